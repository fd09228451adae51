import type { Knex } from 'knex';
import type { Pattern } from '#contract/patterns';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import { joinCautions } from './cautions.service.ts';
import { lastChangeIn, listOwnDeeds } from './changes.store.ts';
import { listEvidence, listRecordings } from './document.store.ts';
import type { Row, RowEntity } from './entities.ts';
import { canEditPattern, canManagePatterns, canSeePattern } from './patterns.policy.ts';
import { toHead } from './patterns.service.ts';
import { findPattern, findStudio, type PatternRow } from './patterns.store.ts';
import { listRows } from './rows.store.ts';
import { undoStack } from './undo-stack.ts';

/** What a pattern holds, without anything about who asks. */
export type PatternContent = Omit<Pattern, 'me' | 'mayEdit' | 'mayManage' | 'mayUndo' | 'mayRedo'>;

/** Lines whose piece is still there, piece by piece; a piece that was taken away takes its lines along. */
function inOrder(pieces: readonly Row[], lines: readonly Row[]): Row[] {
  return pieces.flatMap((piece) => lines.filter((line) => line.pieceId === piece.id));
}

async function readContent(trx: Knex, pattern: PatternRow): Promise<PatternContent> {
  const read = (entity: RowEntity) => listRows(trx, entity, pattern.id);
  const lastChange = await lastChangeIn(trx, pattern.id);
  const pieces = await read('piece');
  const lines = inOrder(pieces, await read('line'));
  const here = new Set<unknown>([null, ...lines.map(({ id }) => id)]);
  const evidence = await listEvidence(trx, pattern.id);
  const materials = await read('material');
  const content = {
    ...toHead(pattern),
    studioName: (await findStudio(trx, pattern.studioId))?.name ?? '',
    lastChange,
    pieces,
    lines,
    marks: (await read('mark')).filter((mark) => here.has(mark.lineId)),
    evidence: evidence.filter(({ lineId }) => here.has(lineId)),
    recordings: await listRecordings(trx, pattern.id),
    materials,
    cautions: joinCautions({ pattern, materials, lines }, await read('caution')),
    notes: await read('note'),
    specialStitches: await read('special-stitch'),
    leftChecks: await read('left-check'),
  };
  return content as unknown as PatternContent;
}

/** All of it as of one moment, though it takes several queries. */
const atOneMoment = <T>(db: Knex, read: (trx: Knex.Transaction) => Promise<T>) =>
  db.transaction(read, { isolationLevel: 'repeatable read', readOnly: true });

/**
 * Everything a pattern holds, for the sheet, editions and jobs: no right is checked here.
 * @returns undefined where there is none
 */
export async function readPatternContent(db: Knex, patternId: string): Promise<PatternContent | undefined> {
  return atOneMoment(db, async (trx) => {
    const pattern = await findPattern(trx, patternId);
    return pattern && readContent(trx, pattern);
  });
}

/**
 * The bench document.
 * @throws AppError not-found, also where it may not be seen
 */
export async function readPattern(db: Knex, who: Person, patternId: string): Promise<Pattern> {
  return atOneMoment(db, async (trx) => {
    const pattern = await findPattern(trx, patternId);
    if (!pattern || !canSeePattern(who, pattern)) throw new AppError('not-found');
    const { undo, redo } = undoStack(await listOwnDeeds(trx, patternId, who.id));
    const isBinned = pattern.deletedAt !== null;
    return {
      ...(await readContent(trx, pattern)),
      me: { id: who.id, name: who.name },
      mayEdit: canEditPattern(who, pattern) && !isBinned,
      mayManage: canManagePatterns(who, pattern),
      mayUndo: undo !== null && !isBinned,
      mayRedo: redo !== null && !isBinned,
    };
  });
}

/**
 * Whether somebody may see a pattern, and write to it; for other desks that hang on one.
 * @throws AppError not-found, also where it may not be seen
 */
export async function findSeenPattern(
  db: Knex,
  who: Person,
  patternId: string,
): Promise<PatternRow & { mayEdit: boolean }> {
  const pattern = await findPattern(db, patternId);
  if (!pattern || !canSeePattern(who, pattern)) throw new AppError('not-found');
  return { ...pattern, mayEdit: canEditPattern(who, pattern) && pattern.deletedAt === null };
}
