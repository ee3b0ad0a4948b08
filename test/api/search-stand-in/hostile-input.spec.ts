import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SearchUnderTest } from './search-under-test.js';

let search: SearchUnderTest;
beforeAll(async () => {
  search = await SearchUnderTest.started();
  await search.index(
    'write-ups',
    [{ id: 1, title: 'bracket rocks', kind: 'shim', gap: 0.5, fixes: [{ kind: 'trim' }] }],
    {
      filterableAttributes: ['kind', 'gap', 'fixes'],
      sortableAttributes: ['gap'],
      synonyms: { rock: ['wobble', 'not flat'] },
      stopWords: ['the'],
    },
  );
});
afterAll(() => search.stop());

/** Texts with what a query language, a database or a tokenizer might stumble over. */
const awkward = fc.oneof(
  fc.string({ unit: 'binary', maxLength: 60 }),
  fc.string({ maxLength: 60 }),
  fc
    .array(
      fc.constantFrom(
        '"',
        "'",
        '\\',
        '(',
        ')',
        '[',
        ']',
        '-',
        '*',
        '^',
        ':',
        '{',
        '}',
        'AND',
        'OR',
        'NOT',
        'NEAR',
        'IN',
        'TO',
        'IS',
        'NULL',
        'EXISTS',
        'kind',
        'gap',
        '=',
        '!=',
        '>',
        ' ',
        ' ',
        '\0',
        '\u0000',
        '\ud800',
        '½',
        '…',
        '22.5',
        '-1',
        '1e999',
        'M48x0.75',
        'brackte',
        '; DROP TABLE indexes',
        '%',
        '_',
        '\u202e',
        'ß',
        'İ',
        '🔭',
        ',',
        '..',
        '0x',
        "won't",
        '$.a',
        '__proto__',
        'STARTS WITH',
      ),
      { maxLength: 14 },
    )
    .map((pieces) => pieces.join(fc.sample(fc.constantFrom('', ' '), 1)[0])),
);

const anything = fc.oneof(
  awkward,
  fc.jsonValue({ maxDepth: 3 }),
  fc.double(),
  fc.constant(null),
  fc.array(awkward, { maxLength: 4 }),
);

const searchFields = [
  'q',
  'offset',
  'limit',
  'page',
  'hitsPerPage',
  'filter',
  'facets',
  'sort',
  'attributesToRetrieve',
  'attributesToCrop',
  'cropLength',
  'cropMarker',
  'attributesToHighlight',
  'highlightPreTag',
  'showMatchesPosition',
  'matchingStrategy',
  'attributesToSearchOn',
  'rankingScoreThreshold',
  'distinct',
  'facetName',
  'facetQuery',
];

async function expectNoFailure(method: string, path: string, body?: string, type = 'application/json') {
  const answer = await search.send(method, path, body, { 'content-type': type });
  expect(answer.status, `${method} ${path} ${body ?? ''} ${JSON.stringify(answer.body)}`).toBeLessThan(500);
  if (answer.status >= 400) {
    expect(Object.keys(answer.body).sort()).toEqual(['code', 'link', 'message', 'type']);
    expect(answer.body['code']).not.toBe('internal');
  }
  expect(search.errors).toEqual([]);
  return answer;
}

const runs = { numRuns: 150 };

