import { randomUUID } from 'node:crypto';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { OutgoingMail } from '../../api/platform/mail.ts';
import { buildApp, FROM_OUR_PAGE, type TestApp } from '../support/app.ts';
import { addMember, buildHouse, buildPerson, type Household, type PersonRow } from '../support/builders.ts';

let house: TestApp;
let loft: Household;
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
  loft = await buildHouse(house.db);
});
afterAll(() => house.close());

type Method = 'get' | 'post' | 'patch' | 'delete';
async function call(who: { id: string } | null, method: Method, path: string, body?: object, version?: number) {
  const agent = request(house.app);
  const headers = { ...(who ? await house.as(who) : FROM_OUR_PAGE), ...(version && { 'If-Match': `"${version}"` }) };
  return agent[method](`/api${path}`).set(headers).send(body);
}
const people = (who: { id: string }) => call(who, 'get', `/studios/${loft.studio.id}/members`);

async function tokenTo(email: string): Promise<string> {
  await house.workAll();
  const letter = sent.findLast((mail) => mail.to === email);
  return /#([\w-]{43})/.exec(letter?.text ?? '')?.[1] ?? '';
}

async function invited(email: string, role = 'editor'): Promise<string> {
  const res = await call(loft.owner, 'post', `/studios/${loft.studio.id}/invitations`, { email, role });
  expect(res.status).toBe(201);
  return tokenTo(email);
}

describe('opening a studio', () => {
  test('makes the person its owner, with an address made of its name', async () => {
    const who = await buildPerson(house.db);
    const opened = await call(who, 'post', '/studios', { name: 'Café Håkla & daughters' });
    expect(opened.status).toBe(201);
    expect(opened.body).toMatchObject({ slug: 'cafe-hakla-daughters', role: 'owner', usedBytes: 0, version: 1 });
    expect(opened.body.quotaBytes).toBe(50_000_000_000);
    const second = await call(who, 'post', '/studios', { name: 'Café Håkla & daughters' });
    expect(second.body.slug).toBe('cafe-hakla-daughters-2');
    const mine = await call(who, 'get', '/studios');
    expect(mine.body).toMatchObject([{ id: opened.body.id }, { id: second.body.id }]);
    const me = await call(who, 'get', '/account');
    expect(me.body.memberships).toHaveLength(2);
  });

  test('with an unknown field or no name is refused, and no studio is there', async () => {
    const who = await buildPerson(house.db);
    for (const body of [{ name: 'Loft', quotaBytes: 1 }, { name: '  ' }, {}]) {
      expect((await call(who, 'post', '/studios', body)).status).toBe(422);
    }
    expect((await call(who, 'get', '/studios')).body).toEqual([]);
  });
});

describe('settings', () => {
  test('are saved by an owner who read them last; the next is shown what stands now', async () => {
    const path = `/studios/${loft.studio.id}`;
    const saved = await call(loft.owner, 'patch', path, { foot: 'Make it, say whose it is.', paper: 'Letter' }, 1);
    expect([saved.status, saved.get('ETag')]).toEqual([200, '"2"']);
    const stale = await call(loft.owner, 'patch', path, { foot: 'Another foot' }, 1);
    expect(stale.status).toBe(412);
    expect(stale.body.current).toMatchObject({ foot: 'Make it, say whose it is.', paper: 'Letter', version: 2 });
    expect((await call(loft.owner, 'patch', path, { foot: 'x' })).status).toBe(428);
    expect((await call(loft.owner, 'patch', path, {}, 2)).status).toBe(422);
    expect((await call(loft.editor, 'patch', path, { foot: 'x' }, 2)).status).toBe(403);
  });

  test('of two owners who save at once, one is told to look again', async () => {
    const path = `/studios/${loft.studio.id}`;
    for (let n = 0; n < 10; n += 1) {
      const { version } = (await call(loft.owner, 'get', path)).body as { version: number };
      const save = (foot: string) => call(loft.owner, 'patch', path, { foot }, version);
      const answers = await Promise.all([save('one'), save('two')]);
      expect(answers.map((a) => a.status).sort()).toEqual([200, 412]);
    }
  });

  test('a studio of others is answered like an id that never was', async () => {
    const others = await buildHouse(house.db);
    const bodies = [];
    for (const id of [loft.studio.id, randomUUID(), 'no-id']) {
      for (const [method, path, body, version] of [
        ['get', `/studios/${id}`],
        ['get', `/studios/${id}/members`],
        ['patch', `/studios/${id}`, { foot: 'x' }, 1],
        ['post', `/studios/${id}/invitations`, { email: 'a@b.example', role: 'editor' }],
        ['delete', `/studios/${id}/members/${loft.owner.id}`],
      ] as const) {
        const res = await call(others.owner, method, path, body, version);
        bodies.push({ ...res.body, instance: '' });
      }
    }
    expect(new Set(bodies.map((b) => JSON.stringify(b))).size).toBe(1);
    expect(bodies[0]).toMatchObject({ status: 404 });
  });
});

