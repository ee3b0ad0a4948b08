import express from 'express';
import { Meilisearch } from 'meilisearch';
import { pino } from 'pino';
import request from 'supertest';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { visitor } from '../../server/http/caller.js';
import { mountRoutes } from '../../server/http/mount.js';
import { problemHandler } from '../../server/http/problem-handler.js';
import { requestLog } from '../../server/http/request-log.js';
import { rebuildSearch } from '../../server/search/rebuild.js';
import { createSearch } from '../../server/search/search.js';
import { TaskFailed, createSearchIndex, type SearchIndex } from '../../server/search/search-index.js';
import {
  createSearchOutbox,
  createSearchOutboxStore,
  type SearchOutboxStore,
} from '../../server/search/search-outbox.store.js';
import { workBatch } from '../../server/search/search-worker.js';
import { createWriteUpDocumentStore } from '../../server/search/write-up-document.store.js';
import { searchRoutes, type WriteUpDocument } from '../../shared/contract/search.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { fromSetUp, workerNumber } from './support/environment.js';
import { indexIsInStep } from './support/search.js';
import { completeContent, insertJoint, publishNew, type PublishedWriteUp } from './support/write-ups.js';

const indexUid = `write-ups-${workerNumber}`;
const engine = new Meilisearch({ host: fromSetUp('TEST_MEILI_HOST'), apiKey: fromSetUp('TEST_MEILI_KEY') });
/** Nothing listens there. */
const deadEngine = new Meilisearch({ host: 'http://127.0.0.1:9', apiKey: 'x' });
const logger = pino({ level: 'silent' });

let app: TestApp;
let author: MemberAgent;
let moderator: MemberAgent;
let outbox: SearchOutboxStore;
let now: Date;

beforeAll(async () => {
  app = await startTestApp({ search: true });
  author = await app.memberNamed('Author');
  moderator = await app.as('moderator');
  outbox = createSearchOutboxStore(app.knex);
});
afterAll(() => app.close());

beforeEach(() => {
  now = new Date();
});

const publish = async (title: string): Promise<PublishedWriteUp> =>
  publishNew(author, moderator, completeContent(await insertJoint(app.knex), { title }));

const documentIn = (id: number): Promise<WriteUpDocument | null> =>
  engine
    .index<WriteUpDocument>(indexUid)
    .getDocument(id)
    .catch(() => null);

const note = (id: number): Promise<void> => createSearchOutbox({ clock: () => now }).add(app.knex, id);

describe('while the worker of the app runs', () => {
  test('when an edition is published, then it can be found, with what it says now', async () => {
    const { slug, writeUpId } = await publish('Snarfle under the plate');
    await indexIsInStep(app);
    const found = await app.visitor().get('/api/search').query({ q: 'snarfle' });
    expect(found.body.items.map((item: { slug: string }) => item.slug)).toEqual([slug]);
    expect(await documentIn(writeUpId)).toMatchObject({
      id: writeUpId,
      slug,
      title: 'Snarfle under the plate',
      kind: ['shim'],
      standing: ['told'],
    });
  });

  test('when a trial changes the standing of a fix, then the index says so', async () => {
    const content = completeContent(await insertJoint(app.knex), { title: 'Tried fix' });
    const { slug, writeUpId } = await publishNew(author, moderator, content);
    const other = await app.memberNamed('Somebody who tries');
    const revisionIds = content.joints[0]!.a.revisions.slice(0, 1).map((mark) => mark.revisionId);
    await other
      .post(`/api/write-ups/${slug}/trials`)
      .send({ fixKey: content.fixes[0]!.key, outcome: 'held', revisionIds, note: 'It sits.', figure: null })
      .expect(201);
    await indexIsInStep(app);
    expect(await documentIn(writeUpId)).toMatchObject({ standing: ['tried'] });
  });

  test('when the same write-up is noted many times, then its document is right and nothing is left to do', async () => {
    const { writeUpId } = await publish('Noted often');
    await Promise.all(Array.from({ length: 25 }, () => note(writeUpId)));
    await indexIsInStep(app);
    expect(await documentIn(writeUpId)).toMatchObject({ title: 'Noted often' });
  });

  test('when a write-up is no longer there, then it is no longer found', async () => {
    const { writeUpId } = await publish('Taken back');
    await indexIsInStep(app);
    expect(await documentIn(writeUpId)).not.toBeNull();
    await app.knex('write_ups').where('id', writeUpId).update({ published_edition_id: null });
    await note(writeUpId);
    await indexIsInStep(app);
    expect(await documentIn(writeUpId)).toBeNull();
  });

  test('when the command that noted a write-up is rolled back, then nothing is noted', async () => {
    await expect(
      app.knex.transaction(async (trx) => {
        await createSearchOutbox({ clock: () => now }).add(trx, 999_999);
        throw new Error('refused');
      }),
    ).rejects.toThrow('refused');
    expect(await app.knex('search_outbox').where('write_up_id', 999_999)).toEqual([]);
  });
});

