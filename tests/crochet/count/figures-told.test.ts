import { expect, test } from 'vitest';
import { countLines, inShort } from './support.ts';

test('a row that needs more than there is says both figures', () => {
  const line = countLines(['30 sc'], { base: 24 })[0]!;
  expect([line.verdict, line.base, line.uses, line.message]).toEqual([
    'does-not-fit',
    24,
    30,
    'Needs 30, there are 24.',
  ]);
});

test('decreases all round stop where only one stitch is left, and tell it', () => {
  const line = countLines(['dec around'], { base: 13 })[0]!;
  expect([line.verdict, line.count, line.message]).toEqual(['does-not-fit', 6, '12 used, 1 left over.']);
});

test('a chain on which no place is named is begun at the height of its stitch', () => {
  const line = countLines(['F: ch 20', 'dc across'], { worked: 'rows' })[1]!;
  expect(inShort(line)).toBe('17 18 no-total');
});
