import type { Draft, DraftLine, DraftPiece, Verdict } from '#crochet';
import type { ReadingPiece, ReadingSummary } from '#contract/recordings';

const isCounted = ({ kind }: DraftLine) => kind === 'round' || kind === 'row';

/** A range stands for as many rounds as it has. */
const roundsOf = ({ from, to }: DraftLine) => (from === null || to === null ? 1 : Math.max(1, to - from + 1));

/** "9", "5–8": as a ring is numbered. */
const ringLabel = ({ from, to }: DraftLine) =>
  from === null ? '' : to === null || to === from ? String(from) : `${from}–${to}`;

function summarisePiece({ name, make, worked, lines }: DraftPiece): ReadingPiece {
  const counted = lines.filter(isCounted);
  return {
    name,
    make,
    worked,
    lines: lines.length,
    rings: counted.map((line) => ({
      label: ringLabel(line),
      counts: Array.from({ length: roundsOf(line) }, () => line.count),
      verdict: line.verdict,
    })),
    rounds: counted.reduce((sum, line) => sum + roundsOf(line), 0),
    totals: counted.flatMap((line) => {
      const { count } = line;
      return count === null ? [] : Array.from({ length: roundsOf(line) }, () => count);
    }),
  };
}

/** What a reading came to, in figures: pieces with their totals, lines by verdict, and what was not understood. */
export function summariseDraft(draft: Draft): Omit<ReadingSummary, 'id' | 'taken'> {
  const all = draft.pieces.flatMap(({ lines }) => lines);
  const counted = all.filter(isCounted);
  const verdicts: Record<Verdict, number> = { agrees: 0, differs: 0, 'does-not-fit': 0, unread: 0, 'no-total': 0 };
  for (const { verdict } of counted) verdicts[verdict] += 1;
  return {
    terms: draft.terms,
    termsReason: draft.termsReason,
    pieces: draft.pieces.map(summarisePiece),
    verdicts,
    toLook: counted.length - verdicts.agrees,
    // A word's moment is worked out within its caption and falls between milliseconds.
    unread: all.flatMap(({ unread }) => (unread ? [{ quote: unread.quote, atMs: Math.round(unread.atMs) }] : [])),
    suggestions: draft.suggestions.map(({ kind, text, atMs }) => ({ kind, text, atMs: Math.round(atMs) })),
    corrections: draft.corrections.length,
    notice: draft.notice,
  };
}
