import type { Knex } from 'knex';
import { addMember, buildHouse, buildPerson, type Household } from '../../support/builders.ts';

/** Everybody who may come along; testers by link and buyers come with what is theirs. */
export const PEOPLE = [
  'nobody',
  'viewer',
  'creator',
  'editor',
  'owner',
  'creator of another studio',
  'editor of another studio',
  'owner of another studio',
  'removed member',
  'operator',
] as const;
export type Who = (typeof PEOPLE)[number];

export interface Cast {
  readonly loft: Household;
  readonly elsewhere: Household;
  readonly people: Readonly<Record<Exclude<Who, 'nobody'>, { readonly id: string; readonly email: string }>>;
}

export async function buildCast(db: Knex): Promise<Cast> {
  const loft = await buildHouse(db);
  const elsewhere = await buildHouse(db);
  const removed = await buildPerson(db);
  await addMember(db, loft.studio.id, removed.id, 'owner', { left_at: new Date() });
  const people = {
    viewer: await buildPerson(db),
    creator: loft.creator,
    editor: loft.editor,
    owner: loft.owner,
    'creator of another studio': elsewhere.creator,
    'editor of another studio': elsewhere.editor,
    'owner of another studio': elsewhere.owner,
    'removed member': removed,
    operator: await buildPerson(db, { is_operator: true }),
  };
  return { loft, elsewhere, people };
}

export type Expected = Readonly<Record<Who, number>>;

const everybody = (status: number): Record<Who, number> =>
  Object.fromEntries(PEOPLE.map((who) => [who, status])) as Record<Who, number>;

/** No difference is made. */
export const anybody = (status: number): Expected => everybody(status);

/** Whoever has signed in. */
export const signedIn = (status: number): Expected => ({ ...everybody(status), nobody: 401 });

/** The studio's people; to others the thing is not there. `outside` is what a stranger who has no session is told. */
export const members = (status: number, outside = 401): Expected => ({
  ...everybody(404),
  nobody: outside,
  owner: status,
  creator: status,
  editor: status,
});

/** Owners and creators; an editor sees the thing but may not do this. */
export const makers = (status: number): Expected => ({ ...members(status), editor: 403 });

/** Owners alone. */
export const owners = (status: number): Expected => ({ ...makers(status), creator: 403 });
