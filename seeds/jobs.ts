import { recordingTasks } from '../api/features/recordings/recordings.tasks.ts';
import type { Deps } from '../api/platform/deps.ts';
import { startJobs } from '../api/platform/jobs.ts';

const PATIENCE_MS = 60_000;

/** Does `work` while what it asks to be done with recordings is done in the background. */
export async function withRecordingJobs<T>(deps: Deps, work: () => Promise<T>): Promise<T> {
  const runner = await startJobs({
    databaseUrl: deps.env.database.url,
    db: deps.db,
    tasks: recordingTasks(deps),
    timetable: {},
    log: deps.log,
  });
  try {
    return await work();
  } finally {
    await runner.stop();
  }
}

/** Waits until something is there that a job makes. */
export async function until<T>(what: string, look: () => Promise<T | undefined | null | false>): Promise<T> {
  const patient = Date.now() + PATIENCE_MS;
  while (Date.now() < patient) {
    const found = await look();
    if (found) return found;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Error(`${what} did not come within a minute`);
}
