import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DeskItem } from '../../shared/contract/desk-queue.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { askAbout, replyTo, reportTrialOf } from './support/posts.js';
import { completeContent, insertJoint, plainFix, publishNew, type TestJoint } from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let teller: MemberAgent;
let other: MemberAgent;
let moderator: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp({ rateLimits: true });
  [author, teller, other, moderator] = await Promise.all([
    app.memberNamed('Author'),
    app.memberNamed('Teller'),
    app.memberNamed('Other'),
    app.as('moderator'),
  ]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

const flag = (over: object) => ({
  fixKey: null,
  ground: 'unsafe',
  line: 'It has you cut towards your hand.',
  ...over,
});
const tell = (who: MemberAgent, over: object) => who.post('/api/flags').send(flag(over));
const flags = async (): Promise<DeskItem[]> =>
  (await moderator.get('/api/desk?kind=flag&limit=100').expect(200)).body.items;
const settle = (id: number, outcome: string, who = moderator) =>
  who.post(`/api/desk/flags/${id}/settle`).send({ outcome, reason: 'We have read it with care.' });
const mailsTo = (member: MemberAgent): Promise<{ subject: string; body_text: string }[]> =>
  app.knex('mail_outbox').where('to_address', member.account.email).orderBy('id');

describe('telling the desk', () => {
  it('of one thing by several people is one item with the words of each', async () => {
    const { slug } = await askAbout(author, joint);
    const id = await replyTo(author, slug);
    await tell(teller, { kind: 'reply', id }).expect(201);
    await tell(other, { kind: 'reply', id, ground: 'rude-or-spam' }).expect(201);
    const items = (await flags()).filter((item) => item.title.startsWith('Reply to'));
    expect(items).toHaveLength(1);
    const { body } = await moderator.get(`/api/desk/flags/${items[0]!.id}`).expect(200);
    expect(body).toMatchObject({
      state: 'waiting',
      subject: { kind: 'reply', id, text: 'Try a thicker disc.', path: `/questions/${slug}` },
      flags: [
        { person: { displayName: 'Teller' }, ground: 'unsafe' },
        { person: { displayName: 'Other' }, ground: 'rude-or-spam' },
      ],
    });
  });

  it('is possible once a person and thing while it waits', async () => {
    const { id } = await askAbout(author, joint);
    await tell(teller, { kind: 'question', id }).expect(201);
    const again = await tell(teller, { kind: 'question', id, line: 'I say it once more.' });
    expect([again.status, again.body.type]).toEqual([409, '/problems/already-there']);
  });

  it('names what stands on the pages, and of a fix its key', async () => {
    const fix = plainFix();
    const { writeUpId } = await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }));
    const member = await app.memberNamed('Careful reader');
    await tell(member, { kind: 'fix', id: writeUpId, fixKey: fix.key }).expect(201);
    await tell(member, { kind: 'write-up', id: writeUpId }).expect(201);
    for (const wrong of [
      { kind: 'fix', id: writeUpId },
      { kind: 'question', id: 999_999_999 },
      { kind: 'fix', id: writeUpId, fixKey: 'item-nowhere' },
      { kind: 'write-up', id: writeUpId, fixKey: fix.key },
    ]) {
      const refused = await tell(member, wrong);
      expect(refused.status).toBe(422);
    }
  });

  it('needs an account, and is not for a machine', async () => {
    const { id } = await askAbout(author, joint);
    expect(
      (
        await app
          .visitor()
          .post('/api/flags')
          .send(flag({ kind: 'question', id }))
      ).status,
    ).toBe(401);
    const machine = await app.memberNamed('Machine');
    let last = 0;
    for (let tries = 0; tries < 25 && last !== 429; tries += 1)
      last = (await tell(machine, { kind: 'question', id: 999_999_999 })).status;
    expect(last).toBe(429);
  });
});

