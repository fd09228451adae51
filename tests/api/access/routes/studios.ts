import { addMember, buildPerson } from '../../../support/builders.ts';
import { type Entry, someone } from '../entry.ts';
import { anybody, members, owners, signedIn } from '../people.ts';

export const studios: Record<string, Entry> = {
  'POST /api/studios': {
    expect: signedIn(201),
    ask: () => ({ url: '/api/studios', body: { name: 'One more' } }),
  },
  'GET /api/studios': { expect: signedIn(200), ask: () => ({ url: '/api/studios' }) },
  'GET /api/studios/:studioId': {
    expect: members(200),
    ask: ({ studioId }) => ({ url: `/api/studios/${studioId}` }),
  },
  'PATCH /api/studios/:studioId': {
    expect: owners(200),
    ask: async ({ at, studioId }) => {
      const row = await at
        .db<{ version: number }>('studios')
        .where({ id: studioId } as never)
        .first();
      return { url: `/api/studios/${studioId}`, body: { foot: 'A foot' }, version: row!.version };
    },
  },
  'GET /api/studios/:studioId/members': {
    expect: members(200),
    ask: ({ studioId }) => ({ url: `/api/studios/${studioId}/members` }),
  },
  'PATCH /api/studios/:studioId/members/:personId': {
    expect: owners(204),
    ask: async ({ at, studioId }) => {
      const { id } = await buildPerson(at.db);
      await addMember(at.db, studioId, id, 'editor');
      return { url: `/api/studios/${studioId}/members/${id}`, body: { role: 'creator' } };
    },
  },
  'DELETE /api/studios/:studioId/members/:personId': {
    expect: owners(204),
    ask: async ({ at, studioId }) => {
      const { id } = await buildPerson(at.db);
      await addMember(at.db, studioId, id, 'editor');
      return { url: `/api/studios/${studioId}/members/${id}` };
    },
  },
  'POST /api/studios/:studioId/invitations': {
    expect: owners(201),
    ask: ({ studioId }) => ({
      url: `/api/studios/${studioId}/invitations`,
      body: { email: someone(), role: 'editor' },
    }),
  },
  'DELETE /api/studios/:studioId/invitations/:invitationId': {
    expect: owners(204),
    ask: async (world) => {
      const made = await world.owner('post', `/studios/${world.studioId}/invitations`, {
        email: someone(),
        role: 'editor',
      });
      return { url: `/api/studios/${world.studioId}/invitations/${(made.body as { id: string }).id}` };
    },
  },
  'POST /api/invitations/look': {
    expect: anybody(200),
    ask: async (world) => ({ url: '/api/invitations/look', body: { token: await world.invitation(someone()) } }),
  },
  'POST /api/invitations/accept': {
    // The letter went to somebody else.
    expect: signedIn(403),
    ask: async (world) => ({ url: '/api/invitations/accept', body: { token: await world.invitation(someone()) } }),
  },
  'POST /api/invitations/join': {
    expect: anybody(201),
    ask: async (world) => ({
      url: '/api/invitations/join',
      body: { token: await world.invitation(someone()), name: 'A', password: 'wheat and water' },
    }),
  },
};
