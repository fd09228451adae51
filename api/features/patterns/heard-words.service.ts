import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { countPattern, readStretch, type DraftLine, type LineInput, type StretchReading } from '#crochet';
import type { HeardWords, WordsUsed } from '#contract/readings';
import { AppError } from '../../http/problem.ts';
import { findSpokenIn, listHeardCues, type SpokenIn } from './cues.store.ts';
import { openPattern, record, writeFields, type Asking, type Deed } from './deed.service.ts';
import { hearAgain, moveMark } from './draft-again.ts';
import { insertEvidence, listKnownLines, newHearing, type KnownLine, type SourceOfDraft } from './draft.store.ts';
import type { Fields, Row, RowEntity } from './entities.ts';
import { newShortIds } from './ids.ts';
import { placeManyAfter } from './order.ts';
import { canEditPattern } from './patterns.policy.ts';
import type { PatternRow } from './patterns.store.ts';
import { insertRows, listRows, takenShortIds, touchFields } from './rows.store.ts';
import { placeWritten } from './written-total.ts';

/** Everything that words are used on. */
interface Desk {
  readonly trx: Knex.Transaction;
  readonly deed: Deed;
  readonly pattern: PatternRow;
  readonly source: SourceOfDraft;
  readonly pieces: readonly Row[];
  /** Lines that stand, piece by piece in order. */
  readonly lines: readonly KnownLine[];
}

/** Where a new line goes: its piece, and the line before it there. */
interface Place {
  readonly piece: Row | undefined;
  readonly after: KnownLine | undefined;
}

/** Behind the last line whose moment in this recording comes before the words; else before all others. */
async function placeAt({ trx, source, pieces, lines }: Desk, atMs: number): Promise<Place> {
  const marks = await trx('marks')
    .where({ recording_id: source.recordingId, main: true })
    .whereNull('deleted_at')
    .where('start_ms', '<=', atMs)
    .whereIn(
      'line_id',
      lines.map(({ id }) => id),
    )
    .orderBy('start_ms', 'desc')
    .select<{ line_id: string; start_ms: number }[]>('line_id', 'start_ms');
  const latest = marks.filter(({ start_ms }) => start_ms === marks[0]?.start_ms).map(({ line_id }) => line_id);
  const after = lines.findLast(({ id }) => latest.includes(id));
  return { piece: pieces.find(({ id }) => id === after?.pieceId) ?? pieces[0], after };
}

const isCounted = ({ kind }: { readonly kind: string }) => kind === 'round' || kind === 'row';

/** Places that the last round or row up to a line leaves; null where there is none or it cannot be counted. */
function placesBefore({ pattern, lines }: Desk, piece: Row | undefined, upTo: KnownLine | undefined): number | null {
  if (!piece || !upTo) return null;
  const own = lines.filter((line) => line.pieceId === piece.id);
  const before = own.slice(0, own.findIndex(({ id }) => id === upTo.id) + 1);
  const worked = piece.worked as 'spiral' | 'joined' | 'rows';
  const count = countPattern({
    terms: pattern.terms,
    sizes: pattern.sizes,
    pieces: [{ id: piece.id, name: '', make: 1, worked, lines: before as unknown as readonly LineInput[] }],
  });
  const last = before.findLast(isCounted);
  return count.pieces[0]?.lines.find(({ id }) => id === last?.id)?.count ?? null;
}

const unitOf = (piece: Row | undefined) => (piece?.worked === 'rows' ? 'row' : 'round');

/** The line before in its piece. */
function lineBefore({ lines }: Desk, line: KnownLine): KnownLine | undefined {
  const own = lines.filter(({ pieceId }) => pieceId === line.pieceId);
  return own[own.findIndex(({ id }) => id === line.id) - 1];
}

const evidenceOf = (
  read: StretchReading,
  { firstWord, lastWord }: HeardWords,
  role: DraftLine['evidence'][number]['role'],
): DraftLine['evidence'] => [
  { role, firstWord, lastWord, startMs: read.startMs, endMs: read.endMs, words: read.words },
];

