import type { Pattern } from '../api/contract/patterns.ts';
import { readPattern } from '../api/features/patterns/document.service.ts';
import { createPattern, editPattern } from '../api/features/patterns/patterns.service.ts';
import { createRow, editRow, removeRow } from '../api/features/patterns/rows.service.ts';
import { readCues } from '../api/features/recordings/transcripts.service.ts';
import type { Person } from '../api/http/session.ts';
import type { Deps } from '../api/platform/deps.ts';
import { addSeedRecording } from './recordings.ts';
import { labelOf, type LineSpec, type PatternSpec, type PieceSpec } from './spec.ts';

export interface Hand {
  readonly who: Person;
  readonly now: Date;
}

type Line = Pattern['lines'][number];
type Piece = Pattern['pieces'][number];
type Fields = Readonly<Record<string, unknown>>;

/** Captions of the pattern's recordings, to find the moments of lines by. */
interface Heard {
  readonly recordingId: string;
  readonly startMs: number;
  readonly text: string;
}

async function captionsOf(deps: Deps, who: Person, pattern: Pattern): Promise<Heard[]> {
  const lists = await Promise.all(
    pattern.recordings.map(async ({ id, transcriptId }) => {
      const { cues } = transcriptId ? await readCues(deps.db, who, transcriptId) : { cues: [] };
      return cues.map(({ startMs, heard }) => ({ recordingId: id, startMs, text: heard }));
    }),
  );
  return lists.flat();
}

/** The drafted line that a wanted one is: by its numbers, and for steps by its moment. */
function matchOf(spec: LineSpec, free: readonly Line[], startOf: (line: Line) => number | undefined, at?: number) {
  const sameKind = free.filter((line) => line.kind === spec.kind);
  if (spec.from !== undefined) return sameKind.find((line) => line.from === spec.from);
  return sameKind.find((line) => at !== undefined && Math.abs((startOf(line) ?? -1e9) - at) < 4_000);
}

const fieldsOf = (spec: LineSpec) => ({
  kind: spec.kind,
  label: labelOf(spec),
  from: spec.from ?? null,
  to: spec.to ?? spec.from ?? null,
  text: spec.text,
  written: spec.total === undefined ? null : { sts: [spec.total] },
  note: spec.note ?? '',
  spokenSlip: spec.spokenSlip ?? null,
  putAsideReason: spec.putAsideReason ?? null,
});

/** Mends a piece line by line, as its creator does after a reading: what fits stays, what is missing is added. */
async function writeLines(
  deps: Deps,
  hand: Hand,
  { pattern, pieceId, heard }: { pattern: Pattern; pieceId: string; heard: readonly Heard[] },
  spec: PieceSpec,
) {
  const free = pattern.lines.filter((line) => line.pieceId === pieceId);
  const startOf = (line: Line) => pattern.marks.find((mark) => mark.lineId === line.id && mark.main)?.startMs;
  let after: string | null = null;
  for (const wanted of spec.lines) {
    const caption = wanted.heard === undefined ? undefined : heard.find(({ text }) => text.startsWith(wanted.heard!));
    if (wanted.heard !== undefined && !caption) throw new Error(`no caption begins with “${wanted.heard}”`);
    const found = matchOf(wanted, free, startOf, caption?.startMs);
    const id: string = found
      ? await mend(found, wanted, after)
      : (await createRow(deps.db, hand, pattern.id, 'line', { pieceId, ...fieldsOf(wanted), after })).row.id;
    if (found) free.splice(free.indexOf(found), 1);
    if (caption && (!found || startOf(found) === undefined)) {
      const { recordingId, startMs } = caption;
      await createRow(deps.db, hand, pattern.id, 'mark', { lineId: id, recordingId, startMs, main: true });
    }
    after = id;
  }
  for (const { id, version } of free) await removeRow(deps.db, hand, 'line', { id, version });

  async function mend(line: Line, wanted: LineSpec, behind: string | null): Promise<string> {
    const asked = { ...fieldsOf(wanted), after: behind };
    const { row } = await editRow(deps.db, hand, 'line', { id: line.id, version: line.version }, asked);
    return row.id;
  }
}

async function writePieces(deps: Deps, hand: Hand, patternId: string, specs: readonly PieceSpec[]): Promise<void> {
  const pattern = await readPattern(deps.db, hand.who, patternId);
  const heard = await captionsOf(deps, hand.who, pattern);
  let after: string | null = null;
  for (const [i, spec] of specs.entries()) {
    const { name, make, worked } = spec;
    const found: Piece | undefined = pattern.pieces[i];
    const at = found && { id: found.id, version: found.version };
    const { row }: { row: Fields } = at
      ? await editRow(deps.db, hand, 'piece', at, { name, make, worked })
      : await createRow(deps.db, hand, patternId, 'piece', { name, make, worked, after });
    const pieceId = row.id as string;
    await writeLines(deps, hand, { pattern, pieceId, heard }, spec);
    after = pieceId;
  }
  for (const { id } of pattern.pieces.slice(specs.length)) {
    for (const line of pattern.lines.filter((one) => one.pieceId === id)) {
      await removeRow(deps.db, hand, 'line', { id: line.id, version: line.version });
    }
    const { version } = pattern.pieces.find((one) => one.id === id)!;
    await removeRow(deps.db, hand, 'piece', { id, version });
  }
}

/** Says again what is said of the piece: materials, notes and details. */
async function writeAbout(deps: Deps, hand: Hand, spec: PatternSpec): Promise<void> {
  const { db } = deps;
  const { materials, notes } = await readPattern(db, hand.who, spec.id);
  for (const { id, version } of materials) await removeRow(db, hand, 'material', { id, version });
  for (const { id, version } of notes) await removeRow(db, hand, 'note', { id, version });
  for (const material of spec.materials) await createRow(db, hand, spec.id, 'material', material);
  for (const text of spec.notes) await createRow(db, hand, spec.id, 'note', { text });
  const { version } = await readPattern(db, hand.who, spec.id);
  await editPattern(db, hand, { id: spec.id, version }, { details: spec.details });
}

/** Makes a pattern from its recordings, if it has any, and mends it into what the demo wants to show. */
export async function writePattern(deps: Deps, hand: Hand, studioId: string, spec: PatternSpec): Promise<void> {
  await createPattern(deps.db, hand, { id: spec.id, studioId, title: spec.title, terms: 'US' });
  for (const recording of spec.recordings ?? []) await addSeedRecording(deps, hand, spec.id, recording);
  await writePieces(deps, hand, spec.id, spec.pieces);
  await writeAbout(deps, hand, spec);
}

/** A line of a pattern by its piece and label, as it stands now. */
export async function lineOf(deps: Deps, who: Person, patternId: string, pieceName: string, label: string) {
  const { pieces, lines } = await readPattern(deps.db, who, patternId);
  const piece = pieces.find((one) => one.name === pieceName);
  const line = lines.find((one) => one.pieceId === piece?.id && one.label === label);
  if (!line) throw new Error(`there is no ${label} of ${pieceName}`);
  return line;
}

/** Writes a line anew, as somebody does at the bench. */
export async function rewrite(
  deps: Deps,
  hand: Hand,
  patternId: string,
  at: readonly [piece: string, label: string],
  fields: Fields,
): Promise<void> {
  const { id, version } = await lineOf(deps, hand.who, patternId, ...at);
  await editRow(deps.db, hand, 'line', { id, version }, fields);
}
