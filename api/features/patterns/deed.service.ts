import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { Entity } from '#contract/changes';
import type { Asking } from '../../http/asking.ts';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import { deedBelongsElsewhere, insertChanges, type NewChange } from './changes.store.ts';
import type { Fields, Row } from './entities.ts';
import { canSeePattern } from './patterns.policy.ts';
import { lockPattern, type PatternRow } from './patterns.store.ts';
import { updateRow } from './rows.store.ts';

export type { Asking } from '../../http/asking.ts';

/** One step of somebody's: everything written under it is undone together. */
export interface Deed {
  readonly id: string;
  readonly patternId: string;
  /** Null: made by a reading, which nobody undoes. */
  readonly personId: string | null;
  readonly at: Date;
  /** The deed that this one takes back. */
  readonly undoes?: string;
}

type Right = (who: Person, pattern: PatternRow) => boolean;

/**
 * Opens a pattern for writing: until the transaction ends all other writers wait.
 * @throws AppError not-found (also where it may not be seen) | forbidden | gone (it lies in the bin) | conflict (the
 *   deed id is another person's)
 */
export async function openPattern(
  trx: Knex.Transaction,
  asking: Asking,
  patternId: string,
  may: Right,
  { evenBinned = false } = {},
): Promise<{ pattern: PatternRow; deed: Deed }> {
  const pattern = await lockPattern(trx, patternId);
  if (!pattern || !canSeePattern(asking.who, pattern)) throw new AppError('not-found');
  if (!may(asking.who, pattern)) throw new AppError('forbidden');
  if (pattern.deletedAt && !evenBinned) {
    throw new AppError('gone', 'This pattern lies in the bin. Restore it, then write on.');
  }
  const deed: Deed = {
    id: asking.deedId ?? randomUUID(),
    patternId,
    personId: asking.who.id,
    at: asking.now,
  };
  if (asking.deedId !== undefined && (await deedBelongsElsewhere(trx, deed))) {
    throw new AppError('conflict', 'This Deed-Id is in use for something else.');
  }
  return { pattern, deed };
}

/** Writes down what was done. The one way into the change log: every write to a pattern ends here. */
export async function record(trx: Knex.Transaction, deed: Deed, changes: readonly NewChange[]): Promise<void> {
  if (changes.length > 0) await insertChanges(trx, deed, changes);
}

const differs = (a: unknown, b: unknown): boolean => JSON.stringify(sorted(a)) !== JSON.stringify(sorted(b));

function sorted(value: unknown): unknown {
  if (value instanceof Date) return value.toISOString();
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value ?? null;
  return Object.fromEntries(
    Object.entries(value as Fields)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([key, inner]) => [key, sorted(inner)]),
  );
}

/** Whether two values of a field say the same, whatever the order of their keys. */
export const isSame = (a: unknown, b: unknown): boolean => !differs(a, b);

/** The fields among `wanted` that are not so already. */
export function changedFields(row: Fields, wanted: Fields): Fields {
  return Object.fromEntries(Object.entries(wanted).filter(([field, value]) => differs(row[field], value)));
}

/**
 * Saves fields of a row and logs them. What is so already is left out; where nothing is left nothing is written.
 * @throws AppError stale-version when somebody saved in between
 */
export async function writeFields(
  trx: Knex.Transaction,
  deed: Deed,
  entity: Exclude<Entity, 'recording'>,
  row: Row,
  wanted: Fields,
): Promise<Row> {
  const after = changedFields(row, wanted);
  const fields = Object.keys(after);
  if (fields.length === 0) return row;
  const saved = await updateRow(trx, entity, { id: row.id, version: row.version }, after);
  if (!saved) throw new AppError('stale-version');
  const before = Object.fromEntries(fields.map((field) => [field, row[field] ?? null]));
  await record(trx, deed, [{ entity, entityId: row.id, before, after }]);
  return saved;
}
