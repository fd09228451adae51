import { createHash, randomUUID } from 'node:crypto';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { isCommonPassword } from '../../api/features/account/common-passwords.ts';
import { hashPassword } from '../../api/features/account/passwords.ts';
import { ABSOLUTE_MS, IDLE_MS, SESSION_COOKIE } from '../../api/http/session.ts';
import type { OutgoingMail } from '../../api/platform/mail.ts';
import { buildApp, FROM_OUR_PAGE, type TestApp } from '../support/app.ts';

const PASSWORD = 'slow wheat under lamp';
let house: TestApp;
const sent: OutgoingMail[] = [];

beforeAll(async () => {
  const mail = {
    send: (letter: OutgoingMail) => {
      sent.push(letter);
      return Promise.resolve();
    },
    close: () => undefined,
  };
  house = await buildApp({ deps: { mail } });
});
afterAll(() => house.close());

const freshAddress = () => `${randomUUID().slice(0, 8)}@post.example`;
const post = (path: string, body: object, headers: Record<string, string> = {}) =>
  request(house.app)
    .post(`/api${path}`)
    .set({ ...FROM_OUR_PAGE, ...headers })
    .send(body);
const cookieOf = (res: request.Response) => (res.get('Set-Cookie')?.[0] ?? '').split(';')[0] ?? '';
const account = (cookie: string) => request(house.app).get('/api/account').set('Cookie', cookie);

/** The token in the last letter to an address, after all jobs are done. */
async function tokenTo(email: string): Promise<string> {
  await house.workAll();
  const letter = sent.findLast((mail) => mail.to === email);
  return /#([\w-]{43})/.exec(letter?.text ?? '')?.[1] ?? '';
}

async function somebody(name = 'Hanna A.') {
  const email = freshAddress();
  const hash = await hashPassword(PASSWORD);
  const [row] = await house
    .db('people')
    .insert({ email, name, password_hash: hash, email_confirmed_at: new Date() })
    .returning<{ id: string }[]>('id');
  return { id: row!.id, email, name };
}

async function signedInCookie(email: string, password = PASSWORD) {
  const res = await post('/session', { email, password });
  expect(res.status).toBe(200);
  return cookieOf(res);
}

describe('signing up', () => {
  test('an account is there once its letter is answered, and the letter works once', async () => {
    const email = freshAddress();
    const asked = await post('/account', { name: 'Hanna A.', email, password: PASSWORD });
    expect([asked.status, asked.body]).toEqual([202, { sent: true }]);
    expect((await post('/session', { email, password: PASSWORD })).status).toBe(401);

    const token = await tokenTo(email);
    const confirmed = await post('/account/confirm', { token });
    expect([confirmed.status, confirmed.body]).toEqual([200, { email }]);
    expect((await post('/account/confirm', { token })).status).toBe(410);

    const me = await account(await signedInCookie(email));
    expect(me.body).toMatchObject({ name: 'Hanna A.', email, isOperator: false, memberships: [] });
  });

  test('a known address is answered like an unknown one, and its account stays as it was', async () => {
    const known = await somebody();
    const unknown = freshAddress();
    const answers = [];
    for (const email of [known.email, unknown]) {
      const res = await post('/account', { name: 'Other', email, password: 'another long one' });
      answers.push([res.status, res.body]);
    }
    expect(answers[0]).toEqual(answers[1]);
    await house.workAll();
    expect(sent.findLast((mail) => mail.to === known.email)?.subject).toBe('You have an account already');
    await signedInCookie(known.email);
    expect((await house.db('people').where({ id: known.id }).first())?.name).toBe('Hanna A.');
  });

  test('of two who signed up with one address, each letter brings its own password', async () => {
    const email = freshAddress();
    await post('/account', { name: 'First', email, password: 'the first of them' });
    const first = await tokenTo(email);
    await post('/account', { name: 'Second', email, password: 'the second of them' });
    const second = await tokenTo(email);
    expect((await post('/account/confirm', { token: second })).status).toBe(200);
    expect((await post('/account/confirm', { token: first })).status).toBe(409);
    await signedInCookie(email, 'the second of them');
  });

  test('a letter older than two days no longer works', async () => {
    const email = freshAddress();
    await post('/account', { name: 'Late', email, password: PASSWORD });
    const token = await tokenTo(email);
    house.clock.advance(48 * 3_600_000);
    expect((await post('/account/confirm', { token })).status).toBe(410);
    house.clock.advance(-48 * 3_600_000);
  });
});

