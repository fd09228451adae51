import { type Item, type Sized } from '../language/tree.ts';
import { stitchOf } from '../stitches.ts';
import { type Choices } from './readings.ts';
import { type Finished } from './finished.ts';
import { type Walker } from './walker.ts';
import { type Named } from './places.ts';

/** An edge of a piece worked earlier: its stitches, null where not known, and how many of them are used up. */
export interface Edge {
  readonly has: number | null;
  used: number;
}

/** What is needed while a line is worked: the hands, what was chosen, and what the line says of itself. */
export interface Job {
  readonly walker: Walker;
  readonly choices: Choices;
  /** Which size is worked, from 0. */
  readonly size: number;
  /** What a bare `inc`, `dec` or `6 sts` is made of. */
  readonly stitch: string;
  readonly named: Named;
  /** Stitches that the pattern defines, by key. */
  readonly own: ReadonlyMap<string, readonly Item[]>;
  readonly ring: boolean;
  /** Places along a chain made within the line (`ch 6, dc in 4th ch and next 2`). */
  /** Places on the first side of a chain that is worked on both sides; 0 where it is not, or the far side is reached. */
  sideEnd: number;
  local: { chains: number; left: number } | null;
  /** Places marked, by index. */
  readonly marks: readonly number[];
  /** Fills that had no bound: what they make is not known. */
  endless: boolean;
  turned: boolean;
  readonly finished: readonly Finished[];
  /** Edges of pieces worked along so far, by name and number. */
  readonly edges: Map<string, Edge>;
  /** How many repeats the hands are in. */
  depth: number;
  /** A chain at the very end, before the turn. */
  turningChain: number;
  /** A picot or another end that makes no stitch. */
  readonly lastSlip: Item | null;
}

export const pick = (sized: Sized, size: number): number => sized[size] ?? sized[0] ?? 1;

/** Places that one stitch uses. */
export function legsOf(key: string): number {
  return stitchOf(key)?.uses ?? 1;
}

/** Places that these items use, where they say how many; what goes on until the places run out uses none here. */
export function usesOf(items: readonly Item[], job: Job): number {
  let uses = 0;
  for (const item of items) {
    if (item.type === 'skip') uses += item.of?.which === 'every' ? 0 : pick(item.n, job.size);
    else if (item.type === 'step') uses += item.what === 'leave' ? Math.max(0, item.n ?? 1) : 0;
    else if (item.type === 'group') {
      const n =
        item.times.type === 'n'
          ? pick(item.times.n, job.size)
          : item.times.type === 'rep'
            ? pick(item.times.n, job.size) + (job.choices.rep === 'more' ? 1 : 0)
            : item.times.type === 'unsaid' && job.choices.unsaid === 'once'
              ? 1
              : 0;
      if (item.into)
        uses += item.into.which === 'same' || item.into.what === 'ring' || item.into.which === 'first' ? 0 : n;
      else uses += n * usesOf(item.items, job);
    } else if (item.type === 'work') {
      if (item === job.lastSlip || item.stitch === 'ch' || item.stitch === 'picot' || item.times.type !== 'n') continue;
      if (
        item.into?.what === 'ring' ||
        item.into?.what === 'edge' ||
        item.into?.which === 'hook' ||
        item.into?.which === 'same' ||
        item.into?.which === 'first' ||
        item.into?.which === 'skipped'
      )
        continue;
      if (stitchOf(item.stitch)?.family === 'foundation') continue;
      const legs = legsOf(item.stitch) * (item.into?.through === 'layers' ? 2 : 1);
      uses += pick(item.times.n, job.size) * legs;
    }
  }
  return uses;
}
