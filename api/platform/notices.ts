import type { Knex } from 'knex';
import pg from 'pg';
import type { Env } from '../env.ts';
import type { Logger } from './log.ts';

/**
 * Short notices between processes, through PostgreSQL: what one process tells, every process that listens hears, once
 * the teller's transaction is through. Nothing is kept: who was not listening has to look for themselves, and is told
 * so when listening begins anew.
 */
const CHANNEL = 'notices';
/** Waits before connecting again, the last one from then on. */
const AGAIN_MS = [100, 500, 2_000, 5_000];

/** What is told, about the thing with the id. PostgreSQL takes 8,000 bytes at most, so ids travel, never texts. */
export interface Notice {
  readonly about: string;
  readonly kind: string;
}
/** `look` comes from here: notices may have been missed. */
export const LOOK = 'look';

/** Tells whoever listens to things about this id, once the transaction is through. */
export async function tell(trx: Knex, notice: Notice & Readonly<Record<string, unknown>>): Promise<void> {
  await trx.raw('select pg_notify(?, ?)', [CHANNEL, JSON.stringify(notice)]);
}

type Hear = (notice: Notice) => void;

export interface Notices {
  /** Hears what is told about the id from now on, never before this call has returned; first a `look`. @returns the way to stop */
  hear(about: string, hear: Hear, onEnd: () => void): () => void;
  /** Ends every listener: the process is about to go. */
  close(): Promise<void>;
}

interface Listener {
  readonly hear: Hear;
  readonly onEnd: () => void;
}

/** One listening connection for the whole process, made when the first listener comes and made anew when it breaks. */
class NoticeBoard implements Notices {
  readonly #url: string;
  readonly #log: Pick<Logger, 'warn'>;
  readonly #listeners = new Map<string, Set<Listener>>();
  #client: pg.Client | null = null;
  #state: 'idle' | 'connecting' | 'listening' | 'closed' = 'idle';
  #again: NodeJS.Timeout | undefined;
  #tries = 0;

  constructor(url: string, log: Pick<Logger, 'warn'>) {
    this.#url = url;
    this.#log = log;
  }

  hear(about: string, hear: Hear, onEnd: () => void): () => void {
    const listener = { hear, onEnd };
    if (this.#isClosed()) {
      queueMicrotask(onEnd);
      return () => undefined;
    }
    const all = this.#listeners.get(about) ?? new Set();
    this.#listeners.set(about, all.add(listener));
    if (this.#state === 'idle') void this.#connect();
    if (this.#state === 'listening') queueMicrotask(() => hear({ about, kind: LOOK }));
    return () => {
      all.delete(listener);
      if (all.size === 0 && this.#listeners.get(about) === all) this.#listeners.delete(about);
    };
  }

  async close(): Promise<void> {
    this.#state = 'closed';
    clearTimeout(this.#again);
    const ending = [...this.#listeners.values()].flatMap((all) => [...all]);
    this.#listeners.clear();
    for (const { onEnd } of ending) onEnd();
    await this.#client?.end();
  }

  async #connect(): Promise<void> {
    this.#state = 'connecting';
    const client = new pg.Client({ connectionString: this.#url, application_name: 'roundelay notices' });
    this.#client = client;
    client.on('notification', ({ payload }) => this.#dispatch(payload));
    client.on('error', (err) => this.#broken(client, err));
    client.on('end', () => this.#broken(client, undefined));
    try {
      await client.connect();
      await client.query(`listen ${CHANNEL}`);
    } catch (err) {
      this.#broken(client, err);
      return;
    }
    if (this.#client !== client || this.#isClosed()) return;
    this.#state = 'listening';
    this.#tries = 0;
    for (const [about, all] of this.#listeners) for (const { hear } of all) hear({ about, kind: LOOK });
  }

  #isClosed = (): boolean => this.#state === 'closed';

  #broken(client: pg.Client, err: unknown): void {
    if (this.#client !== client || this.#isClosed()) return;
    this.#client = null;
    client.end().catch(() => undefined);
    this.#log.warn({ err }, 'notices are not heard just now');
    this.#state = 'connecting';
    const wait = AGAIN_MS[Math.min(this.#tries, AGAIN_MS.length - 1)];
    this.#tries += 1;
    this.#again = setTimeout(() => void this.#connect(), wait);
  }

  #dispatch(payload: string | undefined): void {
    const notice = JSON.parse(payload ?? '{}') as Notice;
    for (const { hear } of [...(this.#listeners.get(notice.about) ?? [])]) hear(notice);
  }
}

/** Nothing is connected until somebody listens. */
export function openNotices(settings: Env['database'], log: Pick<Logger, 'warn'>): Notices {
  return new NoticeBoard(settings.url, log);
}
