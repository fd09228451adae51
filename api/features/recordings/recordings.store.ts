import { generateKeyBetween } from 'fractional-indexing';
import type { Knex } from 'knex';
import type { ClipFacts } from '#contract/clip-facts';

export interface RecordingRow {
  readonly id: string;
  readonly studioId: string;
  readonly title: string;
  readonly publicUrl: string | null;
  readonly publicOffsetMs: number;
  readonly durationMs: number | null;
  readonly codec: string | null;
  readonly version: number;
}

/** A recording as it stands in a pattern. */
export interface PlacedRecordingRow extends RecordingRow {
  readonly number: number;
  readonly orderKey: string;
  readonly removedAt: Date | null;
  readonly clipType: string | null;
  readonly clipBytes: number | null;
}

const COLUMNS = {
  id: 'r.id',
  studioId: 'r.studio_id',
  title: 'r.title',
  publicUrl: 'r.public_url',
  publicOffsetMs: 'r.public_offset_ms',
  durationMs: 'r.duration_ms',
  codec: 'r.codec',
  version: 'r.version',
} as const;

const PLACED = {
  ...COLUMNS,
  number: 'pr.number',
  orderKey: 'pr.order_key',
  removedAt: 'pr.removed_at',
  clipType: 'o.type',
  clipBytes: 'o.bytes',
} as const;

const placed = (db: Knex, patternId: string) =>
  db('pattern_recordings as pr')
    .join('recordings as r', 'r.id', 'pr.recording_id')
    .leftJoin('objects as o', (on) => on.on('o.id', 'r.clip_object_id').andOnVal('o.state', 'ready'))
    .where('pr.pattern_id', patternId);

export async function findRecording(db: Knex, id: string, { lock = false } = {}): Promise<RecordingRow | undefined> {
  const row = db('recordings as r').where('r.id', id);
  if (lock) void row.forUpdate();
  return row.first<RecordingRow | undefined>(COLUMNS);
}

/** Terms that a person said a recording is spoken in; null where they are inferred. */
export async function findSpokenTerms(db: Knex, id: string): Promise<'US' | 'UK' | null> {
  const row = await db('recordings').where({ id }).first<{ terms: 'US' | 'UK' | null } | undefined>({
    terms: 'spoken_terms',
  });
  return row?.terms ?? null;
}

/** Says in which terms a recording is spoken; null: they are inferred. */
export async function setSpokenTerms(trx: Knex.Transaction, id: string, terms: 'US' | 'UK' | null): Promise<void> {
  await trx('recordings').where({ id }).update({ spoken_terms: terms });
}

/** The recordings of a pattern in their order. */
export async function listPlaced(db: Knex, patternId: string): Promise<PlacedRecordingRow[]> {
  return placed(db, patternId)
    .whereNull('pr.removed_at')
    .orderBy(['pr.order_key', 'pr.number'])
    .select<PlacedRecordingRow[]>(PLACED);
}

/** A recording in a pattern, also one that was removed from it. */
export async function findPlaced(db: Knex, patternId: string, id: string): Promise<PlacedRecordingRow | undefined> {
  return placed(db, patternId).where('r.id', id).first<PlacedRecordingRow | undefined>(PLACED);
}

interface Keyed {
  pattern_id: string;
  recording_id: string;
  number: number;
  order_key: string;
}

const places = (db: Knex, patternId: string) => db<Keyed>('pattern_recordings').where({ pattern_id: patternId });

/**
 * The key that puts a recording behind `after` (null: first; undefined: last). Those that were removed count too, so
 * that one that is put back finds its place free.
 * @returns undefined when `after` does not stand in the pattern
 */
export async function keyBehind(
  db: Knex,
  patternId: string,
  after: string | null | undefined,
  selfId: string,
): Promise<string | undefined> {
  const others = () => places(db, patternId).whereNot({ recording_id: selfId });
  let left: Keyed | undefined;
  if (after !== null) {
    const before = others().orderBy('order_key', 'desc').select('order_key');
    if (after !== undefined) void before.where({ recording_id: after });
    left = await before.first<Keyed | undefined>();
    if (!left && after !== undefined) return undefined;
  }
  const behind = others().orderBy('order_key').select('order_key');
  if (left) void behind.where('order_key', '>', left.order_key);
  const right = await behind.first<Keyed | undefined>();
  return generateKeyBetween(left?.order_key ?? null, right?.order_key ?? null);
}

/** Makes a recording and puts it into a pattern under the next number nobody had. */
export async function insertPlaced(
  trx: Knex.Transaction,
  patternId: string,
  row: Pick<PlacedRecordingRow, 'id' | 'studioId' | 'title' | 'publicUrl' | 'publicOffsetMs' | 'orderKey'>,
): Promise<void> {
  await trx('recordings').insert({
    id: row.id,
    studio_id: row.studioId,
    title: row.title,
    public_url: row.publicUrl,
    public_offset_ms: row.publicOffsetMs,
  });
  const last = await trx('pattern_recordings')
    .where({ pattern_id: patternId })
    .max<{ max: number | null }[]>({ max: 'number' });
  await trx('pattern_recordings').insert({
    pattern_id: patternId,
    recording_id: row.id,
    number: (last[0]?.max ?? 0) + 1,
    order_key: row.orderKey,
  });
}

/** Saves what changes, if nobody saved since `version`. @returns false when somebody did */
export async function updateRecording(
  trx: Knex.Transaction,
  at: { readonly id: string; readonly version: number },
  fields: {
    readonly title?: string | undefined;
    readonly publicUrl?: string | null | undefined;
    readonly publicOffsetMs?: number | undefined;
  },
): Promise<boolean> {
  const saved = await trx('recordings')
    .where({ id: at.id, version: at.version })
    .update({
      ...(fields.title !== undefined && { title: fields.title }),
      ...(fields.publicUrl !== undefined && { public_url: fields.publicUrl }),
      ...(fields.publicOffsetMs !== undefined && { public_offset_ms: fields.publicOffsetMs }),
      version: at.version + 1,
    });
  return saved > 0;
}

export async function updatePlace(
  trx: Knex.Transaction,
  at: { readonly patternId: string; readonly id: string },
  fields: { readonly orderKey?: string; readonly removedAt?: Date | null },
): Promise<void> {
  await trx('pattern_recordings')
    .where({ pattern_id: at.patternId, recording_id: at.id })
    .update({
      ...(fields.orderKey !== undefined && { order_key: fields.orderKey }),
      ...(fields.removedAt !== undefined && { removed_at: fields.removedAt }),
    });
}

/** Patterns in which a recording stands. */
export async function listPatternsOf(db: Knex, recordingId: string): Promise<string[]> {
  const rows = await db('pattern_recordings')
    .where({ recording_id: recordingId })
    .whereNull('removed_at')
    .orderBy('pattern_id')
    .select<{ pattern_id: string }[]>('pattern_id');
  return rows.map(({ pattern_id }) => pattern_id);
}

/** Lets a recording show a clip. @returns the object it showed before, if any */
export async function showClip(
  trx: Knex.Transaction,
  id: string,
  objectId: string | null,
  facts: Pick<ClipFacts, 'durationMs' | 'video'> | null,
): Promise<string | null> {
  const before = await trx('recordings').where({ id }).forUpdate().first<{ clip: string | null } | undefined>({
    clip: 'clip_object_id',
  });
  await trx('recordings')
    .where({ id })
    .update({
      clip_object_id: objectId,
      duration_ms: facts?.durationMs ?? null,
      codec: facts?.video ?? null,
      version: trx.raw('version + 1'),
    });
  return before?.clip ?? null;
}
