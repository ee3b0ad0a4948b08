import type { Knex } from 'knex';
import type { Logger } from 'pino';
import type { Photo } from '../../shared/contract/photos.js';
import { repeatedly, type Worker } from '../worker.js';
import type { DeletionService } from './deletion.service.js';
import { unusedPhotoStore } from './unused-photo.store.js';

const minute = 60 * 1000;

/** What taking files away needs of the photo store. */
export interface PhotoRemover {
  removeFiles(photo: Pick<Photo, 'hash' | 'widths'>): Promise<void>;
}

export interface DeletionRounds {
  /** Deletes the accounts whose time has come, and then the files that went with them. */
  round(): Promise<void>;
  /** A round every minute. */
  readonly worker: Worker;
}

export function createDeletionRounds(needs: {
  knex: Knex;
  deletion: DeletionService;
  photos: PhotoRemover;
  logger: Logger;
}): DeletionRounds {
  const { knex, deletion, photos, logger } = needs;
  const onError = (error: unknown): void =>
    logger.warn({ err: error }, 'an account could not be deleted yet; trying again');
  const round = async (): Promise<void> => {
    await deletion.deleteDue(onError);
    await removeFiles();
  };
  const worker = repeatedly({
    round: async () => {
      await round();
      return { more: false };
    },
    pauseMs: minute,
    onError,
  });
  return { round, worker };

  /** A file is crossed off only once it is gone, so that a stop in between leaves none behind. */
  async function removeFiles(): Promise<void> {
    for (const photo of await unusedPhotoStore.removals(knex)) {
      await photos.removeFiles(photo);
      await unusedPhotoStore.crossOff(knex, photo.hash);
    }
  }
}
