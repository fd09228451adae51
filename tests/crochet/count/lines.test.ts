import { describe, expect, test } from 'vitest';
import { countLines, type Given, inShort } from './support.ts';

interface Row {
  readonly n: number;
  readonly lines: readonly string[];
  readonly given?: Given;
  /** What the last lines come to, in order. */
  readonly answers: readonly string[];
  readonly made?: Readonly<Record<string, number>>;
}

const rows: readonly Row[] = [
  { n: 1, lines: ['*2 sc, inv dec* to marker (18)'], given: { base: 24 }, answers: ['24 18 agrees'] },
  {
    n: 2,
    lines: ['(2 sc, inc) ×6', 'same with one more sc between'],
    given: { base: 18 },
    answers: ['24 30 no-total'],
  },
  { n: 3, lines: ['6 sc, 3 inc, 9 sc, 3 inc, 3 sc (30)'], given: { base: 24 }, answers: ['24 30 agrees'] },
  { n: 4, lines: ['pinch flat, 6 sc through both layers (6)'], given: { base: 12 }, answers: ['12 6 agrees'] },
  {
    n: 5,
    lines: ['5 sc, 4 sc through arm and body, 10 sc, 4 sc through arm and body, 5 sc (28)'],
    given: { base: 28 },
    answers: ['28 28 agrees'],
  },
  {
    n: 6,
    lines: ['ch 1, sc in same st as join and in next 2, inc; (3 sc, inc) around, join (30)'],
    given: { base: 24 },
    answers: ['24 30 agrees'],
  },
  {
    n: 7,
    lines: ['3 ch (1 tr), 1 tr in same place, *1 tr, 2 tr in next; rep to last st, 1 tr (18)'],
    given: { base: 12, terms: 'UK' },
    answers: ['12 18 agrees'],
  },
  {
    n: 8,
    lines: ['3 dc in each st across', 'ch 3, dc in same st, 3 dc in each gap, 2 dc in last st (28)'],
    given: { base: 9, worked: 'rows' },
    answers: ['35 28 agrees'],
  },
  {
    n: 9,
    lines: [
      '(3 tr, 2 ch) 4 times in ring',
      '(3 tr, 2 ch, 3 tr) in each corner',
      'tr in corner sp, (2 tr, 2 ch, 3 tr) in same sp, 3 tr in gap, *(3 tr, 2 ch, 3 tr) in corner, 3 tr in gap* 3 times',
    ],
    given: { terms: 'UK' },
    answers: ['8 36 no-total'],
    made: { dc: 36, 'ch-2 sp': 4 },
  },
  {
    n: 10,
    lines: ['(3 dc, ch 1) 8 times in ring', 'dc in each dc, 2 dc in each ch-1 sp around (40)'],
    answers: ['32 40 agrees'],
  },
  {
    n: 11,
    lines: [
      'F: ch 38',
      'sc in 2nd ch from hook, *sk 2, 5 dc in next ch, sk 2, sc in next ch; rep from * across',
      'ch 3, 2 dc in first sc, *sc in 3rd dc of shell, 5 dc in next sc* 5 times, sc in 3rd dc of shell, 3 dc in last sc (37)',
    ],
    given: { worked: 'rows' },
    answers: ['37 37 agrees'],
  },
  {
    n: 12,
    lines: [
      'F: ch 22',
      'sc in 2nd ch, (ch 1, sk 1, sc) across (21)',
      'sc, *sc in ch-1 sp, ch 1, sk sc* to last sp, sc in sp, sc in last (21)',
    ],
    given: { worked: 'rows' },
    answers: ['21 12 agrees'],
    made: { sc: 12, 'ch-1 sp': 9 },
  },
  {
    n: 13,
    lines: [
      '16 sc in ring',
      '(sc, ch 5) around (16 sps)',
      '(sc, ch 5) in each of 15 sps, sc in last sp, ch 2, dc in first sc (16 sps)',
    ],
    answers: ['16 16 agrees'],
    made: { sc: 16, 'ch-5 sp': 16 },
  },
  {
    n: 14,
    lines: [
      '6 sc in ring',
      '5 dc in each sc around (30)',
      'sl st to centre of shell, ch 1, (sc in 3rd dc of shell, ch 6) around',
    ],
    answers: ['30 6 no-total'],
    made: { sc: 6, 'ch-6 sp': 6 },
  },
  {
    n: 15,
    lines: [
      '(10 dc, ch 2, 10 dc) in ring',
      'ch 3, dc in first st, dc to centre sp, (2 dc, ch 2, 2 dc) in sp, dc to last st, 2 dc in last (26 dc)',
    ],
    given: { worked: 'rows' },
    answers: ['21 26 agrees'],
    made: { dc: 26, 'ch-2 sp': 1 },
  },
  {
    n: 16,
    lines: [
      '(ch 3, 3 dc) 4 times in ring',
      "ch 6, dc in 4th ch and next 2, (sl st in next block's sp, ch 3, 3 dc in same sp) ×4 (5 blocks)",
    ],
    given: { worked: 'rows' },
    answers: ['4 5 agrees'],
  },
  {
    n: 17,
    lines: ['A 4, B 2, A 6, B 2, A 4 (15 A, 4 B)'],
    given: { base: 18 },
    answers: ['18 18 differs'],
    made: { A: 14, B: 4 },
  },
  {
    n: 18,
    lines: ['sc, 2 sc BLO, (drop dc two rows down, 4 sc BLO) ×4, drop dc, sc (25)'],
    given: { base: 25 },
    answers: ['25 25 agrees'],
  },
  {
    n: 19,
    lines: ['(2 FPdc, sk 2, FPtr in next 2, FPtr in the 2 skipped) ×12 (72)'],
    given: { base: 72 },
    answers: ['72 72 agrees'],
  },
  { n: 20, lines: ['hdc in third loop around (48)'], given: { base: 48 }, answers: ['48 48 agrees'] },
  {
    n: 21,
    lines: ['sk 1, 9 sc, 3 sc in 1, *9 sc, sk 2, 9 sc, 3 sc in 1* twice, 9 sc, leave last (63)'],
    given: { base: 63 },
    answers: ['63 63 agrees'],
  },
  {
    n: 22,
    lines: ['10 dc, 8 ch, miss 8, 18 dc (36)', '1 dc in each st and ch (36)'],
    given: { base: 36, terms: 'UK' },
    answers: ['36 28 agrees', '36 36 agrees'],
  },
  {
    n: 23,
    lines: ['dec 1 st each end of next and foll alt rows until 54 sts'],
    given: { base: 62, terms: 'UK', worked: 'rows' },
    answers: ['62 54 agrees'],
  },
  {
    n: 24,
    lines: ['*sc to marked st, 3 sc in it* 4 times, sc to end; move markers up (68)'],
    given: { base: 60 },
    answers: ['60 68 agrees'],
  },
  { n: 25, lines: ['R7–12: as set, 6 more each round (72)'], given: { base: 36 }, answers: ['36 72 agrees'] },
  { n: 26, lines: ['work straight until 14 cm (84)'], given: { base: 84 }, answers: ['84 84 agrees'] },
  {
    n: 27,
    lines: ['12 sc, turn', '12 sc, turn', '12 sc, 6 sc in sts left (18)'],
    given: { base: 18, worked: 'rows' },
    answers: ['18 12 no-total', '12 12 no-total', '18 18 agrees'],
  },
  {
    n: 28,
    lines: ['*3 sc, ch 3, sl st in 3rd ch from hook* around'],
    given: { base: 62 },
    answers: ['62 60 does-not-fit'],
  },
  { n: 29, lines: ['3 sc over every 4 row ends (24)'], given: { base: 32 }, answers: ['32 24 agrees'] },
  {
    n: 31,
    lines: ['R10: BLO: (sc, dec) ×6 (12)', 'into the front loops left in R10: (2 sc, inc) ×6 (24)'],
    given: { base: 18 },
    answers: ['18 12 agrees', '18 24 agrees'],
  },
  { n: 32, lines: ['inv dec ×6 in BLO (12)'], given: { base: 24 }, answers: ['24 6 does-not-fit'] },
  { n: 33, lines: ['F: ch 17', 'hdc in 2nd ch and across (16)'], given: { worked: 'rows' }, answers: ['16 16 agrees'] },
  {
    n: 34,
    lines: ['ch 2, hdc in each st across (21)'],
    given: { base: 20, worked: 'rows' },
    answers: ['20 20 differs'],
  },
  { n: 35, lines: ['inc in every 6th st around (116)'], given: { base: 100 }, answers: ['100 116 agrees'] },
  { n: 36, lines: ['2 sc, 4 dc ×4'], given: { base: 24 }, answers: ['24 24 no-total'] },
  { n: 36, lines: ['2 sc, 4 dc ×4'], given: { base: 18 }, answers: ['18 18 no-total'] },
  { n: 36, lines: ['2 sc, 4 dc ×4'], given: { base: 20 }, answers: ['20 18 does-not-fit'] },
  { n: 37, lines: ['sc around, snug but not tight (24)'], given: { base: 24 }, answers: ['24 24 agrees'] },
  {
    n: 38,
    lines: ['dec round (6), then pull shut through the front loops'],
    given: { base: 12 },
    answers: ['12 6 agrees'],
  },
  {
    n: 39,
    lines: [
      '(3 dc, ch 2) 4 times in ring',
      '*(3 dc, ch 2, 3 dc) in corner, ch 1; rep from * around',
      'R3: 3 dc in each ch-1 sp, ch 1 between, corners (3 dc, ch 2, 3 dc)',
    ],
    answers: ['8 36 no-total'],
    made: { dc: 36, 'ch-1 sp': 8, 'ch-2 sp': 4 },
  },
  {
    n: 40,
    lines: ['7 (9, 11) sc in ring', '6 (8, 10) sc, inc (7: 10: 12)'],
    given: { sizes: ['S', 'M', 'L'] },
    answers: ['7 8 differs'],
  },
];

