import type { Stitch } from '../count/result.ts';
import type { Repeat } from './document.ts';

/** Longest stretch that is looked for as a repeat; beyond it a maker counts by other means. */
const LONGEST = 60;

function alike(a: Stitch | undefined, b: Stitch | undefined): boolean {
  if (!a || !b) return false;
  return a.stitch === b.stitch && a.makes === b.makes && a.on.length === b.on.length;
}

/**
 * The repeat a line's work begins with: the shortest stretch that comes again at once and covers the most of the
 * line. Empty where nothing comes twice; a plain round is one stitch many times.
 *
 * @example walk of `(2 sc, inv dec) ×6` → [{ stitches: 3, times: 6, makes: 3, rest: 0 }]
 */
export function repeatsOf(walk: readonly Stitch[]): readonly Repeat[] {
  let best: Repeat | null = null;
  for (let length = 1; length <= Math.min(LONGEST, Math.floor(walk.length / 2)); length++) {
    let same = length;
    while (same < walk.length && alike(walk[same], walk[same - length])) same++;
    const times = Math.floor(same / length);
    const covers = times * length;
    if (times < 2 || (best && covers <= best.stitches * best.times)) continue;
    const makes = walk.slice(0, length).reduce((sum, stitch) => sum + stitch.makes, 0);
    best = { stitches: length, times, makes, rest: walk.length - covers };
  }
  return best && best.makes > 0 ? [best] : [];
}
