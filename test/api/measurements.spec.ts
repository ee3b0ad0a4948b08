import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DimensionReadings, PartMeasurements } from '../../shared/contract/measurements.js';
import { startTestApp, type MemberAgent, type TestApp } from './support/app.js';
import { insertPart, type TestPart } from './support/catalogue.js';
import { insertFeature, reading, record, type TestFeature } from './support/features.js';

let app: TestApp;
let member: MemberAgent;
let moderator: MemberAgent;

beforeAll(async () => {
  app = await startTestApp();
  [member, moderator] = await Promise.all([app.memberNamed('Reader'), app.as('moderator')]);
});
afterAll(() => app.close());

async function recessOf(): Promise<{ part: TestPart; recess: TestFeature; revision: number }> {
  const part = await insertPart(app.knex);
  return { part, recess: await insertFeature(app.knex, part, 'recess'), revision: part.revisions[0]!.id };
}

const measured = async (part: TestPart): Promise<PartMeasurements> =>
  (await app.visitor().get(`/api/parts/${part.slug}/measurements`).expect(200)).body;
const readings = async (
  part: TestPart,
  feature: TestFeature,
  dimension = 'diameter',
): Promise<DimensionReadings> =>
  (
    await app
      .visitor()
      .get(`/api/parts/${part.slug}/features/${feature.slug}/dimensions/${dimension}`)
      .expect(200)
  ).body;

describe('recording a reading', () => {
  it('answers with the consensus, and the part shows it to everybody', async () => {
    const { part, recess, revision } = await recessOf();
    const { body } = await member
      .post('/api/measurements')
      .send(reading(recess, revision, 'diameter', 19.5))
      .expect(201);
    expect(body.measurement).toMatchObject({
      value: 19.5,
      repeats: 1,
      person: { displayName: 'Reader' },
      setAside: null,
      weight: 1,
    });
    expect(body.consensus).toMatchObject({ count: 1, mean: 19.5, thin: true });
    const shown = (await measured(part)).features[0]!.revisions.find(
      (entry) => entry.revision.id === revision,
    )!;
    expect(shown.dimensions).toEqual([{ name: 'diameter', consensus: body.consensus }]);
  });

  it('takes inches and keeps what was typed', async () => {
    const { part, recess, revision } = await recessOf();
    const inches = { ...reading(recess, revision, 'diameter', 0.768), unit: 'in', uncertainty: 0.001 };
    const { body } = await member.post('/api/measurements').send(inches).expect(201);
    expect(body.measurement.value).toBeCloseTo(19.5072, 10);
    expect(body.measurement.uncertainty).toBeCloseTo(0.0254, 10);
    expect((await readings(part, recess)).revisions[0]!.readings[0]!.entered).toEqual({
      values: [0.768],
      unit: 'in',
    });
  });

  it('makes mean and type A uncertainty of repeats, beside the instrument’s own (JCGM 100:2008, 4.2.3)', async () => {
    const { recess, revision } = await recessOf();
    const { body } = await member
      .post('/api/measurements')
      .send({ ...reading(recess, revision, 'diameter', 19.48, 19.5, 19.52), uncertainty: 0.01 })
      .expect(201);
    expect(body.measurement.value).toBeCloseTo(19.5, 12);
    expect(body.measurement.uncertainty).toBeCloseTo(Math.hypot(0.01, 0.02 / Math.sqrt(3)), 12);
    expect(body.measurement.repeats).toBe(3);
  });

  it('a reading in inches typed as millimetres is named and leaves the consensus where it was', async () => {
    const { part, recess, revision } = await recessOf();
    await record(
      member,
      ...[19.48, 19.5, 19.52, 19.49].map((value) => reading(recess, revision, 'diameter', value)),
    );
    const before = (await readings(part, recess)).revisions[0]!.consensus!;
    await record(member, reading(recess, revision, 'diameter', 0.768));
    const after = (await readings(part, recess)).revisions[0]!;
    expect(after.consensus).toMatchObject({
      mean: before.mean,
      uncertainty: before.uncertainty,
      count: 5,
      unitSlips: 1,
    });
    expect(after.readings[0]).toMatchObject({ value: 0.768, unitSlip: true, weight: 0 });
  });

  it('two at the same moment are both in the consensus', async () => {
    const { part, recess, revision } = await recessOf();
    await Promise.all(
      [19.4, 19.6, 19.5, 19.45].map((value) => record(member, reading(recess, revision, 'diameter', value))),
    );
    expect((await readings(part, recess)).revisions[0]!.consensus!.count).toBe(4);
  });

  it.each([
    ['a feature that is not there', { featureId: 999_999 }, 'featureId'],
    ['a dimension the feature does not have', { dimension: 'flankAngle' }, 'dimension'],
    ['a unit that does not suit it', { unit: 'deg' }, 'unit'],
    ['a photo of nobody', { photoId: 999_999 }, 'photoId'],
    ['no reading at all', { values: [] }, 'values'],
    ['a length below zero', { values: [-19.5] }, 'values'],
  ])('refuses %s and names the field', async (_, over, field) => {
    const { recess, revision } = await recessOf();
    const { body } = await member
      .post('/api/measurements')
      .send({ ...reading(recess, revision, 'diameter', 19.5), ...over })
      .expect(422);
    expect(body.fields[0].path).toBe(field);
    expect(await app.knex('measurements').where('feature_id', recess.id)).toEqual([]);
  });

  it('refuses a revision of another part', async () => {
    const { recess } = await recessOf();
    const other = await insertPart(app.knex);
    const { body } = await member
      .post('/api/measurements')
      .send(reading(recess, other.revisions[0]!.id, 'diameter', 19.5))
      .expect(422);
    expect(body.fields[0].path).toBe('revisionId');
  });
});

