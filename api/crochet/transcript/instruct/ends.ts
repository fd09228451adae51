import { type Token } from '../tokens.ts';

/** How many tokens the longest way of naming both ends takes. */
const REACH = 7;
const BOTH =
  /^(?:at|in|on|into)?(?: the)? ?(?:each|either|both|each of the 2|each of the two|each of the|both of the)(?: of)?(?: the| your| my)? ?(?:ends?|edges?|edge stitch|end stitch|end stitches|sides?|end of the row|ends of the row)$/;
const THE_ENDS = /^(?:at|in|on|into)(?: the| your)? (?:ends|edges|sides)$/;

/** `at each end`, `on both sides`, `at the edges`: the token after it; null where no such phrase begins here. */
export function bothEndsAt(tokens: readonly Token[], i: number, to: number): number | null {
  if (!STARTS.test(tokens[i]!.text)) return null;
  let text = '';
  let found: number | null = null;
  for (let j = i; j < Math.min(to, i + REACH); j++) {
    if (',.|'.includes(tokens[j]!.kind)) break;
    text = text === '' ? tokens[j]!.text : `${text} ${tokens[j]!.text}`;
    if (BOTH.test(text) || THE_ENDS.test(text)) found = j + 1;
  }
  return found;
}

const STARTS = /^(?:at|in|on|into|each|either|both)\b/;

/**
 * What an end of the row is where it stands: `G` as the place of stitches ("two in the end", "two at the end"), `d` as the
 * name of what was told of the ends before ("end, five, corner, five, end"); null for anything else.
 */
export function endLetter(tokens: readonly Token[], i: number, text: string): 'G' | 'd' | null {
  if (!/^(?:end|edge|very end|far end|other end)$/.test(tokens[i]!.text)) return null;
  const before = tokens[i - 1]?.kind ?? '.';
  const after = tokens[i + 1]?.kind ?? '.';
  const isBare = ',.|&~'.includes(before) && ',.|'.includes(after);
  if (/[NSPT]I[XLO]*$/.test(text)) return 'G';
  return isBare && !text.endsWith('I') ? 'd' : null;
}

/** "two at the end", "an increase at the edge": at is where they go. */
export function isAtEnd(tokens: readonly Token[], i: number, text: string): boolean {
  if (tokens[i]!.text !== 'at' || !/[NSPT]$/.test(text)) return false;
  const next = tokens[i + 1]?.kind === 'a' ? tokens[i + 2] : tokens[i + 1];
  return /^(?:end|edge|very end|far end|other end|edge stitch|end stitch)$/.test(next?.text ?? '');
}