describe('passwords', () => {
  test.each([
    ['seven letters', 'seven 7', 422],
    ['eight letters of one kind', 'xqzjwvkp', 202],
    ['sixty-four letters', 'q7 '.repeat(22).slice(0, 64), 202],
    ['one of the common ones', 'password', 422],
    ['a common one in capitals', 'QWERTYUIOP', 422],
  ])('%s', async (_what, password, status) => {
    const res = await post('/account', { name: 'A', email: freshAddress(), password });
    expect(res.status).toBe(status);
    if (status === 422) expect(res.body.errors[0]).toMatchObject({ pointer: '#/password' });
  });

  test('a long one counts to its last letter', async () => {
    const email = freshAddress();
    const long = `${'many words in a row '.repeat(8)}end`;
    await house.db('people').insert({
      email,
      name: 'L',
      password_hash: await hashPassword(long),
      email_confirmed_at: new Date(),
    });
    expect((await post('/session', { email, password: `${long.slice(0, -1)}x` })).status).toBe(401);
    await signedInCookie(email, long);
  });

  test('are kept as argon2id with 19 MiB, two passes and one lane', async () => {
    expect(await hashPassword(PASSWORD)).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });

  test('the list of common ones holds what everybody tries and not what somebody thinks up', () => {
    for (const word of ['12345678', 'password1', 'iloveyou', 'sunshine', 'Princess']) {
      expect(isCommonPassword(word), word).toBe(true);
    }
    expect(isCommonPassword(PASSWORD)).toBe(false);
  });
});

