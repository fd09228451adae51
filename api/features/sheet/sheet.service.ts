import type { EditionDocument, PublicEdition } from '#crochet';
import type { Paper, SheetQuery } from '#contract/editions';
import { renderSheet } from './page/render-sheet.ts';
import { unprintable } from './page/runs.ts';

/** Where an edition's page stands, whole; a draft has none yet and names the pattern's lasting address. */
export function addressOf(publicUrl: string, edition: Pick<PublicEdition, 'code' | 'edition'>): string {
  const path = `${publicUrl}/w/${edition.code}`;
  return edition.edition === null ? path : `${path}/${edition.edition}`;
}

/** A file name that says what it is wherever it lands: "harvest-mouse-edition-3-A4-US.pdf". */
export function sheetFileName(edition: Pick<PublicEdition, 'title' | 'edition'>, paper: Paper, terms: string): string {
  const title = edition.title
    .normalize('NFKD')
    .replace(/[^A-Za-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .toLowerCase();
  const which = edition.edition === null ? 'draft' : `edition-${edition.edition}`;
  return `${title === '' ? 'pattern' : title}-${which}-${paper}-${terms}.pdf`;
}

export interface MadeSheet {
  readonly pdf: Buffer;
  readonly fileName: string;
}

/** Draws a sheet. What is not asked for is the studio's paper and the pattern's own terms. */
export async function makeSheet(
  edition: PublicEdition,
  asked: SheetQuery & { readonly studioPaper: Paper; readonly publicUrl: string; readonly made: Date },
): Promise<MadeSheet> {
  const { paper = asked.studioPaper, terms = edition.terms, made } = asked;
  const pdf = await renderSheet(edition, { paper, terms, made, address: addressOf(asked.publicUrl, edition) });
  return { pdf, fileName: sheetFileName(edition, paper, terms) };
}

/** Every word of a document that a sheet prints. */
function printedWords(document: EditionDocument): string {
  const { details, terms } = document;
  const both = (text: { US: string; UK: string }) => text[terms];
  return [
    ...[document.title, document.maker, document.checker, document.studio.name],
    ...[details.introduction, details.gauge, details.finishedSize, details.care, details.permission, details.contact],
    ...document.materials.map(({ text }) => text),
    ...document.cautions.map(({ text }) => text),
    ...document.notes.map(both),
    ...document.specialStitches.flatMap(({ name, text }) => [name, both(text)]),
    ...document.pieces.flatMap(({ name, lines }) => [
      name,
      ...lines.flatMap((line) => [line.label, both(line.text), both(line.note)]),
    ]),
  ].join('');
}

/** Signs in a document that none of the sheet's fonts has: they would be left out, so the creator is told. */
export const missingSigns = (document: EditionDocument): readonly string[] => unprintable(printedWords(document));
