import { cupPiece, flatPiece, onRim, profile, rimOf, type Cup } from './fabric.ts';
import { ball, hook, leftHand, marker, needle, rightHand, strand, table } from './hands.ts';
import { at, moved, n, outlined, smooth, SLATE, WHEAT, WIDTH, HEIGHT, type Yarn } from './svg.ts';

/** Rounds of the demo's pieces, stitch totals in working order. */
export const COUNTS = {
  body: [6, 12, 18, 24, 24, 24, 24, 24, 18, 18, 24, 24, 24, 18, 18, 12, 12, 6],
  ear: [6, 12, 12],
  hexagon: [6, 12, 18, 24, 30, 36, 42, 48, 54, 60],
} as const;

/** What a shot shows. `round` is the round in work, `from` and `to` how much of it is made at its two ends (0 to 1). */
export type View =
  | { readonly show: 'title'; readonly title: string; readonly about: string; readonly piece: 'mouse' | 'holder' }
  | { readonly show: 'materials'; readonly yarn: 'wheat' | 'slate' }
  | { readonly show: 'mouse' }
  | { readonly show: 'holder' }
  | { readonly show: 'ring'; readonly yarn: 'wheat' | 'slate'; readonly from: number; readonly to: number }
  | {
      readonly show: 'round';
      readonly piece: keyof typeof COUNTS;
      readonly round: number;
      readonly from: number;
      readonly to: number;
    }
  | { readonly show: 'eyes' }
  | { readonly show: 'stuff' }
  | { readonly show: 'closing' }
  | { readonly show: 'tail'; readonly from: number; readonly to: number }
  | { readonly show: 'sewing' }
  | { readonly show: 'edge'; readonly from: number; readonly to: number };

/** The hook's four positions while one stitch is made: in, catch, draw, through. */
const POSES: readonly (readonly [number, number])[] = [
  [0, 0],
  [-9, 8],
  [-5, -7],
  [5, -3],
];

const shadow = (d: string, width: number) =>
  `<path d="${d}" transform="translate(9 14)" fill="none" stroke="#26373a" stroke-width="${n(width)}" stroke-linecap="round" opacity=".45"/>`;

/** Hands and hook around a piece whose newest stitch is at (x, y). */
function working(
  piece: string,
  x: number,
  y: number,
  pose: number,
  yarn: Yarn,
  tool: 'hook' | 'needle' = 'hook',
): string {
  const [dx, dy] = POSES[pose]!;
  const left = leftHand(0, Math.max(-10, Math.min(30, y - 200)) * 0.5);
  const right = rightHand(x - 494 + dx, y - 184 + dy);
  const feed = strand(
    smooth([
      [-14, 206],
      [50, 288],
      [140, 306],
      [186, 250],
      [206, 158],
      [270, 96],
      [(x + 270) / 2 + 10, Math.min(70, y - 60)],
      [x - 24, y - 12],
    ]),
    yarn,
  );
  const held =
    tool === 'hook'
      ? hook(x + dx - 2, y + dy, x + 266 + dx, y + 26 + dy)
      : needle(x + dx - 6, y + dy + 6, x + 150 + dx, y - 6 + dy);
  return ball(715, 58, 58, yarn) + feed + left.behind + piece + left.front + right.behind + held + right.front;
}

function round(view: Extract<View, { show: 'round' }>, part: number, pose: number): string {
  const counts = COUNTS[view.piece];
  const yarn = view.piece === 'hexagon' ? SLATE : WHEAT;
  const made = view.round - 1;
  if (view.piece === 'hexagon' || (view.round <= 4 && view.piece === 'body') || view.round <= 2) {
    const flatRounds = view.piece === 'hexagon' ? 24 + view.round * 13 : 26 + view.round * 22;
    const angle = -0.85;
    const x = 398 + flatRounds * 0.86 * Math.cos(angle);
    const y = 262 + flatRounds * 0.86 * Math.sin(angle);
    const disc = flatPiece(
      { counts, rounds: made, part, corners: view.piece === 'hexagon' },
      398,
      262,
      (flatRounds * (made + part)) / view.round,
      yarn,
      angle,
    );
    const start = angle + part * 2 * Math.PI;
    const hung = (flatRounds * made) / view.round;
    const mark = marker(398 + hung * Math.cos(start) - 4, 262 + hung * Math.sin(start) - 4);
    return working(disc + mark, x, y, pose, yarn);
  }
  return standing({ counts, rounds: made, part }, pose, yarn, view.piece === 'ear');
}

