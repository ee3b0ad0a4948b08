import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DeskItem } from '../../shared/contract/desk-queue.js';
import { jpeg } from '../fixtures/photos.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertFeature, reading } from './support/features.js';
import { askAbout, replyTo, reportTrialOf } from './support/posts.js';
import { completeContent, insertJoint, plainFix, publishNew, type TestJoint } from './support/write-ups.js';

let app: TestApp;
let moderator: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp();
  moderator = await app.as('moderator');
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

const waitingOf = async (member: MemberAgent, kind = 'first-post'): Promise<DeskItem[]> =>
  (await moderator.get(`/api/desk?kind=${kind}&limit=100`).expect(200)).body.items.filter(
    (item: DeskItem) => item.person.id === member.account.id,
  );
const fine = (id: number, who = moderator) => who.post(`/api/desk/first-posts/${id}/fine`);
const takeDown = (id: number) =>
  moderator.post(`/api/desk/first-posts/${id}/take-down`).send({ reason: 'This is an advertisement.' });

describe('the first posts of a member', () => {
  it('stand on the pages at once and come up at the desk, whatever they are', async () => {
    const member = await app.memberNamed('New member');
    const { slug } = await askAbout(member, joint);
    await replyTo(member, slug);
    const fix = plainFix();
    const writeUp = await publishNew(
      await app.memberNamed('Author'),
      moderator,
      completeContent(joint, { fixes: [fix] }),
    );
    await reportTrialOf(member, writeUp.slug, fix.key);
    const feature = await insertFeature(app.knex, joint.motor, 'boss');
    await member
      .post('/api/measurements')
      .send(reading(feature, joint.motor.revisions[0]!.id, 'diameter', 22.4))
      .expect(201);
    await app.visitor().get(`/api/questions/${slug}`).expect(200);
    const items = await waitingOf(member);
    expect(items.map((item) => item.title.split(/[ :]/)[0])).toEqual([
      'Question',
      'Reply',
      'Trial',
      'Reading',
    ]);
    const { body } = await moderator.get(`/api/desk/first-posts/${items[1]!.id}`).expect(200);
    expect(body).toMatchObject({
      state: 'waiting',
      fineSoFar: 0,
      subject: { kind: 'reply', text: 'Try a thicker disc.', path: `/questions/${slug}` },
    });
  });

  it('come up no more once three were found fine', async () => {
    const member = await app.memberNamed('Becomes known');
    for (const _ of [1, 2, 3]) await askAbout(member, joint);
    const items = await waitingOf(member);
    expect(items).toHaveLength(3);
    await fine(items[0]!.id).expect(204);
    await fine(items[1]!.id).expect(204);
    await askAbout(member, joint);
    expect(await waitingOf(member)).toHaveLength(2);
    await fine(items[2]!.id).expect(204);
    const { known_at: knownAt } = await app.knex('accounts').where('id', member.account.id).first('known_at');
    expect(knownAt).not.toBeNull();
    const before = (await waitingOf(member)).length;
    await askAbout(member, joint);
    expect(await waitingOf(member)).toHaveLength(before);
  });

  it('are taken down with a reason that goes to their writer, and count for nothing', async () => {
    const member = await app.memberNamed('Advertiser');
    const { slug, id } = await askAbout(member, joint);
    const [item] = await waitingOf(member);
    await takeDown(item!.id).expect(204);
    expect((await app.visitor().get(`/api/questions/${slug}`)).status).toBe(410);
    const [mail] = await app.knex('mail_outbox').where('to_address', member.account.email);
    expect(mail.body_text).toContain('This is an advertisement.');
    expect(await waitingOf(member)).toEqual([]);
    expect((await fine(item!.id)).status).toBe(409);
    expect(
      await app.knex('audit_log').where({ subject_kind: 'question', subject_id: id }).pluck('action'),
    ).toEqual(['taken-down']);
  });

  it('of those who work at the desk do not come up', async () => {
    const colleague = await app.as('moderator');
    await askAbout(colleague, joint);
    expect(await waitingOf(colleague)).toEqual([]);
  });

  it('are decided once, and not while another has them in hand', async () => {
    const member = await app.memberNamed('Looked at twice');
    await askAbout(member, joint);
    const [item] = await waitingOf(member);
    const other = await app.as('moderator');
    await other.put(`/api/desk/claims/first-post/${item!.id}`).send({ takeOverFrom: null }).expect(200);
    expect((await fine(item!.id)).body.type).toBe('/problems/claimed-by-another');
    const answers = await Promise.all([fine(item!.id, other), fine(item!.id, other)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([204, 409]);
  });
});

describe('a photo outside of editions', () => {
  it('waits until a moderator has looked at it, once', async () => {
    const member = await app.memberNamed('With a photo');
    const photo = (
      await member
        .post('/api/photos')
        .field('alt', 'Caliper on the lip')
        .attach('file', await jpeg(400, 300), 'a.jpg')
        .expect(201)
    ).body;
    expect(await waitingOf(member, 'photo')).toEqual([]);
    const feature = await insertFeature(app.knex, joint.motor, 'boss');
    const body = { ...reading(feature, joint.motor.revisions[0]!.id, 'diameter', 22.4), photoId: photo.id };
    await member.post('/api/measurements').send(body).expect(201);
    const [item] = await waitingOf(member, 'photo');
    expect(item).toMatchObject({ id: photo.id, title: 'Caliper on the lip' });
    const page = (await moderator.get(`/api/desk/photos/${photo.id}`).expect(200)).body;
    expect(page.subject).toMatchObject({ photo: { hash: photo.hash }, path: `/parts/${joint.motor.slug}` });
    await moderator.post(`/api/desk/photos/${photo.id}/fine`).expect(204);
    await member.post('/api/measurements').send(body).expect(201);
    expect(await waitingOf(member, 'photo')).toEqual([]);
    expect((await moderator.post(`/api/desk/photos/${photo.id}/fine`)).status).toBe(409);
  });
});
