import { readLine } from '../language/read-line.ts';
import { type Item, type ReadLine } from '../language/tree.ts';
import { allItems, targetsIn } from './base.ts';
import { type CountedWith } from './compare.ts';
import { countLine, type Around, type Counted } from './count-line.ts';
import { type LineInput, type PatternInput, type PieceInput } from './input.ts';
import { type Left } from './places.ts';
import { relativeOf } from './relative.ts';
import { type LineCount, type PatternCount, type PieceCount } from './result.ts';
import { ownStitches } from './special.ts';
import { sensesToTry } from './senses.ts';
import { type ChainPolicy } from './start.ts';
import { startState, type State } from './state.ts';

/** What is remembered of a line, so that it is worked again only where something it depends on changed. */
interface Memo {
  readonly line: LineInput;
  readonly read: ReadLine;
  readonly lefts: readonly Left[];
  readonly before: State['before'];
  readonly around: string;
  readonly counted: Counted;
}

const MEMOS = new WeakMap<LineCount, Memo>();

/**
 * Counts a whole pattern line by line. Pure: the same input gives the same result.
 *
 * @param previous an earlier result of nearly the same pattern: what does not depend on a change is taken from it.
 */
export function countPattern(input: PatternInput, previous?: PatternCount): PatternCount {
  const own = ownStitches(input.specialStitches ?? [], input.terms);
  return {
    pieces: input.pieces.map((piece, i) =>
      countPiece(
        input,
        piece,
        own,
        i === 0 ? (input.base ?? null) : null,
        previous?.pieces.find((one) => one.id === piece.id),
      ),
    ),
  };
}

function countPiece(
  input: PatternInput,
  piece: PieceInput,
  own: ReadonlyMap<string, readonly Item[]>,
  base: number | null,
  previous?: PieceCount,
): PieceCount {
  const old = new Map(previous?.lines.map((line) => [line.id, MEMOS.get(line)]));
  const reads = piece.lines.map((line) => readOnce(line, input, old.get(line.id)));
  const sizes = Math.max(1, input.sizes.length, ...reads.map((read) => sizesOf(read)));
  const said = saidPolicy(reads);
  const settle = (sense: CountedWith | null): Counted[] =>
    settleChains(said, (policy) => workPiece(piece, reads, { sizes, own, policy, base, sense }, old));
  const open = settle(null);
  const tries = sensesToTry(open).map((sense) => settle(sense));
  const best = tries.length > 0 ? mostAgreeing(tries) : open;
  return { id: piece.id, lines: best.map((one) => one.count) };
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

function readOnce(line: LineInput, input: PatternInput, memo: Memo | undefined): ReadLine {
  if (memo?.line.text === line.text && memo.line.kind === line.kind) return memo.read;
  return readLine(line.text, {
    terms: input.terms,
    special: input.specialStitches ?? [],
    sizes: Math.max(1, input.sizes.length),
  });
}

/** How many sizes the figures of a line speak of. */
const SIZES = new WeakMap<ReadLine, number>();

function sizesOf(read: ReadLine): number {
  const known = SIZES.get(read);
  if (known !== undefined) return known;
  let most = 1;
  for (const item of allItems(read.tree.items)) {
    if (item.type === 'work' && item.times.type === 'n') most = Math.max(most, item.times.n.length);
    if (item.type === 'group' && item.times.type === 'n') most = Math.max(most, item.times.n.length);
    if (item.type === 'skip') most = Math.max(most, item.n.length);
  }
  SIZES.set(read, most);
  return most;
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

interface PieceWork {
  readonly sizes: number;
  readonly own: ReadonlyMap<string, readonly Item[]>;
  readonly policy: ChainPolicy;
  readonly base: number | null;
  readonly sense: CountedWith | null;
}

function workPiece(
  piece: PieceInput,
  reads: readonly ReadLine[],
  work: PieceWork,
  old: ReadonlyMap<string, Memo | undefined>,
): Counted[] {
  let state = startState(work.sizes, work.base);
  const counted: Counted[] = [];
  const backFrom = lastTakingBack(reads);
  const trees: Around['trees'] = new Map();
  const free: Around['free'] = new Map();
  piece.lines.forEach((line, i) => {
    if (line.kind === 'note' || line.kind === 'step') {
      counted.push({ count: quiet(line), state, chain: null, senses: null, trees: [], free: null });
      return;
    }
    const read = reads[i]!;
    const around: Around = {
      sizes: work.sizes,
      policy: work.policy,
      own: work.own,
      ring: piece.worked !== 'rows' || line.kind === 'round',
      comesBack: backFrom > i,
      sense: work.sense,
      trees,
      free,
    };
    const key = `${String(work.sizes)} ${JSON.stringify(work.policy)} ${String(around.ring)} ${String(around.comesBack)} ${String(work.sense)}`;
    const memo = old.get(line.id);
    const one =
      memo && isStill(memo, line, read, state, key)
        ? memo.counted
        : remember(line, read, state, key, countLine(line, read, state, around), memo);
    for (const [n, tree] of one.trees) trees.set(n, tree);
    if (one.free) free.set(...one.free);
    state = one.state;
    counted.push(one);
  });
  return counted;
}

/** Index of the last line that goes over what short rows left; -1 where none does. */
function lastTakingBack(reads: readonly ReadLine[]): number {
  return reads.findLastIndex(
    (read) =>
      targetsIn(read.tree.items).some((target) => target.which === 'skipped') &&
      !allItems(read.tree.items).some((item) => item.type === 'skip'),
  );
}

/** Whether nothing that the line depends on changed. Lines told by another are always worked again. */
function isStill(memo: Memo, line: LineInput, read: ReadLine, state: State, around: string): boolean {
  return (
    memo.line.text === line.text &&
    memo.read === read &&
    memo.line.kind === line.kind &&
    memo.line.from === line.from &&
    memo.line.to === line.to &&
    JSON.stringify(memo.line.written) === JSON.stringify(line.written) &&
    JSON.stringify(memo.line.said) === JSON.stringify(line.said) &&
    memo.lefts === state.lefts &&
    memo.before === state.before &&
    memo.around === around &&
    relativeOf(read.tree) === null &&
    !targetsIn(read.tree.items).some((target) => target.what === 'loop')
  );
}

function remember(
  line: LineInput,
  read: ReadLine,
  state: State,
  around: string,
  fresh: Counted,
  memo: Memo | undefined,
): Counted {
  // Where the outcome is as before, the old state goes on, so that what follows need not be worked again.
  const same =
    memo &&
    JSON.stringify(memo.counted.state.lefts) === JSON.stringify(fresh.state.lefts) &&
    JSON.stringify(memo.counted.state.before) === JSON.stringify(fresh.state.before);
  const counted = same
    ? { ...fresh, state: { ...fresh.state, lefts: memo.counted.state.lefts, before: memo.counted.state.before } }
    : fresh;
  MEMOS.set(counted.count, { line, read, lefts: state.lefts, before: state.before, around, counted });
  return counted;
}

/** A line that is no work: a step or a note. */
function quiet(line: LineInput): LineCount {
  return {
    id: line.id,
    verdict: 'no-total',
    base: null,
    uses: null,
    count: null,
    made: {},
    written: null,
    writtenSpan: null,
    said: null,
    odd: [],
    unread: [],
    atFault: null,
    message: null,
    follows: null,
    work: [],
    loops: 'both',
    rounds: null,
    rows: null,
    asks: [],
    countedWith: null,
    walk: [],
    sizes: [],
  };
}
