import { createServer, type Server } from 'node:http';
import { connect, type AddressInfo } from 'node:net';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { PartBuffers, PARTS_IN_HAND } from '../../api/features/recordings/part-buffers.ts';
import { startStorageFake, type StorageFake } from '../../storage-fake/server.ts';
import { buildApp, type TestApp } from '../support/app.ts';
import { buildHouse, buildPattern, buildRecording } from '../support/builders.ts';
import { clipFactsOf, filmClip, padFilm, partOf, sha256 } from '../support/clips.ts';
import { startCuttingProxy } from '../support/cutting-proxy.ts';

const KEYS = { accessKey: 'cut-key', secretKey: 'cut-secret-key' };

describe('a clip whose way is cut', () => {
  let at: TestApp;
  let fake: StorageFake;
  let port: number;
  let server: Server;
  let file: Buffer;
  let who: Awaited<ReturnType<TestApp['as']>>;
  let recordingId: string;
  const dir = mkdtempSync(path.join(tmpdir(), 'roundelay-cut-'));

  beforeAll(async () => {
    fake = await startStorageFake({ port: 0, dir, ...KEYS });
    port = fake.port;
    const variables = {
      S3_ENDPOINT: `http://127.0.0.1:${port}`,
      S3_ACCESS_KEY: KEYS.accessKey,
      S3_SECRET_KEY: KEYS.secretKey,
    };
    at = await buildApp({ variables });
    server = createServer(at.app);
    await new Promise<void>((ready) => server.listen(0, '127.0.0.1', ready));
    const house = await buildHouse(at.db);
    const pattern = await buildPattern(at.db, { studio_id: house.studio.id });
    recordingId = (await buildRecording(at.db, { pattern_id: pattern.id })).id;
    who = await at.as(house.creator);
    file = padFilm(filmClip('mp4'), 13_000_000);
  });
  afterAll(async () => {
    server.closeAllConnections();
    server.close();
    await at.close();
    await fake.close();
    rmSync(dir, { recursive: true, force: true });
  });

  const start = async () => {
    const answer = await request(server).post(`/api/recordings/${recordingId}/clip`).set(who).send(clipFactsOf(file));
    return answer.body as { uploadId: string; partSize: number; have: number[] };
  };
  const put = (uploadId: string, n: number, partSize: number) => {
    const bytes = partOf(file, n, partSize);
    return request(server)
      .put(`/api/uploads/${uploadId}/parts/${n}`)
      .set(who)
      .field('sha256', sha256(bytes))
      .attach('part', bytes, 'part');
  };

  /** Sends half of a part over a bare socket, then cuts it. */
  const cutHalfWay = (uploadId: string, n: number, partSize: number) =>
    new Promise<void>((cut) => {
      const bytes = partOf(file, n, partSize);
      const field = `--b\r\nContent-Disposition: form-data; name="sha256"\r\n\r\n${sha256(bytes)}\r\n`;
      const head = `${field}--b\r\nContent-Disposition: form-data; name="part"; filename="part"\r\n\r\n`;
      const socket = connect((server.address() as AddressInfo).port, '127.0.0.1', () => {
        socket.write(
          `PUT /api/uploads/${uploadId}/parts/${n} HTTP/1.1\r\nHost: localhost\r\nCookie: ${who.Cookie}\r\n` +
            'Sec-Fetch-Site: same-origin\r\nContent-Type: multipart/form-data; boundary=b\r\n' +
            `Content-Length: ${head.length + bytes.length + 9}\r\n\r\n${head}`,
        );
        socket.write(bytes.subarray(0, bytes.length / 2), () => {
          socket.destroy();
          cut();
        });
      });
    });

  test('cut in the middle of a part, keeps the parts before, and goes on with just that part', async () => {
    const { uploadId, partSize } = await start();
    expect((await put(uploadId, 1, partSize)).status).toBe(200);
    // More often than there are buffers: each has to find its way back.
    for (let n = 0; n <= PARTS_IN_HAND; n += 1) await cutHalfWay(uploadId, 2, partSize);
    const again = await start();
    expect(again).toMatchObject({ uploadId, have: [1] });
    for (const n of [2, 3]) expect((await put(uploadId, n, partSize)).status).toBe(200);
    await request(server).post(`/api/uploads/${uploadId}/complete`).set(who);
    await at.workAll();
    const ready = await request(server).get(`/api/uploads/${uploadId}`).set(who);
    expect(ready.body).toMatchObject({ state: 'ready' });
    expect(at.logged.filter((line) => line.includes('"level":"error"'))).toEqual([]);
  });

  test('with storage down, says within five seconds that nothing is lost, and goes on when it is back', async () => {
    const other = padFilm(filmClip('mp4', 3), 9_000_000);
    const facts = clipFactsOf(other, 'ears.mp4');
    const begin = () => request(server).post(`/api/recordings/${recordingId}/clip`).set(who).send(facts);
    const { uploadId, partSize } = (await begin()).body as { uploadId: string; partSize: number };
    const send = (n: number) =>
      request(server)
        .put(`/api/uploads/${uploadId}/parts/${n}`)
        .set(who)
        .field('sha256', sha256(partOf(other, n, partSize)))
        .attach('part', partOf(other, n, partSize), 'part');
    expect((await send(1)).status).toBe(200);

    await fake.close();
    const before = Date.now();
    const down = await send(2);
    expect(Date.now() - before).toBeLessThan(5_000);
    expect(down.status).toBe(503);
    expect(down.body).toMatchObject({ type: '/problems/storage-down' });
    expect(down.body.detail).toMatch(/Nothing was lost/);
    expect((await request(server).get(`/api/recordings/${recordingId}/clip`).set(who)).status).toBe(503);
    expect(await at.db('upload_parts').where({ upload_id: uploadId }).pluck('n')).toEqual([1]);

    fake = await startStorageFake({ port, dir, ...KEYS });
    expect((await begin()).body).toMatchObject({ uploadId, have: [1] });
    expect((await send(2)).status).toBe(200);
    await request(server).post(`/api/uploads/${uploadId}/complete`).set(who);
    await at.workAll();
    expect((await request(server).get(`/api/uploads/${uploadId}`).set(who)).body).toMatchObject({ state: 'ready' });
    expect((await request(server).get(`/api/recordings/${recordingId}/clip`).set(who)).status).toBe(200);
  });
});

