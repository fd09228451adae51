import { memo } from 'react';
import { verdictShape } from '../verdict-mark.tsx';
import { type RingLine } from './ring-geometry.ts';

const ROW_PX = 11;
const LABEL_PX = 34;

interface StaffRow {
  readonly line: RingLine;
  readonly n: number;
  readonly label: string;
}

/** Rows, not rounds: one straight line of dashes a row, the first at the foot; the direction of work as an arrow at its start. */
export const Staff = memo(function Staff({
  lines,
  openId,
  width,
  name,
  onOpen,
}: {
  lines: readonly RingLine[];
  openId: string | null;
  width: number;
  name: string;
  onOpen: (lineId: string) => void;
}) {
  const rows: StaffRow[] = lines.flatMap((line) =>
    line.counts.map((n, i) => ({ line, n: n ?? 0, label: i === line.counts.length - 1 ? line.label : '' })),
  );
  const most = Math.max(1, ...rows.map((row) => row.n));
  const stitch = (width - 2 * LABEL_PX) / most;
  const height = rows.length * ROW_PX + 10;
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={name}
      className="block max-w-full"
    >
      {rows.map(({ line, n, label }, i) => {
        const y = height - 8 - i * ROW_PX;
        const x = (width - n * stitch) / 2;
        const isOpen = line.id === openId;
        const isFault = line.verdict === 'differs' || line.verdict === 'does-not-fit';
        const colour = isFault
          ? 'var(--color-madder)'
          : isOpen
            ? 'var(--color-now)'
            : line.isDone
              ? 'var(--color-woad)'
              : 'var(--color-tocome)';
        const goesLeft = i % 2 === 0;
        const end = x + n * stitch;
        const tip = goesLeft ? end + 9 : x - 9;
        const back = goesLeft ? 4 : -4;
        return (
          <g key={`${line.id}-${i}`} className="cursor-pointer" onClick={() => onOpen(line.id)}>
            {isOpen && <rect x="0" y={y - ROW_PX / 2} width={width} height={ROW_PX} fill="var(--color-woadwash)" />}
            {line.verdict === 'unread' ? (
              <path
                d={`M${LABEL_PX} ${y}H${width - LABEL_PX}`}
                stroke="var(--color-unreadring)"
                strokeWidth="1.7"
                strokeDasharray="9 4"
              />
            ) : (
              <path
                d={`M${x} ${y}H${end}`}
                stroke={colour}
                strokeWidth={isOpen ? 3 : 1.8}
                strokeDasharray={`${stitch * 0.7} ${stitch * 0.3}`}
                strokeDashoffset={-stitch * 0.15}
              />
            )}
            <path d={`M${tip + back} ${y - 2.5}l${-back} 2.5 ${back} 2.5`} fill="none" stroke={colour} />
            <rect x="0" y={y - ROW_PX / 2} width={width} height={ROW_PX} fill="transparent" />
            {isFault || line.verdict === 'unread' ? (
              <svg x="2" y={y - 5} width="10" height="10" viewBox="0 0 16 16">
                {verdictShape(line.verdict)}
              </svg>
            ) : (
              <text x="2" y={y + 3.5} fontSize="10" fontWeight={isOpen ? 800 : 500} fill="var(--color-walnut2)">
                {label}
              </text>
            )}
          </g>
        );
      })}
    </svg>
  );
});