const HOOK_ANGLE = 0.24 * Math.PI;

/** The scale and foot at which a standing piece fills the middle of the picture, as it grows. */
function place(cup: Cup, small: boolean): { cx: number; base: number; scale: number } {
  const tall = profile(cup.counts.slice(0, cup.rounds)).at(-1)!.z;
  const scale = small ? 11 : Math.min(7.4, 250 / Math.max(20, tall + 4));
  return { cx: 396, base: small ? 350 : 392 + Math.max(0, 12 - scale) * 2, scale };
}

function standing(
  cup: Cup,
  pose: number,
  yarn: Yarn,
  small: boolean,
  extra = '',
  tool: 'hook' | 'needle' = 'hook',
): string {
  const { cx, base, scale } = place(cup, small);
  const rim = rimOf(cup, cx, base, scale);
  const piece = cupPiece(cup, cx, base, scale, yarn, HOOK_ANGLE);
  const [x, y] = onRim(rim, HOOK_ANGLE);
  const start = HOOK_ANGLE - cup.part * 2 * Math.PI;
  const mark = Math.sin(start) > -0.2 ? marker(onRim(rim, start)[0] - 2, onRim(rim, start)[1] + 8) : '';
  return working(piece + mark + extra, x + 6, y - 14, pose, yarn, tool);
}

function eyes(pose: number): string {
  const cup = { counts: COUNTS.body, rounds: 15, part: 0 };
  const { cx, base, scale } = place(cup, false);
  const rim = rimOf(cup, cx, base, scale);
  const eye = (x: number) =>
    `<circle cx="${n(x)}" cy="${n(rim.y + rim.r * 0.34 + 18)}" r="12" fill="#171310"/><circle cx="${n(x - 4)}" cy="${n(rim.y + rim.r * 0.34 + 13)}" r="3.4" fill="#f2f4f4"/>`;
  return standing(cup, pose, WHEAT, false, eye(cx - 30) + eye(cx + 24));
}

function stuff(pose: number): string {
  const cup = { counts: COUNTS.body, rounds: 15, part: 0 };
  const { cx, base, scale } = place(cup, false);
  const rim = rimOf(cup, cx, base, scale);
  const tuft = [-22, -6, 10, 24]
    .map(
      (dx, i) =>
        `<circle cx="${n(cx + dx)}" cy="${n(rim.y - 8 - ((i + pose) % 3) * 6)}" r="${18 - i}" fill="#f1efe6" stroke="#cfcabb" stroke-width="2"/>`,
    )
    .join('');
  return standing(cup, pose, WHEAT, false, tuft, 'needle');
}

function ring(yarn: Yarn, part: number, pose: number): string {
  const loop = `M332 236a78 66 0 1 0 156 0a78 66 0 1 0 -156 0`;
  const stitches = Array.from({ length: Math.round(6 * part) }, (_, k) => {
    const angle = -0.7 + k * -0.5;
    const [x, y] = [410 + 82 * Math.cos(angle), 236 + 70 * Math.sin(angle)];
    const lie = (angle * 180) / Math.PI + 90;
    return `<ellipse cx="${n(x)}" cy="${n(y)}" rx="18" ry="13" transform="rotate(${n(lie)} ${at(x, y)})" fill="${yarn.body}" stroke="${yarn.edge}" stroke-width="2.4"/><path d="M${at(410 + 72 * Math.cos(angle), 236 + 61 * Math.sin(angle))}L${at(410 + 92 * Math.cos(angle), 236 + 79 * Math.sin(angle))}" stroke="${yarn.light}" stroke-width="3.4" stroke-linecap="round"/>`;
  }).join('');
  const piece =
    outlined(loop, 12, yarn.body, yarn.edge, 3) + stitches + strand('M372 296C352 350 372 400 352 470', yarn, 8);
  return working(piece, 470, 186, pose, yarn);
}

function tail(part: number, pose: number): string {
  const made = 120 + 330 * part;
  const x = 560 - 60 * part;
  const d = `M${n(x)} 232C${n(x - made * 0.35)} 210 ${n(x - made * 0.6)} 290 ${n(x - made)} 262`;
  const cord = shadow(d, 16) + outlined(d, 15, WHEAT.body, WHEAT.edge, 4);
  const beads = `<path d="${d}" fill="none" stroke="${WHEAT.light}" stroke-width="9" stroke-dasharray="4 11" stroke-linecap="round"/>`;
  return working(cord + beads, x, 226, pose, WHEAT);
}

