import type { Knex } from 'knex';
import type { Letter } from './letter.js';
import type { Recipient } from './recipients.store.js';

/** What a word from the desk is about. */
export interface DeskMatter {
  readonly accountId: number;
  /** Names the thing once and for all, such as `reply:17`. */
  readonly key: string;
  /** What it is, in words: "your reply to “Which shim?”". */
  readonly what: string;
  readonly path: string;
  readonly reason: string;
  readonly at: Date;
}

/** What the desk tells members about things they wrote or told it of. */
export interface DeskWords {
  queueTakenDown(trx: Knex, matter: DeskMatter): Promise<void>;
  queuePutBack(trx: Knex, matter: DeskMatter): Promise<void>;
  /** To somebody who told the desk of a thing: what came of it. */
  queueFlagSettled(trx: Knex, matter: DeskMatter & { outcome: string }): Promise<void>;
}

export function createDeskMail(around: {
  page: (path: string) => string;
  queueNotice: (
    trx: Knex,
    dedupeKey: string,
    accountId: number,
    write: (to: Recipient & { turnOffUrl: string }) => Letter,
  ) => Promise<void>;
}): DeskWords {
  const { page, queueNotice } = around;
  // A thing can be taken down more than once; the instant tells one event from the next.
  const keyOf = (event: string, { key, accountId, at }: DeskMatter): string =>
    `${event}:${key}:${accountId}:${at.getTime()}`;
  return {
    queueTakenDown: (trx, matter) =>
      queueNotice(trx, keyOf('taken-down', matter), matter.accountId, (to) => ({
        subject: `Taken down: ${matter.what}`,
        greeting: `Hello ${to.displayName},`,
        paragraphs: [
          `the desk has taken down ${matter.what}. Others no longer see it; you do, and nothing of it is lost. The reason:`,
          matter.reason,
        ],
        action: { label: 'See it as you left it', url: page(matter.path) },
        turnOffUrl: to.turnOffUrl,
      })),

    queuePutBack: (trx, matter) =>
      queueNotice(trx, keyOf('put-back', matter), matter.accountId, (to) => ({
        subject: `Back on the pages: ${matter.what}`,
        greeting: `Hello ${to.displayName},`,
        paragraphs: [
          `the desk has put back ${matter.what}; everybody sees it again. The reason:`,
          matter.reason,
        ],
        action: { label: 'See it there', url: page(matter.path) },
        turnOffUrl: to.turnOffUrl,
      })),

    queueFlagSettled: (trx, matter) =>
      queueNotice(trx, keyOf('flag-settled', matter), matter.accountId, (to) => ({
        subject: `What came of your word to the desk: ${matter.what}`,
        greeting: `Hello ${to.displayName},`,
        paragraphs: [
          `you told the desk of ${matter.what}. It has looked and ${matter.outcome}. In its words:`,
          matter.reason,
        ],
        action: { label: 'Open the page', url: page(matter.path) },
        closing: 'Thank you for telling the desk.',
        turnOffUrl: to.turnOffUrl,
      })),
  };
}
