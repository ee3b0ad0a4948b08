import type { EnqueuedTaskPromise, Meilisearch } from 'meilisearch';
import type { WriteUpDocument } from '../../shared/contract/search.js';

const taskPatience = { timeout: 10_000, interval: 25 };

export type SearchIndex = ReturnType<typeof createSearchIndex>;

/** The index as the outbox fills it; each call resolves when the engine has done it and throws when it has not. */
export function createSearchIndex(engine: Meilisearch, uid: string) {
  const index = engine.index<WriteUpDocument>(uid);
  return {
    async put(documents: WriteUpDocument[]): Promise<void> {
      if (documents.length > 0) await finish(index.addDocuments(documents, { primaryKey: 'id' }));
    },
    async remove(writeUpIds: number[]): Promise<void> {
      if (writeUpIds.length > 0) await finish(index.deleteDocuments(writeUpIds));
    },
  };
}

async function finish(enqueued: EnqueuedTaskPromise): Promise<void> {
  const task = await enqueued.waitTask(taskPatience);
  if (task.status !== 'succeeded') throw new TaskFailed(task.error?.message ?? `the task is ${task.status}`);
}

/** The engine took the task and could not do it: something in it is wrong. */
export class TaskFailed extends Error {}