describe('one batch of work', () => {
  // The running worker would take the notes away.
  beforeEach(() => Promise.all(app.workers.map((worker) => worker.stop())));
  afterEach(() => app.knex('search_outbox').delete());

  const parts = (index: SearchIndex) => ({
    outbox,
    documents: createWriteUpDocumentStore(app.knex),
    index,
    clock: () => now,
    logger,
  });
  const rowsOf = (id: number) =>
    app.knex('search_outbox').where('write_up_id', id).select('attempts', 'next_try_at', 'last_error');

  test('when the engine does not answer, then the note waits longer each time and is worked once it answers', async () => {
    const { writeUpId } = await publish('Waits for the engine');
    await app.knex('search_outbox').delete();
    await note(writeUpId);
    const pauses: number[] = [];
    for (let tries = 1; tries <= 3; tries += 1) {
      expect(await workBatch(parts(createSearchIndex(deadEngine, indexUid)))).toBe(1);
      const [row] = await rowsOf(writeUpId);
      expect(row).toMatchObject({ attempts: tries, last_error: expect.stringMatching(/\w/) });
      pauses.push(row.next_try_at.getTime() - now.getTime());
      expect(await workBatch(parts(createSearchIndex(deadEngine, indexUid)))).toBe(0);
      now = row.next_try_at;
    }
    expect(pauses).toEqual([500, 1000, 2000]);
    expect(await workBatch(parts(createSearchIndex(engine, indexUid)))).toBe(1);
    expect(await rowsOf(writeUpId)).toEqual([]);
    expect(await documentIn(writeUpId)).toMatchObject({ title: 'Waits for the engine' });
  });

  test('when the engine refuses one document, then the others get in and that one waits', async () => {
    const good = await publish('Good document');
    const bad = await publish('Bad document');
    await app.knex('search_outbox').delete();
    await note(good.writeUpId);
    await note(bad.writeUpId);
    const index = createSearchIndex(engine, indexUid);
    const refusing: SearchIndex = {
      ...index,
      put: async (documents) => {
        if (documents.some((document) => document.id === bad.writeUpId)) throw new TaskFailed('refused');
        await index.put(documents);
      },
    };
    await workBatch(parts(refusing));
    expect(await documentIn(good.writeUpId)).toMatchObject({ title: 'Good document' });
    expect(await rowsOf(good.writeUpId)).toEqual([]);
    expect(await rowsOf(bad.writeUpId)).toMatchObject([{ attempts: 1, last_error: 'refused' }]);
  });

  test('when two workers look at once, then each note goes to one of them', async () => {
    for (let id = 1; id <= 30; id += 1) await note(id);
    const later = new Date(now.getTime() + 30_000);
    const claims = await Promise.all([
      outbox.claim(now, later, 100),
      outbox.claim(now, later, 100),
      outbox.claim(now, later, 100),
    ]);
    const ids = claims.flat().map((claimed) => claimed.id);
    expect(new Set(ids).size).toBe(ids.length);
    expect(ids.length + (await outbox.claim(now, later, 100)).length).toBe(30);
  });

  test('when a worker dies with a note, then the note is due again after its lease, and not before', async () => {
    await note(4711);
    const later = new Date(now.getTime() + 30_000);
    expect(await outbox.claim(now, later, 10)).toHaveLength(1);
    expect(await outbox.claim(new Date(later.getTime() - 1), new Date(later.getTime() + 30_000), 10)).toEqual(
      [],
    );
    expect(await outbox.claim(later, new Date(later.getTime() + 30_000), 10)).toHaveLength(1);
  });

  test('when a write-up is noted again while it is worked on, then the second note waits its turn and is not lost', async () => {
    await note(4712);
    const later = new Date(now.getTime() + 30_000);
    const [first] = await outbox.claim(now, later, 10);
    await note(4712);
    expect(await outbox.claim(now, later, 10)).toEqual([]);
    await outbox.settle([first!.id]);
    expect(await outbox.claim(now, later, 10)).toHaveLength(1);
  });

  test('when a command notes a write-up while a worker claims, then neither waits for the other', async () => {
    await note(4713);
    await app.knex.transaction(async (trx) => {
      await createSearchOutbox({ clock: () => now }).add(trx, 4714);
      expect(await outbox.claim(now, new Date(now.getTime() + 30_000), 10)).toMatchObject([
        { writeUpId: 4713 },
      ]);
      await createSearchOutbox({ clock: () => now }).add(trx, 4715);
    });
    expect(
      (await outbox.claim(now, new Date(now.getTime() + 30_000), 10))
        .map((claimed) => claimed.writeUpId)
        .sort(),
    ).toEqual([4714, 4715]);
  });

  test('when the index is made anew, then it says what the database says, and there was no moment without results', async () => {
    const kept = await publish('Brimtok kept');
    const lost = await publish('Brimtok lost');
    await app.knex('search_outbox').delete();
    const index = createSearchIndex(engine, indexUid);
    const stray = {
      ...(await createWriteUpDocumentStore(app.knex).documentsOf([kept.writeUpId])).get(kept.writeUpId)!,
      id: 888_888,
      title: 'Brimtok stray',
    };
    await index.put([stray, { ...stray, id: kept.writeUpId, title: 'Brimtok old title' }]);
    await index.remove([lost.writeUpId]);

    const totals: number[] = [];
    let rebuilt = false;
    const searching = (async () => {
      while (!rebuilt) {
        const found = await engine.index(indexUid).search('brimtok');
        totals.push(found.hits.length);
      }
    })();
    const said: string[] = [];
    await rebuildSearch({
      knex: app.knex,
      engine,
      indexUid,
      clock: () => now,
      logger,
      say: (line) => void said.push(line),
    });
    rebuilt = true;
    await searching;

    expect(Math.min(...totals)).toBeGreaterThan(0);
    expect(await documentIn(888_888)).toBeNull();
    expect(await documentIn(kept.writeUpId)).toMatchObject({ title: 'Brimtok kept' });
    expect(await documentIn(lost.writeUpId)).toMatchObject({ title: 'Brimtok lost' });
    expect((await engine.getIndexes({ limit: 100 })).results.map((each) => each.uid)).not.toContain(
      `${indexUid}-next`,
    );
    expect(said).toHaveLength(3);
  });

  test('when a write-up changes between being read and the swap, then the new index has the change', async () => {
    const { writeUpId, editionId } = await publish('Before the swap');
    await app.knex('search_outbox').delete();
    const says: string[] = [];
    const say = async (line: string): Promise<void> => {
      if (says.push(line) > 1) return;
      await app
        .knex('editions')
        .where('id', editionId)
        .update({ content: app.knex.raw("JSON_SET(content, '$.title', 'After the swap')") });
    };
    await rebuildSearch({ knex: app.knex, engine, indexUid, clock: () => now, logger, say });
    expect(await documentIn(writeUpId)).toMatchObject({ title: 'After the swap' });
    expect(says.at(-1)).toMatch(/^1 /);
  });
});

