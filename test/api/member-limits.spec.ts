import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import type { MemberRow } from '../../shared/contract/members.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { throughAllPages } from './support/pages.js';
import { completeContent, insertJoint, publishNew, type TestJoint } from './support/write-ups.js';

const day = 24 * 60 * 60 * 1000;
let timeShift = 0;
let app: TestApp;
let moderator: MemberAgent;
let administrator: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp({ clock: () => new Date(Date.now() + timeShift) });
  [moderator, administrator] = await Promise.all([app.as('moderator'), app.as('administrator')]);
  joint = await insertJoint(app.knex);
});
afterEach(() => {
  timeShift = 0;
});
afterAll(() => app.close());

const reason = 'Advertising under questions, told twice to stop.';
const limit = (who: MemberAgent, over: object = {}, by = moderator) =>
  by
    .post(`/api/desk/members/${who.account.id}/limits`)
    .send({ kind: 'limited', reason, days: 7, works: 'stay', ...over });
const lift = (limitId: number, works: 'leave' | 'put-back' = 'leave', by = moderator) =>
  by.post(`/api/desk/limits/${limitId}/lift`).send({ reason: 'We talked it over.', works });
const ask = (who: MemberAgent) =>
  who.post('/api/questions').send({
    title: 'Which shim is it?',
    text: 'The plate rocks on the lip and I cannot tell why.',
    parts: [{ partId: joint.motor.id, revisionId: null }],
    symptoms: [],
    readings: [],
    worksheet: null,
    photos: [],
  });
const signIn = (who: MemberAgent) =>
  app
    .visitor()
    .post('/api/account/sign-in')
    .send({ email: who.account.email, password: who.account.password });
const isSignedIn = async (who: MemberAgent): Promise<boolean> =>
  (await who.get('/api/account/session').expect(200)).body.account !== null;

describe('a limited member', () => {
  it('may read and keep a bench but not post, and is told why and until when', async () => {
    const member = await app.memberNamed('Loud');
    const set = await limit(member);
    expect([set.status, set.body.limits[0].holds]).toEqual([201, true]);

    const posts = [
      await member.post('/api/write-ups').send({}),
      await ask(member),
      await member.post('/api/measurements').send({}),
    ];

    for (const { status, body } of posts) {
      expect([status, body.type]).toEqual([403, '/problems/posting-limited']);
      expect(body.detail).toContain(reason);
      expect(body.detail).toMatch(/until \d+ \w+ \d{4}, \d\d:\d\d UTC/);
    }
    expect((await member.get('/api/my/write-ups')).status).toBe(200);
    await member
      .post('/api/bench')
      .send({ partId: joint.motor.id, revisionId: joint.motor.revisions[0]!.id })
      .expect(({ status }) => expect([200, 201]).toContain(status));
    await member.patch('/api/account/profile').send({ displayName: 'Quiet' }).expect(200);
    const mine = await member.get('/api/account/limit').expect(200);
    expect(mine.body.limit).toMatchObject({ kind: 'limited', reason });
    await member.post('/api/account/sign-out').expect(204);
  });

  it('posts again when the term has run out, by itself', async () => {
    const member = await app.memberNamed('For a week');
    await limit(member, { days: 7 }).expect(201);
    timeShift = 7 * day - 60_000;
    expect((await member.post('/api/write-ups').send({})).status).toBe(403);
    timeShift = 7 * day + 60_000;
    expect((await member.post('/api/write-ups').send({})).status).toBe(201);
    expect((await member.get('/api/account/limit')).body.limit).toBeNull();
    const page = (await moderator.get(`/api/desk/members/${member.account.id}`)).body;
    expect(page.limits).toMatchObject([{ holds: false, lifted: null }]);
  });

  it('posts again when it is lifted, and reads of both in mails', async () => {
    const member = await app.memberNamed('Lifted');
    const set = await limit(member, { days: null });
    expect((await member.post('/api/write-ups').send({})).body.detail).toContain('until the desk lifts it');

    await lift(set.body.limits[0].id).expect(200);

    expect((await member.post('/api/write-ups').send({})).status).toBe(201);
    const mails = await app.mailbox.waitFor(member.account.email, 2);
    expect(mails.map((mail) => mail.subject).sort()).toEqual([
      'Your account is limited',
      'Your account is limited no longer',
    ]);
    expect((await lift(set.body.limits[0].id)).status).toBe(404);
    expect(
      await app
        .knex('audit_log')
        .where({ subject_kind: 'account', subject_id: member.account.id })
        .orderBy('id')
        .pluck('action'),
    ).toEqual(['member-limited', 'limit-lifted']);
  });
});

