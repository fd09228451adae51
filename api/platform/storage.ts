import type { Readable } from 'node:stream';
import {
  AbortMultipartUploadCommand,
  CompleteMultipartUploadCommand,
  CreateBucketCommand,
  CreateMultipartUploadCommand,
  DeleteObjectCommand,
  GetObjectCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  ListMultipartUploadsCommand,
  ListObjectsV2Command,
  PutObjectCommand,
  S3Client,
  S3ServiceException,
  UploadPartCommand,
} from '@aws-sdk/client-s3';
import type { Env } from '../env.ts';

/** A short question to the store answers within this, or the store counts as down. */
const QUESTION_MS = 4_000;
/** Bytes under way may take longer, but not for ever. */
const TRANSFER_MS = 60_000;

/** The store could not be reached or failed by itself; trying again later may help. */
export class StorageDown extends Error {
  override name = 'StorageDown';
}

/** The store refused what was asked (an upload it no longer knows, a part it does not have). */
export class StorageRefused extends Error {
  override name = 'StorageRefused';
}

/** Both ends included, counted from 0, as HTTP's ranges are. */
export interface ByteRange {
  readonly start: number;
  readonly end: number;
}

export interface StoredObject {
  readonly key: string;
  readonly bytes: number;
  readonly changedAt: Date;
}

/** Objects by key; a key is one of our ids, never a name that a person gave. */
export interface Storage {
  put(key: string, body: Uint8Array, type: string): Promise<void>;
  /** @returns null when there is no such object; the stream must be read or destroyed */
  get(key: string, range?: ByteRange): Promise<{ body: Readable; bytes: number; type: string } | null>;
  head(key: string): Promise<{ bytes: number; type: string } | null>;
  /** Removing what is not there is no fault. */
  remove(key: string): Promise<void>;
  /** @returns the store's id of the upload */
  createMultipart(key: string, type: string): Promise<string>;
  /**
   * @param sha256 digest of the body in hexadecimal, where it is known: the store then holds the bytes against it
   * @returns the part's ETag, which `completeMultipart` wants back
   */
  putPart(key: string, uploadId: string, n: number, body: Uint8Array, sha256?: string): Promise<string>;
  completeMultipart(key: string, uploadId: string, parts: readonly { n: number; etag: string }[]): Promise<void>;
  /** Aborting what is no longer there is no fault. */
  abortMultipart(key: string, uploadId: string): Promise<void>;
  /** Every object, in the order of keys; for the sweep. */
  list(prefix?: string): AsyncIterable<StoredObject>;
  /** Every upload in parts that was neither completed nor aborted; for the sweep. */
  listMultiparts(): AsyncIterable<{ key: string; uploadId: string; startedAt: Date }>;
  /** @throws StorageDown when the bucket cannot be reached within `withinMs` */
  check(withinMs?: number): Promise<void>;
  /** Makes the bucket where it is missing. */
  prepare(): Promise<void>;
  close(): void;
}

/** Codes of refusals that are the asker's affair; everything else counts as the store being down. */
const REFUSALS = new Set(['NoSuchUpload', 'InvalidPart', 'InvalidPartOrder', 'EntityTooSmall', 'InvalidRange']);

function isMissing(err: unknown): boolean {
  return err instanceof S3ServiceException && err.$metadata.httpStatusCode === 404 && err.name !== 'NoSuchUpload';
}

async function ask<T>(work: (abortSignal: AbortSignal) => Promise<T>, withinMs: number): Promise<T> {
  const cut = new AbortController();
  // Stopped once the answer begins: the bytes of a clip may take as long as somebody watches it.
  const timer = setTimeout(() => cut.abort(), withinMs);
  try {
    return await work(cut.signal);
  } catch (err) {
    if (isMissing(err)) throw err;
    if (err instanceof S3ServiceException && REFUSALS.has(err.name)) {
      throw new StorageRefused(err.name, { cause: err });
    }
    throw new StorageDown('object storage did not answer as it should', { cause: err });
  } finally {
    clearTimeout(timer);
  }
}

/** Signs a body by a digest that is known already, instead of going over its bytes once more. */
function signWith(command: UploadPartCommand, sha256: string): void {
  command.middlewareStack.add(
    (next) => (args) => {
      (args.request as { headers: Record<string, string> }).headers['x-amz-content-sha256'] = sha256;
      return next(args);
    },
    { step: 'build', name: 'signWithKnownDigest' },
  );
}

async function orNull<T>(work: Promise<T>): Promise<T | null> {
  try {
    return await work;
  } catch (err) {
    if (isMissing(err)) return null;
    throw err;
  }
}