describe('the proxy that story tests cut a line with', () => {
  test('cuts one connection at its byte, and lets everything else through', async () => {
    const server = createServer((req, res) => void req.resume().on('end', () => res.end('whole')));
    await new Promise<void>((ready) => server.listen(0, '127.0.0.1', ready));
    const proxy = await startCuttingProxy((server.address() as AddressInfo).port, 1_000_000);
    const send = () => request(`http://127.0.0.1:${proxy.port}`).put('/').send(Buffer.alloc(800_000));
    expect((await send()).text).toBe('whole');
    await expect(send()).rejects.toThrow();
    expect((await send()).text).toBe('whole');
    expect(proxy.cuts).toBe(1);
    await proxy.close();
    server.close();
  });
});

describe('the buffers that parts are read into', () => {
  test('are six, and whoever holds the fewest is served first', async () => {
    const buffers = new PartBuffers(16);
    const held = await Promise.all(Array.from({ length: PARTS_IN_HAND }, () => buffers.take('a')));
    expect(new Set(held).size).toBe(6);
    const served: string[] = [];
    const wait = (owner: string) => buffers.take(owner).then(() => served.push(owner));
    const waiting = [wait('a'), wait('a'), wait('b'), wait('c')];
    await Promise.resolve();
    expect(served).toEqual([]);
    for (const buffer of held.slice(0, 4)) buffers.giveBack('a', buffer);
    await Promise.all(waiting);
    expect(served.slice(0, 2)).toEqual(['b', 'c']);
  });
});
