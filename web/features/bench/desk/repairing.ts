import { useMemo } from 'react';
import { type Repair, repairsFor } from '#crochet';
import { toPatternInput } from '#contract/pattern-input';
import { copyTotals } from '../pattern/copy-totals.ts';
import { lineName } from './line-name.ts';
import { type Desk, lineOf } from './use-desk.ts';

/** The best repair of a line that needs one; none for a line that is well. */
export function useRepair({ counts, pattern }: Desk, lineId: string | null): Repair | null {
  const verdict = lineId ? counts.get(lineId)?.verdict : undefined;
  const needsOne = verdict !== undefined && verdict !== 'agrees' && verdict !== 'no-total';
  return useMemo(
    () => (lineId && needsOne ? (repairsFor(toPatternInput(pattern), lineId)[0] ?? null) : null),
    [pattern, lineId, needsOne],
  );
}

/** Takes a repair; it can be undone like anything typed. */
export function useRepairing(desk: Desk): (repair: Repair) => void {
  return ({ lineId, text, written }) => {
    desk.bench.edit('line', lineId, written === undefined ? { text } : { text, written: copyTotals(written) });
    const line = lineOf(desk, lineId);
    desk.tellDone(`${line ? lineName(line) : 'The line'} set to ${text}`);
  };
}
