import {
  countPattern,
  heldAgainst,
  lineLabel,
  translate,
  type Draft,
  type DraftLine,
  type Held,
  type LineCount,
  type PatternInput,
  type SaidAt,
  type Totals,
} from '#crochet';
import { SPOKEN_ROLES, type HeldLine, type HeldPiece, type HeldSide } from '#contract/held';
import { toPatternInput } from '#contract/pattern-input';
import type { Pattern } from '#contract/patterns';
import type { Line } from '#contract/rows';

export type Content = Pick<
  Pattern,
  'terms' | 'sizes' | 'pieces' | 'lines' | 'specialStitches' | 'marks' | 'evidence' | 'recordings'
>;

const keyOf = ({ piece, line }: SaidAt) => `${piece}.${line}`;

function countAll(input: PatternInput): ReadonlyMap<string, LineCount> {
  return new Map(countPattern(input).pieces.flatMap(({ lines }) => lines.map((line) => [line.id, line] as const)));
}

/** A draft as the count reads it; its lines are named by their places. */
const inputOfDraft = (draft: Draft, content: Content): PatternInput => ({
  ...toPatternInput({ ...content, pieces: [], lines: [] }),
  terms: draft.terms,
  pieces: draft.pieces.map(({ name, make, worked, lines }, piece) => ({
    id: String(piece),
    name,
    make,
    worked,
    lines: lines.map(({ kind, label, from, to, text, said }, line) => {
      return { id: keyOf({ piece, line }), kind, label, from, to, text, said, written: null };
    }),
  })),
});

/** A pattern and a draft of one of its recordings, both counted, and how they were found in each other. */
export interface Holding {
  readonly content: Content;
  readonly draft: Draft;
  readonly held: Held;
  readonly written: ReadonlyMap<string, LineCount>;
  readonly said: ReadonlyMap<string, LineCount>;
  /** How each written line was found, by its id. */
  readonly found: ReadonlyMap<string, Held['lines'][number]>;
}

export function holdDraft(content: Content, draft: Draft): Holding {
  const written = countAll(toPatternInput(content));
  const said = countAll(inputOfDraft(draft, content));
  const held = heldAgainst({
    written: {
      terms: content.terms,
      pieces: content.pieces.map((piece) => ({
        ...piece,
        lines: content.lines
          .filter(({ pieceId }) => pieceId === piece.id)
          .map((line) => {
            const count = written.get(line.id);
            return { ...line, total: count?.written ?? line.written, work: count?.work ?? [] };
          }),
      })),
    },
    said: {
      terms: draft.terms,
      pieces: draft.pieces.map((piece, n) => ({
        ...piece,
        lines: piece.lines.map((line, i) => ({ ...line, work: said.get(keyOf({ piece: n, line: i }))?.work ?? [] })),
      })),
    },
  });
  return { content, draft, held, written, said, found: new Map(held.lines.map((line) => [line.lineId, line])) };
}

const sideOf = (text: string, total: Totals | null, count: LineCount | undefined): HeldSide => ({
  text,
  total: total && Object.fromEntries(Object.entries(total).map(([kind, figures]) => [kind, [...figures]])),
  count: count?.count ?? null,
  verdict: count?.verdict ?? 'no-total',
});

const lineAt = (draft: Draft, { piece, line }: SaidAt): DraftLine => draft.pieces[piece]!.lines[line]!;

function saidSide({ draft, content, said }: Holding, at: SaidAt): NonNullable<HeldLine['said']> {
  const line = lineAt(draft, at);
  const heard = line.evidence.filter(({ role }) => SPOKEN_ROLES.includes(role));
  const text = line.kind === 'step' ? line.text : translate(line.text, draft.terms, content.terms);
  return {
    ...sideOf(text, line.said, said.get(keyOf(at))),
    key: keyOf(at),
    name: lineLabel(line),
    atMs: Math.round(line.startMs),
    words: [...heard]
      .sort((a, b) => a.firstWord - b.firstWord)
      .map(({ words }) => words)
      .join(' '),
  };
}

