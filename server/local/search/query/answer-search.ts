import type { IndexCatalogue, IndexState } from '../storage/index-catalogue.js';
import { facetsOfHits, findHits } from './search.js';
import type { SearchRequest } from './search-request.js';

/** One search as it is answered over HTTP. `extraFilter` comes from the caller's token. */
export function answerSearch(
  catalogue: IndexCatalogue,
  index: IndexState,
  request: SearchRequest,
  extraFilter: unknown,
): Record<string, unknown> {
  const started = performance.now();
  const { page, hitsPerPage = 20 } = request;
  const isPaged = page !== undefined || request.hitsPerPage !== undefined;
  const pageNumber = page ?? 1;
  const wanted = isPaged
    ? { offset: Math.max(0, pageNumber - 1) * hitsPerPage, limit: pageNumber === 0 ? 0 : hitsPerPage }
    : { offset: request.offset, limit: request.limit };
  const { hits, total } = findHits(catalogue, index, request, extraFilter, wanted);
  const paging = isPaged
    ? {
        hitsPerPage,
        page: pageNumber,
        totalPages: hitsPerPage === 0 ? 0 : Math.ceil(total / hitsPerPage),
        totalHits: total,
      }
    : { limit: request.limit, offset: request.offset, estimatedTotalHits: total };
  const facets = facetsOfHits(catalogue, index, request.facets);
  return {
    hits: hits.map((hit) => hit.shown),
    query: request.q,
    processingTimeMs: Math.round(performance.now() - started),
    ...paging,
    ...facets,
  };
}
