import type { LineKind, PatternText, Span } from '#crochet';

/** What a stretch of the text is. */
export type Role = 'title' | 'piece' | 'line' | 'step' | 'note' | 'material' | 'special';

/** A stretch of the pasted text and what it was taken for. Every printed line lies in exactly one. */
export interface Entry {
  readonly id: string;
  readonly span: Span;
  /** As it is printed, line ends made spaces. */
  readonly text: string;
  readonly role: Role;
  /** Of a heading: the piece that begins here. */
  readonly piece: {
    readonly name: string;
    readonly make: number;
    readonly worked: 'spiral' | 'joined' | 'rows';
  } | null;
  /** Of a line of work. */
  readonly line: {
    readonly kind: LineKind;
    readonly label: string;
    readonly from: number | null;
    readonly to: number | null;
    readonly body: string;
  } | null;
  /** A piece without a heading begins with this line. */
  readonly begins: Entry['piece'];
  /** What a person should confirm, as a question; null where the cut is sure. */
  readonly question: string | null;
  /** It goes on with the entry above. */
  readonly isJoined: boolean;
}

const oneLine = (text: string) => text.replace(/\s*[\r\n]+\s*/g, ' ').trim();

type Draft = Omit<Entry, 'id' | 'text' | 'isJoined'>;
const plain = (span: Span, role: Role, question: string | null = null): Draft => ({
  span,
  role,
  piece: null,
  line: null,
  begins: null,
  question,
});

function headingOf(text: string, piece: PatternText['pieces'][number]): Draft | null {
  const first = piece.lines[0]?.span.start ?? piece.span.end;
  const words = text.slice(piece.span.start, first).trim();
  if (words === '') return null;
  const printed = words.split(/[\r\n]/)[0]!.trimEnd();
  const { name, make, worked } = piece;
  const isSure = make > 1 || printed.endsWith(':') || /make/i.test(printed);
  return {
    ...plain({ start: piece.span.start, end: piece.span.start + printed.length }, 'piece'),
    piece: { name: name === '' ? printed : name, make, worked },
    question: isSure ? null : 'Is this the name of a piece?',
  };
}

function linesOf(text: string, piece: PatternText['pieces'][number], hasHeading: boolean): Draft[] {
  return piece.lines.map((line, i): Draft => {
    const span = { start: line.span.start, end: Math.max(line.span.end, line.textSpan.end) };
    if (line.kind === 'step' || line.kind === 'note') return plain(span, line.kind);
    const { kind, label, from, to } = line;
    const isOverLines = /[\r\n]\s*\S/.test(text.slice(span.start, span.end));
    const begins =
      i === 0 && !hasHeading ? { name: piece.name || 'Piece 1', make: piece.make, worked: piece.worked } : null;
    const question = line.uncertain
      ? `${line.uncertain} Is it a ${kind}?`
      : isOverLines
        ? 'Printed over several lines. Is it one?'
        : null;
    return { ...plain(span, 'line', question), line: { kind, label, from, to, body: line.text.trim() }, begins };
  });
}

/** Printed lines that lie in no stretch yet: they are notes, for nothing is dropped. */
function gapsOf(text: string, taken: readonly Draft[], title: string | null): Draft[] {
  const sorted = [...taken].sort((a, b) => a.span.start - b.span.start);
  const gaps: Draft[] = [];
  let at = 0;
  let isTitled = false;
  const look = (to: number) => {
    for (const match of text.slice(at, Math.max(at, to)).matchAll(/\S[^\r\n]*/g)) {
      const start = at + match.index;
      const words = match[0].trimEnd();
      const isTitle = !isTitled && title !== null && words.trim() === title.trim();
      if (isTitle) isTitled = true;
      // A dash, a full stop or a row of stars between two stretches says nothing.
      if (!/[\p{L}\p{N}]/u.test(words)) continue;
      const question = !isTitle && /\d/.test(words) ? 'Not understood as work. Is it a note?' : null;
      gaps.push(plain({ start, end: start + words.length }, isTitle ? 'title' : 'note', question));
    }
  };
  for (const { span } of sorted) {
    look(span.start);
    at = Math.max(at, span.end);
  }
  look(text.length);
  return gaps;
}

/** Lays a text that was read out in the order in which it was printed. Nothing is left out and nothing stands twice. */
export function tellApart(text: string, read: PatternText): Entry[] {
  const drafts: Draft[] = [];
  for (const piece of read.pieces) {
    const heading = headingOf(text, piece);
    if (heading) drafts.push(heading);
    drafts.push(...linesOf(text, piece, heading !== null));
  }
  const special = read.specialStitches.map((stitch) => plain(stitch.span, 'special'));
  drafts.push(...special);
  drafts.push(...read.materials.map(({ span }) => plain(span, 'material')));
  drafts.push(...read.notes.map(({ span }) => plain(span, 'note')));
  const sorted = drafts.sort((a, b) => a.span.start - b.span.start || b.span.end - a.span.end);
  const apart: Draft[] = [];
  for (const draft of sorted) if (draft.span.start >= (apart.at(-1)?.span.end ?? 0)) apart.push(draft);
  return [...apart, ...gapsOf(text, apart, read.title)]
    .sort((a, b) => a.span.start - b.span.start)
    .map((draft) => ({
      ...draft,
      id: String(draft.span.start),
      text: oneLine(text.slice(draft.span.start, draft.span.end)),
      isJoined: false,
    }));
}
