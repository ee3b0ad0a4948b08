import type { Knex } from 'knex';

export interface Recipient {
  readonly accountId: number;
  readonly email: string;
  readonly displayName: string;
}

/** Where to write to for a notice; undefined where the account is gone or wants no notices. */
export async function noticeRecipient(db: Knex, accountId: number): Promise<Recipient | undefined> {
  const row: { email: string; display_name: string } | undefined = await db('accounts')
    .where({ id: accountId, notice_mail: true })
    .first('email', 'display_name');
  return row && { accountId, email: row.email, displayName: row.display_name };
}

export async function turnNoticesOff(db: Knex, accountId: number): Promise<void> {
  await db('accounts').where({ id: accountId }).update({ notice_mail: false });
}
