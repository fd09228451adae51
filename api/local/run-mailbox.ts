import { startMailbox } from './mailbox.ts';

/** The mailbox as a process of its own: `run-mailbox <port for SMTP> <port of its page>`. */
const [, , smtp, page] = process.argv;
const mailbox = await startMailbox({ smtp: Number(smtp), page: Number(page) });
const stop = () => void mailbox.close().then(() => process.exit(0));
process.on('SIGTERM', stop);
process.on('SIGINT', stop);
// The one who started it is gone.
process.on('disconnect', stop);
process.send?.('listening');
