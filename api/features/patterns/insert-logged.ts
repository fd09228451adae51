import type { Knex } from 'knex';
import { record, type Deed } from './deed.service.ts';
import type { Fields, RowEntity } from './entities.ts';
import { insertRows } from './rows.store.ts';

/** Inserts new rows and writes them down as made under the deed, so that undo takes all of them back. */
export async function insertLogged(
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
