import { useMemo } from 'react';
import { type Knot } from '../../../parts/thread/thread-knots.ts';
import { Thread } from '../../../parts/thread/thread.tsx';
import { type Desk, useDesk } from '../desk/use-desk.ts';
import { knotLabel, lineName } from '../desk/line-name.ts';
import { setMoment } from '../desk/marking.ts';
import { formatTenths } from '../../../lib/time.ts';

/** Knots of the shown recording, each with the worst of its line. */
function knotsOf({ pattern, moments, counts }: Pick<Desk, 'pattern' | 'moments' | 'counts'>): Knot[] {
  return moments.map(({ id, lineId, startMs, title }) => {
    const line = pattern.lines.find((one) => one.id === lineId);
    const verdict = lineId ? counts.get(lineId)?.verdict : undefined;
    return {
      id: lineId ?? id,
      startMs,
      label: line ? knotLabel(line) : '',
      name: [line ? lineName(line) : '', title ?? ''].find((name) => name !== '') ?? 'a step',
      ...(verdict ? { verdict } : {}),
    };
  });
}

/** Where each piece lies in the recording: from its first moment to the first of the next. */
function piecesOf({ pattern, moments, lastMs }: Pick<Desk, 'pattern' | 'moments' | 'lastMs'>) {
  const starts = pattern.pieces
    .map(({ id, name }) => {
      const lines = new Set(pattern.lines.filter((line) => line.pieceId === id).map((line) => line.id));
      const own = moments.filter((mark) => mark.lineId !== null && lines.has(mark.lineId));
      return { name, startMs: own[0]?.startMs ?? -1, lastMs: own.at(-1)?.startMs ?? -1 };
    })
    .filter(({ startMs }) => startMs >= 0)
    .sort((a, b) => a.startMs - b.startMs);
  return starts.map(({ name, startMs, lastMs: last }, i) => {
    const next = starts[i + 1]?.startMs ?? lastMs;
    return { name, startMs, endMs: Math.max(last, Math.min(next - 4_000, next)) };
  });
}

/** The thread under it all. */
export function ThreadStrip({ fixedNeedle = false }: { fixedNeedle?: boolean }) {
  const desk = useDesk();
  const { pattern, moments, counts, lastMs, captions, player, lineId, recordingId } = desk;
  const knots = useMemo(() => knotsOf({ pattern, moments, counts }), [pattern, moments, counts]);
  const pieces = useMemo(() => piecesOf({ pattern, moments, lastMs }), [pattern, moments, lastMs]);
  const move = (knotId: string, toMs: number) => {
    if (!recordingId) return;
    setMoment(desk, knotId, recordingId, toMs);
    desk.tellDone(`Moved to ${formatTenths(toMs)}`);
  };
  return (
    <section aria-label="Thread" className="border-t border-rule">
      <Thread
        player={player}
        durationMs={lastMs}
        knots={knots}
        pieces={pieces}
        speech={captions}
        openId={lineId}
        fixedNeedle={fixedNeedle}
        onOpen={(knotId) => {
          desk.pick(knotId, true);
          desk.goTo(knotId);
        }}
        {...(pattern.mayEdit ? { onMove: move } : {})}
      />
    </section>
  );
}