describe('signing in', () => {
  test('the cookie cannot be read by a page, sent in clear or from elsewhere, and its token stands in no table', async () => {
    const { email } = await somebody();
    const res = await post('/session', { email, password: PASSWORD });
    const cookie = res.get('Set-Cookie')?.[0] ?? '';
    expect(cookie).toMatch(new RegExp(`^${SESSION_COOKIE}=[\\w-]{43};`));
    expect(SESSION_COOKIE.startsWith('__Host-')).toBe(true);
    for (const part of ['Secure', 'HttpOnly', 'SameSite=Lax', 'Path=/']) expect(cookie).toContain(part);
    const token = cookieOf(res).split('=')[1]!;
    const hashes = (await house.db('sessions').select<{ token_hash: Buffer }[]>('token_hash')).map((r) =>
      r.token_hash.toString('hex'),
    );
    expect(hashes).toContain(createHash('sha256').update(token).digest('hex'));
    expect(hashes).not.toContain(Buffer.from(token).toString('hex'));
    expect(hashes).not.toContain(Buffer.from(token, 'base64url').toString('hex'));
  });

  test('a new sign-in gives a new token and the old one is worth nothing', async () => {
    const { email } = await somebody();
    const first = await signedInCookie(email);
    const again = await post('/session', { email, password: PASSWORD }, { Cookie: first });
    expect(cookieOf(again)).not.toBe(first);
    expect((await account(first)).status).toBe(401);
    expect((await account(cookieOf(again))).status).toBe(200);
  });

  test('a wrong password, an unknown address and a disabled account are answered alike', async () => {
    const known = await somebody();
    const disabled = await somebody();
    await house.db('people').where({ id: disabled.id }).update({ disabled_at: new Date() });
    const tries = [
      { email: known.email, password: 'not this one' },
      { email: freshAddress(), password: PASSWORD },
      { email: disabled.email, password: PASSWORD },
    ];
    const bodies = [];
    for (const body of tries) {
      const res = await post('/session', body);
      expect(res.status).toBe(401);
      expect(res.get('Set-Cookie')).toBeUndefined();
      bodies.push({ ...res.body, instance: '' });
    }
    expect(bodies[1]).toEqual(bodies[0]);
    expect(bodies[2]).toEqual(bodies[0]);
  });

  test('the eleventh try in a minute waits, and after just that long goes on', async () => {
    const { email } = await somebody();
    house.clock.stopAt(new Date());
    for (let n = 0; n < 10; n += 1) {
      expect((await post('/session', { email, password: 'not this one' })).status).toBe(401);
    }
    const refused = await post('/session', { email: email.toUpperCase(), password: PASSWORD });
    expect(refused.status).toBe(429);
    expect((await post('/session', { email: freshAddress(), password: 'x' })).status).toBe(401);
    house.clock.advance(1_000 * Number(refused.get('Retry-After')));
    expect((await post('/session', { email, password: PASSWORD })).status).toBe(200);
  });

  test('coming in and being refused are both on record, without the password', async () => {
    const { id, email } = await somebody();
    await post('/session', { email, password: 'not this one' });
    await signedInCookie(email);
    const deeds = await house.db('audit').where({ person_id: id }).orderBy('id').select('what', 'request_id');
    expect(deeds.map((d: { what: string }) => d.what)).toEqual(['sign-in-refused', 'sign-in']);
    for (const deed of deeds) expect(deed.request_id).not.toBe('');
    const lines = house.logged.map((line) => JSON.parse(line) as Record<string, unknown>);
    const told = lines.filter((line) => line.personId === id && line.msg === 'sign-in tried');
    expect(told.map((line) => line.what)).toEqual(['sign-in-refused', 'sign-in']);
    expect(house.logged.join('')).not.toContain(PASSWORD);
    expect(house.logged.join('')).not.toContain('not this one');
  });

  test('a change from a page of somebody else is refused, and one without any origin too', async () => {
    const { email } = await somebody();
    const body = { email, password: PASSWORD };
    const foreign = [
      { Origin: 'https://elsewhere.example' },
      { 'Sec-Fetch-Site': 'cross-site' },
      { 'Sec-Fetch-Site': 'same-site' },
      {},
    ];
    for (const headers of foreign) {
      const res = await request(house.app).post('/api/session').set(headers).send(body);
      expect(res.status, JSON.stringify(headers)).toBe(403);
      expect(res.get('Set-Cookie')).toBeUndefined();
    }
  });
});

describe('a session', () => {
  test('ends with sign-out, for a copy of the cookie too', async () => {
    const { email } = await somebody();
    const cookie = await signedInCookie(email);
    const out = await request(house.app)
      .delete('/api/session')
      .set({ ...FROM_OUR_PAGE, Cookie: cookie });
    expect(out.status).toBe(204);
    expect((await account(cookie)).status).toBe(401);
    const who = await request(house.app).get('/api/session').set('Cookie', cookie);
    expect([who.status, who.body]).toEqual([200, { person: null }]);
  });

  test('ends everywhere when the account is disabled', async () => {
    const { id, email } = await somebody();
    const cookies = [await signedInCookie(email), await signedInCookie(email)];
    await house.db('people').where({ id }).update({ disabled_at: new Date() });
    for (const cookie of cookies) expect((await account(cookie)).status).toBe(401);
  });

  test('ends after twelve hours without use, and not a second before', async () => {
    const { email } = await somebody();
    house.clock.stopAt(new Date());
    const cookie = await signedInCookie(email);
    house.clock.advance(IDLE_MS - 1_000);
    expect((await account(cookie)).status).toBe(200);
    house.clock.advance(IDLE_MS);
    expect((await account(cookie)).status).toBe(401);
  });

  test('ends after fourteen days, however much it is used, and not a second before', async () => {
    const { email } = await somebody();
    house.clock.stopAt(new Date());
    const cookie = await signedInCookie(email);
    const step = IDLE_MS - 60_000;
    let left = ABSOLUTE_MS - 1_000;
    for (; left > step; left -= step) {
      house.clock.advance(step);
      expect((await account(cookie)).status).toBe(200);
    }
    house.clock.advance(left);
    expect((await account(cookie)).status).toBe(200);
    house.clock.advance(1_000);
    expect((await account(cookie)).status).toBe(401);
  });

  test('elsewhere can be ended from here', async () => {
    const { email } = await somebody();
    const [there, here] = [await signedInCookie(email), await signedInCookie(email)];
    const places = await request(house.app).get('/api/account/sessions').set('Cookie', here);
    expect(places.body).toMatchObject([{ isThis: true }, { isThis: false }]);
    const ended = await request(house.app)
      .delete('/api/account/sessions')
      .set({ ...FROM_OUR_PAGE, Cookie: here });
    expect(ended.status).toBe(204);
    expect((await account(there)).status).toBe(401);
    expect((await account(here)).status).toBe(200);
  });
});

