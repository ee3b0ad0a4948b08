import { ApiError } from '../http/api-error.js';
import { folded } from '../storage/document-store.js';
import { flatten } from '../storage/flatten.js';
import type { IndexCatalogue, IndexState } from '../storage/index-catalogue.js';
import { countFacets, type FacetCounts } from './facets.js';
import { findHits, type RankedHit } from './search.js';
import type { SearchRequest } from './search-request.js';

export interface FederatedQuery {
  readonly index: IndexState;
  readonly request: SearchRequest;
  /** From the caller's token. */
  readonly extraFilter: unknown;
  readonly weight: number;
}

export interface Federation {
  readonly limit?: number | undefined;
  readonly offset?: number | undefined;
  readonly page?: number | undefined;
  readonly hitsPerPage?: number | undefined;
  readonly facetsByIndex?: Readonly<Record<string, readonly string[] | null>> | undefined;
  readonly mergeFacets?: { readonly maxValuesPerFacet?: number | null | undefined } | null | undefined;
  readonly distinct?: string | null | undefined;
}

interface WeightedHit extends RankedHit {
  readonly weighted: number;
  readonly position: number;
  readonly index: IndexState;
}

/** Hits of several searches in one list, by rank times the search's weight; a document comes once. */
export function federated(
  catalogue: IndexCatalogue,
  queries: readonly FederatedQuery[],
  federation: Federation,
): Record<string, unknown> {
  const started = performance.now();
  const isPaged = federation.page !== undefined || federation.hitsPerPage !== undefined;
  const hitsPerPage = federation.hitsPerPage ?? 20;
  const page = federation.page ?? 1;
  const offset = isPaged ? Math.max(0, page - 1) * hitsPerPage : (federation.offset ?? 0);
  const limit = isPaged ? (page === 0 ? 0 : hitsPerPage) : (federation.limit ?? 20);
  const { reader } = catalogue;
  reader.run('DELETE FROM gathered');
  let total = 0;
  const hits = queries.flatMap((query, position): WeightedHit[] => {
    const wanted = { offset: 0, limit: Math.min(offset + limit, Number.MAX_SAFE_INTEGER) };
    const found = findHits(catalogue, query.index, query.request, query.extraFilter, wanted);
    total += found.total;
    reader.run('INSERT OR IGNORE INTO gathered SELECT ?, doc FROM hits', [query.index.id]);
    return found.hits.map((hit) => ({
      ...hit,
      weighted: hit.rankingScore * query.weight,
      position,
      index: query.index,
    }));
  });
  hits.sort((left, right) => right.weighted - left.weighted || left.position - right.position);
  const once = withoutRepeats(hits, federation.distinct ?? undefined);
  total -= hits.length - once.length;
  const paging = isPaged
    ? {
        hitsPerPage,
        page,
        totalPages: hitsPerPage === 0 ? 0 : Math.ceil(total / hitsPerPage),
        totalHits: total,
      }
    : { limit, offset, estimatedTotalHits: total };
  return {
    hits: once.slice(offset, offset + limit).map(shownHit),
    processingTimeMs: Math.round(performance.now() - started),
    ...paging,
    ...shownFacets(countGathered(catalogue, queries, federation), federation),
  };
}

function shownHit({ shown, index, position, weighted }: WeightedHit): Record<string, unknown> {
  return {
    ...shown,
    _federation: { indexUid: index.uid, queriesPosition: position, weightedRankingScore: weighted },
  };
}

function withoutRepeats(hits: readonly WeightedHit[], distinct: string | undefined): WeightedHit[] {
  const seen = new Set<string>();
  return hits.filter(({ document, index }) => {
    const id = JSON.stringify([index.uid, document[index.primaryKey ?? 'id']]);
    const values =
      distinct === undefined
        ? []
        : flatten(document).filter(({ path, value }) => path === distinct && value !== null);
    const [first] = values;
    const keys = first ? [id, `distinct ${folded(String(first.value))}`] : [id];
    if (keys.some((key) => seen.has(key))) return false;
    for (const key of keys) seen.add(key);
    return true;
  });
}

/** Facets of each index over the hits of all its queries; a document that several queries found counts once. */
function countGathered(
  catalogue: IndexCatalogue,
  queries: readonly FederatedQuery[],
  { facetsByIndex = {} }: Federation,
): Map<string, FacetCounts> {
  const counts = new Map<string, FacetCounts>();
  for (const { index } of queries) {
    const names = facetsByIndex[index.uid] ?? [];
    if (names.length === 0 || counts.has(index.uid)) continue;
    catalogue.reader.run('DELETE FROM hits');
    catalogue.reader.run('INSERT INTO hits SELECT doc, 1, 0 FROM gathered WHERE index_id = ?', [index.id]);
    counts.set(index.uid, countFacets(catalogue.reader, index, names));
  }
  return counts;
}

function mergedCounts(all: readonly FacetCounts[]): FacetCounts {
  const distribution = new Map<string, Map<string, number>>();
  const stats = new Map<string, { min: number; max: number }>();
  for (const { facetDistribution, facetStats } of all) {
    for (const [facet, values] of Object.entries(facetDistribution)) {
      const sums = distribution.get(facet) ?? new Map<string, number>();
      for (const [value, count] of Object.entries(values)) sums.set(value, (sums.get(value) ?? 0) + count);
      distribution.set(facet, sums);
    }
    for (const [facet, { min, max }] of Object.entries(facetStats)) {
      const before = stats.get(facet) ?? { min, max };
      stats.set(facet, { min: Math.min(before.min, min), max: Math.max(before.max, max) });
    }
  }
  const facetDistribution = Object.fromEntries(
    [...distribution].map(([facet, values]) => [facet, Object.fromEntries(values)]),
  );
  return { facetDistribution, facetStats: Object.fromEntries(stats) };
}

function shownFacets(
  facets: ReadonlyMap<string, FacetCounts>,
  federation: Federation,
): Record<string, unknown> {
  if (federation.facetsByIndex === undefined) return {};
  const unknown = Object.keys(federation.facetsByIndex).find(
    (uid) => !facets.has(uid) && (federation.facetsByIndex?.[uid] ?? []).length > 0,
  );
  if (unknown !== undefined) {
    throw new ApiError(
      'invalid_multi_search_facets',
      `\`.federation.facetsByIndex\`: index \`${unknown}\` is not used in queries.`,
    );
  }
  if (federation.mergeFacets) {
    const { facetDistribution, facetStats } = mergedCounts([...facets.values()]);
    const most = federation.mergeFacets.maxValuesPerFacet ?? 100;
    const cut = Object.entries(facetDistribution).map(([facet, values]) => [
      facet,
      Object.fromEntries(Object.entries(values).slice(0, most)),
    ]);
    return { facetDistribution: Object.fromEntries(cut), facetStats };
  }
  const byIndex = [...facets].map(([uid, { facetDistribution, facetStats }]) => [
    uid,
    { distribution: facetDistribution, stats: facetStats },
  ]);
  return { facetsByIndex: Object.fromEntries(byIndex) };
}
