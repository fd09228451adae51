import { createHash, randomBytes } from 'node:crypto';
import { parse, serialize } from 'cookie';
import type { Request, RequestHandler, Response } from 'express';
import type { Knex } from 'knex';
import type { Deps } from '../platform/deps.ts';
import { AppError } from './problem.ts';

export const SESSION_COOKIE = '__Host-roundelay';
const HOUR_MS = 3_600_000;
/** A session not used for this long has ended. */
export const IDLE_MS = 12 * HOUR_MS;
/** A session this old has ended, used or not. */
export const ABSOLUTE_MS = 14 * 24 * HOUR_MS;
/** Being seen is written down at most this often. */
const SEEN_EVERY_MS = 60_000;

/** Who is asking. Loaded anew for each request, so a role taken away is gone with the next one. */
export interface Person {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly isOperator: boolean;
  readonly memberships: readonly { readonly studioId: string; readonly role: 'owner' | 'creator' | 'editor' }[];
}

export interface Session {
  readonly person: Person;
  /** SHA-256 of the token, as hex: what the table holds. */
  readonly tokenHash: string;
}

const sessions = new WeakMap<Request, Session>();
const hashOf = (token: string) => createHash('sha256').update(token).digest();

/** The session of this request, or null for somebody who is not signed in. */
export function sessionOf(req: Request): Session | null {
  return sessions.get(req) ?? null;
}

/** @throws AppError signed-out */
export function signedIn(req: Request): Person {
  const session = sessions.get(req);
  if (!session)
    throw new AppError('signed-out', 'Your session has ended. What you typed is still here: sign in again.');
  return session.person;
}

interface SessionRow {
  seen_at: Date;
  id: string;
  name: string;
  email: string;
  is_operator: boolean;
  memberships: Person['memberships'];
}

const toPerson = ({ id, name, email, is_operator, memberships }: SessionRow): Person => ({
  id,
  name,
  email,
  isOperator: is_operator,
  memberships,
});

async function findSession(db: Knex, tokenHash: Buffer, now: Date): Promise<SessionRow | undefined> {
  const found = await db.raw<{ rows: SessionRow[] }>(
    `select s.seen_at, p.id, p.name, p.email, p.is_operator,
            coalesce((select json_agg(json_build_object('studioId', m.studio_id, 'role', m.role))
                        from members m where m.person_id = p.id and m.left_at is null), '[]') as memberships
       from sessions s join people p on p.id = s.person_id
      where s.token_hash = ? and s.seen_at > ? and s.created_at > ? and p.disabled_at is null`,
    [tokenHash, new Date(now.getTime() - IDLE_MS), new Date(now.getTime() - ABSOLUTE_MS)],
  );
  return found.rows[0];
}

/** The person of a request that goes on for long, looked up anew: null once signed out or ended. */
export async function personStillIn({ db, clock }: Pick<Deps, 'db' | 'clock'>, req: Request): Promise<Person | null> {
  const session = sessions.get(req);
  const row = session && (await findSession(db, Buffer.from(session.tokenHash, 'hex'), clock.now()));
  return row ? toPerson(row) : null;
}

const tokenIn = (req: Request): string | undefined => parse(req.get('Cookie') ?? '')[SESSION_COOKIE];

/** Finds out who asks. A cookie that is no longer good is treated as none. */
export function readSession({ db, clock }: Pick<Deps, 'db' | 'clock'>): RequestHandler {
  return async (req, _res, next) => {
    const token = tokenIn(req);
    if (token !== undefined) {
      const hash = hashOf(token);
      const now = clock.now();
      const row = await findSession(db, hash, now);
      if (row) {
        sessions.set(req, { person: toPerson(row), tokenHash: hash.toString('hex') });
        if (now.getTime() - row.seen_at.getTime() >= SEEN_EVERY_MS) {
          await db('sessions').where({ token_hash: hash }).update({ seen_at: now });
        }
      }
    }
    next();
  };
}

/** Puts a new session into the table. @returns the token, which is kept nowhere else */
export async function createSession(
  { db, clock }: { readonly db: Knex; readonly clock: Deps['clock'] },
  personId: string,
  userAgent = '',
): Promise<string> {
  const token = randomBytes(32).toString('base64url');
  const now = clock.now();
  await db('sessions').insert({
    token_hash: hashOf(token),
    person_id: personId,
    created_at: now,
    seen_at: now,
    user_agent: userAgent.slice(0, 200),
  });
  return token;
}

const cookieOptions = { path: '/', httpOnly: true, secure: true, sameSite: 'lax' } as const;

/** Signs a person in on this answer. The token the request came with, if any, stops working. */
export async function startSession(deps: Pick<Deps, 'db' | 'clock'>, req: Request, res: Response, personId: string) {
  const old = tokenIn(req);
  if (old !== undefined)
    await deps
      .db('sessions')
      .where({ token_hash: hashOf(old) })
      .delete();
  const token = await createSession(deps, personId, req.get('User-Agent'));
  const maxAge = ABSOLUTE_MS / 1_000;
  res.append('Set-Cookie', serialize(SESSION_COOKIE, token, { ...cookieOptions, maxAge }));
}

/** Signs out: the cookie is taken back, and a copy of it is worth nothing. */
export async function endSession({ db }: Pick<Deps, 'db'>, req: Request, res: Response): Promise<void> {
  const token = tokenIn(req);
  if (token !== undefined)
    await db('sessions')
      .where({ token_hash: hashOf(token) })
      .delete();
  res.append('Set-Cookie', serialize(SESSION_COOKIE, '', { ...cookieOptions, maxAge: 0 }));
}

/** Ends every session of a person, except one if its hash (hex) is given. */
export async function endSessionsOf(db: Knex, personId: string, exceptTokenHash?: string): Promise<void> {
  const all = db('sessions').where({ person_id: personId });
  await (
    exceptTokenHash === undefined ? all : all.whereNot({ token_hash: Buffer.from(exceptTokenHash, 'hex') })
  ).delete();
}

/** Clears out sessions that have ended by their age; a job does it once a day. */
export async function sweepSessions(db: Knex, now: Date): Promise<void> {
  await db('sessions')
    .where('seen_at', '<=', new Date(now.getTime() - IDLE_MS))
    .orWhere('created_at', '<=', new Date(now.getTime() - ABSOLUTE_MS))
    .delete();
}
