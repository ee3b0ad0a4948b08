import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DeskItem } from '../../shared/contract/desk-queue.js';
import type { FoundHazard } from '../../shared/contract/moderation.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import type { Caution, Draft } from '../../shared/contract/write-ups.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { throughAllPages } from './support/pages.js';
import {
  cautionFor,
  completeContent,
  insertJoint,
  knifeFix,
  plainFix,
  publishNew,
  saveNewDraft,
  submitDraft,
  submitNext,
  type TestJoint,
} from './support/write-ups.js';

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

const publish = (id: number, who = moderator) =>
  who.post(`/api/desk/editions/${id}/publish`).send({ note: 'Clear and safe.' });
const giveBack = (id: number, reason = 'Say which screw you mean.') =>
  moderator.post(`/api/desk/editions/${id}/return`).send({ reason });
const place = (editionId: number, caution: ReturnType<typeof cautionFor>) =>
  moderator.post('/api/desk/cautions').send({ ...caution, editionId });
const deskEdition = async (id: number) => (await moderator.get(`/api/desk/editions/${id}`).expect(200)).body;
const edition = (id: number) => app.knex('editions').where('id', id).first();
/** What the audit log has on an edition and on cautions of its write-up. */
const decisions = async (id: number): Promise<string[]> => {
  const { write_up_id: writeUpId } = await app.knex('editions').where({ id }).first('write_up_id');
  return app
    .knex('audit_log')
    .where({ subject_kind: 'edition', subject_id: id })
    .orWhereRaw("subject_kind = 'caution' AND JSON_VALUE(details, '$.writeUpId') = ?", [writeUpId])
    .orderBy('id')
    .pluck('action');
};
const mailsTo = (account: { email: string }) => app.knex('mail_outbox').where('to_address', account.email);
const onDesk = async (content = completeContent(joint), who = author): Promise<Draft> =>
  submitDraft(who, await saveNewDraft(who, content));

describe('the queue', () => {
  it('lists what waits, the longest wait first, each once over small pages, with the hazards that nothing answers', async () => {
    const first = await onDesk(
      completeContent(joint, { title: 'Waits the longest', fixes: [knifeFix(), plainFix()] }),
    );
    const second = await onDesk(completeContent(joint, { title: 'Waits less long' }));
    await saveNewDraft(author, completeContent(joint, { title: 'Still a draft' }));
    const items = await throughAllPages<DeskItem>(moderator, '/api/desk', { kind: 'edition' });
    const ids = items.map((item) => item.id);
    expect(new Set(ids).size).toBe(ids.length);
    expect(ids.slice(-2)).toEqual([first.id, second.id]);
    expect(items.find((item) => item.id === first.id)).toMatchObject({
      kind: 'edition',
      title: 'Waits the longest',
      openHazards: 1,
      person: { displayName: 'Author' },
      path: `/desk/editions/${first.id}`,
    });
    expect(items.find((item) => item.id === second.id)).toMatchObject({ openHazards: 0 });
    expect(items.map((item) => item.title)).not.toContain('Still a draft');
    const waits = items.map((item) => item.since);
    expect(waits).toEqual([...waits].sort());
  });

  it('is closed to members and visitors', async () => {
    const draft = await onDesk();
    for (const path of ['/api/desk', `/api/desk/editions/${draft.id}`, '/api/desk/caution-library']) {
      expect((await author.get(path)).status).toBe(403);
      expect((await app.visitor().get(path)).status).toBe(401);
    }
    expect((await publish(draft.id, author)).status).toBe(403);
    expect((await edition(draft.id)).state).toBe('submitted');
  });
});

describe('an edition on the desk', () => {
  it('shows its view, its hazards with the words, and no comparison while it is the first', async () => {
    const fix = knifeFix();
    const draft = await onDesk(completeContent(joint, { fixes: [fix] }));
    expect(await deskEdition(draft.id)).toMatchObject({
      editionId: draft.id,
      slug: null,
      number: 1,
      state: 'submitted',
      comparison: null,
      cautions: [],
      view: { title: 'Bracket rocks on the raised lip' },
      hazards: [
        { hazard: 'blade', fixKey: fix.key, fixTitle: 'Trim the lip', words: ['knife'], answered: false },
      ],
    });
  });

  it('compares a later edition with the published one', async () => {
    const content = completeContent(joint);
    const { slug } = await publishNew(author, moderator, content);
    const next = await submitNext(author, slug, { ...content, sources: 'Measured again.' });
    const { comparison, changeNote } = await deskEdition(next.id);
    expect(changeNote).toBe('Says it better.');
    expect([comparison.from.number, comparison.to.number]).toEqual([1, 2]);
    expect(comparison.changed.map((change: { field: string }) => change.field)).toEqual(['sources']);
  });

  it('is not there while its author still works on it', async () => {
    const draft = await saveNewDraft(author, completeContent(joint));
    expect((await moderator.get(`/api/desk/editions/${draft.id}`)).status).toBe(404);
    expect((await place(draft.id, cautionFor(null, 'sun'))).status).toBe(404);
    const refused = await publish(draft.id);
    expect([refused.status, refused.body.type]).toEqual([409, '/problems/edition-state']);
    expect((await publish(999_999_999)).status).toBe(404);
  });
});

