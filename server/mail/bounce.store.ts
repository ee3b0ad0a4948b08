import type { Knex } from 'knex';

/** Why a mail did not arrive. */
export interface Failure {
  readonly permanent: boolean;
  /** Enhanced status code (RFC 3463), such as `5.1.1`. */
  readonly status: string;
}

export const bounceStore = {
  /**
   * The account a mail went to, held until the transaction ends, and since when its address counts as good. Undefined
   * where the mail is unknown, went to nobody's account, or to an address that is not the account's any more.
   */
  async holdAccountOf(
    trx: Knex,
    mailId: number,
  ): Promise<{ accountId: number; refusedAt: Date | null; goodSince: Date } | undefined> {
    return trx('mail_outbox as m')
      .join('accounts as a', (on) => {
        on.on('a.id', 'm.account_id').andOn('a.email', 'm.to_address');
      })
      .where('m.id', mailId)
      .forUpdate()
      .first({
        accountId: 'a.id',
        refusedAt: 'a.mail_refused_at',
        goodSince: trx.raw('COALESCE(a.confirmed_at, a.created_at)'),
      });
  },

  /** Notes it unless the same was said of this mail before. */
  async add(trx: Knex, bounce: Failure & { mailId: number; accountId: number; at: Date }): Promise<void> {
    await trx('mail_bounces')
      .insert({
        mail_id: bounce.mailId,
        permanent: bounce.permanent,
        account_id: bounce.accountId,
        status: bounce.status,
        at: bounce.at,
      })
      .onConflict(['mail_id', 'permanent'])
      .ignore();
  },

  /** How many mails did not arrive for a while, from `since` on. */
  async countTemporary(trx: Knex, accountId: number, since: Date): Promise<number> {
    const row: { count: number } | undefined = await trx('mail_bounces')
      .where({ account_id: accountId, permanent: false })
      .where('at', '>=', since)
      .first(trx.raw('COUNT(*) AS count'));
    return Number(row?.count ?? 0);
  },

  async refuse(trx: Knex, accountId: number, at: Date): Promise<void> {
    await trx('accounts').where({ id: accountId }).update({ mail_refused_at: at });
  },
};
