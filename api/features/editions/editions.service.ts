import type { Knex } from 'knex';
import { projectEdition, type PublicEdition } from '#crochet';
import { PublicEdition as PublicEditionContract, type EditionList, type Edition } from '#contract/editions';
import { answer, AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import type { Asking } from '../patterns/deed.service.ts';
import { findSeenPattern } from '../patterns/document.service.ts';
import { listFiles } from '../sheet/sheet-files.service.ts';
import { canPublish, canSeeEdition } from './editions.policy.ts';
import {
  findByCode,
  findEdition,
  findEditionById,
  findRecordingId,
  listEditions,
  setWithdrawn,
  type EditionRow,
} from './editions.store.ts';

const iso = (date: Date | null) => date?.toISOString() ?? null;

function toEdition(row: EditionRow, isCurrent: boolean, files: Edition['files']): Edition {
  const { document } = row;
  const lines = document.pieces.flatMap((piece) => piece.lines);
  return {
    number: row.number,
    publishedAt: row.publishedAt.toISOString(),
    publishedBy: row.publishedBy,
    isCurrent,
    withdrawnAt: iso(row.withdrawnAt),
    withdrawnReason: row.withdrawnReason,
    path: `/w/${document.code}/${row.number}`,
    lines: lines.length,
    moments: lines.filter(({ mark }) => mark !== null).length,
    captions: document.captions.length,
    errata: [...document.errata],
    files,
  };
}

/**
 * Every edition of a pattern, for its studio.
 * @throws AppError not-found
 */
export async function readEditions(
  { db, env }: Pick<Deps, 'db' | 'env'>,
  who: Person,
  patternId: string,
): Promise<EditionList> {
  const pattern = await findSeenPattern(db, who, patternId);
  const rows = await listEditions(db, patternId);
  const files = await listFiles(
    db,
    rows.map(({ id }) => id),
  );
  const current = rows.find(({ withdrawnAt }) => withdrawnAt === null);
  return {
    code: pattern.code,
    visibility: pattern.visibility,
    address: `${env.publicUrl}/w/${pattern.code}`,
    mayManage: canPublish(who, pattern),
    editions: rows.map((row) => toEdition(row, row === current, files.get(row.id) ?? [])),
  };
}

/**
 * Withdraws an edition with a reason for those who come with its sheet in hand, or brings it back (`reason` null).
 * @throws AppError not-found | forbidden
 */
export async function withdrawEdition(
  db: Knex,
  { who, now }: Asking,
  at: { readonly patternId: string; readonly number: number },
  reason: string | null,
): Promise<void> {
  const pattern = await findSeenPattern(db, who, at.patternId);
  if (!canPublish(who, pattern)) throw new AppError('forbidden');
  const done = await setWithdrawn(db, at, reason === null ? null : { at: now, reason });
  if (!done) throw new AppError('not-found');
}

/** An edition as the asker may see it. */
export interface SeenEdition {
  readonly id: string;
  readonly patternId: string;
  readonly number: number;
  readonly visibility: 'private' | 'unlisted' | 'listed';
  readonly paper: 'A4' | 'Letter';
  readonly publishedAt: Date;
  readonly withdrawnReason: string | null;
  readonly isWithdrawn: boolean;
  /** The newest one that is out; another number where a later edition is. */
  readonly currentNumber: number;
  /** Projected by right and parsed by the contract. */
  readonly edition: PublicEdition;
}

const project = (row: EditionRow): PublicEdition => answer(PublicEditionContract, projectEdition(row.document));

/**
 * The way from a printed address to a document. An unknown code, a private pattern and an edition that was never
 * published are the same to somebody who may not see them.
 *
 * @param number null for the current edition
 * @throws AppError not-found
 */
export async function openEdition(
  db: Knex,
  who: Person | null,
  code: string,
  number: number | null,
): Promise<SeenEdition> {
  const pattern = await findByCode(db, code);
  if (!pattern || !canSeeEdition(who, pattern)) throw new AppError('not-found');
  const row = await findEdition(db, pattern.patternId, number);
  if (!row) throw new AppError('not-found');
  const current = number === null ? row : await findEdition(db, pattern.patternId, null);
  return {
    id: row.id,
    patternId: pattern.patternId,
    number: row.number,
    visibility: pattern.visibility,
    paper: pattern.paper,
    publishedAt: row.publishedAt,
    withdrawnReason: row.withdrawnReason,
    isWithdrawn: row.withdrawnAt !== null,
    currentNumber: current?.number ?? row.number,
    edition: project(row),
  };
}

/** For jobs: an edition as anybody sees it. @returns undefined where it is gone */
export async function readEditionForJob(db: Knex, id: string): Promise<PublicEdition | undefined> {
  const row = await findEditionById(db, id);
  return row && project(row);
}

/**
 * The recording behind a number in an edition.
 * @throws AppError not-found where the edition shows no clip of that number
 */
export async function recordingOf(db: Knex, seen: SeenEdition, number: number): Promise<string> {
  const shown = seen.edition.recordings.some((recording) => recording.number === number && recording.hasClip);
  const id = shown && !seen.isWithdrawn ? await findRecordingId(db, seen.patternId, number) : undefined;
  if (id === undefined) throw new AppError('not-found');
  return id;
}
