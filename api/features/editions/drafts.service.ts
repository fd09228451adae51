import type { Knex } from 'knex';
import { buildEdition, type EditionDocument } from '#crochet';
import { AppError } from '../../http/problem.ts';
import { readPatternContent, type PatternContent } from '../patterns/document.service.ts';
import { editionSource, type Outgoing } from './edition-source.ts';
import { findAround, listCaptions } from './editions.store.ts';

export const DRAFT: Outgoing = { edition: null, publishedAt: null, errata: [] };

export interface Drafted {
  readonly content: PatternContent;
  readonly document: EditionDocument;
  readonly paper: 'A4' | 'Letter';
}

/**
 * The document a pattern would go out as. The one way from a pattern to a document: draft, sheet and edition alike.
 * No right is checked here.
 *
 * @throws AppError not-found
 */
export async function draftEdition(db: Knex, patternId: string, out: Outgoing = DRAFT): Promise<Drafted> {
  const content = await readPatternContent(db, patternId);
  const around = content && (await findAround(db, patternId));
  if (!content || !around) throw new AppError('not-found');
  const source = editionSource(
    content,
    {
      studio: { name: around.studioName, foot: around.foot },
      creator: around.creator ?? '',
      captions: await listCaptions(db, patternId),
    },
    out,
  );
  return { content, document: buildEdition(source), paper: around.paper };
}
