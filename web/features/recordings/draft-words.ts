import type { ReadingPiece, ReadingSummary } from '#contract/recordings';

const some = (n: number, one: string, many = `${one}s`) => `${n} ${n === 1 ? one : many}`;

/** Rounds where any piece is worked in rounds, else rows. */
function roundWords(pieces: readonly ReadingPiece[]): string {
  const n = pieces.reduce((sum, piece) => sum + piece.rounds, 0);
  return some(n, pieces.every(({ worked }) => worked === 'rows') ? 'row' : 'round');
}

/** "4 pieces, 31 rounds, 27 agree, 2 to look at". */
export function draftWords({ pieces, verdicts, toLook }: ReadingSummary): string {
  const agree = verdicts.agrees;
  const parts = [some(pieces.length, 'piece'), roundWords(pieces), `${agree} agree${agree === 1 ? 's' : ''}`];
  return [...parts, toLook === 0 ? 'nothing to look at' : `${toLook} to look at`].join(', ');
}

/** "Ear, 3 rounds, make 2". */
export function pieceWords({ name, make, worked, rounds }: ReadingPiece): string {
  const unit = some(rounds, worked === 'rows' ? 'row' : 'round');
  return `${name}, ${unit}${make > 1 ? `, make ${make}` : ''}`;
}
