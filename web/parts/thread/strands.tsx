import { useId } from 'react';

/** One wavelength (10 px) of two strands, sines half a turn apart, as near as a cubic comes (amplitude 1.7). */
const ONE = 'M0 4C2.12 1.73 2.88 1.73 5 4S7.88 6.27 10 4';
const OTHER = 'M0 4C2.12 6.27 2.88 6.27 5 4S7.88 1.73 10 4';

/**
 * Two twisted strands from 0 to `width`, woad as far as `played`. Drawn with a repeating tile, so that three hours of
 * thread cost no more than three minutes; whoever moves the needle sets the width of the played part by its `data-played`.
 */
export function Strands({ width, y, played }: { width: number; y: number; played: number }) {
  const id = useId();
  const tile = (name: string, colour: string, stroke: number) => (
    <pattern id={`${id}${name}`} width="10" height="8" patternUnits="userSpaceOnUse" y={y - 4}>
      <path d={ONE} fill="none" stroke={colour} strokeWidth={stroke} />
      <path d={OTHER} fill="none" stroke={colour} strokeWidth={stroke} />
    </pattern>
  );
  return (
    <>
      <defs>
        {tile('come', 'var(--color-tocome)', 1.25)}
        {tile('played', 'var(--color-woad)', 1.5)}
      </defs>
      <rect x="0" y={y - 4} width={Math.max(0, width)} height="8" fill={`url(#${id}come)`} />
      <rect
        x="0"
        y={y - 4}
        width={Math.max(0, played)}
        height="8"
        fill="var(--thread-ground, var(--color-chalk))"
        data-played
      />
      <rect x="0" y={y - 4} width={Math.max(0, played)} height="8" fill={`url(#${id}played)`} data-played />
    </>
  );
}

/** A needle with an eye: the playhead, its point on the thread at (0, y). */
export function Needle({ y, big = 1 }: { y: number; big?: number }) {
  return (
    <>
      <path
        d={`M0 ${y - 20 * big}c1.5 2 1.6 5 1.6 ${14 * big}L0 ${y + 15 * big}l-1.6 ${-21 * big}c0 ${-9 * big} .1 ${-12 * big} 1.6 ${-14 * big}Z`}
        fill="var(--color-walnut)"
      />
      <ellipse cx="0" cy={y - 15 * big} rx=".7" ry="2.4" fill="var(--color-sheet)" />
    </>
  );
}

/** A knot with its two pale wraps, round (0, y). */
export function KnotShape({
  y,
  colour,
  isChosen = false,
  big = 1,
}: {
  y: number;
  colour: string;
  isChosen?: boolean;
  big?: number;
}) {
  const rx = (isChosen ? 5.4 : 4.1) * big;
  const ry = (isChosen ? 6.4 : 5) * big;
  return (
    <>
      <ellipse cx="0" cy={y} rx={rx} ry={ry} fill={colour} />
      <path
        d={`M${-rx * 0.62} ${y - ry * 0.1}L${rx * 0.5} ${y - ry * 0.5}M${-rx * 0.5} ${y + ry * 0.5}L${rx * 0.62} ${y + ry * 0.1}`}
        stroke="#fff"
        strokeOpacity=".8"
      />
    </>
  );
}
