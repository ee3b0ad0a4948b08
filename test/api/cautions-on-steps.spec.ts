import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Fix } from '../../shared/contract/edition-content.js';
import type { FoundHazard } from '../../shared/contract/moderation.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import type { Caution, EditionView } from '../../shared/contract/write-ups.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import {
  cautionFor,
  completeContent,
  insertJoint,
  newKey,
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

const step = (text: string) => ({ key: newKey(), text, photoId: null });
/** Two steps; the second names a knife. */
const cuttingFix = (): Fix => plainFix({ steps: [step('Mark the lip.'), step('Cut it with a knife.')] });
const cautionOn = (fixKey: string | null, stepKey: string | null) => ({
  ...cautionFor(fixKey, 'blade'),
  stepKey,
});
const place = (editionId: number, caution: ReturnType<typeof cautionOn>) =>
  moderator.post('/api/desk/cautions').send({ ...caution, editionId });
const publish = (id: number) => moderator.post(`/api/desk/editions/${id}/publish`).send({ note: '' });
const onDesk = async (fix: Fix) =>
  submitDraft(author, await saveNewDraft(author, completeContent(joint, { fixes: [fix] })));
const desk = async (id: number) => (await moderator.get(`/api/desk/editions/${id}`).expect(200)).body;
const pageView = async (slug: string): Promise<EditionView> =>
  (await app.visitor().get(`/api/write-ups/${slug}`).expect(200)).body.view;
const published = (fix: Fix) =>
  publishNew(author, moderator, completeContent(joint, { fixes: [fix] }), [
    cautionOn(fix.key, fix.steps[1]!.key),
  ]);

describe('a caution on a step', () => {
  it('answers the hazard of that step, and stands above it on page, preview and desk', async () => {
    const fix = cuttingFix();
    const draft = await onDesk(fix);
    expect((await desk(draft.id)).hazards).toEqual([
      expect.objectContaining({ hazard: 'blade', stepKey: fix.steps[1]!.key, step: 2, answered: false }),
    ]);

    const placed = await place(draft.id, cautionOn(fix.key, fix.steps[1]!.key));

    expect([placed.status, placed.body.stepKey]).toEqual([201, fix.steps[1]!.key]);
    const { hazards, view } = await desk(draft.id);
    expect(hazards.map((hazard: FoundHazard) => hazard.answered)).toEqual([true]);
    const preview = (await author.get(`/api/drafts/${draft.id}/preview`).expect(200)).body.view;
    const { slug } = (await publish(draft.id).expect(200)).body;
    for (const shown of [view, preview, await pageView(slug)]) {
      const [only] = shown.fixes;
      expect(only.steps.map((each: { cautions: Caution[] }) => each.cautions.length)).toEqual([0, 1]);
      expect([only.cautions, shown.cautions]).toEqual([[], []]);
    }
  });

  it('does not answer the same hazard in another step, which keeps the edition from being published', async () => {
    const fix = plainFix({ steps: [step('Cut it with a knife.'), step('Cut again with a knife.')] });
    const draft = await onDesk(fix);
    await place(draft.id, cautionOn(fix.key, fix.steps[0]!.key)).expect(201);

    const { status, body } = await publish(draft.id);

    expect([status, body.type]).toEqual([409, '/problems/caution-missing']);
    expect(body.fields.map((field: FieldProblem) => [field.path, field.message])).toEqual([
      ['fixes.0.steps.1', 'Step 2 of “Disc behind the plate” names “knife”: blade'],
    ]);
    await place(draft.id, cautionOn(fix.key, null)).expect(201);
    await publish(draft.id).expect(200);
  });

  it('is refused on a step that the fix has not, and on a step of no fix', async () => {
    const fix = cuttingFix();
    const draft = await onDesk(fix);
    for (const caution of [cautionOn(fix.key, 'no-such-step'), cautionOn(null, fix.steps[0]!.key)]) {
      const refused = await place(draft.id, caution);
      expect([refused.status, refused.body.fields[0].path]).toEqual([422, 'stepKey']);
    }
    expect((await desk(draft.id)).cautions).toEqual([]);
  });
});

describe('no edition drops a caution', () => {
  it('it moves up to the fix when its step is gone, and stands on the step again when that comes back', async () => {
    const fix = cuttingFix();
    const { slug } = await published(fix);
    const without = completeContent(joint, { fixes: [{ ...fix, steps: [fix.steps[0]!] }] });

    const next = await submitNext(author, slug, without);
    const onTheDesk = await desk(next.id);
    await publish(next.id).expect(200);

    expect(onTheDesk.cautions).toMatchObject([{ fixKey: fix.key, stepKey: fix.steps[1]!.key }]);
    expect(onTheDesk.view.fixes[0].cautions).toHaveLength(1);
    expect((await pageView(slug)).fixes[0]!.cautions).toMatchObject([{ hazards: ['blade'] }]);
    const back = await submitNext(author, slug, completeContent(joint, { fixes: [fix] }));
    await publish(back.id).expect(200);
    const [again] = (await pageView(slug)).fixes;
    expect([again!.cautions.length, again!.steps[1]!.cautions.length]).toEqual([0, 1]);
  });

  it('it moves up to the write-up when its fix is gone', async () => {
    const { slug } = await published(cuttingFix());
    const next = await submitNext(author, slug, completeContent(joint, { fixes: [plainFix()] }));
    await publish(next.id).expect(200);
    const view = await pageView(slug);
    expect(view.cautions).toMatchObject([{ hazards: ['blade'] }]);
    expect(view.fixes[0]!.cautions).toEqual([]);
  });

  it('moved up it answers nothing until the desk has put it where it stands', async () => {
    const fix = cuttingFix();
    const { slug } = await published(fix);
    const rekeyed = { ...fix, steps: [step('Mark the lip.'), step('Cut it with a knife.')] };
    const next = await submitNext(author, slug, completeContent(joint, { fixes: [rekeyed] }));
    expect((await publish(next.id)).body.type).toBe('/problems/caution-missing');
    const [caution] = (await desk(next.id)).cautions as Caution[];

    const moved = await moderator
      .put(`/api/desk/cautions/${caution!.id}/place`)
      .send({ editionId: next.id, fixKey: fix.key, stepKey: null });

    // The published edition is still answered, since all of the fix is above its step.
    expect([moved.status, moved.body.stepKey]).toEqual([200, null]);
    await publish(next.id).expect(200);
    expect((await pageView(slug)).fixes[0]!.cautions).toHaveLength(1);
  });
});

describe('moving a caution', () => {
  it('is refused where the published edition needs it, and noted where it is done', async () => {
    const fix = cuttingFix();
    const { editionId } = await published(fix);
    const [caution] = (await desk(editionId)).cautions as Caution[];
    const move = (stepKey: string | null) =>
      moderator.put(`/api/desk/cautions/${caution!.id}/place`).send({ editionId, fixKey: fix.key, stepKey });

    expect((await move(fix.steps[0]!.key)).body.type).toBe('/problems/caution-missing');
    expect((await move('no-such-step')).status).toBe(422);
    await move(null).expect(200);

    const entry = await app
      .knex('audit_log')
      .where({ action: 'caution-moved', subject_id: caution!.id })
      .first();
    expect(entry).toMatchObject({ actor_id: moderator.account.id });
  });

  it('does not move it to another write-up', async () => {
    const { editionId } = await published(cuttingFix());
    const other = await onDesk(cuttingFix());
    const [caution] = (await desk(editionId)).cautions as Caution[];
    const strange = await moderator
      .put(`/api/desk/cautions/${caution!.id}/place`)
      .send({ editionId: other.id, fixKey: null, stepKey: null });
    expect(strange.status).toBe(404);
  });
});

describe('the editor', () => {
  it('shows an author the cautions that stand on their draft, and where', async () => {
    const fix = cuttingFix();
    const { slug } = await published(fix);
    const draft = (await author.post(`/api/write-ups/${slug}/editions`).expect(201)).body;
    const { items } = (await author.get(`/api/drafts/${draft.id}/cautions`).expect(200)).body;
    expect(items).toMatchObject([{ fixKey: fix.key, stepKey: fix.steps[1]!.key, hazards: ['blade'] }]);
    const stranger = await app.memberNamed('Stranger');
    expect((await stranger.get(`/api/drafts/${draft.id}/cautions`)).status).toBe(404);
  });
});
