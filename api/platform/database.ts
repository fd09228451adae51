import knex, { type Knex } from 'knex';
import pg from 'pg';
import type { Env } from '../env.ts';

/** Slightly under the time a request may take, so that the database gives up before the caller does. */
const STATEMENT_TIMEOUT_MS = 14_000;
const ACQUIRE_TIMEOUT_MS = 4_000;
const INT8 = 20;

/**
 * PostgreSQL's 64-bit integers (counts, sizes, change numbers) come as numbers: all of ours are far below 2^53.
 */
const types: pg.CustomTypesConfig = {
  getTypeParser: (oid, format): unknown =>
    (oid as number) === INT8 && format !== 'binary' ? Number : pg.types.getTypeParser(oid, format),
};

export interface DatabaseOptions {
  readonly statementTimeoutMs?: number;
  readonly acquireTimeoutMs?: number;
  /** How soon PostgreSQL notices in the middle of a long statement that this process has died. */
  readonly noticeDeathMs?: number;
}

/** Opens a pool; connections are made when first needed, so a database that is down does not stop the start. */
export function openDatabase(settings: Env['database'], options: DatabaseOptions = {}): Knex {
  return knex({
    client: 'pg',
    connection: {
      connectionString: settings.url,
      application_name: 'roundelay',
      connectionTimeoutMillis: 2_000,
      statement_timeout: options.statementTimeoutMs ?? STATEMENT_TIMEOUT_MS,
      types,
      ...(options.noticeDeathMs !== undefined && {
        options: `-c client_connection_check_interval=${options.noticeDeathMs}`,
      }),
    } as Knex.PgConnectionConfig,
    pool: { min: 0, max: settings.pool },
    acquireConnectionTimeout: options.acquireTimeoutMs ?? ACQUIRE_TIMEOUT_MS,
  });
}

const DOWN = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'ENOTFOUND',
  'ETIMEDOUT',
  'EPIPE',
  '57P01',
  '57P02',
  '57P03',
  '53300',
]);
const BUSY = new Set(['57014', '55P03']);

/** Whether the database could not be reached (`down`) or took too long (`busy`); otherwise null. */
export function databaseTrouble(err: unknown): 'down' | 'busy' | null {
  if (!(err instanceof Error)) return null;
  if (err.name === 'KnexTimeoutError') return 'busy';
  const { code } = err as { code?: unknown };
  if (typeof code === 'string' && DOWN.has(code)) return 'down';
  if (typeof code === 'string' && BUSY.has(code)) return 'busy';
  return /Connection terminated|timeout exceeded when trying to connect|Client has encountered a connection error/.test(
    err.message,
  )
    ? 'down'
    : null;
}

/** Whether a unique constraint refused the write. */
export function isDuplicate(err: unknown): boolean {
  return err instanceof Error && (err as { code?: unknown }).code === '23505';
}
