import { chainUnits, type ReadLineResult } from './read-line.ts';

/** A starting chain as a line that was read. */
export function foundation(many: number): ReadLineResult {
  return {
    isDoubtful: false,
    from: null,
    to: null,
    units: chainUnits(many),
    base: null,
    left: null,
    leavesOutInside: null,
    said: null,
    verdict: 'no-total',
    loops: 'both',
    count: many,
    isRing: false,
    isInvisible: false,
    vague: null,
    lead: 9,
    score: 9,
    cost: 0,
    events: [],
    used: [],
  };
}
