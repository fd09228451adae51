import { at, n, type Yarn } from './svg.ts';

/** Millimetres: one single crochet of the demo's sample. */
const STITCH_WIDTH = 4.4;
const STITCH_HEIGHT = 5;

/** Where each round stands, in millimetres: height over the first round and radius. */
export function profile(counts: readonly number[]): { z: number; r: number }[] {
  const points = [{ z: 0, r: 1.6 }];
  for (const count of counts) {
    const last = points.at(-1)!;
    const r = (count * STITCH_WIDTH) / (2 * Math.PI);
    const grows = Math.min(Math.abs(r - last.r), STITCH_HEIGHT);
    points.push({ z: last.z + Math.sqrt(STITCH_HEIGHT ** 2 - grows ** 2), r });
  }
  return points;
}

/** A stitch seen from its right side: a V with a highlight. */
function vee(left: string, foot: string, right: string): string {
  return `M${left}L${foot}L${right}`;
}

const vees = (d: string, yarn: Yarn, width: number, odd: boolean) =>
  `<path d="${d}" fill="none" stroke="${yarn.edge}" stroke-width="${n(width * 1.6)}" stroke-linejoin="round" stroke-linecap="round"/>` +
  `<path d="${d}" fill="none" stroke="${odd ? yarn.light : yarn.body}" stroke-width="${n(width)}" stroke-linejoin="round" stroke-linecap="round" opacity=".95"/>`;

export interface Flat {
  readonly counts: readonly number[]; // stitches of each round
  readonly rounds: number; // whole rounds made
  readonly part: number; // 0…1 of the round in work
  readonly corners: boolean; // six corners, or round
}

/**
 * A flat piece from above, turning under the hook as its rounds are made: the newest stitch is always at `hookAngle`.
 * @param radius of the whole piece when `rounds` are made, in picture units
 */
export function flatPiece(piece: Flat, cx: number, cy: number, radius: number, yarn: Yarn, hookAngle: number): string {
  const band = radius / (piece.rounds + (piece.part > 0 ? piece.part : 0));
  const turn = hookAngle + piece.part * 2 * Math.PI;
  const reach = (angle: number, round: number) => {
    if (!piece.corners) return 1;
    const sector = Math.PI / 3;
    const inSector = (((angle % sector) + sector) % sector) - sector / 2;
    const hexagon = Math.cos(sector / 2) / Math.cos(inSector);
    const blend = Math.min(1, round / 5);
    return 1 + (hexagon * 1.07 - 1) * blend;
  };
  const point = (round: number, angle: number) => {
    const r = round * band * reach(angle, round);
    return at(cx + r * Math.cos(turn + angle), cy + r * Math.sin(turn + angle));
  };
  const outline = (round: number) =>
    `M${Array.from({ length: 96 }, (_, i) => point(round, (2 * Math.PI * i) / 96)).join('L')}Z`;

  let out = `<path d="${outline(piece.rounds)}" transform="translate(16 18)" fill="#2b3a3d" opacity=".55"/>`;
  out += `<path d="${outline(piece.rounds)}" fill="${yarn.body}" stroke="${yarn.edge}" stroke-width="5"/>`;
  const width = Math.max(1.6, Math.min(5, band * 0.16));
  for (let round = Math.ceil(piece.rounds + piece.part); round >= 1; round -= 1) {
    const count = piece.counts[round - 1] ?? 6;
    const made = round > piece.rounds ? Math.round(count * piece.part) : count;
    const half = Math.PI / count;
    let d = '';
    for (let k = 0; k < made; k += 1) {
      // The round in work grows away from its first stitch, against the clock as a right hand works.
      const angle = -(2 * Math.PI * (k + 0.5)) / count;
      d += vee(
        point(round - 0.14, angle - half * 0.8),
        point(round - 0.78, angle),
        point(round - 0.14, angle + half * 0.8),
      );
    }
    if (d) out += vees(d, yarn, width, round % 2 === 1);
  }
  return `${out}<circle cx="${n(cx)}" cy="${n(cy)}" r="3.5" fill="${yarn.inside}"/>`;
}

export interface Cup {
  readonly counts: readonly number[];
  readonly rounds: number;
  readonly part: number;
}

/** How far the rim is tipped toward the eye: the short half axis of its ellipse, as a share of the long one. */
const TIP = 0.34;

export interface Rim {
  readonly x: number;
  readonly y: number;
  readonly r: number;
}

/** The rim of a cup standing at (cx, base), drawn at `scale` units a millimetre. */
export function rimOf(cup: Cup, cx: number, base: number, scale: number): Rim {
  const top = profile(cup.counts.slice(0, cup.rounds)).at(-1)!;
  return { x: cx, y: base - top.z * Math.sqrt(1 - TIP * TIP) * scale, r: top.r * scale };
}

/** A place on the rim; angle 0 at the right, a quarter turn on at the near side. */
export const onRim = (rim: Rim, angle: number): readonly [number, number] => [
  rim.x + rim.r * Math.cos(angle),
  rim.y + rim.r * TIP * Math.sin(angle),
];

