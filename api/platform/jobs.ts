import type { Knex } from 'knex';
import { EventEmitter } from 'node:events';
import { setTimeout as wait } from 'node:timers/promises';
import {
  Logger as WorkerLogger,
  parseCronItems,
  run,
  runMigrations,
  type TaskList,
  type WorkerEvents,
} from 'graphile-worker';
import type { Logger } from './log.ts';

/** How often a job is tried, with growing gaps, before it stands as failed. */
export const TRIES = 5;
const HEARTBEAT_MS = 10_000;
const STOP_MS = 8_000;
/** A worker not heard of for this long is dead, and its jobs go to the others. */
const DEAD_AFTER_MS = 40_000;

export interface JobInfo {
  /** Which try this is, from 1. */
  readonly attempt: number;
  /** Aborted when the process is asked to stop. */
  readonly signal: AbortSignal | undefined;
}

/** What to do for each job by its name; run twice, a task must do the same as once. */
export type Tasks = Readonly<Record<string, (payload: unknown, info: JobInfo) => Promise<void>>>;

/** When to do a task by itself: a crontab pattern in UTC for each name. */
export type Timetable = Readonly<Record<string, string>>;

/**
 * Asks for a job within `trx`; it is there for the workers once the transaction is committed, and never if it is not.
 * @param key jobs of one key that have not begun are one job: the later call replaces the earlier
 * @param runAt not before this moment
 */
export async function addJob(
  trx: Knex.Transaction,
  name: string,
  payload: Readonly<Record<string, unknown>>,
  options: { readonly key?: string; readonly runAt?: Date } = {},
): Promise<void> {
  await trx.raw(
    `select graphile_worker.add_job(identifier => ?::text, payload => ?::json, max_attempts => ?::int,
       job_key => ?::text, run_at => ?::timestamptz)`,
    [name, JSON.stringify(payload), TRIES, options.key ?? null, options.runAt ?? null],
  );
}

function workerLogger(log: Logger): WorkerLogger {
  return new WorkerLogger((scope) => (level: string, message) => {
    const line = { job: scope.taskIdentifier, jobId: scope.jobId };
    if (level === 'error') log.error(line, message);
    else if (level === 'warning') log.warn(line, message);
    else log.debug(line, message);
  });
}

/** Brings the tables of the job queue up to date. */
export async function migrateJobs(databaseUrl: string, log: Logger): Promise<void> {
  await runMigrations({ connectionString: databaseUrl, logger: workerLogger(log) });
}

export interface JobRunner {
  /** Takes no more jobs, waits for those under way, hands back what does not end in time. */
  stop(): Promise<void>;
}

/**
 * Gives the jobs of dead workers to the living. The queue itself would only do so after four hours.
 * @returns how many workers were buried
 */
export async function releaseDeadWorkers(db: Knex, now: Date): Promise<number> {
  const before = new Date(now.getTime() - DEAD_AFTER_MS);
  const dead = await db('workers').where('seen_at', '<', before).delete().returning<{ id: string }[]>('id');
  const strays = await db.raw<{ rows: { id: string }[] }>(
    `select distinct locked_by as id from graphile_worker._private_jobs
      where locked_at < ? and locked_by not in (select id from workers)`,
    [before],
  );
  const ids = [...new Set([...dead, ...strays.rows].map(({ id }) => id))];
  if (ids.length > 0) await db.raw('select graphile_worker.force_unlock_workers(?::text[])', [ids]);
  return ids.length;
}

/** Starts working off jobs in this process, beside any number of others. */
export async function startJobs(options: {
  readonly databaseUrl: string;
  readonly db: Knex;
  readonly tasks: Tasks;
  readonly timetable: Timetable;
  readonly log: Logger;
  readonly concurrency?: number;
}): Promise<JobRunner> {
  const { db, tasks, log } = options;
  const taskList: TaskList = Object.fromEntries(
    Object.entries(tasks).map(([name, task]) => [
      name,
      async (payload, helpers) => {
        await task(payload, { attempt: helpers.job.attempts, signal: helpers.abortSignal });
      },
    ]),
  );
  // The queue locks a job for the pool of workers that takes it: the pool's id is what has to be kept alive.
  const mine = new Set<string>();
  const events: WorkerEvents = new EventEmitter();
  events.on('pool:create', ({ workerPool }) => mine.add(workerPool.id));
  const runner = await run({
    events,
    connectionString: options.databaseUrl,
    taskList,
    parsedCronItems: parseCronItems(
      Object.entries(options.timetable).map(([task, match]) => ({ task, match, options: { maxAttempts: 1 } })),
    ),
    concurrency: options.concurrency ?? 2,
    noHandleSignals: true,
    logger: workerLogger(log),
  });

  const beat = async () => {
    const now = new Date();
    const rows = [...mine].map((id) => ({ id, seen_at: now }));
    if (rows.length > 0) await db('workers').insert(rows).onConflict('id').merge();
    await releaseDeadWorkers(db, now);
  };
  const tryBeat = () => beat().catch((err: unknown) => log.warn({ err }, 'the heartbeat of the workers was missed'));
  await tryBeat();
  const heart = setInterval(() => void tryBeat(), HEARTBEAT_MS);
  heart.unref();

  return {
    async stop() {
      clearInterval(heart);
      // Jobs are asked to stop after five seconds; one that does not listen is taken from it.
      await Promise.race([runner.stop(), wait(STOP_MS, undefined, { ref: false })]);
      await db.raw('select graphile_worker.force_unlock_workers(?::text[])', [[...mine]]);
      await db('workers')
        .whereIn('id', [...mine])
        .delete();
    },
  };
}
