import { spawn } from 'node:child_process';
import { cp, mkdtemp, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { openLog } from '../../api/platform/log.ts';
import { migrate, MIGRATIONS_DIR, pendingMigrations, refuseNewer } from '../../api/platform/migrations.ts';
import { PROJECT_ROOT } from '../../api/platform/project-root.ts';
import { bareDatabase, type ScratchDatabase } from '../support/database.ts';

const log = openLog({ logLevel: 'silent' });

describe('running the migrations', () => {
  let scratch: ScratchDatabase;
  let dir: string;

  beforeEach(async () => {
    scratch = await bareDatabase();
    // Inside the project, so that what a migration imports is found.
    dir = await mkdtemp(path.join(PROJECT_ROOT, '.test', 'migrations-'));
    await cp(MIGRATIONS_DIR, dir, { recursive: true });
  });
  afterEach(async () => {
    await scratch.drop();
    await rm(dir, { recursive: true });
  });

  const run = () => migrate({ url: scratch.url, pool: 4 }, log, dir);
  const addMigration = (name: string, body: string) => writeFile(path.join(dir, `${name}.ts`), body);
  const recorded = async () =>
    (await scratch.db<{ name: string }>('knex_migrations').orderBy('id').select('name')).map(({ name }) => name);

  /** Runs the migrations in a process of its own, as every start does. */
  function start() {
    const child = spawn(process.execPath, ['--import', 'tsx', 'migrations/run.ts', dir], {
      cwd: PROJECT_ROOT,
      env: { ...process.env, NODE_ENV: 'test', DATABASE_URL: scratch.url, ROUNDELAY_LOG_LEVEL: 'error' },
      stdio: ['ignore', 'inherit', 'inherit'],
    });
    const ended = new Promise<number | null>((resolve) => child.once('exit', resolve));
    return { child, ended };
  }

  const isAsleep = async () => {
    const found = await scratch.db.raw<{ rows: unknown[] }>(
      `select from pg_stat_activity where datname = current_database() and pid <> pg_backend_pid()
          and state = 'active' and query ~ 'pg_sleep|create index concurrently'`,
    );
    return found.rows.length > 0;
  };

  test('five at once all succeed, and each migration is done once', async () => {
    const codes = await Promise.all(Array.from({ length: 5 }, () => start().ended));
    expect(codes).toEqual([0, 0, 0, 0, 0]);
    const names = await recorded();
    expect(names).toEqual([...new Set(names)]);
    expect(await pendingMigrations(scratch.db, dir)).toEqual([]);
  });

  test('one that was killed in the middle is done by the next, without a hand', async () => {
    await run();
    const name = '29990101000000_sleep';
    const body = (seconds: number) => `
      export async function up(knex) {
        await knex.raw('create table sleepers (id integer primary key)');
        await knex.raw('select pg_sleep(${seconds})');
      }
      export async function down(knex) { await knex.raw('drop table sleepers'); }`;
    await addMigration(name, body(60));
    const killed = start();
    await expect.poll(isAsleep, { timeout: 20_000 }).toBe(true);
    killed.child.kill('SIGKILL');
    await killed.ended;
    await addMigration(name, body(0));
    expect(await start().ended).toBe(0);
    expect((await recorded()).at(-1)).toBe(name);
    expect(await scratch.db('sleepers')).toEqual([]);
  });

  test('an index whose building was killed is built anew', async () => {
    await run();
    const name = '29990101000001_index_concurrently';
    await addMigration(
      name,
      `export const config = { transaction: false };
       export async function up(knex) { await knex.raw('create index concurrently if not exists slow on rate_limits (hits)'); }
       export async function down(knex) { await knex.raw('drop index concurrently if exists slow'); }`,
    );
    // Somebody who writes and does not end holds the building up.
    const holder = await scratch.db.transaction();
    await holder('rate_limits').insert({ bucket: 'held', hits: 1, resets_at: new Date() });
    const killed = start();
    await expect.poll(isAsleep, { timeout: 20_000 }).toBe(true);
    killed.child.kill('SIGKILL');
    await killed.ended;
    await scratch.db.raw(
      `select pg_terminate_backend(pid) from pg_stat_activity
        where datname = current_database() and query ~ '^create index concurrently'`,
    );
    await holder.rollback();
    expect(await start().ended).toBe(0);
    const index = await scratch.db.raw<{ rows: { valid: boolean }[] }>(
      `select indisvalid as valid from pg_index where indexrelid = 'slow'::regclass`,
    );
    expect(index.rows).toEqual([{ valid: true }]);
    expect((await recorded()).at(-1)).toBe(name);
  });

  test('a database that a later version has changed is refused, with both numbers', async () => {
    await run();
    const last = (await recorded()).at(-1) ?? '';
    await scratch
      .db('knex_migrations')
      .insert({ name: '29991231000000_from_the_future', batch: 9, migration_time: new Date() });
    const said = new RegExp(`29991231000000_from_the_future.*${last}`);
    await expect(refuseNewer(scratch.db, dir)).rejects.toThrow(said);
    await expect(run()).rejects.toThrow(said);
  });

  test('a migration that is missing in the database is told as pending', async () => {
    expect((await pendingMigrations(scratch.db, dir)).length).toBeGreaterThan(4);
    await run();
    await addMigration('29990101000000_later', 'export async function up() {}\nexport async function down() {}');
    expect(await pendingMigrations(scratch.db, dir)).toEqual(['29990101000000_later']);
  });

  test('the job queue has its tables too', async () => {
    await run();
    const found = await scratch.db.raw<{ rows: { name: string }[] }>(
      `select proname as name from pg_proc where pronamespace = 'graphile_worker'::regnamespace and proname = 'add_job'`,
    );
    expect(found.rows.length).toBeGreaterThan(0);
  });
});
