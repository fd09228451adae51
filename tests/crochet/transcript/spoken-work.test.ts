import { describe, expect, test } from 'vitest';
import { readTranscript } from '#crochet';
import { talk } from './talk.ts';

/** Label, shorthand, total said and verdict of each counted line. */
const read = (text: string): readonly string[] =>
  readTranscript(talk(text))
    .pieces.flatMap((piece) => piece.lines)
    .filter((line) => line.kind !== 'step')
    .map((line) => `${line.label}: ${line.text} | ${String(line.said?.sts?.[0] ?? '–')} ${line.verdict}`);

const ROW =
  'Chain eleven. | Row one, single crochet in the second chain from the hook and in each chain across, ten. | ';

describe('a maker who', () => {
  test('tells a corner and a side gets as many of both as there are sides', () => {
    const square =
      'Round one, twelve double crochet in a magic ring, twelve. | Round two. In the first corner, two double crochet, chain two, two double crochet, all in the same stitch. Then double crochet in each of the next two stitches. Four times for four sides, and that is twenty-four.';
    expect(read(square).at(-1)).toBe('R2: ((2 dc, ch 2, 2 dc) in next st, 2 dc) × 4 | 24 agrees');
  });

  test('widens several rows at once at both ends gets each row with its own length', () => {
    expect(read(`${ROW}Rows two, three and four, two at each end and one in everything between.`).slice(2)).toEqual([
      'Row 2: inc, 8 sc, inc | – no-total',
      'Row 3: inc, 10 sc, inc | – no-total',
      'Row 4: inc, 12 sc, inc | – no-total',
    ]);
  });

  test('says the total before the row, or a row is another with a longer middle, is understood', () => {
    const text = `${ROW}Twelve for row two. Two in the first, eight singles, and two in the last. | Row three is the same as row two but with ten along the middle. Fourteen.`;
    expect(read(text).slice(2)).toEqual(['Row 2: inc, 8 sc, inc | 12 agrees', 'Row 3: inc, 10 sc, inc | 14 agrees']);
  });

  test('does sums aloud is not taken to repeat, and a wrong total is shown as wrong', () => {
    const text =
      'Round one, six single crochet in a magic ring, six. | Round two, increase in every stitch, twelve. | Round three, one single and an increase, three per side, six sides, eighteen. | Round four, two singles, an increase, six times, twenty-five.';
    expect(read(text).slice(2)).toEqual(['R3: (sc, inc) × 6 | 18 agrees', 'R4: (2 sc, inc) × 6 | 25 differs']);
  });
});
