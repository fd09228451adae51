import { Router, type ErrorRequestHandler, type Request } from 'express';
import { limit, READS } from '../../http/limits.ts';
import { logProblem, toAppError } from '../../http/problem.ts';
import { readSession, sessionOf } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { openEdition } from '../editions/editions.service.ts';
import { numberIn } from '../../http/number-in.ts';
import { pageAssets } from './page-assets.ts';
import { nothingHere, trouble, watchPage } from './watch-page.ts';

/** Failures of a page are pages: the same one for everything that is not there or not shared. */
function pageProblems(deps: Deps, webDir?: string): ErrorRequestHandler {
  return (err: unknown, req, res, next) => {
    if (res.headersSent) {
      next(err);
      return;
    }
    const problem = toAppError(err);
    logProblem(deps, problem, req, sessionOf(req)?.person.id);
    const { retryAfter } = problem.extra;
    if (typeof retryAfter === 'number') res.set('Retry-After', String(retryAfter));
    res.status(problem.status).type('html').set('Cache-Control', 'no-store');
    res.send(problem.status === 404 ? nothingHere(pageAssets(deps.env.web, webDir)) : trouble());
  };
}

/** The public pages under /w: a pattern's current edition, and each edition at its own address. */
export function watchPages(deps: Deps, webDir?: string): Router {
  const { db, env } = deps;
  const router = Router();
  router.use('/w', readSession(deps), limit(deps, READS));

  const send = async (req: Request, number: number | null) => {
    const who = sessionOf(req)?.person ?? null;
    const seen = await openEdition(db, who, String(req.params.code), number);
    const path = `/w/${seen.edition.code}`;
    const page = watchPage({
      edition: seen.edition,
      number: seen.number,
      address: number === null ? env.publicUrl + path : `${env.publicUrl}${path}/${seen.number}`,
      currentNumber: seen.currentNumber,
      path,
      isListed: seen.visibility === 'listed' && !seen.isWithdrawn && (number === null || number === seen.currentNumber),
      withdrawnReason: seen.isWithdrawn ? (seen.withdrawnReason ?? '') : null,
      assets: pageAssets(env.web, webDir),
    });
    return { page, keeping: seen.visibility === 'private' ? 'private, no-store' : 'private, no-cache' };
  };

  router.get('/w/:code', async (req, res) => {
    const { page, keeping } = await send(req, null);
    res.type('html').set('Cache-Control', keeping).send(page);
  });

  router.get('/w/:code/:number', async (req, res) => {
    const { page, keeping } = await send(req, numberIn(req));
    res.type('html').set('Cache-Control', keeping).send(page);
  });

  router.use('/w', pageProblems(deps, webDir));
  return router;
}
