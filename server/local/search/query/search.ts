import { ApiError } from '../http/api-error.js';
import { FilterSyntaxError } from '../filter/filter-tokens.js';
import { filterSql, readFilter, type Sql } from '../filter/filter-sql.js';
import { covers, isFilterable } from '../storage/attributes.js';
import type { Document } from '../storage/flatten.js';
import { columnsOf, type IndexCatalogue, type IndexState } from '../storage/index-catalogue.js';
import { collectHits, hitColumn } from './collect-hits.js';
import { countFacets } from './facets.js';
import { formatDocument, matchesPosition, type Formatting } from './format-document.js';
import { hitOrder, readSort } from './hit-order.js';
import { project, shownPaths } from './projection.js';
import { planQuery, type QueryPlan } from './query-plan.js';
import type { SearchRequest } from './search-request.js';
import { TextMatcher } from './text-matches.js';

export interface RankedHit {
  readonly document: Document;
  /** The hit as it is answered, without the rank. */
  readonly shown: Record<string, unknown>;
  /** 0 to 1. */
  readonly rankingScore: number;
}

export interface Found {
  readonly hits: readonly RankedHit[];
  /** All hits, `maxTotalHits` at most. */
  readonly total: number;
}

export interface PageWanted {
  readonly offset: number;
  readonly limit: number;
}

/** Runs one search; leaves all its hits in the reader's `hits` table, for facets. Throws ApiError on bad input. */
export function findHits(
  catalogue: IndexCatalogue,
  index: IndexState,
  request: SearchRequest,
  extraFilter: unknown,
  page: PageWanted,
): Found {
  const { reader } = catalogue;
  checkSearchOn(index, request.attributesToSearchOn);
  const order = hitOrder(readSort(request.sort, index), index);
  const plan = planQuery(request.q, index.settings, catalogue.lexicon(index));
  const filter = combinedFilter(index, [request.filter, extraFilter], hitColumn(plan));
  collectHits(reader, index, {
    plan,
    filter,
    strategy: request.matchingStrategy,
    searchOn: request.attributesToSearchOn,
  });
  keepDistinct(catalogue, index, request, order);
  const best = reader.first<{ best: number | null }>('SELECT max(score) AS best FROM hits')?.best ?? 0;
  if (request.rankingScoreThreshold !== undefined) {
    reader.run(`DELETE FROM hits WHERE ${rankingScore} < ?`, [best, best, request.rankingScoreThreshold]);
  }
  const most = index.settings.pagination.maxTotalHits;
  const total = Math.min(reader.first<{ n: number }>('SELECT count(*) AS n FROM hits')?.n ?? 0, most);
  const limit = Math.max(0, Math.min(page.limit, most - page.offset));
  const rows = reader.all<{ body: string; rank: number }>(
    `SELECT d.body AS body, ${rankingScore} AS rank FROM hits h JOIN documents_${index.id} d ON d.num = h.doc
     ORDER BY ${order.text} LIMIT ? OFFSET ?`,
    [best, best, ...order.values, limit, Math.min(page.offset, most)],
  );
  const matcher = new TextMatcher(plan);
  const hits = rows.map(({ body, rank }) => {
    const document = JSON.parse(body) as Document;
    return { document, rankingScore: rank, shown: shownHit(document, matcher, plan, request, index, rank) };
  });
  return { hits, total };
}

/** Half from the part of the query a document has, half from its rank beside the best hit. */
const rankingScore = 'bucket * CASE WHEN ? <= 0 THEN 1.0 ELSE 0.5 + 0.5 * max(score, 0.0) / ? END';

/** Facets over the hits of the search that ran last. */
export function facetsOfHits(catalogue: IndexCatalogue, index: IndexState, facets: readonly string[]) {
  return facets.length === 0 ? {} : countFacets(catalogue.reader, index, facets);
}

/** All filters together, as SQL over a column of document numbers. Throws invalid_search_filter. */
function combinedFilter(index: IndexState, filters: readonly unknown[], column: string): Sql | undefined {
  try {
    const all = filters.map(readFilter).filter((filter) => filter !== undefined);
    return all.length === 0 ? undefined : filterSql({ all }, index, column);
  } catch (error) {
    if (error instanceof FilterSyntaxError) throw new ApiError('invalid_search_filter', error.message);
    throw error;
  }
}

function checkSearchOn(index: IndexState, attributes: readonly string[] | null): void {
  if (attributes === null || index.settings.searchableAttributes.includes('*')) return;
  const columns = columnsOf(index);
  const unknown = attributes.find(
    (attribute) =>
      attribute !== '*' && !columns.some((column) => covers(attribute, column) || covers(column, attribute)),
  );
  if (unknown === undefined) return;
  throw new ApiError(
    'invalid_search_attributes_to_search_on',
    `Attribute \`${unknown}\` is not searchable. Available searchable attributes are: \`${columns.join(', ')}\`.`,
  );
}

function keepDistinct(
  catalogue: IndexCatalogue,
  index: IndexState,
  request: SearchRequest,
  order: Sql,
): void {
  const attribute = request.distinct ?? index.settings.distinctAttribute;
  if (attribute === null) return;
  if (request.distinct !== undefined && !isFilterable(index.settings, attribute)) {
    throw new ApiError(
      'invalid_search_distinct',
      `Attribute \`${attribute}\` is not filterable, so hits cannot be made distinct by it.`,
    );
  }
  catalogue.reader.run(
    `DELETE FROM hits WHERE doc IN (
       SELECT doc FROM (
         SELECT h.doc AS doc, row_number() OVER (PARTITION BY v.folded ORDER BY ${order.text}) AS place
         FROM hits h JOIN facts_${index.id} v ON v.doc = h.doc AND v.field = ? AND v.shown IS NOT NULL)
       WHERE place > 1)`,
    [...order.values, attribute],
  );
}

function shownHit(
  document: Document,
  matcher: TextMatcher,
  plan: QueryPlan,
  request: SearchRequest,
  index: IndexState,
  rank: number,
): Record<string, unknown> {
  const displayed = index.settings.displayedAttributes;
  const shown = project(document, shownPaths(request.attributesToRetrieve, displayed));
  const { attributesToHighlight, attributesToCrop } = request;
  const hit: Record<string, unknown> = { ...shown };
  if (attributesToHighlight.length > 0 || attributesToCrop.length > 0) {
    const formatting = formattingOf(request);
    const named = [...attributesToHighlight, ...formatting.crop.map(({ attribute }) => attribute)];
    const paths = shownPaths(
      [...request.attributesToRetrieve, ...named.filter((attribute) => attribute !== '*')],
      displayed,
    );
    hit['_formatted'] = formatDocument(project(document, paths), matcher, formatting);
  }
  if (request.showMatchesPosition) {
    hit['_matchesPosition'] = matchesPosition(project(document, shownPaths(['*'], displayed)), matcher);
  }
  if (request.showRankingScore) hit['_rankingScore'] = rank;
  if (request.showRankingScoreDetails) {
    hit['_rankingScoreDetails'] = { bm25: { order: 0, words: plan.terms.length, score: rank } };
  }
  return hit;
}

function formattingOf(request: SearchRequest): Formatting {
  return {
    highlight: request.attributesToHighlight,
    tags: { before: request.highlightPreTag, after: request.highlightPostTag },
    crop: request.attributesToCrop.map((text) => {
      const [, attribute = text, words] = /^(.+):(\d+)$/s.exec(text) ?? [];
      return { attribute, words: words === undefined ? request.cropLength : Number(words) };
    }),
    marker: request.cropMarker,
  };
}
