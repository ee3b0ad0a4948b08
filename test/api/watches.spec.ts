import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { mostWatches } from '../../shared/contract/watches.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart, type TestPart } from './support/catalogue.js';
import { throughAllPages } from './support/pages.js';
import { insertJoint, completeContent, publishNew } from './support/write-ups.js';

let app: TestApp;
let member: MemberAgent;
let part: TestPart;

beforeEach(async () => {
  app = await startTestApp();
  member = await app.memberNamed('Ada Winder');
  part = await insertPart(app.knex, { name: 'Motor M' });
});
afterEach(() => app.close());

const keys = async (): Promise<string[]> =>
  (await member.get('/api/my/watches/keys').expect(200)).body.keys.sort();

describe('a watch', () => {
  it('is there once, however often it is made, and gone when it is ended', async () => {
    await member.put(`/api/watches/part/${part.id}`).expect(204);
    await member.put(`/api/watches/part/${part.id}`).expect(204);
    expect(await keys()).toEqual([`part/${part.id}`]);

    await member.delete(`/api/watches/part/${part.id}`).expect(204);
    await member.delete(`/api/watches/part/${part.id}`).expect(204);

    expect(await keys()).toEqual([]);
  });

  it('stands in the list with name and address, the newest first', async () => {
    const joint = await insertJoint(app.knex);
    const published = await publishNew(
      await app.memberNamed('Bo Author'),
      await app.as('moderator'),
      completeContent(joint),
    );
    await member.put(`/api/watches/part/${part.id}`).expect(204);
    await member.put(`/api/watches/revision/${part.revisions[1]!.id}`).expect(204);
    await member.put(`/api/watches/write-up/${published.writeUpId}`).expect(204);

    const items = await throughAllPages<Record<string, unknown>>(member, '/api/my/watches');

    expect(items.map(({ name, path }) => [name, path])).toEqual(
      expect.arrayContaining([
        ['Bracket rocks on the raised lip', `/write-ups/${published.slug}`],
        ['Motor M Rev B', `/parts/${part.slug}`],
        ['Motor M', `/parts/${part.slug}`],
      ]),
    );
    expect(items).toHaveLength(3);
    const times = items.map(({ createdAt }) => String(createdAt));
    expect(times).toEqual([...times].sort().reverse());
  });

  it('is refused on what is not there or not published', async () => {
    const draft = (await member.post('/api/write-ups').send({}).expect(201)).body;
    for (const address of ['part/999999', `write-up/${draft.writeUpId}`, 'question/999999', 'person/1']) {
      const answer = await member.put(`/api/watches/${address}`);
      expect([address, answer.status, answer.body.type]).toEqual([address, 404, '/problems/not-found']);
    }
    expect(await keys()).toEqual([]);
  });

  it('is refused beyond as many as one person can have, and one that is there is not', async () => {
    await app.knex('watches').insert(
      Array.from({ length: mostWatches }, (_, index) => ({
        account_id: member.account.id,
        subject: 'question',
        subject_id: index + 1,
        created_at: new Date(),
      })),
    );
    const answer = await member.put(`/api/watches/part/${part.id}`);
    expect([answer.status, answer.body.fields[0].path]).toEqual([422, 'id']);

    await member.delete('/api/watches/question/1').expect(204);
    await member.put(`/api/watches/part/${part.id}`).expect(204);
    await member.put(`/api/watches/part/${part.id}`).expect(204);
    expect(await keys()).toHaveLength(mostWatches);
  });

  it('is nobody else’s to see or end', async () => {
    await member.put(`/api/watches/part/${part.id}`).expect(204);
    const other = await app.memberNamed('Cy Other');

    await other.delete(`/api/watches/part/${part.id}`).expect(204);

    expect((await other.get('/api/my/watches').expect(200)).body.items).toEqual([]);
    expect(await keys()).toEqual([`part/${part.id}`]);
  });

  it('says that what it is on is no longer there', async () => {
    await app.knex('watches').insert({
      account_id: member.account.id,
      subject: 'question',
      subject_id: 999_999,
      created_at: new Date(),
    });
    const { items } = (await member.get('/api/my/watches').expect(200)).body;
    expect(items).toMatchObject([{ subject: 'question', id: 999_999, name: null, path: null }]);
  });
});

describe('when parts are merged', () => {
  it('watches on the part and its revisions go on with the one that stays, once for who watched both', async () => {
    const kept = await insertPart(app.knex, { name: 'Motor M again', revisions: ['Rev A', 'Rev C'] });
    const other = await app.memberNamed('Cy Other');
    const [a, b] = part.revisions;
    await member.put(`/api/watches/part/${part.id}`).expect(204);
    await member.put(`/api/watches/part/${kept.id}`).expect(204);
    await member.put(`/api/watches/revision/${a!.id}`).expect(204);
    await other.put(`/api/watches/part/${part.id}`).expect(204);
    await other.put(`/api/watches/revision/${b!.id}`).expect(204);

    await (
      await app.as('moderator')
    )
      .post('/api/desk/merges')
      .send({
        kind: 'part',
        from: part.id,
        into: kept.id,
        revisionMap: [{ from: a!.id, into: kept.revisions[0]!.id }],
      })
      .expect(200);

    expect(await keys()).toEqual([`part/${kept.id}`, `revision/${kept.revisions[0]!.id}`]);
    const others = (await other.get('/api/my/watches').expect(200)).body.items;
    expect(others.map(({ name }: { name: string }) => name).sort()).toEqual([
      'Motor M again',
      'Motor M again Rev B',
    ]);
  });
});
