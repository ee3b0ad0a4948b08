import { describe, expect, test } from 'vitest';
import { SearchQuery } from '../../shared/contract/search.js';
import { runsOf } from './hit-marks.js';
import { pageFrom, placeOf, queriesFor, type Found } from './search-request.js';

function foundOf(...ids: number[]): Found {
  return { hits: ids.map((id) => ({ id })) } as unknown as Found;
}

function idsOf(page: ReturnType<typeof pageFrom>): number[] {
  return page.hits.map((hit) => hit.id);
}

describe('pages over groups', () => {
  test('when the first group fills a page, then the next page goes on within it', () => {
    const page = pageFrom([foundOf(1, 2, 3), foundOf(4, 5)], { group: 0, offset: 0 }, 2);
    expect(idsOf(page)).toEqual([1, 2]);
    expect(placeOf(SearchQuery.parse({ cursor: page.next }))).toEqual({ group: 0, offset: 2 });
  });

  test('when a page goes over the end of a group, then the next page goes on in the later one', () => {
    const page = pageFrom([foundOf(3), foundOf(4, 5, 6)], { group: 0, offset: 2 }, 2);
    expect(idsOf(page)).toEqual([3, 4]);
    expect(placeOf(SearchQuery.parse({ cursor: page.next }))).toEqual({ group: 1, offset: 1 });
  });

  test('when there is nothing after a page, then there is no next one', () => {
    expect(pageFrom([foundOf(), foundOf(), foundOf(7, 8)], { group: 2, offset: 4 }, 2).next).toBeNull();
    expect(pageFrom([foundOf()], { group: 0, offset: 0 }, 2)).toEqual({ hits: [], next: null });
  });
});

describe('queries of one screen', () => {
  test('when values of two facets are chosen, then each of the two is counted without its own', () => {
    const query = SearchQuery.parse({ q: 'rocks', kind: ['shim'], part: ['m1'] });
    const { queries, facets } = queriesFor(query, [undefined], 'write-ups');
    expect(facets).toEqual([['revision', 'symptom', 'permanence', 'standing'], ['part'], ['kind']]);
    expect(queries.map((each) => each.filter)).toEqual([
      ['partSlugs IN ["m1"]', 'kind IN ["shim"]'],
      ['partSlugs IN ["m1"]', 'kind IN ["shim"]'],
      ['kind IN ["shim"]'],
      ['partSlugs IN ["m1"]'],
    ]);
  });

  test('when nothing is asked, then the newest come first', () => {
    expect(queriesFor(SearchQuery.parse({}), [undefined], 'write-ups').queries[0]?.sort).toEqual([
      'publishedAt:desc',
    ]);
    expect(
      queriesFor(SearchQuery.parse({ q: 'rocks' }), [undefined], 'write-ups').queries[0]?.sort,
    ).toBeUndefined();
  });

  test('when a cursor is not one, then the field is named', () => {
    expect(() => placeOf(SearchQuery.parse({ cursor: 'nonsense' }))).toThrow(
      expect.objectContaining({ status: 422 }),
    );
  });
});

test('when the engine marks words, then they are told apart and no mark is left', () => {
  expect(runsOf('the \uE000lip\uE001 rocks \uE000on\uE001')).toEqual([
    { text: 'the ', hit: false },
    { text: 'lip', hit: true },
    { text: ' rocks ', hit: false },
    { text: 'on', hit: true },
  ]);
  expect(runsOf('cut \uE000off')).toEqual([
    { text: 'cut ', hit: false },
    { text: 'off', hit: true },
  ]);
  expect(runsOf('\uE001stray')).toEqual([{ text: 'stray', hit: false }]);
  expect(runsOf('')).toEqual([]);
});
