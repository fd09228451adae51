import { type PatternCount } from '../count/result.ts';
import { countPattern } from '../count/pattern.ts';
import { checkAbbreviations, checkUnexplainedStitches } from './abbreviations.ts';
import { adviseSheet, isToy } from './advice.ts';
import { checkAttached } from './attached.ts';
import { checkReworded, checkUses } from './called-cautions.ts';
import { type Check, CHECK_KINDS } from './check.ts';
import { checkClosing } from './closing.ts';
import { checkColours } from './colours.ts';
import { checkChapters, checkMarkOrder, checkMarksBeyond, checkMissingMarks } from './marks.ts';
import { checkMissingMaterials, checkUnusedMaterials } from './materials.ts';
import { checkDecreaseNames, checkStitchSpelling } from './naming.ts';
import { checkNeeded } from './needed.ts';
import { checkNumbers } from './numbers.ts';
import { checkRepeatEnds } from './repeat-end.ts';
import { scanPattern, type Scan } from './scan.ts';
import { adviseShape } from './shape-advice.ts';
import { type CheckSource } from './source.ts';
import { checkTerms } from './terms-mixed.ts';
import { checkTotalBrackets } from './total-brackets.ts';
import { checkMissingTotals, checkWrongTotals } from './totals.ts';

const CHECKS: readonly ((scan: Scan) => Check[])[] = [
  checkNumbers,
  checkWrongTotals,
  checkMissingTotals,
  checkTotalBrackets,
  checkRepeatEnds,
  checkClosing,
  checkAttached,
  checkTerms,
  checkMissingMaterials,
  checkUnusedMaterials,
  checkColours,
  checkNeeded,
  checkUses,
  checkReworded,
  checkUnexplainedStitches,
  checkAbbreviations,
  checkDecreaseNames,
  checkStitchSpelling,
  checkMissingMarks,
  checkMarkOrder,
  checkMarksBeyond,
  checkChapters,
  adviseShape,
  adviseSheet,
];

const RANK = new Map(CHECK_KINDS.map((kind, i) => [kind, i]));

export interface Checked {
  /** Worst first; of one kind in the order of the pattern. Advice comes last. */
  readonly checks: readonly Check[];
  /** Stuffed or with eyes: then advice is not shown until it is asked for. */
  readonly isToy: boolean;
}

/**
 * The automatic checks over a whole pattern. Pure, and in time that grows with the pattern's length; it never throws on
 * what a pattern says. A pattern without a line has nothing to check.
 *
 * @param counted the count of the same source, where it is at hand; else it is counted here
 */
export function checkPattern(source: CheckSource, counted: PatternCount = countPattern(source)): Checked {
  const scan = scanPattern(source, counted);
  if (scan.lines.length === 0) return { checks: [], isToy: false };
  const checks = CHECKS.flatMap((check) => check(scan)).sort((a, b) => RANK.get(a.kind)! - RANK.get(b.kind)!);
  return { checks, isToy: isToy(scan) };
}

/** A check that somebody left as it is. */
export interface LeftCheck {
  readonly kind: string;
  readonly subject: string;
  /** What the check said then. */
  readonly says: string;
}

/** The checks that are still open, and those that were left; one whose words changed since is open again. */
export function settleChecks<L extends LeftCheck>(
  checks: readonly Check[],
  left: readonly L[],
): { readonly open: readonly Check[]; readonly settled: readonly { readonly check: Check; readonly left: L }[] } {
  const known = new Map(left.map((one) => [`${one.kind} ${one.subject}`, one]));
  const open: Check[] = [];
  const settled: { check: Check; left: L }[] = [];
  for (const check of checks) {
    const one = known.get(`${check.kind} ${check.subject}`);
    if (one?.says === check.says) settled.push({ check, left: one });
    else open.push(check);
  }
  return { open, settled };
}
