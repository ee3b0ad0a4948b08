import type { Knex } from 'knex';
import type { TakenDownKind } from '../../shared/contract/taken-down.js';
import { addFirstPost, addPhotoLooks } from './desk-look.store.js';

/** What members wrote, before the desk knows them. */
export interface PostedThing {
  readonly kind: Exclude<TakenDownKind, 'photo'>;
  readonly id: number;
  readonly accountId: number;
  /** What it is called in the queue. */
  readonly title: string;
}

/** Lays on the desk what it looks at after it stands on the pages, within the transaction in which it is posted. */
export interface DeskInbox {
  /** Only of members whom the desk does not know yet; posting a thing anew lays it there anew. */
  firstPost(trx: Knex, post: PostedThing): Promise<void>;
  /** Photos used outside of editions; each is looked at once. */
  photosUsed(trx: Knex, photoIds: readonly number[]): Promise<void>;
}

export function createDeskInbox({ clock }: { clock: () => Date }): DeskInbox {
  return {
    firstPost: (trx, post) => addFirstPost(trx, post, clock()),
    photosUsed: (trx, photoIds) => addPhotoLooks(trx, photoIds, clock()),
  };
}
