import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { emptyContent, type EditionContent } from '../../shared/contract/edition-content.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import type { Draft, MyWriteUp } from '../../shared/contract/write-ups.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { throughAllPages } from './support/pages.js';
import { insertPart } from './support/catalogue.js';
import {
  completeContent,
  insertJoint,
  newKey,
  plainFix,
  publishNew,
  saveDraft,
  saveNewDraft,
  submitDraft,
  submitNext,
  type TestJoint,
} from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let stranger: MemberAgent;
let moderator: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp();
  [author, stranger, moderator] = await Promise.all([
    app.memberNamed('Author'),
    app.memberNamed('Stranger'),
    app.as('moderator'),
  ]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

const put = (
  agent: MemberAgent,
  draft: Draft,
  content: EditionContent,
  version = draft.version,
  changeNote = '',
) => agent.put(`/api/drafts/${draft.id}`).set('If-Match', `"${version}"`).send({ content, changeNote });
const stored = async (id: number): Promise<Draft> => (await author.get(`/api/drafts/${id}`).expect(200)).body;
const pathsOf = (fields: FieldProblem[]): string[] => fields.map((field) => field.path);

async function insertPhoto(ownerId: number): Promise<number> {
  const hash = Buffer.from(newKey().padEnd(32, 'p')).toString('hex').slice(0, 64);
  const [id] = await app.knex('photos').insert({
    hash,
    owner_id: ownerId,
    width: 100,
    height: 80,
    widths: '[480]',
    placeholder: 'data:,',
    alt: 'The lip',
    created_at: new Date(),
  });
  return id!;
}

describe('starting', () => {
  it('gives an empty draft with the title, its version as ETag, and nothing published', async () => {
    const { status, body, headers } = await author.post('/api/write-ups').send({ title: 'Lip too wide' });
    expect(status).toBe(201);
    expect(headers['etag']).toBe('"1"');
    expect(body).toMatchObject({
      number: 1,
      state: 'draft',
      slug: null,
      version: 1,
      content: { ...emptyContent, title: 'Lip too wide' },
    });
    expect(body.author.displayName).toBe('Author');
    expect(await app.knex('write_ups').where('id', body.writeUpId).first()).toMatchObject({
      slug: null,
      published_edition_id: null,
    });
  });

  it('needs an account', async () => {
    expect((await app.visitor().post('/api/write-ups').send({})).status).toBe(401);
  });
});

describe('saving', () => {
  it('takes an incomplete text, gives back what it stored, and counts the version up', async () => {
    const draft = await saveNewDraft(author, {
      ...emptyContent,
      title: 'Half',
      joints: [{ a: side(joint.motor.id), b: side(null) }],
    });
    const { status, body, headers } = await put(
      author,
      draft,
      { ...draft.content, cause: 'Because.' },
      draft.version,
      'Why',
    );
    expect([status, headers['etag'], body.version]).toEqual([200, '"3"', 3]);
    expect(await stored(draft.id)).toEqual(body);
    expect(body).toMatchObject({ changeNote: 'Why', content: { cause: 'Because.', title: 'Half' } });
  });

  it('refuses a version that was overtaken, with the draft as it is now and the fields that differ', async () => {
    const draft = await saveNewDraft(author, { ...emptyContent, title: 'First words' });
    const newer = await saveDraft(author, draft, { ...draft.content, title: 'Newer words' });
    const { status, body } = await put(
      author,
      draft,
      { ...draft.content, cause: 'Mine.' },
      draft.version,
      'Note',
    );
    expect([status, body.type]).toEqual([412, '/problems/edition-moved-on']);
    expect(body.current).toEqual(newer);
    expect(body.changed.sort()).toEqual(['cause', 'changeNote', 'title']);
    expect(await stored(draft.id)).toEqual(newer);
  });

  it('lets exactly one of several saves at the same moment win', async () => {
    const draft = await saveNewDraft(author, { ...emptyContent, title: 'Race' });
    const titles = ['Save one', 'Save two', 'Save three', 'Save four'];
    const answers = await Promise.all(titles.map((title) => put(author, draft, { ...emptyContent, title })));
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 412, 412, 412]);
    const winner = answers.find((answer) => answer.status === 200)!;
    expect(await stored(draft.id)).toEqual(winner.body);
    expect(winner.body.version).toBe(draft.version + 1);
  });

  it('needs the version to be named', async () => {
    const draft = await saveNewDraft(author, { ...emptyContent, title: 'No version' });
    const bare = await author.put(`/api/drafts/${draft.id}`).send({ content: draft.content, changeNote: '' });
    expect([bare.status, bare.body.type]).toEqual([428, '/problems/precondition-needed']);
    const odd = await author
      .put(`/api/drafts/${draft.id}`)
      .set('If-Match', 'W/"1"')
      .send({ content: draft.content, changeNote: '' });
    expect(odd.status).toBe(428);
  });

  it('names every reference that is not there or does not belong, and stores nothing', async () => {
    const other = await insertPart(app.knex);
    const draft = await saveNewDraft(author, { ...emptyContent, title: 'As it was' });
    const twice = newKey();
    const theirs = await insertPhoto(stranger.account.id);
    const { status, body } = await put(author, draft, {
      ...emptyContent,
      joints: [
        {
          a: side(
            joint.motor.id,
            other.revisions[0]!.id,
            joint.motor.revisions[0]!.id,
            joint.motor.revisions[0]!.id,
          ),
          b: side(999_999_999),
        },
      ],
      symptoms: ['no-such-symptom'],
      readings: [
        {
          key: newKey(),
          revisionId: 999_999_999,
          dimension: 'd',
          value: 1,
          unit: 'mm',
          instrument: 'caliper',
          uncertainty: null,
        },
      ],
      fixes: [
        plainFix({ key: twice, revisionIds: [999_999_999] }),
        plainFix({ key: twice, steps: [{ key: newKey(), text: '', photoId: theirs }] }),
      ],
      photos: [{ photoId: 999_999_999, alt: '', caption: '', callouts: [] }],
    });
    expect([status, body.type]).toEqual([422, '/problems/not-valid']);
    expect(pathsOf(body.fields).sort()).toEqual([
      'content.fixes.0.revisionIds.0',
      'content.fixes.1.key',
      'content.fixes.1.steps.0.photoId',
      'content.joints.0.a.revisions.0',
      'content.joints.0.a.revisions.2',
      'content.joints.0.b.partId',
      'content.photos.0.photoId',
      'content.readings.0.revisionId',
      'content.symptoms.0',
    ]);
    expect((await stored(draft.id)).content.title).toBe('As it was');
  });

  it('refuses text beyond its limits and fields that are none, naming them', async () => {
    const draft = await saveNewDraft(author, emptyContent);
    const { status, body } = await put(author, draft, {
      ...emptyContent,
      title: 'x'.repeat(141),
      spoon: 1,
    } as EditionContent);
    expect(status).toBe(422);
    expect(pathsOf(body.fields).sort()).toEqual(['content.spoon', 'content.title']);
  });

  it('takes the caller’s own photos and gives them back with the draft', async () => {
    const photoId = await insertPhoto(author.account.id);
    const draft = await saveNewDraft(author, {
      ...emptyContent,
      photos: [{ photoId, alt: 'The lip', caption: '', callouts: [] }],
    });
    expect(draft.photos).toMatchObject([{ id: photoId, alt: 'The lip', widths: [480] }]);
  });

  it('keeps hostile text as it is and renders it without its script', async () => {
    const cause = '<img src=x onerror=alert(1)>[click](javascript:alert(2)) **bold**';
    const draft = await saveNewDraft(author, { ...emptyContent, cause });
    expect(draft.content.cause).toBe(cause);
    const { body } = await author.get(`/api/drafts/${draft.id}/preview`).expect(200);
    expect(body.view.cause.html).toContain('<strong>bold</strong>');
    expect(body.view.cause.html).not.toMatch(/<img|<script|href="javascript/i);
  });
});

