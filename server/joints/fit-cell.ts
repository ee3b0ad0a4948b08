import type { FitChance } from '../../shared/contract/joints.js';
import type { DimensionConsensus } from '../../shared/contract/measurements.js';
import type { Dimension } from '../../shared/fit/dimension.js';
import { moveChance } from '../../shared/fit/evidence.js';
import type { JointKind } from '../../shared/fit/joint-kinds.js';
import { judgeJoint, type FeatureOnHand, type JointVerdict } from '../../shared/fit/joint-verdict.js';
import type { Process } from '../../shared/statistics/consensus.js';

/** What is known of a feature on one revision. */
export interface KnownFeature {
  readonly process: Process;
  readonly attributes: Readonly<Record<string, string>>;
  readonly dimensions: Readonly<Record<string, DimensionConsensus>>;
}

/** The one part in somebody's hand: the consensus with the spread to expect of one more part. */
export function onHand(known: KnownFeature): FeatureOnHand {
  return {
    process: known.process,
    attributes: known.attributes,
    dimensions: Object.fromEntries(
      Object.entries(known.dimensions).map(([name, consensus]) => [name, toDimension(consensus)]),
    ),
  };
}

function toDimension(consensus: DimensionConsensus): Dimension {
  return {
    value: consensus.mean,
    uncertainty: consensus.predictionSpread,
    source: { kind: 'consensus', readings: consensus.count, thin: consensus.thin },
  };
}

/** Verdict of a pair; readings that exclude each other leave it not known, and say so. */
export function verdictOfPair(kind: JointKind, a: KnownFeature, b: KnownFeature): JointVerdict {
  try {
    return judgeJoint(kind, onHand(a), onHand(b));
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return { ...notKnown, sentence: `The readings cannot be right together: ${error.message}` };
  }
}

const notKnown: JointVerdict = {
  verdict: 'not-known',
  margin: null,
  marginOf: '',
  chance: null,
  touches: null,
  gap: null,
  tilt: null,
  freeAngles: null,
  turnNeeded: null,
  isoFit: null,
  sentence: '',
  missing: [],
};

/** The predicted chance moved by one voice per person; without a prediction the voices alone tell, from an even prior. */
export function chanceOf(predicted: number | null, voices: { sat: number; didNotSit: number }): FitChance {
  const { sat, didNotSit } = voices;
  if (predicted === null && sat + didNotSit === 0) {
    return { predicted, sat, didNotSit, chance: null, interval: null, contradicts: false };
  }
  const moved = moveChance({ predicted: predicted ?? 0.5, sat, didNotSit });
  return {
    predicted,
    sat,
    didNotSit,
    chance: moved.chance,
    interval: [moved.interval[0], moved.interval[1]],
    contradicts: predicted !== null && moved.contradicts,
  };
}
