import { startWorker } from './background.ts';
import { readEnv } from './env.ts';
import { closeDeps, openDeps } from './platform/deps.ts';

/** A process that does nothing but jobs; as many of them as are wanted. */
const deps = openDeps(readEnv());
const runner = await startWorker(deps);
deps.log.info('worker started');
process.send?.('listening');

async function end(): Promise<void> {
  try {
    await runner.stop();
    await closeDeps(deps);
  } catch (err) {
    deps.log.error({ err }, 'the worker did not end in order');
    process.exitCode = 1;
  }
}

let ending: Promise<void> | undefined;
const stop = () => void (ending ??= end());
process.on('SIGTERM', stop);
process.on('SIGINT', stop);
