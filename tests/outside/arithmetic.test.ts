import { describe, expect, test } from 'vitest';
import { countLines, type Given, inShort } from '../crochet/count/support.ts';
import { flatnessOf, silhouetteOf } from '#crochet/shape';

const count = (lines: readonly string[], given?: Given) => countLines(lines, given).map(inShort);
const ROWS: Given = { worked: 'rows' };

describe('stitches from a chain, computed from the chain that the first stitch goes into', () => {
  test.each([
    // Stitch, where it goes, chains, stitches where what is skipped does not count.
    ['sc', '2nd', 20, 19],
    ['hdc', '3rd', 20, 18],
    ['dc', '4th', 20, 17],
    ['tr', '5th', 20, 16],
    ['dtr', '6th', 20, 15],
    // Booties 5162, booklet No. 178, 1940s.
    ['sc', '2nd', 11, 10],
    // A blanket leaflet of a yarn company, 2020.
    ['sc', '2nd', 112, 111],
    // Common practice.
    ['sc', '2nd', 26, 25],
    ['hdc', '3rd', 47, 45],
    // J. E. Fryer, The Mary Frances Knitting and Crocheting Book, 1918: dc in the third of 15.
    ['dc', '3rd', 15, 13],
  ])('%s in the %s of %i chains, skipped ones not counted: %i', (stitch, nth, chains, made) => {
    const line = `ch ${chains}, ${stitch} in ${nth} ch from hook and in each ch across (${made})`;
    expect(count([line], ROWS)).toEqual([`${made} ${made} agrees`]);
  });

  test.each([
    ['dc', '4th', 13, 11],
    ['dc', '4th', 12, 10],
    ['tr', '5th', 20, 17],
  ])('%s in the %s of %i chains, skipped ones counted: %i', (stitch, nth, chains, made) => {
    const lines = [
      `ch ${chains}, ${stitch} in ${nth} ch from hook (skipped ch count as ${stitch}) and in each ch across (${made})`,
    ];
    expect(countLines(lines, ROWS).map(({ verdict, count: total }) => `${String(total)} ${verdict}`)).toEqual([
      `${made} agrees`,
    ]);
  });

  test('in the round: “ch 2, n sc in 2nd ch” is n, booklets of the 1940s', () => {
    expect(count(['ch 2, 7 sc in 2nd ch from hook (7)'])).toEqual(['1 7 agrees']);
  });

  test('a shell row needs 6k + 1 places: 20 chains fit, 19 do not; computed', () => {
    const row = 'sc in 2nd ch from hook, *sk 2, 5 dc in next, sk 2, sc in next; rep from * across';
    expect(count(['F: ch 20', row], ROWS).at(-1)).toBe('19 19 no-total');
    expect(count(['F: ch 19', row], ROWS).at(-1)).toContain('does-not-fit');
  });
});

describe('repeats', () => {
  test('“3 more times” is four in all: a crochet handbook', () => {
    expect(count(['*2 sc, inc; rep from * 3 more times (16)'], { base: 12 })).toEqual(['12 16 agrees']);
  });

  test('“rep from * 3 times” is four by the definition of Star Book No. 98, 1953, where only so it fits', () => {
    expect(count(['*2 sc, inc; rep from * 3 times (16)'], { base: 12 })).toEqual(['12 16 agrees']);
  });

  test('and three in all, as a UK magazine prints it, where only so it fits', () => {
    expect(count(['*2 sc, inc; rep from * 3 times (12)'], { base: 9 })).toEqual(['9 12 agrees']);
  });

  test('Star Doily Book No. 143: a cluster, then six more, on eight of which one was begun with', () => {
    expect(
      countLines(['8 sc in ring', 'ch 3, 2 dc in same st, *ch 3, 3 dc in next st; rep from * 6 times']).at(-1)?.verdict,
    ).not.toBe('does-not-fit');
  });
});

describe('flat circles', () => {
  const totals = (n: number) => Array.from({ length: 8 }, (_, i) => n * (i + 1));

  test('round r of a disc of n makes n·r from n·(r − 1): computed', () => {
    for (const n of [6, 8, 12]) {
      const lines = Array.from({ length: 6 }, (_, i) =>
        i === 0
          ? `${n} sc in magic ring (${n})`
          : i === 1
            ? `inc x ${n} (${2 * n})`
            : `(${i - 1} sc, inc) x ${n} (${n * (i + 1)})`,
      );
      expect(countLines(lines).every(({ verdict }) => verdict === 'agrees')).toBe(true);
    }
  });

  test.each([
    // n, height by width at which it lies flat: n / 2π, computed; n as printed in booklets of the 1940s and on berets.
    [6, 0.955],
    [7, 1.114],
    [8, 1.273],
    [12, 1.91],
    [15, 2.387],
  ])('%i a round lie flat where a stitch is %f times as high as wide', (n, height) => {
    expect(flatnessOf(totals(n), { width: 1, height }).every(({ lies }) => lies === 'flat')).toBe(true);
    expect(flatnessOf(totals(n), { width: 1, height: height * 1.2 }).every(({ lies }) => lies === 'cups')).toBe(true);
    expect(flatnessOf(totals(n), { width: 1, height: height * 0.8 }).every(({ lies }) => lies === 'ruffles')).toBe(
      true,
    );
  });

  test('the ideal is 2πh/w: 6.28, 9.42, 12.57, 18.85 for heights of 1, 1½, 2 and 3; computed', () => {
    const ideal = [1, 1.5, 2, 3].map((height) => flatnessOf([6, 12], { width: 1, height })[0]?.ideal.toFixed(2));
    expect(ideal).toEqual(['6.28', '9.42', '12.57', '18.85']);
  });

  test('radius is total × width / 2π, and an even round rises by its height; computed', () => {
    const { radii, heights } = silhouetteOf([24, 24], { width: 4.4, height: 5 });
    expect(radii[1]).toBeCloseTo(16.807, 3);
    expect(heights).toEqual([0, 5]);
  });
});

describe('hyperbolic growth: D. W. Henderson & D. Taimina, The Mathematical Intelligencer 23(2), 2001', () => {
  test('20 at 5/4 is 25, and an increase in every 4th goes on to 31 and 38', () => {
    const every = 'inc in every 4th st across';
    expect(count([`${every} (25)`, `${every} (31)`, `${every} (38)`], { ...ROWS, base: 20 })).toEqual([
      '20 25 agrees',
      '25 31 agrees',
      '31 38 agrees',
    ]);
  });

  test('one in every stitch doubles: 6, 12, 24, 48, 96', () => {
    const lines = ['6 sc in magic ring (6)', ...[12, 24, 48, 96].map((n) => `inc in each st around (${n})`)];
    expect(countLines(lines).every(({ verdict }) => verdict === 'agrees')).toBe(true);
  });
});
