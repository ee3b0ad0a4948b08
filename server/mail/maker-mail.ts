import type { Knex } from 'knex';
import { htmlOf, subjectOf, textOf, type Attachment, type Letter } from './letter.js';
import { addMail } from './mail-outbox.store.js';
import type { Recipient } from './recipients.store.js';

/** Mails between those who speak for makers, the desk, and the makers. */
export interface MakerMail {
  /** The link that proves who speaks for a maker; it goes to an address at the maker's domain. */
  queueMakerProof(
    trx: Knex,
    proof: {
      proofId: number;
      accountId: number;
      address: string;
      displayName: string;
      makerName: string;
      token: string;
    },
  ): Promise<void>;
  queueMakerRequestDecided(
    trx: Knex,
    decision: {
      requestId: number;
      accountId: number;
      makerName: string;
      makerSlug: string;
      granted: boolean;
      /** Null: the mailed link was the proof. */
      reason: string | null;
    },
  ): Promise<void>;
  queueSpeakingEnded(
    trx: Knex,
    end: { requestId: number; accountId: number; makerName: string; makerSlug: string; reason: string },
  ): Promise<void>;
  /** A letter to somebody who need not have an account. */
  queueLetter(
    trx: Knex,
    mail: { dedupeKey: string; to: string; letter: Letter; attachments: readonly Attachment[] },
  ): Promise<void>;
}

export function createMakerMail(around: {
  clock: () => Date;
  page: (path: string, query?: Record<string, string>) => string;
  queueAccountMail: (
    trx: Knex,
    dedupeKey: string,
    to: { accountId: number; email: string },
    letter: Letter,
  ) => Promise<void>;
  queueNotice: (
    trx: Knex,
    dedupeKey: string,
    accountId: number,
    write: (to: Recipient & { turnOffUrl: string }) => Letter,
  ) => Promise<void>;
}): MakerMail {
  const { clock, page, queueAccountMail, queueNotice } = around;
  return {
    queueMakerProof: (trx, proof) =>
      queueAccountMail(
        trx,
        `maker-proof:${proof.proofId}`,
        { accountId: proof.accountId, email: proof.address },
        {
          subject: `Speaking for ${proof.makerName} on Shimlore`,
          greeting: 'Hello,',
          paragraphs: [
            `${proof.displayName} has a Shimlore account and asks to speak for ${proof.makerName} there: to answer write-ups about its parts, to announce revisions and to say what is made right.`,
            `If that is you, follow the link within 24 hours, signed in as ${proof.displayName}. It works once and for nobody else.`,
          ],
          action: {
            label: `Speak for ${proof.makerName}`,
            url: page('/makers/prove', { token: proof.token }),
          },
          closing: 'If it is not you, leave the link alone and nothing happens.',
        },
      ),

    queueMakerRequestDecided: (trx, { requestId, accountId, makerName, makerSlug, granted, reason }) =>
      queueNotice(trx, `maker-request-decided:${requestId}`, accountId, (to) =>
        granted
          ? {
              subject: `You speak for ${makerName}`,
              greeting: `Hello ${to.displayName},`,
              paragraphs: [
                `you speak for ${makerName} from now on. What you answer and announce stands under its name; your own name stands beside it.`,
                ...(reason ? [reason] : []),
              ],
              action: { label: `Open the page of ${makerName}`, url: page(`/makers/${makerSlug}`) },
              turnOffUrl: to.turnOffUrl,
            }
          : {
              subject: `Not granted: speaking for ${makerName}`,
              greeting: `Hello ${to.displayName},`,
              paragraphs: [
                `the desk has read your request to speak for ${makerName} and does not grant it. The reason:`,
                reason ?? '',
              ],
              action: { label: 'Ask again', url: page(`/makers/${makerSlug}`) },
              turnOffUrl: to.turnOffUrl,
            },
      ),

    queueSpeakingEnded: (trx, { requestId, accountId, makerName, makerSlug, reason }) =>
      queueNotice(trx, `maker-speaking-ended:${requestId}`, accountId, (to) => ({
        subject: `You no longer speak for ${makerName}`,
        greeting: `Hello ${to.displayName},`,
        paragraphs: [
          `the desk has ended that you speak for ${makerName}. What you answered stays. The reason:`,
          reason,
        ],
        action: { label: `Open the page of ${makerName}`, url: page(`/makers/${makerSlug}`) },
        turnOffUrl: to.turnOffUrl,
      })),

    queueLetter: (trx, { dedupeKey, to, letter, attachments }) =>
      addMail(
        trx,
        {
          dedupeKey,
          category: 'letter',
          accountId: null,
          to,
          subject: subjectOf(letter),
          text: textOf(letter),
          html: htmlOf(letter),
          unsubscribeUrl: null,
          attachments,
        },
        clock(),
      ),
  };
}
