import path from 'node:path';
import express, { Router, type Response } from 'express';
import { PROJECT_ROOT } from '../platform/project-root.ts';

export const WEB_DIR = path.join(PROJECT_ROOT, 'dist/web');

/** The count page's promise, kept by the browser itself: nothing that is written there can be sent anywhere. */
const sealed = (res: Response): string =>
  String(res.getHeader('Content-Security-Policy'))
    .replace(/connect-src [^;]*/, "connect-src 'none'")
    .replace(/form-action [^;]*/, "form-action 'none'");

/**
 * The built pages. Files under /assets carry a hash of what is in them and never change; every other address that
 * asks for a page gets the one page of the app, which finds its way by the address itself.
 */
export function webPages(dir = WEB_DIR): Router {
  const router = Router();
  router.use('/assets', express.static(path.join(dir, 'assets'), { immutable: true, maxAge: '365d', index: false }));
  router.use('/assets', (_req, res) => {
    res.status(404).type('text/plain').send('There is no such file.\n');
  });
  router.get('/count', (_req, res) => {
    res
      .set('Cache-Control', 'no-cache')
      .set('Content-Security-Policy', sealed(res))
      .sendFile('count.html', { root: dir });
  });
  router.use(
    express.static(dir, {
      index: false,
      dotfiles: 'ignore',
      setHeaders: (res) => res.setHeader('Cache-Control', 'no-cache'),
    }),
  );
  router.get('/{*path}', (_req, res) => {
    res.set('Cache-Control', 'no-cache').sendFile('index.html', { root: dir });
  });
  return router;
}
