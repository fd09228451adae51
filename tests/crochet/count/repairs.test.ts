import { describe, expect, test } from 'vitest';
import { type PatternInput, readLine, repairsFor } from '#crochet';
import { inputFor } from './support.ts';

const BEFORE = '(2 sc, inc) ×6 (24)';

/** A line on 24 stitches, perhaps with what was said of it. */
function after24(text: string, said: number | null = null, before = BEFORE): PatternInput {
  const input = inputFor([before, text, 'sc around'], { base: 18 });
  const [piece] = input.pieces;
  const lines = piece!.lines.map((line, i) => (i === 1 && said !== null ? { ...line, said: { sts: [said] } } : line));
  return { ...input, pieces: [{ ...piece!, lines }] };
}

const offered = (input: PatternInput) => repairsFor(input, 'line-1').map(({ text, sentence }) => [text, sentence]);

describe('a line that trails off', () => {
  test('is one stretch not understood, from its "and" to its last word', () => {
    const text = '2 sc, inv dec, and so on, tapering as you like (18)';
    expect(readLine(text).unread.map(({ start, end }) => text.slice(start, end))).toEqual([
      'and so on, tapering as you like',
    ]);
  });

  test('is offered as its words, as often as they go in, where that is the total said', () => {
    const [repair, ...others] = repairsFor(after24('2 sc, inv dec, and so on, tapering as you like', 18), 'line-1');
    expect(others).toEqual([]);
    expect(repair).toEqual({
      lineId: 'line-1',
      text: '(2 sc, inv dec) ×6',
      sentence: 'One repeat uses 4 and R1 leaves 24: six repeats. 18 was said.',
      fits: { base: 24, count: 18 },
    });
  });

  test.each([
    ['keeps its written total', '2 sc, inv dec, and so on (18)', '(2 sc, inv dec) ×6 (18)', BEFORE],
    [
      'keeps what stands before and behind',
      'BLO: 2 sc, dec, etc., join (18)',
      'BLO: (2 sc, dec) ×6, join (18)',
      BEFORE,
    ],
    ['gives up a number of its own', '(2 sc, dec) ×2, and so on (18)', '(2 sc, dec) ×6 (18)', BEFORE],
    ['needs no bracket for one stitch', 'inc, and so on (48)', 'inc ×24 (48)', BEFORE],
    ['writes × as its maker does', '2 sc, dec, and so on (18)', '(2 sc, dec) x 6 (18)', '(2 sc, inc) x 6 (24)'],
    [
      'writes "times" as its maker does',
      '2 sc, dec, and so on (18)',
      '(2 sc, dec) 6 times (18)',
      '(2 sc, inc) 6 times',
    ],
  ])('%s', (_, text, mended, before) => {
    expect(offered(after24(text, null, before)).map(([one]) => one)).toEqual([mended]);
  });

  test.each([
    ['the total is another', '2 sc, inv dec, and so on (17)', null],
    ['what was said is not what is written', '2 sc, inv dec, and so on (18)', 20],
    ['no total was given', '2 sc, inv dec, and so on', null],
    ['the words do not go in evenly', '3 sc, inv dec, and so on (20)', null],
  ])('is offered nothing where %s', (_, text, said) => {
    expect(offered(after24(text, said))).toEqual([]);
  });
});

test.each(['(3 sc, dec) ×6 (18)', '(2 sc, dec) ×6 (17)', '(2 sc, inc) ×6 (18)', '(sc, dec) ×8 (18)'])(
  'every repair of %s says why in a sentence',
  (text) => {
    const repairs = repairsFor(after24(text), 'line-1');
    expect(repairs.length).toBeGreaterThan(0);
    for (const { sentence } of repairs) expect(sentence).toMatch(/^[A-Z].*[^.]\.$/);
  },
);
