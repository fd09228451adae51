import type { Knex } from 'knex';
import { checkPattern, settleChecks, type Check } from '#crochet';
import { toCheckSource, type CheckAnswer, type CheckList } from '#contract/checks';
import type { Person } from '../../http/session.ts';
import { findSeenPattern, readPatternContent, type PatternContent } from './document.service.ts';
import { AppError } from '../../http/problem.ts';

const toAnswer = (check: Check, leftBecause: string | null): CheckAnswer => ({
  kind: check.kind,
  subject: check.subject,
  isAdvice: check.isAdvice,
  refs: [...check.refs],
  sentence: check.sentence,
  says: check.says,
  leftBecause,
});

/** The automatic checks of a pattern as they stand: open, left as they are, and advice. The bench finds the same as one types. */
export function listChecks(content: PatternContent): CheckList {
  const { checks } = checkPattern(toCheckSource(content));
  const { open, settled } = settleChecks(checks, content.leftChecks);
  return {
    open: open.filter(({ isAdvice }) => !isAdvice).map((check) => toAnswer(check, null)),
    left: settled.map(({ check, left }) => toAnswer(check, left.reason)),
    advice: open.filter(({ isAdvice }) => isAdvice).map((check) => toAnswer(check, null)),
  };
}

/**
 * The automatic checks of a pattern, for its studio.
 * @throws AppError not-found
 */
export async function readChecks(db: Knex, who: Person, patternId: string): Promise<CheckList> {
  await findSeenPattern(db, who, patternId);
  const content = await readPatternContent(db, patternId);
  if (!content) throw new AppError('not-found');
  return listChecks(content);
}
