import type { Meilisearch } from 'meilisearch';
import type { SearchQuery, SearchResults } from '../../shared/contract/search.js';
import type { OwnedPart } from '../../shared/fit/applicability.js';
import type { Caller } from '../http/caller.js';
import { benchGroups } from './bench-groups.js';
import { facetFields, facetsOf, type FacetName } from './facets.js';
import type { FacetLabelsStore } from './facet-labels.store.js';
import { searchHitOf } from './search-hit.js';
import { pageFrom, placeOf, queriesFor, type Found, type FoundDocument } from './search-request.js';
import { SearchUnavailable, isUnavailable } from './search-unavailable.js';

/** Longer than this nobody waits for a list that changes with each letter. */
const patienceMs = 4000;

export type BenchOf = (
  accountId: number,
) => Promise<readonly { partId: number; revisionId: number | null }[]>;
export type SearchService = ReturnType<typeof createSearchService>;

export function createSearchService(parts: {
  engine: Meilisearch;
  indexUid: string;
  labels: FacetLabelsStore;
  benchOf: BenchOf;
}) {
  const { engine, indexUid, labels, benchOf } = parts;

  async function ownedBy(caller: Caller, mine: readonly number[]): Promise<OwnedPart[]> {
    if (caller.role === 'visitor') {
      return (await labels.revisionsByIds(mine)).map((revision) => ({ partId: revision.partId, revision }));
    }
    const bench = await benchOf(caller.accountId);
    const revisions = await labels.revisionsByIds(bench.flatMap((item) => item.revisionId ?? []));
    return bench.map((item) => ({
      partId: item.partId,
      revision: revisions.find(({ id }) => id === item.revisionId) ?? null,
    }));
  }

  async function ask(queries: ReturnType<typeof queriesFor>['queries']): Promise<Found[]> {
    try {
      const answer = await engine.multiSearch<{ queries: typeof queries }, FoundDocument>(
        { queries },
        { signal: AbortSignal.timeout(patienceMs) },
      );
      return answer.results;
    } catch (error) {
      throw isUnavailable(error) ? new SearchUnavailable(error) : error;
    }
  }

  return {
    /**
     * Write-ups for the words and filters asked for. What holds for the reader's bench comes first, then what is not known
     * for it, then the rest; without words the newest come first within each. Throws SearchUnavailable.
     */
    async search(query: SearchQuery, caller: Caller): Promise<SearchResults> {
      const owned = await ownedBy(caller, query.mine);
      const groups = benchGroups(owned);
      const { queries, facets } = queriesFor(query, groups, indexUid);
      const results = await ask(queries);
      const found = results.slice(0, groups.length);
      const counts = countsIn(results.slice(groups.length), facets);
      const known = await labels.labelsOf({
        parts: [...Object.keys(counts.get('part') ?? {}), ...query.part],
        symptoms: [...Object.keys(counts.get('symptom') ?? {}), ...query.symptom],
        revisionsOfParts: query.part,
      });
      const page = pageFrom(found, placeOf(query), query.limit);
      return {
        items: page.hits.map((hit) => searchHitOf(hit, owned)),
        next: page.next,
        total: found.reduce((sum, group) => sum + (group.estimatedTotalHits ?? 0), 0),
        facets: facetsOf(query, counts, known),
        benchSize: owned.filter((item) => item.revision).length,
      };
    },
  };
}

function countsIn(
  results: readonly Found[],
  facets: readonly (readonly FacetName[])[],
): Map<FacetName, Record<string, number>> {
  return new Map(
    results.flatMap((result, at) =>
      (facets[at] ?? []).map((name): [FacetName, Record<string, number>] => [
        name,
        result.facetDistribution?.[facetFields[name]] ?? {},
      ]),
    ),
  );
}
