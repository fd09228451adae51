import type { Knex } from 'knex';
import type { AccountEdit, Me, SignedInPlace, SignUp } from '#contract/accounts';
import { AppError } from '../../http/problem.ts';
import { ABSOLUTE_MS, endSessionsOf, IDLE_MS, type Session } from '../../http/session.ts';
import { addAudit } from '../../platform/audit.ts';
import type { Deps } from '../../platform/deps.ts';
import { addJob } from '../../platform/jobs.ts';
import { queueMail } from '../../platform/mail.ts';
import { alreadyLetter, changedLetter, confirmLetter } from './account.letters.ts';
import { hashPassword, isPassword, refuseCommon } from './passwords.ts';
import {
  confirmEmail,
  findByEmail,
  findPerson,
  insertPerson,
  listMemberships,
  listPlaces,
  renamePerson,
  replacePassword,
  type PersonRow,
} from './people.store.ts';
import { createToken, dropTokens, findToken, spendToken } from './tokens.store.ts';

type Needs = Pick<Deps, 'db' | 'clock' | 'env' | 'log'>;

const CONFIRM_MS = 48 * 3_600_000;
const DEAD_LINK = 'This link was used already or its time is over. Ask for a new one.';

/** What a sign-up becomes once its letter is answered; each letter answers for its own. */
interface SignUpPayload {
  name: string;
  passwordHash: string;
}

/**
 * Sends the letter that a sign-up has to be confirmed by; the account is made when it is. A known address gets a
 * letter that says so, and the caller is told the same either way, after the same work.
 * @throws AppError invalid for a password of the common ones
 */
export async function signUp({ db, clock, env }: Needs, { name, email, password }: SignUp): Promise<void> {
  refuseCommon(password);
  const passwordHash = await hashPassword(password);
  const known = await findByEmail(db, email);
  const payload: SignUpPayload = { name, passwordHash };
  const expiresAt = new Date(clock.now().getTime() + CONFIRM_MS);
  await db.transaction(async (trx) => {
    if (known) return queueMail(trx, 'already', email, alreadyLetter(env.publicUrl, known.name));
    const token = await createToken(trx, { kind: 'confirm', email, payload, expiresAt });
    return queueMail(trx, 'confirm', email, confirmLetter(env.publicUrl, name, token));
  });
}

/**
 * Makes the account that a letter was sent for. Nobody is signed in by it: who followed the link need not be the one
 * who chose the password.
 * @returns the address, so that signing in can begin with it
 * @throws AppError gone for a link that no longer works | conflict where another letter was answered before
 */
export async function confirmAddress({ db, clock }: Needs, token: string): Promise<string> {
  return db.transaction(async (trx) => {
    const row = await spendToken(trx, 'confirm', token, clock.now());
    if (!row?.email) throw new AppError('gone', DEAD_LINK);
    const { name, passwordHash } = row.payload as SignUpPayload;
    const person = await insertPerson(trx, { name, email: row.email, passwordHash, confirmedAt: clock.now() });
    if (!person) throw new AppError('conflict', 'This address is confirmed already: sign in.');
    await addAudit(trx, { personId: person.id, what: 'account-made' });
    return row.email;
  });
}

/** Makes an account whose address a letter has proved already; for invitations, in their transaction. */
export async function makeConfirmedAccount(
  trx: Knex.Transaction,
  clock: Deps['clock'],
  person: SignUp,
): Promise<PersonRow> {
  refuseCommon(person.password);
  const passwordHash = await hashPassword(person.password);
  const row = await insertPerson(trx, { ...person, passwordHash, confirmedAt: clock.now() });
  if (!row) throw new AppError('conflict', 'This address has an account: sign in to accept.');
  await addAudit(trx, { personId: row.id, what: 'account-made' });
  return row;
}

/**
 * Checks an address and a password. Wrong, unknown, not yet confirmed and disabled answer alike, after the same work.
 * @returns the person's id
 * @throws AppError wrong-password
 */
export async function signIn({ db, log }: Needs, email: string, password: string): Promise<string> {
  const person = await findByEmail(db, email);
  const fits = await isPassword(password, person?.password_hash);
  const what = fits && person?.email_confirmed_at && !person.disabled_at ? 'sign-in' : 'sign-in-refused';
  log.info({ personId: person?.id ?? null, what }, 'sign-in tried');
  await addAudit(db, { personId: person?.id ?? null, what });
  if (!person || what === 'sign-in-refused') {
    throw new AppError(
      'wrong-password',
      'Look at both again. If you have just signed up, confirm the address first: the link is in the letter.',
    );
  }
  return person.id;
}