describe('publishing', () => {
  it('makes it the published edition, with its links, a decision, a mail to the author and a note to the index', async () => {
    const me = await app.memberNamed('Published author');
    const draft = await onDesk(completeContent(joint), me);
    const { status, body } = await publish(draft.id);
    expect([status, body.number]).toEqual([200, 1]);
    expect(await edition(draft.id)).toMatchObject({ state: 'published', number: 1 });
    const writeUp = await app.knex('write_ups').where('id', draft.writeUpId).first();
    expect(writeUp).toMatchObject({ slug: body.slug, published_edition_id: draft.id });
    expect(writeUp.first_published_at).not.toBeNull();
    expect(
      await app
        .knex('edition_sides')
        .where('edition_id', draft.id)
        .orderBy('side')
        .select('joint', 'side', 'part_id'),
    ).toEqual([
      { joint: 0, side: 'a', part_id: joint.motor.id },
      { joint: 0, side: 'b', part_id: joint.bracket.id },
    ]);
    const revisions = await app
      .knex('edition_revisions')
      .where('edition_id', draft.id)
      .orderBy('revision_id')
      .select('revision_id', 'holds');
    expect(revisions).toEqual([
      { revision_id: joint.motor.revisions[0]!.id, holds: 1 },
      { revision_id: joint.motor.revisions[1]!.id, holds: 0 },
      { revision_id: joint.bracket.revisions[0]!.id, holds: 1 },
    ]);
    expect(await app.knex('edition_symptoms').where('edition_id', draft.id)).toHaveLength(1);
    expect(await app.knex('edition_fixes').where('edition_id', draft.id)).toMatchObject([{ position: 0 }]);
    expect(await decisions(draft.id)).toEqual(['edition-published']);
    expect(await mailsTo(me.account)).toHaveLength(1);
    expect(await app.knex('search_outbox').where('write_up_id', draft.writeUpId)).toHaveLength(1);
  });

  it('is impossible while a hazard has no caution, names each, and changes nothing', async () => {
    const fix = knifeFix({ materials: ['epoxy'] });
    const me = await app.memberNamed('Careless author');
    const draft = await onDesk(completeContent(joint, { fixes: [plainFix(), fix] }), me);
    await place(draft.id, cautionFor(fix.key, 'dust')).expect(201);
    const { status, body } = await publish(draft.id);
    expect([status, body.type]).toEqual([409, '/problems/caution-missing']);
    expect(body.fields.map((field: FieldProblem) => [field.path, field.message])).toEqual([
      ['fixes.1', '“Trim the lip” names “knife”: blade'],
      ['fixes.1', '“Trim the lip” names “epoxy”: adhesive'],
    ]);
    expect((await edition(draft.id)).state).toBe('submitted');
    expect(await app.knex('write_ups').where('id', draft.writeUpId).first()).toMatchObject({
      slug: null,
      published_edition_id: null,
    });
    expect(await mailsTo(me.account)).toHaveLength(0);
    await place(draft.id, cautionFor(fix.key, 'blade')).expect(201);
    await place(draft.id, cautionFor(null, 'adhesive')).expect(201);
    await publish(draft.id).expect(200);
  });

  it('happens once when two moderators publish at the same moment, with one mail', async () => {
    const other = await app.as('moderator');
    const me = await app.memberNamed('Twice published');
    const draft = await onDesk(completeContent(joint), me);
    const answers = await Promise.all([
      publish(draft.id),
      publish(draft.id, other),
      publish(draft.id),
      publish(draft.id, other),
    ]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409, 409, 409]);
    expect(answers.find((answer) => answer.status === 409)!.body.type).toBe('/problems/edition-state');
    expect(await decisions(draft.id)).toEqual(['edition-published']);
    expect(await mailsTo(me.account)).toHaveLength(1);
    expect(await app.knex('edition_sides').where('edition_id', draft.id)).toHaveLength(2);
  });

  it('gives write-ups of the same title different addresses when they are published at the same moment', async () => {
    const content = completeContent(joint, { title: 'The same title for several' });
    const drafts = [await onDesk(content), await onDesk(content), await onDesk(content)];
    const answers = await Promise.all(drafts.map((draft) => publish(draft.id)));
    expect(answers.map((answer) => answer.status)).toEqual([200, 200, 200]);
    expect(answers.map((answer) => answer.body.slug).sort()).toEqual([
      'the-same-title-for-several',
      'the-same-title-for-several-2',
      'the-same-title-for-several-3',
    ]);
  });

  it('and returning or recalling at the same moment leave one decision', async () => {
    const draft = await onDesk();
    const answers = await Promise.all([
      publish(draft.id),
      giveBack(draft.id),
      author.post(`/api/drafts/${draft.id}/recall`),
    ]);
    expect(answers.filter((answer) => answer.status < 300)).toHaveLength(1);
    expect((await decisions(draft.id)).length).toBeLessThanOrEqual(1);
  });
});

