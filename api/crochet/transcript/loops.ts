import { type Token } from './tokens.ts';

const LEFT = /\b(?:leave|leaving|left|see|standing|sticking|loose|later|don't do anything)\b/;

/** The loops that a line is worked in: the first told, where they are not just spoken of as left for later. */
export function loopsOf(
  tokens: readonly Token[],
  from: number,
  to: number,
  skipped: (index: number) => boolean,
): 'both' | 'back' | 'front' {
  for (let i = from; i < to; i++) {
    const token = tokens[i]!;
    if (token.kind !== 'B' || skipped(i)) continue;
    if (token.value === 'both') return 'both';
    if (isOfDecrease(tokens, from, i)) continue;
    const around = tokens
      .slice(Math.max(from, i - 4), i)
      .map((one) => one.text)
      .join(' ');
    if (LEFT.test(around) && !/\b(?:in|into|under|through)(?: the| those| them)? loose\b/.test(around)) continue;
    return token.value === 'back' ? 'back' : 'front';
  }
  return 'both';
}

const DECREASE_REACH = 8;

/** `a decrease, under the front loops`: how the decrease is made, not where the round is. */
function isOfDecrease(tokens: readonly Token[], from: number, at: number): boolean {
  const before = tokens.slice(Math.max(from, at - DECREASE_REACH), at);
  const decrease = before.findLastIndex((token) => token.kind === 'D');
  if (decrease < 0 || tokens[at]!.value !== 'front') return false;
  const between = before.slice(decrease + 1);
  const isUnder = between.some((token) => /^(?:under|through)$/.test(token.text));
  return isUnder && between.every((token) => !'.|USP'.includes(token.kind));
}

/** Whether the decreases of a line are invisible: called so, or taken under the front loops. */
export function isInvisible(tokens: readonly Token[], from: number, to: number): boolean {
  return tokens
    .slice(from, to)
    .some(
      (token, n) =>
        (token.kind === 'D' && token.text.startsWith('inv')) ||
        (token.kind === 'B' && isOfDecrease(tokens, from, from + n)),
    );
}
