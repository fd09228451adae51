import type { Knex } from 'knex';
import { broughtCautions, type BroughtCaution } from '#crochet';
import type { Caution } from '#contract/pattern-details';
import { AppError } from '../../http/problem.ts';
import type { Fields, Row } from './entities.ts';
import { findPattern, type PatternRow } from './patterns.store.ts';
import { refuseField } from './row-checks.ts';
import { listRows } from './rows.store.ts';

interface Sources {
  readonly pattern: Pick<PatternRow, 'details'>;
  readonly materials: readonly Row[];
  readonly lines: readonly Row[];
}

const asText = (value: unknown) => (typeof value === 'string' ? value : '');

/** What the pattern's materials, words and use bring by themselves. */
function broughtIn({ pattern, materials, lines }: Sources): BroughtCaution[] {
  return broughtCautions({
    materials: materials.map((row) => ({ name: asText(row.name) })),
    lines: lines.map((row) => ({
      label: asText(row.label) || 'a step',
      text: `${asText(row.text)}\n${asText(row.note)}`,
    })),
    uses: pattern.details.uses ?? [],
  });
}

/** The cautions as printed: those that something brings first, in the creator's words where there are some. */
export function joinCautions(sources: Sources, rows: readonly Row[]): Caution[] {
  const asCaution = (row: Row, broughtBy: readonly string[]) => ({ ...row, broughtBy }) as unknown as Caution;
  const brought = broughtIn(sources);
  const kinds = new Set<string>(brought.map(({ kind }) => kind));
  return [
    ...brought.map(({ kind, text, broughtBy }): Caution => {
      const row = rows.find((one) => one.kind === kind);
      if (row) return asCaution(row, broughtBy);
      return { id: null, orderKey: null, kind, text, broughtBy: [...broughtBy], version: null };
    }),
    ...rows.filter((row) => !kinds.has(asText(row.kind))).map((row) => asCaution(row, [])),
  ];
}

async function readSources(trx: Knex, patternId: string): Promise<Sources> {
  const pattern = (await findPattern(trx, patternId))!;
  const materials = await listRows(trx, 'material', patternId);
  return { pattern, materials, lines: await listRows(trx, 'line', patternId) };
}

/**
 * One wording a kind; only the creator's own may stand any number of times.
 * @throws AppError conflict
 */
export async function fitCaution(trx: Knex, patternId: string, fields: Fields, row?: Row): Promise<void> {
  if (fields.kind === undefined || fields.kind === 'own') return;
  const rows = await listRows(trx, 'caution', patternId);
  if (rows.some((other) => other.kind === fields.kind && other.id !== row?.id)) {
    refuseField('kind', 'This caution has its wording already. Change that one.');
  }
}

/** @throws AppError forbidden for a caution that is still brought by something: it can be put otherwise, not left out */
export async function checkRemoval(trx: Knex, row: Row): Promise<void> {
  const cause = broughtIn(await readSources(trx, row.patternId)).find(({ kind }) => kind === row.kind);
  if (!cause) return;
  const by = cause.broughtBy.join(', ');
  throw new AppError('forbidden', `This caution comes with ${by}. It can be put in other words; it goes when they go.`);
}
