import type { Knex } from 'knex';
import type { DeskItemKind } from '../../shared/contract/desk-queue.js';

export interface ItemRef {
  readonly kind: DeskItemKind;
  readonly id: number;
}
export interface ClaimRow {
  readonly moderatorId: number;
  readonly displayName: string;
  readonly until: Date;
}

const keyOf = ({ kind, id }: ItemRef): { kind: string; item_id: number } => ({ kind, item_id: id });

/** Claims of items; each statement compares and sets by itself, so that of two at once exactly one gets it. */
export const claimStore = {
  /** A claim that has not run out. */
  async standing(db: Knex, item: ItemRef, now: Date): Promise<ClaimRow | undefined> {
    return db('desk_claims as c')
      .join('accounts as a', 'a.id', 'c.moderator_id')
      .where({ 'c.kind': item.kind, 'c.item_id': item.id })
      .where('c.until', '>', now)
      .first('c.until', { moderatorId: 'c.moderator_id', displayName: 'a.display_name' });
  },

  /** Whether the moderator has it now: it was free, has run out, or was theirs. */
  async take(db: Knex, item: ItemRef, moderatorId: number, now: Date, until: Date): Promise<boolean> {
    const changed = await db('desk_claims')
      .where(keyOf(item))
      .where((either) => either.where('until', '<=', now).orWhere('moderator_id', moderatorId))
      .update({ moderator_id: moderatorId, until });
    if (changed > 0) return true;
    const [result] = (await db.raw(
      'INSERT IGNORE INTO desk_claims (kind, item_id, moderator_id, until) VALUES (?, ?, ?, ?)',
      [item.kind, item.id, moderatorId, until],
    )) as [{ affectedRows: number }];
    return result.affectedRows > 0;
  },

  /** Whether it was still the other's to be taken over. */
  async takeOver(db: Knex, item: ItemRef, from: number, moderatorId: number, until: Date): Promise<boolean> {
    const changed = await db('desk_claims')
      .where({ ...keyOf(item), moderator_id: from })
      .update({ moderator_id: moderatorId, until });
    return changed > 0;
  },

  async giveUp(db: Knex, item: ItemRef, moderatorId: number): Promise<void> {
    await db('desk_claims')
      .where({ ...keyOf(item), moderator_id: moderatorId })
      .delete();
  },
};
