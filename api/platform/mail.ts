import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { createTransport } from 'nodemailer';
import type { Env } from '../env.ts';
import type { Clock } from './clock.ts';
import { addJob, TRIES, type Tasks } from './jobs.ts';
import { setLetter, type Letter } from './letter.ts';
import type { Logger } from './log.ts';

export interface OutgoingMail {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  readonly messageId: string;
}

export interface Mailer {
  send(mail: OutgoingMail): Promise<void>;
  close(): void;
}

/** Opens the way to the mail server; it is first spoken to with the first mail. */
export function openMail(settings: Env['mail']): Mailer {
  const url = new URL(settings.url);
  const loopback = ['127.0.0.1', 'localhost', '[::1]'].includes(url.hostname);
  const secure = url.protocol === 'smtps:';
  const transport = createTransport({
    host: url.hostname,
    port: Number(url.port) || (secure ? 465 : 587),
    secure,
    ...(loopback ? { ignoreTLS: true } : { requireTLS: !secure }),
    ...(url.username && {
      auth: { user: decodeURIComponent(url.username), pass: decodeURIComponent(url.password) },
    }),
    connectionTimeout: 5_000,
    greetingTimeout: 5_000,
    socketTimeout: 20_000,
  });
  return {
    async send({ to, subject, text, html, messageId }) {
      await transport.sendMail({ from: settings.from, to, subject, text, html, messageId });
    },
    close: () => transport.close(),
  };
}

interface MailRow {
  id: string;
  to_email: string;
  message_id: string;
  payload: Partial<Letter>;
  state: 'queued' | 'sending' | 'sent' | 'doubtful' | 'bounced' | 'failed';
}

/**
 * Puts a letter in the outbox within `trx`: it leaves only if the change that asks for it is committed.
 * @param kind what sort of letter it is, as `confirm`, `reset`, `invite`
 */
export async function queueMail(trx: Knex.Transaction, kind: string, to: string, letter: Letter): Promise<void> {
  const id = randomUUID();
  await trx('mails').insert({
    id,
    kind,
    to_email: to,
    message_id: `<${id}@mail.roundelay>`,
    payload: JSON.stringify(letter),
  });
  await addJob(trx, 'send-mail', { mailId: id });
}

/**
 * Works off the outbox. A mail found in `sending` was under way when its worker died: whether it left is not known,
 * so it goes again under the same Message-ID, which lets the receiving side drop the second.
 */
export function mailTasks(deps: { db: Knex; mail: Mailer; clock: Clock; log: Logger }): Tasks {
  return {
    'send-mail': async (payload, { attempt }) => {
      const { mailId } = payload as { mailId: string };
      const mails = () => deps.db<MailRow>('mails').where({ id: mailId });
      const row = await mails().first();
      if (!row || row.state === 'sent' || row.state === 'failed') return;
      if (row.state === 'sending') deps.log.warn({ mailId }, 'a mail may go out twice');
      await mails().update({ state: 'sending', tries: attempt } as never);
      try {
        await deps.mail.send({ to: row.to_email, messageId: row.message_id, ...setLetter(row.payload as Letter) });
      } catch (err) {
        const reason = err instanceof Error ? err.message : String(err);
        await mails().update({ state: attempt >= TRIES ? 'failed' : 'queued', last_error: reason } as never);
        throw err;
      }
      // What the letter said is not needed any more, and it may hold a link that signs somebody in.
      await mails().update({ state: 'sent', sent_at: deps.clock.now(), payload: '{}', last_error: null } as never);
    },
  };
}
