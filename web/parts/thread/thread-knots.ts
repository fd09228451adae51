import { type VerdictName } from '../verdict-mark.tsx';

/** A marked moment on the thread. `label` is the round's number as it stands above the knot. */
export interface Knot {
  readonly id: string;
  readonly startMs: number;
  readonly label: string;
  /** As a screen reader should name it: "R9". */
  readonly name: string;
  readonly verdict?: VerdictName;
}

export interface KnotGroup {
  readonly knots: readonly Knot[];
  readonly startMs: number;
}

/** Knots nearer than this share one, with a count. */
const NEAR_PX = 12;
/** A caption's start draws a dragged knot to itself from this far. */
export const SNAP_MS = 400;

/** Knots in order, those that would overlap taken together. */
export function groupKnots(knots: readonly Knot[], pxPerMs: number): KnotGroup[] {
  const groups: { knots: Knot[]; startMs: number }[] = [];
  for (const knot of [...knots].sort((a, b) => a.startMs - b.startMs)) {
    const last = groups.at(-1);
    if (last && (knot.startMs - last.startMs) * pxPerMs < NEAR_PX) last.knots.push(knot);
    else groups.push({ knots: [knot], startMs: knot.startMs });
  }
  return groups;
}

/** Where a knot let go at `ms` comes to lie: at the start of a caption if one is near, unless it is held free (Alt). */
export function snapTo(ms: number, starts: readonly number[], isFree: boolean): number {
  if (isFree) return Math.round(ms / 100) * 100;
  let nearest = Math.round(ms / 100) * 100;
  let distance = SNAP_MS;
  for (const start of starts) {
    const away = Math.abs(start - ms);
    if (away < distance) [nearest, distance] = [start, away];
  }
  return nearest;
}

const FAULTS: readonly VerdictName[] = ['unread', 'does-not-fit', 'differs'];

/** The worst fault among knots that share one. */
export const worstFault = (knots: readonly Knot[]): VerdictName | undefined =>
  FAULTS.find((fault) => knots.some((knot) => knot.verdict === fault));
