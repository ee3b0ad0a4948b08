import type { Knex } from 'knex';
import type {
  AddMeasurement,
  DimensionConsensus,
  DimensionReadings,
  Measurement,
  PartMeasurements,
} from '../../shared/contract/measurements.js';
import { millimetresPerInch } from '../../shared/fit/dimension.js';
import { dimensionSpec, type DimensionSpec } from '../../shared/fit/feature-dimensions.js';
import { usualUncertainty } from '../../shared/fit/instruments.js';
import { isUnitSlip, sayOf } from '../../shared/statistics/consensus.js';
import { typeA } from '../../shared/statistics/summary.js';
import type { AuditLog } from '../audit/audit.js';
import type { HardwareService } from '../hardware/hardware.js';
import { AlreadyThere, FieldNotValid, NotFound } from '../http/problems.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import { groupBy } from '../rows.js';
import type { Happenings } from '../watches/happenings.js';
import { dimensionConsensus } from './consensus.js';
import type { FeatureRow, MeasurementRow, MeasurementStore, Place } from './measurement.store.js';

const shownPerRevision = 200;

/** What is known of features on revisions: `feature/revision` is the key. */
export interface KnownDimensions {
  readonly attributes: ReadonlyMap<string, Record<string, string>>;
  readonly dimensions: ReadonlyMap<string, Record<string, DimensionConsensus>>;
}

export type MeasurementService = ReturnType<typeof createMeasurementService>;

