import type { JointPage, JointSidePage } from '../../../shared/contract/joints';
import type { DimensionConsensus } from '../../../shared/contract/measurements';
import { inchToMillimetre, type Dimension } from '../../../shared/fit/dimension';
import { featureSpecs } from '../../../shared/fit/feature-dimensions';
import { usualUncertainty } from '../../../shared/fit/instruments';
import type { JointKind } from '../../../shared/fit/joint-kinds';
import {
  judgeJoint,
  type FeatureOnHand,
  type JointVerdict,
  type MissingReading,
} from '../../../shared/fit/joint-verdict';
import { readFigure, type OwnReadings, type Side } from './own-readings';

/** Verdict of a pair, or in words why what was entered cannot be right. */
export type Judged =
  | { readonly verdict: JointVerdict; readonly wrong: null }
  | { readonly verdict: null; readonly wrong: string };

/**
 * The one part in the reader's hand: the consensus of its revision with the spread to expect of one more part, replaced
 * dimension by dimension by what the reader has read. What is no figure replaces nothing.
 */
export function onHand(
  side: JointSidePage,
  revisionId: number,
  name: Side,
  own: OwnReadings | null,
): FeatureOnHand {
  const known = side.revisions.find(({ revision }) => revision.id === revisionId);
  const dimensions: Record<string, Dimension> = {};
  for (const [dimension, consensus] of Object.entries(known?.dimensions ?? {}))
    dimensions[dimension] = predicted(consensus);
  const attributes: Record<string, string> = { ...known?.attributes };
  const specs = featureSpecs[side.feature.kind];
  for (const spec of specs.dimensions) {
    const value = own ? readFigure(own[name][spec.name] ?? '') : null;
    if (own && value !== null) {
      const inches = spec.unit === 'mm' && own.unit === 'in';
      dimensions[spec.name] = {
        value: inches ? inchToMillimetre(value) : value,
        uncertainty: usualUncertainty(own.instrument, spec.unit),
        source: { kind: 'own-reading' },
      };
    }
  }
  for (const spec of specs.attributes) {
    const word = own?.[name][spec.name]?.trim();
    if (word && (!spec.options || spec.options.includes(word))) attributes[spec.name] = word;
  }
  return { dimensions, attributes, process: side.process };
}

function predicted(consensus: DimensionConsensus): Dimension {
  return {
    value: consensus.mean,
    uncertainty: consensus.predictionSpread,
    source: {
      kind: 'consensus',
      readings: consensus.count,
      thin: consensus.thin,
    },
  };
}

/** Judges two features; figures outside the range of the judge come back as words, not as an error. */
export function judge(kind: JointKind, a: FeatureOnHand, b: FeatureOnHand): Judged {
  try {
    return { verdict: judgeJoint(kind, a, b), wrong: null };
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return { verdict: null, wrong: error.message };
  }
}

/** What nobody has read of a pair yet, and how to read it. */
export function missingOf(joint: JointPage, revisionA: number, revisionB: number): readonly MissingReading[] {
  const a = onHand(joint.sideA, revisionA, 'a', null);
  const b = onHand(joint.sideB, revisionB, 'b', null);
  return judge(joint.kind, a, b).verdict?.missing ?? [];
}
