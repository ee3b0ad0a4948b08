import type { Knex } from 'knex';
import type { AnnounceRevision } from '../../shared/contract/makers.js';
import { isDuplicate } from '../rows.js';

export interface AnnouncedRow {
  readonly id: number;
  readonly partId: number;
  readonly label: string;
  readonly state: 'sold' | 'announced';
}

/** Revisions that their maker has announced, in the catalogue with all others. */
export const announcedRevisionStore = {
  /** Behind all others of the part, which is held until the transaction ends. */
  async add(trx: Knex, partId: number, entry: AnnounceRevision, at: Date): Promise<number | 'already-there'> {
    await trx('parts').where({ id: partId }).forUpdate().first('id');
    const last = await trx('revisions').where('part_id', partId).max({ at: 'position' });
    return unlessThere(async () => {
      const [id] = await trx('revisions').insert({
        part_id: partId,
        position: (last[0]?.at ?? -1) + 1,
        state: 'announced',
        announced_at: at,
        ...columnsOf(entry),
      });
      return id!;
    });
  },

  /** Held until the transaction ends. */
  async hold(trx: Knex, id: number): Promise<AnnouncedRow | undefined> {
    return trx('revisions')
      .where({ id })
      .whereNotNull('announced_at')
      .forUpdate()
      .first('id', 'label', 'state', { partId: 'part_id' });
  },

  async change(trx: Knex, id: number, entry: AnnounceRevision): Promise<number | 'already-there'> {
    return unlessThere(() => trx('revisions').where({ id }).update(columnsOf(entry)));
  },

  async markSold(trx: Knex, id: number, soldFrom: string): Promise<void> {
    await trx('revisions').where({ id }).update({ state: 'sold', sold_from: soldFrom });
  },

  /** `in-use` where a reading, a bench, a write-up or anything else names it. */
  async remove(trx: Knex, id: number): Promise<'removed' | 'in-use'> {
    try {
      await trx('revisions').where({ id }).delete();
      return 'removed';
    } catch (error) {
      if ((error as { code?: unknown }).code === 'ER_ROW_IS_REFERENCED_2') return 'in-use';
      throw error;
    }
  },
};

function columnsOf(entry: AnnounceRevision): Record<string, unknown> {
  return {
    label: entry.label,
    sold_from: entry.soldFrom,
    what_changed: entry.whatChanges,
    how_to_tell: entry.howToTell,
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
