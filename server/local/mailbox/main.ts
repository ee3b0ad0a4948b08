import { createMailboxServer } from './http.js';
import { createMailbox } from './mailbox.js';
import { createSmtpServer } from './smtp.js';

const mailbox = createMailbox();
const smtp = createSmtpServer(mailbox, () => new Date());
const pages = createMailboxServer(mailbox);
smtp.on('error', (error: Error) => console.error(error.message));

smtp.listen(portOf('MAILBOX_SMTP_PORT', 4313), '127.0.0.1');
pages.listen(portOf('MAILBOX_PORT', 4314), '127.0.0.1');

for (const signal of ['SIGTERM', 'SIGINT'] as const) {
  process.once(signal, () => {
    smtp.close();
    pages.close();
    pages.closeAllConnections();
  });
}

function portOf(variable: string, otherwise: number): number {
  return Number(process.env[variable] ?? otherwise);
}
