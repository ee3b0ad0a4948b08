import type { Knex } from 'knex';

/** Notes, in the caller's transaction, that a write-up's document must be made anew. */
export interface SearchOutbox {
  add(trx: Knex, writeUpId: number): Promise<void>;
  addAll(trx: Knex, writeUpIds: readonly number[]): Promise<void>;
}

export function createSearchOutbox({ clock }: { clock: () => Date }): SearchOutbox {
  return {
    add: (trx, writeUpId) => addNotes(trx, [writeUpId], clock()),
    addAll: (trx, writeUpIds) => addNotes(trx, writeUpIds, clock()),
  };
}

async function addNotes(db: Knex, writeUpIds: readonly number[], now: Date): Promise<void> {
  if (writeUpIds.length === 0) return;
  await db('search_outbox').insert(
    writeUpIds.map((id) => ({ write_up_id: id, created_at: now, next_try_at: now })),
  );
}

/** A note that a worker has taken on. */
export interface ClaimedNote {
  readonly id: number;
  readonly writeUpId: number;
}

/** Pause before the next try: a quarter of a second, doubled with each, at most ten seconds. */
const pauseMicroseconds = 'LEAST(10000, 250 * POW(2, LEAST(attempts, 10))) * 1000';
const longestError = 1000;

export type SearchOutboxStore = ReturnType<typeof createSearchOutboxStore>;

/** The worker's side of the outbox. */
export function createSearchOutboxStore(knex: Knex) {
  return {
    /**
     * Takes due notes until `until`, the oldest first; whoever dies with them leaves them due again then. Notes of a
     * write-up that is being worked on or waits for its next try are left, so that documents never overtake each other.
     * Rows are locked by identity only and never waited for: a command that adds notes is not held up.
     */
    async claim(now: Date, until: Date, limit: number): Promise<ClaimedNote[]> {
      const due: number[] = await knex('search_outbox')
        .where('next_try_at', '<=', now)
        .orderBy('id')
        .limit(limit)
        .pluck('id');
      if (due.length === 0) return [];
      return knex.transaction(
        async (trx) => {
          const notes: ClaimedNote[] = await trx('search_outbox')
            .whereIn('id', due)
            .where('next_try_at', '<=', now)
            .whereNotIn(
              'write_up_id',
              trx('search_outbox')
                .where('next_try_at', '>', now)
                .where('attempts', '>', 0)
                .select('write_up_id'),
            )
            .forUpdate()
            .skipLocked()
            .select('id', 'write_up_id as writeUpId');
          const ids = notes.map((note) => note.id);
          await trx('search_outbox')
            .whereIn('id', ids)
            .update({ next_try_at: until, attempts: trx.raw('attempts + 1') });
          return notes;
        },
        { isolationLevel: 'read committed' },
      );
    },

    async settle(ids: readonly number[]): Promise<void> {
      if (ids.length > 0) await knex('search_outbox').whereIn('id', ids).delete();
    },

    async postpone(ids: readonly number[], now: Date, error: string): Promise<void> {
      if (ids.length === 0) return;
      await knex('search_outbox')
        .whereIn('id', ids)
        .update({
          next_try_at: knex.raw(`DATE_ADD(?, INTERVAL ${pauseMicroseconds} MICROSECOND)`, [now]),
          last_error: error.slice(0, longestError),
        });
    },

    addAll: (writeUpIds: readonly number[], now: Date): Promise<void> => addNotes(knex, writeUpIds, now),

    async count(): Promise<number> {
      const row = await knex('search_outbox').count({ count: '*' }).first();
      return Number(row?.count ?? 0);
    },
  };
}
