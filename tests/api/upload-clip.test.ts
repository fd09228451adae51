import request from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { createApp } from '../../api/app.ts';
import { buildApp, type TestApp } from '../support/app.ts';
import { buildHouse, buildPattern, buildPerson, buildRecording, type Household } from '../support/builders.ts';
import { clipFactsOf, filmClip, padFilm, partOf, sha256 } from '../support/clips.ts';

const MIB = 1_048_576;

describe('a clip on its way up', () => {
  let at: TestApp;
  let house: Household;
  let film: Buffer;
  let large: Buffer;
  let creator: Awaited<ReturnType<TestApp['as']>>;

  beforeAll(async () => {
    at = await buildApp();
    house = await buildHouse(at.db);
    film = filmClip('mp4');
    large = padFilm(film, 12 * MIB + 123);
    creator = await at.as(house.creator);
  });
  // Each test stands in a minute of its own, so that calls are not counted together.
  beforeEach(() => at.clock.advance(61_000));
  afterAll(() => at.close());

  const recording = async () => {
    const pattern = await buildPattern(at.db, { studio_id: house.studio.id });
    return buildRecording(at.db, { pattern_id: pattern.id });
  };
  const start = (id: string, body: object, who: Record<string, string> = creator, app = at.app) =>
    request(app).post(`/api/recordings/${id}/clip`).set(who).send(body);
  const put = (uploadId: string, n: number, bytes: Buffer, digest = sha256(bytes), app = at.app) =>
    request(app)
      .put(`/api/uploads/${uploadId}/parts/${n}`)
      .set(creator)
      .field('sha256', digest)
      .attach('part', bytes, { filename: 'part', contentType: 'application/octet-stream' });
  const complete = (uploadId: string) => request(at.app).post(`/api/uploads/${uploadId}/complete`).set(creator);
  const state = async (uploadId: string) =>
    (await request(at.app).get(`/api/uploads/${uploadId}`).set(creator)).body as Record<string, string>;

  const sendAll = async (id: string, file: Buffer, name?: string) => {
    const started = await start(id, clipFactsOf(file, name));
    expect(started.status).toBe(201);
    const { uploadId, partSize } = started.body as { uploadId: string; partSize: number };
    const count = Math.ceil(file.length / partSize);
    for (let n = 1; n <= count; n += 1) {
      const sent = await put(uploadId, n, partOf(file, n, partSize));
      if (sent.status !== 200) return { uploadId, sent };
    }
    const ended = await complete(uploadId);
    await at.workAll();
    return { uploadId, sent: ended };
  };

  test('sent in order, shows only once it is whole, with its length and codec', async () => {
    const { id } = await recording();
    const started = await start(id, clipFactsOf(large));
    const { uploadId, partSize } = started.body as { uploadId: string; partSize: number };
    for (const n of [1, 2, 3]) {
      expect((await request(at.app).get(`/api/recordings/${id}/clip`).set(creator)).status).toBe(404);
      expect((await put(uploadId, n, partOf(large, n, partSize))).status).toBe(200);
    }
    const ended = await complete(uploadId);
    expect(ended.status).toBe(202);
    expect(ended.body).toMatchObject({ state: 'completing', haveBytes: large.length });
    await at.workAll();

    expect(await state(uploadId)).toMatchObject({ state: 'ready', refusal: null });
    const got = await request(at.app).get(`/api/recordings/${id}/clip`).set(creator).buffer(true);
    expect(got.headers['content-type']).toBe('video/mp4');
    expect(sha256(got.body as Buffer)).toBe(sha256(large));
    const row = await at.db('recordings').where({ id }).first('duration_ms', 'codec');
    expect(row).toEqual({ duration_ms: 2000, codec: 'avc' });
  });

  test('parts come in any order, and one sent twice is kept once', async () => {
    const { id } = await recording();
    const { uploadId, partSize } = (await start(id, clipFactsOf(large))).body as { uploadId: string; partSize: number };
    for (const n of [3, 1, 1, 2, 3]) expect((await put(uploadId, n, partOf(large, n, partSize))).status).toBe(200);
    expect(await at.db('upload_parts').where({ upload_id: uploadId }).pluck('n')).toHaveLength(3);
    await complete(uploadId);
    await at.workAll();
    expect(await state(uploadId)).toMatchObject({ state: 'ready' });
  });

  test('goes on where it stopped on another day and in another process', async () => {
    const { id } = await recording();
    const first = await start(id, clipFactsOf(large));
    const { uploadId, partSize } = first.body as { uploadId: string; partSize: number };
    await put(uploadId, 2, partOf(large, 2, partSize));
    at.clock.advance(3 * 24 * 3_600_000);
    const later = await at.as(house.creator);
    const other = createApp({ ...at.deps });

    const again = await start(id, clipFactsOf(large), later, other);
    expect(again.body).toEqual({ uploadId, partSize, have: [2] });
    creator = later;
    for (const n of [1, 3]) {
      expect((await put(uploadId, n, partOf(large, n, partSize), undefined, other)).status).toBe(200);
    }
    await complete(uploadId);
    await at.workAll();
    expect(await state(uploadId)).toMatchObject({ state: 'ready' });
    const known = await start(id, clipFactsOf(large));
    expect(known.body).toMatchObject({ uploadId, have: [1, 2, 3] });
  });

  test('another file for the same recording begins anew, and what had arrived is removed', async () => {
    const { id } = await recording();
    const first = (await start(id, clipFactsOf(large))).body as { uploadId: string; partSize: number };
    await put(first.uploadId, 1, partOf(large, 1, first.partSize));
    const { object_id } = await at.db('uploads').where({ id: first.uploadId }).first('object_id');
    const second = await start(id, clipFactsOf(film, 'better-cut.mp4'));
    expect(second.body.uploadId).not.toBe(first.uploadId);
    expect(second.body.have).toEqual([]);
    expect((await put(first.uploadId, 2, partOf(large, 2, first.partSize))).status).toBe(410);
    await at.workAll();
    expect(await at.db('objects').where({ id: object_id }).first()).toBeUndefined();
  });

  test('damaged on its way, is refused and may be sent again', async () => {
    const { id } = await recording();
    const { uploadId, partSize } = (await start(id, clipFactsOf(large))).body as { uploadId: string; partSize: number };
    const damaged = await put(uploadId, 1, partOf(large, 1, partSize), sha256(Buffer.from('something else')));
    expect(damaged.status).toBe(422);
    expect(damaged.body).toMatchObject({ type: '/problems/invalid' });
    expect(damaged.body.detail).toMatch(/send this part again/);
    expect((await put(uploadId, 1, partOf(large, 1, partSize))).status).toBe(200);
    const other = await put(uploadId, 1, partOf(large, 2, partSize));
    expect(other.status).toBe(409);
  });

  test('a part of the wrong size, or one more than there are, is refused', async () => {
    const { id } = await recording();
    const { uploadId, partSize } = (await start(id, clipFactsOf(large))).body as { uploadId: string; partSize: number };
    expect((await put(uploadId, 1, large.subarray(0, 1000))).status).toBe(422);
    expect((await put(uploadId, 3, partOf(large, 1, partSize))).status).toBe(413);
    expect((await put(uploadId, 4, film)).status).toBe(422);
    expect(await at.db('upload_parts').where({ upload_id: uploadId })).toEqual([]);
  });

  test('with parts missing, is not complete and is told which', async () => {
    const { id } = await recording();
    const { uploadId, partSize } = (await start(id, clipFactsOf(large))).body as { uploadId: string; partSize: number };
    await put(uploadId, 2, partOf(large, 2, partSize));
    const early = await complete(uploadId);
    expect(early.status).toBe(409);
    expect(early.body.missing).toEqual([1, 3]);
    expect(await state(uploadId)).toMatchObject({ state: 'arriving', have: [2] });
  });

  test('cancelled, is gone with its parts, and nobody can go on with it', async () => {
    const { id } = await recording();
    const { uploadId, partSize } = (await start(id, clipFactsOf(large))).body as { uploadId: string; partSize: number };
    await put(uploadId, 1, partOf(large, 1, partSize));
    expect((await request(at.app).delete(`/api/uploads/${uploadId}`).set(creator)).status).toBe(204);
    expect((await put(uploadId, 2, partOf(large, 2, partSize))).status).toBe(410);
    await at.workAll();
    for await (const each of at.deps.storage.listMultiparts()) {
      const live = await at.db('uploads').where({ s3_upload_id: each.uploadId }).whereIn('state', ['arriving']);
      expect(live).toHaveLength(1);
    }
    const anew = await start(id, clipFactsOf(large));
    expect(anew.body).toMatchObject({ have: [] });
  });

  test.each([
    ['hevc', 'phone.mp4', /HEVC/],
    ['ten-bit', 'camera.mp4', /10 bit/],
  ] as const)('a %s film is refused with what to export instead', async (kind, name, sentence) => {
    const { id } = await recording();
    const { uploadId } = await sendAll(id, filmClip(kind), name);
    const refused = await state(uploadId);
    expect(refused).toMatchObject({ state: 'refused' });
    expect(refused.refusal).toMatch(sentence);
    expect(refused.refusal).toMatch(/Export it as H\.264/);
    expect((await request(at.app).get(`/api/recordings/${id}/clip`).set(creator)).status).toBe(404);
    const keys = await at
      .db('objects as o')
      .join('uploads as u', 'u.object_id', 'o.id')
      .where('u.id', uploadId)
      .pluck('o.key');
    expect(await at.deps.storage.head(keys[0] as string)).toBeNull();
  });

  test.each([
    ['mov', 'part-two.MOV', 'video/quicktime'],
    ['webm', 'ears.webm', 'video/webm'],
  ] as const)('a %s film plays under its own type', async (kind, name, type) => {
    const { id } = await recording();
    const { uploadId } = await sendAll(id, filmClip(kind), name);
    expect(await state(uploadId)).toMatchObject({ state: 'ready' });
    const got = await request(at.app).get(`/api/recordings/${id}/clip`).set(creator).set('Range', 'bytes=0-1');
    expect(got.status).toBe(206);
    expect(got.headers['content-type']).toBe(type);
  });

  test('a film that breaks off is refused, and a file that is no film is not even taken in', async () => {
    const { id } = await recording();
    const broken = await sendAll(id, film.subarray(0, film.length - 2000), 'broken.mp4');
    expect(await state(broken.uploadId)).toMatchObject({ state: 'refused' });

    const other = await recording();
    const text = Buffer.from('This is a shopping list and no film at all.'.repeat(50));
    const { sent, uploadId } = await sendAll(other.id, text, 'list.mp4');
    expect(sent.status).toBe(415);
    expect(sent.body.detail).toMatch(/not what its name says/);
    expect(await state(uploadId)).toMatchObject({ state: 'refused' });
    const webm = await sendAll((await recording()).id, filmClip('webm'), 'really-webm.mp4');
    expect(webm.sent.status).toBe(415);
  });

  test.each(['list.txt', 'film.mp4.exe', 'noending', 'clip.mkv'])('a file called %s is not begun', async (name) => {
    const { id } = await recording();
    const answer = await start(id, clipFactsOf(film, name));
    expect(answer.status).toBe(415);
    expect(await at.db('uploads').where({ recording_id: id })).toEqual([]);
  });

  test('a hostile name reaches neither the key nor a header', async () => {
    const { id } = await recording();
    const { uploadId } = await sendAll(id, film, '../../a"\r\n.mp4');
    expect(await state(uploadId)).toMatchObject({ state: 'ready', name: '../../a"\r\n.mp4' });
    const { key } = await at
      .db('objects as o')
      .join('uploads as u', 'u.object_id', 'o.id')
      .where('u.id', uploadId)
      .first('o.key');
    expect(key).toMatch(/^[0-9a-f-]{36}$/);
    const got = await request(at.app).head(`/api/recordings/${id}/clip`).set(creator);
    expect(JSON.stringify(got.headers)).not.toContain('../');
  });

  test('larger than eight gigabytes, or than the room that is left, is told before anything is sent', async () => {
    const { id } = await recording();
    const huge = await start(id, { ...clipFactsOf(film), size: 8_000_000_001 });
    expect(huge.status).toBe(413);
    await at.db('studios').where({ id: house.studio.id }).update({ quota_bytes: 1 });
    const full = await start(id, clipFactsOf(film));
    expect(full.status).toBe(422);
    expect(full.body).toMatchObject({ type: '/problems/over-quota', quotaBytes: 1, wantedBytes: film.length });
    expect(full.body.usedBytes).toBeGreaterThan(0);
    expect(full.body.detail).toMatch(/Nothing was sent/);
    await at.db('studios').where({ id: house.studio.id }).update({ quota_bytes: 50_000_000_000 });
  });

  test('clips on their way count against the room, so that two together cannot go over it', async () => {
    const studioUsed = await at
      .db('objects')
      .where({ studio_id: house.studio.id })
      .whereNot({ state: 'doomed' })
      .sum('bytes as sum');
    await at
      .db('studios')
      .where({ id: house.studio.id })
      .update({ quota_bytes: Number(studioUsed[0]?.sum) + Math.ceil(large.length * 1.5) });
    const [a, b] = [await recording(), await recording()];
    const answers = await Promise.all([
      start(a.id, clipFactsOf(large, 'a.mp4')),
      start(b.id, clipFactsOf(large, 'b.mp4')),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 422]);
    await at.db('studios').where({ id: house.studio.id }).update({ quota_bytes: 50_000_000_000 });
  });

  test('is nobody else’s affair: a stranger finds nothing, an editor may not send', async () => {
    const { id } = await recording();
    const { uploadId } = (await start(id, clipFactsOf(film))).body as { uploadId: string };
    const stranger = await at.as(await buildPerson(at.db));
    const editor = await at.as(house.editor);
    expect((await start(id, clipFactsOf(film), stranger)).status).toBe(404);
    expect((await start(id, clipFactsOf(film), editor)).status).toBe(403);
    expect((await request(at.app).get(`/api/uploads/${uploadId}`).set(stranger)).status).toBe(404);
    expect((await request(at.app).get(`/api/uploads/${uploadId}`).set(editor)).status).toBe(200);
    expect((await request(at.app).delete(`/api/uploads/${uploadId}`).set(stranger)).status).toBe(404);
    expect((await request(at.app).post(`/api/uploads/${uploadId}/complete`).set(stranger)).status).toBe(404);
  });

  test('a new cut takes the place of the old, which is removed from storage', async () => {
    const { id } = await recording();
    const old = await sendAll(id, film, 'first.mp4');
    const before = await at
      .db('objects as o')
      .join('uploads as u', 'u.object_id', 'o.id')
      .where('u.id', old.uploadId)
      .first('o.key');
    await sendAll(id, filmClip('mp4', 3), 'second.mp4');
    expect(await at.deps.storage.head(before.key as string)).toBeNull();
    const row = await at.db('recordings').where({ id }).first('duration_ms');
    expect(row).toEqual({ duration_ms: 3000 });
  });
});
