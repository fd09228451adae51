import { generateKeyBetween } from 'fractional-indexing';
import type { Pattern } from '#contract/patterns';
import type { Fields, RowKind } from './bench-types.ts';

/** Where each kind of row stands in the bench document. */
export const LISTS = {
  piece: 'pieces',
  line: 'lines',
  mark: 'marks',
  material: 'materials',
  caution: 'cautions',
  note: 'notes',
  'special-stitch': 'specialStitches',
  'left-check': 'leftChecks',
} as const satisfies Readonly<Record<RowKind, keyof Pattern>>;

export type AnyRow = Fields & { readonly id: string; readonly version: number };

export const listOf = (pattern: Pattern, kind: RowKind): readonly AnyRow[] =>
  pattern[LISTS[kind]] as unknown as readonly AnyRow[];

export const findRow = (pattern: Pattern, kind: RowKind, id: string): AnyRow | undefined =>
  listOf(pattern, kind).find((row) => row.id === id);

const text = (value: unknown) => (typeof value === 'string' ? value : '');
const byKey = (a: AnyRow, b: AnyRow) => {
  const [x, y] = [text(a.orderKey) || text(a.id), text(b.orderKey) || text(b.id)];
  return x < y ? -1 : x > y ? 1 : text(a.id) < text(b.id) ? -1 : 1;
};

/** The list in its order; the server orders it the same way. */
function sorted(pattern: Pattern, kind: RowKind, rows: readonly AnyRow[]): readonly AnyRow[] {
  if (kind === 'mark') return rows.toSorted((a, b) => Number(a.startMs) - Number(b.startMs));
  // Cautions that something brings come first, in an order of their own.
  if (kind === 'caution') return rows;
  const inOrder = rows.toSorted(byKey);
  return kind === 'line' ? pattern.pieces.flatMap(({ id }) => inOrder.filter((row) => row.pieceId === id)) : inOrder;
}

export function withRows(pattern: Pattern, kind: RowKind, rows: readonly AnyRow[]): Pattern {
  const next = { ...pattern, [LISTS[kind]]: sorted(pattern, kind, rows) };
  return kind === 'piece' ? withRows(next, 'line', listOf(next, 'line')) : next;
}

/** Puts a row in the place of the one with its id, or adds it. */
export function putRow(pattern: Pattern, kind: RowKind, row: AnyRow): Pattern {
  const rows = listOf(pattern, kind);
  const isSame = (one: AnyRow) =>
    one.id === row.id || (kind === 'caution' && (one.id as string | null) === null && one.kind === row.kind);
  const at = rows.findIndex(isSame);
  if (at < 0) return withRows(pattern, kind, [...rows, kind === 'caution' ? { broughtBy: [], ...row } : row]);
  return withRows(pattern, kind, rows.with(at, { ...rows[at], ...row }));
}

/** Takes a row out, with what hangs on it: a piece's lines, a line's marks. */
export function dropRow(pattern: Pattern, kind: RowKind, id: string): Pattern {
  const without = withRows(
    pattern,
    kind,
    listOf(pattern, kind).filter((row) => row.id !== id),
  );
  if (kind === 'piece') {
    const lines = pattern.lines.filter((line) => line.pieceId === id);
    return lines.reduce((next, line) => dropRow(next, 'line', line.id), without);
  }
  if (kind !== 'line') return without;
  return { ...without, marks: without.marks.filter((mark) => mark.lineId !== id) };
}

/** The key that puts a row behind `after` until the server has given it its own. */
export function localKey(
  pattern: Pattern,
  kind: RowKind,
  row: { readonly id: string; readonly pieceId?: unknown },
  after: string | null | undefined,
): string {
  const others = listOf(pattern, kind)
    .filter((other) => other.id !== row.id && (kind !== 'line' || other.pieceId === row.pieceId))
    .toSorted(byKey);
  const at = after === null ? -1 : after === undefined ? others.length - 1 : others.findIndex(({ id }) => id === after);
  const before = at < 0 && after !== null ? others.at(-1) : others[at];
  const key = before ? text(before.orderKey) : null;
  const next = others.find((other) => key === null || text(other.orderKey) > key);
  return generateKeyBetween(key, next ? text(next.orderKey) : null);
}
