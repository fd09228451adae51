import { type Span } from '../span.ts';
import { type Item, type LineTree, type ReadLine, type Totals } from '../language/tree.ts';
import { allItems, type FreeLoop } from './base.ts';
import { type LineInput } from './input.ts';
import { judgeLine, type Given, type Judged } from './judge.ts';
import { plainLeft, type Left } from './places.ts';
import { isMixed, relativeOf, withMore } from './relative.ts';
import { type LineCount, type RoundCount, type RowCount, type Verdict } from './result.ts';
import { leftOfTotals, type State } from './state.ts';
import { madeOf, workOf } from './tally.ts';
import { messageOf } from './message.ts';
import { type ChainPolicy } from './start.ts';
import { type Setting } from './work-line.ts';

/** What a line takes from its piece and pattern. */
export interface Around {
  readonly sizes: number;
  readonly policy: ChainPolicy;
  readonly own: ReadonlyMap<string, readonly Item[]>;
  readonly ring: boolean;
  readonly comesBack: boolean;
  /** Trees of the numbered lines so far, and loops left free: added to as the piece is gone through. */
  readonly trees: Map<number, LineTree>;
  readonly free: Map<number, FreeLoop>;
}

export interface Counted {
  readonly count: LineCount;
  readonly state: State;
  /** Starting chains about which nothing is said, by stitch: which way they were taken. */
  readonly chain: { readonly stitch: string; readonly other: boolean; readonly matters: boolean } | null;
  /** What the line adds to the piece for later lines to name. */
  readonly trees: readonly (readonly [number, LineTree])[];
  readonly free: readonly [number, FreeLoop] | null;
}

const WORST: readonly Verdict[] = ['unread', 'does-not-fit', 'differs', 'agrees', 'no-total'];

/** The worse of two verdicts; no-total is no judgement and gives way to any. */
export const worse = (a: Verdict, b: Verdict): Verdict => (WORST.indexOf(a) <= WORST.indexOf(b) ? a : b);

/** One pass of a line: a tree and the number of the round it is. */
interface Pass {
  readonly n: number;
  readonly read: ReadLine;
  readonly source: number | null;
}

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
  const sizes = Array.from({ length: around.sizes }, (_, size) => runSize(line, passes, given2, state, around, size));
  return joined(line, read, given2, sizes, passes, state, around);
}

/** `until 54 sts` is a total like any other. */
function withUntil(tree: LineTree, given: Given): Given {
  const shaped = tree.items.find((item) => item.type === 'shaped');
  return shaped?.type === 'shaped' && shaped.until && !given.written
    ? { ...given, written: { sts: shaped.until } }
    : given;
}

/** The rounds that a line stands for, each with its tree; null where it names a line that is not there. */
function passesOf(line: LineInput, read: ReadLine, state: State, around: Around): Pass[] | null {
  const first = line.from ?? state.number + 1;
  const relative = isMixed(read.tree) ? null : relativeOf(read.tree);
  const range = line.from !== null && line.to !== null && line.to > line.from ? line.to - line.from + 1 : 0;
  if (!relative) {
    const n = Math.min(Math.max(1, range), 2000);
    return Array.from({ length: n }, (_, i) => ({ n: first + i, read, source: null }));
  }
  const lines =
    relative.lines.length > 0 ? relative.lines.map((n) => (n < 0 ? state.number + 1 + n : n)) : [state.number];
  const trees = lines.map((n) => around.trees.get(n));
  if (trees.some((tree) => tree === undefined)) return null;
  const times = relative.times?.[0] ?? 1;
  const until = relative.until === null ? 0 : relative.until - first + 1;
  const total = Math.min(range || until || lines.length * times, 2000);
  return Array.from({ length: Math.max(1, total) }, (_, i) => {
    const tree = trees[i % lines.length]!;
    const more = relative.more * (1 + (lines.length === 1 ? i : 0));
    return { n: first + i, read: { ...read, tree: withMore(tree, more) }, source: lines[i % lines.length]! };
  });
}

interface SizeRun {
  readonly judged: readonly Judged[];
  readonly verdict: Verdict;
  readonly left: Left;
  readonly follows: LineCount['follows'];
}

