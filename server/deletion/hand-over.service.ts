import type { Knex } from 'knex';
import { offerDays, type HandOver, type OfferedHandOver } from '../../shared/contract/deletion.js';
import type { Leaving, LeavingAccount } from '../accounts/leaving.js';
import { FieldNotValid, NotFound } from '../http/problems.js';
import type { MailQueue } from '../mail/mail-queue.js';
import { handOverStore, type HandOverRow } from './hand-over.store.js';

const dayMs = 24 * 60 * 60 * 1000;

export type HandOverService = ReturnType<typeof createHandOverService>;

/** Write-ups of somebody who leaves, offered to another member to look after. */
export function createHandOverService(parts: {
  knex: Knex;
  clock: () => Date;
  leaving: Leaving;
  mail: MailQueue;
}) {
  const { knex, clock, leaving, mail } = parts;

  async function listFor(accountId: number): Promise<OfferedHandOver[]> {
    const now = clock();
    return (await handOverStore.offersTo(knex, accountId))
      .filter((offer) => offer.state === 'taken' || offer.endsAt > now)
      .map(({ id, from, writeUps, state, offeredAt, endsAt }) => ({
        id,
        from,
        writeUps,
        state,
        offeredAt: offeredAt.toISOString(),
        endsAt: endsAt.toISOString(),
      }));
  }

  async function decide(
    id: number,
    accountId: number,
    state: 'taken' | 'declined',
  ): Promise<OfferedHandOver[]> {
    await knex.transaction(async (trx) => {
      const offer = await handOverStore.holdWaiting(trx, id, accountId, clock());
      if (!offer) {
        throw new NotFound(
          'There is no offer of this number that waits for you.',
          'It may have been called off or have run out; load the page again.',
        );
      }
      await handOverStore.decide(trx, id, state, clock());
      const [giver, taker] = await Promise.all([
        leaving.account(trx, offer.fromId),
        leaving.account(trx, accountId),
      ]);
      if (giver && taker)
        await mail.queueHandOverDecided(trx, { id, giver, taker, taken: state === 'taken' });
    });
    return listFor(accountId);
  }

  return {
    listFor,
    take: (id: number, accountId: number) => decide(id, accountId, 'taken'),
    decline: (id: number, accountId: number) => decide(id, accountId, 'declined'),

    /**
     * Offers the write-ups to whoever is called so. A name that nobody or several have is told; whether an address has
     * an account is not, for that is its owner's business: the offer then waits and runs out.
     */
    async offer(trx: Knex, giver: LeavingAccount, words: string): Promise<void> {
      const found = await leaving.membersCalled(trx, words, giver.id);
      if (!words.includes('@') && found.length !== 1) {
        throw found.length === 0
          ? new FieldNotValid(
              'handOverTo',
              'is the name of no other member',
              'Check it, or write the e-mail address.',
            )
          : new FieldNotValid(
              'handOverTo',
              'is the name of several members',
              'Write the e-mail address instead.',
            );
      }
      const offeredAt = clock();
      const endsAt = new Date(offeredAt.getTime() + offerDays * dayMs);
      const toId = found[0] ?? null;
      const id = await handOverStore.add(trx, {
        fromId: giver.id,
        toId,
        addressedTo: words,
        offeredAt,
        endsAt,
      });
      const taker = toId === null ? undefined : await leaving.account(trx, toId);
      if (taker) await mail.queueHandOverOffered(trx, { id, giver, taker, endsAt });
    },

    async offerOf(db: Knex, accountId: number): Promise<HandOver | null> {
      const offer = await handOverStore.newestOf(db, accountId);
      return offer && offer.state !== 'called-off' ? shown(offer, clock()) : null;
    },

    callOff: (trx: Knex, accountId: number) => handOverStore.callOff(trx, accountId, clock()),
    endOverdue: () => handOverStore.endOverdue(knex, clock()),

    /** Whether somebody may still take what is offered. */
    async isWaiting(trx: Knex, accountId: number): Promise<boolean> {
      const offer = await handOverStore.newestOf(trx, accountId);
      return offer?.state === 'waiting' && offer.endsAt > clock();
    },

    /** When the giver goes: what was taken is the taker's to look after, and no name is kept. */
    async settle(trx: Knex, accountId: number): Promise<void> {
      const offer = await handOverStore.newestOf(trx, accountId);
      if (offer?.state === 'taken' && offer.toId !== null && (await leaving.account(trx, offer.toId))) {
        await handOverStore.moveWriteUps(trx, accountId, offer.toId);
        await handOverStore.decide(trx, offer.id, 'done', clock());
      }
      await handOverStore.forget(trx, accountId, clock());
    },
  };
}

function shown(offer: HandOverRow, now: Date): HandOver {
  return {
    addressedTo: offer.addressedTo,
    state: offer.state === 'waiting' && offer.endsAt <= now ? 'run-out' : offer.state,
    offeredAt: offer.offeredAt.toISOString(),
    endsAt: offer.endsAt.toISOString(),
  };
}
