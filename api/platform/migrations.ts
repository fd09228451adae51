import { readdir } from 'node:fs/promises';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Knex } from 'knex';
import type { Env } from '../env.ts';
import { openDatabase } from './database.ts';
import { migrateJobs } from './jobs.ts';
import type { Logger } from './log.ts';
import { PROJECT_ROOT } from './project-root.ts';

export const MIGRATIONS_DIR = path.join(PROJECT_ROOT, 'migrations');
/** Any number that nothing else locks: whoever holds it migrates, the others wait. */
const LOCK = 7_351_012;
const FILE = /^(\d{14}_[a-z0-9_]+)\.(?:ts|js)$/;

/** The database was made by a later version of the product than this one. */
export class NewerDatabase extends Error {
  override name = 'NewerDatabase';
}

/** Names without the ending, in order: the same whether the files are sources or a build of them. */
async function migrationNames(dir: string): Promise<string[]> {
  return (await readdir(dir)).flatMap((file) => FILE.exec(file)?.[1] ?? []).sort();
}

function sourceIn(dir: string): Knex.MigrationSource<string> {
  return {
    getMigrations: () => migrationNames(dir),
    getMigrationName: (name) => name,
    getMigration: async (name) => {
      const file = (await readdir(dir)).find((each) => FILE.exec(each)?.[1] === name);
      return (await import(pathToFileURL(path.join(dir, file ?? name)).href)) as Knex.Migration;
    },
  };
}

/** For knex's own commands and for tests that go down again. */
export const migrationConfig = (dir = MIGRATIONS_DIR): Knex.MigratorConfig => ({ migrationSource: sourceIn(dir) });

async function appliedNames(db: Knex): Promise<string[]> {
  const there = await db.raw<{ rows: { there: boolean }[] }>(
    `select to_regclass('knex_migrations') is not null as there`,
  );
  if (!there.rows[0]?.there) return [];
  return (await db<{ name: string }>('knex_migrations').orderBy('id').select('name')).map(({ name }) => name);
}

/** Migrations this version has and the database has not. */
export async function pendingMigrations(db: Knex, dir = MIGRATIONS_DIR): Promise<string[]> {
  const applied = new Set(await appliedNames(db));
  return (await migrationNames(dir)).filter((name) => !applied.has(name));
}

/**
 * Refuses to work on a database that a later version has changed already.
 * @throws NewerDatabase with the last migration of both
 */
export async function refuseNewer(db: Knex, dir = MIGRATIONS_DIR): Promise<void> {
  const known = await migrationNames(dir);
  const newer = (await appliedNames(db)).filter((name) => !known.includes(name));
  if (newer.length > 0) {
    throw new NewerDatabase(
      `the database is at ${newer.at(-1) ?? ''}, this version of Roundelay knows only up to ${known.at(-1) ?? 'nothing'}`,
    );
  }
}

/** An index whose building was cut short is there but unused; it goes, so that the migration can build it again. */
async function dropHalfBuiltIndexes(db: Knex): Promise<void> {
  const broken = await db.raw<{ rows: { name: string }[] }>(
    `select i.indexrelid::regclass::text as name from pg_index i
       join pg_class c on c.oid = i.indexrelid join pg_namespace n on n.oid = c.relnamespace
      where not i.indisvalid and n.nspname = 'public'`,
  );
  for (const { name } of broken.rows) await db.raw(`drop index if exists ${name}`);
}

/**
 * Brings the database up to date, the job queue's own tables too. Any number of processes may ask at once: one does
 * it, the others wait and find nothing left to do. A run that was killed leaves nothing that the next has to be told.
 * @throws NewerDatabase
 */
export async function migrate(
  settings: Env['database'],
  log: Logger,
  dir = MIGRATIONS_DIR,
): Promise<readonly string[]> {
  const db = openDatabase({ url: settings.url, pool: 4 }, { statementTimeoutMs: 0, noticeDeathMs: 1_000 });
  try {
    // The lock belongs to this one connection: when the process dies, the server lets it go.
    return await db.transaction(async (holder) => {
      // Without bindings: a bound statement would keep its snapshot, and an index built concurrently waits for those.
      await holder.raw(`select pg_advisory_xact_lock(${LOCK})`);
      await refuseNewer(db, dir);
      await dropHalfBuiltIndexes(db);
      await db.migrate.forceFreeMigrationsLock(migrationConfig(dir));
      const [, done] = (await db.migrate.latest(migrationConfig(dir))) as [number, string[]];
      await migrateJobs(settings.url, log);
      return done;
    });
  } finally {
    await db.destroy();
  }
}
