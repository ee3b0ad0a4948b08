import { pino } from 'pino';
import { openDatabase } from '../database.js';
import { rebuildSearch } from '../search/rebuild.js';
import { databaseUrl } from './places.js';
import { searchPlace } from './search-place.js';

/** `npm run rebuild-search`: makes the search index anew from the database, while the site runs or not. */
try {
  const knex = openDatabase(databaseUrl(process.env));
  try {
    const say = (line: string): void => console.log(line);
    await rebuildSearch({ ...searchPlace(process.env), knex, clock: () => new Date(), logger: pino(), say });
  } finally {
    await knex.destroy();
  }
} catch (error) {
  console.error((error as Error).message);
  process.exitCode = 1;
}
