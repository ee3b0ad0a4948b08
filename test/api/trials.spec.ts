import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { emptySeat, worksheetVersion } from '../../shared/contract/worksheet.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart } from './support/catalogue.js';
import {
  completeContent,
  insertJoint,
  newKey,
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
  app = await startTestApp();
  [author, moderator] = await Promise.all([app.memberNamed('Author'), app.as('moderator')]);
  joint = await insertJoint(app.knex);
});
afterAll(() => app.close());

const trial = (fixKey: string, over: object = {}) => ({
  fixKey,
  outcome: 'held',
  revisionIds: [],
  note: '',
  figure: null,
  ...over,
});
const report = (who: MemberAgent, slug: string, body: object) =>
  who.post(`/api/write-ups/${slug}/trials`).send(body);
const page = async (slug: string) => (await app.visitor().get(`/api/write-ups/${slug}`).expect(200)).body;
const standing = async (slug: string): Promise<string> => (await page(slug)).view.fixes[0].standing;

async function indexNotes(writeUpId: number): Promise<number> {
  return (await app.knex('search_outbox').where('write_up_id', writeUpId)).length;
}

async function publishWith(fix = plainFix()) {
  return { fix, ...(await publishNew(author, moderator, completeContent(joint, { fixes: [fix] }))) };
}

describe('reporting a trial', () => {
  it('stands on the page with its person, outcome, revisions and figure, and is counted', async () => {
    const { slug, fix } = await publishWith();
    const owner = await app.memberNamed('Owner');
    const revisionIds = [joint.motor.revisions[2]!.id, joint.bracket.revisions[0]!.id];
    const { status, body } = await report(
      owner,
      slug,
      trial(fix.key, { revisionIds, note: 'Sits flat.', figure: 0.4 }),
    );
    expect(status).toBe(201);
    expect(body).toMatchObject({
      fixKey: fix.key,
      outcome: 'held',
      note: 'Sits flat.',
      figure: 0.4,
      person: { id: owner.account.id, displayName: 'Owner' },
      revisions: [
        { label: 'v1', partName: 'Bracket K' },
        { label: 'Rev C', partName: 'Motor M' },
      ],
    });
    const { trials, view } = await page(slug);
    expect(trials).toEqual([body]);
    expect(view.fixes[0].trialCounts).toEqual({ held: 1, heldForAWhile: 0, didNotHelp: 0 });
  });

  it('takes the place of the person’s earlier one on the same fix', async () => {
    const { slug, fix } = await publishWith();
    const owner = await app.memberNamed('Owner');
    await report(
      owner,
      slug,
      trial(fix.key, { revisionIds: [joint.motor.revisions[0]!.id], note: 'First.' }),
    ).expect(201);
    const second = await report(
      owner,
      slug,
      trial(fix.key, { outcome: 'did-not-help', note: 'It slipped.' }),
    ).expect(201);
    const { trials, view } = await page(slug);
    expect(trials).toEqual([second.body]);
    expect(second.body).toMatchObject({ outcome: 'did-not-help', note: 'It slipped.', revisions: [] });
    expect(view.fixes[0].trialCounts).toEqual({ held: 0, heldForAWhile: 0, didNotHelp: 1 });
  });

  it('carries the worksheet by which its person worked it out, until they report without one', async () => {
    const { slug, fix } = await publishWith();
    const owner = await app.memberNamed('Owner');
    const worksheet = {
      kind: 'seat',
      version: worksheetVersion,
      inputs: { ...emptySeat, bossDiameter: 32.1, recessDiameter: 32 },
      result: { sentence: 'The boss may not enter.', figures: [] },
    };
    const { body } = await report(owner, slug, trial(fix.key, { worksheet })).expect(201);
    expect(body.worksheet).toEqual(worksheet);
    expect((await page(slug)).trials[0].worksheet).toEqual(worksheet);
    await report(owner, slug, trial(fix.key)).expect(201);
    expect((await page(slug)).trials[0].worksheet).toBeNull();
  });

  it('refuses a worksheet of another version, naming the field, and stores nothing', async () => {
    const { slug, fix } = await publishWith();
    const worksheet = { kind: 'seat', version: 99, inputs: emptySeat, result: { sentence: '', figures: [] } };
    const { body } = await report(await app.memberNamed('Owner'), slug, trial(fix.key, { worksheet })).expect(
      422,
    );
    expect(body.fields.map((field: { path: string }) => field.path)).toEqual(['worksheet.version']);
    expect((await page(slug)).trials).toEqual([]);
  });

  it('is kept once when it is sent twice at the same moment', async () => {
    const { slug, fix } = await publishWith();
    const owner = await app.memberNamed('Owner');
    const answers = await Promise.all([1, 2, 3].map(() => report(owner, slug, trial(fix.key))));
    expect(answers.map((answer) => answer.status)).toEqual([201, 201, 201]);
    expect((await page(slug)).trials).toHaveLength(1);
  });

  it('refuses a fix, a revision or a figure that does not belong, naming the field', async () => {
    const { slug } = await publishWith();
    const noFigure = plainFix({ acceptance: null });
    const other = await publishWith(noFigure);
    const stray = await insertPart(app.knex);
    const owner = await app.memberNamed('Owner');
    const refused = async (to: string, body: object): Promise<unknown> => {
      const answer = await report(owner, to, body);
      return [answer.status, answer.body.fields?.map((field: { path: string }) => field.path)];
    };
    expect(await refused(slug, trial(newKey()))).toEqual([422, ['fixKey']]);
    expect(await refused(slug, trial(noFigure.key))).toEqual([422, ['fixKey']]);
    expect(
      await refused(other.slug, trial(noFigure.key, { figure: 1, revisionIds: [stray.revisions[0]!.id] })),
    ).toEqual([422, ['revisionIds.0', 'figure']]);
    expect(await refused(slug, trial(newKey(), { outcome: 'splendid' }))).toEqual([422, ['outcome']]);
    expect((await report(owner, 'no-such-write-up', trial(newKey()))).status).toBe(404);
    expect((await app.visitor().post(`/api/write-ups/${slug}/trials`).send(trial(newKey()))).status).toBe(
      401,
    );
    expect((await page(other.slug)).trials).toEqual([]);
  });
});

