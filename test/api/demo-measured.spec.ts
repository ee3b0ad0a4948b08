import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { seedDemo } from '../../seeds/demo.js';
import { demoJoints } from '../../seeds/demo/measured/joints.js';
import { hashPassword } from '../../server/accounts/password.js';
import { verdictOfPair, type KnownFeature } from '../../server/joints/fit-cell.js';
import { dimensionConsensus } from '../../server/measurements/consensus.js';
import { groupBy } from '../../server/rows.js';
import { type FitCell, JointPage, type JointSidePage } from '../../shared/contract/joints.js';
import type { Photo } from '../../shared/contract/photos.js';
import type { FeatureKind } from '../../shared/contract/vocabulary.js';
import { dimensionSpec } from '../../shared/fit/feature-dimensions.js';
import { jointKindNames, jointKinds } from '../../shared/fit/joint-kinds.js';
import type { JointVerdict } from '../../shared/fit/joint-verdict.js';
import { startTestApp, type TestApp } from './support/app.js';

let app: TestApp;
const now = new Date('2026-11-30T12:00:00Z');

let photos = 0;
async function rowWithoutFiles(_bytes: Buffer, alt: string, ownerId: number): Promise<Photo> {
  photos += 1;
  const photo = { hash: String(photos).padStart(64, '0'), width: 960, height: 720, placeholder: '', alt };
  const row = { ...photo, widths: '[480,960]', owner_id: ownerId, created_at: now };
  const [id] = await app.knex('photos').insert(row);
  return { id: id!, ...photo, widths: [480, 960] };
}

beforeAll(async () => {
  app = await startTestApp();
  await seedDemo({ knex: app.knex, storePhoto: rowWithoutFiles, now, hashPassword });
}, 300_000);
afterAll(() => app.close());

async function pageOf(slug: string): Promise<JointPage> {
  const { body } = await app.visitor().get(`/api/joints/${slug}`).expect(200);
  return JointPage.parse(body);
}

function side(page: JointSidePage, label: string): JointSidePage['revisions'][number] {
  return page.revisions.find((entry) => entry.revision.label === label)!;
}

function cell(page: JointPage, labelA: string, labelB: string): FitCell {
  const [a, b] = [side(page.sideA, labelA).revision.id, side(page.sideB, labelB).revision.id];
  return page.cells.find((entry) => entry.revisionA === a && entry.revisionB === b)!;
}

/** The whole verdict, made from what the page shows of both features. */
function verdictOn(page: JointPage, labelA: string, labelB: string): JointVerdict {
  const known = (from: JointSidePage, label: string): KnownFeature => ({
    process: from.process,
    attributes: side(from, label).attributes,
    dimensions: side(from, label).dimensions,
  });
  return verdictOfPair(page.kind, known(page.sideA, labelA), known(page.sideB, labelB));
}

