import { type RingLine, type RingState } from './ring-types.ts';

const FULL = 2 * Math.PI;

/** Where a round's stitches lie. */
export interface Worked {
  readonly n: number;
  readonly start: number;
  readonly span: number;
  readonly radius: number;
  readonly stroke: number;
}
export type PointAt = (r: number, a: number) => string;

const middle = ({ start, span, n }: Worked, k: number) => start + (span * (k + 0.5)) / n;

/** Dashes with a gap of at most a third; loose pegs where it does not fit; one tacked line where nothing can be counted. */
export function dashesOf(
  state: RingState,
  here: Worked,
  band: number,
  arc: (r: number, a: number, b: number) => string,
  point: PointAt,
): string {
  const { n, start, span, radius, stroke } = here;
  if (state === 'unread' || n === 0) return arc(radius, start, FULL - start);
  const dash = span / n;
  const gap = Math.min(0.3 * dash, (stroke * 1.15 + 1.5) / radius) / 2;
  let path = '';
  for (let k = 0; k < n; k += 1) {
    const a = start + dash * k;
    const peg = Math.min(3, band * 0.22);
    if (state === 'does-not-fit') path += `M${point(radius - peg, a + dash / 2)}L${point(radius + peg, a + dash / 2)}`;
    else path += arc(radius, a + gap, a + dash - gap);
  }
  return path;
}

/** Increases split from one foot to their dashes, decreases join from their feet; in the open ring every stitch has its stem. */
export function stemsOf(
  line: RingLine,
  below: Worked,
  here: Worked,
  band: number,
  isOpen: boolean,
  point: PointAt,
): string {
  const foot = below.radius + Math.max(here.stroke, below.stroke) * 0.5 + 1;
  const top = here.radius - here.stroke * 0.4;
  const lift = Math.min(0.2 * band, 2) * 0.3;
  const near = (m: number, t: number, r: number, spread: number) =>
    m + Math.max(-spread / r, Math.min(spread / r, t - m));
  const arm = Math.min(0.5 * (here.span / here.n) * here.radius, 0.42 * band);
  let path = '';
  for (const { on, from, to } of groupByFoot(line.walk)) {
    const tops = Array.from({ length: to - from }, (_, k) => middle(here, from + k));
    const feet = on.filter((k) => k < below.n).map((k) => middle(below, k));
    const [first] = tops;
    const [foothold] = feet;
    if (first === undefined || foothold === undefined || to > here.n) continue;
    if (tops.length > 1) {
      const m = tops.reduce((a, b) => a + b) / tops.length;
      const split = foot + (here.radius - foot) * 0.42;
      path += `M${point(foot + lift, foothold)}L${point(split, m)}`;
      for (const t of tops) path += `M${point(split, m)}L${point(top, near(m, t, here.radius, arm))}`;
    } else if (feet.length > 1) {
      const join = foot + (here.radius - foot) * 0.6;
      path += `M${point(join, first)}L${point(top, first)}`;
      for (const t of feet) path += `M${point(foot + lift, near(first, t, foot, arm))}L${point(join, first)}`;
    } else if (isOpen) {
      path += `M${point(here.radius - 0.46 * band, first)}L${point(top, first)}`;
    }
  }
  return path;
}

interface Grown {
  readonly on: readonly number[];
  /** Numbers of the stitches it makes, from and up to but without the last. */
  readonly from: number;
  to: number;
}

/** Stitches one after another on the same single place are one increase. */
function groupByFoot(walk: RingLine['walk']): Grown[] {
  const grown: Grown[] = [];
  let made = 0;
  for (const { on, makes } of walk) {
    const last = grown.at(-1);
    const isSame = last?.on.length === 1 && on.length === 1 && last.on[0] === on[0];
    if (isSame) last.to += makes;
    else grown.push({ on, from: made, to: made + makes });
    made += makes;
  }
  return grown;
}