describe('setting a reading aside', () => {
  async function three(): Promise<{ part: TestPart; recess: TestFeature; wrong: number }> {
    const { part, recess, revision } = await recessOf();
    await record(member, ...[19.5, 19.51, 19.8].map((value) => reading(recess, revision, 'diameter', value)));
    return { part, recess, wrong: (await readings(part, recess)).revisions[0]!.readings[0]!.id };
  }

  it('keeps it on show with its reason but without a say', async () => {
    const { part, recess, wrong } = await three();
    await moderator
      .post(`/api/measurements/${wrong}/set-aside`)
      .send({ reason: 'Read across the chamfer' })
      .expect(200);
    const after = (await readings(part, recess)).revisions[0]!;
    expect(after.consensus!.count).toBe(2);
    expect(after.consensus!.mean).toBeCloseTo(19.505, 6);
    expect(after.readings[0]).toMatchObject({
      value: 19.8,
      weight: 0,
      setAside: { reason: 'Read across the chamfer' },
    });
  });

  it('can be taken back, and a second time is told', async () => {
    const { part, recess, wrong } = await three();
    const before = (await readings(part, recess)).revisions[0]!.consensus;
    await moderator
      .post(`/api/measurements/${wrong}/set-aside`)
      .send({ reason: 'Read across the chamfer' })
      .expect(200);
    await moderator
      .post(`/api/measurements/${wrong}/set-aside`)
      .send({ reason: 'Read across the chamfer' })
      .expect(409);
    await moderator.post(`/api/measurements/${wrong}/take-back`).expect(200);
    expect((await readings(part, recess)).revisions[0]!.consensus).toEqual(before);
  });

  it('of the only reading leaves no consensus', async () => {
    const { part, recess, revision } = await recessOf();
    await record(member, reading(recess, revision, 'depth', 2));
    const only = (await readings(part, recess, 'depth')).revisions[0]!.readings[0]!.id;
    const { body } = await moderator
      .post(`/api/measurements/${only}/set-aside`)
      .send({ reason: 'Read on the wrong part' })
      .expect(200);
    expect(body.consensus).toBeNull();
    expect((await measured(part)).features[0]!.revisions[0]!.dimensions).toEqual([]);
  });

  it('of a reading that is not there is told', async () => {
    await moderator.post('/api/measurements/999999/set-aside').send({ reason: 'Not there' }).expect(404);
  });
});

describe('what was measured', () => {
  it('of a part that is not there, or a dimension it does not have, is not found', async () => {
    const { part, recess } = await recessOf();
    await app.visitor().get('/api/parts/no-such-part/measurements').expect(404);
    await app
      .visitor()
      .get(`/api/parts/${part.slug}/features/${recess.slug}/dimensions/flankAngle`)
      .expect(404);
  });
  it('of a part without features is an empty list', async () => {
    expect(await measured(await insertPart(app.knex))).toEqual({ features: [] });
  });
});
