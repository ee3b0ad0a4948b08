import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { askAs, fieldsOf, photoOf, questionAbout, replyAs } from './support/questions.js';
import { insertJoint, type TestJoint } from './support/write-ups.js';

let app: TestApp;
let asker: MemberAgent;
let replier: MemberAgent;
let moderator: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp();
  [asker, replier, moderator] = await Promise.all([
    app.memberNamed('Asker'),
    app.memberNamed('Rep_lier*'),
    app.as('moderator'),
  ]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

const page = async (slug: string) => (await app.visitor().get(`/api/questions/${slug}`).expect(200)).body;

describe('photos of questions and replies', () => {
  it('are shown in the order in which they were attached, with their alternative texts', async () => {
    const [lip, recess] = [await photoOf(asker, 'The lip from the side'), await photoOf(asker, 'The recess')];
    const asked = await askAs(asker, questionAbout(joint, { photos: [recess.id, lip.id] }));
    expect(asked.photos).toEqual([recess, lip]);
    const disc = await photoOf(replier, 'A disc on the plate');
    const reply = await replyAs(replier, asked.slug, { photos: [disc.id] });
    expect(reply.photos).toEqual([disc]);
    const read = await page(asked.slug);
    expect([read.photos, read.replies[0].photos]).toEqual([[recess, lip], [disc]]);
  });

  it('have to be the writer’s own, each once, and six at most', async () => {
    const foreign = await photoOf(replier, 'Somebody else’s photo');
    const own = await photoOf(asker, 'My own photo');
    const { slug } = await askAs(asker, questionAbout(joint));
    const refused = async (photos: number[]) => {
      const ask = await asker.post('/api/questions').send(questionAbout(joint, { photos })).expect(422);
      const text = 'Look at this.';
      const reply = await asker
        .post(`/api/questions/${slug}/replies`)
        .send({ text, worksheet: null, photos })
        .expect(422);
      expect(fieldsOf(reply.body)).toEqual(fieldsOf(ask.body));
      return fieldsOf(ask.body);
    };
    expect(await refused([own.id, foreign.id])).toEqual(['photos.1']);
    expect(await refused([own.id, own.id])).toEqual(['photos']);
    expect(await refused([1, 2, 3, 4, 5, 6, 7])).toEqual(['photos']);
    expect((await page(slug)).replies).toEqual([]);
  });
});

describe('changing what one has written', () => {
  it('of a question changes what is named, keeps its address, and shows when', async () => {
    const { slug, ...before } = await askAs(asker, questionAbout(joint));
    const readings = [{ dimension: 'lip diameter', value: 32.4, unit: 'mm', instrument: 'micrometer' }];
    const { body } = await asker
      .patch(`/api/questions/${slug}`)
      .send({ title: 'Why does it rock on Rev B?', readings })
      .expect(200);
    expect(body).toMatchObject({
      slug,
      title: 'Why does it rock on Rev B?',
      readings,
      text: before.text,
      parts: before.parts,
    });
    expect([before.changedAt, typeof body.changedAt]).toEqual([null, 'string']);
    expect(await page(slug)).toEqual(body);
  });

  it('of a reply changes its words and shows when', async () => {
    const { slug } = await askAs(asker, questionAbout(joint));
    const reply = await replyAs(replier, slug);
    const { body } = await replier
      .patch(`/api/replies/${reply.id}`)
      .send({ text: 'Lay *two* discs.' })
      .expect(200);
    expect(body.text.html).toContain('<em>two</em>');
    expect([reply.changedAt, typeof body.changedAt]).toEqual([null, 'string']);
    expect((await page(slug)).replies).toEqual([body]);
  });

  it('is for its writer only, and refused with the field named', async () => {
    const { slug } = await askAs(asker, questionAbout(joint));
    const reply = await replyAs(replier, slug);
    const before = await page(slug);
    await replier.patch(`/api/questions/${slug}`).send({ title: 'Why does it rock?' }).expect(403);
    await asker.patch(`/api/replies/${reply.id}`).send({ text: 'Nonsense.' }).expect(403);
    const short = await asker.patch(`/api/questions/${slug}`).send({ title: 'Rocks' }).expect(422);
    const empty = await replier.patch(`/api/replies/${reply.id}`).send({ text: '  ' }).expect(422);
    expect([fieldsOf(short.body), fieldsOf(empty.body)]).toEqual([['title'], ['text']]);
    await replier.patch('/api/replies/999999999').send({ text: 'Yes.' }).expect(404);
    expect(await page(slug)).toEqual(before);
  });
});

describe('a write-up from a reply', () => {
  const startDraft = (who: MemberAgent, id: number) => who.post(`/api/replies/${id}/draft`);

  it('starts with parts, symptoms, readings and words of both, and credit for both', async () => {
    const asked = await askAs(asker, questionAbout(joint));
    const photo = await photoOf(replier, 'A disc on the plate');
    const text = 'The lip is wider than the recess.\n\nLay a disc of 1.5 mm on it.\n\nThen tighten.';
    const reply = await replyAs(replier, asked.slug, { text, photos: [photo.id] });
    const { body } = await startDraft(replier, reply.id).expect(201);
    const draft = (await replier.get(`/api/drafts/${body.draftId}`).expect(200)).body;
    expect(draft.state).toBe('draft');
    expect(draft.content).toMatchObject({
      title: asked.title,
      noticed: asked.text.source,
      cause: 'The lip is wider than the recess.',
      symptoms: [joint.symptom],
      joints: [
        {
          a: {
            partId: joint.motor.id,
            revisions: [{ revisionId: joint.motor.revisions[1]!.id, holds: true }],
          },
          b: { partId: joint.bracket.id, revisions: [] },
        },
      ],
      readings: [{ dimension: 'lip diameter', value: 32.1, unit: 'mm', instrument: 'caliper' }],
      fixes: [{ why: 'Lay a disc of 1.5 mm on it.\n\nThen tighten.' }],
      photos: [{ photoId: photo.id, alt: 'A disc on the plate' }],
    });
    const { view } = (await replier.get(`/api/drafts/${body.draftId}/preview`).expect(200)).body;
    expect(view.sources.html).toContain(`href="/questions/${asked.slug}"`);
    expect(view.sources.html).toContain('Rep_lier*');
    expect(view.sources.html).toContain('Asker');
  });

  it('can be saved as it is, and is given back while it is under way', async () => {
    const { slug } = await askAs(asker, questionAbout(joint));
    const reply = await replyAs(replier, slug);
    const { body } = await startDraft(replier, reply.id).expect(201);
    const draft = (await replier.get(`/api/drafts/${body.draftId}`).expect(200)).body;
    await replier
      .put(`/api/drafts/${body.draftId}`)
      .set('If-Match', `"${draft.version}"`)
      .send({ content: draft.content, changeNote: '' })
      .expect(200);
    expect((await startDraft(replier, reply.id).expect(201)).body).toEqual(body);
    const again = await startDraft(moderator, reply.id).expect(409);
    expect(again.body.type).toBe('/problems/already-there');
  });

  it('is started once when it is asked for twice at the same moment', async () => {
    const { slug } = await askAs(asker, questionAbout(joint));
    const reply = await replyAs(replier, slug);
    const answers = await Promise.all([1, 2, 3].map(() => startDraft(replier, reply.id)));
    expect(new Set(answers.map((answer) => answer.body.draftId)).size).toBe(1);
  });

  it('is for the reply’s writer and for moderators, who are credited as the writer is', async () => {
    const { slug } = await askAs(asker, questionAbout(joint));
    const photo = await photoOf(replier, 'A disc on the plate');
    const reply = await replyAs(replier, slug, { photos: [photo.id] });
    await startDraft(asker, reply.id).expect(403);
    const { body } = await startDraft(moderator, reply.id).expect(201);
    const { content } = (await moderator.get(`/api/drafts/${body.draftId}`).expect(200)).body;
    expect(content.sources).toContain('Rep\\_lier\\*');
    // A photo is its owner's to use.
    expect(content.photos).toEqual([]);
    await startDraft(replier, 999_999_999).expect(404);
  });
});
