import { describe, expect, test } from 'vitest';
import { repeatsOf } from '../../../api/crochet/edition/repeats.ts';

const sc = { stitch: 'sc', on: [0], makes: 1 };
const inc = { stitch: 'sc', on: [0], makes: 2 };
const dec = { stitch: 'sc2tog', on: [0, 1], makes: 1 };
const times = <T>(n: number, ...of: T[]) => Array.from({ length: n }, () => of).flat();

describe('the repeat a line is made of', () => {
  test.each([
    ['a plain round', times(24, sc), [{ stitches: 1, times: 24, makes: 1, rest: 0 }]],
    ['(2 sc, inc) × 6', times(6, sc, sc, inc), [{ stitches: 3, times: 6, makes: 4, rest: 0 }]],
    ['(sc, dec) × 5, 3 sc', [...times(5, sc, dec), sc, sc, sc], [{ stitches: 2, times: 5, makes: 2, rest: 3 }]],
    ['nothing that comes twice', [sc, inc, dec], []],
    ['no stitch at all', [], []],
  ])('of %s', (_what, walk, repeats) => {
    expect(repeatsOf(walk)).toEqual(repeats);
  });
});
