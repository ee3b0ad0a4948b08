import type { Logger } from 'pino';
import { repeatedly, type Worker } from '../worker.js';
import { TaskFailed, type SearchIndex } from './search-index.js';
import type { ClaimedNote, SearchOutboxStore } from './search-outbox.store.js';
import type { WriteUpDocumentStore } from './write-up-document.store.js';

const batchSize = 200;
/** Longer than a batch can take; a worker that died keeps its notes from others for as long. */
const leaseMs = 30_000;
const pauseMs = 120;
const longestRestMs = 10_000;

export interface SearchWorkerParts {
  readonly outbox: SearchOutboxStore;
  readonly documents: WriteUpDocumentStore;
  readonly index: SearchIndex;
  /** Makes the index where it is missing; asked until it has worked once. */
  readonly prepare: () => Promise<void>;
  readonly clock: () => Date;
  readonly logger: Logger;
}

/**
 * Brings the index up to what the database says for every write-up noted in the outbox. Each note is worked at least
 * once; doing it twice changes nothing, since the whole document is made anew from the database each time.
 */
export function createSearchWorker(parts: SearchWorkerParts): Worker {
  const { logger } = parts;
  let prepared = false;
  let failures = 0;
  let restUntil = 0;

  async function round(): Promise<{ more: boolean }> {
    if (performance.now() < restUntil) return { more: false };
    if (!prepared) {
      await parts.prepare();
      prepared = true;
    }
    const worked = await workBatch(parts);
    failures = 0;
    return { more: worked === batchSize };
  }

  return repeatedly({
    round,
    pauseMs,
    onError(error) {
      failures += 1;
      restUntil = performance.now() + Math.min(longestRestMs, 250 * 2 ** Math.min(failures, 10));
      logger.warn({ err: error, failures }, 'the search index waits for its engine or database');
    },
  });
}

/** Works one batch of due notes; gives how many there were. Failures of the engine are noted on the rows, never thrown. */
export async function workBatch({
  outbox,
  documents,
  index,
  clock,
  logger,
}: Omit<SearchWorkerParts, 'prepare'>): Promise<number> {
  const now = clock();
  const notes = await outbox.claim(now, new Date(now.getTime() + leaseMs), batchSize);
  if (notes.length === 0) return 0;
  try {
    await bringUp(notes);
    await outbox.settle(idsOf(notes));
  } catch (error) {
    if (error instanceof TaskFailed && new Set(notes.map((note) => note.writeUpId)).size > 1)
      await oneByOne(notes);
    else await postpone(notes, error);
  }
  return notes.length;

  async function bringUp(some: readonly ClaimedNote[]): Promise<void> {
    const ids = [...new Set(some.map((note) => note.writeUpId))];
    const found = await documents.documentsOf(ids);
    await index.put([...found.values()]);
    await index.remove(ids.filter((id) => !found.has(id)));
  }

  /** One document that the engine refuses must not keep the others out. */
  async function oneByOne(all: readonly ClaimedNote[]): Promise<void> {
    for (const id of new Set(all.map((note) => note.writeUpId))) {
      const some = all.filter((note) => note.writeUpId === id);
      await bringUp(some).then(
        () => outbox.settle(idsOf(some)),
        (error: unknown) => postpone(some, error),
      );
    }
  }

  async function postpone(some: readonly ClaimedNote[], error: unknown): Promise<void> {
    logger.warn(
      { err: error, writeUpIds: some.map((note) => note.writeUpId) },
      'write-ups could not be brought into the search index; will try again',
    );
    await outbox.postpone(idsOf(some), clock(), error instanceof Error ? error.message : String(error));
  }
}

function idsOf(notes: readonly ClaimedNote[]): number[] {
  return notes.map((note) => note.id);
}
