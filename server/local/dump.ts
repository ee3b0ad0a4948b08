import { openDatabase } from '../database.js';
import { dumpPath, makeDump } from '../dump/dump-file.js';
import { databaseUrl, dumpDirectory } from './places.js';

/** `npm run dump`: makes the dump of published knowledge now, while the site runs or not. */
try {
  const knex = openDatabase(databaseUrl(process.env));
  try {
    const folder = dumpDirectory(process.env);
    const publicAddress =
      process.env['PUBLIC_ADDRESS'] || `http://localhost:${process.env['PORT'] || '4310'}`;
    const { counts, bytes } = await makeDump(knex, { folder, publicAddress }, new Date());
    const records = counts.reduce((sum, { count }) => sum + count, 0);
    console.log(`${records} records, ${bytes} bytes: ${dumpPath(folder)}`);
  } finally {
    await knex.destroy();
  }
} catch (error) {
  console.error((error as Error).message);
  process.exitCode = 1;
}
