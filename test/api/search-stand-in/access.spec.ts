import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Key } from 'meilisearch';
import { generateTenantToken } from 'meilisearch/token';
import { idsOf, masterKey, refusalOf, SearchUnderTest } from './search-under-test.js';

const documents = [
  { id: 1, maker: 'Tarn', title: 'bracket' },
  { id: 2, maker: 'Cotterpin', title: 'bracket' },
];

let search: SearchUnderTest;
beforeAll(async () => {
  search = await SearchUnderTest.started();
  await search.index('write-ups', documents, { filterableAttributes: ['maker'] });
  await search.index('parts', documents, { filterableAttributes: ['maker'] });
});
afterAll(() => search.stop());

const made = (actions: string[], indexes = ['*'], expiresAt: Date | null = null) =>
  search.client().createKey({ actions, indexes, expiresAt });

const forbidden = { status: 403, code: 'invalid_api_key' };

describe('keys', () => {
  it('when no key is sent, then only health answers', async () => {
    const stranger = search.client('');
    expect(await stranger.health()).toEqual({ status: 'available' });
    expect(await refusalOf(stranger.getStats())).toEqual({
      status: 401,
      code: 'missing_authorization_header',
    });
    expect(await refusalOf(stranger.index('write-ups').search(''))).toEqual({
      status: 401,
      code: 'missing_authorization_header',
    });
  });

  it('when a wrong key is sent, then it is forbidden', async () => {
    expect(await refusalOf(search.client(`${masterKey}x`).getVersion())).toEqual(forbidden);
    const answer = await search.send('GET', '/version', undefined, { authorization: 'Basic abc' });
    expect(answer.status).toBe(403);
  });

  it('when the server starts, then there are a search key and an admin key, each for its work', async () => {
    const { results } = await search.client().getKeys();
    const keyFor = (action: string) => results.find(({ actions }) => actions.includes(action))?.key;
    const searcher = search.client(keyFor('search'));
    expect(idsOf(await searcher.index('write-ups').search('bracket'))).toHaveLength(2);
    expect(await refusalOf(searcher.index('write-ups').getDocuments())).toEqual(forbidden);
    const admin = search.client(keyFor('*'));
    expect((await admin.index('write-ups').getDocuments()).total).toBe(2);
    expect((await admin.getVersion()).pkgVersion).toMatch(/^\d+\.\d+\.\d+$/);
  });

  it('when a key is made, renamed and deleted, then each shows and it works until then', async () => {
    const key = await made(['documents.*']);
    const holder = search.client(key.key);
    expect((await holder.index('write-ups').getDocuments()).total).toBe(2);
    await search.client().updateKey(key.uid, { name: 'reader', description: 'reads' });
    expect(await search.client().getKey(key.key)).toMatchObject({
      uid: key.uid,
      name: 'reader',
      description: 'reads',
    });
    await search.client().deleteKey(key.uid);
    expect(await refusalOf(search.client().getKey(key.uid))).toEqual({
      status: 404,
      code: 'api_key_not_found',
    });
    expect(await refusalOf(holder.index('write-ups').getDocuments())).toEqual(forbidden);
  });

  it('when a key is for some indexes, then others are forbidden, and out of sight in lists', async () => {
    const key = await made(['*'], ['write*']);
    const holder = search.client(key.key);
    expect(idsOf(await holder.index('write-ups').search('bracket'))).toHaveLength(2);
    expect(await refusalOf(holder.index('parts').search('bracket'))).toEqual(forbidden);
    expect((await holder.getRawIndexes()).results.map(({ uid }) => uid)).toEqual(['write-ups']);
    const { results } = await holder.tasks.getTasks();
    expect(new Set(results.map(({ indexUid }) => indexUid))).toEqual(new Set(['write-ups']));
    const swap = holder.swapIndexes([{ indexes: ['write-ups', 'parts'], rename: false }]);
    expect(await refusalOf(swap)).toEqual(forbidden);
  });

  it('when a key has run out, then it is forbidden', async () => {
    const key = await made(['search'], ['*'], new Date(Date.now() + 400));
    const holder = search.client(key.key);
    await expect
      .poll(() => refusalOf(holder.index('write-ups').search('')).catch(() => undefined))
      .toEqual(forbidden);
  });

  it.each([
    { key: { indexes: ['*'], expiresAt: null }, code: 'missing_api_key_actions' },
    { key: { actions: ['*'], expiresAt: null }, code: 'missing_api_key_indexes' },
    { key: { actions: ['*'], indexes: ['*'] }, code: 'missing_api_key_expires_at' },
    { key: { actions: ['fly'], indexes: ['*'], expiresAt: null }, code: 'invalid_api_key_actions' },
    { key: { actions: ['*'], indexes: ['a b'], expiresAt: null }, code: 'invalid_api_key_indexes' },
    { key: { actions: ['*'], indexes: ['*'], expiresAt: '2001-01-01' }, code: 'invalid_api_key_expires_at' },
    { key: { actions: ['*'], indexes: ['*'], expiresAt: null, uid: 'x' }, code: 'invalid_api_key_uid' },
  ])('when $key is to be a key, then it is refused as $code', async ({ key, code }) => {
    const answer = await search.send('POST', '/keys', JSON.stringify(key));
    expect([answer.status, answer.body['code']]).toEqual([400, code]);
  });

  it('when what a key allows is to be changed, then it is refused', async () => {
    const key = await made(['search']);
    const answer = await search.send('PATCH', `/keys/${key.uid}`, JSON.stringify({ actions: ['*'] }));
    expect([answer.status, answer.body['code']]).toEqual([400, 'immutable_api_key_actions']);
  });

  it('when the server starts again, then keys are still there and work', async () => {
    const key = await made(['search']);
    await search.restart();
    expect(idsOf(await search.client(key.key).index('write-ups').search('bracket'))).toHaveLength(2);
  });
});

