import { randomUUID } from 'node:crypto';
import { type Entry } from '../entry.ts';
import { makers, members } from '../people.ts';

export const patterns: Record<string, Entry> = {
  'GET /api/patterns': {
    expect: members(200),
    ask: ({ studioId }) => ({ url: `/api/patterns?studioId=${studioId}` }),
  },
  'POST /api/patterns': {
    expect: makers(201),
    ask: ({ studioId }) => ({ url: '/api/patterns', body: { studioId, title: 'A new one' } }),
  },
  'POST /api/patterns/written': {
    expect: makers(201),
    ask: ({ studioId }) => ({
      url: '/api/patterns/written',
      body: {
        id: randomUUID(),
        studioId,
        title: 'A written one',
        terms: 'US',
        sizes: [],
        pieces: [{ name: 'Cap', make: 1, worked: 'spiral', lines: [] }],
        materials: [],
        notes: [],
        specialStitches: [],
      },
    }),
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
  'GET /api/patterns/:patternId/events': {
    expect: members(200),
    ask: async (world) => {
      const url = `/api/patterns/${(await world.pattern()).id}/events?tab=${randomUUID()}`;
      return { url, send: (headers) => world.listen(url, headers) };
    },
  },
  'PUT /api/patterns/:patternId/seats/:tabId': {
    expect: members(204),
    ask: async (world) => ({
      url: `/api/patterns/${(await world.pattern()).id}/seats/${randomUUID()}`,
      body: { lineId: null },
    }),
  },
  'GET /api/patterns/:patternId/checks': {
    expect: members(200),
    ask: async (world) => ({ url: `/api/patterns/${(await world.pattern()).id}/checks` }),
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
