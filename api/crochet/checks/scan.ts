import { lineLabel } from '../edition/line-label.ts';
import { readLine } from '../language/read-line.ts';
import { type ReadLine } from '../language/tree.ts';
import { type LineCount, type PatternCount } from '../count/result.ts';
import { type Terms } from '../span.ts';
import { type CheckRef } from './check.ts';
import { type CheckLine, type CheckPiece, type CheckSource } from './source.ts';

/** A line with its count and its piece. */
export interface ScanLine {
  readonly line: CheckLine;
  readonly piece: CheckPiece;
  readonly count: LineCount;
  readonly ref: CheckRef;
  /** The line's tree; only of a round, a row or a foundation. */
  readonly read: ReadLine | null;
}

/** The pattern laid out for the checks. */
export interface Scan {
  readonly source: CheckSource;
  readonly pieces: readonly {
    readonly piece: CheckPiece;
    readonly ref: CheckRef;
    readonly lines: readonly ScanLine[];
  }[];
  readonly lines: readonly ScanLine[];
}

interface Known {
  readonly terms: Terms;
  readonly text: string;
  readonly special: CheckSource['specialStitches'];
  readonly read: ReadLine;
}

/** A count stays the same thing while its line does: what was read for it need not be read at the next key press. */
const READS = new WeakMap<LineCount, Known>();

function readOf(line: CheckLine, count: LineCount, source: CheckSource): ReadLine {
  const { terms, specialStitches } = source;
  const known = READS.get(count);
  const same = known?.terms === terms && known.text === line.text;
  if (same && JSON.stringify(known.special) === JSON.stringify(specialStitches)) return known.read;
  const sizes = Math.max(1, source.sizes.length);
  const read = readLine(line.text, { terms, special: specialStitches ?? [], sizes });
  READS.set(count, { terms, text: line.text, special: specialStitches, read });
  return read;
}

export const isCounted = ({ kind }: Pick<CheckLine, 'kind'>): boolean => kind === 'round' || kind === 'row';

/** A line as a reader knows it; beside other pieces than the first with the piece's name. */
function refOf(line: CheckLine, piece: CheckPiece, isFirst: boolean): CheckRef {
  const label = lineLabel(line);
  const name = label === '' ? `A ${line.kind === 'note' ? 'note' : 'step'} of ${piece.name}` : label;
  return { lineId: line.id, pieceId: piece.id, name: isFirst || label === '' ? name : `${piece.name} ${label}` };
}

/** Lays a pattern out; a line that the count does not hold is left out. */
export function scanPattern(source: CheckSource, counted: PatternCount): Scan {
  const pieces = source.pieces.map((piece, p) => {
    const counts = new Map(counted.pieces.find(({ id }) => id === piece.id)?.lines.map((one) => [one.id, one]));
    const lines = piece.lines.flatMap((line): ScanLine[] => {
      const count = counts.get(line.id);
      if (!count) return [];
      const read = isCounted(line) || line.kind === 'foundation' ? readOf(line, count, source) : null;
      return [{ line, piece, count, ref: refOf(line, piece, p === 0), read }];
    });
    return { piece, ref: { lineId: null, pieceId: piece.id, name: piece.name }, lines };
  });
  return { source, pieces, lines: pieces.flatMap(({ lines }) => lines) };
}

/** All that a line says in words: its instruction and the note under it. */
export const wordsOf = ({ line }: ScanLine): string => (line.note === '' ? line.text : `${line.text}\n${line.note}`);

export const refsOf = (lines: readonly ScanLine[]): CheckRef[] => lines.map(({ ref }) => ref);
