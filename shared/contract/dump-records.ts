import { z } from 'zod';
import { FixKind, HazardKind, Permanence, SignalWord, Standing, TrialOutcome } from './vocabulary.js';
import { licence } from './licence.js';
import { Day, Instant, Slug } from './primitives.js';

/** Name to give credit to. */
const By = z.string().describe('Name to credit; several people may have the same');
const Markdown = z.string().describe('Markdown as written');
const Revision = z.strictObject({ part: Slug, revision: z.string() });

const Header = z
  .strictObject({
    kind: z.literal('shimlore'),
    version: z.literal(1),
    licence: z.literal(licence.spdx).describe('SPDX identifier'),
    attribution: z.string(),
    address: z.string(),
    schema: z.string(),
    createdAt: Instant,
    counts: z.record(z.string(), z.int()),
  })
  .describe('The first line');

const Maker = z.strictObject({ kind: z.literal('maker'), slug: Slug, name: z.string(), about: z.string() });
const Part = z.strictObject({
  kind: z.literal('part'),
  slug: Slug,
  maker: Slug,
  name: z.string(),
  partKind: z.string(),
  about: z.string(),
  priceBand: z.string().nullable(),
});
const RevisionRecord = z.strictObject({
  kind: z.literal('revision'),
  part: Slug,
  label: z.string(),
  position: z.int().describe('Order on the time line, the oldest first'),
  state: z.enum(['sold', 'announced']),
  soldFrom: Day.nullable(),
  soldTo: Day.nullable().describe('Up to, not including, this day'),
  howToTell: z.string(),
  whatChanged: z.string(),
});
const Feature = z.strictObject({
  kind: z.literal('feature'),
  part: Slug,
  slug: Slug,
  name: z.string(),
  featureKind: z.string(),
  process: z.string(),
});
const place = { part: Slug, feature: Slug, revision: z.string(), dimension: z.string() };
const Consensus = z
  .strictObject({
    kind: z.literal('consensus'),
    ...place,
    count: z.int(),
    mean: z.number(),
    uncertainty: z.number(),
    thin: z.boolean().describe('Too few readings to rely on'),
  })
  .describe('What the readings of one dimension agree on; mm or degrees, standard uncertainty');
const Reading = z
  .strictObject({
    kind: z.literal('reading'),
    ...place,
    value: z.number(),
    uncertainty: z.number(),
    entered: z.array(z.number()),
    unit: z.string(),
    instrument: z.string(),
    by: By,
    at: Instant,
  })
  .describe('Value and standard uncertainty in mm or degrees; `entered` in `unit`');
const side = z.strictObject({ part: Slug, feature: Slug });
const Joint = z.strictObject({
  kind: z.literal('joint'),
  slug: Slug,
  name: z.string(),
  jointKind: z.string(),
  a: side,
  b: side,
});
const FitReport = z.strictObject({
  kind: z.literal('fit-report'),
  joint: Slug,
  revisionA: z.string(),
  revisionB: z.string(),
  sat: z.boolean(),
  note: z.string(),
  by: By,
  at: Instant,
});
const FixRecord = z.strictObject({
  key: z.string(),
  title: z.string(),
  kind: FixKind.nullable(),
  permanence: Permanence.nullable(),
  standing: Standing,
  why: Markdown,
  tools: z.array(z.string()),
  materials: z.array(z.string()),
  steps: z.array(Markdown),
  revisions: z.array(Revision).describe('Empty: all for which the write-up holds'),
  afterwards: z.array(z.string()),
  afterwardsNote: z.string(),
  acceptance: z.unknown(),
});
const WriteUp = z.strictObject({
  kind: z.literal('write-up'),
  slug: Slug,
  edition: z.int(),
  authors: z.array(By),
  firstPublishedAt: Instant,
  publishedAt: Instant,
  title: z.string(),
  summary: z.string(),
  joints: z.array(
    z.array(
      z.strictObject({
        part: Slug,
        feature: z.string(),
        holdsFor: z.array(z.string()),
        notFor: z.array(z.string()),
      }),
    ),
  ),
  symptoms: z.array(Slug),
  noticed: Markdown,
  cause: Markdown,
  readings: z.array(z.unknown()),
  fixes: z.array(FixRecord),
  photos: z.array(z.strictObject({ file: z.string(), alt: z.string(), caption: z.string(), by: By })),
  sources: Markdown,
});
const Caution = z
  .strictObject({
    kind: z.literal('caution'),
    writeUp: Slug,
    fix: z.string().nullable().describe('Key of the fix; null: the whole write-up'),
    step: z.string().nullable(),
    signalWord: SignalWord,
    hazards: z.array(HazardKind),
    hazard: z.string(),
    consequence: z.string(),
    avoidance: z.string(),
    at: Instant,
  })
  .describe('Show it wherever you show the write-up or the fix');
const Trial = z.strictObject({
  kind: z.literal('trial'),
  writeUp: Slug,
  fix: z.string(),
  outcome: TrialOutcome,
  note: z.string(),
  figure: z.number().nullable(),
  revisions: z.array(Revision),
  by: By,
  at: Instant,
});
const Question = z.strictObject({
  kind: z.literal('question'),
  slug: Slug,
  title: z.string(),
  text: Markdown,
  parts: z.array(z.strictObject({ part: Slug, revision: z.string().nullable() })),
  readings: z.array(z.unknown()),
  settledBy: z.strictObject({ writeUp: Slug, fix: z.string() }).nullable(),
  by: By,
  at: Instant,
});
const Reply = z.strictObject({
  kind: z.literal('reply'),
  question: Slug,
  text: Markdown,
  by: By,
  at: Instant,
});

/** One line of the dump. */
export const DumpRecord = z.discriminatedUnion('kind', [
  Header,
  Maker,
  Part,
  RevisionRecord,
  Feature,
  Consensus,
  Reading,
  Joint,
  FitReport,
  WriteUp,
  Caution,
  Trial,
  Question,
  Reply,
]);
export type DumpRecord = z.infer<typeof DumpRecord>;
export type DumpHeader = z.infer<typeof Header>;
export type WriteUpRecord = z.infer<typeof WriteUp>;
/** Every line but the first. */
export type BodyRecord = Exclude<DumpRecord, DumpHeader>;
