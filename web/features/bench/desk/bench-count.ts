import { type LineCount } from '#crochet';
import { type Pattern } from '#contract/patterns';
import { type Line } from '#contract/rows';
import { type VerdictName, VERDICTS } from '../../../parts/verdict-mark.tsx';

export type Counts = ReadonlyMap<string, LineCount>;

/** Lines that are counted: foundations, notes and steps carry no verdict. */
export const isCounted = (kind: string): boolean => kind === 'round' || kind === 'row';

/** How many lines came out how, worst first; verdicts that no line has are left out. */
export function tallyVerdicts(lines: readonly Line[], counts: Counts): { verdict: VerdictName; n: number }[] {
  const verdicts = lines.filter((line) => isCounted(line.kind)).map((line) => counts.get(line.id)?.verdict);
  return VERDICTS.map((verdict) => ({ verdict, n: verdicts.filter((one) => one === verdict).length })).filter(
    ({ n }) => n > 0,
  );
}

const WORTH_A_LOOK: readonly VerdictName[] = ['unread', 'does-not-fit', 'differs', 'no-total'];

/** The next line that wants a look after `fromId`: worst first, in the order of the pattern; round again at the end. */
export function nextToLook(lines: Pattern['lines'], counts: Counts, fromId: string | null): string | null {
  const worth = lines
    .map(({ id, kind }) => ({ id, kind, rank: WORTH_A_LOOK.indexOf(counts.get(id)?.verdict ?? 'agrees') }))
    .filter(({ rank, kind }) => rank >= 0 && isCounted(kind))
    .sort((a, b) => a.rank - b.rank);
  const at = worth.findIndex(({ id }) => id === fromId);
  return worth[(at + 1) % worth.length]?.id ?? null;
}

/** How many rounds or rows a line stands for; 1 where its end is open. */
const roundsOf = ({ from, to }: Pick<Line, 'from' | 'to'>) =>
  from !== null && to !== null && to > from ? to - from + 1 : 1;

/** Stitches of one of a piece, every round of a range counted; null while a round of it cannot be counted. */
export function pieceStitches(lines: readonly Line[], counts: Counts): number | null {
  let sum = 0;
  let any = false;
  for (const line of lines) {
    if (!isCounted(line.kind)) continue;
    const one = counts.get(line.id);
    // Where the work is not understood, what was written or said is still what the next round works into.
    const each = one?.count ?? one?.written?.sts?.[0] ?? one?.said?.sts?.[0];
    if (each === undefined) return null;
    any = true;
    sum += one?.rounds ? one.rounds.reduce((total, round) => total + (round.count ?? each), 0) : each * roundsOf(line);
  }
  return any ? sum : null;
}
