import type { Readable } from 'node:stream';
import type { Knex } from 'knex';
import type { PublicEdition } from '#crochet';
import type { EditionFile, Paper } from '#contract/editions';
import type { Deps } from '../../platform/deps.ts';
import { makeSheet } from './sheet.service.ts';
import { beginObject, findFile, findStudioOf, listFileRows, settleFile } from './sheet-files.store.ts';

const PAPERS: readonly Paper[] = ['A4', 'Letter'];

const variantOf = (paper: Paper, terms: string) => `${paper}-${terms}`;

/** Sheets that are ready, by the id of their edition. */
export async function listFiles(db: Knex, editionIds: readonly string[]): Promise<ReadonlyMap<string, EditionFile[]>> {
  const found = new Map<string, EditionFile[]>();
  for (const { editionId, variant, bytes } of await listFileRows(db, editionIds)) {
    const [paper, terms] = variant.split('-') as [Paper, 'US' | 'UK'];
    found.set(editionId, [...(found.get(editionId) ?? []), { paper, terms, bytes }]);
  }
  return found;
}

/**
 * Makes an edition's sheets for both papers in the pattern's own terms and keeps them. Done twice it does the same
 * as once: what is there stays.
 */
export async function keepSheets(
  { db, storage, clock, env }: Pick<Deps, 'db' | 'storage' | 'clock' | 'env'>,
  editionId: string,
  edition: PublicEdition,
): Promise<void> {
  const studioId = await findStudioOf(db, editionId);
  if (studioId === undefined) return;
  const made = edition.publishedAt === null ? clock.now() : new Date(edition.publishedAt);
  for (const paper of PAPERS) {
    const variant = variantOf(paper, edition.terms);
    if (await findFile(db, editionId, variant)) continue;
    const { pdf } = await makeSheet(edition, { paper, studioPaper: paper, publicUrl: env.publicUrl, made });
    const object = await beginObject(db, studioId, pdf.byteLength, clock.now());
    await storage.put(object.key, pdf, 'application/pdf');
    await settleFile(db, { editionId, variant, objectId: object.id, at: clock.now() });
  }
}

/** A kept sheet's bytes; null where it is not made yet, or was never meant to be kept. */
export async function openKeptSheet(
  { db, storage }: Pick<Deps, 'db' | 'storage'>,
  editionId: string,
  paper: Paper,
  terms: string,
): Promise<{ readonly body: Readable; readonly bytes: number } | null> {
  const file = await findFile(db, editionId, variantOf(paper, terms));
  return file ? storage.get(file.key) : null;
}
