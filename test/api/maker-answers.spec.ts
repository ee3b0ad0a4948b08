import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { MakerPage, MakerSide, WantedReadings } from '../../shared/contract/makers.js';
import type { PartPage } from '../../shared/contract/hardware.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertFeature, insertJointOf, reading, record } from './support/features.js';
import { auditActions, speakerFor } from './support/makers.js';
import { completeContent, insertJoint, publishNew, type TestJoint } from './support/write-ups.js';

let app: TestApp;
let now = new Date('2026-11-20T10:00:00Z');

beforeAll(async () => {
  app = await startTestApp({ clock: () => now });
});
afterAll(() => app.close());

interface Scene {
  readonly joint: TestJoint;
  readonly slug: string;
  readonly writeUpId: number;
  readonly speaker: MemberAgent;
  readonly moderator: MemberAgent;
}

/** A published write-up, and somebody who speaks for the motor's maker. */
async function scene(): Promise<Scene> {
  const joint = await insertJoint(app.knex);
  const moderator = await app.as('moderator');
  const { slug, writeUpId } = await publishNew(await app.as('member'), moderator, completeContent(joint));
  return { joint, slug, writeUpId, moderator, speaker: await speakerFor(app, joint.motor) };
}

const answerAt = ({ slug, joint }: Scene): string =>
  `/api/write-ups/${slug}/makers/${joint.motor.makerSlug}/answer`;

async function sideOf({ slug }: Scene, agent = app.visitor()): Promise<MakerSide> {
  return (await agent.get(`/api/write-ups/${slug}/makers`).expect(200)).body;
}

async function happeningsOf(kind: string): Promise<{ title: string; path: string; text: string }[]> {
  return app.knex('happenings').where({ kind }).orderBy('id').select('title', 'path', 'text');
}

