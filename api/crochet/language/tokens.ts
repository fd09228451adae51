import { plainLetters } from './letters.ts';

/** A word, a number or a mark, in plain letters, with its place in the text. */
export interface Token {
  readonly kind: 'word' | 'number' | 'mark';
  readonly text: string;
  readonly start: number;
  readonly end: number;
  /** Nothing stands between it and the token before. */
  readonly glued: boolean;
  /** A line break stands before it. */
  readonly broken: boolean;
  /** It begins with a capital. */
  readonly capital: boolean;
}

const isDigit = (code: number): boolean => code >= 48 && code <= 57;
const isUpper = (code: number): boolean => code >= 65 && code <= 90;
const isLetter = (code: number): boolean =>
  (code >= 97 && code <= 122) || (code > 127 && code !== 0xd7 && code !== 0xbd && code !== 0xbc && code !== 0xbe);

/**
 * A text cut into words, numbers and marks. Letters and digits that stand together are parted (`2dc` is `2`, `dc`),
 * an apostrophe's tail is dropped (`st's` is `st`), a number keeps its fraction (`3.5`). Linear in the length.
 */
export function tokensOf(text: string): Token[] {
  const plain = plainLetters(text);
  const tokens: Token[] = [];
  let at = 0;
  let broken = false;
  let last = 0;
  const push = (kind: Token['kind'], start: number, end: number, word = plain.slice(start, end)) => {
    const capital = kind === 'word' && text[start] !== plain[start] && isUpper(text.charCodeAt(start));
    tokens.push({ kind, text: word, start, end, glued: tokens.length > 0 && last === start, broken, capital });
    broken = false;
    last = end;
  };
  while (at < plain.length) {
    const code = plain.charCodeAt(at);
    if (code <= 32) {
      if (code === 10 || code === 13) broken = true;
      at += 1;
      continue;
    }
    const start = at;
    if (isDigit(code)) {
      while (at < plain.length && isDigit(plain.charCodeAt(at))) at += 1;
      const point = plain.charCodeAt(at);
      if ((point === 46 || point === 47) && isDigit(plain.charCodeAt(at + 1)) && isFraction(plain, start, at)) {
        at += 1;
        while (at < plain.length && isDigit(plain.charCodeAt(at))) at += 1;
      }
      push('number', start, at);
    } else if (isLetter(code)) {
      while (at < plain.length && isLetter(plain.charCodeAt(at))) at += 1;
      const end = at;
      // `incx6`: the sign of times run together with the word before it.
      if (
        end - start > 2 &&
        plain[end - 1] === 'x' &&
        plain.slice(start, end) !== 'six' &&
        /^ ?\d/.test(plain.slice(end, end + 2))
      ) {
        push('word', start, end - 1);
        push('word', end - 1, end);
        continue;
      }
      if (plain[at] === "'" && isLetter(plain.charCodeAt(at + 1))) {
        at += 1;
        while (at < plain.length && isLetter(plain.charCodeAt(at))) at += 1;
      }
      push('word', start, at, plain.slice(start, end));
    } else {
      at += 1;
      push('mark', start, at);
    }
  }
  return tokens;
}

/** `3.5`, `1/2` are fractions; `4.2 sc` (a label and a count) is told by what follows: fractions are measures. */
function isFraction(plain: string, start: number, point: number): boolean {
  if (plain[point] === '/') return true;
  let at = point + 1;
  while (isDigit(plain.charCodeAt(at))) at += 1;
  if (point - start > 2) return false;
  const rest = plain.slice(at, at + 8).trimStart();
  return /^(mm|cm|in\b|inch|"|m\b|yd|g\b|oz|x|-)/.test(rest) && !/^in (next|each|the|mr|ring|ma)/.test(rest);
}
