/** The parts of s3rver that the fixes take hold of; the package brings no types of its own. */
declare module 's3rver' {
  import type { Server } from 'node:http';
  import type { Readable } from 'node:stream';

  export interface StoredMetadata {
    readonly etag: string;
    readonly 'last-modified': string;
    readonly 'content-length': number;
    readonly [name: string]: unknown;
  }
  export interface FakeObject {
    readonly bucket: string;
    readonly key: string;
    readonly content: Readable | Buffer | null;
    readonly metadata: Readonly<Record<string, string>>;
    readonly size: number;
    range?: { start: number; end: number };
  }
  export interface ListOptions {
    readonly delimiter?: string;
    readonly startAfter?: string;
    readonly prefix?: string;
    readonly maxKeys?: number;
  }
  export interface Store {
    getBucket(bucket: string): Promise<unknown>;
    getResourcePath(bucket: string, key: string | undefined, resource: string): string;
    getMetadata(bucket: string, key: string): Promise<StoredMetadata>;
    putMetadata(bucket: string, key: string, metadata: unknown, md5: string): Promise<void>;
    listObjects(
      bucket: string,
      options: ListOptions,
    ): Promise<{ objects: FakeObject[]; commonPrefixes: string[]; isTruncated: boolean }>;
    getObject(bucket: string, key: string, options?: { start?: number; end?: number }): Promise<FakeObject | null>;
    putObject(object: FakeObject): Promise<{ size: number; md5: string }>;
    putPart(
      bucket: string,
      uploadId: string,
      partNumber: string,
      content: Readable,
    ): Promise<{ size: number; md5: string }>;
    putObjectMultipart(
      bucket: string,
      uploadId: string,
      parts: readonly { number: number; etag: string }[],
    ): Promise<{ size: number; md5: string }>;
  }
  export interface Context {
    readonly method: string;
    readonly path: string;
    readonly url: string;
    readonly query: Readonly<Record<string, string | undefined>>;
    readonly headers: Record<string, string | undefined>;
    readonly store: Store;
    req: Readable;
    status: number;
    body: unknown;
  }
  export type Middleware = (ctx: Context, next: () => Promise<unknown>) => unknown;

  export default class S3rver {
    constructor(options: Readonly<Record<string, unknown>>);
    readonly middleware: Middleware[];
    readonly store: Store;
    readonly httpServer: Server;
    silent: boolean;
    on(event: 'error', listener: (err: Error) => void): this;
    run(): Promise<{ port: number; address: string }>;
    close(): Promise<void>;
  }
}

declare module 's3rver/lib/models/error.js' {
  export default class S3Error extends Error {
    constructor(code: string, message: string, detail?: Readonly<Record<string, unknown>>);
  }
}

declare module 's3rver/lib/models/object.js' {
  import type { FakeObject } from 's3rver';
  import type { Readable } from 'node:stream';

  const S3Object: new (bucket: string, key: string, content: Readable | null, metadata: unknown) => FakeObject;
  export default S3Object;
}

declare module 's3rver/lib/models/account.js' {
  const accounts: { DUMMY_ACCOUNT: { createKeyPair(accessKeyId: string, secretAccessKey: string): void } };
  export default accounts;
}
