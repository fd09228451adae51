import type { LineCount } from '../count/result.ts';
import type { Totals } from '../language/tree.ts';
import type { Terms } from '../span.ts';
import { printTotals } from '../language/totals-text.ts';
import { translate } from '../language/translate.ts';
import type { BothTerms, EditionLine, EditionPiece } from './document.ts';
import { lineLabel } from './line-label.ts';
import { repeatsOf } from './repeats.ts';
import { slipsOf } from './slips.ts';
import type { SourceLine } from './source.ts';

/** The words in both terms, the other ones translated from those they were typed in. */
export function inBothTerms(text: string, terms: Terms): BothTerms {
  const other = terms === 'US' ? 'UK' : 'US';
  return { [terms]: text, [other]: translate(text, terms, other) } as BothTerms;
}

/** The instruction without the total that stands in it, nor what led up to it ("… – (24)"). */
function withoutTotal(text: string, span: LineCount['writtenSpan']): string {
  if (!span) return text.trim();
  const before = text.slice(0, span.start).replace(/[\s:=;,–—-]+$/, '');
  const after = text.slice(span.end).replace(/^[\s.;,]+/, '');
  return after === '' ? before.trim() : `${before} ${after}`.trim();
}

/** What was worked out, by kind where there are several kinds, one figure a size; null where it is not known. */
function workedOut(count: LineCount): Totals | null {
  if (count.count === null) return null;
  const kinds = Object.keys(count.made);
  const lace = kinds.some((kind) => / sp$|^ch/.test(kind)) && kinds.length > 1;
  if (lace && count.sizes.length === 0) {
    return Object.fromEntries(Object.entries(count.made).map(([kind, made]) => [kind, [made]]));
  }
  const others = count.sizes.map((size) => size.count);
  return others.includes(null) ? null : { sts: [count.count, ...(others as number[])] };
}

/** One line as it goes out. */
export function buildLine(
  line: SourceLine,
  count: LineCount,
  worked: EditionPiece['worked'],
  terms: Terms,
): EditionLine {
  const counted = line.kind === 'round' || line.kind === 'row';
  const totals = counted || count.written ? (count.written ?? workedOut(count)) : null;
  const rounds = count.rounds?.map(({ n, count: after }) => ({ n, count: after })) ?? null;
  const several = line.from !== null && line.to !== null && line.to > line.from;
  const repeats = repeatsOf(count.walk);
  return {
    shortId: line.shortId,
    kind: line.kind,
    label: lineLabel(line),
    from: line.from,
    to: line.to,
    text: inBothTerms(withoutTotal(line.text, count.writtenSpan), terms),
    note: inBothTerms(line.note, terms),
    totals,
    total: totals && inBothTerms(printTotals(totals), terms),
    count: count.count,
    each: several && (rounds === null || rounds.every((round) => round.count === rounds[0]?.count)),
    made: count.made,
    mark: line.mark,
    walk: count.walk,
    rounds,
    repeats,
    slips: slipsOf({ walk: count.walk, repeats, count: count.count }, worked),
    studio: {
      id: line.id,
      verdict: count.verdict,
      said: count.said,
      written: count.written,
      leftBecause: line.leftBecause,
    },
  };
}