/** The mouse lying on its side, drawn from its own totals. */
function mouse(x0 = 236, cy = 262, scale = 6.2): string {
  const points = profile(COUNTS.body);
  const top = points.map((p): [number, number] => [x0 + p.z * scale, cy - p.r * scale]);
  const foot = points.map((p): [number, number] => [x0 + p.z * scale, cy + p.r * scale]).reverse();
  const nose = top.at(-1)!;
  const outline = `${smooth(top)}Q${at(nose[0] + 26, cy)} ${at(...foot[0]!)}${smooth(foot).replace(/^M[^C]*/u, '')}Z`;
  let out = `<path d="${outline}" transform="translate(14 26)" fill="#26373a" opacity=".55"/>`;
  const cord = `M${at(x0 + 6, cy + 6)}C${at(x0 - 60, cy + 74)} ${at(x0 - 150, cy + 60)} ${at(x0 - 150, cy - 10)}S${at(x0 - 80, cy - 96)} ${at(x0 - 128, cy - 140)}`;
  out += shadow(cord, 16) + outlined(cord, 14, WHEAT.body, WHEAT.edge, 4);
  out += `<path d="${cord}" fill="none" stroke="${WHEAT.light}" stroke-width="8" stroke-dasharray="4 11" stroke-linecap="round"/>`;
  const ear = (x: number, y: number, lean: number) =>
    `<g transform="rotate(${lean} ${at(x, y)})"><ellipse cx="${n(x)}" cy="${n(y)}" rx="46" ry="54" fill="${WHEAT.body}" stroke="${WHEAT.edge}" stroke-width="5"/><ellipse cx="${n(x)}" cy="${n(y)}" rx="32" ry="38" fill="none" stroke="${WHEAT.light}" stroke-width="5" stroke-dasharray="13 5"/><ellipse cx="${n(x)}" cy="${n(y)}" rx="16" ry="19" fill="none" stroke="${WHEAT.edge}" stroke-width="4" stroke-dasharray="9 4"/></g>`;
  const earX = x0 + points[12]!.z * scale;
  out += ear(earX + 22, cy - 128, 16);
  out += `<path d="${outline}" fill="${WHEAT.body}" stroke="${WHEAT.edge}" stroke-width="5"/>`;
  for (let i = 1; i < points.length; i += 1) {
    const [low, high] = [points[i - 1]!, points[i]!];
    const x = x0 + ((low.z + high.z) / 2) * scale;
    const r = ((low.r + high.r) / 2) * scale;
    const count = COUNTS.body[i - 1]!;
    const wide = Math.max(4, (high.z - low.z) * scale * 0.42);
    let d = '';
    for (let k = 0; k < count; k += 1) {
      const angle = (2 * Math.PI * (k + (i % 2) * 0.5)) / count;
      if (Math.cos(angle) < 0.12) continue;
      const y = cy + r * Math.sin(angle);
      const half = ((r * Math.PI) / count) * Math.cos(angle) * 0.84;
      d += `M${at(x + wide, y - half)}L${at(x - wide * 0.8, y)}L${at(x + wide, y + half)}`;
    }
    out += outlined(d, 4.6, i % 2 === 1 ? '#e3c07d' : '#d3ad66', WHEAT.edge, 2.6);
  }
  out += ear(earX - 12, cy - 84, -8);
  const eyeX = x0 + points[14]!.z * scale + 26;
  return `${out}<circle cx="${n(eyeX)}" cy="${n(cy - 24)}" r="17" fill="#171310"/><circle cx="${n(eyeX - 6)}" cy="${n(cy - 31)}" r="5" fill="#f2f4f4"/>`;
}

function holder(x = 398, y = 246): string {
  const flat = { counts: COUNTS.hexagon, rounds: 10, part: 0, corners: true };
  const loop = `M${at(x + 118, y - 78)}C${at(x + 150, y - 150)} ${at(x + 210, y - 110)} ${at(x + 132, y - 62)}`;
  const border = Array.from({ length: 7 }, (_, i) =>
    at(x + 173 * Math.cos((i * Math.PI) / 3), y + 173 * Math.sin((i * Math.PI) / 3)),
  );
  return (
    shadow(loop, 12) +
    outlined(loop, 10, SLATE.body, SLATE.edge, 3) +
    flatPiece(flat, x, y, 168, SLATE, 0) +
    outlined(`M${border.join('L')}`, 9, SLATE.light, SLATE.edge, 3)
  );
}

