import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { Draft, DraftLine } from '#crochet';
import type { Details } from '#contract/pattern-details';
import { AppError } from '../../http/problem.ts';
import { joinCautions } from './cautions.service.ts';
import { writeFields, type Deed } from './deed.service.ts';
import { hearAgain } from './draft-again.ts';
import {
  fieldsTaken,
  GONE,
  planDraft,
  type DraftChoice,
  type DraftPlan,
  type PlannedLine,
  type PlannedPiece,
} from './draft-plan.ts';
import { findSource, insertEvidence, listKnownLines, newHearing, type SourceOfDraft } from './draft.store.ts';
import type { Fields } from './entities.ts';
import { followMoments } from './follow-words.service.ts';
import { newShortIds } from './ids.ts';
import { insertLogged } from './insert-logged.ts';
import { placeManyAfter } from './order.ts';
import { setPatternState } from './patterns.service.ts';
import { lockPattern } from './patterns.store.ts';
import { findRow, listRows, takenShortIds } from './rows.store.ts';
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

/** Puts drafted lines behind one of the piece (null: first), each with its moment and the words it was heard in. */
async function addLines(
  { trx, deed, source, shortIds }: Taking,
  pieceId: string,
  drafts: readonly DraftLine[],
  after: string | null,
): Promise<string | null> {
  const keys = await placeManyAfter(trx, { entity: 'line', within: pieceId }, after, drafts.length);
  const rows = drafts.map(({ kind, label, from, to, text, said, ...draft }, i) => {
    const hearings = newHearing(draft.evidence);
    const line = { kind, label, from, to, said, heardTotal: said, pieceId, orderKey: keys[i], hearings };
    const fields = { ...line, shortId: shortIds.pop(), ...placeWritten({ kind, text }) };
    return { id: randomUUID(), draft, hearings, fields };
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
    transcriptId: source.transcriptId,
  }));
  await insertLogged(trx, deed, 'mark', marks);
  await insertEvidence(
    trx,
    source,
    rows.flatMap(({ id, draft, hearings }) =>
      hearings.map((hearingId) => ({ lineId: id, hearingId, evidence: draft.evidence })),
    ),
  );
  return rows.at(-1)?.id ?? after;
}

/** Tells a line that is there what was heard for it; one that was taken away and is asked for comes back. */
async function takeKnown({ trx, deed, source }: Taking, planned: PlannedLine, choice: DraftChoice): Promise<void> {
  const line = planned.line!;
  const fields = fieldsTaken(planned, choice);
  if (line.deletedAt && fields === null) return;
  const back = line.deletedAt ? { deletedAt: null } : {};
  await hearAgain(trx, deed, source, line, { draft: planned.draft, fields: { ...fields, ...back } });
}

/** Goes through a piece in the order of the recording: what is new comes behind what stood before it there. */
async function mergeLines(
  taking: Taking,
  pieceId: string,
  lines: readonly PlannedLine[],
  choice: DraftChoice,
): Promise<number> {
  let after: string | null = null;
  let added = 0;
  let run: DraftLine[] = [];
  const addRun = async () => {
    if (run.length > 0) after = await addLines(taking, pieceId, run, after);
    added += run.length;
    run = [];
  };
  for (const planned of lines) {
    if (!planned.line) {
      if (fieldsTaken(planned, choice)) run.push(planned.draft);
      continue;
    }
    await addRun();
    await takeKnown(taking, planned, choice);
    after = planned.line.id;
  }
  await addRun();
  return added;
}

/** A piece that is not there yet is made, where anything of it is taken. */
async function takePiece(taking: Taking, planned: PlannedPiece, choice: DraftChoice): Promise<Taken> {
  const { trx, deed } = taking;
  const isNew = !planned.piece;
  if (isNew && !planned.lines.some((line) => fieldsTaken(line, choice))) return { pieces: 0, lines: 0 };
  const id = planned.piece?.id ?? randomUUID();
  if (isNew) {
    const [orderKey] = await placeManyAfter(trx, { entity: 'piece', within: deed.patternId }, undefined, 1);
    const { name, make, worked } = planned.draft;
    await insertLogged(trx, deed, 'piece', [{ id, name, make, worked, orderKey }]);
  }
  return { pieces: isNew ? 1 : 0, lines: await mergeLines(taking, id, planned.lines, choice) };
}

async function takePlan(taking: Taking, plan: DraftPlan, choice: DraftChoice): Promise<Taken> {
  const { trx, deed, source } = taking;
  const wanted = plan.pieces.filter(({ index }) => choice.pieces?.includes(index) ?? true);
  let taken: Taken = { pieces: 0, lines: 0 };
  for (const piece of wanted) {
    const { pieces, lines } = await takePiece(taking, piece, choice);
    taken = { pieces: taken.pieces + pieces, lines: taken.lines + lines };
  }
  for (const line of plan.gone) {
    if (choice.lines?.includes(GONE + line.id)) await writeFields(trx, deed, 'line', line, { deletedAt: deed.at });
  }
  const known = new Set<unknown>(wanted.flatMap(({ lines }) => lines.map(({ line }) => line?.id)));
  const isIn = (lineId: unknown) => choice.pieces === undefined || known.has(lineId);
  if (choice.moments !== false) await followMoments(trx, deed, source, isIn);
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
 * written or taken away stays so, unless it is asked for by name. The caller has checked the right, and gives the deed it
 * is part of.
 * @throws AppError not-found (no such pattern or reading)
 */
export async function takeDraft(
  trx: Knex.Transaction,
  deed: Deed,
  readingId: string,
  draft: Draft,
  choice: DraftChoice = {},
): Promise<Taken> {
  const pattern = await lockPattern(trx, deed.patternId);
  const source = await findSource(trx, readingId);
  if (!pattern || !source) throw new AppError('not-found');
  const lines = await listKnownLines(trx, pattern.id);
  const isEmpty = lines.every(({ deletedAt }) => deletedAt !== null);
  if (isEmpty) await takeHead(trx, deed, draft);
  const many = draft.pieces.reduce((sum, piece) => sum + piece.lines.length, 0);
  const shortIds = newShortIds(await takenShortIds(trx, pattern.id), many);
  const taking: Taking = { trx, deed, source, shortIds };
  const pieces = await listRows(trx, 'piece', pattern.id);
  const terms = isEmpty ? draft.terms : pattern.terms;
  const plan = planDraft({ draft, recordingId: source.recordingId, terms, pieces, lines });
  const taken = await takePlan(taking, plan, choice);
  const isChosen = choice.pieces !== undefined || choice.lines !== undefined;
  if (choice.suggestions ?? !isChosen) await takeSuggestions(taking, draft);
  if (pattern.state === 'reading') await setPatternState(trx, deed, 'drafting');
  return taken;
}
