/** What a maker measured: so many stitches of one kind took so much yarn. */
export interface YarnSample {
  readonly stitch: string;
  readonly stitches: number;
  /** Yarn used, in millimetres. */
  readonly length: number;
}

export interface YarnUse {
  /** Yarn for the stitches that have a sample, and the ends, in millimetres. */
  readonly length: number;
  /** Kinds that were made and have no sample: they are not in the length. */
  readonly without: readonly string[];
}

/**
 * Yarn for what was made, from the maker's own samples alone. A kind without one is not guessed but named.
 *
 * @param made stitches by kind.
 * @param ends tails and joins as the maker sets them, in millimetres.
 */
export function yarnFor(made: Readonly<Record<string, number>>, samples: readonly YarnSample[], ends = 0): YarnUse {
  let length = ends;
  const without: string[] = [];
  for (const [stitch, n] of Object.entries(made)) {
    const sample = samples.find((one) => one.stitch === stitch && one.stitches > 0);
    if (sample) length += (n * sample.length) / sample.stitches;
    else if (n > 0) without.push(stitch);
  }
  return { length, without };
}
