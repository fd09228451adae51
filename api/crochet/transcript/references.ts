import { numberAt, readNumberList } from './announce/number-list.ts';
import { type ReadSoFar } from './bases.ts';
import { type Token } from './tokens.ts';
import { type Unit } from './work/units.ts';

const LIKE = /\b(?:same|as|like|repeat|repeating|repeats|again|copy|yer|did|over|back to|repetition|returning|what)\b/;

/** Lines named as the model of this one: `the same as row three`, `repeat rows two and three`. */
export function linesNamed(tokens: readonly Token[], from: number, to: number, before: number): readonly number[] {
  const out: number[] = [];
  for (let i = from; i < to; i++) {
    const named =
      tokens[i]!.kind === 'U'
        ? readNumberList(tokens, tokens[i + 1]?.kind === '#' ? i + 2 : i + 1, true)
        : ordinalNamed(tokens, i);
    if (named === null || named.to >= before) continue;
    const around = tokens
      .slice(Math.max(from, i - 7), Math.min(to, named.end + 6))
      .map((token) => token.text)
      .join(' ');
    if (!LIKE.test(around)) continue;
    for (let n = named.from; n <= named.to; n++) out.push(n);
    i = named.end - 1;
  }
  return [...new Set(out)];
}

function ordinalNamed(tokens: readonly Token[], i: number): { from: number; to: number; end: number } | null {
  if (tokens[i]!.kind !== 'O' || tokens[i + 1]?.kind !== 'U') return null;
  const n = numberAt(tokens, i)!;
  return { from: n, to: n, end: i + 2 };
}

const SAME =
  /\b(?:same|again|copy|just like|repeat|repetition|like that|likewise|once more|one more time|ditto|the lap you just did|is like it|do it over|that is|that with)\b/;

/** Works that the line may copy: the lines it names, or the one before where it says "the same". */
export function copiesFor(
  tokens: readonly Token[],
  from: number,
  to: number,
  named: readonly number[],
  earlier: readonly ReadSoFar[],
): readonly { units: readonly Unit[]; cost: number }[] {
  const out = named.flatMap((n) => {
    const line = earlier.findLast((one) => one.from !== null && one.from <= n && n <= (one.to ?? one.from));
    return line === undefined ? [] : [{ units: asPattern(line), cost: 0.3 }];
  });
  const text = tokens
    .slice(from, to)
    .map((token) => token.text)
    .join(' ');
  const last = earlier.at(-1);
  if (SAME.test(text) && last !== undefined && last.from !== null) out.push({ units: asPattern(last), cost: 0.9 });
  return out;
}

/** One kind of stitch in every place is copied as such, whatever the number of places now. */
function asPattern(line: ReadSoFar): readonly Unit[] {
  const [unit] = line.units;
  const isUniform =
    line.units.length === 1 && (unit?.type === 'stitch' || unit?.type === 'together' || unit?.type === 'oneplace');
  if (isUniform && unit.times > 1) return [{ type: 'repeat', units: [{ ...unit, times: 1 }], times: 0 }];
  if (line.units.length === 1 && unit?.type === 'repeat') return [{ ...unit, times: 0 }];
  return line.units;
}
