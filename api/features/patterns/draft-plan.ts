import { matchLines, matchPieces, translate, type Draft, type DraftLine, type DraftPiece, type Terms } from '#crochet';
import { changedFields } from './deed.service.ts';
import type { KnownLine } from './draft.store.ts';
import type { Fields, Row } from './entities.ts';
import { placeWritten } from './written-total.ts';

/** A drafted line held against the pattern. */
export interface PlannedLine {
  /** Place in the draft, which never changes: "2.5". */
  readonly key: string;
  readonly draft: DraftLine;
  /** The line of the pattern that it is, if the pattern has it, or had it and somebody took it away. */
  readonly line: KnownLine | undefined;
  /** What it would write in that line, of what is not so already. */
  readonly fields: Fields;
  /** Those of them that a person wrote. */
  readonly touched: readonly string[];
}

export interface PlannedPiece {
  readonly index: number;
  readonly draft: DraftPiece;
  readonly piece: Row | undefined;
  readonly lines: readonly PlannedLine[];
}

/** A draft held against a pattern: what is new, what would change, and what the draft no longer has. */
export interface DraftPlan {
  readonly pieces: readonly PlannedPiece[];
  /** Lines that were heard in this recording and are not in the draft. */
  readonly gone: readonly KnownLine[];
}

export interface PlanOf {
  readonly draft: Draft;
  readonly recordingId: string;
  /** Terms in which the pattern is written. */
  readonly terms: Terms;
  /** Pieces that stand in the pattern. */
  readonly pieces: readonly Row[];
  readonly lines: readonly KnownLine[];
}

const inTerms = (line: DraftLine, from: Terms, to: Terms): DraftLine =>
  line.kind === 'step' ? line : { ...line, text: translate(line.text, from, to) };

const heardIn = (line: KnownLine, recordingId: string) => line.heard.some((one) => one.recordingId === recordingId);

/** A reading heard it here, and nothing else speaks for it. */
const isReadOnlyIn = ({ heard }: KnownLine, recordingId: string) =>
  heard.length === 1 && heard.every((one) => one.isRead && one.recordingId === recordingId);

/**
 * What a reading may say anew of a line: from the recording it was drafted from, all of it; of a line that was typed,
 * only what was said; from another recording nothing, that is only another moment.
 */
function fieldsToHear(line: KnownLine, draft: DraftLine, recordingId: string): Fields {
  const isDrafted = heardIn(line, recordingId);
  if (!isDrafted && line.heard.length > 0) return {};
  if (!isDrafted) return { said: draft.said };
  const { kind, from, to, label, said, text } = draft;
  return { kind, from, to, label, said, ...placeWritten({ kind, text }, line) };
}

function planLine(of: PlanOf, key: string, draft: DraftLine, line: KnownLine | undefined): PlannedLine {
  const fields = line ? changedFields(line, fieldsToHear(line, draft, of.recordingId)) : {};
  const touched = line ? Object.keys(fields).filter((field) => line.touched.includes(field)) : [];
  return { key, draft, line, fields, touched };
}

/** Holds a draft against a pattern. Pure: the same draft and pattern give the same plan. */
export function planDraft(of: PlanOf): DraftPlan {
  const { draft, recordingId, terms } = of;
  const known = of.lines.filter(({ isUnmade }) => !isUnmade);
  const standing = of.pieces.map((row) => ({
    row,
    name: row.name as string,
    lines: known.filter((line) => line.pieceId === row.id),
  }));
  const drafts = draft.pieces.map((piece) => ({
    ...piece,
    lines: piece.lines.map((line) => inTerms(line, draft.terms, terms)),
  }));
  const found = matchPieces(drafts, standing, ({ lines }) => lines.some((line) => heardIn(line, recordingId)));
  const met = new Set<string>();
  const pieces = drafts.map((piece, index): PlannedPiece => {
    const here = standing[found[index]!];
    const lines = here?.lines ?? [];
    const at = matchLines(piece.lines, lines);
    const planned = piece.lines.map((line, n) => {
      const present = lines[at[n]!];
      if (present) met.add(present.id);
      return planLine(of, `${index}.${n}`, line, present);
    });
    return { index, draft: piece, piece: here?.row, lines: planned };
  });
  const gone = standing
    .flatMap(({ lines }) => lines)
    .filter((line) => !line.deletedAt && !met.has(line.id) && isReadOnlyIn(line, recordingId));
  return { pieces, gone };
}

/** What of a draft is taken. Left out altogether: all that is new, and what no person has written. */
export interface DraftChoice {
  /** Only these pieces of the draft. */
  readonly pieces?: readonly number[] | undefined;
  /** Exactly these lines, by key, whoever wrote in them; lines that are no longer found by "gone." and their id. */
  readonly lines?: readonly string[] | undefined;
  /** Whether moments that a person set follow their words into another transcript; they do where it is not said. */
  readonly moments?: boolean | undefined;
  /** Materials and cautions; taken along where nothing was chosen. */
  readonly suggestions?: boolean | undefined;
}

export const GONE = 'gone.';

/** The fields of a planned line that are taken; null where the line is left out. */
export function fieldsTaken({ key, line, fields, touched }: PlannedLine, choice: DraftChoice): Fields | null {
  const isNamed = choice.lines?.includes(key);
  if (isNamed === true) return fields;
  if (isNamed === false) return null;
  if (line?.deletedAt) return null;
  return Object.fromEntries(Object.entries(fields).filter(([field]) => !touched.includes(field)));
}
