import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startTestApp, type TestApp } from './support/app.js';
import { insertPart } from './support/catalogue.js';

let app: TestApp;

beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

describe('my bench', () => {
  it('takes a part with its revision, and gives it back with all revisions of the part', async () => {
    const part = await insertPart(app.knex);
    const me = await app.memberNamed('Owner');
    const added = await me.post('/api/bench').send({ partId: part.id, revisionId: part.revisions[1]!.id });
    expect(added.status).toBe(201);
    expect(added.body).toMatchObject({
      part: { id: part.id, name: part.name },
      revision: { label: 'Rev B', partId: part.id },
    });
    const { body } = await me.get('/api/bench').expect(200);
    expect(body.items).toEqual([added.body]);
    expect(body.items[0].part.revisions).toHaveLength(2);
  });

  it('takes two revisions of one part but not the same one twice, the unknown one included', async () => {
    const part = await insertPart(app.knex);
    const me = await app.memberNamed('Owner');
    const add = (revisionId: number | null) => me.post('/api/bench').send({ partId: part.id, revisionId });
    expect((await add(null)).status).toBe(201);
    expect((await add(part.revisions[0]!.id)).status).toBe(201);
    const again = await add(null);
    expect([again.status, again.body.type]).toEqual([409, '/problems/already-there']);
    expect((await me.get('/api/bench')).body.items).toHaveLength(2);
  });

  it('takes the same part only once when it is sent twice at the same moment', async () => {
    const part = await insertPart(app.knex);
    const me = await app.memberNamed('Owner');
    const sent = { partId: part.id, revisionId: null };
    const answers = await Promise.all([1, 2, 3].map(() => me.post('/api/bench').send(sent)));
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409, 409]);
    expect((await me.get('/api/bench')).body.items).toHaveLength(1);
  });

  it('changes the revision, and refuses one that would stand there twice', async () => {
    const part = await insertPart(app.knex);
    const me = await app.memberNamed('Owner');
    const { body: unknown } = await me.post('/api/bench').send({ partId: part.id, revisionId: null });
    await me.post('/api/bench').send({ partId: part.id, revisionId: part.revisions[0]!.id });
    const changed = await me.patch(`/api/bench/${unknown.id}`).send({ revisionId: part.revisions[1]!.id });
    expect([changed.status, changed.body.revision.label]).toEqual([200, 'Rev B']);
    const twice = await me.patch(`/api/bench/${unknown.id}`).send({ revisionId: part.revisions[0]!.id });
    expect(twice.status).toBe(409);
    const labels = (await me.get('/api/bench')).body.items.map(
      (item: { revision: { label: string } }) => item.revision.label,
    );
    expect(labels).toEqual(['Rev B', 'Rev A']);
  });

  it('refuses a part that is not there and a revision of another part, naming the field', async () => {
    const [part, other] = [await insertPart(app.knex), await insertPart(app.knex)];
    const me = await app.memberNamed('Owner');
    const refused = async (body: object): Promise<unknown[]> => {
      const answer = await me.post('/api/bench').send(body);
      return [answer.status, answer.body.fields[0].path];
    };
    expect(await refused({ partId: 999_999_999, revisionId: null })).toEqual([422, 'partId']);
    expect(await refused({ partId: part.id, revisionId: other.revisions[0]!.id })).toEqual([
      422,
      'revisionId',
    ]);
    expect(await refused({ partId: part.id })).toEqual([422, 'revisionId']);
    expect((await me.get('/api/bench')).body.items).toEqual([]);
  });

  it('takes a part off', async () => {
    const part = await insertPart(app.knex);
    const me = await app.memberNamed('Owner');
    const { body } = await me.post('/api/bench').send({ partId: part.id, revisionId: null });
    expect((await me.delete(`/api/bench/${body.id}`)).status).toBe(204);
    expect((await me.get('/api/bench')).body.items).toEqual([]);
    expect((await me.delete(`/api/bench/${body.id}`)).status).toBe(404);
  });

  it('is nobody else’s to see or to change', async () => {
    const part = await insertPart(app.knex);
    const [mine, theirs] = [await app.memberNamed('Owner'), await app.memberNamed('Stranger')];
    const { body } = await mine.post('/api/bench').send({ partId: part.id, revisionId: null });
    expect((await theirs.get('/api/bench')).body.items).toEqual([]);
    expect(
      (await theirs.patch(`/api/bench/${body.id}`).send({ revisionId: part.revisions[0]!.id })).status,
    ).toBe(404);
    expect((await theirs.delete(`/api/bench/${body.id}`)).status).toBe(404);
    expect((await app.visitor().get('/api/bench')).status).toBe(401);
    expect((await mine.get('/api/bench')).body.items).toEqual([body]);
  });
});
