import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { idsOf, SearchUnderTest } from './search-under-test.js';

let search: SearchUnderTest;
beforeAll(async () => {
  search = await SearchUnderTest.started();
});
afterAll(() => search.stop());

const text = (id: number, words: string) => ({ id, words });

describe('which words find a document', () => {
  const cases: { name: string; words: string; query: string; found: boolean }[] = [
    { name: 'another form of the word', words: 'the bracket rocked', query: 'rocks', found: true },
    { name: 'capitals and accents', words: 'Écrou Moleté', query: 'ecrou molete ', found: true },
    { name: 'a contraction with its apostrophe', words: "it won't sit", query: 'wont ', found: true },
    { name: 'a contraction without its apostrophe', words: 'it doesnt sit', query: 'doesn’t ', found: true },
    { name: 'a figure with decimals', words: 'a lip of 22.5 mm', query: '22.5', found: true },
    { name: 'a figure with its unit stuck to it', words: 'a lip of 22.5mm', query: '22.5 mm', found: true },
    { name: 'another figure', words: 'a lip of 22.6 mm', query: '22.5 ', found: false },
    { name: 'a thread', words: 'adapter M48x0.75 male', query: 'm48×0.75', found: true },
    { name: 'another thread', words: 'adapter M42x0.75 male', query: 'm48x0.75 ', found: false },
    { name: 'part of a thread', words: 'adapter M48x0.75 male', query: 'm48 ', found: true },
    {
      name: 'the beginning of the last word',
      words: 'collimation drifts',
      query: 'drifts colli',
      found: true,
    },
    {
      name: 'the beginning of a word before the last',
      words: 'collimation drifts',
      query: 'colli drifts',
      found: false,
    },
    {
      name: 'the beginning of a last word that is closed by a space',
      words: 'collimation',
      query: 'colli ',
      found: false,
    },
    { name: 'four letters with a typo', words: 'boss', query: 'bess ', found: false },
    { name: 'five letters with a typo', words: 'screw', query: 'scrow ', found: true },
    {
      name: 'nine letters typed for eight, a swap and one too many',
      words: 'backlash',
      query: 'bakclaash ',
      found: true,
    },
    { name: 'eight letters with two letters wrong', words: 'dovetail', query: 'dovxtaix ', found: false },
    { name: 'nine letters with two typos', words: 'helicoids', query: 'halicoads ', found: true },
    { name: 'neighbours swapped, counted as one typo', words: 'recess', query: 'reecss ', found: true },
    {
      name: 'a wrong first letter in a middling word, counted as two',
      words: 'recess',
      query: 'tecess ',
      found: false,
    },
    { name: 'a wrong first letter in a long word', words: 'tensioner', query: 'rensioner ', found: true },
    { name: 'two words written as one', words: 'guide scope foot', query: 'guidescope ', found: true },
    { name: 'one word written as two', words: 'a new timingbelt', query: 'timing belt', found: true },
    { name: 'one word written as three', words: 'an offaxisguider', query: 'off axis guider', found: true },
    {
      name: 'words in quotes that follow each other',
      words: 'the belt bracket rocks',
      query: '"belt bracket"',
      found: true,
    },
    {
      name: 'words in quotes that stand apart',
      words: 'the belt and its bracket',
      query: '"belt bracket"',
      found: false,
    },
    { name: 'a word that was ruled out', words: 'belt bracket', query: 'belt -bracket', found: false },
  ];

  it.each(cases)('$name: "$query" on "$words" is $found', async ({ words, query, found }) => {
    const uid = `case-${cases.findIndex((each) => each.query === query && each.words === words)}`;
    const index = await search.index(uid, [text(1, words)]);
    const result = await index.search(query, { matchingStrategy: 'all' });
    expect(idsOf(result)).toEqual(found ? [1] : []);
  });

  it('when eleven words are typed, then the eleventh is not looked at', async () => {
    const index = await search.index('eleven', [text(1, 'aa bb cc dd ee ff gg hh ii jj')]);
    const result = await index.search('aa bb cc dd ee ff gg hh ii jj zz', { matchingStrategy: 'all' });
    expect(idsOf(result)).toEqual([1]);
  });
});

