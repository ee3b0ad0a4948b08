import type { Knex } from 'knex';
import type { MemberWorks } from '../../shared/contract/members.js';
import type { AccountRole } from '../../shared/contract/vocabulary.js';
import { holding, type HoldingLimit } from './member-limit.store.js';

export interface StoredMember {
  readonly id: number;
  readonly email: string;
  readonly displayName: string;
  readonly role: AccountRole;
  readonly createdAt: Date;
}

const columns = {
  id: 'a.id',
  email: 'a.email',
  displayName: 'a.display_name',
  role: 'a.role',
  createdAt: 'a.created_at',
};
const mostWriteUps = 200;

/** Read model of the members for the desk. */
export const memberStore = {
  async byId(db: Knex, id: number): Promise<StoredMember | undefined> {
    return db('accounts as a').where('a.id', id).whereNotNull('a.confirmed_at').first(columns);
  },

  /** The same, held until the transaction ends: of two limits at once the second finds the first. */
  async hold(trx: Knex, id: number): Promise<StoredMember | undefined> {
    return trx('accounts as a').where('a.id', id).whereNotNull('a.confirmed_at').forUpdate().first(columns);
  },

  /** Confirmed accounts, the newest first, with the limit that holds on each. */
  async newestFirst(
    db: Knex,
    wanted: {
      words: string | undefined;
      limitedOnly: boolean;
      beforeId: number | undefined;
      rows: number;
      now: Date;
    },
  ): Promise<(StoredMember & { limit: HoldingLimit | null })[]> {
    const newest = holding(db('member_limits as l').whereRaw('l.account_id = a.id').max('l.id'), wanted.now);
    const query = db('accounts as a')
      .leftJoin('member_limits as m', 'm.id', db.raw('(?)', [newest]))
      .whereNotNull('a.confirmed_at')
      .orderBy('a.id', 'desc')
      .limit(wanted.rows)
      .select({
        ...columns,
        limitId: 'm.id',
        kind: 'm.kind',
        reason: 'm.reason',
        from: 'm.from_at',
        until: 'm.until_at',
      });
    if (wanted.limitedOnly) void query.whereNotNull('m.id');
    if (wanted.beforeId !== undefined) void query.where('a.id', '<', wanted.beforeId);
    if (wanted.words)
      void query.where('a.display_name', 'like', `%${wanted.words.replace(/[\\%_]/g, '\\$&')}%`);
    const rows: (StoredMember & Omit<HoldingLimit, 'id'> & { limitId: number | null })[] = await query;
    return rows.map(({ limitId, kind, reason, from, until, ...member }) => ({
      ...member,
      limit: limitId === null ? null : { id: limitId, kind, reason, from, until },
    }));
  },

  /** What an account wrote, counted; the write-ups by name, at most 200, the newest first. */
  async worksOf(db: Knex, accountId: number): Promise<MemberWorks> {
    const count = (table: string, writer = 'account_id') =>
      db.raw('(SELECT COUNT(*) FROM ?? WHERE ?? = ?)', [table, writer, accountId]);
    const [writeUps, counts] = await Promise.all([
      db('write_ups as w')
        .join('editions as s', 's.id', db.raw('COALESCE(w.published_edition_id, w.withdrawn_edition_id)'))
        .join('editions as e', (on) => on.on('e.write_up_id', 'w.id').andOnVal('e.state', 'published'))
        .groupBy('w.id', 'w.slug', 's.title', 'w.withdrawn_at')
        .havingRaw('SUM(e.author_id = ?) > 0', [accountId])
        .orderBy('w.id', 'desc')
        .limit(mostWriteUps)
        .select('w.slug', 's.title', {
          withdrawn: db.raw('w.withdrawn_at IS NOT NULL'),
          soleAuthor: db.raw('SUM(e.author_id <> ?) = 0', [accountId]),
        }) as Promise<{ slug: string; title: string; withdrawn: number; soleAuthor: number }[]>,
      db
        .select({
          questions: count('questions'),
          replies: count('question_replies'),
          trials: count('trials'),
          readings: count('measurements'),
          fitReports: count('fit_reports'),
          photos: count('photos', 'owner_id'),
        })
        .first() as Promise<Record<keyof Omit<MemberWorks, 'writeUps'>, number>>,
    ]);
    return {
      writeUps: writeUps.map((row) => ({
        slug: row.slug,
        title: row.title,
        withdrawn: Boolean(row.withdrawn),
        soleAuthor: Boolean(row.soleAuthor),
      })),
      ...counts,
    };
  },
};
