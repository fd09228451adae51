import { roundsOf, type PublicLine } from '#crochet';

/** Side of a box and the distance from one to the next, in points. */
export const BOX = 8.25;
export const BOX_STEP = 10.5;
export const BOX_ROW = 12;
/** Up to this many boxes stand side by side before the label; more of them stand under the instruction. */
const BESIDE = 4;
/** Above this many copies a piece has one row of boxes of its own, and its lines one box each. */
const MANY_COPIES = 12;
const UNDER = 25;
const FIVE_GAP = 4;

export interface BoxPlan {
  readonly where: 'beside' | 'under';
  /** Boxes in each row, one row after another. */
  readonly rows: readonly number[];
}

function rowsOf(count: number, wide: number): number[] {
  const rows: number[] = [];
  for (let left = count; left > 0; left -= wide) rows.push(Math.min(left, wide));
  return rows;
}

/** Whether the copies of a piece are ticked at its heading instead of at every line. */
export const ticksAtHeading = (make: number): boolean => make > MANY_COPIES;

/**
 * The boxes of a line: one for every round of its range and every copy of its piece, a row of boxes a copy. A note
 * has none.
 */
export function planBoxes(line: Pick<PublicLine, 'kind' | 'from' | 'to'>, make: number): BoxPlan {
  if (line.kind === 'note') return { where: 'beside', rows: [] };
  const copies = ticksAtHeading(make) ? 1 : make;
  const rounds = roundsOf(line);
  if (rounds === 1) return { where: 'beside', rows: rowsOf(copies, BESIDE) };
  if (rounds <= BESIDE) return { where: 'beside', rows: Array.from({ length: copies }, () => rounds) };
  return { where: 'under', rows: Array.from({ length: copies }, () => rowsOf(rounds, UNDER)).flat() };
}

/** One row of boxes for all copies of a piece that is made many times. */
export const planCopies = (make: number): BoxPlan => ({ where: 'under', rows: rowsOf(make, UNDER) });

/** Draws rows of boxes; those under an instruction stand in fives, so that they can be counted at a glance. */
export function drawBoxes(doc: PDFKit.PDFDocument, plan: BoxPlan, x: number, y: number): void {
  if (plan.rows.length === 0) return;
  doc.lineWidth(0.75).strokeColor('#2B221B');
  plan.rows.forEach((count, row) => {
    for (let i = 0; i < count; i++) {
      const fives = plan.where === 'under' ? Math.floor(i / 5) * FIVE_GAP : 0;
      doc.rect(x + i * BOX_STEP + fives, y + row * BOX_ROW, BOX, BOX);
    }
  });
  doc.stroke();
}