describe('somebody else’s draft', () => {
  it('is not there, for strangers and for moderators, whatever they try', async () => {
    const draft = await saveNewDraft(author, completeContent(joint));
    for (const agent of [stranger, moderator]) {
      const answers = await Promise.all([
        agent.get(`/api/drafts/${draft.id}`),
        agent.get(`/api/drafts/${draft.id}/preview`),
        put(agent, draft, emptyContent),
        agent.delete(`/api/drafts/${draft.id}`),
        agent.post(`/api/drafts/${draft.id}/restore`),
        agent.post(`/api/drafts/${draft.id}/submit`).set('If-Match', `"${draft.version}"`),
        agent.post(`/api/drafts/${draft.id}/recall`),
      ]);
      expect(answers.map((answer) => answer.status)).toEqual([404, 404, 404, 404, 404, 404, 404]);
    }
    expect(await stored(draft.id)).toEqual(draft);
  });
});

describe('throwing away and bringing back', () => {
  it('hides the draft until it is brought back as it was', async () => {
    const draft = await saveNewDraft(author, { ...emptyContent, title: 'Hidden' });
    expect((await author.delete(`/api/drafts/${draft.id}`)).status).toBe(204);
    expect((await author.get(`/api/drafts/${draft.id}`)).status).toBe(404);
    expect((await put(author, draft, emptyContent)).status).toBe(404);
    const { status, body } = await author.post(`/api/drafts/${draft.id}/restore`);
    expect(status).toBe(200);
    expect({ ...body, updatedAt: '' }).toEqual({ ...draft, updatedAt: '' });
    const again = await author.post(`/api/drafts/${draft.id}/restore`);
    expect([again.status, again.body.type]).toEqual([409, '/problems/edition-state']);
  });

  it('is refused for an edition on the desk', async () => {
    const draft = await submitDraft(author, await saveNewDraft(author, completeContent(joint)));
    const { status, body } = await author.delete(`/api/drafts/${draft.id}`);
    expect([status, body.type]).toEqual([409, '/problems/edition-state']);
    expect((await stored(draft.id)).state).toBe('submitted');
  });

  it('is refused for bringing back while another edition of the same write-up is under way', async () => {
    const { slug } = await publishNew(author, moderator, completeContent(joint));
    const first: Draft = (await author.post(`/api/write-ups/${slug}/editions`)).body;
    await author.delete(`/api/drafts/${first.id}`).expect(204);
    const second: Draft = (await author.post(`/api/write-ups/${slug}/editions`)).body;
    expect(second.id).not.toBe(first.id);
    expect((await author.post(`/api/drafts/${first.id}/restore`)).status).toBe(409);
    expect((await author.get(`/api/drafts/${first.id}`)).status).toBe(404);
  });
});

