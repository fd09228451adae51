import { type Entry } from './entry.ts';
import { anybody } from './people.ts';
import { account } from './routes/account.ts';
import { studios } from './routes/studios.ts';
import { patterns } from './routes/patterns.ts';
import { rows } from './routes/rows.ts';
import { recordings } from './routes/recordings.ts';
import { editions } from './routes/editions.ts';

const house: Record<string, Entry> = {
  'GET /health/live': { expect: anybody(200), ask: () => ({ url: '/health/live' }) },
  'GET /health/ready': { expect: anybody(200), ask: () => ({ url: '/health/ready' }) },
  'GET /count': { expect: anybody(200), ask: () => ({ url: '/count' }) },
  'GET /{*path}': { expect: anybody(200), ask: () => ({ url: '/sign-in' }) },
};

/** The whole table. A route that stands in it twice has its other case behind it in brackets. */
export const ROUTES: Readonly<Record<string, Entry>> = {
  ...house,
  ...account,
  ...studios,
  ...patterns,
  ...rows,
  ...recordings,
  ...editions,
};

/** `GET /w/:code (private)` is about `GET /w/:code`. */
export const routeOf = (entry: string): string => entry.replace(/ \(.*\)$/u, '');