/** Who a person is and where they belong, as the contract tells it. */
export async function describePerson(db: Knex, personId: string): Promise<Me> {
  const person = await findPerson(db, personId);
  if (!person) throw new AppError('signed-out');
  const memberships = await listMemberships(db, personId);
  return {
    id: person.id,
    name: person.name,
    email: person.email,
    emailConfirmedAt: person.email_confirmed_at?.toISOString() ?? null,
    isOperator: person.is_operator,
    version: person.version,
    memberships: memberships.map((m) => ({ studioId: m.studio_id, studioName: m.studio_name, role: m.role })),
  };
}

/** Saves the name as creators and viewers see it. @throws AppError stale-version with the present account */
export async function editAccount(db: Knex, personId: string, edit: AccountEdit, version: number): Promise<Me> {
  const saved = await renamePerson(db, personId, edit.name, version);
  const current = await describePerson(db, personId);
  if (!saved) throw new AppError('stale-version', 'The name was changed elsewhere meanwhile.', { current });
  return current;
}

/**
 * Gives a person who is signed in a new password and signs out every other place.
 * @throws AppError invalid where the present password is wrong or the new one is common
 */
export async function changePassword({ db, env }: Needs, session: Session, current: string, password: string) {
  const { id } = session.person;
  const person = await findPerson(db, id);
  if (!(await isPassword(current, person?.password_hash))) {
    throw new AppError('invalid', '', { errors: [{ pointer: '#/current', detail: 'This is not your password.' }] });
  }
  refuseCommon(password);
  const passwordHash = await hashPassword(password);
  await db.transaction(async (trx) => {
    await replacePassword(trx, id, passwordHash);
    await endSessionsOf(trx, id, session.tokenHash);
    await dropTokens(trx, 'reset', id);
    await addAudit(trx, { personId: id, what: 'password-changed' });
    await queueMail(trx, 'password-changed', session.person.email, changedLetter(env.publicUrl, session.person.name));
  });
}

/** Asks for the letter with a way back in. Whether the address is known is found out later, by the job. */
export async function askForReset(db: Knex, email: string): Promise<void> {
  await db.transaction((trx) => addJob(trx, 'send-reset-letter', { email }));
}

/**
 * Sets a new password by the link of a letter and signs the person out everywhere.
 * @throws AppError gone for a link that no longer works | invalid for a common password, which leaves the link usable
 */
export async function resetPassword({ db, clock, env }: Needs, token: string, password: string): Promise<void> {
  refuseCommon(password);
  if (!(await findToken(db, 'reset', token, clock.now()))) throw new AppError('gone', DEAD_LINK);
  const passwordHash = await hashPassword(password);
  await db.transaction(async (trx) => {
    const row = await spendToken(trx, 'reset', token, clock.now());
    const person = row?.person_id ? await findPerson(trx, row.person_id) : undefined;
    if (!person) throw new AppError('gone', DEAD_LINK);
    await replacePassword(trx, person.id, passwordHash);
    await confirmEmail(trx, person.id, clock.now());
    await endSessionsOf(trx, person.id);
    await dropTokens(trx, 'reset', person.id);
    await addAudit(trx, { personId: person.id, what: 'password-reset' });
    await queueMail(trx, 'password-changed', person.email, changedLetter(env.publicUrl, person.name));
  });
}

/** Where a person is signed in now, the asking browser first. */
export async function listSignedInPlaces({ db, clock }: Needs, session: Session): Promise<SignedInPlace[]> {
  const now = clock.now().getTime();
  const rows = await listPlaces(db, session.person.id, new Date(now - IDLE_MS), new Date(now - ABSOLUTE_MS));
  const places = rows.map((row) => ({
    isThis: row.token_hash.toString('hex') === session.tokenHash,
    userAgent: row.user_agent,
    createdAt: row.created_at.toISOString(),
    seenAt: row.seen_at.toISOString(),
  }));
  return places.sort((a, b) => Number(b.isThis) - Number(a.isThis));
}