describe('handing to the desk', () => {
  it('names everything that is missing and leaves the draft with its author', async () => {
    const draft = await saveNewDraft(author, { ...emptyContent, title: 'Too little' });
    const { status, body } = await author
      .post(`/api/drafts/${draft.id}/submit`)
      .set('If-Match', `"${draft.version}"`);
    expect([status, body.type]).toEqual([422, '/problems/not-complete']);
    expect(pathsOf(body.fields)).toEqual(['summary', 'joints', 'symptoms', 'cause', 'fixes']);
    expect(body.fields.every((field: FieldProblem) => field.remedy !== undefined)).toBe(true);
    expect((await stored(draft.id)).state).toBe('draft');
  });

  it('asks for revisions of parts that a joint names', async () => {
    const other = await insertPart(app.knex);
    const content = completeContent(joint, { fixes: [plainFix({ revisionIds: [other.revisions[0]!.id] })] });
    const draft = await saveNewDraft(author, content);
    const { status, body } = await author
      .post(`/api/drafts/${draft.id}/submit`)
      .set('If-Match', `"${draft.version}"`);
    expect([status, pathsOf(body.fields)]).toEqual([422, ['fixes.0.revisionIds.0']]);
  });

  it('puts a complete draft on the desk, where it cannot be saved, and gives it back when it is recalled', async () => {
    const draft = await saveNewDraft(author, completeContent(joint));
    const submitted = await submitDraft(author, draft);
    expect(submitted).toMatchObject({ state: 'submitted', version: draft.version + 1 });
    const save = await put(author, submitted, emptyContent);
    expect([save.status, save.body.type]).toEqual([409, '/problems/edition-state']);
    const recalled = await author.post(`/api/drafts/${draft.id}/recall`).expect(200);
    expect(recalled.body).toMatchObject({
      state: 'draft',
      version: draft.version + 2,
      content: draft.content,
    });
    expect((await author.post(`/api/drafts/${draft.id}/recall`)).status).toBe(409);
    await saveDraft(author, recalled.body, { ...draft.content, sources: 'More.' });
  });

  it('refuses a version that was overtaken', async () => {
    const draft = await saveNewDraft(author, completeContent(joint));
    const newer = await saveDraft(author, draft, { ...draft.content, sources: 'More.' });
    const { status, body } = await author
      .post(`/api/drafts/${draft.id}/submit`)
      .set('If-Match', `"${draft.version}"`);
    expect([status, body.current]).toEqual([412, newer]);
    expect((await stored(draft.id)).state).toBe('draft');
  });

  it('lets one of two at the same moment through', async () => {
    const draft = await saveNewDraft(author, completeContent(joint));
    const hand = () => author.post(`/api/drafts/${draft.id}/submit`).set('If-Match', `"${draft.version}"`);
    const answers = await Promise.all([hand(), hand()]);
    expect(answers.filter((answer) => answer.status === 200)).toHaveLength(1);
    expect(answers.find((answer) => answer.status !== 200)!.status).toBe(409);
  });

  it('needs a change note from the second edition on', async () => {
    const { slug } = await publishNew(author, moderator, completeContent(joint));
    const next: Draft = (await author.post(`/api/write-ups/${slug}/editions`)).body;
    const { status, body } = await author
      .post(`/api/drafts/${next.id}/submit`)
      .set('If-Match', `"${next.version}"`);
    expect([status, pathsOf(body.fields)]).toEqual([422, ['changeNote']]);
  });
});

