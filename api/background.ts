import { accountTasks } from './features/account/account.tasks.ts';
import { recordingTasks } from './features/recordings/recordings.tasks.ts';
import { sheetTasks } from './features/sheet/sheet.tasks.ts';
import { sweepRequestKeys } from './http/idempotency.ts';
import { sweepLimits } from './http/limits.ts';
import { sweepSessions } from './http/session.ts';
import type { Deps } from './platform/deps.ts';
import { startJobs, type JobRunner, type Tasks, type Timetable } from './platform/jobs.ts';
import { mailTasks } from './platform/mail.ts';

/** What is done in the background, by name. */
export function allTasks(deps: Deps): Tasks {
  return {
    ...mailTasks(deps),
    ...accountTasks(deps),
    ...recordingTasks(deps),
    ...sheetTasks(deps),
    'sweep-housekeeping': async () => {
      const now = deps.clock.now();
      await sweepSessions(deps.db, now);
      await sweepLimits(deps.db, now);
      await sweepRequestKeys(deps.db, now);
    },
  };
}

/** What is done by the clock. */
export const TIMETABLE: Timetable = {
  'sweep-housekeeping': '17 * * * *',
  'sweep-tokens': '23 3 * * *',
  'sweep-storage': '41 * * * *',
};

/** Works off jobs until stopped. */
export function startWorker(deps: Deps): Promise<JobRunner> {
  return startJobs({
    databaseUrl: deps.env.database.url,
    db: deps.db,
    tasks: allTasks(deps),
    timetable: TIMETABLE,
    log: deps.log,
  });
}
