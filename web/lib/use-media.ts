import { useSyncExternalStore } from 'react';

/** Whether a media query holds now: `useMedia('(max-width: 640px)')`. */
export function useMedia(query: string): boolean {
  return useSyncExternalStore(
    (tell) => {
      const list = window.matchMedia(query);
      list.addEventListener('change', tell);
      return () => list.removeEventListener('change', tell);
    },
    () => window.matchMedia(query).matches,
  );
}

/** One column up to here. */
export const PHONE = '(max-width: 640px)';
/** Three columns of the bench do not fit side by side: it is worked as on a phone. */
export const ONE_COLUMN = '(max-width: 860px)';
/** The side panel is a drawer up to here. */
export const NARROW = '(max-width: 1100px)';