function runSize(
  line: LineInput,
  passes: readonly Pass[],
  given: Given,
  state: State,
  around: Around,
  size: number,
): SizeRun {
  const shapedRows = rowsUntil(passes[0]!.read.tree, size);
  if (shapedRows) return runUntil(line, passes[0]!, given, state, around, size, shapedRows);
  let start = startFor(state, size);
  let run = runPasses(passes, given, start.left, state, around, size);
  // What the line before made does not fit: perhaps its total does.
  if (run.verdict === 'does-not-fit') {
    for (const other of otherStarts(state, size)) {
      const again = runPasses(passes, given, other.left, state, around, size);
      if (again.verdict !== 'does-not-fit') {
        run = again;
        start = other;
        break;
      }
    }
  }
  return { ...run, follows: start.follows };
}

interface Start { readonly left: Left; readonly follows: LineCount['follows'] }

/** What the line works into: what was made, or, after a fault, what was written or said. */
function startFor(state: State, size: number): Start {
  const made = state.lefts[size] ?? state.lefts[0]!;
  const { before } = state;
  if (before?.verdict !== 'does-not-fit' && before?.verdict !== 'unread') return { left: made, follows: null };
  return otherStarts(state, size)[0] ?? { left: made, follows: { line: before.id, as: 'made' } };
}

function otherStarts(state: State, size: number): Start[] {
  const { before } = state;
  if (!before || before.verdict === 'agrees' || before.verdict === 'no-total') return [];
  const starts: Start[] = [];
  for (const as of ['written', 'said'] as const) {
    const totals = before[as];
    const left = totals ? leftOfTotals(totals, size) : null;
    if (left) starts.push({ left, follows: { line: before.id, as } });
  }
  return starts;
}

function runPasses(
  passes: readonly Pass[],
  given: Given,
  start: Left,
  state: State,
  around: Around,
  size: number,
): Omit<SizeRun, 'follows'> {
  const judged: Judged[] = [];
  let left = start;
  const figures = (given.written ?? given.said)?.sts;
  const perRound = around.sizes === 1 && figures !== undefined && figures.length === passes.length && passes.length > 1;
  const none: Given = { written: null, said: null };
  let verdict: Verdict = 'no-total';
  let isEven = false;
  passes.forEach((pass, i) => {
    const setting: Setting = {
      left,
      ring: around.ring,
      size,
      policy: around.policy,
      own: around.own,
      stitch: state.stitch,
      free: around.free,
      rows: state.rows + i,
      comesBack: around.comesBack,
      label: pass.n,
      blocks: given.written?.group !== undefined,
    };
    const isLast = i === passes.length - 1;
    // Where every round is the same, its total is that of each; where they shape, of the last.
    const isGiven = perRound || isLast || isEven;
    const one = judgeLine(pass.read, isGiven ? given : none, setting, perRound ? i : size);
    if (i === 0 && passes.length > 1)
      isEven = one.work.tally.sts === one.work.base && passes.every((other) => other.read === pass.read);
    if (i === 0 && isEven) {
      const again = judgeLine(pass.read, given, setting, perRound ? i : size);
      judged.push(again);
      verdict = worse(verdict, again.verdict);
      left = again.work.left;
      return;
    }
    judged.push(one);
    verdict = worse(verdict, one.verdict);
    left = one.work.left;
  });
  return { judged, verdict, left };
}

/** Rows that shape until a number is reached; null where the line is no such thing. */
function rowsUntil(tree: LineTree, size: number): { until: number; every: number; change: number } | null {
  const item = tree.items.find((one) => one.type === 'shaped');
  if (item?.type !== 'shaped' || !item.until) return null;
  return { until: item.until[size] ?? item.until[0]!, every: item.every, change: item.change[size] ?? item.change[0]! };
}

