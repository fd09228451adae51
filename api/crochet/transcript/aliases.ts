import { type Token } from './tokens.ts';

const REACH = 60;

/**
 * Speakers name things for themselves: `around here we call that a squeeze`. From there on the word stands for the
 * increase, decrease or stitch it was said of.
 */
export function withAliases(tokens: readonly Token[]): readonly Token[] {
  const aliases = new Map<string, Token>();
  return tokens.map((token, i) => {
    if (token.kind === 'w' && /^(?:that|it|this|them|those|a|an)$/.test(tokens[i - 1]?.text ?? '')) {
      const meant = namedHere(tokens, i);
      if (meant !== null) aliases.set(token.text, meant);
    }
    const known =
      token.kind === 'w' ? (aliases.get(token.text) ?? aliases.get(token.text.replace(/s$/, ''))) : undefined;
    return known === undefined ? token : { ...token, kind: known.kind, value: known.value };
  });
}

/** The last decrease, increase or special stitch spoken of before `we call that a …`, or null. */
function namedHere(tokens: readonly Token[], i: number): Token | null {
  const lead = tokens
    .slice(Math.max(0, i - 4), i)
    .map((token) => token.text)
    .join(' ');
  if (!/\b(?:call|calls|calling) (?:that|it|this|them|those)(?: an?)?$/.test(lead)) return null;
  return tokens.slice(Math.max(0, i - REACH), i).findLast((token) => token.kind === 'D' || token.kind === 'P') ?? null;
}
