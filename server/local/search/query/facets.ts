import { ApiError } from '../http/api-error.js';
import { filterablePatterns, isFilterable } from '../storage/attributes.js';
import type { Connection } from '../storage/connection.js';
import type { IndexState } from '../storage/index-catalogue.js';

export interface FacetValue {
  readonly value: string;
  readonly count: number;
}

export interface FacetCounts {
  readonly facetDistribution: Record<string, Record<string, number>>;
  readonly facetStats: Record<string, { min: number; max: number }>;
}

/** How the values of a facet are read; depends on how many of the documents are hits. */
type Reading = 'hit by hit' | 'among hits' | 'all documents';

/** Up to this part of all documents, hits are looked up one by one; for more, a facet's values are read in one go. */
const fewHits = 0.1;

const valueKinds = "f.kind IN ('text', 'number', 'truth', 'emptyText')";

/** Looks at the reader's `hits` to choose the cheapest way to count. */
function readingOf(reader: Connection, { id }: IndexState): Reading {
  const counts = reader.first<{ hits: number; documents: number }>(
    `SELECT (SELECT count(*) FROM hits) AS hits, (SELECT count(*) FROM documents_${id}) AS documents`,
  );
  const { hits, documents } = counts ?? { hits: 0, documents: 0 };
  if (hits === documents) return 'all documents';
  return hits <= documents * fewHits ? 'hit by hit' : 'among hits';
}

/** Counts the values of facets over the reader's `hits`. `*` is every filterable attribute met. */
export function countFacets(reader: Connection, index: IndexState, facets: readonly string[]): FacetCounts {
  const { maxValuesPerFacet, sortFacetValuesBy } = index.settings.faceting;
  const reading = readingOf(reader, index);
  const distributions: [string, Record<string, number>][] = [];
  const stats: [string, { min: number; max: number }][] = [];
  for (const facet of facetFields(reader, index, facets)) {
    const order = sortFacetValuesBy[facet] ?? sortFacetValuesBy['*'] ?? 'alpha';
    const values = facetValues(reader, index, facet, { order, most: maxValuesPerFacet }, reading);
    distributions.push([facet, Object.fromEntries(values.map(({ value, count }) => [value, count]))]);
    const numbers = reader.first<{ min: number | null; max: number | null }>(
      `SELECT min(f.number) AS min, max(f.number) AS max ${fromFacts(index, reading)} AND f.number IS NOT NULL`,
      [facet],
    );
    if (numbers && numbers.min !== null && numbers.max !== null)
      stats.push([facet, { min: numbers.min, max: numbers.max }]);
  }
  return { facetDistribution: Object.fromEntries(distributions), facetStats: Object.fromEntries(stats) };
}

/** Values of one facet over the reader's `hits` with the number of documents that have each. */
export function facetValues(
  reader: Connection,
  index: IndexState,
  facet: string,
  { order, most }: { order: 'alpha' | 'count'; most: number },
  reading = readingOf(reader, index),
): FacetValue[] {
  return reader.all<FacetValue>(
    `SELECT (SELECT shown FROM facts_${index.id} s WHERE s.doc = c.doc AND s.field = ? AND s.folded = c.folded) AS value,
       count
     FROM (
       SELECT f.folded AS folded, min(f.doc) AS doc, count(*) AS count ${fromFacts(index, reading)} AND ${valueKinds}
       GROUP BY f.folded ORDER BY ${order === 'count' ? 'count DESC, ' : ''} f.folded LIMIT ?) c`,
    [facet, facet, most],
  );
}

function fromFacts({ id }: IndexState, reading: Reading): string {
  if (reading === 'hit by hit')
    return `FROM hits h CROSS JOIN facts_${id} f ON f.doc = h.doc WHERE f.field = ?`;
  const all = `FROM facts_${id} f WHERE f.field = ?`;
  return reading === 'all documents' ? all : `${all} AND +f.doc IN (SELECT doc FROM hits)`;
}

function facetFields(reader: Connection, index: IndexState, facets: readonly string[]): string[] {
  const { settings } = index;
  const unknown = facets.filter((facet) => facet !== '*' && !isFilterable(settings, facet));
  const [first] = unknown;
  if (first !== undefined) {
    const patterns = filterablePatterns(settings);
    const available =
      patterns.length === 0
        ? 'This index does not have configured filterable attributes.'
        : `Available filterable attributes patterns are: ${patterns.map((each) => `\`${each}\``).join(', ')}.`;
    throw new ApiError(
      'invalid_search_facets',
      `Invalid facet distribution: Attribute \`${first}\` is not filterable. ${available}`,
    );
  }
  if (!facets.includes('*')) return [...new Set(facets)].sort();
  return reader
    .all<{ field: string }>(
      `SELECT DISTINCT field FROM facts_${index.id} WHERE kind <> 'object' ORDER BY field`,
    )
    .map(({ field }) => field)
    .filter((field) => isFilterable(settings, field));
}
