import type { Knex } from 'knex';
import type { Feature, RevisionRef } from '../../shared/contract/hardware.js';
import type { DimensionConsensus, MeasurementUnit } from '../../shared/contract/measurements.js';
import type { Photo } from '../../shared/contract/photos.js';
import type { Instrument } from '../../shared/contract/vocabulary.js';
import { coverage95 } from '../../shared/fit/dimension.js';
import type { Process } from '../../shared/statistics/consensus.js';
import { revisionRefColumns, toRevisionRef, type RevisionRefRow } from '../revision-ref.js';
import { fromJson } from '../rows.js';

export interface FeatureRow extends Feature {
  readonly partId: number;
  readonly process: Process;
}

/** One dimension of one feature of one revision. */
export interface Place {
  readonly featureId: number;
  readonly revisionId: number;
  readonly dimension: string;
}

export interface MeasurementRow extends Place {
  readonly id: number;
  readonly value: number;
  readonly uncertainty: number;
  readonly entered: number[];
  readonly unit: MeasurementUnit;
  readonly instrument: Instrument;
  readonly accountId: number;
  readonly displayName: string;
  readonly createdAt: Date;
  readonly photo: Photo | null;
  readonly setAside: {
    readonly reason: string;
    readonly byId: number;
    readonly byName: string;
    readonly at: Date;
  } | null;
}

export interface NewMeasurement extends Place {
  readonly value: number;
  readonly uncertainty: number;
  readonly entered: readonly number[];
  readonly unit: MeasurementUnit;
  readonly instrument: Instrument;
  readonly photoId: number | null;
  readonly accountId: number;
  readonly createdAt: Date;
}

export type MeasurementStore = ReturnType<typeof createMeasurementStore>;

export function createMeasurementStore(knex: Knex) {
  const features = (db: Knex) =>
    db('features as f').select('f.id', 'f.slug', 'f.name', 'f.kind', 'f.process', { partId: 'f.part_id' });

  return {
    async featuresOfPart(partId: number): Promise<FeatureRow[]> {
      return features(knex).where('f.part_id', partId).orderBy(['f.name', 'f.id']);
    },

    /** The feature, held against other writers until the transaction ends: its consensus is made one at a time. */
    async holdFeature(id: number, trx: Knex): Promise<FeatureRow | undefined> {
      return features(trx).where('f.id', id).forUpdate().first();
    },

    async attributesOf(
      featureIds: readonly number[],
    ): Promise<{ featureId: number; revisionId: number; name: string; value: string }[]> {
      return knex('feature_attributes')
        .whereIn('feature_id', featureIds)
        .select('name', 'value', { featureId: 'feature_id', revisionId: 'revision_id' });
    },

    async consensusOfFeatures(
      featureIds: readonly number[],
    ): Promise<(Place & { consensus: DimensionConsensus })[]> {
      const rows: ConsensusRecord[] = await consensusRows(knex).whereIn('feature_id', featureIds);
      return rows.map(toConsensus);
    },

    async add(measurement: NewMeasurement, trx: Knex): Promise<number> {
      const [id] = await trx('measurements').insert({
        feature_id: measurement.featureId,
        revision_id: measurement.revisionId,
        dimension: measurement.dimension,
        value: measurement.value,
        uncertainty: measurement.uncertainty,
        entered: JSON.stringify(measurement.entered),
        unit: measurement.unit,
        instrument: measurement.instrument,
        photo_id: measurement.photoId,
        account_id: measurement.accountId,
        created_at: measurement.createdAt,
      });
      return id!;
    },

    async byId(id: number, trx: Knex): Promise<MeasurementRow | undefined> {
      const row: MeasurementRecord | undefined = await measurements(trx).where('m.id', id).first();
      return row && toMeasurement(row);
    },

    /** Readings that have a say in the consensus of a place, in the order they came. */
    async counted(place: Place, trx: Knex): Promise<{ value: number; uncertainty: number }[]> {
      return trx('measurements')
        .where(columnsOf(place))
        .whereNull('set_aside_at')
        .select('value', 'uncertainty')
        .orderBy('id');
    },

    /** The newest `rows` readings of each revision, and how many there are in all. */
    async newest(
      featureId: number,
      dimension: string,
      rows: number,
    ): Promise<(MeasurementRow & { total: number })[]> {
      const ranked = knex('measurements')
        .where({ feature_id: featureId, dimension })
        .select(
          'id',
          { total: knex.raw('COUNT(*) OVER (PARTITION BY revision_id)') },
          { place: knex.raw('ROW_NUMBER() OVER (PARTITION BY revision_id ORDER BY id DESC)') },
        );
      const found: (MeasurementRecord & { total: number })[] = await measurements(knex)
        .join(ranked.as('ranked'), 'ranked.id', 'm.id')
        .where('ranked.place', '<=', rows)
        .select('ranked.total')
        .orderBy('m.id', 'desc');
      return found.map((row) => ({ ...toMeasurement(row), total: Number(row.total) }));
    },

    async saveConsensus(place: Place, consensus: DimensionConsensus, trx: Knex): Promise<void> {
      await trx('consensus')
        .insert({
          ...columnsOf(place),
          ...figuresOf(consensus),
        })
        .onConflict(['feature_id', 'revision_id', 'dimension'])
        .merge();
    },

    async dropConsensus(place: Place, trx: Knex): Promise<void> {
      await trx('consensus').where(columnsOf(place)).delete();
    },

    /** Joints that the feature is one side of. */
    async jointsOf(featureId: number, trx: Knex): Promise<number[]> {
      return trx('joints').where('feature_a', featureId).orWhere('feature_b', featureId).pluck('id');
    },

    /** The features, held like one of them, in the order of their identities. */
    async holdFeatures(ids: readonly number[], trx: Knex): Promise<FeatureRow[]> {
      return features(trx).whereIn('f.id', ids).orderBy('f.id').forUpdate();
    },

    /** Readings that have a say, on every place of the features, in the order they came. */
    async countedOfFeatures(
      featureIds: readonly number[],
      trx: Knex,
    ): Promise<(Place & { value: number; uncertainty: number })[]> {
      return trx('measurements')
        .whereIn('feature_id', featureIds)
        .whereNull('set_aside_at')
        .select('dimension', 'value', 'uncertainty', { featureId: 'feature_id', revisionId: 'revision_id' })
        .orderBy('id');
    },

    async replaceConsensus(
      featureIds: readonly number[],
      entries: readonly { place: Place; consensus: DimensionConsensus }[],
      trx: Knex,
    ): Promise<void> {
      await trx('consensus').whereIn('feature_id', featureIds).delete();
      if (entries.length === 0) return;
      await trx('consensus').insert(
        entries.map(({ place, consensus }) => ({ ...columnsOf(place), ...figuresOf(consensus) })),
      );
    },

    async setAside(
      id: number,
      by: { accountId: number; reason: string; at: Date } | null,
      trx: Knex,
    ): Promise<void> {
      await trx('measurements')
        .where({ id })
        .update({
          set_aside_at: by?.at ?? null,
          set_aside_by: by?.accountId ?? null,
          set_aside_reason: by?.reason ?? null,
        });
    },

    async ownsPhoto(accountId: number, photoId: number, trx: Knex): Promise<boolean> {
      return (
        (await trx('photos').where({ id: photoId, owner_id: accountId, taken_down_at: null }).first('id')) !==
        undefined
      );
    },

    async revisionsOfPart(partId: number): Promise<RevisionRef[]> {
      const rows: RevisionRefRow[] = await knex('revisions')
        .where('part_id', partId)
        .select(revisionRefColumns)
        .orderBy('position');
      return rows.map(toRevisionRef);
    },
  };
}

