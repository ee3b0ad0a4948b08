import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { addMail } from '../../server/mail/mail-outbox.store.js';
import type { TestAccount } from '../api/support/agents.js';
import { pause, startSite, until, type Site } from './support/site.js';

const mailCount = 60;
/** As many mails as a worker has in hand at once (server/mail/mail-worker.ts). */
const inHand = 10;

let site: Site;
let reader: TestAccount;

beforeAll(async () => {
  site = await startSite();
  reader = (await site.member('member', 'Reader')).account;
});
afterAll(() => site.stop());

const arrived = () => site.mailbox.list(reader.email);

/** The mails of a round, whose keys begin with `round`, as letters that stand in the outbox. */
async function fillOutbox(round: string): Promise<void> {
  const now = new Date();
  await site.knex.transaction(async (trx) => {
    for (let number = 1; number <= mailCount; number += 1) {
      await addMail(
        trx,
        {
          dedupeKey: `${round}:${number}`,
          category: 'notice',
          accountId: reader.id,
          to: reader.email,
          subject: `${round} ${number}`,
          text: `Mail ${number}`,
          html: `<p>Mail ${number}</p>`,
          unsubscribeUrl: null,
        },
        now,
      );
    }
  });
}

describe('mail that is being sent', () => {
  it.each(['server', 'database'] as const)(
    'reaches its reader exactly once when the %s is killed in the middle of it',
    async (what) => {
      const before = (await arrived()).length;
      await fillOutbox(what);
      await until(arrived, (mails) => mails.length >= before + 5, 60);

      if (what === 'server') await site.killServer();
      else await site.killDatabase();
      const atTheFall = (await arrived()).length - before;
      if (what === 'server') await site.startServer();
      else await site.startDatabase();

      expect(atTheFall).toBeLessThan(mailCount);
      const left = await until(
        async () => {
          // What the fallen one had in hand is due again when its lease is over; nobody waits for that here.
          await site
            .knex('mail_outbox')
            .whereNull('sent_at')
            .update({ next_try_at: new Date(0) });
          await pause(1500);
          return site
            .knex('mail_outbox')
            .where('dedupe_key', 'like', `${what}:%`)
            .whereNull('sent_at')
            .pluck('id');
        },
        (ids) => ids.length === 0,
        90,
      );
      expect(left).toEqual([]);
      const mails = (await arrived()).filter(({ subject }) => subject.startsWith(`${what} `));
      expect(mails.map(({ subject }) => subject).sort()).toEqual(
        Array.from({ length: mailCount }, (_, index) => `${what} ${index + 1}`).sort(),
      );
      // Between the mail server's yes and the note of it lies a moment that no sender can close: what fell into it goes
      // out again under the same Message-ID, which mailboxes drop.
      const sentAgain = mails.filter(({ copies }) => copies > 1).length;
      expect(sentAgain).toBeLessThanOrEqual(inHand);
    },
  );
});
