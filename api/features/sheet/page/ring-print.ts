import { roundsOf, type PublicEdition, type PublicLine, type PublicPiece } from '#crochet';
import { INK, type Pen } from './pen.ts';

/** The gap between two dashes: this share of a stitch's place, and at most this many points. */
const GAP = 0.26;
const WIDEST_GAP = 2.4;
const HEART = 0.05;
/** Where in its band a ring stands. */
const IN_BAND = 0.72;

/** Totals after each round in working order, those of a range one by one; rounds without a known total are left out. */
function totalsOf(lines: readonly PublicLine[]): readonly number[] {
  return lines
    .filter(({ kind }) => kind === 'round')
    .flatMap((line) => line.rounds?.map(({ count }) => count) ?? Array<number | null>(roundsOf(line)).fill(line.count))
    .filter((count): count is number => count !== null && count > 0);
}

/** The piece whose ring map stands at the head of the sheet: the first that is worked in rounds. */
export function ringPieceOf(edition: PublicEdition): PublicPiece | null {
  return edition.pieces.find((piece) => piece.worked !== 'rows' && totalsOf(piece.lines).length > 1) ?? null;
}

/**
 * The print of a piece: one ring a round in working order, one dash a stitch, counterclockwise from the top. Over
 * twelve rounds every second one is left out, so that the dashes stay apart on paper.
 */
export function drawRingPrint(pen: Pen, piece: PublicPiece, x: number, y: number, side: number): void {
  const all = totalsOf(piece.lines);
  const rings = all.length > 12 ? all.filter((_, i) => i % 2 === 0 || i === all.length - 1) : all;
  const centre = side / 2;
  const heart = side * HEART;
  const band = (centre - 1 - heart) / rings.length;
  const { doc } = pen;
  doc
    .save()
    .translate(x + centre, y + centre)
    .lineCap('butt')
    .strokeColor(INK);
  rings.forEach((count, ring) => {
    const radius = heart + band * (ring + IN_BAND);
    const place = (2 * Math.PI) / count;
    const dash = place - Math.min(place * GAP, WIDEST_GAP / radius);
    doc.lineWidth(Math.min(1.6, Math.max(0.6, band * 0.42)));
    for (let k = 0; k < count; k++) {
      // Angles run clockwise on the page, work runs the other way.
      const from = -Math.PI / 2 - place * k - (place - dash) / 2;
      doc.moveTo(radius * Math.cos(from), radius * Math.sin(from));
      doc.path(arcPath(radius, from, from - dash));
    }
    doc.stroke();
  });
  doc
    .lineWidth(0.8)
    .circle(0, 0, heart * 0.6)
    .stroke()
    .restore();
}

function arcPath(radius: number, from: number, to: number): string {
  const at = (angle: number) => `${(radius * Math.cos(angle)).toFixed(3)} ${(radius * Math.sin(angle)).toFixed(3)}`;
  return `M${at(from)}A${radius.toFixed(3)} ${radius.toFixed(3)} 0 0 0 ${at(to)}`;
}
