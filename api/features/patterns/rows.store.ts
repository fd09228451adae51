import type { Knex } from 'knex';
import { TABLES, type EntityTable, type Fields, type Row, type RowEntity } from './entities.ts';

type Written = Exclude<keyof typeof TABLES, never>;
type Raw = Record<string, unknown>;

const patternColumn = (spec: EntityTable) => (spec.table === 'patterns' ? 'id' : 'pattern_id');

/** A row of the table in the names of the contract. */
export function toRow(spec: EntityTable, raw: Raw): Row {
  const fields = Object.fromEntries(
    Object.entries(spec.columns).map(([field, column]) => [field, raw[column] ?? null]),
  );
  const { id, version } = raw as { id: string; version: number };
  const deletedAt = (raw.deleted_at ?? null) as Date | null;
  return { ...fields, id, version, deletedAt, patternId: raw[patternColumn(spec)] as string };
}

function toColumns(spec: EntityTable, fields: Fields): Raw {
  return Object.fromEntries(
    Object.entries(fields).flatMap(([field, value]) => {
      const column = spec.columns[field];
      return column === undefined ? [] : [[column, value]];
    }),
  );
}

/** @returns the row, deleted or not, or undefined */
export async function findRow(db: Knex, entity: Written, id: string): Promise<Row | undefined> {
  const spec = TABLES[entity];
  const raw = await db<Raw>(spec.table).where({ id }).first<Raw | undefined>();
  return raw && toRow(spec, raw);
}

/** Every row of a pattern that is not deleted, in order where there is one. */
export async function listRows(db: Knex, entity: RowEntity, patternId: string): Promise<Row[]> {
  const spec = TABLES[entity];
  const rows = db<Raw>(spec.table).where({ pattern_id: patternId }).whereNull('deleted_at');
  const ordered = rows.orderBy([spec.listedBy ?? 'id', 'id']);
  return (await ordered.select<Raw[]>('*')).map((raw) => toRow(spec, raw));
}

/** @param rows with every field that has no default in the table */
export async function insertRows(
  db: Knex,
  entity: RowEntity,
  patternId: string,
  rows: readonly Fields[],
): Promise<Row[]> {
  if (rows.length === 0) return [];
  const spec = TABLES[entity];
  const raw = await db<Raw>(spec.table)
    .insert(rows.map((row) => ({ id: row.id, pattern_id: patternId, ...toColumns(spec, row) })))
    .returning<Raw[]>('*');
  return raw.map((one) => toRow(spec, one));
}

/** @returns the saved row, or undefined when `version` is no longer the stored one (nothing is written then) */
export async function updateRow(
  db: Knex,
  entity: Written,
  at: { readonly id: string; readonly version: number },
  fields: Fields,
): Promise<Row | undefined> {
  const spec = TABLES[entity];
  const [raw] = await db<Raw>(spec.table)
    .where(at)
    .update({ ...toColumns(spec, fields), version: at.version + 1 })
    .returning<Raw[]>('*');
  return raw && toRow(spec, raw);
}

/** Every short id a pattern ever gave to a line. */
export async function takenShortIds(db: Knex, patternId: string): Promise<Set<string>> {
  return new Set(await db('lines').where({ pattern_id: patternId }).pluck<string[]>('short_id'));
}

/** Notes that a person wrote these fields of a line, so that a later reading leaves them alone. */
export async function touchFields(db: Knex, lineId: string, fields: readonly string[], at: Date): Promise<void> {
  if (fields.length === 0) return;
  await db('line_touched')
    .insert(fields.map((field) => ({ line_id: lineId, field, at })))
    .onConflict(['line_id', 'field'])
    .merge(['at']);
}
