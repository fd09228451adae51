import { type LineTree, type ReadLine } from '../language/tree.ts';
import { type LineInput } from './input.ts';
import { type Given } from './judge.ts';
import { isMixed, relativeOf, withMore } from './relative.ts';
import { type State } from './state.ts';
import { type Around } from './count-line.ts';

/** Rounds that one line may stand for. */
export const MOST_PASSES = 2000;

/** One pass of a line: a tree and the number of the round it is. */
export interface Pass {
  readonly n: number;
  readonly read: ReadLine;
  readonly source: number | null;
}

/** `until 54 sts` is a total like any other. */
export function withUntil(tree: LineTree, given: Given): Given {
  const shaped = tree.items.find((item) => item.type === 'shaped');
  return shaped?.type === 'shaped' && shaped.until && !given.written
    ? { ...given, written: { sts: shaped.until } }
    : given;
}

/** The rounds that a line stands for, each with its tree; null where it names a line that is not there. */
export function passesOf(line: LineInput, read: ReadLine, state: State, around: Around): Pass[] | null {
  const first = line.from ?? state.number + 1;
  const relative = isMixed(read.tree) ? null : relativeOf(read.tree);
  const range = line.from !== null && line.to !== null && line.to > line.from ? line.to - line.from + 1 : 0;
  if (!relative) {
    const n = Math.min(Math.max(1, range), MOST_PASSES);
    return Array.from({ length: n }, (_, i) => ({ n: first + i, read, source: null }));
  }
  const lines =
    relative.lines.length > 0 ? relative.lines.map((n) => (n < 0 ? state.number + 1 + n : n)) : [state.number];
  const trees = lines.map((n) => around.trees.get(n));
  if (trees.some((tree) => tree === undefined)) return null;
  const times = relative.times?.[0] ?? 1;
  const until = relative.until === null ? 0 : relative.until - first + 1;
  const total = Math.min(range || until || lines.length * times, MOST_PASSES);
  return Array.from({ length: Math.max(1, total) }, (_, i) => {
    const tree = trees[i % lines.length]!;
    const more = relative.more * (1 + (lines.length === 1 ? i : 0));
    return { n: first + i, read: { ...read, tree: withMore(tree, more) }, source: lines[i % lines.length]! };
  });
}

/** Rows that shape until a number is reached; null where the line is no such thing. */
export function rowsUntil(tree: LineTree, size: number): { until: number; every: number; change: number } | null {
  const item = tree.items.find((one) => one.type === 'shaped');
  if (item?.type !== 'shaped' || !item.until) return null;
  return { until: item.until[size] ?? item.until[0]!, every: item.every, change: item.change[size] ?? item.change[0]! };
}
