import type { PublicEdition, Terms } from '#crochet';
import type { Block } from './paginate.ts';
import { GREY, type Pen } from './pen.ts';
import type { Style } from './runs.ts';

export type Paper = 'A4' | 'Letter';

export const PAPERS: Readonly<Record<Paper, readonly [width: number, height: number]>> = {
  A4: [595.28, 841.89],
  Letter: [612, 792],
};

/** Side margins, in points. */
export const MARGIN = 34.5;
/** Where the first line of a page begins, and how much is kept for its foot. */
export const TOP = 30;
export const FOOT = 50;

export interface SheetContext {
  readonly pen: Pen;
  readonly edition: PublicEdition;
  readonly terms: Terms;
  /** Where the watch page of this edition stands, without a slash at the end. */
  readonly address: string;
  /** Left and right edge of what is printed. */
  readonly left: number;
  readonly right: number;
}

export const body: Style = { face: 'sans', size: 10.05 };
export const bodyBold: Style = { face: 'sans-bold', size: 10.05 };
export const section: Style = { face: 'heading', size: 10.9 };
export const small: Style = { face: 'sans', size: 9.4, colour: GREY };
export const BODY_LEADING = 12.75;

/** Splits typed text where the writer began a new line. */
export const paragraphs = (text: string): readonly string[] =>
  text
    .split(/\r?\n/)
    .map((line) => line.trim())
    .filter((line) => line !== '');

/**
 * A heading and its paragraphs over the whole width, one block a line so that long texts run on over pages. Nothing
 * for empty text.
 */
export function prose(context: SheetContext, heading: string, texts: readonly string[], style: Style = body): Block[] {
  const { pen, left, right } = context;
  const filled = texts.flatMap(paragraphs);
  if (filled.length === 0) return [];
  const part = { element: null as PDFKit.PDFStructureElement | null };
  const under = () => (part.element ??= pen.group(pen.root, 'Sect'));
  const blocks: Block[] = [
    {
      height: 24,
      keepNext: 2,
      draw: (y) => pen.tag(under(), 'H2', () => pen.text(heading, section, left, y + 18)),
    },
  ];
  for (const text of filled) {
    const lines = pen.wrap({ text, style }, Math.min(right - left, style.size * 48));
    lines.forEach((line, i) => {
      blocks.push({
        height: BODY_LEADING + (i === lines.length - 1 ? 2 : 0),
        ...(i === 0 && lines.length > 1 && { keepNext: 1 }),
        draw: (y) => pen.tag(under(), 'P', () => pen.line(line, left, y + 10)),
      });
    });
  }
  return blocks;
}
