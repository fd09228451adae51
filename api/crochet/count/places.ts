import { type Target } from '../language/tree.ts';

/** One thing that a line leaves in its row: a stitch, or a run of chains. */
export interface Made {
  readonly kind: 'st' | 'chs';
  readonly stitch: string;
  /** Chains in the run; 0 for a stitch. */
  readonly chains: number;
  /** Places of the line before that it stands on. */
  readonly on: readonly number[];
  /** Stitches that stand together in one place share a group; its number, or -1. */
  readonly group: number;
  /** Number within its group, from 1, and the size of the group. */
  readonly nth: number;
  readonly size: number;
  /** A run of chains that stands between stitches of one place (a corner). */
  readonly inside: boolean;
  readonly colour: string | null;
}

/** What a line leaves for the next. */
export interface Left {
  readonly made: readonly Made[];
  readonly shape: 'ring' | 'row' | 'chain' | 'base';
  /** Chains of a foundation, or joined into a ring, that are not worked yet. */
  readonly chains: number;
  /** Places left unworked by short rows, that come back. */
  readonly unworked: number;
  /** A turning chain made at the end of the line for the next one. */
  readonly turningChain: number;
  /** Stitches as counted in the line's total. */
  readonly count: number | null;
  /** Anything may be worked into it: a magic ring, or what is not known. */
  readonly open: boolean;
}

export const NOTHING: Left = {
  made: [],
  shape: 'base',
  chains: 0,
  unworked: 0,
  turningChain: 0,
  count: null,
  open: true,
};

/** Stitches that one line is worked to at most: more is a slip of the key or meant ill, and is said to be too many. */
export const MOST = 100_000;

/** A row of plain places of which only the number is known. */
export function plainLeft(n: number): Left {
  const made = Array.from({ length: placesIn(n) }, (_, i): Made => ({ ...PLAIN, on: [i] }));
  return { ...NOTHING, made, count: n, open: false };
}

/** How many places are laid out for so many: one more than can be worked is enough to find that they are too many. */
export const placesIn = (n: number): number => Math.min(Math.max(0, Math.floor(n)), MOST + 1);

export const PLAIN: Made = {
  kind: 'st',
  stitch: 'st',
  chains: 0,
  on: [],
  group: -1,
  nth: 1,
  size: 1,
  inside: false,
  colour: null,
};

/** A place of the line that is being worked. `counted`: of a kind that the line names. */
export interface Place {
  readonly kind: 'st' | 'sp' | 'ch' | 'gap';
  readonly stitch: string;
  readonly chains: number;
  readonly group: number;
  readonly nth: number;
  readonly size: number;
  readonly inside: boolean;
  readonly counted: boolean;
}

/** The kinds of places that a line works into. */
export interface Named {
  readonly st: boolean;
  readonly ch: boolean;
  readonly gap: boolean;
  readonly sps: readonly Target[];
}

const placeOf = (one: Made, kind: Place['kind'], counted: boolean): Place => ({
  kind,
  stitch: kind === 'ch' ? 'ch' : one.stitch,
  chains: one.chains,
  group: one.group,
  nth: one.nth,
  size: one.size,
  inside: one.inside,
  counted,
});

/** Places along what the line before left, in working order, for a line that names these kinds. */
export function placesOf(left: Left, named: Named): Place[] {
  const places: Place[] = [];
  const { made } = left;
  const spaces = spacesOf(made);
  const noSpaces = named.sps.length > 0 && !spaces.any && !named.st;
  const wantGaps = named.gap || noSpaces;
  let gaps = 0;
  made.forEach((one, i) => {
    if (one.kind === 'st') places.push(placeOf(one, 'st', named.st));
    else if (named.ch) {
      const chain = placeOf(one, 'ch', true);
      for (let n = 0; n < one.chains && n < MOST; n += 1) places.push(chain);
    } else {
      const isNamed = named.sps.some((target) => isSpace(target, one, spaces));
      places.push(placeOf(one, 'sp', isNamed));
    }
    const next = made[i + 1] ?? (left.shape === 'ring' ? made[0] : undefined);
    if (wantGaps && next && isGap(one, next, made.length)) {
      places.push({ ...PLAIN, kind: 'gap', counted: true });
      gaps += 1;
    }
  });
  // Free loops are called loops too: where there is neither space nor gap, a stitch is meant.
  if (noSpaces && gaps === 0) return places.map((place) => ({ ...place, counted: true }));
  // Spaces between groups are called gaps where there is a chain in each.
  if (named.gap && gaps === 0)
    return places.map((place) => (place.kind === 'sp' ? { ...place, kind: 'gap', counted: true } : place));
  return places;
}

