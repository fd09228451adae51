import type { Pattern } from '#contract/patterns';
import type { BenchApi } from './bench-api.ts';
import type { Fields } from './bench-types.ts';
import { compareFields, isSame } from './clash.ts';
import type { KeptDrafts } from './kept-drafts.ts';
import { nextToSend, type Pending } from './pending.ts';
import { readRefusal, type Refusal } from './refusal.ts';
import { dropRow, putRow } from './row-lists.ts';
import type { Trouble } from './save-state.ts';

const FIRST_WAIT_MS = 2_000;
const LONGEST_WAIT_MS = 30_000;

export interface OutboxDeps {
  readonly api: BenchApi;
  readonly drafts: KeptDrafts;
  readonly now: () => number;
  /** Called when everything is saved, so that what the server works out (cautions, undo) is read again. */
  readonly onIdle?: () => void;
  /** Called before something is sent: what is being read would be older than the save. */
  readonly onSend?: () => void;
  /** Called when anything here has changed. */
  readonly onChange: () => void;
  /** A line for the person about something that happened by itself. */
  readonly onNotice: (words: string) => void;
}

/**
 * What the server has of a pattern, and what is on the way to it: changes are sent one after the other in the order
 * they were made; one that fails is kept and tried again, or waits for the person to settle it.
 */
export class Outbox {
  server: Pattern;
  entries: readonly Pending[] = [];
  trouble: Trouble | null = null;
  savedAt: Date | null = null;
  #isSending = false;
  #wait = FIRST_WAIT_MS;
  #timer: ReturnType<typeof setTimeout> | undefined;
  #idlers: (() => void)[] = [];
  readonly #deps: OutboxDeps;

  constructor(server: Pattern, deps: OutboxDeps) {
    this.server = server;
    this.#deps = deps;
  }

  /** Takes up what an earlier visit could not save, and goes on with it. */
  async open(): Promise<void> {
    const kept = await this.#deps.drafts.load();
    const known = new Set(this.entries.map(({ key }) => key));
    this.set([...kept.filter(({ key }) => !known.has(key)), ...this.entries]);
  }

  close(): void {
    clearTimeout(this.#timer);
    this.#deps.drafts.close();
  }

  isIdle(): boolean {
    return this.entries.length === 0 && !this.#isSending;
  }

  set(entries: readonly Pending[]): void {
    this.entries = entries;
    this.#deps.drafts.keep(entries);
    this.#deps.onChange();
    this.#pump();
  }

  /** Sends everything now. @returns when nothing more can be sent */
  flush(): Promise<void> {
    this.entries = this.entries.map((entry) => ({ ...entry, dueAt: 0 }));
    this.#pump();
    return this.#isSending ? new Promise((resolve) => this.#idlers.push(resolve)) : Promise.resolve();
  }

  retry(): void {
    this.trouble = null;
    this.#wait = FIRST_WAIT_MS;
    this.set(
      this.entries.map((one) => (one.status === 'refused' ? { ...one, status: 'waiting', problem: null } : one)),
    );
  }

  /** Has an answer for an entry: the row as saved, or null where it is gone. */
  accept(entry: Pending, row: Fields | null): void {
    this.entries = this.entries.filter(({ key }) => key !== entry.key);
    this.#learn(entry, row);
  }

  /** Takes over a row as the server has it; what still waits for the row goes on from there. */
  #learn({ kind, id }: Pending, row: Fields | null): void {
    const version = Number(row?.version ?? 0);
    if (kind === 'pattern') this.server = { ...this.server, ...(row as Partial<Pattern>) };
    else if (row === null) this.server = dropRow(this.server, kind, id);
    else this.server = putRow(this.server, kind, { ...row, id, version });
    if (row === null) return;
    this.entries = this.entries.map((one) =>
      one.kind === kind && one.id === id ? { ...one, baseVersion: version } : one,
    );
  }

