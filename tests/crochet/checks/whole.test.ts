import { describe, expect, test } from 'vitest';
import fc from 'fast-check';
import { checkPattern, settleChecks } from '#crochet';
import { gaugeOf } from '../../../api/crochet/checks/gauge.ts';
import { checksOf, line, piece, saying, source } from './support.ts';

const DETAILS = { introduction: '', gauge: '', finishedSize: '7 cm', level: 'easy', uses: [] };

describe('advice', () => {
  test('is apart from what is open, and comes last', () => {
    const checks = checksOf(source([piece('Body', ['R1: 6 sc in magic ring'])], { details: DETAILS }));
    expect(checks.map(({ kind, isAdvice }) => [kind, isAdvice])).toEqual([
      ['total-missing', false],
      ['gauge-missing', true],
    ]);
  });

  test('a stuffed piece is a toy', () => {
    const of = (step: string) => checkPattern(source([piece('Body', ['R1: 6 sc in magic ring (6)', step])])).isToy;
    expect(of('Stuff firmly.')).toBe(true);
    expect(of('Do not stuff.')).toBe(false);
    expect(of('Press it flat.')).toBe(false);
  });

  /** A disc that grows by n a round, five rounds. */
  const disc = (n: number, gauge: string) => {
    const work = (r: number) =>
      r === 1 ? `${n} sc in magic ring` : r === 2 ? `inc x ${n}` : `(${r - 2} sc, inc) x ${n}`;
    return source(
      [
        piece(
          'Disc',
          [1, 2, 3, 4, 5].map((r) => `R${r}: ${work(r)} (${n * r})`),
        ),
      ],
      {
        details: { ...DETAILS, gauge },
      },
    );
  };

  test('a disc of six lies flat where a stitch is as high as it is wide, one of nine ruffles, one of four cups', () => {
    const square = '20 sc and 20 rounds = 10 cm';
    expect(saying(disc(6, square), 'ruffles', 'cups', 'gathers')).toEqual([]);
    expect(saying(disc(9, square), 'ruffles')).toEqual([
      'R2, R3, R4, R5 grow by 9; about 6.3 a round lie flat by this gauge, so it ruffles.',
    ]);
    expect(saying(disc(4, square), 'cups')).toEqual([
      'R2, R3, R4, R5 grow by 4; about 6.3 a round lie flat by this gauge, so it cups.',
    ]);
  });

  test('without a gauge nothing is said of the shape', () => {
    expect(saying(disc(12, ''), 'ruffles')).toEqual([]);
  });
});

test.each([
  ['20 sc and 25 rows = 10 cm', 5, 4],
  ['10 sc and 9 rounds make 4.4 × 4.5 cm, worked firm.', 4.4, 5],
  ['16 sts × 20 rows to 4 in', 6.35, 5.08],
  ['18 htr by 12 rows over 10 cm', 100 / 18, 100 / 12],
])('“%s” is a stitch of %f × %f mm', (text, width, height) => {
  const sample = gaugeOf(text);
  expect(sample?.width).toBeCloseTo(width, 6);
  expect(sample?.height).toBeCloseTo(height, 6);
});

test.each(['', 'Gauge is not important.', '20 sc = 10 cm', '0 sc and 0 rows = 10 cm'])('“%s” is no sample', (text) => {
  expect(gaugeOf(text)).toBeNull();
});

describe('a check that was left', () => {
  const before = checksOf(['R1: 6 sc in magic ring', 'R2: inc x 6 (12)']);
  const [check] = before;
  const left = [{ kind: check!.kind, subject: check!.subject, says: check!.says }];

  test('is settled while it says the same', () => {
    const { open, settled } = settleChecks(before, left);
    expect(open).toEqual([]);
    expect(settled.map((one) => one.check.kind)).toEqual(['total-missing']);
  });

  test('comes back when another line joins it', () => {
    const after = checksOf(['R1: 6 sc in magic ring', 'R2: inc x 6']);
    expect(settleChecks(after, left).open.map(({ kind }) => kind)).toEqual(['total-missing']);
  });
});

test('a pattern without a line has nothing to check', () => {
  expect(checkPattern(source([])).checks).toEqual([]);
});

test('no words of a pattern make it throw', () => {
  const typed = fc.oneof(
    fc.string(),
    fc.constantFrom(
      'R1: 6 sc',
      'R2-9: rep R1',
      'rep rows 2-5 to row 61, ending with a row 3',
      'stuff',
      'pull shut',
      '[24]',
      'htr',
      'A 4, B 2',
    ),
  );
  fc.assert(
    fc.property(
      fc.array(fc.tuple(typed, fc.string(), fc.nat(9999)), { maxLength: 12 }),
      fc.string(),
      (lines, words) => {
        const all = lines.map(([text, note, from], i) => line(`R${from}: ${text}`, { id: String(i), note }));
        const one = source([piece(words, all, { make: 2 }), piece('Ear', all)], {
          title: words,
          details: { ...DETAILS, gauge: words, introduction: words },
          notes: [{ text: words }],
        });
        expect(checkPattern(one).checks).toEqual(checkPattern(one).checks);
      },
    ),
    { numRuns: 60 },
  );
});
