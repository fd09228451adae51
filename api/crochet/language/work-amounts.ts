import { type Sized, type Times, type Work } from './tree.ts';
import { stitchOf } from '../stitches.ts';
import { ONE } from './amounts.ts';
import { type TargetRead } from './target.ts';
import { FILL, times } from './times.ts';

export type Amounts = Pick<Work, 'per' | 'times' | 'into'>;

export function amounts(
  count: Sized | null,
  more: Sized | null,
  target: TargetRead | null,
  fill: Times | null,
): Amounts {
  const into = target?.target ?? null;
  if (into?.which === 'skipped') return { per: ONE, times: times(target?.count ?? count ?? ONE), into };
  if (into?.what === 'ring' || into?.which === 'hook') return { per: count ?? ONE, times: times(more ?? ONE), into };
  if (target?.count) {
    const isEach = !target.each && count?.[0] === target.count[0] && target.count[0]! > 1;
    return {
      per: isEach || !count ? ONE : count,
      times: fill && target.count[0] === 1 ? fill : times(target.count),
      into,
    };
  }
  if (target?.fill) return { per: count ?? ONE, times: fill?.type === 'fill' ? fill : FILL, into };
  if (fill) {
    // `24 sc around` is a count; `1 sc around` goes on.
    if (count && !into && count[0]! > 2) return { per: ONE, times: times(count), into };
    return { per: count ?? ONE, times: fill, into };
  }
  if (
    into &&
    (into.which === 'next' ||
      into.which === 'same' ||
      into.which === 'first' ||
      into.which === 'last' ||
      into.which === 'nth' ||
      into.which === 'centre')
  ) {
    return { per: count ?? ONE, times: times(more ?? ONE), into };
  }
  if (into) return { per: count ?? ONE, times: times(more ?? ONE), into };
  return {
    per: ONE,
    times: times(count && more ? count.map((n, i) => n * (more[i] ?? more[0]!)) : (count ?? more ?? ONE)),
    into,
  };
}

/** `dec over next 2 sts`, `inv dec in next 2 sts`: the stitches that are drawn together, not so many decreases. */
export function drawnInto(key: string, found: Amounts, target: TargetRead | null): Amounts {
  const uses = stitchOf(key)?.family === 'decrease' ? (stitchOf(key)?.uses ?? 2) : 0;
  const n = target?.count?.[0] ?? 0;
  const isPlace = target?.target.what === 'st' && (target.target.which === 'next' || target.target.which === 'first');
  if (uses < 2 || !isPlace || target.each || found.per[0] !== 1 || n % uses !== 0) return found;
  return n === uses || target.over ? { ...found, times: times([n / uses]), into: null } : found;
}
