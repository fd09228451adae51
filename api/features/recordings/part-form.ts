import { createHash } from 'node:crypto';
import type { Request, Response } from 'express';
import multer from 'multer';
import { PartDigest } from '#contract/uploads';
import { AppError } from '../../http/problem.ts';

/** A part that stops arriving for this long is given up: the sender goes on with it over a new connection. */
const STALL_MS = 20_000;

export interface PartBytes {
  readonly sha256: string;
  readonly bytes: Uint8Array;
}

/** Reads into `buffer`, counting and digesting on the way, so that a part lies in memory once. */
function intoBuffer(buffer: Buffer, isOver: () => boolean): multer.StorageEngine {
  return {
    _handleFile(_req, file, done) {
      const hash = createHash('sha256');
      let size = 0;
      file.stream.on('data', (chunk: Buffer) => {
        // A form that was given up may still have bytes under way, and its buffer another owner by now.
        if (isOver()) return;
        chunk.copy(buffer, size);
        hash.update(chunk);
        size += chunk.length;
      });
      file.stream.once('error', (err: unknown) => done(err));
      file.stream.once('end', () => done(null, { size, filename: hash.digest('hex') }));
    },
    _removeFile: (_req, _file, done) => done(null),
  };
}

const WANTED = 'A part is a form with the field "sha256" first and the file "part" after it.';

/**
 * Reads the form of a part: the digest first, then the bytes, into `buffer`.
 * @param limit bytes the part may have
 * @param known asked with the digest before the bytes are read; true: they need not be, they are here already
 * @returns null when `known` said so
 * @throws AppError bad-request | too-large | invalid (the bytes are not those of the digest)
 */
export async function readPartForm(
  req: Request,
  res: Response,
  options: {
    readonly buffer: Buffer;
    readonly limit: number;
    readonly known: (sha256: string) => boolean;
  },
): Promise<PartBytes | null> {
  const seen = { known: false, over: false };
  const form = multer({
    storage: intoBuffer(options.buffer, () => seen.over),
    limits: { fileSize: options.limit, files: 1, fields: 1, parts: 2, fieldSize: 200 },
    fileFilter: (asked, _file, done) => {
      try {
        seen.known = options.known(PartDigest.parse(asked.body).sha256);
        done(null, !seen.known);
      } catch (err) {
        done(err as Error);
      }
    },
  }).single('part');

  await new Promise<void>((resolve, reject) => {
    const stalled = () => req.destroy();
    const gone = () => {
      if (req.complete) return;
      seen.over = true;
      reject(new AppError('bad-request', 'The connection ended before the part had arrived.'));
    };
    req.setTimeout(STALL_MS, stalled);
    req.once('close', gone);
    void form(req, res, (err: unknown) => {
      req.setTimeout(0);
      req.off('close', gone);
      seen.over = true;
      if (err instanceof Error) reject(err);
      else resolve();
    });
  });
  if (seen.known) return null;
  if (!req.file) throw new AppError('bad-request', WANTED);
  const { sha256 } = PartDigest.parse(req.body);
  if (req.file.filename !== sha256) {
    throw new AppError('invalid', 'The part was damaged on its way. Nothing else was lost: send this part again.');
  }
  return { sha256, bytes: options.buffer.subarray(0, req.file.size) };
}
