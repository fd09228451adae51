import type { PublicEdition, PublicLine } from '#contract/editions';

/** A stretch of one recording, in milliseconds. */
export interface Moment {
  readonly recordingNumber: number;
  readonly startMs: number;
  readonly endMs: number;
}

const linesOf = (edition: PublicEdition) => edition.pieces.flatMap(({ lines }) => lines);

/** How long a recording is, as far as the edition knows: its own length, else the end of its last caption or mark. */
export function lengthOf(edition: PublicEdition, recordingNumber: number): number {
  const own = edition.recordings.find(({ number }) => number === recordingNumber)?.durationMs;
  if (own) return own;
  const ends = edition.captions.filter((c) => c.recordingNumber === recordingNumber).map(({ endMs }) => endMs);
  const starts = linesOf(edition).flatMap(({ mark }) =>
    mark?.recordingNumber === recordingNumber ? [mark.startMs + 1_000] : [],
  );
  return Math.max(0, ...ends, ...starts);
}

/** Where a line is shown: from its mark to its end, else to the next line's mark, else to the end of the recording. */
export function momentOf(edition: PublicEdition, line: PublicLine): Moment | null {
  const { mark } = line;
  if (!mark) return null;
  const later = linesOf(edition)
    .flatMap((other) => (other.mark?.recordingNumber === mark.recordingNumber ? [other.mark.startMs] : []))
    .filter((startMs) => startMs > mark.startMs);
  const endMs = mark.endMs ?? Math.min(...later, lengthOf(edition, mark.recordingNumber));
  return { recordingNumber: mark.recordingNumber, startMs: mark.startMs, endMs: Math.max(endMs, mark.startMs + 500) };
}

/** The line that is shown at a moment: the last one marked before it. */
export function lineAt(edition: PublicEdition, recordingNumber: number, ms: number): PublicLine | undefined {
  return linesOf(edition)
    .filter(({ mark }) => mark?.recordingNumber === recordingNumber && mark.startMs <= ms)
    .sort((a, b) => (a.mark?.startMs ?? 0) - (b.mark?.startMs ?? 0))
    .at(-1);
}

/** `?t=90` in the first recording, `?r=2&t=90` in the second; null where the address names no moment. */
export function momentIn(search: string): { readonly recordingNumber: number; readonly ms: number } | null {
  const query = new URLSearchParams(search);
  const seconds = Number(query.get('t') ?? NaN);
  const recordingNumber = Number(query.get('r') ?? 1);
  if (!Number.isFinite(seconds) || seconds < 0 || !Number.isInteger(recordingNumber)) return null;
  return { recordingNumber, ms: seconds * 1000 };
}
