import type { PublicEdition, Terms } from '#crochet';
import { cautionBlocks } from './cautions.ts';
import { closingBlocks } from './closing.ts';
import { factBlocks } from './facts.ts';
import { drawFeet } from './foot.ts';
import { headBlocks } from './head.ts';
import { pieceBlocks } from './ledger.ts';
import { paginate, type Block } from './paginate.ts';
import { Pen } from './pen.ts';
import { FOOT, MARGIN, PAPERS, TOP, type Paper, type SheetContext } from './sheet-context.ts';

export interface SheetOptions {
  readonly paper: Paper;
  readonly terms: Terms;
  /** Where the watch page of this edition stands, e.g. `https://roundelay.example/w/h9m/3`. */
  readonly address: string;
  /** Written into the file as its date; a published sheet takes the day it was published. */
  readonly made: Date;
}

/**
 * The step sheet of an edition (or of a draft, which says so) as a tagged PDF of vectors: title, materials, cautions,
 * every line with its boxes, total and moment. Pure but for the fonts it reads: the same edition and options give
 * the same pages.
 */
export async function renderSheet(edition: PublicEdition, options: SheetOptions): Promise<Buffer> {
  const [width, height] = PAPERS[options.paper];
  const pen = new Pen({
    size: [width, height],
    title: edition.edition === null ? `${edition.title} (draft)` : `${edition.title}, edition ${edition.edition}`,
    author: edition.maker === '' ? edition.studio.name : edition.maker,
    subject: `Crochet pattern in ${options.terms} terms`,
    made: options.made,
  });
  const context: SheetContext = {
    pen,
    edition,
    terms: options.terms,
    address: options.address,
    left: MARGIN,
    right: width - MARGIN,
  };
  pen.doc.addPage();
  const blocks: Block[] = [
    ...headBlocks(context),
    ...factBlocks(context),
    ...cautionBlocks(context),
    ...edition.pieces.flatMap((piece, i) => pieceBlocks(context, piece, i === 0)),
    ...closingBlocks(context),
  ];
  let page = 0;
  for (const block of paginate(blocks, TOP, height - FOOT)) {
    if (block.page > page) {
      pen.doc.addPage();
      page = block.page;
    }
    block.draw(block.y);
  }
  drawFeet(context, height);
  return pen.finish();
}