describe('an invitation', () => {
  test('lets somebody with an account in, once, under the role it names', async () => {
    const guest = await buildPerson(house.db);
    const token = await invited(guest.email);
    const look = await call(null, 'post', '/invitations/look', { token });
    expect(look.body).toEqual({
      studioName: loft.studio.name,
      role: 'editor',
      email: guest.email,
      askedBy: loft.owner.name,
      isKnown: true,
    });
    expect((await call(guest, 'get', `/studios/${loft.studio.id}`)).status).toBe(404);
    const accepted = await call(guest, 'post', '/invitations/accept', { token });
    expect(accepted.body).toEqual({ studioId: loft.studio.id, role: 'editor' });
    expect((await call(guest, 'get', `/studios/${loft.studio.id}`)).body.role).toBe('editor');
    expect((await call(guest, 'post', '/invitations/accept', { token })).status).toBe(410);
  });

  test('of somebody else is refused and still there for the one it went to', async () => {
    const guest = await buildPerson(house.db);
    const token = await invited(guest.email);
    const stranger = await buildPerson(house.db);
    const refused = await call(stranger, 'post', '/invitations/accept', { token });
    expect(refused.status).toBe(403);
    expect(refused.body.detail).toContain(guest.email);
    expect((await call(guest, 'post', '/invitations/accept', { token })).status).toBe(200);
  });

  test('makes an account for somebody without one, whose address it has proved', async () => {
    const email = `${randomUUID().slice(0, 8)}@post.example`;
    const token = await invited(email, 'creator');
    const common = await call(null, 'post', '/invitations/join', { token, name: 'Odile R.', password: 'password1' });
    expect(common.status).toBe(422);
    const joined = await call(null, 'post', '/invitations/join', {
      token,
      name: 'Odile R.',
      password: 'wheat and water',
    });
    expect([joined.status, joined.body.role]).toEqual([201, 'creator']);
    const cookie = (joined.get('Set-Cookie')?.[0] ?? '').split(';')[0]!;
    const me = await request(house.app).get('/api/account').set('Cookie', cookie);
    expect(me.body).toMatchObject({ email, name: 'Odile R.', memberships: [{ role: 'creator' }] });
    expect(me.body.emailConfirmedAt).not.toBeNull();
  });

  test('lasts seven days, can be taken back, and a newer one takes the place of an older', async () => {
    const guest = await buildPerson(house.db);
    const first = await invited(guest.email);
    const second = await invited(guest.email, 'creator');
    expect((await call(null, 'post', '/invitations/look', { token: first })).status).toBe(410);
    house.clock.advance(7 * 24 * 3_600_000);
    expect((await call(null, 'post', '/invitations/look', { token: second })).status).toBe(410);
    house.clock.advance(-1_000);
    expect((await call(null, 'post', '/invitations/look', { token: second })).status).toBe(200);
    const open = (await people(loft.owner)).body.invitations as { id: string; email: string }[];
    const mine = open.find((i) => i.email === guest.email)!;
    const path = `/studios/${loft.studio.id}/invitations/${mine.id}`;
    expect((await call(loft.editor, 'delete', path)).status).toBe(403);
    expect((await call(loft.owner, 'delete', path)).status).toBe(204);
    expect((await call(loft.owner, 'delete', path)).status).toBe(404);
    expect((await call(null, 'post', '/invitations/look', { token: second })).status).toBe(410);
    house.clock.advance(1_000 - 7 * 24 * 3_600_000);
  });

  test('to a member is refused at the field, and members who are not owners see none', async () => {
    const res = await call(loft.owner, 'post', `/studios/${loft.studio.id}/invitations`, {
      email: loft.editor.email.toUpperCase(),
      role: 'creator',
    });
    expect([res.status, res.body.errors[0].pointer]).toEqual([422, '#/email']);
    await invited(`${randomUUID().slice(0, 8)}@post.example`);
    expect((await people(loft.editor)).body.invitations).toEqual([]);
    expect((await people(loft.owner)).body.invitations.length).toBeGreaterThan(0);
  });
});

