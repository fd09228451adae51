import { createHash, createHmac, timingSafeEqual } from 'node:crypto';
import type { Context, Middleware } from 's3rver';
import S3Error from 's3rver/lib/models/error.js';

/** What a request claims about its own signature (AWS signature version 4, in a header or in the query). */
interface Claim {
  readonly accessKey: string;
  readonly scope: string;
  readonly signedHeaders: readonly string[];
  readonly signature: string;
  readonly time: string;
  readonly payload: string;
}

const strict = (text: string) =>
  encodeURIComponent(text).replace(/[!'()*]/g, (char) => `%${char.charCodeAt(0).toString(16).toUpperCase()}`);
const hmac = (key: string | Buffer, text: string) => createHmac('sha256', key).update(text).digest();
const sha256 = (text: string) => createHash('sha256').update(text).digest('hex');

function claimOf(ctx: Context): Claim | null {
  const header =
    /^AWS4-HMAC-SHA256 Credential=([^/]+)\/([^,]+),\s*SignedHeaders=([^,]+),\s*Signature=([0-9a-f]{64})$/.exec(
      ctx.headers.authorization ?? '',
    );
  if (header) {
    const [, accessKey = '', scope = '', names = '', signature = ''] = header;
    const time = ctx.headers['x-amz-date'] ?? '';
    const payload = ctx.headers['x-amz-content-sha256'] ?? '';
    return { accessKey, scope, signedHeaders: names.split(';'), signature, time, payload };
  }
  const { query } = ctx;
  const [accessKey = '', ...scope] = (query['X-Amz-Credential'] ?? '').split('/');
  const signature = query['X-Amz-Signature'];
  if (signature === undefined) return null;
  return {
    accessKey,
    scope: scope.join('/'),
    signedHeaders: (query['X-Amz-SignedHeaders'] ?? '').split(';'),
    signature,
    time: query['X-Amz-Date'] ?? '',
    payload: query['X-Amz-Content-Sha256'] ?? 'UNSIGNED-PAYLOAD',
  };
}

function canonicalRequest(ctx: Context, claim: Claim): string {
  const { pathname, searchParams } = new URL(ctx.url, 'http://fake');
  const path = pathname
    .split('/')
    .map((part) => strict(decodeURIComponent(part)))
    .join('/');
  const query = [...searchParams]
    .filter(([name]) => name !== 'X-Amz-Signature')
    .map(([name, value]) => `${strict(name)}=${strict(value)}`)
    .sort()
    .join('&');
  const headers = claim.signedHeaders
    .map((name) => `${name}:${(ctx.headers[name] ?? '').trim().replace(/\s+/g, ' ')}\n`)
    .join('');
  return [ctx.method, path, query, headers, claim.signedHeaders.join(';'), claim.payload].join('\n');
}

/** Refuses what is not signed with the one key pair, and what was changed after it was signed. */
export function checkSignature(accessKey: string, secretKey: string): Middleware {
  return (ctx, next) => {
    const claim = claimOf(ctx);
    if (!claim) throw new S3Error('AccessDenied', 'The request is not signed');
    if (claim.accessKey !== accessKey) throw new S3Error('InvalidAccessKeyId', 'This access key is not known');
    const [day = '', region = '', service = '', end = ''] = claim.scope.split('/');
    const key = hmac(hmac(hmac(hmac(`AWS4${secretKey}`, day), region), service), end);
    const toSign = ['AWS4-HMAC-SHA256', claim.time, claim.scope, sha256(canonicalRequest(ctx, claim))].join('\n');
    if (!timingSafeEqual(hmac(key, toSign), Buffer.from(claim.signature.padEnd(64, '0').slice(0, 64), 'hex'))) {
      throw new S3Error('SignatureDoesNotMatch', 'The signature is not the one of this request and key');
    }
    return next();
  };
}
