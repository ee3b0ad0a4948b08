import type { FacetDistribution } from 'meilisearch';
import type {
  FacetValue,
  SearchQuery,
  SearchResults,
  WriteUpDocument,
} from '../../shared/contract/search.js';
import {
  FixKind,
  Permanence,
  Standing,
  fixKindWords,
  permanenceWords,
  standingWords,
} from '../../shared/contract/vocabulary.js';
import type { FacetLabels } from './facet-labels.store.js';

export type FacetName = keyof SearchResults['facets'];

/** Field of the document behind each facet. */
export const facetFields: Readonly<Record<FacetName, keyof WriteUpDocument>> = {
  part: 'partSlugs',
  revision: 'revisionIds',
  symptom: 'symptomSlugs',
  permanence: 'permanence',
  standing: 'standing',
  kind: 'kind',
};
export const facetNames = Object.keys(facetFields) as FacetName[];

/** Filters of the values chosen: any value within a facet, all facets together; without those of `except`. */
export function filtersOf(query: SearchQuery, except?: FacetName): string[] {
  return facetNames
    .filter((name) => name !== except && query[name].length > 0)
    .map((name) => `${facetFields[name]} IN [${query[name].map((value) => `"${value}"`).join(', ')}]`);
}

/** Facets for the screen; values that are chosen stand there even with a count of none, so that they can be left again. */
export function facetsOf(
  query: SearchQuery,
  counts: ReadonlyMap<FacetName, FacetDistribution[string]>,
  labels: FacetLabels,
): SearchResults['facets'] {
  const countsOf = (name: FacetName): Map<string, number> => {
    const chosen = query[name].map((value): [string, number] => [String(value), 0]);
    return new Map([...chosen, ...Object.entries(counts.get(name) ?? {})]);
  };
  const byCount = (name: FacetName, known: ReadonlyMap<string, string>): FacetValue[] =>
    [...countsOf(name)]
      .flatMap(([value, count]) =>
        known.has(value) ? [{ value, label: known.get(value) ?? '', count }] : [],
      )
      .sort((one, other) => other.count - one.count || one.label.localeCompare(other.label, 'en'));
  const inOrder = (
    name: FacetName,
    values: readonly string[],
    labelOf: (value: string) => string,
  ): FacetValue[] => {
    const found = countsOf(name);
    return values.flatMap((value) =>
      found.has(value) ? [{ value, label: labelOf(value), count: found.get(value) ?? 0 }] : [],
    );
  };
  const revisionCounts = countsOf('revision');
  return {
    part: byCount('part', labels.parts),
    revision: labels.revisions.map(({ id, label }) => ({
      value: String(id),
      label,
      count: revisionCounts.get(String(id)) ?? 0,
    })),
    symptom: byCount('symptom', labels.symptoms),
    permanence: inOrder('permanence', Permanence.options, (value) => permanenceWords[value as Permanence]),
    standing: inOrder('standing', Standing.options, (value) => standingWords[value as Standing].label),
    kind: inOrder('kind', FixKind.options, (value) => fixKindWords[value as FixKind].label),
  };
}
