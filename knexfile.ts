import { readEnv } from './api/env.ts';
import { migrationConfig } from './api/platform/migrations.ts';

/** For knex's own commands (`migrate:status`, `migrate:down` …); the product migrates with `migrations/run.ts`. */
export default { client: 'pg', connection: readEnv().database.url, migrations: migrationConfig() };
