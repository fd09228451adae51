import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import * as z from 'zod';
import { type Role } from '#contract/accounts';
import {
  Invitation,
  type InvitationCreate,
  type InvitationJoin,
  InvitationLook,
  Joined,
  Studio,
  type StudioCreate,
  type StudioEdit,
  StudioPeople,
} from '#contract/studios';
import { send } from '../../lib/http.ts';
import { chooseStudio, sessionQuery } from '../../lib/session.ts';

const Nothing = z.undefined();
const base = (studioId: string) => `/api/studios/${studioId}`;

export const studioQuery = (studioId: string) =>
  queryOptions({
    queryKey: ['studios', studioId],
    queryFn: ({ signal }) => send(Studio, base(studioId), { signal }),
  });

export const peopleQuery = (studioId: string) =>
  queryOptions({
    queryKey: ['studios', studioId, 'members'],
    queryFn: ({ signal }) => send(StudioPeople, `${base(studioId)}/members`, { signal }),
  });

export const invitationQuery = (token: string) =>
  queryOptions({
    queryKey: ['invitations', token],
    queryFn: ({ signal }) => send(InvitationLook, '/api/invitations/look', { method: 'POST', body: { token }, signal }),
  });

/** Opens a studio and goes to work in it. */
export function useOpenStudio() {
  const client = useQueryClient();
  return async (body: StudioCreate): Promise<Studio> => {
    const studio = await send(Studio, '/api/studios', { method: 'POST', body });
    chooseStudio(studio.id);
    await client.invalidateQueries({ queryKey: sessionQuery.queryKey });
    return studio;
  };
}

export function useEditStudio(studio: Studio) {
  const client = useQueryClient();
  return async (body: StudioEdit): Promise<Studio> => {
    try {
      return await send(Studio, base(studio.id), { method: 'PATCH', body, version: studio.version });
    } finally {
      // Also after a refusal: the newer settings have to be on screen before the next try.
      await client.invalidateQueries({ queryKey: studioQuery(studio.id).queryKey });
      void client.invalidateQueries({ queryKey: sessionQuery.queryKey });
    }
  };
}

export function useInvite(studioId: string) {
  const client = useQueryClient();
  return async (body: InvitationCreate): Promise<Invitation> => {
    const invitation = await send(Invitation, `${base(studioId)}/invitations`, { method: 'POST', body });
    await client.invalidateQueries({ queryKey: peopleQuery(studioId).queryKey });
    return invitation;
  };
}

/** What an owner does in the list of people; each reloads it. */
export function usePeopleDeeds(studioId: string) {
  const client = useQueryClient();
  const onSettled = () =>
    Promise.all([
      client.invalidateQueries({ queryKey: peopleQuery(studioId).queryKey }),
      client.invalidateQueries({ queryKey: sessionQuery.queryKey }),
    ]);
  const member = (personId: string) => `${base(studioId)}/members/${personId}`;
  const changeRole = useMutation({
    mutationFn: ({ personId, role }: { personId: string; role: Role }) =>
      send(Nothing, member(personId), { method: 'PATCH', body: { role } }),
    onSettled,
  });
  const remove = useMutation({
    mutationFn: (personId: string) => send(Nothing, member(personId), { method: 'DELETE' }),
    onSettled,
  });
  const takeBack = useMutation({
    mutationFn: (invitationId: string) =>
      send(Nothing, `${base(studioId)}/invitations/${invitationId}`, { method: 'DELETE' }),
    onSettled,
  });
  return { changeRole, remove, takeBack };
}

/** Answers an invitation, with the account one has or a new one, and goes to work in the studio. */
export function useJoin() {
  const client = useQueryClient();
  const entered = async (joined: Joined) => {
    chooseStudio(joined.studioId);
    await client.invalidateQueries({ queryKey: sessionQuery.queryKey });
    return joined;
  };
  return {
    accept: (token: string) =>
      send(Joined, '/api/invitations/accept', { method: 'POST', body: { token } }).then(entered),
    join: (body: InvitationJoin) => send(Joined, '/api/invitations/join', { method: 'POST', body }).then(entered),
  };
}
