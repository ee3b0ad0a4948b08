import { hashPassword } from '../accounts/password.js';
import { openDatabase } from '../database.js';
import { createPhotos } from '../photos/photos.js';
import { seedDemo } from '../../seeds/demo.js';
import { databaseUrl, photoDirectory } from './places.js';

const knex = openDatabase(databaseUrl(process.env));
try {
  const filled = (await knex('accounts').select('id').first()) ?? (await knex('parts').select('id').first());
  if (filled === undefined) {
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
