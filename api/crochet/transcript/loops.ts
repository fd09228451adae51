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
    const around = tokens
      .slice(Math.max(from, i - 4), i)
      .map((one) => one.text)
      .join(' ');
    if (LEFT.test(around) && !/\b(?:in|into|under|through)(?: the| those| them)? loose\b/.test(around)) continue;
    return token.value === 'back' ? 'back' : 'front';
  }
  return 'both';
}
