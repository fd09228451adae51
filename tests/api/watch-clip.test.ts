import { randomUUID } from 'node:crypto';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { buildApp, type TestApp } from '../support/app.ts';
import { buildHouse, buildPattern, buildPerson, buildRecording, type Household } from '../support/builders.ts';

/** Bytes whose every tenth says where it stands. */
const CLIP = Buffer.from(Array.from({ length: 1_000 }, (_, n) => (n % 10 === 0 ? n / 10 : n % 7)));

describe('a clip on its way to a viewer', () => {
  let at: TestApp;
  let house: Household;
  let creator: Awaited<ReturnType<TestApp['as']>>;
  let clip: { id: string; patternId: string; objectId: string };

  beforeAll(async () => {
    at = await buildApp();
    house = await buildHouse(at.db);
    creator = await at.as(house.creator);
    clip = await stored();
  });
  afterAll(() => at.close());

  async function stored(pattern: object = {}) {
    const { id: patternId } = await buildPattern(at.db, { studio_id: house.studio.id, ...pattern });
    const { id } = await buildRecording(at.db, { pattern_id: patternId });
    const objectId = randomUUID();
    const key = randomUUID();
    await at.deps.storage.put(key, CLIP, 'application/octet-stream');
    const about = { kind: 'clip', state: 'ready', bytes: CLIP.length, type: 'video/mp4' };
    await at.db('objects').insert({ id: objectId, studio_id: house.studio.id, key, ...about });
    await at.db('recordings').where({ id }).update({ clip_object_id: objectId, duration_ms: 2_000 });
    return { id, patternId, objectId };
  }
  const publish = (patternId: string, numbers: readonly number[], over: object = {}) =>
    at.db('editions').insert({
      pattern_id: patternId,
      number: 1,
      schema_version: 1,
      engine_version: '1',
      document: JSON.stringify({ recordings: numbers.map((number) => ({ number, title: 'Part', hasClip: true })) }),
      published_at: new Date(),
      ...over,
    });
  const get = (id: string, headers: Record<string, string> = {}, who: Record<string, string> = creator) =>
    request(at.app)
      .get(`/api/recordings/${id}/clip`)
      .set(who)
      .set(headers)
      .buffer(true)
      .parse((res, done) => {
        const chunks: Buffer[] = [];
        res.on('data', (chunk: Buffer) => chunks.push(chunk));
        res.on('end', () => done(null, Buffer.concat(chunks)));
      });

  test.each([
    ['bytes=0-1', 0, 1],
    ['bytes=0-0', 0, 0],
    ['bytes=100-199', 100, 199],
    ['bytes=990-', 990, 999],
    ['bytes=-10', 990, 999],
    ['bytes=-5000', 0, 999],
    ['bytes=900-100000', 900, 999],
    ['BYTES=0-4', 0, 4],
  ])('asked for %s, answers exactly that', async (range, start, end) => {
    const got = await get(clip.id, { Range: range });
    expect(got.status).toBe(206);
    expect(got.headers['content-range']).toBe(`bytes ${start}-${end}/1000`);
    expect(got.headers['content-length']).toBe(String(end - start + 1));
    expect((got.body as Buffer).equals(CLIP.subarray(start, end + 1))).toBe(true);
  });

  test.each(['bytes=1000-', 'bytes=1000-1001', 'bytes=-0', 'bytes=99999-'])(
    'past the end (%s) there is nothing',
    async (range) => {
      const got = await get(clip.id, { Range: range });
      expect(got.status).toBe(416);
      expect(got.headers['content-range']).toBe('bytes */1000');
      expect(got.headers['content-type']).toMatch(/problem\+json/);
    },
  );

  test.each(['bytes=5-2', 'bytes=-', 'bytes=a-b', 'lines=0-1', 'bytes=0-1,5-6', 'bytes'])(
    'what cannot be understood or is several ranges (%s) gets the whole',
    async (range) => {
      const got = await get(clip.id, { Range: range });
      expect(got.status).toBe(200);
      expect((got.body as Buffer).equals(CLIP)).toBe(true);
    },
  );

  test('says what it is, and nothing else', async () => {
    const got = await get(clip.id);
    expect(got.headers).toMatchObject({
      'content-type': 'video/mp4',
      'x-content-type-options': 'nosniff',
      'accept-ranges': 'bytes',
      'cache-control': 'private, no-cache',
      etag: `"${clip.objectId}"`,
    });
    expect(got.headers['content-security-policy']).toMatch(/sandbox/);
    const head = await request(at.app).head(`/api/recordings/${clip.id}/clip`).set(creator).set('Range', 'bytes=0-9');
    expect(head.status).toBe(206);
    expect(head.headers['content-length']).toBe('10');
  });

  test('a range of a clip that has changed since is answered with the whole new one', async () => {
    const other = await get(clip.id, { Range: 'bytes=0-1', 'If-Range': '"of-another"' });
    expect(other.status).toBe(200);
    const same = await get(clip.id, { Range: 'bytes=0-1', 'If-Range': `"${clip.objectId}"` });
    expect(same.status).toBe(206);
    expect((await get(clip.id, { 'If-None-Match': `"${clip.objectId}"` })).status).toBe(304);
  });

  test('unpublished, it is there for the studio alone, and a stranger cannot tell it from nothing', async () => {
    const stranger = await at.as(await buildPerson(at.db));
    const refused = await get(clip.id, {}, stranger);
    const nothing = await get(randomUUID(), {}, stranger);
    const plain = (answer: typeof refused) => {
      const body = JSON.parse((answer.body as Buffer).toString()) as Record<string, unknown>;
      return { ...body, instance: '' };
    };
    expect(refused.status).toBe(404);
    expect(plain(refused)).toEqual(plain(nothing));
    expect((await get(clip.id, {}, {})).status).toBe(404);
    expect((await get(clip.id, {}, await at.as(house.editor))).status).toBe(200);
  });

  test('who lost the right gets nothing with the very next range', async () => {
    const helper = await buildPerson(at.db);
    await at.db('members').insert({ studio_id: house.studio.id, person_id: helper.id, role: 'editor' });
    const who = await at.as(helper);
    expect((await get(clip.id, { Range: 'bytes=0-1' }, who)).status).toBe(206);
    await at.db('members').where({ person_id: helper.id }).update({ left_at: new Date() });
    expect((await get(clip.id, { Range: 'bytes=2-3' }, who)).status).toBe(404);
  });

  test('of a published edition it is there for anybody, as long as the edition is out', async () => {
    const out = await stored({ visibility: 'unlisted', state: 'published' });
    expect((await get(out.id, {}, {})).status).toBe(404);
    await publish(out.patternId, [1]);
    expect((await get(out.id, { Range: 'bytes=0-1' }, {})).status).toBe(206);
    await at.db('patterns').where({ id: out.patternId }).update({ visibility: 'private' });
    expect((await get(out.id, {}, {})).status).toBe(404);
    await at.db('patterns').where({ id: out.patternId }).update({ visibility: 'listed' });
    expect((await get(out.id, {}, {})).status).toBe(200);
    await at.db('editions').where({ pattern_id: out.patternId }).update({ withdrawn_at: new Date() });
    expect((await get(out.id, {}, {})).status).toBe(404);
  });

  test('a recording added after the edition went out is not out with it', async () => {
    const out = await stored({ visibility: 'listed', state: 'published' });
    await publish(out.patternId, [7]);
    expect((await get(out.id, {}, {})).status).toBe(404);
    await at.db('pattern_recordings').where({ pattern_id: out.patternId }).update({ number: 7 });
    expect((await get(out.id, {}, {})).status).toBe(200);
  });

  test('removed, it makes room; shown by an edition that is out, it cannot be removed', async () => {
    const remove = (id: string) => request(at.app).delete(`/api/recordings/${id}/clip`).set(creator);
    const out = await stored({ visibility: 'listed', state: 'published' });
    await publish(out.patternId, [1]);
    expect((await remove(out.id)).status).toBe(409);
    const own = await stored();
    expect((await remove(own.id)).status).toBe(204);
    expect((await get(own.id)).status).toBe(404);
    await at.workAll();
    expect(await at.db('objects').where({ id: own.objectId })).toEqual([]);
  });
});
