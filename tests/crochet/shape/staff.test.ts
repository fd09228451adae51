import { describe, expect, test } from 'vitest';
import { type RingLine, staffOf } from '../../../api/crochet/shape/index.ts';

const row = (id: string, n: number | null, more: Partial<RingLine> = {}): RingLine => ({
  id,
  label: id,
  counts: [n],
  verdict: 'agrees',
  walk: [],
  isDone: true,
  ...more,
});
const dashes = (path: string) => (path.match(/M/g) ?? []).length;

describe('the staff of a piece worked in rows', () => {
  test('one dash is one stitch, the first row stands at the foot, and a range has a row for each', () => {
    const { rows, height } = staffOf([row('1', 8), row('2', 6, { counts: [6, 6, 6] })], { width: 200, openId: null });
    expect(rows.map((each) => dashes(each.dashes))).toEqual([8, 6, 6, 6]);
    expect(rows.map((each) => each.y)).toEqual([...rows.map((each) => each.y)].sort((a, b) => b - a));
    expect(rows[0]!.y).toBeLessThan(height);
    expect(rows.map((each) => each.label)).toEqual(['1', '', '', '2']);
  });

  test('rows are worked to and fro: the first begins at the right, for the left hand at the left', () => {
    const begins = (isMirrored: boolean) =>
      staffOf([row('1', 8), row('2', 8)], { width: 200, openId: null, isMirrored }).rows.map(
        (each) => Number(/^M([\d.]+)/.exec(each.arrow)![1]) > 100,
      );
    expect(begins(false)).toEqual([true, false]);
    expect(begins(true)).toEqual([false, true]);
  });

  test('what does not fit stands in loose pegs, what is not understood is one line to be tacked', () => {
    const { rows } = staffOf([row('1', 8, { verdict: 'does-not-fit' }), row('2', null, { verdict: 'unread' })], {
      width: 200,
      openId: '2',
    });
    expect(rows[0]!.dashes).toContain('V');
    expect(dashes(rows[1]!.dashes)).toBe(1);
    expect(rows.map((each) => each.state)).toEqual(['does-not-fit', 'unread']);
  });

  test('every stitch stays within the drawing, however long the row', () => {
    const { rows } = staffOf([row('1', 700), row('2', 3)], { width: 286, openId: '1' });
    const ends = [...rows[0]!.dashes.matchAll(/[MH]([\d.]+)/g)].map((match) => Number(match[1]));
    expect(Math.min(...ends)).toBeGreaterThanOrEqual(34);
    expect(Math.max(...ends)).toBeLessThanOrEqual(286 - 34);
  });
});
