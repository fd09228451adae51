import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { inject } from 'vitest';
import { databaseUrl } from '../../api/local/postgres.mjs';
import { openDatabase } from '../../api/platform/database.ts';

export interface ScratchDatabase {
  readonly db: Knex;
  readonly url: string;
  readonly name: string;
  drop(): Promise<void>;
}

async function asAdministrator(work: (admin: Knex) => Promise<unknown>): Promise<void> {
  const admin = openDatabase({ url: databaseUrl(inject('house').cluster, 'postgres'), pool: 2 });
  try {
    await work(admin);
  } finally {
    await admin.destroy();
  }
}

async function createScratch(sql: string): Promise<ScratchDatabase> {
  const name = `t_${randomUUID().replaceAll('-', '')}`;
  await asAdministrator((admin) => admin.raw(`create database ${name} ${sql}`));
  const url = databaseUrl(inject('house').cluster, name);
  const db = openDatabase({ url, pool: 10 });
  return {
    db,
    url,
    name,
    async drop() {
      await db.destroy();
      await asAdministrator((admin) => admin.raw(`drop database ${name} with (force)`));
    },
  };
}

/** A database of one's own, migrated and empty; some 50 ms. Drop it in `afterAll`. */
export const cloneDatabase = (): Promise<ScratchDatabase> => createScratch(`template ${inject('house').template}`);

/** A database without any table, for tests of the migrations. */
export const bareDatabase = (): Promise<ScratchDatabase> => createScratch('');
