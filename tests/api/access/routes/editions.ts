import { type Entry } from '../entry.ts';
import { anybody, makers, members } from '../people.ts';

export const editions: Record<string, Entry> = {
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
