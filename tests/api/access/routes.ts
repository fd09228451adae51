import { randomUUID } from 'node:crypto';
import { addMember, buildPerson, TEST_PASSWORD } from '../../support/builders.ts';
import { anybody, makers, members, owners, signedIn, type Expected, type Who } from './people.ts';
import { CLIP_START, type World } from './world.ts';

/** One call: where to, with what; a body that is a file is sent by `send` itself. */
export interface Call {
  readonly url: string;
  readonly body?: object;
  readonly version?: number;
  readonly send?: (headers: Record<string, string>) => Promise<{ status: number }>;
}

export interface Entry {
  readonly expect: Expected;
  /** Makes what the call is about, fresh for each person. */
  readonly ask: (world: World, who: Who) => Promise<Call> | Call;
}

const someone = () => `${randomUUID().slice(0, 8)}@post.example`;
const NOWHERE = 'x'.repeat(43);

const account: Record<string, Entry> = {
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

const studios: Record<string, Entry> = {
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

const patterns: Record<string, Entry> = {
  'GET /api/patterns': {
    expect: members(200),
    ask: ({ studioId }) => ({ url: `/api/patterns?studioId=${studioId}` }),
  },
  'POST /api/patterns': {
    expect: makers(201),
    ask: ({ studioId }) => ({ url: '/api/patterns', body: { studioId, title: 'A new one' } }),
  },
  'GET /api/patterns/:patternId': {
    expect: members(200),
    ask: async (world) => ({ url: `/api/patterns/${(await world.pattern()).id}` }),
  },
  'PATCH /api/patterns/:patternId': {
    expect: members(200),
    ask: async (world) => ({
      url: `/api/patterns/${(await world.pattern()).id}`,
      body: { title: 'Another title' },
      version: 1,
    }),
  },
  'PATCH /api/patterns/:patternId (who sees it)': {
    expect: makers(200),
    ask: async (world) => ({
      url: `/api/patterns/${(await world.pattern()).id}`,
      body: { visibility: 'listed' },
      version: 1,
    }),
  },
  'POST /api/patterns/:patternId/state': {
    expect: members(200),
    ask: async (world) => ({
      url: `/api/patterns/${(await world.pattern()).id}/state`,
      body: { state: 'in-proof' },
      version: 1,
    }),
  },
  'POST /api/patterns/:patternId/duplicate': {
    expect: makers(201),
    ask: async (world) => ({ url: `/api/patterns/${(await world.pattern()).id}/duplicate` }),
  },
  'GET /api/patterns/:patternId/changes': {
    expect: members(200),
    ask: async (world) => ({ url: `/api/patterns/${(await world.pattern()).id}/changes` }),
  },
};
for (const step of ['bin', 'restore', 'archive', 'unarchive']) {
  patterns[`POST /api/patterns/:patternId/${step}`] = {
    expect: makers(200),
    ask: async (world) => ({ url: `/api/patterns/${(await world.pattern()).id}/${step}`, version: 1 }),
  };
}
for (const which of ['undo', 'redo']) {
  patterns[`POST /api/patterns/:patternId/${which}`] = {
    // There is nothing of theirs to take back: members are told so, others see no pattern.
    expect: members(409),
    ask: async (world) => ({ url: `/api/patterns/${(await world.pattern()).id}/${which}` }),
  };
}

/** Rows made under a pattern and then written and taken away by id. */
const KINDS: Record<string, { make: object; edit: object }> = {
  pieces: { make: { name: 'Ear' }, edit: { name: 'Tail' } },
  materials: { make: { kind: 'hook', name: 'Hook' }, edit: { name: 'Other hook' } },
  cautions: { make: { text: 'Short cords.' }, edit: { text: 'Shorter cords.' } },
  notes: { make: { text: 'Right side out.' }, edit: { text: 'Right side in.' } },
  'special-stitches': { make: { name: 'Knot', text: 'ch 3' }, edit: { text: 'ch 4' } },
};
const rows: Record<string, Entry> = {};
for (const [kind, { make, edit }] of Object.entries(KINDS)) {
  rows[`POST /api/patterns/:patternId/${kind}`] = {
    expect: members(201),
    ask: async (world) => ({ url: `/api/patterns/${(await world.pattern()).id}/${kind}`, body: make }),
  };
  rows[`PATCH /api/${kind}/:id`] = {
    expect: members(200),
    ask: async (world) => {
      const { id, version } = await world.row(kind, make);
      return { url: `/api/${kind}/${id}`, body: edit, version };
    },
  };
  rows[`DELETE /api/${kind}/:id`] = {
    expect: members(204),
    ask: async (world) => {
      const { id, version } = await world.row(kind, make);
      return { url: `/api/${kind}/${id}`, version };
    },
  };
}
Object.assign(rows, {
  'POST /api/patterns/:patternId/lines': {
    expect: members(201),
    ask: async (world: World) => {
      const { pattern, piece } = await world.line();
      return { url: `/api/patterns/${pattern.id}/lines`, body: { pieceId: piece.id, kind: 'step', text: 'Stuff.' } };
    },
  },
  'PATCH /api/lines/:id': {
    expect: members(200),
    ask: async (world: World) => ({
      url: `/api/lines/${(await world.line()).line.id}`,
      body: { text: '7 sc' },
      version: 1,
    }),
  },
  'DELETE /api/lines/:id': {
    expect: members(204),
    ask: async (world: World) => ({ url: `/api/lines/${(await world.line()).line.id}`, version: 1 }),
  },
  'POST /api/patterns/:patternId/marks': {
    expect: members(201),
    ask: async (world: World) => {
      const { pattern, recording } = await world.recording();
      return { url: `/api/patterns/${pattern.id}/marks`, body: { recordingId: recording.id, startMs: 4_000 } };
    },
  },
  'PATCH /api/marks/:id': {
    expect: members(200),
    ask: async (world: World) => ({
      url: `/api/marks/${(await world.mark()).mark.id}`,
      body: { startMs: 1_100 },
      version: 1,
    }),
  },
  'DELETE /api/marks/:id': {
    expect: members(204),
    ask: async (world: World) => ({ url: `/api/marks/${(await world.mark()).mark.id}`, version: 1 }),
  },
} satisfies Record<string, Entry>);

const recordings: Record<string, Entry> = {
  'GET /api/patterns/:patternId/recordings': {
    expect: members(200),
    ask: async (world) => ({ url: `/api/patterns/${(await world.pattern()).id}/recordings` }),
  },
  'POST /api/patterns/:patternId/recordings': {
    expect: makers(201),
    ask: async (world) => ({
      url: `/api/patterns/${(await world.pattern()).id}/recordings`,
      body: { title: 'Part one' },
    }),
  },
  'PATCH /api/patterns/:patternId/recordings/:recordingId': {
    expect: makers(200),
    ask: async (world) => {
      const { pattern, recording } = await world.recording();
      return {
        url: `/api/patterns/${pattern.id}/recordings/${recording.id}`,
        body: { title: 'Part two' },
        version: 1,
      };
    },
  },
  'DELETE /api/patterns/:patternId/recordings/:recordingId': {
    expect: makers(204),
    ask: async (world) => {
      const { pattern, recording } = await world.recording();
      return { url: `/api/patterns/${pattern.id}/recordings/${recording.id}`, version: 1 };
    },
  },
  'POST /api/patterns/:patternId/recordings/:recordingId/put-back': {
    expect: makers(200),
    ask: async (world) => {
      const { pattern, recording } = await world.recording();
      const url = `/patterns/${pattern.id}/recordings/${recording.id}`;
      await world.owner('delete', url, undefined, 1);
      const row = await world.at
        .db<{ version: number }>('recordings')
        .where({ id: recording.id } as never)
        .first();
      return { url: `/api${url}/put-back`, version: row!.version };
    },
  },
  'POST /api/patterns/:patternId/readings/:readingId/take': {
    expect: makers(200),
    ask: async (world) => {
      const { patternId, readingId } = await world.transcript();
      return { url: `/api/patterns/${patternId}/readings/${readingId}/take` };
    },
  },
  'POST /api/recordings/:recordingId/transcripts': {
    expect: makers(201),
    ask: async (world) => {
      const { recording } = await world.recording();
      return {
        url: `/api/recordings/${recording.id}/transcripts`,
        send: (headers) => world.sendTranscript(recording.id, headers),
      };
    },
  },
  'GET /api/transcripts/:transcriptId': {
    expect: members(200),
    ask: async (world) => ({ url: `/api/transcripts/${(await world.transcript()).transcriptId}` }),
  },
  'GET /api/transcripts/:transcriptId/cues': {
    expect: members(200),
    ask: async (world) => ({ url: `/api/transcripts/${(await world.transcript()).transcriptId}/cues` }),
  },
  'POST /api/transcripts/:transcriptId/readings': {
    expect: makers(202),
    ask: async (world) => ({ url: `/api/transcripts/${(await world.transcript()).transcriptId}/readings` }),
  },
  'PATCH /api/cues/:cueId': {
    expect: members(200),
    ask: async (world) => ({
      url: `/api/cues/${(await world.transcript()).cueId}`,
      body: { corrected: 'Round one. Six double crochet in a magic ring.' },
      version: 1,
    }),
  },
  'POST /api/recordings/:recordingId/clip': {
    expect: makers(201),
    ask: async (world) => ({
      url: `/api/recordings/${(await world.recording()).recording.id}/clip`,
      body: CLIP_START,
    }),
  },
  'PUT /api/uploads/:uploadId/parts/:n': {
    expect: makers(200),
    ask: async (world) => {
      const uploadId = await world.upload(false);
      return { url: `/api/uploads/${uploadId}/parts/1`, send: (headers) => world.sendPart(uploadId, headers) };
    },
  },
  'GET /api/uploads/:uploadId': {
    expect: members(200),
    ask: async (world) => ({ url: `/api/uploads/${await world.upload(false)}` }),
  },
  'POST /api/uploads/:uploadId/complete': {
    expect: makers(202),
    ask: async (world) => ({ url: `/api/uploads/${await world.upload()}/complete` }),
  },
  'DELETE /api/uploads/:uploadId': {
    expect: makers(204),
    ask: async (world) => ({ url: `/api/uploads/${await world.upload(false)}` }),
  },
  'GET /api/recordings/:recordingId/clip': {
    expect: members(200, 404),
    ask: async (world) => ({ url: `/api/recordings/${(await world.clip()).recordingId}/clip` }),
  },
  'DELETE /api/recordings/:recordingId/clip': {
    expect: makers(204),
    ask: async (world) => ({ url: `/api/recordings/${(await world.clip()).recordingId}/clip` }),
  },
};

const editions: Record<string, Entry> = {
  'GET /api/patterns/:patternId/editions': {
    expect: members(200),
    ask: async (world) => ({ url: `/api/patterns/${(await world.pattern()).id}/editions` }),
  },
  'GET /api/patterns/:patternId/next-edition': {
    expect: members(200),
    ask: async (world) => ({ url: `/api/patterns/${(await world.pattern()).id}/next-edition` }),
  },
  'POST /api/patterns/:patternId/editions': {
    expect: makers(201),
    ask: async (world) => {
      const { patternId, version } = await world.publishable();
      return { url: `/api/patterns/${patternId}/editions`, body: { visibility: 'unlisted' }, version };
    },
  },
  'PUT /api/patterns/:patternId/editions/:number/withdrawal': {
    expect: makers(200),
    ask: async (world) => ({
      url: `/api/patterns/${(await world.edition()).patternId}/editions/1/withdrawal`,
      body: { reason: 'A round is wrong.' },
    }),
  },
  'DELETE /api/patterns/:patternId/editions/:number/withdrawal': {
    expect: makers(200),
    ask: async (world) => ({ url: `/api/patterns/${(await world.edition()).patternId}/editions/1/withdrawal` }),
  },
  'GET /api/patterns/:patternId/sheet.pdf': {
    expect: members(200),
    ask: async (world) => ({ url: `/api/patterns/${(await world.line()).pattern.id}/sheet.pdf` }),
  },
};
/** What an edition's page is made of: for anybody with the link, unless the pattern is private. */
const PUBLISHED: Record<string, (code: string) => string> = {
  'GET /api/editions/:code/:number/clips/:recording': (code) => `/api/editions/${code}/1/clips/1`,
  'GET /api/editions/:code/:number/captions/:recording': (code) => `/api/editions/${code}/1/captions/1`,
  'GET /api/editions/:code/:number/sheet.pdf': (code) => `/api/editions/${code}/1/sheet.pdf`,
  'GET /w/:code': (code) => `/w/${code}`,
  'GET /w/:code/:number': (code) => `/w/${code}/1`,
};
for (const [route, urlOf] of Object.entries(PUBLISHED)) {
  for (const [visibility, expect] of [
    ['unlisted', anybody(200)],
    ['private', members(200, 404)],
  ] as const) {
    editions[`${route} (${visibility})`] = {
      expect,
      ask: async (world) => ({ url: urlOf((await world.edition(visibility)).code) }),
    };
  }
}

const house: Record<string, Entry> = {
  'GET /health/live': { expect: anybody(200), ask: () => ({ url: '/health/live' }) },
  'GET /health/ready': { expect: anybody(200), ask: () => ({ url: '/health/ready' }) },
  'GET /{*path}': { expect: anybody(200), ask: () => ({ url: '/sign-in' }) },
};

/** The whole table. A route that stands in it twice has its other case behind it in brackets. */
export const ROUTES: Readonly<Record<string, Entry>> = {
  ...house,
  ...account,
  ...studios,
  ...patterns,
  ...rows,
  ...recordings,
  ...editions,
};

/** `GET /w/:code (private)` is about `GET /w/:code`. */
export const routeOf = (entry: string): string => entry.replace(/ \(.*\)$/u, '');
