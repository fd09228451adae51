import { pipeline } from 'node:stream/promises';
import type { Readable } from 'node:stream';
import type { Request, Response } from 'express';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { StorageDown, type ByteRange } from '../../platform/storage.ts';
import { readRange } from './byte-range.ts';
import { findClip, type ClipRow } from './clips.store.ts';
import { canWatchClip } from './recordings.policy.ts';

/** The clip may be kept by the browser that got it, but the right to it is asked for again each time. */
const KEEPING = 'private, no-cache';

const POLICY = "default-src 'none'; object-src 'none'; base-uri 'none'; frame-ancestors 'none'; sandbox";

interface Described {
  readonly status: 200 | 206 | 416;
  readonly headers: Readonly<Record<string, string>>;
  readonly range?: ByteRange;
}

function describeAnswer(clip: ClipRow, rangeHeader: string | undefined): Described {
  const range = readRange(rangeHeader, clip.bytes);
  const headers = {
    'Accept-Ranges': 'bytes',
    'Content-Type': clip.type,
    'Content-Disposition': 'inline',
    'Content-Security-Policy': POLICY,
    'X-Content-Type-Options': 'nosniff',
    'Cache-Control': KEEPING,
    'Last-Modified': clip.changedAt.toUTCString(),
    ETag: etagOf(clip),
  };
  if (range === 'unsatisfiable') return { status: 416, headers: { 'Content-Range': `bytes */${clip.bytes}` } };
  if (range === null) return { status: 200, headers: { ...headers, 'Content-Length': String(clip.bytes) } };
  return {
    status: 206,
    range,
    headers: {
      ...headers,
      'Content-Range': `bytes ${range.start}-${range.end}/${clip.bytes}`,
      'Content-Length': String(range.end - range.start + 1),
    },
  };
}

const etagOf = (clip: ClipRow) => `"${clip.objectId}"`;

async function readStored(storage: Deps['storage'], clip: ClipRow, range: ByteRange | undefined): Promise<Readable> {
  const found = await storage.get(clip.key, range);
  if (!found) throw new StorageDown('a clip is not where it should be');
  return found.body;
}

/**
 * A recording's whole clip, whoever asks: no right is checked here.
 * @throws AppError not-found while there is none
 */
export async function findRecordingClip(db: Deps['db'], recordingId: string): Promise<ClipRow> {
  const clip = await findClip(db, recordingId);
  if (!clip) throw new AppError('not-found');
  return clip;
}

/**
 * A recording's clip, for a member of its studio, or for anybody once it is published.
 * @param who null for somebody who is not signed in
 * @throws AppError not-found, also where it may not be seen
 */
export async function findWatchableClip(db: Deps['db'], who: Person | null, recordingId: string): Promise<ClipRow> {
  const clip = await findRecordingClip(db, recordingId);
  if (!canWatchClip(who, clip)) throw new AppError('not-found');
  return clip;
}

/** A stretch is only the right one of the very same clip; of another, the whole answers. */
function wantedRange(req: Request, clip: ClipRow): string | undefined {
  const condition = req.get('If-Range');
  return condition === undefined || condition === etagOf(clip) ? req.get('Range') : undefined;
}

/**
 * Answers a request with a clip: ranges, HEAD and revalidation as HTTP has them. The right was checked before.
 * @throws AppError range-refused
 * @throws StorageDown
 */
export async function sendClip(
  { storage, log }: Pick<Deps, 'storage' | 'log'>,
  clip: ClipRow,
  req: Request,
  res: Response,
): Promise<void> {
  const { status, headers, range } = describeAnswer(clip, wantedRange(req, clip));
  if (req.get('If-None-Match') === etagOf(clip)) {
    res
      .status(304)
      .set({ ETag: etagOf(clip), 'Cache-Control': KEEPING })
      .end();
    return;
  }
  if (status === 416) {
    res.set(headers);
    throw new AppError('range-refused', 'The clip ends before that.');
  }
  const body = req.method === 'HEAD' ? null : await readStored(storage, clip, range);
  res.status(status).set(headers);
  if (!body) {
    res.end();
    return;
  }
  try {
    await pipeline(body, res);
  } catch (err) {
    // A viewer who seeks or leaves ends the answer, and nothing failed; what the store broke off is asked for again.
    if (!req.destroyed) log.warn({ err }, 'a clip was not sent to its end');
  }
}
