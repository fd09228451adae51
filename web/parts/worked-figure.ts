import type { LineCount, Totals } from '#crochet';

/** The part of a counted line that its worked-out cell tells of. */
type Worked = Pick<LineCount, 'verdict' | 'uses' | 'base' | 'odd' | 'count' | 'made' | 'written' | 'said' | 'sizes'>;

/** What stands in the worked-out cell. */
export interface WorkedFigure {
  readonly text: readonly string[];
  readonly isOdd: boolean;
}

/** Kinds that the given totals name are worked out in the same kinds, so that like stands beside like. */
function inKindsOf(given: Totals | null, count: Worked): readonly string[] {
  const kinds = Object.keys(given ?? {}).filter((kind) => kind !== 'sts');
  if (kinds.length === 0) return [String(count.count ?? '?')];
  return kinds.map((kind) => `${count.made[kind] ?? 0} ${kind}`);
}

/** `18`, `?` where it cannot be worked out, `needs 30` or `3 left` where it does not fit. */
export function workedFigure(count: Worked | undefined): WorkedFigure {
  if (!count) return { text: ['–'], isOdd: false };
  const { verdict, uses, base, odd } = count;
  if (verdict === 'unread') return { text: ['?'], isOdd: false };
  if (verdict === 'does-not-fit') {
    if (uses === null || base === null) return { text: ['does not fit'], isOdd: true };
    return { text: [uses > base ? `needs ${uses}` : `${base - uses} left`], isOdd: true };
  }
  if (count.count === null) return { text: ['–'], isOdd: false };
  const sizes = count.sizes.map((size) => size.count ?? '?');
  const text =
    sizes.length > 0 ? [`${count.count} (${sizes.join(', ')})`] : inKindsOf(count.written ?? count.said, count);
  return { text, isOdd: odd.includes('worked') };
}
