/** Width and height of one stitch, measured by the maker on a swatch, in millimetres. */
export interface Sample {
  readonly width: number;
  readonly height: number;
}

/** The outline of a piece worked in rounds. */
export interface Profile {
  /** Radius of each round, in millimetres. */
  readonly radii: readonly number[];
  /** Height of each round above the first, in millimetres. */
  readonly heights: readonly number[];
  /** Rounds (index from 0) that widen by more than a stitch is high. */
  readonly ruffles: readonly number[];
  /** Rounds that narrow by more than a stitch is high. */
  readonly gathers: readonly number[];
}

/**
 * The silhouette that totals make: a round of n stitches has the radius n·w / 2π, and between rounds the work rises by
 * √(h² − Δr²), or not at all where it widens or narrows by more than h.
 *
 * @example silhouetteOf([6, 6], { width: 4, height: 5 }).heights // [0, 5]
 */
export function silhouetteOf(totals: readonly number[], { width, height }: Sample): Profile {
  const radii = totals.map((n) => (n * width) / (2 * Math.PI));
  const heights: number[] = [];
  const ruffles: number[] = [];
  const gathers: number[] = [];
  let at = 0;
  radii.forEach((radius, i) => {
    const before = radii[i - 1];
    if (before !== undefined) {
      const step = radius - before;
      if (step > height) ruffles.push(i);
      if (-step > height) gathers.push(i);
      at += Math.sqrt(Math.max(0, height * height - step * step));
    }
    heights.push(at);
  });
  return { radii, heights, ruffles, gathers };
}
