import type { Block } from './paginate.ts';
import type { Text } from './runs.ts';
import { body, bodyBold, BODY_LEADING, section, type SheetContext } from './sheet-context.ts';

const HEAD_WIDTH = 62;
const PADDING = 10.5;
/** A frame holds at most this many lines, so that it always fits on a page. */
const FRAME_LINES = 34;

/**
 * The cautions in the sheet's only full double frame, with the sentence that defers to the rules where the maker
 * lives. No mark of the count ever stands in here. Long ones run on in a second frame.
 */
export function cautionBlocks(context: SheetContext): Block[] {
  const { pen, edition, left, right } = context;
  const words: Text[] = edition.cautions.flatMap(({ title, text }): Text[] => [
    ...(title === '' ? [] : [{ text: `${title}. `, style: bodyBold }]),
    { text: `${text} `, style: body },
  ]);
  words.push({ text: edition.deferral, style: body });
  const lines = pen.wrap(words, right - left - 2 * PADDING - HEAD_WIDTH);
  const frames = Array.from({ length: Math.ceil(lines.length / FRAME_LINES) }, (_, i) =>
    lines.slice(i * FRAME_LINES, (i + 1) * FRAME_LINES),
  );
  return frames.map((frame, i) => {
    const inside = Math.max(frame.length, i > 0 ? 2 : 1) * BODY_LEADING;
    const height = inside + 2 * PADDING - 3;
    return {
      height: height + 16,
      draw: (y) => {
        const top = y + 3;
        pen.artifact(() => {
          const { doc } = pen;
          doc.lineWidth(0.75).strokeColor('#2B221B');
          doc.rect(left + 0.4, top, right - left - 0.8, height).stroke();
          doc.rect(left + 3.4, top + 3, right - left - 6.8, height - 6).stroke();
        });
        const part = pen.group(pen.root, 'Sect');
        pen.tag(part, 'H2', () => {
          pen.text('Cautions', section, left + PADDING, top + PADDING + 8.6);
          if (i > 0) pen.text('continued', body, left + PADDING, top + PADDING + 8.6 + BODY_LEADING);
        });
        pen.tag(part, 'P', () => pen.lines(frame, left + PADDING + HEAD_WIDTH, top + PADDING + 8.4, BODY_LEADING));
        part.end();
      },
    };
  });
}
