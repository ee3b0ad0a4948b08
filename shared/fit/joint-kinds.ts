import type { FeatureKind } from '../contract/vocabulary.js';

/** Kinds of seat between two features, with the feature kind of each side. */
export const jointKinds = {
  'boss-recess': { label: 'boss in recess', a: 'boss', b: 'recess' },
  'barrel-bore': { label: 'barrel in bore', a: 'barrel', b: 'bore' },
  'thread-pair': { label: 'thread in thread', a: 'thread', b: 'thread' },
  'hole-pattern': { label: 'plate on tapped holes', a: 'hole-pattern', b: 'hole-pattern' },
  'barrel-clamp': { label: 'barrel in split ring', a: 'barrel', b: 'bore' },
  'shaft-bore': { label: 'shaft in bore', a: 'shaft', b: 'bore' },
  dovetail: { label: 'dovetail bar in clamp', a: 'dovetail', b: 'dovetail' },
  envelope: { label: 'body past an obstruction', a: 'envelope', b: 'envelope' },
} as const satisfies Record<string, { label: string; a: FeatureKind; b: FeatureKind }>;

export type JointKind = keyof typeof jointKinds;
export const jointKindNames = Object.keys(jointKinds) as [JointKind, ...JointKind[]];
