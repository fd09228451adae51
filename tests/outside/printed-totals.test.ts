import { describe, expect, test } from 'vitest';
import { countLines, type Given, inShort } from '../crochet/count/support.ts';

interface Row {
  readonly source: string;
  readonly lines: readonly string[];
  readonly given?: Given;
  readonly answers: readonly string[];
}

/** Totals as they stand in print; the wording is ours. */
const printed: readonly Row[] = [
  {
    source: '"Change Purse", Learn How Book No. 170, Spool Cotton Co., 1941',
    lines: [
      'ch 2, 6 sc in 2nd ch from hook',
      'inc x 6 (12)',
      '(sc, inc) x 6',
      '(2 sc, inc) x 6',
      '(3 sc, inc) x 6',
      'R6-10: as R5 with one more sc between (60)',
    ],
    answers: ['1 6 no-total', '6 12 agrees', '12 18 no-total', '18 24 no-total', '24 30 no-total', '30 60 agrees'],
  },
  {
    source: 'Toy 5225, booklet No. 194, 1940s',
    lines: ['ch 2, 7 sc in 2nd ch from hook', 'inc x 7 (14)', '(sc, inc) x 7 (21)', '(2 sc, inc) x 7 (28)'],
    answers: ['1 7 no-total', '7 14 agrees', '14 21 agrees', '21 28 agrees'],
  },
  {
    source: 'Hat No. 205, booklet of 1945',
    lines: ['inc in every 9th st around (100)', 'inc in every 6th st around (116)'],
    given: { base: 90 },
    answers: ['90 100 agrees', '100 116 agrees'],
  },
  {
    source: 'J. E. Fryer, The Mary Frances Knitting and Crocheting Book, 1918, ch. XVI (20 is not a multiple of 3)',
    lines: ['(2 sc, inc) around'],
    given: { base: 20 },
    answers: ['20 24 does-not-fit'],
  },
  {
    source: 'Booties 5162, booklet No. 178, 1940s',
    lines: ['F: ch 11', 'sc in 2nd ch from hook and in each ch across (10)'],
    given: { worked: 'rows' },
    answers: ['- 11 no-total', '10 10 agrees'],
  },
  {
    source: 'A blanket leaflet of a yarn company, 2020',
    lines: [
      'F: ch 112',
      'sc in 2nd ch from hook and in each ch across (111)',
      '*sc 10, spike sc in next; rep from * 9 times more, sc 1',
    ],
    given: { worked: 'rows' },
    answers: ['- 112 no-total', '111 111 agrees', '111 111 no-total'],
  },
  {
    source: 'common practice: the ball of six, 30 stitches round',
    lines: [
      '6 sc in MR (6)',
      'inc x 6 (12)',
      '(sc, inc) x 6 (18)',
      '(2 sc, inc) x 6 (24)',
      '(3 sc, inc) x 6 (30)',
      'R6-10: sc around (30)',
      'R11: (3 sc, dec) x 6 (24)',
      'R12: (2 sc, dec) x 6 (18)',
      'R13: (sc, dec) x 6 (12)',
      'R14: dec x 6 (6)',
    ],
    answers: [
      '- 6 agrees',
      '6 12 agrees',
      '12 18 agrees',
      '18 24 agrees',
      '24 30 agrees',
      '30 30 agrees',
      '30 24 agrees',
      '24 18 agrees',
      '18 12 agrees',
      '12 6 agrees',
    ],
  },
  {
    source:
      'D. W. Henderson & D. Taimina, Crocheting the Hyperbolic Plane, The Mathematical Intelligencer 23(2), 2001: an increase in every stitch',
    lines: ['6 sc in ring', 'inc around (12)', 'inc around (24)', 'inc around (48)', 'inc around (96)'],
    answers: ['- 6 no-total', '6 12 agrees', '12 24 agrees', '24 48 agrees', '48 96 agrees'],
  },
  {
    source: 'computed: a wave of thirteen on a chain of 13k + 12, k = 2',
    lines: ['F: ch 38', 'sc in 2nd ch from hook, sc 4, *3 sc in next, sc 5, sk 2, sc 5* 2 times, 3 sc in next, sc 5'],
    given: { worked: 'rows' },
    answers: ['- 38 no-total', '37 39 no-total'],
  },
];

describe('totals that stand in print come out', () => {
  test.each(printed)('$source', ({ lines, given, answers }) => {
    expect(countLines(lines, given).map(inShort)).toEqual(answers);
  });
});

/** Totals that were printed wrong. */
const misprinted: readonly Row[] = [
  {
    source: 'common practice: a doll, "(sc 1, dec) round" on 24 printed as 15',
    lines: ['(sc 1, dec) round (15)'],
    given: { base: 24 },
    answers: ['24 16 differs'],
  },
  {
    source: 'common practice: a hats page, "(2 dc, 1 dc) round" on 12 printed as 36',
    lines: ['(2 dc, 1 dc) round (36)'],
    given: { base: 12 },
    answers: ['12 18 differs'],
  },
  {
    source: 'common practice: a bear ear, 8 sc in ring printed as 10',
    lines: ['8 sc in ring [10]'],
    answers: ['- 8 differs'],
  },
  {
    source: 'common practice: a shell swatch on 19 chains where 20 are needed',
    lines: ['F: ch 19', 'sc in 2nd ch from hook, *sk 2, 5 dc in next, sk 2, sc in next; rep from * across'],
    given: { worked: 'rows' },
    answers: ['- 19 no-total', '18 13 does-not-fit'],
  },
  {
    source: 'common practice: a bear, "*6 sc, dec*" without its repeat count',
    lines: ['*6sc, dec* [42]'],
    given: { base: 48 },
    answers: ['48 42 agrees'],
  },
];

describe('what was printed wrong is found', () => {
  test.each(misprinted)('$source', ({ lines, given, answers }) => {
    expect(countLines(lines, given).map(inShort)).toEqual(answers);
  });
});
