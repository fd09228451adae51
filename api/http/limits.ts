import { createHmac } from 'node:crypto';
import type { Request, RequestHandler } from 'express';
import type { Knex } from 'knex';
import type { Deps } from '../platform/deps.ts';
import { AppError } from './problem.ts';
import { sessionOf } from './session.ts';

export interface Limit {
  /** Calls are counted under this name. */
  readonly name: string;
  readonly max: number;
  readonly perMs: number;
  /** Who is counted; by default the session, else the address. Sign-in counts the account too. */
  readonly by?: (req: Request) => string;
}

const MINUTE_MS = 60_000;
/** Everything read, by anybody. */
export const READS: Limit = { name: 'reads', max: 1_000, perMs: MINUTE_MS };
/** Everything written. */
export const WRITES: Limit = { name: 'writes', max: 100, perMs: MINUTE_MS };
/** Calls that make something new: put on the route, beside WRITES. */
export const CREATING: Limit = { name: 'creating', max: 25, perMs: MINUTE_MS };

/** The session's hash, else the caller's address as the trusted proxies tell it. */
export function callerOf(req: Request): string {
  const session = sessionOf(req);
  return session ? `session ${session.tokenHash}` : `address ${req.ip ?? ''}`;
}

/** Counts one call. @returns how often the bucket was hit in its present window, and when that window ends */
export async function countHit(db: Knex, bucket: string, perMs: number, now: Date) {
  const fresh = new Date(now.getTime() + perMs);
  const counted = await db.raw<{ rows: { hits: number; resets_at: Date }[] }>(
    `insert into rate_limits as l (bucket, hits, resets_at) values (?, 1, ?)
     on conflict (bucket) do update set
       hits = case when l.resets_at <= ? then 1 else l.hits + 1 end,
       resets_at = case when l.resets_at <= ? then excluded.resets_at else l.resets_at end
     returning hits, resets_at`,
    [bucket, fresh, now, now],
  );
  const row = counted.rows[0];
  return { hits: row?.hits ?? 1, resetsAt: row?.resets_at ?? fresh };
}

/**
 * Refuses the call after `max` in a window, for all processes together. Waiting for `Retry-After` seconds is enough.
 * Buckets are named by a keyed hash, so that the table holds no addresses.
 */
export function limit(
  deps: Pick<Deps, 'db' | 'clock' | 'env'>,
  { name, max, perMs, by = callerOf }: Limit,
): RequestHandler {
  return async (req, _res, next) => {
    const bucket = createHmac('sha256', deps.env.secret)
      .update(`${name}\n${by(req)}`)
      .digest('base64url');
    const now = deps.clock.now();
    const { hits, resetsAt } = await countHit(deps.db, bucket, perMs, now);
    if (hits > max) {
      const retryAfter = Math.max(1, Math.ceil((resetsAt.getTime() - now.getTime()) / 1_000));
      throw new AppError('rate-limited', `Please wait ${retryAfter} seconds and try again.`, { retryAfter });
    }
    next();
  };
}

/** Forgets windows that have ended; a job does it. */
export async function sweepLimits(db: Knex, now: Date): Promise<void> {
  await db('rate_limits').where('resets_at', '<=', now).delete();
}
