import { memo } from 'react';
import { type Span } from '../player/player-state.ts';

/** Brackets that name the pieces under the thread. A name that would not fit its bracket is left out. */
export const Brackets = memo(function Brackets({
  pieces,
  pxPerMs,
  y,
}: {
  pieces: readonly (Span & { name: string })[];
  pxPerMs: number;
  y: number;
}) {
  return pieces.map(({ name, startMs, endMs }) => {
    const x = startMs * pxPerMs;
    const end = Math.max(x + 6, endMs * pxPerMs);
    return (
      <g key={`${name}${startMs}`}>
        <path d={`M${x} ${y}v5H${end}v-5`} fill="none" stroke="var(--color-rule)" />
        {end - x > name.length * 6 && (
          <text x={x + 4} y={y + 18} fontSize="14" fill="var(--color-walnut2)">
            {name}
          </text>
        )}
      </g>
    );
  });
});

/** A dash wherever somebody speaks. */
export const Speech = memo(function Speech({
  spans,
  pxPerMs,
  y,
}: {
  spans: readonly Span[];
  pxPerMs: number;
  y: number;
}) {
  let path = '';
  let drawnTo = -1;
  for (const { startMs, endMs } of spans) {
    const x = Math.max(startMs * pxPerMs, drawnTo + 2);
    const end = endMs * pxPerMs - 1;
    if (end - x < 1) continue;
    path += `M${x.toFixed(1)} ${y}H${end.toFixed(1)}`;
    drawnTo = end;
  }
  return <path d={path} stroke="var(--color-double)" strokeWidth="2" />;
});
