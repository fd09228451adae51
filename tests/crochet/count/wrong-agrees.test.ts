import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { printLine, readLine } from '#crochet';
import { countLines } from './support.ts';

/** One stretch of a round: so many plain stitches, increases or decreases. */
interface Part {
  readonly kind: 'sc' | 'inc' | 'dec';
  readonly n: number;
}

/** A round as a plain list of repeats; `tail` is worked once behind them. */
interface Round {
  readonly parts: readonly Part[];
  readonly times: number;
  readonly tail: readonly Part[];
  readonly total: number;
}

const USES = { sc: 1, inc: 1, dec: 2 };
const MAKES = { sc: 1, inc: 2, dec: 1 };

const sum = (parts: readonly Part[], each: Readonly<Record<Part['kind'], number>>): number =>
  parts.reduce((all, { kind, n }) => all + each[kind] * n, 0);

/** Stitch by stitch on paper, with nothing of the count's own: what a round uses and what it makes. */
const expand = ({ parts, times, tail }: Pick<Round, 'parts' | 'times' | 'tail'>) => ({
  uses: times * sum(parts, USES) + sum(tail, USES),
  makes: times * sum(parts, MAKES) + sum(tail, MAKES),
});

const wordsOf = (parts: readonly Part[]): string =>
  parts.map(({ kind, n }) => (kind === 'sc' || n > 1 ? `${String(n)} ${kind}` : kind)).join(', ');

const textOf = ({ parts, times, tail, total }: Round): string =>
  `${[`(${wordsOf(parts)}) × ${String(times)}`, wordsOf(tail)].filter(Boolean).join(', ')} (${String(total)})`;

const part: fc.Arbitrary<Part> = fc.record({
  kind: fc.constantFrom('sc', 'inc', 'dec'),
  n: fc.integer({ min: 1, max: 5 }),
});

const round: fc.Arbitrary<Round> = fc
  .record({
    parts: fc.array(part, { minLength: 1, maxLength: 3 }),
    times: fc.integer({ min: 2, max: 8 }),
    tail: fc.array(part, { maxLength: 2 }),
  })
  .map((one) => ({ ...one, total: expand(one).makes }));

const piece = fc.array(round, { minLength: 1, maxLength: 3 });

/** What a round works into. */
const base = (one: Round): number => expand(one).uses;

/** Every way to change just one number of a round, by as much as `by`. */
function changed(one: Round, by: number): Round[] {
  const turn = (parts: readonly Part[], at: number): Part[] =>
    parts.map((each, i) => (i === at ? { ...each, n: each.n + by } : each));
  return [
    { ...one, total: one.total + by },
    { ...one, times: one.times + by },
    ...one.parts.map((_, at) => ({ ...one, parts: turn(one.parts, at) })),
    ...one.tail.map((_, at) => ({ ...one, tail: turn(one.tail, at) })),
  ].filter(({ total, times, parts, tail }) => total > 0 && times > 0 && [...parts, ...tail].every(({ n }) => n > 0));
}

describe('with one number wrong', () => {
  test('no line agrees, unless it comes out all the same', () => {
    fc.assert(
      fc.property(round, fc.constantFrom(-2, -1, 1, 2, 6), fc.nat(), (sound, by, which) => {
        expect(countLines([textOf(sound)], { base: base(sound) })[0]!.verdict).toBe('agrees');
        const all = changed(sound, by);
        const wrong = all[which % Math.max(1, all.length)];
        fc.pre(wrong !== undefined);
        const { uses, makes } = expand(wrong);
        const isSound = uses === base(sound) && makes === wrong.total;
        const counted = countLines([textOf(wrong)], { base: base(sound) })[0]!;
        expect([textOf(wrong), counted.verdict === 'agrees']).toEqual([textOf(wrong), isSound]);
      }),
      { numRuns: 200 },
    );
  });

  test('in a round of a piece, that round does not agree', () => {
    fc.assert(
      fc.property(piece, fc.nat(), fc.constantFrom(-1, 1), fc.nat(), (rounds, at, by, which) => {
        // Each round is made to follow the one before by as many repeats of a plain round as it needs.
        const sound = rounds.reduce<Round[]>((all, one) => {
          const left = all.at(-1)?.total ?? base(one);
          const each = sum(one.parts, USES);
          const rest = left % each;
          const next: Omit<Round, 'total'> = {
            parts: one.parts,
            times: Math.floor(left / each),
            tail: rest > 0 ? [{ kind: 'sc', n: rest }] : [],
          };
          return next.times === 0 ? all : [...all, { ...next, total: expand(next).makes }];
        }, []);
        const start = base(sound[0]!);
        const good = countLines(sound.map(textOf), { base: start });
        expect(good.map(({ verdict }) => verdict)).toEqual(sound.map(() => 'agrees'));
        const index = at % sound.length;
        const all = changed(sound[index]!, by);
        const wrong = all[which % Math.max(1, all.length)];
        fc.pre(wrong !== undefined);
        const lines = sound.map((one, i) => textOf(i === index ? wrong : one));
        const { uses, makes } = expand(wrong);
        const isSound = uses === base(sound[index]!) && makes === wrong.total;
        expect([lines, countLines(lines, { base: start })[index]!.verdict === 'agrees']).toEqual([lines, isSound]);
      }),
      { numRuns: 80 },
    );
  });
});

test('only a figure behind a decrease may say how many stitches it takes', () => {
  expect(countLines(['(2 sc, dec 2) × 3 (9)'], { base: 12 })[0]!.verdict).toBe('agrees');
  expect(countLines(['(2 sc, 2 dec) × 3 (9)'], { base: 12 })[0]!.verdict).toBe('does-not-fit');
  expect(printLine(readLine('(2 sc, dec 2) × 3').tree, { terms: 'US' })).toContain('dec 2');
});

test('a number too long to be a count is never passed over', () => {
  const lines = [
    '(sc, inc) x 9999999 (9)',
    '(sc, inc) 9999999 times (9)',
    '(sc, inc) × 3, ch 9999999 (9)',
    '(sc, inc) × 3, sk 9999999 (9)',
    '(sc, inc) around 9999999 (9)',
    'sc, inc, 9999999 sc (9)',
  ];
  expect(lines.map((line) => [line, countLines([line], { base: 6 })[0]!.verdict])).toEqual(
    lines.map((line) => [line, 'unread']),
  );
  expect(countLines(['(sc, inc) x 999999 (9)'], { base: 6 })[0]!.verdict).toBe('does-not-fit');
});

test('a starting chain told apart in a total is one that was made and counts', () => {
  const verdictOf = (line: string) => countLines([line], { base: 36 })[0]!.verdict;
  expect(verdictOf('ch 3, dc in next 35 sts, join (35 dc + ch 3)')).toBe('agrees');
  expect(verdictOf('ch 3, dc in next 35 sts, join (36 dc + ch 3)')).toBe('differs');
  expect(verdictOf('ch 3, dc in next 35 sts, join (35 dc + ch 2)')).toBe('differs');
  expect(verdictOf('dc in each st around (35 dc + ch 3)')).toBe('differs');
});
