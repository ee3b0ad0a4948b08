import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { idsOf, refusalOf, SearchUnderTest } from './search-under-test.js';

let search: SearchUnderTest;
beforeAll(async () => {
  search = await SearchUnderTest.started();
});
afterAll(() => search.stop());

describe('documents', () => {
  it('when documents are added, then they come back as they were, nested values and all', async () => {
    const document = {
      id: 'a-1',
      title: 'Lip',
      fixes: [{ kind: 'shim', sizes: [0.1, null, { unit: 'mm' }] }],
      none: null,
      '': 'odd',
    };
    const index = await search.index('nested', [document]);
    expect(await index.getDocument('a-1')).toEqual(document);
    expect(await index.getDocument('a-1', { fields: ['title'] })).toEqual({ title: 'Lip' });
  });

  it('when a document is sent again by POST, then the new one stands in its place', async () => {
    const index = await search.index('replaced', [{ id: 1, title: 'bracket', text: 'rocks' }]);
    await index.addDocuments([{ id: 1, title: 'belt' }]).waitTask();
    expect(await index.getDocument(1)).toEqual({ id: 1, title: 'belt' });
    expect(idsOf(await index.search('bracket'))).toEqual([]);
    expect(idsOf(await index.search('belt'))).toEqual([1]);
  });

  it('when a document is sent by PUT, then its fields are merged in', async () => {
    const index = await search.index('merged', [{ id: 1, title: 'bracket', text: 'rocks' }]);
    const task = await index
      .updateDocuments([
        { id: 1, text: 'slips' },
        { id: 2, text: 'new' },
      ])
      .waitTask();
    expect(task.details).toEqual({ receivedDocuments: 2, indexedDocuments: 2 });
    expect(await index.getDocument(1)).toEqual({ id: 1, title: 'bracket', text: 'slips' });
    expect(idsOf(await index.search('slips'))).toEqual([1]);
  });

  it('when documents come as lines of JSON or as CSV, then they are read', async () => {
    const index = search.client().index('formats');
    await index
      .addDocumentsFromString('{"id":1,"t":"one"}\n\n{"id":2,"t":"two"}\n', 'application/x-ndjson')
      .waitTask();
    const csv =
      'id:number;t;open:boolean;gap:number\r\n3;"three; ""quoted""\nlines";true;0.5\r\n4;four;false;\r\n';
    const task = await index
      .addDocumentsFromString(csv, 'text/csv', { csvDelimiter: ';', primaryKey: 'id' })
      .waitTask();
    expect(task.status).toBe('succeeded');
    expect((await index.getDocuments()).results).toEqual([
      { id: 1, t: 'one' },
      { id: 2, t: 'two' },
      { id: 3, t: 'three; "quoted"\nlines', open: true, gap: 0.5 },
      { id: 4, t: 'four', open: false, gap: null },
    ]);
  });

  it('when documents are listed, then in pages, with chosen fields, by identifiers', async () => {
    const index = await search.index(
      'listed',
      [1, 2, 3].map((id) => ({ id, title: `t${id}` })),
    );
    expect(await index.getDocuments({ offset: 1, limit: 1, fields: ['title'] })).toEqual({
      results: [{ title: 't2' }],
      offset: 1,
      limit: 1,
      total: 3,
    });
    expect((await index.getDocuments({ ids: [3, 1] })).results.map((each) => each['id'])).toEqual([1, 3]);
  });

  it('when documents are deleted, one, some, by filter or all, then they are no longer found', async () => {
    const index = await search.index(
      'deleted',
      [1, 2, 3, 4, 5, 6].map((id) => ({ id, title: 'shim' })),
      { filterableAttributes: ['id'] },
    );
    await index.deleteDocument(1).waitTask();
    expect((await index.deleteDocuments([2, 77]).waitTask()).details).toMatchObject({
      providedIds: 2,
      deletedDocuments: 1,
    });
    expect((await index.deleteDocuments({ filter: 'id = 3' }).waitTask()).details).toMatchObject({
      deletedDocuments: 1,
      originalFilter: 'id = 3',
    });
    expect(idsOf(await index.search('shim'))).toEqual([4, 5, 6]);
    expect((await index.deleteAllDocuments().waitTask()).details).toMatchObject({ deletedDocuments: 3 });
    expect(idsOf(await index.search('shim'))).toEqual([]);
    await index.addDocuments([{ id: 9, title: 'shim' }]).waitTask();
    expect(idsOf(await index.search('shim'))).toEqual([9]);
  });

  it('when a document holds the last use of a word, then its deletion ends typos towards that word', async () => {
    const index = await search.index('lexicon', [
      { id: 1, title: 'bracket' },
      { id: 2, title: 'brackets belt' },
    ]);
    expect(idsOf(await index.search('brackte '))).toHaveLength(2);
    await index.deleteDocuments([1, 2]).waitTask();
    expect(idsOf(await index.search('brackte '))).toEqual([]);
  });

  it('when an identifier is missing or off, then the task fails and nothing of it is kept', async () => {
    const index = await search.index('off', [{ id: 1 }]);
    const missing = await index.addDocuments([{ id: 2 }, { title: 'no id' }]).waitTask();
    expect([missing.status, missing.error?.code]).toEqual(['failed', 'missing_document_id']);
    const off = await index.addDocuments([{ id: 'with space' }]).waitTask();
    expect(off.error?.code).toBe('invalid_document_id');
    expect((await index.getDocuments()).total).toBe(1);
  });

  it('when no primary key is named, then the only field that ends in id is it', async () => {
    const client = search.client();
    await client
      .index('guessed')
      .addDocuments([{ partId: 4, title: 'x' }])
      .waitTask();
    expect((await client.getRawIndex('guessed')).primaryKey).toBe('partId');
    const two = await client
      .index('two-keys')
      .addDocuments([{ partId: 4, id: 1 }])
      .waitTask();
    expect(two.error?.code).toBe('index_primary_key_multiple_candidates_found');
    const none = await client
      .index('no-keys')
      .addDocuments([{ title: 4 }])
      .waitTask();
    expect(none.error?.code).toBe('index_primary_key_no_candidate_found');
  });

  it('when a document is not there, then 404 says so', async () => {
    const index = await search.index('missing', [{ id: 1 }]);
    expect(await refusalOf(index.getDocument(2))).toEqual({ status: 404, code: 'document_not_found' });
  });

  it.each([
    { body: '', type: 'application/json', status: 400, code: 'missing_payload' },
    { body: '{"id":', type: 'application/json', status: 400, code: 'malformed_payload' },
    { body: '[1]', type: 'application/json', status: 400, code: 'malformed_payload' },
    { body: '{"id":1}\nnope', type: 'application/x-ndjson', status: 400, code: 'malformed_payload' },
    { body: 'id,t\n1', type: 'text/csv', status: 400, code: 'malformed_payload' },
    { body: '<id>1</id>', type: 'text/xml', status: 415, code: 'invalid_content_type' },
  ])('when "$body" comes as $type, then it is refused as $code', async ({ body, type, status, code }) => {
    const answer = await search.send('POST', '/indexes/bodies/documents', body, { 'content-type': type });
    expect([answer.status, answer.body['code']]).toEqual([status, code]);
  });
});