describe('the next edition', () => {
  it('starts from the published text with the same keys, and is given back instead of a second one', async () => {
    const content = completeContent(joint);
    const { slug } = await publishNew(author, moderator, content);
    const first = await author.post(`/api/write-ups/${slug}/editions`);
    expect([first.status, first.headers['etag']]).toEqual([201, '"1"']);
    expect(first.body).toMatchObject({ number: 2, state: 'draft', slug, content, changeNote: '' });
    const second = await author.post(`/api/write-ups/${slug}/editions`);
    expect(second.body.id).toBe(first.body.id);
    const several = await Promise.all([1, 2, 3].map(() => moderator.post(`/api/write-ups/${slug}/editions`)));
    expect(new Set(several.map((answer) => answer.body.id)).size).toBe(1);
    expect(several[0]!.body.id).not.toBe(first.body.id);
  });

  it('is there for a write-up that is published only', async () => {
    expect((await author.post('/api/write-ups/no-such-write-up/editions')).status).toBe(404);
  });

  it('may go on using the photos of earlier editions, whoever took them', async () => {
    const photoId = await insertPhoto(author.account.id);
    const content = completeContent(joint, {
      photos: [{ photoId, alt: 'The raised lip', caption: '', callouts: [] }],
    });
    const { slug } = await publishNew(author, moderator, content);
    const draft: Draft = (await moderator.post(`/api/write-ups/${slug}/editions`)).body;
    const saved = await put(moderator, draft, { ...content, sources: 'More.' });
    expect(saved.status).toBe(200);
    const elsewhere: Draft = (await moderator.post('/api/write-ups').send({})).body;
    expect((await put(moderator, elsewhere, content)).status).toBe(422);
  });
});

describe('my list', () => {
  it('goes through my editions, the last touched first, each once, and keeps what is thrown away out', async () => {
    const me = await app.memberNamed('Lister');
    const drafts: Draft[] = [];
    for (const title of ['One', 'Two', 'Three', 'Four'])
      drafts.push(await saveNewDraft(me, { ...emptyContent, title }));
    await me.delete(`/api/drafts/${drafts[2]!.id}`).expect(204);
    await saveDraft(me, drafts[0]!, { ...emptyContent, title: 'One again' });
    const titles = (await throughAllPages<MyWriteUp>(me, '/api/my/write-ups')).map((line) => line.title);
    expect(titles).toEqual(['One again', 'Four', 'Two']);
  });

  it('narrows to one state and shows the desk’s reason', async () => {
    const me = await app.memberNamed('Lister');
    await saveNewDraft(me, { ...emptyContent, title: 'Still a draft' });
    const draft = await submitDraft(me, await saveNewDraft(me, completeContent(joint)));
    await moderator
      .post(`/api/desk/editions/${draft.id}/return`)
      .send({ reason: 'Say which screw you mean.' })
      .expect(204);
    const { body } = await me.get('/api/my/write-ups').query({ state: 'returned' }).expect(200);
    expect(body.items).toMatchObject([
      {
        editionId: draft.id,
        state: 'returned',
        slug: null,
        number: 1,
        returnReason: 'Say which screw you mean.',
      },
    ]);
    const published = await publishNew(me, moderator, completeContent(joint));
    await submitNext(me, published.slug, completeContent(joint, { sources: 'More.' }));
    const onDesk = await me.get('/api/my/write-ups').query({ state: 'submitted' });
    expect(onDesk.body.items).toMatchObject([{ slug: published.slug, number: 2 }]);
  });
});

function side(partId: number | null, ...revisionIds: number[]) {
  return { partId, feature: '', revisions: revisionIds.map((revisionId) => ({ revisionId, holds: true })) };
}
