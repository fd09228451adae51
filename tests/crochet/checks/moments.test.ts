import { describe, expect, test } from 'vitest';
import { checksOf, line, piece, saying, source } from './support.ts';

const LINES = ['R1: 6 sc in magic ring (6)', 'R2: inc x 6 (12)', 'R3: (sc, inc) x 6 (18)', 'R4: sc around (18)'];

/** A filmed pattern whose lines are marked at these seconds; null is no mark. */
const filmed = (seconds: readonly (number | null)[], durationMs: number | null = 600_000) =>
  source([piece('Body', LINES)], {
    recordings: [{ id: 'film', title: 'Film', durationMs }],
    marks: seconds.flatMap((at, i) =>
      at === null
        ? []
        : [{ id: `m${i}`, lineId: LINES[i]!, recordingId: 'film', startMs: at * 1000, endMs: null, main: true }],
    ),
  });

const KINDS = ['mark-missing', 'mark-order', 'mark-beyond', 'chapter-short'] as const;

test('moments in order are nothing to say', () => {
  expect(saying(filmed([10, 40, 80, 120]), ...KINDS)).toEqual([]);
});

test('a pattern without a recording needs no moments', () => {
  expect(saying(source([piece('Body', LINES)]), ...KINDS)).toEqual([]);
});

test('lines without a moment are one check, and can be said not to be filmed', () => {
  const [check] = checksOf(filmed([10, null, null, 120])).filter(({ kind }) => kind === 'mark-missing');
  expect(check?.refs.map(({ name }) => name)).toEqual(['R2', 'R3']);
  expect(check?.mend?.changes).toEqual(
    [LINES[1], LINES[2]].map((id) => ({ op: 'edit', row: 'line', id, fields: { filmed: false } })),
  );
  const unfilmed = LINES.map((typed) => line(typed, { filmed: false }));
  const recordings = [{ id: 'film', title: 'Film', durationMs: 1 }];
  expect(saying(source([piece('Body', unfilmed)], { recordings }), ...KINDS)).toEqual([]);
});

describe('out of order', () => {
  test('one that is far too late is named alone, not all that follow it', () => {
    expect(saying(filmed([10, 400, 80, 120]), 'mark-order')).toEqual([
      'R2 has its moment out of order with the lines around.',
    ]);
  });

  test('another piece may be filmed before', () => {
    const two = source([piece('Body', [LINES[0]!]), piece('Ear', ['R1: 8 sc in magic ring (8)'])], {
      recordings: [{ id: 'film', title: 'Film', durationMs: null }],
      marks: [
        { id: 'a', lineId: LINES[0]!, recordingId: 'film', startMs: 90_000, endMs: null, main: true },
        { id: 'b', lineId: 'R1: 8 sc in magic ring (8)', recordingId: 'film', startMs: 9_000, endMs: null, main: true },
      ],
    });
    expect(saying(two, 'mark-order')).toEqual([]);
  });
});

test('beyond the end of the recording', () => {
  const [check] = checksOf(filmed([10, 40, 80, 120], 100_000)).filter(({ kind }) => kind === 'mark-beyond');
  expect(check?.refs.map(({ name }) => name)).toEqual(['R4']);
  expect(check?.mend?.changes).toEqual([{ op: 'remove', row: 'mark', id: 'm3' }]);
});

test('a chapter of ten seconds is long enough, one of less is not', () => {
  expect(saying(filmed([10, 20, 80, 120]), 'chapter-short')).toEqual([]);
  expect(saying(filmed([10, 19.9, 80, 595]), 'chapter-short')).toEqual([
    'R1, R4 last less than 10 seconds, and are merged with the next where chapters are listed.',
  ]);
});
