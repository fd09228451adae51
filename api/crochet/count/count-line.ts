import { type Span } from '../span.ts';
import { type Item, type LineTree, type ReadLine } from '../language/tree.ts';
import { type FreeLoop } from './base.ts';
import { openingOf, type Finished, type Opening } from './finished.ts';
import { type LineInput } from './input.ts';
import { hasChains, type CountedWith } from './compare.ts';
import { judgeLine, type Given } from './judge.ts';
import { plainLeft } from './places.ts';
import { relativeOf } from './relative.ts';
import { type LineCount, type Verdict } from './result.ts';
import { type State } from './state.ts';
import { madeOf, workOf } from './tally.ts';
import { messageOf } from './message.ts';
import { type ChainPolicy } from './start.ts';
import { type SizeRun, settingFor, startFor, runSize } from './runs.ts';
import { type Pass, withUntil, passesOf } from './passes.ts';
import { lastSpan, countOf, loopsOf, roundsOf, rowsOf } from './told.ts';

/** What a line takes from its piece and pattern. */
export interface Around {
  readonly sizes: number;
  readonly policy: ChainPolicy;
  readonly own: ReadonlyMap<string, readonly Item[]>;
  readonly ring: boolean;
  readonly comesBack: boolean;
  /** In which sense the plain totals of the piece's lace are meant, where that is settled. */
  readonly sense: CountedWith | null;
  /** Trees of the numbered lines so far, and loops left free: added to as the piece is gone through. */
  readonly trees: Map<number, LineTree>;
  readonly free: Map<number, FreeLoop>;
  /** Pieces worked earlier. */
  readonly finished: readonly Finished[];
}

export interface Counted {
  readonly count: LineCount;
  readonly state: State;
  /** Starting chains about which nothing is said, by stitch: which way they were taken. */
  readonly chain: { readonly stitch: string; readonly other: boolean; readonly matters: boolean } | null;
  /** For a line with chains that agrees with a plain total: every sense in which it does. */
  readonly senses: readonly CountedWith[] | null;
  /** What the line adds to the piece for later lines to name. */
  readonly trees: readonly (readonly [number, LineTree])[];
  readonly free: readonly [number, FreeLoop] | null;
  readonly opening: Opening | null;
}

const WORST: readonly Verdict[] = ['unread', 'does-not-fit', 'differs', 'agrees', 'no-total'];

/** The worse of two verdicts; no-total is no judgement and gives way to any. */
export const worse = (a: Verdict, b: Verdict): Verdict => (WORST.indexOf(a) <= WORST.indexOf(b) ? a : b);

/** Counts one line after the state that the lines before left. */
export function countLine(line: LineInput, read: ReadLine, state: State, around: Around): Counted {
  const given: Given = { written: read.total ?? line.written, said: line.said };
  const unread = read.unread;
  const passes = passesOf(line, read, state, around);
  if (unread.length > 0 || passes === null) {
    const spans = passes === null ? [...unread, relativeOf(read.tree)!.span] : unread;
    return unreadLine(line, read, given, spans, state, around);
  }
  const given2 = withUntil(read.tree, given);
  const sizes = Array.from({ length: around.sizes }, (_, size) => runSize(passes, given2, state, around, size));
  return joined(line, read, given2, sizes, passes, state, around);
}

