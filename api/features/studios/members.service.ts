import type { Knex } from 'knex';
import type { Role } from '#contract/accounts';
import type { StudioPeople } from '#contract/studios';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import { addAudit } from '../../platform/audit.ts';
import type { Deps } from '../../platform/deps.ts';
import { changeMember, listInvitations, listMembers, lockRoles } from './members.store.ts';
import { canManageStudio, canRemoveMember } from './studios.policy.ts';
import { mustManage, roleHere } from './studios.service.ts';

type Needs = Pick<Deps, 'db' | 'clock'>;

/** Who belongs to a studio and, for its owners, who is invited. @throws AppError not-found */
export async function listPeople({ db, clock }: Needs, who: Person, studioId: string): Promise<StudioPeople> {
  roleHere(who, studioId);
  const members = await listMembers(db, studioId);
  const invitations = canManageStudio(who, studioId) ? await listInvitations(db, studioId, clock.now()) : [];
  return {
    members: members.map((m) => ({
      personId: m.person_id,
      name: m.name,
      email: m.email,
      role: m.role,
      joinedAt: m.joined_at.toISOString(),
      seenAt: m.seen_at?.toISOString() ?? null,
    })),
    invitations: invitations.map(({ email, expires_at, payload }) => ({
      id: payload.id,
      email,
      role: payload.role,
      askedBy: payload.askedBy,
      expiresAt: expires_at.toISOString(),
    })),
  };
}

/** A studio always has an owner. @throws AppError not-found | conflict */
function mustLeaveAnOwner(roles: ReadonlyMap<string, Role>, personId: string, role: Role | null): void {
  if (!roles.has(personId)) throw new AppError('not-found');
  const others = [...roles].some(([id, held]) => id !== personId && held === 'owner');
  if (role === 'owner' || others || roles.get(personId) !== 'owner') return;
  throw new AppError('conflict', 'A studio needs an owner. Make somebody else an owner first.');
}

/** Gives a member another role, from their next request on. @throws AppError not-found | forbidden | conflict */
export async function changeRole(db: Knex, who: Person, studioId: string, personId: string, role: Role): Promise<void> {
  mustManage(who, studioId);
  await db.transaction(async (trx) => {
    mustLeaveAnOwner(await lockRoles(trx, studioId), personId, role);
    await changeMember(trx, studioId, personId, { role });
    await addAudit(trx, { personId: who.id, what: `member-made-${role}`, target: `${studioId} ${personId}` });
  });
}

/**
 * Lets a member go, or lets somebody leave; their next request is refused. What they signed stays under their name.
 * @throws AppError not-found | forbidden | conflict for the last owner
 */
export async function removeMember(
  { db, clock }: Needs,
  who: Person,
  studioId: string,
  personId: string,
): Promise<void> {
  roleHere(who, studioId);
  if (!canRemoveMember(who, studioId, personId)) {
    throw new AppError('forbidden', 'Only an owner of the studio can do this.');
  }
  await db.transaction(async (trx) => {
    mustLeaveAnOwner(await lockRoles(trx, studioId), personId, null);
    await changeMember(trx, studioId, personId, { left_at: clock.now() });
    await addAudit(trx, { personId: who.id, what: 'member-removed', target: `${studioId} ${personId}` });
  });
}
