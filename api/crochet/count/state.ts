import { type Totals } from '../language/tree.ts';
import { MOST, NOTHING, PLAIN, plainLeft, type Left, type Made } from './places.ts';
import { type Verdict } from './result.ts';

/** What is handed from line to line of a piece. One `Left` a size. */
export interface State {
  readonly lefts: readonly Left[];
  /** The line before, whose total may stand in for what it made. */
  readonly before: Before | null;
  readonly rows: number;
  readonly stitch: string;
  /** Number of the last numbered line. */
  readonly number: number;
}

export interface Before {
  readonly id: string;
  readonly verdict: Verdict;
  readonly written: Totals | null;
  readonly said: Totals | null;
}

export const startState = (sizes: number, base: number | null): State => ({
  lefts: Array.from({ length: sizes }, () => (base === null ? NOTHING : plainLeft(base))),
  before: null,
  rows: 0,
  stitch: 'sc',
  number: 0,
});

/** Places as a total tells them: plain stitches, and spaces spread among them. */
export function leftOfTotals(totals: Totals, index: number): Left | null {
  let sts = 0;
  const spaces: number[] = [];
  let known = false;
  for (const [kind, figures] of Object.entries(totals)) {
    const n = figures[index] ?? figures[0];
    if (n === undefined || n > MOST) continue;
    const length = /^ch-(\d+) sp$/.exec(kind);
    if (length || kind === 'sp') for (let i = 0; i < n; i += 1) spaces.push(length ? Number(length[1]) : 1);
    else if (kind === 'inc' || kind === 'dec' || kind === 'group' || kind === 'corner' || kind === 'shell') continue;
    else {
      sts += n;
      known = true;
    }
  }
  if (!known && spaces.length === 0) return null;
  const left = plainLeft(sts);
  if (spaces.length === 0) return left;
  const made: Made[] = [];
  const each = sts / spaces.length;
  spaces.forEach((chains, i) => {
    for (let k = Math.floor(i * each); k < Math.floor((i + 1) * each); k += 1) made.push({ ...PLAIN, on: [k] });
    made.push({ ...PLAIN, kind: 'chs', stitch: 'ch', chains });
  });
  return { ...left, made, shape: 'ring' };
}