function columnsOf(place: Place): Record<string, unknown> {
  return { feature_id: place.featureId, revision_id: place.revisionId, dimension: place.dimension };
}

function figuresOf(consensus: DimensionConsensus): Record<string, unknown> {
  return {
    count: consensus.count,
    mean: consensus.mean,
    uncertainty: consensus.uncertainty,
    prediction_spread: consensus.predictionSpread,
    thin: consensus.thin,
    unit_slips: consensus.unitSlips,
  };
}

interface ConsensusRecord extends Place {
  count: number;
  mean: number;
  uncertainty: number;
  predictionSpread: number;
  thin: number | boolean;
  unitSlips: number;
}

/** Consensus rows with the columns that `toConsensus` reads. */
function consensusRows(knex: Knex): Knex.QueryBuilder {
  return knex('consensus').select('dimension', 'count', 'mean', 'uncertainty', 'thin', {
    featureId: 'feature_id',
    revisionId: 'revision_id',
    predictionSpread: 'prediction_spread',
    unitSlips: 'unit_slips',
  });
}

function toConsensus(row: ConsensusRecord): Place & { consensus: DimensionConsensus } {
  const { featureId, revisionId, dimension, ...figures } = row;
  return {
    featureId,
    revisionId,
    dimension,
    consensus: {
      ...figures,
      thin: Boolean(figures.thin),
      low: figures.mean - coverage95 * figures.uncertainty,
      high: figures.mean + coverage95 * figures.uncertainty,
    },
  };
}

interface MeasurementRecord extends Place {
  id: number;
  value: number;
  uncertainty: number;
  entered: unknown;
  unit: MeasurementUnit;
  instrument: Instrument;
  accountId: number;
  displayName: string;
  createdAt: Date;
  setAsideAt: Date | null;
  setAsideBy: number | null;
  setAsideName: string | null;
  setAsideReason: string | null;
  photoId: number | null;
  hash: string;
  width: number;
  height: number;
  widths: unknown;
  placeholder: string;
  alt: string;
}

function measurements(knex: Knex): Knex.QueryBuilder {
  return knex('measurements as m')
    .join('accounts as a', 'a.id', 'm.account_id')
    .leftJoin('accounts as b', 'b.id', 'm.set_aside_by')
    .leftJoin('photos as f', (on) => on.on('f.id', 'm.photo_id').andOnNull('f.taken_down_at'))
    .select('m.id', 'm.dimension', 'm.value', 'm.uncertainty', 'm.entered', 'm.unit', 'm.instrument', {
      featureId: 'm.feature_id',
      revisionId: 'm.revision_id',
      accountId: 'a.id',
      displayName: 'a.display_name',
      createdAt: 'm.created_at',
      setAsideAt: 'm.set_aside_at',
      setAsideBy: 'b.id',
      setAsideName: 'b.display_name',
      setAsideReason: 'm.set_aside_reason',
      photoId: 'f.id',
    })
    .select('f.hash', 'f.width', 'f.height', 'f.widths', 'f.placeholder', 'f.alt');
}

function toMeasurement(row: MeasurementRecord): MeasurementRow {
  const { setAsideAt, setAsideBy, setAsideName, setAsideReason, entered, ...others } = row;
  const { photoId, hash, width, height, widths, placeholder, alt, ...rest } = others;
  return {
    ...rest,
    entered: fromJson(entered),
    photo:
      photoId === null
        ? null
        : { id: photoId, hash, width, height, widths: fromJson(widths), placeholder, alt },
    setAside: setAsideAt && {
      reason: setAsideReason!,
      byId: setAsideBy!,
      byName: setAsideName!,
      at: setAsideAt,
    },
  };
}
