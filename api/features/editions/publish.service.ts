import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { blocksOf, differenceOf, type Block, type EditionDocument, type Erratum } from '#crochet';
import type { Block as BlockAnswer, Publish, PublishDesk } from '#contract/editions';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import { addJob } from '../../platform/jobs.ts';
import { openPattern, writeFields, type Asking } from '../patterns/deed.service.ts';
import { listChecks } from '../patterns/checks.service.ts';
import { findSeenPattern } from '../patterns/document.service.ts';
import { setPatternState } from '../patterns/patterns.service.ts';
import { missingSigns } from '../sheet/sheet.service.ts';
import { draftEdition } from './drafts.service.ts';
import { canPublish } from './editions.policy.ts';
import { insertEdition, insertErrata, listEditions } from './editions.store.ts';

/** Name of the job that makes an edition's sheets. */
export const SHEETS_JOB = 'make-sheets';

const SAYS: Readonly<Record<Block['reason'], string>> = {
  empty: 'has no instruction',
  unread: 'is not understood',
  differs: 'differs: its totals are not equal',
  'does-not-fit': 'does not fit the line before',
};

function answerBlock(block: Block): BlockAnswer {
  const { lineId, piece, label, verdict, reason } = block;
  const name = label === '' ? `A step of ${piece}` : `${piece}, ${label}`;
  return { lineId, piece, label, verdict, reason, sentence: `${name} ${SAYS[reason]}.` };
}

/** The newest edition's document, from which the next one differs; withdrawn ones count, since they were printed. */
async function previousOf(db: Knex, patternId: string): Promise<EditionDocument | null> {
  const [newest] = await listEditions(db, patternId);
  return newest?.document ?? null;
}

/**
 * What the next edition would be: its number, what holds it back, what it changes.
 * @throws AppError not-found
 */
export async function readPublishDesk(db: Knex, who: Person, patternId: string): Promise<PublishDesk> {
  const pattern = await findSeenPattern(db, who, patternId);
  const { content, document, paper } = await draftEdition(db, patternId);
  const previous = await previousOf(db, patternId);
  const difference = previous ? differenceOf(previous, document) : { countsChanged: false, errata: [] };
  const lines = document.pieces.flatMap((piece) => piece.lines);
  return {
    lastChange: content.lastChange,
    number: (previous?.edition ?? 0) + 1,
    visibility: content.visibility,
    mayPublish: canPublish(who, pattern) && pattern.deletedAt === null,
    lines: lines.length,
    counted: lines.filter(({ kind }) => kind === 'round' || kind === 'row').length,
    agreeing: lines.filter((line) => line.studio.verdict === 'agrees').length,
    blocks: blocksOf(document).map(answerBlock),
    checks: listChecks(content).open,
    unprintable: [...missingSigns(document)],
    countsChanged: difference.countsChanged,
    errata: [...difference.errata],
    paper,
  };
}

/** Refuses what may not go out, naming the lines. */
function checkOutgoing(document: EditionDocument): void {
  if (document.pieces.every((piece) => piece.lines.length === 0)) {
    throw new AppError('invalid', 'There is nothing to publish yet: the pattern has no line.', { blocks: [] });
  }
  const blocks = blocksOf(document).map(answerBlock);
  if (blocks.length === 0) return;
  const named = blocks.slice(0, 3).map(({ sentence }) => sentence);
  const more = blocks.length > 3 ? ` And ${blocks.length - 3} more.` : '';
  throw new AppError('invalid', `${named.join(' ')}${more} Mend them, or leave them as they are and say why.`, {
    blocks,
  });
}

/** The drafted errata as the creator settled them: some left out, some with a reason. */
function settle(drafted: readonly Erratum[], settled: Publish['errata']): Erratum[] {
  return drafted.flatMap((erratum, index) => {
    const said = settled.find((one) => one.index === index);
    if (said?.told === false) return [];
    if (said === undefined && erratum.weight === 'look') return [];
    return [said && said.why !== '' ? { ...erratum, why: said.why } : erratum];
  });
}

/**
 * Freezes the pattern as its next edition, in one transaction with the change of its state, who may see it, the
 * errata and the job that makes the sheets.
 *
 * @param at the pattern, and the number of the newest change the caller has seen
 * @returns the number of the new edition
 * @throws AppError not-found | forbidden | gone (in the bin) | stale-version (somebody changed it since) | invalid (a
 *   line holds it back; `blocks` names each)
 */
export async function publishEdition(
  db: Knex,
  asking: Asking,
  at: { readonly patternId: string; readonly lastChange: number },
  asked: Publish,
): Promise<number> {
  const { patternId } = at;
  return db.transaction(async (trx) => {
    const { pattern, deed } = await openPattern(trx, asking, patternId, canPublish);
    const previous = await previousOf(trx, patternId);
    const number = (previous?.edition ?? 0) + 1;
    const out = { edition: number, publishedAt: asking.now, errata: [] };
    const drafted = await draftEdition(trx, patternId, out);
    if (drafted.content.lastChange !== at.lastChange) {
      throw new AppError('stale-version', 'The pattern was changed while you looked. See what is new, then publish.');
    }
    checkOutgoing(drafted.document);
    const errata = previous ? settle(differenceOf(previous, drafted.document).errata, asked.errata) : [];
    const document = { ...drafted.document, errata };
    const id = randomUUID();
    await insertEdition(trx, { id, patternId, number, document, at: asking.now, personId: asking.who.id });
    await insertErrata(trx, id, errata, new Map(drafted.content.lines.map((line) => [line.shortId, line.id])));
    await writeFields(trx, deed, 'pattern', { ...pattern, patternId }, { visibility: asked.visibility });
    await setPatternState(trx, deed, 'published');
    await addJob(trx, SHEETS_JOB, { editionId: id }, { key: `sheets ${id}` });
    return number;
  });
}
