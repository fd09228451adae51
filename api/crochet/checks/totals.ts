import { placeTotal } from '../language/place-total.ts';
import { printTotals } from '../language/totals-text.ts';
import { type Totals } from '../language/tree.ts';
import { type LineCount } from '../count/result.ts';
import { type Check, type CheckChange, finding, many } from './check.ts';
import { isCounted, refsOf, type Scan, type ScanLine } from './scan.ts';

/** What a line comes to, one figure a size, by the kinds that its given total names; null where that is not known. */
function workedOut(count: LineCount, given: Totals | null): Totals | null {
  if (count.count === null || count.sizes.some((size) => size.count === null)) return null;
  const kinds = Object.keys(given ?? {}).filter((kind) => kind !== 'sts');
  if (kinds.length > 0) {
    return Object.fromEntries(
      kinds.map((kind) => [kind, [count.made[kind] ?? 0, ...count.sizes.map((size) => size.made[kind] ?? 0)]]),
    );
  }
  return { sts: [count.count, ...count.sizes.map((size) => size.count!)] };
}

/** Writes a total where the line has its own, in the text or beside it. */
function write({ line, count }: ScanLine, totals: Totals): CheckChange {
  const span = count.writtenSpan;
  const fields = span ? { text: placeTotal(line.text, span, printTotals(totals)), written: null } : { written: totals };
  return { op: 'edit', row: 'line', id: line.id, fields };
}

/** A plain number beside chains and spaces could be meant in another way than its neighbours'. */
const isPlain = ({ count }: ScanLine): boolean =>
  Object.keys(count.made).every((kind) => !kind.startsWith('ch') && !kind.endsWith('sp'));

/**
 * Rounds and rows without a written total. A total that nobody spoke is never asked for, and a line that is not
 * understood or does not fit has no figure to write, so it is not named here.
 */
export function checkMissingTotals(scan: Scan): Check[] {
  const without = scan.lines.filter(
    ({ line, count }) =>
      isCounted(line) &&
      count.written === null &&
      count.count !== null &&
      (count.verdict === 'agrees' || count.verdict === 'no-total'),
  );
  if (without.length === 0) return [];
  const changes = without.flatMap((one) => {
    const totals = isPlain(one) ? workedOut(one.count, null) : null;
    return totals ? [write(one, totals)] : [];
  });
  const [only] = without;
  const figure = without.length === 1 && only ? String(only.count.count) : null;
  return [
    finding('total-missing', `${many(without.length, 'has', 'have')} no written total.`, {
      refs: refsOf(without),
      mend:
        changes.length === 0
          ? null
          : {
              words: figure ? `Write (${figure})` : 'Write all totals',
              done: changes.length === 1 ? 'Total written' : `${changes.length} totals written`,
              changes,
            },
    }),
  ];
}

/** Written totals that the work, and what was said where something was, do not bear out. A line left with a reason is settled. */
export function checkWrongTotals(scan: Scan): Check[] {
  return scan.lines.flatMap((one) => {
    const { line, count, ref } = one;
    const isOdd = isCounted(line) && count.verdict === 'differs' && count.odd.includes('written');
    if (!isOdd || !count.written || line.putAsideReason !== null) return [];
    const totals = workedOut(count, count.written);
    const bearsOut = !count.odd.includes('said');
    if (!totals) return [];
    const right = printTotals(totals, scan.source.terms);
    return [
      finding('total-wrong', `says ${printTotals(count.written, scan.source.terms)} and works out to ${right}.`, {
        subject: line.id,
        refs: [ref],
        mend: bearsOut
          ? { words: `Make it (${right})`, done: `${ref.name} says ${right}`, changes: [write(one, totals)] }
          : null,
      }),
    ];
  });
}
