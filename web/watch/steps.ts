import type { PublicEdition, PublicLine, PublicPiece } from '#contract/editions';

/** One thing to work and to tick: a round of a line, for one copy of its piece. */
export interface Step {
  /** Holds over reloads: line, round and copy. */
  readonly key: string;
  readonly piece: PublicPiece;
  readonly line: PublicLine;
  /** Which copy of the piece, from 1. */
  readonly copy: number;
  /** Number of the round or row; null for a step, a foundation and a line without a number. */
  readonly round: number | null;
}

/** "R9", "Row 3", "step": what a button that leads there says. */
export function stepName({ line, round }: Pick<Step, 'line' | 'round'>): string {
  if (line.kind === 'round' && round !== null) return `R${round}`;
  if (line.kind === 'row' && round !== null) return `Row ${round}`;
  return line.label === '' ? 'step' : line.label;
}

/** Rounds of a line one by one; a line with an open end counts once. */
function roundsOf({ from, to }: PublicLine): (number | null)[] {
  if (from === null || to === null || to <= from) return [from];
  return Array.from({ length: to - from + 1 }, (_, i) => from + i);
}

export const stepKey = (line: Pick<PublicLine, 'shortId'>, round: number | null, copy: number): string =>
  `${line.shortId}-${round ?? 0}-${copy}`;

/** Everything there is to work, in working order: a piece that is made twice comes twice. Notes are read, not worked. */
export function stepsOf(edition: PublicEdition): readonly Step[] {
  return edition.pieces.flatMap((piece) =>
    Array.from({ length: piece.make }, (_, i) => i + 1).flatMap((copy) =>
      piece.lines
        .filter(({ kind }) => kind !== 'note')
        .flatMap((line) =>
          roundsOf(line).map((round) => ({ key: stepKey(line, round, copy), piece, line, copy, round })),
        ),
    ),
  );
}

const highest = (piece: PublicPiece, kind: PublicLine['kind']) =>
  Math.max(0, ...piece.lines.filter((line) => line.kind === kind).map((line) => line.to ?? line.from ?? 0));

/** "Round 9 of 18, Body", "Row 1 of 40, Tail", "After R15, Body", "Round 2 of 3, Ear 1 of 2". */
export function placeText(step: Step): string {
  const { piece, line, round, copy } = step;
  const where = piece.make > 1 ? `${piece.name} ${copy} of ${piece.make}` : piece.name;
  if (round !== null && (line.kind === 'round' || line.kind === 'row')) {
    return `${line.kind === 'round' ? 'Round' : 'Row'} ${round} of ${highest(piece, line.kind)}, ${where}`;
  }
  if (line.kind === 'foundation') return `Foundation, ${where}`;
  const before = piece.lines.slice(0, piece.lines.indexOf(line)).findLast(({ label }) => label !== '');
  return `${before ? `After ${before.label}` : 'First'}, ${where}`;
}

/** The stitches after a step, as large as they are printed; empty where the line has no total. */
export function stepTotal({ line, round }: Pick<Step, 'line' | 'round'>, terms: 'US' | 'UK'): string {
  const own = line.rounds?.find(({ n }) => n === round);
  if (own && !line.each) return own.count === null ? '' : String(own.count);
  return line.total?.[terms] ?? '';
}

/** The step that an address names: `#<line>` or `#<line>-<round>`; undefined where it names none. */
export function stepAt(steps: readonly Step[], hash: string): Step | undefined {
  const [, shortId, round] = /^#?([a-z0-9]+)(?:-(\d+))?$/.exec(hash) ?? [];
  const ofLine = steps.filter(({ line }) => line.shortId === shortId);
  return round === undefined ? ofLine[0] : (ofLine.find((step) => step.round === Number(round)) ?? ofLine[0]);
}

/** The address of a step within its page. */
export function stepHash({ line, round }: Step): string {
  const isRange = line.from !== null && line.to !== null && line.to > line.from;
  return `#${line.shortId}${isRange && round !== null ? `-${round}` : ''}`;
}
