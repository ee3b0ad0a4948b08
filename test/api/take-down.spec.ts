import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTakeDownService } from '../../server/moderation/take-down.service.js';
import { jpeg } from '../fixtures/photos.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertFeature, insertJointOf, reading, record } from './support/features.js';
import { askAbout, replyTo, reportTrialOf } from './support/posts.js';
import { completeContent, insertJoint, plainFix, publishNew, type TestJoint } from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let moderator: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp();
  [author, moderator] = await Promise.all([app.memberNamed('Author'), app.as('moderator')]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

const reason = 'It names a private address.';
const takeDown = (kind: string, id: number, who = moderator) =>
  who.post(`/api/desk/subjects/${kind}/${id}/take-down`).send({ reason });
const putBack = (kind: string, id: number) =>
  moderator.post(`/api/desk/subjects/${kind}/${id}/put-back`).send({ reason: 'It was a misunderstanding.' });
const mailsTo = (member: MemberAgent): Promise<{ subject: string; body_text: string }[]> =>
  app.knex('mail_outbox').where('to_address', member.account.email).orderBy('id');
const audit = (kind: string, id: number): Promise<string[]> =>
  app.knex('audit_log').where({ subject_kind: kind, subject_id: id }).orderBy('id').pluck('action');

describe('a question that is taken down', () => {
  it('is gone for readers, who are told why, and stays for its asker and the desk', async () => {
    const asker = await app.memberNamed('Asker');
    const { slug, id } = await askAbout(asker, joint);
    expect((await takeDown('question', id)).status).toBe(204);

    const gone = await app.visitor().get(`/api/questions/${slug}`);
    expect([gone.status, gone.body.type]).toEqual([410, '/problems/taken-down']);
    expect(gone.body.detail).toContain(reason);
    expect((await author.get(`/api/questions/${slug}`)).status).toBe(410);
    for (const who of [asker, moderator]) {
      const { body } = await who.get(`/api/questions/${slug}`).expect(200);
      expect(body.takenDown.reason).toBe(reason);
    }
    const { items } = (await app.visitor().get('/api/questions?limit=100').expect(200)).body;
    expect(items.map((item: { slug: string }) => item.slug)).not.toContain(slug);
    expect(
      (await author.post(`/api/questions/${slug}/replies`).send({ text: 'Hm.', worksheet: null })).status,
    ).toBe(410);
  });

  it('is told to its asker by mail with the reason, is in the audit log, and comes back whole', async () => {
    const asker = await app.memberNamed('Told asker');
    const { slug, id } = await askAbout(asker, joint);
    await takeDown('question', id).expect(204);
    expect((await takeDown('question', id)).status).toBe(409);
    await putBack('question', id).expect(204);
    expect((await putBack('question', id)).status).toBe(409);
    const { body } = await app.visitor().get(`/api/questions/${slug}`).expect(200);
    expect([body.takenDown, body.text.source]).toEqual([
      null,
      'It rocks about the raised lip, whatever I tighten.',
    ]);
    expect(await audit('question', id)).toEqual(['taken-down', 'put-back']);
    const mails = await mailsTo(asker);
    expect(mails.map((mail) => mail.subject.split(':')[0])).toEqual(['Taken down', 'Back on the pages']);
    expect(mails[0]!.body_text).toContain(reason);
  });
});

describe('a reply that is taken down', () => {
  it('is neither shown nor counted, but for its writer with the reason', async () => {
    const { slug } = await askAbout(author, joint);
    const replier = await app.memberNamed('Replier');
    const id = await replyTo(replier, slug, 'Rude words.');
    await takeDown('reply', id).expect(204);
    const seen = (await app.visitor().get(`/api/questions/${slug}`)).body;
    expect([seen.replies, seen.replyCount]).toEqual([[], 0]);
    const own = (await replier.get(`/api/questions/${slug}`)).body;
    expect(own.replies).toMatchObject([{ id, takenDown: { reason } }]);
  });
});

describe('a trial that is taken down', () => {
  it('no longer bears the fix out, on the page, in the counts and in the index', async () => {
    const fix = plainFix();
    const { slug, writeUpId } = await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }));
    const trier = await app.memberNamed('Trier');
    const id = await reportTrialOf(trier, slug, fix.key);
    const page = async (who = app.visitor()) => (await who.get(`/api/write-ups/${slug}`).expect(200)).body;
    expect((await page()).view.fixes[0].standing).toBe('tried');
    await app.knex('search_outbox').delete();

    await takeDown('trial', id).expect(204);
    const without = await page();
    expect(without.trials).toEqual([]);
    expect(without.view.fixes[0]).toMatchObject({ standing: 'told', trialCounts: { held: 0 } });
    expect((await page(trier)).trials).toMatchObject([{ id, takenDown: { reason } }]);
    expect(await app.knex('search_outbox').where('write_up_id', writeUpId)).toHaveLength(1);

    await putBack('trial', id).expect(204);
    expect((await page()).view.fixes[0].standing).toBe('tried');
  });
});

