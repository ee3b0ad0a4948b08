import type { Knex } from 'knex';
import { isDuplicate } from '../rows.js';

export interface BenchRow {
  readonly id: number;
  readonly partId: number;
  readonly revisionId: number | null;
}

export type BenchStore = ReturnType<typeof createBenchStore>;

export function createBenchStore(knex: Knex) {
  const items = () => knex('bench_items').select('id', { partId: 'part_id', revisionId: 'revision_id' });
  return {
    async itemsOf(accountId: number): Promise<BenchRow[]> {
      return items().where('account_id', accountId).orderBy('id');
    },

    async itemOf(accountId: number, id: number): Promise<BenchRow | undefined> {
      return items().where({ account_id: accountId, id }).first();
    },

    async addItem(
      accountId: number,
      item: { partId: number; revisionId: number | null },
      createdAt: Date,
    ): Promise<number | 'already-there'> {
      return unlessThere(async () => {
        const [id] = await knex('bench_items').insert({
          account_id: accountId,
          part_id: item.partId,
          revision_id: item.revisionId,
          created_at: createdAt,
        });
        return id!;
      });
    },

    async setRevision(
      accountId: number,
      id: number,
      revisionId: number | null,
    ): Promise<number | 'already-there'> {
      return unlessThere(() =>
        knex('bench_items').where({ account_id: accountId, id }).update({ revision_id: revisionId }),
      );
    },

    /** Whether there was one to remove. */
    async removeItem(accountId: number, id: number): Promise<boolean> {
      return (await knex('bench_items').where({ account_id: accountId, id }).delete()) > 0;
    },
  };
}

async function unlessThere(write: () => Promise<number>): Promise<number | 'already-there'> {
  try {
    return await write();
  } catch (error) {
    if (isDuplicate(error)) return 'already-there';
    throw error;
  }
}
