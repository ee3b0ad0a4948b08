import type { Mail } from './mailbox.js';

/**
 * The report (RFC 3464) with which a mail server gives a mail back to its return path: `status` of class 5 says for
 * good, of class 4 not yet.
 */
export function returnedMessage(mail: Mail, status: string): string {
  const recipient = mail.to[0] ?? '';
  const failed = status.startsWith('5');
  const boundary = `returned-${mail.id}`;
  return [
    'From: Mail Delivery System <mailer-daemon@mailbox.invalid>',
    `To: <${mail.envelopeFrom}>`,
    `Subject: ${failed ? 'Undelivered mail returned to sender' : 'Mail not delivered yet'}`,
    'Auto-Submitted: auto-replied',
    'MIME-Version: 1.0',
    `Content-Type: multipart/report; report-type=delivery-status; boundary="${boundary}"`,
    '',
    `--${boundary}`,
    'Content-Type: text/plain; charset=utf-8',
    '',
    `The mail to ${recipient} ${failed ? 'could not be delivered' : 'is delayed'}.`,
    '',
    `--${boundary}`,
    'Content-Type: message/delivery-status',
    '',
    'Reporting-MTA: dns; mailbox.invalid',
    '',
    `Final-Recipient: rfc822; ${recipient}`,
    `Action: ${failed ? 'failed' : 'delayed'}`,
    `Status: ${status}`,
    '',
    `--${boundary}`,
    'Content-Type: text/rfc822-headers',
    '',
    `Subject: ${mail.subject}`,
    '',
    `--${boundary}--`,
    '',
  ].join('\r\n');
}