function runUntil(
  line: LineInput,
  pass: Pass,
  given: Given,
  state: State,
  around: Around,
  size: number,
  rows: { until: number; every: number; change: number },
): SizeRun {
  const start = startFor(state, size);
  const from = start.left.count ?? start.left.made.length;
  const shapings = (rows.until - from) / rows.change;
  const n = Number.isInteger(shapings) && shapings > 0 && shapings < 500 ? (shapings - 1) * rows.every + 1 : 1;
  const plain: ReadLine = {
    ...pass.read,
    tree: {
      ...pass.read.tree,
      items: [{ type: 'straight', span: line.text ? pass.read.tree.span : pass.read.tree.span, open: false }],
    },
  };
  const passes = Array.from({ length: n }, (_, i) => ({
    ...pass,
    n: pass.n + i,
    read: i % rows.every === 0 ? pass.read : plain,
  }));
  const run = runPasses(passes, given, start.left, state, around, size);
  return { ...run, follows: start.follows };
}

function loopsOf(read: ReadLine): LineCount['loops'] {
  const works = allItems(read.tree.items).filter(
    (item) => item.type === 'work' && item.stitch !== 'ch' && item.stitch !== 'slst',
  );
  const kinds = new Set(
    works.map((item) => (item.type === 'work' ? (item.loops ?? read.tree.loops ?? 'both') : 'both')),
  );
  if (kinds.size > 1) return 'mixed';
  return [...kinds][0] ?? read.tree.loops ?? 'both';
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
    countedWith: final === 'agrees' && given.written?.sts ? (shown.ways[0] ?? null) : null,
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
  const isLooped = (loops === 'back' || loops === 'front') && count.uses !== null;
  const free = isLooped ? ([passes.at(-1)!.n, { loops, n: count.uses }] as const) : null;
  return { count, state: nextState(line, count, sizes, passes, state), chain: unsaid, trees, free };
}

/** Stitches; or blocks and groups, where the total counts those and comes out. */
function countOf({ work, verdict }: Judged, given: Given): number {
  const kinds = Object.entries(given.written ?? {});
  const [kind, figures] = kinds[0] ?? ['sts', []];
  const isGrouped = kinds.length === 1 && ['group', 'shell', 'vst'].includes(kind) && verdict === 'agrees';
  return isGrouped ? (figures[0] ?? work.tally.sts) : work.tally.sts;
}

/** One entry a round where the rounds of a range do not all come out the same. */
function roundsOf(
  judged: readonly Judged[],
  passes: readonly Pass[],
  given: Given,
  around: Around,
): RoundCount[] | null {
  if (judged.length < 2) return null;
  const isEven = judged.every(
    (one) => one.work.tally.sts === judged[0]!.work.tally.sts && one.work.base === judged[0]!.work.base,
  );
  if (isEven) return null;
  const figures = given.written?.sts;
  const perRound = around.sizes === 1 && figures?.length === judged.length;
  return judged.map((one, i) => {
    const isLast = i === judged.length - 1;
    const stated: Totals | null = perRound ? { sts: [figures[i]!] } : isLast ? given.written : null;
    return { n: passes[i]?.n ?? i + 1, base: one.work.base, stated, count: one.work.tally.sts, verdict: one.verdict };
  });
}

/** One entry a row where a group of rows is repeated. */
function rowsOf(judged: readonly Judged[], passes: readonly Pass[], given: Given): RowCount[] | null {
  const isGroup = new Set(passes.map((pass) => pass.source)).size > 1;
  if (!isGroup) return null;
  return judged.map(({ work, verdict }, i) => ({
    from: passes[i]!.n,
    to: passes[i]!.n,
    source: passes[i]!.source ?? passes[i]!.n,
    work: workOf(work.walk),
    base: work.base,
    uses: work.uses,
    stated: i === judged.length - 1 ? given.written : null,
    count: work.tally.sts,
    made: madeOf(work.tally),
    verdict,
  }));
}

function lastSpan(tree: LineTree): Span | null {
  const working = tree.items.filter((item) => item.type !== 'note' && item.type !== 'step');
  return working.at(-1)?.span ?? null;
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
  const setting: Setting = {
    left: state.lefts[0]!,
    ring: around.ring,
    size: 0,
    policy: around.policy,
    own: around.own,
    stitch: state.stitch,
    free: around.free,
    rows: state.rows,
    comesBack: around.comesBack,
    label: line.from,
    blocks: false,
  };
  const judged = judgeLine(read, { written: null, said: null }, setting, 0);
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
    trees: line.from === null ? [] : [[line.from, read.tree]],
    free: null,
  };
}
