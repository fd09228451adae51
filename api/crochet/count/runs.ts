import { type ReadLine } from '../language/tree.ts';
import { type LineInput } from './input.ts';
import { judgeLine, type Given, type Judged } from './judge.ts';
import { type Left } from './places.ts';
import { type LineCount, type Verdict } from './result.ts';
import { leftOfTotals, type State } from './state.ts';
import { type Setting } from './work-line.ts';
import { type Around, worse } from './count-line.ts';
import { rowsUntil, type Pass } from './passes.ts';

export interface SizeRun {
  readonly judged: readonly Judged[];
  readonly verdict: Verdict;
  readonly left: Left;
  readonly follows: LineCount['follows'];
}

export function runSize(
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

export interface Start {
  readonly left: Left;
  readonly follows: LineCount['follows'];
}

/** What the line works into: what was made, or, after a fault, what was written or said. */
export function startFor(state: State, size: number): Start {
  const made = state.lefts[size] ?? state.lefts[0]!;
  const { before } = state;
  if (before?.verdict !== 'does-not-fit' && before?.verdict !== 'unread') return { left: made, follows: null };
  return otherStarts(state, size)[0] ?? { left: made, follows: { line: before.id, as: 'made' } };
}

export function otherStarts(state: State, size: number): Start[] {
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

export function runPasses(
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
  const perRound = around.sizes === 1 && figures?.length === passes.length && passes.length > 1;
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
      sense: around.sense,
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

export function runUntil(
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
