import { expect, test } from 'vitest';
import { type Pattern } from '#contract/patterns';
import { cardOf, lineAtNumber, linesToRead } from '../../web/features/filming/card-lines.ts';

type Line = Partial<Pattern['lines'][number]>;
const line = (id: string, fields: Line) => ({
  id,
  pieceId: 'body',
  kind: 'round',
  label: '',
  from: null,
  to: null,
  text: '',
  note: '',
  written: null,
  said: null,
  filmed: true,
  ...fields,
});
const PATTERN = {
  terms: 'US',
  sizes: [],
  specialStitches: [],
  pieces: [
    { id: 'body', name: 'Body', make: 1, worked: 'spiral' },
    { id: 'ear', name: 'Ear', make: 2, worked: 'spiral' },
  ],
  lines: [
    line('1', { from: 1, to: 1, text: '6 sc in magic ring (6)' }),
    line('2', { from: 2, to: 2, text: 'inc × 6', written: { sts: [12] } }),
    line('3', { from: 3, to: 6, text: 'sc around' }),
    line('4', { kind: 'step', text: 'Stuff firmly.' }),
    line('5', { pieceId: 'ear', from: 1, to: 1, text: '5 sc in magic ring', filmed: false }),
    line('6', { pieceId: 'ear', from: 2, to: 2, text: 'inc around' }),
  ],
} as unknown as Pattern;

test('a line is read number first, its total last, wherever the total was written', () => {
  const [body] = cardOf(PATTERN);
  expect(body!.lines.map(({ name, spoken, text, total }) => [name, spoken, text, total])).toEqual([
    ['R1', 'round 1', '6 sc in magic ring', '6'],
    ['R2', 'round 2', 'inc × 6', '12'],
    ['R3–6', 'rounds 3 to 6', 'sc around', '12 each'],
    ['Step', null, 'Stuff firmly.', ''],
  ]);
});

test('what is not filmed is passed over', () => {
  expect(linesToRead(cardOf(PATTERN)).map(({ id }) => id)).toEqual(['1', '2', '3', '4', '6']);
});

test('a number leads to its line in the piece in hand, also inside a range, else in another piece', () => {
  const lines = linesToRead(cardOf(PATTERN));
  expect(lineAtNumber(lines, 2, 'ear')?.id).toBe('6');
  expect(lineAtNumber(lines, 2, 'body')?.id).toBe('2');
  expect(lineAtNumber(lines, 5, 'ear')?.id).toBe('3');
  expect(lineAtNumber(lines, 40, 'body')).toBeUndefined();
});
