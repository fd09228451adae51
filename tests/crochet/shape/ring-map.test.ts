import { describe, expect, test } from 'vitest';
import { ringMap, type RingLine } from '../../../api/crochet/shape/index.ts';

const plain = (n: number) => Array.from({ length: n }, (_, k) => ({ on: [k], makes: 1 }));
const line = (id: string, n: number, more: Partial<RingLine> = {}): RingLine => ({
  id,
  label: id,
  counts: [n],
  verdict: 'agrees',
  walk: plain(n),
  isDone: true,
  ...more,
});
/** A round of increases as the count walks it: two stitches on each place. */
const increases = Array.from({ length: 12 }, (_, k) => ({ on: [Math.floor(k / 2)], makes: 1 }));
const arcs = (path: string) => (path.match(/A/g) ?? []).length;
const start = (path: string) => /^M([\d.]+) ([\d.]+)/.exec(path)!.slice(1).map(Number) as [number, number];

describe('ring map', () => {
  test('one dash is one stitch, and a range has a ring for every round of it', () => {
    const { rings } = ringMap([line('1', 6), line('2', 12, { counts: [12, 12, 12] })], { size: 200, openId: null });
    expect(rings.map((ring) => arcs(ring.dashes))).toEqual([6, 12, 12, 12]);
  });

  test('stitches run counterclockwise from the seam, and clockwise for the left hand', () => {
    const right = ringMap([line('1', 6)], { size: 200, openId: null }).rings[0]!;
    const left = ringMap([line('1', 6)], { size: 200, openId: null, isMirrored: true }).rings[0]!;
    expect(start(right.dashes)[0]).toBeLessThan(100);
    expect(start(left.dashes)[0]).toBeGreaterThan(100);
    expect(start(left.dashes)[0] - 100).toBeCloseTo(100 - start(right.dashes)[0], 1);
  });

  test('an increase is one stem that splits, however the count walks it', () => {
    const [, second] = ringMap([line('1', 6), line('2', 12, { walk: increases })], { size: 200, openId: null }).rings;
    expect((second!.stems.match(/M/g) ?? []).length).toBe(6 * 3);
  });

  test('the open ring is wider and gives every stitch its stem', () => {
    const { rings } = ringMap([line('1', 6), line('2', 6), line('3', 6)], { size: 200, openId: '2', openWeight: 2.6 });
    expect(rings[1]!.band / rings[0]!.band).toBeCloseTo(2.6);
    expect((rings[1]!.stems.match(/M/g) ?? []).length).toBe(6);
    expect(rings[2]!.stems).toBe('');
  });

  test('what does not fit has loose pegs and no ring; what is not understood is one tacked line with its mark', () => {
    const [, loose, tacked] = ringMap(
      [line('1', 6), line('2', 8, { verdict: 'does-not-fit' }), line('3', 0, { counts: [null], verdict: 'unread' })],
      {
        size: 200,
        openId: null,
      },
    ).rings;
    expect(arcs(loose!.dashes)).toBe(0);
    expect((loose!.dashes.match(/L/g) ?? []).length).toBe(8);
    expect(arcs(tacked!.dashes)).toBe(1);
    expect(tacked!.mark?.verdict).toBe('unread');
  });

  test('of many rounds those away from the open one are bundled in fives, and every band stays inside', () => {
    const lines = Array.from({ length: 150 }, (_, i) => line(String(i + 1), 24));
    const { rings } = ringMap(lines, { size: 214, openId: '70' });
    expect(rings.length).toBeLessThan(50);
    expect(rings.some((ring) => ring.lineId === '70' && ring.isOpen)).toBe(true);
    const last = rings.at(-1)!;
    expect(last.inner + last.band).toBeCloseTo(104, 0);
  });
});
