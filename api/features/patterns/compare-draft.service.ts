import type { Knex } from 'knex';
import { countPattern, type Draft, type LineCount, type LineInput, type Terms } from '#crochet';
import type { ComparedSide, LineDifference, PieceDifference, ReadingDifferences } from '#contract/readings';
import { AppError } from '../../http/problem.ts';
import { lastChangeIn } from './changes.store.ts';
import { GONE, planDraft, type DraftPlan, type PlannedLine, type PlannedPiece } from './draft-plan.ts';
import { findSource, listKnownLines, type KnownLine } from './draft.store.ts';
import type { Fields, Row } from './entities.ts';
import { findMovedMoments } from './follow-words.service.ts';
import type { PatternRow } from './patterns.store.ts';
import { listRows } from './rows.store.ts';

/** What of the differences a pattern's own desk tells; the recording's desk adds whose recording it is. */
export type PatternDifferences = Pick<ReadingDifferences, 'lastChange' | 'pieces' | 'gone' | 'moments'>;

type Counts = ReadonlyMap<string, LineCount>;
interface CountedPiece {
  readonly row: Fields;
  readonly lines: readonly LineInput[];
}

function countAll(pieces: readonly CountedPiece[], terms: Terms, sizes: readonly string[]): Counts {
  const input = pieces.map(({ row, lines }) => ({
    id: row.id as string,
    name: row.name as string,
    make: row.make as number,
    worked: row.worked as 'spiral' | 'joined' | 'rows',
    lines,
  }));
  const count = countPattern({ terms, sizes, pieces: input });
  return new Map(count.pieces.flatMap(({ lines }) => lines.map((line) => [line.id, line] as const)));
}

const inputOf = (line: Fields, id: string): LineInput => ({ written: null, said: null, ...line, id }) as LineInput;

/** A piece with every change of the plan in it, whoever wrote what was there. */
function merged(planned: PlannedPiece, standing: readonly KnownLine[]): LineInput[] {
  const out = standing.map((line) => inputOf(line, line.id));
  let at = 0;
  for (const { key, draft, line, fields } of planned.lines) {
    const place = line ? out.findIndex(({ id }) => id === line.id) : -1;
    if (place >= 0) {
      out[place] = inputOf({ ...line, ...fields }, line!.id);
      at = place + 1;
    } else if (!line) out.splice(at++, 0, inputOf({ ...draft }, key));
  }
  return out;
}

const sideOf = (line: Fields, count: LineCount | undefined): ComparedSide => ({
  label: line.label as string,
  kind: line.kind as ComparedSide['kind'],
  text: line.text as string,
  said: (line.said ?? null) as ComparedSide['said'],
  written: (count?.written ?? line.written ?? null) as ComparedSide['written'],
  count: count?.count ?? null,
  verdict: count?.verdict ?? 'no-total',
});

/** A planned line as a difference; null where it stands as it was heard. */
function differenceOf(
  { key, draft, line, fields, touched }: PlannedLine,
  is: Counts,
  would: Counts,
): LineDifference | null {
  const atMs = Math.round(draft.startMs);
  const base = { key, touched: touched.length > 0, atMs };
  if (!line) {
    return { ...base, change: 'new', lineId: null, is: null, would: sideOf({ ...draft }, would.get(key)) };
  }
  const heard = { ...line, ...fields };
  if (line.deletedAt) {
    return { ...base, touched: true, change: 'taken-away', lineId: line.id, is: null, would: sideOf(heard, undefined) };
  }
  if (Object.keys(fields).length === 0) return null;
  const [now, then] = [sideOf(line, is.get(line.id)), sideOf(heard, would.get(line.id))];
  return { ...base, change: 'changed', lineId: line.id, is: now, would: then };
}

function pieceDifference(planned: PlannedPiece, is: Counts, would: Counts): PieceDifference {
  const { index, piece, draft } = planned;
  const lines = planned.lines.flatMap((line) => differenceOf(line, is, would) ?? []);
  const { name, make, worked } = draft;
  return {
    index,
    name,
    make,
    worked,
    piece: piece ? { id: piece.id, name: piece.name as string, version: piece.version } : null,
    same: planned.lines.length - lines.length,
    lines,
  };
}

function tell(plan: DraftPlan, pieces: readonly Row[], lines: readonly KnownLine[], pattern: PatternRow) {
  const standing = lines.filter(({ deletedAt }) => !deletedAt);
  const linesOf = (piece: Pick<Row, 'id'>) => standing.filter((line) => line.pieceId === piece.id);
  const now = pieces.map((row) => ({ row, lines: linesOf(row).map((line) => inputOf(line, line.id)) }));
  const planOf = (row: Pick<Row, 'id'>) => plan.pieces.find(({ piece }) => piece?.id === row.id);
  const then = [
    ...now.map(({ row, lines: as }) => {
      const planned = planOf(row);
      return { row, lines: planned ? merged(planned, linesOf(row)) : as };
    }),
    ...plan.pieces
      .filter(({ piece }) => !piece)
      .map((planned) => ({ row: { ...planned.draft, id: `new.${planned.index}` }, lines: merged(planned, []) })),
  ];
  const is = countAll(now, pattern.terms, pattern.sizes);
  const would = countAll(then, pattern.terms, pattern.sizes);
  const gone = plan.gone.map((line) => ({
    key: GONE + line.id,
    change: 'gone' as const,
    lineId: line.id,
    touched: line.touched.length > 0,
    is: sideOf(line, is.get(line.id)),
    would: null,
    atMs: null,
    pieceName: (pieces.find(({ id }) => id === line.pieceId)?.name ?? '') as string,
  }));
  return { pieces: plan.pieces.map((planned) => pieceDifference(planned, is, would)), gone };
}

/** A moment that would move by less than this stays where it is, in milliseconds. */
const STILL_MS = 100;

/**
 * Holds a reading against a pattern, line by line: as it stands, as it would read, each counted among its neighbours.
 * Nothing is written. The caller has checked the right.
 * @returns undefined where there is no such reading
 */
export async function compareDraft(
  trx: Knex,
  pattern: PatternRow,
  readingId: string,
  draft: Draft,
): Promise<PatternDifferences | undefined> {
  const source = await findSource(trx, readingId);
  if (!source) return undefined;
  const lines = await listKnownLines(trx, pattern.id);
  const pieces = await listRows(trx, 'piece', pattern.id);
  const isEmpty = lines.every(({ deletedAt }) => deletedAt !== null);
  const terms = isEmpty ? draft.terms : pattern.terms;
  const plan = planDraft({ draft, recordingId: source.recordingId, terms, pieces, lines });
  const moments = (await findMovedMoments(trx, pattern.id, source))
    .filter(({ mark }) => mark.madeBy === 'person')
    .map(({ mark, startMs }) => ({
      markId: mark.id,
      lineId: mark.lineId as string | null,
      isMs: mark.startMs as number,
      wouldMs: startMs,
    }))
    .filter(({ isMs, wouldMs }) => wouldMs === null || Math.abs(wouldMs - isMs) >= STILL_MS);
  return {
    lastChange: await lastChangeIn(trx, pattern.id),
    ...tell(plan, pieces, lines, { ...pattern, terms }),
    moments,
  };
}

/**
 * Refuses to take what was told of a pattern that has changed since: it would not be what somebody saw.
 * @throws AppError stale-version
 */
export async function refuseIfChanged(trx: Knex, patternId: string, lastChange: number): Promise<void> {
  if ((await lastChangeIn(trx, patternId)) === lastChange) return;
  throw new AppError('stale-version', 'The pattern has changed meanwhile. Look at the differences again.');
}
