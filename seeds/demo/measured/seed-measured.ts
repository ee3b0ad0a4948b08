import type { Knex } from 'knex';
import { idsFrom, insertRows } from '../ids.js';
import { seededNumbers } from '../random.js';
import { type Catalogue, known } from '../seed-catalogue.js';
import { consensusOfReadings, type PlaceConsensus } from './consensus.js';
import { planReports } from './fit-reports.js';
import { demoJoints } from './joints.js';
import { judgePairs, letterOf, partOf } from './judge-pairs.js';
import { ownStock } from './own-stock.js';
import { processOf } from './process.js';
import { readingsOf, type Measurer, type Reading } from './readings.js';
import { measuredFeatures } from './sizes.js';
import { withWrongEntries } from './wrong-entries.js';

const day = 86_400_000;
/** How many wrong readings the moderator has set aside. */
const setAside = 12;

interface Surroundings {
  readonly accounts: ReadonlyMap<string, number>;
  readonly catalogue: Catalogue;
  readonly now: Date;
}

/** Inserts joints, attributes, readings with their consensus, reports on fit and own stock. Trials must be there. */
export async function seedMeasured(trx: Knex, around: Surroundings): Promise<void> {
  const { accounts, catalogue, now } = around;
  const jointIds = await seedJoints(trx, catalogue);
  await insertRows(trx, 'feature_attributes', attributeRows(catalogue));
  const measurers = await measurersOf(trx, accounts);
  const readings = planReadings(measurers, now);
  await insertRows(trx, 'measurements', measurementRows(readings, around));
  const consensus = consensusOfReadings(readings, (feature) => processOf(partOf(feature)));
  await insertRows(trx, 'consensus', consensusRows(consensus, catalogue));

  const pairs = await judgePairs(trx, catalogue, consensus);
  const people = measurers.map((person) => person.accountId);
  await insertRows(
    trx,
    'fit_reports',
    planReports(pairs, people, now, seededNumbers(1_905)).map(({ pair, ...report }) => ({
      joint_id: known(jointIds, pair.joint),
      revision_a: known(catalogue.revisions, pair.a),
      revision_b: known(catalogue.revisions, pair.b),
      account_id: report.accountId,
      sat: report.sat,
      note: report.note,
      created_at: report.createdAt,
    })),
  );
  await insertRows(trx, 'own_stock', stockRows(accounts));
}

async function seedJoints(trx: Knex, catalogue: Catalogue): Promise<Map<string, number>> {
  const nextId = await idsFrom(trx, 'joints');
  const ids = new Map(demoJoints.map((joint) => [joint.slug, nextId()]));
  await insertRows(
    trx,
    'joints',
    demoJoints.map(({ slug, name, kind, a, b }) => ({
      id: ids.get(slug),
      slug,
      name,
      kind,
      feature_a: known(catalogue.features, a),
      feature_b: known(catalogue.features, b),
    })),
  );
  return ids;
}

function attributeRows(catalogue: Catalogue): object[] {
  return measuredFeatures.flatMap(({ part, feature, words }) =>
    Object.entries(words).flatMap(([name, values]) =>
      Object.entries(values).flatMap(([letters, value]) =>
        [...letters].map((letter) => ({
          feature_id: known(catalogue.features, `${part}/${feature}`),
          revision_id: known(catalogue.revisions, `${part}:${letter}`),
          name,
          value,
        })),
      ),
    ),
  );
}

async function measurersOf(trx: Knex, accounts: ReadonlyMap<string, number>): Promise<Measurer[]> {
  const rows: { id: number; createdAt: Date; units: string }[] = await trx('accounts')
    .whereIn('id', [...accounts.values()])
    .whereIn('role', ['member', 'maker'])
    .orderBy('id')
    .select('id', 'units', { createdAt: 'created_at' });
  return rows.map((row) => ({ accountId: row.id, since: row.createdAt, inches: row.units === 'in' }));
}

/** All readings in the order in which they were made. */
function planReadings(people: readonly Measurer[], now: Date): Reading[] {
  const next = seededNumbers(22_519);
  const right = measuredFeatures.flatMap((feature) => {
    const part = partOf(feature.part);
    const kind = part.features.find((candidate) => candidate.name === feature.feature)?.kind;
    if (!kind) throw new Error(`The demo measures “${feature.feature}”, which ${feature.part} lacks.`);
    return part.revisions.flatMap((revision) =>
      readingsOf({
        feature,
        kind,
        process: processOf(part),
        letter: letterOf(revision.label),
        from: new Date(revision.from ?? 0),
        to: new Date(now.getTime() - 2 * day),
        people,
        next,
      }),
    );
  });
  right.sort((one, other) => one.createdAt.getTime() - other.createdAt.getTime());
  return withWrongEntries(right, setAside, next);
}

function measurementRows(readings: readonly Reading[], { accounts, catalogue, now }: Surroundings): object[] {
  const moderator = known(accounts, 'moderator');
  return readings.map((reading) => {
    const aside = reading.setAsideReason !== null;
    return {
      feature_id: known(catalogue.features, reading.feature),
      revision_id: known(catalogue.revisions, `${reading.feature.split('/')[0]}:${reading.letter}`),
      dimension: reading.spec.name,
      value: reading.value,
      uncertainty: reading.uncertainty,
      entered: JSON.stringify(reading.entered),
      unit: reading.unit,
      instrument: reading.instrument,
      account_id: reading.accountId,
      created_at: reading.createdAt,
      set_aside_at: aside ? new Date(Math.min(reading.createdAt.getTime() + 3 * day, now.getTime())) : null,
      set_aside_by: aside ? moderator : null,
      set_aside_reason: reading.setAsideReason,
    };
  });
}

function consensusRows(places: readonly PlaceConsensus[], catalogue: Catalogue): object[] {
  return places.map(({ feature, letter, dimension, consensus }) => ({
    feature_id: known(catalogue.features, feature),
    revision_id: known(catalogue.revisions, `${feature.split('/')[0]}:${letter}`),
    dimension,
    count: consensus.count,
    mean: consensus.mean,
    uncertainty: consensus.uncertainty,
    prediction_spread: consensus.predictionSpread,
    thin: consensus.thin,
    unit_slips: consensus.unitSlips,
  }));
}

function stockRows(accounts: ReadonlyMap<string, number>): object[] {
  return Object.entries(ownStock).flatMap(([account, items]) =>
    items.map(([name, thickness, uncertainty, available]) => ({
      account_id: known(accounts, account),
      name,
      thickness,
      uncertainty,
      available,
    })),
  );
}
