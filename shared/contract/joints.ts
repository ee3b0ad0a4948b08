import { z } from 'zod';
import { jointKindNames } from '../fit/joint-kinds.js';
import { Feature, PartRef, RevisionRef } from './hardware.js';
import { DimensionConsensus } from './measurements.js';
import { Id, IdText, Slug, passage } from './primitives.js';
import { anyone, route, signedIn } from './route.js';
import { Caution, FixView } from './write-ups.js';

export const Process = z.enum(['machined', 'printed', 'cast']);
export const FitVerdict = z.enum(['seats-with-room', 'seats-snugly', 'tight', 'will-not-seat', 'not-known']);
export const fitVerdictWords: Record<z.infer<typeof FitVerdict>, string> = {
  'seats-with-room': 'seats with room',
  'seats-snugly': 'seats snugly',
  tight: 'tight',
  'will-not-seat': 'will not seat',
  'not-known': 'not known',
};

export const JointRef = z.object({
  id: Id,
  slug: Slug,
  name: z.string(),
  kind: z.enum(jointKindNames),
  a: PartRef,
  b: PartRef,
});
export type JointRef = z.infer<typeof JointRef>;

/** One side of a joint: the feature, and what is known of it on each revision, oldest first. */
export const JointSidePage = z.object({
  part: PartRef,
  feature: Feature,
  process: Process,
  revisions: z.array(
    z.object({
      revision: RevisionRef,
      attributes: z.record(z.string(), z.string()),
      dimensions: z.record(z.string(), DimensionConsensus),
    }),
  ),
});
export type JointSidePage = z.infer<typeof JointSidePage>;

/** Chance predicted from measurements, moved by reports (shared/fit/evidence.ts). */
export const FitChance = z.object({
  predicted: z.number().nullable(),
  sat: z.number().int(),
  didNotSit: z.number().int(),
  chance: z.number().nullable(),
  /** 90 % interval of the moved chance. */
  interval: z.tuple([z.number(), z.number()]).nullable(),
  /** The reports speak strongly against the prediction: a reading or a label is probably wrong. */
  contradicts: z.boolean(),
});
export type FitChance = z.infer<typeof FitChance>;

export const FitCell = FitChance.extend({
  revisionA: Id,
  revisionB: Id,
  verdict: FitVerdict,
  sentence: z.string(),
  /** Write-ups with fixes that hold for this pair. */
  writeUps: z.array(Slug),
});
export type FitCell = z.infer<typeof FitCell>;

export const JointWriteUp = z.object({
  slug: Slug,
  title: z.string(),
  holdsFor: z.array(Id),
  cautions: z.array(Caution),
  fixes: z.array(
    FixView.pick({
      key: true,
      title: true,
      kind: true,
      permanence: true,
      standing: true,
      afterwards: true,
      cautions: true,
    }).extend({ revisionIds: z.array(Id) }),
  ),
});
export type JointWriteUp = z.infer<typeof JointWriteUp>;

export const JointPage = JointRef.extend({
  sideA: JointSidePage,
  sideB: JointSidePage,
  cells: z.array(FitCell),
  writeUps: z.array(JointWriteUp),
});
export type JointPage = z.infer<typeof JointPage>;

/** One joint between two parts somebody has or thinks of buying. */
export const FitCheckLine = z.object({
  joint: JointRef,
  revisionA: RevisionRef,
  revisionB: RevisionRef,
  verdict: FitVerdict,
  sentence: z.string(),
  chance: FitChance,
  writeUps: z.array(JointWriteUp),
});
export type FitCheckLine = z.infer<typeof FitCheckLine>;

export const ReportFit = z.strictObject({
  revisionA: Id,
  revisionB: Id,
  sat: z.boolean(),
  note: passage(1000),
});

/** A part that does the same work as others, for the revisions on the reader's bench. */
export const ComparedPart = z.object({
  part: PartRef,
  about: z.string(),
  price: z.string().nullable(),
  lines: z.array(FitCheckLine),
  trials: z.object({ held: z.number().int(), heldForAWhile: z.number().int(), didNotHelp: z.number().int() }),
  afterwards: z.array(z.string()),
});
export type ComparedPart = z.infer<typeof ComparedPart>;

const tag = 'joints';
const Revisions = z.array(IdText).max(100);

export const jointRoutes = {
  listJoints: route({
    method: 'get',
    path: '/api/joints',
    tag,
    access: anyone,
    summary: 'Known joints by name, all or those of one part',
    query: z.strictObject({ part: Slug.optional() }),
    response: z.object({ items: z.array(JointRef) }),
  }),
  readJoint: route({
    method: 'get',
    path: '/api/joints/:slug',
    tag,
    access: anyone,
    summary: 'A joint: both features, the fit table of their revisions, write-ups',
    params: z.object({ slug: Slug }),
    response: JointPage,
  }),
  reportFit: route({
    method: 'post',
    path: '/api/joints/:slug/reports',
    tag,
    access: signedIn,
    status: 201,
    summary:
      'Say whether a pair of revisions sat as delivered; one per person and pair, a second replaces the first',
    params: z.object({ slug: Slug }),
    body: ReportFit,
    response: FitCell,
  }),
  checkFit: route({
    method: 'get',
    path: '/api/fit-check',
    tag,
    access: anyone,
    summary: 'Every known joint between the revisions named, worst first',
    query: z.strictObject({ revision: Revisions.default([]) }),
    response: z.object({
      items: z.array(FitCheckLine),
      /** What the revisions named are, in the order of their identities; those that do not exist are left out. */
      stands: z.array(z.object({ part: PartRef, revision: RevisionRef })),
    }),
  }),
  compareParts: route({
    method: 'get',
    path: '/api/comparison',
    tag,
    access: anyone,
    summary: 'Parts that do the same work side by side for the revisions named; none is called best',
    query: z.strictObject({ part: z.array(Slug).max(6).default([]), revision: Revisions.default([]) }),
    response: z.object({ items: z.array(ComparedPart) }),
  }),
};
