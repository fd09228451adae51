import type { Stitch } from '../count/result.ts';
import type { EditionPiece, Repeat, Slip } from './document.ts';

interface Line {
  readonly walk: readonly Stitch[];
  readonly repeats: readonly Repeat[];
  readonly count: number | null;
}

const decreases = (stitch: Stitch) => stitch.on.length > 1 && stitch.makes === 1;
const increases = (stitch: Stitch) => stitch.on.length === 1 && stitch.makes > 1;

/**
 * What most often went wrong, for the differences that have a likely cause: a shaping stitch worked plain, the end
 * of the round, a repeat too few or too many. One cause a difference, the likeliest first; none where the line's
 * stitches are not known.
 *
 * @example R9 `(2 sc, inv dec) ×6`, one too many → "Most often one decrease was worked as two stitches."
 */
export function slipsOf(line: Line, worked: EditionPiece['worked']): readonly Slip[] {
  if (line.count === null || line.walk.length === 0) return [];
  const found = new Map<number, string>();
  const offer = (difference: number, text: string) => {
    if (difference !== 0 && !found.has(difference)) found.set(difference, text);
  };
  const dec = line.walk.find(decreases);
  const inc = line.walk.find(increases);
  if (dec) offer(dec.on.length - 1, `Most often one decrease was worked as ${dec.on.length} stitches.`);
  if (inc) offer(1 - inc.makes, 'Most often one increase was worked as a single stitch.');
  if (worked === 'spiral') {
    offer(-1, 'Most often the last stitch before the marker was left out.');
    offer(1, 'Most often the round ran one stitch past the marker.');
  } else if (worked === 'joined') {
    offer(1, 'Most often the joining slip stitch was worked as a stitch.');
    offer(-1, 'Most often the stitch at the join was left out.');
  } else {
    offer(-1, 'Most often the last stitch of the row was left out.');
    offer(1, 'Most often the turning chain was worked as a stitch.');
  }
  const [repeat] = line.repeats;
  if (repeat && repeat.stitches > 1) {
    offer(-repeat.makes, 'Most often one repeat was left out.');
    offer(repeat.makes, 'Most often one repeat was worked once too often.');
  }
  return [...found].map(([difference, text]) => ({ difference, text })).sort((a, b) => a.difference - b.difference);
}
