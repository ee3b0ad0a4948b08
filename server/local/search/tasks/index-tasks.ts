import { ApiError, indexNotFound } from '../http/api-error.js';
import { changedSettings, needsReindexing } from '../settings/settings.js';
import { DocumentWriter } from '../storage/document-store.js';
import type { IndexState } from '../storage/index-catalogue.js';
import type { WorkSurroundings } from './document-tasks.js';
import type { TaskWork } from './task.js';
import type { Done } from './task-runner.js';

/** Does work on whole indexes inside the writer's transaction; undefined where it is other work. */
export async function performIndexWork(work: TaskWork, around: WorkSurroundings): Promise<Done | undefined> {
  switch (work.kind) {
    case 'changeSettings':
      return changeSettings(work, around);
    case 'createIndex':
      return createIndex(work.primaryKey, around);
    case 'updateIndex':
      return updateIndex(work, around);
    case 'deleteIndex':
      return deleteIndex(around);
    case 'swapIndexes':
      return swapIndexes(work.swaps, around);
    case 'compactIndex':
      existing(around.uid, around);
      return { outcome: {} };
    default:
      return undefined;
  }
}

async function changeSettings(
  work: TaskWork & { kind: 'changeSettings' },
  around: WorkSurroundings,
): Promise<Done> {
  const { catalogue, uid, now } = around;
  const found = catalogue.find(uid, catalogue.writer);
  if (!found && !work.mayCreate) throw indexNotFound(uid);
  const before = found ?? catalogue.create(uid, null, now);
  const index: IndexState = {
    ...before,
    settings: changedSettings(before.settings, work.change),
    updatedAt: now,
  };
  catalogue.save(index);
  if (!needsReindexing(before.settings, index.settings)) return { outcome: {} };
  const documents = new DocumentWriter(catalogue.writer, index);
  await documents.rebuild(index);
  documents.flushWords();
  return { outcome: {}, afterCommit: () => catalogue.forgetLexicon(index.id) };
}

function createIndex(primaryKey: string | null, { catalogue, uid, now }: WorkSurroundings): Done {
  if (catalogue.find(uid, catalogue.writer)) {
    throw new ApiError('index_already_exists', `Index \`${uid}\` already exists.`);
  }
  catalogue.create(uid, primaryKey, now);
  return { outcome: {} };
}

function updateIndex(work: TaskWork & { kind: 'updateIndex' }, around: WorkSurroundings): Done {
  const { catalogue, uid, now } = around;
  const index = existing(uid, around);
  const { primaryKey = index.primaryKey, newUid = uid } = work;
  const isFilled = () =>
    catalogue.writer.first(`SELECT 1 AS one FROM documents_${index.id} LIMIT 1`) !== undefined;
  if (primaryKey !== index.primaryKey && index.primaryKey !== null && isFilled()) {
    throw new ApiError(
      'index_primary_key_already_exists',
      `Index \`${uid}\` already has a primary key: \`${index.primaryKey}\`.`,
    );
  }
  if (newUid !== uid && catalogue.find(newUid, catalogue.writer)) {
    throw new ApiError('index_already_exists', `Index \`${newUid}\` already exists.`);
  }
  catalogue.save({ ...index, uid: newUid, primaryKey, updatedAt: now });
  return { outcome: {} };
}

function deleteIndex(around: WorkSurroundings): Done {
  const { catalogue, uid } = around;
  const index = existing(uid, around);
  const counted = catalogue.writer.first<{ n: number }>(`SELECT count(*) AS n FROM documents_${index.id}`);
  catalogue.drop(index);
  return {
    outcome: { details: { deletedDocuments: counted?.n ?? 0 } },
    afterCommit: () => catalogue.forgetLexicon(index.id),
  };
}

function swapIndexes(
  swaps: readonly { readonly indexes: readonly [string, string]; readonly rename?: boolean }[],
  around: WorkSurroundings,
): Done {
  const { catalogue, now } = around;
  for (const { indexes, rename = false } of swaps) {
    const [left, right] = indexes;
    if (rename) {
      if (catalogue.find(right, catalogue.writer)) {
        throw new ApiError('index_already_exists', `Index \`${right}\` already exists.`);
      }
      catalogue.save({ ...existing(left, around), uid: right, updatedAt: now });
    } else catalogue.swap(existing(left, around), existing(right, around));
  }
  return { outcome: {} };
}

function existing(uid: string, { catalogue }: WorkSurroundings): IndexState {
  const index = catalogue.find(uid, catalogue.writer);
  if (!index) throw indexNotFound(uid);
  return index;
}
