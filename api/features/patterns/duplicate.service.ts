import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { PatternHead } from '#contract/patterns';
import { openPattern, record, type Asking, type Deed } from './deed.service.ts';
import { TABLES, type Fields, type RowEntity } from './entities.ts';
import { canManagePatterns } from './patterns.policy.ts';
import { insertWithCode, toHead } from './patterns.service.ts';
import { findPattern } from './patterns.store.ts';
import { insertRows, listRows } from './rows.store.ts';

/** In the order in which they may point at one another. */
const COPIED: readonly RowEntity[] = ['piece', 'line', 'mark', 'material', 'caution', 'note', 'special-stitch'];
/** Fields that name another row of the same pattern. */
const POINTERS = ['pieceId', 'lineId'] as const;

async function copyRecordings(trx: Knex.Transaction, from: string, to: string): Promise<void> {
  await trx.raw(
    `insert into pattern_recordings (pattern_id, number, recording_id, order_key, removed_at)
     select ?, number, recording_id, order_key, removed_at from pattern_recordings where pattern_id = ?`,
    [to, from],
  );
}

/** Evidence goes along, so that the copy's lines can still be heard. */
async function copyEvidence(trx: Knex.Transaction, ids: ReadonlyMap<string, string>): Promise<void> {
  const lines = [...ids.keys()];
  const rows = await trx('line_evidence').whereIn('line_id', lines).select<Record<string, unknown>[]>('*');
  const copies = rows.map((row) => ({ ...row, id: randomUUID(), line_id: ids.get(row.line_id as string) }));
  if (copies.length > 0) await trx.batchInsert('line_evidence', copies, 500);
}

async function copyRows(trx: Knex.Transaction, deed: Deed, from: string): Promise<void> {
  const ids = new Map<string, string>();
  const startsOn: [pieceId: string, lineId: string][] = [];
  for (const entity of COPIED) {
    const rows = (await listRows(trx, entity, from)).flatMap((row): Fields[] => {
      const id = randomUUID();
      const fields: Record<string, unknown> = Object.fromEntries(
        Object.keys(TABLES[entity].columns).map((field) => [field, row[field]]),
      );
      for (const pointer of POINTERS) {
        const old = fields[pointer];
        if (typeof old !== 'string') continue;
        // What stood in a piece or at a line that was taken away stays behind with it.
        if (!ids.has(old)) return [];
        fields[pointer] = ids.get(old);
      }
      ids.set(row.id, id);
      if (typeof fields.startsOnLineId === 'string') startsOn.push([id, fields.startsOnLineId]);
      return [{ ...fields, id, ...(entity === 'piece' && { startsOnLineId: null }) }];
    });
    await insertRows(trx, entity, deed.patternId, rows);
    await record(
      trx,
      deed,
      rows.map(({ id, ...after }) => ({ entity, entityId: id as string, before: null, after })),
    );
  }
  for (const [pieceId, lineId] of startsOn) {
    await trx('pieces')
      .where({ id: pieceId })
      .update({ starts_on_line_id: ids.get(lineId) ?? null });
  }
  await copyEvidence(trx, ids);
}

/** "Harvest mouse, copy". */
const copyTitle = (title: string) => `${title.slice(0, 190)}, copy`;

/**
 * Doubles a pattern: lines, marks, recordings and all; the copy drafts under a code of its own, without a past.
 * @throws AppError not-found | forbidden | gone
 */
export async function duplicatePattern(db: Knex, asking: Asking, patternId: string): Promise<PatternHead> {
  return db.transaction(async (trx) => {
    const { pattern, deed: opened } = await openPattern(trx, asking, patternId, canManagePatterns);
    const id = randomUUID();
    const title = copyTitle(pattern.title);
    const by = { personId: asking.who.id, at: asking.now };
    await insertWithCode(trx, { ...pattern, id, title }, by);
    const deed: Deed = { ...opened, patternId: id };
    const { terms, sizes, details } = pattern;
    await record(trx, deed, [
      {
        entity: 'lifecycle',
        entityId: id,
        before: null,
        after: { title, terms, sizes, details, copiedFrom: pattern.id },
      },
    ]);
    await copyRecordings(trx, patternId, id);
    await copyRows(trx, deed, patternId);
    return toHead((await findPattern(trx, id))!);
  });
}
