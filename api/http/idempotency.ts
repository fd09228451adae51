import { createHash } from 'node:crypto';
import type { Request, RequestHandler } from 'express';
import type { Knex } from 'knex';
import type { Deps } from '../platform/deps.ts';
import { callerOf } from './limits.ts';
import { AppError } from './problem.ts';
import { sessionOf } from './session.ts';

const KEPT_MS = 24 * 3_600_000;
/** A request without an answer after this long died with its process; the key may be used again. */
const LOST_MS = 60_000;

interface KeyRow {
  request_hash: string;
  status: number | null;
  answer: { body: unknown; headers: Record<string, string> } | null;
}

const REPEATED_HEADERS = ['ETag', 'Location'] as const;

async function takeKey(db: Knex, key: { scope: string; key: string }, hash: string, now: Date) {
  const ago = (ms: number) => new Date(now.getTime() - ms);
  await db('request_keys')
    .where(key)
    .whereRaw('(created_at <= ? or (status is null and created_at <= ?))', [ago(KEPT_MS), ago(LOST_MS)])
    .delete();
  const taken = await db('request_keys')
    .insert({ ...key, request_hash: hash, created_at: now })
    .onConflict(['scope', 'key'])
    .ignore()
    .returning('key');
  return taken.length > 0;
}

function scopeOf(req: Request): string {
  const who = sessionOf(req)?.person.id ?? callerOf(req);
  return createHash('sha256').update(`${who}\n${req.method}\n${req.baseUrl}${req.path}`).digest('base64url');
}

/** What was asked for: the body, and a file that was sent as a form. */
function hashOf({ body, file }: Request): string {
  const hash = createHash('sha256').update(JSON.stringify(body ?? null));
  if (file) hash.update(JSON.stringify([file.originalname, file.mimetype])).update(file.buffer);
  return hash.digest('base64url');
}

/**
 * Lets a caller send the same request again without doing it twice: with the same `Idempotency-Key` and body the
 * first answer comes again, for 24 hours. Put it on routes that make something; without the header nothing changes.
 * @throws AppError bad-request | invalid (same key, other body) | still-running
 */
export function idempotent({ db, clock, log }: Pick<Deps, 'db' | 'clock' | 'log'>): RequestHandler {
  return async (req, res, next) => {
    const given = req.get('Idempotency-Key');
    if (given === undefined) {
      next();
      return;
    }
    if (!/^[\x21-\x7e]{1,200}$/.test(given)) throw new AppError('bad-request', 'Idempotency-Key cannot be used.');
    const key = { scope: scopeOf(req), key: given };
    const hash = hashOf(req);

    if (!(await takeKey(db, key, hash, clock.now()))) {
      const row = await db<KeyRow>('request_keys').where(key).first();
      if ((row?.request_hash ?? hash) !== hash) {
        throw new AppError('invalid', 'This Idempotency-Key was used for another request.');
      }
      if (typeof row?.status !== 'number')
        throw new AppError('still-running', 'Please try again in a moment.', { retryAfter: 1 });
      res
        .status(row.status)
        .set(row.answer?.headers ?? {})
        .json(row.answer?.body ?? null);
      return;
    }

    const send = res.json.bind(res);
    let kept = false;
    const keep = async (body: unknown) => {
      const headers = Object.fromEntries(
        REPEATED_HEADERS.flatMap((name) =>
          res.getHeader(name) === undefined ? [] : [[name, String(res.getHeader(name))]],
        ),
      );
      await db('request_keys')
        .where(key)
        .update({ status: res.statusCode, answer: JSON.stringify({ body, headers }) });
    };
    res.json = (body: unknown) => {
      kept = true;
      // The change is made already: an answer that could not be kept must still reach the one who asked.
      void keep(body)
        .catch((err: unknown) => log.error({ err }, 'an answer could not be kept'))
        .finally(() => send(body));
      return res;
    };
    res.on('close', () => {
      if (kept) return;
      db('request_keys')
        .where(key)
        .whereNull('status')
        .delete()
        .catch((err: unknown) => log.warn({ err }, 'a key was not given back'));
    });
    next();
  };
}

/** Forgets keys older than a day; a job does it. */
export async function sweepRequestKeys(db: Knex, now: Date): Promise<void> {
  await db('request_keys')
    .where('created_at', '<=', new Date(now.getTime() - KEPT_MS))
    .delete();
}
