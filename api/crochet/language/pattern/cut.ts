import { type Span, type Terms } from '../../span.ts';
import { readLabel, type Label } from '../labels.ts';
import { lexesOf, type Lex } from '../lexer.ts';
import { isMark, isPlain, isWord } from '../reading.ts';

/** A stretch of the text that stands for itself: a physical line, or a part of one that begins with a label. */
export interface Entry {
  readonly span: Span;
  readonly label: Label | null;
  /** Where the words behind the label begin. */
  readonly bodyStart: number;
  readonly labelText: string;
  /** A blank line stands before it. */
  readonly apart: boolean;
}

type Own = readonly (readonly [string, string])[];

/** Cuts a text at its line ends and at labels inside lines (`R1: 6 sc (6) R2: inc × 6 (12)`). */
export function entriesOf(text: string, terms: Terms, own: Own): Entry[] {
  const entries: Entry[] = [];
  let apart = true;
  const lines = physicalLines(text);
  const isBulleted = hasStarBullets(text, lines);
  for (const whole of lines) {
    const line = isBulleted ? { ...whole, start: whole.start + bulletOf(text.slice(whole.start, whole.end)) } : whole;
    const source = text.slice(line.start, line.end);
    if (source.trim() === '') {
      apart = true;
      continue;
    }
    const lexes = lexesOf(source.slice(0, LONGEST), terms, own);
    const cuts = cutsIn(lexes);
    cuts.forEach((cut, i) => {
      const from = cut.at === 0 ? 0 : lexes[cut.at]!.start;
      const next = cuts[i + 1];
      const to = next ? lexes[next.at]!.start : source.length;
      const body = cut.label ? lexes[cut.label.after]!.start : from;
      const start = line.start + from + leading(source.slice(from, to));
      entries.push({
        span: { start, end: line.start + from + source.slice(from, to).trimEnd().length },
        label: cut.label,
        bodyStart: Math.min(line.start + body, line.start + to),
        labelText: cut.label ? labelWords(source, lexes, cut.at, cut.label.after) : '',
        apart: apart && i === 0,
      });
    });
    apart = false;
  }
  return entries;
}

/** `* ` before a printed line. */
const BULLET = /^\s*\*\s+/;

const bulletOf = (line: string): number => BULLET.exec(line)?.[0].length ?? 0;

/** Whether stars begin the printed lines and no repeats: most lines have one, with no partner. */
function hasStarBullets(text: string, lines: readonly Span[]): boolean {
  const printed = lines.map(({ start, end }) => text.slice(start, end)).filter((line) => line.trim() !== '');
  const bulleted = printed.filter((line) => BULLET.test(line) && line.indexOf('*') === line.lastIndexOf('*'));
  return bulleted.length >= 3 && bulleted.length * 2 > printed.length;
}

/** Labels are looked for in so much of a printed line, in UTF-16 units. */
const LONGEST = 100_000;

const leading = (text: string): number => text.length - text.trimStart().length;

function labelWords(source: string, lexes: readonly Lex[], from: number, after: number): string {
  const end = lexes[after - 1]?.end ?? 0;
  return source
    .slice(lexes[from]!.start, end)
    .replace(/[:.)\-–—=|,\s]+$/, '')
    .replace(/^[|•\-–#\s]+/, '');
}

function physicalLines(text: string): Span[] {
  const lines: Span[] = [];
  let start = 0;
  for (let i = 0; i <= text.length; i += 1) {
    const code = i < text.length ? text.charCodeAt(i) : 10;
    if (code !== 10 && code !== 13) continue;
    lines.push({ start, end: i });
    if (code === 13 && text.charCodeAt(i + 1) === 10) i += 1;
    start = i + 1;
  }
  return lines;
}

interface Cut {
  readonly at: number;
  readonly label: Label | null;
}

/** Where in a line labels begin. The first cut is the line's own start. */
function cutsIn(lexes: readonly Lex[]): Cut[] {
  const first = readLabel(lexes, 0);
  const cuts: Cut[] = [{ at: 0, label: first }];
  for (let i = Math.max(1, first?.after ?? 1); i < lexes.length - 1; i += 1) {
    if (!mayBegin(lexes, i)) continue;
    const label = readLabel(lexes, i);
    if (!label || label.kind === 'bare' || label.from === null || !isClosed(lexes, i, label.after)) continue;
    cuts.push({ at: i, label });
    i = label.after - 1;
  }
  return cuts;
}

const REFERS = [
  'rep',
  'of',
  'from',
  'to',
  'and',
  'as',
  'in',
  'on',
  'through',
  'gap',
  'same',
  'with',
  'each',
  'the',
  'last',
  'next',
  'loop',
];

/** A label inside a line begins a sentence: behind a full stop, a bracket, a total; never behind `repeat` or `of`. */
function mayBegin(lexes: readonly Lex[], i: number): boolean {
  const lex = lexes[i]!;
  const isStart =
    isWord(lex, 'round', 'row') ||
    isPlain(lex, 'r') ||
    lex.kind === 'ord' ||
    (isWord(lex, 'first') && isWord(lexes[i + 1]!, 'round', 'row'));
  if (!isStart) return false;
  const before = lexes[i - 1]!;
  if (isWord(before, ...REFERS) || before.kind === 'ord' || (before.kind === 'num' && lex.glued)) return false;
  if (isMark(before, '-') || isMark(before, ',') || isMark(before, '(') || isMark(before, '&') || isMark(before, '+'))
    return false;
  return true;
}

/** A colon closes a label inside a line; a full stop or dash only where the line before it has ended. */
function isClosed(lexes: readonly Lex[], at: number, after: number): boolean {
  for (let i = at + 1; i < after; i += 1) if (isMark(lexes[i]!, ':')) return true;
  const before = lexes[at - 1]!;
  const ended = isMark(before, '.') || isMark(before, ')') || isMark(before, ']') || isMark(before, ';');
  const last = lexes[after - 1]!;
  return ended && (isMark(last, '.') || isMark(last, '-') || isMark(last, ')') || isMark(last, '='));
}
