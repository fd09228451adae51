import type { Entity } from '#contract/changes';

/** What the change log may write to, with the names that fields have in the contract and in the table. */
export interface EntityTable {
  readonly table: string;
  /** Contract name to column name. */
  readonly columns: Readonly<Record<string, string>>;
  /** The field whose rows stand in one order together; null where there is no order. */
  readonly orderedWithin: 'patternId' | 'pieceId' | null;
  /** Columns by which rows are listed; the id settles what is alike. */
  readonly listedBy?: string;
}

const PLACED = { orderKey: 'order_key' } as const;
const DELETED = { deletedAt: 'deleted_at' } as const;

const ofPattern = (table: string, ...fields: string[]): EntityTable => ({
  table,
  columns: { ...Object.fromEntries(fields.map((field) => [field, field])), ...PLACED, ...DELETED },
  orderedWithin: 'patternId',
  listedBy: 'order_key',
});

/** Rows that belong to a pattern and are made, edited and taken away one by one. */
export type RowEntity = Exclude<Entity, 'pattern' | 'lifecycle' | 'recording'>;

export const TABLES: Readonly<Record<Exclude<Entity, 'recording'>, EntityTable>> = {
  pattern: {
    table: 'patterns',
    columns: { title: 'title', visibility: 'visibility', terms: 'terms', sizes: 'sizes', details: 'details' },
    orderedWithin: null,
  },
  lifecycle: {
    table: 'patterns',
    columns: { state: 'state', archivedAt: 'archived_at', ...DELETED },
    orderedWithin: null,
  },
  piece: {
    table: 'pieces',
    columns: {
      name: 'name',
      make: 'make',
      worked: 'worked',
      startsOnLineId: 'starts_on_line_id',
      ...PLACED,
      ...DELETED,
    },
    orderedWithin: 'patternId',
    listedBy: 'order_key',
  },
  line: {
    table: 'lines',
    columns: {
      shortId: 'short_id',
      pieceId: 'piece_id',
      kind: 'kind',
      label: 'label',
      from: 'from_no',
      to: 'to_no',
      text: 'text',
      note: 'note',
      written: 'written',
      said: 'said',
      heardTotal: 'heard_total',
      filmed: 'filmed',
      putAsideReason: 'put_aside_reason',
      spokenSlip: 'spoken_slip',
      hearings: 'hearings',
      ...PLACED,
      ...DELETED,
    },
    orderedWithin: 'pieceId',
    listedBy: 'order_key',
  },
  mark: {
    table: 'marks',
    columns: {
      lineId: 'line_id',
      recordingId: 'recording_id',
      startMs: 'start_ms',
      endMs: 'end_ms',
      main: 'main',
      title: 'title',
      madeBy: 'made_by',
      transcriptId: 'transcript_id',
      ...DELETED,
    },
    orderedWithin: null,
    listedBy: 'start_ms',
  },
  material: ofPattern('materials', 'kind', 'name', 'details'),
  caution: ofPattern('cautions', 'kind', 'text'),
  note: ofPattern('notes', 'text'),
  'left-check': {
    table: 'left_checks',
    columns: { kind: 'kind', subject: 'subject', says: 'says', reason: 'reason', ...DELETED },
    orderedWithin: null,
  },
  'special-stitch': ofPattern('special_stitches', 'name', 'abbreviation', 'text'),
};

/** A row in the contract's names, with what every row has. */
export interface Row {
  readonly id: string;
  readonly patternId: string;
  readonly version: number;
  readonly deletedAt: Date | null;
  readonly [field: string]: unknown;
}
export type Fields = Readonly<Record<string, unknown>>;
