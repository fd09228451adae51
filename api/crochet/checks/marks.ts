import { type Check, type CheckChange, finding, many } from './check.ts';
import { isCounted, refsOf, type Scan, type ScanLine } from './scan.ts';
import { type CheckMark } from './source.ts';

/** A line with its printed moment. */
interface Marked {
  readonly at: ScanLine;
  readonly mark: CheckMark;
}

/** Every line's main mark, in the order of the lines. A line that was not filmed has none to speak of. */
function markedLines(scan: Scan): Marked[] {
  const marks = new Map<string, CheckMark>();
  for (const mark of scan.source.marks) {
    const known = mark.lineId === null ? undefined : marks.get(mark.lineId);
    if (mark.lineId !== null && (!known || (mark.main && !known.main))) marks.set(mark.lineId, mark);
  }
  return scan.lines.flatMap((at) => {
    const mark = at.line.filmed ? marks.get(at.line.id) : undefined;
    return mark ? [{ at, mark }] : [];
  });
}

/** Rounds and rows of a filmed pattern without a moment, unless the creator says they were not filmed. */
export function checkMissingMarks(scan: Scan): Check[] {
  if (scan.source.recordings.length === 0) return [];
  const marked = new Set(scan.source.marks.map(({ lineId }) => lineId));
  const without = scan.lines.filter(({ line }) => isCounted(line) && line.filmed && !marked.has(line.id));
  if (without.length === 0) return [];
  return [
    finding('mark-missing', `${many(without.length, 'has', 'have')} no moment in the recording.`, {
      refs: refsOf(without),
      mend: {
        words: many(without.length, 'It was not filmed', 'They were not filmed'),
        done: many(without.length, 'Set as not filmed', `${without.length} lines set as not filmed`),
        changes: without.map(({ line }) => ({ op: 'edit', row: 'line', id: line.id, fields: { filmed: false } })),
      },
    }),
  ];
}

/**
 * The fewest that stand out of order: all but the longest run that only grows. Takes n log n steps.
 * @param starts moments in the order of the lines, in milliseconds
 */
function outOfOrder(starts: readonly number[]): Set<number> {
  const tails: number[] = [];
  const before: (number | null)[] = [];
  starts.forEach((start, i) => {
    let [low, high] = [0, tails.length];
    while (low < high) {
      const middle = (low + high) >> 1;
      if (starts[tails[middle]!]! <= start) low = middle + 1;
      else high = middle;
    }
    before[i] = low > 0 ? tails[low - 1]! : null;
    tails[low] = i;
  });
  const odd = new Set(starts.keys());
  for (let i = tails.at(-1) ?? null; i !== null; i = before[i] ?? null) odd.delete(i);
  return odd;
}

/** Lines whose moment lies before that of a line they follow, within a piece and a recording: pieces are filmed in any order. */
export function checkMarkOrder(scan: Scan): Check[] {
  const runs = new Map<string, Marked[]>();
  for (const one of markedLines(scan)) {
    const key = `${one.at.piece.id} ${one.mark.recordingId}`;
    const run = runs.get(key);
    if (run) run.push(one);
    else runs.set(key, [one]);
  }
  const odd = [...runs.values()].flatMap((run) => {
    const out = outOfOrder(run.map(({ mark }) => mark.startMs));
    return run.filter((_, i) => out.has(i)).map(({ at }) => at);
  });
  if (odd.length === 0) return [];
  return [
    finding(
      'mark-order',
      `${many(odd.length, 'has its moment', 'have their moments')} out of order with the lines around.`,
      {
        refs: refsOf(odd),
      },
    ),
  ];
}

/** Moments that lie behind the end of their recording. */
export function checkMarksBeyond(scan: Scan): Check[] {
  const ends = new Map(scan.source.recordings.map(({ id, durationMs }) => [id, durationMs]));
  const beyond = markedLines(scan).filter(({ mark }) => {
    const end = ends.get(mark.recordingId) ?? Infinity;
    return mark.startMs >= end || (mark.endMs ?? 0) > end;
  });
  if (beyond.length === 0) return [];
  return [
    finding(
      'mark-beyond',
      `${many(beyond.length, 'has its moment', 'have their moments')} beyond the end of the recording.`,
      {
        refs: refsOf(beyond.map(({ at }) => at)),
        mend: {
          words: many(beyond.length, 'Take the moment away', 'Take the moments away'),
          done: many(beyond.length, 'Moment taken away', `${beyond.length} moments mended`),
          changes: beyond.map(({ mark }): CheckChange => {
            const isStart = mark.startMs >= (ends.get(mark.recordingId) ?? Infinity);
            return isStart
              ? { op: 'remove', row: 'mark', id: mark.id }
              : { op: 'edit', row: 'mark', id: mark.id, fields: { endMs: null } };
          }),
        },
      },
    ),
  ];
}

/** Chapters are at least this long where recordings are listed; shorter ones are merged with the next there. */
const SHORTEST_MS = 10_000;

/** Moments followed by the next, or by the end of the recording, in less than ten seconds. */
export function checkChapters(scan: Scan): Check[] {
  const ends = new Map(scan.source.recordings.map(({ id, durationMs }) => [id, durationMs]));
  const inTime = markedLines(scan)
    .filter(({ at }) => isCounted(at.line) || at.line.kind === 'foundation')
    .sort((a, b) =>
      a.mark.recordingId === b.mark.recordingId
        ? a.mark.startMs - b.mark.startMs
        : a.mark.recordingId < b.mark.recordingId
          ? -1
          : 1,
    );
  const short = inTime.filter(({ mark }, i) => {
    const next = inTime[i + 1]?.mark;
    const end = next?.recordingId === mark.recordingId ? next.startMs : (ends.get(mark.recordingId) ?? null);
    return end !== null && end >= mark.startMs && end - mark.startMs < SHORTEST_MS;
  });
  if (short.length === 0) return [];
  const among = new Set(short.map(({ at }) => at));
  const inOrder = scan.lines.filter((line) => among.has(line));
  return [
    finding(
      'chapter-short',
      `${many(short.length, 'lasts', 'last')} less than 10 seconds, and ${many(short.length, 'is', 'are')} merged with the next where chapters are listed.`,
      {
        refs: refsOf(inOrder),
      },
    ),
  ];
}
