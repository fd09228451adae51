import { randomUUID } from 'node:crypto';
import { TEST_PASSWORD } from '../../../support/builders.ts';
import { type Entry, someone, NOWHERE } from '../entry.ts';
import { anybody, signedIn } from '../people.ts';

export const account: Record<string, Entry> = {
  'POST /api/account': {
    expect: anybody(202),
    ask: () => ({ url: '/api/account', body: { name: 'A', email: someone(), password: 'wheat and water' } }),
  },
  'POST /api/account/confirm': {
    expect: anybody(410),
    ask: () => ({ url: '/api/account/confirm', body: { token: NOWHERE } }),
  },
  'POST /api/account/forgotten': {
    expect: anybody(202),
    ask: () => ({ url: '/api/account/forgotten', body: { email: someone() } }),
  },
  'POST /api/account/reset': {
    expect: anybody(410),
    ask: () => ({ url: '/api/account/reset', body: { token: NOWHERE, password: 'wheat and water' } }),
  },
  'GET /api/account': { expect: signedIn(200), ask: () => ({ url: '/api/account' }) },
  'PATCH /api/account': {
    expect: signedIn(200),
    ask: async ({ at, cast }, who) => {
      const id = who === 'nobody' ? randomUUID() : cast.people[who].id;
      const row = await at
        .db<{ version: number }>('people')
        .where({ id } as never)
        .first();
      return { url: '/api/account', body: { name: 'New name' }, version: row?.version ?? 1 };
    },
  },
  'POST /api/account/password': {
    expect: signedIn(204),
    ask: () => ({ url: '/api/account/password', body: { current: TEST_PASSWORD, password: TEST_PASSWORD } }),
  },
  'GET /api/account/sessions': { expect: signedIn(200), ask: () => ({ url: '/api/account/sessions' }) },
  'DELETE /api/account/sessions': { expect: signedIn(204), ask: () => ({ url: '/api/account/sessions' }) },
  'GET /api/session': { expect: anybody(200), ask: () => ({ url: '/api/session' }) },
  'POST /api/session': {
    expect: anybody(401),
    ask: () => ({ url: '/api/session', body: { email: someone(), password: 'wheat and water' } }),
  },
  'DELETE /api/session': { expect: anybody(204), ask: () => ({ url: '/api/session' }) },
};
