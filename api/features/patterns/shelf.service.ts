import type { Knex } from 'knex';
import { countPattern } from '#crochet';
import { toPatternInput, type Counted } from '#contract/pattern-input';
import type { Shelf, ShelfPart, ShelfPattern } from '#contract/shelf';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import { canManagePatterns, canSeePattern } from './patterns.policy.ts';
import { countAside, findStudio, listPatterns, type PatternRow } from './patterns.store.ts';
import { remember } from './remember.ts';
import { shelfFigures, shelfGroup } from './shelf-figures.ts';
import { readShelfContent, type ShelfContent, type ShelfLine } from './shelf.store.ts';

/** Counting is most of the shelf's work, and most patterns are as they were at the last look. */
const figuresOf = remember(
  ({
    counted,
    isFilmed,
  }: {
    readonly counted: Counted & { readonly lines: ShelfLine[] };
    readonly isFilmed: boolean;
  }) => shelfFigures(counted, countPattern(toPatternInput(counted)), isFilmed),
  1_000,
);

function toShelfPattern(
  pattern: PatternRow,
  content: ShelfContent,
  role: 'owner' | 'creator' | 'editor',
): ShelfPattern {
  const ofPattern = <T extends { readonly patternId: string }>(rows: readonly T[]) =>
    rows.filter(({ patternId }) => patternId === pattern.id);
  const pieces = ofPattern(content.pieces);
  const lines = ofPattern(content.lines).filter((line) => pieces.some(({ id }) => id === line.pieceId));
  const { terms, sizes } = pattern;
  const counted = { terms, sizes, pieces, lines, specialStitches: ofPattern(content.specials) };
  const figures = figuresOf({ counted, isFilmed: content.filmed.includes(pattern.id) });
  return {
    ...figures,
    id: pattern.id,
    code: pattern.code,
    title: pattern.title,
    state: pattern.state,
    group: shelfGroup({ state: pattern.state, needs: figures.needs }, role),
    pieces: pieces.map(({ name, make }) => ({ name, make })),
    edition: ofPattern(content.editions)[0]?.number ?? null,
    touchedAt: pattern.touchedAt.toISOString(),
    version: pattern.version,
  };
}

/**
 * A studio's shelf, its archive or its bin: every pattern with what its counts come to, last touched first.
 * @throws AppError not-found, also for a studio one is not a member of
 */
export async function readShelf(db: Knex, who: Person, asked: { studioId: string; part: ShelfPart }): Promise<Shelf> {
  const studio = await findStudio(db, asked.studioId);
  const role = who.memberships.find(({ studioId }) => studioId === asked.studioId)?.role;
  if (!studio || !role || !canSeePattern(who, asked)) throw new AppError('not-found');
  const patterns = await listPatterns(db, asked.studioId, asked.part);
  const content = await readShelfContent(
    db,
    patterns.map(({ id }) => id),
  );
  const mayManage = canManagePatterns(who, asked);
  return {
    studio: { id: studio.id, name: studio.name },
    part: asked.part,
    mayCreate: mayManage,
    mayManage,
    ...(await countAside(db, asked.studioId)),
    patterns: patterns.map((pattern) => toShelfPattern(pattern, content, role)),
  };
}
