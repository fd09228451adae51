import type { Erratum } from '#crochet';
import type { Block } from './paginate.ts';
import type { Text } from './runs.ts';
import { body, bodyBold, BODY_LEADING, paragraphs, prose, section, type SheetContext } from './sheet-context.ts';

const OF_THE_LOOK = 'look';

function erratumText({ place, was, now, why }: Erratum): Text[] {
  const change =
    now === '' ? `was “${was}”, now left out` : was === '' ? `new: “${now}”` : `“${was}” now reads “${now}”`;
  return [
    { text: `${place}: `, style: bodyBold },
    { text: `${change}${why === '' ? '' : `. ${why}`}`, style: body },
  ];
}

/** Care, then what changed since the edition before; changes of the look alone are not told. */
export function closingBlocks(context: SheetContext): Block[] {
  const { pen, edition, left, right } = context;
  const { care, permission, contact } = edition.details;
  const blocks = prose(context, 'Care', [care]);
  const told = edition.errata.filter(({ weight }) => weight !== OF_THE_LOOK);
  if (told.length > 0 && edition.edition !== null) {
    const heading = `Changed in edition ${edition.edition}`;
    blocks.push({
      height: 24,
      keepNext: 1,
      draw: (y) => pen.tag(pen.root, 'H2', () => pen.text(heading, section, left, y + 18)),
    });
    for (const erratum of told) {
      const lines = pen.wrap(erratumText(erratum), right - left);
      blocks.push({
        height: lines.length * BODY_LEADING + 2,
        draw: (y) => pen.tag(pen.root, 'P', () => pen.lines(lines, left, y + 10, BODY_LEADING)),
      });
    }
  }
  const split = left + (right - left) * 0.7;
  const wrapAll = (text: string, width: number) =>
    paragraphs(text).flatMap((line) => pen.wrap({ text: line, style: body }, width));
  const may = wrapAll(permission, split - left - 16);
  const ask = wrapAll(contact === '' ? '' : `Questions: ${contact}`, right - split);
  if (may.length + ask.length > 0) {
    blocks.push({
      height: Math.max(may.length, ask.length) * BODY_LEADING + 20,
      draw: (y) => {
        pen.artifact(() => pen.rule(left, right, y + 10, 0.75));
        if (may.length > 0) pen.tag(pen.root, 'P', () => pen.lines(may, left, y + 23, BODY_LEADING));
        if (ask.length > 0) pen.tag(pen.root, 'P', () => pen.lines(ask, split, y + 23, BODY_LEADING));
      },
    });
  }
  return blocks;
}
