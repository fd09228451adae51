import { KnotShape, Strands } from './strands.tsx';

/** Upload and reading: thread wound onto a bobbin as far as it has come, the rest dashed. `share` is 0 to 1. */
export function Winding({ share, label, width = 366 }: { share: number; label: string; width?: number }) {
  const percent = Math.round(Math.min(1, Math.max(0, share)) * 100);
  const end = (width - 14) * (percent / 100);
  return (
    <svg
      viewBox={`0 0 ${width} 20`}
      className="block h-5 w-full"
      preserveAspectRatio="xMinYMid meet"
      role="progressbar"
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={100}
      aria-valuenow={percent}
    >
      <path d={`M${end + 12} 10H${width}`} stroke="var(--color-tocome)" strokeDasharray="3 3" />
      <Strands width={end} y={10} played={end} />
      <g transform={`translate(${end + 4} 0)`}>
        <KnotShape y={10} colour="var(--color-woad)" />
      </g>
    </svg>
  );
}

/** Waiting with no known length: three dashes that take turns (all three stand when motion is reduced). */
export function Waiting({ label }: { label: string }) {
  return (
    <span role="status" className="inline-flex items-center gap-1.5">
      <span className="sr-only">{label}</span>
      {[0, 1, 2].map((i) => (
        <i
          key={i}
          aria-hidden
          className="taking-turns h-[2px] w-2.5 bg-woad"
          style={{ animationDelay: `${i * 0.4}s` }}
        />
      ))}
    </span>
  );
}
