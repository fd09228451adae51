import { describe, expect, test } from 'vitest';
import { readLine, readPattern, type Item } from '#crochet';
import { lexesOf, type Lex } from '../../../api/crochet/language/lexer.ts';
import { readItems } from '../../../api/crochet/language/items.ts';
import { closesOf } from '../../../api/crochet/language/reading.ts';

const UNITS: readonly (readonly [name: string, unit: string])[] = [
  ['opening brackets', '('],
  ['closing brackets', ')'],
  ['closed brackets', '(sc) '],
  ['brackets never closed', '(sc, '],
  ['brackets of all kinds', '[({'],
  ['stars', '*'],
  ['stars apart', '* '],
  ['doubled stars', '** sc '],
  ['open repeats', '*sc, '],
  ['digits', '7'],
  ['numbers', '6 '],
  ['sizes', '6 (8, 10) '],
  ['commas', ','],
  ['full stops', '.'],
  ['dashes', '-'],
  ['bars', '|sc '],
  ['quotes', '"sc" '],
  ['letters', 'a'],
  ['stitches', 'sc, '],
  ['stitches without commas', 'sc '],
  ['places', 'in each st '],
  ['conjunctions', 'sc in next st and '],
  ['repeats', 'rep from * '],
  ['labels', 'R1: '],
  ['turns', 'turn '],
  ['totals', 'total '],
  ['told totals', 'you should have '],
  ['references', 'same as '],
  ['skips', 'sk '],
  ['steps in brackets', 'stuff ('],
  ['prose', 'hello there '],
  ['counts of chains', 'ch 3 counts as '],
];

/** How often a meaning was looked at while a text of this unit was read. */
function visits(unit: string, length: number): number {
  const lexes = lexesOf(unit.repeat(Math.ceil(length / unit.length)), 'US');
  let n = 0;
  const watched = new Proxy(lexes, {
    get(target, key) {
      if (typeof key === 'string' && /^\d+$/.test(key)) n += 1;
      return Reflect.get(target, key) as unknown;
    },
  }) as readonly Lex[];
  readItems(
    { lexes: watched, at: 0, closes: closesOf(lexes), stitch: null, totals: [], sizes: 1, readItems },
    lexes.length - 1,
  );
  return n;
}

/** Items in a tree. */
const size = (items: readonly Item[]): number =>
  items.reduce((sum, item) => sum + 1 + (item.type === 'group' ? size(item.items) : 0), 0);

describe('reading', () => {
  test.each(UNITS)('of four times as many %s looks at most at five times as much', (_, unit) => {
    expect(visits(unit, 8000)).toBeLessThanOrEqual(5 * visits(unit, 2000) + 200);
  });

  test.each([
    ['opening brackets', '('],
    ['stars', '*'],
    ['digits', '7'],
    ['commas', ','],
    ['letters', 'a'],
  ])('a megabyte of %s in one line comes to an end', { timeout: 120_000 }, (_, unit) => {
    const text = unit.repeat(1_048_576);
    expect(size(readLine(text).tree.items)).toBeLessThanOrEqual(text.length);
  });

  test('a quarter of a megabyte of work in one line is read to its end', { timeout: 120_000 }, () => {
    const text = '6 sc, '.repeat(44_000);
    const { tree, unread } = readLine(text);
    expect([tree.items.length, unread.length]).toEqual([44_000, 0]);
  });

  test('a pattern of many lines keeps each of them', { timeout: 120_000 }, () => {
    const text = Array.from({ length: 3000 }, (_, i) => `R${String(i + 1)}: sc around (6)`).join('\n');
    expect(readPattern(text).pieces.flatMap((piece) => piece.lines)).toHaveLength(3000);
  });
});
