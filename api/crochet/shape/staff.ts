import { type RingLine, type RingState } from './ring-types.ts';

/** One row as it is drawn. Lengths are in px from the left and the top. */
export interface StaffRow {
  readonly lineId: string;
  readonly key: string;
  readonly state: RingState;
  readonly isOpen: boolean;
  readonly y: number;
  /** SVG path data of the dashes, one a stitch; of a row that cannot be counted one line to be tacked. */
  readonly dashes: string;
  readonly stroke: number;
  /** SVG path data of the small arrow at the row's start end, which shows the way it is worked. */
  readonly arrow: string;
  readonly label: string;
}

export interface StaffGeometry {
  readonly width: number;
  readonly height: number;
  readonly rowHeight: number;
  /** The first row first; it stands at the foot. */
  readonly rows: readonly StaffRow[];
}

export interface StaffOptions {
  /** Width of the whole in px, labels and arrows included. */
  readonly width: number;
  readonly openId: string | null;
  /** Left-handed work begins at the other end. */
  readonly isMirrored?: boolean;
}

const ROW_PX = 11;
/** Room at either side: numbers at the left, arrows at both ends. */
const MARGIN_PX = 34;
const f = (n: number) => n.toFixed(2);

function stateOf({ verdict, id, isDone }: RingLine, openId: string | null): RingState {
  if (verdict === 'differs' || verdict === 'does-not-fit' || verdict === 'unread') return verdict;
  if (id === openId) return 'now';
  return isDone ? 'done' : 'to-come';
}

/** Dashes with a gap of three tenths; loose upright pegs where the row does not fit. */
function dashesOf(state: RingState, n: number, x: number, y: number, stitch: number): string {
  let path = '';
  for (let k = 0; k < n; k += 1) {
    const at = x + k * stitch;
    path +=
      state === 'does-not-fit'
        ? `M${f(at + stitch / 2)} ${f(y - 2.5)}V${f(y + 2.5)}`
        : `M${f(at + stitch * 0.15)} ${f(y)}H${f(at + stitch * 0.85)}`;
  }
  return path;
}

/**
 * Rows, not rounds: one straight line of dashes a row, the first at the foot, worked to and fro. The first row runs from
 * right to left as a right-handed one does.
 *
 * @returns geometry in px; as many rows as the lines stand for.
 */
export function staffOf(lines: readonly RingLine[], options: StaffOptions): StaffGeometry {
  const { width, openId, isMirrored = false } = options;
  const rows = lines.flatMap((line) =>
    line.counts.map((n, i) => ({ line, n: n ?? 0, label: i === line.counts.length - 1 ? line.label : '' })),
  );
  const most = Math.max(1, ...rows.map((row) => row.n));
  const stitch = (width - 2 * MARGIN_PX) / most;
  const height = rows.length * ROW_PX + 10;
  return {
    width,
    height,
    rowHeight: ROW_PX,
    rows: rows.map(({ line, n, label }, i): StaffRow => {
      const y = height - 8 - i * ROW_PX;
      const x = (width - n * stitch) / 2;
      const state = stateOf(line, openId);
      const isOpen = line.id === openId;
      const beginsRight = (i % 2 === 0) !== isMirrored;
      const tip = beginsRight ? x + n * stitch + 5 : x - 5;
      const back = beginsRight ? 4 : -4;
      return {
        lineId: line.id,
        key: `${line.id}-${String(i)}`,
        state,
        isOpen,
        y,
        dashes:
          state === 'unread' || n === 0
            ? `M${String(MARGIN_PX)} ${f(y)}H${String(width - MARGIN_PX)}`
            : dashesOf(state, n, x, y, stitch),
        stroke: state === 'unread' ? 1.7 : isOpen ? 3 : state === 'to-come' ? 1.3 : 1.8,
        arrow: `M${f(tip + back)} ${f(y - 2.5)}l${String(-back)} 2.5 ${String(back)} 2.5`,
        label,
      };
    }),
  };
}
