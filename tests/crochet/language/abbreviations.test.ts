import { expect, test } from 'vitest';
import { abbreviationsUsed, readLine } from '#crochet';
import { inputFor } from '../count/support.ts';

test('the list of abbreviations names loops and places beside the stitches', () => {
  const used = abbreviationsUsed(inputFor(['BLO: sc in each st around', 'FLO: (hdc, inc) x 6']));
  expect(used.map((one) => one.abbreviation).toSorted()).toEqual(['BLO', 'FLO', 'hdc', 'inc', 'sc', 'st'].toSorted());
});

test('a slip of the scanner or the fingers is told with what it was read as', () => {
  const text = '125C, 2 incraese';
  const told = readLine(text).readAs?.map(({ span, as }) => [text.slice(span.start, span.end), as]);
  expect(told).toEqual([
    ['5C', 'sc'],
    ['incraese', 'increase'],
  ]);
});
