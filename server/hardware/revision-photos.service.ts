import type { Knex } from 'knex';
import { mostRevisionPhotos, type RevisionPhoto } from '../../shared/contract/hardware.js';
import { AlreadyThere, FieldNotValid, NotFound } from '../http/problems.js';
import type { RevisionStore } from './revision.store.js';

export type RevisionPhotoService = ReturnType<typeof createRevisionPhotoService>;

/** Photos that show how to tell a revision, kept by moderators. */
export function createRevisionPhotoService({ knex, store }: { knex: Knex; store: RevisionStore }) {
  return {
    /** Puts one of the caller's photos behind those the revision has. NotFound, FieldNotValid or AlreadyThere. */
    async add(
      accountId: number,
      revisionId: number,
      input: { photoId: number; caption: string },
    ): Promise<RevisionPhoto> {
      return knex.transaction(async (trx) => {
        if (!(await store.hold(revisionId, trx))) throw new NotFound('There is no such revision.');
        if (!(await store.ownsPhoto(accountId, input.photoId, trx))) {
          throw new FieldNotValid('photoId', 'is not a photo of yours', 'Add the photo first.');
        }
        const shown = await store.photos(revisionId, trx);
        if (shown.some(({ photo }) => photo.id === input.photoId)) {
          throw new AlreadyThere('That revision shows this photo already.');
        }
        if (shown.length >= mostRevisionPhotos) {
          throw new FieldNotValid(
            'photoId',
            `is one too many: a revision shows at most ${mostRevisionPhotos} photos`,
            'Take one away first.',
          );
        }
        await store.addPhoto(revisionId, input, trx);
        return (await store.photos(revisionId, trx)).at(-1)!;
      });
    },

    /** Takes a photo away from a revision; the photo itself stays its owner's. NotFound. */
    async remove(revisionId: number, photoId: number): Promise<void> {
      if (!(await store.removePhoto(revisionId, photoId))) {
        throw new NotFound('That revision does not show such a photo.');
      }
    },
  };
}