function stateOf(line: Line, isSaid: boolean, unlike: readonly string[]): HeldLine['state'] {
  if (isSaid) return unlike.length > 0 ? 'differently' : 'as-written';
  return line.filmed ? 'never-said' : 'not-filmed';
}

/** What the tellings of one recording need besides. */
export interface Where {
  readonly recordingId: string;
  readonly transcriptId: string;
}

function writtenLine(holding: Holding, where: Where, line: Line): HeldLine {
  const { content, found, written } = holding;
  const { said, unlike } = found.get(line.id) ?? { said: [], unlike: [] };
  const count = written.get(line.id);
  const marks = content.marks.filter((mark) => mark.lineId === line.id && mark.recordingId === where.recordingId);
  return {
    lineId: line.id,
    version: line.version,
    kind: line.kind,
    name: lineLabel(line),
    state: stateOf(line, said.length > 0, unlike),
    unlike: [...unlike],
    written: sideOf(line.text, count?.written ?? line.written, count),
    said: said[0] ? saidSide(holding, said[0]) : null,
    markMs: marks[0]?.startMs ?? null,
    isTaken:
      marks.length > 0 &&
      content.evidence.some((one) => one.lineId === line.id && one.transcriptId === where.transcriptId),
  };
}

function unwrittenLine(holding: Holding, at: SaidAt): HeldLine {
  const line = lineAt(holding.draft, at);
  const base = { lineId: null, version: 0, written: null, markMs: null, isTaken: false };
  return {
    ...base,
    kind: line.kind,
    name: lineLabel(line),
    state: 'not-written',
    unlike: [],
    said: saidSide(holding, at),
  };
}

/** What is not written, each behind the written line that was said before it. */
function weave(lines: readonly HeldLine[], extra: readonly HeldLine[]): HeldLine[] {
  const placeOf = (one: HeldLine) => Number(one.said?.key.split('.')[1] ?? -1);
  const out = [...lines];
  for (const one of extra) {
    const before = out.findLastIndex((line) => line.said !== null && placeOf(line) < placeOf(one));
    out.splice(before + 1, 0, one);
  }
  return out;
}

/** Both ways, piece by piece in the order of the pattern; pieces that are not written come last. */
export function tellHeld(holding: Holding, where: Where): HeldPiece[] {
  const { content, draft, held } = holding;
  const extraOf = (n: number) =>
    held.unwritten.filter(({ piece }) => piece === n).map((at) => unwrittenLine(holding, at));
  const numbers = new Map(content.recordings.map(({ id, number }) => [id, number]));
  const written = content.pieces.map((piece): HeldPiece => {
    const n = held.pieces.indexOf(piece.id);
    const lines = content.lines.filter(({ pieceId }) => pieceId === piece.id);
    const ids = new Set<string | null>(lines.map(({ id }) => id));
    const own = lines.filter(({ kind }) => kind !== 'note').map((line) => writtenLine(holding, where, line));
    const seen = content.marks.filter(({ lineId }) => lineId !== null && ids.has(lineId));
    const saidName = draft.pieces[n]?.name ?? null;
    return {
      pieceId: piece.id,
      name: piece.name,
      make: piece.make,
      saidName: saidName === piece.name ? null : saidName,
      recordings: [...new Set(seen.flatMap(({ recordingId }) => numbers.get(recordingId) ?? []))].sort((a, b) => a - b),
      lines: n < 0 ? own : weave(own, extraOf(n)),
    };
  });
  const unwritten = draft.pieces.flatMap((piece, n): HeldPiece[] => {
    if (held.pieces[n] !== null) return [];
    return [{ pieceId: null, name: piece.name, make: piece.make, saidName: null, recordings: [], lines: extraOf(n) }];
  });
  return [...written, ...unwritten];
}
