import { createHash } from 'node:crypto';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import express from 'express';
import {
  ABSOLUTE_MS,
  createSession,
  endSession,
  endSessionsOf,
  IDLE_MS,
  readSession,
  SESSION_COOKIE,
  signedIn,
  startSession,
  sweepSessions,
} from '../../../api/http/session.ts';
import { problemHandler } from '../../../api/http/problem.ts';
import { buildApp, type TestApp } from '../../support/app.ts';
import { addMember, buildHouse, buildPerson } from '../../support/builders.ts';

describe('a session', () => {
  let house: TestApp;
  let door: express.Express;

  beforeAll(async () => {
    house = await buildApp();
    door = express();
    door.use(readSession(house.deps));
    door.post('/in/:personId', async (req, res) => {
      await startSession(house.deps, req, res, req.params.personId);
      res.json({});
    });
    door.post('/out', async (req, res) => {
      await endSession(house.deps, req, res);
      res.json({});
    });
    door.get('/me', (req, res) => {
      res.json(signedIn(req));
    });
    door.use(problemHandler(house.deps, () => undefined));
  });
  afterAll(() => house.close());

  const cookieFor = async (personId: string) =>
    `${SESSION_COOKIE}=${await createSession(house.deps, personId, 'a browser')}`;
  const me = (cookie: string) => request(door).get('/me').set('Cookie', cookie);

  test('is a cookie that only our host, only over TLS and no script can read', async () => {
    const person = await buildPerson(house.db);
    const res = await request(door).post(`/in/${person.id}`);
    const [cookie = ''] = res.get('Set-Cookie') ?? [];
    expect(cookie).toMatch(/^__Host-roundelay=[\w-]{43}; /);
    for (const part of ['Path=/', 'HttpOnly', 'Secure', 'SameSite=Lax', 'Max-Age=1209600'])
      expect(cookie).toContain(part);
    expect(cookie).not.toContain('Domain');
  });

  test('is stored only as the hash of its token', async () => {
    const person = await buildPerson(house.db);
    const token = await createSession(house.deps, person.id);
    const rows = await house.db('sessions').where({ person_id: person.id });
    expect(rows[0].token_hash).toEqual(createHash('sha256').update(token).digest());
    expect(JSON.stringify(rows)).not.toContain(token);
  });

  test('begun anew ends the one before, also for a copy of its cookie', async () => {
    const person = await buildPerson(house.db);
    const old = await cookieFor(person.id);
    const res = await request(door).post(`/in/${person.id}`).set('Cookie', old);
    const fresh = (res.get('Set-Cookie') ?? [])[0]?.split(';')[0] ?? '';
    expect((await me(old)).status).toBe(401);
    expect((await me(fresh)).body).toMatchObject({ id: person.id });
  });

  test('that was signed out is worth nothing, also as a copy', async () => {
    const cookie = await cookieFor((await buildPerson(house.db)).id);
    const res = await request(door).post('/out').set('Cookie', cookie);
    expect((res.get('Set-Cookie') ?? [])[0]).toContain('Max-Age=0');
    const after = await me(cookie);
    expect(after.status).toBe(401);
    expect(after.body).toMatchObject({ type: '/problems/signed-out', status: 401 });
  });

  test('of somebody whose account was closed ends at once', async () => {
    const person = await buildPerson(house.db);
    const cookie = await cookieFor(person.id);
    await house.db('people').where({ id: person.id }).update({ disabled_at: house.clock.now() });
    expect((await me(cookie)).status).toBe(401);
  });

  test('can be kept while all the others of a person end', async () => {
    const person = await buildPerson(house.db);
    const [kept, other] = [await createSession(house.deps, person.id), await createSession(house.deps, person.id)];
    await endSessionsOf(house.db, person.id, createHash('sha256').update(kept).digest('hex'));
    expect((await me(`${SESSION_COOKIE}=${kept}`)).status).toBe(200);
    expect((await me(`${SESSION_COOKIE}=${other}`)).status).toBe(401);
  });

  test('ends after twelve hours without use, and not a second before', async () => {
    house.clock.stopAt(new Date('2026-03-01T08:00:00Z'));
    const cookie = await cookieFor((await buildPerson(house.db)).id);
    house.clock.advance(IDLE_MS - 1_000);
    expect((await me(cookie)).status).toBe(200);
    house.clock.advance(IDLE_MS - 1_000);
    expect((await me(cookie)).status).toBe(200);
    house.clock.advance(IDLE_MS + 1_000);
    expect((await me(cookie)).status).toBe(401);
  });

  test('ends after fourteen days, however much it is used', async () => {
    house.clock.stopAt(new Date('2026-03-01T08:00:00Z'));
    const cookie = await cookieFor((await buildPerson(house.db)).id);
    const step = IDLE_MS / 2;
    for (let at = step; at < ABSOLUTE_MS; at += step) {
      house.clock.advance(step);
      expect((await me(cookie)).status).toBe(200);
    }
    house.clock.advance(step - 1_000);
    expect((await me(cookie)).status).toBe(200);
    house.clock.advance(2_000);
    expect((await me(cookie)).status).toBe(401);
  });

  test('that has ended is swept, and no other', async () => {
    house.clock.stopAt(new Date('2027-03-01T08:00:00Z'));
    const person = await buildPerson(house.db);
    await cookieFor(person.id);
    house.clock.advance(IDLE_MS);
    const fresh = await cookieFor(person.id);
    await sweepSessions(house.db, house.clock.now());
    expect((await house.db('sessions').where({ person_id: person.id })).length).toBe(1);
    expect((await me(fresh)).status).toBe(200);
  });

  test('knows the roles its person has now, not those they had when it began', async () => {
    const { studio, editor } = await buildHouse(house.db);
    const cookie = await cookieFor(editor.id);
    expect((await me(cookie)).body.memberships).toEqual([{ studioId: studio.id, role: 'editor' }]);
    await house.db('members').where({ person_id: editor.id }).update({ left_at: house.clock.now() });
    expect((await me(cookie)).body.memberships).toEqual([]);
    const newcomer = await buildPerson(house.db);
    await addMember(house.db, studio.id, newcomer.id, 'creator');
    expect((await me(await cookieFor(newcomer.id))).body.memberships).toEqual([
      { studioId: studio.id, role: 'creator' },
    ]);
  });

  test.each(['', 'short', 'x'.repeat(43), "' or 1=1 --"])('of the made-up token %j is none', async (token) => {
    expect((await me(`${SESSION_COOKIE}=${encodeURIComponent(token)}`)).status).toBe(401);
  });
});
