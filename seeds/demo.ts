import type { Knex } from 'knex';
import type { Photo } from '../shared/contract/photos.js';
import { seedMeasured } from './demo/measured/seed-measured.js';
import { seedAccounts } from './demo/seed-accounts.js';
import { seedBenches } from './demo/seed-benches.js';
import { seedCatalogue } from './demo/seed-catalogue.js';
import { seedDesk } from './demo/seed-desk.js';
import { storePartDrawings, storeRevisionDrawings, storeWriteUpDrawings } from './demo/seed-drawings.js';
import { seedMakerWords } from './demo/seed-maker-words.js';
import { seedMarks } from './demo/seed-marks.js';
import { seedQuestions } from './demo/seed-questions.js';
import { seedRevisionPhotos } from './demo/seed-revision-photos.js';
import { seedWatches } from './demo/seed-watches.js';
import { seedWriteUps } from './demo/seed-write-ups.js';

/** What the seeder is handed; nothing in it is made here. */
export interface DemoSurroundings {
  readonly knex: Knex;
  readonly storePhoto: (bytes: Buffer, alt: string, ownerId: number) => Promise<Photo>;
  readonly now: Date;
  readonly hashPassword: (plain: string) => Promise<string>;
}

/**
 * Fills a migrated, empty database with the demo: the same content in every run, with dates spread over three years
 * before `now`. Throws when the demo is already there. Takes some 20 s on two cores, nearly all of it for drawings.
 */
export async function seedDemo({ knex, storePhoto, now, hashPassword }: DemoSurroundings): Promise<void> {
  // Photos are stored outside the transaction below and need their owners.
  const accounts = await seedAccounts(knex, now, hashPassword);
  const [partPhotos, revisionPhotos, photos] = await Promise.all([
    storePartDrawings(storePhoto, accounts),
    storeRevisionDrawings(storePhoto, accounts),
    storeWriteUpDrawings(storePhoto, accounts),
  ]);
  await knex.transaction(async (trx) => {
    const catalogue = await seedCatalogue(trx, partPhotos);
    await seedRevisionPhotos(trx, { catalogue, photos: revisionPhotos });
    await seedMarks(trx, catalogue);
    await seedWriteUps(trx, { accounts, catalogue, photos, now });
    await seedQuestions(trx, { accounts, catalogue, now });
    await seedMakerWords(trx, { accounts, catalogue, now });
    await seedBenches(trx, { accounts, catalogue, now });
    await seedWatches(trx, { accounts, catalogue, now });
    await seedMeasured(trx, { accounts, catalogue, now });
    await seedDesk(trx, { accounts, now });
  });
}
