import { Readable } from 'node:stream';
import { ZipFile } from 'yazl';
import type { Photo } from '../../shared/contract/photos.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { OwnDataStore } from './own-data.store.js';
import { readme } from './readme.js';
import { sections } from './sections.js';

/** What the export needs of the photo store. */
export interface PhotoFiles {
  openLargest(photo: Pick<Photo, 'hash' | 'widths'>): Promise<Readable | null>;
}

export type ExportService = ReturnType<typeof createExportService>;

/** Everything that one person wrote or keeps, as one archive for them to take away. */
export function createExportService(needs: {
  ownData: OwnDataStore;
  photos: PhotoFiles;
  limits: RateLimits;
  clock: () => Date;
}) {
  const { ownData, photos, limits, clock } = needs;

  return {
    /**
     * A ZIP archive that is written while it is read: a batch of rows or one photo at a time is in memory. An error on
     * the way destroys the stream, so that nobody takes half an archive for a whole one.
     */
    async openArchive(accountId: number): Promise<{ archive: Readable; createdAt: Date }> {
      await limits.take('export', String(accountId));
      const createdAt = clock();
      const zip = new ZipFile();
      const archive = zip.outputStream;
      const fail = (error: unknown): void => void archive.destroy(error as Error);
      zip.on('error', fail);
      let inHand: Readable | undefined;
      archive.once('close', () => inHand?.destroy());
      /** An entry whose content is opened when its turn comes, and closed with the archive. */
      const add = (name: string, compress: boolean, open: () => Promise<Readable>): void =>
        zip.addReadStreamLazy(name, { mtime: createdAt, compress }, (give) => {
          open().then((content) => {
            content.on('error', fail);
            inHand = content;
            if (archive.destroyed) content.destroy();
            else give(null, content);
          }, fail);
        });
      zip.addBuffer(Buffer.from(readme(createdAt), 'utf8'), 'README.txt', { mtime: createdAt });
      add('data.json', true, () => Promise.resolve(Readable.from(jsonOf(accountId, createdAt))));
      const addPhotos = async (): Promise<void> => {
        for await (const photo of ownData.photosOf(accountId)) {
          // WebP is compressed already.
          add(
            `photos/${photo.hash}.webp`,
            false,
            async () => (await photos.openLargest(photo)) ?? Readable.from([]),
          );
        }
        zip.end();
      };
      addPhotos().catch(fail);
      return { archive, createdAt };
    },
  };

  async function* jsonOf(accountId: number, createdAt: Date): AsyncGenerator<string> {
    const head = { format: 'shimlore-own-data', version: 1, createdAt };
    yield JSON.stringify(head).slice(0, -1);
    for (const section of sections) {
      yield `,\n${JSON.stringify(section.name)}:[`;
      let before = '\n';
      for await (const row of ownData.rowsOf(section, accountId)) {
        yield before + JSON.stringify(row);
        before = ',\n';
      }
      yield ']';
    }
    yield '\n}\n';
  }
}
