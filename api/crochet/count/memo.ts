import { type ReadLine } from '../language/tree.ts';
import { type Counted } from './count-line.ts';
import { type LineInput } from './input.ts';
import { relativeOf } from './relative.ts';
import { type LineCount } from './result.ts';
import { type State } from './state.ts';
import { isAlongRows, targetsIn } from './tree-walk.ts';

/** A line counted once, and the state it was counted after. */
interface Try {
  readonly state: State;
  readonly counted: Counted;
}

/**
 * What is remembered of a line, so that it is worked again only where something it depends on changed: its reading, and
 * what came out each way the piece around it was taken.
 */
export interface Memo {
  readonly line: LineInput;
  readonly read: ReadLine;
  /** What holds for the whole pattern: terms, sizes, stitches of its own. */
  readonly era: string;
  readonly tries: Map<string, Try>;
}

const MEMOS = new WeakMap<LineCount, Memo>();

export const memoOf = (line: LineCount): Memo | undefined => MEMOS.get(line);

/** What a reading says of its need for more than the places before it. */
interface Needs {
  /** Told by another line, or worked into loops or pieces finished earlier: always worked again. */
  readonly others: boolean;
  readonly rows: boolean;
}

const NEEDS = new WeakMap<ReadLine, Needs>();

function needsOf(read: ReadLine): Needs {
  const known = NEEDS.get(read);
  if (known) return known;
  const { items } = read.tree;
  const needs = {
    others: relativeOf(read.tree) !== null || targetsIn(items).some(({ what }) => what === 'loop' || what === 'edge'),
    rows: isAlongRows(items),
  };
  NEEDS.set(read, needs);
  return needs;
}

/** The same line, also where it came as a new object. */
const isSameLine = (one: LineInput, other: LineInput): boolean =>
  one === other ||
  (one.text === other.text &&
    one.kind === other.kind &&
    one.from === other.from &&
    one.to === other.to &&
    one.label === other.label &&
    isAlike(one.written, other.written) &&
    isAlike(one.said, other.said));

const isAlike = (one: unknown, other: unknown): boolean =>
  one === other || JSON.stringify(one) === JSON.stringify(other);

/** The memo to go on with: the old one where the line is the same, so that nothing is kept twice. */
export function memoFor(line: LineInput, read: ReadLine, era: string, old: Memo | undefined): Memo {
  const isSame = old?.read === read && old.era === era && isSameLine(old.line, line);
  return isSame ? old : { line, read, era, tries: new Map() };
}

/** What came out before, where nothing that the line depends on has changed since; else undefined. */
export function stillOf(now: Memo, around: string, state: State): Counted | undefined {
  const before = now.tries.get(around);
  if (!before) return undefined;
  const needs = needsOf(now.read);
  const isStill =
    !needs.others &&
    before.state.lefts === state.lefts &&
    before.state.before === state.before &&
    before.state.stitch === state.stitch &&
    (!needs.rows || before.state.rows === state.rows) &&
    (now.line.from !== null || before.state.number === state.number);
  if (!isStill) return undefined;
  const { counted } = before;
  return before.state.rows === state.rows && before.state.number === state.number
    ? counted
    : { ...counted, state: { ...counted.state, rows: counted.state.rows - before.state.rows + state.rows } };
}

/**
 * Keeps what came out. Where that is as before, the old state goes on, so that what follows need not be worked again.
 *
 * @param memo what was remembered of the line as it was before.
 */
export function keep(memo: Memo | undefined, now: Memo, around: string, state: State, fresh: Counted): Counted {
  const old = memo?.tries.get(around)?.counted.state;
  const isAsBefore =
    old !== undefined && isAlike(old.lefts, fresh.state.lefts) && isAlike(old.before, fresh.state.before);
  const counted = isAsBefore ? { ...fresh, state: { ...fresh.state, lefts: old.lefts, before: old.before } } : fresh;
  now.tries.set(around, { state, counted });
  MEMOS.set(counted.count, now);
  return counted;
}
