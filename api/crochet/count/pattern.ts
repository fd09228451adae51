import { readLine } from '../language/read-line.ts';
import { type ReadLine } from '../language/tree.ts';
import { type CountedWith } from './compare.ts';
import { type Counted } from './count-line.ts';
import { type Finished } from './finished.ts';
import { type LineInput, type PatternInput, type PieceInput } from './input.ts';
import { memoFor, memoOf, type Memo } from './memo.ts';
import { type PatternCount, type PieceCount } from './result.ts';
import { sensesToTry } from './senses.ts';
import { sizesIn } from './sizes.ts';
import { ownStitches } from './special.ts';
import { type ChainPolicy } from './start.ts';
import { workPiece, type Known, type PieceWork } from './work-piece.ts';

/**
 * Counts a whole pattern line by line. Pure: the same input gives the same result.
 *
 * @param previous an earlier result of nearly the same pattern: what does not depend on a change is taken from it.
 */
export function countPattern(input: PatternInput, previous?: PatternCount): PatternCount {
  const own = ownStitches(input.specialStitches ?? [], input.terms);
  const era = JSON.stringify([input.terms, input.sizes.length, input.specialStitches ?? []]);
  const finished: Finished[] = [];
  const pieces = input.pieces.map((piece, i) => {
    const old = previous?.pieces.find((one) => one.id === piece.id);
    const base = i === 0 ? (input.base ?? null) : null;
    const counted = countPiece(input, piece, { own, base, finished: [...finished] }, era, old);
    finished.push(finishedFrom(piece, counted));
    return { id: piece.id, lines: counted.map((one) => one.count) };
  });
  return { pieces };
}

/** What a piece that has been counted offers to those after it. */
function finishedFrom(piece: PieceInput, counted: readonly Counted[]): Finished {
  const state = counted.at(-1)?.state;
  return {
    name: piece.name.toLowerCase(),
    lefts: state?.lefts ?? [],
    rows: state?.rows ?? 0,
    free: new Map(counted.flatMap(({ free }) => (free ? [free] : []))),
    opening: counted.findLast((one) => one.opening !== null)?.opening ?? null,
  };
}

function countPiece(
  input: PatternInput,
  piece: PieceInput,
  given: Pick<PieceWork, 'own' | 'base' | 'finished'>,
  era: string,
  previous?: PieceCount,
): Counted[] {
  const memos = new Map(previous?.lines.map((line) => [line.id, memoOf(line)]));
  const known = piece.lines.map((line): Known => {
    const old = memos.get(line.id);
    return { old, now: memoFor(line, readOnce(line, input, era, old), era, old) };
  });
  const reads = known.map(({ now }) => now.read);
  const sizes = reads.reduce((most, read) => Math.max(most, sizesIn(read)), Math.max(1, input.sizes.length));
  const said = saidPolicy(reads);
  const settle = (sense: CountedWith | null): Counted[] =>
    settleChains(said, (policy) => workPiece(piece, known, { ...given, sizes, policy, sense }));
  const open = settle(null);
  const tries = sensesToTry(open).map((sense) => settle(sense));
  return tries.length > 0 ? mostAgreeing(tries) : open;
}

/** The same chain cannot count in one line and not in another: takes the way in which more lines come out. */
function settleChains(said: ChainPolicy, work: (policy: ChainPolicy) => Counted[]): Counted[] {
  const first = work(said);
  const unsure = contested(first);
  if (unsure.length === 0) return first;
  return mostAgreeing(
    [true, false].map((counts) => work({ ...said, ...Object.fromEntries(unsure.map((stitch) => [stitch, counts])) })),
  );
}

/** The attempt in which most lines agree; the first of those that are alike. */
function mostAgreeing(attempts: readonly (readonly Counted[])[]): Counted[] {
  const agreeing = (counted: readonly Counted[]) => counted.filter((one) => one.count.verdict === 'agrees').length;
  return [...attempts.reduce((a, b) => (agreeing(b) > agreeing(a) ? b : a))];
}

function readOnce(line: LineInput, input: PatternInput, era: string, memo: Memo | undefined): ReadLine {
  if (memo?.line.text === line.text && memo.era === era) return memo.read;
  return readLine(line.text, {
    terms: input.terms,
    special: input.specialStitches ?? [],
    sizes: Math.max(1, input.sizes.length),
  });
}

/** `ch 3 (counts as dc)` said once holds for the piece. */
function saidPolicy(reads: readonly ReadLine[]): ChainPolicy {
  const policy: Record<string, boolean> = {};
  for (const read of reads) {
    for (const item of read.tree.items) {
      if (item.type !== 'work' || !item.counts) continue;
      if (item.counts.as && item.counts.as !== 'st') policy[item.counts.as] ??= true;
    }
  }
  return policy;
}

/** Stitches whose starting chain counted in one agreeing line and not in another, with nothing said. */
function contested(counted: readonly Counted[]): string[] {
  const ways = new Map<string, Set<boolean>>();
  for (const { chain } of counted) {
    if (!chain?.matters) continue;
    const set = ways.get(chain.stitch) ?? new Set<boolean>();
    set.add(chain.other);
    ways.set(chain.stitch, set);
  }
  return [...ways].filter(([, set]) => set.size > 1).map(([stitch]) => stitch);
}
