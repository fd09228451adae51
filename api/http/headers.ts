import type { RequestHandler } from 'express';
import helmet from 'helmet';

/** Vite's own server puts small inline scripts into the pages it serves; only `npm run dev` allows them. */
const DEV_SCRIPTS = ["'unsafe-inline'"];

/** What every answer tells the browser about itself. Inline styles are what dialogs and toasts insert at run time. */
export function securityHeaders(options: { readonly vite: boolean }): RequestHandler {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'", ...(options.vite ? DEV_SCRIPTS : [])],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'blob:', 'data:'],
        mediaSrc: ["'self'", 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'", ...(options.vite ? ['ws:'] : [])],
        workerSrc: ["'self'"],
        manifestSrc: ["'self'"],
        formAction: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        frameAncestors: ["'none'"],
      },
    },
    strictTransportSecurity: { maxAge: 31_536_000, includeSubDomains: true },
    frameguard: { action: 'deny' },
    referrerPolicy: { policy: 'strict-origin-when-cross-origin' },
    crossOriginResourcePolicy: { policy: 'same-origin' },
  });
}

/** Answers of the API are for the one who asked; a route that serves a file says otherwise itself. */
export const noStore: RequestHandler = (_req, res, next) => {
  res.set('Cache-Control', 'no-store');
  next();
};
