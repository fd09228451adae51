import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import type { Seat } from '#contract/live';
import { patternQuery } from './bench.queries.ts';
import type { BenchStore } from './bench-store.ts';
import type { Company } from './bench-types.ts';
import { Live } from './live.ts';

/** How often others' saves are looked for where they cannot be heard of. */
const LOOK_EVERY_MS = 15_000;
/** Saves that come close together are read once. */
const GATHER_MS = 200;

/**
 * Hears of others while the page is looked at, and reads what they saved once nothing of one's own is on the way:
 * what is saved here is read anyway when it has been answered.
 */
export function useLive(store: BenchStore, patternId: string): Company {
  const client = useQueryClient();
  const [seats, setSeats] = useState<readonly Seat[]>([]);
  const [live] = useState(() => {
    let gather: ReturnType<typeof setTimeout> | undefined;
    return new Live(patternId, crypto.randomUUID(), {
      now: Date.now,
      onSeats: setSeats,
      onSaved(change) {
        if (change !== null && change <= store.snapshot().pattern.lastChange) return;
        clearTimeout(gather);
        gather = setTimeout(() => {
          if (store.isIdle())
            void client.invalidateQueries({ queryKey: patternQuery(patternId).queryKey, exact: true });
        }, GATHER_MS);
      },
    });
  });

  useEffect(() => {
    const look = () => {
      if (document.visibilityState !== 'visible' || live.isHeard() || !store.isIdle()) return;
      void client.invalidateQueries({ queryKey: patternQuery(patternId).queryKey, exact: true });
    };
    const follow = () => (document.visibilityState === 'visible' ? live.listen() : live.rest());
    follow();
    const timer = setInterval(look, LOOK_EVERY_MS);
    window.addEventListener('focus', look);
    document.addEventListener('visibilitychange', follow);
    return () => {
      clearInterval(timer);
      window.removeEventListener('focus', look);
      document.removeEventListener('visibilitychange', follow);
      live.rest();
    };
  }, [client, store, patternId, live]);

  return { seats, sit: live.sit };
}
