import type { Knex } from 'knex';
import type { Revision, RevisionPhoto } from '../../shared/contract/hardware.js';
import type { Photo } from '../../shared/contract/photos.js';
import { toRevisionRef } from '../revision-ref.js';
import { fromJson, groupBy } from '../rows.js';

interface RevisionRow extends Omit<Revision, 'photos' | 'announced' | 'announcedAt'>, PhotoColumns {
  state: 'sold' | 'announced';
  announcedAt: Date | null;
}

interface PhotoColumns extends Omit<Photo, 'id' | 'hash' | 'widths'> {
  photoId: number;
  /** Null: no photo; the other columns are then null too. */
  hash: string | null;
  widths: unknown;
  caption: string;
}

const photoColumns = {
  photoId: 'f.id',
  hash: 'f.hash',
  width: 'f.width',
  height: 'f.height',
  widths: 'f.widths',
  placeholder: 'f.placeholder',
  alt: 'f.alt',
  caption: 'rp.caption',
};

export type RevisionStore = ReturnType<typeof createRevisionStore>;

/** Revisions with the photos that show what tells them apart. */
export function createRevisionStore(knex: Knex) {
  return {
    /** Oldest first; their photos in order. */
    async ofPart(partId: number): Promise<Revision[]> {
      const rows: RevisionRow[] = await knex('revisions as r')
        .leftJoin('revision_photos as rp', 'rp.revision_id', 'r.id')
        .leftJoin('photos as f', (on) => on.on('f.id', 'rp.photo_id').andOnNull('f.taken_down_at'))
        .where('r.part_id', partId)
        .select('r.id', 'r.label', { partId: 'r.part_id', soldFrom: 'r.sold_from', soldTo: 'r.sold_to' })
        .select({ state: 'r.state', announcedAt: 'r.announced_at' })
        .select({ howToTell: 'r.how_to_tell', whatChanged: 'r.what_changed', ...photoColumns })
        .orderBy(['r.position', 'r.id', 'rp.position', 'rp.photo_id']);
      return [...groupBy(rows, (row) => row.id).values()].map((of) => {
        const { id, label, state, soldFrom, soldTo, announcedAt, howToTell, whatChanged } = of[0]!;
        return {
          ...toRevisionRef({ id, partId, label, state }),
          soldFrom,
          soldTo,
          announcedAt: announcedAt?.toISOString() ?? null,
          howToTell,
          whatChanged,
          photos: of.flatMap(toPhoto),
        };
      });
    },

    /** Whether it is there; held against other writers until the transaction ends. */
    async hold(revisionId: number, trx: Knex): Promise<boolean> {
      return (await trx('revisions').where('id', revisionId).forUpdate().first('id')) !== undefined;
    },

    async ownsPhoto(accountId: number, photoId: number, trx: Knex): Promise<boolean> {
      return (
        (await trx('photos').where({ id: photoId, owner_id: accountId, taken_down_at: null }).first('id')) !==
        undefined
      );
    },

    async photos(revisionId: number, trx: Knex): Promise<RevisionPhoto[]> {
      const rows: PhotoColumns[] = await trx('revision_photos as rp')
        .join('photos as f', (on) => on.on('f.id', 'rp.photo_id').andOnNull('f.taken_down_at'))
        .where('rp.revision_id', revisionId)
        .select(photoColumns)
        .orderBy(['rp.position', 'rp.photo_id']);
      return rows.flatMap(toPhoto);
    },

    /** Puts a photo behind those the revision has. */
    async addPhoto(
      revisionId: number,
      { photoId, caption }: { photoId: number; caption: string },
      trx: Knex,
    ): Promise<void> {
      const last = await trx('revision_photos').where('revision_id', revisionId).max({ at: 'position' });
      await trx('revision_photos').insert({
        revision_id: revisionId,
        photo_id: photoId,
        position: (last[0]?.at ?? -1) + 1,
        caption,
      });
    },

    /** Whether it was there. */
    async removePhoto(revisionId: number, photoId: number): Promise<boolean> {
      return (
        (await knex('revision_photos').where({ revision_id: revisionId, photo_id: photoId }).delete()) > 0
      );
    },
  };
}

function toPhoto(row: PhotoColumns): RevisionPhoto[] {
  const { photoId, hash, width, height, widths, placeholder, alt, caption } = row;
  if (hash === null) return [];
  return [
    { photo: { id: photoId, hash, width, height, widths: fromJson(widths), placeholder, alt }, caption },
  ];
}
