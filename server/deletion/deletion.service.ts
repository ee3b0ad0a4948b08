import type { Knex } from 'knex';
import {
  deletionWords,
  graceDays,
  type AskForDeletion,
  type Deletion,
} from '../../shared/contract/deletion.js';
import { formerMember } from '../../shared/contract/licence.js';
import type { Leaving } from '../accounts/leaving.js';
import type { AuditLog } from '../audit/audit.js';
import { AlreadyThere, FieldNotValid, NotAllowed, NotFound } from '../http/problems.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { MailQueue } from '../mail/mail-queue.js';
import { deletionStore } from './deletion.store.js';
import type { HandOverService } from './hand-over.service.js';
import { unusedPhotoStore } from './unused-photo.store.js';

const dayMs = 24 * 60 * 60 * 1000;

export interface DeletionParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly leaving: Leaving;
  readonly handOvers: HandOverService;
  readonly mail: MailQueue;
  readonly limits: RateLimits;
  readonly audit: AuditLog;
}

export type DeletionService = ReturnType<typeof createDeletionService>;

/** Somebody leaves: asks for it, thinks better of it, or is gone when the days of grace are over. */
export function createDeletionService(parts: DeletionParts) {
  const { knex, clock, leaving, handOvers, mail, limits, audit } = parts;

  async function readDeletion(accountId: number): Promise<Deletion> {
    return knex.transaction(async (trx) => {
      const account = await leaving.account(trx, accountId);
      if (!account) throw noSuchAccount();
      return {
        deletionAt: account.deletionAt?.toISOString() ?? null,
        lastAdministrator: await leaving.isLastAdministrator(trx, account),
        counts: await deletionStore.countsOf(trx, accountId),
        handOver: await handOvers.offerOf(trx, accountId),
      };
    });
  }

  return {
    readDeletion,

    /** Sets the day on which the account goes. Throws FieldNotValid for a wrong password, other words or an unknown name. */
    async askForDeletion(accountId: number, wish: AskForDeletion): Promise<Deletion> {
      await limits.take('deletion', String(accountId));
      await knex.transaction(async (trx) => {
        const account = await leaving.hold(trx, accountId);
        if (!account) throw noSuchAccount();
        if (account.deletionAt)
          throw new AlreadyThere('The deletion is asked for already.', 'Call it off first.');
        if (await leaving.isLastAdministrator(trx, account)) {
          throw new NotAllowed(
            'You are the only administrator, and without one nobody can run the site.',
            'Give another member the role first.',
          );
        }
        if (wish.words.trim().toLowerCase() !== deletionWords)
          throw new FieldNotValid('words', 'are not the words asked for', `Type “${deletionWords}”.`);
        if (!(await leaving.isPasswordOf(account, wish.password)))
          throw new FieldNotValid('password', 'is not your password', 'Type the one you sign in with.');
        const deletionAt = new Date(clock().getTime() + graceDays * dayMs);
        if (wish.handOverTo !== null) await handOvers.offer(trx, account, wish.handOverTo);
        await leaving.setDeletionAt(trx, accountId, deletionAt);
        await mail.queueDeletionAsked(trx, { ...account, deletionAt });
        await audit.note(trx, {
          actorId: accountId,
          action: 'deletion-asked',
          subject: { kind: 'account', id: accountId, name: account.displayName },
        });
      });
      return readDeletion(accountId);
    },

    /** The account stays after all. Doing it twice is harmless. */
    async callDeletionOff(accountId: number): Promise<Deletion> {
      await knex.transaction(async (trx) => {
        const account = await leaving.hold(trx, accountId);
        if (!account?.deletionAt) return;
        await leaving.setDeletionAt(trx, accountId, null);
        await handOvers.callOff(trx, accountId);
        await audit.note(trx, {
          actorId: accountId,
          action: 'deletion-called-off',
          subject: { kind: 'account', id: accountId, name: account.displayName },
        });
      });
      return readDeletion(accountId);
    },

    /** Deletes every account whose time has come; one that cannot be deleted does not keep the others. */
    async deleteDue(onError: (error: unknown) => void): Promise<void> {
      await handOvers.endOverdue();
      for (const accountId of await leaving.due(knex, clock())) {
        try {
          await deleteAccount(accountId);
        } catch (error) {
          onError(error);
        }
      }
    },
  };

  /** All of it or nothing. Waits while an offer is open and while nobody else runs the site. */
  async function deleteAccount(accountId: number): Promise<void> {
    await knex.transaction(async (trx) => {
      const now = clock();
      const account = await leaving.hold(trx, accountId);
      if (!account?.deletionAt || account.deletionAt > now) return;
      if (await leaving.isLastAdministrator(trx, account)) return;
      if (await handOvers.isWaiting(trx, accountId)) return;
      await deletionStore.deleteUnpublished(trx, accountId);
      await handOvers.settle(trx, accountId);
      await deletionStore.deleteGoingRows(trx, accountId);
      await unusedPhotoStore.deleteUnused(trx, accountId, now);
      await leaving.makeFormer(trx, accountId, now);
      await audit.note(trx, {
        actorId: null,
        action: 'account-deleted',
        subject: { kind: 'account', id: accountId, name: formerMember },
      });
    });
  }
}

function noSuchAccount(): NotFound {
  return new NotFound('There is no such account.', 'Sign in again.');
}
