import type { Person } from '../../http/session.ts';

/** Who may do what with editions. Pure, one line each; the access matrix reads them too. */

interface OfStudio {
  readonly studioId: string;
}

const roleIn = (who: Person | null, { studioId }: OfStudio) =>
  who?.memberships.find((m) => m.studioId === studioId)?.role;

/** The list of editions and what holds the next one back: every member. */
export const canSeeEditions = (who: Person | null, of: OfStudio): boolean => roleIn(who, of) !== undefined;

/** To publish, and to withdraw what is out. */
export const canPublish = (who: Person | null, of: OfStudio): boolean =>
  ['owner', 'creator'].includes(roleIn(who, of) ?? '');

/** A published edition: anybody with the link, unless it is private; then the studio alone. */
export const canSeeEdition = (
  who: Person | null,
  of: OfStudio & { readonly visibility: 'private' | 'unlisted' | 'listed' },
): boolean => of.visibility !== 'private' || canSeeEditions(who, of);
