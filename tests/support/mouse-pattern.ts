import type { Knex } from 'knex';
import {
  buildHouse,
  buildLine,
  buildMark,
  buildPattern,
  buildPiece,
  buildRecording,
  type Household,
} from './builders.ts';

export interface MousePattern {
  readonly house: Household;
  readonly patternId: string;
  readonly code: string;
  readonly recordingId: string;
  /** Ids of the body's lines R1 to R3 and the step after them. */
  readonly lines: readonly string[];
}

const LINES = [
  ['R1', '6 sc in magic ring (6)'],
  ['R2', 'inc × 6 (12)'],
  ['R3', '(sc, inc) × 6 (18)'],
] as const;

/** A mouse's body that agrees throughout, with a recording, moments and a caption, drafted in a studio of its own. */
export async function buildMouse(db: Knex): Promise<MousePattern> {
  const house = await buildHouse(db);
  const pattern = await buildPattern(db, {
    studio_id: house.studio.id,
    title: 'Harvest mouse',
    created_by: house.creator.id,
    details: JSON.stringify({ introduction: 'A toy 7 cm long.', level: 'easy' }),
  });
  const recording = await buildRecording(db, { pattern_id: pattern.id, title: 'Mouse, filmed' });
  const piece = await buildPiece(db, { pattern_id: pattern.id, name: 'Body' });
  const lines: string[] = [];
  for (const [label, text] of LINES) {
    const line = await buildLine(db, { piece_id: piece.id, label, text, short_id: `b${label.toLowerCase()}` });
    lines.push(line.id);
    await buildMark(db, {
      pattern_id: pattern.id,
      recording_id: recording.id,
      line_id: line.id,
      start_ms: lines.length * 60_000,
    });
  }
  const step = await buildLine(db, {
    piece_id: piece.id,
    kind: 'step',
    label: '',
    from_no: null,
    to_no: null,
    text: 'Stuff firmly.',
    short_id: 'stuff',
  });
  const [transcript] = await db('transcripts')
    .insert({
      recording_id: recording.id,
      number: 1,
      file_name: 'mouse.srt',
      source_text: '',
      encoding: 'utf-8',
      format: 'srt',
    })
    .returning<{ id: string }[]>('id');
  await db('cues').insert([
    {
      transcript_id: transcript?.id,
      ordinal: 1,
      start_ms: 60_000,
      end_ms: 63_000,
      heard: 'Sex single',
      corrected: 'Six single & one ring',
    },
    { transcript_id: transcript?.id, ordinal: 2, start_ms: 120_000, end_ms: 123_000, heard: 'Now <two> in each' },
  ]);
  return { house, patternId: pattern.id, code: pattern.code, recordingId: recording.id, lines: [...lines, step.id] };
}
