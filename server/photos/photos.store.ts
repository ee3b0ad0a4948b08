import type { Knex } from 'knex';
import type { Photo } from '../../shared/contract/photos.js';

export interface NewPhoto extends Omit<Photo, 'id'> {
  readonly ownerId: number;
  readonly createdAt: Date;
}

interface PhotoRow {
  id: number;
  hash: string;
  owner_id: number;
  width: number;
  height: number;
  widths: string | number[];
  placeholder: string;
  alt: string;
}

const columns = ['id', 'hash', 'owner_id', 'width', 'height', 'widths', 'placeholder', 'alt'];

export type PhotosStore = ReturnType<typeof createPhotosStore>;

export function createPhotosStore(knex: Knex) {
  return {
    /** Rows of this content, whoever sent it; the owner's own first. */
    async findByHash(
      hash: string,
      ownerId: number,
    ): Promise<{ photo: Photo; ownerId: number; takenDownReason: string | null }[]> {
      const rows: (PhotoRow & { taken_down_reason: string | null })[] = await knex('photos')
        .where({ hash })
        .select(columns)
        .select('taken_down_reason')
        .orderBy('id');
      return rows
        .map((row) => ({
          photo: toPhoto(row),
          ownerId: row.owner_id,
          takenDownReason: row.taken_down_reason,
        }))
        .sort((one, other) => Number(other.ownerId === ownerId) - Number(one.ownerId === ownerId));
    },

    /** Adds a row, unless the owner has this photo already; gives the row that is there now. */
    async add(photo: NewPhoto): Promise<Photo> {
      await knex('photos')
        .insert({
          hash: photo.hash,
          owner_id: photo.ownerId,
          width: photo.width,
          height: photo.height,
          widths: JSON.stringify(photo.widths),
          placeholder: photo.placeholder,
          alt: photo.alt,
          created_at: photo.createdAt,
        })
        .onConflict(['hash', 'owner_id'])
        .ignore();
      const row: PhotoRow = await knex('photos')
        .where({ hash: photo.hash, owner_id: photo.ownerId })
        .first(columns);
      return toPhoto(row);
    },

    /** Whether every row of this content is taken down; false where there is none. */
    async isTakenDown(hash: string): Promise<boolean> {
      const rows: { taken_down_at: Date | null }[] = await knex('photos')
        .where({ hash })
        .select('taken_down_at');
      return rows.length > 0 && rows.every((row) => row.taken_down_at !== null);
    },

    /** Those of the photos that are the owner's and not taken down. */
    async idsOwnedBy(ownerId: number, ids: readonly number[]): Promise<number[]> {
      if (ids.length === 0) return [];
      return knex('photos')
        .whereIn('id', ids)
        .where({ owner_id: ownerId, taken_down_at: null })
        .pluck('id');
    },

    /** Those of the photos that the desk has not taken down. */
    async byIds(ids: readonly number[]): Promise<Photo[]> {
      if (ids.length === 0) return [];
      const rows: PhotoRow[] = await knex('photos')
        .whereIn('id', ids)
        .whereNull('taken_down_at')
        .select(columns);
      return rows.map(toPhoto);
    },
  };
}

function toPhoto(row: PhotoRow): Photo {
  const { id, hash, width, height, placeholder, alt } = row;
  const widths = typeof row.widths === 'string' ? (JSON.parse(row.widths) as number[]) : row.widths;
  return { id, hash, width, height, widths, placeholder, alt };
}