describe('indexes', () => {
  it('when an index is made, read, changed, listed and deleted, then each shows', async () => {
    const client = search.client();
    expect((await client.createIndex('made', { primaryKey: 'id' }).waitTask()).status).toBe('succeeded');
    expect((await client.createIndex('made').waitTask()).error?.code).toBe('index_already_exists');
    expect(await client.getRawIndex('made')).toMatchObject({ uid: 'made', primaryKey: 'id' });
    await client.updateIndex('made', { primaryKey: 'slug' }).waitTask();
    expect((await client.getRawIndex('made')).primaryKey).toBe('slug');
    const { results, total } = await client.getRawIndexes({ limit: 100 });
    expect(results.map(({ uid }) => uid)).toContain('made');
    expect(total).toBe(results.length);
    await client.deleteIndex('made').waitTask();
    expect(await refusalOf(client.getRawIndex('made'))).toEqual({ status: 404, code: 'index_not_found' });
    expect((await client.deleteIndex('made').waitTask()).error?.code).toBe('index_not_found');
  });

  it('when indexes are swapped, then each answers with the other one’s documents and settings', async () => {
    const left = await search.index('left', [{ id: 1, title: 'old' }], { filterableAttributes: ['title'] });
    const right = await search.index('right', [{ id: 2, title: 'new' }]);
    await search
      .client()
      .swapIndexes([{ indexes: ['left', 'right'], rename: false }])
      .waitTask();
    expect(idsOf(await left.search(''))).toEqual([2]);
    expect(idsOf(await right.search('', { filter: 'title = old' }))).toEqual([1]);
    const failed = await search
      .client()
      .swapIndexes([{ indexes: ['left', 'nowhere'], rename: false }])
      .waitTask();
    expect(failed.error?.code).toBe('index_not_found');
    const twice = search.client().swapIndexes([{ indexes: ['left', 'left'], rename: false }]);
    expect((await refusalOf(twice)).code).toBe('invalid_swap_duplicate_index_found');
  });

  it('when a name has other characters, then it is refused', async () => {
    expect((await refusalOf(search.client().createIndex('with space'))).code).toBe('invalid_index_uid');
  });

  it('when figures are asked for, then documents and fields are counted', async () => {
    const index = await search.index('figures', [{ id: 1, a: 1 }, { id: 2 }]);
    expect(await index.getStats()).toMatchObject({
      numberOfDocuments: 2,
      isIndexing: false,
      fieldDistribution: { id: 2, a: 1 },
    });
    expect((await search.client().getStats()).indexes['figures']?.numberOfDocuments).toBe(2);
  });
});

