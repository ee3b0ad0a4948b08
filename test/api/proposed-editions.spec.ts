import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { DeskEdition } from '../../shared/contract/moderation.js';
import type { ProposedEdition } from '../../shared/contract/proposed-editions.js';
import type { Draft } from '../../shared/contract/write-ups.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import {
  completeContent,
  insertJoint,
  publishNew,
  saveDraft,
  submitDraft,
  submitNext,
  type PublishedWriteUp,
  type TestJoint,
} from './support/write-ups.js';

let app: TestApp;
let author: MemberAgent;
let proposer: MemberAgent;
let stranger: MemberAgent;
let moderator: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  app = await startTestApp();
  [author, proposer, stranger, moderator] = await Promise.all([
    app.memberNamed('Author'),
    app.memberNamed('Proposer'),
    app.memberNamed('Stranger'),
    app.as('moderator'),
  ]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

const publishFirst = (): Promise<PublishedWriteUp> => publishNew(author, moderator, completeContent(joint));
const start = async (agent: MemberAgent, slug: string): Promise<Draft> =>
  (await agent.post(`/api/write-ups/${slug}/editions`).expect(201)).body;
const publish = (id: number) => moderator.post(`/api/desk/editions/${id}/publish`).send({ note: '' });
const submit = (agent: MemberAgent, draft: Draft) =>
  agent.post(`/api/drafts/${draft.id}/submit`).set('If-Match', `"${draft.version}"`);
const onDesk = async (id: number): Promise<DeskEdition> =>
  (await moderator.get(`/api/desk/editions/${id}`).expect(200)).body;
const proposedTo = async (agent: MemberAgent): Promise<ProposedEdition[]> =>
  (await agent.get('/api/my/proposed-editions?limit=100').expect(200)).body.items;

/** Published by one, while an edition of another from the same base is under way. */
async function overtake(): Promise<{ writeUp: PublishedWriteUp; mine: Draft; content: EditionContent }> {
  const writeUp = await publishFirst();
  const mine = await start(proposer, writeUp.slug);
  const content = { ...mine.content, cause: 'The lip is 0.4 mm wider than the recess, on Rev A.' };
  const saved = await saveDraft(proposer, mine, content, 'Says how much.');
  const theirs = await submitNext(author, writeUp.slug, {
    ...mine.content,
    summary: 'A disc of 1.2 mm behind the plate lets it sit flat.',
  });
  await publish(theirs.id).expect(200);
  return { writeUp, mine: saved, content };
}

describe('an edition of somebody else’s write-up', () => {
  it('is started by anybody who is signed in, on the base of what is published', async () => {
    const { slug, editionId } = await publishFirst();
    const draft = await start(proposer, slug);
    expect(draft).toMatchObject({ number: 2, base: { id: editionId, number: 1 }, overtakenBy: null });
    expect(draft.writtenBy.map((person) => person.displayName)).toEqual(['Author']);
    expect((await start(proposer, slug)).id).toBe(draft.id);
    expect((await app.visitor().post(`/api/write-ups/${slug}/editions`)).status).toBe(401);
  });

  it('is shown to the authors of the write-up while the desk has it, word by word, and to nobody else', async () => {
    const { slug } = await publishFirst();
    const draft = await start(proposer, slug);
    const content = { ...draft.content, cause: 'The lip is narrower than the recess and carries the plate.' };
    const saved = await saveDraft(proposer, draft, content, 'Had it the wrong way round.');
    expect((await proposedTo(author)).map((line) => line.editionId)).not.toContain(draft.id);

    await submitDraft(proposer, saved);

    expect((await proposedTo(author)).find((line) => line.editionId === draft.id)).toMatchObject({
      slug,
      author: { displayName: 'Proposer' },
      changeNote: 'Had it the wrong way round.',
      myOpinion: null,
    });
    const { body } = await author.get(`/api/my/proposed-editions/${draft.id}`).expect(200);
    expect(body.comparison.changed.map((each: { field: string }) => each.field)).toEqual(['cause']);
    expect(body.comparison.changed[0].pieces).toContainEqual({ kind: 'removed', text: 'wider' });
    for (const agent of [stranger, proposer, moderator]) {
      expect((await agent.get(`/api/my/proposed-editions/${draft.id}`)).status).toBe(404);
      expect((await proposedTo(agent)).map((line) => line.editionId)).not.toContain(draft.id);
    }
  });

  it('is told to the authors of the write-up once, and to nobody who only watches it', async () => {
    const { slug } = await publishFirst();
    const handed = await submitNext(proposer, slug, completeContent(joint, { sources: 'My own bench.' }));
    const recalled: Draft = (await proposer.post(`/api/drafts/${handed.id}/recall`).expect(200)).body;
    await submitDraft(proposer, recalled);

    const happenings = await app.knex('happenings').where('event_key', `edition-proposed:${handed.id}`);
    expect(happenings).toMatchObject([{ kind: 'edition-proposed', actor_id: proposer.account.id }]);
    const of = { happening_id: happenings[0].id };
    expect(await app.knex('happening_people').where(of).pluck('account_id')).toEqual([author.account.id]);
    expect(await app.knex('happening_subjects').where(of)).toEqual([]);
  });

  it('of an author’s own write-up tells nobody', async () => {
    const { slug } = await publishFirst();
    const handed = await submitNext(author, slug, completeContent(joint, { sources: 'My own bench.' }));
    expect(await app.knex('happenings').where('event_key', `edition-proposed:${handed.id}`)).toEqual([]);
  });

  it('credits its writer among the authors once it is published', async () => {
    const { slug } = await publishFirst();
    const handed = await submitNext(proposer, slug, completeContent(joint, { sources: 'My own bench.' }));
    await publish(handed.id).expect(200);
    const { body } = await app.visitor().get(`/api/write-ups/${slug}`).expect(200);
    expect(body.authors.map((person: { displayName: string }) => person.displayName)).toEqual([
      'Author',
      'Proposer',
    ]);
  });
});

describe('what an author tells the desk', () => {
  const say = (agent: MemberAgent, id: number, body: object) =>
    agent.put(`/api/my/proposed-editions/${id}/opinion`).send(body);

  it('stands on the desk’s page of the edition, the last word of each author only', async () => {
    const { slug } = await publishFirst();
    const { id } = await submitNext(proposer, slug, completeContent(joint, { sources: 'My own bench.' }));
    await say(author, id, { agrees: false, line: 'Not so on Rev B.' }).expect(200);
    const { body } = await say(author, id, { agrees: true, line: 'I was wrong.' }).expect(200);
    expect(body).toMatchObject({ agrees: true, line: 'I was wrong.', person: { displayName: 'Author' } });

    const edition = await onDesk(id);
    expect(edition.opinions).toEqual([body]);
    expect(edition.author.displayName).toBe('Proposer');
    expect(edition.writtenBy.map((person) => person.displayName)).toEqual(['Author']);
    expect((await proposedTo(author)).find((line) => line.editionId === id)?.myOpinion).toEqual(body);
  });

  it('is marked as said before, once the edition was handed in again', async () => {
    const { slug } = await publishFirst();
    const { id } = await submitNext(proposer, slug, completeContent(joint, { sources: 'My own bench.' }));
    await say(author, id, { agrees: true, line: '' }).expect(200);
    const recalled: Draft = (await proposer.post(`/api/drafts/${id}/recall`).expect(200)).body;
    expect((await say(author, id, { agrees: false, line: '' })).status).toBe(404);
    await submitDraft(proposer, recalled);
    expect((await onDesk(id)).opinions).toMatchObject([{ agrees: true, beforeHandingIn: true }]);
  });

  it('is for authors of the write-up only, and takes one line', async () => {
    const { slug } = await publishFirst();
    const { id } = await submitNext(proposer, slug, completeContent(joint, { sources: 'My own bench.' }));
    expect((await say(stranger, id, { agrees: true, line: '' })).status).toBe(404);
    expect((await say(proposer, id, { agrees: true, line: '' })).status).toBe(404);
    const { status, body } = await say(author, id, { agrees: true, line: 'x'.repeat(301) });
    expect([status, body.fields[0].path]).toEqual([422, 'line']);
    expect((await onDesk(id)).opinions).toEqual([]);
  });
});

describe('when another edition was published in the meantime', () => {
  it('the draft says so and still saves', async () => {
    const { mine } = await overtake();
    const { body } = await proposer.get(`/api/drafts/${mine.id}`).expect(200);
    expect(body).toMatchObject({
      base: { number: 1 },
      overtakenBy: { number: 2, author: { displayName: 'Author' } },
    });
    const saved = await saveDraft(proposer, mine, { ...mine.content, sources: 'Mine.' }, 'Says how much.');
    expect(saved.overtakenBy?.number).toBe(2);
  });

  it('handing in is refused with the base, what is published and what differs between them', async () => {
    const { mine, writeUp } = await overtake();
    const { status, body } = await submit(proposer, mine);
    expect([status, body.type]).toEqual([409, '/problems/edition-moved-on']);
    expect(body.base.edition.id).toBe(writeUp.editionId);
    expect(body.base.content.summary).toContain('1.5 mm');
    expect(body.current.edition.number).toBe(2);
    expect(body.current.content.summary).toContain('1.2 mm');
    expect(body.changed).toEqual(['summary']);
    const { body: still } = await proposer.get(`/api/drafts/${mine.id}`).expect(200);
    expect(still.state).toBe('draft');
    const { body: ground } = await proposer.get(`/api/drafts/${mine.id}/published`).expect(200);
    expect(ground).toEqual({ base: body.base, current: body.current, changed: body.changed });
    expect((await stranger.get(`/api/drafts/${mine.id}/published`)).status).toBe(404);
  });

  it('a merged text that names the published edition moves the base, and then the desk takes and publishes it', async () => {
    const { mine, content } = await overtake();
    const { body: ground } = await proposer.get(`/api/drafts/${mine.id}/published`).expect(200);
    const merged = { ...content, summary: ground.current.content.summary };
    const { body: saved } = await proposer
      .put(`/api/drafts/${mine.id}`)
      .set('If-Match', `"${mine.version}"`)
      .send({ content: merged, changeNote: 'Says how much.', baseEditionId: ground.current.edition.id })
      .expect(200);
    expect(saved).toMatchObject({ base: { number: 2 }, overtakenBy: null });
    const handed = await submitDraft(proposer, saved);
    const { body } = await publish(handed.id).expect(200);
    expect(body.number).toBe(3);
    const { body: page } = await app.visitor().get(`/api/write-ups/${body.slug}`).expect(200);
    expect(page.view.summary).toContain('1.2 mm');
    expect(page.view.cause.source).toContain('0.4 mm');
  });

  it('a merge with an edition that is not the published one is refused and stores nothing', async () => {
    const { mine, writeUp } = await overtake();
    const { status, body } = await proposer
      .put(`/api/drafts/${mine.id}`)
      .set('If-Match', `"${mine.version}"`)
      .send({
        content: { ...mine.content, title: 'Lost' },
        changeNote: '',
        baseEditionId: writeUp.editionId,
      });
    expect([status, body.type, body.current.edition.number]).toEqual([409, '/problems/edition-moved-on', 2]);
    const { body: still } = await proposer.get(`/api/drafts/${mine.id}`).expect(200);
    expect(still).toMatchObject({ version: mine.version, base: { number: 1 }, content: mine.content });
  });

  it('the desk cannot publish one that was handed in before, sees why, and can give it back', async () => {
    const writeUp = await publishFirst();
    const theirs = await submitNext(proposer, writeUp.slug, completeContent(joint, { sources: 'Theirs.' }));
    const mine = await submitNext(author, writeUp.slug, completeContent(joint, { sources: 'Mine.' }));
    await publish(mine.id).expect(200);

    const { status, body } = await publish(theirs.id);

    expect([status, body.type]).toEqual([409, '/problems/edition-moved-on']);
    expect(await onDesk(theirs.id)).toMatchObject({
      state: 'submitted',
      base: { number: 1 },
      overtakenBy: { number: 2 },
    });
    await moderator
      .post(`/api/desk/editions/${theirs.id}/return`)
      .send({ reason: 'Merge it with edition 2, please.' })
      .expect(204);
    const { body: returned } = await proposer.get(`/api/drafts/${theirs.id}`).expect(200);
    expect(returned).toMatchObject({ state: 'returned', overtakenBy: { number: 2 } });
  });

  it('of two editions handed in at the same moment as one of them is published, none gets past its base', async () => {
    const { mine } = await overtake();
    const answers = await Promise.all([submit(proposer, mine), submit(proposer, mine)]);
    expect(answers.map((answer) => answer.status)).toEqual([409, 409]);
  });
});

describe('bringing an earlier edition back', () => {
  const bringBack = (agent: MemberAgent, slug: string, number: number | string) =>
    agent.post(`/api/write-ups/${slug}/editions/${number}/bring-back`);

  it('starts an edition with the earlier text on the base of the published one, saying so', async () => {
    const { slug } = await publishFirst();
    const second = await submitNext(author, slug, completeContent(joint, { sources: 'Second.' }));
    await publish(second.id).expect(200);

    const { body } = await bringBack(stranger, slug, 1).expect(201);

    expect(body).toMatchObject({
      state: 'draft',
      number: 3,
      changeNote: 'Brings edition 1 back',
      base: { number: 2 },
      overtakenBy: null,
      content: { sources: '' },
    });
    const handed = await submitDraft(stranger, body);
    await publish(handed.id).expect(200);
    const { body: page } = await app.visitor().get(`/api/write-ups/${slug}`).expect(200);
    expect(page).toMatchObject({ edition: { number: 3, changeNote: 'Brings edition 1 back' } });
  });

  it('is refused while one is under way, for the published edition, and for one that is not there', async () => {
    const { slug } = await publishFirst();
    const one = await bringBack(stranger, slug, 1);
    expect([one.status, one.body.type]).toEqual([409, '/problems/edition-state']);
    const second = await submitNext(author, slug, completeContent(joint, { sources: 'Second.' }));
    await publish(second.id).expect(200);
    const draft = await start(stranger, slug);
    const underWay = await bringBack(stranger, slug, 1);
    expect([underWay.status, underWay.body.type]).toEqual([409, '/problems/edition-state']);
    expect((await start(stranger, slug)).id).toBe(draft.id);
    expect((await bringBack(stranger, slug, 7)).status).toBe(404);
    expect((await bringBack(stranger, slug, 'seven')).status).toBe(404);
    expect((await bringBack(app.visitor() as MemberAgent, slug, 1)).status).toBe(401);
  });
});
