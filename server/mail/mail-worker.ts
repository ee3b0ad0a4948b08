import { createHash } from 'node:crypto';
import type { Knex } from 'knex';
import type { SendMailOptions, Transporter } from 'nodemailer';
import type { Logger } from 'pino';
import { repeatedly, type Worker } from '../worker.js';
import { failureOf, type Bounces } from './bounces.js';
import { claimDueMails, markFailed, markGivenUp, markSent, type ClaimedMail } from './mail-outbox.store.js';
import type { ReturnPath } from './return-path.js';

const second = 1000;
/** How many mails are taken at once, and how long a dead worker keeps them, in milliseconds. */
const batch = 10;
const lease = 120 * second;
const pauseMs = 300;
/** The last of these tries is about two hours after the first. */
const mostAttempts = 8;

export interface MailWorkerNeeds {
  readonly knex: Knex;
  readonly transport: Transporter;
  readonly clock: () => Date;
  readonly from: string;
  readonly publicAddress: string;
  readonly logger: Logger;
  readonly bounces: Bounces;
  /** Where mail comes back to; undefined: to the sender. */
  readonly returnPath: ReturnPath | undefined;
}

/**
 * Sends what the outbox holds. Each mail is claimed before it is sent, so that of several workers one sends it; should
 * a worker die between sending and noting it, the second copy has the same Message-ID and mailboxes drop it.
 */
export function createMailWorker(needs: MailWorkerNeeds): Worker {
  const { knex, clock, logger } = needs;

  const sendOne = async (mail: ClaimedMail): Promise<void> => {
    if (mail.unwanted) {
      await markGivenUp(
        knex,
        mail.id,
        clock(),
        'The recipient has turned such mail off, or mail to them comes back.',
      );
      return;
    }
    try {
      await needs.transport.sendMail(messageOf(mail, needs));
    } catch (error) {
      await noteFailure(mail, error);
      return;
    }
    await markSent(knex, mail.id, clock());
  };

  const noteFailure = async (mail: ClaimedMail, error: unknown): Promise<void> => {
    const reason = error instanceof Error ? error.message : String(error);
    if (isRefusedForGood(error) || mail.attempts >= mostAttempts) {
      await markGivenUp(knex, mail.id, clock(), reason);
      const status = statusOfRefusedRecipient(error);
      if (status !== undefined) await needs.bounces.record(mail.id, failureOf(status));
      logger.warn({ mail: mail.dedupeKey, attempts: mail.attempts, reason }, 'mail given up');
      return;
    }
    await markFailed(knex, mail.id, new Date(clock().getTime() + waitAfter(mail.attempts)), reason);
    logger.info(
      { mail: mail.dedupeKey, attempts: mail.attempts, reason },
      'mail not sent yet; trying again later',
    );
  };

  return repeatedly({
    round: async () => {
      const now = clock();
      const mails = await claimDueMails(knex, {
        now,
        leaseUntil: new Date(now.getTime() + lease),
        limit: batch,
      });
      await Promise.all(mails.map(sendOne));
      return { more: mails.length === batch };
    },
    pauseMs,
    onError: (error) => logger.warn({ err: error }, 'the mail outbox could not be read; trying again'),
  });
}

/** Milliseconds to wait after the n-th failed try: half a minute, then twice as long each time, an hour at most. */
export function waitAfter(attempts: number): number {
  return Math.min(30 * second * 2 ** (attempts - 1), 3600 * second);
}

/** SMTP answers from 500 on say that trying again is of no use (RFC 5321, 4.2.1). */
function isRefusedForGood(error: unknown): boolean {
  const code = (error as { responseCode?: unknown } | null)?.responseCode;
  return typeof code === 'number' && code >= 500 && code < 600;
}

/**
 * What the mail server said of the recipient, as an enhanced status code (RFC 3463); undefined where it did not refuse
 * the recipient but something else, such as the sign-in or the text.
 */
function statusOfRefusedRecipient(error: unknown): string | undefined {
  const { code, command, responseCode, response } = (error ?? {}) as Record<string, unknown>;
  if (code !== 'EENVELOPE' || command !== 'RCPT TO' || typeof responseCode !== 'number') return undefined;
  const given = typeof response === 'string' ? /\b[45]\.\d{1,3}\.\d{1,3}\b/.exec(response)?.[0] : undefined;
  return given ?? `${Math.floor(responseCode / 100)}.0.0`;
}

function messageOf(
  mail: ClaimedMail,
  { from, publicAddress, returnPath }: Pick<MailWorkerNeeds, 'from' | 'publicAddress' | 'returnPath'>,
): SendMailOptions {
  return {
    from,
    ...(returnPath ? { envelope: { from: returnPath.addressFor(mail.id), to: mail.to } } : {}),
    to: { name: '', address: mail.to },
    subject: mail.subject,
    text: mail.text,
    html: mail.html,
    attachments: (mail.attachments ?? []).map(({ fileName, mediaType, content }) => ({
      filename: fileName,
      contentType: mediaType,
      content,
    })),
    messageId: messageIdOf(mail.dedupeKey, publicAddress),
    disableFileAccess: true,
    disableUrlAccess: true,
    headers: {
      'Auto-Submitted': 'auto-generated',
      ...(mail.unsubscribeUrl === null
        ? {}
        : {
            'List-Unsubscribe': `<${mail.unsubscribeUrl}>`,
            'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
          }),
    },
  };
}

/** The same for each try of one mail. */
export function messageIdOf(dedupeKey: string, publicAddress: string): string {
  const digest = createHash('sha256').update(dedupeKey).digest('hex').slice(0, 32);
  return `<${digest}@${new URL(publicAddress).hostname}>`;
}
