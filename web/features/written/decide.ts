import type { Entry, Role } from './told-apart.ts';

/** What a person can say of a stretch. */
export type Decision = Exclude<Role, 'title' | 'special'> | 'joined' | 'kept';

/** How many of it are made, where the words say so. */
const MAKE = /\bmake\s*(\d{1,3})\b|[x×]\s*(\d{1,3})\b/i;

function pieceOf(entry: Entry): Entry['piece'] {
  const made = MAKE.exec(entry.text);
  const make = Math.max(1, Number(made?.[1] ?? made?.[2] ?? 1));
  const name = entry.text
    .replace(/\s*\(?(?:make\s*\d+|[x×]\s*\d+)\)?/i, '')
    .replace(/[\s:.–-]+$/, '')
    .slice(0, 120);
  return { name: name === '' ? 'Piece' : name, make, worked: 'spiral' };
}

/** The entry as the person has decided. Whatever is decided answers its question. */
export function decide(entry: Entry, decision: Decision): Entry {
  const answered = { ...entry, question: null, isJoined: false };
  switch (decision) {
    case 'kept':
      return { ...entry, question: null };
    case 'joined':
      return { ...answered, isJoined: true };
    case 'piece':
      return { ...answered, role: 'piece', piece: entry.piece ?? pieceOf(entry) };
    case 'line':
      return {
        ...answered,
        role: 'line',
        line: entry.line ?? { kind: 'round', label: '', from: null, to: null, body: entry.text },
      };
    case 'step':
    case 'note':
    case 'material':
      return { ...answered, role: decision };
  }
}

/** The next entry with an open question behind one, round again at the end. */
export function nextQuestion(entries: readonly Entry[], fromId: string | null): Entry | undefined {
  const at = entries.findIndex(({ id }) => id === fromId);
  const after = [...entries.slice(at + 1), ...entries.slice(0, at + 1)];
  return after.find(({ question }) => question !== null);
}
