import { type PieceRows, type Row } from '../worker/protocol.ts';
import { type Result } from '../use-counting.ts';

/** So many lines are drawn, or left undrawn, together. */
export const CHUNK = 60;

/** A run of lines of one piece within a chunk. */
export interface Segment {
  readonly piece: PieceRows;
  readonly from: number;
  readonly to: number;
}
export type Chunk = readonly Segment[];

/** The ledger cut into stretches of about as many lines each, so that a long pattern is drawn only where it is seen. */
export function chunksOf(pieces: Result['pieces']): Chunk[] {
  const chunks: Segment[][] = [];
  let room = 0;
  for (const { rows: piece } of pieces) {
    let from = 0;
    do {
      if (room <= 0) {
        chunks.push([]);
        room = CHUNK;
      }
      const to = Math.min(piece.rows.length, from + room);
      chunks.at(-1)!.push({ piece, from, to });
      room -= Math.max(1, to - from);
      from = to;
    } while (from < piece.rows.length);
  }
  return chunks;
}

export const rowsIn = (chunk: Chunk): readonly Row[] =>
  chunk.flatMap(({ piece, from, to }) => piece.rows.slice(from, to));

export const isSameChunk = (a: Chunk, b: Chunk): boolean =>
  a.length === b.length &&
  a.every((one, i) => one.piece === b[i]!.piece && one.from === b[i]!.from && one.to === b[i]!.to);
