import type { Knex } from 'knex';
import type { WithdrawalNotice } from '../../shared/contract/withdrawal.js';
import { isModerator, type Caller } from '../http/caller.js';
import { ProblemError } from '../http/problems.js';
import { NoSuchWriteUp } from './edition-problems.js';
import type { PublishedStore, WriteUpRow } from './published.store.js';
import type { DeskWriteUpRow, WithdrawalStore } from './withdrawal.store.js';

export type { DeskWriteUpRow } from './withdrawal.store.js';

/** The desk has withdrawn it: carries what stands at the address instead. */
export class WriteUpWithdrawn extends ProblemError {
  constructor(withdrawal: WithdrawalNotice) {
    super(
      'withdrawn',
      410,
      `The desk has withdrawn “${withdrawal.title}”: ${withdrawal.reason}`,
      withdrawal.instead
        ? `Read “${withdrawal.instead.title}” instead.`
        : 'Search for the symptom or the part.',
      { withdrawal },
    );
  }
}

export type WithdrawalService = ReturnType<typeof createWithdrawalService>;

/** What readers find where the desk has withdrawn a write-up, and how it is withdrawn and put back. */
export function createWithdrawalService(parts: {
  knex: Knex;
  withdrawals: WithdrawalStore;
  published: PublishedStore;
}) {
  const { knex, withdrawals, published } = parts;

  async function mayReadHistory(caller: Caller, writeUpId: number): Promise<boolean> {
    if (isModerator(caller)) return true;
    return (
      caller.accountId !== null && (await published.authorIds(knex, writeUpId)).includes(caller.accountId)
    );
  }

  async function missing(caller: Caller, slug: string): Promise<ProblemError> {
    const writeUp = await withdrawals.deskWriteUp(slug);
    if (!writeUp?.withdrawal) return new NoSuchWriteUp();
    return new WriteUpWithdrawn(
      noticeOf(writeUp.title, writeUp.withdrawal, await mayReadHistory(caller, writeUp.id)),
    );
  }

  return {
    deskWriteUp: withdrawals.deskWriteUp,
    soleWriteUpsOf: withdrawals.soleWriteUpsOf,
    writeUpsWithdrawnWith: withdrawals.withdrawnWith,
    /** In the transaction that holds the write-up. */
    withdrawHeld: withdrawals.withdraw,
    putBackHeld: withdrawals.putBack,

    /** Why there is nothing to read at an address: it was withdrawn, or never was. */
    missing,

    /** The write-up whose editions are asked for; those of a withdrawn one are for its authors and moderators. */
    async withHistory(caller: Caller, slug: string): Promise<WriteUpRow> {
      const writeUp = await withdrawals.deskWriteUp(slug);
      if (!writeUp) throw new NoSuchWriteUp();
      if (writeUp.withdrawal && !(await mayReadHistory(caller, writeUp.id)))
        throw new WriteUpWithdrawn(noticeOf(writeUp.title, writeUp.withdrawal, false));
      return writeUp;
    },
  };
}

/** What stands at the address of a withdrawn write-up. */
export function noticeOf(
  title: string,
  { at, reason, instead }: NonNullable<DeskWriteUpRow['withdrawal']>,
  mayReadHistory: boolean,
): WithdrawalNotice {
  return { title, reason, at: at.toISOString(), by: 'the desk', instead, mayReadHistory };
}
