import { STEPS } from './lexicon/steps.ts';
import { type Sentences } from './sentences.ts';
import { type Token } from './tokens.ts';

/** Something done that adds no stitch, where it is said. */
export interface SpokenStep {
  readonly topic: string;
  readonly at: number;
  /** Where the doing itself is named: what stands before it in the sentence may still be the line's total. */
  readonly trigger: number;
  readonly end: number;
}

const AHEAD = 12;
/** Without full stops a step goes on for about so many words after the last that names a doing. */
const SPOKEN_LENGTH = 9;
/** Pulling a ring shut belongs to the first round. */
const RING_REACH = 14;
const IDLE = /\b(?:if|before|don't|do not|dinnae|never|when|unless|because|you can fasten|instead of|later|until|no)\b/;
const LEADS = '~&vaOXIGrpw';

/** Finds the steps among the tokens. Clauses of one kind that follow each other are one step. */
export function findSteps(
  tokens: readonly Token[],
  sentences: Sentences,
  skipped: readonly boolean[],
): readonly SpokenStep[] {
  const found: SpokenStep[] = [];
  for (let i = 0; i < tokens.length; i++) {
    if (skipped[i] === true || ',.|'.includes(tokens[i]!.kind)) continue;
    const topic = topicAt(tokens, i, sentences);
    if (topic === null || isIdle(tokens, i, sentences)) continue;
    if (topic === 'finish' && tokens.slice(Math.max(0, i - RING_REACH), i).some((token) => token.kind === 'V'))
      continue;
    const last = found.at(-1);
    if (last !== undefined && belongsTo(last, topic, i, sentences)) {
      found[found.length - 1] = { ...last, end: i + 1 };
      continue;
    }
    found.push({ topic, at: startOfStep(tokens, i, sentences), trigger: i, end: i + 1 });
  }
  return found;
}

/** The token after a step's words: its whole sentence, as far as nothing else begins before. */
export function endOfStep(step: SpokenStep, next: number, sentences: Sentences): number {
  const sentence = sentences.endOf[step.end - 1]!;
  const spoken = sentences.isPunctuated ? sentence : Math.min(sentence, step.end + SPOKEN_LENGTH);
  return Math.max(step.trigger + 1, Math.min(next, Math.max(step.end, spoken)));
}

/** Where the sentence that tells a step begins: with its doings, not with stitches or another step before them. */
export function startOfTelling(
  tokens: readonly Token[],
  sentences: Sentences,
  step: SpokenStep,
  after: number,
): number {
  const start = sentences.startOf[step.at]!;
  const isOwn = start >= after && !tokens.slice(start, step.at).some((token) => 'SPDU'.includes(token.kind));
  return sentences.isPunctuated && isOwn ? start : step.at;
}

/** A clause of the same kind close by, or any in the same sentence, goes on with the step before it. */
function belongsTo(last: SpokenStep, topic: string, i: number, sentences: Sentences): boolean {
  const sameSentence = sentences.startOf[i] === sentences.startOf[last.at];
  if (sentences.isPunctuated && sameSentence) return true;
  return last.topic === topic && (sameSentence || i - last.end < 16);
}

function topicAt(tokens: readonly Token[], i: number, sentences: Sentences): string | null {
  // "in the next stitch it's …" is a place
  if (tokens[i]!.kind === 'G' && 'XOLNEMIaS'.includes(tokens[i - 1]?.kind ?? '.')) return null;
  const ahead: string[] = [];
  for (let j = i; j < Math.min(tokens.length, sentences.endOf[i]!, i + AHEAD); j++) {
    if (!',.|'.includes(tokens[j]!.kind)) ahead.push(tokens[j]!.text);
  }
  const text = ahead.join(' ');
  const bare = text.replace(/^(?:you|we|i) (?=put|tie|sew|cut)/, '');
  return STEPS.find(({ words }) => words.test(bare))?.topic ?? null;
}

function isIdle(tokens: readonly Token[], i: number, sentences: Sentences): boolean {
  if (tokens[i - 1]?.text === 'to') return true;
  const start = Math.max(sentences.startOf[i]!, i - 6);
  return IDLE.test(
    tokens
      .slice(start, i)
      .map((token) => token.text)
      .join(' '),
  );
}

function startOfStep(tokens: readonly Token[], i: number, sentences: Sentences): number {
  const start = sentences.startOf[i]!;
  if (sentences.isPunctuated && i - start < 7) return start;
  let at = i;
  while (at > start && i - at < 5 && LEADS.replace('w', '').includes(tokens[at - 1]!.kind)) at -= 1;
  return at;
}
