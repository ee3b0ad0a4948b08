import type { Knex } from 'knex';
import type { WriteUpRow } from './published.store.js';

/** A write-up that is published or was before it was withdrawn. */
export interface DeskWriteUpRow extends WriteUpRow {
  readonly title: string;
  /** `instead`: only while that one is published itself. */
  readonly withdrawal: {
    readonly at: Date;
    readonly reason: string;
    readonly instead: { slug: string; title: string } | null;
  } | null;
}

interface Row extends WriteUpRow {
  title: string;
  withdrawnAt: Date | null;
  withdrawnReason: string | null;
  insteadSlug: string | null;
  insteadTitle: string | null;
}

export type WithdrawalStore = ReturnType<typeof createWithdrawalStore>;

/**
 * Write-ups that the desk has withdrawn. While one is withdrawn it has no published edition, so that no list, search or
 * page of another feature shows it; the edition to put back is kept beside.
 */
export function createWithdrawalStore(knex: Knex) {
  return {
    /** `publishedEditionId` is the edition that is published, or that would be were it not withdrawn. */
    async deskWriteUp(slug: string, db: Knex = knex): Promise<DeskWriteUpRow | undefined> {
      const row: Row | undefined = await db('write_ups as w')
        .join('editions as e', 'e.id', baseOfNext(db, 'w'))
        .leftJoin('write_ups as i', 'i.id', 'w.instead_id')
        .leftJoin('editions as ie', 'ie.id', 'i.published_edition_id')
        .where('w.slug', slug)
        .first('w.id', 'w.slug', 'e.title', {
          publishedEditionId: 'e.id',
          firstPublishedAt: 'w.first_published_at',
          withdrawnAt: 'w.withdrawn_at',
          withdrawnReason: 'w.withdrawn_reason',
          insteadSlug: 'i.slug',
          insteadTitle: 'ie.title',
        });
      return row && toDeskWriteUp(row);
    },

    async withdraw(
      trx: Knex,
      writeUpId: number,
      withdrawal: {
        at: Date;
        by: number;
        reason: string;
        insteadId: number | null;
        limitId: number | null;
      },
    ): Promise<void> {
      await trx('write_ups')
        .where('id', writeUpId)
        .update({ withdrawn_edition_id: trx.ref('published_edition_id') });
      await trx('write_ups').where('id', writeUpId).update({
        published_edition_id: null,
        withdrawn_at: withdrawal.at,
        withdrawn_by: withdrawal.by,
        withdrawn_reason: withdrawal.reason,
        instead_id: withdrawal.insteadId,
        withdrawn_limit_id: withdrawal.limitId,
      });
    },

    async putBack(trx: Knex, writeUpId: number): Promise<void> {
      await trx('write_ups')
        .where('id', writeUpId)
        .update({ published_edition_id: trx.ref('withdrawn_edition_id') });
      await trx('write_ups').where('id', writeUpId).update(notWithdrawn);
    },

    /** Slugs of the published write-ups of which this account wrote every published edition. */
    async soleWriteUpsOf(trx: Knex, accountId: number): Promise<string[]> {
      return trx('write_ups as w')
        .join('editions as e', 'e.write_up_id', 'w.id')
        .where('e.state', 'published')
        .whereNotNull('w.published_edition_id')
        .groupBy('w.id', 'w.slug')
        .havingRaw('MIN(e.author_id) = ? AND MAX(e.author_id) = ?', [accountId, accountId])
        .orderBy('w.id')
        .pluck('w.slug');
    },

    /** Slugs of the write-ups that were withdrawn with a limit and still are. */
    async withdrawnWith(trx: Knex, limitId: number): Promise<string[]> {
      return trx('write_ups').where('withdrawn_limit_id', limitId).orderBy('id').pluck('slug');
    },
  };
}

/** The edition that the next one builds on: the published one, or the one that was when the write-up was withdrawn. */
export function baseOfNext(db: Knex, table: string): Knex.Raw {
  return db.raw('COALESCE(??, ??)', [`${table}.published_edition_id`, `${table}.withdrawn_edition_id`]);
}

/** Columns of a write-up that is not withdrawn. */
export const notWithdrawn = {
  withdrawn_edition_id: null,
  withdrawn_at: null,
  withdrawn_by: null,
  withdrawn_reason: null,
  instead_id: null,
  withdrawn_limit_id: null,
};

function toDeskWriteUp(row: Row): DeskWriteUpRow {
  const { withdrawnAt, withdrawnReason, insteadSlug, insteadTitle, ...writeUp } = row;
  return {
    ...writeUp,
    withdrawal: withdrawnAt && {
      at: withdrawnAt,
      reason: withdrawnReason ?? '',
      instead:
        insteadSlug !== null && insteadTitle !== null ? { slug: insteadSlug, title: insteadTitle } : null,
    },
  };
}
