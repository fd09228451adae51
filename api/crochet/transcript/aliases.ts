import { type Token } from './tokens.ts';

const REACH = 60;

/**
 * Speakers name things for themselves: `around here we call that a squeeze`. From there on the word stands for the
 * increase, decrease or stitch it was said of.
 */
export function withAliases(tokens: readonly Token[]): readonly Token[] {
  const aliases = new Map<string, Pick<Token, 'kind' | 'value'>>();
  return tokens.map((token, i) => {
    if (token.kind === 'w' && /^(?:that|it|this|them|those|a|an)$/.test(tokens[i - 1]?.text ?? '')) {
      const meant = namedHere(tokens, i) ?? definedHere(tokens, i);
      if (meant !== null) aliases.set(token.text, meant);
    }
    const known =
      token.kind === 'w' ? (aliases.get(token.text) ?? aliases.get(token.text.replace(/s$/, ''))) : undefined;
    return known === undefined ? token : { ...token, kind: known.kind, value: known.value };
  });
}

const WORKED: Readonly<Record<'P' | 'D', Pick<Token, 'kind' | 'value'>>> = {
  P: { kind: 'P', value: 0 },
  D: { kind: 'D', value: 0 },
};

/** `a squish is two together`, `a buddy means two singles in one stitch`: what a word is said to be. */
function definedHere(tokens: readonly Token[], i: number): Pick<Token, 'kind' | 'value'> | null {
  if (!/^(?:a|an)$/.test(tokens[i - 1]?.text ?? '')) return null;
  const after = tokens.slice(i + 1, i + 10);
  if (!/^(?:is|'s|means|just means|that is)$/.test(after[0]?.text ?? '')) return null;
  const letters = after.map((token) => token.kind).join('');
  const told = /^.[a~]*(?:(P|D)(?=[.,|&w]|$)|N([SGaI]*T|S?I[XLaM]*[NGE]))/.exec(letters);
  const number = after.find((token) => token.kind === 'N');
  if (told === null || (told[1] === undefined && number?.value !== 2)) return null;
  return WORKED[told[1] === 'D' || told[2]?.endsWith('T') === true ? 'D' : 'P'];
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
