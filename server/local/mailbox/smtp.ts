import { simpleParser, type ParsedMail } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import type { Mailbox } from './mailbox.js';

/** Takes every mail for any address and delivers none of them to anybody. */
export function createSmtpServer(mailbox: Mailbox, clock: () => Date): SMTPServer {
  return new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    disableReverseLookup: true,
    onAuth: (_credentials, _session, done) => done(null, { user: 'anybody' }),
    onRcptTo(address, _session, done) {
      if (!mailbox.refuses(address.address)) return done();
      done(Object.assign(new Error('5.1.1 There is nobody of that name here'), { responseCode: 550 }));
    },
    onData(stream, session, done) {
      const recipients = session.envelope.rcptTo.map((recipient) => recipient.address.toLowerCase());
      simpleParser(stream).then((mail) => {
        mailbox.add({
          from: mail.from?.text ?? '',
          envelopeFrom: session.envelope.mailFrom === false ? '' : session.envelope.mailFrom.address,
          to: recipients,
          subject: mail.subject ?? '',
          text: mail.text ?? '',
          html: mail.html === false ? null : (mail.html ?? null),
          headers: headersOf(mail),
          attachments: mail.attachments.map(({ filename, contentType, content }) => ({
            name: filename ?? 'file',
            mediaType: contentType,
            base64: content.toString('base64'),
          })),
          receivedAt: clock().toISOString(),
        });
        done();
      }, done);
    },
  });
}

function headersOf(mail: ParsedMail): Record<string, string> {
  return Object.fromEntries(
    mail.headerLines.map(({ key, line }) => [key, line.slice(line.indexOf(':') + 1).trim()]),
  );
}
