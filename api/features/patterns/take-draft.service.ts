import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { Draft, DraftLine } from '#crochet';
import type { Details } from '#contract/pattern-details';
import { AppError } from '../../http/problem.ts';
import { joinCautions } from './cautions.service.ts';
import { record, writeFields, type Deed } from './deed.service.ts';
import { matchLines, matchPiece, type MatchedLine } from './draft-match.ts';
import { findSource, insertEvidence, listKnownLines, type KnownLine, type SourceOfDraft } from './draft.store.ts';
import { hearAgain } from './draft-again.ts';
import type { Fields, RowEntity } from './entities.ts';
import { newShortIds } from './ids.ts';
import { placeManyAfter } from './order.ts';
import { setPatternState } from './patterns.service.ts';
import { lockPattern } from './patterns.store.ts';
import { findRow, insertRows, listRows, takenShortIds } from './rows.store.ts';
import { suggestedCautions, suggestedMaterials } from './suggestions.ts';
import { placeWritten } from './written-total.ts';

/** How much of a draft was new to the pattern. */
export interface Taken {
  readonly pieces: number;
  readonly lines: number;
}

interface Taking {
  readonly trx: Knex.Transaction;
  readonly deed: Deed;
  readonly source: SourceOfDraft;
  /** Short ids that no line of the pattern ever had, to be used up. */
  readonly shortIds: string[];
}

async function insertLogged(
  trx: Knex.Transaction,
  deed: Deed,
  entity: RowEntity,
  rows: readonly Fields[],
): Promise<void> {
  await insertRows(trx, entity, deed.patternId, rows);
  await record(
    trx,
    deed,
    rows.map(({ id, ...after }) => ({ entity, entityId: id as string, before: null, after })),
  );
}

/** Puts drafted lines behind one of the piece (null: first), each with its moment and the words it was heard in. */
async function addLines(
  { trx, deed, source, shortIds }: Taking,
  pieceId: string,
  drafts: readonly DraftLine[],
  after: string | null,
): Promise<string | null> {
  const keys = await placeManyAfter(trx, { entity: 'line', within: pieceId }, after, drafts.length);
  const rows = drafts.map(({ kind, label, from, to, text, said, ...draft }, i) => {
    const line = { kind, label, from, to, said, heardTotal: said, pieceId, orderKey: keys[i], shortId: shortIds.pop() };
    return { id: randomUUID(), draft, fields: { ...line, ...placeWritten({ kind, text }) } };
  });
  await insertLogged(
    trx,
    deed,
    'line',
    rows.map(({ id, fields }) => ({ id, ...fields })),
  );
  const marks = rows.map(({ id, draft }) => ({
    id: randomUUID(),
    lineId: id,
    recordingId: source.recordingId,
    startMs: Math.round(draft.startMs),
    main: true,
    madeBy: 'reading',
  }));
  await insertLogged(trx, deed, 'mark', marks);
  await insertEvidence(
    trx,
    source,
    rows.map(({ id, draft }) => ({ lineId: id, evidence: draft.evidence })),
  );
  return rows.at(-1)?.id ?? after;
}

/** Goes through a piece in the order of the recording: what is new comes behind what stood before it there. */
async function mergeLines(taking: Taking, pieceId: string, matched: readonly MatchedLine[]): Promise<number> {
  let after: string | null = null;
  let added = 0;
  for (let i = 0; i < matched.length;) {
    const known = matched[i]!.line;
    if (known) {
      if (!known.deletedAt) await hearAgain(taking.trx, taking.deed, taking.source, known, matched[i]!.draft);
      after = known.id;
      i += 1;
      continue;
    }
    const until = matched.findIndex((one, at) => at > i && one.line !== undefined);
    const run = matched.slice(i, until < 0 ? undefined : until).map(({ draft }) => draft);
    after = await addLines(taking, pieceId, run, after);
    added += run.length;
    i += run.length;
  }
  return added;
}

async function takePieces(taking: Taking, draft: Draft, lines: readonly KnownLine[]): Promise<Taken> {
  const { trx, deed } = taking;
  const pieces = await listRows(trx, 'piece', deed.patternId);
  const met = new Set<string>();
  let taken: Taken = { pieces: 0, lines: 0 };
  for (const drafted of draft.pieces) {
    const piece = matchPiece(drafted, pieces, met);
    const id = piece?.id ?? randomUUID();
    met.add(id);
    if (!piece) {
      const [orderKey] = await placeManyAfter(trx, { entity: 'piece', within: deed.patternId }, undefined, 1);
      const { name, make, worked } = drafted;
      await insertLogged(trx, deed, 'piece', [{ id, name, make, worked, orderKey }]);
    }
    const known = lines.filter((line) => line.pieceId === id);
    const added = await mergeLines(taking, id, matchLines(drafted.lines, known));
    taken = { pieces: taken.pieces + (piece ? 0 : 1), lines: taken.lines + added };
  }
  return taken;
}

async function takeSuggestions({ trx, deed }: Taking, draft: Draft): Promise<void> {
  const { patternId } = deed;
  const add = async (entity: 'material' | 'caution', rows: readonly Fields[]) => {
    const keys = await placeManyAfter(trx, { entity, within: patternId }, undefined, rows.length);
    await insertLogged(
      trx,
      deed,
      entity,
      rows.map((row, i) => ({ id: randomUUID(), ...row, orderKey: keys[i] })),
    );
  };
  await add('material', suggestedMaterials(draft.suggestions, await listRows(trx, 'material', patternId)));
  const cautions = await listRows(trx, 'caution', patternId);
  const sources = {
    pattern: { details: {} },
    materials: await listRows(trx, 'material', patternId),
    lines: await listRows(trx, 'line', patternId),
  };
  const brought = new Set<string>(joinCautions(sources, []).map(({ kind }) => kind));
  await add('caution', suggestedCautions(draft.suggestions, cautions, brought));
}

/** What the speaker's words say of the pattern as a whole, where it is still empty. */
async function takeHead(trx: Knex.Transaction, deed: Deed, draft: Draft): Promise<void> {
  const row = (await findRow(trx, 'pattern', deed.patternId))!;
  const details = row.details as Partial<Details>;
  const gauge = draft.suggestions.find(({ kind }) => kind === 'gauge')?.text.slice(0, 300);
  const heard = gauge !== undefined && !details.gauge ? { details: { ...details, gauge } } : {};
  await writeFields(trx, deed, 'pattern', row, { terms: draft.terms, ...heard });
}

/**
 * Takes a reading into a pattern: pieces, lines with their moments and the words they were heard in, and what the
 * recording says of materials and cautions. What the pattern has already keeps its place and its ids; what a person has
 * written or taken away stays so. The caller has checked the right, and gives the deed it is part of.
 * @throws AppError not-found (no such pattern or reading)
 */
export async function takeDraft(trx: Knex.Transaction, deed: Deed, readingId: string, draft: Draft): Promise<Taken> {
  const pattern = await lockPattern(trx, deed.patternId);
  const source = await findSource(trx, readingId);
  if (!pattern || !source) throw new AppError('not-found');
  const lines = await listKnownLines(trx, pattern.id);
  if (lines.length === 0) await takeHead(trx, deed, draft);
  const many = draft.pieces.reduce((sum, piece) => sum + piece.lines.length, 0);
  const shortIds = newShortIds(await takenShortIds(trx, pattern.id), many);
  const taking: Taking = { trx, deed, source, shortIds };
  const taken = await takePieces(taking, draft, lines);
  await takeSuggestions(taking, draft);
  if (pattern.state === 'reading') await setPatternState(trx, deed, 'drafting');
  return taken;
}
