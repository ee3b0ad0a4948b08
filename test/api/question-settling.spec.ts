import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { askAs, fieldsOf, questionAbout, replyAs } from './support/questions.js';
import { completeContent, insertJoint, plainFix, publishNew, type TestJoint } from './support/write-ups.js';

let app: TestApp;
let asker: MemberAgent;
let author: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp();
  [asker, author] = await Promise.all([app.memberNamed('Asker'), app.memberNamed('Author')]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

async function publish() {
  const fix = plainFix();
  const moderator = await app.as('moderator');
  return { fix, ...(await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }))) };
}
const trial = (over: object = {}) => ({
  outcome: 'held',
  revisionIds: [joint.motor.revisions[1]!.id],
  note: 'Sits flat since.',
  figure: 0.05,
  worksheet: null,
  ...over,
});
const settle = (slug: string, body: object) => asker.post(`/api/questions/${slug}/settled`).send(body);
const writeUp = async (slug: string) => (await app.visitor().get(`/api/write-ups/${slug}`).expect(200)).body;
const question = async (slug: string) => (await app.visitor().get(`/api/questions/${slug}`).expect(200)).body;
const happening = async (kind: string, key: string) => {
  const row = await app.knex('happenings').where({ kind }).where('event_key', 'like', `${key}%`).first();
  const subjects = await app
    .knex('happening_subjects')
    .where('happening_id', row.id)
    .orderBy(['subject', 'subject_id'])
    .select('subject', { id: 'subject_id' });
  const people = await app
    .knex('happening_people')
    .where('happening_id', row.id)
    .orderBy('account_id')
    .select({ id: 'account_id', atOnce: 'at_once' });
  return { ...row, subjects, people: people.map(({ id, atOnce }) => [id, Boolean(atOnce)]) };
};
const idOf = async (slug: string): Promise<number> =>
  (await app.knex('questions').where({ slug }).first('id')).id;

describe('settling with a trial', () => {
  it('names the fix and reports the asker’s trial of it, which counts for its standing', async () => {
    const { slug: writeUpSlug, fix } = await publish();
    const { slug } = await askAs(asker, questionAbout(joint));
    const { body } = await settle(slug, { writeUpSlug, fixKey: fix.key, trial: trial() }).expect(200);
    expect(body.settledBy).toMatchObject({ writeUpSlug, fixKey: fix.key });
    const { trials, view } = await writeUp(writeUpSlug);
    expect(trials).toMatchObject([
      { fixKey: fix.key, outcome: 'held', note: 'Sits flat since.', person: { id: asker.account.id } },
    ]);
    expect(view.fixes[0].standing).toBe('measured');
  });

  it('does neither where the trial does not belong, and names the field within it', async () => {
    const { slug: writeUpSlug, fix } = await publish();
    const { slug } = await askAs(asker, questionAbout(joint));
    const stray = await settle(slug, {
      writeUpSlug,
      fixKey: fix.key,
      trial: trial({ revisionIds: [999_999_999] }),
    }).expect(422);
    const odd = await settle(slug, {
      writeUpSlug,
      fixKey: fix.key,
      trial: trial({ outcome: 'splendid' }),
    }).expect(422);
    expect([fieldsOf(stray.body), fieldsOf(odd.body)]).toEqual([['trial.revisionIds.0'], ['trial.outcome']]);
    expect((await question(slug)).settledBy).toBeNull();
    expect((await writeUp(writeUpSlug)).trials).toEqual([]);
  });
});

describe('those who watch', () => {
  it('hear of a question on its parts and revisions', async () => {
    const { slug } = await askAs(
      asker,
      questionAbout(joint, { text: 'It *rocks* about the lip all night.' }),
    );
    const id = await idOf(slug);
    expect(await happening('question-asked', `question-asked:${id}`)).toMatchObject({
      title: 'Question: Why does the bracket still rock?',
      text: 'It rocks about the lip all night.',
      path: `/questions/${slug}`,
      actor_id: asker.account.id,
      subjects: [
        ...[joint.motor.id, joint.bracket.id]
          .sort((one, two) => one - two)
          .map((part) => ({ subject: 'part', id: part })),
        { subject: 'revision', id: joint.motor.revisions[1]!.id },
        { subject: 'question', id },
      ],
      people: [],
    });
  });

  it('and the asker hear of a reply', async () => {
    const { slug } = await askAs(asker, questionAbout(joint));
    const reply = await replyAs(author, slug);
    expect(await happening('reply-added', `reply-added:${reply.id}`)).toMatchObject({
      path: `/questions/${slug}`,
      actor_id: author.account.id,
      subjects: [{ subject: 'question', id: await idOf(slug) }],
      people: [[asker.account.id, false]],
    });
  });

  it('and those who replied hear of what settled it, once', async () => {
    const { slug: writeUpSlug, fix, writeUpId } = await publish();
    const { slug } = await askAs(asker, questionAbout(joint));
    await replyAs(author, slug);
    await replyAs(author, slug);
    const id = await idOf(slug);
    for (const _ of [1, 2]) await settle(slug, { writeUpSlug, fixKey: fix.key }).expect(200);
    expect(await happening('question-settled', `question-settled:${id}:`)).toMatchObject({
      title: 'Settled: Why does the bracket still rock?',
      subjects: [
        { subject: 'write-up', id: writeUpId },
        { subject: 'question', id },
      ],
      people: [[author.account.id, false]],
    });
    expect(await app.knex('happenings').where('event_key', 'like', `question-settled:${id}:%`)).toHaveLength(
      1,
    );
  });
});
