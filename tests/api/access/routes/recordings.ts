import { type Entry } from '../entry.ts';
import { makers, members } from '../people.ts';
import { CLIP_START, type World } from '../world.ts';

/** A recording whose transcript has been read. */
async function heldUrl(world: World): Promise<string> {
  const { patternId, transcriptId } = await world.transcript();
  const row = await world.at
    .db<{ recording_id: string }>('transcripts')
    .where({ id: transcriptId } as never)
    .first();
  return `/api/patterns/${patternId}/recordings/${row!.recording_id}`;
}
/** The newest change of all, which is that of the pattern made last. */
async function newestChange(world: World): Promise<number> {
  return Number((await world.at.db('changes').max<{ max: string }[]>('id as max'))[0]!.max);
}

export const recordings: Record<string, Entry> = {
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
  'GET /api/patterns/:patternId/readings/:readingId/differences': {
    expect: members(200),
    ask: async (world) => {
      const { patternId, readingId } = await world.transcript();
      return { url: `/api/patterns/${patternId}/readings/${readingId}/differences` };
    },
  },
  'POST /api/patterns/:patternId/heard-words': {
    expect: members(201),
    ask: async (world) => {
      const { patternId, transcriptId } = await world.transcript();
      return {
        url: `/api/patterns/${patternId}/heard-words`,
        body: { transcriptId, firstWord: 0, lastWord: 3, as: 'step' },
      };
    },
  },
  'GET /api/transcripts/:transcriptId/corrections': {
    expect: members(200),
    ask: async (world) => ({ url: `/api/transcripts/${(await world.transcript()).transcriptId}/corrections` }),
  },
  'POST /api/transcripts/:transcriptId/corrections': {
    expect: members(200),
    ask: async (world) => ({
      url: `/api/transcripts/${(await world.transcript()).transcriptId}/corrections`,
      body: { take: [] },
    }),
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
  'GET /api/patterns/:patternId/recordings/:recordingId/held': {
    expect: members(200),
    ask: async (world) => ({ url: `${await heldUrl(world)}/held` }),
  },
  'POST /api/patterns/:patternId/recordings/:recordingId/held': {
    expect: members(200),
    ask: async (world) => ({ url: `${await heldUrl(world)}/held`, body: { lastChange: await newestChange(world) } }),
  },
  'GET /api/patterns/:patternId/recordings/:recordingId/cut': {
    expect: members(200),
    ask: async (world) => ({ url: `${await heldUrl(world)}/cut` }),
  },
  'POST /api/patterns/:patternId/recordings/:recordingId/cut': {
    expect: members(200),
    ask: async (world) => ({
      url: `${await heldUrl(world)}/cut`,
      body: { how: 'stand', lastChange: await newestChange(world) },
    }),
  },
};
