import { z } from 'zod';
import { Feature, PartRef, Revision } from './hardware.js';
import { DimensionName } from './measurements.js';
import { Day, Id, Slug } from './primitives.js';
import { anyone, route } from './route.js';

/** A dimension that was read on two revisions or more, so that a reading of it can tell them apart. */
export const TellingDimension = z.object({
  feature: Feature,
  dimension: DimensionName,
  /** In the unit of the dimension: mm, degrees or a count. */
  revisions: z.array(z.object({ revisionId: Id, mean: z.number(), predictionSpread: z.number() })),
});
export type TellingDimension = z.infer<typeof TellingDimension>;

/** Something to be seen on the part without measuring, such as "clamp screw on the left". */
export const TellingMark = z.object({
  id: Id,
  text: z.string(),
  /** A revision that is not listed is not known to show it or not. */
  revisions: z.array(z.object({ revisionId: Id, shows: z.boolean() })),
});
export type TellingMark = z.infer<typeof TellingMark>;

/** All that shared/fit/which-revision.ts needs to find out which revision somebody holds. */
export const WhichOne = z.object({
  part: PartRef,
  /** Today; how long the newest revision has been sold is counted up to it. */
  asOf: Day,
  revisions: z.array(Revision),
  dimensions: z.array(TellingDimension),
  marks: z.array(TellingMark),
});
export type WhichOne = z.infer<typeof WhichOne>;

export const whichOneRoutes = {
  readWhichOne: route({
    method: 'get',
    path: '/api/parts/:slug/which-one',
    tag: 'hardware',
    access: anyone,
    summary:
      'What tells the revisions of a part apart: marks, and dimensions with their spread; mm and degrees',
    params: z.object({ slug: Slug }),
    response: WhichOne,
  }),
};
