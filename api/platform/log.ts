import { AsyncLocalStorage } from 'node:async_hooks';
import { destination, pino, stdTimeFunctions, type DestinationStream, type Logger } from 'pino';
import type { Env } from '../env.ts';

export type { Logger } from 'pino';

const requests = new AsyncLocalStorage<string>();

/** Runs `work` so that every line logged in it, however deep, carries `requestId`. */
export function withRequestId<T>(requestId: string, work: () => T): T {
  return requests.run(requestId, work);
}

/** The id of the request being answered, or an empty string outside of one. */
export function currentRequestId(): string {
  return requests.getStore() ?? '';
}

const SECRET_KEYS = ['password', 'newPassword', 'passwordHash', 'token', 'cookie', 'authorization', 'secret', 'link'];

/** What is kept of an error: enough to find it, without the values of a query. */
function describeError(err: unknown): Record<string, unknown> {
  if (!(err instanceof Error)) return { message: String(err) };
  const { code } = err as { code?: unknown };
  return {
    type: err.name,
    message: err.message,
    stack: err.stack,
    ...(typeof code === 'string' && { code }),
    ...(err.cause !== undefined && { cause: describeError(err.cause) }),
  };
}

/**
 * One JSON object a line, times in UTC. Values under the names of secrets are struck out up to three levels down.
 * @param to where lines go; standard output unless told
 */
export function openLog(env: Pick<Env, 'logLevel'>, to: DestinationStream = destination({ sync: true })): Logger {
  return pino(
    {
      level: env.logLevel,
      base: {},
      timestamp: stdTimeFunctions.isoTime,
      formatters: { level: (label) => ({ level: label }) },
      serializers: { err: describeError },
      redact: {
        paths: SECRET_KEYS.flatMap((key) => [key, `*.${key}`, `*.*.${key}`, `*.*.*.${key}`]),
        censor: '[struck out]',
      },
      mixin: () => {
        const requestId = currentRequestId();
        return requestId ? { requestId } : {};
      },
    },
    to,
  );
}
