import type { Knex } from 'knex';
import type { Meilisearch } from 'meilisearch';
import { pino } from 'pino';
import { openDatabase } from '../database.js';
import { rebuildSearch } from '../search/rebuild.js';
import { createSearchIndex } from '../search/search-index.js';
import { createSearchOutboxStore } from '../search/search-outbox.store.js';
import { workBatch } from '../search/search-worker.js';
import { createWriteUpDocumentStore } from '../search/write-up-document.store.js';
import { databaseUrl } from './places.js';
import { searchPlace } from './search-place.js';

/**
 * `npm run rebuild-search`: makes the search index anew from the database, while the site runs or not. With
 * `--if-needed` only where it does not hold as many write-ups as are published.
 */
try {
  const { engine, indexUid } = searchPlace(process.env);
  const knex = openDatabase(databaseUrl(process.env));
  try {
    if (process.argv.includes('--if-needed') && (await holdsAll(knex, engine, indexUid))) {
      console.log('The search index holds every published write-up.');
    } else {
      await rebuild(knex, engine, indexUid);
    }
  } finally {
    await knex.destroy();
  }
} catch (error) {
  console.error((error as Error).message);
  process.exitCode = 1;
}

async function holdsAll(knex: Knex, engine: Meilisearch, indexUid: string): Promise<boolean> {
  const row = await knex('write_ups').whereNotNull('published_edition_id').count({ count: '*' }).first();
  const { indexes } = await engine.getStats();
  return indexes[indexUid]?.numberOfDocuments === Number(row?.count);
}

async function rebuild(knex: Knex, engine: Meilisearch, indexUid: string): Promise<void> {
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
}
