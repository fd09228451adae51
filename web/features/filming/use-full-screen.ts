import { useSyncExternalStore } from 'react';

const subscribe = (tell: () => void) => {
  document.addEventListener('fullscreenchange', tell);
  return () => document.removeEventListener('fullscreenchange', tell);
};

/** Whether the page fills the screen, and the way in and out; `turn` is null where the browser cannot. */
export function useFullScreen(): { isFull: boolean; turn: (() => void) | null } {
  const isFull = useSyncExternalStore(subscribe, () => document.fullscreenElement !== null);
  const turn = document.fullscreenEnabled
    ? () => {
        const done = isFull ? document.exitFullscreen() : document.documentElement.requestFullscreen();
        // Refused by the browser it stays as it is, which is seen.
        done.catch(() => undefined);
      }
    : null;
  return { isFull, turn };
}
