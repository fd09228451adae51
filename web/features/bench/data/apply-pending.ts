import type { Pattern } from '#contract/patterns';
import type { Fields, RowKind } from './bench-types.ts';
import { mergeFields, type Pending } from './pending.ts';
import { dropRow, findRow, localKey, putRow, type AnyRow } from './row-lists.ts';

/** What a row is until the server has answered its making. */
const DEFAULTS: Readonly<Record<RowKind, Fields>> = {
  piece: { make: 1, worked: 'spiral', startsOnLineId: null },
  line: {
    shortId: '',
    label: '',
    from: null,
    to: null,
    text: '',
    note: '',
    written: null,
    said: null,
    heardTotal: null,
    filmed: true,
    putAsideReason: null,
    spokenSlip: null,
  },
  mark: { lineId: null, endMs: null, title: null, madeBy: 'person', main: true },
  material: { details: {} },
  caution: { kind: 'own' },
  note: {},
  'special-stitch': { abbreviation: '' },
  'left-check': { subject: '' },
};

/** One mark of a line is its main one: where one becomes it, the other is it no longer. */
function keepOneMain(pattern: Pattern, mark: AnyRow): Pattern {
  if (mark.main !== true || typeof mark.lineId !== 'string') return pattern;
  const marks = pattern.marks.map((other) =>
    other.lineId === mark.lineId && other.id !== mark.id && other.main ? { ...other, main: false } : other,
  );
  return { ...pattern, marks };
}

function place(pattern: Pattern, kind: RowKind, row: AnyRow, fields: Fields): AnyRow {
  const { after, ...rest } = { ...row, ...fields } as AnyRow & { after?: string | null };
  const moves = 'after' in fields || row.orderKey === undefined || (kind === 'line' && row.pieceId !== rest.pieceId);
  if (kind === 'mark' || kind === 'left-check' || !moves) return rest;
  return { ...rest, orderKey: localKey(pattern, kind, rest, after) };
}

function applyOne(pattern: Pattern, { op, kind, id, fields }: Pending): Pattern {
  if (kind === 'pattern') return { ...pattern, ...(mergeFields(kind, pattern, fields) as Partial<Pattern>) };
  if (op === 'remove') return dropRow(pattern, kind, id);
  const present = findRow(pattern, kind, id);
  if (op === 'edit' && !present) return pattern;
  const given = op === 'create' && kind === 'mark' && fields.main === undefined ? withMain(pattern, fields) : fields;
  const row = place(pattern, kind, present ?? { ...DEFAULTS[kind], id, version: 0 }, given);
  const next = kind === 'mark' ? keepOneMain(pattern, row) : pattern;
  return putRow(next, kind, row);
}

const withMain = (pattern: Pattern, fields: Fields): Fields => ({
  ...fields,
  main: !pattern.marks.some((mark) => mark.main && mark.lineId !== null && mark.lineId === fields.lineId),
});

/** The pattern as it shows: the server's, with every change of one's own that is on the way in it. */
export function applyPending(pattern: Pattern, entries: readonly Pending[]): Pattern {
  return entries.reduce(applyOne, pattern);
}
