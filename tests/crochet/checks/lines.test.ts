import { describe, expect, test } from 'vitest';
import { checksOf, line, piece, saying, source } from './support.ts';

/** What the first mend of this kind writes, by line and field. */
const mended = (of: Parameters<typeof checksOf>[0], kind: string) =>
  checksOf(of).find((one) => one.kind === kind)?.mend ?? null;

describe('numbers', () => {
  test('rounds in order, as ranges and alone, are nothing to say', () => {
    expect(saying(['R1: 6 sc in MR (6)', 'R2-4: sc around (6)', 'R5: inc x 6 (12)'], 'number-missing')).toEqual([]);
  });

  test('a number left out is named; where what follows fits, the numbers close up', () => {
    const lines = ['R1: 6 sc in magic ring (6)', 'R2: inc x 6 (12)', 'R4: (sc, inc) x 6 (18)', 'R5: sc around (18)'];
    expect(saying(lines, 'number-missing')).toEqual(['R4 follows a gap: 3 is missing.']);
    expect(mended(lines, 'number-missing')).toMatchObject({
      words: 'Number on from 3',
      changes: [
        { op: 'edit', row: 'line', fields: { from: 3, to: 3 } },
        { op: 'edit', row: 'line', fields: { from: 4, to: 4 } },
      ],
    });
  });

  test('where what follows does not fit, a line is missing and is added at its place', () => {
    const lines = ['R1: 6 sc in magic ring (6)', 'R2: inc x 6 (12)', 'R4: (2 sc, inc) x 6 (24)'];
    expect(mended(lines, 'number-missing')).toMatchObject({
      words: 'Add R3',
      changes: [{ op: 'add', row: 'line', fields: { after: lines[1], from: 3, to: 3, kind: 'round', text: '' } }],
    });
  });

  test('numbers that words name are not moved', () => {
    const lines = ['R1: 6 sc in magic ring (6)', 'R3: inc x 6 (12)', 'Set the eyes between R3 and R4.'];
    expect(mended(lines, 'number-missing')?.words).toBe('Add R2');
  });

  test('nothing is missing after rounds that a length ends', () => {
    expect(saying(['R1: 6 sc in MR (6)', 'R2 on: work straight until 14 cm', 'R30: inc x 6 (12)'])).not.toContainEqual(
      expect.stringContaining('missing'),
    );
  });

  test('a doubled round and ranges that share rounds are told apart', () => {
    expect(saying(['R1: 6 sc in MR (6)', 'R2: inc x 6 (12)', 'R2: (sc, inc) x 6 (18)'], 'number-doubled')).toEqual([
      'R2 stands twice.',
    ]);
    expect(saying(['R1-4: sc around (6)', 'R4-6: sc around (6)'], 'range-overlaps')).toEqual([
      'R1–4, R4–6 share rounds: one goes on where the other has not ended.',
    ]);
  });

  test('a round that stands behind a later one is out of order', () => {
    const lines = ['R1: 6 sc in MR (6)', 'R2-3: sc around (6)', 'R5: sc around (6)', 'R4: sc around (6)'];
    expect(saying(lines, 'number-order')).toEqual(['R4 stands behind R5, out of order.']);
  });

  test('rounds after rows, and the next piece, begin again at one', () => {
    const flat = piece('Base', ['Row 1: ch 5, sc in 2nd ch from hook and across (4)', 'R1: sc around (4)']);
    expect(saying(source([flat, piece('Ear', ['R1: 6 sc in MR (6)'])]), 'number-doubled', 'number-order')).toEqual([]);
  });
});

describe('totals', () => {
  test('many without a total are one check, written with one deed', () => {
    const lines = ['R1: 6 sc in magic ring', 'R2: inc x 6', 'R3: sc around (12)'];
    expect(saying(lines, 'total-missing')).toEqual(['R1, R2 have no written total.']);
    expect(mended(lines, 'total-missing')).toMatchObject({
      words: 'Write all totals',
      changes: [{ fields: { written: { sts: [6] } } }, { fields: { written: { sts: [12] } } }],
    });
  });

  test('a total that nobody spoke is never asked for', () => {
    const lines = [
      line('R1: 6 sc in magic ring (6)', { said: null }),
      line('R2: inc x 6 (12)', { said: { sts: [12] } }),
    ];
    expect(saying(lines, 'total-missing', 'total-wrong')).toEqual([]);
  });

  test('a wrong one is put right where it stands', () => {
    const lines = ['R1: 6 sc in magic ring (6)', 'R2: inc x 6 (13)'];
    expect(saying(lines, 'total-wrong')).toEqual(['R2 says 13 and works out to 12.']);
    expect(mended(lines, 'total-wrong')).toMatchObject({
      words: 'Make it (12)',
      changes: [{ fields: { text: 'inc x 6 (12)', written: null } }],
    });
  });

  test('a line that stays as it is for a reason is settled', () => {
    const lines = ['R1: 6 sc in MR (6)', line('R2: inc x 6 (13)', { putAsideReason: 'As filmed.' })];
    expect(saying(lines, 'total-wrong')).toEqual([]);
  });

  test('other brackets than most are one check, and one deed makes them alike', () => {
    const lines = [
      'R1: 6 sc in MR (6)',
      'R2: inc x 6 [12]',
      'R3: (sc, inc) x 6 (18)',
      'R4: sc around – 18',
      'R5: sc around (18)',
    ];
    expect(saying(lines, 'total-brackets')).toEqual([
      'R2, R4 give their totals in [ ] and no brackets, the others in ( ).',
    ]);
    expect(mended(lines, 'total-brackets')).toMatchObject({
      words: 'Make all totals ( )',
      changes: [{ fields: { text: 'inc x 6 (12)' } }, { fields: { text: 'sc around (18)' } }],
    });
  });
});

