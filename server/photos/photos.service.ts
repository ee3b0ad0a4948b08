import { readFile } from 'node:fs/promises';
import type { Readable } from 'node:stream';
import type { Photo } from '../../shared/contract/photos.js';
import { NotFound, TakenDownByDesk } from '../http/problems.js';
import { createGate } from './gate.js';
import {
  hashOfPhoto,
  photoFileName,
  photoFormats,
  processPhoto,
  type ProcessedPhoto,
} from './photo-processing.js';
import type { PhotoStore } from './photo-store.js';
import type { PhotosStore } from './photos.store.js';

/** Photos unpacked and encoded at once; each takes a core and up to 250 MB. */
const atOnce = 2;

export type PhotoService = ReturnType<typeof createPhotoService>;

export function createPhotoService({
  photos,
  files,
  clock,
}: {
  photos: PhotosStore;
  files: PhotoStore;
  clock: () => Date;
}) {
  const inTurn = createGate(atOnce);

  /** Stores a photo, or finds the one that is there: the same bytes from the same owner give the same photo. Throws PhotoRefused, or TakenDownByDesk for one of theirs that the desk has taken down. */
  async function store(bytes: Buffer, alt: string, ownerId: number): Promise<Photo> {
    const hash = hashOfPhoto(bytes);
    const known = (await photos.findByHash(hash, ownerId))[0];
    if (known?.ownerId === ownerId && known.takenDownReason !== null)
      throw new TakenDownByDesk('This photo of yours', known.takenDownReason);
    const complete = known && (await hasFilesOf(known.photo));
    if (complete && known.ownerId === ownerId) return known.photo;
    const made = complete ? known.photo : await makeFiles(hash, bytes);
    const { width, height, widths, placeholder } = made;
    return photos.add({ hash, ownerId, width, height, widths, placeholder, alt, createdAt: clock() });
  }

  async function makeFiles(hash: string, bytes: Buffer): Promise<ProcessedPhoto> {
    const photo = await processPhoto(bytes);
    await Promise.all(
      photo.files.map((file) => files.put(photoFileName(hash, file.width, file.format), file.bytes)),
    );
    return photo;
  }

  async function hasFilesOf(photo: Photo): Promise<boolean> {
    return (await Promise.all(filesOf(photo).map((name) => files.has(name)))).every(Boolean);
  }

  return {
    storePhoto: (bytes: Buffer, alt: string, ownerId: number): Promise<Photo> =>
      inTurn(() => store(bytes, alt, ownerId)),

    /** Stores a file from the disk; it is only read once its turn has come. */
    storeUpload: (path: string, alt: string, ownerId: number): Promise<Photo> =>
      inTurn(async () => store(await readFile(path), alt, ownerId)),

    /** Photos by identity; those that are not there, or taken down, are left out. */
    async photosByIds(ids: readonly number[]): Promise<Map<number, Photo>> {
      return new Map((await photos.byIds([...new Set(ids)])).map((photo) => [photo.id, photo]));
    },

    /** Which of the photos are the account's own, and not taken down. */
    async ownPhotoIds(accountId: number, ids: readonly number[]): Promise<Set<number>> {
      return new Set(await photos.idsOwnedBy(accountId, ids));
    },

    /** The largest WebP file of a photo as a stream; null where its files are gone. */
    openLargest: ({ hash, widths }: Pick<Photo, 'hash' | 'widths'>): Promise<Readable | null> =>
      files.open(photoFileName(hash, Math.max(...widths), 'webp')),

    /** Takes every file of this content away. Nothing may show it any more. */
    async removeFiles(photo: Pick<Photo, 'hash' | 'widths'>): Promise<void> {
      await Promise.all(filesOf(photo).map((name) => files.remove(name)));
    },

    /** The bytes of a photo file. Throws NotFound, or TakenDownByDesk unless somebody's photo of the same bytes still stands. */
    async readFile(name: string): Promise<Buffer> {
      const hash = name.slice(0, name.indexOf('-'));
      if (await photos.isTakenDown(hash)) throw new TakenDownByDesk('This photo', null);
      const bytes = await files.get(name);
      if (!bytes)
        throw new NotFound(
          'There is no photo of this name and size.',
          'Load the page again; it names the sizes there are.',
        );
      return bytes;
    },
  };
}

/** Names of all files of a photo. */
function filesOf({ hash, widths }: Pick<Photo, 'hash' | 'widths'>): string[] {
  return widths.flatMap((width) => photoFormats.map((format) => photoFileName(hash, width, format)));
}
