import { type Totals } from '../language/tree.ts';
import { type Tally } from './tally.ts';

export type CountedWith = 'stitches' | 'chains' | 'spaces';

/** How a total compares with what was made. `ways`: in which senses a plain number comes out right. */
export interface Compared {
  readonly equal: boolean;
  /** False where the total counts something that cannot be compared (petals, points). */
  readonly comparable: boolean;
  readonly ways: readonly CountedWith[];
}

/** Whether a plain number under the line can mean more than its stitches. */
export const hasChains = (tally: Tally): boolean => tally.chains > 0 || tally.spaces > 0;

/** Senses in which a plain number equals what was made: stitches, stitches and chains, stitches and spaces. */
function waysOf(n: number, tally: Tally, sense: CountedWith | null): CountedWith[] {
  const ways: CountedWith[] = [];
  if (n === tally.sts) ways.push('stitches');
  if (tally.chains > 0 && (n === tally.sts + tally.chains || n === tally.sts + tally.chainsOutside))
    ways.push('chains');
  if (tally.spaces > 0 && n === tally.sts + tally.spaces) ways.push('spaces');
  return sense === null || !hasChains(tally) ? ways : ways.filter((way) => way === sense);
}

/**
 * Compares a total kind by kind, for one size (or one round).
 *
 * @param sense how a plain number is meant in this piece; null where that is open. Beside figures for other kinds it
 * says the stitches.
 */
export function compareTotals(totals: Totals, tally: Tally, index: number, sense: CountedWith | null): Compared {
  let equal = true;
  let comparable = false;
  let ways: CountedWith[] = [];
  const kinds = Object.keys(totals);
  if (isStartApart(totals, tally, index)) return { equal: true, comparable: true, ways: [] };
  const namesChains = kinds.some((kind) => kind === 'ch' || kind.endsWith('sp'));
  for (const [kind, figures] of Object.entries(totals)) {
    const n = figures[index] ?? figures[0];
    if (n === undefined) continue;
    if (kind === 'sts') {
      comparable = true;
      if (namesChains) {
        if (n !== tally.sts) equal = false;
        continue;
      }
      ways = waysOf(n, tally, sense);
      if (ways.length === 0) equal = false;
      continue;
    }
    const worked = figureOf(kind, tally, kinds.length === 1);
    if (worked === null) continue;
    if (worked.loose && !worked.figures.includes(n)) continue;
    comparable = true;
    if (!worked.figures.includes(n)) equal = false;
  }
  return { equal: equal && comparable, comparable, ways };
}

/** `35 dc + ch 3`: the starting chain that counts as a stitch is told apart from the others. */
function isStartApart(totals: Totals, { start, chains, sts, byStitch }: Tally, index: number): boolean {
  if (start === null || chains > 0 || Object.keys(totals).length !== 2) return false;
  const figure = (kind: string) => totals[kind]?.[index] ?? totals[kind]?.[0];
  const isAllOne = byStitch[start.stitch] === sts;
  return isAllOne && figure('ch') === start.chains && figure(start.stitch) === sts - 1;
}

/** What was made of a kind; several figures where it may be counted in several ways. Null: not to be compared. */
function figureOf(kind: string, tally: Tally, alone: boolean): { figures: readonly number[]; loose: boolean } | null {
  const strict = (...figures: number[]) => ({ figures, loose: false });
  if (kind === 'ch') return strict(tally.chains, tally.chainsOutside);
  if (kind === 'sp' || kind === 'gap') return strict(tally.spaces);
  const space = /^ch-(\d+) sp$/.exec(kind);
  if (space) return strict(tally.byLength[Number(space[1])] ?? 0);
  if (kind === 'inc' || kind === 'dec' || kind === 'invdec') return null;
  if (kind === 'corner') return tally.spaces === 4 ? strict(4) : null;
  if (kind === 'group' || kind === 'shell' || kind === 'vst')
    return { figures: [tally.groups, tally.spaces], loose: true };
  if (/^[A-Z]$/.test(kind)) {
    // A line that names no colours is all of one.
    const isPlain = alone && Object.keys(tally.byColour).length === 0;
    return strict(isPlain ? tally.sts : (tally.byColour[kind] ?? 0));
  }
  const own = tally.byStitch[kind];
  if (own !== undefined) {
    // `(24 sc)` under a line of several kinds may say all of its stitches.
    return alone && own !== tally.sts ? { figures: [own, tally.sts], loose: false } : strict(own);
  }
  return alone ? strict(tally.sts) : strict(0);
}
