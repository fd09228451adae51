import { type Span } from '../span.ts';
import { type Item } from './tree.ts';
import { type Lex } from './lexer.ts';

/** Brackets deeper than this are not read: nobody writes them, and a hostile text must not exhaust the stack. */
const DEEPEST = 12;

/** The state of one reading: where we are in the list of meanings. Forward only but for short looks ahead. */
export interface Reading {
  readonly lexes: readonly Lex[];
  at: number;
  /** Index of the closing bracket for each opening one. */
  readonly closes: ReadonlyMap<number, number>;
  /** The stitch named last, which `2 in next` and `6 sts` take. */
  stitch: string | null;
  /** Totals met on the way. */
  readonly totals: TotalMet[];
  readonly sizes: number;
  /** Reads items up to an index; here so that brackets and stars can call it without a circle of imports. */
  readonly readItems: (reading: Reading, limit: number) => Item[];
}

export interface TotalMet {
  readonly kinds: Readonly<Record<string, readonly number[]>>;
  readonly span: Span;
}

const OPEN = new Map([
  ['(', ')'],
  ['[', ']'],
  ['{', '}'],
]);
const CLOSE = new Set(OPEN.values());

/** Which bracket closes which. A bracket of the wrong kind closes all the same (`(sc, inc]`); too deep ones are left out. */
export function closesOf(lexes: readonly Lex[]): ReadonlyMap<number, number> {
  const closes = new Map<number, number>();
  const open: number[] = [];
  lexes.forEach((lex, i) => {
    if (lex.kind !== 'mark') return;
    if (OPEN.has(lex.text)) open.push(i);
    else if (CLOSE.has(lex.text)) {
      const start = open.pop();
      if (start !== undefined && open.length < DEEPEST) closes.set(start, i);
    }
  });
  return closes;
}

export const peek = (reading: Reading, ahead = 0): Lex =>
  reading.lexes[Math.min(reading.at + ahead, reading.lexes.length - 1)]!;

export const isMark = (lex: Lex, text: string): boolean => lex.kind === 'mark' && lex.text === text;
export const isWord = (lex: Lex, ...names: readonly string[]): boolean => lex.kind === 'w' && names.includes(lex.text);
export const isPlain = (lex: Lex, ...words: readonly string[]): boolean =>
  lex.kind === 'word' && words.includes(lex.text);
/** The sign of times: `x`, `×`, and a star between a bracket and a number. */
export const isTimesSign = (lex: Lex): boolean => isMark(lex, '×') || isPlain(lex, 'x');

/** Takes the next meaning if it is one of these grammar words. */
export function take(reading: Reading, ...names: readonly string[]): boolean {
  if (!isWord(peek(reading), ...names)) return false;
  reading.at += 1;
  return true;
}

/** Nobody writes more small words in a row; without an end to them, looking ahead would not be linear. */
const MOST_WORDS = 12;

export function takeAll(reading: Reading, ...names: readonly string[]): void {
  for (let n = 0; n < MOST_WORDS && take(reading, ...names); n += 1);
}

/** The stretch from a meaning to the one before where we are now. */
export function spanFrom(reading: Reading, from: number): Span {
  const last = Math.max(from, reading.at - 1);
  return { start: reading.lexes[from]!.start, end: reading.lexes[last]!.end };
}

const SEPARATORS = new Set([
  ',',
  ';',
  '.',
  ':',
  '!',
  '?',
  '/',
  '|',
  '+',
  '=',
  '>',
  '<',
  '~',
  '"',
  "'",
  '\\',
  '#',
  '&',
  '-',
  ')',
  ']',
  '}',
]);

export const isSeparator = (lex: Lex): boolean => lex.kind === 'mark' && SEPARATORS.has(lex.text);
