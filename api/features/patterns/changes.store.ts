import type { Knex } from 'knex';
import type { Entity } from '#contract/changes';
import { tell, type Notice } from '../../platform/notices.ts';
import type { Deed } from './deed.service.ts';
import type { Fields } from './entities.ts';

export interface NewChange {
  readonly entity: Entity;
  readonly entityId: string;
  /** Only the fields that change; null before a row was made. */
  readonly before: Fields | null;
  readonly after: Fields | null;
}

export interface ChangeRow extends NewChange {
  readonly id: number;
  readonly deedId: string;
  readonly at: Date;
  readonly personId: string | null;
  readonly personName: string | null;
  readonly undoesDeedId: string | null;
}

/** A save, told to every bench that is open on the pattern; `change` is its number in the log. */
export interface SavedNotice extends Notice {
  readonly kind: 'saved';
  readonly change: number;
}

/** Logs changes, marks the pattern as touched, and tells whoever listens once the transaction is through. */
export async function insertChanges(trx: Knex.Transaction, deed: Deed, changes: readonly NewChange[]): Promise<void> {
  const made = await trx('changes')
    .insert(
      changes.map((change) => ({
        pattern_id: deed.patternId,
        deed_id: deed.id,
        person_id: deed.personId,
        at: deed.at,
        entity: change.entity,
        entity_id: change.entityId,
        before: change.before,
        after: change.after,
        undoes_deed_id: deed.undoes ?? null,
      })),
    )
    .returning<{ id: number }[]>('id');
  await trx('patterns').where({ id: deed.patternId }).update({ touched_at: deed.at });
  const change = Math.max(...made.map(({ id }) => id));
  await tell(trx, { about: deed.patternId, kind: 'saved', change } satisfies SavedNotice);
}

/** Whether the deed's id was used already by somebody else or in another pattern. */
export async function deedBelongsElsewhere(db: Knex, deed: Deed): Promise<boolean> {
  const other = await db('changes')
    .where({ deed_id: deed.id })
    .whereRaw('(pattern_id <> ? or person_id is distinct from ? or undoes_deed_id is not null)', [
      deed.patternId,
      deed.personId,
    ])
    .first<{ id: number } | undefined>('id');
  return other !== undefined;
}

const READ = {
  id: 'c.id',
  deedId: 'c.deed_id',
  at: 'c.at',
  personId: 'c.person_id',
  personName: 'p.name',
  entity: 'c.entity',
  entityId: 'c.entity_id',
  before: 'c.before',
  after: 'c.after',
  undoesDeedId: 'c.undoes_deed_id',
} as const;

const log = (db: Knex) => db('changes as c').leftJoin('people as p', 'p.id', 'c.person_id');

/** Changes of a pattern, newest first, or only those of one of its rows. */
export async function listChanges(
  db: Knex,
  patternId: string,
  page: { readonly entityId?: string | undefined; readonly before?: number | undefined; readonly limit: number },
): Promise<ChangeRow[]> {
  const rows = log(db).where('c.pattern_id', patternId).orderBy('c.id', 'desc').limit(page.limit);
  if (page.entityId !== undefined) void rows.where('c.entity_id', page.entityId);
  if (page.before !== undefined) void rows.where('c.id', '<', page.before);
  return rows.select<ChangeRow[]>(READ);
}

/** What a deed did, in the order it was done. */
export async function listDeed(db: Knex, patternId: string, deedId: string): Promise<ChangeRow[]> {
  return log(db).where({ 'c.pattern_id': patternId, 'c.deed_id': deedId }).orderBy('c.id').select<ChangeRow[]>(READ);
}

/** The last change to a row, by anybody. */
export async function lastChangeTo(db: Knex, patternId: string, entityId: string): Promise<ChangeRow | undefined> {
  const [row] = await listChanges(db, patternId, { entityId, limit: 1 });
  return row;
}

/** The last to put a line into a piece since a change, other than its maker; undefined where there is none. */
export async function lastIntoPiece(db: Knex, since: ChangeRow, patternId: string): Promise<ChangeRow | undefined> {
  return log(db)
    .where({ 'c.pattern_id': patternId, 'c.entity': 'line' })
    .where('c.id', '>', since.id)
    .whereRaw("c.after ->> 'pieceId' = ? and c.person_id is distinct from ?", [since.entityId, since.personId])
    .orderBy('c.id', 'desc')
    .first<ChangeRow | undefined>(READ);
}

/** The newest change's number in a pattern; 0 where there is none. */
export async function lastChangeIn(db: Knex, patternId: string): Promise<number> {
  const row = await db('changes').where({ pattern_id: patternId }).max<{ max: number | null }>('id').first();
  return row?.max ?? 0;
}

export interface DeedRow {
  readonly deedId: string;
  readonly undoesDeedId: string | null;
}

/** How far back undo reaches. */
const DEEDS = 500;

/** A person's own deeds in a pattern that undo may take back, oldest first. Its life (bin, archive …) is not among them. */
export async function listOwnDeeds(db: Knex, patternId: string, personId: string): Promise<DeedRow[]> {
  const rows = await db('changes')
    .where({ pattern_id: patternId, person_id: personId })
    .groupBy('deed_id', 'undoes_deed_id')
    .havingRaw("not bool_or(entity in ('lifecycle', 'recording'))")
    .orderByRaw('max(id) desc')
    .limit(DEEDS)
    .select<DeedRow[]>('deed_id as deedId', 'undoes_deed_id as undoesDeedId');
  return rows.reverse();
}
