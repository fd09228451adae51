import { dashesOf, stemsOf, type Worked } from './ring-paths.ts';
import { roundsOf, type Round } from './ring-rounds.ts';
import { type Ring, type RingLine, type RingMapGeometry, type RingOptions, type RingState } from './ring-types.ts';

const FULL = 2 * Math.PI;
const f = (n: number) => n.toFixed(2);

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