async function insertLogged({ trx, deed }: Desk, entity: RowEntity, { id, ...after }: Fields): Promise<string> {
  await insertRows(trx, entity, deed.patternId, [{ id, ...after }]);
  await record(trx, deed, [{ entity, entityId: id as string, before: null, after }]);
  return id as string;
}

async function ensurePiece(desk: Desk, piece: Row | undefined): Promise<string> {
  if (piece) return piece.id;
  const [orderKey] = await placeManyAfter(desk.trx, { entity: 'piece', within: desk.deed.patternId }, undefined, 1);
  const fields = { name: 'Piece 1', make: 1, worked: 'spiral', orderKey };
  return insertLogged(desk, 'piece', { id: randomUUID(), ...fields });
}

/** Numbers that the words name, else one on from the numbered line before. */
function numbersFor(desk: Desk, place: Place, read: StretchReading): { from: number; to: number } {
  if (read.from !== null) return { from: read.from, to: read.to ?? read.from };
  const own = desk.lines.filter((line) => line.pieceId === place.piece?.id);
  const before = own.slice(0, own.findIndex(({ id }) => id === place.after?.id) + 1);
  const n = (before.findLast((line) => isCounted(line) && line.to !== null)?.to ?? 0) + 1;
  return { from: n, to: n };
}

const labelOf = (unit: 'round' | 'row', { from, to }: { from: number; to: number }) =>
  (unit === 'row' ? (from === to ? 'Row ' : 'Rows ') : 'R') + (from === to ? String(from) : `${from}–${to}`);

const totalOf = (read: StretchReading) => (read.said === null ? null : { sts: [read.said] });

async function addLine(desk: Desk, words: HeardWords, read: StretchReading, place: Place): Promise<WordsUsed> {
  const unit = unitOf(place.piece);
  const numbers = numbersFor(desk, place, read);
  const as = words.as;
  const text = as === 'line' ? read.text || read.words : as === 'step' ? read.step : read.words;
  const row: Fields =
    as === 'line'
      ? { kind: unit, ...numbers, label: labelOf(unit, numbers), text, said: totalOf(read), heardTotal: totalOf(read) }
      : { kind: as, from: null, to: null, label: '', text };
  const pieceId = await ensurePiece(desk, place.piece);
  const { trx, source } = desk;
  const [orderKey] = await placeManyAfter(trx, { entity: 'line', within: pieceId }, place.after?.id ?? null, 1);
  const [shortId] = newShortIds(await takenShortIds(trx, desk.deed.patternId), 1);
  const evidence = evidenceOf(read, words, 'work');
  const hearings = newHearing(evidence);
  const id = randomUUID();
  await insertLogged(desk, 'line', { id, pieceId, orderKey, shortId, hearings, ...row, ...placeWritten(row) });
  await insertEvidence(trx, source, [{ lineId: id, hearingId: hearings[0]!, evidence }]);
  await moveMark(trx, desk.deed, source, id, read.startMs);
  return { as, id, text };
}

/** The open line's words are these from now on; what they say is what it reads. */
async function readAgainAs(desk: Desk, words: HeardWords, read: StretchReading, line: KnownLine): Promise<WordsUsed> {
  const { trx, deed, source } = desk;
  const text = isCounted(line) || line.kind === 'foundation' ? read.text || read.words : read.step;
  const said = read.said === null ? {} : { said: totalOf(read) };
  const fields = { ...placeWritten({ text }, line), ...said };
  const draft = { said: totalOf(read), startMs: read.startMs, evidence: evidenceOf(read, words, 'work') };
  await hearAgain(trx, deed, source, line, { draft, fields });
  await touchFields(trx, line.id, Object.keys(fields), deed.at);
  return { as: words.as, id: line.id, text };
}

