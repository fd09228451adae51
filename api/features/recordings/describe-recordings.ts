import type { Knex } from 'knex';
import type { Recording, TranscriptHead } from '#contract/recordings';
import { listNewestReadings, type ReadingRow } from './readings.store.ts';
import type { PlacedRecordingRow } from './recordings.store.ts';
import { summariseDraft } from './summarise-draft.ts';
import { listNewestTranscripts, type NewestTranscript } from './transcripts.store.ts';
import { listNewest, listParts, uploadAnswer } from './uploads.store.ts';

/** A transcript with how far its reading has come. */
export function describeTranscript(row: NewestTranscript, reading: ReadingRow | undefined): TranscriptHead {
  const state = reading ? 'done' : row.readingFailedAt ? 'failed' : 'waiting';
  return {
    id: row.id,
    number: row.number,
    fileName: row.fileName,
    format: row.format,
    encoding: row.encoding,
    captions: row.captions,
    lastMs: row.lastMs,
    problems: row.problems,
    reading: {
      state,
      summary: reading ? { ...summariseDraft(reading.draft), id: reading.id, taken: reading.taken } : null,
    },
  };
}

/** Recordings as the contract tells them, with what has arrived of each. */
export async function describeRecordings(db: Knex, rows: readonly PlacedRecordingRow[]): Promise<Recording[]> {
  const ids = rows.map(({ id }) => id);
  const transcripts = await listNewestTranscripts(db, ids);
  const readings = await listNewestReadings(
    db,
    transcripts.map(({ id }) => id),
  );
  const uploads = (await listNewest(db, ids)).filter(({ state }) => state !== 'ready');
  const described: Recording[] = [];
  for (const row of rows) {
    const upload = uploads.find(({ recordingId }) => recordingId === row.id);
    const transcript = transcripts.find(({ recordingId }) => recordingId === row.id);
    described.push({
      id: row.id,
      number: row.number,
      orderKey: row.orderKey,
      title: row.title,
      publicUrl: row.publicUrl,
      publicOffsetMs: row.publicOffsetMs,
      durationMs: row.durationMs,
      codec: row.codec,
      clip:
        row.clipType === null
          ? null
          : { url: `/api/recordings/${row.id}/clip`, type: row.clipType, bytes: row.clipBytes ?? 0 },
      upload: upload ? uploadAnswer(upload, await listParts(db, upload.id)) : null,
      transcript: transcript
        ? describeTranscript(
            transcript,
            readings.find(({ transcriptId }) => transcriptId === transcript.id),
          )
        : null,
      version: row.version,
    });
  }
  return described;
}
