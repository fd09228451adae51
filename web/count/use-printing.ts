import { useSyncExternalStore } from 'react';

let isPrinting = false;
const listeners = new Set<() => void>();
const set = (to: boolean) => () => {
  isPrinting = to;
  for (const tell of listeners) tell();
};
window.addEventListener('beforeprint', set(true));
window.addEventListener('afterprint', set(false));

/** Whether the page is being printed: then lines are drawn that nobody has scrolled to. */
export const usePrinting = (): boolean =>
  useSyncExternalStore(
    (tell) => {
      listeners.add(tell);
      return () => listeners.delete(tell);
    },
    () => isPrinting,
  );
