import { longDate } from './dates.ts';
import type { Block } from './paginate.ts';
import { planQr } from './qr.ts';
import { drawRingPrint, ringPieceOf } from './ring-print.ts';
import type { Style } from './runs.ts';
import { body, type SheetContext } from './sheet-context.ts';

const title: Style = { face: 'heading', size: 28.5 };
const lead: Style = { face: 'written', size: 11.25 };
const LEADING = 15.75;
/** An introduction longer than this stands in a section of its own below. */
export const SHORT_INTRODUCTION = 160;
const MAP = 88;

const sentence = (text: string) => (text.endsWith('.') ? text : `${text}.`);

function byLine({ edition }: SheetContext): string {
  const who = edition.maker === '' ? edition.studio.name : `${edition.maker}, ${edition.studio.name}`;
  const checked = edition.checker === '' ? '' : ` ${sentence(`Proofread by ${edition.checker}`)}`;
  return `${sentence(`By ${who}`)}${checked}`;
}

/** "Edition 3, 21 March 2026." or, before publishing, that it is a draft. */
function editionLine({ edition }: SheetContext): string {
  if (edition.edition === null || edition.publishedAt === null) return 'Draft: not published, may still change.';
  return `Edition ${edition.edition}, ${longDate(edition.publishedAt)}.`;
}

/** Title, who made it, edition; at the right the ring map of the first piece in rounds and the way to the recording. */
export function headBlocks(context: SheetContext): Block[] {
  const { pen, edition, left, right, address } = context;
  const qr = edition.edition === null ? null : planQr(pen, address);
  const piece = ringPieceOf(edition);
  const mapWidth = piece ? MAP + 22 : 0;
  const qrWidth = qr ? 74 : 0;
  const width = right - left - mapWidth - qrWidth - 14;
  const titleLines = pen.wrap({ text: edition.title, style: title }, width);
  const { introduction } = edition.details;
  const short = introduction.length <= SHORT_INTRODUCTION ? [introduction] : [];
  const texts = [...short, byLine(context), editionLine(context)].filter((text) => text !== '');
  const leads = texts.map((text) => pen.wrap({ text, style: lead }, width));
  const textHeight = titleLines.length * 33 + leads.flat().length * LEADING + 8;
  const height = Math.max(textHeight, qr ? qr.side + 24 : 0, piece ? MAP + 6 : 0);
  return [
    {
      height: height + 14,
      draw: (y) => {
        pen.tag(pen.root, 'H1', () => pen.lines(titleLines, left, y + 27, 33));
        let at = y + titleLines.length * 33 + 11;
        for (const lines of leads) {
          pen.tag(pen.root, 'P', () => pen.lines(lines, left, at, LEADING));
          at += lines.length * LEADING;
        }
        if (piece) {
          const alt = `Ring map of the piece ${piece.name}: one ring a round, one dash a stitch, in working order.`;
          pen.tag(pen.root, 'Figure', () => drawRingPrint(pen, piece, right - qrWidth - mapWidth + 8, y + 1, MAP), {
            alt,
          });
        }
        if (qr) {
          const x = right - (qrWidth + qr.side) / 2;
          pen.tag(pen.root, 'Figure', () => qr.draw(x, y + 2), { alt: `QR code for ${address}` });
          const under = { ...body, size: 9.4 };
          pen.tag(pen.root, 'P', () => {
            pen.text('Every round', under, right - qrWidth / 2, y + qr.side + 10, 'center');
            pen.text('in the recording', under, right - qrWidth / 2, y + qr.side + 20, 'center');
          });
        }
        pen.artifact(() => {
          pen.rule(left, right, y + height + 4, 1.1);
          pen.rule(left, right, y + height + 7, 1.1);
        });
      },
    },
  ];
}
