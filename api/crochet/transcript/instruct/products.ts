import { type Token } from '../tokens.ts';

const REACH = 9;

/**
 * Sums that speakers do aloud: `five times six is thirty`, `three per side, six sides, eighteen`, `two fifteens is thirty`.
 * Their factors are neither stitches nor repeats.
 * @returns the factors' token indices, and the index of each result, which is a total
 */
export function spokenProducts(
  tokens: readonly Token[],
  from: number,
  to: number,
): { readonly factors: ReadonlySet<number>; readonly results: ReadonlySet<number> } {
  const factors = new Set<number>();
  const results = new Set<number>();
  for (let i = from; i < to; i++) {
    const found = tokens[i]!.kind === 'N' ? productAt(tokens, i, to) : null;
    if (found === null) continue;
    for (let j = i; j < found; j++) if (!'.,|'.includes(tokens[j]!.kind)) factors.add(j);
    results.add(found);
    i = found;
  }
  return { factors, results };
}

/** Where the result stands of a product that begins here; null where none does. */
function productAt(tokens: readonly Token[], i: number, to: number): number | null {
  let second = i + 1;
  const isTimes = tokens[second]?.kind === 't' && Number(tokens[second]!.value) === 0;
  const isPer = tokens[second]?.kind === 'o';
  const isPlural = tokens[second]?.kind === 'N' && tokens[second]!.text.endsWith('s');
  if (isTimes || isPer) second += 1;
  if (isPer) while (',~&a'.includes(tokens[second]?.kind ?? '.')) second += 1;
  if (!(isTimes || isPer || isPlural) || tokens[second]?.kind !== 'N') return null;
  if (isPer && tokens[second + 1]?.kind !== 'o') return null;
  const product = Number(tokens[i]!.value) * Number(tokens[second]!.value);
  for (let j = second + 1; j < Math.min(to, second + REACH); j++) {
    const token = tokens[j]!;
    if (token.kind === 'N') return Number(token.value) === product && product > 1 ? j : null;
    if (!'=v,~a&o'.includes(token.kind)) return null;
    if (token.kind === ',' && isTimes) return null;
  }
  return null;
}
