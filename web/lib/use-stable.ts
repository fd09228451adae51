import { useCallback, useLayoutEffect, useRef } from 'react';

/** A function that stays the same while what it does follows the newest render: for handlers given to memoized rows. */
export function useStable<A extends unknown[], R>(act: (...args: A) => R): (...args: A) => R {
  const latest = useRef(act);
  useLayoutEffect(() => {
    latest.current = act;
  });
  return useCallback((...args: A) => latest.current(...args), []);
}
