import { type LineText, type PatternText, readPattern, type Terms } from '#crochet';

const isWork = (line: LineText) => line.kind !== 'note' && line.kind !== 'step';

/** A line pasted alone is work, whatever it looks like: each printed line is taken for a round of its own. */
function lineByLine(text: string, read: PatternText): PatternText {
  const lines: LineText[] = [];
  for (const match of text.matchAll(/\S[^\r\n]*/g)) {
    const source = match[0].trimEnd();
    const span = { start: match.index, end: match.index + source.length };
    const n = lines.length + 1;
    lines.push({
      kind: 'round',
      label: '',
      from: n,
      to: n,
      text: source,
      textSpan: span,
      span,
      written: null,
      uncertain: 'Nothing here is labelled as a round: each line is taken for one.',
    });
  }
  const end = lines.at(-1)?.span.end ?? 0;
  return {
    ...read,
    title: null,
    notes: [],
    materials: [],
    pieces: [{ name: '', make: 1, worked: 'spiral', lines, span: { start: 0, end } }],
  };
}

/** So many printed lines without any work are still taken for lines somebody wants counted. */
const FEW = 6;

/** Tells the text apart; a few lines that look like no pattern are counted all the same. */
export function cutText(text: string, terms: Terms | null): PatternText {
  const read = readPattern(text, terms ?? undefined);
  if (read.pieces.some((piece) => piece.lines.some(isWork))) return read;
  const printed = text.split(/\r\n|\r|\n/).filter((line) => line.trim() !== '');
  return printed.length > 0 && printed.length <= FEW ? lineByLine(text, read) : read;
}
