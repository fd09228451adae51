import { countPattern, type PatternCount } from '#crochet';
import { toPatternInput } from '#contract/pattern-input';
import type { Pattern } from '#contract/patterns';
import { applyPending } from './apply-pending.ts';
import type { BenchSnapshot, Fields, Kind, Notice, Resolution, RowKind, UndoOutcome } from './bench-types.ts';
import { settledFields, toConflict } from './clash.ts';
import { Outbox, type OutboxDeps } from './outbox.ts';
import { addEdit, addRemove, fresh, type Pending } from './pending.ts';
import { readRefusal } from './refusal.ts';
import { findRow } from './row-lists.ts';
import { saveState } from './save-state.ts';

export type BenchDeps = Omit<OutboxDeps, 'onChange' | 'onNotice'>;

/** What is told again when a row is made anew that somebody has taken away. */
const TOLD = ['pieceId', 'kind', 'label', 'from', 'to', 'text', 'note', 'written', 'said', 'name', 'make', 'worked'];

/** One pattern on the bench. Every change shows at once and is on its way; nothing waits for an answer. */
export class BenchStore {
  readonly #outbox: Outbox;
  readonly #deps: BenchDeps;
  readonly #listeners = new Set<() => void>();
  #notices: readonly Notice[] = [];
  #deedId: string | null = null;
  #count: PatternCount | undefined;
  #snapshot: BenchSnapshot;

  constructor(pattern: Pattern, deps: BenchDeps) {
    this.#deps = deps;
    this.#outbox = new Outbox(pattern, { ...deps, onChange: this.#emit, onNotice: this.#tell });
    this.#snapshot = this.#take();
  }

  open = (): Promise<void> => this.#outbox.open();
  close = (): void => this.#outbox.close();
  flush = (): Promise<void> => this.#outbox.flush();
  retry = (): void => this.#outbox.retry();
  isIdle = (): boolean => this.#outbox.isIdle();
  snapshot = (): BenchSnapshot => this.#snapshot;
  subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };

  /** A newer reading of the whole; one that is older than what is known already is left out. */
  receive(pattern: Pattern): void {
    if (pattern === this.#outbox.server || pattern.lastChange < this.#outbox.server.lastChange) return;
    this.#outbox.server = pattern;
    this.#emit();
  }

  add(kind: RowKind, fields: Fields & { readonly id?: string | undefined }): string {
    const { id = crypto.randomUUID(), ...rest } = fields;
    this.#outbox.set([...this.#outbox.entries, fresh('create', kind, id, rest, this.#deedId)]);
    return id;
  }

  edit(kind: Kind, id: string, fields: Fields): void {
    const known = this.#known(kind, id);
    if (known) this.#outbox.set(addEdit(this.#outbox.entries, { kind, id, fields, ...known }, this.#deps.now()));
  }

  remove(kind: RowKind, id: string): void {
    const known = this.#known(kind, id);
    if (known) this.#outbox.set(addRemove(this.#outbox.entries, { kind, id, ...known }));
  }

  asOneDeed(work: () => void): void {
    const outer = this.#deedId;
    this.#deedId ??= crypto.randomUUID();
    try {
      work();
    } finally {
      this.#deedId = outer;
    }
  }

  async undo(which: 'undo' | 'redo'): Promise<UndoOutcome> {
    await this.flush();
    if (!this.isIdle()) return { done: false, words: `Not everything is saved yet, so ${which} has to wait.` };
    try {
      const { rows } = await this.#deps.api.undo(which);
      this.receive(await this.#deps.api.read());
      return { done: true, rowIds: rows.map(({ id }) => id) };
    } catch (error) {
      const refusal = readRefusal(error);
      return { done: false, words: 'why' in refusal ? refusal.why : 'What it was done to is no longer there.' };
    }
  }

  resolve(conflictId: string, how: Resolution): void {
    const { entries } = this.#outbox;
    const entry = entries.find(({ key, status }) => key === conflictId && status === 'clash');
    if (!entry?.theirs) return;
    const { row } = entry.theirs;
    if (row === null) {
      const others = entries.filter(({ key }) => key !== conflictId);
      this.#outbox.set(how === 'theirs' ? others : [...others, this.#madeAnew(entry, how)]);
      return;
    }
    this.#outbox.accept(entry, row);
    this.#emit();
    const fields = settledFields(entry, how);
    if (Object.keys(fields).length > 0) this.edit(entry.kind, entry.id, fields);
    void this.flush();
  }

  dismissNotice(id: string): void {
    this.#notices = this.#notices.filter((notice) => notice.id !== id);
    this.#emit();
  }

  #known(kind: Kind, id: string) {
    const shown = this.#snapshot.pattern;
    const row = kind === 'pattern' ? (shown as unknown as Fields) : findRow(shown, kind, id);
    if (!row) return undefined;
    const { server } = this.#outbox;
    const saved = kind === 'pattern' ? server : findRow(server, kind, id);
    return { row, version: saved?.version ?? null, deedId: this.#deedId };
  }

  #madeAnew(entry: Pending, how: Resolution): Pending {
    const whole: Fields = { ...entry.base, ...entry.fields, ...(typeof how === 'object' && how) };
    const told = TOLD.flatMap((field) => (whole[field] === undefined ? [] : [[field, whole[field]] as const]));
    return fresh('create', entry.kind, crypto.randomUUID(), Object.fromEntries(told), null);
  }

  #tell = (words: string): void => {
    this.#notices = [...this.#notices, { id: crypto.randomUUID(), words }];
  };

  #emit = (): void => {
    this.#snapshot = this.#take();
    for (const listener of this.#listeners) listener();
  };

  #take(): BenchSnapshot {
    const { server, entries, trouble, savedAt } = this.#outbox;
    const pattern = applyPending(server, entries);
    const count = countPattern(toPatternInput(pattern), this.#count);
    this.#count = count;
    const isChanged = entries.length > 0;
    return {
      pattern,
      count,
      lineCounts: new Map(count.pieces.flatMap((piece) => piece.lines).map((line) => [line.id, line])),
      save: saveState(entries, trouble, savedAt),
      conflicts: entries.filter(({ status }) => status === 'clash').map(toConflict),
      notices: this.#notices,
      canUndo: pattern.mayEdit && (isChanged || pattern.mayUndo),
      canRedo: pattern.mayEdit && !isChanged && pattern.mayRedo,
    };
  }
}
