import { at, moved, n, outlined, WHEAT, WIDTH, HEIGHT, type Yarn } from './svg.ts';

const SKIN = '#cf9c7d';
const PALM = '#b98363';
const SKIN_EDGE = '#8f5c40';
const NAIL = '#e6bfa6';
const SLEEVE = '#6d3b45';
const CUFF = '#59303a';
const STEEL = '#c9d1d6';
const STEEL_EDGE = '#2b3236';
const MARKER = '#b42e3c';

const finger = (d: string, width: number) => outlined(d, width, SKIN, SKIN_EDGE);
const palm = (d: string, width: number) => outlined(d, width, PALM, SKIN_EDGE);
const nail = (x: number, y: number, turn: number) =>
  `<ellipse cx="${n(x)}" cy="${n(y)}" rx="8.5" ry="6.2" transform="rotate(${turn} ${at(x, y)})" fill="${NAIL}"/>`;

/** The table: a dark green woven ground. */
export function table(): string {
  return `<defs><pattern id="weave" width="14" height="14" patternUnits="userSpaceOnUse"><rect width="14" height="14" fill="#43585c"/>
    <rect width="6" height="14" fill="#3d5155" opacity=".75"/><rect width="14" height="6" fill="#3d5155" opacity=".75"/></pattern></defs>
    <rect width="${WIDTH}" height="${HEIGHT}" fill="url(#weave)"/>`;
}

/** The left hand in two halves, so that the work can lie between them: palm and fingers behind, the thumb in front. */
export function leftHand(x = 0, y = 0): { behind: string; front: string } {
  const sleeve = `<path d="M-30 440 92 370 134 432 40 520H-40Z" fill="${SLEEVE}"/><path d="M84 352 106 338 148 402 128 418Z" fill="${CUFF}"/>`;
  const behind =
    sleeve +
    palm('M118 406C166 372 202 350 246 338', 78) +
    palm('M232 350C262 358 300 352 330 334', 40) +
    palm('M226 332C262 344 290 338 318 322', 36) +
    finger('M208 314C224 240 262 180 298 142', 38);
  const front = finger('M222 326C240 292 274 268 312 261', 36) + nail(322, 259, -20);
  return { behind: moved(x, y, behind), front: moved(x, y, front) };
}

/** The right hand: palm behind the hook, two fingers and thumb before it. */
export function rightHand(x = 0, y = 0): { behind: string; front: string } {
  const behind =
    `<path d="M704 432 762 338 870 356V500H730Z" fill="${SLEEVE}"/><path d="M764 334 786 352 732 432 708 418Z" fill="${CUFF}"/>` +
    palm('M655 302C690 330 720 352 744 384', 80) +
    palm('M572 300C590 330 620 331 655 312', 40) +
    palm('M556 272C572 301 604 313 640 296', 36);
  const front =
    finger('M570 178C606 190 640 226 654 268', 40) +
    nail(566, 179, 0) +
    finger('M572 218C592 262 618 285 650 288', 42) +
    nail(568, 215, 50);
  return { behind: moved(x, y, behind), front: moved(x, y, front) };
}

/** A crochet hook from its head to the far end of its shaft. */
export function hook(headX: number, headY: number, endX: number, endY: number): string {
  const angle = Math.atan2(endY - headY, endX - headX);
  const point = (along: number, across: number) =>
    at(
      headX + along * Math.cos(angle) - across * Math.sin(angle),
      headY + along * Math.sin(angle) + across * Math.cos(angle),
    );
  const shaft = outlined(`M${point(6, -3)}L${at(endX, endY)}`, 7.5, STEEL, STEEL_EDGE, 4.5);
  const head = `M${point(8, -2)}C${point(-8, -3)} ${point(-10, 12)} ${point(1, 12)}C${point(6, 12)} ${point(6, 8)} ${point(5, 6)}`;
  return `${shaft}<path d="${head}" fill="none" stroke="${STEEL}" stroke-width="7" stroke-linecap="round"/>`;
}

/** A blunt needle with its eye at the far end, threaded. */
export function needle(tipX: number, tipY: number, endX: number, endY: number): string {
  return (
    outlined(`M${at(tipX, tipY)}L${at(endX, endY)}`, 6, STEEL, STEEL_EDGE, 4) +
    `<ellipse cx="${n(endX)}" cy="${n(endY)}" rx="8" ry="3" transform="rotate(${n((Math.atan2(endY - tipY, endX - tipX) * 180) / Math.PI)} ${at(endX, endY)})" fill="${STEEL_EDGE}"/>`
  );
}

/** The stitch marker, hung in the first stitch of the round. */
export const marker = (x: number, y: number): string =>
  `<path d="M${at(x, y)}c14-6 26 0 24 12s-14 14-20 10" fill="none" stroke="${MARKER}" stroke-width="6" stroke-linecap="round"/>`;

/** A strand of yarn lying or held along a path. */
export const strand = (d: string, yarn: Yarn = WHEAT, width = 9): string => outlined(d, width, yarn.body, yarn.edge, 2);

/** The ball the yarn comes from. */
export function ball(x: number, y: number, r: number, yarn: Yarn = WHEAT): string {
  const wraps = [-0.8, -0.45, -0.1, 0.25, 0.6]
    .map((k) => {
      const from = at(x + k * r, y - Math.sqrt(1 - k * k) * r * 0.94);
      const to = at(x + (k + 0.35) * r * 0.8, y + Math.sqrt(1 - k * k) * r * 0.9);
      return `<path d="M${from}Q${at(x + (k + 0.5) * r, y - 0.1 * r)} ${to}" fill="none" stroke="${yarn.light}" stroke-width="4.5" opacity=".7"/>`;
    })
    .join('');
  const across = [-0.4, 0, 0.4]
    .map(
      (k) =>
        `<path d="M${at(x - 0.9 * r, y + k * r)}Q${at(x, y + (k - 0.35) * r)} ${at(x + 0.88 * r, y + k * r)}" fill="none" stroke="${yarn.edge}" stroke-width="3" opacity=".55"/>`,
    )
    .join('');
  return `<circle cx="${n(x + 9)}" cy="${n(y + 11)}" r="${n(r)}" fill="#2b3a3d" opacity=".5"/><clipPath id="ball"><circle cx="${n(x)}" cy="${n(y)}" r="${n(r)}"/></clipPath>
    <circle cx="${n(x)}" cy="${n(y)}" r="${n(r)}" fill="${yarn.body}" stroke="${yarn.edge}" stroke-width="3"/><g clip-path="url(#ball)">${wraps}${across}</g>`;
}
