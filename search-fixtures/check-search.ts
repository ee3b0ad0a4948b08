import { pino } from 'pino';
import { openDatabase } from '../server/database.js';
import { visitor } from '../server/http/caller.js';
import { databaseUrl } from '../server/local/places.js';
import { searchPlace } from '../server/local/search-place.js';
import { createSearch } from '../server/search/search.js';
import { judgeSearch, judgementLines } from './judge-search.js';

/** `npm run check:search`: judges the configured engine, through the product's own search, on the demo's write-ups. */
try {
  const { engine, indexUid } = searchPlace(process.env);
  const knex = openDatabase(databaseUrl(process.env));
  try {
    const { service } = createSearch({
      knex,
      search: engine,
      indexUid,
      clock: () => new Date(),
      logger: pino(),
      benchOf: () => Promise.resolve([]),
    });
    const judgement = await judgeSearch((query) => service.search(query, visitor));
    for (const line of judgementLines(judgement)) console.log(line);
  } finally {
    await knex.destroy();
  }
} catch (error) {
  console.error((error as Error).message);
  process.exitCode = 1;
}