describe('when the engine is down', () => {
  const search = () =>
    createSearch({
      knex: app.knex,
      search: deadEngine,
      clock: () => now,
      logger,
      benchOf: () => Promise.resolve([]),
      indexUid,
    });

  test('when somebody searches, then that is told as such, with when to try again', async () => {
    const server = express();
    server.use(requestLog(logger));
    mountRoutes(server, searchRoutes, search().bindings, {
      callerOf: () => visitor,
      csrf: (_request, _response, next) => next(),
    });
    server.use(problemHandler);
    const answer = await request(server).get('/api/search').query({ q: 'lip' });
    expect(answer.status).toBe(503);
    expect(answer.headers['retry-after']).toMatch(/^\d+$/);
    expect(answer.body).toMatchObject({
      type: '/problems/search-unavailable',
      remedy: expect.stringMatching(/\w/),
    });
  });

  test('when its health is asked, then it is not well, and the living one is', async () => {
    expect(await search().health()).toMatchObject({ ok: false, detail: expect.stringMatching(/\w/) });
    const living = createSearch({
      knex: app.knex,
      search: engine,
      clock: () => now,
      logger,
      benchOf: () => Promise.resolve([]),
      indexUid,
    });
    expect(await living.health()).toMatchObject({ ok: true });
  });
});