describe('the joints of the demo', () => {
  it('are at least thirty, of every kind, between features of the kinds that theirs joins', async () => {
    const rows: { kind: keyof typeof jointKinds; a: FeatureKind; b: FeatureKind }[] = await app
      .knex('joints as j')
      .join('features as a', 'a.id', 'j.feature_a')
      .join('features as b', 'b.id', 'j.feature_b')
      .select('j.kind', { a: 'a.kind', b: 'b.kind' });
    expect(rows.length).toBeGreaterThanOrEqual(30);
    expect(new Set(rows.map((row) => row.kind))).toEqual(new Set(jointKindNames));
    for (const { kind, a, b } of rows)
      expect({ a, b }).toEqual({ a: jointKinds[kind].a, b: jointKinds[kind].b });
  });

  it('answer with a cell for each pair of revisions, and none with readings that exclude each other', async () => {
    for (const { slug } of demoJoints) {
      const page = await pageOf(slug);
      expect(page.cells, slug).toHaveLength(page.sideA.revisions.length * page.sideB.revisions.length);
      expect(
        page.cells.filter((entry) => entry.sentence.includes('cannot be right together')),
        slug,
      ).toEqual([]);
    }
  });

  it('keep the belt bracket 1.7 mm off the later motor, and seat it on the earlier one or with its later lip', async () => {
    const page = await pageOf('bracket-lip-in-m1-recess');
    expect(cell(page, 'Rev B', 'Rev C')).toMatchObject({
      verdict: 'will-not-seat',
      writeUps: ['belt-bracket-lip-does-not-enter-the-m1-recess'],
    });
    const { gap, tilt, touches } = verdictOn(page, 'Rev B', 'Rev C');
    expect(gap?.value).toBeCloseTo(1.7, 1);
    expect(tilt?.worst).not.toBeNull();
    expect(touches).toContain('face round the recess');
    expect(verdictOn(page, 'Rev A', 'Rev C').gap?.value).toBeCloseTo(1.2, 1);
    expect(cell(page, 'Rev B', 'Rev B').verdict).toBe('seats-with-room');
    expect(cell(page, 'Rev D', 'Rev C').verdict).toBe('seats-with-room');
  });

  it('agree with the write-ups on what bottoms, slips, rocks and passes', async () => {
    const told: [string, string, string, string][] = [
      ['m48-spacer-in-w1-rear-thread', 'Rev B', 'Rev C', 'will-not-seat'],
      ['m48-spacer-in-w1-rear-thread', 'Rev C', 'Rev C', 'seats-with-room'],
      ['reducer-barrel-in-heron-72-drawtube', 'Rev A', 'Rev A', 'will-not-seat'],
      ['reducer-barrel-in-heron-72-drawtube', 'Rev C', 'Rev A', 'seats-with-room'],
      ['wren-60-grip-ring-in-ring-gear', 'Rev B', 'Rev C', 'will-not-seat'],
      ['wren-60-grip-ring-in-ring-gear', 'Rev C', 'Rev C', 'seats-with-room'],
      ['m2-on-motor-plate', 'Rev B', 'Rev B', 'will-not-seat'],
      ['m2-on-motor-plate', 'Rev C', 'Rev B', 'seats-with-room'],
      ['heron-72-bar-in-dovetail-clamp', 'Rev A', 'Rev B', 'tight'],
      ['ring-gear-past-the-focuser-clamp-screw', 'Rev A', 'Rev B', 'seats-with-room'],
      ['ring-gear-past-the-focuser-clamp-screw', 'Rev B', 'Rev B', 'will-not-seat'],
      ['g1-barrel-in-micro-helical', 'Rev B', 'Rev B', 'tight'],
    ];
    for (const [slug, a, b, verdict] of told)
      expect(`${slug} ${a} ${b} ${cell(await pageOf(slug), a, b).verdict}`).toBe(
        `${slug} ${a} ${b} ${verdict}`,
      );
  });

  it('name the angles that stay free where a clamp screw has moved', async () => {
    const page = await pageOf('ring-gear-past-the-focuser-clamp-screw');
    const { freeAngles, turnNeeded } = verdictOn(page, 'Rev B', 'Rev B');
    expect(freeAngles).toHaveLength(1);
    expect(Math.abs(turnNeeded!)).toBeGreaterThan(1);
  });

  it('ask for readings, and say how to make them, where nobody has measured the newest revision', async () => {
    const page = await pageOf('rigid-bracket-lip-in-m1-recess');
    expect(side(page.sideA, 'Rev B').dimensions).toEqual({});
    const { verdict, missing } = verdictOn(page, 'Rev B', 'Rev C');
    expect([cell(page, 'Rev B', 'Rev C').verdict, verdict]).toEqual(['not-known', 'not-known']);
    expect(missing.map((reading) => `${reading.side}.${reading.name}`)).toEqual(['a.diameter', 'a.height']);
    expect(missing.every((reading) => reading.howTo.length > 20)).toBe(true);
  });
});

