import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import * as z from 'zod';
import {
  type AccountEdit,
  ConfirmedAddress,
  type Forgotten,
  LetterSent,
  Me,
  type PasswordChange,
  type PasswordReset,
  SignedInPlaces,
  type SignIn,
  type SignUp,
} from '#contract/accounts';
import { send } from '../../lib/http.ts';
import { sessionQuery } from '../../lib/session.ts';

const Nothing = z.undefined();

export const placesQuery = queryOptions({
  queryKey: ['account', 'places'],
  queryFn: ({ signal }) => send(SignedInPlaces, '/api/account/sessions', { signal }),
});

export const signUp = (body: SignUp) => send(LetterSent, '/api/account', { method: 'POST', body });
export const confirmAddress = (token: string) =>
  send(ConfirmedAddress, '/api/account/confirm', { method: 'POST', body: { token } });
export const askForReset = (body: Forgotten) => send(LetterSent, '/api/account/forgotten', { method: 'POST', body });
export const resetPassword = (body: PasswordReset) => send(Nothing, '/api/account/reset', { method: 'POST', body });
export const changePassword = (body: PasswordChange) =>
  send(Nothing, '/api/account/password', { method: 'POST', body });

/** Signing in. What was in the cache belonged to somebody else, or to nobody. */
export function useSignIn() {
  const client = useQueryClient();
  return async (body: SignIn): Promise<Me> => {
    const me = await send(Me, '/api/session', { method: 'POST', body });
    client.clear();
    client.setQueryData(sessionQuery.queryKey, { person: me });
    return me;
  };
}

/** Signs out and loads a page anew, so that nothing of what was read stays in this tab. */
export function useSignOut(to = window.location.href) {
  return useMutation({
    mutationFn: () => send(Nothing, '/api/session', { method: 'DELETE' }),
    onSuccess: () => {
      window.location.assign(to);
      if (to === window.location.href) window.location.reload();
    },
  });
}

export function useRename(me: Me) {
  const client = useQueryClient();
  return async (body: AccountEdit): Promise<Me> => {
    try {
      const saved = await send(Me, '/api/account', { method: 'PATCH', body, version: me.version });
      client.setQueryData(sessionQuery.queryKey, { person: saved });
      return saved;
    } finally {
      // Also after a refusal: the newer name has to be on screen before the next try.
      void client.invalidateQueries({ queryKey: sessionQuery.queryKey });
    }
  };
}

export function useSignOutElsewhere() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => send(Nothing, '/api/account/sessions', { method: 'DELETE' }),
    onSettled: () => client.invalidateQueries({ queryKey: placesQuery.queryKey }),
  });
}
