import type { Knex } from 'knex';
import type { Change, ChangePage, ChangesQuery } from '#contract/changes';
import type { z } from 'zod';
import { listChanges, type ChangeRow } from './changes.store.ts';
import { findSeenPattern } from './document.service.ts';
import type { Fields } from './entities.ts';
import type { Person } from '../../http/session.ts';

const toChange = (row: ChangeRow, state: Fields | null): Change => ({
  id: row.id,
  deedId: row.deedId,
  at: row.at.toISOString(),
  person: row.personId === null ? null : { id: row.personId, name: row.personName ?? '' },
  entity: row.entity,
  entityId: row.entityId,
  before: row.before,
  after: row.after,
  row: state,
  undoesDeedId: row.undoesDeedId,
});

const ALL = 10_000;

/** One row from the start: each step with every field as it left it. Newest first. */
async function rowHistory(db: Knex, patternId: string, entityId: string): Promise<Change[]> {
  const rows = (await listChanges(db, patternId, { entityId, limit: ALL })).reverse();
  let state: Fields = {};
  return rows
    .map((row) => {
      state = { ...state, ...row.after };
      return toChange(row, state);
    })
    .reverse();
}

/**
 * What was done to a pattern, newest first, by whom and when.
 * @throws AppError not-found
 */
export async function readHistory(
  db: Knex,
  who: Person,
  patternId: string,
  query: z.output<typeof ChangesQuery>,
): Promise<ChangePage> {
  await findSeenPattern(db, who, patternId);
  const { entityId, before, limit } = query;
  if (entityId !== undefined) {
    const older = (await rowHistory(db, patternId, entityId)).filter(({ id }) => before === undefined || id < before);
    return { changes: older.slice(0, limit), more: older.length > limit };
  }
  const rows = await listChanges(db, patternId, { before, limit: limit + 1 });
  return { changes: rows.slice(0, limit).map((row) => toChange(row, null)), more: rows.length > limit };
}
