import type { Knex } from 'knex';
import { demoAccounts, demoMembers } from '../../seeds/demo/accounts.js';
import { seedDemo } from '../../seeds/demo.js';
import { hashPassword } from '../accounts/password.js';
import { openDatabase } from '../database.js';
import { createPhotos } from '../photos/photos.js';
import { databaseUrl, photoDirectory } from './places.js';

/** `npm run seed [-- --if-empty]`: puts the demo into an empty database; a filled one is left as it is. */
const knex = openDatabase(databaseUrl(process.env));
try {
  if (await isEmpty(knex)) {
    const photos = createPhotos({ knex, photoDir: photoDirectory(process.env), clock: () => new Date() });
    await seedDemo({ knex, storePhoto: photos.service.storePhoto, now: new Date(), hashPassword });
    console.log('The demo is made.');
  } else if (process.argv.includes('--if-empty')) {
    console.log('There is data already; the demo was not made.');
  } else {
    console.error('The database is not empty, so the demo was not made: it goes into an empty one only.');
    process.exitCode = 1;
  }
} finally {
  await knex.destroy();
}

/**
 * Whether there is neither catalogue nor person. The demo's own people without a catalogue are what a run that was cut
 * short leaves, since the rest comes in one transaction after them; they are cleared away.
 */
async function isEmpty(database: Knex): Promise<boolean> {
  if (await database('parts').select('id').first()) return false;
  const ofDemo = [...demoAccounts, ...demoMembers].map((account) => account.email);
  if (await database('accounts').whereNotIn('email', ofDemo).select('id').first()) return false;
  await database.transaction(async (trx) => {
    await trx('photos').delete();
    await trx('accounts').delete();
  });
  return true;
}