/** What there is among the spaces of a line, reckoned once. */
export interface Spaces {
  readonly any: boolean;
  readonly inside: boolean;
  readonly longest: number;
  /** Stitches of the largest group: a half shell at an edge is no shell. */
  readonly largest: number;
  readonly chains: boolean;
  readonly gaps: boolean;
}

export function spacesOf(
  all: readonly { readonly kind: string; readonly chains: number; readonly inside: boolean; readonly size: number }[],
): Spaces {
  let longest = 0;
  let largest = 0;
  let any = false;
  let inside = false;
  let chains = false;
  let gaps = false;
  for (const one of all) {
    if (one.size > largest) largest = one.size;
    if (one.kind === 'ch') chains = true;
    if (one.kind === 'gap') gaps = true;
    if (one.kind !== 'sp' && one.kind !== 'chs') continue;
    any = true;
    if (one.inside) inside = true;
    if (one.chains > longest) longest = one.chains;
  }
  return { any, inside, longest, largest, chains, gaps };
}

/** Whether a space is meant by `ch-2 sp`, `corner`, or any `sp`. */
function isSpace(target: Target, space: Pick<Made, 'chains' | 'inside'>, spaces: Spaces): boolean {
  if (target.chains !== undefined) return space.chains === target.chains;
  if (!target.corner) return true;
  return spaces.inside ? space.inside : space.chains === spaces.longest;
}

/** Between two groups that stand in different places, or where a place was passed over. */
function isGap(one: Made, next: Made, length: number): boolean {
  if (one.kind !== 'st' || next.kind !== 'st' || length < 2) return false;
  if (one.group >= 0 && one.group === next.group) return false;
  if (one.size > 1 || next.size > 1) return true;
  const from = one.on.at(-1);
  const to = next.on[0];
  return from !== undefined && to !== undefined && to - from > 1;
}

/** Whether a place is one that the target names. */
export function isAt(place: Place, target: Target | null, spaces: Spaces): boolean {
  if (!target) return place.kind === 'st' || place.kind === 'ch';
  switch (target.what) {
    case 'sp':
      if (place.kind === 'gap') return !spaces.any;
      if (place.kind === 'st') return !spaces.any && !spaces.gaps;
      return place.kind === 'sp' && isSpace(target, place, spaces);
    case 'gap':
      return place.kind === 'gap';
    case 'ch':
      if (place.kind === 'st') return !spaces.any && !spaces.chains;
      return place.kind === 'ch' || (place.kind === 'sp' && !spaces.chains);
    case 'st-or-ch':
      return place.kind === 'st' || place.kind === 'ch';
    case 'group':
      return isCentre(place, Math.max(2, Math.ceil((spaces.largest * 2) / 3)));
    case 'st':
      // Where no corner was made yet, the stitch that is to become one is the next.
      if (target.corner && spaces.largest >= 3) return isCentre(place, 3);
      if (target.of !== undefined && target.which === 'nth')
        return place.kind === 'st' && place.size > 1 && place.size * 3 > spaces.largest * 2 && place.nth === target.n;
      if (target.of !== undefined && target.which === 'centre')
        return isCentre(place, Math.max(2, Math.ceil((spaces.largest * 2) / 3)));
      if (place.kind === 'ch') return !target.stitch;
      return place.kind === 'st' && isStitch(place, target.stitch);
    default:
      return place.kind === 'st' || place.counted;
  }
}

const isCentre = (place: Place, least: number): boolean =>
  place.kind === 'st' && place.size >= least && place.nth === Math.ceil(place.size / 2);

/** A place of which only the number is known may be any stitch. */
export const isStitch = (place: Pick<Place, 'stitch'>, key: string | undefined): boolean =>
  key === undefined ||
  place.stitch === 'st' ||
  place.stitch === key ||
  place.stitch.startsWith(key) ||
  place.stitch.endsWith(key) ||
  key === 'st';
