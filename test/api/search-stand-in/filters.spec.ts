import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Filter, Index } from 'meilisearch';
import { idsOf, refusalOf, SearchUnderTest } from './search-under-test.js';

const documents = [
  {
    id: 1,
    kind: 'Shim',
    gap: 0.5,
    tags: ['lip', 'boss'],
    note: null,
    fixes: [{ kind: 'shim', cost: 3 }],
    since: '2026-01-05',
  },
  { id: 2, kind: 'trim', gap: 2, tags: [], note: '', fixes: [], since: '2026-03-01', open: true },
  {
    id: 3,
    kind: 'leaves a mark',
    gap: 10,
    tags: ['recess'],
    note: 'set "square"',
    fixes: [{ kind: 'trim', cost: 9 }],
    open: false,
  },
  { id: 4, kind: 'IN', note: {}, tags: ['lip'] },
];

let search: SearchUnderTest;
let index: Index;
beforeAll(async () => {
  search = await SearchUnderTest.started();
  index = await search.index('filters', documents, {
    filterableAttributes: ['kind', 'gap', 'tags', 'note', 'fixes', 'since', 'open', 'id'],
    sortableAttributes: ['gap', 'kind'],
  });
});
afterAll(() => search.stop());

const cases: [filter: Filter, ids: number[]][] = [
  ['kind = shim', [1]],
  ['kind = "LEAVES A MARK"', [3]],
  ["kind = 'IN'", [4]],
  ['kind != trim', [1, 3, 4]],
  ['gap != 2', [1, 3, 4]],
  ['gap = 2.0', [2]],
  ['gap > 0.5', [2, 3]],
  ['gap >= 0.5 AND gap < 10', [1, 2]],
  ['gap <= 2', [1, 2]],
  ['gap 0.5 TO 2', [1, 2]],
  ['NOT gap 0.5 TO 2', [3, 4]],
  ['since > 2026-02-01', [2]],
  ['open = true', [2]],
  ['tags = LIP', [1, 4]],
  ['tags IN [boss, recess]', [1, 3]],
  ['tags NOT IN [boss, recess]', [2, 4]],
  ['gap IN [2, 10.0]', [2, 3]],
  ['tags IN []', []],
  ['gap EXISTS', [1, 2, 3]],
  ['gap NOT EXISTS', [4]],
  ['NOT gap EXISTS', [4]],
  ['note IS NULL', [1]],
  ['note IS NOT NULL', [2, 3, 4]],
  ['note IS EMPTY', [2, 4]],
  ['tags IS EMPTY', [2]],
  ['tags IS NOT EMPTY', [1, 3, 4]],
  ['kind STARTS WITH "Leaves a"', [3]],
  ['kind NOT STARTS WITH s', [2, 3, 4]],
  ['fixes.kind = trim', [3]],
  ['fixes.cost > 2', [1, 3]],
  ['note = "set \\"square\\""', [3]],
  ['kind = shim OR kind = trim AND gap > 5', [1]],
  ['(kind = shim OR kind = trim) AND gap > 1', [2]],
  ['NOT kind = shim AND gap EXISTS', [2, 3]],
  ['NOT (kind = shim OR kind = trim)', [3, 4]],
  [
    ['kind != shim', 'gap EXISTS'],
    [2, 3],
  ],
  [[['kind = shim', 'kind = trim'], 'gap < 1'], [1]],
  [[], [1, 2, 3, 4]],
  ['', [1, 2, 3, 4]],
];

describe('filters', () => {
  it.each(cases)('%j leaves %j', async (filter, ids) => {
    expect(idsOf(await index.search('', { filter }))).toEqual(ids);
  });

  it.each(cases.filter(([filter]) => typeof filter === 'string'))(
    'documents are read by %j too',
    async (filter, ids) => {
      const { results, total } = await index.getDocuments({ filter });
      expect(results.map((document) => document['id'])).toEqual(ids);
      expect(total).toBe(ids.length);
    },
  );

  it.each([
    'kind =',
    '= shim',
    'kind',
    'kind shim',
    '(kind = shim',
    'kind = shim)',
    'kind IN shim',
    'kind IN [shim',
    'kind IN [a b]',
    "kind = 'shim",
    'kind = shim AND',
    'kind = IN',
    'kind IS',
    'kind IS shim',
    'kind STARTS shim',
    'gap 1 TO',
    'kind ! shim',
    'unknown = 1',
    '_geoRadius(1, 2, 3)',
    `${'('.repeat(500)}kind = a${')'.repeat(500)}`,
    `${'NOT '.repeat(30)}`,
  ])('when the filter is %j, then it is refused with a reason', async (filter) => {
    expect(await refusalOf(index.search('', { filter }))).toEqual({
      status: 400,
      code: 'invalid_search_filter',
    });
  });

  it('when an array of filters nests three levels or holds numbers, then it is refused', async () => {
    for (const filter of [[[['kind = shim']]], [1], { kind: 'shim' }]) {
      const refusal = await refusalOf(index.search('', { filter: filter as unknown as Filter }));
      expect(refusal).toEqual({ status: 400, code: 'invalid_search_filter' });
    }
  });

  it('when a filter has thousands of conditions, then it is answered', async () => {
    const many = Array.from({ length: 3000 }, (_, at) => `id = ${at + 2}`).join(' OR ');
    expect(idsOf(await index.search('', { filter: many }))).toEqual([2, 3, 4]);
  });

  it('when an attribute allows only equality, then it cannot be compared', async () => {
    const only = await search.index('equality', documents, {
      filterableAttributes: [
        {
          attributePatterns: ['ga*'],
          features: { facetSearch: false, filter: { equality: true, comparison: false } },
        },
      ],
    });
    expect(idsOf(await only.search('', { filter: 'gap = 2' }))).toEqual([2]);
    expect((await refusalOf(only.search('', { filter: 'gap > 2' }))).code).toBe('invalid_search_filter');
  });
});

