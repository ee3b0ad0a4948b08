import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Index } from 'meilisearch';
import { idsOf, refusalOf, SearchUnderTest } from './search-under-test.js';

const long =
  'one two three four five six seven eight nine ten eleven the bracket rocks on a raised lip of the boss here';
const documents = [
  {
    id: 1,
    title: 'Bracket rocks',
    text: long,
    gap: 0.5,
    fixes: [{ name: 'Brass shim', steps: ['Cut', 'Shim the bracket'] }],
    hidden: 'x',
  },
  { id: 2, title: 'Größe: bracket', text: 'short', gap: 22, fixes: [], hidden: 'y' },
  { id: 3, title: 'Belt', text: 'slips', gap: 3, fixes: [], hidden: 'z' },
];

let search: SearchUnderTest;
let index: Index;
beforeAll(async () => {
  search = await SearchUnderTest.started();
  index = await search.index('results', documents, {
    searchableAttributes: ['title', 'text', 'gap', 'fixes'],
    displayedAttributes: ['id', 'title', 'text', 'gap', 'fixes'],
    filterableAttributes: ['gap'],
  });
});
afterAll(() => search.stop());

describe('what a hit shows', () => {
  it('when nothing is asked for, then displayed attributes come as stored, nested ones too', async () => {
    const { hits } = await index.search('rocks ');
    const { hidden: _hidden, ...shown } = documents[0] ?? {};
    expect(hits).toEqual([shown]);
  });

  it('when attributes are named, then only these come', async () => {
    const { hits } = await index.search('rocks ', { attributesToRetrieve: ['id', 'fixes.name', 'hidden'] });
    expect(hits).toEqual([{ id: 1, fixes: [{ name: 'Brass shim' }] }]);
  });

  it('when matches are highlighted, then other forms, nested texts and numbers are shown as texts with tags', async () => {
    const { hits } = await index.search('brackets 0.5 ', {
      attributesToRetrieve: ['id', 'title', 'gap', 'fixes'],
      attributesToHighlight: ['*'],
    });
    expect(hits[0]?._formatted).toEqual({
      id: '1',
      title: '<em>Bracket</em> rocks',
      gap: '<em>0.5</em>',
      fixes: [{ name: 'Brass shim', steps: ['Cut', 'Shim the <em>bracket</em>'] }],
    });
  });

  it('when the last word is unfinished, then only what was typed of it is tagged', async () => {
    const tags = { highlightPreTag: '[', highlightPostTag: ']' };
    const { hits } = await index.search('brack', {
      attributesToHighlight: ['title'],
      filter: 'gap = 0.5',
      ...tags,
    });
    expect(hits[0]?._formatted?.['title']).toBe('[Brack]et rocks');
  });

  it('when texts are cropped, then the words around the matches are shown between markers', async () => {
    const { hits } = await index.search('raised lip ', {
      attributesToCrop: ['text:5'],
      attributesToHighlight: ['text'],
    });
    expect(hits[0]?._formatted?.['text']).toMatch(/^…[^…]*<em>raised<\/em> <em>lip<\/em>[^…]*…$/);
    const shown = hits[0]?._formatted?.['text'] as string;
    expect(shown.replace(/<\/?em>|…/g, '').split(' ')).toHaveLength(5);
  });

  it('when a cropped text has no match, then its beginning is shown', async () => {
    const { hits } = await index.search('', { attributesToCrop: ['text'], cropLength: 3, cropMarker: '...' });
    expect(hits[0]?._formatted?.['text']).toBe('one two three...');
    expect(hits[1]?._formatted?.['text']).toBe('short');
  });

  it('when positions are wanted, then they are bytes', async () => {
    const { hits } = await index.search('bracket ', { showMatchesPosition: true, filter: 'gap = 22' });
    expect(hits[0]?._matchesPosition).toEqual({ title: [{ start: 9, length: 7 }] });
    const nested = await index.search('bracket ', { showMatchesPosition: true, filter: 'gap = 0.5' });
    expect(nested.hits[0]?._matchesPosition?.['fixes.steps']).toEqual([
      { start: 9, length: 7, indices: [0, 1] },
    ]);
  });
});