/** A piece that stands up, seen from a little above, first round at the foot; it turns under the hook as it grows. */
export function cupPiece(cup: Cup, cx: number, base: number, scale: number, yarn: Yarn, hookAngle: number): string {
  const points = profile(cup.counts.slice(0, cup.rounds));
  const flat = Math.sqrt(1 - TIP * TIP);
  const y = (z: number) => base - z * flat * scale;
  const ellipse = (z: number, r: number, look: string) =>
    `<ellipse cx="${n(cx)}" cy="${n(y(z))}" rx="${n(r * scale)}" ry="${n(r * scale * TIP)}" ${look}/>`;
  const slices: [number, number][] = [];
  for (let i = 1; i < points.length; i += 1) {
    const [low, high] = [points[i - 1]!, points[i]!];
    for (let t = 0; t <= 1; t += 0.2) slices.push([low.z + (high.z - low.z) * t, low.r + (high.r - low.r) * t]);
  }
  const widest = Math.max(...points.map((p) => p.r)) * scale;
  let out = `<ellipse cx="${n(cx + 20)}" cy="${n(base + 6)}" rx="${n(widest * 1.02)}" ry="${n(widest * 0.36)}" fill="#26373a" opacity=".6"/>`;
  out += slices.map(([z, r]) => ellipse(z, r, `fill="${yarn.edge}" stroke="${yarn.edge}" stroke-width="6"`)).join('');
  out += slices.map(([z, r]) => ellipse(z, r, `fill="${yarn.body}"`)).join('');
  // Seen from above its rim a cup shows its wrong side, so its rounds run with the clock there.
  const turn = hookAngle - cup.part * 2 * Math.PI;
  for (let i = 1; i < points.length; i += 1) out += wallRound(i);
  return out + rim();

  function wallRound(i: number): string {
    const [low, high] = [points[i - 1]!, points[i]!];
    const count = cup.counts[i - 1]!;
    const r = ((low.r + high.r) / 2) * scale;
    const tall = Math.max(5, (y(low.z) - y(high.z)) * 0.46);
    let d = '';
    for (let k = 0; k < count; k += 1) {
      const angle = turn + (2 * Math.PI * (k + (i % 2) * 0.5)) / count;
      if (Math.sin(angle) < 0.1) continue;
      const x = cx + r * Math.cos(angle);
      const middle = (y(low.z) + y(high.z)) / 2 + r * TIP * Math.sin(angle);
      const half = ((r * Math.PI) / count) * Math.sin(angle) * 0.86;
      d += vee(at(x - half, middle - tall), at(x, middle + tall * 0.8), at(x + half, middle - tall));
    }
    return vees(d, yarn, 5, i % 2 === 1);
  }

  function rim(): string {
    const top = rimOf(cup, cx, base, scale);
    const inner = `<ellipse cx="${n(top.x)}" cy="${n(top.y + 2)}" rx="${n(Math.max(2, top.r - 13))}" ry="${n(Math.max(1, top.r * TIP - 7))}" fill="${yarn.inside}"/>`;
    const edge = `<ellipse cx="${n(top.x)}" cy="${n(top.y)}" rx="${n(top.r)}" ry="${n(top.r * TIP)}" fill="${yarn.body}" stroke="${yarn.edge}" stroke-width="2.4"/>`;
    const count = cup.counts[cup.rounds - 1]!;
    const next = cup.counts[cup.rounds] ?? count;
    const made = Math.round(next * cup.part);
    const places: { sin: number; svg: string }[] = [];
    for (let k = 0; k < count; k += 1) places.push(chainTop(turn + (2 * Math.PI * (k + 0.5)) / count, count, 0));
    for (let k = 0; k < made; k += 1) places.push(newStitch(turn + (2 * Math.PI * (k + 0.5)) / next, next));
    places.sort((a, b) => a.sin - b.sin);
    const far = places.filter((p) => p.sin < 0).map((p) => p.svg);
    const near = places.filter((p) => p.sin >= 0).map((p) => p.svg);
    return edge + inner + far.join('') + near.join('');

    function chainTop(angle: number, around: number, lift: number) {
      const [x, yy] = onRim({ ...top, r: top.r - 6 }, angle);
      const length = Math.hypot(Math.sin(angle), TIP * Math.cos(angle)) * ((top.r * Math.PI) / around) * 0.92;
      const lie = (Math.atan2(TIP * Math.cos(angle), -Math.sin(angle)) * 180) / Math.PI;
      const svg = `<ellipse cx="${n(x)}" cy="${n(yy - lift)}" rx="${n(length)}" ry="5" transform="rotate(${n(lie)} ${at(x, yy - lift)})" fill="${yarn.light}" stroke="${yarn.edge}" stroke-width="2"/>`;
      return { sin: Math.sin(angle), svg };
    }

    function newStitch(angle: number, around: number) {
      const [x, yy] = onRim(top, angle);
      const half = Math.max(3, ((top.r * Math.PI) / around) * Math.abs(Math.sin(angle)));
      const body = `<path d="M${at(x - half, yy - 20)}H${n(x + half)}V${n(yy + 4)}H${n(x - half)}Z" fill="${yarn.body}"/>`;
      const v =
        Math.sin(angle) > 0.1
          ? vees(
              vee(at(x - half * 0.8, yy - 17), at(x, yy + 2), at(x + half * 0.8, yy - 17)),
              yarn,
              5,
              (cup.rounds + 1) % 2 === 1,
            )
          : '';
      return { sin: Math.sin(angle), svg: body + v + chainTop(angle, around, 20).svg };
    }
  }
}