describe('settings', () => {
  it('when an index is new, then its settings are the documented ones', async () => {
    await search.client().createIndex('fresh').waitTask();
    expect(await search.client().index('fresh').getSettings()).toMatchObject({
      searchableAttributes: ['*'],
      rankingRules: ['words', 'typo', 'proximity', 'attributeRank', 'sort', 'wordPosition', 'exactness'],
      typoTolerance: { enabled: true, minWordSizeForTypos: { oneTypo: 5, twoTypos: 9 } },
      faceting: { maxValuesPerFacet: 100, sortFacetValuesBy: { '*': 'alpha' } },
      pagination: { maxTotalHits: 1000 },
    });
  });

  it('when single settings are changed and reset, then only they change', async () => {
    const index = await search.index('single', [{ id: 1 }], { stopWords: ['the'] });
    await index.updateSynonyms({ rock: ['wobble'] }).waitTask();
    await index.updateTypoTolerance({ minWordSizeForTypos: { oneTypo: 4 } }).waitTask();
    await index.updateFaceting({ maxValuesPerFacet: 7 }).waitTask();
    expect(await index.getSynonyms()).toEqual({ rock: ['wobble'] });
    expect(await index.getStopWords()).toEqual(['the']);
    expect((await index.getTypoTolerance())?.minWordSizeForTypos).toEqual({ oneTypo: 4, twoTypos: 9 });
    expect(await index.getFaceting()).toEqual({ maxValuesPerFacet: 7, sortFacetValuesBy: { '*': 'alpha' } });
    await index.resetSynonyms().waitTask();
    expect(await index.getSynonyms()).toEqual({});
    await index.resetSettings().waitTask();
    expect((await index.getSettings()).stopWords).toEqual([]);
  });

  it('when searched attributes change, then stored documents are searched by the new ones', async () => {
    const index = await search.index('rebuilt', [{ id: 1, a: 'bracket', b: 'belt' }], {
      searchableAttributes: ['a'],
    });
    expect(idsOf(await index.search('belt'))).toEqual([]);
    await index.updateSearchableAttributes(['b']).waitTask();
    expect(idsOf(await index.search('belt'))).toEqual([1]);
    expect(idsOf(await index.search('bracket'))).toEqual([]);
  });

  it.each([
    { change: { rankingRules: ['loudness'] }, code: 'invalid_settings_ranking_rules' },
    { change: { synonyms: [] }, code: 'invalid_settings_synonyms' },
    {
      change: { typoTolerance: { minWordSizeForTypos: { oneTypo: 9, twoTypos: 3 } } },
      code: 'invalid_settings_typo_tolerance',
    },
    { change: { colour: 'blue' }, code: 'bad_request' },
  ])('when $change is sent, then it is refused as $code', async ({ change, code }) => {
    const answer = await search.send('PATCH', '/indexes/refused/settings', JSON.stringify(change));
    expect([answer.status, answer.body['code']]).toEqual([400, code]);
  });
});
