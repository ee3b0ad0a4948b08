import { z } from 'zod';
import { Id, IdText, Instant, Slug, line } from './primitives.js';
import { Feature, RevisionRef } from './hardware.js';
import { Photo } from './photos.js';
import { anyone, moderators, route, signedIn } from './route.js';
import { Instrument } from './vocabulary.js';
import { PersonRef } from './write-ups.js';

/** Name of a dimension of a feature kind, as in shared/fit/feature-dimensions.ts. */
export const DimensionName = z.string().regex(/^[a-z][A-Za-z]{1,39}$/, 'is not the name of a dimension');
export const MeasurementUnit = z.enum(['mm', 'in', 'deg', 'count']);
export type MeasurementUnit = z.infer<typeof MeasurementUnit>;

/** What many readings of one dimension of one revision come to; lengths in mm, angles in degrees. */
export const DimensionConsensus = z.object({
  count: z.number().int(),
  mean: z.number(),
  /** Standard uncertainty of the mean. */
  uncertainty: z.number(),
  /** Standard deviation to expect of one more part. */
  predictionSpread: z.number(),
  /** 95 % interval of the mean. */
  low: z.number(),
  high: z.number(),
  /** Two readings or fewer. */
  thin: z.boolean(),
  unitSlips: z.number().int(),
});
export type DimensionConsensus = z.infer<typeof DimensionConsensus>;

export const Measurement = z.object({
  id: Id,
  revisionId: Id,
  dimension: z.string(),
  /** Mean of the readings, mm or degrees. */
  value: z.number(),
  /** Standard uncertainty, mm or degrees. */
  uncertainty: z.number(),
  repeats: z.number().int(),
  /** As typed. */
  entered: z.object({ values: z.array(z.number()), unit: MeasurementUnit }),
  instrument: Instrument,
  person: PersonRef,
  createdAt: Instant,
  /** Of the reading being taken. */
  photo: Photo.nullable(),
  /** Set aside by a moderator: shown, but without a say. */
  setAside: z.object({ reason: z.string(), by: PersonRef, at: Instant }).nullable(),
  /** What its say in the consensus came down to, 0 to 1. */
  weight: z.number(),
  /** Off by about 25.4 or 1/25.4. */
  unitSlip: z.boolean(),
});
export type Measurement = z.infer<typeof Measurement>;

/** Everything measured on a part: one entry for each dimension that somebody has read. */
export const PartMeasurements = z.object({
  features: z.array(
    Feature.extend({
      process: z.enum(['machined', 'printed', 'cast']),
      revisions: z.array(
        z.object({
          revision: RevisionRef,
          attributes: z.record(z.string(), z.string()),
          dimensions: z.array(z.object({ name: z.string(), consensus: DimensionConsensus })),
        }),
      ),
    }),
  ),
});
export type PartMeasurements = z.infer<typeof PartMeasurements>;

export const DimensionReadings = z.object({
  feature: Feature,
  dimension: z.string(),
  revisions: z.array(
    z.object({
      revision: RevisionRef,
      consensus: DimensionConsensus.nullable(),
      readings: z.array(Measurement),
      more: z.number().int(),
    }),
  ),
});
export type DimensionReadings = z.infer<typeof DimensionReadings>;

export const AddMeasurement = z.strictObject({
  featureId: Id,
  revisionId: Id,
  dimension: DimensionName,
  /** One reading or repeats of it, in the unit named. */
  values: z
    .array(z.number().finite().min(-100_000).max(100_000))
    .min(1, 'takes at least one reading')
    .max(20, 'takes at most 20 repeats'),
  unit: MeasurementUnit,
  instrument: Instrument,
  /** Standard uncertainty in the unit named; null: the instrument's usual one. */
  uncertainty: z.number().finite().positive('is more than zero').max(1000).nullable(),
  photoId: Id.nullable(),
});
export type AddMeasurement = z.infer<typeof AddMeasurement>;

const tag = 'measurements';
const byId = z.object({ id: IdText });

export const measurementRoutes = {
  readPartMeasurements: route({
    method: 'get',
    path: '/api/parts/:slug/measurements',
    tag,
    access: anyone,
    summary: 'Consensus of each dimension that was read, by feature and revision; mm and degrees',
    params: z.object({ slug: Slug }),
    response: PartMeasurements,
  }),
  readDimension: route({
    method: 'get',
    path: '/api/parts/:slug/features/:feature/dimensions/:dimension',
    tag,
    access: anyone,
    summary: 'All readings of one dimension on every revision, newest first, at most 200 a revision',
    params: z.object({ slug: Slug, feature: Slug, dimension: DimensionName }),
    response: DimensionReadings,
  }),
  addMeasurement: route({
    method: 'post',
    path: '/api/measurements',
    tag,
    access: signedIn,
    status: 201,
    summary: 'Record a reading; the consensus follows at once',
    body: AddMeasurement,
    response: z.object({ measurement: Measurement, consensus: DimensionConsensus }),
    problems: ['too-many-requests'],
  }),
  setAsideMeasurement: route({
    method: 'post',
    path: '/api/measurements/:id/set-aside',
    tag,
    access: moderators,
    summary: 'Set a reading aside with a reason; it stays on show',
    params: byId,
    body: z.strictObject({ reason: line(300, 5) }),
    response: z.object({ consensus: DimensionConsensus.nullable() }),
    problems: ['already-there'],
  }),
  takeBackMeasurement: route({
    method: 'post',
    path: '/api/measurements/:id/take-back',
    tag,
    access: moderators,
    summary: 'Give a reading that was set aside its say again',
    params: byId,
    response: z.object({ consensus: DimensionConsensus.nullable() }),
  }),
};
