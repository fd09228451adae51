import { describe, expect, test } from 'vitest';
import { flatnessOf, silhouetteOf, yarnFor } from '#crochet/shape';

describe('the shape that totals make', () => {
  test('straight rounds rise by the height of a stitch', () => {
    const { radii, heights } = silhouetteOf([12, 12, 12], { width: 4, height: 5 });
    expect(radii[0]).toBeCloseTo((12 * 4) / (2 * Math.PI));
    expect(heights).toEqual([0, 5, 10]);
  });

  test('a round that widens by more than a stitch is high ruffles, and rises nothing', () => {
    const { ruffles, heights } = silhouetteOf([6, 30], { width: 4, height: 5 });
    expect(ruffles).toEqual([1]);
    expect(heights).toEqual([0, 0]);
  });

  test('a round that narrows so gathers', () => {
    expect(silhouetteOf([30, 6], { width: 4, height: 5 }).gathers).toEqual([1]);
  });

  test('six more a round lie flat where a stitch is 0.955 as high as wide', () => {
    expect(flatnessOf([6, 12, 18], { width: 1, height: 0.955 }).map(({ lies }) => lies)).toEqual(['flat', 'flat']);
    expect(flatnessOf([6, 8], { width: 1, height: 0.955 })[0]?.lies).toBe('cups');
    expect(flatnessOf([6, 18], { width: 1, height: 0.955 })[0]?.lies).toBe('ruffles');
  });

  test('yarn is reckoned from samples, and what has none is named', () => {
    const use = yarnFor({ sc: 100, dc: 4 }, [{ stitch: 'sc', stitches: 20, length: 600 }], 150);
    expect(use).toEqual({ length: 3150, without: ['dc'] });
  });
});
