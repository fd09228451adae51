import { useSyncExternalStore } from 'react';

const subscribe = (tell: () => void) => {
  window.addEventListener('online', tell);
  window.addEventListener('offline', tell);
  return () => {
    window.removeEventListener('online', tell);
    window.removeEventListener('offline', tell);
  };
};

/** Whether the browser believes itself to be connected. */
export const useOnline = (): boolean => useSyncExternalStore(subscribe, () => navigator.onLine);
