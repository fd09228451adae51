import type { Clock } from '../../api/platform/clock.ts';

/** A clock that goes as the real one does, and can be put forward. */
export interface MovableClock extends Clock {
  /** Puts the clock forward by so many milliseconds, or back with a negative number. */
  advance(ms: number): void;
  /** Stops the clock at a moment; `advance` still moves it. */
  stopAt(at: Date): void;
}

export function movableClock(): MovableClock {
  let ahead = 0;
  let stopped: number | null = null;
  return {
    now: () => new Date((stopped ?? Date.now()) + ahead),
    advance(ms) {
      ahead += ms;
    },
    stopAt(at) {
      stopped = at.getTime();
      ahead = 0;
    },
  };
}