describe('the standing of a fix', () => {
  it('goes from told to tried by another’s trial, and the index is told', async () => {
    const { slug, fix, writeUpId } = await publishWith();
    const before = await indexNotes(writeUpId);
    expect(await standing(slug)).toBe('told');
    await report(
      await app.memberNamed('Owner'),
      slug,
      trial(fix.key, { outcome: 'held-for-a-while' }),
    ).expect(201);
    expect(await standing(slug)).toBe('tried');
    expect(await indexNotes(writeUpId)).toBe(before + 1);
  });

  it('goes to measured by a figure that reaches the acceptance figure, and back when it is taken back', async () => {
    const { slug, fix } = await publishWith();
    const owner = await app.memberNamed('Owner');
    await report(owner, slug, trial(fix.key, { figure: 0.11 })).expect(201);
    expect(await standing(slug)).toBe('tried');
    await report(owner, slug, trial(fix.key, { figure: 0.1 })).expect(201);
    expect(await standing(slug)).toBe('measured');
    await report(owner, slug, trial(fix.key, { outcome: 'did-not-help' })).expect(201);
    expect(await standing(slug)).toBe('tried');
  });

  it('is not raised by its author’s own trial, and the index is not troubled', async () => {
    const { slug, fix, writeUpId } = await publishWith();
    const before = await indexNotes(writeUpId);
    await report(author, slug, trial(fix.key, { figure: 0.01 })).expect(201);
    expect(await standing(slug)).toBe('told');
    expect((await page(slug)).trials).toHaveLength(1);
    expect(await indexNotes(writeUpId)).toBe(before);
  });

  it('is made right where the maker has corrected the part, whatever the trials say', async () => {
    const { slug, fix, writeUpId } = await publishWith();
    await app
      .knex('fixes')
      .where({ write_up_id: writeUpId, fix_key: fix.key })
      .update({ made_right_from: joint.motor.revisions[2]!.id });
    await report(await app.memberNamed('Owner'), slug, trial(fix.key)).expect(201);
    const [shown] = (await page(slug)).view.fixes;
    expect([shown.standing, shown.madeRightFrom.label]).toEqual(['made-right', 'Rev C']);
  });

  it('is judged anew when another edition changes the acceptance figure', async () => {
    const { slug, fix } = await publishWith();
    await report(await app.memberNamed('Owner'), slug, trial(fix.key, { figure: 0.3 })).expect(201);
    expect(await standing(slug)).toBe('tried');
    const looser = { ...fix, acceptance: { ...fix.acceptance!, value: 0.3 } };
    const draft = await submitNext(author, slug, completeContent(joint, { fixes: [looser] }));
    await moderator.post(`/api/desk/editions/${draft.id}/publish`).send({ note: '' }).expect(200);
    expect(await standing(slug)).toBe('measured');
  });
});