test('a repeat of rows that would end on another row than it says', () => {
  const rows = [
    'Row 1: ch 11, sc in 2nd ch from hook and in each ch across (10)',
    'Row 2: ch 1, sc across (10)',
    'Row 3: ch 1, sc across (10)',
    'Row 4: ch 1, sc across (10)',
    'Row 5: ch 1, sc across (10)',
    'Row 6-61: rep rows 2-5 to row 61, ending with a row 3',
  ];
  const flat = (lines: string[]) => source([piece('Panel', lines, { worked: 'rows' })]);
  expect(saying(flat(rows), 'repeat-end')).toEqual(['Rows 6–61 says it ends with row 3; row 61 is a row 5.']);
  const right = rows.with(5, 'Row 6-61: rep rows 2-5 to row 61, ending with a row 5');
  expect(saying(flat(right), 'repeat-end')).toEqual([]);
});

describe('names', () => {
  test('decreases under two names; back-loop rounds keep the plain one', () => {
    const lines = ['R1: (2 sc, inv dec) x 6 (18)', 'R2: (sc, dec) x 6 (12)', 'R3: BLO: dec x 6 (6)'];
    expect(saying(lines, 'decrease-names')).toEqual(['R2 says dec, R1 says inv dec.']);
    expect(mended(lines, 'decrease-names')).toMatchObject({
      words: 'Write inv dec',
      changes: [{ fields: { text: '(sc, inv dec) x 6 (12)' } }],
    });
  });

  test('a stitch written out in some lines and abbreviated in the rest', () => {
    const lines = ['R1: 6 sc in MR (6)', 'R2: sc around (6)', 'R3: 6 single crochets (6)'];
    expect(saying(lines, 'stitch-spelling')).toEqual(['R3 says single crochet, the other lines sc.']);
    expect(mended(lines, 'stitch-spelling')?.changes).toEqual([
      { op: 'edit', row: 'line', id: lines[2], fields: { text: '6 sc (6)' } },
    ]);
  });

  test('shorthand that no list explains goes into one note; a note that explains it is enough', () => {
    const lines = ['R1: 6 sc in MR (6)', 'R2: WS: sc around (6)'];
    expect(saying(lines, 'abbreviation-unexplained')).toEqual([
      'R1, R2 use MR and WS; they are not in the abbreviations.',
    ]);
    expect(mended(lines, 'abbreviation-unexplained')?.changes).toEqual([
      { op: 'add', row: 'note', fields: { text: 'MR: magic ring; WS: wrong side.' } },
    ]);
    const explained = source([piece('Body', lines)], { notes: [{ text: 'MR: magic ring; WS: wrong side.' }] });
    expect(saying(explained, 'abbreviation-unexplained')).toEqual([]);
  });

  test('a cluster needs its own words', () => {
    const lines = ['R1: 6 sc in MR (6)', 'R2: cl in each st around (6)'];
    expect(saying(lines, 'stitch-unexplained')).toEqual(['R2 works a cluster; no special stitch says how.']);
    const special = [{ name: 'cluster', abbreviation: 'cl', text: '3 dc in one st, closed together' }];
    expect(saying(source([piece('Body', lines)], { specialStitches: special }), 'stitch-unexplained')).toEqual([]);
  });
});

describe('US and UK', () => {
  test('a word that one side alone has is put into the pattern’s terms', () => {
    const lines = ['R1: 6 sc in magic ring (6)', 'R2: htr in each st around (6)'];
    expect(saying(lines, 'terms-mixed')).toEqual(['R2 says htr, a word of UK terms; the pattern is in US terms.']);
    expect(mended(lines, 'terms-mixed')?.changes).toMatchObject([{ fields: { text: 'hdc in each st around (6)' } }]);
  });

  test('beside a name with two meanings nothing is translated', () => {
    const lines = ['R1: 6 sc in magic ring (6)', 'R2: 3 htr, 3 dc (6)'];
    expect(mended(lines, 'terms-mixed')).toBeNull();
    expect(saying(lines, 'terms-mixed')).toHaveLength(1);
  });

  test('where all speak the other terms, the pattern is theirs', () => {
    const pear = source([piece('Body', ['R1: 6 htr in magic ring (6)', 'R2: 2 htr in each st around (12)'])]);
    expect(mended(pear, 'terms-mixed')).toMatchObject({ changes: [{ op: 'edit-pattern', fields: { terms: 'UK' } }] });
  });

  test('UK lines in a UK pattern are nothing to say', () => {
    const uk = source([piece('Body', ['R1: 6 dc in magic ring (6)', 'R2: miss 1, 5 htr (5)'])], { terms: 'UK' });
    expect(saying(uk, 'terms-mixed')).toEqual([]);
  });
});
