import { type Item } from '../language/tree.ts';
import { placesOf, plainLeft, type Left, type Named, type Place } from './places.ts';
import { USUAL } from './readings.ts';
import { type LineWork, workLine } from './work-line.ts';

/** How many places a line offers to the next, by what the next one says that it works into. */
export interface Offer {
  readonly stitches: number;
  /** Stitches, and every chain outside groups as a place of its own: a mesh, a bridge. */
  readonly stitchesAndChains: number;
  /** Stitches, and every space as one place. */
  readonly stitchesAndSpaces: number;
  readonly spaces: number;
  /** Spaces inside groups: the corners of a square. */
  readonly corners: number;
  /** Gaps between groups where there is no chain. */
  readonly gaps: number;
  /** Shells, fans, corners: groups of three or more in one place, or with a space in them. */
  readonly groups: number;
}

const ALL: Named = { st: true, ch: false, gap: true, sps: [{ what: 'sp', which: 'next' }] };

/** Counts the places that a line left, in every way that the next may name them. Linear in the stitches. */
export function offerOf(left: Left): Offer {
  const places = placesOf(left, ALL);
  const count = (kind: Place['kind']) => places.filter((place) => place.kind === kind).length;
  const stitches = count('st');
  const spaces = left.made.filter((one) => one.kind === 'chs').length;
  const corners = left.made.filter((one) => one.kind === 'chs' && one.inside).length;
  const chains = left.made.reduce((sum, one) => sum + (one.inside ? 0 : one.chains), 0);
  return {
    stitches,
    stitchesAndChains: stitches + chains,
    stitchesAndSpaces: stitches + spaces,
    spaces,
    corners,
    gaps: count('gap'),
    groups: groupsIn(left),
  };
}

function groupsIn(left: Left): number {
  const groups = new Set<number>();
  left.made.forEach((one, i) => {
    if (one.kind === 'st' && one.size > 2) groups.add(one.group);
    const before = left.made[i - 1];
    if (one.inside && before !== undefined && before.group >= 0) groups.add(before.group);
  });
  return groups.size;
}

/**
 * Works items one place after another: what a speaker told, of which it is known how many places there are.
 *
 * @param places how many there are; null where anything may be worked into it
 */
export function workInOrder(items: readonly Item[], places: number | null, isRing: boolean): LineWork {
  const span = { start: 0, end: 0 };
  // an empty group first, so that a chain at the start is taken as told and stands for nothing
  const lead: Item = { type: 'group', span, items: [], times: { type: 'n', n: [1] }, into: null, mark: '', stop: null };
  return workLine({ span, items: [lead, ...items], loops: null }, USUAL, {
    left: places === null ? { ...plainLeft(0), open: true } : plainLeft(places),
    ring: isRing,
    size: 0,
    policy: {},
    own: new Map(),
    stitch: 'sc',
    free: new Map(),
    finished: [],
    rows: 0,
    comesBack: false,
    label: null,
    blocks: false,
    sense: null,
  });
}
