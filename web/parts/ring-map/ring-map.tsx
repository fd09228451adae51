import { memo, useMemo } from 'react';
import { type Ring, type RingLine, ringMap } from '#crochet/shape';
import { verdictShape } from '../verdict-mark.tsx';
import { RING_COLOURS } from './ring-colours.ts';
import { useRingKeys } from './use-ring-keys.ts';

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
  const { root, walk } = useRingKeys();
  const map = useMemo(
    () => ringMap(lines, { size, openId, openWeight, isMirrored }),
    [lines, size, openId, openWeight, isMirrored],
  );
  const centre = size / 2;
  const openAt = map.rings.findIndex((ring) => ring.lineId === openId);

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
  const colour = RING_COLOURS[state];
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
