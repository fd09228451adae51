import { useDeferredValue, useMemo } from 'react';
import { type Check, checkPattern, settleChecks } from '#crochet';
import { type LeftCheck, toCheckSource } from '#contract/checks';
import { type Bench } from '../data/bench-types.ts';

/** The automatic checks as they stand while one types. */
export interface PatternChecks {
  /** Worst first. */
  readonly open: readonly Check[];
  readonly advice: readonly Check[];
  readonly left: readonly { readonly check: Check; readonly left: LeftCheck }[];
  /** Of a toy, advice is not shown until somebody asks for it. */
  readonly isToy: boolean;
}

/** Checks the pattern anew after each change, behind the typing: a key press never waits for it. */
export function useChecks({ pattern, count }: Pick<Bench, 'pattern' | 'count'>): PatternChecks {
  const now = useMemo(() => ({ pattern, count }), [pattern, count]);
  const seen = useDeferredValue(now);
  return useMemo(() => {
    const { checks, isToy } = checkPattern(toCheckSource(seen.pattern), seen.count);
    const { open, settled } = settleChecks(checks, seen.pattern.leftChecks);
    return {
      open: open.filter(({ isAdvice }) => !isAdvice),
      advice: open.filter(({ isAdvice }) => isAdvice),
      left: settled,
      isToy,
    };
  }, [seen]);
}

const lines = (n: number) => `${n} ${n === 1 ? 'line' : 'lines'}`;
const checks = (n: number) => `${n} ${n === 1 ? 'check' : 'checks'}`;

/** "2 lines and 3 checks": what is still open of a pattern; empty where nothing is. A wrong total is its line's. */
export function openWords(openLines: number, { open }: Pick<PatternChecks, 'open'>): string {
  const openChecks = open.filter(({ kind }) => kind !== 'total-wrong').length;
  return [openLines > 0 && lines(openLines), openChecks > 0 && checks(openChecks)].filter(Boolean).join(' and ');
}
