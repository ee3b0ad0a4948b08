import type { Knex } from 'knex';
import type { WhatGoes } from '../../shared/contract/deletion.js';
import { goingRows } from './what-becomes.js';

/** Editions that nobody but their author and the desk has ever seen, and that are not on the desk now. */
const unpublished = ['draft', 'returned'] as const;

export const deletionStore = {
  /** How much there is of each kind; one query. */
  async countsOf(db: Knex, accountId: number): Promise<WhatGoes> {
    const count = (table: string, column = 'account_id') =>
      db.raw('(SELECT COUNT(*) FROM ?? WHERE ?? = ?)', [table, column, accountId]);
    const row: Record<keyof WhatGoes, number> = await db.first({
      benchItems: count('bench_items'),
      ownStock: count('own_stock'),
      drafts: db('editions').where('author_id', accountId).whereIn('state', unpublished).count(),
      writeUps: db('editions')
        .where({ author_id: accountId, state: 'published' })
        .countDistinct('write_up_id'),
      readings: count('measurements'),
      trials: count('trials'),
      fitReports: count('fit_reports'),
      questions: count('questions'),
      replies: count('question_replies'),
    });
    return Object.fromEntries(Object.entries(row).map(([name, value]) => [name, Number(value)])) as WhatGoes;
  },

  /** Drafts and returned editions, and write-ups of which nothing else is left. */
  async deleteUnpublished(trx: Knex, accountId: number): Promise<void> {
    await trx('editions').where('author_id', accountId).whereIn('state', unpublished).delete();
    await trx('write_ups')
      .where('created_by', accountId)
      .whereNotExists(trx('editions as e').where('e.write_up_id', trx.ref('write_ups.id')))
      .delete();
  },

  /** Every row that is nobody's business once its owner has left. */
  async deleteGoingRows(trx: Knex, accountId: number): Promise<void> {
    for (const { table, column } of goingRows) await trx(table).where(column, accountId).delete();
  },
};
