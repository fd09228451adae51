import type { Person } from '../../http/session.ts';

/** Who may do what with the patterns of a studio. Pure, one line each; the access matrix reads them too. */

interface OfStudio {
  readonly studioId: string;
}

const roleIn = (who: Person, { studioId }: OfStudio) => who.memberships.find((m) => m.studioId === studioId)?.role;

/** An unpublished pattern is seen by the studio's members; published editions have a door of their own. */
export const canSeePattern = (who: Person, pattern: OfStudio): boolean => roleIn(who, pattern) !== undefined;

/** Editors write too: they mend wordings while they proofread, and history tells whose hand it was. */
export const canEditPattern = (who: Person, pattern: OfStudio): boolean => roleIn(who, pattern) !== undefined;

/** To make a pattern, bin it, archive it, double it, or change who sees it. */
export const canManagePatterns = (who: Person, studio: OfStudio): boolean =>
  ['owner', 'creator'].includes(roleIn(who, studio) ?? '');
