import { createHash, randomUUID } from 'node:crypto';
import { readdir } from 'node:fs/promises';
import { mkdtemp, rm } from 'node:fs/promises';
import { request as httpRequest } from 'node:http';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { buffer } from 'node:stream/consumers';
import { Readable } from 'node:stream';
import {
  CreateBucketCommand,
  GetObjectCommand,
  HeadObjectCommand,
  ListPartsCommand,
  PutObjectCommand,
  S3Client,
  CreateMultipartUploadCommand,
  UploadPartCommand,
} from '@aws-sdk/client-s3';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { startStorageFake, type StorageFake } from '../../storage-fake/server.ts';

/** What the fake must do as the real S3 does, where the package it is made of does not. */
describe('the storage fake', () => {
  let dir: string;
  let fake: StorageFake;
  const clients: S3Client[] = [];
  const Bucket = `t-${randomUUID()}`;

  function open(more: ConstructorParameters<typeof S3Client>[0] = {}): S3Client {
    const client = new S3Client({
      region: 'us-east-1',
      endpoint: `http://127.0.0.1:${fake.port}`,
      forcePathStyle: true,
      credentials: { accessKeyId: 'k', secretAccessKey: 's' },
      maxAttempts: 1,
      ...more,
    });
    clients.push(client);
    return client;
  }

  beforeAll(async () => {
    dir = await mkdtemp(path.join(tmpdir(), 'roundelay-fake-'));
    fake = await startStorageFake({ port: 0, dir, accessKey: 'k', secretKey: 's' });
    await open().send(new CreateBucketCommand({ Bucket }));
  });
  afterAll(async () => {
    for (const client of clients) client.destroy();
    await fake.close();
    await rm(dir, { recursive: true });
  });

  async function got(Key: string, Range?: string): Promise<string> {
    const found = await open().send(new GetObjectCommand({ Bucket, Key, Range }));
    return (await buffer(found.Body as Readable)).toString();
  }

  const filesOfBucket = async () => (await readdir(path.join(dir, Bucket), { recursive: true })).toSorted();

  test('refuses an unsigned request, a wrong secret, another key and a changed address', async () => {
    await open().send(new PutObjectCommand({ Bucket, Key: 'signed', Body: 'x' }));
    expect((await fetch(`http://127.0.0.1:${fake.port}/${Bucket}/signed`)).status).toBe(403);
    const head = (accessKeyId: string, secretAccessKey: string) =>
      open({ credentials: { accessKeyId, secretAccessKey } }).send(new GetObjectCommand({ Bucket, Key: 'signed' }));
    await expect(head('k', 'wrong')).rejects.toMatchObject({ name: 'SignatureDoesNotMatch' });
    await expect(head('other', 's')).rejects.toMatchObject({ name: 'InvalidAccessKeyId' });

    const client = open();
    client.middlewareStack.add(
      (next) => (args) => {
        (args.request as { path: string }).path = `/${Bucket}/another`;
        return next(args);
      },
      { step: 'finalizeRequest', priority: 'low' },
    );
    await expect(client.send(new GetObjectCommand({ Bucket, Key: 'signed' }))).rejects.toMatchObject({
      name: 'SignatureDoesNotMatch',
    });
  });

  test('signs keys with odd letters as the client does', async () => {
    const Key = "a b/c+d(e)'f*!~é";
    await open().send(new PutObjectCommand({ Bucket, Key, Body: 'odd' }));
    expect(await got(Key)).toBe('odd');
  });

  test('keeps what was meant when the client frames the body, as it does by default', async () => {
    const client = open({ requestChecksumCalculation: 'WHEN_SUPPORTED' });
    const body = Buffer.alloc(200_000, 'frame');
    await client.send(
      new PutObjectCommand({ Bucket, Key: 'framed', Body: Readable.from([body]), ContentLength: body.length }),
    );
    const found = await open().send(new GetObjectCommand({ Bucket, Key: 'framed' }));
    expect((await buffer(found.Body as Readable)).equals(body)).toBe(true);
    expect(found.ContentEncoding).toBeUndefined();
  });

  test.each([
    ['bytes=0-0', 'a'],
    ['bytes=-3', 'hij'],
    ['bytes=8-', 'ij'],
    ['bytes=-99', 'abcdefghij'],
    ['bytes=2-3', 'cd'],
    ['pages=1-2', 'abcdefghij'],
  ])('answers the range %s with %s', async (range, expected) => {
    await open().send(new PutObjectCommand({ Bucket, Key: 'letters', Body: 'abcdefghij' }));
    expect(await got('letters', range)).toBe(expected);
  });

  test('keeps nothing of a PUT that was cut', async () => {
    const before = await filesOfBucket();
    const body = Buffer.alloc(100_000, 'x');
    const client = open({ requestChecksumCalculation: 'WHEN_REQUIRED' });
    // The client signs; the bytes are sent by hand, half of them.
    let signed: { headers: Record<string, string>; path: string } | undefined;
    client.middlewareStack.add(
      () => (args) => {
        signed = args.request as typeof signed & object;
        throw new Error('not sent');
      },
      { step: 'finalizeRequest', priority: 'low' },
    );
    await expect(client.send(new PutObjectCommand({ Bucket, Key: 'cut', Body: body }))).rejects.toThrow('not sent');
    await new Promise<void>((resolve) => {
      const put = httpRequest({
        host: '127.0.0.1',
        port: fake.port,
        method: 'PUT',
        path: signed?.path,
        headers: signed?.headers ?? {},
      });
      put.on('error', () => resolve());
      put.write(body.subarray(0, 50_000), () => setTimeout(() => put.destroy(new Error('cut')), 50));
    });
    await expect.poll(filesOfBucket).toEqual(before);
    await expect(open().send(new HeadObjectCommand({ Bucket, Key: 'cut' }))).rejects.toMatchObject({
      name: 'NotFound',
    });
  });

  test('refuses a body that is not the one that was signed', async () => {
    const client = open({ requestChecksumCalculation: 'WHEN_REQUIRED' });
    client.middlewareStack.add(
      (next) => (args) => {
        (args.request as { body: unknown }).body = Buffer.from('forged');
        return next(args);
      },
      { step: 'finalizeRequest', priority: 'low' },
    );
    const put = client.send(new PutObjectCommand({ Bucket, Key: 'forged', Body: Buffer.from('signed') }));
    await expect(put).rejects.toMatchObject({ name: 'BadDigest' });
    await expect(open().send(new HeadObjectCommand({ Bucket, Key: 'forged' }))).rejects.toMatchObject({
      name: 'NotFound',
    });
  });

  test('lists the parts that are there', async () => {
    const client = open();
    const { UploadId } = await client.send(new CreateMultipartUploadCommand({ Bucket, Key: 'parts' }));
    for (const n of [2, 1]) {
      await client.send(new UploadPartCommand({ Bucket, Key: 'parts', UploadId, PartNumber: n, Body: `part ${n}` }));
    }
    const { Parts } = await client.send(new ListPartsCommand({ Bucket, Key: 'parts', UploadId }));
    const md5 = (text: string) => `"${createHash('md5').update(text).digest('hex')}"`;
    expect(Parts?.map(({ PartNumber, Size, ETag }) => [PartNumber, Size, ETag])).toEqual([
      [1, 6, md5('part 1')],
      [2, 6, md5('part 2')],
    ]);
  });
});
