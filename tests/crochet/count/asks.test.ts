import { expect, test } from 'vitest';
import { countLines, type Given } from './support.ts';

const asked = (lines: readonly string[], given: Given) =>
  countLines(lines, given)
    .at(-1)!
    .asks.map(({ text }) => text);

test.each([
  ['2 sc, 4 dc ×4', 24, 'Read as all of the series repeated: only so does it come out.'],
  [
    '2 sc, 4 dc ×4',
    20,
    'Read as only the last of the series repeated (18); is all of the series repeated meant (24)? Neither fits.',
  ],
  ['*2 sc, inc; rep from * 3 times', 12, 'Read as 3 more, 4 in all: only so does it come out.'],
  ['*2 sc, inc; rep from * 3 times', 10, 'Read as 3 in all (12); is 3 more, 4 in all meant (16)? Neither fits.'],
  [
    'inv dec ×6 in BLO',
    12,
    'An invisible decrease closes front loops, and this line is worked in the back loops: is a plain decrease meant?',
  ],
])('of %s on %i the maker is told or asked', (text, base, answer) => {
  expect(asked([text], { base })).toEqual([answer]);
});

test('a half double row that is one short is explained by its turning chain', () => {
  expect(asked(['ch 2, hdc in each st across (21)'], { base: 20, worked: 'rows' })).toEqual([
    '21 comes out if the turning chain counts and no stitch is passed over: each such row grows by one.',
  ]);
});

test.each([
  ['2 sc, 4 dc ×4', 18],
  ['*2 sc, inc; rep from * 3 times', 9],
  ['(2 sc, inv dec) ×6', 24],
  ['ch 2, hdc in each st across (20)', 20],
])('nothing is asked of %s on %i', (text, base) => {
  expect(asked([text], { base, worked: 'rows' })).toEqual([]);
});
