import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { record } from '../patterns/deed.service.ts';
import { listPatternsOf } from './recordings.store.ts';

/** Whose hand it was; null: the machine's own (a clip that has arrived, a reading). */
export interface Hand {
  readonly who: { readonly id: string } | null;
  readonly now: Date;
  readonly deedId?: string | undefined;
}

/** Writes what happened to a recording into the log of every pattern it stands in, and so tells whoever listens. */
export async function recordOnRecording(
  trx: Knex.Transaction,
  hand: Hand,
  recordingId: string,
  change: {
    readonly before: Readonly<Record<string, unknown>> | null;
    readonly after: Readonly<Record<string, unknown>>;
  },
): Promise<void> {
  for (const patternId of await listPatternsOf(trx, recordingId)) {
    const deed = { id: hand.deedId ?? randomUUID(), patternId, personId: hand.who?.id ?? null, at: hand.now };
    await record(trx, deed, [{ entity: 'recording', entityId: recordingId, ...change }]);
  }
}
