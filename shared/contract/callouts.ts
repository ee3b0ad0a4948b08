import { z } from 'zod';
import { ItemKey, line } from './primitives.js';

/** How many callouts one photo takes; more hide what they point at. */
export const mostCallouts = 20;

const share = (what: string) =>
  z
    .number(`takes a number from 0 to 1, a share of the photo’s ${what}`)
    .min(0, `lies outside the photo: takes 0 to 1 of its ${what}`)
    .max(1, `lies outside the photo: takes 0 to 1 of its ${what}`);

/** A place on a photo: shares of its width from the left and of its height from the top, each 0 to 1. */
export const PhotoPoint = z.strictObject({ x: share('width'), y: share('height') });
export type PhotoPoint = z.infer<typeof PhotoPoint>;

/** Units that a dimension drawn on a photo can have. */
export const CalloutUnit = z.enum(['mm', 'in', 'um', 'deg']);
export type CalloutUnit = z.infer<typeof CalloutUnit>;

const named = {
  /** Stays the same across editions, so that a comparison knows the callout again. */
  key: ItemKey,
  /** What it points at: "lip". May be empty. */
  label: line(80),
};

/** Points from `from`, where its label stands, to `to`, where its head is. */
export const ArrowCallout = z.strictObject({
  kind: z.literal('arrow'),
  ...named,
  from: PhotoPoint,
  to: PhotoPoint,
});

/** A circle, true on photos of any shape: `radius` is a share of the photo's width. It may reach beyond the edge. */
export const RingCallout = z.strictObject({
  kind: z.literal('ring'),
  ...named,
  centre: PhotoPoint,
  radius: z
    .number('takes a number from 0.005 to 1, a share of the photo’s width')
    .min(0.005, 'takes at least 0.005 of the photo’s width')
    .max(1, 'takes at most the photo’s width'),
});

/** A length or angle read between two places; `value` is what was measured, not what the photo would give, null where not known. */
export const DimensionCallout = z.strictObject({
  kind: z.literal('dimension'),
  ...named,
  from: PhotoPoint,
  to: PhotoPoint,
  value: z.number().finite().min(-100_000).max(100_000).nullable(),
  unit: CalloutUnit,
});

/**
 * Something drawn on a photo. It is kept as figures beside the photo, never painted into it, so that it stays sharp at any
 * size, can be changed and can be read aloud.
 */
export const Callout = z.discriminatedUnion('kind', [ArrowCallout, RingCallout, DimensionCallout], {
  error: 'takes an arrow, a ring or a dimension',
});
export type Callout = z.infer<typeof Callout>;
export type CalloutKind = Callout['kind'];
export type ArrowCallout = z.infer<typeof ArrowCallout>;
export type RingCallout = z.infer<typeof RingCallout>;
export type DimensionCallout = z.infer<typeof DimensionCallout>;

/** The callouts of one use of a photo, in the order in which they are drawn and read out. */
export const Callouts = z
  .array(Callout)
  .max(mostCallouts, `takes at most ${mostCallouts} callouts`)
  .superRefine((callouts, context) => {
    const seen = new Set<string>();
    callouts.forEach(({ key }, index) => {
      if (seen.has(key))
        context.addIssue({ code: 'custom', path: [index, 'key'], message: 'stands twice on this photo' });
      seen.add(key);
    });
  });
