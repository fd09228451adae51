import express, { Router, type Express, type Request } from 'express';
import { accountRoutes } from './features/account/account.routes.ts';
import { editionRoutes } from './features/editions/editions.routes.ts';
import { patternRoutes } from './features/patterns/patterns.routes.ts';
import { recordingRoutes } from './features/recordings/recordings.routes.ts';
import { sheetRoutes } from './features/sheet/sheet.routes.ts';
import { studioRoutes } from './features/studios/studios.routes.ts';
import { watchPages } from './features/watch/watch.routes.ts';
import { noStore, securityHeaders } from './http/headers.ts';
import { healthRoutes, type Readiness } from './http/health.ts';
import { limit, READS, WRITES } from './http/limits.ts';
import { noRoute, problemHandler } from './http/problem.ts';
import { accessLog, requestId } from './http/request-id.ts';
import { isUnsafe, sameOrigin } from './http/same-origin.ts';
import { readSession, sessionOf } from './http/session.ts';
import { webPages } from './http/web-pages.ts';
import type { Deps } from './platform/deps.ts';

/** What is sent as JSON; files come as forms, with limits of their own. */
const JSON_LIMIT = '1mb';
/** Parts and ranges of a clip are bounded by what is open and by bytes, not by calls a minute. */
const UNCOUNTED: readonly RegExp[] = [
  /^PUT \/uploads\/[^/]+\/parts\/\d+$/,
  /^(?:GET|HEAD) \/recordings\/[^/]+\/clip$/,
  /^(?:GET|HEAD) \/editions\/[^/]+\/\d+\/clips\/\d+$/,
];

const personIdOf = (req: Request) => sessionOf(req)?.person.id;

function countedCalls(deps: Deps): express.RequestHandler {
  const reads = limit(deps, READS);
  const writes = limit(deps, WRITES);
  return (req, res, next) => {
    const call = `${req.method} ${req.path}`;
    if (UNCOUNTED.some((pattern) => pattern.test(call))) {
      next();
      return;
    }
    return (isUnsafe(req) ? writes : reads)(req, res, next);
  };
}

/** Everything under /api: who asks is known, calls are counted, and every failure is a problem document. */
function apiRoutes(deps: Deps): Router {
  const router = Router();
  router.use(noStore, sameOrigin(deps), readSession(deps), countedCalls(deps), express.json({ limit: JSON_LIMIT }));
  router.use(accountRoutes(deps), studioRoutes(deps), patternRoutes(deps), recordingRoutes(deps));
  router.use(editionRoutes(deps), sheetRoutes(deps));
  router.use(noRoute, problemHandler(deps, personIdOf));
  return router;
}

export interface AppOptions {
  readonly readiness?: Readiness;
  /** Where the built pages are; the project's own build unless told. */
  readonly webDir?: string;
}

/** The whole server as one handler: middleware in order, then the routes. */
export function createApp(deps: Deps, options: AppOptions = {}): Express {
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', deps.env.trustedProxies);
  // An ETag is a version here: only routes that have one give it.
  app.set('etag', false);
  app.use(requestId, accessLog(deps, personIdOf), securityHeaders({ vite: deps.env.web === 'vite' }));
  app.use(healthRoutes(deps, options.readiness ?? { accepting: true }));
  app.use('/api', apiRoutes(deps));
  app.use(watchPages(deps, options.webDir));
  app.use(webPages(options.webDir));
  app.use(problemHandler(deps, personIdOf));
  return app;
}