/** Adds words to those a line was heard in, as its total. */
async function giveTotal(desk: Desk, words: HeardWords, read: StretchReading, line: KnownLine): Promise<WordsUsed> {
  const said = totalOf(read);
  if (said === null) throw new AppError('invalid', 'No total was found in these words.');
  const evidence = evidenceOf(read, words, 'total');
  const hearings = newHearing(evidence);
  const all = [...line.heard.map(({ id }) => id), ...hearings];
  await writeFields(desk.trx, desk.deed, 'line', line, { said, hearings: all });
  await insertEvidence(desk.trx, desk.source, [{ lineId: line.id, hearingId: hearings[0]!, evidence }]);
  await touchFields(desk.trx, line.id, ['said'], desk.deed.at);
  return { as: words.as, id: line.id, text: String(read.said) };
}

async function addMaterial(desk: Desk, words: HeardWords, read: StretchReading): Promise<WordsUsed> {
  const { trx, deed } = desk;
  const [orderKey] = await placeManyAfter(trx, { entity: 'material', within: deed.patternId }, undefined, 1);
  const name = read.step.replace(/\.$/u, '').slice(0, 200);
  const details = { heard: read.words.slice(0, 500), heardAtMs: read.startMs };
  const id = await insertLogged(desk, 'material', { id: randomUUID(), kind: read.material, name, details, orderKey });
  return { as: words.as, id, text: name };
}

async function readWords(desk: Desk, spoken: SpokenIn, words: HeardWords, line: KnownLine | undefined) {
  const cues = await listHeardCues(desk.trx, words.transcriptId);
  const setting = {
    firstWord: words.firstWord,
    lastWord: words.lastWord,
    written: desk.pattern.terms,
    ...(spoken.spokenTerms && { spoken: spoken.spokenTerms }),
  };
  const first = readStretch(cues, { ...setting, unit: 'round', base: null });
  if (!first) throw new AppError('invalid', 'This transcript has no such words.');
  const place = await placeAt(desk, first.startMs);
  const piece = line ? desk.pieces.find(({ id }) => id === line.pieceId) : place.piece;
  const base = placesBefore(desk, piece, line ? lineBefore(desk, line) : place.after);
  return { place, read: readStretch(cues, { ...setting, unit: unitOf(piece), base }) ?? first };
}

/**
 * Makes of words that somebody chose in a transcript what they say they are: a line at its place in time, another reading
 * of a line, its total, a step, a note, a material. One step for undo.
 * @throws AppError not-found | forbidden | gone | invalid (no such words or line; no total in them)
 */
export async function takeHeardWords(
  db: Knex,
  asking: Asking,
  patternId: string,
  words: HeardWords,
): Promise<{ used: WordsUsed; deedId: string }> {
  return db.transaction(async (trx) => {
    const { pattern, deed } = await openPattern(trx, asking, patternId, canEditPattern);
    const spoken = await findSpokenIn(trx, patternId, words.transcriptId);
    if (!spoken) throw new AppError('invalid', 'This transcript is of no recording in the pattern.');
    const source = { readingId: null, transcriptId: words.transcriptId, recordingId: spoken.recordingId };
    const pieces = await listRows(trx, 'piece', patternId);
    const known = (await listKnownLines(trx, patternId)).filter(({ deletedAt }) => !deletedAt);
    const lines = pieces.flatMap(({ id }) => known.filter((line) => line.pieceId === id));
    const desk: Desk = { trx, deed, pattern, source, pieces, lines };
    const line = lines.find(({ id }) => id === words.lineId);
    if (words.lineId !== undefined && !line) throw new AppError('invalid', 'The line is not in this pattern any more.');
    const { place, read } = await readWords(desk, spoken, words, line);
    const used =
      words.as === 'material'
        ? await addMaterial(desk, words, read)
        : words.as === 'again'
          ? await readAgainAs(desk, words, read, line!)
          : words.as === 'total'
            ? await giveTotal(desk, words, read, line!)
            : await addLine(desk, words, read, place);
    return { used, deedId: deed.id };
  });
}
