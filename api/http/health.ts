import { Router } from 'express';
import type { Deps } from '../platform/deps.ts';
import { noStore } from './headers.ts';
import { pendingMigrations } from '../platform/migrations.ts';

const WITHIN_MS = 1_500;

/** Whether this process still takes work; set false when it is asked to stop. */
export interface Readiness {
  accepting: boolean;
}

async function within<T>(work: Promise<T>): Promise<T> {
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<never>((_resolve, reject) => {
    timer = setTimeout(() => reject(new DOMException('no answer in time', 'TimeoutError')), WITHIN_MS);
  });
  try {
    return await Promise.race([work, late]);
  } finally {
    clearTimeout(timer);
  }
}

async function checkMigrations(deps: Deps): Promise<void> {
  const pending = await pendingMigrations(deps.db);
  if (pending.length > 0) throw new RangeError(`${pending.length} migrations are still to be run`);
}

/** `live`: the process runs. `ready`: it can do its work now. Strangers learn only that; the log says why not. */
export function healthRoutes(deps: Deps, readiness: Readiness): Router {
  const router = Router();
  router.use('/health', noStore);
  router.get('/health/live', (_req, res) => {
    res.json({ status: 'live' });
  });
  router.get('/health/ready', async (_req, res) => {
    const checks = readiness.accepting
      ? await Promise.allSettled([within(checkMigrations(deps)), within(deps.storage.check(WITHIN_MS))])
      : [];
    const failed = checks.flatMap((check) => (check.status === 'rejected' ? [check.reason as unknown] : []));
    for (const err of failed) deps.log.warn({ err }, 'not ready');
    const ready = readiness.accepting && failed.length === 0;
    res.status(ready ? 200 : 503).json({ status: ready ? 'ready' : 'not ready' });
  });
  return router;
}
