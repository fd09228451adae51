import { readdir, readFile, rm, stat } from 'node:fs/promises';
import path from 'node:path';
import type { Context, Middleware } from 's3rver';
import S3Error from 's3rver/lib/models/error.js';
import { partsOf, uploadsDir } from './store.ts';

const XMLNS = { xmlns: 'http://s3.amazonaws.com/doc/2006-03-01/' };
const MOST_KEYS = 1_000;

/** The bucket and the key of an address in path style; the key is empty for the bucket itself. */
function placeOf(ctx: Context): { bucket: string; key: string } {
  const [, bucket = '', ...key] = decodeURIComponent(ctx.path).split('/');
  return { bucket, key: key.join('/') };
}

/** S3's ranges: `a-b`, `a-`, and `-n` for the last n bytes. What is no range is left out, as S3 does. */
const readRange: Middleware = async (ctx, next) => {
  const given = ctx.headers.range;
  if (given !== undefined && (ctx.method === 'GET' || ctx.method === 'HEAD')) {
    const { bucket, key } = placeOf(ctx);
    const [whole, from = '', to = ''] = /^bytes=(\d*)-(\d*)$/.exec(given) ?? [];
    if (whole === undefined || (from === '' && to === '')) delete ctx.headers.range;
    else if (from === '') {
      const size = await ctx.store.getMetadata(bucket, key).then(
        (metadata) => metadata['content-length'],
        () => 0,
      );
      ctx.headers.range = `bytes=${Math.max(0, size - Number(to))}-${Math.max(0, size - 1)}`;
    }
  }
  await next();
};

async function listObjects(ctx: Context, bucket: string): Promise<void> {
  if (!(await ctx.store.getBucket(bucket))) throw new S3Error('NoSuchBucket', 'There is no such bucket');
  const { query } = ctx;
  const token = query['continuation-token'];
  const maxKeys = Math.min(MOST_KEYS, Number(query['max-keys'] ?? MOST_KEYS) || MOST_KEYS);
  const found = await ctx.store.listObjects(bucket, {
    prefix: query.prefix ?? '',
    delimiter: query.delimiter ?? '',
    startAfter: token === undefined ? (query['start-after'] ?? '') : Buffer.from(token, 'base64url').toString(),
    maxKeys,
  });
  const last = found.objects.at(-1)?.key ?? '';
  ctx.status = 200;
  ctx.body = {
    ListBucketResult: {
      '@': XMLNS,
      Name: bucket,
      Prefix: query.prefix ?? '',
      KeyCount: found.objects.length,
      MaxKeys: maxKeys,
      IsTruncated: found.isTruncated,
      ...(found.isTruncated && { NextContinuationToken: Buffer.from(last).toString('base64url') }),
      Contents: found.objects.map(({ key, size, metadata }) => ({
        Key: key,
        LastModified: new Date(metadata['last-modified'] ?? 0).toISOString(),
        ETag: metadata.etag,
        Size: size,
        StorageClass: 'STANDARD',
      })),
      CommonPrefixes: found.commonPrefixes.map((Prefix) => ({ Prefix })),
    },
  };
}

async function listUploads(ctx: Context, bucket: string): Promise<void> {
  const dir = uploadsDir(ctx.store, bucket);
  const ids = (await readdir(dir).catch(() => [])).filter((name) => !name.endsWith('.completing'));
  const uploads = await Promise.all(
    ids.map(async (id) => {
      const [Key, { birthtime }] = await Promise.all([
        readFile(path.join(dir, id, 'key'), 'utf8'),
        stat(path.join(dir, id)),
      ]);
      return { Key, UploadId: id, Initiated: birthtime.toISOString() };
    }),
  );
  ctx.status = 200;
  ctx.body = {
    ListMultipartUploadsResult: { '@': XMLNS, Bucket: bucket, IsTruncated: false, Upload: uploads },
  };
}

async function listParts(ctx: Context, bucket: string, key: string, uploadId: string): Promise<void> {
  const parts = await partsOf(ctx.store, bucket, uploadId);
  ctx.status = 200;
  ctx.body = {
    ListPartsResult: {
      '@': XMLNS,
      Bucket: bucket,
      Key: key,
      UploadId: uploadId,
      IsTruncated: false,
      Part: parts.map(({ n, size, md5, changedAt }) => ({
        PartNumber: n,
        LastModified: changedAt.toISOString(),
        ETag: `"${md5}"`,
        Size: size,
      })),
    },
  };
}

async function abort(ctx: Context, bucket: string, uploadId: string): Promise<void> {
  await partsOf(ctx.store, bucket, uploadId);
  await rm(path.join(uploadsDir(ctx.store, bucket), path.basename(uploadId)), { recursive: true, force: true });
  ctx.status = 204;
}

/** What s3rver answers wrongly or not at all. */
const operate: Middleware = async (ctx, next) => {
  const { bucket, key } = placeOf(ctx);
  const { uploadId } = ctx.query;
  if (ctx.method === 'GET' && key === '' && ctx.query['list-type'] === '2') return listObjects(ctx, bucket);
  if (ctx.method === 'GET' && key === '' && ctx.query.uploads !== undefined) return listUploads(ctx, bucket);
  if (ctx.method === 'GET' && uploadId !== undefined) return listParts(ctx, bucket, key, uploadId);
  if (ctx.method === 'DELETE' && uploadId !== undefined) return abort(ctx, bucket, uploadId);
  if (ctx.method === 'PUT' && uploadId !== undefined && ctx.headers['x-amz-copy-source'] !== undefined) {
    throw new S3Error('NotImplemented', 'Parts cannot be copied from other objects here');
  }
  return next();
};

export const operations: readonly Middleware[] = [readRange, operate];
