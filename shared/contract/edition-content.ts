import { z } from 'zod';
import { Callouts } from './callouts.js';
import { Id, ItemKey, Slug, line, passage } from './primitives.js';
import { WorksheetRecord } from './worksheet.js';
import { Afterwards, FixKind, Instrument, Permanence, ReadingUnit } from './vocabulary.js';

/** Whether the write-up holds for a revision, as its author found it. A revision that is not listed is not known. */
export const RevisionMark = z.strictObject({ revisionId: Id, holds: z.boolean() });
export type RevisionMark = z.infer<typeof RevisionMark>;

export const JointSide = z.strictObject({
  partId: Id.nullable(),
  /** The mating feature in words: "raised lip round the shaft hole". */
  feature: line(120),
  revisions: z.array(RevisionMark).max(40),
});
export type JointSide = z.infer<typeof JointSide>;

export const JointEntry = z.strictObject({ a: JointSide, b: JointSide });
export type JointEntry = z.infer<typeof JointEntry>;

export const Reading = z.strictObject({
  key: ItemKey,
  revisionId: Id.nullable(),
  dimension: line(120),
  value: z.number().finite().min(-100_000).max(100_000).nullable(),
  unit: ReadingUnit,
  instrument: Instrument,
  /** Standard uncertainty in the reading's unit; null where the author gives none. */
  uncertainty: z.number().finite().min(0).max(100_000).nullable(),
});
export type Reading = z.infer<typeof Reading>;

/** The figure a trial must reach for the fix to stand as measured. */
export const Acceptance = z.strictObject({
  quantity: line(120, 1),
  comparison: z.enum(['at-most', 'at-least']),
  value: z.number().finite().min(-100_000).max(100_000),
  unit: ReadingUnit,
});
export type Acceptance = z.infer<typeof Acceptance>;

export const Step = z.strictObject({ key: ItemKey, text: passage(4000), photoId: Id.nullable() });
export type Step = z.infer<typeof Step>;

export const Fix = z.strictObject({
  key: ItemKey,
  title: line(140),
  kind: FixKind.nullable(),
  permanence: Permanence.nullable(),
  why: passage(4000),
  tools: z.array(line(80, 1)).max(30),
  materials: z.array(line(80, 1)).max(30),
  steps: z.array(Step).max(40),
  /** Revisions it holds for; empty: all for which the write-up holds. */
  revisionIds: z.array(Id).max(80),
  afterwards: z.array(Afterwards).max(6),
  afterwardsNote: line(300),
  acceptance: Acceptance.nullable(),
  /** How the author sized it; readers run it again with their own figures. Texts from before worksheets have none. */
  worksheet: WorksheetRecord.nullable().default(null),
});
export type Fix = z.infer<typeof Fix>;

export const PhotoUse = z.strictObject({
  photoId: Id,
  alt: line(300),
  caption: line(300),
  /** Arrows, rings and dimensions drawn on it here. Texts from before callouts have none. */
  callouts: Callouts.default([]),
});
export type PhotoUse = z.infer<typeof PhotoUse>;

/**
 * Everything an edition says. A draft may be as incomplete as its author likes; limits of length and shape hold always.
 * What is needed for the desk is told by `missingFromContent`.
 */
export const EditionContent = z.strictObject({
  title: line(140),
  summary: line(400),
  joints: z.array(JointEntry).max(4),
  symptoms: z.array(Slug).max(12),
  /** What the owner notices, in own words (Markdown). */
  noticed: passage(6000),
  /** Why it happens (Markdown). */
  cause: passage(10_000),
  readings: z.array(Reading).max(60),
  fixes: z.array(Fix).max(12),
  photos: z.array(PhotoUse).max(24),
  /** Where facts come from (Markdown). */
  sources: passage(4000),
});
export type EditionContent = z.infer<typeof EditionContent>;

export const emptyContent: EditionContent = {
  title: '',
  summary: '',
  joints: [],
  symptoms: [],
  noticed: '',
  cause: '',
  readings: [],
  fixes: [],
  photos: [],
  sources: '',
};
