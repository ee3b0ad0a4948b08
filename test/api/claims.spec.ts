import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DeskItem } from '../../shared/contract/desk-queue.js';
import type { Draft } from '../../shared/contract/write-ups.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import {
  completeContent,
  insertJoint,
  saveNewDraft,
  submitDraft,
  type TestJoint,
} from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let one: MemberAgent;
let two: MemberAgent;
let joint: TestJoint;
let now = new Date('2026-12-01T20:00:00Z');

beforeAll(async () => {
  app = await startTestApp({ clock: () => now });
  [author, one, two] = await Promise.all([
    app.memberNamed('Author'),
    app.as('moderator'),
    app.as('moderator'),
  ]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

const later = (minutes: number): void => {
  now = new Date(now.getTime() + minutes * 60_000);
};
const onDesk = async (): Promise<Draft> =>
  submitDraft(author, await saveNewDraft(author, completeContent(joint)));
const claim = (who: MemberAgent, id: number, takeOverFrom: number | null = null) =>
  who.put(`/api/desk/claims/edition/${id}`).send({ takeOverFrom });
const giveUp = (who: MemberAgent, id: number) => who.delete(`/api/desk/claims/edition/${id}`);
const publish = (who: MemberAgent, id: number) =>
  who.post(`/api/desk/editions/${id}/publish`).send({ note: '' });
const itemOf = async (who: MemberAgent, id: number): Promise<DeskItem> =>
  (await who.get('/api/desk?limit=100&kind=edition').expect(200)).body.items.find(
    (item: DeskItem) => item.id === id,
  );

describe('claiming an item', () => {
  it('gives it to exactly one of two moderators who ask at the same moment', async () => {
    const { id } = await onDesk();
    const answers = await Promise.all([claim(one, id), claim(two, id), claim(one, id), claim(two, id)]);
    const taken = answers.filter((answer) => answer.status === 200);
    const refused = answers.filter((answer) => answer.status === 409);
    expect([taken.length, refused.length]).toEqual([2, 2]);
    expect(new Set(taken.map((answer) => answer.body.person.id)).size).toBe(1);
    expect(refused[0]!.body.type).toBe('/problems/claimed-by-another');
  });

  it('lasts twenty minutes, is renewed by claiming again, and then runs out by itself', async () => {
    const { id } = await onDesk();
    expect((await claim(one, id)).body.until).toBe(new Date(now.getTime() + 20 * 60_000).toISOString());
    later(15);
    await claim(one, id).expect(200);
    later(15);
    expect((await claim(two, id)).status).toBe(409);
    later(6);
    expect((await itemOf(two, id)).claim).toBeNull();
    expect((await claim(two, id)).body.person.id).toBe(two.account.id);
    expect((await claim(one, id)).status).toBe(409);
  });

  it('shows in the queue whose it is, and the queue can be kept to what is free or mine', async () => {
    const [mine, free] = [await onDesk(), await onDesk()];
    await claim(one, mine.id).expect(200);
    expect(await itemOf(one, mine.id)).toMatchObject({
      mine: true,
      claim: { person: { id: one.account.id } },
    });
    expect(await itemOf(two, mine.id)).toMatchObject({
      mine: false,
      claim: { person: { id: one.account.id } },
    });
    const ids = async (who: MemberAgent, kept: string): Promise<number[]> =>
      (await who.get(`/api/desk?limit=100&kind=edition&claim=${kept}`).expect(200)).body.items.map(
        (item: DeskItem) => item.id,
      );
    expect(await ids(one, 'mine')).toContain(mine.id);
    expect(await ids(one, 'mine')).not.toContain(free.id);
    expect(await ids(two, 'mine')).not.toContain(mine.id);
    expect(await ids(two, 'free')).toContain(free.id);
    expect(await ids(two, 'free')).not.toContain(mine.id);
  });

  it('is undone by giving it up, which nobody can do for another', async () => {
    const { id } = await onDesk();
    await claim(one, id).expect(200);
    await giveUp(two, id).expect(204);
    expect((await claim(two, id)).status).toBe(409);
    await giveUp(one, id).expect(204);
    await giveUp(one, id).expect(204);
    await claim(two, id).expect(200);
  });

  it('can be taken over from the one who has it, and only from that one', async () => {
    const { id } = await onDesk();
    const three = await app.as('moderator');
    await claim(one, id).expect(200);
    const answers = await Promise.all([claim(two, id, one.account.id), claim(three, id, one.account.id)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    expect((await claim(one, id)).status).toBe(409);
  });

  it('is for moderators only', async () => {
    const { id } = await onDesk();
    expect((await claim(author, id)).status).toBe(403);
    expect((await app.visitor().get(`/api/desk/claims/edition/${id}`)).status).toBe(401);
  });
});

describe('deciding an item that another has in hand', () => {
  it('is refused for publishing and returning, until the claim is given up', async () => {
    const { id } = await onDesk();
    await claim(one, id).expect(200);
    const refused = await publish(two, id);
    expect([refused.status, refused.body.type]).toEqual([409, '/problems/claimed-by-another']);
    expect(refused.body.detail).toContain(one.account.displayName);
    const returned = await two
      .post(`/api/desk/editions/${id}/return`)
      .send({ reason: 'Say which screw you mean.' });
    expect(returned.status).toBe(409);
    expect((await app.knex('editions').where({ id }).first('state')).state).toBe('submitted');
    await giveUp(one, id).expect(204);
    await publish(two, id).expect(200);
  });

  it('is refused for a proposal as well, and open to the one who has it', async () => {
    const proposed = await author
      .post('/api/proposals')
      .send({
        partId: joint.motor.id,
        entry: {
          kind: 'revision',
          label: 'Rev Z',
          soldFrom: null,
          soldTo: null,
          howToTell: 'A ring is milled around the boss.',
          whatChanged: 'The boss is wider.',
        },
      })
      .expect(201);
    const { id } = proposed.body;
    await one.put(`/api/desk/claims/proposal/${id}`).send({ takeOverFrom: null }).expect(200);
    const decline = (who: MemberAgent) =>
      who.post(`/api/desk/proposals/${id}/decline`).send({ reason: 'It is in the catalogue.' });
    expect((await decline(two)).body.type).toBe('/problems/claimed-by-another');
    expect((await two.post(`/api/desk/proposals/${id}/take`).send({ entry: null })).status).toBe(409);
    await decline(one).expect(204);
  });
});
