import type { Request, RequestHandler } from 'express';
import type { Deps } from '../platform/deps.ts';
import { AppError } from './problem.ts';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/** Whether a method may change something. */
export const isUnsafe = (req: Request) => !SAFE.has(req.method);

function hostOf(origin: string): string | null {
  return URL.canParse(origin) ? new URL(origin).host : null;
}

/**
 * Lets a change through only when the browser says that it comes from a page of ours. Browsers send `Sec-Fetch-Site`
 * or `Origin` with every unsafe request and let no page forge them; a request with neither is refused as well.
 */
export function sameOrigin({ env }: Pick<Deps, 'env'>): RequestHandler {
  const own = new URL(env.publicUrl).host;
  return (req, _res, next) => {
    if (isUnsafe(req)) {
      const site = req.get('Sec-Fetch-Site');
      const origin = req.get('Origin');
      const host = origin === undefined ? undefined : hostOf(origin);
      const originFits = host !== undefined && host !== null && (host === own || host === req.get('Host'));
      const fits = site === undefined ? originFits : site === 'same-origin' && (origin === undefined || originFits);
      if (!fits) throw new AppError('foreign-origin');
    }
    next();
  };
}
