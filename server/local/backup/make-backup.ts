import { cp, mkdir, rename, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { dumpDatabase } from './client-programs.js';
import { filesUnder, writeManifest } from './manifest.js';

export interface BackupPlaces {
  readonly databaseUrl: string;
  readonly photoDir: string;
}

/**
 * Makes a folder named by the instant in `targetDir`, with the database as SQL, the photos and a note of all hashes.
 * The database comes first: a photo's files are there before its row and are never changed, so each row in the dump has
 * its files in the copy made after it. The folder gets its name when it is complete. The app may run meanwhile.
 *
 * @returns path of the folder
 */
export async function makeBackup(
  places: BackupPlaces,
  targetDir: string,
  clock: () => Date,
): Promise<string> {
  const madeAt = clock();
  const folder = join(targetDir, madeAt.toISOString().replace(/[:.]/g, '-'));
  const unfinished = `${folder}.unfinished`;
  await mkdir(join(unfinished, 'photos'), { recursive: true, mode: 0o700 });
  try {
    await dumpDatabase(places.databaseUrl, join(unfinished, 'database.sql'));
    for (const path of await filesUnder(places.photoDir)) {
      await cp(join(places.photoDir, path), join(unfinished, 'photos', path));
    }
    await writeManifest(unfinished, madeAt);
    await rename(unfinished, folder);
    return folder;
  } catch (error) {
    await rm(unfinished, { recursive: true, force: true });
    throw error;
  }
}
