import { type KeyboardEvent, memo, useMemo, useRef } from 'react';
import { verdictShape } from '../verdict-mark.tsx';
import { type Ring, type RingLine, ringMap, type RingState } from './ring-geometry.ts';

const COLOURS: Record<RingState, string> = {
  done: 'var(--color-woad)',
  now: 'var(--color-now)',
  'to-come': 'var(--color-tocome)',
  differs: 'var(--color-madder)',
  'does-not-fit': 'var(--color-madder)',
  unread: 'var(--color-unreadring)',
};

export interface RingMapProps {
  lines: readonly RingLine[];
  openId: string | null;
  size: number;
  /** What the whole is called: "Body, 18 rounds". */
  name: string;
  /** How a ring is read out: "Round 9, 18 stitches, agrees". */
  nameOf: (lineId: string) => string;
  onOpen: (lineId: string) => void;
  openWeight?: number;
  isMirrored?: boolean;
}

/**
 * The piece as its totals make it: one ring a round, one dash a stitch. Each ring is a button that goes to its line; one
 * stop of the Tab key, arrows go outward and inward. It repeats the list beside it and is never the only way.
 */
export const RingMap = memo(function RingMap({
  lines,
  openId,
  size,
  name,
  nameOf,
  onOpen,
  openWeight = 2.6,
  isMirrored = false,
}: RingMapProps) {
  const root = useRef<SVGSVGElement>(null);
  const map = useMemo(
    () => ringMap(lines, { size, openId, openWeight, isMirrored }),
    [lines, size, openId, openWeight, isMirrored],
  );
  const centre = size / 2;
  const openAt = map.rings.findIndex((ring) => ring.lineId === openId);

  const walk = (event: KeyboardEvent) => {
    const way = { ArrowUp: 1, ArrowRight: 1, ArrowDown: -1, ArrowLeft: -1 }[event.key];
    if (way === undefined) return;
    event.preventDefault();
    const rings = [...(root.current?.querySelectorAll<SVGGElement>('[role=button]') ?? [])];
    rings[rings.indexOf(document.activeElement as unknown as SVGGElement) + way]?.focus();
  };

  return (
    <svg
      ref={root}
      width={size}
      height={size}
      viewBox={`0 0 ${size} ${size}`}
      role="toolbar"
      aria-label={name}
      onKeyDown={walk}
      className="block max-w-full"
    >
      <circle cx={centre} cy={centre} r={map.heart} fill="none" stroke="var(--color-woad)" strokeWidth="1.3" />
      {map.rings.map((ring, i) => (
        <RingButton
          key={ring.key}
          ring={ring}
          centre={centre}
          name={nameOf(ring.lineId)}
          isStop={i === Math.max(0, openAt)}
          onOpen={onOpen}
        />
      ))}
    </svg>
  );
});

function RingButton({
  ring,
  centre,
  name,
  isStop,
  onOpen,
}: {
  ring: Ring;
  centre: number;
  name: string;
  isStop: boolean;
  onOpen: (lineId: string) => void;
}) {
  const { state, inner, band, dashes, stems, lineId, label, mark, radius } = ring;
  const colour = COLOURS[state];
  const middle = inner + band / 2;
  const ground =
    ring.isOpen && state !== 'unread' ? 'var(--color-woadwash)' : state === 'unread' ? 'var(--color-weldwash)' : null;
  return (
    <g
      role="button"
      tabIndex={isStop ? 0 : -1}
      aria-label={name}
      aria-pressed={ring.isOpen}
      className="ring-button cursor-pointer"
      onClick={() => onOpen(lineId)}
      onKeyDown={(event) => {
        if (event.key !== 'Enter' && event.key !== ' ') return;
        event.preventDefault();
        onOpen(lineId);
      }}
    >
      {ground && <circle cx={centre} cy={centre} r={middle} fill="none" stroke={ground} strokeWidth={band} />}
      <circle cx={centre} cy={centre} r={inner + band} fill="none" stroke="var(--color-feint)" />
      <path
        d={dashes}
        fill="none"
        stroke={colour}
        strokeWidth={ring.stroke}
        {...(state === 'unread' ? { strokeDasharray: '9 4' } : {})}
      />
      {stems && <path d={stems} fill="none" stroke={colour} strokeWidth={ring.stemStroke} strokeLinecap="round" />}
      <circle
        className="hit"
        cx={centre}
        cy={centre}
        r={middle}
        fill="none"
        stroke="transparent"
        strokeWidth={Math.max(1, band - 0.5)}
        pointerEvents="stroke"
      />
      {label && (
        <text
          x={centre}
          y={centre - radius + label.size * 0.36}
          textAnchor="middle"
          fontSize={label.size}
          fontWeight={ring.isOpen ? 800 : 500}
          fill={ring.isOpen ? 'var(--color-walnut)' : 'var(--color-walnut2)'}
        >
          {label.text}
        </text>
      )}
      {mark && (
        <svg
          x={centre - mark.size / 2}
          y={centre - radius - mark.size / 2}
          width={mark.size}
          height={mark.size}
          viewBox="0 0 16 16"
        >
          {verdictShape(mark.verdict)}
        </svg>
      )}
    </g>
  );
}
