import type { Letter } from '../../platform/letter.ts';

/** The token stands behind the #, so that it reaches no server log and no other site. */
const address = (publicUrl: string, page: string, token: string) => `${publicUrl}/${page}#${token}`;

export const confirmLetter = (publicUrl: string, name: string, token: string): Letter => ({
  subject: 'Confirm your address',
  greeting: `Hello ${name},`,
  paragraphs: ['Follow the link and confirm this address, then you can sign in. The link works once, for two days.'],
  link: { label: 'Confirm this address', url: address(publicUrl, 'confirm', token) },
  reason: 'Somebody signed up with this address. If it was not you, do nothing, and no account is made.',
});

export const alreadyLetter = (publicUrl: string, name: string): Letter => ({
  subject: 'You have an account already',
  greeting: `Hello ${name},`,
  paragraphs: [
    'Somebody signed up with this address, which has an account. Nothing was changed. If it was you: sign in.',
  ],
  link: { label: 'Sign in', url: `${publicUrl}/sign-in` },
  reason: 'If you have forgotten the password, the page has a link for that too.',
});

export const resetLetter = (publicUrl: string, name: string, token: string): Letter => ({
  subject: 'A new password',
  greeting: `Hello ${name},`,
  paragraphs: [
    'Follow the link and choose a new password. The link works once, for an hour.',
    'Everywhere you are signed in will then be signed out.',
  ],
  link: { label: 'Choose a new password', url: address(publicUrl, 'reset', token) },
  reason: 'Somebody asked for this at the sign-in page. If it was not you, do nothing: your password stays as it is.',
});

export const changedLetter = (publicUrl: string, name: string): Letter => ({
  subject: 'Your password was changed',
  greeting: `Hello ${name},`,
  paragraphs: ['Your password was changed just now, and the other places you were signed in were signed out.'],
  link: { label: 'It was not me: choose a new one', url: `${publicUrl}/forgotten` },
  reason: 'You get this because a password that changes unasked is worth knowing about.',
});
