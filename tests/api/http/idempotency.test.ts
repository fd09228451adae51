import { setTimeout as wait } from 'node:timers/promises';
import express from 'express';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { idempotent, sweepRequestKeys } from '../../../api/http/idempotency.ts';
import { AppError, problemHandler } from '../../../api/http/problem.ts';
import { readSession } from '../../../api/http/session.ts';
import { buildApp, type TestApp } from '../../support/app.ts';
import { buildPerson } from '../../support/builders.ts';

const HOUR_MS = 3_600_000;

describe('a request sent again with its Idempotency-Key', () => {
  let house: TestApp;
  let door: express.Express;
  let made = 0;

  beforeAll(async () => {
    house = await buildApp();
    door = express();
    door.use(readSession(house.deps), express.json(), idempotent(house.deps));
    door.post('/things', async (req, res) => {
      const { slow, fail } = req.body as { slow?: number; fail?: boolean };
      await wait(slow ?? 0);
      if (fail) throw new AppError('unavailable');
      made += 1;
      res.status(201).set('ETag', '"1"').json({ number: made });
    });
    door.use(problemHandler(house.deps, () => undefined));
  });
  afterAll(() => house.close());

  const post = (key: string, body: object) => request(door).post('/things').set('Idempotency-Key', key).send(body);

  test('is done once and answered alike', async () => {
    const first = await post('once', { a: 1 });
    const again = await post('once', { a: 1 });
    expect(first.status).toBe(201);
    expect([again.status, again.body, again.get('ETag')]).toEqual([201, first.body, '"1"']);
    expect((await post('another', { a: 1 })).body).not.toEqual(first.body);
  });

  test('but with another body is refused', async () => {
    await post('changed', { a: 1 });
    expect((await post('changed', { a: 2 })).status).toBe(422);
  });

  test('while the first is under way is told to wait', async () => {
    const first = post('slow', { slow: 400 }).then((res) => res.status);
    await expect.poll(async () => (await house.db('request_keys').where({ key: 'slow' })).length).toBe(1);
    const meanwhile = await post('slow', { slow: 400 });
    expect([meanwhile.status, meanwhile.get('Retry-After')]).toEqual([409, '1']);
    expect(await first).toBe(201);
  });

  test('after a failure is tried anew', async () => {
    const body = { fail: true };
    expect((await post('failed', body)).status).toBe(503);
    await expect.poll(async () => (await house.db('request_keys').where({ key: 'failed' })).length).toBe(0);
  });

  test('of ten at once is done once', async () => {
    const before = made;
    const statuses = await Promise.all(
      Array.from({ length: 10 }, async () => (await post('ten', { slow: 50 })).status),
    );
    expect(made).toBe(before + 1);
    expect(statuses.every((status) => status === 201 || status === 409)).toBe(true);
  });

  test('by somebody else is another request', async () => {
    const [one, two] = [await house.as(await buildPerson(house.db)), await house.as(await buildPerson(house.db))];
    const first = await post('shared', {}).set(one);
    expect((await post('shared', {}).set(two)).body).not.toEqual(first.body);
  });

  test('is remembered for a day, and no longer', async () => {
    house.clock.stopAt(new Date('2026-05-01T00:00:00Z'));
    const first = await post('day', {});
    house.clock.advance(24 * HOUR_MS - 1_000);
    expect((await post('day', {})).body).toEqual(first.body);
    house.clock.advance(1_000);
    expect((await post('day', {})).body).not.toEqual(first.body);
    house.clock.advance(24 * HOUR_MS);
    await sweepRequestKeys(house.db, house.clock.now());
    expect(await house.db('request_keys').where({ key: 'day' })).toEqual([]);
  });

  test('that died with its process may be made again after a minute', async () => {
    house.clock.stopAt(new Date('2026-06-01T00:00:00Z'));
    await post('lost', {});
    await house.db('request_keys').where({ key: 'lost' }).update({ status: null, answer: null });
    expect((await post('lost', {})).status).toBe(409);
    house.clock.advance(60_000);
    expect((await post('lost', {})).status).toBe(201);
  });

  test('must be a key that can be kept', async () => {
    expect((await post('x'.repeat(201), {})).status).toBe(400);
  });
});