describe('the readings of the demo', () => {
  it('are at least two thousand, by many people over three years, none before its revision was sold', async () => {
    const readings: { accountId: number; at: Date; soldFrom: Date | string | null }[] = await app
      .knex('measurements as m')
      .join('revisions as r', 'r.id', 'm.revision_id')
      .select({ accountId: 'm.account_id', at: 'm.created_at', soldFrom: 'r.sold_from' });
    expect(readings.length).toBeGreaterThanOrEqual(2000);
    expect(new Set(readings.map((reading) => reading.accountId)).size).toBeGreaterThan(20);
    const times = readings.map((reading) => reading.at.getTime());
    const years = (Math.max(...times) - Math.min(...times)) / (365.25 * 86_400_000);
    expect(years).toBeGreaterThan(2.8);
    expect(years).toBeLessThan(3.3);
    expect(Math.max(...times)).toBeLessThanOrEqual(now.getTime());
    const early = readings.filter(({ at, soldFrom }) => soldFrom && at < new Date(soldFrom));
    expect(early).toEqual([]);
  });

  it('come to the consensus that is stored, set-aside ones left out', async () => {
    const readings: {
      place: string;
      kind: FeatureKind;
      process: 'machined' | 'printed' | 'cast';
      dimension: string;
      value: number;
      uncertainty: number;
    }[] = await app
      .knex('measurements as m')
      .join('features as f', 'f.id', 'm.feature_id')
      .whereNull('m.set_aside_at')
      .orderBy('m.id')
      .select('f.kind', 'f.process', 'm.dimension', 'm.value', 'm.uncertainty', {
        place: app.knex.raw("CONCAT(m.feature_id, '/', m.revision_id, '/', m.dimension)"),
      });
    const stored: { place: string; count: number; mean: number; spread: number; slips: number }[] = await app
      .knex('consensus')
      .select('count', 'mean', {
        place: app.knex.raw("CONCAT(feature_id, '/', revision_id, '/', dimension)"),
        spread: 'prediction_spread',
        slips: 'unit_slips',
      });
    const places = groupBy(readings, (reading) => reading.place);
    expect(stored).toHaveLength(places.size);
    for (const { place, ...figures } of stored) {
      const [{ kind, dimension, process }] = places.get(place) as [(typeof readings)[number]];
      const again = dimensionConsensus(places.get(place)!, dimensionSpec(kind, dimension)!.unit, process)!;
      expect(figures.count, place).toBe(again.count);
      expect(figures.slips, place).toBe(again.unitSlips);
      expect(figures.mean, place).toBeCloseTo(again.mean, 9);
      expect(figures.spread, place).toBeCloseTo(again.predictionSpread, 9);
    }
  });

  it('hold wrong entries that stand out, a dozen of them set aside with the reason', async () => {
    const aside: { set_aside_reason: string; role: string }[] = await app
      .knex('measurements')
      .join('accounts', 'accounts.id', 'measurements.set_aside_by')
      .whereNotNull('set_aside_at')
      .select('set_aside_reason', 'accounts.role');
    expect(aside).toHaveLength(12);
    expect(aside.every((row) => row.role === 'moderator' && row.set_aside_reason.length > 20)).toBe(true);
    const slips = await app.knex('consensus').where('unit_slips', '>', 0);
    expect(slips.length).toBeGreaterThan(5);
    expect(await app.knex('consensus').where({ thin: true })).not.toEqual([]);
  });
});

describe('what members of the demo say of fit', () => {
  it('is at least 150 reports that contradict the measurements on one pair only', async () => {
    expect((await app.knex('fit_reports')).length).toBeGreaterThanOrEqual(150);
    const contradicted: string[] = [];
    for (const { slug } of demoJoints) {
      const page = await pageOf(slug);
      contradicted.push(...page.cells.filter((entry) => entry.contradicts).map(() => slug));
    }
    expect(contradicted).toEqual(['wren-60-shield-in-dew-ring']);
  });

  it.each([
    ['thornapple-belt-kit-60', 'cotterpin-ring-gear-kit', ['larkfield-wren-60', 'tarn-m1']],
    ['thornapple-belt-kit-80', 'cotterpin-ring-gear-kit-80', ['larkfield-wren-80', 'tarn-m2']],
    ['stonebridge-belt-bracket', 'tarn-m1-rigid-bracket', ['tarn-m1']],
    ['oxbow-ring-clamp', 'larkfield-tube-ring-70', ['larkfield-wren-60']],
  ])('lets %s and %s be compared on the same parts, each with a price', async (one, other, against) => {
    const revisions: number[] = await app
      .knex('revisions as r')
      .join('parts as p', 'p.id', 'r.part_id')
      .whereIn('p.slug', against)
      .where('r.position', 1)
      .pluck('r.id');
    const { body } = await app
      .visitor()
      .get('/api/comparison')
      .query({ part: [one, other], revision: revisions })
      .expect(200);
    for (const compared of body.items) {
      const met = compared.lines.map((line: { joint: { a: { slug: string }; b: { slug: string } } }) =>
        line.joint.a.slug === compared.part.slug ? line.joint.b.slug : line.joint.a.slug,
      );
      expect([...new Set(met)].sort(), compared.part.slug).toEqual(against);
      expect(compared.price, compared.part.slug).toMatch(/^[\d,]+ to [\d,]+ euro$/);
    }
    expect(body.items).toHaveLength(2);
  });

  it('has a price band for every part and stock of their own for some members', async () => {
    expect(await app.knex('parts').whereNull('price_band').pluck('slug')).toEqual([]);
    expect((await app.knex('own_stock').distinct('account_id')).length).toBeGreaterThanOrEqual(3);
  });
});