describe('returning', () => {
  it('gives the edition back to its author with the reason, by mail as well, to be mended and handed in again', async () => {
    const me = await app.memberNamed('Returned author');
    const draft = await onDesk(completeContent(joint), me);
    expect((await giveBack(draft.id)).status).toBe(204);
    const { body: returned } = await me.get(`/api/drafts/${draft.id}`).expect(200);
    expect(returned).toMatchObject({ state: 'returned', returnReason: 'Say which screw you mean.' });
    expect(await decisions(draft.id)).toEqual(['edition-returned']);
    const [mail] = await mailsTo(me.account);
    expect(mail.body_text).toContain('Say which screw you mean.');
    expect((await giveBack(draft.id)).status).toBe(409);
    await submitDraft(me, returned);
    await publish(draft.id).expect(200);
    expect(await decisions(draft.id)).toEqual(['edition-returned', 'edition-published']);
  });

  it('needs a reason that says something', async () => {
    const draft = await onDesk();
    const { status, body } = await giveBack(draft.id, 'no');
    expect([status, body.fields[0].path]).toEqual([422, 'reason']);
    expect((await edition(draft.id)).state).toBe('submitted');
  });
});

describe('cautions', () => {
  it('are placed on a fix, answer its hazards, and are noted', async () => {
    const fix = knifeFix();
    const draft = await onDesk(completeContent(joint, { fixes: [fix] }));
    const { status, body } = await place(draft.id, cautionFor(fix.key, 'blade'));
    expect([status, body.fixKey, body.hazards]).toEqual([201, fix.key, ['blade']]);
    const desk = await deskEdition(draft.id);
    expect(desk.cautions).toEqual([body]);
    expect(desk.hazards.map((hazard: FoundHazard) => hazard.answered)).toEqual([true]);
    expect(await decisions(draft.id)).toEqual(['caution-placed']);
  });

  it('are refused on a fix that the edition has not, and from an entry that the library has not', async () => {
    const draft = await onDesk();
    const stray = await place(draft.id, cautionFor('no-such-fix', 'blade'));
    expect([stray.status, stray.body.fields[0].path]).toEqual([422, 'fixKey']);
    const entry = await moderator
      .post('/api/desk/cautions')
      .send({ ...cautionFor(null, 'sun'), editionId: draft.id, libraryId: 999_999_999 });
    expect([entry.status, entry.body.fields[0].path]).toEqual([422, 'libraryId']);
    expect((await deskEdition(draft.id)).cautions).toEqual([]);
  });

  it('come from the library in its order', async () => {
    const words = {
      signal_word: 'danger',
      hazard: 'The Sun.',
      consequence: 'It blinds.',
      avoidance: 'Use a filter.',
    };
    const slug = `sun-${Date.now()}`;
    await app.knex('caution_library').insert([
      { ...words, slug: `${slug}-b`, name: 'Second', hazards: '["sun"]', position: 9002 },
      { ...words, slug: `${slug}-a`, name: 'First', hazards: '["sun","heat"]', position: 9001 },
    ]);
    const { items } = (await moderator.get('/api/desk/caution-library').expect(200)).body;
    expect(items.slice(-2)).toMatchObject([
      { name: 'First', signalWord: 'danger', hazards: ['sun', 'heat'], avoidance: 'Use a filter.' },
      { name: 'Second' },
    ]);
  });

  it('stay when an author writes another edition, and come back with the fix', async () => {
    const fix = knifeFix();
    const { slug } = await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }), [
      cautionFor(fix.key, 'blade'),
    ]);
    const renamed = await submitNext(
      author,
      slug,
      completeContent(joint, { fixes: [{ ...fix, title: 'Trim it another way' }] }),
    );
    expect((await deskEdition(renamed.id)).hazards).toMatchObject([{ hazard: 'blade', answered: true }]);
    await publish(renamed.id).expect(200);
    const page = (await app.visitor().get(`/api/write-ups/${slug}`)).body;
    expect(page.view.fixes[0].cautions).toMatchObject([{ hazards: ['blade'] }]);
  });

  it('do not answer for a fix that an author gives another key', async () => {
    const fix = knifeFix();
    const { slug } = await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }), [
      cautionFor(fix.key, 'blade'),
    ]);
    const rekeyed = await submitNext(author, slug, completeContent(joint, { fixes: [knifeFix()] }));
    const { status, body } = await publish(rekeyed.id);
    expect([status, body.type]).toEqual([409, '/problems/caution-missing']);
  });

  it('cannot be taken off while the published edition needs them, and can once another answers', async () => {
    const fix = knifeFix();
    const { slug, editionId } = await publishNew(
      author,
      moderator,
      completeContent(joint, { fixes: [fix] }),
      [cautionFor(fix.key, 'blade')],
    );
    const [caution] = (await deskEdition(editionId)).cautions as Caution[];
    const refused = await moderator.delete(`/api/desk/cautions/${caution!.id}`);
    expect([refused.status, refused.body.type, refused.body.fields[0].path]).toEqual([
      409,
      '/problems/caution-missing',
      'fixes.0',
    ]);
    expect((await deskEdition(editionId)).cautions).toHaveLength(1);
    await place(editionId, cautionFor(null, 'blade')).expect(201);
    expect((await moderator.delete(`/api/desk/cautions/${caution!.id}`)).status).toBe(204);
    const page = (await app.visitor().get(`/api/write-ups/${slug}`)).body;
    expect([page.view.fixes[0].cautions, page.view.cautions.length]).toEqual([[], 1]);
    expect(await app.knex('cautions').where('id', caution!.id).first()).toMatchObject({
      write_up_id: expect.any(Number),
      removed_at: expect.any(Date),
    });
    expect((await moderator.delete(`/api/desk/cautions/${caution!.id}`)).status).toBe(404);
  });

  it('leave at least one when two that answer the same hazard are taken off at the same moment', async () => {
    const fix = knifeFix();
    const both = [cautionFor(fix.key, 'blade'), cautionFor(fix.key, 'blade')];
    const { editionId } = await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }), both);
    const { cautions } = await deskEdition(editionId);
    const answers = await Promise.all(
      cautions.map((caution: Caution) => moderator.delete(`/api/desk/cautions/${caution.id}`)),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([204, 409]);
    expect((await deskEdition(editionId)).cautions).toHaveLength(1);
  });

  it('cannot slip away while the edition that needs them is published', async () => {
    const fix = knifeFix();
    const draft = await onDesk(completeContent(joint, { fixes: [fix] }));
    const { body: caution } = await place(draft.id, cautionFor(fix.key, 'blade')).expect(201);
    const [published, removed] = await Promise.all([
      publish(draft.id),
      moderator.delete(`/api/desk/cautions/${caution.id}`),
    ]);
    const isPublished = (await edition(draft.id)).state === 'published';
    expect([published.status, removed.status]).toEqual(isPublished ? [200, 409] : [409, 204]);
    expect((await deskEdition(draft.id)).cautions).toHaveLength(isPublished ? 1 : 0);
  });

  it('can be worded anew, but not so that a published hazard stays unanswered', async () => {
    const fix = knifeFix();
    const { editionId } = await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }), [
      cautionFor(fix.key, 'blade'),
    ]);
    const [caution] = (await deskEdition(editionId)).cautions as Caution[];
    const { fixKey: _, libraryId: __, ...words } = cautionFor(fix.key, 'blade');
    const change = (over: object) =>
      moderator.patch(`/api/desk/cautions/${caution!.id}`).send({ ...words, ...over });
    expect((await change({ hazards: ['dust'] })).status).toBe(409);
    const changed = await change({ avoidance: 'Wear a glove.', signalWord: 'danger' });
    expect(changed.body).toEqual({ ...caution, avoidance: 'Wear a glove.', signalWord: 'danger' });
    expect((await deskEdition(editionId)).cautions).toEqual([changed.body]);
    expect(await decisions(editionId)).toEqual(['caution-placed', 'edition-published', 'caution-changed']);
  });
});
