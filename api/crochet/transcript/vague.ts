import { type Event } from './instruct/event.ts';
import { type Sentences } from './sentences.ts';
import { type Token } from './tokens.ts';

/** Ways of leaving it to the viewer how the work goes on, so that its count cannot be told. */
const VAGUE =
  /^(?:taper(?:ing)?\b|as you (?:like|please|want|wish|fancy|see fit|feel)|how(?:ever|soever) (?:many )?(?:you|often you) (?:like|want|please|fancy)|wherever you (?:like|want|please|fancy)|to taste\b|by eye\b|here and there\b|now and then\b|every so often\b|as (?:many|few|often|much)(?: \w+)? as you (?:like|want|please|need|fancy)|as needed\b|freehand\b|(?:until|till) it (?:looks|feels)\b|whatever (?:looks|feels)\b)/;
const AHEAD = 6;
/** How far before it "and so on" may stand to be part of it, and how far it goes where there are no full stops. */
const BACK = 4;
const SPOKEN_LENGTH = 5;

/** Tokens, the end exclusive. */
export interface TokenSpan {
  readonly from: number;
  readonly to: number;
}

/** Words in a line's instruction that leave it open how the work goes on; null where everything is told. */
export function findVague(
  tokens: readonly Token[],
  from: number,
  to: number,
  sentences: Sentences,
  events: readonly Event[],
): TokenSpan | null {
  for (let i = from; i < to; i++) {
    const ahead = tokens
      .slice(i, Math.min(to, i + AHEAD))
      .map((token) => token.text)
      .join(' ');
    if (!VAGUE.test(ahead)) continue;
    const start = Math.max(from, sentences.startOf[i]!);
    const isOfWork = events.some((event) => event.at >= start && event.at <= i && event.type !== 'number');
    if (!isOfWork) continue;
    const end = Math.min(to, sentences.endOf[i]!);
    const until = sentences.isPunctuated ? end : Math.min(end, i + SPOKEN_LENGTH);
    return { from: goingOn(tokens, start, i), to: until };
  }
  return null;
}

/** `and so on, tapering`: begins where the work is said to go on. */
function goingOn(tokens: readonly Token[], start: number, at: number): number {
  for (let i = at - 1; i >= Math.max(start, at - BACK); i--) {
    if (tokens[i]!.kind === 'R' || tokens[i]!.kind === 'A') return i;
  }
  return at;
}
