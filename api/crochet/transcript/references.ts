import { numberAt, readNumberList } from './announce/number-list.ts';
import { type ReadSoFar } from './bases.ts';
import { type Token } from './tokens.ts';
import { periodOf, type Unit } from './work/units.ts';

const LIKE =
  /\b(?:same|as|like|repeat|repeating|repeats|again|copy|yer|did|over|back to|repetition|returning|what|'s a|is a|alternate|alternating|turn about|in turn)\b/;

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

const textBefore = (tokens: readonly Token[], i: number): string =>
  `${tokens
    .slice(Math.max(0, i - 3), i)
    .map((token) => token.text)
    .join(' ')} `;

function ordinalNamed(tokens: readonly Token[], i: number): { from: number; to: number; end: number } | null {
  if (tokens[i]!.kind === 'N') {
    const list = readNumberList(tokens, i, true, true);
    const asNamed =
      list !== null &&
      /\b(?:same as|like) $/.test(textBefore(tokens, i)) &&
      '.,|'.includes(tokens[list.end]?.kind ?? '.');
    if (asNamed) return list;
    return list !== null && /^(?:did|was|were)$/.test(tokens[list.end]?.text ?? '') ? list : null;
  }
  if (tokens[i]!.kind !== 'O' || tokens[i + 1]?.kind !== 'U') return null;
  const n = numberAt(tokens, i)!;
  return { from: n, to: n, end: i + 2 };
}

const SAME =
  /\b(?:more (?:plain )?between|same|again|copy|just like|repeat|repetition|like that|likewise|once more|one more time|ditto|the lap you just did|is like it|do it over|is that with|is that but)\b/;

/** Works that the line may copy: the lines it names, or the one before where it says "the same". */
export function copiesFor(
  tokens: readonly Token[],
  from: number,
  to: number,
  named: readonly number[],
  earlier: readonly ReadSoFar[],
): readonly { units: readonly Unit[]; cost: number }[] {
  const lengths = lengthsTold(tokens, from, to);
  const out = named.flatMap((n) => {
    const line = earlier.findLast((one) => one.from !== null && one.from <= n && n <= (one.to ?? one.from));
    return line === undefined
      ? []
      : [
          ...patternsOf(line).map((units, k) => ({ units, cost: 0.3 + 0.4 * k })),
          ...lengths.flatMap((n) => withStretches(line.units, n)).map((units) => ({ units, cost: 0.2 })),
        ];
  });
  const text = tokens
    .slice(from, to)
    .map((token) => token.text)
    .join(' ');
  const last = earlier.at(-1);
  if (SAME.test(text) && last !== undefined && last.from !== null)
    out.push(
      ...patternsOf(last).map((units, k) => ({ units, cost: 0.6 + 0.3 * k })),
      ...lengths.flatMap((n) => withStretches(last.units, n)).map((units) => ({ units, cost: 0.7 })),
    );
  return out;
}

const MOST_LENGTHS = 4;

/** Numbers that may be the new length of its plain stretches: `with twenty along each side instead of seventeen`. */
function lengthsTold(tokens: readonly Token[], from: number, to: number): readonly number[] {
  const out = new Set<number>();
  for (let i = from; i < to && out.size < MOST_LENGTHS; i++) {
    const { kind, value } = tokens[i]!;
    const before = tokens[i - 1];
    const names = before?.kind === 'U' || before?.kind === '#' || before?.kind === 'p' || before?.text === 'of';
    if (kind === 'N' && !names && Number(value) > 0 && Number(value) < 200) out.add(Number(value));
  }
  return [...out];
}

/** The same with its plain stretches so long; of several lengths the longest, or all where they are alike. */
function withStretches(units: readonly Unit[], length: number): readonly (readonly Unit[])[] {
  const longest = Math.max(...units.map(longestIn));
  if (longest < 1 || longest === length) return [];
  const visit = (unit: Unit): Unit =>
    unit.type === 'repeat'
      ? { ...unit, units: unit.units.map(visit) }
      : unit.type === 'stitch' && unit.inOne === 1 && unit.times === longest
        ? { ...unit, times: length }
        : unit;
  return [units.map(visit)];
}

function longestIn(unit: Unit): number {
  if (unit.type === 'repeat') return Math.max(0, ...unit.units.map(longestIn));
  return plainLength(unit);
}

/** The ways to do a line again: as it was, and with its longest plain stretch as long as now fits. */
export function patternsOf(line: ReadSoFar): readonly (readonly Unit[])[] {
  const period = periodOf(line.units);
  if (period.length < line.units.length) return repeats(period);
  const [unit] = line.units;
  const isUniform = unit?.type === 'stitch' || unit?.type === 'together' || unit?.type === 'oneplace';
  if (line.units.length === 1 && isUniform && unit.times > 1) return [[open([{ ...unit, times: 1 }])]];
  if (line.units.length === 1 && unit?.type === 'repeat') return [line.units, ...repeats(unit.units)];
  const longest = line.units.reduce(
    (best, one, n) => (plainLength(one) > plainLength(line.units[best]!) ? n : best),
    0,
  );
  const stretch = line.units[longest];
  if (stretch?.type !== 'stitch' || plainLength(stretch) < 2) return [line.units];
  return [line.units, line.units.map((one, n) => (n === longest ? open([{ ...stretch, times: 1 }]) : one))];
}

/** A group as often as it fits: as it was, and with one more or one fewer plain stitch in it. */
function repeats(group: readonly Unit[]): readonly (readonly Unit[])[] {
  const plain = group.findIndex((unit) => plainLength(unit) > 0);
  const stretch = group[plain];
  if (stretch?.type !== 'stitch') return [[open(group)]];
  const longer = (by: number) => [
    open(group.map((unit, n) => (n === plain ? { ...stretch, times: stretch.times + by } : unit))),
  ];
  return stretch.times > 1 ? [[open(group)], longer(1), longer(-1)] : [[open(group)], longer(1)];
}

function plainLength(unit: Unit): number {
  return unit.type === 'stitch' && unit.inOne === 1 ? unit.times : 0;
}

function open(units: readonly Unit[]): Unit {
  return { type: 'repeat', units, times: 0 };
}
