import { randomUUID } from 'node:crypto';
import request from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { buildApp, type TestApp } from '../support/app.ts';
import { buildHouse, buildPattern, buildPerson, type Household } from '../support/builders.ts';

interface Answer {
  id: string;
  number: number;
  title: string;
  version: number;
  publicUrl: string | null;
  publicOffsetMs: number;
}

describe('the recordings of a pattern', () => {
  let at: TestApp;
  let house: Household;
  let creator: Awaited<ReturnType<TestApp['as']>>;
  let patternId: string;

  beforeAll(async () => {
    at = await buildApp();
    house = await buildHouse(at.db);
    creator = await at.as(house.creator);
  });
  beforeEach(async () => {
    at.clock.advance(61_000);
    patternId = (await buildPattern(at.db, { studio_id: house.studio.id })).id;
  });
  afterAll(() => at.close());

  const path = (id = '') => `/api/patterns/${patternId}/recordings${id && `/${id}`}`;
  const add = (body: object, who = creator) => request(at.app).post(path()).set(who).send(body);
  const added = async (title: string) => (await add({ title })).body as Answer;
  const edit = (of: Answer, body: object, who = creator) =>
    request(at.app).patch(path(of.id)).set(who).set('If-Match', `"${of.version}"`).send(body);
  const remove = (of: Answer, who = creator) =>
    request(at.app).delete(path(of.id)).set(who).set('If-Match', `"${of.version}"`);
  const list = async () =>
    (await request(at.app).get(path()).set(creator)).body as {
      recordings: Answer[];
      mayEdit: boolean;
      storage: { quotaBytes: number; usedBytes: number };
    };

  test('are added, numbered in order, and listed with the room the studio has', async () => {
    await added('Part one');
    await added('The ears');
    const { recordings, mayEdit, storage } = await list();
    expect(recordings.map(({ number, title }) => [number, title])).toEqual([
      [1, 'Part one'],
      [2, 'The ears'],
    ]);
    expect(recordings[0]).toMatchObject({ clip: null, upload: null, transcript: null, durationMs: null, version: 1 });
    expect(mayEdit).toBe(true);
    expect(storage).toEqual({ quotaBytes: 50_000_000_000, usedBytes: 0 });
  });

  test('sent twice with one id, or with one key, are one', async () => {
    const id = randomUUID();
    expect((await add({ id, title: 'Part one' })).status).toBe(201);
    expect((await add({ id, title: 'Part one' })).body).toMatchObject({ id, number: 1 });
    const key = randomUUID();
    const first = await add({ title: 'Part two' }).set('Idempotency-Key', key);
    const second = await add({ title: 'Part two' }).set('Idempotency-Key', key);
    expect(second.body).toEqual(first.body);
    expect((await list()).recordings).toHaveLength(2);
  });

  test('a number is never given again, and one taken out comes back under its own', async () => {
    const one = await added('Part one');
    const two = await added('Part two');
    expect((await remove(two)).status).toBe(204);
    expect((await added('Part three')).number).toBe(3);
    expect((await list()).recordings.map(({ number }) => number)).toEqual([1, 3]);
    const back = await request(at.app)
      .post(`${path(two.id)}/put-back`)
      .set(creator)
      .set('If-Match', '"2"')
      .send({});
    expect(back.body).toMatchObject({ id: two.id, number: 2 });
    expect((await list()).recordings.map(({ number }) => number)).toEqual([1, 2, 3]);
    expect((await remove(one)).status).toBe(204);
    expect((await remove(one)).status).toBe(404);
  });

  test('are put into another order without a change of numbers', async () => {
    const [one, two, three] = [await added('One'), await added('Two'), await added('Three')];
    const moved = await edit(three, { after: null });
    expect(moved.status).toBe(200);
    expect((await list()).recordings.map(({ title }) => title)).toEqual(['Three', 'One', 'Two']);
    await edit(one, { after: two.id });
    expect((await list()).recordings.map(({ number }) => number)).toEqual([3, 2, 1]);
    expect((await edit({ ...two, version: 1 }, { after: randomUUID() })).status).toBe(422);
  });

  test('may stand elsewhere: the address and the offset are kept, and only an address is taken', async () => {
    const one = await added('Part one');
    const url = 'https://films.example/watch?v=mouse&t=1';
    const saved = await edit(one, { publicUrl: url, publicOffsetMs: 12_500 });
    expect(saved.body).toMatchObject({ publicUrl: url, publicOffsetMs: 12_500, version: 2 });
    for (const wrong of [
      'javascript:alert(1)',
      'ftp://films.example/a',
      'films.example',
      'https://a:b@films.example/',
    ]) {
      expect((await edit({ ...one, version: 2 }, { publicUrl: wrong })).status).toBe(422);
    }
    expect((await edit({ ...one, version: 2 }, { publicUrl: null })).body).toMatchObject({ publicUrl: null });
  });

  test('a save that would write over somebody else’s is refused, with what is stored', async () => {
    const one = await added('Part one');
    const both = await Promise.all([edit(one, { title: 'Body' }), edit(one, { title: 'The body' })]);
    expect(both.map(({ status }) => status).sort()).toEqual([200, 412]);
    const [saved, refused] = both[0].status === 200 ? both : [both[1], both[0]];
    expect(refused.body.present.title).toBe(saved.body.title);
    const bare = await request(at.app).patch(path(one.id)).set(creator).send({ title: 'x' });
    expect(bare.status).toBe(428);
  });

  test('every change stands in the pattern’s history with whose hand it was', async () => {
    const one = await added('Part one');
    await edit(one, { title: 'The body' });
    const changes = await at
      .db('changes')
      .where({ pattern_id: patternId })
      .orderBy('id')
      .select('entity', 'person_id', 'before', 'after');
    expect(changes).toMatchObject([
      { entity: 'recording', person_id: house.creator.id, before: null, after: { title: 'Part one' } },
      { entity: 'recording', before: { title: 'Part one' }, after: { title: 'The body' } },
    ]);
  });

  test('are the studio’s: strangers find nothing, editors look on, unknown fields are refused', async () => {
    const one = await added('Part one');
    const stranger = await at.as(await buildPerson(at.db));
    const editor = await at.as(house.editor);
    expect((await request(at.app).get(path()).set(stranger)).status).toBe(404);
    expect((await request(at.app).get(path())).status).toBe(401);
    expect((await add({ title: 'x' }, stranger)).status).toBe(404);
    expect((await add({ title: 'x' }, editor)).status).toBe(403);
    expect((await edit(one, { title: 'x' }, editor)).status).toBe(403);
    expect((await remove(one, stranger)).status).toBe(404);
    const seen = await request(at.app).get(path()).set(editor);
    expect(seen.body).toMatchObject({ mayEdit: false });
    for (const extra of [
      { studioId: house.studio.id },
      { number: 7 },
      { clipObjectId: randomUUID() },
      { version: 3 },
    ]) {
      expect((await add({ title: 'x', ...extra })).status).toBe(422);
    }
  });
});
