import { type VerdictName } from '../verdict-mark.tsx';

/** A line worked in rounds, as the map needs it. */
export interface RingLine {
  readonly id: string;
  /** The number of its last round, as it stands in the seam. */
  readonly label: string;
  /** Stitches of each of its rounds; null where they cannot be counted. A range has several. */
  readonly counts: readonly (number | null)[];
  readonly verdict: VerdictName;
  /** One entry a stitch of one round, in order: the places of the round before that it stands on. */
  readonly walk: readonly { readonly on: readonly number[]; readonly makes: number }[];
  readonly isDone: boolean;
}

export type RingState = 'done' | 'now' | 'to-come' | 'differs' | 'does-not-fit' | 'unread';

export interface Ring {
  readonly lineId: string;
  readonly key: string;
  readonly state: RingState;
  readonly isOpen: boolean;
  /** Inner edge and width of the band; the hit area. */
  readonly inner: number;
  readonly band: number;
  readonly stroke: number;
  /** SVG path data of the dashes, one a stitch, and of the stems of increases and decreases. */
  readonly dashes: string;
  readonly stems: string;
  readonly stemStroke: number;
  readonly label: { readonly text: string; readonly size: number } | null;
  readonly mark: { readonly verdict: VerdictName; readonly size: number } | null;
  /** Distance of the dashes from the heart; label and mark stand there in the seam. */
  readonly radius: number;
}

export interface RingMapGeometry {
  readonly size: number;
  readonly heart: number;
  readonly rings: readonly Ring[];
}

export interface RingOptions {
  /** Edge of the square in px. */
  readonly size: number;
  readonly openId: string | null;
  /** How much wider the open ring's band is: 2.6 bench, 3.2 watch, 4 phone. */
  readonly openWeight?: number;
  /** Left-handed work grows the other way round. */
  readonly isMirrored?: boolean;
}

interface Round {
  readonly line: RingLine;
  readonly n: number;
  readonly isLast: boolean;
  readonly isFirst: boolean;
  readonly label: string;
}

const FULL = 2 * Math.PI;
const BUNDLE_OVER = 40;
const BUNDLE_BELOW_PX = 300;
const BUNDLE = 5;
const f = (n: number) => n.toFixed(2);

/** Every round of every line; where there are too many, those away from the open one bundled in fives. */
function roundsOf(lines: readonly RingLine[], { size, openId }: RingOptions): Round[] {
  const rounds = lines.flatMap((line) =>
    line.counts.map((n, i): Round => {
      const isLast = i === line.counts.length - 1;
      return { line, n: n ?? 0, isLast, isFirst: i === 0, label: isLast ? line.label : '' };
    }),
  );
  if (rounds.length <= BUNDLE_OVER || size >= BUNDLE_BELOW_PX) return rounds;
  const open = rounds.findIndex(({ line }) => line.id === openId);
  const bundled: Round[] = [];
  for (let at = 0; at < rounds.length;) {
    const group = rounds.slice(at, at + BUNDLE);
    const last = group.at(-1);
    const isNear = open >= 0 && at <= open + 2 && at + BUNDLE > open - 2;
    if (isNear || !last || group.length < BUNDLE) bundled.push(...group);
    else bundled.push({ ...last, isFirst: false, isLast: true, label: `${at + 1}–${at + BUNDLE}` });
    at += BUNDLE;
  }
  return bundled;
}

const stateOf = ({ verdict, id, isDone }: RingLine, openId: string | null): RingState => {
  if (verdict === 'differs' || verdict === 'does-not-fit' || verdict === 'unread') return verdict;
  if (id === openId) return 'now';
  return isDone ? 'done' : 'to-come';
};

/** Ring map: rounds in working order from the heart outward, one dash a stitch, counterclockwise from the seam at twelve o'clock. */
export function ringMap(lines: readonly RingLine[], options: RingOptions): RingMapGeometry {
  const { size, openId, openWeight = 2.6, isMirrored = false } = options;
  const rounds = roundsOf(lines, options);
  const centre = size / 2;
  const outer = centre - 3;
  const heart = 0.03 * size;
  const seam = size < 240 ? Math.max(6, 0.03 * size) : 0.03 * size;
  const weight = (round: Round) => (round.line.id === openId ? openWeight : 1);
  const unit =
    (outer - heart) /
    Math.max(
      1,
      rounds.reduce((sum, round) => sum + weight(round), 0),
    );
  const turn = isMirrored ? 1 : -1;
  const point = (r: number, a: number) => `${f(centre + turn * r * Math.sin(a))} ${f(centre - r * Math.cos(a))}`;
  const arc = (r: number, a: number, b: number) =>
    `M${point(r, a)}A${f(r)} ${f(r)} 0 ${b - a > Math.PI ? 1 : 0} ${isMirrored ? 1 : 0} ${point(r, b)}`;

  let inner = heart;
  let below: Worked | null = null;
  const rings = rounds.map((round, i): Ring => {
    const { line, n } = round;
    const isOpen = line.id === openId;
    const band = unit * weight(round);
    const state = stateOf(line, openId);
    const radius = inner + 0.72 * band;
    const thin = state === 'to-come' ? 0.72 : 1;
    const stroke =
      isOpen && state === 'now' ? Math.max(2.4, 0.2 * band) : Math.max(0.8, Math.min(2.2, 0.3 * band) * thin);
    const start = Math.min(0.5, seam / radius);
    const here: Worked = { n, start, span: FULL - 2 * start, radius, stroke };
    const isCounted = state !== 'unread' && n > 0;
    const stems =
      isCounted && state !== 'does-not-fit' && below && size >= 80 && round.isFirst
        ? stemsOf(line, below, here, band, isOpen, point)
        : '';
    const mark = state === 'differs' || state === 'does-not-fit' || state === 'unread' ? state : null;
    const showsLabel = round.label !== '' && ((band >= 8 && inner > 10) || (isOpen && round.isLast));
    const ring: Ring = {
      lineId: line.id,
      key: `${line.id}-${i}`,
      state,
      isOpen,
      inner,
      band,
      stroke: state === 'unread' ? 1.7 : stroke,
      dashes: dashesOf(state, here, band, arc, point),
      stems,
      stemStroke: isOpen ? Math.max(1.6, stroke * 0.42) : Math.max(0.8, stroke * 0.62),
      label:
        showsLabel && !mark
          ? { text: round.label, size: isOpen ? Math.min(15, Math.max(10, band * 0.34)) : Math.min(10, band * 0.62) }
          : null,
      mark: mark && round.isLast ? { verdict: mark, size: Math.min(16, Math.max(9, band * 0.62)) } : null,
      radius,
    };
    inner += band;
    below = isCounted ? here : null;
    return ring;
  });
  return { size, heart: 0.55 * heart, rings };
}

/** Where a round's stitches lie. */
interface Worked {
  readonly n: number;
  readonly start: number;
  readonly span: number;
  readonly radius: number;
  readonly stroke: number;
}
type PointAt = (r: number, a: number) => string;

const middle = ({ start, span, n }: Worked, k: number) => start + (span * (k + 0.5)) / n;

/** Dashes with a gap of at most a third; loose pegs where it does not fit; one tacked line where nothing can be counted. */
function dashesOf(
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
function stemsOf(line: RingLine, below: Worked, here: Worked, band: number, isOpen: boolean, point: PointAt): string {
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