describe('a fit report that is taken down', () => {
  it('has no say in the fit table', async () => {
    const [boss, recess] = await Promise.all([
      insertFeature(app.knex, joint.motor, 'boss'),
      insertFeature(app.knex, joint.bracket, 'recess'),
    ]);
    const slug = await insertJointOf(app.knex, 'boss-recess', boss, recess);
    const pair = {
      revisionA: joint.motor.revisions[0]!.id,
      revisionB: joint.bracket.revisions[0]!.id,
    };
    await author
      .post(`/api/joints/${slug}/reports`)
      .send({ ...pair, sat: false, note: '' })
      .expect(201);
    const told = async (): Promise<number> =>
      (await app.visitor().get(`/api/joints/${slug}`)).body.cells.find(
        (cell: typeof pair) => cell.revisionA === pair.revisionA && cell.revisionB === pair.revisionB,
      ).didNotSit;
    expect(await told()).toBe(1);
    const { id } = await app.knex('fit_reports').where('account_id', author.account.id).first('id');
    await takeDown('fit-report', id).expect(204);
    expect(await told()).toBe(0);
  });
});

describe('a photo that is taken down', () => {
  it('is no longer served, unless somebody else’s photo of the same bytes stands', async () => {
    const [one, two] = await Promise.all([app.memberNamed('One'), app.memberNamed('Two')]);
    const bytes = await jpeg(500, 400);
    const add = async (who: MemberAgent) =>
      (
        await who
          .post('/api/photos')
          .field('alt', 'The raised lip')
          .attach('file', bytes, 'a.jpg')
          .expect(201)
      ).body;
    const [first, second] = [await add(one), await add(two)];
    const file = `/photos/${first.hash}-${first.widths[0]}.webp`;
    await takeDown('photo', first.id).expect(204);
    expect((await app.visitor().get(file)).status).toBe(200);
    await takeDown('photo', second.id).expect(204);
    const gone = await app.visitor().get(file);
    expect([gone.status, gone.body.type]).toEqual([410, '/problems/taken-down']);
    const again = await one.post('/api/photos').field('alt', 'The raised lip').attach('file', bytes, 'a.jpg');
    expect([again.status, again.body.type]).toEqual([410, '/problems/taken-down']);
    await putBack('photo', first.id).expect(204);
    expect((await app.visitor().get(file)).status).toBe(200);
  });
});

describe('a reading that is taken down', () => {
  it('is set aside, and the consensus is made without it', async () => {
    const feature = await insertFeature(app.knex, joint.motor, 'boss');
    const revision = joint.motor.revisions[0]!.id;
    await record(
      author,
      reading(feature, revision, 'diameter', 22.4),
      reading(feature, revision, 'diameter', 99),
    );
    const { id } = await app.knex('measurements').where({ feature_id: feature.id, value: 99 }).first('id');
    await takeDown('reading', id).expect(204);
    const consensus = await app.knex('consensus').where('feature_id', feature.id).first();
    expect([consensus.count, consensus.mean]).toEqual([1, 22.4]);
  });
});

describe('taking down', () => {
  it('is for the desk alone, with a reason that says something, and of things that are there', async () => {
    const { id } = await askAbout(author, joint);
    expect((await takeDown('question', id, author)).status).toBe(403);
    const wordless = await moderator
      .post(`/api/desk/subjects/question/${id}/take-down`)
      .send({ reason: 'no' });
    expect([wordless.status, wordless.body.fields[0].path]).toEqual([422, 'reason']);
    expect((await takeDown('question', 999_999_999)).status).toBe(404);
    expect((await takeDown('reading', 999_999_999)).status).toBe(404);
  });

  it('of all that somebody wrote is put back as one, and leaves down what was down before', async () => {
    const member = await app.memberNamed('Gone for a while');
    const [kept, earlier] = [await askAbout(member, joint), await askAbout(member, joint)];
    await takeDown('question', earlier.id).expect(204);
    const service = createTakeDownService({
      clock: () => new Date(),
      audit: { note: () => Promise.resolve() },
      mail: {
        queueTakenDown: () => Promise.resolve(),
        queuePutBack: () => Promise.resolve(),
        queueFlagSettled: () => Promise.resolve(),
      },
      measurements: {
        decideWithin: () => Promise.resolve({ consensus: null }),
        remakeConsensus: () => Promise.resolve(),
      },
      writeUps: { judgeAnew: () => Promise.resolve() },
      searchOutbox: { add: () => Promise.resolve() },
    });
    const order = { moderatorId: moderator.account.id, reason };
    const { at, count } = await app.knex.transaction((trx) =>
      service.takeDownAllOf(trx, member.account.id, order),
    );
    expect(count).toBe(1);
    const status = async (slug: string) => (await app.visitor().get(`/api/questions/${slug}`)).status;
    expect([await status(kept.slug), await status(earlier.slug)]).toEqual([410, 410]);
    await app.knex.transaction((trx) => service.putBackAllOf(trx, member.account.id, { ...order, at }));
    expect([await status(kept.slug), await status(earlier.slug)]).toEqual([200, 410]);
  });
});
