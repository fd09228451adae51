import { basesAfter, basesOnChain } from './bases.ts';
import { type Base } from './instruct/resolve.ts';
import { type Before, type Stretch, type Talk } from './read-line.ts';
import { type Token } from './tokens.ts';
import { sumOf } from './work/units.ts';

/** How many pieces back loops that were left are looked for. */
const PIECES_BACK = 8;

/** The places before a line, the likeliest first; none where they are not known. */
export function basesFor(
  talk: Talk,
  { from, to }: Stretch,
  before: Before,
  loops: 'both' | 'back' | 'front',
  words: readonly Token[],
): readonly Base[] {
  const { tokens } = talk;
  const last = before.piece.at(-1);
  const left = loops === 'both' ? null : loopsLeft(tokens, before.introFrom, to, before);
  if (left !== null) return [{ n: left, cost: 0 }];
  if (last === undefined && before.chains === null && loops !== 'both') return freeLoops(before, loops);
  if (last !== undefined)
    return layered(
      basesAfter(
        last,
        words.some((token) => token.kind === 'Z'),
      ),
      words,
    );
  if (before.chains === null) return [];
  const text = tokens
    .slice(from, to)
    .map((token) => token.text)
    .join(' ');
  const nth = tokens.slice(from, to).findIndex((token, n) => token.kind === 'O' && tokens[from + n + 1]?.kind === 'C');
  return basesOnChain({
    chains: before.chains,
    isJoined: before.chainJoined,
    bothSides:
      /\b(?:other side|underside|under side|bottom|back down|both sides|other edge|both edges|coming back|coming home|up one side|goes all around the chain)\b/.test(
        text,
      ),
    nth: nth < 0 ? null : Number(tokens[from + nth]!.value),
  });
}

/** Through both layers two places are worked as one. */
function layered(bases: readonly Base[], words: readonly Token[]): readonly Base[] {
  const text = words.map((token) => token.text).join(' ');
  if (!/\bboth (?:the )?(?:sides|layers|thicknesses)\b|\beach both sides\b/.test(text)) return bases;
  return bases.flatMap(({ n, cost }) => (n % 2 === 0 ? [{ n: n / 2, cost }] : []));
}

/** A piece that begins in loops grows on the last line that was worked in the other ones. */
function freeLoops(before: Before, loops: 'back' | 'front'): readonly Base[] {
  const line = before.all
    .slice(-PIECES_BACK)
    .flat()
    .findLast((one) => one.loops !== 'both' && one.loops !== loops && one.base !== null);
  return line === undefined || line.base === null ? [] : [{ n: line.base, cost: 0 }];
}

/** `the front loops left in round thirteen`: as many as that round had to work into. */
function loopsLeft(tokens: readonly Token[], from: number, to: number, before: Before): number | null {
  const text = tokens.slice(from, to);
  if (
    !text.some(
      (token) => token.kind === 'B' || token.text === 'loops' || token.text === 'line' || token.text === 'fence',
    )
  )
    return null;
  const last = before.piece.at(-1);
  for (let i = from; i < to; i++) {
    if (tokens[i]!.kind !== 'U' || tokens[i + 1]?.kind !== 'N') continue;
    const n = Number(tokens[i + 1]!.value);
    const lines = last === undefined ? before.all.slice(-PIECES_BACK).reverse().flat() : [...before.piece];
    if (last !== undefined && n >= (last.to ?? 0)) continue;
    const line = lines.find((one) => one.from !== null && one.from <= n && n <= (one.to ?? one.from));
    if (line !== undefined) return line.base ?? sumOf(line.units).uses;
  }
  return null;
}
