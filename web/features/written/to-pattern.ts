import type { PatternText } from '#crochet';
import type { WrittenLine, WrittenPattern, WrittenPiece } from '#contract/written';
import type { Entry } from './told-apart.ts';

const MOST_TEXT = 4_000;
const MOST_NOTE = 2_000;

/** Cuts overlong words at spaces, so that a paragraph without end still stands somewhere as a whole. */
export function inParts(text: string, most: number): string[] {
  const parts: string[] = [];
  let rest = text.trim();
  while (rest.length > most) {
    const space = rest.lastIndexOf(' ', most);
    const at = space > most / 2 ? space : most;
    parts.push(rest.slice(0, at).trim());
    rest = rest.slice(at).trim();
  }
  return rest === '' ? parts : [...parts, rest];
}

function materialKind(words: string): 'yarn' | 'hook' | 'notion' | 'filling' {
  if (/\bhook\b/i.test(words)) return 'hook';
  if (/\b(?:yarn|cotton|wool|acrylic|dk|worsted|aran|skein|ball)\b/i.test(words)) return 'yarn';
  return /\b(?:stuffing|filling|fib(?:re|er) ?fill)\b/i.test(words) ? 'filling' : 'notion';
}

/** A heading like `Materials:` is no material; `Hook: 3.5 mm` is one. */
const isOnlyHeading = (words: string) =>
  /^[^:]{1,40}:?$/.test(words) &&
  /^(?:materials?|supplies|you(?:'| wi)?ll need|you need|tools|notions)\b[^\d]*$/i.test(words);

type Piece = Omit<WrittenPiece, 'lines'> & { lines: WrittenLine[] };

/** Joins each entry that goes on with the one above to it. */
function joined(entries: readonly Entry[]): Entry[] {
  const whole: Entry[] = [];
  for (const entry of entries) {
    const above = whole.at(-1);
    if (!entry.isJoined || !above) whole.push(entry);
    else
      whole[whole.length - 1] = {
        ...above,
        text: `${above.text} ${entry.text}`,
        line: above.line && { ...above.line, body: `${above.line.body} ${entry.text}` },
      };
  }
  return whole;
}

function linesOf(entry: Entry, last: number, worked: Piece['worked']): WrittenLine[] {
  const none = { label: '', from: null, to: null };
  if (entry.role !== 'line' || !entry.line) {
    const kind = entry.role === 'step' ? ('step' as const) : ('note' as const);
    return inParts(entry.text, MOST_TEXT).map((text) => ({ kind, ...none, text }));
  }
  const { kind, label, from, to, body } = entry.line;
  // A line without a label bears the number that its place gives it, whatever has been put before it since.
  const isNumbered = kind !== 'foundation' && (from === null || (label === '' && from === to));
  const counted = isNumbered
    ? { kind: worked === 'rows' ? ('row' as const) : kind, from: last + 1, to: last + 1 }
    : { kind, from, to };
  const [text = '', ...more] = inParts(body === '' ? entry.text : body, MOST_TEXT);
  return [
    { ...counted, label: label.trim().slice(0, 60), text },
    ...more.map((words) => ({ kind: 'note' as const, ...none, text: words })),
  ];
}

/** What is sent: pieces with their lines; notes within a piece stay there, those before the first are notes of the pattern. */
export function toWritten(
  entries: readonly Entry[],
  read: Pick<PatternText, 'sizes' | 'specialStitches'>,
  about: Pick<WrittenPattern, 'id' | 'studioId' | 'title' | 'terms'>,
): WrittenPattern {
  const pieces: Piece[] = [];
  const materials: WrittenPattern['materials'] = [];
  const notes: string[] = [];
  let last = 0;
  const begin = (piece: NonNullable<Entry['piece']>) => {
    const { name, make, worked } = piece;
    pieces.push({ name: name.slice(0, 120), make: Math.min(999, make), worked, lines: [] });
    last = 0;
  };
  for (const entry of joined(entries)) {
    if (entry.role === 'title' || entry.role === 'special') continue;
    if (entry.role === 'piece' && entry.piece) {
      begin(entry.piece);
      continue;
    }
    if (entry.role === 'material') {
      if (isOnlyHeading(entry.text)) continue;
      for (const name of inParts(entry.text, 200)) materials.push({ kind: materialKind(name), name });
      continue;
    }
    // Where a heading has just been decided on, the line under it begins nothing anew.
    if (entry.begins && pieces.at(-1)?.lines.length !== 0) begin(entry.begins);
    const isWork = entry.role === 'line' || entry.role === 'step';
    if (pieces.length === 0 && isWork) begin({ name: about.title.slice(0, 120), make: 1, worked: 'spiral' });
    const piece = pieces.at(-1);
    if (!piece) {
      notes.push(...inParts(entry.text, MOST_NOTE));
      continue;
    }
    const lines = linesOf(entry, last, piece.worked);
    piece.lines.push(...lines);
    const numbered = lines.findLast((line) => line.from !== null);
    last = numbered?.to ?? numbered?.from ?? last;
  }
  return {
    ...about,
    sizes: [...read.sizes],
    pieces,
    materials,
    notes,
    specialStitches: read.specialStitches.map(({ name, abbreviation, text }) => ({
      name: name.slice(0, 120),
      abbreviation: (abbreviation ?? '').slice(0, 30),
      text: text.slice(0, MOST_NOTE),
    })),
  };
}
