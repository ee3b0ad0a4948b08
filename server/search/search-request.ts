import type { MultiSearchQuery, MultiSearchResult } from 'meilisearch';
import { z } from 'zod';
import type { SearchQuery, WriteUpDocument } from '../../shared/contract/search.js';
import { readCursor, writeCursor } from '../http/pages.js';
import { facetFields, facetNames, filtersOf, type FacetName } from './facets.js';
import { hitEnd, hitStart } from './hit-marks.js';
import { furthestHit } from './index-settings.js';
import { withPlainFigures } from './measurement-words.js';

/** Place in the list: which group, and how many of its hits were shown. */
const Place = z.strictObject({
  group: z.number().int().min(0).max(2),
  offset: z.number().int().min(0).max(furthestHit),
});
export type Place = z.infer<typeof Place>;

/** Fields an excerpt is cut from, the owner's own words first. */
export const excerptFields = ['noticed', 'summary', 'fixTitles', 'cause', 'fixText', 'measured'] as const;
const excerptWords = 32;

export type FoundDocument = Pick<WriteUpDocument, 'id' | 'slug' | 'title' | 'card'>;
export type Found = MultiSearchResult<FoundDocument>;

export function placeOf(query: SearchQuery): Place {
  return readCursor(Place, query.cursor) ?? { group: 0, offset: 0 };
}

/**
 * Everything one screen needs, as queries of one request: first one for each group of the bench, then the facet counts.
 * A facet with chosen values is counted without them, so that the screen shows what choosing another would give.
 */
export function queriesFor(
  query: SearchQuery,
  groups: readonly (string | undefined)[],
  indexUid: string,
): { queries: MultiSearchQuery[]; facets: FacetName[][] } {
  const q = withPlainFigures(query.q);
  const place = placeOf(query);
  const base = { indexUid, q };
  const hits = groups.map((group, at): MultiSearchQuery => ({
    ...base,
    filter: group === undefined ? filtersOf(query) : [...filtersOf(query), group],
    offset: at === place.group ? place.offset : 0,
    // One more than is shown tells whether there is a next page; groups that are passed only add to the total.
    limit: at < place.group ? 0 : query.limit + 1,
    ...(q === '' ? { sort: ['publishedAt:desc'] } : {}),
    attributesToRetrieve: ['id', 'slug', 'title', 'card'],
    attributesToHighlight: ['title', ...excerptFields],
    attributesToCrop: [...excerptFields],
    cropLength: excerptWords,
    highlightPreTag: hitStart,
    highlightPostTag: hitEnd,
  }));
  const counted = facetNames.filter((name) => name !== 'revision' || query.part.length > 0);
  const free = counted.filter((name) => query[name].length === 0);
  const chosen = counted.filter((name) => query[name].length > 0);
  const facets = [...(free.length > 0 ? [free] : []), ...chosen.map((name) => [name])];
  const counts = facets.map((names): MultiSearchQuery => ({
    ...base,
    filter: filtersOf(query, names.length === 1 ? names[0] : undefined),
    limit: 0,
    facets: names.map((name) => facetFields[name]),
  }));
  return { queries: [...hits, ...counts], facets };
}

/** One page out of the groups' hits, and the place after it. */
export function pageFrom(
  found: readonly Found[],
  place: Place,
  limit: number,
): { hits: Found['hits']; next: string | null } {
  const numbered = found.flatMap(({ hits }, group) =>
    hits.map((hit, at) => ({
      hit,
      after: { group, offset: (group === place.group ? place.offset : 0) + at + 1 },
    })),
  );
  const shown = numbered.slice(0, limit);
  const last = shown.at(-1);
  const more = numbered.length > limit && last !== undefined && last.after.offset < furthestHit;
  return { hits: shown.map(({ hit }) => hit), next: more ? writeCursor(last.after) : null };
}
