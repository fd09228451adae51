import { createHash, randomBytes } from 'node:crypto';
import type { Knex } from 'knex';

export type TokenKind = 'confirm' | 'reset' | 'invite';

export interface TokenRow<Payload = unknown> {
  hash: Buffer;
  kind: TokenKind;
  person_id: string | null;
  email: string | null;
  payload: Payload;
  expires_at: Date;
  used_at: Date | null;
}

const hashOf = (token: string) => createHash('sha256').update(token).digest();

/** What a new token is for. */
export interface TokenUse {
  readonly kind: TokenKind;
  readonly personId?: string;
  readonly email?: string;
  readonly payload?: unknown;
  readonly expiresAt: Date;
}

/** Puts a token that works once into the table. @returns the token itself, which only the letter holds */
export async function createToken(trx: Knex, use: TokenUse): Promise<string> {
  const token = randomBytes(32).toString('base64url');
  await trx('tokens').insert({
    hash: hashOf(token),
    kind: use.kind,
    person_id: use.personId ?? null,
    email: use.email ?? null,
    payload: JSON.stringify(use.payload ?? {}),
    expires_at: use.expiresAt,
  });
  return token;
}

const live = (db: Knex, kind: TokenKind, now: Date) =>
  db<TokenRow>('tokens').where({ kind }).whereNull('used_at').where('expires_at', '>', now);

/** Looks at a token without using it up. @returns undefined where it is unknown, used or past its time */
export async function findToken(db: Knex, kind: TokenKind, token: string, now: Date): Promise<TokenRow | undefined> {
  return live(db, kind, now)
    .where({ hash: hashOf(token) })
    .first<TokenRow | undefined>();
}

/** Uses a token up. Of two who come with it at once, one gets it. @returns undefined where it no longer works */
export async function spendToken(trx: Knex, kind: TokenKind, token: string, now: Date): Promise<TokenRow | undefined> {
  const [row] = await live(trx, kind, now)
    .where({ hash: hashOf(token) })
    .update({ used_at: now })
    .returning<TokenRow[]>('*');
  return row;
}

/** Makes the other links of a person worthless, as after a new password. */
export async function dropTokens(trx: Knex, kind: TokenKind, personId: string): Promise<void> {
  await trx('tokens').where({ kind, person_id: personId }).delete();
}

/** Forgets tokens whose time is over; a job does it. */
export async function sweepTokens(db: Knex, now: Date): Promise<void> {
  await db('tokens').where('expires_at', '<=', now).delete();
}
