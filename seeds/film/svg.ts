/** Small helpers for drawing frames as SVG text. All lengths are in units of the 816 × 459 picture. */

export const WIDTH = 816;
export const HEIGHT = 459;

/** Four shades of one yarn: the strand, its shadow between stitches, its highlight and the dark inside of a piece. */
export interface Yarn {
  readonly body: string;
  readonly edge: string;
  readonly light: string;
  readonly inside: string;
}

export const WHEAT: Yarn = { body: '#dab56f', edge: '#b98f43', light: '#f0d99b', inside: '#a67c38' };
export const SLATE: Yarn = { body: '#8fb3bd', edge: '#5f8591', light: '#cfe2e5', inside: '#4d717d' };

/** A figure as SVG writes it: two decimals at most. */
export const n = (value: number): string => String(Math.round(value * 100) / 100);

/** A point as SVG paths write it. */
export const at = (x: number, y: number): string => `${n(x)} ${n(y)}`;

/** A line drawn with an outline of another colour, as all strands and fingers are. */
export function outlined(d: string, width: number, fill: string, outline: string, rim = 2.6): string {
  const stroke = (colour: string, w: number) =>
    `<path d="${d}" fill="none" stroke="${colour}" stroke-width="${n(w)}" stroke-linecap="round" stroke-linejoin="round"/>`;
  return stroke(outline, width + rim) + stroke(fill, width);
}

/** Moves and turns what is drawn; `turn` in degrees about the picture's point `about`. */
export function moved(
  x: number,
  y: number,
  inner: string,
  turn = 0,
  about: readonly [number, number] = [0, 0],
): string {
  const rotate = turn === 0 ? '' : ` rotate(${n(turn)} ${at(...about)})`;
  return `<g transform="translate(${at(x, y)})${rotate}">${inner}</g>`;
}

/** A smooth curve through points, in order. */
export function smooth(points: readonly (readonly [number, number])[]): string {
  const point = (i: number) => points[Math.max(0, Math.min(points.length - 1, i))]!;
  let d = `M${at(...point(0))}`;
  for (let i = 0; i + 1 < points.length; i += 1) {
    const [before, from, to, after] = [point(i - 1), point(i), point(i + 1), point(i + 2)];
    const first = at(from[0] + (to[0] - before[0]) / 6, from[1] + (to[1] - before[1]) / 6);
    const second = at(to[0] - (after[0] - from[0]) / 6, to[1] - (after[1] - from[1]) / 6);
    d += `C${first} ${second} ${at(...to)}`;
  }
  return d;
}