describe('matching strategies', () => {
  const documents = [
    text(1, 'belt bracket motor'),
    text(2, 'belt bracket'),
    text(3, 'belt'),
    text(4, 'motor'),
  ];

  it('when the strategy is last, then words are given up from the end and fuller matches come first', async () => {
    const index = await search.index('last', documents);
    expect(idsOf(await index.search('belt bracket motor '))).toEqual([1, 2, 3]);
  });

  it('when the strategy is all, then every word must be there', async () => {
    const index = await search.index('all', documents);
    expect(idsOf(await index.search('belt bracket motor ', { matchingStrategy: 'all' }))).toEqual([1]);
  });

  it('when the strategy is frequency, then the rarest word is kept', async () => {
    const index = await search.index('frequency', [
      ...documents,
      text(5, 'belt'),
      text(6, 'bracket'),
      text(7, 'bracket'),
    ]);
    const result = await index.search('belt motor ', { matchingStrategy: 'frequency' });
    expect(idsOf(result).sort()).toEqual([1, 4]);
  });

  it('when a word stands in no document, then the others still find', async () => {
    const index = await search.index('unknown', documents);
    expect(idsOf(await index.search('xyzzyx motor '))).toEqual(expect.arrayContaining([1, 4]));
    expect(idsOf(await index.search('xyzzyx motor ', { matchingStrategy: 'all' }))).toEqual([]);
  });
});

describe('settings about words', () => {
  it('when synonyms are set, then they find one way, also as several words', async () => {
    const synonyms = { wobble: ['rock'], 'focus motor': ['electronic focuser'] };
    const index = await search.index(
      'synonyms',
      [text(1, 'it rocks'), text(2, 'an electronic focuser'), text(3, 'it wobbles')],
      {
        synonyms,
      },
    );
    expect(idsOf(await index.search('wobble ')).sort()).toEqual([1, 3]);
    expect(idsOf(await index.search('rock '))).toEqual([1]);
    expect(idsOf(await index.search('focus motor ', { matchingStrategy: 'all' }))).toEqual([2]);
  });

  it('when a query has stop words, then they are passed over unless there is nothing else', async () => {
    const index = await search.index('stop-words', [text(1, 'the lip'), text(2, 'the boss')], {
      stopWords: ['the'],
    });
    expect(idsOf(await index.search('the lip ', { matchingStrategy: 'all' }))).toEqual([1]);
    expect(idsOf(await index.search('the lip '))).toEqual([1]);
    expect(idsOf(await index.search('the ')).sort()).toEqual([1, 2]);
  });

  it('when typos are switched off, for all or for one word, then only right spelling finds', async () => {
    const index = await search.index('no-typos', [text(1, 'bracket screw')], {
      typoTolerance: { disableOnWords: ['brackte'] },
    });
    expect(idsOf(await index.search('brackte '))).toEqual([]);
    expect(idsOf(await index.search('scrwe '))).toEqual([1]);
    await index.updateTypoTolerance({ enabled: false }).waitTask();
    expect(idsOf(await index.search('scrwe '))).toEqual([]);
  });

  it('when typos are switched off for an attribute, then they find in the others only', async () => {
    const documents = [
      { id: 1, title: 'bracket', text: '' },
      { id: 2, title: '', text: 'bracket' },
    ];
    const index = await search.index('strict-title', documents, {
      typoTolerance: { disableOnAttributes: ['title'] },
    });
    expect(idsOf(await index.search('brackte '))).toEqual([2]);
  });

  it('when prefix search is disabled, then beginnings of words do not find', async () => {
    const index = await search.index('no-prefix', [text(1, 'collimation')], { prefixSearch: 'disabled' });
    expect(idsOf(await index.search('colli'))).toEqual([]);
  });
});

describe('rank', () => {
  it('when a word stands in a more important attribute, then the document comes first', async () => {
    const documents = [
      { id: 1, title: 'motor stalls', text: 'the bracket is fine' },
      { id: 2, title: 'bracket rocks', text: 'the motor is fine' },
      { id: 3, title: 'belt slips', text: 'nothing else here' },
      { id: 4, title: 'dew heater', text: 'nothing else there' },
      { id: 5, title: 'guide foot', text: 'nothing more' },
    ];
    const index = await search.index('importance', documents, { searchableAttributes: ['title', 'text'] });
    expect(idsOf(await index.search('bracket '))).toEqual([2, 1]);
    expect(idsOf(await index.search('bracket ', { attributesToSearchOn: ['text'] }))).toEqual([1]);
  });

  it('when a word matches as typed, then the document comes before one with a typo', async () => {
    const others = Array.from({ length: 8 }, (_, at) => text(10 + at, 'nothing of the kind'));
    const index = await search.index('typed', [
      text(1, 'the shimmed hub'),
      text(2, 'the skimmed hub'),
      ...others,
    ]);
    const result = await index.search('skimmed ', { showRankingScore: true });
    expect(idsOf(result)).toEqual([2, 1]);
    const [first, second] = result.hits.map((hit) => hit._rankingScore ?? 0);
    expect(first).toBeGreaterThan(second ?? 1);
  });

  it('when a threshold for the rank is set, then weaker hits are left out', async () => {
    const index = await search.index('threshold', [text(1, 'belt bracket motor'), text(2, 'belt')]);
    const result = await index.search('belt bracket motor ', { rankingScoreThreshold: 0.6 });
    expect(idsOf(result)).toEqual([1]);
    expect(result.estimatedTotalHits).toBe(1);
  });
});
