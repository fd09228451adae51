import type { Knex } from 'knex';
import { currentRequestId } from './log.ts';

/** Something done that somebody may have to answer for: who came in, who gave whom which right. */
export interface Deed {
  readonly personId: string | null;
  /** As `sign-in`, `sign-in-refused`, `member-removed`. */
  readonly what: string;
  /** Whom or what it was done to. Never a password, a token or an address typed by a stranger. */
  readonly target?: string;
}

/** Writes a deed into the audit, with the id of the request it was part of. */
export async function addAudit(db: Knex, { personId, what, target = '' }: Deed): Promise<void> {
  await db('audit').insert({ person_id: personId, what, target, request_id: currentRequestId() });
}
