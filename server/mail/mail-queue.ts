import type { Knex } from 'knex';
import { createDeskMail, type DeskWords } from './desk-mail.js';
import { htmlOf, subjectOf, textOf, type Letter } from './letter.js';
import type { Letters } from './letters.js';
import { addMail, countMails } from './mail-outbox.store.js';
import { createLeavingMail, type LeavingMail } from './leaving-mail.js';
import { createLimitMail, type LimitMail } from './limit-mail.js';
import { createMakerMail, type MakerMail } from './maker-mail.js';
import { noticeRecipient, type Recipient } from './recipients.store.js';
import { unsubscribeToken } from './unsubscribe-token.js';

interface AccountLetter {
  readonly accountId: number;
  readonly email: string;
  readonly displayName: string;
  readonly token: string;
  readonly tokenId: number;
}

/**
 * Puts mails into the outbox, within the transaction whose outcome they tell of: they are sent when it is committed
 * and never when it is not.
 */
export interface MailQueue extends MakerMail, DeskWords, LimitMail, LeavingMail {
  queueEditionPublished(
    trx: Knex,
    edition: { authorId: number; editionId: number; number: number; title: string; slug: string },
  ): Promise<void>;
  queueEditionReturned(
    trx: Knex,
    edition: { authorId: number; editionId: number; number: number; title: string; reason: string },
  ): Promise<void>;
  queueProposalDecided(
    trx: Knex,
    proposal: {
      accountId: number;
      proposalId: number;
      what: string;
      slug: string | null;
      reason: string | null;
    },
  ): Promise<void>;
  queueEmailConfirmation(trx: Knex, letter: AccountLetter): Promise<void>;
  /** To an address that was confirmed once and sends mail back. */
  queueAddressCheck(trx: Knex, letter: AccountLetter): Promise<void>;
  queuePasswordReset(trx: Knex, letter: AccountLetter): Promise<void>;
  queueAlreadyHasAccount(
    trx: Knex,
    account: { id: number; email: string; displayName: string },
  ): Promise<void>;
}

const hour = 60 * 60 * 1000;

export function createMailQueue(needs: { letters: Letters; secret: string; clock: () => Date }): MailQueue {
  const { letters, secret, clock } = needs;

  const queueAccountMail = (
    trx: Knex,
    dedupeKey: string,
    to: { accountId: number; email: string },
    letter: Letter,
  ): Promise<void> =>
    addMail(
      trx,
      {
        dedupeKey,
        category: 'account',
        accountId: to.accountId,
        to: to.email,
        subject: subjectOf(letter),
        text: textOf(letter),
        html: htmlOf(letter),
        unsubscribeUrl: null,
      },
      clock(),
    );

  const queueNotice = async (
    trx: Knex,
    dedupeKey: string,
    accountId: number,
    write: (to: Recipient & { turnOffUrl: string }) => Letter,
  ): Promise<void> => {
    const recipient = await noticeRecipient(trx, accountId);
    if (!recipient) return;
    const token = unsubscribeToken(secret, accountId);
    const letter = write({ ...recipient, turnOffUrl: letters.turnOffPage(token) });
    await addMail(
      trx,
      {
        dedupeKey,
        category: 'notice',
        accountId,
        to: recipient.email,
        subject: subjectOf(letter),
        text: textOf(letter),
        html: htmlOf(letter),
        unsubscribeUrl: letters.turnOffAddress(token),
      },
      clock(),
    );
  };

  return {
    ...createDeskMail({ page: letters.page, queueNotice }),
    ...createLeavingMail({ page: letters.page, queueAccountMail }),
    ...createLimitMail({ page: letters.page, queueAccountMail }),
    ...createMakerMail({ clock, page: letters.page, queueAccountMail, queueNotice }),

    queueEditionPublished: (trx, edition) =>
      queueNotice(trx, `edition-published:${edition.editionId}:${edition.authorId}`, edition.authorId, (to) =>
        letters.editionPublished({ ...edition, ...to }),
      ),

    async queueEditionReturned(trx, edition) {
      // An edition may come back more than once; each return is an event of its own.
      const keyStart = `edition-returned:${edition.editionId}:`;
      const earlier = await countMails(trx, keyStart);
      await queueNotice(trx, `${keyStart}${earlier + 1}`, edition.authorId, (to) =>
        letters.editionReturned({ ...edition, ...to }),
      );
    },

    queueProposalDecided: (trx, proposal) =>
      queueNotice(trx, `proposal-decided:${proposal.proposalId}`, proposal.accountId, (to) =>
        letters.proposalDecided({ ...proposal, ...to }),
      ),

    queueEmailConfirmation: (trx, letter) =>
      queueAccountMail(trx, `confirm-email:${letter.tokenId}`, letter, letters.emailConfirmation(letter)),

    queueAddressCheck: (trx, letter) =>
      queueAccountMail(trx, `confirm-email:${letter.tokenId}`, letter, letters.addressCheck(letter)),

    queuePasswordReset: (trx, letter) =>
      queueAccountMail(trx, `reset-password:${letter.tokenId}`, letter, letters.passwordReset(letter)),

    queueAlreadyHasAccount: (trx, account) =>
      // At most one an hour, however often somebody tries.
      queueAccountMail(
        trx,
        `already-has-account:${account.id}:${Math.floor(clock().getTime() / hour)}`,
        { accountId: account.id, email: account.email },
        letters.alreadyHasAccount(account),
      ),
  };
}
