import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { QuestionLine } from '../../shared/contract/questions.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart, insertSymptom } from './support/catalogue.js';
import { askAs, fieldsOf, questionAbout, replyAs } from './support/questions.js';
import { completeContent, insertJoint, plainFix, publishNew } from './support/write-ups.js';

let app: TestApp;
let asker: MemberAgent;
let other: MemberAgent;
let moderator: MemberAgent;

beforeAll(async () => {
  app = await startTestApp();
  [asker, other, moderator] = await Promise.all([
    app.memberNamed('Asker'),
    app.memberNamed('Other'),
    app.as('moderator'),
  ]);
});
afterAll(() => app.close());

const get = async (path: string) => (await app.visitor().get(path).expect(200)).body;
const slugsOf = (items: QuestionLine[]) => items.map((item) => item.slug);
const found = async (query: string) => slugsOf((await get(`/api/questions?${query}`)).items);

async function askAbout(partIds: number[], title: string, text: string): Promise<string> {
  const parts = partIds.map((partId) => ({ partId, revisionId: null }));
  const question = { title, text, parts, symptoms: [], readings: [], worksheet: null };
  return (await askAs(asker, question)).slug;
}

describe('searching questions', () => {
  it('finds those in which every word stands or begins a word, in whatever case', async () => {
    const { id } = await insertPart(app.knex);
    const both = await askAbout([id], 'Gimbal squeaks when cold', 'Only below zero, and only when I pan.');
    await askAbout([id], 'Gimbal is loose', 'It wobbles at every touch of the focuser.');
    expect(await found('q=gimb SQUEAKS')).toEqual([both]);
    expect(await found('q=gimbal below')).toEqual([both]);
    expect(await found('q=gimbal trapezoid')).toEqual([]);
  });

  it('finds short words and figures too, and leaves out words without meaning', async () => {
    const { id } = await insertPart(app.knex);
    const slug = await askAbout([id], 'The Q7 does not turn freely', 'The bore reads 41.37 with my caliper.');
    expect(await found('q=Q7')).toEqual([slug]);
    expect(await found('q=41.37')).toEqual([slug]);
    expect(await found('q=what is the q7')).toEqual([slug]);
  });

  it.each(['"(+lip', '@@ ** ~~', '+', "'; DROP TABLE questions", '%'])(
    'takes %s for words and nothing else',
    async (typed) => {
      await get(`/api/questions?q=${encodeURIComponent(typed)}`);
    },
  );

  it('goes with the part and with what is open', async () => {
    const [one, two] = [await insertPart(app.knex), await insertPart(app.knex)];
    const slug = await askAbout([one.id], 'Dovetail slips again', 'It slips by a millimetre each night.');
    await askAbout([two.id], 'Dovetail slips as well', 'It slips by a millimetre each night.');
    expect(await found(`q=dovetail&part=${one.slug}&open=true`)).toEqual([slug]);
    expect(await found(`q=dovetail&part=${one.slug}&open=false`)).toEqual([]);
  });
});

describe('what is like a question that is being written', () => {
  const alike = (query: string) => get(`/api/question-alike?${query}`);

  it('is what shares more parts first, then what its words match better', async () => {
    const [a, b] = [await insertPart(app.knex), await insertPart(app.knex)];
    const words = await askAbout(
      [(await insertPart(app.knex)).id],
      'Zirconia ring chips',
      'At its edge only, every night.',
    );
    const one = await askAbout([a.id], 'Nothing turns any more', 'Since yesterday, on both of them.');
    const oneWithWords = await askAbout([a.id], 'Zirconia is brittle', 'And I have dropped it once.');
    const both = await askAbout([a.id, b.id], 'Belt jumps a tooth', 'On every reversal, whatever I do.');
    const { questions } = await alike(`q=zirconia ring&part=${a.id}&part=${b.id}`);
    expect(slugsOf(questions)).toEqual([both, oneWithWords, one, words]);
  });

  it('names the known joints between its parts', async () => {
    const [a, b] = [await insertPart(app.knex), await insertPart(app.knex)];
    const featureIds: number[] = [];
    for (const part of [a, b])
      featureIds.push(
        (
          await app.knex('features').insert({ part_id: part.id, slug: 'seat', name: 'Seat', kind: 'boss' })
        )[0]!,
      );
    await app.knex('joints').insert({
      slug: 'seat-in-seat',
      name: 'Seat in seat',
      kind: 'boss-recess',
      feature_a: featureIds[0],
      feature_b: featureIds[1],
    });
    const { joints } = await alike(`part=${a.id}&part=${b.id}`);
    expect(joints).toMatchObject([{ slug: 'seat-in-seat', a: { id: a.id }, b: { id: b.id } }]);
    expect((await alike(`part=${a.id}`)).joints).toEqual([]);
  });

  it('is nothing while nothing is written, and never a question that is taken down', async () => {
    expect(await alike('')).toEqual({ questions: [], joints: [] });
    const part = await insertPart(app.knex);
    const slug = await askAbout([part.id], 'Lens cap is stuck', 'It does not come off any more.');
    await app.knex('questions').where({ slug }).update({ taken_down_at: new Date() });
    expect((await alike(`part=${part.id}`)).questions).toEqual([]);
  });

  it('names the field of a part that is no number', async () => {
    const { body } = await app.visitor().get('/api/question-alike?part=lip').expect(422);
    expect(fieldsOf(body)).toEqual(['part.0']);
  });
});