describe('a blocked member', () => {
  it('is signed out at once and cannot sign in, and is told why', async () => {
    const member = await app.memberNamed('Blocked');
    expect(await isSignedIn(member)).toBe(true);

    await limit(member, { kind: 'blocked', days: 30 }).expect(201);

    expect(await isSignedIn(member)).toBe(false);
    expect(await app.knex('sessions').where({ account_id: member.account.id })).toHaveLength(0);
    const refused = await signIn(member);
    expect([refused.status, refused.body.type]).toEqual([403, '/problems/account-blocked']);
    expect(refused.body.detail).toContain(reason);
    const wrong = await app
      .visitor()
      .post('/api/account/sign-in')
      .send({ email: member.account.email, password: 'not the right password' });
    expect(wrong.body.type).toBe('/problems/sign-in-refused');
    timeShift = 31 * day;
    expect((await signIn(member)).status).toBe(200);
  });
});

describe('what they wrote', () => {
  it('stays where that is chosen', async () => {
    const member = await app.memberNamed('Works stay');
    const { slug } = await publishNew(member, moderator, completeContent(joint));
    await limit(member, { kind: 'blocked' }).expect(201);
    expect((await app.visitor().get(`/api/write-ups/${slug}`)).status).toBe(200);
  });

  it('goes with write-ups that nobody else wrote, and comes back when the limit is lifted', async () => {
    const member = await app.memberNamed('Works go');
    const alone = await publishNew(member, moderator, completeContent(joint, { title: 'Written alone' }));
    const { body: question } = await ask(member).expect(201);
    const status = async (path: string) => (await app.visitor().get(path)).status;

    const set = await limit(member, { works: 'go' });

    expect([set.status, set.body.limits[0].worksGo]).toEqual([201, true]);
    expect(await status(`/api/write-ups/${alone.slug}`)).toBe(410);
    expect(await status(`/api/questions/${question.slug}`)).toBe(410);
    const notice = (await app.visitor().get(`/api/write-ups/${alone.slug}`)).body.withdrawal;
    expect(notice.reason).not.toContain('Advertising');
    await lift(set.body.limits[0].id, 'put-back').expect(200);
    expect(await status(`/api/write-ups/${alone.slug}`)).toBe(200);
    expect(await status(`/api/questions/${question.slug}`)).toBe(200);
  });
});

describe('who may be limited', () => {
  it('is members and makers for a moderator, everybody else for an administrator, nobody themself', async () => {
    const [maker, second, member] = await Promise.all([
      app.as('maker'),
      app.as('moderator'),
      app.memberNamed('Plain'),
    ]);
    expect((await limit(maker)).status).toBe(201);
    for (const [whom, by] of [
      [second, moderator],
      [administrator, moderator],
      [moderator, moderator],
      [administrator, administrator],
    ] as const) {
      const refused = await limit(whom, {}, by);
      expect([refused.status, refused.body.type]).toEqual([403, '/problems/not-allowed']);
    }
    expect((await limit(second, {}, administrator)).status).toBe(201);
    expect((await limit(moderator, {}, member)).status).toBe(403);
  });

  it('has one limit at a time, also when two set one at the same moment', async () => {
    const member = await app.memberNamed('Twice');
    const answers = await Promise.all([limit(member), limit(member, { kind: 'blocked' }, administrator)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409]);
    expect(await app.knex('member_limits').where({ account_id: member.account.id })).toHaveLength(1);
  });

  it('is refused with a reason too short or a term out of range, naming the field', async () => {
    const member = await app.memberNamed('Unharmed');
    const refused = await limit(member, { reason: 'No.', days: 0 });
    expect([refused.status, refused.body.fields.map((field: { path: string }) => field.path)]).toEqual([
      422,
      ['reason', 'days'],
    ]);
  });
});

describe('the members page', () => {
  it('shows a moderator names and what they wrote, but no address; an administrator the address too', async () => {
    const member = await app.memberNamed('Somebody to find');
    await publishNew(member, moderator, completeContent(joint, { title: 'By somebody' }));
    const path = `/api/desk/members/${member.account.id}`;
    const { body } = await moderator.get(path).expect(200);
    expect(body).toMatchObject({
      displayName: 'Somebody to find',
      email: null,
      mayLimit: true,
      works: { writeUps: [{ title: 'By somebody', soleAuthor: true, withdrawn: false }], questions: 0 },
    });
    expect((await administrator.get(path)).body.email).toBe(member.account.email);
    expect(JSON.stringify((await moderator.get('/api/desk/members')).body)).not.toContain('@');
  });

  it('finds by name, and only the limited ones where asked, each once over small pages', async () => {
    const name = `Findable ${Date.now()}`;
    const [one, two] = [await app.memberNamed(`${name} one`), await app.memberNamed(`${name} two`)];
    await limit(two).expect(201);
    const found = async (query: string) =>
      (await throughAllPages<MemberRow>(moderator, `/api/desk/members?${query}`)).map((row) => row.id);
    expect(await found(`q=${encodeURIComponent(name)}`)).toEqual([two.account.id, one.account.id]);
    const limited = await found(`q=${encodeURIComponent(name)}&limited=true`);
    expect(limited).toEqual([two.account.id]);
  });
});
