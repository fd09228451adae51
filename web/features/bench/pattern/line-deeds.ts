import { type Line, type LineCreate, type LineEdit } from '#contract/rows';
import { type Desk } from '../desk/use-desk.ts';
import { focusLine } from '../desk/focus-line.ts';
import { nextNumber } from '../desk/line-name.ts';

const linesOf = (desk: Desk, pieceId: string) => desk.pattern.lines.filter((line) => line.pieceId === pieceId);
const isNumbered = (line: Line | undefined) => line?.kind === 'round' || line?.kind === 'row';

/** The kind that a new line of a piece most likely is. */
function kindFor(desk: Desk, pieceId: string): 'round' | 'row' {
  const piece = desk.pattern.pieces.find((one) => one.id === pieceId);
  return piece?.worked === 'rows' ? 'row' : 'round';
}

/** Adds a line after `after` (null: first of its piece), numbered one on from the last numbered line before it, and opens it. */
export function addLineAfter(desk: Desk, pieceId: string, after: string | null, more: Partial<LineCreate> = {}): void {
  const lines = linesOf(desk, pieceId);
  const at = lines.findIndex((line) => line.id === after);
  const n = nextNumber(lines.slice(0, at + 1).findLast((line) => isNumbered(line) && line.from !== null));
  const id = desk.bench.add('line', {
    pieceId,
    kind: kindFor(desk, pieceId),
    after,
    from: n,
    to: n,
    text: '',
    ...more,
  });
  desk.pick(id, true);
}

/** Adds a line above this one. */
export function addLineAbove(desk: Desk, line: Line): void {
  const lines = linesOf(desk, line.pieceId);
  addLineAfter(desk, line.pieceId, lines[lines.indexOf(line) - 1]?.id ?? null);
}

/** The same again under it, one round on. */
export function duplicateLine(desk: Desk, line: Line): void {
  const { kind, text, note, label, written } = line;
  const numbers = isNumbered(line) ? {} : { from: null, to: null };
  addLineAfter(desk, line.pieceId, line.id, { kind, text, note, label, written, ...numbers });
}

/** Where a line goes when it moves one place up or down; over the edge of its piece into the next. Null: it is at the end. */
export function placeBeside(desk: Desk, line: Line, way: 1 | -1): Pick<LineEdit, 'pieceId' | 'after'> | null {
  const lines = linesOf(desk, line.pieceId);
  const at = lines.findIndex((one) => one.id === line.id);
  if (way > 0 ? at < lines.length - 1 : at > 0) {
    return { after: lines[way > 0 ? at + 1 : at - 2]?.id ?? null };
  }
  const { pieces } = desk.pattern;
  const piece = pieces[pieces.findIndex((one) => one.id === line.pieceId) + way];
  if (!piece) return null;
  return { pieceId: piece.id, after: way > 0 ? null : (linesOf(desk, piece.id).at(-1)?.id ?? null) };
}

export function moveLine(desk: Desk, line: Line, way: 1 | -1): void {
  const place = placeBeside(desk, line, way);
  if (place) desk.bench.edit('line', line.id, place);
}

/** Deletes a line; the hand goes to its neighbour. */
export function deleteLine(desk: Desk, line: Line): void {
  const { lines } = desk.pattern;
  const at = lines.findIndex((one) => one.id === line.id);
  const neighbour = (lines[at + 1] ?? lines[at - 1])?.id ?? null;
  desk.pick(neighbour);
  focusLine(neighbour);
  desk.bench.remove('line', line.id);
}
