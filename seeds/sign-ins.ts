/** Who can sign in to the demo. Invented people, addresses under `.example`; the passwords are no secret. */
export interface SignIn {
  readonly name: string;
  /** What they are in the demo, for the one who reads the list. */
  readonly role: string;
  readonly email: string;
  readonly password: string;
}

export const ISMAY: SignIn = {
  name: 'Ismay T.',
  role: 'owner and creator',
  email: 'ismay@ninepinloft.example',
  password: 'slow wheat under lamp',
};
export const ODILE: SignIn = {
  name: 'Odile R.',
  role: 'creator',
  email: 'odile@ninepinloft.example',
  password: 'oval basket at noon',
};
export const CORIN: SignIn = {
  name: 'Corin H.',
  role: 'editor',
  email: 'corin@redpencil.example',
  password: 'red pencil on ledger',
};
export const HANNA: SignIn = {
  name: 'Hanna A.',
  role: 'viewer, in no studio',
  email: 'hanna@post.example',
  password: 'yarn and phone on table',
};

export const SIGN_INS: readonly SignIn[] = [ISMAY, ODILE, CORIN, HANNA];