describe("a maker's answer", () => {
  it('stands on the write-up under its name, and on its own page', async () => {
    const at = await scene();
    await at.speaker.put(answerAt(at)).send({ text: 'The lip is **shorter** from Rev C on.' }).expect(200);
    const [answer] = (await sideOf(at)).answers;
    expect(answer?.maker.slug).toBe(at.joint.motor.makerSlug);
    expect(answer?.text.html).toContain('<strong>shorter</strong>');
    expect(answer?.person.displayName).toBe('Test maker');
    const page: MakerPage = (await app.visitor().get(`/api/makers/${at.joint.motor.makerSlug}`).expect(200))
      .body;
    expect(page.answers.map(({ slug }) => slug)).toEqual([at.slug]);
    expect(await auditActions(app.knex)).toContain('maker-answered');
    expect((await happeningsOf('maker-answered')).at(-1)).toMatchObject({ path: `/write-ups/${at.slug}` });
  });

  it('is one: a second text takes the place of the first, which stays readable', async () => {
    const at = await scene();
    await at.speaker.put(answerAt(at)).send({ text: 'We look into it.' }).expect(200);
    const before = now;
    now = new Date(before.getTime() + 3600_000);
    await at.speaker.put(answerAt(at)).send({ text: 'Rev D has a lower lip.' }).expect(200);
    const { answers } = await sideOf(at);
    expect(answers).toHaveLength(1);
    expect(answers[0]?.text.source).toBe('Rev D has a lower lip.');
    expect(answers[0]?.earlier).toEqual([
      expect.objectContaining({
        text: expect.objectContaining({ source: 'We look into it.' }),
        from: before.toISOString(),
        to: now.toISOString(),
      }),
    ]);
    now = before;
  });

  it('that is sent twice leaves no trace of the second time', async () => {
    const at = await scene();
    for (const _ of [1, 2])
      await at.speaker.put(answerAt(at)).send({ text: 'Said twice alike.' }).expect(200);
    expect((await sideOf(at)).answers[0]?.earlier).toEqual([]);
  });

  it('cannot run script', async () => {
    const at = await scene();
    await at.speaker
      .put(answerAt(at))
      .send({ text: 'Look: <script>alert(1)</script><img src=x onerror=alert(2)> [x](javascript:alert(3))' })
      .expect(200);
    const html = (await sideOf(at)).answers[0]!.text.html;
    expect(html).not.toMatch(/<script|<img|href="javascript/i);
  });

  it('is taken back by whoever speaks for the maker, and said again', async () => {
    const at = await scene();
    await at.speaker.put(answerAt(at)).send({ text: 'Hasty words here.' }).expect(200);
    await at.speaker
      .post(`${answerAt(at)}/take-back`)
      .send({ reason: '' })
      .expect(204);
    expect((await sideOf(at)).answers).toEqual([]);
    await at.speaker.put(answerAt(at)).send({ text: 'Hasty words here.' }).expect(200);
    expect((await sideOf(at)).answers).toHaveLength(1);
  });

  it('is taken back by a moderator with a reason only', async () => {
    const at = await scene();
    await at.speaker.put(answerAt(at)).send({ text: 'Buy our newest part.' }).expect(200);
    const refused = await at.moderator
      .post(`${answerAt(at)}/take-back`)
      .send({ reason: '' })
      .expect(422);
    expect(refused.body.fields[0].path).toBe('reason');
    await at.moderator
      .post(`${answerAt(at)}/take-back`)
      .send({ reason: 'An advertisement.' })
      .expect(204);
    expect((await sideOf(at)).answers).toEqual([]);
  });

  it('is refused to whoever speaks for another maker, or for none', async () => {
    const at = await scene();
    const other = await speakerFor(app, (await insertJoint(app.knex)).motor);
    await other.put(answerAt(at)).send({ text: 'Not my part at all.' }).expect(403);
    await at.moderator.put(answerAt(at)).send({ text: 'I only moderate.' }).expect(403);
    await (await app.as('member')).put(answerAt(at)).send({ text: 'I only own one.' }).expect(403);
  });

  it('has no place on a write-up that is not about its parts', async () => {
    const [at, elsewhere] = [await scene(), await scene()];
    await at.speaker
      .put(`/api/write-ups/${elsewhere.slug}/makers/${at.joint.motor.makerSlug}/answer`)
      .send({ text: 'On a write-up of others.' })
      .expect(404);
  });

  it('says nothing when it is blank', async () => {
    const at = await scene();
    await at.speaker.put(answerAt(at)).send({ text: '            ' }).expect(422);
  });
});

describe('an announced revision', () => {
  const entry = {
    label: 'Rev E',
    soldFrom: '2027-02-01',
    whatChanges: 'The lip is 0.5 mm lower.',
    howToTell: 'Two dots beside the serial number.',
  };
  const announce = (agent: MemberAgent, part: { slug: string }, over = {}) =>
    agent.post(`/api/parts/${part.slug}/announced-revisions`).send({ ...entry, ...over });
  const pageOf = async (slug: string): Promise<PartPage> =>
    (await app.visitor().get(`/api/parts/${slug}`).expect(200)).body;

  it('stands last on the part, marked, until it is sold', async () => {
    const { joint, speaker } = await scene();
    const { body } = await announce(speaker, joint.motor).expect(201);
    expect((await pageOf(joint.motor.slug)).revisions.at(-1)).toMatchObject({
      label: 'Rev E',
      announced: true,
      soldFrom: '2027-02-01',
      whatChanged: entry.whatChanges,
    });
    await speaker
      .post(`/api/announced-revisions/${body.id}/sold`)
      .send({ soldFrom: '2027-02-01' })
      .expect(422);
    await speaker
      .post(`/api/announced-revisions/${body.id}/sold`)
      .send({ soldFrom: '2026-11-19' })
      .expect(200);
    const sold = (await pageOf(joint.motor.slug)).revisions.at(-1);
    expect(sold).toMatchObject({ label: 'Rev E', soldFrom: '2026-11-19' });
    expect(sold?.announced).toBeUndefined();
    await speaker
      .post(`/api/announced-revisions/${body.id}/sold`)
      .send({ soldFrom: '2026-11-19' })
      .expect(404);
  });

  it('can be put on a bench, but is not what the comparison takes for the newest', async () => {
    const { joint, speaker } = await scene();
    const { body: revision } = await announce(speaker, joint.motor).expect(201);
    const owner = await app.as('member');
    await owner.post('/api/bench').send({ partId: joint.motor.id, revisionId: revision.id }).expect(201);
    const one = await insertFeature(app.knex, joint.motor, 'recess');
    const other = await insertFeature(app.knex, joint.bracket, 'boss');
    await insertJointOf(app.knex, 'boss-recess', other, one);
    const { body } = await app
      .visitor()
      .get(`/api/comparison?part=${joint.motor.slug}&revision=${joint.bracket.revisions[0]!.id}`)
      .expect(200);
    expect(body.items[0].lines[0].revisionB.label).toBe('Rev C');
  });

  it('is a column of the fit table without readings', async () => {
    const { joint, speaker } = await scene();
    const slug = await insertJointOf(
      app.knex,
      'boss-recess',
      await insertFeature(app.knex, joint.bracket, 'boss'),
      await insertFeature(app.knex, joint.motor, 'recess'),
    );
    await announce(speaker, joint.motor).expect(201);
    const { body } = await app.visitor().get(`/api/joints/${slug}`).expect(200);
    expect(body.sideB.revisions.at(-1)).toMatchObject({
      revision: { label: 'Rev E', announced: true },
      dimensions: {},
    });
  });

  it('asks owners for the dimensions of its joints until three have read each', async () => {
    const { joint, speaker } = await scene();
    const recess = await insertFeature(app.knex, joint.motor, 'recess');
    await insertFeature(app.knex, joint.motor, 'gear');
    await insertJointOf(
      app.knex,
      'boss-recess',
      await insertFeature(app.knex, joint.bracket, 'boss'),
      recess,
    );
    const { body: revision } = await announce(speaker, joint.motor).expect(201);
    const wanted = async (): Promise<WantedReadings[]> =>
      (await app.visitor().get(`/api/parts/${joint.motor.slug}/wanted-readings`).expect(200)).body.items;
    const [wish] = await wanted();
    expect(wish).toMatchObject({ revision: { label: 'Rev E' }, announced: true });
    expect(wish?.features.map(({ feature }) => feature.id)).toEqual([recess.id]);
    expect(wish?.features[0]?.dimensions.map(({ name }) => name)).toContain('diameter');
    expect((await happeningsOf('revision-announced')).at(-1)?.text).toContain('inner diameter');
    for (const value of [19.5, 19.52, 19.48])
      await record(await app.as('member'), reading(recess, revision.id, 'diameter', value));
    const [after] = await wanted();
    expect(after?.features[0]?.dimensions.map(({ name }) => name)).not.toContain('diameter');
  });

  it('is changed, and taken out while nothing hangs on it', async () => {
    const { joint, speaker } = await scene();
    const { body: revision } = await announce(speaker, joint.motor).expect(201);
    const at = `/api/announced-revisions/${revision.id}`;
    await speaker
      .put(at)
      .send({ ...entry, label: 'Rev F', soldFrom: null })
      .expect(200);
    const owner = await app.as('member');
    const { body: item } = await owner
      .post('/api/bench')
      .send({ partId: joint.motor.id, revisionId: revision.id })
      .expect(201);
    await speaker.delete(at).expect(409);
    await owner.delete(`/api/bench/${item.id}`).expect(204);
    await speaker.delete(at).expect(204);
    expect((await pageOf(joint.motor.slug)).revisions.map(({ label }) => label)).not.toContain('Rev F');
  });

  it('needs a label that the part does not have', async () => {
    const { joint, speaker } = await scene();
    await announce(speaker, joint.motor, { label: 'Rev A' }).expect(409);
  });

  it("is for the part's own maker", async () => {
    const { joint, speaker, moderator } = await scene();
    await announce(speaker, joint.bracket).expect(403);
    await announce(moderator, joint.motor).expect(403);
    const { body: revision } = await announce(speaker, joint.motor).expect(201);
    const other = await speakerFor(app, joint.bracket);
    await other.delete(`/api/announced-revisions/${revision.id}`).expect(403);
    await moderator.delete(`/api/announced-revisions/${revision.id}`).expect(204);
  });

  it('is no answer to which one somebody has', async () => {
    const { joint, speaker } = await scene();
    await announce(speaker, joint.motor).expect(201);
    const { body } = await app.visitor().get(`/api/parts/${joint.motor.slug}/which-one`).expect(200);
    expect(body.revisions.map(({ label }: { label: string }) => label)).not.toContain('Rev E');
  });
});
