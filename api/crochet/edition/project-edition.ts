import type { EditionDocument, EditionLine, EditionPiece } from './document.ts';

/** A line without what is the studio's alone. */
export type PublicLine = Omit<EditionLine, 'studio'>;
export type PublicPiece = Omit<EditionPiece, 'lines'> & { readonly lines: readonly PublicLine[] };
/** What anybody with the link may see of an edition. */
export type PublicEdition = Omit<EditionDocument, 'pieces'> & { readonly pieces: readonly PublicPiece[] };

function publicLine(line: EditionLine): PublicLine {
  const shown: Partial<EditionLine> = { ...line };
  delete (shown as { studio?: unknown }).studio;
  return shown as PublicLine;
}

/**
 * The projection by right: the only way from a stored document to somebody outside the studio. Line ids, what was
 * said, verdicts and reasons for leaving a line stay behind.
 */
export function projectEdition(document: EditionDocument): PublicEdition {
  return {
    ...document,
    pieces: document.pieces.map((piece) => ({ ...piece, lines: piece.lines.map(publicLine) })),
  };
}
