import { Router, type Request, type Response } from 'express';
import { FilterSyntaxError } from '../filter/filter-tokens.js';
import { filterSql, readFilter } from '../filter/filter-sql.js';
import { hitOrder, readSort } from '../query/hit-order.js';
import { project, shownPaths } from '../query/projection.js';
import type { SqlValue } from '../storage/connection.js';
import type { Document } from '../storage/flatten.js';
import type { IndexState } from '../storage/index-catalogue.js';
import { ApiError } from './api-error.js';
import { documentsInBody } from './documents-body.js';
import {
  countParam,
  jsonBody,
  objectBody,
  onlyFields,
  onlyParams,
  optionalJsonBody,
  param,
  pathParam,
} from './input.js';
import { enqueue, indexInPath, uidInPath, type Surroundings } from './surroundings.js';

const putParams = ['primaryKey', 'csvDelimiter', 'customMetadata', 'skipCreation'];

/** Documents of an index: adding, merging, reading, deleting. */
export function documentRoutes(around: Surroundings): Router {
  const router = Router();
  const path = '/indexes/:uid/documents';

  router.post(path, (request, response) => put(around, request, response, false));
  router.put(path, (request, response) => put(around, request, response, true));

  router.get(path, (request, response) => {
    const { index } = indexInPath(around, request, 'documents.get');
    onlyParams(request, ['offset', 'limit', 'fields', 'filter', 'retrieveVectors', 'ids', 'sort']);
    const list = (name: string) => param(request, name)?.split(',');
    response.json(
      listed(around, index, {
        offset: countParam(request, 'offset', 'invalid_document_offset', 0),
        limit: countParam(request, 'limit', 'invalid_document_limit', 20),
        fields: list('fields'),
        filter: param(request, 'filter'),
        ids: list('ids'),
        sort: list('sort'),
      }),
    );
  });

  router.post(`${path}/fetch`, (request, response) => {
    const { index } = indexInPath(around, request, 'documents.get');
    const body = objectBody(optionalJsonBody(request));
    onlyFields(body, ['offset', 'limit', 'fields', 'filter', 'retrieveVectors', 'ids', 'sort']);
    response.json(
      listed(around, index, {
        offset: countField(body, 'offset', 0),
        limit: countField(body, 'limit', 20),
        fields: textsField(body, 'fields'),
        filter: body['filter'],
        ids: textsField(body, 'ids'),
        sort: textsField(body, 'sort'),
      }),
    );
  });

  router.post(`${path}/delete-batch`, (request, response) => {
    const { uid } = uidInPath(around, request, 'documents.delete');
    const body = jsonBody(request);
    if (!Array.isArray(body))
      throw new ApiError('bad_request', 'Invalid value type: expected an array of identifiers');
    remove(around, request, response, uid, body);
  });

  router.post(`${path}/delete`, (request, response) => {
    const { uid } = uidInPath(around, request, 'documents.delete');
    const body = objectBody(jsonBody(request));
    onlyFields(body, ['filter']);
    if (body['filter'] === undefined) throw new ApiError('missing_document_filter', 'Missing field `filter`');
    refusingFilter(() => readFilter(body['filter']));
    enqueue(around, request, response, {
      indexUid: uid,
      type: 'documentDeletion',
      work: { kind: 'removeFiltered', filter: body['filter'] },
      details: { providedIds: 0, deletedDocuments: null, originalFilter: filterText(body['filter']) },
    });
  });

  router.delete(path, (request, response) => {
    const { uid } = uidInPath(around, request, 'documents.delete');
    enqueue(around, request, response, {
      indexUid: uid,
      type: 'documentDeletion',
      work: { kind: 'removeAllDocuments' },
      details: { providedIds: 0, deletedDocuments: null, originalFilter: null },
    });
  });

  router.get(`${path}/:id`, (request, response) => {
    const { index } = indexInPath(around, request, 'documents.get');
    const id = pathParam(request, 'id');
    const row = around.catalogue.reader.first<{ body: string }>(
      `SELECT body FROM documents_${index.id} WHERE doc_id = ?`,
      [id],
    );
    if (!row) throw new ApiError('document_not_found', `Document \`${id}\` not found.`);
    response.json(shown(index, row.body, param(request, 'fields')?.split(',')));
  });

  router.delete(`${path}/:id`, (request, response) => {
    const { uid } = uidInPath(around, request, 'documents.delete');
    remove(around, request, response, uid, [pathParam(request, 'id')]);
  });

  return router;
}

