import { type ReactNode, useMemo } from 'react';
import { Mark } from '../../parts/mark.tsx';
import { coverRings } from './cover-rings.ts';

const SIZE = 1130;
const INK = { done: 'var(--color-clothlink)', open: 'var(--color-weldfill)', 'to-come': '#6e93ab' } as const;

/** The cover of the book: the mouse's rounds stitched on cloth, the ninth in weld with the marker in its seam. */
function Cover() {
  const { rings, markerY, centre } = useMemo(() => coverRings(SIZE), []);
  return (
    <svg
      width={SIZE}
      height={SIZE}
      viewBox={`0 0 ${SIZE} ${SIZE}`}
      fill="none"
      aria-hidden
      className="absolute top-1/2 left-[44%] -translate-1/2 max-lg:left-1/2 max-lg:scale-75 max-sm:top-[148%] max-sm:scale-[0.42]"
    >
      <circle cx={centre} cy={centre} r={0.0165 * SIZE} stroke={INK.done} strokeWidth={1.4} />
      {rings.map((ring, i) => (
        <g key={i} stroke={INK[ring.kind]}>
          <path d={ring.dashes} strokeWidth={ring.width} />
          <path d={ring.stems} strokeWidth={ring.kind === 'open' ? 5 : 1} strokeLinecap="round" />
        </g>
      ))}
      <path
        d={`M${centre - 11} ${markerY + 54}V${markerY - 20}a17 17 0 1 1 17 17`}
        stroke={INK.open}
        strokeWidth={9}
        strokeLinecap="round"
      />
    </svg>
  );
}

/** The pages of people who are not (yet) inside: the cover at the left, one short form to the right of the binding. */
export function Door({ title, lead, children }: { title?: string; lead?: ReactNode; children: ReactNode }) {
  return (
    <div className="flex min-h-full max-sm:flex-col">
      <div className="cloth running-stitch relative w-[57%] shrink-0 overflow-hidden max-lg:w-[42%] max-sm:h-36 max-sm:w-full max-sm:after:hidden">
        <Cover />
      </div>
      <main className="flex grow items-center justify-center px-6 py-10 max-sm:items-start max-sm:py-7">
        <div className="w-full max-w-[340px]">
          <p className="flex items-center gap-[15px] font-serif text-[40px] leading-[46px] font-semibold max-sm:text-[32px]">
            <Mark size={52} />
            Roundelay
          </p>
          {title && <h1 className="mt-6 font-serif text-[20px] leading-[27px] font-semibold">{title}</h1>}
          {lead && <div className="mt-4 font-serif text-[18px] leading-[27px]">{lead}</div>}
          <div className="mt-6">{children}</div>
        </div>
      </main>
    </div>
  );
}
