import { z } from 'zod';
import { EmailAddress, NewPassword, Role } from './accounts.ts';
import { Terms } from './rows.ts';

/** Studios, who belongs to them, and the look that all their sheets share. */

const name = z.string().trim().min(1, 'A name is needed.').max(80, 'At most 80 letters.');
export const Paper = z.enum(['A4', 'Letter']);
const token = z.string().regex(/^[\w-]{43}$/, 'This link is not complete.');

/** Body of POST /api/studios; who opens a studio owns it. */
export const StudioCreate = z.strictObject({ name });
export type StudioCreate = z.infer<typeof StudioCreate>;

/** Body of PATCH /api/studios/:studioId; needs If-Match. */
export const StudioEdit = z
  .strictObject({
    name,
    defaultTerms: Terms,
    paper: Paper,
    /** Printed at the head and the foot of every sheet. */
    head: z.string().trim().max(200, 'At most 200 letters.'),
    foot: z.string().trim().max(400, 'At most 400 letters.'),
  })
  .partial()
  .refine((edit) => Object.keys(edit).length > 0, 'Nothing to change was given.');
export type StudioEdit = z.infer<typeof StudioEdit>;

export const Studio = z.object({
  id: z.uuid(),
  name: z.string(),
  slug: z.string(),
  defaultTerms: Terms,
  paper: Paper,
  head: z.string(),
  foot: z.string(),
  /** What may be stored, and what is: bytes. */
  quotaBytes: z.number(),
  usedBytes: z.number(),
  /** The role of the one who asks. */
  role: Role,
  createdAt: z.iso.datetime(),
  version: z.int().positive(),
});
export type Studio = z.infer<typeof Studio>;
export const StudioList = z.array(Studio);

export const Member = z.object({
  personId: z.uuid(),
  name: z.string(),
  email: z.string(),
  role: Role,
  joinedAt: z.iso.datetime(),
  /** When they last did anything while signed in; null where they are signed out everywhere. */
  seenAt: z.iso.datetime().nullable(),
});
export type Member = z.infer<typeof Member>;

export const Invitation = z.object({
  id: z.uuid(),
  email: z.string(),
  role: Role,
  askedBy: z.string(),
  expiresAt: z.iso.datetime(),
});
export type Invitation = z.infer<typeof Invitation>;

/** Answer of GET /api/studios/:studioId/members. Only owners are told who is invited. */
export const StudioPeople = z.object({ members: z.array(Member), invitations: z.array(Invitation) });
export type StudioPeople = z.infer<typeof StudioPeople>;

/** Body of PATCH /api/studios/:studioId/members/:personId. */
export const MemberEdit = z.strictObject({ role: Role });
export type MemberEdit = z.infer<typeof MemberEdit>;

/** Body of POST /api/studios/:studioId/invitations. */
export const InvitationCreate = z.strictObject({ email: EmailAddress, role: Role });
export type InvitationCreate = z.infer<typeof InvitationCreate>;

/** Body of POST /api/invitations/look and /api/invitations/accept. */
export const InvitationToken = z.strictObject({ token });
export type InvitationToken = z.infer<typeof InvitationToken>;

/** What the letter's link is about. `isKnown`: there is an account with this address, so sign in rather than sign up. */
export const InvitationLook = z.object({
  studioName: z.string(),
  role: Role,
  email: z.string(),
  askedBy: z.string(),
  isKnown: z.boolean(),
});
export type InvitationLook = z.infer<typeof InvitationLook>;

/** Body of POST /api/invitations/join: a new account by an invitation, whose letter has proved the address. */
export const InvitationJoin = z.strictObject({ token, name, password: NewPassword });
export type InvitationJoin = z.infer<typeof InvitationJoin>;

/** Answer to accepting an invitation. */
export const Joined = z.object({ studioId: z.uuid(), role: Role });
export type Joined = z.infer<typeof Joined>;