function edge(part: number, pose: number): string {
  const flat = { counts: COUNTS.hexagon, rounds: 10, part: 0, corners: true };
  const angle = -0.85;
  const under = moved(10, 14, flatPiece(flat, 398, 258, 150, SLATE, angle));
  const piece = flatPiece(flat, 398, 258, 150, SLATE, angle + part * 2 * Math.PI);
  const done = Array.from({ length: Math.round(60 * part) }, (_, k) => {
    const a = angle + (2 * Math.PI * (60 * part - k)) / 60;
    const inSector = ((((a - angle - part * 2 * Math.PI) % (Math.PI / 3)) + Math.PI / 3) % (Math.PI / 3)) - Math.PI / 6;
    const r = (150 * 1.07 * Math.cos(Math.PI / 6)) / Math.cos(inSector) + 3;
    return `<circle cx="${n(398 + r * Math.cos(a))}" cy="${n(258 + r * Math.sin(a))}" r="6.5" fill="${SLATE.light}" stroke="${SLATE.edge}" stroke-width="2"/>`;
  }).join('');
  return working(under + piece + done, 398 + 150 * Math.cos(angle), 258 + 150 * Math.sin(angle), pose, SLATE);
}

function materials(yarn: Yarn, pose: number): string {
  const left = leftHand(-60 + pose * 2, 40);
  const eye = (x: number) =>
    `<circle cx="${x}" cy="330" r="15" fill="#171310"/><circle cx="${x - 5}" cy="324" r="4" fill="#f2f4f4"/>`;
  const small = yarn === WHEAT ? eye(560) + eye(604) : '';
  return (
    ball(430, 196, 104, yarn) +
    strand('M500 270C560 330 640 250 700 300S800 340 830 300', yarn) +
    moved(0, 0, hook(560, 250, 770, 196)) +
    small +
    marker(662, 330) +
    left.behind +
    left.front
  );
}

function title(view: Extract<View, { show: 'title' }>): string {
  const picture =
    view.piece === 'mouse'
      ? moved(120, 44, `<g transform="scale(.78)">${mouse()}</g>`)
      : moved(110, 52, `<g transform="scale(.78)">${holder(380, 210)}</g>`);
  const words = (y: number, size: number, text: string, look: string) =>
    `<text x="408" y="${y}" text-anchor="middle" font-family="Lora" ${look} font-size="${size}" fill="#fbfcfa" stroke="#1b2426" stroke-width="4" stroke-opacity=".6" paint-order="stroke">${text}</text>`;
  return picture + words(398, 40, view.title, 'font-weight="600"') + words(432, 20, view.about, 'font-style="italic"');
}

/**
 * Draws one frame.
 * @param share how much of the shot has gone by, 0 to 1
 * @param pose which of the hook's four positions is shown
 */
export function drawFrame(view: View, share: number, pose: number): string {
  const part = 'from' in view ? view.from + (view.to - view.from) * share : 0;
  const yarnOf = (name: 'wheat' | 'slate') => (name === 'wheat' ? WHEAT : SLATE);
  const inner = ((): string => {
    switch (view.show) {
      case 'title':
        return title(view);
      case 'materials':
        return materials(yarnOf(view.yarn), pose);
      case 'mouse':
        return mouse();
      case 'holder':
        return holder();
      case 'ring':
        return ring(yarnOf(view.yarn), part, pose);
      case 'round':
        return round(view, part, pose);
      case 'eyes':
        return eyes(pose);
      case 'stuff':
        return stuff(pose);
      case 'closing':
        return standing({ counts: COUNTS.body, rounds: 18, part: 0 }, pose, WHEAT, false, '', 'needle');
      case 'tail':
        return tail(part, pose);
      case 'sewing':
        return (
          moved(-40, 10, mouse()) + rightHand(60, 20).behind + needle(470, 190, 640, 170) + rightHand(60, 20).front
        );
      case 'edge':
        return edge(part, pose);
    }
  })();
  return `<svg xmlns="http://www.w3.org/2000/svg" width="640" height="360" viewBox="0 0 ${WIDTH} ${HEIGHT}">${table()}${inner}</svg>`;
}
