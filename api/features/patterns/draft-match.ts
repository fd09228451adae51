import type { DraftLine, DraftPiece } from '#crochet';
import type { KnownLine } from './draft.store.ts';
import type { Row } from './entities.ts';

/** A drafted line, and the line of the pattern that it is, if the pattern has it (or had it: somebody took it away). */
export interface MatchedLine {
  readonly draft: DraftLine;
  readonly line: KnownLine | undefined;
}

const plain = (text: unknown) => (typeof text === 'string' ? text.trim().toLowerCase().replace(/\s+/g, ' ') : '');

/** The piece of the pattern that a drafted piece is, by its name. */
export function matchPiece(draft: DraftPiece, pieces: readonly Row[], taken: ReadonlySet<string>): Row | undefined {
  return pieces.find((piece) => !taken.has(piece.id) && plain(piece.name) === plain(draft.name));
}

const isNumbered = ({ kind }: { readonly kind: unknown }) => kind === 'round' || kind === 'row';

function isSameLine(draft: DraftLine, line: KnownLine): boolean {
  if (draft.kind !== line.kind) return false;
  if (isNumbered(draft)) return draft.from === line.from && draft.to === line.to;
  return plain(draft.text) === plain(line.text) || (draft.label !== '' && plain(draft.label) === plain(line.label));
}

/** Finds each drafted line among the lines of its piece; each of those is one drafted line at most. */
export function matchLines(drafts: readonly DraftLine[], lines: readonly KnownLine[]): MatchedLine[] {
  const taken = new Set<string>();
  return drafts.map((draft) => {
    const line = lines.find((known) => !taken.has(known.id) && isSameLine(draft, known));
    if (line) taken.add(line.id);
    return { draft, line };
  });
}
