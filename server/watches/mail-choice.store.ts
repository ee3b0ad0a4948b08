import type { Knex } from 'knex';
import type { MailRhythm } from '../../shared/contract/accounts.js';

export const mailChoiceStore = {
  async choicesOf(db: Knex, accountId: number): Promise<{ rhythm: MailRhythm; benchWatch: boolean }> {
    const row: { rhythm: MailRhythm; bench: number | null } | undefined = await db('accounts')
      .where({ id: accountId })
      .first({ rhythm: 'mail_rhythm', bench: 'bench_watch' });
    return { rhythm: row?.rhythm ?? 'none', benchWatch: Boolean(row?.bench) };
  },

  async endBenchWatch(db: Knex, accountId: number): Promise<void> {
    await db('accounts').where({ id: accountId }).update({ bench_watch: false });
  },

  async setWeekly(db: Knex, accountId: number): Promise<void> {
    await db('accounts')
      .where({ id: accountId })
      .whereNot({ mail_rhythm: 'none' })
      .update({ mail_rhythm: 'weekly' });
  },
};
