import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DeskItem } from '../../shared/contract/desk-queue.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { throughAllPages } from './support/pages.js';
import { askAbout } from './support/posts.js';
import {
  completeContent,
  insertJoint,
  saveNewDraft,
  submitDraft,
  type TestJoint,
} from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let moderator: MemberAgent;
let joint: TestJoint;
let now = new Date('2026-12-01T20:00:00.000Z');

beforeAll(async () => {
  app = await startTestApp({ clock: () => now });
  [author, moderator] = await Promise.all([app.memberNamed('Ilka Brandt'), app.as('moderator')]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

const onDesk = async (title: string) =>
  submitDraft(author, await saveNewDraft(author, completeContent(joint, { title })));
const proposeRevision = async (label: string): Promise<number> =>
  (
    await author
      .post('/api/proposals')
      .send({
        partId: joint.motor.id,
        entry: {
          kind: 'revision',
          label,
          soldFrom: null,
          soldTo: null,
          howToTell: 'A ring is milled around the boss.',
          whatChanged: 'The boss is wider.',
        },
      })
      .expect(201)
  ).body.id;

describe('the queue of the desk', () => {
  it('holds every kind, the longest wait first, each item once, even where several came at the same instant', async () => {
    const edition = await onDesk('Waits with the others');
    const proposal = await proposeRevision('Rev Q1');
    const question = await askAbout(author, joint, 'Waits as a first post');
    await (
      await app.memberNamed('Teller')
    )
      .post('/api/flags')
      .send({
        kind: 'question',
        id: question.id,
        fixKey: null,
        ground: 'wrong',
        line: 'That is not what a lip is.',
      })
      .expect(201);
    now = new Date(now.getTime() + 1000);
    const second = await proposeRevision('Rev Q2');

    const items = await throughAllPages<DeskItem>(moderator, '/api/desk');
    const keys = items.map((item) => `${item.kind} ${item.id}`);
    expect(new Set(keys).size).toBe(keys.length);
    expect(items.map((item) => item.since)).toEqual([...items.map((item) => item.since)].sort());
    expect(keys).toEqual(expect.arrayContaining([`edition ${edition.id}`, `proposal ${proposal}`]));
    expect(items.map((item) => item.kind)).toEqual(expect.arrayContaining(['flag', 'first-post']));
    expect(keys.at(-1)).toBe(`proposal ${second}`);
    expect(items.at(-1)).toMatchObject({
      title: 'Rev Q2',
      openHazards: null,
      path: `/desk/hardware/${second}`,
    });
    const whole = (await moderator.get('/api/desk?limit=100').expect(200)).body.items as DeskItem[];
    expect(whole.map((item) => `${item.kind} ${item.id}`)).toEqual(keys);
  });

  it('counts what waits by kind, whatever the list is kept to', async () => {
    const before = (await moderator.get('/api/desk').expect(200)).body.counts;
    await proposeRevision('Rev Counted');
    const { items, counts } = (await moderator.get('/api/desk?kind=edition&limit=100').expect(200)).body;
    expect(counts).toEqual({ ...before, proposal: before.proposal + 1 });
    expect(new Set(items.map((item: DeskItem) => item.kind))).toEqual(new Set(['edition']));
    expect(items).toHaveLength(counts.edition);
  });

  it('is kept to words of the title or of the writer’s name, as they are', async () => {
    const found = await onDesk('Backlash of 50 % after the swap');
    await onDesk('Something else altogether');
    const idsFor = async (words: string): Promise<number[]> =>
      (await moderator.get('/api/desk').query({ words, limit: 100 }).expect(200)).body.items.map(
        (item: DeskItem) => item.id,
      );
    expect(await idsFor('backlash OF 50 %')).toEqual([found.id]);
    expect(await idsFor('ilka')).toContain(found.id);
    expect(await idsFor('50 _')).toEqual([]);
  });

  it('refuses a place that is none of its own', async () => {
    for (const cursor of ['zzz', Buffer.from('{"at":"x","rank":99,"id":1}').toString('base64url')]) {
      const { status, body } = await moderator.get('/api/desk').query({ cursor });
      expect([status, body.fields[0].path]).toEqual([422, 'cursor']);
    }
  });

  it('loses what is decided', async () => {
    const id = await proposeRevision('Rev Declined');
    await moderator
      .post(`/api/desk/proposals/${id}/decline`)
      .send({ reason: 'It is in the catalogue.' })
      .expect(204);
    const items = (await moderator.get('/api/desk?kind=proposal&limit=100').expect(200)).body.items;
    expect(items.map((item: DeskItem) => item.id)).not.toContain(id);
  });
});
