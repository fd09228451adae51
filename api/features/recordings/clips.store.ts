import type { Knex } from 'knex';

/** A whole clip, with what decides who may see it. */
export interface ClipRow {
  readonly recordingId: string;
  readonly studioId: string;
  readonly objectId: string;
  readonly key: string;
  readonly bytes: number;
  readonly type: string;
  readonly changedAt: Date;
  /** It belongs to an edition that is out: unlisted or listed, and not withdrawn. */
  readonly published: boolean;
}

/**
 * The clip of a recording; undefined while it has none. An edition names its recordings by number, so that one
 * added to the pattern later is not out with it.
 */
export async function findClip(db: Knex, recordingId: string): Promise<ClipRow | undefined> {
  const { rows } = await db.raw<{ rows: ClipRow[] }>(
    `select r.id as "recordingId", r.studio_id as "studioId", o.id as "objectId", o.key, o.bytes, o.type,
            o.touched_at as "changedAt",
            exists (select 1 from pattern_recordings pr
                      join patterns p on p.id = pr.pattern_id
                      join editions e on e.pattern_id = p.id
                     where pr.recording_id = r.id and p.visibility in ('unlisted', 'listed') and p.deleted_at is null
                       and e.withdrawn_at is null
                       and e.document -> 'recordings' @> jsonb_build_array(jsonb_build_object('number', pr.number)))
              as published
       from recordings r join objects o on o.id = r.clip_object_id and o.state = 'ready'
      where r.id = ?`,
    [recordingId],
  );
  return rows[0];
}
