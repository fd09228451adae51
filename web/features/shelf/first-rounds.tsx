const SIZE = 432;
const CENTRE = SIZE / 2;
const HEART = SIZE * 0.03;
/** Stitches of the four rounds; each increases by six, the first is worked now. */
const ROUNDS = [6, 12, 18, 24] as const;
const OPEN_WEIGHT = 1.7;
const UNIT = (SIZE / 2 - 3 - HEART) / (OPEN_WEIGHT + ROUNDS.length - 1);
const SEAM = SIZE * 0.03;

const bandOf = (i: number) => (i === 0 ? UNIT * OPEN_WEIGHT : UNIT);
const innerOf = (i: number) => HEART + (i === 0 ? 0 : UNIT * (OPEN_WEIGHT + i - 1));
const radiusOf = (i: number) => innerOf(i) + bandOf(i) * 0.72;

const at = (radius: number, angle: number) =>
  `${(CENTRE - radius * Math.sin(angle)).toFixed(1)} ${(CENTRE - radius * Math.cos(angle)).toFixed(1)}`;

/** Where the `k`-th of `n` dashes begins, counterclockwise from the seam at twelve o'clock. */
function angleAt(radius: number, k: number, n: number): number {
  const seam = Math.min(0.5, SEAM / radius);
  return seam + ((2 * Math.PI - 2 * seam) * k) / n;
}

function dash(i: number, k: number): string {
  const [n, radius] = [ROUNDS[i] ?? 0, radiusOf(i)];
  const [from, to] = [angleAt(radius, k, n), angleAt(radius, k + 1, n)];
  const gap = Math.min(0.3 * (to - from), (i === 0 ? 18 : 7) / radius) / 2;
  const r = radius.toFixed(1);
  return `M${at(radius, from + gap)}A${r} ${r} 0 0 0 ${at(radius, to - gap)}`;
}

/** An increase: one stem from the round before, splitting to two dashes. */
function stem(i: number, k: number): string {
  const [n, below] = [ROUNDS[i] ?? 0, ROUNDS[i - 1] ?? 1];
  const repeat = below / 6;
  const second = (k + 1) * (repeat + 1) - 1;
  // From the outer edge of the dash it grows out of; the open round's are thick.
  const foot = radiusOf(i - 1) + (i === 1 ? bandOf(0) * 0.1 : 0.8);
  const middle = (angleAt(radiusOf(i), second - 1, n) + angleAt(radiusOf(i), second + 1, n)) / 2;
  const fork = innerOf(i) + bandOf(i) * 0.34;
  const spread = 0.26 * (angleAt(radiusOf(i), 1, n) - angleAt(radiusOf(i), 0, n));
  const top = radiusOf(i);
  return `M${at(foot, middle)}L${at(fork, middle)}M${at(fork, middle)}L${at(top, middle - spread)}M${at(fork, middle)}L${at(top, middle + spread)}`;
}

/** Four rounds begun in a ring, the first lit. Decoration: the list beside it says the same. */
export function FirstRounds() {
  return (
    <svg width={SIZE} height={SIZE} viewBox={`0 0 ${SIZE} ${SIZE}`} fill="none" aria-hidden>
      <circle cx={CENTRE} cy={CENTRE} r={CENTRE - 1} fill="var(--color-sheet)" />
      <circle cx={CENTRE} cy={CENTRE} r={innerOf(1)} fill="var(--color-woadwash)" />
      <circle cx={CENTRE} cy={CENTRE} r={HEART + 2} fill="var(--color-sheet)" />
      <circle cx={CENTRE} cy={CENTRE} r={HEART * 0.55} stroke="var(--color-woad)" strokeWidth="1.2" />
      {ROUNDS.map((stitches, i) => (
        <g key={stitches}>
          <circle cx={CENTRE} cy={CENTRE} r={innerOf(i) + bandOf(i)} stroke="var(--color-feint)" />
          {i > 0 && (
            <path
              d={Array.from({ length: 6 }, (_, k) => stem(i, k)).join('')}
              stroke="var(--color-tocome)"
              strokeWidth="1.2"
            />
          )}
          <path
            d={Array.from({ length: stitches }, (_, k) => dash(i, k)).join('')}
            stroke={i === 0 ? 'var(--color-now)' : 'var(--color-tocome)'}
            strokeWidth={i === 0 ? bandOf(0) * 0.2 : 1.6}
          />
          <text
            x={CENTRE}
            y={CENTRE - radiusOf(i) + 4}
            textAnchor="middle"
            fill="var(--color-walnut2)"
            className={i === 0 ? 'text-[15px] font-bold' : 'text-[11px]'}
          >
            {i + 1}
          </text>
        </g>
      ))}
    </svg>
  );
}
