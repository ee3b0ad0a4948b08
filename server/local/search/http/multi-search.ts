import { z } from 'zod';
import { answerSearch } from '../query/answer-search.js';
import { federated, type FederatedQuery } from '../query/federated-search.js';
import { readSearch } from '../query/search-request.js';
import { tokenFilter, type Caller } from './access.js';
import { ApiError, indexNotFound } from './api-error.js';
import { indexUid, objectBody, onlyFields } from './input.js';
import type { Surroundings } from './surroundings.js';

const count = z.number().int().min(0).max(Number.MAX_SAFE_INTEGER);
const FederationShape = z.strictObject({
  limit: count.optional(),
  offset: count.optional(),
  page: count.optional(),
  hitsPerPage: count.optional(),
  facetsByIndex: z.record(z.string(), z.array(z.string()).nullable()).optional(),
  mergeFacets: z.strictObject({ maxValuesPerFacet: count.nullable().optional() }).nullable().optional(),
  distinct: z.string().nullable().optional(),
  showPerformanceDetails: z.boolean().optional(),
});
const OptionsShape = z.strictObject({
  weight: z.number().min(0).optional(),
  queryPosition: count.optional(),
  remote: z.null().optional(),
});

/** Several searches in one: each with its own answer or, with `federation`, all their hits in one list. */
export function answerMultiSearch(
  around: Surroundings,
  caller: Caller,
  input: unknown,
): Record<string, unknown> {
  const body = objectBody(input);
  onlyFields(body, ['queries', 'federation']);
  const given = body['queries'];
  if (given === undefined) throw new ApiError('bad_request', 'Missing field `queries`');
  if (!Array.isArray(given))
    throw new ApiError('bad_request', 'Invalid value type at `.queries`: expected an array');
  const isFederated = body['federation'] !== undefined && body['federation'] !== null;
  const queries = given.map((each, at) => inPlace(at, () => readQuery(around, caller, each, isFederated)));
  if (isFederated) return federated(around.catalogue, queries, readFederation(body['federation']));
  const results = queries.map(({ index, request, extraFilter }, at) =>
    inPlace(at, () => ({
      indexUid: index.uid,
      ...answerSearch(around.catalogue, index, request, extraFilter),
    })),
  );
  return { results };
}

function readQuery(
  around: Surroundings,
  caller: Caller,
  input: unknown,
  isFederated: boolean,
): FederatedQuery {
  const query = objectBody(input);
  if (query['indexUid'] === undefined) throw new ApiError('missing_index_uid', 'Missing field `indexUid`');
  const uid = indexUid(query['indexUid']);
  around.access.checkIndex(caller, uid);
  const index = around.catalogue.find(uid);
  if (!index) throw indexNotFound(uid);
  const request = readSearch(query, ['indexUid', 'federationOptions', 'facetName', 'facetQuery']);
  const options = query['federationOptions'] ?? undefined;
  if (!isFederated && options !== undefined) {
    throw new ApiError(
      'invalid_multi_search_federation_options',
      'Using `federationOptions` is not allowed in a non-federated search. Add `federation` to the request.',
    );
  }
  if (isFederated) refuseInFederation(query);
  const parsed = OptionsShape.safeParse(options ?? {});
  if (!parsed.success) {
    const [issue] = parsed.error.issues;
    throw new ApiError(
      'invalid_multi_search_weight',
      `Invalid value at \`.federationOptions.${issue?.path.join('.') ?? ''}\`: ${issue?.message ?? ''}`,
    );
  }
  return { index, request, extraFilter: tokenFilter(caller, uid), weight: parsed.data.weight ?? 1 };
}

function refuseInFederation(query: Readonly<Record<string, unknown>>): void {
  const paging = ['limit', 'offset', 'page', 'hitsPerPage'].find(
    (name) => query[name] !== undefined && query[name] !== null,
  );
  if (paging !== undefined) {
    throw new ApiError(
      'invalid_multi_search_query_pagination',
      `Using \`${paging}\` is not allowed inside a query of a federated search: put it under \`federation\`.`,
    );
  }
  if (Array.isArray(query['facets']) && query['facets'].length > 0) {
    throw new ApiError(
      'invalid_multi_search_query_facets',
      'Using `facets` is not allowed inside a query of a federated search: use `federation.facetsByIndex`.',
    );
  }
}

function readFederation(input: unknown) {
  const parsed = FederationShape.safeParse(input);
  if (parsed.success) return parsed.data;
  const [issue] = parsed.error.issues;
  throw new ApiError(
    'invalid_multi_search_federation',
    `Invalid value at \`.federation.${issue?.path.join('.') ?? ''}\`: ${issue?.message ?? ''}`,
  );
}

function inPlace<Result>(at: number, work: () => Result): Result {
  try {
    return work();
  } catch (error) {
    if (error instanceof ApiError && error.code !== 'invalid_api_key') {
      throw new ApiError(error.code, `Inside \`.queries[${at}]\`: ${error.message}`);
    }
    throw error;
  }
}
