import { type Judged } from './judge.ts';
import { type Verdict } from './result.ts';

/** The plain words for a line that does not come out: `Needs 30, there are 24.` */
export function messageOf(judged: Judged, verdict: Verdict): string | null {
  const { work } = judged;
  if (verdict === 'does-not-fit') {
    if (work.short > 0 && work.base !== null) return `Needs ${work.base + work.short}, there are ${work.base}.`;
    if (work.over > 0 && work.base !== null) return `${work.base - work.over} used, ${work.over} left over.`;
    return 'There are more stitches here than a line can have.';
  }
  if (verdict === 'differs') return `Works out to ${wordsOf(judged)}.`;
  return null;
}

/** What was made, in figures: by colour where the line is told in colours. */
function wordsOf({ work }: Judged): string {
  const colours = Object.entries(work.tally.byColour);
  return colours.length > 0
    ? colours.map(([colour, n]) => `${String(n)} ${colour}`).join(', ')
    : String(work.tally.sts);
}
