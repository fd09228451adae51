import { randomUUID } from 'node:crypto';
import { hash } from '@node-rs/argon2';
import { generateKeyBetween } from 'fractional-indexing';
import type { Knex } from 'knex';

/** The password of everybody that `buildPerson` makes. */
export const TEST_PASSWORD = 'a long enough test password';
let passwordHash: Promise<string> | undefined;

type Over = Readonly<Record<string, unknown>>;
export type Role = 'owner' | 'creator' | 'editor';

let made = 0;
const next = () => (made += 1);
const tag = () => randomUUID().replaceAll('-', '').slice(0, 10);

async function insert<T>(db: Knex, table: string, row: Over): Promise<T> {
  const [saved] = await db(table).insert(row).returning('*');
  return saved as T;
}

export interface PersonRow {
  id: string;
  email: string;
  name: string;
  version: number;
}

/** A person with a confirmed address. */
export async function buildPerson(db: Knex, over: Over = {}): Promise<PersonRow> {
  passwordHash ??= hash(TEST_PASSWORD, { memoryCost: 19_456, timeCost: 2, parallelism: 1 });
  return insert(db, 'people', {
    email: `person-${tag()}@mail.example`,
    email_confirmed_at: new Date('2026-01-01T00:00:00Z'),
    name: `Person ${next()}`,
    password_hash: await passwordHash,
    ...over,
  });
}

export interface StudioRow {
  id: string;
  name: string;
  slug: string;
  version: number;
}

/** A studio without members; `buildHouse` makes one that is lived in. */
export async function buildStudio(db: Knex, over: Over = {}): Promise<StudioRow> {
  return insert(db, 'studios', {
    name: `Studio ${next()}`,
    slug: `studio-${tag()}`,
    quota_bytes: 50_000_000_000,
    ...over,
  });
}

export async function addMember(
  db: Knex,
  studioId: string,
  personId: string,
  role: Role,
  over: Over = {},
): Promise<void> {
  await insert(db, 'members', { studio_id: studioId, person_id: personId, role, ...over });
}

export interface Household {
  readonly studio: StudioRow;
  readonly owner: PersonRow;
  readonly creator: PersonRow;
  readonly editor: PersonRow;
}

/** A studio with an owner, a creator and an editor. */
export async function buildHouse(db: Knex): Promise<Household> {
  const studio = await buildStudio(db);
  const [owner, creator, editor] = await Promise.all([buildPerson(db), buildPerson(db), buildPerson(db)]);
  await addMember(db, studio.id, owner.id, 'owner');
  await addMember(db, studio.id, creator.id, 'creator');
  await addMember(db, studio.id, editor.id, 'editor');
  return { studio, owner, creator, editor };
}

export interface PatternRow {
  id: string;
  studio_id: string;
  code: string;
  title: string;
  version: number;
}

/** A pattern that is being drafted, without pieces; makes its studio when none is given. */
export async function buildPattern(db: Knex, over: Over = {}): Promise<PatternRow> {
  const studioId = over.studio_id ?? (await buildStudio(db)).id;
  return insert(db, 'patterns', { studio_id: studioId, code: tag(), title: `Pattern ${next()}`, ...over });
}

/** The order key after the last of the rows that match. */
async function keyAfterLast(db: Knex, table: string, where: Over): Promise<string> {
  const last = await db(table).where(where).max<{ max: string | null }[]>('order_key as max');
  return generateKeyBetween(last[0]?.max ?? null, null);
}

export interface PieceRow {
  id: string;
  pattern_id: string;
  order_key: string;
  name: string;
  version: number;
}

/** A piece worked in a spiral, after those the pattern has; makes its pattern when none is given. */
export async function buildPiece(db: Knex, over: Over = {}): Promise<PieceRow> {
  const patternId = over.pattern_id ?? (await buildPattern(db)).id;
  return insert(db, 'pieces', {
    pattern_id: patternId,
    order_key: await keyAfterLast(db, 'pieces', { pattern_id: patternId }),
    name: `Piece ${next()}`,
    worked: 'spiral',
    ...over,
  });
}

export interface LineRow {
  id: string;
  pattern_id: string;
  piece_id: string;
  short_id: string;
  order_key: string;
  text: string;
  version: number;
}

/** A round after those the piece has; makes its piece when none is given. */
export async function buildLine(db: Knex, over: Over = {}): Promise<LineRow> {
  const piece = over.piece_id
    ? await db<PieceRow>('pieces')
        .where({ id: over.piece_id as string })
        .first()
    : await buildPiece(db);
  const pieceId = piece?.id ?? '';
  const number = (await db('lines').where({ piece_id: pieceId }).count<{ n: number }[]>('* as n'))[0]?.n ?? 0;
  return insert(db, 'lines', {
    pattern_id: piece?.pattern_id,
    piece_id: pieceId,
    short_id: tag(),
    order_key: await keyAfterLast(db, 'lines', { piece_id: pieceId }),
    kind: 'round',
    label: `Rnd ${number + 1}`,
    from_no: number + 1,
    to_no: number + 1,
    text: '6 sc in a magic ring (6)',
    ...over,
  });
}

export interface RecordingRow {
  id: string;
  studio_id: string;
  title: string;
  version: number;
}

/** A recording without a clip or transcript, joined to the pattern if one is given with `pattern_id`. */
export async function buildRecording(db: Knex, { pattern_id, ...over }: Over = {}): Promise<RecordingRow> {
  const pattern = pattern_id
    ? await db<PatternRow>('patterns')
        .where({ id: pattern_id as string })
        .first()
    : undefined;
  const studioId = over.studio_id ?? pattern?.studio_id ?? (await buildStudio(db)).id;
  const recording = await insert<RecordingRow>(db, 'recordings', {
    studio_id: studioId,
    title: `Recording ${next()}`,
    ...over,
  });
  if (pattern) {
    const joined = await db('pattern_recordings')
      .where({ pattern_id: pattern.id })
      .max<{ max: number | null }[]>('number as max');
    await insert(db, 'pattern_recordings', {
      pattern_id: pattern.id,
      number: (joined[0]?.max ?? 0) + 1,
      recording_id: recording.id,
      order_key: await keyAfterLast(db, 'pattern_recordings', { pattern_id: pattern.id }),
    });
  }
  return recording;
}

/** A person's mark at a moment of a recording, by default the main one of the line. */
export async function buildMark(
  db: Knex,
  over: { readonly pattern_id: string; readonly recording_id: string; readonly start_ms: number } & Over,
): Promise<{ id: string; version: number }> {
  return insert(db, 'marks', { made_by: 'person', ...over });
}
