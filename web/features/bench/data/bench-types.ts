import type { LineCount, PatternCount } from '#crochet';
import type { LeftCheck, LeftCheckCreate, LeftCheckEdit } from '#contract/checks';
import type {
  Caution,
  CautionCreate,
  Material,
  MaterialCreate,
  Note,
  NoteCreate,
  SpecialStitch,
  SpecialStitchCreate,
} from '#contract/pattern-details';
import type { Pattern, PatternEdit } from '#contract/patterns';
import type { Seat } from '#contract/live';
import type {
  Line,
  LineCreate,
  LineEdit,
  Mark,
  MarkCreate,
  MarkEdit,
  Piece,
  PieceCreate,
  PieceEdit,
} from '#contract/rows';

type Edit<C> = Partial<Omit<C, 'id'>>;

/** What the bench writes, by the name it has in the change log. */
export interface RowTypes {
  piece: { row: Piece; create: PieceCreate; edit: PieceEdit };
  line: { row: Line; create: LineCreate; edit: LineEdit };
  mark: { row: Mark; create: MarkCreate; edit: MarkEdit };
  material: { row: Material; create: MaterialCreate; edit: Edit<MaterialCreate> };
  caution: { row: Caution; create: CautionCreate; edit: Edit<Pick<CautionCreate, 'text'>> };
  note: { row: Note; create: NoteCreate; edit: Edit<NoteCreate> };
  'special-stitch': { row: SpecialStitch; create: SpecialStitchCreate; edit: Edit<SpecialStitchCreate> };
  'left-check': { row: LeftCheck; create: LeftCheckCreate; edit: LeftCheckEdit };
}
export type RowKind = keyof RowTypes;
/** Rows, and the pattern's own (title, terms, sizes, details). */
export type Kind = RowKind | 'pattern';
export type Fields = Readonly<Record<string, unknown>>;

/** How saving stands; `words` is the line the strip shows: "Saved 10:42", "Saving", "Not saved: …". */
export interface SaveState {
  readonly state: 'saved' | 'saving' | 'not-saved';
  /** When the last save was answered. */
  readonly at: Date | null;
  /** Why not, in a sentence; what was typed is kept on this device. */
  readonly reason: string | null;
  /** The session ended: signing in again lets the saves go on. */
  readonly isSignedOut: boolean;
  readonly words: string;
}

/** One field of a row that two people wrote. */
export interface ConflictField {
  readonly field: string;
  /** What both began from. */
  readonly base: unknown;
  readonly mine: unknown;
  readonly theirs: unknown;
  /** Both changed it, and not to the same; else only one did, and that one stands already. */
  readonly clashes: boolean;
}

/** A save that would have overwritten somebody's. Nothing is lost: mine is kept on this device until it is settled. */
export interface Conflict {
  /** Of the conflict; give it to `resolve`. */
  readonly id: string;
  readonly kind: Kind;
  readonly rowId: string;
  /** The row as both began from it, with mine in it, and as it is now; `theirs` is null where they took it away. */
  readonly base: Fields;
  readonly mine: Fields;
  readonly theirs: Fields | null;
  /** Every field that either of us changed. */
  readonly fields: readonly ConflictField[];
  readonly savedBy: string | null;
  readonly savedAt: Date | null;
}

/** `mine` or `theirs` for every clash, or what it becomes, field by field. */
export type Resolution = 'mine' | 'theirs' | Fields;

/** Something that happened by itself and is worth a line: two people's changes put together, say. */
export interface Notice {
  readonly id: string;
  readonly words: string;
}

/** How an undo or a redo went; refused, it says why, and nothing has changed. */
export type UndoOutcome =
  { readonly done: true; readonly rowIds: readonly string[] } | { readonly done: false; readonly words: string };

/** What the bench shows: the pattern with every change of one's own in it, saved or not, and what its count says. */
export interface BenchSnapshot {
  readonly pattern: Pattern;
  readonly count: PatternCount;
  readonly lineCounts: ReadonlyMap<string, LineCount>;
  readonly save: SaveState;
  readonly conflicts: readonly Conflict[];
  readonly notices: readonly Notice[];
  readonly canUndo: boolean;
  readonly canRedo: boolean;
}

/** What the bench does. Every change shows at once and saves itself; none waits for an answer. */
export interface BenchActions {
  /** Makes a row and gives its id, which it keeps. `after` as in the contract: absent last, null first. */
  add<K extends RowKind>(kind: K, fields: RowTypes[K]['create']): string;
  edit<K extends RowKind>(kind: K, id: string, fields: RowTypes[K]['edit']): void;
  remove(kind: RowKind, id: string): void;
  /** Title, terms, sizes, who sees it; of `details` only what changes. */
  editPattern(fields: PatternEdit): void;
  /** Sets a line's written total where it lives: in its text if one stands there, else beside it. */
  setWritten(lineId: string, totals: Line['written']): void;
  /** Every change inside `work` is one step for undo and history. */
  asOneDeed(work: () => void): void;
  /** Sends what waits, now: when a field is left, before a page is. Resolves when nothing more can be sent. */
  flush(): Promise<void>;
  undo(): Promise<UndoOutcome>;
  redo(): Promise<UndoOutcome>;
  resolve(conflictId: string, how: Resolution): void;
  /** Tries what could not be saved again, e.g. after signing in. */
  retry(): void;
  dismissNotice(id: string): void;
}

/** Who else has the pattern open, and telling them where one sits oneself. */
export interface Company {
  readonly seats: readonly Seat[];
  /** Tells the others which line is in hand. */
  readonly sit: (lineId: string | null) => void;
}

export interface Bench extends BenchSnapshot, BenchActions, Company {}