export function createMeasurementService(around: {
  knex: Knex;
  clock: () => Date;
  hardware: HardwareService;
  store: MeasurementStore;
  audit: AuditLog;
  happenings: Happenings;
  deskInbox: DeskInbox;
}) {
  const { knex, clock, hardware, store, audit, happenings, deskInbox } = around;

  /** Makes the consensus of a place anew; the feature must be held. */
  async function refresh(place: Place, feature: FeatureRow, trx: Knex): Promise<DimensionConsensus | null> {
    const unit = dimensionSpec(feature.kind, place.dimension)?.unit ?? 'mm';
    const consensus = dimensionConsensus(await store.counted(place, trx), unit, feature.process);
    if (consensus) await store.saveConsensus(place, consensus, trx);
    else await store.dropConsensus(place, trx);
    return consensus;
  }

  /** Sets a reading aside, or gives it its say again where there is no reason; within the transaction of what asks for it. */
  async function decideWithin(
    trx: Knex,
    id: number,
    actorId: number,
    reason: string | null,
  ): Promise<{ consensus: DimensionConsensus | null }> {
    const measurement = await store.byId(id, trx);
    if (!measurement) throw new NotFound('There is no such reading.');
    const feature = (await store.holdFeature(measurement.featureId, trx))!;
    if (reason !== null && measurement.setAside) throw new AlreadyThere('That reading is set aside already.');
    const by = reason === null ? null : { accountId: actorId, reason, at: clock() };
    await store.setAside(id, by, trx);
    await audit.note(trx, {
      actorId,
      action: by ? 'reading-set-aside' : 'reading-taken-back',
      subject: { kind: 'measurement', id, name: `${measurement.dimension} of ${feature.name}` },
      reason: reason ?? '',
    });
    return { consensus: await refresh(measurement, feature, trx) };
  }

  /** Attributes and consensus of features by revision; keys are `feature/revision`. */
  async function knownOf(featureIds: readonly number[]): Promise<KnownDimensions> {
    const [attributes, consensus] = await Promise.all([
      store.attributesOf(featureIds),
      store.consensusOfFeatures(featureIds),
    ]);
    const at = (row: { featureId: number; revisionId: number }): string =>
      `${row.featureId}/${row.revisionId}`;
    return {
      attributes: mapValues(groupBy(attributes, at), (rows) =>
        Object.fromEntries(rows.map(({ name, value }) => [name, value])),
      ),
      dimensions: mapValues(groupBy(consensus, at), (rows) =>
        Object.fromEntries(rows.map((row) => [row.dimension, row.consensus])),
      ),
    };
  }

  return {
    knownOf,
    decideWithin,

    /** Consensus of every dimension of a part that was read. NotFound for a slug that no part has or had. */
    async partMeasurements(slug: string): Promise<PartMeasurements> {
      const part = await hardware.partBySlug(slug);
      const features = await store.featuresOfPart(part.id);
      const [revisions, known] = await Promise.all([
        features.length > 0 ? store.revisionsOfPart(part.id) : [],
        knownOf(features.map((feature) => feature.id)),
      ]);
      return {
        features: features.map(({ partId: _, ...feature }) => ({
          ...feature,
          revisions: revisions.map((revision) => {
            const at = `${feature.id}/${revision.id}`;
            return {
              revision,
              attributes: known.attributes.get(at) ?? {},
              dimensions: Object.entries(known.dimensions.get(at) ?? {}).map(([name, consensus]) => ({
                name,
                consensus,
              })),
            };
          }),
        })),
      };
    },

    /** All readings of a dimension on every revision. NotFound for a feature or dimension that the part does not have. */
    async dimensionReadings(
      slug: string,
      featureSlug: string,
      dimension: string,
    ): Promise<DimensionReadings> {
      const part = await hardware.partBySlug(slug);
      const feature = (await store.featuresOfPart(part.id)).find(({ slug: at }) => at === featureSlug);
      if (!feature || !dimensionSpec(feature.kind, dimension))
        throw new NotFound('The part has no such dimension.');
      const [revisions, consensus, newest] = await Promise.all([
        store.revisionsOfPart(feature.partId),
        store.consensusOfFeatures([feature.id]),
        store.newest(feature.id, dimension, shownPerRevision),
      ]);
      const { partId: _, process: __, ...shown } = feature;
      return {
        feature: shown,
        dimension,
        revisions: revisions.map((revision) => {
          const rows = newest.filter((row) => row.revisionId === revision.id);
          const found = consensus.find(
            (row) => row.revisionId === revision.id && row.dimension === dimension,
          );
          return {
            revision,
            consensus: found?.consensus ?? null,
            readings: rows.map((row) => toMeasurement(row, found?.consensus ?? null)),
            more: (rows[0]?.total ?? 0) - rows.length,
          };
        }),
      };
    },

    /** Records a reading and makes the consensus anew in one transaction. */
    async add(
      accountId: number,
      input: AddMeasurement,
    ): Promise<{ measurement: Measurement; consensus: DimensionConsensus }> {
      return knex.transaction(async (trx) => {
        const feature = await store.holdFeature(input.featureId, trx);
        if (!feature)
          throw new FieldNotValid(
            'featureId',
            'is not a feature of the catalogue',
            'Choose one of the part.',
          );
        if (
          !(await store.revisionsOfPart(feature.partId)).some((revision) => revision.id === input.revisionId)
        ) {
          throw new FieldNotValid('revisionId', 'is not a revision of that part', 'Choose one of the part.');
        }
        if (input.photoId !== null && !(await store.ownsPhoto(accountId, input.photoId, trx))) {
          throw new FieldNotValid('photoId', 'is not a photo of yours', 'Add the photo first.');
        }
        const spec = dimensionSpec(feature.kind, input.dimension);
        if (!spec)
          throw new FieldNotValid(
            'dimension',
            'is not a dimension of that feature',
            'Choose one of the list.',
          );
        const id = await store.add(
          { ...input, ...toStoredUnit(input, spec), entered: input.values, accountId, createdAt: clock() },
          trx,
        );
        const consensus = (await refresh(input, feature, trx))!;
        const part = (await hardware.partsByIds([feature.partId])).get(feature.partId)!;
        await happenings.add(trx, {
          kind: 'reading-recorded',
          key: `reading-recorded:${id}`,
          title: `Reading: ${spec.label} of ${feature.name} on ${part.name}`,
          path: `/parts/${part.slug}`,
          actorId: accountId,
          about: {
            parts: [feature.partId],
            revisions: [input.revisionId],
            joints: await store.jointsOf(feature.id, trx),
          },
        });
        const title = `Reading: ${spec.label} of ${feature.name} on ${part.name}`;
        await deskInbox.firstPost(trx, { kind: 'reading', id, accountId, title });
        await deskInbox.photosUsed(trx, input.photoId === null ? [] : [input.photoId]);
        return { measurement: toMeasurement((await store.byId(id, trx))!, consensus), consensus };
      });
    },

    /** Makes every consensus of the features anew, after their readings or revisions have moved. */
    async remakeConsensus(featureIds: readonly number[], trx: Knex): Promise<void> {
      if (featureIds.length === 0) return;
      const features = new Map((await store.holdFeatures(featureIds, trx)).map((row) => [row.id, row]));
      const places = groupBy(
        await store.countedOfFeatures(featureIds, trx),
        ({ featureId, revisionId, dimension }) => `${featureId}/${revisionId}/${dimension}`,
      );
      const entries = [...places.values()].flatMap((readings) => {
        const place = readings[0]!;
        const { kind, process } = features.get(place.featureId)!;
        const unit = dimensionSpec(kind, place.dimension)?.unit ?? 'mm';
        const consensus = dimensionConsensus(readings, unit, process);
        return consensus ? [{ place, consensus }] : [];
      });
      await store.replaceConsensus(featureIds, entries, trx);
    },

    setAside(
      id: number,
      accountId: number,
      reason: string,
    ): Promise<{ consensus: DimensionConsensus | null }> {
      return knex.transaction((trx) => decideWithin(trx, id, accountId, reason));
    },

    takeBack(id: number, accountId: number): Promise<{ consensus: DimensionConsensus | null }> {
      return knex.transaction((trx) => decideWithin(trx, id, accountId, null));
    },
  };
}