/** The line as it is told, from what came out for each size and round. */
function joined(
  line: LineInput,
  read: ReadLine,
  given: Given,
  sizes: readonly SizeRun[],
  passes: readonly Pass[],
  state: State,
  around: Around,
): Counted {
  const first = sizes[0]!;
  const opening = first.judged[0]!;
  const closing = first.judged.at(-1)!;
  const verdict = sizes.reduce<Verdict>((worst, run) => worse(worst, run.verdict), first.verdict);
  const faulty = first.judged.find((one) => one.verdict === first.verdict) ?? opening;
  const isFoundation = opening.work.isFoundation;
  const rounds = roundsOf(first.judged, passes, given, around);
  const shown = rounds ? closing : opening;
  const final: Verdict = isFoundation ? 'no-total' : verdict;
  const loops = loopsOf(passes[0]!.read);
  const count: LineCount = {
    id: line.id,
    verdict: final,
    base: opening.work.base,
    uses: opening.work.uses,
    count: opening.work.endless && !opening.inferred ? null : countOf(shown, given),
    made: isFoundation ? { ch: shown.work.walk.length } : madeOf(shown.work.tally),
    written: given.written,
    writtenSpan: read.totalSpan,
    said: line.said,
    odd: faulty.odd,
    unread: [],
    atFault: final === 'does-not-fit' ? (faulty.work.fault ?? lastSpan(read.tree)) : null,
    message: messageOf(faulty, final),
    follows: first.follows,
    work: workOf(opening.work.walk),
    loops,
    rounds,
    rows: rowsOf(first.judged, passes, given),
    asks: opening.asks,
    countedWith: final === 'agrees' ? (shown.ways[0] ?? null) : null,
    walk: opening.work.walk.map(({ stitch, on, makes }) => ({ stitch, on, makes })),
    sizes: sizes.slice(1).map(({ judged, verdict: each }) => {
      const one = judged.at(-1)!;
      return {
        base: judged[0]!.work.base,
        uses: judged[0]!.work.uses,
        count: one.work.tally.sts,
        made: madeOf(one.work.tally),
        verdict: each,
      };
    }),
  };
  const unsaid = opening.work.chainUnsaid
    ? {
        stitch: opening.work.walk[0]?.stitch ?? 'dc',
        other: opening.choices.chain === 'other',
        matters: final === 'agrees',
      }
    : null;
  const trees = passes.map((pass) => [pass.n, pass.read.tree] as const);
  const used = sizes.map((run) => run.judged.at(-1)!.work.uses);
  const isLooped = loops === 'back' || loops === 'front' || loops === 'third';
  const free = isLooped && used.every((n) => n !== null) ? ([passes.at(-1)!.n, { loops, n: used }] as const) : null;
  return {
    count,
    state: nextState(line, count, sizes, passes, state),
    chain: unsaid,
    senses: final === 'agrees' ? sensesOf(sizes) : null,
    trees,
    free,
    opening: openingOf(opening.work.walk),
  };
}

/** Senses in which the totals of every round and size come out; null where no chains are made. */
function sensesOf(sizes: readonly SizeRun[]): CountedWith[] | null {
  const judged = sizes
    .flatMap((run) => run.judged)
    .filter((one) => one.verdict === 'agrees' && one.ways.length > 0 && hasChains(one.work.tally));
  const [first, ...others] = judged;
  return first ? first.ways.filter((way) => others.every((one) => one.ways.includes(way))) : null;
}

function nextState(
  line: LineInput,
  count: LineCount,
  sizes: readonly SizeRun[],
  passes: readonly Pass[],
  state: State,
): State {
  const last = line.to ?? line.from ?? (line.kind === 'foundation' ? 0 : state.number + passes.length);
  return {
    lefts: sizes.map((run) => run.left),
    before: { id: line.id, verdict: count.verdict, written: count.written, said: count.said },
    rows: state.rows + (line.kind === 'foundation' ? 0 : passes.length),
    stitch: state.stitch,
    number: line.kind === 'foundation' && line.from === null ? state.number : last,
  };
}

/** A line with a stretch that could change the count: nothing is worked out, and the next goes on from its totals. */
function unreadLine(
  line: LineInput,
  read: ReadLine,
  given: Given,
  unread: readonly Span[],
  state: State,
  around: Around,
): Counted {
  const nothing: Given = { written: null, said: null };
  const setting = settingFor(state, around, 0, state.lefts[0]!, {
    rows: state.rows,
    label: line.from,
    given: nothing,
  });
  const judged = judgeLine(read, nothing, setting, 0);
  const count: LineCount = {
    id: line.id,
    verdict: 'unread',
    base: startFor(state, 0).left.count ?? judged.work.base,
    uses: null,
    count: null,
    made: {},
    written: given.written,
    writtenSpan: read.totalSpan,
    said: line.said,
    odd: [],
    unread,
    atFault: null,
    message: null,
    follows: null,
    work: workOf(judged.work.walk),
    loops: loopsOf(read),
    rounds: null,
    rows: null,
    asks: [],
    countedWith: null,
    walk: [],
    sizes: [],
  };
  const made = judged.work.endless ? plainLeft(0) : judged.work.left;
  return {
    count,
    state: {
      ...state,
      lefts: state.lefts.map(() => made),
      before: { id: line.id, verdict: 'unread', written: given.written, said: line.said },
      number: line.to ?? line.from ?? state.number + 1,
      rows: state.rows + 1,
    },
    chain: null,
    senses: null,
    trees: line.from === null ? [] : [[line.from, read.tree]],
    free: null,
    opening: null,
  };
}
