import { checkDimension, figure, type Dimension, type Figure } from './dimension.js';
import { chancePositive, verdictOf, type SeatVerdict } from './verdict.js';

export interface DovetailSide {
  /** Width at its reference height, mm. */
  readonly width: Dimension | null;
  /** Height above the wide face at which the width was read, mm. */
  readonly referenceHeight: Dimension | null;
  /** Angle of the flanks against the wide face, degrees. */
  readonly flankAngle: Dimension | null;
}

export interface DovetailResult {
  readonly verdict: SeatVerdict;
  readonly trouble: 'too-wide' | 'flank-angle' | null;
  /** Clamp opening minus bar at the bar's reference height, mm. */
  readonly clearance: Figure | null;
  readonly chance: number | null;
  /** Difference of flank angles, degrees: from 2° on the bar sits on an edge; common practice, no source. */
  readonly angleDifference: Figure | null;
  readonly missing: readonly string[];
}

/** Difference of flank angles from which the bar carries on an edge only, degrees. */
const edgeContactFrom = 2;

/**
 * A dovetail bar in a clamp opened all the way. The clamp's width is carried to the bar's reference height along its flank:
 * w(h) = w0 − 2·(h − h0)/tan(flank). Lengths mm, angles degrees in (20, 90]. RangeError outside.
 */
export function judgeDovetail(bar: DovetailSide, clamp: DovetailSide): DovetailResult {
  const missing = Object.entries({
    'bar.width': bar.width,
    'bar.referenceHeight': bar.referenceHeight,
    'bar.flankAngle': bar.flankAngle,
    'clamp.width': clamp.width,
    'clamp.referenceHeight': clamp.referenceHeight,
    'clamp.flankAngle': clamp.flankAngle,
  }).flatMap(([name, value]) => (value === null ? [name] : []));
  if (
    !bar.width ||
    !clamp.width ||
    !bar.referenceHeight ||
    !clamp.referenceHeight ||
    !bar.flankAngle ||
    !clamp.flankAngle
  ) {
    return {
      verdict: 'not-known',
      trouble: null,
      clearance: null,
      chance: null,
      angleDifference: null,
      missing,
    };
  }
  checkDimension(bar.width, 'the width of the bar');
  checkDimension(clamp.width, 'the opening of the clamp');
  for (const angle of [bar.flankAngle.value, clamp.flankAngle.value]) {
    if (!(angle > 20 && angle <= 90)) throw new RangeError('A flank angle lies over 20° and up to 90°.');
  }
  const rise = bar.referenceHeight.value - clamp.referenceHeight.value;
  const slope = 2 / Math.tan(radians(clamp.flankAngle.value));
  const opening = clamp.width.value - rise * slope;
  const slopeByDegree = (2 / Math.sin(radians(clamp.flankAngle.value)) ** 2) * radians(1);
  const uncertainty = Math.hypot(
    bar.width.uncertainty,
    clamp.width.uncertainty,
    slope * bar.referenceHeight.uncertainty,
    slope * clamp.referenceHeight.uncertainty,
    rise * slopeByDegree * clamp.flankAngle.uncertainty,
  );
  const clearance = figure(opening - bar.width.value, uncertainty);
  const angleDifference = figure(
    Math.abs(bar.flankAngle.value - clamp.flankAngle.value),
    Math.hypot(bar.flankAngle.uncertainty, clamp.flankAngle.uncertainty),
  );
  const enters = chancePositive(clearance);
  const onEdge = angleDifference.value >= edgeContactFrom;
  const verdict = verdictOf(enters, clearance.value, 0.2);
  return {
    verdict: onEdge && enters >= 0.95 ? 'tight' : verdict,
    trouble: enters < 0.5 ? 'too-wide' : onEdge ? 'flank-angle' : null,
    clearance,
    chance: enters,
    angleDifference,
    missing,
  };
}

function radians(degrees: number): number {
  return (degrees * Math.PI) / 180;
}
