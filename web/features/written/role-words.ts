import type { Decision } from './decide.ts';
import type { Entry } from './told-apart.ts';

/** What an entry is called in the list: `R5–8`, `Step`, `Piece, make 2`. */
export function roleWords(entry: Entry): string {
  if (entry.isJoined) return 'goes on';
  switch (entry.role) {
    case 'title':
      return 'Title';
    case 'piece':
      return entry.piece && entry.piece.make > 1 ? `Piece, make ${entry.piece.make}` : 'Piece';
    case 'line': {
      const { line } = entry;
      if (!line) return 'Round';
      if (line.kind === 'foundation') return 'Chain';
      return line.label === '' ? (line.kind === 'row' ? 'Row' : 'Round') : line.label;
    }
    case 'step':
      return 'Step';
    case 'note':
      return 'Note';
    case 'material':
      return 'Material';
    case 'special':
      return 'Stitch';
  }
}

/** What can be said of an entry, each with its key. */
export const DECISIONS: readonly { readonly key: string; readonly decision: Decision; readonly words: string }[] = [
  { key: 'Y', decision: 'kept', words: 'Right as it is' },
  { key: 'R', decision: 'line', words: 'Round or row' },
  { key: 'J', decision: 'joined', words: 'Goes on from above' },
  { key: 'P', decision: 'piece', words: 'Name of a piece' },
  { key: 'S', decision: 'step', words: 'Step' },
  { key: 'M', decision: 'material', words: 'Material' },
  { key: 'O', decision: 'note', words: 'Note' },
];
