import type { Fields, Kind } from './bench-types.ts';

/** A change of one's own that the server has not answered yet. It shows already; until it is saved it is kept here. */
export interface Pending {
  readonly key: string;
  readonly op: 'create' | 'edit' | 'remove';
  readonly kind: Kind;
  /** Of the row. */
  readonly id: string;
  /** What is to be sent, as the contract has it. */
  readonly fields: Fields;
  /** The row as it was when this began; null for one that is made. */
  readonly base: Fields | null;
  /** The version that was read then; null while its making is still on the way. */
  readonly baseVersion: number | null;
  readonly deedId: string;
  /** Whether the step was named by the bench (several changes in one), so that nothing else is put into it. */
  readonly isOwnDeed: boolean;
  /** Not sent before this moment (ms since 1970), so that a word is sent and not its letters. */
  readonly dueAt: number;
  readonly status: 'waiting' | 'sending' | 'refused' | 'clash';
  /** Why it was refused, in a sentence. */
  readonly problem: string | null;
  /** The row as somebody else has saved it (null: taken away), for a clash. */
  readonly theirs: { readonly row: Fields | null; readonly by: string | null; readonly at: string | null } | null;
}

/** Fields one types in letter by letter. */
const TYPED = new Set(['text', 'note', 'name', 'title', 'label', 'details', 'abbreviation']);
const TYPING_MS = 700;

export const dueAfter = (fields: Fields, now: number): number =>
  Object.keys(fields).some((field) => TYPED.has(field)) ? now + TYPING_MS : now;

/** Puts new fields over old ones; of `details` only what is given. */
export function mergeFields(kind: Kind, old: Fields, fields: Fields): Fields {
  if (kind !== 'pattern' || !('details' in fields)) return { ...old, ...fields };
  return { ...old, ...fields, details: { ...(old.details as Fields | undefined), ...(fields.details as Fields) } };
}

const takesMore = (entry: Pending, deedId: string | null): boolean =>
  entry.op !== 'remove' &&
  entry.status !== 'sending' &&
  (entry.status === 'clash' || (deedId === null ? !entry.isOwnDeed : entry.deedId === deedId));

export interface NewEdit {
  readonly kind: Kind;
  readonly id: string;
  readonly fields: Fields;
  /** The row as it shows now, and the server's version of it. */
  readonly row: Fields;
  readonly version: number | null;
  /** The step it is part of, if the bench named one. */
  readonly deedId: string | null;
}

/** Adds an edit: into the row's last entry while that still waits, else as one of its own behind it. */
export function addEdit(entries: readonly Pending[], edit: NewEdit, now: number): Pending[] {
  const { kind, id, fields } = edit;
  const at = entries.findLastIndex((entry) => entry.id === id && entry.kind === kind);
  const last = entries[at];
  if (last && takesMore(last, edit.deedId)) {
    const merged: Pending = {
      ...last,
      fields: mergeFields(kind, last.fields, fields),
      dueAt: dueAfter(fields, now),
      ...(last.status === 'refused' && { status: 'waiting', problem: null }),
    };
    return entries.with(at, merged);
  }
  return [
    ...entries,
    {
      ...fresh('edit', kind, id, fields, edit.deedId),
      base: edit.row,
      baseVersion: edit.version,
      dueAt: dueAfter(fields, now),
    },
  ];
}

export function fresh(op: Pending['op'], kind: Kind, id: string, fields: Fields, deedId: string | null): Pending {
  return {
    key: crypto.randomUUID(),
    op,
    kind,
    id,
    fields,
    base: null,
    baseVersion: null,
    deedId: deedId ?? crypto.randomUUID(),
    isOwnDeed: deedId !== null,
    dueAt: 0,
    status: 'waiting',
    problem: null,
    theirs: null,
  };
}

const pointsAt = (entry: Pending, id: string) => entry.fields.lineId === id || entry.fields.pieceId === id;

/** Adds a taking away. What was never sent of the row is dropped; a row that was never made needs no answer at all. */
export function addRemove(entries: readonly Pending[], gone: Omit<NewEdit, 'fields'>): Pending[] {
  const { kind, id } = gone;
  const isOf = (entry: Pending) => entry.kind === kind && entry.id === id;
  const made = entries.find((entry) => isOf(entry) && entry.op === 'create');
  const kept = entries.filter((entry) => entry.status === 'sending' || !isOf(entry));
  if (made && made.status !== 'sending')
    return kept.filter((entry) => entry.status === 'sending' || !pointsAt(entry, id));
  return [...kept, { ...fresh('remove', kind, id, {}, gone.deedId), base: gone.row, baseVersion: gone.version }];
}

/** The next to send: in the order they came, none before its row's earlier ones, none before it is due. */
export function nextToSend(entries: readonly Pending[], now: number): Pending | undefined {
  const held = new Set<string>();
  for (const entry of entries) {
    const { lineId, pieceId } = entry.fields;
    const isHeld = [entry.id, lineId, pieceId].some((id) => typeof id === 'string' && held.has(id));
    if (entry.status === 'waiting' && !isHeld && entry.dueAt <= now) return entry;
    held.add(entry.id);
  }
  return undefined;
}
