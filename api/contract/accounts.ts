import { z } from 'zod';

/** Who somebody is, how they come in and how they get back in. */

export const EmailAddress = z.email('This is not a mail address.').max(254);
const name = z.string().trim().min(1, 'A name is needed.').max(80, 'At most 80 letters.');
/** At least eight letters, no rules about which; the whole of it counts. The bound only keeps a body from being huge. */
export const NewPassword = z.string().min(8, 'At least 8 letters.').max(1_000, 'At most 1,000 letters.');
const password = z.string().min(1, 'The password is needed.').max(1_000);
/** A token from a letter: 32 random bytes. */
const token = z.string().regex(/^[\w-]{43}$/, 'This link is not complete.');

/** Body of POST /api/account. The answer is the same whether or not the address is known. */
export const SignUp = z.strictObject({ name, email: EmailAddress, password: NewPassword });
export type SignUp = z.infer<typeof SignUp>;

/** Body of POST /api/account/confirm. */
export const AddressConfirm = z.strictObject({ token });
export type AddressConfirm = z.infer<typeof AddressConfirm>;

/** Answer of POST /api/account/confirm: signing in can begin with it. */
export const ConfirmedAddress = z.object({ email: z.string() });

/** Body of POST /api/session. */
export const SignIn = z.strictObject({ email: EmailAddress, password });
export type SignIn = z.infer<typeof SignIn>;

/** Body of POST /api/account/forgotten. */
export const Forgotten = z.strictObject({ email: EmailAddress });
export type Forgotten = z.infer<typeof Forgotten>;

/** Body of POST /api/account/reset: a new password by the link of a letter. */
export const PasswordReset = z.strictObject({ token, password: NewPassword });
export type PasswordReset = z.infer<typeof PasswordReset>;

/** Body of POST /api/account/password. */
export const PasswordChange = z.strictObject({ current: password, password: NewPassword });
export type PasswordChange = z.infer<typeof PasswordChange>;

/** Body of PATCH /api/account; needs If-Match. */
export const AccountEdit = z.strictObject({ name });
export type AccountEdit = z.infer<typeof AccountEdit>;

export const Role = z.enum(['owner', 'creator', 'editor']);
export type Role = z.infer<typeof Role>;

/** The person who is signed in, and the studios they belong to. */
export const Me = z.object({
  id: z.uuid(),
  name: z.string(),
  email: z.string(),
  emailConfirmedAt: z.iso.datetime().nullable(),
  isOperator: z.boolean(),
  version: z.int().positive(),
  memberships: z.array(z.object({ studioId: z.uuid(), studioName: z.string(), role: Role })),
});
export type Me = z.infer<typeof Me>;

/** Answer of GET /api/session: asking who one is, is never an error. */
export const Session = z.object({ person: Me.nullable() });
export type Session = z.infer<typeof Session>;

/** One place a person is signed in; answer of GET /api/account/sessions is a list of them, the present one first. */
export const SignedInPlace = z.object({
  isThis: z.boolean(),
  userAgent: z.string(),
  createdAt: z.iso.datetime(),
  seenAt: z.iso.datetime(),
});
export const SignedInPlaces = z.array(SignedInPlace);
export type SignedInPlace = z.infer<typeof SignedInPlace>;

/** Answer where a letter may have been sent: the same for every address. */
export const LetterSent = z.object({ sent: z.literal(true) });
