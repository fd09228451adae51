import type { Knex } from 'knex';
import type { Role } from '#contract/accounts';
import type { Studio, StudioEdit } from '#contract/studios';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import { addAudit } from '../../platform/audit.ts';
import type { Deps } from '../../platform/deps.ts';
import { putMember } from './members.store.ts';
import { canManageStudio, canSeeStudio } from './studios.policy.ts';
import { findStudio, insertStudio, listStudiosOf, replaceStudio, usedBytes, type StudioRow } from './studios.store.ts';

/** A name as it can stand in an address: "Ninepin Loft" becomes "ninepin-loft". */
function slugOf(name: string): string {
  const plain = name
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/gu, '-')
    .replace(/^-|-$/gu, '')
    .slice(0, 60);
  return plain || 'studio';
}

async function describe(db: Knex, row: StudioRow, role: Role): Promise<Studio> {
  return {
    id: row.id,
    name: row.name,
    slug: row.slug,
    defaultTerms: row.default_terms,
    paper: row.paper,
    head: row.head,
    foot: row.foot,
    quotaBytes: Number(row.quota_bytes),
    usedBytes: await usedBytes(db, row.id),
    role,
    createdAt: row.created_at.toISOString(),
    version: row.version,
  };
}

/** Opens a studio; the person becomes its owner. Two studios may have one name; their addresses differ. */
export async function openStudio({ db, clock, env }: Pick<Deps, 'db' | 'clock' | 'env'>, who: Person, name: string) {
  return db.transaction(async (trx) => {
    const slug = slugOf(name);
    let row: StudioRow | undefined;
    for (let n = 1; !row; n += 1) {
      row = await insertStudio(trx, { name, slug: n === 1 ? slug : `${slug}-${n}`, quotaBytes: env.quotaBytes });
    }
    await putMember(trx, row.id, who.id, 'owner', clock.now());
    await addAudit(trx, { personId: who.id, what: 'studio-opened', target: row.id });
    return describe(trx, row, 'owner');
  });
}

/** The studios a person belongs to. */
export async function listStudios(db: Knex, who: Person): Promise<Studio[]> {
  const rows = await listStudiosOf(db, who.id);
  return Promise.all(rows.map((row) => describe(db, row, row.role)));
}

/**
 * The role of somebody in a studio they may see.
 * @throws AppError not-found, the same for a studio of others and for an id that never was
 */
export function roleHere(who: Person, studioId: string): Role {
  const role = who.memberships.find((m) => m.studioId === studioId)?.role;
  if (!role || !canSeeStudio(who, studioId)) throw new AppError('not-found');
  return role;
}

/** @throws AppError not-found | forbidden */
export function mustManage(who: Person, studioId: string): void {
  roleHere(who, studioId);
  if (!canManageStudio(who, studioId)) throw new AppError('forbidden', 'Only an owner of the studio can do this.');
}

/** @throws AppError not-found */
export async function showStudio(db: Knex, who: Person, studioId: string): Promise<Studio> {
  const role = roleHere(who, studioId);
  const row = await findStudio(db, studioId);
  if (!row) throw new AppError('not-found');
  return describe(db, row, role);
}

/**
 * Saves settings if nobody saved them since `version`.
 * @throws AppError not-found | forbidden | stale-version with the present settings
 */
export async function editStudio(
  db: Knex,
  who: Person,
  studioId: string,
  edit: StudioEdit,
  version: number,
): Promise<Studio> {
  mustManage(who, studioId);
  const saved = await db.transaction(async (trx) => {
    const row = await replaceStudio(trx, studioId, edit, version);
    if (row) await addAudit(trx, { personId: who.id, what: 'studio-edited', target: studioId });
    return row;
  });
  const current = await showStudio(db, who, studioId);
  if (!saved) throw new AppError('stale-version', 'The settings were saved by somebody else meanwhile.', { current });
  return current;
}
