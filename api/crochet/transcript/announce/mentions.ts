import { type Sentences } from '../sentences.ts';
import { type Token } from '../tokens.ts';
import { type NumberList } from './number-list.ts';

const MENTIONING = new Set([
  'before',
  'like',
  'as',
  'than',
  'from',
  'since',
  'during',
  'of',
  'finished',
  'recap',
  'through',
  'between',
  'in between',
  'at',
  'when',
  'where',
  'while',
  'around',
  'above',
  'below',
  'under',
  'under round',
  'after',
  'same',
]);
const REACHING = new Set([
  'until',
  'till',
  'to the end of',
  'finish with',
  'finish on',
  'up to',
  'get to',
  'gets you to',
  'end with',
  'takes you to',
  'that takes you',
]);
const PAST = new Set(['was', 'were', 'had', 'did']);

/**
 * Whether a numbered round is only spoken of: a recap, a look back or ahead, a place on the work.
 * @returns `until` where it is the last line that others are worked up to, `mention` where it is just spoken of, or null
 */
export function isMention(
  tokens: readonly Token[],
  i: number,
  { from, to, end }: NumberList,
  sentences: Sentences,
): 'until' | 'mention' | null {
  let j = i - 1;
  while (j >= 0 && isBeside(tokens[j]!) && !MENTIONING.has(tokens[j]!.text) && i - j < 4) j -= 1;
  const before = j >= sentences.startOf[i]! ? tokens[j] : undefined;
  if (PAST.has(tokens[end]?.text ?? '') || /^(?:finished|done|over|behind)$/.test(tokens[end]?.text ?? ''))
    return 'mention';
  if (before === undefined || (from < to && tellsRange(tokens, j))) return null;
  if (REACHING.has(before.text) || (before.text === 'with' && /^(?:finish|done|end)$/.test(tokens[j - 1]?.text ?? '')))
    return 'until';
  if (before.text === 'of' && /^(?:end|finish)$/.test(tokens[j - 1]?.text ?? '')) return 'until';
  if (PAST.has(before.text) || (before.kind !== 'N' && PAST.has(tokens[j - 1]?.text ?? ''))) return 'mention';
  if (before.kind === 'b' || before.kind === 'R' || before.kind === 'n' || MENTIONING.has(before.text))
    return 'mention';
  return null;
}

/** `before your round five`: what may stand between; a pronoun belongs to what was said before it. */
function isBeside({ kind, text }: Token): boolean {
  return kind === '~' || (kind === 'a' && !/^(?:it|them|me|us|you|he|she|they|we|i|there|here)$/.test(text));
}

/** `from round six to round ten`, `on each of rows two to four`, `for every one of rounds 5-8`: all of them are told here. */
function tellsRange(tokens: readonly Token[], j: number): boolean {
  return tokens[j]!.text === 'from' || (tokens[j]!.text === 'of' && tokens[j - 1]?.kind === 'E');
}
