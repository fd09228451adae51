import type { Knex } from 'knex';
import { findShifts, lineLabel, shiftMoment, wordsOf, type Shifts, type Word } from '#crochet';
import type { CutTake, Followed, NewCut } from '#contract/held';
import type { Line, Mark } from '#contract/rows';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import { lastChangeIn } from './changes.store.ts';
import { refuseIfChanged } from './compare-draft.service.ts';
import { listHeardCues } from './cues.store.ts';
import { openPattern, writeFields, type Asking, type Deed } from './deed.service.ts';
import { findSeenPattern } from './document.service.ts';
import type { Row } from './entities.ts';
import type { OfRecording } from './held.service.ts';
import { findHeardRecording, listTranscriptsOf, type TranscriptOf } from './held.store.ts';
import { canEditPattern } from './patterns.policy.ts';
import { listRows } from './rows.store.ts';

type MarkRow = Row &
  Pick<Mark, 'lineId' | 'recordingId' | 'startMs' | 'endMs'> & { readonly transcriptId: string | null };

async function wordsIn(db: Knex, transcriptId: string): Promise<readonly Word[]> {
  const cues = await listHeardCues(db, transcriptId);
  return wordsOf(cues.map(({ startMs, endMs, heard, corrected }) => ({ startMs, endMs, text: corrected ?? heard })));
}

/** Moments that still stand by the words of an earlier transcript, and how that one lies in the newest. */
interface Part {
  readonly transcript: TranscriptOf;
  readonly shifts: Shifts;
  readonly marks: readonly MarkRow[];
}

interface Cut {
  readonly newest: TranscriptOf | null;
  readonly marks: readonly MarkRow[];
  readonly parts: readonly Part[];
}

/** A mark that was there before any transcript stands by the words of the first. */
async function findCut(db: Knex, of: OfRecording): Promise<Cut> {
  const transcripts = await listTranscriptsOf(db, of.recordingId);
  const newest = transcripts.at(-1) ?? null;
  const marks = ((await listRows(db, 'mark', of.patternId)) as MarkRow[]).filter(
    (mark) => mark.recordingId === of.recordingId,
  );
  const parts: Part[] = [];
  const after = newest && transcripts.length > 1 ? await wordsIn(db, newest.id) : [];
  for (const transcript of transcripts.slice(0, -1)) {
    const own = marks.filter((mark) => (mark.transcriptId ?? transcripts[0]!.id) === transcript.id);
    if (own.length === 0) continue;
    parts.push({ transcript, shifts: findShifts(await wordsIn(db, transcript.id), after), marks: own });
  }
  return { newest, marks, parts };
}

const nameOf = (line: Row | undefined): string => (line ? lineLabel(line as unknown as Line) : '');

/**
 * How the moments of a recording lie in its newest transcript: which part of it moved by how much, and what was cut out.
 * Nothing is written.
 * @throws AppError not-found, also where it may not be seen
 */
export async function readCut(db: Knex, who: Person, of: OfRecording): Promise<NewCut> {
  const pattern = await findSeenPattern(db, who, of.patternId);
  if (!(await findHeardRecording(db, of.patternId, of.recordingId))) throw new AppError('not-found');
  const lastChange = await lastChangeIn(db, of.patternId);
  const { newest, marks, parts } = await findCut(db, of);
  const lines = new Map((await listRows(db, 'line', of.patternId)).map((line) => [line.id, line]));
  return {
    recordingId: of.recordingId,
    moments: marks.length,
    lastMs: marks.at(-1)?.startMs ?? 0,
    newestFileName: newest?.fileName ?? null,
    newestTranscriptId: newest?.id ?? null,
    lastChange,
    mayTake: canEditPattern(who, pattern) && pattern.deletedAt === null,
    parts: parts.map(({ transcript, shifts, marks: own }) => ({
      transcriptId: transcript.id,
      fileName: transcript.fileName,
      found: shifts.found,
      shifts: shifts.kept.map((shift) => ({ ...shift })),
      moments: own.map(({ id, lineId, startMs }) => {
        const name = nameOf(lines.get(lineId ?? ''));
        return { markId: id, lineId, name, isMs: startMs, wouldMs: shiftMoment(shifts.kept, startMs) };
      }),
    })),
  };
}

const later = (ms: number, byMs: number) => Math.max(0, ms + byMs);

/** Moves a mark, its end along with it. @returns whether anything of it changed */
async function moveBy(trx: Knex.Transaction, deed: Deed, mark: MarkRow, byMs: number, by: TranscriptOf | null) {
  const endMs = mark.endMs === null ? null : later(mark.endMs, byMs);
  const fields = { startMs: later(mark.startMs, byMs), endMs, ...(by && { transcriptId: by.id }) };
  return (await writeFields(trx, deed, 'mark', mark, fields)) !== mark;
}

async function followTheWords(trx: Knex.Transaction, deed: Deed, { parts, newest }: Cut, removeCutOut: boolean) {
  let taken = 0;
  for (const { marks, shifts } of parts) {
    for (const mark of marks) {
      const to = shiftMoment(shifts.kept, mark.startMs);
      if (to !== null) taken += (await moveBy(trx, deed, mark, to - mark.startMs, newest)) ? 1 : 0;
      else if (removeCutOut) {
        await writeFields(trx, deed, 'mark', mark, { deletedAt: deed.at });
        taken += 1;
      }
    }
  }
  return taken;
}

/**
 * Takes the moments of a recording into its new cut: where their words went, by an offset given by hand, or as they
 * stand. One step for undo.
 * @throws AppError not-found | forbidden | gone | stale-version (the pattern has changed since this was told)
 */
export async function takeCut(db: Knex, asking: Asking, of: OfRecording, take: CutTake): Promise<Followed> {
  return db.transaction(async (trx) => {
    const { deed } = await openPattern(trx, asking, of.patternId, canEditPattern);
    if (!(await findHeardRecording(trx, of.patternId, of.recordingId))) throw new AppError('not-found');
    await refuseIfChanged(trx, of.patternId, take.lastChange);
    const cut = await findCut(trx, of);
    if (take.how === 'words') {
      return { deedId: deed.id, taken: await followTheWords(trx, deed, cut, take.removeCutOut) };
    }
    const [byMs, fromMs] = take.how === 'hand' ? [take.byMs, take.fromMs] : [0, 0];
    let taken = 0;
    for (const mark of cut.marks) {
      if (mark.startMs >= fromMs && (await moveBy(trx, deed, mark, byMs, cut.newest))) taken += 1;
    }
    return { deedId: deed.id, taken };
  });
}