describe('a new password', () => {
  test('signs out the other places, gives this one a new token and is told by letter', async () => {
    const { email } = await somebody();
    const [there, here] = [await signedInCookie(email), await signedInCookie(email)];
    const wrong = await post('/account/password', { current: 'not it', password: 'wheat and water' }, { Cookie: here });
    expect([wrong.status, wrong.body.errors[0].pointer]).toEqual([422, '#/current']);
    const res = await post('/account/password', { current: PASSWORD, password: 'wheat and water' }, { Cookie: here });
    expect(res.status).toBe(204);
    for (const cookie of [there, here]) expect((await account(cookie)).status).toBe(401);
    expect((await account(cookieOf(res))).status).toBe(200);
    await house.workAll();
    expect(sent.findLast((mail) => mail.to === email)?.subject).toBe('Your password was changed');
    await signedInCookie(email, 'wheat and water');
  });

  test('comes by a link that works once, for an hour, and signs out everywhere', async () => {
    const { email } = await somebody();
    const cookie = await signedInCookie(email);
    expect((await post('/account/forgotten', { email })).body).toEqual({ sent: true });
    const token = await tokenTo(email);
    const common = await post('/account/reset', { token, password: 'password123' });
    expect([common.status, common.body.errors[0].pointer]).toEqual([422, '#/password']);
    expect((await post('/account/reset', { token, password: 'three ears of wheat' })).status).toBe(204);
    expect((await post('/account/reset', { token, password: 'four ears of wheat' })).status).toBe(410);
    expect((await account(cookie)).status).toBe(401);
    await signedInCookie(email, 'three ears of wheat');

    await post('/account/forgotten', { email });
    const late = await tokenTo(email);
    house.clock.advance(3_600_000);
    expect((await post('/account/reset', { token: late, password: 'five ears of wheat' })).status).toBe(410);
    house.clock.advance(-3_600_000);
  });

  test('asked for an unknown address is answered alike and sends nothing', async () => {
    const known = await somebody();
    const before = sent.length;
    const unknown = await post('/account/forgotten', { email: freshAddress() });
    await house.workAll();
    expect(sent.length).toBe(before);
    const res = await post('/account/forgotten', { email: known.email });
    expect([unknown.status, unknown.body]).toEqual([res.status, res.body]);
  });
});

test('a name is changed by the one who read it last; another is told to look again', async () => {
  const person = await somebody();
  const headers = { ...(await house.as(person)), 'If-Match': '"1"' };
  const rename = (name: string) => request(house.app).patch('/api/account').set(headers).send({ name });
  const first = await rename('Hanna B.');
  expect([first.status, first.get('ETag')]).toEqual([200, '"2"']);
  const second = await rename('Hanna C.');
  expect(second.status).toBe(412);
  expect(second.body.current).toMatchObject({ name: 'Hanna B.', version: 2 });
  const blind = await request(house.app)
    .patch('/api/account')
    .set(await house.as(person))
    .send({ name: 'Hanna D.' });
  expect(blind.status).toBe(428);
});
