import type { Knex } from 'knex';
import { isDuplicate } from '../rows.js';

export interface SentLetter {
  readonly makerId: number;
  readonly accountId: number;
  readonly displayName: string;
  readonly month: string;
  readonly sentAt: Date;
}

/** Letters that told a maker of a write-up. */
export const makerLetterStore = {
  /** The newest first. */
  async of(db: Knex, writeUpId: number): Promise<SentLetter[]> {
    return db('maker_letters as l')
      .join('accounts as a', 'a.id', 'l.account_id')
      .where('l.write_up_id', writeUpId)
      .orderBy('l.id', 'desc')
      .select('l.month', {
        makerId: 'l.maker_id',
        accountId: 'l.account_id',
        displayName: 'a.display_name',
        sentAt: 'l.sent_at',
      });
  },

  /** Undefined where the maker was told of it this month already. */
  async add(
    trx: Knex,
    letter: { writeUpId: number; makerId: number; month: string; accountId: number; at: Date },
  ): Promise<number | undefined> {
    try {
      const [id] = await trx('maker_letters').insert({
        write_up_id: letter.writeUpId,
        maker_id: letter.makerId,
        month: letter.month,
        account_id: letter.accountId,
        sent_at: letter.at,
      });
      return id;
    } catch (error) {
      if (isDuplicate(error)) return undefined;
      throw error;
    }
  },
};
