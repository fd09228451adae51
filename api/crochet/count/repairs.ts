import { editsOf, type Edit } from './edits.ts';
import { type LineInput, type PatternInput, type PieceInput } from './input.ts';
import { countPattern } from './pattern.ts';
import { type LineCount, type PatternCount, type Repair, type Verdict } from './result.ts';
import { repeatedWords } from './repeated-words.ts';

const MOST = 3;

/**
 * The smallest edits that mend a line: a repeat number, one stitch number, inc for dec, the written total, or the same
 * in the line before; for a line not understood, the words that were, repeated as often as fits. Each is worked again; only those that make this line fit and equal its totals, and keep the next
 * line fitting, are returned.
 *
 * @returns three at most, the likeliest first; none for a line that needs no mending.
 */
export function repairsFor(input: PatternInput, lineId: string): Repair[] {
  const piece = input.pieces.find((one) => one.lines.some((line) => line.id === lineId));
  if (!piece) return [];
  const index = piece.lines.findIndex((line) => line.id === lineId);
  const near: PatternInput = {
    ...input,
    pieces: [{ ...piece, lines: piece.lines.slice(0, index + 3) }],
    base: input.pieces[0] === piece ? (input.base ?? null) : null,
  };
  const now = countPattern(near);
  const line = piece.lines[index]!;
  const verdict = verdictAt(now, index);
  if (verdict === 'agrees' || verdict === 'no-total') return [];
  const before = previousWork(piece, index);
  if (verdict === 'unread') {
    const words = repeatedWords(near, now, index, before === null ? null : piece.lines[before]!.label);
    return words ? mend(near, now, index, index, [words]) : [];
  }
  const repairs = mend(near, now, index, index, editsOf(line, input, now.pieces[0]!.lines[index]!));
  if (repairs.length < MOST && before !== null) {
    const label = piece.lines[before]!.label || 'The line before';
    const edits = editsOf(piece.lines[before]!, input, now.pieces[0]!.lines[before]!).map((edit) => ({
      ...edit,
      sentence: `${label}: ${edit.sentence.charAt(0).toLowerCase()}${edit.sentence.slice(1)}`,
    }));
    repairs.push(...mend(near, now, before, index, edits));
  }
  return repairs.slice(0, MOST);
}

const verdictAt = (count: PatternCount, index: number): Verdict => count.pieces[0]!.lines[index]!.verdict;

function previousWork(piece: PieceInput, index: number): number | null {
  for (let i = index - 1; i >= 0; i -= 1)
    if (piece.lines[i]!.kind !== 'note' && piece.lines[i]!.kind !== 'step') return i;
  return null;
}

/** Tries the edits of one line and keeps those under which the line to mend agrees and nothing else gets worse. */
function mend(near: PatternInput, now: PatternCount, edited: number, wanted: number, edits: readonly Edit[]): Repair[] {
  const piece = near.pieces[0]!;
  const line = piece.lines[edited]!;
  const repairs: Repair[] = [];
  const seen = new Set([line.text]);
  for (const edit of [...edits].sort((a, b) => a.weight - b.weight)) {
    if (repairs.length >= MOST) break;
    if (seen.has(edit.text) && edit.written === undefined) continue;
    seen.add(edit.text);
    const changed: LineInput = {
      ...line,
      text: edit.text,
      written: edit.written === undefined ? line.written : edit.written,
    };
    const lines = piece.lines.map((one, i) => (i === edited ? changed : one));
    const again = countPattern({ ...near, pieces: [{ ...piece, lines }] }, now);
    const counted = again.pieces[0]!.lines;
    const mended = counted[wanted]!;
    if (
      mended.verdict !== 'agrees' &&
      !(mended.verdict === 'no-total' && mended.written === null && mended.said === null)
    )
      continue;
    if (!keepsOthers(now.pieces[0]!.lines, counted, wanted)) continue;
    const at = counted[edited]!;
    repairs.push({
      lineId: line.id,
      text: edit.text,
      ...(edit.written === undefined ? {} : { written: edit.written }),
      sentence: edit.sentence,
      fits: { base: at.base ?? 0, count: at.count ?? 0 },
    });
  }
  return repairs;
}

const FAULTS: ReadonlySet<Verdict> = new Set(['unread', 'does-not-fit', 'differs']);

function keepsOthers(before: readonly LineCount[], after: readonly LineCount[], wanted: number): boolean {
  return after.every(
    (line, i) =>
      i === wanted ||
      !FAULTS.has(line.verdict) ||
      (FAULTS.has(before[i]!.verdict) && before[i]!.verdict === line.verdict),
  );
}