describe('questions and write-ups', () => {
  it('lead to each other when one settled the other', async () => {
    const joint = await insertJoint(app.knex);
    const fix = plainFix();
    const { slug } = await publishNew(other, moderator, completeContent(joint, { fixes: [fix] }));
    const question = await askAs(asker, questionAbout(joint, { symptoms: [] }));
    await askAs(asker, questionAbout(joint));
    expect((await get(`/api/write-ups/${slug}/questions`)).items).toEqual([]);
    await asker
      .post(`/api/questions/${question.slug}/settled`)
      .send({ writeUpSlug: slug, fixKey: fix.key })
      .expect(200);
    expect(slugsOf((await get(`/api/write-ups/${slug}/questions`)).items)).toEqual([question.slug]);
    expect((await get(`/api/questions/${question.slug}`)).writeUps[0].slug).toBe(slug);
    await app.visitor().get('/api/write-ups/no-such-write-up/questions').expect(404);
  });

  it('show what is written on both parts and a symptom, and nothing else', async () => {
    const joint = await insertJoint(app.knex);
    const elsewhere = await insertJoint(app.knex);
    const title = 'Bracket rocks on the raised lip';
    const { slug } = await publishNew(other, moderator, completeContent(joint, { title }));
    const otherSymptom = await insertSymptom(app.knex, 'It squeaks');
    await publishNew(other, moderator, completeContent({ ...joint, symptom: otherSymptom }));
    await publishNew(other, moderator, completeContent({ ...joint, bracket: elsewhere.bracket }));
    const { writeUps } = await askAs(asker, questionAbout(joint));
    expect(writeUps).toEqual([{ slug, title }]);
  });

  it('show the write-up that was made from a reply once it is published', async () => {
    const joint = await insertJoint(app.knex);
    const { slug } = await askAs(asker, questionAbout({ ...joint, symptom: await insertSymptom(app.knex) }));
    const reply = await replyAs(other, slug);
    const { body } = await other.post(`/api/replies/${reply.id}/draft`).expect(201);
    expect((await get(`/api/questions/${slug}`)).replies[0].writeUp).toBeNull();
    const draft = (await other.get(`/api/drafts/${body.draftId}`).expect(200)).body;
    const saved = await other
      .put(`/api/drafts/${body.draftId}`)
      .set('If-Match', `"${draft.version}"`)
      .send({ content: completeContent(joint), changeNote: '' })
      .expect(200);
    await other
      .post(`/api/drafts/${body.draftId}/submit`)
      .set('If-Match', saved.headers['etag']!)
      .expect(200);
    await moderator.post(`/api/desk/editions/${body.draftId}/publish`).send({ note: '' }).expect(200);
    const page = await get(`/api/questions/${slug}`);
    expect(page.replies[0].writeUp.title).toBe('Bracket rocks on the raised lip');
    expect(page.writeUps).toEqual([page.replies[0].writeUp]);
    const covered = await get(`/api/write-ups/${page.replies[0].writeUp.slug}/questions`);
    expect(slugsOf(covered.items)).toEqual([slug]);
  });
});
