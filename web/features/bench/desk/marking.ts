import { lineName } from './line-name.ts';
import { mainMark } from './moments.ts';
import { type Desk, lineOf } from './use-desk.ts';
import { formatTenths } from '../../../lib/time.ts';

const TENTH_MS = 100;

/** Moves the line's main moment, or gives it one. */
export function setMoment(desk: Desk, lineId: string, recordingId: string, startMs: number): void {
  const mark = mainMark(desk.pattern.marks, lineId);
  if (!mark) desk.bench.add('mark', { lineId, recordingId, startMs, main: true });
  else
    desk.bench.edit('mark', mark.id, {
      recordingId,
      startMs,
      ...(mark.endMs !== null && mark.endMs < startMs ? { endMs: null } : {}),
    });
}

/**
 * Marks a line at the playhead: the one in hand, else the first that has no moment yet. A line that is not being written in
 * hands on to the next, so that a whole piece is marked by playing on and pressing one key.
 */
export function markAtPlayhead(desk: Desk): void {
  const { pattern, recordingId, player } = desk;
  const line =
    lineOf(desk, desk.lineId) ?? pattern.lines.find((one) => one.kind !== 'note' && !mainMark(pattern.marks, one.id));
  if (!line || !recordingId || !pattern.mayEdit) return;
  const atMs = Math.round(player.getState().positionMs / TENTH_MS) * TENTH_MS;
  setMoment(desk, line.id, recordingId, atMs);
  desk.tellDone(`${lineName(line) || 'The step'} marked at ${formatTenths(atMs)}`);
  const next = pattern.lines[pattern.lines.indexOf(line) + 1];
  if (!desk.isOpen && next) desk.pick(next.id);
}

/** Moves the moment of the line in hand by tenths of a second; the playhead goes with it, so that it can be seen. */
export function nudgeMoment(desk: Desk, byTenths: number): void {
  const mark = desk.lineId ? mainMark(desk.pattern.marks, desk.lineId) : undefined;
  if (!mark || !desk.lineId || !desk.pattern.mayEdit) return;
  const startMs = Math.max(0, mark.startMs + byTenths * TENTH_MS);
  setMoment(desk, desk.lineId, mark.recordingId, startMs);
  desk.player.request({ kind: 'seek', toMs: startMs });
}
