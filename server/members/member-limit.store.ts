import type { Knex } from 'knex';
import type { LimitKind, MemberLimit } from '../../shared/contract/members.js';

/** A limit that holds. */
export interface HoldingLimit {
  readonly id: number;
  readonly kind: LimitKind;
  readonly reason: string;
  readonly from: Date;
  /** It holds before this instant; null: until it is lifted. */
  readonly until: Date | null;
}

export interface LimitRow extends HoldingLimit {
  readonly accountId: number;
  readonly worksGoneAt: Date | null;
  readonly liftedAt: Date | null;
}

interface HistoryRow extends LimitRow {
  setById: number;
  setByName: string;
  liftedById: number | null;
  liftedByName: string | null;
  liftReason: string;
}

const columns = {
  id: 'l.id',
  accountId: 'l.account_id',
  kind: 'l.kind',
  reason: 'l.reason',
  from: 'l.from_at',
  until: 'l.until_at',
  worksGoneAt: 'l.works_gone_at',
  liftedAt: 'l.lifted_at',
};

/** Limits that hold at `now`: not lifted, and their term not run out. `l` is the alias of the table. */
export function holding(query: Knex.QueryBuilder, now: Date): Knex.QueryBuilder {
  return query
    .whereNull('l.lifted_at')
    .where((either) => either.whereNull('l.until_at').orWhere('l.until_at', '>', now));
}

/** Limits on accounts; none is ever deleted. */
export const memberLimitStore = {
  /** The one that holds; undefined where none does. */
  async holdingOf(db: Knex, accountId: number, now: Date): Promise<HoldingLimit | undefined> {
    const query = db('member_limits as l').where('l.account_id', accountId);
    return holding(query, now).orderBy('l.id', 'desc').first(columns);
  },

  async add(
    trx: Knex,
    limit: {
      accountId: number;
      kind: LimitKind;
      reason: string;
      from: Date;
      until: Date | null;
      setBy: number;
    },
  ): Promise<number> {
    const [id] = await trx('member_limits').insert({
      account_id: limit.accountId,
      kind: limit.kind,
      reason: limit.reason,
      from_at: limit.from,
      until_at: limit.until,
      set_by: limit.setBy,
      lift_reason: '',
    });
    return id!;
  },

  async markWorksGone(trx: Knex, id: number, at: Date): Promise<void> {
    await trx('member_limits').where({ id }).update({ works_gone_at: at });
  },

  async accountOf(db: Knex, id: number): Promise<number | undefined> {
    const row: { account_id: number } | undefined = await db('member_limits')
      .where({ id })
      .first('account_id');
    return row?.account_id;
  },

  /** Held against changes until the transaction ends. */
  async hold(trx: Knex, id: number): Promise<LimitRow | undefined> {
    return trx('member_limits as l').where('l.id', id).forUpdate().first(columns);
  },

  async lift(trx: Knex, id: number, by: { at: Date; accountId: number; reason: string }): Promise<void> {
    await trx('member_limits')
      .where({ id })
      .update({ lifted_at: by.at, lifted_by: by.accountId, lift_reason: by.reason });
  },

  /** Every limit there ever was on an account, the newest first. */
  async historyOf(db: Knex, accountId: number, now: Date): Promise<MemberLimit[]> {
    const rows: HistoryRow[] = await db('member_limits as l')
      .join('accounts as s', 's.id', 'l.set_by')
      .leftJoin('accounts as u', 'u.id', 'l.lifted_by')
      .where('l.account_id', accountId)
      .orderBy('l.id', 'desc')
      .select({
        ...columns,
        setById: 's.id',
        setByName: 's.display_name',
        liftedById: 'u.id',
        liftedByName: 'u.display_name',
        liftReason: 'l.lift_reason',
      });
    return rows.map((row) => ({
      id: row.id,
      kind: row.kind,
      reason: row.reason,
      from: row.from.toISOString(),
      until: row.until?.toISOString() ?? null,
      setBy: { id: row.setById, displayName: row.setByName },
      worksGo: row.worksGoneAt !== null,
      lifted: row.liftedAt && {
        at: row.liftedAt.toISOString(),
        by: { id: row.liftedById!, displayName: row.liftedByName! },
        reason: row.liftReason,
      },
      holds: row.liftedAt === null && (row.until === null || row.until > now),
    }));
  },
};
