import { lexesOf, type Lex } from './lexer.ts';
import { closesOf, type Reading } from './reading.ts';
import { totalBetween } from './totals.ts';
import { nameOf } from '../stitches.ts';
import { type Terms } from '../span.ts';
import { type Totals } from './tree.ts';

/**
 * What a person types into a field for a total: `24`, `12 dc, 4 ch-2 sps`, `18 (20, 22)`. Null where it is no total. A letter
 * is a colour where it stands apart (`14 A`) or beside another (`14A, 4B`); `2a` is no count.
 *
 * @example readTotals('12 dc, 4 ch-2 sps') // { dc: [12], 'ch-2 sp': [4] }
 */
export function readTotals(text: string, terms: Terms = 'US'): Totals | null {
  const lexes = lexesOf(text, terms);
  const reading: Reading = {
    lexes,
    at: 0,
    closes: closesOf(lexes),
    stitch: null,
    totals: [],
    sizes: 1,
    readItems: () => [],
  };
  let from = 0;
  let to = lexes.length - 1;
  if (reading.closes.get(0) === to - 1) {
    from += 1;
    to -= 1;
  }
  return hasStrayLetter(text, lexes) ? null : totalBetween(reading, from, to);
}

/** A letter written on to its figure that no second colour, both in capitals, shows to be one. */
function hasStrayLetter(text: string, lexes: readonly Lex[]): boolean {
  const letters = lexes
    .filter((lex, i) => lex.glued && lex.end - lex.start === 1 && lexes[i - 1]?.kind === 'num')
    .map((lex) => text.slice(lex.start, lex.end))
    .filter((letter) => /[a-z]/iu.test(letter));
  return letters.length > 0 && (new Set(letters).size < 2 || letters.some((letter) => letter !== letter.toUpperCase()));
}

/** A total in words: `{ dc: [12], 'ch-2 sp': [4] }` is `12 dc, 4 ch-2 sps`; plain numbers stand alone. */
export function printTotals(totals: Totals, terms: Terms = 'US'): string {
  return Object.entries(totals)
    .map(([kind, figures]) =>
      [printFigures(figures), printKind(kind, figures[0] ?? 0, terms)].filter(Boolean).join(' '),
    )
    .join(', ');
}

const printFigures = ([first, ...others]: readonly number[]): string =>
  others.length > 0 ? `${String(first)} (${others.join(', ')})` : String(first);

function printKind(kind: string, n: number, terms: Terms): string {
  if (kind === 'sts') return '';
  if (kind.endsWith('sp') || kind === 'group' || kind === 'gap' || kind === 'corner')
    return n === 1 ? kind : `${kind}s`;
  return nameOf(kind, terms);
}
