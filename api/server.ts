import { createServer } from 'node:http';
import { createApp } from './app.ts';
import { startWorker } from './background.ts';
import { EnvError, readEnv, type Env } from './env.ts';
import { orderlyEnd } from './http/shutdown.ts';
import { closeDeps, openDeps } from './platform/deps.ts';
import { NewerDatabase, refuseNewer } from './platform/migrations.ts';

/** A request that is not answered by then has its connection closed; statements in the database end before. */
const REQUEST_MS = 15_000;
/** Keeps a connection open a little longer than balancers do, so that they never send into a closing one. */
const KEEP_ALIVE_MS = 65_000;

async function serve(env: Env): Promise<void> {
  const deps = openDeps(env);
  await refuseNewer(deps.db);
  // The bucket may come later than the server: until then it is not ready, and says why in the log.
  await deps.storage.prepare().catch((err: unknown) => deps.log.warn({ err }, 'no storage yet'));
  const readiness = { accepting: true };
  const server = createServer(createApp(deps, { readiness }));
  server.headersTimeout = REQUEST_MS;
  server.keepAliveTimeout = KEEP_ALIVE_MS;
  const worker = env.worker ? await startWorker(deps) : null;

  const close = orderlyEnd({
    server,
    readiness,
    drainMs: env.drainMs,
    cleanUps: [
      ...(worker ? [{ name: 'worker', run: () => worker.stop() }] : []),
      { name: 'connections', run: () => closeDeps(deps) },
    ],
    log: deps.log,
    exit: (code) => process.exit(code),
  });
  // Streams would hold the door open for as long as somebody listens.
  const end = () => Promise.all([deps.notices.close(), close()]);
  process.on('SIGTERM', () => void end());
  process.on('SIGINT', () => void end());
  // The one who started it is gone.
  process.on('disconnect', () => void end());

  server.on('error', (err) => {
    deps.log.fatal({ err }, 'the port cannot be used');
    process.exit(1);
  });
  server.listen(env.port, env.host, () => {
    deps.log.info({ address: server.address() }, 'listening');
    process.send?.('listening');
  });
}

try {
  await serve(readEnv());
} catch (err) {
  if (!(err instanceof EnvError) && !(err instanceof NewerDatabase)) throw err;
  console.error(`Roundelay does not start:\n${err.message}`);
  process.exit(1);
}
