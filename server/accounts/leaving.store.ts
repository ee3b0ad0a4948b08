import type { Knex } from 'knex';
import type { AccountRole } from '../../shared/contract/vocabulary.js';
import { formerMember } from '../../shared/contract/licence.js';

/** The little of an account that leaving needs. */
export interface LeavingAccount {
  readonly id: number;
  readonly email: string;
  readonly displayName: string;
  readonly role: AccountRole;
  readonly passwordHash: string;
  readonly deletionAt: Date | null;
}

const columns = {
  id: 'id',
  email: 'email',
  displayName: 'display_name',
  role: 'role',
  passwordHash: 'password_hash',
  deletionAt: 'deletion_at',
};

export const leavingStore = {
  async byId(db: Knex, id: number): Promise<LeavingAccount | undefined> {
    return db('accounts').where({ id, deleted_at: null }).first(columns);
  },

  /** The same, held against changes until the transaction ends. */
  async hold(trx: Knex, id: number): Promise<LeavingAccount | undefined> {
    return trx('accounts').where({ id, deleted_at: null }).forUpdate().first(columns);
  },

  /** Administrators who are not about to leave, held until the transaction ends: of two who ask at once one stays. */
  async administratorsWhoStay(trx: Knex): Promise<number[]> {
    return trx('accounts')
      .where({ role: 'administrator', deletion_at: null, deleted_at: null })
      .whereNotNull('confirmed_at')
      .orderBy('id')
      .forUpdate()
      .pluck('id');
  },

  async setDeletionAt(trx: Knex, id: number, at: Date | null): Promise<void> {
    await trx('accounts').where({ id }).update({ deletion_at: at });
  },

  /** Accounts whose time has come, the longest waiting first. */
  async due(db: Knex, now: Date): Promise<number[]> {
    return db('accounts')
      .where('deletion_at', '<=', now)
      .whereNull('deleted_at')
      .orderBy('deletion_at')
      .pluck('id');
  },

  /** Confirmed members of that display name or address, at most two: more than one is as good as none. */
  async membersCalled(db: Knex, words: string, exceptId: number): Promise<number[]> {
    return db('accounts')
      .where(words.includes('@') ? { email: words } : { display_name: words })
      .whereNot('id', exceptId)
      .whereNotNull('confirmed_at')
      .whereNull('deleted_at')
      .limit(2)
      .pluck('id');
  },

  /** Leaves a row that the published work can hang on, and nothing of the person. */
  async makeFormer(trx: Knex, id: number, left: { passwordHash: string; at: Date }): Promise<void> {
    await trx('accounts')
      .where({ id })
      .update({
        // No address equals it, for it has no @; the id keeps it unique.
        email: `${formerMember} ${id}`,
        display_name: formerMember,
        role: 'member',
        password_hash: left.passwordHash,
        confirmed_at: null,
        notice_mail: false,
        mail_rhythm: 'none',
        safety_mail: false,
        bench_watch: false,
        mail_refused_at: null,
        deletion_at: null,
        deleted_at: left.at,
      });
  },
};
