import { readEnv } from '../api/env.ts';
import { closeDeps, openDeps } from '../api/platform/deps.ts';
import { seed, SIGN_INS } from './index.ts';

/** Puts the demo into the database and the store; done again, it changes nothing. Tells its sign-ins to the starter. */
const deps = openDeps(readEnv());
try {
  await deps.storage.prepare();
  await seed(deps);
  process.send?.({ signIns: SIGN_INS });
} catch (err) {
  deps.log.fatal({ err }, 'the demo could not be put in');
  process.exitCode = 1;
} finally {
  await closeDeps(deps);
}
