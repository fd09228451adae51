import { type Sentences } from '../sentences.ts';
import { type Token } from '../tokens.ts';
import { type Candidate } from './candidate.ts';
import { announcementStart, startsClause } from './candidates.ts';

/** `in the next one, a single`: a place, and no line. */
function isPlace(tokens: readonly Token[], i: number): boolean {
  return tokens[i - 1]?.kind === 'I' || (tokens[i - 1]?.kind === 'a' && tokens[i - 2]?.kind === 'I');
}

const LAP_REACH = 5;
const LAP_STRENGTH = 1.5;

/** `the next time around`, `the last time you come around`: the time is a round. */
function isLap(tokens: readonly Token[], i: number): boolean {
  const next = tokens[i + 1];
  if (next?.kind === 't' && /^time (?:a|r)/.test(next.text)) return true;
  return next?.text === 'time' && tokens.slice(i + 2, i + LAP_REACH).some((one) => one.kind === 'A');
}

/** `Then you go once around in single crochet`. */
function goesAround(tokens: readonly Token[], i: number): boolean {
  const isOnce = tokens[i - 1]?.kind === 't' && tokens[i - 1]!.value === 1;
  return isOnce && tokens[i]!.text.startsWith('around') && tokens[i - 2]?.kind === 'v';
}

/** `Next, increase in each`, `and the one after that is …`, `and around once more`, `the next time you come around`. */
export function oneMore(tokens: readonly Token[], i: number, sentences: Sentences): Candidate[] {
  const token = tokens[i]!;
  const next = tokens[i + 1];
  const at = announcementStart(tokens, i, sentences);
  const base = { kind: 'line' as const, at, end: i + 1, mark: i, unit: null, needs: null };
  const lines = { type: 'next' as const, many: 1 };
  const isTime = 'XL'.includes(token.kind) && isLap(tokens, i) && (token.kind === 'X' || startsClause(tokens, i));
  if (isTime || (token.kind === 'A' && goesAround(tokens, i))) return [{ ...base, lines, strength: LAP_STRENGTH }];
  const isAfter = token.text === 'one after that' && next?.kind === 'v';
  const isNext =
    token.kind === 'X' && !isPlace(tokens, i) && startsClause(tokens, i) && (next?.kind === ',' || next?.kind === 'v');
  const isAround = token.kind === 'A' && /^(?:once|one|again)/.test(next?.text ?? '') && startsClause(tokens, i);
  return isNext || isAround || isAfter ? [{ ...base, lines, strength: 0.7 }] : [];
}

/** `repeat row two, two more times`, `until there are six of them`. */
export function repeatCandidates(tokens: readonly Token[], i: number, sentences: Sentences): Candidate[] {
  const start = Math.max(sentences.startOf[i]!, i - 14);
  const before = tokens.slice(start, i);
  const base = {
    kind: 'line' as const,
    at: announcementStart(tokens, start, sentences),
    end: i + 1,
    mark: start,
    unit: null,
    needs: null,
  };
  const number = before.findLast((one) => one.kind === 'N');
  if (number === undefined) return [];
  const hasLine = before.some((one, n) => one.kind === 'U' && before.slice(0, n).some((early) => early.kind === 'R'));
  if (tokens[i]!.kind === 't') {
    const isMore = before.at(-1)?.kind === 'm';
    const repeat = before.findIndex((one) => one.kind === 'R');
    if (!isMore || !hasLine || repeat < 0) return [];
    const at = announcementStart(tokens, start + repeat, sentences);
    return [{ ...base, at, lines: { type: 'next', many: Number(number.value) }, strength: 1.8 }];
  }
  const until = before.findIndex((one) => one.text === 'until' || one.text === 'till');
  if (until < 0) return [];
  const deed = before.findLastIndex((one) => one.kind === 'R');
  const at = deed < 0 ? base.at : announcementStart(tokens, start + deed, sentences);
  return [{ ...base, at, lines: { type: 'until', last: Number(number.value) }, strength: 1.2 }];
}
