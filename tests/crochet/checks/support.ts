import { type Check, type CheckKind, type CheckLine, type CheckPiece, checkPattern, type CheckSource } from '#crochet';

/** A line as one types it: "R5-8: sc around (24)" is a range, "Row 2: …" a row, "R9 on: …" an open one; all else a step. */
export function line(typed: string, more: Partial<CheckLine> = {}): CheckLine {
  const found = /^(R|Row )(\d+)(?:-(\d+))?( on)?: ?(.*)$/u.exec(typed);
  const from = found ? Number(found[2]) : null;
  return {
    id: typed,
    kind: found ? (found[1] === 'R' ? 'round' : 'row') : 'step',
    label: '',
    from,
    to: !found || found[4] ? null : Number(found[3] ?? found[2]),
    text: found?.[5] ?? typed,
    note: '',
    written: null,
    said: null,
    filmed: true,
    putAsideReason: null,
    ...more,
  };
}

export const piece = (
  name: string,
  lines: readonly (string | CheckLine)[],
  more: Partial<CheckPiece> = {},
): CheckPiece => ({
  id: name,
  name,
  make: 1,
  worked: 'spiral',
  lines: lines.map((one) => (typeof one === 'string' ? line(one) : one)),
  ...more,
});

/** A pattern with all that a sheet needs, so that only what a test puts in is found. */
export function source(pieces: readonly CheckPiece[], more: Partial<CheckSource> = {}): CheckSource {
  return {
    terms: 'US',
    sizes: [],
    title: 'Seed pear',
    pieces,
    details: { introduction: '', gauge: 'firm', finishedSize: '7 cm', level: 'easy', uses: [] },
    materials: [
      { kind: 'yarn', name: 'Cotton', details: { weight: 3 } },
      { kind: 'hook', name: 'Hook', details: { sizeMm: 3 } },
    ],
    notes: [],
    cautions: [],
    marks: [],
    recordings: [],
    ...more,
  };
}

/** The checks of one piece's lines, or of a whole source. */
export const checksOf = (of: CheckSource | readonly (string | CheckLine)[]): readonly Check[] =>
  checkPattern('pieces' in of ? of : source([piece('Body', of)])).checks;

/** "R4, R6 give their totals …" of every check of these kinds. */
export const saying = (of: Parameters<typeof checksOf>[0], ...kinds: CheckKind[]): string[] =>
  checksOf(of)
    .filter(({ kind }) => kinds.length === 0 || kinds.includes(kind))
    .map(({ refs, sentence }) => [refs.map(({ name }) => name).join(', '), sentence].filter(Boolean).join(' '));
