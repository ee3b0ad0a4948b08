import type { Knex } from 'knex';

/** Which of the photos an author may use: their own, and those that stood in an earlier edition of the same write-up. */
export function createPhotoRightsStore(knex: Knex) {
  return {
    async usablePhotos(ids: readonly number[], authorId: number, writeUpId: number): Promise<Set<number>> {
      if (ids.length === 0) return new Set();
      const ofEarlierEditions = knex('edition_photos as ep')
        .join('editions as e', 'e.id', 'ep.edition_id')
        .where('e.write_up_id', writeUpId)
        .select('ep.photo_id');
      const usable = await knex('photos')
        .whereIn('id', ids)
        .where((either) => either.where('owner_id', authorId).orWhereIn('id', ofEarlierEditions))
        .pluck('id');
      return new Set(usable);
    },
  };
}

export type PhotoRightsStore = ReturnType<typeof createPhotoRightsStore>;
