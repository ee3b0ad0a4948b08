import { ApiError } from '../http/api-error.js';
import { alignmentDistance } from '../lexicon/distance.js';
import { plain, wordsOf } from '../lexicon/words.js';
import { filterFeatures, filterablePatterns, isFilterable } from '../storage/attributes.js';
import type { IndexCatalogue, IndexState } from '../storage/index-catalogue.js';
import { facetValues, type FacetValue } from './facets.js';
import { findHits } from './search.js';
import type { SearchRequest } from './search-request.js';

const mostRead = 100_000;

/** Values of one facet that begin with what was typed (any word of theirs, one typo in longer words allowed). */
export function searchFacet(
  catalogue: IndexCatalogue,
  index: IndexState,
  facet: { readonly name: string; readonly query: string | null },
  request: SearchRequest,
  extraFilter: unknown,
): FacetValue[] {
  const { settings } = index;
  if (
    !isFilterable(settings, facet.name) ||
    !filterFeatures(settings, facet.name).facetSearch ||
    !settings.facetSearch
  ) {
    const patterns = filterablePatterns(settings)
      .map((each) => `\`${each}\``)
      .join(', ');
    throw new ApiError(
      'invalid_facet_search_facet_name',
      `Attribute \`${facet.name}\` is not facet-searchable. Filterable attribute patterns are: ${patterns || 'none'}.`,
    );
  }
  findHits(catalogue, index, request, extraFilter, { offset: 0, limit: 0 });
  const { maxValuesPerFacet, sortFacetValuesBy } = settings.faceting;
  const order = sortFacetValuesBy[facet.name] ?? sortFacetValuesBy['*'] ?? 'alpha';
  const values = facetValues(catalogue.reader, index, facet.name, { order, most: mostRead });
  const typed = wordsOf(facet.query ?? '').map(({ word }) => word);
  const { oneTypo } = settings.typoTolerance.minWordSizeForTypos;
  const typoFrom = settings.typoTolerance.enabled ? oneTypo : Infinity;
  return values.filter(({ value }) => answers(value, typed, typoFrom)).slice(0, maxValuesPerFacet);
}

function answers(value: string, typed: readonly string[], typoFrom: number): boolean {
  const words = wordsOf(value).map(({ word }) => word);
  return typed.every((beginning) =>
    words.some(
      (word) =>
        word.startsWith(beginning) ||
        plain(value).startsWith(beginning) ||
        (beginning.length >= typoFrom &&
          word[0] === beginning[0] &&
          alignmentDistance(beginning, word.slice(0, beginning.length), 1) <= 1),
    ),
  );
}
