import { type KeyboardEvent, type PointerEvent, useRef, useState } from 'react';
import { formatTenths, speakMoment } from '../../lib/time.ts';
import { VERDICT_WORDS, verdictShape } from '../verdict-mark.tsx';
import { KnotShape } from './strands.tsx';
import { type KnotGroup, snapTo, worstFault } from './thread-knots.ts';

/** Less than this is a press, not a drag. */
const DRAG_PX = 4;
const HALF_PX = 12;

interface KnotButtonProps {
  group: KnotGroup;
  pxPerMs: number;
  y: number;
  big: number;
  isPassed: boolean;
  openId: string | null;
  isStop: boolean;
  showsLabel: boolean;
  snaps: readonly number[];
  onOpen: (knotId: string) => void;
  onMove?: (knotId: string, toMs: number) => void;
}

/** One knot: press it to go there, drag it to move its moment (it is drawn to a caption's start; Alt holds it free). */
export function KnotButton({
  group,
  pxPerMs,
  y,
  big,
  isPassed,
  openId,
  isStop,
  showsLabel,
  snaps,
  onOpen,
  onMove,
}: KnotButtonProps) {
  const start = useRef<{ x: number } | null>(null);
  const [draggedTo, setDraggedTo] = useState<number | null>(null);
  const { knots } = group;
  const openAt = knots.findIndex((knot) => knot.id === openId);
  const held = knots[Math.max(0, openAt)];
  const fault = worstFault(knots);
  if (!held) return null;
  const atMs = draggedTo ?? group.startMs;
  const isOpen = openAt >= 0;
  const more = knots.length - 1;

  const name = `${held.name}, ${speakMoment(held.startMs)}${fault ? `, ${VERDICT_WORDS[fault]}` : ''}${more > 0 ? `, and ${more} more here` : ''}`;
  const openNext = () => onOpen((knots[(openAt + 1) % knots.length] ?? held).id);

  const drag = (event: PointerEvent<HTMLButtonElement>) => {
    if (!onMove || !start.current) return;
    const away = event.clientX - start.current.x;
    if (draggedTo === null && Math.abs(away) < DRAG_PX) return;
    setDraggedTo(snapTo(Math.max(0, held.startMs + away / pxPerMs), snaps, event.altKey));
  };
  const letGo = () => {
    if (draggedTo !== null) onMove?.(held.id, draggedTo);
    else if (start.current) openNext();
    start.current = null;
    setDraggedTo(null);
  };
  const press = (event: KeyboardEvent<HTMLButtonElement>) => {
    const by = { ArrowLeft: -100, ArrowRight: 100 }[event.key];
    if (by !== undefined && event.shiftKey) {
      event.preventDefault();
      event.stopPropagation();
      onMove?.(held.id, Math.max(0, held.startMs + by));
    }
  };

  return (
    <button
      type="button"
      tabIndex={isStop ? 0 : -1}
      aria-label={name}
      aria-pressed={isOpen}
      className="absolute top-0 touch-none outline-offset-[-2px]"
      style={{ left: atMs * pxPerMs - HALF_PX, width: HALF_PX * 2, height: y + 14 }}
      onPointerDown={(event) => {
        event.currentTarget.setPointerCapture(event.pointerId);
        start.current = { x: event.clientX };
      }}
      onPointerMove={drag}
      onPointerUp={letGo}
      onPointerCancel={() => {
        start.current = null;
        setDraggedTo(null);
      }}
      onClick={(event) => event.detail === 0 && openNext()}
      onKeyDown={press}
    >
      <svg
        width={HALF_PX * 2}
        height={y + 14}
        viewBox={`${-HALF_PX} 0 ${HALF_PX * 2} ${y + 14}`}
        className="overflow-visible"
        aria-hidden
      >
        <KnotShape
          y={y}
          big={big}
          isChosen={isOpen}
          colour={isOpen ? 'var(--color-now)' : isPassed ? 'var(--color-woad)' : 'var(--color-edge)'}
        />
        {draggedTo !== null ? (
          <text y={y - 10} textAnchor="middle" fontSize="14" fontWeight="700" fill="var(--color-walnut)">
            {formatTenths(draggedTo)}
          </text>
        ) : fault ? (
          <>
            <path
              d={`M0 ${y - 7}V${y - 12}`}
              stroke={fault === 'unread' ? 'var(--color-tack)' : 'var(--color-madder)'}
            />
            <svg x="-6.5" y={y - 25} width="13" height="13" viewBox="0 0 16 16">
              {verdictShape(fault)}
            </svg>
          </>
        ) : (
          showsLabel &&
          held.label !== '' && (
            <text y={y - 11} textAnchor="middle" fontSize="13" fontWeight="500" fill="var(--color-walnut2)">
              {held.label}
              {more > 0 && `+${more}`}
            </text>
          )
        )}
      </svg>
    </button>
  );
}
