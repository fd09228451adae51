import { CLEARLY, flatnessOf } from '../shape/flatness.ts';
import { type Check, finding, listed, many } from './check.ts';
import { gaugeOf } from './gauge.ts';
import { isCounted, refsOf, type Scan, type ScanLine } from './scan.ts';

/** A round with its total; each round of a range stands for itself. */
interface Total {
  readonly at: ScanLine;
  readonly n: number;
}

/** No drawing and no piece has more rounds than a sheet can tell; a longer range adds nothing, since it is even. */
const LONGEST = 60;

/** The totals of a piece round by round, until one is not known. */
function totalsOf(lines: readonly ScanLine[]): Total[] {
  const totals: Total[] = [];
  for (const at of lines) {
    if (!isCounted(at.line)) continue;
    const { count, line } = at;
    if (count.count === null || count.verdict === 'unread' || count.verdict === 'does-not-fit') break;
    const rounds = count.rounds?.map((round) => round.count);
    const times = line.from !== null && line.to !== null ? Math.min(LONGEST, line.to - line.from + 1) : 1;
    for (const n of rounds ?? Array.from({ length: Math.max(1, times) }, () => count.count)) {
      if (n === null) return totals;
      totals.push({ at, n });
    }
  }
  return totals;
}

const rounded = (n: number) => String(Math.round(n * 10) / 10);

/** A piece that only grows, round after round, is meant to lie flat. */
const isFlat = (totals: readonly Total[]): boolean =>
  totals.length > 3 && totals.every(({ n }, i) => i === 0 || n > totals[i - 1]!.n);

/**
 * What the totals make of a round piece by the maker's own gauge: a round that widens by more than lies flat ruffles,
 * one that narrows by more gathers, and a flat piece that widens clearly less cups. Always advice.
 */
export function adviseShape(scan: Scan): Check[] {
  const sample = gaugeOf(scan.source.details.gauge);
  if (!sample) return [];
  return scan.pieces.flatMap(({ piece, lines }) => {
    if (piece.worked === 'rows') return [];
    const totals = totalsOf(lines);
    const flatness = flatnessOf(
      totals.map(({ n }) => n),
      sample,
    );
    const flat = isFlat(totals);
    const [ruffles, gathers, cups]: [Set<ScanLine>, Set<ScanLine>, Set<ScanLine>] = [new Set(), new Set(), new Set()];
    flatness.forEach(({ grown, ideal, lies }, i) => {
      const { at } = totals[i + 1]!;
      if (lies === 'ruffles') ruffles.add(at);
      else if (-grown > ideal / CLEARLY) gathers.add(at);
      else if (flat && lies === 'cups') cups.add(at);
    });
    const ideal = flatness[0] ? rounded(flatness[0].ideal) : '';
    const grownAt = (set: ReadonlySet<ScanLine>, sign: 1 | -1) =>
      listed([
        ...new Set(
          flatness.flatMap(({ grown }, i) =>
            set.has(totals[i + 1]!.at) && sign * grown > 0 ? [String(sign * grown)] : [],
          ),
        ),
      ]);
    const advice = (kind: 'ruffles' | 'gathers' | 'cups', at: ReadonlySet<ScanLine>, words: string) =>
      at.size === 0 ? [] : [finding(kind, words, { subject: piece.id, refs: refsOf([...at]) })];
    const by = `about ${ideal} a round lie flat by this gauge`;
    return [
      ...advice(
        'ruffles',
        ruffles,
        `${many(ruffles.size, 'grows', 'grow')} by ${grownAt(ruffles, 1)}; ${by}, so it ruffles.`,
      ),
      ...advice(
        'gathers',
        gathers,
        `${many(gathers.size, 'narrows', 'narrow')} by ${grownAt(gathers, -1)}; ${by}, so it gathers.`,
      ),
      ...advice('cups', cups, `${many(cups.size, 'grows', 'grow')} by ${grownAt(cups, 1)}; ${by}, so it cups.`),
    ];
  });
}
