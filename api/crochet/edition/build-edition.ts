import type { LineCount, PieceCount } from '../count/result.ts';
import { countPattern } from '../count/pattern.ts';
import { abbreviationsUsed } from '../language/abbreviations.ts';
import { buildLine, inBothTerms } from './build-line.ts';
import { cautionTitle, DEFERRAL } from './cautions.ts';
import { SCHEMA_VERSION, type EditionDocument, type EditionPiece } from './document.ts';
import { materialText } from './material-text.ts';
import type { EditionSource, SourcePiece } from './source.ts';

/** Says which rules counted an edition; raised when a later engine may count the same text otherwise. */
export const ENGINE_VERSION = '1';

function countOf(counts: readonly LineCount[], id: string): LineCount {
  const found = counts.find((count) => count.id === id);
  if (!found) throw new RangeError(`the count left out line ${id}`);
  return found;
}

function buildPiece(piece: SourcePiece, count: PieceCount | undefined, terms: EditionSource['terms']): EditionPiece {
  return {
    id: piece.id,
    name: piece.name,
    make: piece.make,
    worked: piece.worked,
    lines: piece.lines.map((line) => buildLine(line, countOf(count?.lines ?? [], line.id), piece.worked, terms)),
  };
}

/**
 * The whole pattern as it goes out. Pure: the same source gives the same document, so a draft's preview, the sheet
 * and the watch page cannot tell different things.
 *
 * @throws RangeError if the count does not answer for a line (a fault of ours, not of the pattern)
 */
export function buildEdition(source: EditionSource): EditionDocument {
  const { terms, sizes, pieces, specialStitches } = source;
  const input = { terms, sizes, pieces, specialStitches };
  const counted = countPattern(input);
  const both = (text: string) => inBothTerms(text, terms);
  return {
    schemaVersion: SCHEMA_VERSION,
    engineVersion: ENGINE_VERSION,
    code: source.code,
    title: source.title,
    edition: source.edition,
    publishedAt: source.publishedAt,
    studio: source.studio,
    maker: source.maker,
    checker: source.checker,
    terms,
    sizes,
    details: source.details,
    materials: source.materials.map((material) => ({ kind: material.kind, text: materialText(material) })),
    abbreviations: abbreviationsUsed(input).map(({ abbreviation, name, uk }) => ({
      abbreviation: { US: abbreviation, UK: uk.abbreviation },
      name: { US: name, UK: uk.name },
    })),
    specialStitches: specialStitches.map(({ name, abbreviation, text }) => ({ name, abbreviation, text: both(text) })),
    notes: source.notes.map(both),
    cautions: source.cautions.map(({ kind, text }) => ({ kind, title: cautionTitle(kind), text })),
    deferral: DEFERRAL,
    pieces: pieces.map((piece) =>
      buildPiece(
        piece,
        counted.pieces.find(({ id }) => id === piece.id),
        terms,
      ),
    ),
    recordings: source.recordings,
    captions: source.captions,
    errata: source.errata,
  };
}
