import { type Item, type ReadLine } from '../language/tree.ts';
import { type CountedWith } from './compare.ts';
import { countLine, type Around, type Counted } from './count-line.ts';
import { type PieceInput } from './input.ts';
import { type Finished } from './finished.ts';
import { keep, stillOf, type Memo } from './memo.ts';
import { quiet } from './quiet.ts';
import { type ChainPolicy } from './start.ts';
import { startState } from './state.ts';
import { takesBack } from './tree-walk.ts';

/** How the lines of a piece are taken in one go over them. */
export interface PieceWork {
  readonly sizes: number;
  readonly own: ReadonlyMap<string, readonly Item[]>;
  readonly policy: ChainPolicy;
  readonly base: number | null;
  readonly sense: CountedWith | null;
  readonly finished: readonly Finished[];
}

/** A line as it was read now, and what is remembered of it from before. */
export interface Known {
  readonly now: Memo;
  readonly old: Memo | undefined;
}

/** Works all lines of a piece one after another; `known` runs along them. */
export function workPiece(piece: PieceInput, known: readonly Known[], work: PieceWork): Counted[] {
  let state = startState(work.sizes, work.base);
  const counted: Counted[] = [];
  const backFrom = lastTakingBack(known.map(({ now }) => now.read));
  const trees: Around['trees'] = new Map();
  const free: Around['free'] = new Map();
  const way = `${String(work.sizes)} ${JSON.stringify(work.policy)} ${String(work.sense)}`;
  piece.lines.forEach((line, i) => {
    if (line.kind === 'note' || line.kind === 'step') {
      counted.push({ count: quiet(line), state, chain: null, senses: null, trees: [], free: null, opening: null });
      return;
    }
    const { now, old } = known[i]!;
    // A heading within a piece (`Head`, worked on from the legs) leaves the lines above it to be named as a piece.
    const above = { name: piece.name.toLowerCase(), lefts: state.lefts, rows: state.rows, free, opening: null };
    const around: Around = {
      sizes: work.sizes,
      policy: work.policy,
      own: work.own,
      ring: piece.worked !== 'rows' || line.kind === 'round',
      comesBack: backFrom > i,
      sense: work.sense,
      trees,
      free,
      finished: [above, ...work.finished],
    };
    const key = `${way} ${String(around.ring)} ${String(around.comesBack)}`;
    const one = stillOf(now, key, state) ?? keep(old, now, key, state, countLine(line, now.read, state, around));
    for (const [n, tree] of one.trees) trees.set(n, tree);
    if (one.free) free.set(...one.free);
    state = one.state;
    counted.push(one);
  });
  return counted;
}

/** Index of the last line that goes over what short rows left; -1 where none does. */
function lastTakingBack(reads: readonly ReadLine[]): number {
  return reads.findLastIndex((read) => takesBack(read.tree.items));
}
