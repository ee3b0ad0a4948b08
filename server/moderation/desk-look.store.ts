import type { Knex } from 'knex';
import type { TakenDownKind } from '../../shared/contract/taken-down.js';
import type { PostedThing } from './desk-inbox.js';

export type LookState = 'waiting' | 'fine' | 'taken-down';

export interface FirstPostRow {
  readonly id: number;
  readonly kind: PostedThing['kind'];
  readonly subjectId: number;
  readonly title: string;
  readonly accountId: number;
  readonly state: LookState;
  readonly createdAt: Date;
}

export interface PhotoLookRow {
  readonly id: number;
  readonly state: LookState;
  readonly createdAt: Date;
}

interface Decision {
  readonly state: Exclude<LookState, 'waiting'>;
  readonly by: number;
  readonly at: Date;
}

const longestTitle = 300;

/** Nothing for members whom the desk knows, and for those who work at it. */
export async function addFirstPost(trx: Knex, post: PostedThing, at: Date): Promise<void> {
  await trx.raw(
    `INSERT INTO first_posts (subject_kind, subject_id, title, account_id, created_at)
      SELECT ?, ?, ?, id, ? FROM accounts WHERE id = ? AND known_at IS NULL AND role IN ('member', 'maker')
      ON DUPLICATE KEY UPDATE
        created_at = IF(state = 'fine', VALUES(created_at), first_posts.created_at),
        state = IF(state = 'fine', 'waiting', state)`,
    [post.kind, post.id, post.title.slice(0, longestTitle), at, post.accountId],
  );
}

/** Nothing for photos that were looked at, and for those of the desk itself. */
export async function addPhotoLooks(trx: Knex, photoIds: readonly number[], at: Date): Promise<void> {
  if (photoIds.length === 0) return;
  await trx.raw(
    `INSERT INTO photo_looks (photo_id, created_at)
      SELECT p.id, ? FROM photos p JOIN accounts a ON a.id = p.owner_id
      WHERE p.id IN (${photoIds.map(() => '?').join(', ')}) AND a.role IN ('member', 'maker')
      ON DUPLICATE KEY UPDATE photo_id = photo_looks.photo_id`,
    [at, ...photoIds],
  );
}

export const deskLookStore = {
  async firstPost(db: Knex, id: number): Promise<FirstPostRow | undefined> {
    return firstPosts(db).where({ id }).first();
  },

  /** Held until the transaction ends, so that of two decisions the second finds the first. */
  async holdFirstPost(trx: Knex, id: number): Promise<FirstPostRow | undefined> {
    return firstPosts(trx).where({ id }).forUpdate().first();
  },

  async decideFirstPost(trx: Knex, id: number, { state, by, at }: Decision): Promise<void> {
    await trx('first_posts').where({ id }).update({ state, decided_by: by, decided_at: at });
  },

  async fineSoFar(db: Knex, accountId: number): Promise<number> {
    const row = await db('first_posts')
      .where({ account_id: accountId, state: 'fine' })
      .count({ count: '*' })
      .first();
    return Number(row?.['count'] ?? 0);
  },

  async makeKnown(trx: Knex, accountId: number, at: Date): Promise<void> {
    await trx('accounts').where({ id: accountId }).whereNull('known_at').update({ known_at: at });
  },

  async photoLook(db: Knex, id: number): Promise<PhotoLookRow | undefined> {
    return photoLooks(db).where({ photo_id: id }).first();
  },

  async holdPhotoLook(trx: Knex, id: number): Promise<PhotoLookRow | undefined> {
    return photoLooks(trx).where({ photo_id: id }).forUpdate().first();
  },

  async decidePhotoLook(trx: Knex, id: number, { state, by, at }: Decision): Promise<void> {
    await trx('photo_looks').where({ photo_id: id }).update({ state, decided_by: by, decided_at: at });
  },

  /** What waits on a thing that is taken down needs no decision of its own any more. */
  async closeOn(
    trx: Knex,
    { kind, id }: { kind: TakenDownKind; id: number },
    by: number,
    at: Date,
  ): Promise<void> {
    const decided = { state: 'taken-down', decided_by: by, decided_at: at };
    if (kind === 'photo') await trx('photo_looks').where({ photo_id: id, state: 'waiting' }).update(decided);
    else
      await trx('first_posts')
        .where({ subject_kind: kind, subject_id: id, state: 'waiting' })
        .update(decided);
  },

  async closeAllOf(trx: Knex, accountId: number, by: number, at: Date): Promise<void> {
    const decided = { state: 'taken-down', decided_by: by, decided_at: at };
    await trx('first_posts').where({ account_id: accountId, state: 'waiting' }).update(decided);
    await trx('photo_looks')
      .where({ state: 'waiting' })
      .whereIn('photo_id', trx('photos').where({ owner_id: accountId }).select('id'))
      .update(decided);
  },
};

function firstPosts(db: Knex): Knex.QueryBuilder {
  return db('first_posts').select('id', 'title', 'state', {
    kind: 'subject_kind',
    subjectId: 'subject_id',
    accountId: 'account_id',
    createdAt: 'created_at',
  });
}

function photoLooks(db: Knex): Knex.QueryBuilder {
  return db('photo_looks').select('state', { id: 'photo_id', createdAt: 'created_at' });
}