describe('hostile input', () => {
  it('when any text is searched for, then hits are answered', async () => {
    await fc.assert(
      fc.asyncProperty(awkward, fc.constantFrom('last', 'all', 'frequency'), async (q, matchingStrategy) => {
        const asked = {
          q,
          matchingStrategy,
          attributesToHighlight: ['*'],
          attributesToCrop: ['*'],
          showMatchesPosition: true,
        };
        const answer = await expectNoFailure('POST', '/indexes/write-ups/search', JSON.stringify(asked));
        expect(answer.status).toBe(200);
      }),
      runs,
    );
  });

  it('when any text is a filter, then it is answered or refused', async () => {
    await fc.assert(
      fc.asyncProperty(awkward, async (filter) => {
        await expectNoFailure(
          'POST',
          '/indexes/write-ups/search',
          JSON.stringify({ filter, sort: ['gap:asc'] }),
        );
        await expectNoFailure('POST', '/indexes/write-ups/documents/fetch', JSON.stringify({ filter }));
      }),
      runs,
    );
  });

  it('when search parameters hold anything, then they are answered or refused', async () => {
    const body = fc.dictionary(fc.constantFrom(...searchFields), anything, { maxKeys: 4 });
    await fc.assert(
      fc.asyncProperty(body, async (asked) => {
        await expectNoFailure('POST', '/indexes/write-ups/search', JSON.stringify(asked));
        await expectNoFailure(
          'POST',
          '/indexes/write-ups/facet-search',
          JSON.stringify({ facetName: 'kind', ...asked }),
        );
        const query = new URLSearchParams(
          Object.entries(asked).map(([name, value]) => [name, String(value)]),
        );
        await expectNoFailure('GET', `/indexes/write-ups/search?${query}`);
        const queries = [{ indexUid: 'write-ups', ...asked }];
        await expectNoFailure(
          'POST',
          '/multi-search',
          JSON.stringify({ queries, federation: asked['limit'] }),
        );
      }),
      runs,
    );
  });

  it('when bodies hold anything, then every route answers or refuses', async () => {
    const routes = [
      ['POST', '/indexes'],
      ['PATCH', '/indexes/fuzzed'],
      ['POST', '/swap-indexes'],
      ['POST', '/keys'],
      ['POST', '/multi-search'],
      ['PATCH', '/indexes/fuzzed/settings'],
      ['PUT', '/indexes/fuzzed/settings/synonyms'],
      ['PUT', '/indexes/fuzzed/settings/stop-words'],
      ['PATCH', '/indexes/fuzzed/settings/typo-tolerance'],
      ['PUT', '/indexes/fuzzed/settings/ranking-rules'],
      ['POST', '/indexes/fuzzed/documents/delete-batch'],
      ['POST', '/indexes/fuzzed/documents/delete'],
      ['POST', '/indexes/fuzzed/documents/fetch'],
      ['POST', '/indexes/fuzzed/search'],
      ['POST', '/tasks/cancel?uids=0'],
    ] as const;
    await fc.assert(
      fc.asyncProperty(fc.constantFrom(...routes), anything, async ([method, path], value) => {
        await expectNoFailure(method, path, JSON.stringify(value) ?? '');
      }),
      runs,
    );
  });

  it('when documents hold anything, then their tasks end without an inner error and search goes on', async () => {
    const document = fc.dictionary(fc.oneof(awkward, fc.constantFrom('title', 'kind', 'a.b')), anything, {
      maxKeys: 5,
    });
    await fc.assert(
      fc.asyncProperty(
        fc.array(document, { maxLength: 3 }),
        fc.constantFrom('POST', 'PUT'),
        async (documents, method) => {
          const body = JSON.stringify(documents.map((each, id) => ({ ...each, id })));
          const { status, body: summary } = await expectNoFailure(
            method,
            '/indexes/write-ups/documents',
            body,
          );
          if (status !== 202) return;
          const task = await search.client().tasks.waitForTask(summary['taskUid'] as number, { interval: 2 });
          expect(task.error?.code).not.toBe('internal');
          await expectNoFailure(
            'POST',
            '/indexes/write-ups/search',
            JSON.stringify({ facets: ['*'], attributesToHighlight: ['*'] }),
          );
        },
      ),
      { numRuns: 60 },
    );
  });

  it('when bodies are no JSON, cut off or of another type, then they are refused', async () => {
    const type = fc.constantFrom(
      'application/json',
      'text/csv',
      'application/x-ndjson',
      'text/plain',
      'nonsense',
    );
    await fc.assert(
      fc.asyncProperty(awkward, type, async (body, contentType) => {
        await expectNoFailure('POST', '/indexes/raw/documents', body, contentType);
        await expectNoFailure('POST', '/indexes/write-ups/search', body, contentType);
      }),
      runs,
    );
  });

  it.each([
    '/indexes/%00/search',
    '/indexes/%E0%A4%A/search',
    '/indexes/..%2f..%2fetc/documents',
    "/indexes/a'b/settings",
    '/tasks/abc',
    '/tasks/99999999999999999999',
    '/batches/-1',
    '/keys/%00',
    '/indexes/write-ups/documents/%00',
    '/indexes?limit=1e3',
    '/tasks?uids=1,x',
    '/nowhere',
  ])('when %s is asked for, then it is refused', async (path) => {
    const answer = await expectNoFailure('GET', path);
    expect(answer.status).toBeGreaterThanOrEqual(400);
  });

  it('when a body is nested beyond reason, then it is refused', async () => {
    const deep = `${'['.repeat(100_000)}${']'.repeat(100_000)}`;
    for (const path of ['/indexes/write-ups/documents', '/indexes/write-ups/search', '/multi-search']) {
      expect((await expectNoFailure('POST', path, deep)).body['code']).toBe('malformed_payload');
    }
  });

  it('when a field is called like an inner property of objects, then it is kept as any other', async () => {
    const index = await search.index('names', [{ id: 1 }]);
    const body = '[{"id":2,"__proto__":{"polluted":true},"constructor":"x","hasOwnProperty":"y"}]';
    const { body: summary } = await expectNoFailure('POST', '/indexes/names/documents', body);
    await search.client().tasks.waitForTask(summary['taskUid'] as number);
    expect(JSON.stringify(await index.getDocument(2))).toContain('"__proto__":{"polluted":true}');
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
    expect((await index.search('y')).hits).toHaveLength(1);
  });
});