/** Opens the store over S3; checksums only where S3 requires them, since other stores keep the framing in the file. */
export function openStorage(settings: Env['s3']): Storage {
  const client = new S3Client({
    region: settings.region,
    endpoint: settings.endpoint,
    forcePathStyle: true,
    credentials: { accessKeyId: settings.accessKey, secretAccessKey: settings.secretKey },
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    maxAttempts: 2,
    requestHandler: { connectionTimeout: 1_500 },
  });
  const Bucket = settings.bucket;

  async function* list(prefix?: string): AsyncGenerator<StoredObject> {
    let token: string | undefined;
    do {
      const page = await ask(
        (abortSignal) =>
          client.send(new ListObjectsV2Command({ Bucket, Prefix: prefix, ContinuationToken: token }), { abortSignal }),
        QUESTION_MS,
      );
      for (const item of page.Contents ?? []) {
        yield { key: item.Key ?? '', bytes: item.Size ?? 0, changedAt: item.LastModified ?? new Date(0) };
      }
      token = page.NextContinuationToken;
    } while (token !== undefined);
  }

  async function* listMultiparts(): AsyncGenerator<{ key: string; uploadId: string; startedAt: Date }> {
    let marker: { KeyMarker?: string; UploadIdMarker?: string } | undefined = {};
    while (marker) {
      const at: { KeyMarker?: string; UploadIdMarker?: string } = marker;
      const page = await ask(
        (abortSignal) => client.send(new ListMultipartUploadsCommand({ Bucket, ...at }), { abortSignal }),
        QUESTION_MS,
      );
      for (const item of page.Uploads ?? []) {
        yield { key: item.Key ?? '', uploadId: item.UploadId ?? '', startedAt: item.Initiated ?? new Date(0) };
      }
      marker =
        page.IsTruncated && page.NextKeyMarker !== undefined
          ? {
              KeyMarker: page.NextKeyMarker,
              ...(page.NextUploadIdMarker !== undefined && { UploadIdMarker: page.NextUploadIdMarker }),
            }
          : undefined;
    }
  }

  return {
    async put(Key, Body, ContentType) {
      await ask(
        (abortSignal) =>
          client.send(new PutObjectCommand({ Bucket, Key, Body, ContentType, ContentLength: Body.byteLength }), {
            abortSignal,
          }),
        TRANSFER_MS,
      );
    },
    async get(Key, range) {
      const Range = range && `bytes=${range.start}-${range.end}`;
      const found = await orNull(
        ask((abortSignal) => client.send(new GetObjectCommand({ Bucket, Key, Range }), { abortSignal }), TRANSFER_MS),
      );
      return (
        found && {
          body: found.Body as Readable,
          bytes: found.ContentLength ?? 0,
          type: found.ContentType ?? 'application/octet-stream',
        }
      );
    },
    async head(Key) {
      const found = await orNull(
        ask((abortSignal) => client.send(new HeadObjectCommand({ Bucket, Key }), { abortSignal }), QUESTION_MS),
      );
      return found && { bytes: found.ContentLength ?? 0, type: found.ContentType ?? 'application/octet-stream' };
    },
    async remove(Key) {
      await orNull(
        ask((abortSignal) => client.send(new DeleteObjectCommand({ Bucket, Key }), { abortSignal }), QUESTION_MS),
      );
    },
    async createMultipart(Key, ContentType) {
      const begun = await ask(
        (abortSignal) => client.send(new CreateMultipartUploadCommand({ Bucket, Key, ContentType }), { abortSignal }),
        QUESTION_MS,
      );
      if (begun.UploadId === undefined) throw new StorageDown('object storage began an upload without naming it');
      return begun.UploadId;
    },
    async putPart(Key, UploadId, PartNumber, Body, sha256) {
      const input = { Bucket, Key, UploadId, PartNumber, Body, ContentLength: Body.byteLength };
      const command = new UploadPartCommand(input);
      if (sha256 !== undefined) signWith(command, sha256);
      const put = await ask((abortSignal) => client.send(command, { abortSignal }), TRANSFER_MS);
      if (put.ETag === undefined) throw new StorageDown('object storage took a part without naming it');
      return put.ETag;
    },
    async completeMultipart(Key, UploadId, parts) {
      await ask(
        (abortSignal) =>
          client.send(
            new CompleteMultipartUploadCommand({
              Bucket,
              Key,
              UploadId,
              MultipartUpload: { Parts: parts.map(({ n, etag }) => ({ PartNumber: n, ETag: etag })) },
            }),
            { abortSignal },
          ),
        TRANSFER_MS,
      );
    },
    async abortMultipart(Key, UploadId) {
      try {
        await ask(
          (abortSignal) => client.send(new AbortMultipartUploadCommand({ Bucket, Key, UploadId }), { abortSignal }),
          QUESTION_MS,
        );
      } catch (err) {
        if (!(err instanceof StorageRefused) && !isMissing(err)) throw err;
      }
    },
    list,
    listMultiparts,
    async check(withinMs = QUESTION_MS) {
      const there = await orNull(
        ask((abortSignal) => client.send(new HeadBucketCommand({ Bucket }), { abortSignal }), withinMs),
      );
      if (!there) throw new StorageDown(`there is no bucket ${Bucket}`);
    },
    async prepare() {
      const there = await orNull(
        ask((abortSignal) => client.send(new HeadBucketCommand({ Bucket }), { abortSignal }), QUESTION_MS),
      );
      if (there) return;
      try {
        await client.send(new CreateBucketCommand({ Bucket }));
      } catch (err) {
        const name = err instanceof Error ? err.name : '';
        if (name !== 'BucketAlreadyExists' && name !== 'BucketAlreadyOwnedByYou') throw err;
      }
    },
    close: () => client.destroy(),
  };
}
