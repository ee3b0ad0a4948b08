import type { Knex } from 'knex';
import type { LimitKind } from '../../shared/contract/members.js';
import type { Letter } from './letter.js';

/** Whom a limit is about, and which. */
export interface LimitMatter {
  readonly limitId: number;
  readonly accountId: number;
  readonly email: string;
  readonly displayName: string;
  readonly kind: LimitKind;
  readonly reason: string;
}

/** What members are told of limits set on their accounts; it is sent whatever they chose about mail. */
export interface LimitMail {
  /** `term` in words: "until 4 March 2026, 10:00 UTC". */
  queueLimitSet(trx: Knex, matter: LimitMatter & { term: string; worksGo: boolean }): Promise<void>;
  queueLimitLifted(trx: Knex, matter: LimitMatter & { putBack: boolean }): Promise<void>;
}

const meant: Record<LimitKind, string> = {
  limited: 'You can sign in, read and keep your bench, but not post.',
  blocked: 'You cannot sign in for as long.',
};

export function createLimitMail(around: {
  page: (path: string) => string;
  queueAccountMail: (
    trx: Knex,
    dedupeKey: string,
    to: { accountId: number; email: string },
    letter: Letter,
  ) => Promise<void>;
}): LimitMail {
  const { page, queueAccountMail } = around;
  return {
    queueLimitSet: (trx, matter) =>
      queueAccountMail(trx, `limit-set:${matter.limitId}`, matter, {
        subject: `Your account is ${matter.kind}`,
        greeting: `Hello ${matter.displayName},`,
        paragraphs: [
          `your account is ${matter.kind} ${matter.term}. ${meant[matter.kind]} The desk’s reason:`,
          matter.reason,
          ...(matter.worksGo
            ? ['What you wrote was taken off the pages with it. Nothing of it is deleted.']
            : []),
        ],
        ...(matter.kind === 'limited'
          ? { action: { label: 'See it on your account page', url: page('/account') } }
          : {}),
      }),

    queueLimitLifted: (trx, matter) =>
      queueAccountMail(trx, `limit-lifted:${matter.limitId}`, matter, {
        subject: `Your account is ${matter.kind} no longer`,
        greeting: `Hello ${matter.displayName},`,
        paragraphs: [
          `the desk has lifted what it had set on your account. In its words:`,
          matter.reason,
          ...(matter.putBack ? ['What was taken down with it is back on the pages.'] : []),
        ],
        action: { label: 'Go to your account', url: page('/account') },
      }),
  };
}
