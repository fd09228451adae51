import { randomUUID } from 'node:crypto';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { sweepStorage } from '../../api/features/recordings/sweep.service.ts';
import { buildApp, type TestApp } from '../support/app.ts';
import { buildHouse, buildPattern, buildRecording, type Household } from '../support/builders.ts';
import { clipFactsOf, filmClip, padFilm, partOf, sha256 } from '../support/clips.ts';

const DAY_MS = 24 * 3_600_000;

describe('the sweep of what is stored', () => {
  let at: TestApp;
  let house: Household;
  let file: Buffer;

  beforeAll(async () => {
    at = await buildApp();
    house = await buildHouse(at.db);
    file = padFilm(filmClip('mp4'), 9_000_000);
  });
  afterAll(() => at.close());

  const begin = async () => {
    const pattern = await buildPattern(at.db, { studio_id: house.studio.id });
    const { id } = await buildRecording(at.db, { pattern_id: pattern.id });
    const who = await at.as(house.creator);
    const { body } = await request(at.app).post(`/api/recordings/${id}/clip`).set(who).send(clipFactsOf(file));
    const { uploadId, partSize } = body as { uploadId: string; partSize: number };
    const put = async (n: number) => {
      const bytes = partOf(file, n, partSize);
      const sent = await request(at.app)
        .put(`/api/uploads/${uploadId}/parts/${n}`)
        .set(who)
        .field('sha256', sha256(bytes))
        .attach('part', bytes, 'part');
      expect(sent.status).toBe(200);
    };
    await put(1);
    return { id, uploadId, put, who };
  };
  const keys = async () => {
    const found: string[] = [];
    for await (const { key } of at.deps.storage.list()) found.push(key);
    return found.sort();
  };
  const multiparts = async () => {
    const found: string[] = [];
    for await (const { uploadId } of at.deps.storage.listMultiparts()) found.push(uploadId);
    return found;
  };
  const rows = () => at.db('objects').orderBy('key').pluck('key');

  test('leaves alone what somebody went on with within a week, and takes the rest, parts and all', async () => {
    const old = await begin();
    at.clock.advance(6 * DAY_MS);
    const newer = await begin();
    await sweepStorage(at.deps);
    expect(await multiparts()).toHaveLength(2);
    at.clock.advance(1.5 * DAY_MS);
    const swept = await sweepStorage(at.deps);
    expect(swept).toMatchObject({ givenUp: 1, removed: 1 });
    expect(await multiparts()).toHaveLength(1);
    expect(await at.db('uploads').where({ id: old.uploadId })).toEqual([]);
    expect(await at.db('uploads').where({ id: newer.uploadId }).pluck('state')).toEqual(['arriving']);
    const who = await at.as(house.creator);
    await request(at.app).delete(`/api/uploads/${newer.uploadId}`).set(who);
    await at.workAll();
    expect(await multiparts()).toEqual([]);
    expect(await keys()).toEqual([]);
  });

  test('after a process died between storage and table, one pass leaves no orphan', async () => {
    // Put, and never written down.
    await at.deps.storage.put(randomUUID(), Buffer.from('left over'), 'video/mp4');
    await at.deps.storage.createMultipart(randomUUID(), 'video/mp4');
    // Written down, and never put; doomed, and never removed.
    const about = { studio_id: house.studio.id, kind: 'clip', bytes: 9, type: 'video/mp4', touched_at: at.clock.now() };
    const doomed = randomUUID();
    await at.deps.storage.put(doomed, Buffer.from('doomed'), 'video/mp4');
    await at.db('objects').insert([
      { ...about, key: randomUUID(), state: 'arriving' },
      { ...about, key: randomUUID(), state: 'ready' },
      { ...about, key: doomed, state: 'doomed' },
    ]);
    at.clock.advance(2 * 3_600_000);
    await sweepStorage(at.deps);
    expect(await keys()).toEqual([]);
    expect(await rows()).toEqual([]);
    expect(await multiparts()).toEqual([]);
  });

  test('what was stored within the hour may still be written down, and stays', async () => {
    const key = randomUUID();
    await at.deps.storage.put(key, Buffer.from('new'), 'video/mp4');
    at.clock.stopAt(new Date());
    await sweepStorage(at.deps);
    expect(await keys()).toContain(key);
    at.clock.advance(2 * 3_600_000);
    await sweepStorage(at.deps);
    expect(await keys()).not.toContain(key);
  });

  test('a clip whose last step was lost with its process is finished by the next pass', async () => {
    at.clock.stopAt(new Date());
    const { uploadId, put, who } = await begin();
    await put(2);
    await request(at.app).post(`/api/uploads/${uploadId}/complete`).set(who);
    await at.db.raw('delete from graphile_worker._private_jobs');
    at.clock.advance(3_600_000);
    await sweepStorage(at.deps);
    await at.workAll();
    expect(await at.db('uploads').where({ id: uploadId }).pluck('state')).toEqual(['ready']);
    const before = await keys();
    await sweepStorage(at.deps);
    expect(await keys()).toEqual(before);
    expect(before).toEqual(await rows());
  });
});
