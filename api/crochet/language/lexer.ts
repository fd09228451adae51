import { type Terms } from '../span.ts';
import { lexiconOf, vocabularyOf, type Trie } from './lexicon.ts';
import { mendMarks } from './mend-marks.ts';
import { mendTokens, type MendedToken as Token } from './mend-tokens.ts';
import { NUMBER_WORDS, ORDINAL_TAILS, ORDINAL_WORDS } from './numbers.ts';
import { tokensOf } from './tokens.ts';

/** A token with its meaning. `text` is a stitch's key, a grammar word's name, a mark, or the word as it stands. */
export interface Lex {
  readonly kind: 'num' | 'ord' | 'stitch' | 'w' | 'word' | 'mark' | 'measure' | 'end';
  readonly text: string;
  readonly value: number;
  readonly start: number;
  readonly end: number;
  readonly glued: boolean;
  readonly broken: boolean;
  /** A misspelling or a scanner's slip: what it was read as. */
  readonly readAs?: string;
}

const UNITS = new Set([
  'mm',
  'cm',
  'inch',
  'inches',
  'yd',
  'yds',
  'yards',
  'metres',
  'meters',
  'g',
  'oz',
  'grams',
  'm',
  'percent',
]);

/** Most figures that a count can have. A longer number means nothing that can be counted, and is never prose. */
const LONGEST_NUMBER = 6;

/** The text as a list of meanings, ended by one of kind `end`. Linear in the length of the text. */
export function lexesOf(text: string, terms: Terms, own?: readonly (readonly [string, string])[]): Lex[] {
  const trie = lexiconOf(terms, own);
  const tokens = mendTokens(tokensOf(text), vocabularyOf(trie));
  const out: Lex[] = [];
  let at = 0;
  while (at < tokens.length) {
    const token = tokens[at]!;
    const length =
      token.kind === 'word'
        ? pushWord(tokens, at, trie, out)
        : token.kind === 'number'
          ? pushNumber(tokens, at, out)
          : pushMark(tokens, at, out);
    at += length;
  }
  out.push({ kind: 'end', text: '', value: 0, start: text.length, end: text.length, glued: false, broken: false });
  return mendMarks(out);
}

function make(kind: Lex['kind'], text: string, value: number, first: Token, last: Token): Lex {
  const { start, glued, broken } = first;
  const readAs = first.readAs ?? last.readAs;
  return { kind, text, value, start, end: last.end, glued, broken, ...(readAs !== undefined && { readAs }) };
}

function pushMark(tokens: readonly Token[], at: number, out: Lex[]): number {
  const token = tokens[at]!;
  if (token.text === '*' && tokens[at + 1]?.text === '*' && tokens[at + 1]!.glued) {
    out.push(make('mark', '**', 0, token, tokens[at + 1]!));
    return 2;
  }
  if (token.text === '&') out.push(make('w', 'and', 0, token, token));
  else if (!isAbbreviating(tokens, at, out)) out.push(make('mark', token.text, 0, token, token));
  return 1;
}

/** Words that a sentence does not begin with in small letters: a full stop before them belongs to a short form. */
const GO_ON = new Set(
  'in into on over each ea every next nxt around across to until of tog together from through same first last'.split(
    ' ',
  ),
);

/** The full stop of `1 tr. in next st`, which ends a short form and no sentence. */
function isAbbreviating(tokens: readonly Token[], at: number, out: readonly Lex[]): boolean {
  const token = tokens[at]!;
  const next = tokens[at + 1];
  if (token.text !== '.' || !token.glued || next === undefined) return false;
  const before = out.at(-1);
  const isShort =
    before !== undefined && (before.kind === 'stitch' || before.kind === 'w') && before.end - before.start <= 5;
  return (
    isShort &&
    ((next.kind === 'word' && !next.capital && GO_ON.has(next.text)) || next.text === ',' || next.text === ')')
  );
}

function pushNumber(tokens: readonly Token[], at: number, out: Lex[]): number {
  const token = tokens[at]!;
  const next = tokens[at + 1];
  // `4^{th}`: typesetting left over.
  if (next?.text === '^' && next.glued) {
    const brace = tokens[at + 2]?.text === '{' ? 1 : 0;
    const tail = tokens[at + 2 + brace];
    if (tail && ORDINAL_TAILS.has(tail.text)) {
      out.push(make('ord', token.text, Number(token.text), token, tail));
      return 3 + brace + brace;
    }
  }
  if (
    next?.glued &&
    next.kind === 'word' &&
    ORDINAL_TAILS.has(next.text) &&
    !isStitchCount(token, next, tokens[at + 2])
  ) {
    out.push(make('ord', token.text, Number(token.text), token, next));
    return 2;
  }
  const isFraction = token.text.includes('.') || token.text.includes('/');
  if (next && (UNITS.has(next.text) || next.text === '"' || next.text === '%' || next.text === "'")) {
    const isMeasure = next.text !== 'm' || next.glued;
    if (isMeasure) {
      out.push(make('measure', token.text, 0, token, next));
      return 2;
    }
  }
  if (isFraction) out.push(make('measure', token.text, 0, token, token));
  else if (token.text.length > LONGEST_NUMBER) out.push(make('w', 'uncountable', 0, token, token));
  else out.push(make('num', token.text, Number(token.text), token, token));
  return 1;
}

/** `1st` is an ordinal, but `6st` is six stitches; `3d c` is old for third only before a noun. */
function isStitchCount(number: Token, tail: Token, after: Token | undefined): boolean {
  const value = Number(number.text);
  if (tail.text === 'st') return value % 10 !== 1 || value === 11;
  if (tail.text === 'd') return after?.text === 'c';
  return false;
}

