import { randomUUID } from 'node:crypto';
import type { Express } from 'express';
import { inject } from 'vitest';
import { createApp, type AppOptions } from '../../api/app.ts';
import { allTasks } from '../../api/background.ts';
import { readEnv, type Env } from '../../api/env.ts';
import { createSession, SESSION_COOKIE } from '../../api/http/session.ts';
import type { Deps } from '../../api/platform/deps.ts';
import { openLog } from '../../api/platform/log.ts';
import { openMail } from '../../api/platform/mail.ts';
import { openNotices } from '../../api/platform/notices.ts';
import { openStorage } from '../../api/platform/storage.ts';
import { movableClock, type MovableClock } from './clock.ts';
import { cloneDatabase, type ScratchDatabase } from './database.ts';

/** What a browser sends along with a request that a page of ours makes. */
export const FROM_OUR_PAGE = { 'Sec-Fetch-Site': 'same-origin' } as const;

export interface TestApp {
  readonly app: Express;
  readonly deps: Deps;
  readonly db: ScratchDatabase['db'];
  readonly url: string;
  readonly env: Env;
  readonly clock: MovableClock;
  /** Every line logged so far, as it was written. */
  readonly logged: readonly string[];
  /** Headers of somebody signed in, on a page of ours: `request(app).get(…).set(await as(person))`. */
  as(person: { readonly id: string }): Promise<{ Cookie: string; 'Sec-Fetch-Site': 'same-origin' }>;
  /** Does one job here and now, as a worker would. */
  work(name: string, payload?: unknown): Promise<void>;
  /** Does every job that waits, in order, until none is left; those they ask for too. */
  workAll(): Promise<void>;
  close(): Promise<void>;
}

/** The settings of a test process with services of its own. */
export function testEnv(databaseUrl: string, bucket: string, more: Readonly<Record<string, string>> = {}): Env {
  return readEnv(testVariables(databaseUrl, bucket, more));
}

/** The same as variables, for a process to be started with. */
export function testVariables(
  databaseUrl: string,
  bucket: string,
  more: Readonly<Record<string, string>> = {},
): Record<string, string> {
  const { s3, smtpUrl } = inject('house');
  return {
    NODE_ENV: 'test',
    DATABASE_URL: databaseUrl,
    S3_ENDPOINT: s3.endpoint,
    S3_ACCESS_KEY: s3.accessKey,
    S3_SECRET_KEY: s3.secretKey,
    S3_BUCKET: bucket,
    SMTP_URL: smtpUrl,
    ...more,
  };
}

/** The whole server on a database and a bucket of its own, with a clock to move and a log to read. */
export async function buildApp(
  options: AppOptions & { readonly variables?: Readonly<Record<string, string>>; readonly deps?: Partial<Deps> } = {},
): Promise<TestApp> {
  const scratch = await cloneDatabase();
  const env = testEnv(scratch.url, `t-${randomUUID()}`, options.variables);
  const storage = openStorage(env.s3);
  await storage.prepare();
  const logged: string[] = [];
  const clock = movableClock();
  const log = openLog({ logLevel: 'debug' }, { write: (line) => void logged.push(line) });
  const deps: Deps = {
    env,
    db: scratch.db,
    storage,
    mail: openMail(env.mail),
    clock,
    log,
    notices: openNotices(env.database, log),
    ...options.deps,
  };
  const tasks = allTasks(deps);
  const work = async (name: string, payload: unknown = {}) => {
    const task = tasks[name];
    if (!task) throw new Error(`there is no job ${name}`);
    await task(payload, { attempt: 1, signal: undefined });
  };
  return {
    app: createApp(deps, options),
    deps,
    db: scratch.db,
    url: scratch.url,
    env,
    clock,
    logged,
    async as(person) {
      const token = await createSession(deps, person.id);
      return { Cookie: `${SESSION_COOKIE}=${token}`, ...FROM_OUR_PAGE };
    },
    work,
    async workAll() {
      const next = () =>
        scratch.db.raw<{ rows: { id: string; name: string; payload: unknown }[] }>(
          `delete from graphile_worker._private_jobs j using graphile_worker._private_tasks t
            where t.id = j.task_id
              and j.id = (select id from graphile_worker._private_jobs where run_at <= ? order by priority, run_at, id limit 1)
            returning j.id, t.identifier as name, j.payload`,
          [clock.now()],
        );
      for (let job = (await next()).rows[0]; job; job = (await next()).rows[0]) await work(job.name, job.payload);
    },
    async close() {
      storage.close();
      deps.mail.close();
      await deps.notices.close();
      await scratch.drop();
    },
  };
}
