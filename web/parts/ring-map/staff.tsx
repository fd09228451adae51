import { memo, useMemo } from 'react';
import { type RingLine, staffOf, type StaffRow } from '#crochet/shape';
import { verdictShape } from '../verdict-mark.tsx';
import { RING_COLOURS } from './ring-colours.ts';
import { useRingKeys } from './use-ring-keys.ts';

/**
 * Rows, not rounds: one straight line of dashes a row, the first at the foot; the direction of work as an arrow at its
 * start. Each row is a button that goes to its line; one stop of the Tab key, arrows go up and down.
 */
export const Staff = memo(function Staff(props: {
  lines: readonly RingLine[];
  openId: string | null;
  width: number;
  name: string;
  /** How a row is read out: "Row 4, 13 stitches, agrees". */
  nameOf: (lineId: string) => string;
  onOpen: (lineId: string) => void;
  isMirrored?: boolean;
}) {
  const { lines, openId, width, name, nameOf, onOpen, isMirrored = false } = props;
  const staff = useMemo(() => staffOf(lines, { width, openId, isMirrored }), [lines, width, openId, isMirrored]);
  const { root, walk } = useRingKeys();
  const openAt = staff.rows.findIndex((row) => row.isOpen);
  return (
    <svg
      ref={root}
      width={width}
      height={staff.height}
      viewBox={`0 0 ${width} ${staff.height}`}
      role="toolbar"
      aria-label={name}
      onKeyDown={walk}
      className="block max-w-full"
    >
      {staff.rows.map((row, i) => (
        <RowButton
          key={row.key}
          row={row}
          width={width}
          height={staff.rowHeight}
          name={nameOf(row.lineId)}
          isStop={i === Math.max(0, openAt)}
          onOpen={onOpen}
        />
      ))}
    </svg>
  );
});

function RowButton(props: {
  row: StaffRow;
  width: number;
  height: number;
  name: string;
  isStop: boolean;
  onOpen: (lineId: string) => void;
}) {
  const { row, width, height, name, isStop, onOpen } = props;
  const { state, y, lineId, isOpen } = row;
  const colour = RING_COLOURS[state];
  const isFault = state === 'differs' || state === 'does-not-fit' || state === 'unread';
  const ground = isOpen && state !== 'unread' ? 'var(--color-woadwash)' : null;
  return (
    <g
      role="button"
      tabIndex={isStop ? 0 : -1}
      aria-label={name}
      aria-pressed={isOpen}
      className="ring-button cursor-pointer"
      onClick={() => onOpen(lineId)}
      onKeyDown={(event) => {
        if (event.key !== 'Enter' && event.key !== ' ') return;
        event.preventDefault();
        onOpen(lineId);
      }}
    >
      {ground && <rect x="0" y={y - height / 2} width={width} height={height} fill={ground} />}
      <path
        d={row.dashes}
        fill="none"
        stroke={colour}
        strokeWidth={row.stroke}
        {...(state === 'unread' ? { strokeDasharray: '9 4' } : {})}
      />
      <path d={row.arrow} fill="none" stroke={colour} />
      <path className="hit" d={`M0 ${y}H${width}`} stroke="transparent" strokeWidth={height} pointerEvents="stroke" />
      {isFault ? (
        <svg x="2" y={y - 5} width="10" height="10" viewBox="0 0 16 16">
          {verdictShape(state)}
        </svg>
      ) : (
        <text x="2" y={y + 3.5} fontSize="10" fontWeight={isOpen ? 800 : 500} fill="var(--color-walnut2)">
          {row.label}
        </text>
      )}
    </g>
  );
}
