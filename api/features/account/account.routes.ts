import { Router, type Request } from 'express';
import {
  AccountEdit,
  AddressConfirm,
  ConfirmedAddress,
  Forgotten,
  LetterSent,
  Me,
  PasswordChange,
  PasswordReset,
  Session,
  SignedInPlaces,
  SignIn,
  SignUp,
} from '#contract/accounts';
import { CREATING, limit, type Limit } from '../../http/limits.ts';
import { ifMatchVersion, sendVersioned } from '../../http/preconditions.ts';
import { answer, AppError } from '../../http/problem.ts';
import { endSession, endSessionsOf, sessionOf, signedIn, startSession } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import {
  askForReset,
  changePassword,
  confirmAddress,
  describePerson,
  editAccount,
  listSignedInPlaces,
  resetPassword,
  signIn,
  signUp,
} from './account.service.ts';

const MINUTE_MS = 60_000;
const typedAddress = (req: Request) => {
  const { email } = (req.body ?? {}) as { email?: unknown };
  return typeof email === 'string' ? email.trim().toLowerCase() : '';
};
/** Guessing is counted for each account and the address it comes from. */
const SIGN_INS: Limit = {
  name: 'sign-in',
  max: 10,
  perMs: MINUTE_MS,
  by: (req) => `${typedAddress(req)} ${req.ip ?? ''}`,
};
/** Nobody's mailbox is filled from our pages: letters are counted for each account and where they are asked for. */
const LETTERS: Limit = { ...SIGN_INS, name: 'letters', max: 5, perMs: 10 * MINUTE_MS };
const PASSWORDS: Limit = { name: 'password', max: 10, perMs: MINUTE_MS };

function needSession(req: Request) {
  const session = sessionOf(req);
  if (!session) throw new AppError('signed-out');
  return session;
}

/** Coming in, going out, getting back in, and what one may change about oneself. */
export function accountRoutes(deps: Deps): Router {
  const router = Router();

  router.post('/account', limit(deps, CREATING), limit(deps, LETTERS), async (req, res) => {
    await signUp(deps, SignUp.parse(req.body));
    res.status(202).json(answer(LetterSent, { sent: true }));
  });

  router.post('/account/confirm', limit(deps, CREATING), async (req, res) => {
    const email = await confirmAddress(deps, AddressConfirm.parse(req.body).token);
    res.json(answer(ConfirmedAddress, { email }));
  });

  router.get('/session', async (req, res) => {
    const session = sessionOf(req);
    const person = session ? await describePerson(deps.db, session.person.id) : null;
    res.json(answer(Session, { person }));
  });

  router.post('/session', limit(deps, SIGN_INS), async (req, res) => {
    const { email, password } = SignIn.parse(req.body);
    const personId = await signIn(deps, email, password);
    await startSession(deps, req, res, personId);
    res.json(answer(Me, await describePerson(deps.db, personId)));
  });

  router.delete('/session', async (req, res) => {
    await endSession(deps, req, res);
    res.status(204).end();
  });

  router.get('/account', async (req, res) => {
    const me = await describePerson(deps.db, signedIn(req).id);
    sendVersioned(res, answer(Me, me), me.version);
  });

  router.patch('/account', async (req, res) => {
    const who = signedIn(req);
    const me = await editAccount(deps.db, who.id, AccountEdit.parse(req.body), ifMatchVersion(req));
    sendVersioned(res, answer(Me, me), me.version);
  });

  router.post('/account/password', limit(deps, PASSWORDS), async (req, res) => {
    const session = needSession(req);
    const { current, password } = PasswordChange.parse(req.body);
    await changePassword(deps, session, current, password);
    await startSession(deps, req, res, session.person.id);
    res.status(204).end();
  });

  router.get('/account/sessions', async (req, res) => {
    res.json(answer(SignedInPlaces, await listSignedInPlaces(deps, needSession(req))));
  });

  router.delete('/account/sessions', async (req, res) => {
    const session = needSession(req);
    await endSessionsOf(deps.db, session.person.id, session.tokenHash);
    res.status(204).end();
  });

  router.post('/account/forgotten', limit(deps, CREATING), limit(deps, LETTERS), async (req, res) => {
    await askForReset(deps.db, Forgotten.parse(req.body).email);
    res.status(202).json(answer(LetterSent, { sent: true }));
  });

  router.post('/account/reset', limit(deps, CREATING), async (req, res) => {
    const { token, password } = PasswordReset.parse(req.body);
    await resetPassword(deps, token, password);
    res.status(204).end();
  });

  return router;
}
