import { setImmediate } from 'node:timers/promises';
import { FilterSyntaxError } from '../filter/filter-tokens.js';
import { filterSql, readFilter } from '../filter/filter-sql.js';
import { ApiError, indexNotFound } from '../http/api-error.js';
import { DocumentWriter } from '../storage/document-store.js';
import type { IndexCatalogue, IndexState } from '../storage/index-catalogue.js';
import { documentId, primaryKeyFor } from './primary-key.js';
import type { TaskWork } from './task.js';
import type { Done } from './task-runner.js';

export interface WorkSurroundings {
  readonly catalogue: IndexCatalogue;
  /** The index the task is about; empty where it is about none. */
  readonly uid: string;
  readonly now: string;
}

/** Other requests get in between after this many documents. */
const batch = 100;

/** Does work on documents inside the writer's transaction; undefined where it is other work. */
export async function performDocumentWork(
  work: TaskWork,
  around: WorkSurroundings,
): Promise<Done | undefined> {
  switch (work.kind) {
    case 'putDocuments':
      return putDocuments(work, around);
    case 'removeDocuments':
      return removeDocuments(work.ids, around);
    case 'removeFiltered':
      return removeDocuments(idsByFilter(work.filter, around), around);
    case 'removeAllDocuments':
      return removeAll(around);
    default:
      return undefined;
  }
}

async function putDocuments(
  work: TaskWork & { kind: 'putDocuments' },
  around: WorkSurroundings,
): Promise<Done> {
  const { catalogue, now } = around;
  const { writer } = catalogue;
  const found = catalogue.find(around.uid, writer) ?? catalogue.create(around.uid, work.primaryKey, now);
  const primaryKey = primaryKeyFor(found, work, () => isEmpty(around, found));
  const fields = [
    ...new Set([...found.fields, ...work.documents.flatMap((document) => Object.keys(document))]),
  ];
  const index: IndexState = { ...found, primaryKey, fields, updatedAt: now };
  catalogue.save(index);
  const documents = new DocumentWriter(writer, index);
  const widens = fields.length > found.fields.length && index.settings.searchableAttributes.includes('*');
  if (widens) await documents.rebuild(index);
  let indexed = 0;
  for (const document of work.documents) {
    const id = documentId(document, primaryKey);
    const before = work.merge || work.skipCreation ? documents.read(id)?.document : undefined;
    if (!before && work.skipCreation) continue;
    documents.put(id, work.merge ? { ...before, ...document } : document);
    if (++indexed % batch === 0) await setImmediate();
  }
  documents.flushWords();
  return {
    outcome: { details: { indexedDocuments: indexed } },
    afterCommit: () => keepWords(catalogue, index.id, documents, widens),
  };
}

async function removeDocuments(ids: readonly string[], around: WorkSurroundings): Promise<Done> {
  const index = existing(around);
  const documents = new DocumentWriter(around.catalogue.writer, index);
  let deleted = 0;
  for (const [at, id] of ids.entries()) {
    if (documents.remove(id)) deleted++;
    if (at % batch === batch - 1) await setImmediate();
  }
  documents.flushWords();
  around.catalogue.save({ ...index, updatedAt: around.now });
  return {
    outcome: { details: { deletedDocuments: deleted } },
    afterCommit: () => keepWords(around.catalogue, index.id, documents, false),
  };
}

function removeAll(around: WorkSurroundings): Done {
  const index = existing(around);
  const deleted = new DocumentWriter(around.catalogue.writer, index).removeAll();
  around.catalogue.save({ ...index, updatedAt: around.now });
  return {
    outcome: { details: { deletedDocuments: deleted } },
    afterCommit: () => around.catalogue.forgetLexicon(index.id),
  };
}

function idsByFilter(filter: unknown, around: WorkSurroundings): string[] {
  const index = existing(around);
  try {
    const parsed = readFilter(filter);
    if (!parsed) return [];
    const { text, values } = filterSql(parsed, index, 'd.num');
    return around.catalogue.writer
      .all<{ doc_id: string }>(`SELECT doc_id FROM documents_${index.id} d WHERE ${text}`, values)
      .map((row) => row.doc_id);
  } catch (error) {
    if (error instanceof FilterSyntaxError) throw new ApiError('invalid_document_filter', error.message);
    throw error;
  }
}

function existing(around: WorkSurroundings): IndexState {
  const index = around.catalogue.find(around.uid, around.catalogue.writer);
  if (!index) throw indexNotFound(around.uid);
  return index;
}

function isEmpty(around: WorkSurroundings, index: IndexState): boolean {
  return !around.catalogue.writer.first(`SELECT 1 AS one FROM documents_${index.id} LIMIT 1`);
}

function keepWords(catalogue: IndexCatalogue, id: number, documents: DocumentWriter, rebuilt: boolean): void {
  if (rebuilt) catalogue.forgetLexicon(id);
  else catalogue.adjustLexicon(id, documents.wordChanges);
}