describe('tenant tokens', () => {
  const token = (
    key: Key,
    searchRules: Parameters<typeof generateTenantToken>[0]['searchRules'],
    more = {},
  ) => generateTenantToken({ apiKey: key.key, apiKeyUid: key.uid, searchRules, ...more });

  it('when a token carries a filter, then every search has it on top of its own', async () => {
    const key = await made(['search']);
    const tenant = search.client(await token(key, { 'write-ups': { filter: 'maker = Tarn' } }));
    expect(idsOf(await tenant.index('write-ups').search('bracket'))).toEqual([1]);
    expect(idsOf(await tenant.index('write-ups').search('', { filter: 'maker = Cotterpin' }))).toEqual([]);
    const { results } = await tenant.multiSearch({ queries: [{ indexUid: 'write-ups', q: '' }] });
    expect(results.map(idsOf)).toEqual([[1]]);
    const { facetHits } = await tenant.index('write-ups').searchForFacetValues({ facetName: 'maker' });
    expect(facetHits).toEqual([{ value: 'Tarn', count: 1 }]);
    expect(await refusalOf(tenant.index('parts').search(''))).toEqual(forbidden);
    expect(await refusalOf(tenant.index('write-ups').getDocuments())).toEqual(forbidden);
  });

  it('when a token names indexes by pattern, then these are open', async () => {
    const key = await made(['search']);
    const tenant = search.client(await token(key, ['wri*']));
    expect(idsOf(await tenant.index('write-ups').search(''))).toEqual([1, 2]);
    expect(await refusalOf(tenant.index('parts').search(''))).toEqual(forbidden);
  });

  it('when a token has run out, was altered, or its key may not search or is gone, then it is forbidden', async () => {
    const key = await made(['search']);
    const good = await token(key, ['*']);
    const late = await token(key, ['*'], { expiresAt: new Date(Date.now() - 1000) });
    const [head = '', , signature = ''] = good.split('.');
    const claims = Buffer.from(JSON.stringify({ searchRules: ['*'], apiKeyUid: key.uid, extra: 1 })).toString(
      'base64url',
    );
    const noAlgorithm = Buffer.from(JSON.stringify({ alg: 'none', typ: 'JWT' })).toString('base64url');
    const notSearching = await token(await made(['documents.get']), ['*']);
    const tokens = [
      late,
      `${head}.${claims}.${signature}`,
      `${noAlgorithm}.${good.split('.')[1]}.`,
      notSearching,
      'a.b.c',
    ];
    for (const bad of tokens)
      expect(await refusalOf(search.client(bad).index('write-ups').search(''))).toEqual(forbidden);
    await search.client().deleteKey(key.uid);
    expect(await refusalOf(search.client(good).index('write-ups').search(''))).toEqual(forbidden);
  });
});
