import type { Deps } from '../../platform/deps.ts';
import type { Tasks } from '../../platform/jobs.ts';
import { queueMail } from '../../platform/mail.ts';
import { resetLetter } from './account.letters.ts';
import { findByEmail } from './people.store.ts';
import { createToken, dropTokens, sweepTokens } from './tokens.store.ts';

const RESET_MS = 3_600_000;

/** What accounts have done in the background. */
export function accountTasks({ db, clock, env }: Pick<Deps, 'db' | 'clock' | 'env'>): Tasks {
  return {
    // Run twice it sends two letters, of which the later one's link works.
    'send-reset-letter': async (payload) => {
      const { email } = payload as { email: string };
      const person = await findByEmail(db, email);
      if (!person || person.disabled_at) return;
      await db.transaction(async (trx) => {
        await dropTokens(trx, 'reset', person.id);
        const expiresAt = new Date(clock.now().getTime() + RESET_MS);
        const token = await createToken(trx, { kind: 'reset', personId: person.id, expiresAt });
        await queueMail(trx, 'reset', person.email, resetLetter(env.publicUrl, person.name, token));
      });
    },
    'sweep-tokens': () => sweepTokens(db, clock.now()),
  };
}
