import { randomUUID } from 'node:crypto';
import type { Request, RequestHandler } from 'express';
import type { Deps } from '../platform/deps.ts';
import { withRequestId } from '../platform/log.ts';

const ACCEPTED = /^[A-Za-z0-9._-]{1,64}$/;

/** Gives each request its id, in the answer and in every line logged for it. A caller's own is kept if it is tame. */
export const requestId: RequestHandler = (req, res, next) => {
  const given = req.get('X-Request-Id');
  const id = given !== undefined && ACCEPTED.test(given) ? given : randomUUID();
  res.set('X-Request-Id', id);
  withRequestId(id, next);
};

/** One line for each answered request. The query is left out: it may hold what was searched for, or a key. */
export function accessLog({ log }: Pick<Deps, 'log'>, personOf: (req: Request) => string | undefined): RequestHandler {
  return (req, res, next) => {
    const begun = performance.now();
    const path = req.path;
    res.on('close', () => {
      const line = {
        requestId: res.getHeader('X-Request-Id'),
        method: req.method,
        path,
        status: res.statusCode,
        ms: Math.round(performance.now() - begun),
        personId: personOf(req),
        ...(!res.writableFinished && { cut: true }),
      };
      log.info(line, 'answered');
    });
    next();
  };
}
