import type { Knex } from 'knex';
import type { Meilisearch } from 'meilisearch';
import type { Logger } from 'pino';
import type { RouteBinding } from '../http/binding.js';
import type { Worker } from '../worker.js';
import { createFacetLabelsStore } from './facet-labels.store.js';
import { defaultIndexUid, ensureSearchIndex } from './index-settings.js';
import { createSearchIndex } from './search-index.js';
import { createSearchOutbox, createSearchOutboxStore, type SearchOutbox } from './search-outbox.store.js';
import { createSearchWorker } from './search-worker.js';
import { searchBindings } from './search.routes.js';
import { createSearchService, type BenchOf, type SearchService } from './search.service.js';
import { createWriteUpDocumentStore } from './write-up-document.store.js';

export type { SearchOutbox };

export interface Search {
  readonly bindings: RouteBinding[];
  readonly service: SearchService;
  readonly outbox: SearchOutbox;
  readonly worker: Worker;
  health(): Promise<{ ok: boolean; detail: string }>;
}

const healthPatienceMs = 2000;

/** Search: the index kept in step through an outbox, and the questions asked of it. `benchOf` reads a member's bench. */
export function createSearch(parts: {
  knex: Knex;
  search: Meilisearch;
  clock: () => Date;
  logger: Logger;
  benchOf: BenchOf;
  indexUid?: string;
}): Search {
  const { knex, search: engine, clock, logger, benchOf, indexUid = defaultIndexUid } = parts;
  const service = createSearchService({ engine, indexUid, labels: createFacetLabelsStore(knex), benchOf });
  const outbox = createSearchOutboxStore(knex);
  return {
    bindings: searchBindings(service),
    service,
    outbox: createSearchOutbox({ clock }),
    worker: createSearchWorker({
      outbox,
      documents: createWriteUpDocumentStore(knex),
      index: createSearchIndex(engine, indexUid),
      prepare: () => ensureSearchIndex(engine, indexUid),
      clock,
      logger,
    }),
    async health() {
      try {
        await engine.multiSearch(
          { queries: [{ indexUid, limit: 0 }] },
          { signal: AbortSignal.timeout(healthPatienceMs) },
        );
        return { ok: true, detail: `${await outbox.count()} write-ups wait for the index` };
      } catch (error) {
        return { ok: false, detail: error instanceof Error ? error.message : 'the engine does not answer' };
      }
    },
  };
}
