import type { Process } from '../statistics/consensus.js';
import type { Dimension } from './dimension.js';
import { dimensionSpec, featureSpecs } from './feature-dimensions.js';
import type { JointVerdict, MissingReading } from './joint-answer.js';
import { judges, type Reader } from './joint-judges.js';
import { jointKinds, type JointKind } from './joint-kinds.js';

export type { JointVerdict, MissingReading };

/** What is known of a feature of the one part in the reader's hand: dimensions in mm or degrees, attributes in words. */
export interface FeatureOnHand {
  readonly dimensions: Readonly<Record<string, Dimension | undefined>>;
  readonly attributes: Readonly<Record<string, string | undefined>>;
  readonly process: Process;
}

/** The rougher of two processes decides snug limits. */
const roughness: Record<Process, number> = { machined: 0, printed: 1, cast: 2 };

/**
 * Verdict for two features by the kind of their joint. Lengths mm, angles degrees. A missing dimension never throws: it is
 * named in `missing` with how to read it. RangeError where a dimension lies outside the range of its judge.
 */
export function judgeJoint(kind: JointKind, a: FeatureOnHand, b: FeatureOnHand): JointVerdict {
  const process = roughness[a.process] >= roughness[b.process] ? a.process : b.process;
  const result = judges[kind](reader(a), reader(b), process);
  return {
    ...empty,
    ...result,
    missing: result.missing.map(([side, name]) => describeMissing(kind, side, name)),
  };
}

const empty = {
  margin: null,
  marginOf: 'clearance on diameter',
  chance: null,
  touches: null,
  gap: null,
  tilt: null,
  freeAngles: null,
  turnNeeded: null,
  isoFit: null,
};

function reader(feature: FeatureOnHand): Reader {
  return {
    dim: (name) => feature.dimensions[name] ?? null,
    word: (name) => feature.attributes[name] ?? null,
  };
}

function describeMissing(kind: JointKind, side: 'a' | 'b', name: string): MissingReading {
  const featureKind = jointKinds[kind][side];
  const dimension = dimensionSpec(featureKind, name);
  const attribute = featureSpecs[featureKind].attributes.find((entry) => entry.name === name);
  return {
    side,
    name,
    label: dimension?.label ?? attribute?.label ?? name,
    howTo: dimension?.howTo ?? 'Read it off the part or its drawing.',
  };
}
