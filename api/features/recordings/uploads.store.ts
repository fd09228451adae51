import type { Knex } from 'knex';
import type { Upload, UploadState } from '#contract/recordings';
import type { ClipStart } from '#contract/uploads';

export interface UploadRow {
  readonly id: string;
  readonly recordingId: string;
  readonly studioId: string;
  readonly personId: string;
  readonly objectId: string;
  /** Name of the object in storage. */
  readonly key: string;
  /** The store's own id of the upload in parts. */
  readonly storageId: string;
  readonly name: string;
  readonly size: number;
  readonly partSize: number;
  readonly state: UploadState;
  readonly refusal: string | null;
  readonly touchedAt: Date;
}

const COLUMNS = {
  id: 'u.id',
  recordingId: 'u.recording_id',
  studioId: 'r.studio_id',
  personId: 'u.person_id',
  objectId: 'u.object_id',
  key: 'o.key',
  storageId: 'u.s3_upload_id',
  name: 'u.name',
  size: 'u.size',
  partSize: 'u.part_size',
  state: 'u.state',
  refusal: 'u.refusal',
  touchedAt: 'u.touched_at',
} as const;

const uploads = (db: Knex) =>
  db('uploads as u').join('objects as o', 'o.id', 'u.object_id').join('recordings as r', 'r.id', 'u.recording_id');

export async function findUpload(db: Knex, id: string): Promise<UploadRow | undefined> {
  return uploads(db).where('u.id', id).first<UploadRow | undefined>(COLUMNS);
}

/** As findUpload; until the transaction ends nobody else changes it. */
export async function lockUpload(trx: Knex.Transaction, id: string): Promise<UploadRow | undefined> {
  return uploads(trx).where('u.id', id).forUpdate('u').first<UploadRow | undefined>(COLUMNS);
}

/** Clips of a recording that are on their way, and the one it shows; newest first. */
export async function listUnderWay(db: Knex, recordingId: string): Promise<(UploadRow & ClipStart)[]> {
  return uploads(db)
    .where({ 'u.recording_id': recordingId })
    .whereRaw(`(u.state in ('arriving', 'completing') or (u.state = 'ready' and r.clip_object_id = u.object_id))`)
    .orderBy('u.created_at', 'desc')
    .select<(UploadRow & ClipStart)[]>({
      ...COLUMNS,
      lastModified: 'u.last_modified',
      firstMiBSha256: 'u.first_mib_sha256',
    });
}

/** The newest upload of each recording, unless it has become its clip or was given up. */
export async function listNewest(db: Knex, recordingIds: readonly string[]): Promise<UploadRow[]> {
  return uploads(db)
    .distinctOn('u.recording_id')
    .whereIn('u.recording_id', recordingIds)
    .whereNot('u.state', 'given-up')
    .orderBy(['u.recording_id', { column: 'u.created_at', order: 'desc' }])
    .select<UploadRow[]>(COLUMNS);
}

export async function countArrivingOf(db: Knex, personId: string): Promise<number> {
  const row = await db('uploads').where({ person_id: personId, state: 'arriving' }).count({ n: '*' }).first();
  return Number(row?.n ?? 0);
}

export async function insertUpload(
  trx: Knex.Transaction,
  row: Pick<UploadRow, 'id' | 'recordingId' | 'studioId' | 'personId' | 'objectId' | 'key' | 'storageId' | 'partSize'>,
  file: ClipStart,
  type: string,
  at: Date,
): Promise<void> {
  await trx('objects').insert({
    id: row.objectId,
    studio_id: row.studioId,
    key: row.key,
    kind: 'clip',
    state: 'arriving',
    bytes: file.size,
    type,
    created_at: at,
    touched_at: at,
  });
  await trx('uploads').insert({
    id: row.id,
    recording_id: row.recordingId,
    person_id: row.personId,
    object_id: row.objectId,
    s3_upload_id: row.storageId,
    name: file.name,
    size: file.size,
    last_modified: file.lastModified,
    first_mib_sha256: file.firstMiBSha256,
    part_size: row.partSize,
    state: 'arriving',
    created_at: at,
    touched_at: at,
  });
}

/** Moves an upload on, if it is still in `from`. @returns whether it was */
export async function moveUpload(
  db: Knex,
  id: string,
  from: UploadState,
  to: { readonly state: UploadState; readonly refusal?: string | undefined },
  at: Date,
): Promise<boolean> {
  const moved = await db('uploads')
    .where({ id, state: from })
    .update({ state: to.state, refusal: to.refusal ?? null, touched_at: at });
  return moved > 0;
}

export interface PartRow {
  readonly n: number;
  readonly size: number;
  readonly sha256: string;
  readonly etag: string;
}

export async function listParts(db: Knex, uploadId: string): Promise<PartRow[]> {
  return db('upload_parts')
    .where({ upload_id: uploadId })
    .orderBy('n')
    .select<PartRow[]>('n', 'size', 'sha256', 'etag');
}

export async function findPart(db: Knex, uploadId: string, n: number): Promise<PartRow | undefined> {
  return db('upload_parts').where({ upload_id: uploadId, n }).first<PartRow | undefined>('n', 'size', 'sha256', 'etag');
}

/** Writes a part down and that the upload is alive. @returns false when that part is there already */
export async function insertPart(trx: Knex.Transaction, uploadId: string, part: PartRow, at: Date): Promise<boolean> {
  const made = await trx('upload_parts')
    .insert({ upload_id: uploadId, n: part.n, size: part.size, sha256: part.sha256, etag: part.etag })
    .onConflict(['upload_id', 'n'])
    .ignore()
    .returning('n');
  await trx('uploads').where({ id: uploadId }).update({ touched_at: at });
  return made.length > 0;
}

export async function deletePart(db: Knex, uploadId: string, n: number): Promise<void> {
  await db('upload_parts').where({ upload_id: uploadId, n }).delete();
}

/** An upload as the contract tells it. */
export function uploadAnswer(row: UploadRow, parts: readonly { readonly n: number; readonly size: number }[]): Upload {
  return {
    id: row.id,
    recordingId: row.recordingId,
    name: row.name,
    size: row.size,
    state: row.state,
    refusal: row.refusal,
    partSize: row.partSize,
    have: parts.map(({ n }) => n),
    haveBytes: parts.reduce((sum, { size }) => sum + size, 0),
    touchedAt: row.touchedAt.toISOString(),
  };
}
