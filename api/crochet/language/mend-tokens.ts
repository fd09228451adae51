import { ORDINARY, SHORT_TRADE, TRADE } from './spellings.ts';
import { type Token } from './tokens.ts';

/** A token that was read as something else than it says, with what it was read as. */
export interface MendedToken extends Token {
  readonly readAs?: string;
}

/**
 * Tokens with slips of a scanner and of the fingers put right: `125C` is 12 sc, `l2` is 12, `stitich` a stitch, `scin` is
 * `sc in`. Positions stay those of the text. A word that means something as it stands, or is an ordinary word, is left.
 *
 * @param known every word that means something by itself or in a name of several words.
 */
export function mendTokens(tokens: readonly Token[], known: ReadonlySet<string>): MendedToken[] {
  const out: MendedToken[] = [];
  const hasColours = tokens.some((token, i) => /^[ab]$/.test(token.text) && isGluedToNumber(tokens, i));
  for (let at = 0; at < tokens.length; at += 1) {
    const token = tokens[at]!;
    const next = tokens[at + 1];
    const figures = mendFigures(token, next);
    if (figures) {
      out.push(figures);
      at += 1;
      continue;
    }
    const scanned = hasColours ? null : mendScanned(token, next);
    if (scanned) {
      out.push(...scanned);
      at += 1;
      continue;
    }
    if (token.kind !== 'word' || known.has(token.text) || ORDINARY.has(token.text)) {
      out.push(token);
      continue;
    }
    const parts = splitWord(token, known);
    const moved = parts ? null : moveSpace(token, next, known);
    if (moved) {
      out.push(...moved);
      at += 1;
    } else if (parts) out.push(...parts);
    else out.push(mendSpelling(token, tokens[at - 1], next, known));
  }
  return out;
}

const isGluedToNumber = (tokens: readonly Token[], i: number): boolean =>
  tokens[i]!.glued && tokens[i - 1]?.kind === 'number';

/** `1O`, `l2`, `I2`: figures with a letter that looks like one. */
function mendFigures(token: Token, next: Token | undefined): MendedToken | null {
  if (!next?.glued) return null;
  const both = { ...token, kind: 'number' as const, end: next.end };
  if (token.kind === 'number' && /^[ol]$/.test(next.text)) {
    const text = token.text + (next.text === 'o' ? '0' : '1');
    return { ...both, text, readAs: text };
  }
  if (next.kind === 'number' && /^[li]$/.test(token.text)) {
    const text = `1${next.text}`;
    return { ...both, text, readAs: text };
  }
  return null;
}

/** What a scanner makes of an S before another letter: `5C` for SC, `5T` for ST, `5K` for SK, `5P` for SP. */
const AFTER_FIVE: Readonly<Record<string, string>> = {
  c: 'sc',
  cs: 'scs',
  t: 'st',
  ts: 'sts',
  k: 'sk',
  p: 'sp',
  ps: 'sps',
};

function mendScanned(token: Token, next: Token | undefined): MendedToken[] | null {
  if (token.kind !== 'number' || !next?.glued || next.kind !== 'word' || !token.text.endsWith('5')) return null;
  const word = AFTER_FIVE[next.text];
  if (!word) return null;
  const stitch = { ...next, text: word, start: next.start - 1, readAs: word };
  const rest = token.text.slice(0, -1);
  return rest === ''
    ? [{ ...stitch, glued: token.glued, broken: token.broken }]
    : [{ ...token, text: rest, end: token.end - 1 }, stitch];
}

/** Words that are often run together with the next one. */
const FIRSTS = [
  'sc',
  'hdc',
  'dc',
  'tr',
  'htr',
  'inc',
  'dec',
  'ch',
  'sk',
  'in',
  'each',
  'next',
  'same',
  'st',
  'sts',
  'blo',
  'flo',
  'bl',
  'fl',
];
const SECONDS = new Set(
  'in into each next st sts sc dc hdc tr htr inc dec ch blo flo bl fl around across join turn rep sp sps loop same to'.split(
    ' ',
  ),
);

/** `scin`, `eachst`, `blsc`: two words run together. */
function splitWord(token: Token, known: ReadonlySet<string>): MendedToken[] | null {
  for (const first of FIRSTS) {
    if (!token.text.startsWith(first)) continue;
    const second = token.text.slice(first.length);
    if (!SECONDS.has(second) || !known.has(second)) continue;
    const middle = token.start + first.length;
    const readAs = `${first} ${second}`;
    return [
      { ...token, text: first, end: middle, readAs },
      { ...token, text: second, start: middle, glued: false, broken: false },
    ];
  }
  return null;
}

/** `ine ach`: the space has slipped; `arou nd`: one that does not belong there. Two words of which the first says nothing. */
function moveSpace(token: Token, next: Token | undefined, known: ReadonlySet<string>): MendedToken[] | null {
  if (next?.kind !== 'word' || next.glued || next.broken) return null;
  const joined = token.text + next.text;
  if (joined.length >= 5 && TRADE.includes(joined)) return [{ ...token, text: joined, end: next.end, readAs: joined }];
  for (const first of FIRSTS) {
    const second = joined.slice(first.length);
    if (first === token.text || !joined.startsWith(first) || !SECONDS.has(second) || !known.has(second)) continue;
    const split =
      first.length <= token.text.length ? token.start + first.length : next.start + first.length - token.text.length;
    return [
      { ...token, text: first, end: Math.min(split, token.end), readAs: `${first} ${second}` },
      { ...next, text: second, start: split },
    ];
  }
  return null;
}

function mendSpelling(
  token: Token,
  before: Token | undefined,
  next: Token | undefined,
  known: ReadonlySet<string>,
): MendedToken {
  const { text } = token;
  if (text.length >= 5) {
    const right = TRADE.find((word) => isOneAway(text, word));
    return right && known.has(right) ? { ...token, text: right, readAs: right } : token;
  }
  // A short form is guessed only where a count or a place beside it says that it is one.
  const isLong = text.length === 4 && text !== 'slst';
  const isCounted =
    isLong || before?.kind === 'number' || next?.kind === 'number' || next?.text === 'in' || next?.text === 'each';
  const right = isCounted ? SHORT_TRADE.get(text) : undefined;
  return right && known.has(right) ? { ...token, text: right, readAs: right } : token;
}

/** One letter too many, too few, another, or two swapped. */
export function isOneAway(one: string, other: string): boolean {
  const difference = one.length - other.length;
  if (one === other || Math.abs(difference) > 1) return false;
  let at = 0;
  while (at < one.length && one[at] === other[at]) at += 1;
  const rest = (word: string, from: number) => word.slice(from);
  if (difference === 1) return rest(one, at + 1) === rest(other, at);
  if (difference === -1) return rest(one, at) === rest(other, at + 1);
  if (rest(one, at + 1) === rest(other, at + 1)) return true;
  return one[at] === other[at + 1] && one[at + 1] === other[at] && rest(one, at + 2) === rest(other, at + 2);
}
