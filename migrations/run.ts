import { readEnv } from '../api/env.ts';
import { openLog } from '../api/platform/log.ts';
import { migrate } from '../api/platform/migrations.ts';

const env = readEnv();
const log = openLog(env);
try {
  const done = await migrate(env.database, log);
  log.info({ migrations: done }, done.length > 0 ? 'database brought up to date' : 'database is up to date');
} catch (err) {
  log.fatal({ err }, 'the database could not be migrated');
  process.exitCode = 1;
}