describe('settling what the desk was told', () => {
  async function flagged(who: MemberAgent): Promise<{ item: number; slug: string; reply: number }> {
    const { slug } = await askAbout(author, joint);
    const reply = await replyTo(author, slug);
    await tell(who, { kind: 'reply', id: reply }).expect(201);
    const row = await app.knex('flagged').where({ subject_kind: 'reply', subject_id: reply }).first('id');
    return { item: row.id, slug, reply };
  }

  it('by keeping the thing tells everybody who told of it', async () => {
    const member = await app.memberNamed('Mistaken');
    const { item, slug } = await flagged(member);
    await settle(item, 'kept').expect(204);
    expect((await flags()).map((each) => each.id)).not.toContain(item);
    expect((await app.visitor().get(`/api/questions/${slug}`)).body.replies).toHaveLength(1);
    const [mail] = await mailsTo(member);
    expect(mail!.body_text).toContain('leaves it as it is');
    expect(mail!.body_text).toContain('We have read it with care.');
    expect((await settle(item, 'kept')).status).toBe(409);
    expect(await app.knex('audit_log').where({ subject_kind: 'flag', subject_id: item })).toHaveLength(1);
  });

  it('by taking the thing down tells its writer and whoever told of it', async () => {
    const member = await app.memberNamed('Right');
    const { item, slug } = await flagged(member);
    await settle(item, 'taken-down').expect(204);
    expect((await app.visitor().get(`/api/questions/${slug}`)).body.replies).toEqual([]);
    expect((await mailsTo(member)).map((mail) => mail.body_text).join()).toContain('has taken it down');
    expect((await mailsTo(author)).map((mail) => mail.subject).join()).toContain('Taken down');
  });

  it('happens by itself when the thing is taken down from elsewhere', async () => {
    const member = await app.memberNamed('Heard');
    const { item, reply } = await flagged(member);
    await moderator
      .post(`/api/desk/subjects/reply/${reply}/take-down`)
      .send({ reason: 'It names a private address.' })
      .expect(204);
    expect((await moderator.get(`/api/desk/flags/${item}`)).body.state).toBe('taken-down');
    expect(await mailsTo(member)).toHaveLength(1);
  });

  it('of a write-up is said to be dealt with, for it is not taken down here', async () => {
    const { writeUpId } = await publishNew(author, moderator, completeContent(joint));
    const member = await app.memberNamed('Of a write-up');
    await tell(member, { kind: 'write-up', id: writeUpId }).expect(201);
    const { id } = await app
      .knex('flagged')
      .where({ subject_kind: 'write-up', subject_id: writeUpId })
      .first('id');
    const refused = await settle(id, 'taken-down');
    expect([refused.status, refused.body.fields[0].path]).toEqual([422, 'outcome']);
    await settle(id, 'dealt-with').expect(204);
    expect((await mailsTo(member))[0]!.body_text).toContain('has dealt with it');
  });

  it('is refused while another moderator has it in hand', async () => {
    const { item } = await flagged(await app.memberNamed('Waits'));
    const another = await app.as('moderator');
    await another.put(`/api/desk/claims/flag/${item}`).send({ takeOverFrom: null }).expect(200);
    expect((await settle(item, 'kept')).body.type).toBe('/problems/claimed-by-another');
    await settle(item, 'kept', another).expect(204);
  });

  it('happens once when two decide at the same moment', async () => {
    const { item } = await flagged(await app.memberNamed('Twice'));
    const answers = await Promise.all([settle(item, 'kept'), settle(item, 'taken-down')]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([204, 409]);
  });

  it('of a trial takes its evidence away with it', async () => {
    const fix = plainFix();
    const { slug } = await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }));
    const trial = await reportTrialOf(await app.memberNamed('Trier'), slug, fix.key);
    await tell(await app.memberNamed('Doubter'), { kind: 'trial', id: trial }).expect(201);
    const row = await app.knex('flagged').where({ subject_kind: 'trial', subject_id: trial }).first('id');
    await settle(row.id, 'taken-down').expect(204);
    expect((await app.visitor().get(`/api/write-ups/${slug}`)).body.view.fixes[0].standing).toBe('told');
  });
});
