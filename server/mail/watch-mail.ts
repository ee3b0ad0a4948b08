import type { Knex } from 'knex';
import { htmlOf, subjectOf, textOf, type Letter } from './letter.js';
import type { Letters } from './letters.js';
import { addMails, type OutgoingMail } from './mail-outbox.store.js';
import { recipientsOf, type Recipient } from './recipients.store.js';
import { unsubscribeToken } from './unsubscribe-token.js';
import {
  createWatchLetters,
  type DigestSection,
  type ToldBecause,
  type ToldHappening,
} from './watch-letters.js';

export interface NoticeMail extends ToldBecause {
  readonly dedupeKey: string;
  readonly accountId: number;
  /** Concerns something they tried: goes out whatever they chose about notices. */
  readonly safety: boolean;
  readonly happening: ToldHappening;
}

export interface DigestMail {
  readonly dedupeKey: string;
  readonly accountId: number;
  readonly rhythm: 'daily' | 'weekly';
  /** How many things happened, and how many of them the sections leave out. */
  readonly count: number;
  readonly left: number;
  readonly sections: readonly DigestSection[];
}

/** Puts mail on what people watch into the outbox, within the transaction that keeps whom it told. */
export interface WatchMail {
  queueNotices(trx: Knex, notices: readonly NoticeMail[]): Promise<void>;
  queueDigest(trx: Knex, digest: DigestMail): Promise<void>;
}

export function createWatchMail(needs: {
  publicAddress: string;
  letters: Pick<Letters, 'turnOffAddress'>;
  secret: string;
  clock: () => Date;
}): WatchMail {
  const written = createWatchLetters(needs.publicAddress);

  const mailOf = (
    { accountId, dedupeKey }: { accountId: number; dedupeKey: string },
    category: 'watch' | 'safety',
    to: Recipient,
    letter: Letter,
  ): OutgoingMail => ({
    dedupeKey,
    category,
    accountId,
    to: to.email,
    subject: subjectOf(letter),
    text: textOf(letter),
    html: htmlOf(letter),
    // One click in a mail program stops what is convenient to have, never what somebody's safety may hang on.
    unsubscribeUrl:
      category === 'safety' ? null : needs.letters.turnOffAddress(unsubscribeToken(needs.secret, accountId)),
  });
  const addressed = (to: Recipient) => ({ ...to, token: unsubscribeToken(needs.secret, to.accountId) });

  return {
    async queueNotices(trx, notices) {
      const recipients = await recipientsOf(
        trx,
        notices.map(({ accountId }) => accountId),
      );
      const mails = notices.flatMap((notice) => {
        const to = recipients.get(notice.accountId);
        if (!to) return [];
        const { happening, because, about } = notice;
        return notice.safety
          ? [mailOf(notice, 'safety', to, written.safety(to, happening))]
          : [mailOf(notice, 'watch', to, written.notice(addressed(to), happening, { because, about }))];
      });
      await addMails(trx, mails, needs.clock());
    },

    async queueDigest(trx, digest) {
      const to = (await recipientsOf(trx, [digest.accountId])).get(digest.accountId);
      if (!to) return;
      await addMails(
        trx,
        [mailOf(digest, 'watch', to, written.digest(addressed(to), digest))],
        needs.clock(),
      );
    },
  };
}
