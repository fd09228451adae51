/** The totals of a piece in working order, and how it is worked. */
export interface PrintOf {
  readonly form: 'rings' | 'rows';
  readonly totals: readonly number[];
}

const round1 = (n: number) => n.toFixed(1);

/** Under 96 px, or over 12 rounds, even rounds are left out. */
function shown(totals: readonly number[], size: number): number[] {
  const some = totals.filter((total) => total > 0);
  return size >= 96 && some.length <= 12 ? some : some.filter((_, i) => i % 2 === 0);
}

const strokeFor = (band: number) => Math.max(0.9, Math.min(2, band * 0.52));

/** One ring of dashes, a stitch each, from twelve o'clock counterclockwise as right-handed work grows. */
function ringPath(centre: number, radius: number, stitches: number, stroke: number): string {
  const step = (2 * Math.PI) / stitches;
  const gap = Math.min(0.3 * step, (stroke * 0.7 + 1.1) / radius) / 2;
  const at = (angle: number) =>
    `${round1(centre - radius * Math.sin(angle))} ${round1(centre - radius * Math.cos(angle))}`;
  return Array.from({ length: stitches }, (_, k) => {
    const r = round1(radius);
    return `M${at(k * step + gap)}A${r} ${r} 0 0 0 ${at((k + 1) * step - gap)}`;
  }).join('');
}

function Rings({ totals, size }: { totals: readonly number[]; size: number }) {
  const centre = size / 2;
  const heart = size * 0.05;
  const band = (size / 2 - 1 - heart) / totals.length;
  const stroke = strokeFor(band);
  return (
    <>
      {totals.map((stitches, i) => (
        <path key={i} d={ringPath(centre, heart + band * (i + 0.72), stitches, stroke)} strokeWidth={round1(stroke)} />
      ))}
      <circle cx={centre} cy={centre} r={round1(heart * 0.6)} strokeWidth="1" />
    </>
  );
}

/** Rows as straight lines of dashes, the first at the foot. */
function Staff({ totals, size }: { totals: readonly number[]; size: number }) {
  const widest = Math.max(...totals);
  const band = Math.min(6, (size - 4) / totals.length);
  const stroke = strokeFor(band);
  const stitch = (size - 2) / widest;
  const foot = size / 2 + (band * totals.length) / 2;
  return totals.map((stitches, i) => {
    const y = round1(foot - band * (i + 0.5));
    const left = (size - stitch * stitches) / 2;
    const gap = Math.min(0.3 * stitch, stroke * 0.7 + 1.1) / 2;
    const dashes = Array.from(
      { length: stitches },
      (_, k) => `M${round1(left + stitch * k + gap)} ${y}H${round1(left + stitch * (k + 1) - gap)}`,
    );
    return <path key={i} d={dashes.join('')} strokeWidth={round1(stroke)} />;
  });
}

/** Not read yet: one dotted circle. */
function Blank({ size }: { size: number }) {
  return (
    <g stroke="var(--color-tocome)">
      <circle cx={size / 2} cy={size / 2} r={size / 2 - 1.5} strokeWidth="1.2" strokeDasharray="1.6 3" />
      <circle cx={size / 2} cy={size / 2} r={size * 0.045} />
    </g>
  );
}

/** A pattern's print: what it is known by on the shelf. Decoration beside its name; the figures stand elsewhere. */
export function PatternPrint({ of, size = 58 }: { of: PrintOf | null; size?: number }) {
  const totals = of ? shown(of.totals, size) : [];
  return (
    <svg width={size} height={size} viewBox={`0 0 ${size} ${size}`} fill="none" stroke="var(--color-woad)" aria-hidden>
      {totals.length === 0 && <Blank size={size} />}
      {totals.length > 0 && of?.form === 'rings' && <Rings totals={totals} size={size} />}
      {totals.length > 0 && of?.form === 'rows' && <Staff totals={totals} size={size} />}
    </svg>
  );
}
