import type { Repair } from '#crochet';
import { isCounted, type Placed } from './find-row.ts';
import { type Change, type Row } from './worker/protocol.ts';

/** What is offered for a line: its wording, what it fits, why. */
export type Offer = Pick<Repair, 'lineId' | 'text' | 'sentence' | 'fits'>;

/** The instruction with its total written behind it. */
const withTotal = (text: string, count: number) => `${text.trimEnd()} (${count})`;

/** Whether the figure that was worked out can be written: nobody gave one, and there is one for all sizes. */
export const canWriteTotal = (row: Row): boolean =>
  isCounted(row) && row.verdict === 'no-total' && row.count !== null && row.count > 0 && row.sizes.length === 0;

/** The figure of a line without a total. */
export function totalOffer(row: Row): Offer | null {
  if (!canWriteTotal(row) || row.count === null) return null;
  return {
    lineId: row.id,
    text: withTotal(row.text, row.count),
    sentence: `No total is written. It works out to ${row.count}.`,
    fits: { base: row.base ?? 0, count: row.count },
  };
}

/** Every figure that is missing, as one change of the text. */
export const totalChanges = (placed: readonly Placed[]): Change[] =>
  placed.flatMap(({ row, bodyEnd }) =>
    canWriteTotal(row) ? [{ span: { start: bodyEnd, end: bodyEnd }, text: ` (${row.count ?? 0})` }] : [],
  );
