import { type Result } from './use-counting.ts';
import { type Patch } from './text/patch.ts';
import { type Row } from './worker/protocol.ts';

/** A line of the ledger with where it stands: offsets of the text that was counted. */
export interface Placed {
  readonly row: Row;
  readonly pieceId: string;
  readonly start: number;
  readonly end: number;
  readonly bodyStart: number;
  readonly bodyEnd: number;
}

export const isCounted = (row: Row): boolean => row.kind === 'round' || row.kind === 'row';

const place = (pieceId: string, start: number, row: Row): Placed => ({
  row,
  pieceId,
  start: start + row.whole.start,
  end: start + row.whole.end,
  bodyStart: start + row.body.start,
  bodyEnd: start + row.body.end,
});

export function placedRows(result: Result | null): Placed[] {
  return result?.pieces.flatMap(({ id, start, rows }) => rows.rows.map((row) => place(id, start, row))) ?? [];
}

export const findRow = (placed: readonly Placed[], id: string | null): Placed | undefined =>
  id === null ? undefined : placed.find(({ row }) => row.id === id);

/** A place of the text as it is now, in the text as it was counted. */
function placeBefore(at: number, patch: Patch | null): number {
  if (!patch || at <= patch.at) return at;
  if (at >= patch.at + patch.in.length) return at - patch.in.length + patch.out.length;
  return patch.at;
}

/** The line that the caret stands in, or the nearest one before it. Rows stand in the order of the text. */
export function rowAt(placed: readonly Placed[], caret: number, patch: Patch | null): Placed | undefined {
  const at = placeBefore(caret, patch);
  let low = 0;
  let high = placed.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (placed[middle]!.start <= at) low = middle + 1;
    else high = middle;
  }
  return placed[low - 1];
}

const WORTH_A_LOOK: readonly Row['verdict'][] = ['unread', 'does-not-fit', 'differs'];

/** Whether somebody should look at a line: it is wrong, was not understood, or has a question. */
export const wantsLook = (row: Row): boolean =>
  isCounted(row) && (WORTH_A_LOOK.includes(row.verdict) || row.asks.length > 0);

/** The next line to look at behind one (or before it, with `way` −1), round again at the end. */
export function nextToLook(placed: readonly Placed[], fromId: string | null, way: 1 | -1 = 1): Placed | undefined {
  const at = placed.findIndex(({ row }) => row.id === fromId);
  for (let i = 1; i <= placed.length; i += 1) {
    const next = placed[((((at < 0 && way < 0 ? 0 : at) + way * i) % placed.length) + placed.length) % placed.length];
    if (next && wantsLook(next.row)) return next;
  }
  return undefined;
}
