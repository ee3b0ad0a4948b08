import type { Knex } from 'knex';
import { bounceStore as store, type Failure } from './bounce.store.js';

export type { Failure };

const day = 24 * 60 * 60 * 1000;
/** So many mails within this many milliseconds that could not be delivered for a while stop mail as well. */
const mostTemporary = 3;
const temporarySpan = 14 * day;

/** Keeps which mails did not arrive, and stops mail to addresses that take none. */
export interface Bounces {
  record(mailId: number, failure: Failure): Promise<void>;
}

export function createBounces({ knex, clock }: { knex: Knex; clock: () => Date }): Bounces {
  return {
    async record(mailId, failure) {
      await knex.transaction(async (trx) => {
        const account = await store.holdAccountOf(trx, mailId);
        if (!account) return;
        const at = clock();
        const { accountId, goodSince } = account;
        await store.add(trx, { ...failure, mailId, accountId, at });
        if (account.refusedAt) return;
        // What failed before the address was confirmed anew no longer speaks against it.
        const since = new Date(Math.max(at.getTime() - temporarySpan, goodSince.getTime()));
        if (failure.permanent || (await store.countTemporary(trx, accountId, since)) >= mostTemporary)
          await store.refuse(trx, accountId, at);
      });
    },
  };
}

/**
 * The failure that a status code tells of (RFC 3463), or an SMTP reply code where there is none. Class 5 is for good,
 * but for 5.7.x: that speaks of the sender or the text, not of the address, and so weighs no more than a temporary one.
 */
export function failureOf(status: string): Failure {
  return { permanent: status.startsWith('5') && !status.startsWith('5.7.'), status };
}