function pushWord(tokens: readonly Token[], at: number, trie: Trie, out: Lex[]): number {
  const token = tokens[at]!;
  const number = NUMBER_WORDS.get(token.text);
  if (number !== undefined) return pushNumberWord(tokens, at, number, out);
  const known = longestMatch(tokens, at, trie);
  if (known) {
    const { value, kind, length } = known;
    const last = tokens[at + length - 1]!;
    // Letters that a key gives to a stitch, where they stand for what they always do: `(X, A) x 6`, `a`.
    if (kind === 'stitch' && length === 1 && isOwnSense(tokens, at)) {
      out.push(token.text === 'x' ? make('word', 'x', 0, token, token) : make('w', 'the', 0, token, token));
      return 1;
    }
    if (kind === 'stitch') return pushStitch(tokens, at, length, value, out);
    out.push(make('w', value, 0, token, last));
    return length;
  }
  const ordinal = ORDINAL_WORDS.get(token.text);
  if (ordinal !== undefined) out.push(make('ord', token.text, ordinal, token, token));
  else out.push(make('word', token.text, 0, token, token));
  return 1;
}

/** A small `a`; an `x` before a number and behind a bracket, a star or a word. */
function isOwnSense(tokens: readonly Token[], at: number): boolean {
  const { text, capital } = tokens[at]!;
  if (text === 'a') return !capital;
  if (text !== 'x' || tokens[at + 1]?.kind !== 'number') return false;
  const before = tokens[at - 1];
  return before !== undefined && (before.kind === 'word' || [')', ']', '}', '*'].includes(before.text));
}

/** `sc2tog`, `dc 3 tog`, `sc tog`, `sc dec`, `hdc inc`: what makes another stitch of the name before it. */
function pushStitch(tokens: readonly Token[], at: number, length: number, key: string, out: Lex[]): number {
  const first = tokens[at]!;
  let next = at + length;
  while (tokens[next]?.text === '-' && tokens[next]!.glued) next += 1;
  const tail = tokens[next];
  if (tail?.kind === 'number' && tail.text.length < 3) {
    let tog = next + 1;
    while (tokens[tog]?.text === '-' && tokens[tog]!.glued) tog += 1;
    if (isTogether(tokens[tog])) {
      out.push(make('stitch', `${key}${tail.text}tog`, 0, first, tokens[tog]!));
      return tog + 1 - at;
    }
  }
  if (isTogether(tail) && key !== 'ch') {
    const previous = out.at(-1);
    if (previous?.kind === 'num' && previous.value > 1 && previous.value < 10) {
      out.pop();
      out.push({
        ...make('stitch', `${key}${previous.value}tog`, 0, first, tail!),
        start: previous.start,
        glued: previous.glued,
      });
    } else out.push(make('stitch', `${key}2tog`, 0, first, tail!));
    return next + 1 - at;
  }
  out.push(make('stitch', key, 0, first, tokens[at + length - 1]!));
  return length;
}

const isTogether = (token: Token | undefined): boolean =>
  token?.text === 'tog' || token?.text === 'together' || token?.text === 'togs';

function pushNumberWord(tokens: readonly Token[], at: number, number: number, out: Lex[]): number {
  const token = tokens[at]!;
  if (number >= 20) {
    let next = at + 1;
    if (tokens[next]?.text === '-') next += 1;
    const unit = NUMBER_WORDS.get(tokens[next]?.text ?? '');
    const ordinal = tokens[next]?.text === 'first' ? 1 : ORDINAL_WORDS.get(tokens[next]?.text ?? '');
    if (unit !== undefined && unit > 0 && unit < 10) {
      out.push(make('num', token.text, number + unit, token, tokens[next]!));
      return next + 1 - at;
    }
    if (ordinal !== undefined && ordinal < 10) {
      out.push(make('ord', token.text, number + ordinal, token, tokens[next]!));
      return next + 1 - at;
    }
  }
  out.push(make('num', token.text, number, token, token));
  return 1;
}

/** The longest entry that starts here; a hyphen or a full stop may stand between its words (`sl-st`, `d.c.`). */
function longestMatch(
  tokens: readonly Token[],
  at: number,
  trie: Trie,
): { value: string; kind: 'stitch' | 'word'; length: number } | null {
  let node = trie;
  let next = at;
  let best: { value: string; kind: 'stitch' | 'word'; length: number } | null = null;
  while (next < tokens.length) {
    const token = tokens[next]!;
    const step = node.next.get(token.kind === 'mark' ? '' : token.text);
    if (!step) break;
    node = step;
    next += 1;
    if (node.meaning) {
      // `d.c.`: the last full stop belongs to the name when its letters are parted by full stops.
      const dotted =
        next - at > 1 && tokens[next - 2]?.text === '.' && tokens[next]?.text === '.' && tokens[next]!.glued;
      best = { ...node.meaning, length: next - at + (dotted ? 1 : 0) };
    }
    const mark = tokens[next];
    if (!mark || !mark.glued || node.next.size === 0) continue;
    // `sl-st`, `d.c.`, and `sl. st.` or `inv. dec.` with a space.
    const isShort = tokens[next - 1]!.text.length <= 4 && tokens[next + 1]?.capital !== true;
    if ((mark.text === '-' && tokens[next + 1]?.glued) || (mark.text === '.' && (tokens[next + 1]?.glued || isShort)))
      next += 1;
  }
  return best;
}
