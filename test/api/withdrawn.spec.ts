import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import {
  cautionFor,
  completeContent,
  insertJoint,
  knifeFix,
  plainFix,
  publishNew,
  submitNext,
  type TestJoint,
} from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let moderator: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp({ search: true });
  [author, moderator] = await Promise.all([app.memberNamed('Author'), app.as('moderator')]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

let made = 0;
const publishOne = (title = `Write-up ${++made} that may go`, who = author) =>
  publishNew(who, moderator, completeContent(joint, { title }));
const reason = 'The shim named here comes loose and falls on the mirror.';
const withdraw = (slug: string, over: object = {}, who = moderator) =>
  who.post(`/api/desk/write-ups/${slug}/withdraw`).send({ reason, instead: null, ...over });
const putBack = (slug: string) =>
  moderator.post(`/api/desk/write-ups/${slug}/put-back`).send({ reason: 'The text was mended.' });
const read = (slug: string, who = app.visitor()) => who.get(`/api/write-ups/${slug}`);
const slugsFound = async (words: string): Promise<string[]> =>
  (
    await app
      .visitor()
      .get(`/api/search?q=${encodeURIComponent(words)}`)
      .expect(200)
  ).body.items.map((hit: { slug: string }) => hit.slug);

describe('a withdrawn write-up', () => {
  it('keeps its address, which says that it is gone, why, when, by whom and where to go instead', async () => {
    const [gone, other] = [await publishOne(), await publishOne('The better one')];

    await withdraw(gone.slug, { instead: other.slug }).expect(200);

    const { status, body } = await read(gone.slug);
    expect([status, body.type]).toEqual([410, '/problems/withdrawn']);
    expect(body.withdrawal).toMatchObject({
      reason,
      by: 'the desk',
      instead: { slug: other.slug, title: 'The better one' },
      mayReadHistory: false,
    });
    expect(Date.parse(body.withdrawal.at)).toBeLessThanOrEqual(Date.now());
    expect(JSON.stringify(body)).not.toContain(moderator.account.displayName);
  });

  it('is in no search and in no list of its parts any more, and back in both when it is put back', async () => {
    const mark = `qz${Date.now().toString(36)}`;
    const { slug } = await publishOne(`Lip ${mark}`);
    await expect.poll(() => slugsFound(mark), { timeout: 10_000 }).toEqual([slug]);
    const onPart = async (): Promise<string> =>
      JSON.stringify((await app.visitor().get(`/api/parts/${joint.motor.slug}`).expect(200)).body);
    expect(await onPart()).toContain(slug);

    await withdraw(slug).expect(200);
    await expect.poll(() => slugsFound(mark), { timeout: 10_000 }).toEqual([]);
    expect(await onPart()).not.toContain(slug);

    await putBack(slug).expect(200);
    await expect.poll(() => slugsFound(mark), { timeout: 10_000 }).toEqual([slug]);
    expect((await read(slug)).status).toBe(200);
  });

  it('leaves its history to its authors and to moderators, and to nobody else', async () => {
    const { slug } = await publishOne();
    await withdraw(slug).expect(200);
    const paths = ['editions', 'editions/1', 'comparison?from=1&to=1'].map(
      (path) => `/api/write-ups/${slug}/${path}`,
    );
    for (const path of paths) {
      expect((await author.get(path)).status).toBe(200);
      expect((await moderator.get(path)).status).toBe(200);
      expect((await app.visitor().get(path)).body.type).toBe('/problems/withdrawn');
    }
    expect((await read(slug, author)).body.withdrawal.mayReadHistory).toBe(true);
    const stranger = await app.memberNamed('Stranger');
    expect((await stranger.get(paths[0]!)).status).toBe(410);
  });

  it('keeps its trials, which are there again when it is put back', async () => {
    const fix = plainFix();
    const { slug } = await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }));
    const owner = await app.memberNamed('Owner');
    await owner
      .post(`/api/write-ups/${slug}/trials`)
      .send({ fixKey: fix.key, outcome: 'held', revisionIds: [], note: 'Held.', figure: null })
      .expect(201);
    await withdraw(slug).expect(200);
    await putBack(slug).expect(200);
    expect((await read(slug)).body.trials).toMatchObject([{ note: 'Held.' }]);
  });

  it('is told to its authors by mail, to those who watch, and noted in the audit log', async () => {
    const me = await app.memberNamed('Told author');
    const { slug, writeUpId } = await publishOne(undefined, me);
    await withdraw(slug).expect(200);
    const mails = await app.mailbox.waitFor(me.account.email, 2);
    expect(mails.find((mail) => mail.text.includes(reason))).toBeDefined();
    expect(
      await app.knex('happenings').where({ kind: 'write-up-withdrawn', path: `/write-ups/${slug}` }),
    ).toMatchObject([{ text: reason }]);
    expect(
      await app.knex('audit_log').where({ subject_kind: 'write-up', subject_id: writeUpId }),
    ).toMatchObject([{ action: 'write-up-withdrawn', reason, actor_id: moderator.account.id }]);
  });

  it('is put back by publishing a mended edition that waited at the desk', async () => {
    const { slug } = await publishOne();
    const next = await submitNext(
      author,
      slug,
      completeContent(joint, { summary: 'A thicker disc lets it sit flat.' }),
    );
    await withdraw(slug).expect(200);
    expect((await read(slug)).status).toBe(410);

    await moderator.post(`/api/desk/editions/${next.id}/publish`).send({ note: '' }).expect(200);

    const { body } = await read(slug);
    expect(body.view.summary).toBe('A thicker disc lets it sit flat.');
    const { body: desk } = await moderator.get(`/api/desk/write-ups/${slug}`).expect(200);
    expect(desk.withdrawal).toBeNull();
  });
});