function mapValues<Key, From, To>(map: Map<Key, From>, turn: (value: From) => To): Map<Key, To> {
  return new Map([...map].map(([key, value]) => [key, turn(value)]));
}

/**
 * Mean and standard uncertainty in mm or degrees. Repeats give a type A part (s/√n), the instrument the rest: what repeats
 * cannot show, its error, stays however often one reads (JCGM 100:2008, 4.3.7 and 5.1.2).
 */
function toStoredUnit(input: AddMeasurement, spec: DimensionSpec): { value: number; uncertainty: number } {
  const fitting: Record<string, readonly DimensionSpec['unit'][]> = {
    mm: ['mm'],
    in: ['mm'],
    deg: ['deg'],
    count: ['count'],
  };
  if (!fitting[input.unit]!.includes(spec.unit)) {
    throw new FieldNotValid(
      'unit',
      `does not suit ${spec.label}`,
      `Give it in ${spec.unit === 'mm' ? 'mm or inch' : spec.unit}.`,
    );
  }
  const factor = input.unit === 'in' ? millimetresPerInch : 1;
  const repeats = typeA(input.values);
  const value = repeats.mean * factor;
  const mayBeNegative =
    spec.name === 'bottom' || spec.name === 'top' || spec.name === 'profileShift' || spec.name === 'angle';
  if (!mayBeNegative && value <= 0)
    throw new FieldNotValid('values', 'must be more than zero', 'Check the figure and its unit.');
  const instrument =
    input.uncertainty === null ? usualUncertainty(input.instrument, spec.unit) : input.uncertainty * factor;
  return { value, uncertainty: Math.hypot(instrument, (repeats.standardUncertainty ?? 0) * factor) };
}

function toMeasurement(row: MeasurementRow, consensus: DimensionConsensus | null): Measurement {
  return {
    id: row.id,
    revisionId: row.revisionId,
    dimension: row.dimension,
    value: row.value,
    uncertainty: row.uncertainty,
    repeats: row.entered.length,
    entered: { values: row.entered, unit: row.unit },
    instrument: row.instrument,
    person: { id: row.accountId, displayName: row.displayName },
    createdAt: row.createdAt.toISOString(),
    photo: row.photo,
    setAside: row.setAside && {
      reason: row.setAside.reason,
      by: { id: row.setAside.byId, displayName: row.setAside.byName },
      at: row.setAside.at.toISOString(),
    },
    weight: row.setAside || !consensus ? 0 : sayOf(row, consensus),
    unitSlip: consensus !== null && consensus.count > 2 && isUnitSlip(row.value, consensus.mean),
  };
}
