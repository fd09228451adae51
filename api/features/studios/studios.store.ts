import type { Knex } from 'knex';
import type { Role } from '#contract/accounts';
import type { StudioEdit } from '#contract/studios';

export interface StudioRow {
  id: string;
  name: string;
  slug: string;
  default_terms: 'US' | 'UK';
  paper: 'A4' | 'Letter';
  head: string;
  foot: string;
  quota_bytes: string; // bigint
  created_at: Date;
  version: number;
}

const COLUMNS = [
  'id',
  'name',
  'slug',
  'default_terms',
  'paper',
  'head',
  'foot',
  'quota_bytes',
  'created_at',
  'version',
] as const;

/** @returns the new studio, or undefined when the slug is taken (nothing is written then) */
export async function insertStudio(
  trx: Knex,
  studio: { name: string; slug: string; quotaBytes: number },
): Promise<StudioRow | undefined> {
  const [row] = await trx<StudioRow>('studios')
    .insert({ name: studio.name, slug: studio.slug, quota_bytes: String(studio.quotaBytes) })
    .onConflict('slug')
    .ignore()
    .returning([...COLUMNS]);
  return row;
}

export async function findStudio(db: Knex, id: string): Promise<StudioRow | undefined> {
  return db<StudioRow>('studios')
    .where({ id })
    .first(...COLUMNS);
}

/** The studios of a person, the first joined first. */
export async function listStudiosOf(db: Knex, personId: string): Promise<(StudioRow & { role: Role })[]> {
  return db('members')
    .join('studios', 'studios.id', 'members.studio_id')
    .where('members.person_id', personId)
    .whereNull('members.left_at')
    .orderBy('members.joined_at')
    .select<(StudioRow & { role: Role })[]>(...COLUMNS.map((column) => `studios.${column}`), 'members.role');
}

/** @returns the saved row, or undefined when `version` is no longer the stored one */
export async function replaceStudio(
  db: Knex,
  id: string,
  edit: StudioEdit,
  version: number,
): Promise<StudioRow | undefined> {
  const columns = Object.entries({
    name: edit.name,
    default_terms: edit.defaultTerms,
    paper: edit.paper,
    head: edit.head,
    foot: edit.foot,
  }).filter(([, value]) => value !== undefined);
  const [row] = await db<StudioRow>('studios')
    .where({ id, version })
    .update({ ...Object.fromEntries(columns), version: version + 1 })
    .returning([...COLUMNS]);
  return row;
}

/** What a studio's objects take up, those still arriving too; bytes. */
export async function usedBytes(db: Knex, studioId: string): Promise<number> {
  const row = await db('objects')
    .where({ studio_id: studioId })
    .whereNot({ state: 'doomed' })
    .sum<{ sum: string | null }[]>('bytes')
    .first();
  return Number(row?.sum ?? 0);
}
