import { randomBytes } from 'node:crypto';
import type { Knex } from 'knex';
import { endSessionsOf } from '../http/session-store.js';
import { leavingStore, type LeavingAccount } from './leaving.store.js';
import { hashPassword, passwordMatches } from './password.js';

export type { LeavingAccount };

/** What leaving does to the account itself; everything else that goes is told by server/deletion. */
export interface Leaving {
  account(db: Knex, id: number): Promise<LeavingAccount | undefined>;
  hold(trx: Knex, id: number): Promise<LeavingAccount | undefined>;
  isPasswordOf(account: LeavingAccount, password: string): Promise<boolean>;
  /** Whether nobody else would be there to run the site. */
  isLastAdministrator(trx: Knex, account: LeavingAccount): Promise<boolean>;
  setDeletionAt(trx: Knex, id: number, at: Date | null): Promise<void>;
  due(db: Knex, now: Date): Promise<number[]>;
  membersCalled(db: Knex, words: string, exceptId: number): Promise<number[]>;
  /** Name, address and password go, every session ends. */
  makeFormer(trx: Knex, id: number, at: Date): Promise<void>;
}

export function createLeaving(): Leaving {
  return {
    account: leavingStore.byId,
    hold: leavingStore.hold,
    isPasswordOf: (account, password) => passwordMatches(password, account.passwordHash),
    async isLastAdministrator(trx, account) {
      if (account.role !== 'administrator') return false;
      const staying = await leavingStore.administratorsWhoStay(trx);
      return !staying.some((id) => id !== account.id);
    },
    setDeletionAt: leavingStore.setDeletionAt,
    due: leavingStore.due,
    membersCalled: leavingStore.membersCalled,
    async makeFormer(trx, id, at) {
      // A password that nobody has ever known opens nothing.
      const passwordHash = await hashPassword(randomBytes(32).toString('hex'));
      await leavingStore.makeFormer(trx, id, { passwordHash, at });
      await endSessionsOf(trx, id);
    },
  };
}
