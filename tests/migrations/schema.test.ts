import { readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { afterEach, describe, expect, inject, test } from 'vitest';
import { dumpSchema } from '../../api/local/postgres.mjs';
import { openLog } from '../../api/platform/log.ts';
import { migrate, migrationConfig, MIGRATIONS_DIR } from '../../api/platform/migrations.ts';
import { bareDatabase, cloneDatabase, type ScratchDatabase } from '../support/database.ts';

const SNAPSHOT = path.join(MIGRATIONS_DIR, 'schema.sql');

/** The dump without what changes from one PostgreSQL, or one dump, to the next. */
function tidy(dump: string): string {
  const lines = dump.split('\n').filter((line) => !/^(?:--|SET |SELECT pg_catalog|\\(?:un)?restrict)/.test(line));
  return `${lines
    .join('\n')
    .replace(/\n{3,}/g, '\n\n')
    .trim()}\n`;
}

describe('the schema', () => {
  let scratch: ScratchDatabase;
  afterEach(() => scratch.drop());
  const schema = () => tidy(dumpSchema(inject('house').cluster, scratch.name));

  test('that the migrations make is the one in migrations/schema.sql (UPDATE=1 writes it anew)', async () => {
    scratch = await cloneDatabase();
    if (process.env.UPDATE === '1') writeFileSync(SNAPSHOT, schema());
    expect(schema()).toBe(readFileSync(SNAPSHOT, 'utf8'));
  });

  test('is the same after going down and up again', async () => {
    scratch = await bareDatabase();
    const settings = { url: scratch.url, pool: 4 };
    const log = openLog({ logLevel: 'error' });
    await migrate(settings, log);
    const before = schema();
    await scratch.db.migrate.rollback(migrationConfig(), true);
    expect(schema()).not.toContain('patterns');
    await migrate(settings, log);
    expect(schema()).toBe(before);
  });

  test('has a key on every table and an index under every foreign key', async () => {
    scratch = await cloneDatabase();
    const keyless = await scratch.db.raw<{ rows: { name: string }[] }>(`
      select c.relname as name from pg_class c join pg_namespace n on n.oid = c.relnamespace
       where n.nspname = 'public' and c.relkind = 'r'
         and not exists (select from pg_constraint k where k.conrelid = c.oid and k.contype = 'p')`);
    expect(keyless.rows.map(({ name }) => name)).toEqual([]);
    // An index serves a foreign key when its first columns are the key's, in any order.
    const bare = await scratch.db.raw<{ rows: { name: string }[] }>(`
      select k.conrelid::regclass || '.' || k.conname as name from pg_constraint k
       where k.contype = 'f' and k.connamespace = 'public'::regnamespace
         and not exists (
           select from pg_index i where i.indrelid = k.conrelid and i.indpred is null
              and (string_to_array(i.indkey::text, ' ')::int2[])[1:cardinality(k.conkey)] @> k.conkey)`);
    expect(bare.rows.map(({ name }) => name)).toEqual([]);
  });

  test('leaves no yes-or-no and no list undecided', async () => {
    scratch = await cloneDatabase();
    const loose = await scratch.db.raw<{ rows: { name: string }[] }>(`
      select c.relname || '.' || a.attname as name from pg_attribute a
        join pg_class c on c.oid = a.attrelid join pg_namespace n on n.oid = c.relnamespace
       where n.nspname = 'public' and c.relkind = 'r' and a.attnum > 0 and not a.attisdropped and not a.attnotnull
         and c.relname not like 'knex_%' and a.atttypid in ('bool'::regtype, 'text[]'::regtype)`);
    expect(loose.rows.map(({ name }) => name)).toEqual([]);
  });
});
