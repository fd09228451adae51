import type { Verdict } from '../count/result.ts';
import type { EditionDocument } from './document.ts';

/** A line that holds an edition back, and what is so. */
export interface Block {
  readonly lineId: string;
  readonly shortId: string;
  readonly piece: string;
  readonly label: string;
  readonly verdict: Verdict;
  readonly reason: 'empty' | 'unread' | 'differs' | 'does-not-fit';
}

const HOLDS: ReadonlySet<Verdict> = new Set<Verdict>(['unread', 'differs', 'does-not-fit']);

/**
 * The lines without which a pattern may not go out: an empty instruction, and every unread, differing or not
 * fitting line that nobody has settled with a reason. In the order of the sheet.
 */
export function blocksOf(document: EditionDocument): readonly Block[] {
  return document.pieces.flatMap((piece) =>
    piece.lines.flatMap((line): Block[] => {
      const { id, verdict, leftBecause } = line.studio;
      const at = { lineId: id, shortId: line.shortId, piece: piece.name, label: line.label, verdict };
      if (line.text[document.terms] === '') return [{ ...at, reason: 'empty' }];
      if (leftBecause !== null || !HOLDS.has(verdict)) return [];
      return [{ ...at, reason: verdict as 'unread' | 'differs' | 'does-not-fit' }];
    }),
  );
}
