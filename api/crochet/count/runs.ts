import { type ReadLine } from '../language/tree.ts';
import { judgeLine, type Given, type Judged } from './judge.ts';
import { type Left } from './places.ts';
import { type LineCount, type Verdict } from './result.ts';
import { leftOfTotals, type State } from './state.ts';
import { type Setting } from './work-line.ts';
import { type Around, worse } from './count-line.ts';
import { MOST_PASSES, rowsUntil, type Pass } from './passes.ts';

export interface SizeRun {
  readonly judged: readonly Judged[];
  readonly verdict: Verdict;
  readonly left: Left;
  readonly follows: LineCount['follows'];
}

export function runSize(passes: readonly Pass[], given: Given, state: State, around: Around, size: number): SizeRun {
  const shapedRows = rowsUntil(passes[0]!.read.tree, size);
  if (shapedRows) return runUntil(passes[0]!, given, state, around, size, shapedRows);
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

/** Stitches worked in all rounds of one line together, beyond which the rest of them is not worked. */
const MOST_WORKED = 400_000;

/** Works the rounds of a line one after another. Rounds that can only come out as the one before are not worked again. */
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
  let worked = 0;
  for (const [i, pass] of passes.entries()) {
    const setting = settingFor(state, around, size, left, { rows: state.rows + i, label: pass.n, given });
    const isLast = i === passes.length - 1;
    const index = perRound ? i : size;
    // Where every round is the same, its total is that of each; where they shape, of the last.
    let one = judgeLine(pass.read, perRound || isLast || isEven ? given : none, setting, index);
    if (i === 0 && passes.length > 1) {
      isEven = one.work.tally.sts === one.work.base && passes.every((other) => other.read === pass.read);
      if (isEven) one = judgeLine(pass.read, given, setting, index);
    }
    judged.push(one);
    verdict = worse(verdict, one.verdict);
    if (isEven && !isLast && i > 0 && isSameLeft(left, one.work.left)) {
      while (judged.length < passes.length) judged.push(one);
      return { judged, verdict, left: one.work.left };
    }
    left = one.work.left;
    worked += one.work.walk.length;
    if (one.work.full) break;
    if (worked > MOST_WORKED && !isLast) {
      judged.push({ ...one, verdict: 'does-not-fit', work: { ...one.work, fits: false, full: true } });
      verdict = worse(verdict, 'does-not-fit');
      break;
    }
  }
  return { judged, verdict, left };
}

/** What a line, or one round of it, finds around it. */
export function settingFor(
  state: State,
  around: Around,
  size: number,
  left: Left,
  { rows, label, given }: { readonly rows: number; readonly label: number | null; readonly given: Given },
): Setting {
  return {
    left,
    ring: around.ring,
    size,
    policy: around.policy,
    own: around.own,
    stitch: state.stitch,
    free: around.free,
    finished: around.finished,
    rows,
    comesBack: around.comesBack,
    label,
    blocks: given.written?.group !== undefined,
    sense: around.sense,
  };
}

const isSameLeft = (one: Left, other: Left): boolean =>
  one.made.length === other.made.length && JSON.stringify(one) === JSON.stringify(other);

export function runUntil(
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
  const whole = Number.isInteger(shapings) && shapings > 0 ? (shapings - 1) * rows.every + 1 : 1;
  const n = whole <= MOST_PASSES ? whole : 1;
  const plain: ReadLine = {
    ...pass.read,
    tree: {
      ...pass.read.tree,
      items: [{ type: 'straight', span: pass.read.tree.span, open: false }],
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
