import type { Knex } from 'knex';
import type { Role } from '#contract/accounts';

export interface MemberRow {
  person_id: string;
  name: string;
  email: string;
  role: Role;
  joined_at: Date;
  seen_at: Date | null;
}

/** Who belongs to a studio now: owners first, then creators, then editors, each in the order they joined. */
export async function listMembers(db: Knex, studioId: string): Promise<MemberRow[]> {
  return db('members as m')
    .join('people as p', 'p.id', 'm.person_id')
    .where('m.studio_id', studioId)
    .whereNull('m.left_at')
    .orderByRaw(`array_position(array['owner', 'creator', 'editor'], m.role), m.joined_at, p.name`)
    .select<MemberRow[]>(
      'm.person_id',
      'p.name',
      'p.email',
      'm.role',
      'm.joined_at',
      db.raw('(select max(s.seen_at) from sessions s where s.person_id = m.person_id) as seen_at'),
    );
}

/** Makes somebody a member; who left before comes back under the same row. */
export async function putMember(trx: Knex, studioId: string, personId: string, role: Role, now: Date): Promise<void> {
  await trx('members')
    .insert({ studio_id: studioId, person_id: personId, role, joined_at: now })
    .onConflict(['studio_id', 'person_id'])
    .merge({ role, joined_at: now, left_at: null });
}

/**
 * Reads the members' roles and holds them until the transaction ends, so that of two owners who leave at once one
 * is still there when the other has gone.
 */
export async function lockRoles(trx: Knex.Transaction, studioId: string): Promise<ReadonlyMap<string, Role>> {
  await trx('studios').where({ id: studioId }).forUpdate().first('id');
  const rows = await trx('members')
    .where({ studio_id: studioId })
    .whereNull('left_at')
    .select<{ person_id: string; role: Role }[]>('person_id', 'role');
  return new Map(rows.map((row) => [row.person_id, row.role]));
}

export async function changeMember(
  trx: Knex,
  studioId: string,
  personId: string,
  change: { role: Role } | { left_at: Date },
): Promise<void> {
  await trx('members').where({ studio_id: studioId, person_id: personId }).update(change);
}

export interface InvitationRow {
  email: string;
  expires_at: Date;
  payload: InvitationPayload;
}

/** What a letter of invitation stands for; kept beside its token. */
export interface InvitationPayload {
  id: string;
  studioId: string;
  role: Role;
  invitedBy: string;
  askedBy: string;
}

const openInvitations = (db: Knex, studioId: string, now: Date) =>
  db('tokens')
    .where({ kind: 'invite' })
    .whereNull('used_at')
    .where('expires_at', '>', now)
    .whereRaw(`payload->>'studioId' = ?`, [studioId]);

/** Invitations that wait for an answer, the newest first. */
export async function listInvitations(db: Knex, studioId: string, now: Date): Promise<InvitationRow[]> {
  return openInvitations(db, studioId, now)
    .orderBy('expires_at', 'desc')
    .select<InvitationRow[]>('email', 'expires_at', 'payload');
}

/** Takes invitations back: the one of an id, or all to an address. @returns how many there were */
export async function dropInvitations(
  trx: Knex,
  studioId: string,
  which: { id: string } | { email: string },
  now: Date,
): Promise<number> {
  const open = openInvitations(trx, studioId, now);
  return 'id' in which
    ? open.whereRaw(`payload->>'id' = ?`, [which.id]).delete()
    : open.where({ email: which.email }).delete();
}
