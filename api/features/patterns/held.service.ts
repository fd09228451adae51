import type { Knex } from 'knex';
import type { Followed, HeldAgainst, HeldTake } from '#contract/held';
import { AppError } from '../../http/problem.ts';
import type { Person } from '../../http/session.ts';
import { refuseIfChanged } from './compare-draft.service.ts';
import { openPattern, type Asking } from './deed.service.ts';
import { findSeenPattern, readPatternContent, type PatternContent } from './document.service.ts';
import { hearAgain } from './draft-again.ts';
import { listKnownLines, type KnownLine } from './draft.store.ts';
import type { Fields } from './entities.ts';
import { findHeardRecording, type HeardRecording } from './held.store.ts';
import { holdDraft, tellHeld, type Holding } from './hold-draft.ts';
import { canEditPattern } from './patterns.policy.ts';

export interface OfRecording {
  readonly patternId: string;
  readonly recordingId: string;
}

/** @throws AppError not-found, also where it may not be seen */
async function findHeard(db: Knex, who: Person, of: OfRecording) {
  const pattern = await findSeenPattern(db, who, of.patternId);
  const heard = await findHeardRecording(db, of.patternId, of.recordingId);
  const content = await readPatternContent(db, of.patternId);
  if (!heard || !content) throw new AppError('not-found');
  return { pattern, heard, content };
}

function hold(heard: HeardRecording, content: PatternContent): (Holding & { readonly transcriptId: string }) | null {
  if (!heard.draft || !heard.transcriptId) return null;
  return { ...holdDraft(content, heard.draft), transcriptId: heard.transcriptId };
}

/**
 * A written pattern held against what was last read of one of its recordings, both ways.
 * @throws AppError not-found, also where it may not be seen
 */
export async function readHeld(db: Knex, who: Person, of: OfRecording): Promise<HeldAgainst> {
  const { pattern, heard, content } = await findHeard(db, who, of);
  const holding = hold(heard, content);
  return {
    recordingId: of.recordingId,
    readingId: heard.readingId,
    terms: content.terms,
    spokenTerms: heard.draft?.terms ?? null,
    lastChange: content.lastChange,
    mayTake: canEditPattern(who, pattern) && pattern.deletedAt === null,
    pieces: holding ? tellHeld(holding, { ...of, transcriptId: holding.transcriptId }) : [],
  };
}

/** What was said stands beside what is written, unless a person has set it. */
const saidOf = (line: KnownLine, said: unknown): Fields => (line.touched.includes('said') ? {} : { said });

/**
 * Gives written lines their moments in a recording, the words they were said in and the totals that were said: these
 * lines, or all that were found. Nothing that is written changes. One step for undo.
 * @throws AppError not-found | forbidden | gone | stale-version (the pattern has changed since this was told) |
 *   conflict (nothing of the recording has been read)
 */
export async function takeHeld(db: Knex, asking: Asking, of: OfRecording, take: HeldTake): Promise<Followed> {
  const { heard, content } = await findHeard(db, asking.who, of);
  const holding = hold(heard, content);
  if (!holding) throw new AppError('conflict', 'Nothing of this recording has been read yet.');
  const asked = take.lineIds && new Set(take.lineIds);
  return db.transaction(async (trx) => {
    const { deed } = await openPattern(trx, asking, of.patternId, canEditPattern);
    await refuseIfChanged(trx, of.patternId, take.lastChange);
    const { transcriptId, draft } = holding;
    const source = { readingId: heard.readingId, transcriptId, recordingId: of.recordingId };
    const known = new Map((await listKnownLines(trx, of.patternId)).map((line) => [line.id, line]));
    let taken = 0;
    for (const { lineId, said } of holding.held.lines) {
      const line = known.get(lineId);
      const [first] = said;
      if (!line || !first || (asked && !asked.has(lineId))) continue;
      const drafted = said.map((at) => draft.pieces[at.piece]!.lines[at.line]!);
      const [one] = drafted;
      const evidence = drafted.flatMap((each) => each.evidence);
      await hearAgain(trx, deed, source, line, { draft: { ...one!, evidence }, fields: saidOf(line, one!.said) });
      taken += 1;
    }
    return { deedId: deed.id, taken };
  });
}
