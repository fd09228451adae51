import type { PatternInput } from '#crochet';
import type { SpecialStitch } from './pattern-details.ts';
import type { Line, Piece } from './rows.ts';

/** The part of a pattern that the count reads. */
export interface Counted {
  readonly terms: 'US' | 'UK';
  readonly sizes: readonly string[];
  readonly pieces: readonly Pick<Piece, 'id' | 'name' | 'make' | 'worked'>[];
  readonly lines: readonly Pick<
    Line,
    'id' | 'pieceId' | 'kind' | 'label' | 'from' | 'to' | 'text' | 'written' | 'said'
  >[];
  readonly specialStitches: readonly Pick<SpecialStitch, 'name' | 'abbreviation' | 'text'>[];
}

/** What the count reads of a pattern. Server and browser ask it the same way, so that they give the same verdicts. */
export function toPatternInput(pattern: Counted): PatternInput {
  return {
    terms: pattern.terms,
    sizes: pattern.sizes,
    pieces: pattern.pieces.map(({ id, name, make, worked }) => ({
      id,
      name,
      make,
      worked,
      lines: pattern.lines
        .filter((line) => line.pieceId === id)
        .map(({ id: lineId, kind, label, from, to, text, written, said }) => ({
          id: lineId,
          kind,
          label,
          from,
          to,
          text,
          written,
          said,
        })),
    })),
    specialStitches: pattern.specialStitches.map(({ name, abbreviation, text }) => ({
      name,
      text,
      ...(abbreviation !== '' && { abbreviation }),
    })),
  };
}
