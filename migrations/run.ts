import { readEnv } from '../api/env.ts';
import { openLog } from '../api/platform/log.ts';
import { migrate } from '../api/platform/migrations.ts';

/** Brings the database up to date: `run [folder of built migrations]`; without one the sources are run, under tsx. */
const env = readEnv();
const log = openLog(env);
try {
  const done = await migrate(env.database, log, process.argv[2]);
  log.info({ migrations: done }, done.length > 0 ? 'database brought up to date' : 'database is up to date');
} catch (err) {
  log.fatal({ err }, 'the database could not be migrated');
  process.exitCode = 1;
}
