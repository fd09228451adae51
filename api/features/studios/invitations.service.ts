import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { Invitation, InvitationCreate, InvitationJoin, InvitationLook, Joined } from '#contract/studios';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import { addAudit } from '../../platform/audit.ts';
import type { Deps } from '../../platform/deps.ts';
import type { Letter } from '../../platform/letter.ts';
import { queueMail } from '../../platform/mail.ts';
import {
  createToken,
  findByEmail,
  findToken,
  makeConfirmedAccount,
  spendToken,
} from '../account/account-of-others.service.ts';
import { dropInvitations, listMembers, putMember, type InvitationPayload } from './members.store.ts';
import { mustManage } from './studios.service.ts';
import { findStudio } from './studios.store.ts';

type Needs = Pick<Deps, 'db' | 'clock' | 'env'>;

const INVITATION_MS = 7 * 24 * 3_600_000;
const DEAD_LINK = 'This invitation was answered already, taken back, or its seven days are over. Ask for a new one.';

const invitationLetter = (publicUrl: string, studio: string, payload: InvitationPayload, token: string): Letter => ({
  subject: `${payload.askedBy} asks you into ${studio}`,
  greeting: 'Hello,',
  paragraphs: [
    `${payload.askedBy} asks you into the studio ${studio}, as ${payload.role === 'creator' ? 'a' : 'an'} ${payload.role}.`,
    'The link works once, for seven days.',
  ],
  link: { label: 'Look at the invitation', url: `${publicUrl}/invitation#${token}` },
  reason: 'If you do not know what this is about, do nothing.',
});

/**
 * Sends a letter that lets its reader into the studio; an older one to the same address stops working.
 * @throws AppError not-found | forbidden | invalid for somebody who belongs to it already
 */
export async function invite(
  { db, clock, env }: Needs,
  who: Person,
  studioId: string,
  { email, role }: InvitationCreate,
): Promise<Invitation> {
  mustManage(who, studioId);
  const payload: InvitationPayload = { id: randomUUID(), studioId, role, invitedBy: who.id, askedBy: who.name };
  const now = clock.now();
  const expiresAt = new Date(now.getTime() + INVITATION_MS);
  await db.transaction(async (trx) => {
    const studio = await findStudio(trx, studioId);
    if (!studio) throw new AppError('not-found');
    const members = await listMembers(trx, studioId);
    if (members.some((m) => m.email.toLowerCase() === email.toLowerCase())) {
      const detail = 'They belong to the studio already. Change their role in the list.';
      throw new AppError('invalid', '', { errors: [{ pointer: '#/email', detail }] });
    }
    await dropInvitations(trx, studioId, { email }, now);
    const token = await createToken(trx, { kind: 'invite', email, payload, expiresAt });
    await addAudit(trx, { personId: who.id, what: 'invited', target: `${studioId} ${payload.id} ${role}` });
    await queueMail(trx, 'invite', email, invitationLetter(env.publicUrl, studio.name, payload, token));
  });
  return { id: payload.id, email, role, askedBy: who.name, expiresAt: expiresAt.toISOString() };
}

/** Takes an invitation back; its link stops working. @throws AppError not-found | forbidden */
export async function takeBackInvitation({ db, clock }: Needs, who: Person, studioId: string, id: string) {
  mustManage(who, studioId);
  await db.transaction(async (trx) => {
    if ((await dropInvitations(trx, studioId, { id }, clock.now())) === 0) throw new AppError('not-found');
    await addAudit(trx, { personId: who.id, what: 'invitation-taken-back', target: `${studioId} ${id}` });
  });
}

/** What a letter's link is about, for the one who holds it. @throws AppError gone */
export async function lookAtInvitation({ db, clock }: Needs, token: string): Promise<InvitationLook> {
  const row = await findToken(db, 'invite', token, clock.now());
  const payload = row?.payload as InvitationPayload | undefined;
  const studio = payload && (await findStudio(db, payload.studioId));
  if (!row?.email || !studio) throw new AppError('gone', DEAD_LINK);
  const isKnown = (await findByEmail(db, row.email)) !== undefined;
  return { studioName: studio.name, role: payload.role, email: row.email, askedBy: payload.askedBy, isKnown };
}

async function enter(trx: Knex.Transaction, clock: Deps['clock'], personId: string, payload: InvitationPayload) {
  const { studioId, role } = payload;
  await putMember(trx, studioId, personId, role, clock.now());
  await addAudit(trx, { personId, what: `joined-as-${role}`, target: `${studioId} ${payload.id}` });
  return { studioId, role };
}

/**
 * Lets the person who is signed in into the studio, if the letter went to them.
 * @throws AppError gone | forbidden for another person's letter, which stays usable
 */
export async function acceptInvitation({ db, clock }: Needs, who: Person, token: string): Promise<Joined> {
  return db.transaction(async (trx) => {
    const row = await spendToken(trx, 'invite', token, clock.now());
    if (!row?.email) throw new AppError('gone', DEAD_LINK);
    if (row.email.toLowerCase() !== who.email.toLowerCase()) {
      throw new AppError('forbidden', `This invitation is for ${row.email}. You are signed in as ${who.email}.`);
    }
    return enter(trx, clock, who.id, row.payload as InvitationPayload);
  });
}

/**
 * Makes an account by an invitation, whose letter has proved the address, and lets it into the studio.
 * @returns the new person's id beside what they joined
 * @throws AppError gone | conflict where the address has an account | invalid for a common password
 */
export async function joinByInvitation(
  { db, clock }: Needs,
  { token, name, password }: InvitationJoin,
): Promise<{ personId: string; joined: Joined }> {
  return db.transaction(async (trx) => {
    const row = await spendToken(trx, 'invite', token, clock.now());
    if (!row?.email) throw new AppError('gone', DEAD_LINK);
    const person = await makeConfirmedAccount(trx, clock, { name, email: row.email, password });
    return { personId: person.id, joined: await enter(trx, clock, person.id, row.payload as InvitationPayload) };
  });
}
