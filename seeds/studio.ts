import type { Knex } from 'knex';
import { findByEmail, makeConfirmedAccount } from '../api/features/account/account-of-others.service.ts';
import { describePerson } from '../api/features/account/account.service.ts';
import { acceptInvitation, invite } from '../api/features/studios/invitations.service.ts';
import { editStudio, openStudio } from '../api/features/studios/studios.service.ts';
import type { Person } from '../api/http/session.ts';
import type { Deps } from '../api/platform/deps.ts';
import { CORIN, HANNA, ISMAY, ODILE, type SignIn } from './sign-ins.ts';

const FOOT =
  'Make it for yourself, to give, or to sell what you made, and say whose pattern it is. The sheet and its pictures are not for copying or selling.';

/** A person as the server knows them while they are signed in. */
async function personOf(db: Knex, id: string): Promise<Person> {
  const { memberships, ...me } = await describePerson(db, id);
  return { ...me, memberships: memberships.map(({ studioId, role }) => ({ studioId, role })) };
}

/** Makes the account unless the address has one. */
async function account(deps: Deps, { name, email, password }: SignIn): Promise<Person> {
  const known = await findByEmail(deps.db, email);
  const row =
    known ?? (await deps.db.transaction((trx) => makeConfirmedAccount(trx, deps.clock, { name, email, password })));
  return personOf(deps.db, row.id);
}

interface WaitingMail {
  id: string;
  payload: { link: { url: string } };
}

/** Invites somebody and answers for them; the letter, whose link is spent by that, does not go out. */
async function join(deps: Deps, owner: Person, who: Person, studioId: string, role: 'creator' | 'editor') {
  if (who.memberships.some((m) => m.studioId === studioId)) return;
  await invite(deps, owner, studioId, { email: who.email, role });
  const mail = await deps
    .db<WaitingMail>('mails')
    .where({ kind: 'invite', to_email: who.email } as never)
    .orderBy('created_at', 'desc')
    .first();
  await acceptInvitation(deps, who, mail!.payload.link.url.split('#')[1]!);
  await deps.db('mails').where({ id: mail!.id }).delete();
}

export interface Loft {
  readonly studioId: string;
  readonly ismay: Person;
  readonly odile: Person;
  readonly corin: Person;
}

/** Ninepin Loft and its people, one letter of invitation out, and somebody who only makes. */
export async function seedStudio(deps: Deps): Promise<Loft> {
  const { db } = deps;
  const ismay = await account(deps, ISMAY);
  await account(deps, HANNA);
  let studioId = ismay.memberships[0]?.studioId;
  if (studioId === undefined) {
    const studio = await openStudio(deps, ismay, 'Ninepin Loft');
    studioId = studio.id;
    const owner = await personOf(db, ismay.id);
    await editStudio(db, owner, studioId, { foot: FOOT }, studio.version);
    await invite(deps, owner, studioId, { email: 'jory@fallowyard.example', role: 'editor' });
  }
  const owner = await personOf(db, ismay.id);
  await join(deps, owner, await account(deps, ODILE), studioId, 'creator');
  await join(deps, owner, await account(deps, CORIN), studioId, 'editor');
  return { studioId, ismay: owner, odile: await account(deps, ODILE), corin: await account(deps, CORIN) };
}
