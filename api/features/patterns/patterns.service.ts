import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { Details } from '#contract/pattern-details';
import type { PatternCreate, PatternEdit, PatternHead } from '#contract/patterns';
import { isDuplicate } from '../../platform/database.ts';
import { AppError } from '../../http/problem.ts';
import { openPattern, record, writeFields, type Asking, type Deed } from './deed.service.ts';
import type { Fields, Row } from './entities.ts';
import { newCode } from './ids.ts';
import { canEditPattern, canManagePatterns, canSeePattern } from './patterns.policy.ts';
import { findPattern, findStudio, insertPattern, type PatternRow } from './patterns.store.ts';
import { staleVersion } from './rows.service.ts';
import { findRow } from './rows.store.ts';

/** The pattern's own row as the contract has it. */
export function toHead(row: PatternRow): PatternHead {
  return {
    ...row,
    details: Details.parse(row.details),
    touchedAt: row.touchedAt.toISOString(),
    archivedAt: row.archivedAt?.toISOString() ?? null,
    binnedAt: row.deletedAt?.toISOString() ?? null,
  };
}

const TRIES = 5;

/** Inserts a pattern under a code nobody has; one drawn twice is drawn again. */
export async function insertWithCode(
  trx: Knex.Transaction,
  row: Omit<Parameters<typeof insertPattern>[1], 'code'>,
  by: { readonly personId: string; readonly at: Date },
): Promise<void> {
  for (let tries = 1; ; tries += 1) {
    try {
      await trx.transaction((inner) => insertPattern(inner, { ...row, code: newCode() }, by));
      return;
    } catch (err) {
      if (tries === TRIES || !isDuplicate(err) || (await findPattern(trx, row.id))) throw err;
    }
  }
}

/**
 * Makes an empty pattern. With an `id` of the caller's, sending it twice makes one.
 * @throws AppError not-found (no such studio, or not one of the caller's) | forbidden | conflict
 */
export async function createPattern(db: Knex, asking: Asking, asked: PatternCreate): Promise<PatternHead> {
  const { who, now } = asking;
  const studio = await findStudio(db, asked.studioId);
  if (!studio || !canSeePattern(who, asked)) throw new AppError('not-found');
  if (!canManagePatterns(who, asked)) throw new AppError('forbidden');
  const id = asked.id ?? randomUUID();
  return db.transaction(async (trx) => {
    const present = asked.id === undefined ? undefined : await findPattern(trx, id);
    if (present && present.studioId !== asked.studioId) throw new AppError('conflict');
    if (!present) {
      const { studioId, title, terms = studio.defaultTerms, sizes = [] } = asked;
      await insertWithCode(trx, { id, studioId, title, terms, sizes, details: {} }, { personId: who.id, at: now });
      const deed: Deed = { id: asking.deedId ?? randomUUID(), patternId: id, personId: who.id, at: now };
      await record(trx, deed, [{ entity: 'lifecycle', entityId: id, before: null, after: { title, terms, sizes } }]);
    }
    return toHead((await findPattern(trx, id))!);
  });
}

/** The locked row as the change log sees it, if the caller read this version. */
async function openHead(
  trx: Knex.Transaction,
  entity: 'pattern' | 'lifecycle',
  pattern: PatternRow,
  version: number,
): Promise<Row> {
  const row = (await findRow(trx, entity, pattern.id))!;
  if (pattern.version !== version) throw await staleVersion(trx, row, toHead(pattern));
  return row;
}

/**
 * Saves what a pattern says of itself; of `details` only the parts given.
 * @throws AppError not-found | forbidden | gone | stale-version
 */
export async function editPattern(
  db: Knex,
  asking: Asking,
  at: { readonly id: string; readonly version: number },
  asked: PatternEdit,
): Promise<{ head: PatternHead; deedId: string }> {
  const may = asked.visibility === undefined ? canEditPattern : canManagePatterns;
  return db.transaction(async (trx) => {
    const { pattern, deed } = await openPattern(trx, asking, at.id, may);
    const row = await openHead(trx, 'pattern', pattern, at.version);
    const details = asked.details && { details: { ...pattern.details, ...asked.details } };
    await writeFields(trx, deed, 'pattern', row, { ...asked, ...details });
    return { head: toHead((await findPattern(trx, at.id))!), deedId: deed.id };
  });
}

/** What can be done with a pattern as a whole. */
export type Step = 'bin' | 'restore' | 'archive' | 'unarchive' | 'drafting' | 'in-proof';

const STEPS: Readonly<Record<Step, (now: Date) => Fields>> = {
  bin: (now) => ({ deletedAt: now }),
  restore: () => ({ deletedAt: null }),
  archive: (now) => ({ archivedAt: now }),
  unarchive: () => ({ archivedAt: null }),
  drafting: () => ({ state: 'drafting' }),
  'in-proof': () => ({ state: 'in-proof' }),
};

function checkStep(pattern: PatternRow, step: Step): void {
  if (step !== 'drafting' && step !== 'in-proof') return;
  if (pattern.state === 'reading') throw new AppError('conflict', 'Its recording is still being read.');
}

/**
 * Bins, restores, archives a pattern or sends it to proof and back. Done already is done: nothing is written then.
 * @throws AppError not-found | forbidden | gone (binned, where that is in the way) | conflict | stale-version
 */
export async function stepPattern(
  db: Knex,
  asking: Asking,
  at: { readonly id: string; readonly version: number },
  step: Step,
): Promise<PatternHead> {
  const may = step === 'drafting' || step === 'in-proof' ? canEditPattern : canManagePatterns;
  return db.transaction(async (trx) => {
    const evenBinned = step === 'bin' || step === 'restore';
    const { pattern, deed } = await openPattern(trx, asking, at.id, may, { evenBinned });
    const row = await openHead(trx, 'lifecycle', pattern, at.version);
    checkStep(pattern, step);
    await writeFields(trx, deed, 'lifecycle', row, STEPS[step](asking.now));
    return toHead((await findPattern(trx, at.id))!);
  });
}

/**
 * Moves a pattern to a state for a job or another desk, under a deed of theirs; the caller has checked the right.
 * @throws AppError not-found
 */
export async function setPatternState(trx: Knex.Transaction, deed: Deed, state: PatternRow['state']): Promise<void> {
  const row = await findRow(trx, 'lifecycle', deed.patternId);
  if (!row) throw new AppError('not-found');
  await writeFields(trx, deed, 'lifecycle', row, { state });
}