function put(around: Surroundings, request: Request, response: Response, merge: boolean): void {
  const { uid } = uidInPath(around, request, 'documents.add');
  onlyParams(request, putParams);
  const documents = documentsInBody(request, param(request, 'csvDelimiter'));
  enqueue(around, request, response, {
    indexUid: uid,
    type: 'documentAdditionOrUpdate',
    work: {
      kind: 'putDocuments',
      merge,
      skipCreation: param(request, 'skipCreation') === 'true',
      primaryKey: param(request, 'primaryKey') ?? null,
      documents,
    },
    details: { receivedDocuments: documents.length, indexedDocuments: null },
  });
}

function remove(
  around: Surroundings,
  request: Request,
  response: Response,
  uid: string,
  given: readonly unknown[],
): void {
  const ids = given.map((id) => {
    if (typeof id === 'string' || typeof id === 'number') return String(id);
    throw new ApiError(
      'invalid_document_id',
      `Document identifier \`${JSON.stringify(id).slice(0, 100)}\` is neither a number nor a text.`,
    );
  });
  enqueue(around, request, response, {
    indexUid: uid,
    type: 'documentDeletion',
    work: { kind: 'removeDocuments', ids },
    details: { providedIds: ids.length, deletedDocuments: null, originalFilter: null },
  });
}

interface Wanted {
  readonly offset: number;
  readonly limit: number;
  readonly fields: readonly string[] | undefined;
  readonly filter: unknown;
  readonly ids: readonly string[] | undefined;
  readonly sort: readonly string[] | undefined;
}

function listed(around: Surroundings, index: IndexState, wanted: Wanted) {
  const { reader } = around.catalogue;
  const tests = ['1'];
  const values: SqlValue[] = [];
  const filter = refusingFilter(() => {
    const parsed = readFilter(wanted.filter);
    return parsed && filterSql(parsed, index, 'h.num');
  });
  if (filter) {
    tests.push(filter.text);
    values.push(...filter.values);
  }
  if (wanted.ids) {
    tests.push('h.doc_id IN (SELECT value FROM json_each(?))');
    values.push(JSON.stringify(wanted.ids));
  }
  const order = hitOrder(readSort(wanted.sort ?? [], index, 'invalid_document_sort'), {
    ...index,
    settings: { ...index.settings, rankingRules: ['sort'] },
  });
  const from = `FROM (SELECT num, num AS doc, doc_id, body FROM documents_${index.id}) h WHERE ${tests.join(' AND ')}`;
  const total = reader.first<{ n: number }>(`SELECT count(*) AS n ${from}`, values)?.n ?? 0;
  const rows = reader.all<{ body: string }>(`SELECT body ${from} ORDER BY ${order.text} LIMIT ? OFFSET ?`, [
    ...values,
    ...order.values,
    wanted.limit,
    wanted.offset,
  ]);
  const results = rows.map(({ body }) => shown(index, body, wanted.fields));
  return { results, offset: wanted.offset, limit: wanted.limit, total };
}

function shown(index: IndexState, body: string, fields: readonly string[] | undefined): Document {
  const paths = shownPaths(fields ?? ['*'], index.settings.displayedAttributes);
  return project(JSON.parse(body) as Document, paths);
}

function refusingFilter<Result>(read: () => Result): Result {
  try {
    return read();
  } catch (error) {
    if (error instanceof FilterSyntaxError) throw new ApiError('invalid_document_filter', error.message);
    throw error;
  }
}

const filterText = (filter: unknown): string =>
  typeof filter === 'string' ? filter : JSON.stringify(filter);

function countField(
  body: Readonly<Record<string, unknown>>,
  name: 'offset' | 'limit',
  otherwise: number,
): number {
  const value = body[name] ?? otherwise;
  if (typeof value === 'number' && Number.isSafeInteger(value) && value >= 0) return value;
  throw new ApiError(
    `invalid_document_${name}`,
    `Invalid value at \`.${name}\`: expected a positive integer`,
  );
}

function textsField(body: Readonly<Record<string, unknown>>, name: string): string[] | undefined {
  const value = body[name] ?? undefined;
  if (value === undefined) return undefined;
  const isList =
    Array.isArray(value) && value.every((each) => typeof each === 'string' || typeof each === 'number');
  if (isList) return value.map(String);
  throw new ApiError(`invalid_document_${name}`, `Invalid value at \`.${name}\`: expected an array of texts`);
}
