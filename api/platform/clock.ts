/** Time comes from here alone, so that a test can stand at a limit and step over it. */
export interface Clock {
  now(): Date;
}

export const systemClock: Clock = { now: () => new Date() };
