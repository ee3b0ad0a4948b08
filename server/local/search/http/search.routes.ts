import { Router } from 'express';
import { answerSearch } from '../query/answer-search.js';
import { searchFacet } from '../query/facet-search.js';
import { readSearch, searchFromParams } from '../query/search-request.js';
import { tokenFilter } from './access.js';
import { ApiError } from './api-error.js';
import { jsonBody, objectBody, optionalJsonBody } from './input.js';
import { answerMultiSearch } from './multi-search.js';
import { indexInPath, type Surroundings } from './surroundings.js';

const facetFields = ['facetName', 'facetQuery', 'exhaustiveFacetCount'];

/** Searching: one index, several at once, and the values of one facet. */
export function searchRoutes(around: Surroundings): Router {
  const router = Router();

  router.post('/indexes/:uid/search', (request, response) => {
    const { index, caller } = indexInPath(around, request, 'search');
    const search = readSearch(optionalJsonBody(request), ['facetName', 'facetQuery']);
    response.json(answerSearch(around.catalogue, index, search, tokenFilter(caller, index.uid)));
  });

  router.get('/indexes/:uid/search', (request, response) => {
    const { index, caller } = indexInPath(around, request, 'search');
    const search = readSearch(searchFromParams(request.query), ['facetName', 'facetQuery']);
    response.json(answerSearch(around.catalogue, index, search, tokenFilter(caller, index.uid)));
  });

  router.post('/indexes/:uid/facet-search', (request, response) => {
    const started = performance.now();
    const { index, caller } = indexInPath(around, request, 'search');
    const body = objectBody(jsonBody(request));
    const { facetName, facetQuery = null } = body as { facetName?: unknown; facetQuery?: unknown };
    if (facetName === undefined)
      throw new ApiError('missing_facet_search_facet_name', 'Missing field `facetName`');
    if (typeof facetName !== 'string') {
      throw new ApiError('invalid_facet_search_facet_name', 'Invalid value at `.facetName`: expected a text');
    }
    if (facetQuery !== null && typeof facetQuery !== 'string') {
      throw new ApiError(
        'invalid_facet_search_facet_query',
        'Invalid value at `.facetQuery`: expected a text',
      );
    }
    const search = readSearch(body, facetFields);
    const wanted = { name: facetName, query: facetQuery };
    const facetHits = searchFacet(around.catalogue, index, wanted, search, tokenFilter(caller, index.uid));
    response.json({ facetHits, facetQuery, processingTimeMs: Math.round(performance.now() - started) });
  });

  router.post('/multi-search', (request, response) => {
    const caller = around.access.caller(request, 'search');
    response.json(answerMultiSearch(around, caller, jsonBody(request)));
  });

  return router;
}
