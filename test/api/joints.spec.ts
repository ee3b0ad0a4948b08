import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { FitCheckLine, JointPage } from '../../shared/contract/joints.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart } from './support/catalogue.js';
import { insertFeature, insertJointOf, reading, record } from './support/features.js';
import { completeContent, insertJoint, plainFix, publishNew } from './support/write-ups.js';

let app: TestApp;
let member: MemberAgent;

beforeAll(async () => {
  app = await startTestApp();
  member = await app.memberNamed('Reader');
});
afterAll(() => app.close());

/** A bracket with a lip and a motor with a recess: v1 does not enter Rev A, v2 does; nothing is read on Rev B. */
async function lipAndRecess() {
  const parts = await insertJoint(app.knex);
  const { bracket, motor } = parts;
  const lip = await insertFeature(app.knex, bracket, 'boss', 'printed');
  const recess = await insertFeature(app.knex, motor, 'recess');
  const slug = await insertJointOf(app.knex, 'boss-recess', lip, recess);
  const [v1, v2] = bracket.revisions.map((revision) => revision.id) as [number, number];
  const [revA, revB] = motor.revisions.map((revision) => revision.id) as [number, number];
  await record(
    member,
    reading(lip, v1, 'diameter', 22.5),
    reading(lip, v1, 'height', 1.5),
    reading(lip, v1, 'plateWidth', 60),
    reading(lip, v2, 'diameter', 18.5),
    reading(lip, v2, 'height', 1.5),
    reading(recess, revA, 'diameter', 19.5),
    reading(recess, revA, 'depth', 2.2),
  );
  return { parts, slug, v1, v2, revA, revB };
}

const page = async (slug: string): Promise<JointPage> =>
  (await app.visitor().get(`/api/joints/${slug}`).expect(200)).body;
const cellOf = (joint: JointPage, a: number, b: number) =>
  joint.cells.find((cell) => cell.revisionA === a && cell.revisionB === b)!;
const check = async (...revisions: number[]): Promise<FitCheckLine[]> =>
  (await app.visitor().get('/api/fit-check').query({ revision: revisions }).expect(200)).body.items;

describe('the fit table', () => {
  it('judges every pair of revisions from their consensus', async () => {
    const { slug, v1, v2, revA, revB } = await lipAndRecess();
    const joint = await page(slug);
    expect(joint.cells).toHaveLength(2 * 3);
    expect(cellOf(joint, v1, revA)).toMatchObject({
      verdict: 'will-not-seat',
      sat: 0,
      didNotSit: 0,
      contradicts: false,
    });
    expect(cellOf(joint, v1, revA).sentence).toContain('1.50 mm apart');
    expect(cellOf(joint, v2, revA)).toMatchObject({ verdict: 'seats-with-room' });
    expect(cellOf(joint, v1, revB)).toMatchObject({ verdict: 'not-known', chance: null, interval: null });
  });

  it('a report moves the chance, a second one of the same person replaces it', async () => {
    const { slug, v1, revA } = await lipAndRecess();
    const send = (sat: boolean) =>
      member
        .post(`/api/joints/${slug}/reports`)
        .send({ revisionA: v1, revisionB: revA, sat, note: '' })
        .expect(201);
    const before = cellOf(await page(slug), v1, revA).chance!;
    const first = (await send(true)).body;
    expect(first).toMatchObject({ sat: 1, didNotSit: 0 });
    expect(first.chance).toBeGreaterThan(before);
    expect((await send(false)).body).toMatchObject({ sat: 0, didNotSit: 1 });
    expect(cellOf(await page(slug), v1, revA)).toMatchObject({ sat: 0, didNotSit: 1 });
  });

  it('reports against a firm prediction raise a contradiction', async () => {
    const { slug, v2, revA } = await lipAndRecess();
    for (const name of ['One', 'Two', 'Three', 'Four', 'Five']) {
      const owner = await app.memberNamed(name);
      await owner
        .post(`/api/joints/${slug}/reports`)
        .send({ revisionA: v2, revisionB: revA, sat: false, note: '' })
        .expect(201);
    }
    expect(cellOf(await page(slug), v2, revA)).toMatchObject({ contradicts: true, didNotSit: 5 });
  });

  it('a trial of a fix on a pair tells that the pair did not sit as delivered, unless its owner reported otherwise', async () => {
    const { parts, slug, v1, revA } = await lipAndRecess();
    const fix = plainFix();
    const moderator = await app.as('moderator');
    const published = await publishNew(member, moderator, completeContent(parts, { fixes: [fix] }));
    const owner = await app.memberNamed('Owner');
    await owner
      .post(`/api/write-ups/${published.slug}/trials`)
      .send({ fixKey: fix.key, outcome: 'held', revisionIds: [v1, revA], note: '', figure: null })
      .expect(201);
    const cell = cellOf(await page(slug), v1, revA);
    expect(cell).toMatchObject({ sat: 0, didNotSit: 1, writeUps: [published.slug] });
    const { body } = await owner
      .post(`/api/joints/${slug}/reports`)
      .send({ revisionA: v1, revisionB: revA, sat: true, note: '' })
      .expect(201);
    expect(body).toMatchObject({ sat: 1, didNotSit: 0 });
  });

  it('refuses a report on a revision that is not of its side', async () => {
    const { slug, v1, revA } = await lipAndRecess();
    const { body } = await member
      .post(`/api/joints/${slug}/reports`)
      .send({ revisionA: revA, revisionB: v1, sat: true, note: '' })
      .expect(422);
    expect(body.fields[0].path).toBe('revisionA');
    expect(await app.knex('fit_reports').where('revision_a', revA)).toEqual([]);
  });

  it('readings that exclude each other leave the pair not known, with what is wrong', async () => {
    const barrelPart = await insertPart(app.knex);
    const ringPart = await insertPart(app.knex);
    const barrel = await insertFeature(app.knex, barrelPart, 'barrel');
    const ring = await insertFeature(app.knex, ringPart, 'bore');
    const slug = await insertJointOf(app.knex, 'barrel-clamp', barrel, ring);
    await record(
      member,
      reading(barrel, barrelPart.revisions[0]!.id, 'diameter', 50.8),
      reading(ring, ringPart.revisions[0]!.id, 'diameter', 50),
      reading(ring, ringPart.revisions[0]!.id, 'closedDiameter', 52),
    );
    const cell = (await page(slug)).cells.find((entry) => entry.revisionA === barrelPart.revisions[0]!.id)!;
    expect(cell).toMatchObject({ verdict: 'not-known' });
    expect(cell.sentence).toContain('closed diameter must be smaller');
  });

  it('is not found for a joint that is not there', async () => {
    await app.visitor().get('/api/joints/no-such-joint').expect(404);
  });
});

