import { randomBytes, randomUUID } from 'node:crypto';
import { buffer, text } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { openStorage, StorageDown, StorageRefused, type Storage } from '../../../api/platform/storage.ts';

const MIB = 1 << 20;

async function collect<T>(items: AsyncIterable<T>): Promise<T[]> {
  const all: T[] = [];
  for await (const item of items) all.push(item);
  return all;
}

describe('storage over S3', () => {
  let storage: Storage;
  const settings = () => ({ ...inject('house').s3, region: 'us-east-1', bucket: `t-${randomUUID()}` });

  beforeAll(async () => {
    storage = openStorage(settings());
    await storage.prepare();
    await storage.prepare();
  });
  afterAll(() => storage.close());

  async function read(key: string, range?: { start: number; end: number }): Promise<Buffer> {
    const found = await storage.get(key, range);
    if (!found) throw new Error('not there');
    return buffer(found.body);
  }

  test('what is put comes back byte for byte, with its type', async () => {
    const bytes = randomBytes(300_000);
    await storage.put('a', bytes, 'video/mp4');
    expect(await storage.head('a')).toEqual({ bytes: 300_000, type: 'video/mp4' });
    expect((await read('a')).equals(bytes)).toBe(true);
    await storage.put('empty', Buffer.alloc(0), 'text/plain');
    const empty = await storage.get('empty');
    expect(empty && (await text(empty.body))).toBe('');
  });

  test('what is not there is null, and removing it again is no fault', async () => {
    await storage.put('gone', Buffer.from('x'), 'text/plain');
    await storage.remove('gone');
    await storage.remove('gone');
    expect(await storage.get('gone')).toBeNull();
    expect(await storage.head('gone')).toBeNull();
  });

  test.each([
    [0, 0],
    [0, 1],
    [7, 7],
    [10, 99],
    [90, 500],
  ])('bytes %i to %i come alone', async (start, end) => {
    const bytes = randomBytes(100);
    await storage.put('ranged', bytes, 'video/mp4');
    const got = await read('ranged', { start, end });
    expect(got.equals(bytes.subarray(start, end + 1))).toBe(true);
  });

  test('a range past the end is refused', async () => {
    await storage.put('short', Buffer.from('abc'), 'text/plain');
    await expect(storage.get('short', { start: 3, end: 9 })).rejects.toBeInstanceOf(StorageRefused);
  });

  test('parts become one object, whatever order they came in', async () => {
    const parts = [randomBytes(5 * MIB), randomBytes(5 * MIB), randomBytes(1000)];
    const uploadId = await storage.createMultipart('whole', 'video/webm');
    const etags = await Promise.all(
      parts.map((part, i) => storage.putPart('whole', uploadId, i + 1, part)).toReversed(),
    );
    const list = etags.toReversed().map((etag, i) => ({ n: i + 1, etag }));
    expect(await storage.head('whole')).toBeNull();
    await storage.completeMultipart('whole', uploadId, list);
    expect(await storage.head('whole')).toEqual({ bytes: 10 * MIB + 1000, type: 'video/webm' });
    expect((await read('whole')).equals(Buffer.concat(parts))).toBe(true);
    await expect(storage.putPart('whole', uploadId, 1, Buffer.from('late'))).rejects.toThrow('NoSuchUpload');
    await expect(storage.completeMultipart('whole', uploadId, list)).rejects.toThrow('NoSuchUpload');
  });

  test('a wrong ETag, a missing part and a small part in the middle are refused, and nothing is lost by it', async () => {
    const uploadId = await storage.createMultipart('picky', 'video/mp4');
    const small = await storage.putPart('picky', uploadId, 1, Buffer.from('small'));
    const last = await storage.putPart('picky', uploadId, 2, Buffer.from('last'));
    const complete = (...parts: { n: number; etag: string }[]) => storage.completeMultipart('picky', uploadId, parts);
    await expect(complete({ n: 1, etag: last })).rejects.toThrow('InvalidPart');
    await expect(complete({ n: 1, etag: small }, { n: 3, etag: last })).rejects.toThrow('InvalidPart');
    await expect(complete({ n: 1, etag: small }, { n: 2, etag: last })).rejects.toThrow('EntityTooSmall');
    await complete({ n: 2, etag: last });
    expect((await read('picky')).toString()).toBe('last');
  });

  test('an upload given up leaves nothing, and giving it up again is no fault', async () => {
    const uploadId = await storage.createMultipart('dropped', 'video/mp4');
    await storage.putPart('dropped', uploadId, 1, Buffer.from('part'));
    const open = async () => (await collect(storage.listMultiparts())).map((each) => each.uploadId);
    expect(await open()).toContain(uploadId);
    await storage.abortMultipart('dropped', uploadId);
    await storage.abortMultipart('dropped', uploadId);
    expect(await open()).not.toContain(uploadId);
    expect(await storage.head('dropped')).toBeNull();
  });

  test('a list goes on past its first thousand', async () => {
    const full = openStorage(settings());
    await full.prepare();
    const keys = Array.from({ length: 1_005 }, (_each, i) => `k-${String(i).padStart(5, '0')}`);
    for (let at = 0; at < keys.length; at += 50) {
      await Promise.all(keys.slice(at, at + 50).map((key) => full.put(key, Buffer.from('x'), 'text/plain')));
    }
    const listed = await collect(full.list());
    expect(listed.map(({ key }) => key)).toEqual(keys);
    expect(await collect(full.list('k-0000'))).toHaveLength(10);
    full.close();
  });

  test('a wrong secret, a missing bucket and a store that is not there count as down', async () => {
    const wrong = openStorage({ ...settings(), secretKey: 'another' });
    await expect(wrong.put('a', Buffer.from('x'), 'text/plain')).rejects.toBeInstanceOf(StorageDown);
    const missing = openStorage(settings());
    await expect(missing.check()).rejects.toBeInstanceOf(StorageDown);
    const nowhere = openStorage({ ...settings(), endpoint: 'http://127.0.0.1:9' });
    await expect(nowhere.check(1_500)).rejects.toBeInstanceOf(StorageDown);
    for (const each of [wrong, missing, nowhere]) each.close();
  });
});
