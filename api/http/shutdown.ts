import type { Server } from 'node:http';
import { setTimeout as wait } from 'node:timers/promises';
import type { Deps } from '../platform/deps.ts';
import type { Readiness } from './health.ts';

/** A request still unanswered this long after the door was closed is cut. */
const STUCK_MS = 5_000;
/** The process ends by force after this, whatever hangs. */
const FORCED_MS = 60_000;

/** Something to be put in order at the end, with the name it has in the log. */
export interface CleanUp {
  readonly name: string;
  readonly run: () => Promise<void>;
}

async function closeDoor(server: Server): Promise<void> {
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  const stuck = setTimeout(() => server.closeAllConnections(), STUCK_MS);
  // A kept connection closes with its answer; those that are idle now are closed at once.
  const idle = setInterval(() => server.closeIdleConnections(), 100);
  server.closeIdleConnections();
  await closed;
  clearTimeout(stuck);
  clearInterval(idle);
}

/**
 * Ends the process in order: not ready at once, the door closes, answers under way are given, then the clean-ups
 * one after another. One that fails stops none of the others.
 * @returns the function to call on a signal; called again it does nothing more
 */
export function orderlyEnd(options: {
  readonly server: Server;
  readonly readiness: Readiness;
  readonly drainMs: number;
  readonly cleanUps: readonly CleanUp[];
  readonly log: Deps['log'];
  readonly exit: (code: number) => void;
}): () => Promise<void> {
  const { log, exit } = options;
  let ending: Promise<void> | undefined;

  const end = async () => {
    options.readiness.accepting = false;
    setTimeout(() => {
      log.fatal('ending by force');
      exit(1);
    }, FORCED_MS).unref();
    await wait(options.drainMs);
    await closeDoor(options.server);
    let code = 0;
    for (const { name, run } of options.cleanUps) {
      try {
        await run();
      } catch (err) {
        log.error({ err, cleanUp: name }, 'a clean-up failed');
        code = 1;
      }
    }
    log.info({ code }, 'ended');
    exit(code);
  };
  return () => (ending ??= end());
}
