import type { Knex } from 'knex';
import type { Letter } from './letter.js';

interface Person {
  readonly id: number;
  readonly email: string;
  readonly displayName: string;
}

/** Mails to those who leave and to those who are asked to look after their write-ups. */
export interface LeavingMail {
  queueDeletionAsked(trx: Knex, account: Person & { deletionAt: Date }): Promise<void>;
  queueHandOverOffered(
    trx: Knex,
    offer: { id: number; giver: Person; taker: Person; endsAt: Date },
  ): Promise<void>;
  queueHandOverDecided(
    trx: Knex,
    decision: { id: number; giver: Person; taker: Person; taken: boolean },
  ): Promise<void>;
}

export function createLeavingMail(around: {
  page: (path: string) => string;
  queueAccountMail: (
    trx: Knex,
    dedupeKey: string,
    to: { accountId: number; email: string },
    letter: Letter,
  ) => Promise<void>;
}): LeavingMail {
  const { page } = around;
  const queue = (trx: Knex, key: string, to: Person, letter: Omit<Letter, 'greeting'>): Promise<void> =>
    around.queueAccountMail(
      trx,
      key,
      { accountId: to.id, email: to.email },
      { ...letter, greeting: `Hello ${to.displayName},` },
    );
  return {
    queueDeletionAsked: (trx, account) =>
      queue(trx, `deletion-asked:${account.id}:${account.deletionAt.getTime()}`, account, {
        subject: 'Your account will be deleted',
        paragraphs: [
          `somebody signed in as you asked for your Shimlore account to be deleted. It is deleted after ${dayOf(account.deletionAt)}. Until then nothing changes, and what you wrote can be taken away from your account page.`,
        ],
        action: { label: 'Sign in and call it off', url: page('/account/deletion') },
        closing:
          'If it was not you, call it off and set a new password. If it was you, there is nothing to do.',
      }),

    queueHandOverOffered: (trx, { id, giver, taker, endsAt }) =>
      queue(trx, `hand-over-offered:${id}`, taker, {
        subject: `${giver.displayName} asks you to look after their write-ups`,
        paragraphs: [
          `${giver.displayName} is leaving Shimlore and asks whether you would look after their write-ups: you could write the next editions, and would hear of trials and cautions. What is published so far stays under “a former member”.`,
          `The offer stands until ${dayOf(endsAt)}. If you leave it alone, it runs out and nobody minds.`,
        ],
        action: { label: 'See the write-ups, take or decline', url: page('/my/hand-overs') },
      }),

    queueHandOverDecided: (trx, { id, giver, taker, taken }) =>
      queue(trx, `hand-over-decided:${id}`, giver, {
        subject: taken ? 'Your write-ups will be looked after' : 'Your write-ups were not taken',
        paragraphs: [
          taken
            ? `${taker.displayName} will look after your write-ups once your account is deleted.`
            : `${taker.displayName} does not take your write-ups. They stay under “a former member”. To offer them to somebody else, call the deletion off and ask for it again.`,
        ],
        action: { label: 'See what becomes of your account', url: page('/account/deletion') },
      }),
  };
}

function dayOf(at: Date): string {
  return `${at.toISOString().slice(0, 10)} ${at.toISOString().slice(11, 16)} UTC`;
}