  #pump = (): void => {
    clearTimeout(this.#timer);
    if (this.#isSending) return;
    const now = this.#deps.now();
    const entry = this.trouble ? undefined : nextToSend(this.entries, now);
    if (entry) {
      void this.#send(entry);
      return;
    }
    for (const resolve of this.#idlers.splice(0)) resolve();
    if (this.trouble) this.#tryLater();
    else this.#wakeWhenDue(now);
  };

  #wakeWhenDue(now: number): void {
    const dues = this.entries.flatMap(({ status, dueAt }) => (status === 'waiting' && dueAt > now ? [dueAt] : []));
    if (dues.length > 0) this.#timer = setTimeout(this.#pump, Math.min(...dues) - now);
  }

  #tryLater(): void {
    if (this.trouble?.isSignedOut) return;
    this.#timer = setTimeout(() => {
      this.trouble = null;
      this.#pump();
    }, this.trouble?.waitMs);
  }

  async #send(entry: Pending): Promise<void> {
    this.#isSending = true;
    this.#replace(entry.key, { status: 'sending' });
    this.#deps.onSend?.();
    this.#deps.onChange();
    try {
      this.accept(entry, await this.#deps.api.write(entry));
      this.#wait = FIRST_WAIT_MS;
      this.savedAt = new Date(this.#deps.now());
    } catch (error) {
      this.#refused(entry, readRefusal(error));
    }
    this.#isSending = false;
    this.set(this.entries);
    if (this.isIdle()) this.#deps.onIdle?.();
  }

  #refused(entry: Pending, refusal: Refusal): void {
    if (refusal.is === 'stale') this.#overtaken(entry, refusal);
    else if (refusal.is === 'gone') this.#missing(entry);
    else if (refusal.is === 'refused') this.#replace(entry.key, { status: 'refused', problem: refusal.why });
    else this.#pause(entry, refusal);
  }

  #pause(entry: Pending, refusal: Extract<Refusal, { is: 'signed-out' | 'later' }>): void {
    this.#replace(entry.key, { status: 'waiting', dueAt: 0 });
    const waitMs = refusal.is === 'later' && refusal.afterMs !== null ? refusal.afterMs : this.#wait;
    this.trouble = { why: refusal.why, isSignedOut: refusal.is === 'signed-out', waitMs };
    this.#wait = Math.min(LONGEST_WAIT_MS, this.#wait * 2);
  }

  /** The row is not there any more: to take it away is done, to write to it is for the person to settle. */
  #missing(entry: Pending): void {
    if (entry.op === 'remove') this.accept(entry, null);
    else if (entry.op === 'edit' && entry.kind !== 'pattern') {
      this.#replace(entry.key, { status: 'clash', theirs: { row: null, by: null, at: null } });
    } else {
      const problem = 'It is no longer there, or no longer shared with you.';
      this.#replace(entry.key, { status: 'refused', problem });
    }
  }

  /** Somebody saved first: what does not clash is put together, what does is for the person to settle. */
  #overtaken(entry: Pending, { row, by, at }: Extract<Refusal, { is: 'stale' }>): void {
    const who = by ?? 'Somebody';
    if (entry.op === 'remove') {
      this.accept(entry, row);
      this.#deps.onNotice(`${who} changed this while you took it away, so it is still there.`);
      return;
    }
    const fields = compareFields(entry.base ?? {}, this.#fieldsOf(entry), row, entry.kind === 'pattern');
    if (fields.some(({ clashes }) => clashes)) {
      this.#replace(entry.key, { status: 'clash', theirs: { row, by, at } });
      return;
    }
    this.#replace(entry.key, { status: 'waiting', base: row, dueAt: 0 });
    this.#learn(entry, row);
    const isByThem = fields.some(({ base, theirs }) => !isSame(base, theirs));
    if (isByThem) this.#deps.onNotice(`${who} changed another part of this meanwhile. Both are kept.`);
  }

  /** What the entry holds by now; it may have taken in more while it was on its way. */
  #fieldsOf(entry: Pending): Fields {
    return this.entries.find(({ key }) => key === entry.key)?.fields ?? entry.fields;
  }

  #replace(key: string, part: Partial<Pending>): void {
    this.entries = this.entries.map((entry) => (entry.key === key ? { ...entry, ...part } : entry));
  }
}
