import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import request from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { buildApp, FROM_OUR_PAGE, type TestApp } from '../support/app.ts';
import { mountedRoutes } from './access/mounted-routes.ts';
import { buildCast, PEOPLE, type Who } from './access/people.ts';
import { type Call } from './access/entry.ts';
import { routeOf, ROUTES } from './access/routes.ts';
import { World } from './access/world.ts';

let at: TestApp;
let world: World;
const webDir = mkdtempSync(path.join(tmpdir(), 'pages-'));

beforeAll(async () => {
  for (const page of ['index.html', 'count.html'])
    writeFileSync(path.join(webDir, page), '<!doctype html><title>Roundelay</title>');
  at = await buildApp({ webDir });
  world = new World(at, await buildCast(at.db));
});
afterAll(async () => {
  await at.close();
  rmSync(webDir, { recursive: true });
});
// Each route stands in minutes of its own, so that calls are not counted together.
beforeEach(() => at.clock.advance(11 * 60_000));

async function headersOf(who: Who): Promise<Record<string, string>> {
  return who === 'nobody' ? { ...FROM_OUR_PAGE } : at.as(world.cast.people[who]);
}

async function ask(who: Who, method: string, call: Call, more: object = {}) {
  const agent = request(at.app);
  const version = call.version === undefined ? {} : { 'If-Match': `"${call.version}"` };
  const body = call.body || Object.keys(more).length > 0 ? { ...call.body, ...more } : undefined;
  const asked = agent[method.toLowerCase() as 'get'](call.url);
  return asked.set({ ...(await headersOf(who)), ...version }).send(body);
}

const statusOf = async (who: Who, method: string, call: Call): Promise<number> =>
  (call.send ? await call.send(await headersOf(who)) : await ask(who, method, call)).status;

const methodOf = (entry: string) => entry.split(' ')[0]!;

test('every route that is mounted stands in the table, and nothing else does', () => {
  const told = new Set(Object.keys(ROUTES).map(routeOf));
  expect([...told].sort()).toEqual(mountedRoutes(at.app));
});

describe('who gets what answer', () => {
  test.each(Object.keys(ROUTES))('%s', { timeout: 60_000 }, async (entry) => {
    const { ask: prepare, expect: expected } = ROUTES[entry]!;
    const got: Partial<Record<Who, number>> = {};
    for (const who of PEOPLE) got[who] = await statusOf(who, methodOf(entry), await prepare(world, who));
    expect(got).toEqual(expected);
  });
});

describe('a body with a field that nobody asked for', () => {
  const writing = Object.keys(ROUTES).filter((entry) => entry.startsWith('P') && !entry.includes('/parts/'));
  test.each(writing)('%s', { timeout: 60_000 }, async (entry) => {
    for (const more of [{ owner_id: 'x' }, { role: 'owner', isOperator: true }, { version: 7 }]) {
      const call = await ROUTES[entry]!.ask(world, 'owner');
      // A call without a body of its own, or with a field of that name, has nothing to be slipped into.
      if (!call.body || Object.keys(more).some((key) => key in call.body!)) continue;
      const res = await ask('owner', methodOf(entry), call, more);
      expect([entry, Object.keys(more), res.status]).toEqual([entry, Object.keys(more), 422]);
    }
  });
});

test('reading changes nothing', { timeout: 180_000 }, async () => {
  // Where calls are counted and when a session was last seen is not what anybody reads.
  const ASIDE = ['rate_limits', 'sessions', 'knex_migrations_lock'];
  const calls: [Who, string][] = [];
  for (const entry of Object.keys(ROUTES).filter((name) => name.startsWith('GET '))) {
    const { url, send } = await ROUTES[entry]!.ask(world, 'owner');
    // A stream that stays open has no end to wait for.
    if (send) continue;
    for (const who of ['nobody', 'viewer', 'owner'] as const) calls.push([who, url]);
  }
  await at.workAll();
  const writes = async () => {
    await at.db.raw('select pg_stat_force_next_flush()');
    await new Promise((resolve) => setTimeout(resolve, 1_500));
    const { rows } = await at.db.raw<{ rows: { relname: string; n: string }[] }>(
      `select relname, n_tup_ins + n_tup_upd + n_tup_del as n from pg_stat_user_tables where schemaname = 'public' order by 1`,
    );
    return rows.filter(({ relname }) => !ASIDE.includes(relname));
  };
  const before = await writes();
  for (const [who, url] of calls) await ask(who, 'GET', { url });
  expect(await writes()).toEqual(before);
});

test('what is somebody else’s is answered like what never was', { timeout: 180_000 }, async () => {
  const hidden = Object.entries(ROUTES).filter(
    ([entry, { expect: e }]) => e['owner of another studio'] === 404 && /:\w+[Ii]d|:code/u.test(entry),
  );
  expect(hidden.length).toBeGreaterThan(40);
  const uuid = /[0-9a-f]{8}-[0-9a-f-]{27}/u;
  for (const [entry, { ask: prepare }] of hidden) {
    const call = await prepare(world, 'owner of another studio');
    if (call.send || !uuid.test(call.url)) continue;
    const nothing = { ...call, url: call.url.replace(uuid, '00000000-0000-4000-8000-000000000000') };
    const bodies = [];
    for (const one of [call, nothing]) {
      const res = await ask('owner of another studio', methodOf(entry), one);
      bodies.push({ status: res.status, type: res.type, ...(res.body as object), instance: '' });
    }
    expect([entry, bodies[0]]).toEqual([entry, bodies[1]]);
  }
});
