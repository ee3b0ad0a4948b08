import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { WhichOne } from '../../shared/contract/which-one.js';
import { startTestApp, type TestApp } from './support/app.js';
import { insertPart } from './support/catalogue.js';
import { insertFeature, reading, record } from './support/features.js';
import { insertMark } from './support/marks.js';

let app: TestApp;

beforeAll(async () => {
  app = await startTestApp({ clock: () => new Date('2026-12-01T23:30:00Z') });
});
afterAll(() => app.close());

const whichOne = async (slug: string): Promise<WhichOne> =>
  (await app.visitor().get(`/api/parts/${slug}/which-one`).expect(200)).body;

describe('what tells the revisions of a part apart', () => {
  it('is its marks, with what is known of each revision, and today', async () => {
    const part = await insertPart(app.knex, { revisions: ['A', 'B', 'C'] });
    const [a, b] = part.revisions.map((revision) => revision.id);
    await insertMark(app.knex, part, 'clamp screw on the left', [true, false]);
    const told = await whichOne(part.slug);
    expect(told.asOf).toBe('2026-12-01');
    expect(told.part).toMatchObject({ id: part.id, name: part.name });
    expect(told.revisions.map((revision) => [revision.label, revision.soldFrom])).toEqual([
      ['A', '2024-03-01'],
      ['B', null],
      ['C', null],
    ]);
    expect(told.marks).toEqual([
      {
        id: expect.any(Number),
        text: 'clamp screw on the left',
        revisions: [
          { revisionId: a, shows: true },
          { revisionId: b, shows: false },
        ],
      },
    ]);
  });

  it('is each dimension that was read on two revisions, with mean and spread, and none read on one alone', async () => {
    const part = await insertPart(app.knex);
    const [a, b] = part.revisions.map((revision) => revision.id) as [number, number];
    const recess = await insertFeature(app.knex, part, 'recess');
    await record(
      await app.memberNamed('Reader'),
      reading(recess, a, 'diameter', 19.5),
      reading(recess, b, 'diameter', 20.1),
      reading(recess, a, 'depth', 2),
    );
    const { dimensions } = await whichOne(part.slug);
    expect(dimensions).toEqual([
      {
        feature: expect.objectContaining({ id: recess.id, kind: 'recess' }),
        dimension: 'diameter',
        revisions: [
          { revisionId: a, mean: 19.5, predictionSpread: expect.any(Number) },
          { revisionId: b, mean: 20.1, predictionSpread: expect.any(Number) },
        ],
      },
    ]);
    expect(dimensions[0]!.revisions[0]!.predictionSpread).toBeGreaterThan(0.015);
  });

  it('is not there for a part that is not', async () => {
    const { body } = await app.visitor().get('/api/parts/no-such-part/which-one').expect(404);
    expect(body.type).toBe('/problems/not-found');
  });
});
