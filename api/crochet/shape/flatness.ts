import { type Sample } from './silhouette.ts';

/** How a flat piece lies after one round. `ideal` is how many stitches more would lie flat. Always advice, never a fault. */
export interface Flatness {
  readonly lies: 'flat' | 'cups' | 'ruffles';
  readonly grown: number;
  readonly ideal: number;
}

/** Short of a tenth of what would lie flat a round clearly cups; a tenth above it ruffles. */
export const CLEARLY = 0.9;

/**
 * How each round of a flat piece lies: n stitches more lie flat when n ≈ 2πh/w. The figure is touchy to h/w.
 *
 * @example flatnessOf([6, 12], { width: 1, height: 0.955 })[0]?.lies === 'flat'
 */
export function flatnessOf(totals: readonly number[], { width, height }: Sample): readonly Flatness[] {
  const ideal = (2 * Math.PI * height) / width;
  return totals.slice(1).map((total, i): Flatness => {
    const grown = total - totals[i]!;
    const lies = grown > ideal / CLEARLY ? 'ruffles' : grown < ideal * CLEARLY ? 'cups' : 'flat';
    return { lies, grown, ideal };
  });
}
