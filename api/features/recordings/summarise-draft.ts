import type { Draft, DraftLine, DraftPiece, Verdict } from '#crochet';
import type { ReadingPiece, ReadingSummary } from '#contract/recordings';

const isCounted = ({ kind }: DraftLine) => kind === 'round' || kind === 'row';

/** A range stands for as many rounds as it has. */
const roundsOf = ({ from, to }: DraftLine) => (from === null || to === null ? 1 : Math.max(1, to - from + 1));

function summarisePiece({ name, make, worked, lines }: DraftPiece): ReadingPiece {
  const counted = lines.filter(isCounted);
  return {
    name,
    make,
    worked,
    lines: lines.length,
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
    notice: draft.notice,
  };
}
