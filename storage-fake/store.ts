import { createHash, randomUUID } from 'node:crypto';
import { createReadStream, createWriteStream } from 'node:fs';
import { mkdir, open, readdir, readFile, rename, rm, stat, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Store } from 's3rver';
import S3Error from 's3rver/lib/models/error.js';
import S3Object from 's3rver/lib/models/object.js';

/** S3's own lower limit for every part but the last. */
const SMALLEST_PART = 5 << 20;

const noSuchUpload = () => new S3Error('NoSuchUpload', 'There is no such upload, or it is completed or aborted');
const isMissing = (err: unknown) => (err as NodeJS.ErrnoException).code === 'ENOENT';

/** Writes all of `content` before anybody can see it under its name; what is cut short leaves nothing behind. */
async function writeWhole(file: string, content: Readable | Buffer): Promise<{ size: number; md5: string }> {
  const arriving = `${file}.${randomUUID()}.arriving`;
  const hash = createHash('md5');
  let size = 0;
  try {
    await pipeline(
      Buffer.isBuffer(content) ? Readable.from([content]) : content,
      async function* (source: AsyncIterable<Buffer>) {
        for await (const chunk of source) {
          hash.update(chunk);
          size += chunk.length;
          yield chunk;
        }
      },
      createWriteStream(arriving),
    );
    const handle = await open(arriving, 'r+');
    await handle.sync().finally(() => handle.close());
    await rename(arriving, file);
    return { size, md5: hash.digest('hex') };
  } catch (err) {
    await rm(arriving, { force: true });
    throw err;
  }
}

/** Where the parts of an upload lie until it is completed. */
export function uploadsDir(store: Store, bucket: string): string {
  return store.getResourcePath(bucket, undefined, 'uploads');
}

export interface StoredPart {
  readonly n: number;
  readonly size: number;
  readonly md5: string;
  readonly changedAt: Date;
}

/** The parts that are there, in order. @throws S3Error NoSuchUpload */
export async function partsOf(store: Store, bucket: string, uploadId: string): Promise<StoredPart[]> {
  const dir = path.join(uploadsDir(store, bucket), path.basename(uploadId));
  const names = await readdir(dir).catch((err: unknown) => {
    throw isMissing(err) ? noSuchUpload() : err;
  });
  const parts = names
    .filter((name) => /^\d+$/.test(name))
    .map(async (name) => {
      const file = path.join(dir, name);
      const [{ size, mtime }, md5] = await Promise.all([stat(file), readFile(`${file}.md5`, 'utf8')]);
      return { n: Number(name), size, md5, changedAt: mtime };
    });
  return (await Promise.all(parts)).sort((a, b) => a.n - b.n);
}

/** Replaces the methods of s3rver's store that lose, cut or invent bytes. */
export function mendStore(store: Store): void {
  store.getObject = async (bucket, key, options) => {
    try {
      const metadata = await store.getMetadata(bucket, key);
      const last = metadata['content-length'] - 1;
      const file = store.getResourcePath(bucket, key, 'object');
      if (options?.start === undefined) {
        return new S3Object(bucket, key, last < 0 ? Readable.from([]) : createReadStream(file), metadata);
      }
      const range = { start: options.start, end: Math.min(options.end ?? last, last) };
      const content = range.start <= range.end ? createReadStream(file, range) : null;
      return Object.assign(new S3Object(bucket, key, content, metadata), { range });
    } catch (err) {
      if (isMissing(err)) return null;
      throw err;
    }
  };

  store.putObject = async (object) => {
    const file = store.getResourcePath(object.bucket, object.key, 'object');
    await mkdir(path.dirname(file), { recursive: true });
    const { size, md5 } = await writeWhole(file, object.content ?? Buffer.alloc(0));
    await store.putMetadata(object.bucket, object.key, object.metadata, md5);
    return { size, md5 };
  };

  store.putPart = async (bucket, uploadId, partNumber, content) => {
    const dir = path.join(uploadsDir(store, bucket), path.basename(uploadId));
    const n = Number(partNumber);
    if (!Number.isInteger(n) || n < 1 || n > 10_000) throw new S3Error('InvalidArgument', 'Parts go from 1 to 10,000');
    await stat(dir).catch((err: unknown) => {
      content.resume();
      throw isMissing(err) ? noSuchUpload() : err;
    });
    try {
      const part = await writeWhole(path.join(dir, String(n)), content);
      await writeFile(path.join(dir, `${n}.md5`), part.md5);
      return part;
    } catch (err) {
      throw isMissing(err) ? noSuchUpload() : err;
    }
  };

  store.putObjectMultipart = async (bucket, uploadId, asked) => {
    const there = new Map((await partsOf(store, bucket, uploadId)).map((part) => [part.n, part]));
    const parts = asked.map(({ number, etag }, index) => {
      const part = there.get(number);
      if (part?.md5 !== etag) throw new S3Error('InvalidPart', `Part ${number} is not there with this ETag`);
      const before = asked[index - 1];
      if (before && before.number >= number) throw new S3Error('InvalidPartOrder', 'Parts are not in order');
      return part;
    });
    const small = parts.slice(0, -1).find(({ size }) => size < SMALLEST_PART);
    if (small) throw new S3Error('EntityTooSmall', `Part ${small.n} is smaller than 5 MiB`);
    const dir = path.join(uploadsDir(store, bucket), path.basename(uploadId));
    const closed = `${dir}.completing`;
    // From here on no part is taken any more, and a second completion finds nothing.
    await rename(dir, closed).catch((err: unknown) => {
      throw isMissing(err) ? noSuchUpload() : err;
    });
    try {
      const key = await readFile(path.join(closed, 'key'), 'utf8');
      const metadata = JSON.parse(await readFile(path.join(closed, 'metadata'), 'utf8')) as unknown;
      const bytes = async function* () {
        for (const { n } of parts) yield* createReadStream(path.join(closed, String(n)));
      };
      const done = await store.putObject(new S3Object(bucket, key, Readable.from(bytes()), metadata));
      await rm(closed, { recursive: true, force: true });
      return done;
    } catch (err) {
      await rename(closed, dir);
      throw err;
    }
  };
}
