import express from 'express';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { z } from 'zod';
import { ifMatchVersion, sendVersioned } from '../../../api/http/preconditions.ts';
import { answer, AppError, problemHandler } from '../../../api/http/problem.ts';
import { accessLog, requestId } from '../../../api/http/request-id.ts';
import { sameOrigin } from '../../../api/http/same-origin.ts';
import { openDatabase } from '../../../api/platform/database.ts';
import { StorageDown } from '../../../api/platform/storage.ts';
import { buildApp, FROM_OUR_PAGE, type TestApp } from '../../support/app.ts';
import { buildPerson } from '../../support/builders.ts';

describe('answers', () => {
  let house: TestApp;
  let door: express.Express;

  beforeAll(async () => {
    house = await buildApp();
    const { deps } = house;
    door = express();
    door.use(
      requestId,
      accessLog(deps, () => undefined),
      sameOrigin(deps),
      express.json(),
    );
    door.get('/bug', () => {
      throw new TypeError('select * from people at /srv/secret/place.ts');
    });
    door.get('/slow', async () => {
      const db = openDatabase({ url: house.url, pool: 2 }, { statementTimeoutMs: 100 });
      try {
        await db.raw('select pg_sleep(3)');
      } finally {
        await db.destroy();
      }
    });
    door.get('/no-storage', () => {
      throw new StorageDown('s3.internal refused');
    });
    door.get('/twice', async () => {
      const person = await buildPerson(deps.db);
      await buildPerson(deps.db, { email: person.email });
    });
    door.get('/refused', () => {
      throw new AppError('forbidden', 'Only an owner may do this.');
    });
    door.post('/body', (req, res) => {
      res.json(z.strictObject({ title: z.string().min(1), size: z.int() }).parse(req.body));
    });
    door.get('/leak', (_req, res) => {
      res.json(answer(z.object({ id: z.string() }), { id: 'a', password_hash: 'x' }));
    });
    door.get('/unfit', (_req, res) => {
      res.json(answer(z.object({ id: z.string() }), { id: 7 }));
    });
    door.patch('/row', (req, res) => sendVersioned(res, { was: ifMatchVersion(req) }, ifMatchVersion(req) + 1));
    door.use(problemHandler(deps, () => undefined));
  });
  afterAll(() => house.close());

  const linesOf = (id: string | undefined) =>
    house.logged.map((line) => JSON.parse(line) as Record<string, unknown>).filter((line) => line.requestId === id);

  test('to a fault of ours tell nothing but a number to find it by', async () => {
    const res = await request(door).get('/bug');
    expect(res.status).toBe(500);
    expect(res.type).toBe('application/problem+json');
    const id = res.get('X-Request-Id');
    expect(res.body).toEqual({
      type: '/problems/internal',
      title: 'Something went wrong on our side',
      status: 500,
      instance: `urn:request:${id}`,
    });
    const failed = linesOf(id).find((line) => line.level === 'error');
    expect(JSON.stringify(failed)).toContain('/srv/secret/place.ts');
  });

  test.each([
    ['/slow', 503, 'unavailable'],
    ['/no-storage', 503, 'storage-down'],
    ['/twice', 409, 'conflict'],
    ['/refused', 403, 'forbidden'],
    ['/unfit', 500, 'internal'],
  ])('to %s are %i, %s', async (path, status, kind) => {
    const res = await request(door).get(path);
    expect(res.status).toBe(status);
    expect(res.body).toMatchObject({ type: `/problems/${kind}`, status });
    expect(JSON.stringify(res.body)).not.toMatch(/select|insert|internal refused|pg_|stack/);
  });

  test('name every field at fault by its place', async () => {
    const res = await request(door).post('/body').set(FROM_OUR_PAGE).send({ title: '', size: 1.5, owner_id: 'me' });
    expect(res.status).toBe(422);
    const pointers = (res.body as { errors: { pointer: string }[] }).errors.map(({ pointer }) => pointer);
    expect(pointers.toSorted()).toEqual(['#/', '#/size', '#/title']);
  });

  test('refuse a body that is no JSON, and one in an encoding that nobody reads', async () => {
    const post = () => request(door).post('/body').set(FROM_OUR_PAGE).set('Content-Type', 'application/json');
    expect((await post().send('{')).status).toBe(400);
    expect((await post().set('Content-Encoding', 'odd').send('{}')).status).toBe(415);
    const long = await request(house.app)
      .post('/api/nothing')
      .set(FROM_OUR_PAGE)
      .send({ text: 'x'.repeat(2 << 20) });
    expect(long.status).toBe(413);
    expect(long.body).toMatchObject({ type: '/problems/too-large' });
  });

  test('hold only what the contract names', async () => {
    expect((await request(door).get('/leak')).body).toEqual({ id: 'a' });
  });

  test.each([
    [undefined, 428],
    ['"3"', 200],
    ['3', 400],
    ['*', 400],
    ['W/"3"', 400],
    ['"3", "4"', 400],
  ])('to a write with If-Match %s are %i', async (version, status) => {
    const call = request(door).patch('/row').set(FROM_OUR_PAGE);
    const res = await (version === undefined ? call : call.set('If-Match', version));
    expect(res.status).toBe(status);
    if (status === 200) expect(res.get('ETag')).toBe('"4"');
  });

  test.each([
    ['nothing', {}, 403],
    ['our page', { 'Sec-Fetch-Site': 'same-origin' }, 422],
    ['another site', { 'Sec-Fetch-Site': 'cross-site' }, 403],
    ['a sister site', { 'Sec-Fetch-Site': 'same-site' }, 403],
    ['an address typed in', { 'Sec-Fetch-Site': 'none' }, 403],
    ['our origin', { Origin: 'http://127.0.0.1:4300' }, 422],
    ['a foreign origin', { Origin: 'https://elsewhere.example' }, 403],
    [
      'a foreign origin that says it is ours',
      { 'Sec-Fetch-Site': 'same-origin', Origin: 'https://elsewhere.example' },
      403,
    ],
    ['no origin at all', { Origin: 'null' }, 403],
  ])('to a change that comes from %s (%o) are %i', async (_what, headers, status) => {
    const res = await request(door).post('/body').set(headers).send({});
    expect(res.status).toBe(status);
  });

  test('keep the id of a caller who gives a tame one, and no other', async () => {
    expect((await request(door).get('/refused').set('X-Request-Id', 'abc-1.2_3')).get('X-Request-Id')).toBe(
      'abc-1.2_3',
    );
    for (const wild of ['a b', 'x'.repeat(65), '{"level":"fatal"}', '<script>']) {
      expect((await request(door).get('/refused').set('X-Request-Id', wild)).get('X-Request-Id')).toMatch(
        /^[0-9a-f-]{36}$/,
      );
    }
  });

  test('are logged in lines of JSON under one id, refusals with who and what', async () => {
    const person = await buildPerson(house.db);
    const res = await request(house.app)
      .get('/api/nothing%0d%0a{"level":"fatal"}')
      .set(await house.as(person));
    const lines = linesOf(res.get('X-Request-Id'));
    expect(lines.map((line) => line.msg)).toEqual(['request refused', 'answered']);
    for (const line of lines) {
      expect(line).toMatchObject({ personId: person.id, method: 'GET' });
      expect(line.time).toMatch(/^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z$/);
    }
    expect(house.logged.every((line) => line.endsWith('\n') && line.trimEnd().split('\n').length === 1)).toBe(true);
  });

  test('leave no password, cookie or key in the log', async () => {
    const person = await buildPerson(house.db);
    const headers = await house.as(person);
    const secret = 'a-very-secret-word';
    await request(house.app).get(`/api/nothing?token=${secret}`).set(headers);
    await request(house.app).post('/api/session').set(FROM_OUR_PAGE).send({ email: person.email, password: secret });
    house.deps.log.info(
      { password: secret, body: { token: secret }, req: { headers: { cookie: headers.Cookie } } },
      'all of it',
    );
    const all = house.logged.join('');
    expect(all).not.toContain(secret);
    expect(all).not.toContain(headers.Cookie.split('=')[1]);
  });

  test.each(['/', '/count', '/api/nothing', '/health/live', '/assets/nothing.js'])(
    'at %s carry the safe headers',
    async (path) => {
      const res = await request(house.app).get(path);
      const csp = res.get('Content-Security-Policy') ?? '';
      for (const rule of ["object-src 'none'", "base-uri 'none'", "frame-ancestors 'none'", "default-src 'self'"]) {
        expect(csp).toContain(rule);
      }
      expect(csp).not.toMatch(/script-src[^;]*unsafe/);
      expect(res.get('Strict-Transport-Security')).toBe('max-age=31536000; includeSubDomains');
      expect(res.get('X-Content-Type-Options')).toBe('nosniff');
      expect(res.get('Referrer-Policy')).toBe('strict-origin-when-cross-origin');
      expect(res.get('X-Powered-By')).toBeUndefined();
      expect(res.get('X-Request-Id')).toMatch(/^[0-9a-f-]{36}$/);
      if (path.startsWith('/api')) expect(res.get('Cache-Control')).toBe('no-store');
    },
  );
});
