import { type Evidence, type Mark } from '#contract/rows';
import { type Span } from '../../../parts/player/player-state.ts';

/** The printed moment of a line, if it has one. */
export const mainMark = (marks: readonly Mark[], lineId: string): Mark | undefined =>
  marks.find((mark) => mark.lineId === lineId && mark.main);

/** Main moments in one recording, in order of time. */
export const momentsOf = (marks: readonly Mark[], recordingId: string | null): Mark[] =>
  marks.filter((mark) => mark.recordingId === recordingId && mark.main).sort((a, b) => a.startMs - b.startMs);

const nextStart = (moments: readonly Mark[], startMs: number, lastMs: number) =>
  moments.find((one) => one.startMs > startMs)?.startMs ?? lastMs;

/** What to hear for a line: from its moment to where it was said to end, else to the end of the words that speak of it, else to the next moment. */
export function heardSpan(
  mark: Mark | undefined,
  evidence: readonly Evidence[],
  moments: readonly Mark[],
  lastMs: number,
): Span | null {
  if (!mark) return null;
  const { startMs } = mark;
  const next = nextStart(moments, startMs, lastMs);
  const spokenTo = Math.max(0, ...evidence.filter((one) => one.lineId === mark.lineId).map((one) => one.endMs));
  const endMs = mark.endMs ?? (spokenTo > startMs ? Math.min(spokenTo, Math.max(next, startMs + 1000)) : next);
  return { startMs, endMs: Math.max(endMs, startMs + 500) };
}

/** What the loop repeats: from a line's moment to the next one. */
export function loopSpan(mark: Mark | undefined, moments: readonly Mark[], lastMs: number): Span | null {
  if (!mark) return null;
  return {
    startMs: mark.startMs,
    endMs: mark.endMs ?? Math.max(nextStart(moments, mark.startMs, lastMs), mark.startMs + 1000),
  };
}
