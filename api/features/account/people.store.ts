import type { Knex } from 'knex';
import type { Role } from '#contract/accounts';

export interface PersonRow {
  id: string;
  email: string;
  email_confirmed_at: Date | null;
  name: string;
  password_hash: string;
  is_operator: boolean;
  disabled_at: Date | null;
  version: number;
}

const COLUMNS = [
  'id',
  'email',
  'email_confirmed_at',
  'name',
  'password_hash',
  'is_operator',
  'disabled_at',
  'version',
] as const;

/** Addresses are compared without regard to case, as the column does. */
export async function findByEmail(db: Knex, email: string): Promise<PersonRow | undefined> {
  return db<PersonRow>('people')
    .where({ email })
    .first(...COLUMNS);
}

export async function findPerson(db: Knex, id: string): Promise<PersonRow | undefined> {
  return db<PersonRow>('people')
    .where({ id })
    .first(...COLUMNS);
}

/** @returns the new person, or undefined when the address is taken (nothing is written then) */
export async function insertPerson(
  db: Knex,
  person: { name: string; email: string; passwordHash: string; confirmedAt: Date | null },
): Promise<PersonRow | undefined> {
  const [row] = await db<PersonRow>('people')
    .insert({
      name: person.name,
      email: person.email,
      password_hash: person.passwordHash,
      email_confirmed_at: person.confirmedAt,
    })
    .onConflict('email')
    .ignore()
    .returning([...COLUMNS]);
  return row;
}

export async function confirmEmail(db: Knex, id: string, at: Date): Promise<void> {
  await db<PersonRow>('people').where({ id }).whereNull('email_confirmed_at').update({ email_confirmed_at: at });
}

/** A new password also confirms the address where the way to it was a letter. */
export async function replacePassword(db: Knex, id: string, passwordHash: string): Promise<void> {
  await db<PersonRow>('people').where({ id }).update({ password_hash: passwordHash });
}

/** @returns the saved row, or undefined when `version` is no longer the stored one */
export async function renamePerson(
  db: Knex,
  id: string,
  name: string,
  version: number,
): Promise<PersonRow | undefined> {
  const [row] = await db<PersonRow>('people')
    .where({ id, version })
    .update({ name, version: version + 1 })
    .returning([...COLUMNS]);
  return row;
}

export interface MembershipRow {
  studio_id: string;
  studio_name: string;
  role: Role;
}

export async function listMemberships(db: Knex, personId: string): Promise<MembershipRow[]> {
  return db('members')
    .join('studios', 'studios.id', 'members.studio_id')
    .where('members.person_id', personId)
    .whereNull('members.left_at')
    .orderBy('members.joined_at')
    .select<MembershipRow[]>('studios.id as studio_id', 'studios.name as studio_name', 'members.role');
}

export interface PlaceRow {
  token_hash: Buffer;
  created_at: Date;
  seen_at: Date;
  user_agent: string;
}

/** Where a person is signed in and not past the given limits, the last used first. */
export async function listPlaces(db: Knex, personId: string, seenAfter: Date, createdAfter: Date): Promise<PlaceRow[]> {
  return db<PlaceRow>('sessions')
    .where({ person_id: personId } as never)
    .where('seen_at', '>', seenAfter)
    .where('created_at', '>', createdAfter)
    .orderBy('seen_at', 'desc')
    .select('token_hash', 'created_at', 'seen_at', 'user_agent');
}
