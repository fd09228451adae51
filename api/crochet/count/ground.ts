import { placesOf, spacesOf, type Left, type Named, type Place, type Spaces } from './places.ts';

/** Places to work over, and what is reckoned of them once. Never changed, so that several workings share it. */
export interface Ground {
  readonly places: readonly Place[];
  /** How many counted places stand before each index; one longer than `places`. */
  readonly counted: readonly number[];
  readonly spaces: Spaces;
  /** The number of places is not known: they never run out. */
  readonly open: boolean;
}

export function groundFrom(places: readonly Place[], open = false): Ground {
  const counted = [0];
  let n = 0;
  for (const place of places) {
    if (place.counted) n += 1;
    counted.push(n);
  }
  return { places, counted, spaces: spacesOf(places), open };
}

export const OPEN_GROUND: Ground = groundFrom([], true);

const GROUNDS = new WeakMap<Left, Map<string, Ground>>();

/** The ground that a line naming these kinds of places finds on what was left. A line is tried in many readings. */
export function groundOf(left: Left, named: Named): Ground {
  const key = `${String(named.st)} ${String(named.ch)} ${String(named.gap)} ${JSON.stringify(named.sps)}`;
  let known = GROUNDS.get(left);
  if (!known) GROUNDS.set(left, (known = new Map<string, Ground>()));
  let ground = known.get(key);
  if (!ground) known.set(key, (ground = groundFrom(placesOf(left, named))));
  return ground;
}

/** The same round begun at another place. */
export const groundTurned = (ground: Ground, at: number): Ground =>
  at === 0 ? ground : groundFrom([...ground.places.slice(at), ...ground.places.slice(0, at)], ground.open);
