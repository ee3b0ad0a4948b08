import type { Knex } from 'knex';
import { mostWatches, type WatchSubject } from '../../shared/contract/watches.js';
import type { SubjectRef } from './subject-names.store.js';

export interface WatchRow extends SubjectRef {
  readonly createdAt: Date;
}

export const watchStore = {
  /** Adds it unless it is there; how many the account has is counted under a lock, so that two at once cannot pass the limit. */
  async add(
    trx: Knex,
    watch: SubjectRef & { accountId: number; createdAt: Date },
  ): Promise<'added' | 'too-many'> {
    await trx('accounts').where({ id: watch.accountId }).forUpdate().first('id');
    const row = { account_id: watch.accountId, subject: watch.subject, subject_id: watch.id };
    const others: { count: number } | undefined = await trx('watches')
      .where({ account_id: watch.accountId })
      .whereNot((same) => same.where(row))
      .first(trx.raw('COUNT(*) AS count'));
    if (Number(others?.count ?? 0) >= mostWatches) return 'too-many';
    await trx('watches')
      .insert({ ...row, created_at: watch.createdAt })
      .onConflict()
      .ignore();
    return 'added';
  },

  async remove(db: Knex, accountId: number, { subject, id }: SubjectRef): Promise<void> {
    await db('watches').where({ account_id: accountId, subject, subject_id: id }).delete();
  },

  async has(db: Knex, accountId: number, { subject, id }: SubjectRef): Promise<boolean> {
    const row: unknown = await db('watches')
      .where({ account_id: accountId, subject, subject_id: id })
      .first('subject');
    return row !== undefined;
  },

  /** The newest first, those after `after` in that order only. */
  async newest(
    db: Knex,
    accountId: number,
    { after, rows }: { after: (SubjectRef & { createdAt: string }) | undefined; rows: number },
  ): Promise<WatchRow[]> {
    const query = db('watches')
      .where({ account_id: accountId })
      .select('subject', { id: 'subject_id', createdAt: 'created_at' })
      .orderBy([
        { column: 'created_at', order: 'desc' },
        { column: 'subject', order: 'desc' },
        { column: 'subject_id', order: 'desc' },
      ])
      .limit(rows);
    if (after)
      void query.whereRaw('(created_at, subject, subject_id) < (?, ?, ?)', [
        new Date(after.createdAt),
        after.subject,
        after.id,
      ]);
    return query;
  },

  async all(db: Knex, accountId: number): Promise<SubjectRef[]> {
    return db('watches').where({ account_id: accountId }).select('subject', { id: 'subject_id' });
  },

  /**
   * Lets watches, notices and what is still to be told follow from old identities to new ones. Who watched both
   * watches the new one once.
   */
  async follow(trx: Knex, subject: WatchSubject, moves: ReadonlyMap<number, number>): Promise<void> {
    const olds = [...moves.keys()];
    if (olds.length === 0) return;
    for (const table of ['watches', 'happening_subjects', 'notices']) {
      await trx.raw(
        `UPDATE IGNORE ?? SET subject_id = CASE subject_id ${'WHEN ? THEN ? '.repeat(moves.size)}END WHERE subject = ? AND subject_id IN (?)`,
        [table, ...[...moves].flat(), subject, olds],
      );
    }
    for (const table of ['watches', 'happening_subjects'])
      await trx(table).where({ subject }).whereIn('subject_id', olds).delete();
  },
};
