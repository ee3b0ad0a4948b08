import type { Knex } from 'knex';
import type { Notice, NoticeFilter, WatchSubject } from '../../shared/contract/watches.js';

export interface NoticeRow {
  readonly id: number;
  readonly kind: string;
  readonly title: string;
  readonly text: string;
  readonly path: string;
  readonly at: Date;
  readonly readAt: Date | null;
  readonly safety: boolean;
  readonly because: Notice['because'];
  readonly subject: WatchSubject | null;
  readonly subjectId: number | null;
}

const mostCounted = 100;

export const noticeStore = {
  /** The newest first, those before `beforeId` only. */
  async newest(
    db: Knex,
    wish: {
      accountId: number;
      beforeId: number | undefined;
      unread: boolean;
      about: NoticeFilter | undefined;
      rows: number;
    },
  ): Promise<NoticeRow[]> {
    const query = db('notices as n')
      .join('happenings as h', 'h.id', 'n.happening_id')
      .where('n.account_id', wish.accountId)
      .select('n.id', 'h.kind', 'h.title', 'h.text', 'h.path', 'n.at', 'n.because', 'n.subject', {
        readAt: 'n.read_at',
        safety: 'n.at_once',
        subjectId: 'n.subject_id',
      })
      .orderBy('n.id', 'desc')
      .limit(wish.rows);
    if (wish.beforeId !== undefined) void query.where('n.id', '<', wish.beforeId);
    if (wish.unread) void query.whereNull('n.read_at');
    if (wish.about === 'bench' || wish.about === 'person') void query.where('n.because', wish.about);
    else if (wish.about) void query.where('n.subject', wish.about);
    const rows: (Omit<NoticeRow, 'safety'> & { safety: number })[] = await query;
    return rows.map((row) => ({ ...row, safety: Boolean(row.safety) }));
  },

  async countUnread(db: Knex, accountId: number): Promise<number> {
    const row: { count: number } | undefined = await db
      .count({ count: '*' })
      .from(
        db('notices')
          .where({ account_id: accountId })
          .whereNull('read_at')
          .select('id')
          .limit(mostCounted)
          .as('unread'),
      )
      .first();
    return Number(row?.count ?? 0);
  },

  /** Marks those of them that are unread; what is read keeps when it was. */
  async markRead(
    db: Knex,
    accountId: number,
    which: { ids: readonly number[] } | { through: number },
    at: Date,
  ): Promise<void> {
    const query = db('notices').where({ account_id: accountId }).whereNull('read_at');
    void ('ids' in which ? query.whereIn('id', which.ids) : query.where('id', '<=', which.through));
    await query.update({ read_at: at });
  },

  async markUnread(db: Knex, accountId: number, readAt: Date): Promise<void> {
    await db('notices').where({ account_id: accountId, read_at: readAt }).update({ read_at: null });
  },
};
