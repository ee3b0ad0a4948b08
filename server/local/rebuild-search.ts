import { pino } from 'pino';
import { openDatabase } from '../database.js';
import { rebuildSearch } from '../search/rebuild.js';
import { createSearchIndex } from '../search/search-index.js';
import { createSearchOutboxStore } from '../search/search-outbox.store.js';
import { workBatch } from '../search/search-worker.js';
import { createWriteUpDocumentStore } from '../search/write-up-document.store.js';
import { databaseUrl } from './places.js';
import { searchPlace } from './search-place.js';

/** `npm run rebuild-search`: makes the search index anew from the database, while the site runs or not. */
try {
  const { engine, indexUid } = searchPlace(process.env);
  const knex = openDatabase(databaseUrl(process.env));
  try {
    const clock = (): Date => new Date();
    const documents = createWriteUpDocumentStore(knex);
    const outbox = createSearchOutboxStore(knex);
    const index = createSearchIndex(engine, indexUid);
    await rebuildSearch({
      engine,
      indexUid,
      documents,
      outbox,
      clock,
      workBatch: () => workBatch({ outbox, documents, index, clock, logger: pino() }),
      say: (line) => console.log(line),
    });
  } finally {
    await knex.destroy();
  }
} catch (error) {
  console.error((error as Error).message);
  process.exitCode = 1;
}
