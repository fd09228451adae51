import { type Token } from '../tokens.ts';

/** The numbers that an announcement names: one line, or from one to another. */
export interface NumberList {
  readonly from: number;
  readonly to: number;
  /** Index of the token after the list. */
  readonly end: number;
}

const RANGE = new Set([
  'through',
  'thru',
  'to',
  'up to',
  'up through',
  'until',
  'till',
  'through to',
  'right up to',
  'on to',
]);

/**
 * Reads `five`, `five through eight`, `five, six and seven`, `twenty fourth to twenty eighth` at a token.
 * @param isBare without "rounds" before it, where a number that counts something ends the list
 * @param many whether several may stand there; after a singular "round" only a range with its own word is read
 */
export function readNumberList(tokens: readonly Token[], at: number, many: boolean, isBare = false): NumberList | null {
  const first = numberAt(tokens, at);
  if (first === null) return null;
  let to = first;
  let end = at + 1;
  for (;;) {
    const next = nextInList(tokens, end, to, many, isBare);
    if (next === null) break;
    to = next.value;
    end = next.end;
  }
  return { from: first, to, end };
}

function nextInList(
  tokens: readonly Token[],
  at: number,
  last: number,
  many: boolean,
  isBare: boolean,
): { value: number; end: number } | null {
  const counts = (after: number) => (isBare ? isCounted(tokens, after) : 'tGo'.includes(tokens[after]?.kind ?? '.'));
  let i = at;
  if (RANGE.has(tokens[i]?.text ?? '')) {
    while (tokens[i + 1]?.kind === 'a' || tokens[i + 1]?.kind === 'U') i += 1;
    const value = numberAt(tokens, i + 1);
    return value !== null && value > last && value - last < 400 && !counts(i + 2) ? { value, end: i + 2 } : null;
  }
  if (!many) return null;
  while (tokens[i]?.kind === ',' || tokens[i]?.text === 'and' || tokens[i]?.kind === 'a' || tokens[i]?.kind === '~')
    i += 1;
  const value = numberAt(tokens, i);
  return value === last + 1 && !counts(i + 1) ? { value, end: i + 1 } : null;
}

/** A number before a stitch or a unit counts those, and is no number of a line. */
export function isCounted(tokens: readonly Token[], after: number): boolean {
  return 'SPDGTtCKm'.includes(tokens[after]?.kind ?? '.') || tokens[after]?.kind === 'o';
}

export function numberAt(tokens: readonly Token[], at: number): number | null {
  const token = tokens[at];
  return token?.kind === 'N' || token?.kind === 'O' ? Number(token.value) : null;
}