describe('withdrawing', () => {
  it('needs a reason that says something, and another published write-up to go to', async () => {
    const { slug } = await publishOne();
    const short = await withdraw(slug, { reason: 'No.' });
    expect([short.status, short.body.fields[0].path]).toEqual([422, 'reason']);
    for (const instead of [slug, 'no-such-write-up']) {
      const refused = await withdraw(slug, { instead });
      expect([refused.status, refused.body.fields[0].path]).toEqual([422, 'instead']);
    }
    expect((await read(slug)).status).toBe(200);
  });

  it('happens once when two moderators do it at the same moment', async () => {
    const { slug, writeUpId } = await publishOne();
    const other = await app.as('moderator');
    const answers = await Promise.all([withdraw(slug), withdraw(slug, {}, other)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    expect(
      await app.knex('audit_log').where({ subject_id: writeUpId, action: 'write-up-withdrawn' }),
    ).toHaveLength(1);
  });

  it('is for moderators, and of what was published only', async () => {
    const { slug } = await publishOne();
    expect((await withdraw(slug, {}, author)).status).toBe(403);
    expect((await withdraw('no-such-write-up')).status).toBe(404);
    expect((await putBack(slug)).status).toBe(409);
  });
});

describe('putting back', () => {
  it('is refused while a hazard has no caution', async () => {
    const fix = knifeFix();
    const { slug, editionId } = await publishNew(
      author,
      moderator,
      completeContent(joint, { fixes: [fix] }),
      [cautionFor(fix.key, 'blade')],
    );
    const [caution] = (await moderator.get(`/api/desk/editions/${editionId}`)).body.cautions;
    await withdraw(slug).expect(200);
    await moderator.delete(`/api/desk/cautions/${caution.id}`).expect(204);

    const refused = await putBack(slug);

    expect([refused.status, refused.body.type]).toEqual([409, '/problems/caution-missing']);
    expect((await read(slug)).status).toBe(410);
    await moderator
      .post('/api/desk/cautions')
      .send({ ...cautionFor(fix.key, 'blade'), editionId })
      .expect(201);
    await putBack(slug).expect(200);
  });
});
