import type { Knex } from 'knex';
import type { Env } from '../env.ts';
import { systemClock, type Clock } from './clock.ts';
import { openDatabase } from './database.ts';
import { openLog, type Logger } from './log.ts';
import { openMail, type Mailer } from './mail.ts';
import { openNotices, type Notices } from './notices.ts';
import { openStorage, type Storage } from './storage.ts';

/** What every part of the server is handed. */
export interface Deps {
  readonly env: Env;
  readonly db: Knex;
  readonly storage: Storage;
  readonly mail: Mailer;
  readonly clock: Clock;
  readonly log: Logger;
  readonly notices: Notices;
}

/** Opens everything a process needs; nothing is connected until it is first used. */
export function openDeps(env: Env): Deps {
  const log = openLog(env);
  return {
    env,
    db: openDatabase(env.database),
    storage: openStorage(env.s3),
    mail: openMail(env.mail),
    clock: systemClock,
    log,
    notices: openNotices(env.database, log),
  };
}

/** Lets go of connections; the rest of the process may then end by itself. */
export async function closeDeps(deps: Deps): Promise<void> {
  deps.storage.close();
  deps.mail.close();
  await deps.notices.close();
  await deps.db.destroy();
}