describe('lines that makers write, with what a careful person works out', () => {
  test.each(rows)('line $n: $lines comes to $answers', ({ lines, given, answers, made }) => {
    const counted = countLines(lines, given).slice(-answers.length);
    expect(counted.map(inShort)).toEqual(answers);
    if (made) expect(counted.at(-1)?.made).toEqual(made);
  });

  test('line 30: rows repeated to row 61 come each by their own count, and row 61 is a row 5', () => {
    const rows30 = [
      'F: ch 21',
      'R1: sc in 2nd ch and across',
      'R2: sc across',
      'R3: dc across',
      'R4: hdc across',
      'R5: sc across',
      'R6: rep rows 2–5 to row 61, ending with a row 3',
    ];
    const last = countLines(rows30, { worked: 'rows' }).at(-1)!;
    expect(last.rows?.length).toBe(56);
    expect(last.rows?.at(-1)).toMatchObject({ from: 61, source: 5, count: 20 });
  });

  test('line 40: the other sizes agree', () => {
    const line = countLines(['7 (9, 11) sc in ring', '6 (8, 10) sc, inc (7: 10: 12)'], { sizes: ['S', 'M', 'L'] })[1]!;
    expect(line.sizes.map((size) => `${String(size.base)} ${String(size.count)} ${size.verdict}`)).toEqual([
      '9 10 agrees',
      '11 12 agrees',
    ]);
  });

  test('line 17: the message names the colours', () => {
    expect(countLines(['A 4, B 2, A 6, B 2, A 4 (15 A, 4 B)'], { base: 18 })[0]?.message).toBe(
      'Works out to 14 A, 4 B.',
    );
  });

  test('a line that needs more than there is says both numbers, and where it runs out', () => {
    const line = countLines(['(sc, inc) x 6 (18)'], { base: 10 })[0]!;
    expect(line.verdict).toBe('does-not-fit');
    expect(line.message).toMatch(/^Needs 1\d, there are 10\.$/);
    expect(line.atFault).not.toBeNull();
  });
});
