import { createHash } from 'node:crypto';
import type { Knex } from 'knex';
import type { Meilisearch } from 'meilisearch';
import type { Logger } from 'pino';
import type { WriteUpDocument } from '../../shared/contract/search.js';
import { ensureSearchIndex } from './index-settings.js';
import { createSearchIndex, type SearchIndex } from './search-index.js';
import { createSearchOutboxStore, type SearchOutboxStore } from './search-outbox.store.js';
import { workBatch } from './search-worker.js';
import { createWriteUpDocumentStore, type WriteUpDocumentStore } from './write-up-document.store.js';

const batchSize = 200;
const taskPatience = { timeout: 60_000 };

export interface RebuildParts {
  readonly knex: Knex;
  readonly engine: Meilisearch;
  readonly indexUid: string;
  readonly clock: () => Date;
  readonly logger: Logger;
  /** Told after each stage, which waits for it. */
  readonly say: (line: string) => void | Promise<void>;
}

/**
 * Makes the index anew from the database while it is being searched and written to.
 *
 * A second index is filled beside the first and the two are swapped in one step, so that there is no moment without
 * results. What changed between the reading of a document and the swap went to the index that is now the old one: so every
 * document is read once more after the swap, and those that differ from what was written are noted in the outbox, which is
 * then worked off. Cost: every write-up is read twice. Run again after a failure; nothing is lost by one.
 */
export async function rebuildSearch(
  parts: RebuildParts,
): Promise<{ written: number; changedMeanwhile: number }> {
  const { knex, engine, indexUid, clock, logger, say } = parts;
  const documents = createWriteUpDocumentStore(knex);
  const outbox = createSearchOutboxStore(knex);
  const besideUid = `${indexUid}-next`;
  await removeIndex(engine, besideUid);
  await ensureSearchIndex(engine, indexUid);
  await ensureSearchIndex(engine, besideUid);

  const written = await fill(documents, createSearchIndex(engine, besideUid));
  await say(`${written.size} write-ups are written beside.`);

  const swapped = await engine
    .swapIndexes([{ indexes: [indexUid, besideUid], rename: false }])
    .waitTask(taskPatience);
  if (swapped.status !== 'succeeded')
    throw new Error(`The indexes could not be swapped: ${swapped.error?.message ?? swapped.status}`);
  await say('The new index answers.');

  const changedMeanwhile = await noteChanges(documents, outbox, clock(), written);
  const index = createSearchIndex(engine, indexUid);
  while ((await workBatch({ outbox, documents, index, clock, logger })) > 0);
  await removeIndex(engine, besideUid);
  await say(`${changedMeanwhile} write-ups had changed meanwhile; the old index is gone.`);
  return { written: written.size, changedMeanwhile };
}

/** Writes every published write-up; gives a fingerprint of each document. */
async function fill(documents: WriteUpDocumentStore, index: SearchIndex): Promise<Map<number, string>> {
  const fingerprints = new Map<number, string>();
  for await (const { found } of batchesOf(documents)) {
    await index.put([...found.values()]);
    for (const [id, document] of found) fingerprints.set(id, fingerprintOf(document));
  }
  return fingerprints;
}

/** Notes every write-up whose document is no longer the one that was written. */
async function noteChanges(
  documents: WriteUpDocumentStore,
  outbox: SearchOutboxStore,
  now: Date,
  written: ReadonlyMap<number, string>,
): Promise<number> {
  let changes = 0;
  const unseen = new Set(written.keys());
  for await (const { ids, found } of batchesOf(documents)) {
    const changed = ids.filter((id) => {
      const document = found.get(id);
      return written.get(id) !== (document && fingerprintOf(document));
    });
    await outbox.addAll(changed, now);
    for (const id of ids) unseen.delete(id);
    changes += changed.length;
  }
  await outbox.addAll([...unseen], now);
  return changes + unseen.size;
}

async function* batchesOf(
  documents: WriteUpDocumentStore,
): AsyncGenerator<{ ids: number[]; found: Map<number, WriteUpDocument> }> {
  let ids = await documents.idsAfter(0, batchSize);
  while (ids.length > 0) {
    yield { ids, found: await documents.documentsOf(ids) };
    ids = await documents.idsAfter(ids.at(-1) ?? 0, batchSize);
  }
}

function fingerprintOf(document: WriteUpDocument): string {
  return createHash('sha256').update(JSON.stringify(document)).digest('base64');
}

/** Removes what an interrupted run may have left, or nothing. */
async function removeIndex(engine: Meilisearch, uid: string): Promise<void> {
  const task = await engine.deleteIndex(uid).waitTask(taskPatience);
  if (task.status !== 'succeeded' && task.error?.code !== 'index_not_found') {
    throw new Error(`Index ${uid} could not be removed: ${task.error?.message ?? task.status}`);
  }
}
