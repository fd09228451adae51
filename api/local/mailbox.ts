import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';
import { mailListPage, mailPage } from './mailbox-pages.ts';
import { readMail, type ReadMail } from './read-mail.ts';

/** A mail with the number it came under, from 1. */
export interface KeptMail extends ReadMail {
  readonly id: number;
  readonly at: Date;
}

export interface Mailbox {
  readonly smtpPort: number;
  readonly pagePort: number;
  /** In the order they came. */
  readonly mails: readonly KeptMail[];
  close(): Promise<void>;
}

const KEPT = 500;
const portOf = (server: Server | SMTPServer['server']) => (server.address() as AddressInfo).port;

/**
 * Takes every mail on loopback and shows it on a page of its own instead of sending it on. The mails live as long as
 * the process. `/mails.json` lists them for programs.
 */
export async function startMailbox(ports: { readonly smtp: number; readonly page: number }): Promise<Mailbox> {
  const mails: KeptMail[] = [];
  let last = 0;
  const smtp = new SMTPServer({
    disabledCommands: ['STARTTLS', 'AUTH'],
    logger: false,
    onData(stream, _session, callback) {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('end', () => {
        last += 1;
        mails.push({ id: last, at: new Date(), ...readMail(Buffer.concat(chunks)) });
        if (mails.length > KEPT) mails.shift();
        callback();
      });
    },
  });
  // A sender that goes away in the middle is its own affair.
  smtp.on('error', () => undefined);

  const page = createServer((req, res) => {
    const path = new URL(req.url ?? '/', 'http://mailbox').pathname;
    const html = (status: number, body: string) => {
      res.writeHead(status, { 'Content-Type': 'text/html; charset=utf-8', 'X-Content-Type-Options': 'nosniff' });
      res.end(body);
    };
    const id = /^\/mails\/(\d+)$/.exec(path)?.[1];
    const mail = mails.find((each) => each.id === Number(id));
    if (path === '/') html(200, mailListPage(mails));
    else if (path === '/mails.json') {
      res.writeHead(200, { 'Content-Type': 'application/json' });
      res.end(JSON.stringify(mails));
    } else if (mail) html(200, mailPage(mail));
    else html(404, mailListPage(mails));
  });

  await new Promise<void>((resolve) => smtp.listen(ports.smtp, '127.0.0.1', resolve));
  await new Promise<void>((resolve) => page.listen(ports.page, '127.0.0.1', resolve));
  return {
    smtpPort: portOf(smtp.server),
    pagePort: portOf(page),
    mails,
    async close() {
      await new Promise<void>((resolve) => smtp.close(resolve));
      const closed = new Promise<void>((resolve) => page.close(() => resolve()));
      page.closeAllConnections();
      await closed;
    },
  };
}
