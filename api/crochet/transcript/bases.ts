import { offerOf } from '../count/offer.ts';
import { type Left } from '../count/places.ts';
import { type Base } from './instruct/resolve.ts';
import { sumOf, type Unit } from './work/units.ts';

/** A counted line of the piece as far as it is read, for what comes after it. */
export interface ReadSoFar {
  readonly from: number | null;
  readonly to: number | null;
  readonly units: readonly Unit[];
  readonly base: number | null;
  readonly loops: 'both' | 'back' | 'front';
  readonly said: number | null;
  /** Whether the reading is uncertain, or stands on one that is. */
  readonly isDoubtful: boolean;
  /** Whether its total left out the chains inside a group; null where it tells nothing of that. */
  readonly leavesOutInside: boolean | null;
  /** What the count says that the line leaves; null where it was not understood. */
  readonly left: Left | null;
  readonly verdict: 'agrees' | 'differs' | 'does-not-fit' | 'unread' | 'no-total';
}

/** What the words of the first line after a chain tell about where it begins and how far it goes. */
export interface ChainStart {
  readonly chains: number;
  readonly isJoined: boolean;
  readonly bothSides: boolean;
  /** `third chain from the hook`. */
  readonly nth: number | null;
}

/** The places that a starting chain offers. */
export function basesOnChain({ chains, isJoined, bothSides, nth }: ChainStart): readonly Base[] {
  if (isJoined)
    return [
      { n: chains, cost: 0 },
      { n: chains - 1, cost: 1 },
    ];
  const around = 2 * (chains - 1) - 1;
  const along = nth === null ? chains - 1 : chains - nth + 1;
  const bases: Base[] = [
    { n: along, cost: 0 },
    { n: along + 1, cost: nth !== null && nth > 2 ? 0.1 : 1.2 },
    { n: chains - 2, cost: nth === null ? 0.5 : 1 },
    { n: chains - 3, cost: 1.4 },
    { n: around, cost: bothSides ? 0 : 1 },
    { n: 1, cost: 1.6 },
  ];
  return distinct(
    bothSides ? [{ n: around, cost: 0 }, ...bases.map((base) => ({ ...base, cost: base.cost + 1 }))] : bases,
  );
}

/** The places that a line leaves, the likeliest first: its stitches and chains, its stitches, its spaces and gaps. */
export function basesAfter(line: ReadSoFar, namesSpaces: boolean): readonly Base[] {
  const { makes } = sumOf(line.units);
  const bases: Base[] = [];
  if (line.verdict === 'unread') return line.said === null ? [] : [{ n: line.said, cost: 0 }];
  if (line.verdict === 'does-not-fit') {
    if (line.said !== null) bases.push({ n: line.said, cost: 0 });
    bases.push({ n: makes, cost: line.said === null ? 0 : 0.6 });
    return distinct(bases);
  }
  if (line.left === null) return distinct([{ n: makes, cost: 0 }]);
  const offer = offerOf(line.left);
  const { stitches, stitchesAndChains, corners, groups } = offer;
  const outer = offer.spaces - corners;
  const extra = namesSpaces ? 0 : 0.5;
  bases.push({ n: stitchesAndChains, cost: 0 });
  if (line.verdict === 'differs' && line.said !== null) bases.push({ n: line.said, cost: 0.5 });
  if (corners > 0)
    bases.push(
      { n: stitchesAndChains + corners, cost: 0.2 + extra },
      { n: corners, cost: 0.4 + extra },
      { n: offer.spaces, cost: 0.4 + extra },
    );
  if (outer > 0)
    bases.push({ n: stitches, cost: 0.9 }, { n: outer, cost: 0.5 + extra }, { n: offer.stitchesAndSpaces, cost: 0.6 });
  if (groups > 1)
    bases.push(
      { n: groups, cost: 0.7 + extra },
      { n: groups + 1, cost: 0.8 + extra },
      { n: offer.gaps + corners, cost: 0.5 + extra },
      { n: offer.gaps, cost: 0.6 + extra },
      { n: groups + corners, cost: 0.6 + extra },
      { n: 2 * groups, cost: 0.9 + extra },
      { n: groups - 1, cost: 1 + extra },
      { n: groups + 2, cost: 1 + extra },
    );
  return distinct(bases);
}

function distinct(bases: readonly Base[]): readonly Base[] {
  const best = new Map<number, number>();
  for (const base of bases) if (base.n > 0) best.set(base.n, Math.min(base.cost, best.get(base.n) ?? Infinity));
  return [...best].map(([n, cost]) => ({ n, cost })).sort((a, b) => a.cost - b.cost);
}
