import { type Sentences } from './sentences.ts';
import { type Token } from './tokens.ts';

/** Verbs and little words before a number of pieces: `make two`, `you need seven of them`, `there are four`. */
const MAKING = /\b(?:make|making|makes|need|needs|needing|wants|want|wanting|do|quantity|doing)$/;
const NOT_MAKING = /\b(?:not|no|never|without|don't|can't|won't|cannot|instead|than)\b/;
const BEING = /\b(?:there is|there 's|there are|also|it 's|they 're|is|of which there are also)$/;
const COUNTED_OTHERWISE = 'SGtHZCKPDTNF';
const MEASURE =
  /^(?:millimet|centimet|inch|yard|gram|ounce|minute|ply|hundred|weight|half|color|colour|ball|skein|hour|year|month|round|row|finger|child|kid|people|dog|mil|cop|o'clock|of us|greens|video)/;
/** How far before its first line a piece is introduced, in tokens. */
const NEAR = 45;
const NEAR_FIRST = 30;
/** One for each of two. */
const BOTH = /\bone (?:on|for|at|to|per|in) each\b|\bone each (?:side|end)\b|\bleft (?:one )?and (?:a |one )?right\b/;

/**
 * How many to make of the piece that begins here: the number said with it before its first line.
 * @param isFirst in the talk's long beginning only what is plainly about making counts
 */
export function readMake(
  tokens: readonly Token[],
  from: number,
  to: number,
  sentences: Sentences,
  isFirst: boolean,
): number {
  for (let i = to - 1; i >= from; i--) {
    const token = tokens[i]!;
    const isNear = to - i < (isFirst ? NEAR_FIRST : NEAR);
    if (isPair(tokens, i, from, isNear)) return 2;
    if (isNear && BOTH.test(textFrom(tokens, i, to))) return 2;
    if (token.kind !== 'N' || token.isGuess || tokens[i - 1]?.kind === 'U') continue;
    const n = Number(token.value);
    if (n < 2 || n > 60 || !isFree(tokens, i, to)) continue;
    const start = Math.max(from, sentences.startOf[i]!, i - 6);
    const before = tokens
      .slice(start, i)
      .filter((one) => !/^(?:the|a|so|um|uh|you|only|'ll|be|to|just)$/.test(one.text))
      .map((one) => one.text)
      .join(' ');
    if (
      (MAKING.test(before) && !NOT_MAKING.test(before)) ||
      (isNear && BEING.test(before) && !countsPlaces(tokens, i, from)) ||
      (isNear && !isFirst && isAlone(tokens, i)) ||
      isNeeded(tokens, i)
    )
      return n;
  }
  return 1;
}

const textFrom = (tokens: readonly Token[], i: number, to: number): string =>
  tokens
    .slice(i, Math.min(to, i + 6))
    .map((one) => one.text)
    .join(' ');

/** `Six squares is what you need`, `Two tabs are needed`. */
function isNeeded(tokens: readonly Token[], i: number): boolean {
  return /^\w+ \w+(?: \w+)? (?:is|are)(?: what)?(?: you)? (?:need|needed|wanted)/.test(
    textFrom(tokens, i, tokens.length),
  );
}

/** `Find the front loops. There's fifteen of them.`: places, not pieces. */
function countsPlaces(tokens: readonly Token[], i: number, from: number): boolean {
  const before = tokens.slice(Math.max(from, i - 16), i);
  return before.some((token) => (token.kind === 'G' || token.kind === 'B') && token.text.endsWith('s'));
}

function isFree(tokens: readonly Token[], i: number, to: number): boolean {
  const next = tokens[i + 1];
  if (next === undefined || i + 1 >= to) return true;
  if (COUNTED_OTHERWISE.includes(next.kind)) return next.kind === 'F';
  if ('.,|'.includes(next.kind)) return true;
  return !MEASURE.test(next.text) && !MEASURE.test(tokens[i + 2]?.text ?? '');
}

function isPair(tokens: readonly Token[], i: number, from: number, isNear: boolean): boolean {
  const token = tokens[i]!;
  const around = tokens
    .slice(Math.max(from, i - 8), i + 3)
    .map((one) => one.text)
    .join(' ');
  if (token.text === 'pair') return isNear && !/\beyes\b|\bknit/.test(around);
  if (token.text === 'a pair of') return isNear && /^(?:them|these|those)$/.test(tokens[i + 1]?.text ?? '');
  if (token.text === 'a pair')
    return isNear && tokens[i - 1]?.kind === ',' && '.|'.includes(tokens[i + 1]?.kind ?? '.');
  return token.kind === 't' && Number(token.value) === 2 && /\b(?:make|making|everything|do|you do)\b/.test(around);
}

/** `Legs. There's four.`, `Legs, so, four.`, `Two ears.`, `Three berries, now`. */
function isAlone(tokens: readonly Token[], i: number): boolean {
  const before = tokens[i - 1]?.kind ?? '.';
  const after = tokens[i + 1]?.kind ?? '.';
  const isHead =
    ('.|'.includes(before) || /^(?:so|now|and|okay|the)$/.test(tokens[i - 1]?.text ?? '')) &&
    (after === 'w' || tokens[i + 1]?.text === 'leaves');
  return isHead || (',~.|w'.includes(before) && ('.,|'.includes(after) || after === 'o'));
}
