import { expect, test } from 'vitest';
import { readTranscript } from '#crochet';

const read = (...sentences: readonly string[]) =>
  readTranscript(sentences.map((text, n) => ({ startMs: n * 5000, endMs: n * 5000 + 4500, text }))).pieces.flatMap(
    (piece) => piece.lines.map((line) => [line.label, line.text, line.verdict]),
  );

const RING = ['Round one, six single crochet in a magic ring.', 'Round two, two in each. Twelve.'] as const;

test.each([
  ['A squish is two together.', 'Round three, one single and a squish, four times. Eight.', '(sc, dec) × 4'],
  ['A squish is a decrease.', 'Round three, one single and a squish, four times. Eight.', '(sc, dec) × 4'],
  [
    'A twinny means two singles in one stitch.',
    'Round three, one single and a twinny, six times. Eighteen.',
    '(sc, inc) × 6',
  ],
])('a maker may say what a word of their own is: %s', (definition, round, text) => {
  expect(read(definition, ...RING, round).at(-1)).toEqual(['R3', text, 'agrees']);
});

test('a word that was told to be something else stays talk', () => {
  expect(read('A kettle is two cups.', ...RING, 'Round three, kettle on, one in each. Twelve.').at(-1)).toEqual([
    'R3',
    'sc in each st around',
    'agrees',
  ]);
});
