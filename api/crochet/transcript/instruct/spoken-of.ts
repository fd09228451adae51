import { type Token } from '../tokens.ts';

/** Whether a stitch or a shaping is only spoken of: `you know what an increase is`, `a row in single crochet,`. */
export function isSpokenOf(tokens: readonly Token[], from: number, i: number): boolean {
  const token = tokens[i]!;
  if (!'SPD'.includes(token.kind)) return false;
  const after = tokens[i + 1];
  const isAsked =
    /^(?:is|are|was|means)$/.test(after?.text ?? '') &&
    tokens.slice(Math.max(from, i - 3), i).some((one) => one.text === 'what' || one.text === 'how');
  const isManner =
    token.kind === 'S' && /^(?:in|of)$/.test(tokens[i - 1]?.text ?? '') && ',.|&'.includes(after?.kind ?? '.');
  return isAsked || isManner;
}

const PART_OF =
  /\b(?:top|head|tip|start|end|side) (?:of )?(?:the|that|your|our|this|my)(?: (?:starting|turning|beginning|first))?$/;

/** Where a chain ends that only names a place, as in `into the top of the chain three`; null where it is worked. */
export function endOfNamedChain(tokens: readonly Token[], from: number, i: number): number | null {
  const before = textOf(tokens, Math.max(from, i - 5), i);
  if (!PART_OF.test(before)) {
    // "the top of that three chain"
    return tokens[i - 1]?.kind === 'N' && PART_OF.test(before.replace(/ \S+$/, '')) ? i + 1 : null;
  }
  return tokens[i + 1]?.kind === 'N' && tokens[i + 2]?.kind !== 'S' ? i + 2 : i + 1;
}

/** The plain words of a stretch of tokens. */
export function textOf(tokens: readonly Token[], from: number, to: number): string {
  return tokens
    .slice(from, to)
    .map((token) => token.text)
    .join(' ');
}
