import { Router } from 'express';
import type { IndexState } from '../storage/index-catalogue.js';
import { matchesIndex } from './access.js';
import { ApiError } from './api-error.js';
import { countParam, indexUid, jsonBody, objectBody, onlyFields, onlyParams } from './input.js';
import { enqueue, indexInPath, uidInPath, type Surroundings } from './surroundings.js';

/** Indexes as a whole: making, listing, changing, deleting, swapping. */
export function indexRoutes(around: Surroundings): Router {
  const router = Router();

  router.get('/indexes', (request, response) => {
    const caller = around.access.caller(request, 'indexes.get');
    onlyParams(request, ['offset', 'limit']);
    const offset = countParam(request, 'offset', 'invalid_index_offset', 0);
    const limit = countParam(request, 'limit', 'invalid_index_limit', 20);
    const all = around.catalogue
      .list()
      .filter(({ uid }) => caller.indexes.some((each) => matchesIndex(each, uid)));
    response.json({
      results: all.slice(offset, offset + limit).map(described),
      offset,
      limit,
      total: all.length,
    });
  });

  router.post('/indexes', (request, response) => {
    const caller = around.access.caller(request, 'indexes.create');
    const body = objectBody(jsonBody(request));
    onlyFields(body, ['uid', 'primaryKey']);
    if (body['uid'] === undefined) throw new ApiError('missing_index_uid', 'Missing field `uid`');
    const uid = indexUid(body['uid']);
    around.access.checkIndex(caller, uid);
    const primaryKey = primaryKeyField(body) ?? null;
    enqueue(around, request, response, {
      indexUid: uid,
      type: 'indexCreation',
      work: { kind: 'createIndex', primaryKey },
      details: { primaryKey },
    });
  });

  router.get('/indexes/:uid', (request, response) => {
    response.json(described(indexInPath(around, request, 'indexes.get').index));
  });

  router.patch('/indexes/:uid', (request, response) => {
    const { uid, caller } = uidInPath(around, request, 'indexes.update');
    const body = objectBody(jsonBody(request));
    onlyFields(body, ['primaryKey', 'uid']);
    const primaryKey = primaryKeyField(body);
    const newUid = body['uid'] === undefined || body['uid'] === null ? undefined : indexUid(body['uid']);
    if (newUid !== undefined) around.access.checkIndex(caller, newUid);
    enqueue(around, request, response, {
      indexUid: uid,
      type: 'indexUpdate',
      work: {
        kind: 'updateIndex',
        ...(primaryKey === undefined ? {} : { primaryKey }),
        ...(newUid === undefined ? {} : { newUid }),
      },
      details: {
        primaryKey: primaryKey ?? null,
        ...(newUid === undefined ? {} : { oldIndexUid: uid, newIndexUid: newUid }),
      },
    });
  });

  router.delete('/indexes/:uid', (request, response) => {
    const { uid } = uidInPath(around, request, 'indexes.delete');
    enqueue(around, request, response, {
      indexUid: uid,
      type: 'indexDeletion',
      work: { kind: 'deleteIndex' },
      details: { deletedDocuments: null },
    });
  });

  router.post('/indexes/:uid/compact', (request, response) => {
    const { uid } = uidInPath(around, request, 'indexes.update');
    enqueue(around, request, response, {
      indexUid: uid,
      type: 'indexCompaction',
      work: { kind: 'compactIndex' },
      details: {},
    });
  });

  router.post('/swap-indexes', (request, response) => {
    const caller = around.access.caller(request, 'indexes.swap');
    const swaps = readSwaps(jsonBody(request));
    for (const { indexes } of swaps) for (const uid of indexes) around.access.checkIndex(caller, uid);
    enqueue(around, request, response, {
      indexUid: null,
      type: 'indexSwap',
      work: { kind: 'swapIndexes', swaps },
      details: { swaps },
    });
  });

  return router;
}

const described = ({ uid, primaryKey, createdAt, updatedAt }: IndexState) => ({
  uid,
  createdAt,
  updatedAt,
  primaryKey,
});

function primaryKeyField(body: Readonly<Record<string, unknown>>): string | null | undefined {
  const value = body['primaryKey'];
  if (value === undefined || value === null || (typeof value === 'string' && value !== '')) return value;
  throw new ApiError('invalid_index_primary_key', 'Invalid value at `.primaryKey`: expected a text');
}

function readSwaps(body: unknown): { indexes: [string, string]; rename?: boolean }[] {
  if (!Array.isArray(body))
    throw new ApiError('bad_request', 'Invalid value type: expected an array of swaps');
  const swaps = body.map((each: unknown) => {
    const swap = objectBody(each);
    onlyFields(swap, ['indexes', 'rename']);
    const { indexes, rename } = swap as { indexes?: unknown; rename?: unknown };
    if (indexes === undefined)
      throw new ApiError('missing_swap_indexes', 'Missing field `indexes` inside `[0]`');
    if (!Array.isArray(indexes) || indexes.length !== 2) {
      throw new ApiError('invalid_swap_indexes', 'Two indexes must be given for each swap.');
    }
    if (rename !== undefined && typeof rename !== 'boolean') {
      throw new ApiError('invalid_swap_rename', 'Invalid value at `.rename`: expected true or false');
    }
    const pair: [string, string] = [indexUid(indexes[0]), indexUid(indexes[1])];
    return rename === undefined ? { indexes: pair } : { indexes: pair, rename };
  });
  const names = swaps.flatMap(({ indexes }) => indexes);
  const twice = names.find((name, at) => names.indexOf(name) !== at);
  if (twice !== undefined) {
    throw new ApiError(
      'invalid_swap_duplicate_index_found',
      `Indexes must be declared only once during a swap. \`${twice}\` was specified several times.`,
    );
  }
  return swaps;
}