describe('sorting', () => {
  it.each([
    { sort: ['gap:asc'], ids: [1, 2, 3, 4] },
    { sort: ['gap:desc'], ids: [3, 2, 1, 4] },
    { sort: ['kind:asc'], ids: [4, 3, 1, 2] },
  ])('$sort gives $ids, with documents that lack the value last', async ({ sort, ids }) => {
    expect(idsOf(await index.search('', { sort }))).toEqual(ids);
  });

  it.each(['gap', 'gap:up', 'tags:asc', ':asc'])('when it is by %j, then it is refused', async (rule) => {
    expect(await refusalOf(index.search('', { sort: [rule] }))).toEqual({
      status: 400,
      code: 'invalid_search_sort',
    });
  });

  it('when a ranking rule of an attribute stands first, then it orders all hits', async () => {
    const ranked = await search.index('ranked', documents, { rankingRules: ['gap:desc', 'words'] });
    expect(idsOf(await ranked.search(''))).toEqual([3, 2, 1, 4]);
  });
});

describe('facets', () => {
  it('when facets are wanted, then values are counted over all hits, alphabetically, with figures for numbers', async () => {
    const result = await index.search('', { facets: ['tags', 'gap'], limit: 1, filter: 'id < 4' });
    expect(result.facetDistribution).toEqual({
      gap: { '0.5': 1, '2': 1, '10': 1 },
      tags: { boss: 1, lip: 1, recess: 1 },
    });
    expect(Object.keys(result.facetDistribution?.['tags'] ?? {})).toEqual(['boss', 'lip', 'recess']);
    expect(result.facetStats).toEqual({ gap: { min: 0.5, max: 10 } });
  });

  it('when all documents are hits, then values are counted the same way', async () => {
    const result = await index.search('', { facets: ['tags'] });
    expect(result.facetDistribution).toEqual({ tags: { boss: 1, lip: 2, recess: 1 } });
  });

  it('when values differ only in case, then they are one', async () => {
    const cased = await search.index(
      'cased',
      [
        { id: 1, kind: 'Shim' },
        { id: 2, kind: 'shim' },
      ],
      { filterableAttributes: ['kind'] },
    );
    const { facetDistribution } = await cased.search('', { facets: ['kind'] });
    expect(Object.values(facetDistribution?.['kind'] ?? {})).toEqual([2]);
  });

  it('when fewer values are wanted, by count, then the commonest are given', async () => {
    const few = await search.index('few', documents, {
      filterableAttributes: ['tags'],
      faceting: { maxValuesPerFacet: 1, sortFacetValuesBy: { tags: 'count' } },
    });
    expect((await few.search('', { facets: ['*'] })).facetDistribution).toEqual({ tags: { lip: 2 } });
  });

  it('when a facet is not filterable, then it is refused', async () => {
    expect(await refusalOf(index.search('', { facets: ['colour'] }))).toEqual({
      status: 400,
      code: 'invalid_search_facets',
    });
  });

  it('when values of a facet are searched, then those that begin so are given with their numbers', async () => {
    const { facetHits, facetQuery } = await index.searchForFacetValues({
      facetName: 'tags',
      facetQuery: 'li',
    });
    expect(facetHits).toEqual([{ value: 'lip', count: 2 }]);
    expect(facetQuery).toBe('li');
    const narrowed = await index.searchForFacetValues({
      facetName: 'tags',
      facetQuery: 'li',
      filter: 'gap EXISTS',
    });
    expect(narrowed.facetHits).toEqual([{ value: 'lip', count: 1 }]);
    const refusal = await refusalOf(index.searchForFacetValues({ facetName: 'colour' }));
    expect(refusal.code).toBe('invalid_facet_search_facet_name');
  });

  it('when hits are to be distinct, then only the best of each value is given', async () => {
    const { hits, estimatedTotalHits } = await index.search('', {
      distinct: 'tags',
      filter: 'tags = lip',
      sort: ['gap:desc'],
    });
    expect(hits.map((hit) => hit['id'])).toEqual([1]);
    expect(estimatedTotalHits).toBe(1);
  });
});