describe('members', () => {
  async function newMember(role: 'owner' | 'creator' | 'editor'): Promise<PersonRow> {
    const person = await buildPerson(house.db);
    await addMember(house.db, loft.studio.id, person.id, role);
    return person;
  }
  const member = (id: string) => `/studios/${loft.studio.id}/members/${id}`;

  test('get another role from their very next request on', async () => {
    const person = await newMember('owner');
    const headers = await house.as(person);
    const rename = () =>
      request(house.app)
        .patch(`/api/studios/${loft.studio.id}`)
        .set({ ...headers, 'If-Match': '"0"' })
        .send({ head: 'x' });
    expect((await rename()).status).toBe(412);
    expect((await call(loft.owner, 'patch', member(person.id), { role: 'editor' })).status).toBe(204);
    expect((await rename()).status).toBe(403);
  });

  test('who are let go are refused at their very next request, and keep their row', async () => {
    const person = await newMember('creator');
    const headers = await house.as(person);
    const look = () => request(house.app).get(`/api/studios/${loft.studio.id}`).set(headers);
    expect((await look()).status).toBe(200);
    expect((await call(loft.editor, 'delete', member(person.id))).status).toBe(403);
    expect((await call(loft.owner, 'delete', member(person.id))).status).toBe(204);
    expect((await look()).status).toBe(404);
    const row = await house.db('members').where({ studio_id: loft.studio.id, person_id: person.id }).first();
    expect(row.left_at).not.toBeNull();
    expect((await call(loft.owner, 'delete', member(person.id))).status).toBe(404);
  });

  test('may leave by themselves, but not the last owner', async () => {
    const person = await newMember('editor');
    expect((await call(person, 'delete', member(person.id))).status).toBe(204);
    expect((await call(loft.owner, 'delete', member(loft.owner.id))).status).toBe(409);
    expect((await call(loft.owner, 'patch', member(loft.owner.id), { role: 'editor' })).status).toBe(409);
    expect((await call(loft.owner, 'get', `/studios/${loft.studio.id}`)).body.role).toBe('owner');
  });

  test('of two owners who leave at once, one stays', async () => {
    const both = await buildHouse(house.db);
    const second = await buildPerson(house.db);
    await addMember(house.db, both.studio.id, second.id, 'owner');
    const leave = (who: PersonRow) => call(who, 'delete', `/studios/${both.studio.id}/members/${who.id}`);
    const answers = await Promise.all([leave(both.owner), leave(second)]);
    expect(answers.map((a) => a.status).sort()).toEqual([204, 409]);
  });

  test('who was given which right is on record', async () => {
    const person = await newMember('editor');
    await call(loft.owner, 'patch', member(person.id), { role: 'creator' });
    await call(loft.owner, 'delete', member(person.id));
    const deeds = await house
      .db('audit')
      .where('target', 'like', `%${person.id}`)
      .orderBy('id')
      .select<{ person_id: string; what: string }[]>('person_id', 'what');
    expect(deeds.map((d) => [d.person_id, d.what])).toEqual([
      [loft.owner.id, 'member-made-creator'],
      [loft.owner.id, 'member-removed'],
    ]);
  });
});
