import type { Person } from '../../http/session.ts';

/** Who may do what in a studio. Pure, one line each; the access matrix reads them too. */

const roleIn = (who: Person, studioId: string) => who.memberships.find((m) => m.studioId === studioId)?.role;

/** To everybody else a studio is not there. */
export const canSeeStudio = (who: Person, studioId: string): boolean => roleIn(who, studioId) !== undefined;

/** Its settings, its people and their roles. */
export const canManageStudio = (who: Person, studioId: string): boolean => roleIn(who, studioId) === 'owner';

/** Owners let members go, and everybody may leave. */
export const canRemoveMember = (who: Person, studioId: string, personId: string): boolean =>
  canManageStudio(who, studioId) || (canSeeStudio(who, studioId) && who.id === personId);
