import { type LineCount, type Totals } from '#crochet';
import { type Line } from '#contract/rows';
import { totalLines } from '../../../parts/totals.tsx';
import { VERDICT_WORDS } from '../../../parts/verdict-mark.tsx';
import { spokenName } from '../desk/line-name.ts';

/** What stands in the worked-out cell. */
export interface WorkedFigure {
  readonly text: readonly string[];
  readonly isOdd: boolean;
}

/** Kinds that the given totals name are worked out in the same kinds, so that like stands beside like. */
function inKindsOf(given: Totals | null, count: LineCount): readonly string[] {
  const kinds = Object.keys(given ?? {}).filter((kind) => kind !== 'sts');
  if (kinds.length === 0) return [String(count.count ?? '?')];
  return kinds.map((kind) => `${count.made[kind] ?? 0} ${kind}`);
}

/** `18`, `?` where it cannot be worked out, `needs 30` or `3 left` where it does not fit. */
export function workedFigure(count: LineCount | undefined): WorkedFigure {
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

/** The whole line as a screen reader says it. */
export function spokenLine(line: Line, count: LineCount | undefined, follows: string | undefined): string {
  const say = (name: string, totals: Totals | null) => (totals ? [`${name} ${totalLines(totals).join(', ')}`] : []);
  const parts = [spokenName(line), line.text || 'nothing written yet'];
  if (!count) return parts.join(', ');
  parts.push(...say('said', count.said), ...say('written', count.written));
  if (count.count !== null) parts.push(`worked out ${count.count}`);
  parts.push(count.message ?? (follows ? `follows ${follows}` : VERDICT_WORDS[count.verdict]));
  return parts.join(', ').replace(/\s*×\s*/g, ' times ');
}
