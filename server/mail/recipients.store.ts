import type { Knex } from 'knex';

export interface Recipient {
  readonly accountId: number;
  readonly email: string;
  readonly displayName: string;
}

/** Where to write to for a notice; undefined where the account is gone, wants no notices or sends mail back. */
export async function noticeRecipient(db: Knex, accountId: number): Promise<Recipient | undefined> {
  const row: { email: string; display_name: string } | undefined = await db('accounts')
    .where({ id: accountId, notice_mail: true })
    .whereNull('mail_refused_at')
    .first('email', 'display_name');
  return row && { accountId, email: row.email, displayName: row.display_name };
}

/** Where to write to; accounts that are gone or send mail back are missing. */
export async function recipientsOf(
  db: Knex,
  accountIds: readonly number[],
): Promise<ReadonlyMap<number, Recipient>> {
  const rows: Recipient[] = await db('accounts')
    .whereIn('id', accountIds)
    .whereNull('mail_refused_at')
    .select('email', { accountId: 'id', displayName: 'display_name' });
  return new Map(rows.map((row) => [row.accountId, row]));
}

/** Turns all mail off that one can do without, but for what concerns their safety. */
export async function turnNoticesOff(db: Knex, accountId: number): Promise<void> {
  await db('accounts').where({ id: accountId }).update({ notice_mail: false, mail_rhythm: 'none' });
}
