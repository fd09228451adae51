import { nameOf, stitchOf } from '../stitches.ts';
import { type Terms } from '../span.ts';
import { lexesOf, type Lex } from './lexer.ts';

/** Words of the trade beside the stitches, as they stand on each side. */
const WORDS: readonly (readonly [us: string, uk: string])[] = [
  ['sk', 'miss'],
  ['skip', 'miss'],
  ['gauge', 'tension'],
  ['yo', 'yrh'],
];

/**
 * The text in the other terms: names of stitches are swapped, all other wording is kept as it stands. The whole name
 * changes, never its tail (`dc2tog` is `tr2tog`).
 *
 * @example translate('3 dc in next ch-1 sp', 'US', 'UK') === '3 tr in next ch-1 sp'
 */
export function translate(text: string, from: Terms, to: Terms): string {
  if (from === to) return text;
  let out = '';
  let at = 0;
  for (const lex of lexesOf(text, from)) {
    const word = wordFor(text, lex, from, to);
    if (word === null) continue;
    out += text.slice(at, lex.start) + word;
    at = lex.end;
  }
  return out + text.slice(at);
}

function wordFor(text: string, lex: Lex, from: Terms, to: Terms): string | null {
  const source = text.slice(lex.start, lex.end);
  if (lex.kind === 'stitch') return stitchWord(source, lex.text, from, to);
  if (lex.kind !== 'word' && lex.text !== 'skip') return null;
  const small = source.toLowerCase();
  const side = from === 'US' ? 0 : 1;
  const pair = WORDS.find((words) => words[side] === small);
  return pair ? cased(source, pair[1 - side]!) : null;
}

function stitchWord(source: string, key: string, from: Terms, to: Terms): string | null {
  const row = stitchOf(key);
  if (!row) return null;
  const [abbreviation, name] = to === 'US' ? row.us : row.uk;
  const [mine, mineName] = from === 'US' ? row.us : row.uk;
  // A name that is the same on both sides stays as it was typed.
  if (abbreviation === mine && name === mineName) return null;
  const small = source.toLowerCase();
  const isName = /crochet|treble|double|single|slip|extended|post/.test(small) && !/^(fp|bp)/.test(small);
  const plural = isName && small.endsWith('s') && !name.endsWith('s') ? 's' : '';
  return cased(source, isName ? name + plural : nameOf(key, to));
}

/** As the word it replaces was written: `Sc` gives `Dc`, `SC` gives `DC`. */
function cased(source: string, word: string): string {
  if (source.length > 1 && source === source.toUpperCase() && /[A-Z]/.test(source)) return word.toUpperCase();
  const first = source.charAt(0);
  return first !== first.toLowerCase() && !/^[A-Z]{2}/.test(word) ? word.charAt(0).toUpperCase() + word.slice(1) : word;
}
