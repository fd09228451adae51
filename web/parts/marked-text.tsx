import { type ReactNode } from 'react';
import type { LineCount, Span } from '#crochet';

/** A stretch of the instruction and what is said of it. */
export interface MarkedPart {
  readonly text: string;
  readonly mark: 'tack' | 'fault' | null;
}

/**
 * An instruction cut where something is said of it: what was not understood, and the phrase at which the stitches run out.
 * Spans that lie beyond the text (it is being typed, the count is a moment behind) are cut to it.
 */
export function markParts(text: string, unread: readonly Span[], atFault: Span | null): MarkedPart[] {
  const marks = [
    ...unread.map((span) => ({ ...span, mark: 'tack' as const })),
    ...(atFault ? [{ ...atFault, mark: 'fault' as const }] : []),
  ]
    .map(({ start, end, mark }) => ({ start: Math.min(start, text.length), end: Math.min(end, text.length), mark }))
    .filter(({ start, end }) => end > start)
    .sort((a, b) => a.start - b.start);
  const parts: MarkedPart[] = [];
  let at = 0;
  for (const { start, end, mark } of marks) {
    if (start < at) continue;
    if (start > at) parts.push({ text: text.slice(at, start), mark: null });
    parts.push({ text: text.slice(start, end), mark });
    at = end;
  }
  if (at < text.length) parts.push({ text: text.slice(at), mark: null });
  return parts;
}

/** The instruction with its faults underlined to the letter. */
export function MarkedText({
  text,
  count,
}: {
  text: string;
  count: Pick<LineCount, 'unread' | 'atFault'> | undefined;
}): ReactNode {
  if (!count || (count.unread.length === 0 && !count.atFault)) return text;
  return markParts(text, count.unread, count.atFault).map((part, i) =>
    part.mark ? (
      <span key={i} className={part.mark}>
        {part.text}
      </span>
    ) : (
      part.text
    ),
  );
}
