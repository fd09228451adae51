const MOST = 60;

/** A ring of the round's own dashes with the marker hung in its seam: the tick. Decoration; the words beside it say it. */
export function TickRing({ stitches, size, children }: { stitches: number; size: number; children?: string }) {
  const n = Math.min(Math.max(stitches, 3), MOST);
  const centre = size / 2;
  const radius = size * 0.4;
  const width = size < 40 ? size * 0.085 : 5;
  const at = (angle: number) =>
    `${(centre - radius * Math.sin(angle)).toFixed(2)} ${(centre - radius * Math.cos(angle)).toFixed(2)}`;
  const dashes = Array.from({ length: n }, (_, k) => {
    const from = (2 * Math.PI * k) / n;
    const to = (2 * Math.PI * (k + 1)) / n;
    const gap = Math.min(0.32 * (to - from), (width * 0.55 + 1.2) / radius) / 2;
    return `M${at(from + gap)}A${radius} ${radius} 0 0 0 ${at(to - gap)}`;
  });
  const top = centre - radius;
  const hook = size * 0.066;
  return (
    <svg className="watch-ring" width={size} height={size} viewBox={`0 0 ${size} ${size}`} fill="none" aria-hidden>
      <path d={dashes.join('')} stroke="currentColor" strokeWidth={width} />
      <path
        className="watch-marker"
        d={`M${centre} ${top + size * 0.17}V${top - size * 0.11}a${hook} ${hook} 0 1 1 ${hook} ${hook}`}
        stroke="var(--watch-marker)"
        strokeWidth={size * 0.062}
        strokeLinecap="round"
      />
      {children !== undefined && (
        <text x={centre} y={centre + 7} textAnchor="middle" fontSize="20" fontWeight="800" fill="currentColor">
          {children}
        </text>
      )}
    </svg>
  );
}