describe('pages', () => {
  it('when offset and limit are given, then they and the estimated total come back', async () => {
    const result = await index.search('', { offset: 1, limit: 1 });
    expect(idsOf(result)).toEqual([2]);
    expect(result).toMatchObject({ offset: 1, limit: 1, estimatedTotalHits: 3, query: '' });
    expect(result.processingTimeMs).toBeTypeOf('number');
    expect(result).not.toHaveProperty('totalHits');
  });

  it('when a page is asked for, then totals come back', async () => {
    const result = await index.search('', { page: 2, hitsPerPage: 2 });
    expect(idsOf(result)).toEqual([3]);
    expect(result).toMatchObject({ page: 2, hitsPerPage: 2, totalPages: 2, totalHits: 3 });
    expect(result).not.toHaveProperty('estimatedTotalHits');
  });

  it('when there are more hits than may be given, then the rest is out of reach', async () => {
    const many = await search.index(
      'many',
      Array.from({ length: 12 }, (_, id) => ({ id, t: 'shim' })),
      {
        pagination: { maxTotalHits: 5 },
      },
    );
    const result = await many.search('shim ', { offset: 4, limit: 20 });
    expect(result.hits).toHaveLength(1);
    expect(result.estimatedTotalHits).toBe(5);
  });
});

describe('ways to ask', () => {
  it('when the search comes by GET, then it answers as by POST', async () => {
    const asked = { attributesToHighlight: ['title'], limit: 1, showMatchesPosition: true, facets: ['gap'] };
    const [got, posted] = await Promise.all([
      index.searchGet('bracket ', asked),
      index.search('bracket ', asked),
    ]);
    expect({ ...got, processingTimeMs: 0 }).toEqual({ ...posted, processingTimeMs: 0 });
  });

  it('when several searches are sent at once, then each is answered by itself', async () => {
    const { results } = await search.client().multiSearch({
      queries: [
        { indexUid: 'results', q: 'belt' },
        { indexUid: 'results', q: 'rocks', limit: 1 },
      ],
    });
    expect(results.map((result) => [result.indexUid, idsOf(result)])).toEqual([
      ['results', [3]],
      ['results', [1]],
    ]);
  });

  it('when searches are federated, then hits come in one list by weight, each document once', async () => {
    await search.index('others', [{ id: 1, title: 'bracket' }]);
    const result = await search.client().multiSearch({
      federation: { limit: 3, facetsByIndex: { results: ['gap'] } },
      queries: [
        { indexUid: 'results', q: 'bracket ' },
        { indexUid: 'results', q: 'rocks ' },
        { indexUid: 'others', q: 'bracket ', federationOptions: { weight: 5 } },
      ],
    });
    const origins = result.hits.map((hit) => [hit['_federation']?.indexUid, hit['id']]);
    expect(origins[0]).toEqual(['others', 1]);
    expect(origins.slice(1).sort()).toEqual([
      ['results', 1],
      ['results', 2],
    ]);
    expect(result.facetsByIndex?.['results']?.distribution).toEqual({ gap: { '0.5': 1, '22': 1 } });
  });

  it.each([
    { name: 'an unknown parameter', body: { query: 'x' }, code: 'bad_request' },
    { name: 'a number for the query', body: { q: 5 }, code: 'invalid_search_q' },
    { name: 'a negative limit', body: { limit: -1 }, code: 'invalid_search_limit' },
    { name: 'a text for the offset', body: { offset: 'a' }, code: 'invalid_search_offset' },
    {
      name: 'an unknown strategy',
      body: { matchingStrategy: 'some' },
      code: 'invalid_search_matching_strategy',
    },
    { name: 'a list instead of an object', body: [], code: 'bad_request' },
    {
      name: 'an attribute that is not searched',
      body: { attributesToSearchOn: ['hidden'] },
      code: 'invalid_search_attributes_to_search_on',
    },
  ])('when $name is sent, then it is refused as $code', async ({ body, code }) => {
    const answer = await search.send('POST', '/indexes/results/search', JSON.stringify(body));
    expect(answer.status).toBe(400);
    expect(answer.body).toEqual({
      message: expect.any(String) as string,
      code,
      type: 'invalid_request',
      link: expect.stringContaining(code) as string,
    });
  });

  it('when the index is not there, then 404 says so', async () => {
    expect(await refusalOf(search.client().index('nowhere').search(''))).toEqual({
      status: 404,
      code: 'index_not_found',
    });
  });
});
