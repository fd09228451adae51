import type { Person } from '../../http/session.ts';

/** Who may do what with the recordings of a studio. Pure, one line each; the access matrix reads them too. */

interface OfStudio {
  readonly studioId: string;
}

const roleIn = (who: Person, { studioId }: OfStudio) => who.memberships.find((m) => m.studioId === studioId)?.role;

/** A recording is seen by the studio's members; clips of published editions have a rule of their own. */
export const canSeeRecording = (who: Person, of: OfStudio): boolean => roleIn(who, of) !== undefined;

/** To add, change and remove recordings, and to send clips and transcripts. */
export const canKeepRecordings = (who: Person, of: OfStudio): boolean =>
  ['owner', 'creator'].includes(roleIn(who, of) ?? '');

/** Captions are corrected by editors too, while they proofread. */
export const canCorrectCaptions = (who: Person, of: OfStudio): boolean => roleIn(who, of) !== undefined;

/** A published clip may be seen by anybody. */
export const canWatchClip = (who: Person | null, clip: OfStudio & { readonly published: boolean }): boolean =>
  clip.published || (who !== null && canSeeRecording(who, clip));