describe('the fit check', () => {
  it('lists what meets, worst first, for anybody', async () => {
    const { v1, v2, revA, revB } = await lipAndRecess();
    const lines = await check(v2, revA, v1, revB);
    expect(lines.map((line) => [line.revisionA.id, line.revisionB.id, line.verdict])).toEqual([
      [v1, revA, 'will-not-seat'],
      [v1, revB, 'not-known'],
      [v2, revB, 'not-known'],
      [v2, revA, 'seats-with-room'],
    ]);
  });

  it('gives each line the fixes that hold for its pair', async () => {
    const { parts, v1, v2, revA } = await lipAndRecess();
    const fix = plainFix();
    const published = await publishNew(
      member,
      await app.as('moderator'),
      completeContent(parts, { fixes: [fix] }),
    );
    const lines = await check(v1, v2, revA);
    expect(lines.find((line) => line.revisionA.id === v1)!.writeUps).toMatchObject([
      { slug: published.slug, fixes: [{ key: fix.key, standing: 'told' }] },
    ]);
    expect(lines.find((line) => line.revisionA.id === v2)!.writeUps).toEqual([]);
  });

  it('names every part asked about, so that one without a joint can be told', async () => {
    const { parts, v1 } = await lipAndRecess();
    const lonely = await insertPart(app.knex, { name: 'Lonely ring' });
    const { body } = await app
      .visitor()
      .get('/api/fit-check')
      .query({ revision: [v1, lonely.revisions[0]!.id] })
      .expect(200);
    expect(body.items).toEqual([]);
    expect(body.stands.map((entry: { part: { slug: string } }) => entry.part.slug).sort()).toEqual(
      [parts.bracket.slug, lonely.slug].sort(),
    );
  });

  it('of nothing, or of one part, is empty', async () => {
    const { v1 } = await lipAndRecess();
    expect(await check()).toEqual([]);
    expect(await check(v1)).toEqual([]);
  });
});

describe('the comparison', () => {
  it('sets parts side by side against the bench, each with its newest revision', async () => {
    const { parts, revA, v2 } = await lipAndRecess();
    const kit = await insertPart(app.knex, { name: 'Ring kit' });
    const { body } = await app
      .visitor()
      .get('/api/comparison')
      .query({ part: [parts.bracket.slug, kit.slug], revision: [revA] })
      .expect(200);
    expect(body.items.map((item: { part: { name: string } }) => item.part.name)).toEqual([
      'Bracket K',
      'Ring kit',
    ]);
    expect(body.items[0].lines).toMatchObject([
      { revisionA: { id: v2 }, revisionB: { id: revA }, verdict: 'seats-with-room' },
    ]);
    expect(body.items[1].lines).toEqual([]);
  });

  it('tells the trials of a part whatever stands on the reader’s bench', async () => {
    const { parts, v1, revA } = await lipAndRecess();
    const fix = plainFix();
    const published = await publishNew(
      member,
      await app.as('moderator'),
      completeContent(parts, { fixes: [fix] }),
    );
    await member
      .post(`/api/write-ups/${published.slug}/trials`)
      .send({ fixKey: fix.key, outcome: 'held', revisionIds: [v1, revA], note: '', figure: null })
      .expect(201);
    const { body } = await app
      .visitor()
      .get('/api/comparison')
      .query({ part: [parts.bracket.slug] })
      .expect(200);
    expect(body.items[0]).toMatchObject({
      lines: [],
      trials: { held: 1, heldForAWhile: 0, didNotHelp: 0 },
      afterwards: ['flats'],
    });
  });
});

describe('own stock', () => {
  it('keeps a member’s pieces, thinnest first, until they take them off', async () => {
    const owner = await app.memberNamed('Shimmer');
    const add = (name: string, thickness: number) =>
      owner.post('/api/my/stock').send({ name, thickness, uncertainty: 0.01, available: null });
    await add('brass strip', 0.5).expect(201);
    const { body } = await add('foil', 0.02).expect(201);
    await add('foil', 0.03).expect(409);
    const names = async () =>
      (await owner.get('/api/my/stock').expect(200)).body.items.map((item: { name: string }) => item.name);
    expect(await names()).toEqual(['foil', 'brass strip']);
    await member.delete(`/api/my/stock/${body.id}`).expect(404);
    await owner.delete(`/api/my/stock/${body.id}`).expect(204);
    expect(await names()).toEqual(['brass strip']);
  });
});
