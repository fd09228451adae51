import { type Entry } from '../entry.ts';
import { members } from '../people.ts';
import { type World } from '../world.ts';

/** Rows made under a pattern and then written and taken away by id. */
const KINDS: Record<string, { make: object; edit: object }> = {
  pieces: { make: { name: 'Ear' }, edit: { name: 'Tail' } },
  materials: { make: { kind: 'hook', name: 'Hook' }, edit: { name: 'Other hook' } },
  cautions: { make: { text: 'Short cords.' }, edit: { text: 'Shorter cords.' } },
  notes: { make: { text: 'Right side out.' }, edit: { text: 'Right side in.' } },
  'left-checks': {
    make: { kind: 'hook-missing', says: '0123456789abcdef', reason: 'Any hook will do.' },
    edit: { reason: 'Any hook at all will do.' },
  },
  'special-stitches': { make: { name: 'Knot', text: 'ch 3' }, edit: { text: 'ch 4' } },
};
export const rows: Record<string, Entry> = {};
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
