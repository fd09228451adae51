import { type KeyboardEvent, useMemo, useRef } from 'react';
import { type Player } from '../player/create-player.ts';
import { type Span } from '../player/player-state.ts';
import { usePlayerState } from '../player/use-player.ts';
import { KnotButton } from './knot-button.tsx';
import { groupKnots, type Knot, type KnotGroup } from './thread-knots.ts';

const CHAR_PX = 7;

/** A label is left out where it would run into the one before it; the knot keeps its name for the ear. */
function fitLabels(groups: readonly KnotGroup[], pxPerMs: number): boolean[] {
  let freeFrom = -Infinity;
  return groups.map((group) => {
    const x = group.startMs * pxPerMs;
    const half = ((group.knots[0]?.label.length ?? 0) * CHAR_PX + (group.knots.length > 1 ? 14 : 0)) / 2;
    if (x - half < freeFrom) return false;
    freeFrom = x + half + 3;
    return true;
  });
}

/** All knots, one stop of the Tab key: arrows go from knot to knot, Enter opens, Shift with an arrow moves by 0.1 s. */
export function KnotRow(props: {
  player: Player;
  knots: readonly Knot[];
  pxPerMs: number;
  y: number;
  big: number;
  openId: string | null;
  snaps: readonly Span[];
  onOpen: (knotId: string) => void;
  onMove?: (knotId: string, toMs: number) => void;
}) {
  const { player, knots, pxPerMs, y, big, openId, snaps, onOpen, onMove } = props;
  const row = useRef<HTMLDivElement>(null);
  const groups = useMemo(() => groupKnots(knots, pxPerMs), [knots, pxPerMs]);
  const hasLabel = useMemo(() => fitLabels(groups, pxPerMs), [groups, pxPerMs]);
  const starts = useMemo(() => snaps.map((span) => span.startMs), [snaps]);
  const passed = usePlayerState(player, (state) => groups.filter((group) => group.startMs <= state.positionMs).length);
  const openAt = groups.findIndex((group) => group.knots.some((knot) => knot.id === openId));

  const walk = (event: KeyboardEvent<HTMLDivElement>) => {
    const way = { ArrowLeft: -1, ArrowRight: 1 }[event.key];
    if (way === undefined || event.shiftKey) return;
    const buttons = [...(row.current?.querySelectorAll('button') ?? [])];
    const at = buttons.indexOf(document.activeElement as HTMLButtonElement);
    event.preventDefault();
    buttons[at + way]?.focus();
  };

  return (
    <div ref={row} role="toolbar" aria-label="Moments" onKeyDown={walk}>
      {groups.map((group, i) => (
        <KnotButton
          key={group.knots[0]?.id}
          group={group}
          pxPerMs={pxPerMs}
          y={y}
          big={big}
          isPassed={i < passed}
          openId={i === openAt ? openId : null}
          isStop={i === Math.max(0, openAt)}
          showsLabel={hasLabel[i] ?? false}
          snaps={starts}
          onOpen={onOpen}
          {...(onMove ? { onMove } : {})}
        />
      ))}
    </div>
  );
}
