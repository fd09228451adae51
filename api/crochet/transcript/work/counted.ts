import { compareTotals } from '../../count/compare.ts';
import { workInOrder } from '../../count/offer.ts';
import { type Left } from '../../count/places.ts';
import { type Tally } from '../../count/tally.ts';
import { type Item } from '../../language/tree.ts';
import { type Unit } from './units.ts';

/** What the count makes of told work. */
export interface CountedWork {
  readonly fits: boolean;
  readonly tally: Tally;
  readonly left: Left;
}

/** Asks the count how told work comes out on so many places; null places take any work. */
export function countUnits(units: readonly Unit[], places: number | null, isRing: boolean): CountedWork {
  const { fits, tally, left } = workInOrder(units.map(itemOf), places, isRing);
  return { fits: places === null || fits, tally, left };
}

/**
 * Whether a spoken number is the total of the work: its stitches, with its chains, with its spaces. Where earlier totals
 * of the piece left out what stands inside a group, this one does too.
 */
export function isTotalOf(said: number, tally: Tally, leavesOutInside: boolean): boolean {
  if (leavesOutInside && hasInside(tally)) return said === tally.sts || said === tally.sts + tally.chainsOutside;
  return compareTotals({ sts: [said] }, tally, 0, null).ways.length > 0;
}

/** What a total tells of how the maker counts: whether it left out the chains inside a group; null where that is open. */
export function leavesOutInside(said: number, tally: Tally): boolean | null {
  if (!hasInside(tally)) return null;
  return said === tally.sts || said === tally.sts + tally.chainsOutside;
}

const hasInside = (tally: Tally): boolean => tally.chains > tally.chainsOutside;

const SPAN = { start: 0, end: 0 };

function itemOf(unit: Unit): Item {
  switch (unit.type) {
    case 'stitch':
      return work(keyOf(unit.stitch), unit.inOne, unit.times);
    case 'together':
      return work(`${keyOf(unit.stitch)}${String(unit.many)}tog`, 1, unit.times);
    case 'chain':
      return work('ch', 1, unit.many, false);
    case 'skip':
      return { type: 'skip', span: SPAN, n: [unit.many], of: null };
    case 'oneplace':
      return group(unit.parts.map(partOf), unit.times, true);
    case 'repeat':
      return group(unit.units.map(itemOf), unit.times, false);
  }
}

/** Slip stitches that only join are left out before; those told as work are stitches like others. */
const keyOf = (stitch: string): string => (stitch === 'slst' ? 'sc' : stitch);

const partOf = (part: string): Item => (part === 'ch' ? work('ch', 1, 1, false) : work(keyOf(part), 1, 1, false));

function work(stitch: string, per: number, times: number, inNext = true): Item {
  return {
    type: 'work',
    span: SPAN,
    stitch,
    per: [per],
    times: { type: 'n', n: [times] },
    into: inNext ? { what: 'st', which: 'next' } : null,
    loops: null,
    glued: false,
    multiplied: false,
  };
}

function group(items: readonly Item[], times: number, inNext: boolean): Item {
  const one: Item = {
    type: 'group',
    span: SPAN,
    items,
    times: { type: 'n', n: [1] },
    into: inNext ? { what: 'st', which: 'next' } : null,
    mark: '(',
    stop: null,
  };
  return times === 1 && inNext
    ? one
    : { ...one, items: inNext ? [one] : items, into: null, times: { type: 'n', n: [times] } };
}
