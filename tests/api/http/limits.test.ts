import express from 'express';
import request from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { CREATING, limit, READS, sweepLimits, WRITES, type Limit } from '../../../api/http/limits.ts';
import { problemHandler } from '../../../api/http/problem.ts';
import { readSession } from '../../../api/http/session.ts';
import { buildApp, type TestApp } from '../../support/app.ts';
import { buildPerson } from '../../support/builders.ts';

describe('limits', () => {
  let house: TestApp;
  beforeAll(async () => {
    house = await buildApp();
  });
  beforeEach(() => house.db('rate_limits').delete());
  afterAll(() => house.close());

  /** One process among several on the same database. */
  function door(rule: Limit, trustedProxies = 0): express.Express {
    const app = express();
    app.set('trust proxy', trustedProxies);
    app.use(readSession(house.deps), limit(house.deps, rule));
    app.get('/', (_req, res) => {
      res.json({});
    });
    app.use(problemHandler(house.deps, () => undefined));
    return app;
  }
  const times = async (n: number, call: () => PromiseLike<{ status: number }>) => {
    const statuses: number[] = [];
    for (let i = 0; i < n; i += 1) statuses.push((await call()).status);
    return statuses;
  };

  test('are those that were promised', () => {
    expect([READS.max, WRITES.max, CREATING.max]).toEqual([1_000, 100, 25]);
    expect([READS.perMs, WRITES.perMs, CREATING.perMs]).toEqual([60_000, 60_000, 60_000]);
  });

  test('let n calls through and tell the next how long to wait, which is then enough', async () => {
    house.clock.stopAt(new Date('2026-03-01T08:00:00Z'));
    const app = door(CREATING);
    expect(await times(25, () => request(app).get('/'))).toEqual(Array(25).fill(200));
    house.clock.advance(20_500);
    const refused = await request(app).get('/');
    expect(refused.status).toBe(429);
    expect(refused.get('Retry-After')).toBe('40');
    expect(refused.body).toMatchObject({ type: '/problems/rate-limited', retryAfter: 40 });
    house.clock.advance(39_000);
    expect((await request(app).get('/')).status).toBe(429);
    house.clock.advance(1_000);
    expect((await request(app).get('/')).status).toBe(200);
  });

  test('hold for all processes together', async () => {
    const [one, two] = [door({ name: 'both', max: 4, perMs: 60_000 }), door({ name: 'both', max: 4, perMs: 60_000 })];
    expect(await times(3, () => request(one).get('/'))).toEqual([200, 200, 200]);
    expect(await times(2, () => request(two).get('/'))).toEqual([200, 429]);
    expect((await request(one).get('/')).status).toBe(429);
  });

  test('count a person by their session and strangers by their address', async () => {
    const app = door({ name: 'who', max: 1, perMs: 60_000 });
    const [first, second] = [await house.as(await buildPerson(house.db)), await house.as(await buildPerson(house.db))];
    expect(await times(2, () => request(app).get('/').set(first))).toEqual([200, 429]);
    expect(await times(2, () => request(app).get('/').set(second))).toEqual([200, 429]);
    expect(await times(2, () => request(app).get('/'))).toEqual([200, 429]);
  });

  test('are not got round with a made-up X-Forwarded-For', async () => {
    const rule = { name: 'forged', max: 1, perMs: 60_000 };
    let n = 0;
    const forged = (app: express.Express) => () =>
      request(app)
        .get('/')
        .set('X-Forwarded-For', `10.0.0.${(n += 1)}`);
    expect(await times(3, forged(door(rule)))).toEqual([200, 429, 429]);
    // Behind one trusted proxy only what that proxy has added counts.
    const behind = door({ ...rule, name: 'behind' }, 1);
    const through = (client: string) =>
      request(behind)
        .get('/')
        .set('X-Forwarded-For', `10.1.1.${(n += 1)}, ${client}`);
    expect((await through('203.0.113.5')).status).toBe(200);
    expect((await through('203.0.113.5')).status).toBe(429);
    expect((await through('203.0.113.6')).status).toBe(200);
  });

  test('may count by something else, as the account that is tried', async () => {
    const app = door({ name: 'account', max: 1, perMs: 60_000, by: (req) => req.query.account as string });
    expect(await times(2, () => request(app).get('/?account=a'))).toEqual([200, 429]);
    expect((await request(app).get('/?account=b')).status).toBe(200);
  });

  test('are exact when many come at once', async () => {
    const app = door({ name: 'crowd', max: 5, perMs: 60_000 });
    const statuses = await Promise.all(Array.from({ length: 12 }, async () => (await request(app).get('/')).status));
    expect(statuses.filter((status) => status === 200)).toHaveLength(5);
  });

  test('keep no address in the table, and ended windows are swept', async () => {
    house.clock.stopAt(new Date('2026-03-01T08:00:00Z'));
    await request(door({ name: 'swept', max: 1, perMs: 1_000 })).get('/');
    expect(JSON.stringify(await house.db('rate_limits'))).not.toMatch(/127\.0\.0\.1/);
    house.clock.advance(1_000);
    await sweepLimits(house.db, house.clock.now());
    expect(await house.db('rate_limits')).toEqual([]);
  });

  test('stand before every call of the API', async () => {
    const headers = await house.as(await buildPerson(house.db));
    await request(house.app).get('/api/nothing').set(headers);
    await request(house.app).post('/api/nothing').set(headers);
    expect(await house.db('rate_limits')).toHaveLength(2);
  });
});
