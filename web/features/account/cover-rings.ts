/**
 * The rounds of the harvest mouse as the cover shows them: one dash a stitch, counterclockwise from a seam at the top,
 * with a fork where two stitches grow out of one and legs where two become one. A drawing, not a map of anybody's work.
 */
type Work = readonly [repeats: number, stitches: string];
/** s = one into one, i = two into one, d = two drawn into one. */
const MOUSE: readonly Work[] = [
  [1, 'ssssss'],
  [6, 'i'],
  [6, 'si'],
  [6, 'ssi'],
  ...Array.from({ length: 4 }, (): Work => [24, 's']),
  [6, 'ssd'],
  [18, 's'],
  [6, 'ssi'],
  [24, 's'],
  [24, 's'],
  [6, 'ssd'],
  [18, 's'],
  [6, 'sd'],
  [12, 's'],
  [6, 'd'],
];
/** The ninth round is the one in hand. */
const OPEN = 8;
const OPEN_WEIGHT = 2.6;

export interface CoverRing {
  readonly dashes: string;
  readonly stems: string;
  readonly width: number;
  readonly kind: 'done' | 'open' | 'to-come';
}
export interface Cover {
  readonly rings: readonly CoverRing[];
  /** Where the marker hangs: its foot, in the middle of the seam of the open round. */
  readonly markerY: number;
  readonly centre: number;
}

const short = (value: number) => String(Math.round(value * 10) / 10);

/** Draws the cover's rings into a square of `size`. */
export function coverRings(size: number): Cover {
  const c = size / 2;
  const point = (r: number, angle: number) => `${short(c - r * Math.sin(angle))} ${short(c - r * Math.cos(angle))}`;
  const inner = 0.03 * size;
  const unit = (c - 3 - inner) / (MOUSE.length - 1 + OPEN_WEIGHT);
  const rings: CoverRing[] = [];
  let edge = inner;
  let below: { r: number; start: number; span: number; count: number; width: number } | null = null;
  let markerY = 0;

  MOUSE.forEach(([repeats, stitches], index) => {
    const isOpen = index === OPEN;
    const band = unit * (isOpen ? OPEN_WEIGHT : 1);
    const r = edge + 0.72 * band;
    const start = Math.min(0.5, (0.03 * size) / r);
    const span = 2 * Math.PI - 2 * start;
    const kind = isOpen ? 'open' : index < OPEN ? 'done' : 'to-come';
    const width = isOpen ? 0.2 * band : Math.min(2.2, 0.3 * band) * (kind === 'to-come' ? 0.72 : 1);
    const work = stitches.repeat(repeats);
    const count = Array.from(work).reduce((sum, stitch) => sum + (stitch === 'i' ? 2 : 1), 0);
    const middle = (k: number) => start + (span * (k + 0.5)) / count;
    const gap = Math.min(0.3 * (span / count), (width * 1.15 + 1.5) / r) / 2;

    let dashes = '';
    for (let k = 0; k < count; k += 1) {
      const [from, to] = [start + (span * k) / count + gap, start + (span * (k + 1)) / count - gap];
      dashes += `M${point(r, from)}A${short(r)} ${short(r)} 0 0 0 ${point(r, to)}`;
    }
    const ring = { r, start, span, count, width };
    const stems = below ? stemsOf(work, below, ring, band, isOpen, middle) : '';
    rings.push({ dashes, stems, width, kind });
    if (isOpen) markerY = c - r;
    below = ring;
    edge += band;
  });
  return { rings, markerY, centre: c };

  function stemsOf(
    work: string,
    from: { r: number; start: number; span: number; count: number; width: number },
    to: { r: number; span: number; count: number; width: number },
    band: number,
    isOpen: boolean,
    middle: (k: number) => number,
  ): string {
    const foot = (k: number) => from.start + (from.span * (k + 0.5)) / from.count;
    const bottom = from.r + Math.max(to.width, from.width) / 2 + 1;
    const top = to.r - to.width * 0.4;
    const spread = Math.min(0.5 * (to.span / to.count) * to.r, 0.42 * band);
    const near = (angle: number, m: number, r: number) => m + Math.max(-spread / r, Math.min(spread / r, angle - m));
    let d = '';
    let [used, made] = [0, 0];
    for (const stitch of work) {
      const fork = stitch === 'd' ? bottom + (to.r - bottom) * 0.6 : bottom + (to.r - bottom) * 0.42;
      if (stitch === 'i') {
        const m = (middle(made) + middle(made + 1)) / 2;
        d += `M${point(bottom, foot(used))}L${point(fork, m)}`;
        for (const k of [made, made + 1]) d += `M${point(fork, m)}L${point(top, near(middle(k), m, to.r))}`;
      } else if (stitch === 'd') {
        const m = middle(made);
        d += `M${point(fork, m)}L${point(top, m)}`;
        for (const k of [used, used + 1]) d += `M${point(bottom, near(foot(k), m, bottom))}L${point(fork, m)}`;
      } else if (isOpen) {
        d += `M${point(to.r - 0.46 * band, middle(made))}L${point(top, middle(made))}`;
      }
      used += stitch === 'd' ? 2 : 1;
      made += stitch === 'i' ? 2 : 1;
    }
    return d;
  }
}
