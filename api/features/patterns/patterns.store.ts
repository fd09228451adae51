import type { Knex } from 'knex';
import type { Details } from '#contract/pattern-details';
import type { PatternState } from '#contract/patterns';

export interface PatternRow {
  readonly id: string;
  readonly studioId: string;
  readonly code: string;
  readonly title: string;
  readonly state: PatternState;
  readonly visibility: 'private' | 'unlisted' | 'listed';
  readonly terms: 'US' | 'UK';
  readonly sizes: string[];
  readonly details: Partial<Details>;
  readonly touchedAt: Date;
  readonly archivedAt: Date | null;
  readonly deletedAt: Date | null;
  readonly version: number;
}

const COLUMNS = {
  id: 'id',
  studioId: 'studio_id',
  code: 'code',
  title: 'title',
  state: 'state',
  visibility: 'visibility',
  terms: 'terms',
  sizes: 'sizes',
  details: 'details',
  touchedAt: 'touched_at',
  archivedAt: 'archived_at',
  deletedAt: 'deleted_at',
  version: 'version',
} as const;

export async function findPattern(db: Knex, id: string): Promise<PatternRow | undefined> {
  return db('patterns').where({ id }).first<PatternRow | undefined>(COLUMNS);
}

/** As findPattern; until the transaction ends nobody else writes to the pattern or to anything in it. */
export async function lockPattern(trx: Knex.Transaction, id: string): Promise<PatternRow | undefined> {
  return trx('patterns').where({ id }).forUpdate().first<PatternRow | undefined>(COLUMNS);
}

export async function insertPattern(
  db: Knex,
  row: Pick<PatternRow, 'id' | 'studioId' | 'code' | 'title' | 'terms' | 'sizes' | 'details'>,
  by: { readonly personId: string; readonly at: Date },
): Promise<void> {
  await db('patterns').insert({
    id: row.id,
    studio_id: row.studioId,
    code: row.code,
    title: row.title,
    terms: row.terms,
    sizes: row.sizes,
    details: row.details,
    created_by: by.personId,
    created_at: by.at,
    touched_at: by.at,
  });
}

/** Everything a studio has on one part of its shelf, last touched first. */
export async function listPatterns(
  db: Knex,
  studioId: string,
  part: 'shelf' | 'archive' | 'bin',
): Promise<PatternRow[]> {
  const rows = db('patterns').where({ studio_id: studioId }).orderByRaw('touched_at desc, id');
  if (part === 'bin') void rows.whereNotNull('deleted_at');
  else void rows.whereNull('deleted_at')[part === 'archive' ? 'whereNotNull' : 'whereNull']('archived_at');
  return rows.select<PatternRow[]>(COLUMNS);
}

/** How many patterns lie in the archive and in the bin. */
export async function countAside(db: Knex, studioId: string): Promise<{ archived: number; binned: number }> {
  const rows = await db('patterns')
    .where({ studio_id: studioId })
    .select<{ archived: number; binned: number }[]>(
      db.raw('count(*) filter (where archived_at is not null and deleted_at is null) as archived'),
      db.raw('count(*) filter (where deleted_at is not null) as binned'),
    );
  return rows[0] ?? { archived: 0, binned: 0 };
}

export async function findStudio(
  db: Knex,
  id: string,
): Promise<{ id: string; name: string; defaultTerms: 'US' | 'UK' } | undefined> {
  return db('studios').where({ id }).first<{ id: string; name: string; defaultTerms: 'US' | 'UK' } | undefined>({
    id: 'id',
    name: 'name',
    defaultTerms: 'default_terms',
  });
}
