import { createHash } from 'node:crypto';
import { pipeline, Transform, type TransformCallback } from 'node:stream';
import type { Middleware } from 's3rver';
import S3Error from 's3rver/lib/models/error.js';

/** Takes the framing of `aws-chunked` away: `<hex size>[;extension]CRLF bytes CRLF …  0 CRLF trailers`. */
class Unframe extends Transform {
  private head = '';
  private left = 0;
  private skip = 0;
  private done = false;

  override _transform(chunk: Buffer, _encoding: BufferEncoding, callback: TransformCallback): void {
    let at = 0;
    while (at < chunk.length && !this.done) {
      if (this.left > 0) {
        const take = Math.min(this.left, chunk.length - at);
        this.push(chunk.subarray(at, at + take));
        this.left -= take;
        at += take;
        if (this.left === 0) this.skip = 2;
      } else if (this.skip > 0) {
        this.skip -= 1;
        at += 1;
      } else {
        const end = chunk.indexOf(0x0a, at);
        this.head += chunk.toString('latin1', at, end < 0 ? chunk.length : end);
        at = end < 0 ? chunk.length : end + 1;
        if (end >= 0) this.openFrame();
      }
    }
    callback();
  }

  private openFrame(): void {
    this.left = Number.parseInt(this.head, 16) || 0;
    this.done = this.left === 0;
    this.head = '';
  }
}

function checkSha256(expected: string): Transform {
  const hash = createHash('sha256');
  return new Transform({
    transform(chunk: Buffer, _encoding, callback) {
      hash.update(chunk);
      callback(null, chunk);
    },
    flush(callback) {
      const same = hash.digest('hex') === expected;
      callback(same ? null : new S3Error('BadDigest', 'The body is not the one that was signed'));
    },
  });
}

/** Hands on the bytes of a PUT as they are meant to be stored, and refuses a body that was not the signed one. */
export const readBody: Middleware = (ctx, next) => {
  if (ctx.method !== 'PUT') return next();
  const digest = ctx.headers['x-amz-content-sha256'] ?? 'UNSIGNED-PAYLOAD';
  const encodings = (ctx.headers['content-encoding'] ?? '').split(',').map((name) => name.trim());
  let filter: Transform | null = null;
  if (digest.startsWith('STREAMING-') || encodings.includes('aws-chunked')) {
    filter = new Unframe();
    const rest = encodings.filter((name) => name !== 'aws-chunked').join(',');
    if (rest) ctx.headers['content-encoding'] = rest;
    else delete ctx.headers['content-encoding'];
  } else if (/^[0-9a-f]{64}$/.test(digest)) {
    filter = checkSha256(digest);
  }
  // An error reaches whoever reads the last stream, which is where it is answered.
  if (filter) ctx.req = pipeline(ctx.req, filter, () => undefined);
  return next();
};
