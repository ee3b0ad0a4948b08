import { huberLimit, huberMean } from './huber-mean.js';
import { madToDeviation, medianDeviation, medianOf } from './median.js';
import { coverage95 } from './normal-distribution.js';
import type { Result } from './random-effects.js';

/** How a part is made; sets the spread to expect between parts of one revision where readings do not tell. */
export type Process = 'machined' | 'printed' | 'cast';

/** Default spread between parts of one revision, mm, one standard deviation; common practice, no source. */
export const defaultSpread: Record<Process, number> = { machined: 0.015, printed: 0.08, cast: 0.15 };

export interface Consensus {
  readonly count: number;
  /** Mean of the dimension over the revision's parts. */
  readonly mean: number;
  /** Standard uncertainty of that mean. */
  readonly uncertainty: number;
  /** Standard deviation to expect of one more part, mean's uncertainty included: what a verdict uses. */
  readonly predictionSpread: number;
  /** Half width of the 95 % interval of the mean is 1.96 times `uncertainty`; given for display. */
  readonly interval: readonly [number, number];
  /** Two readings or fewer. */
  readonly thin: boolean;
  /** What each reading's say came down to, 0 to 1, in the order given: 1 where it was taken whole. */
  readonly weights: readonly number[];
  /** Indices of readings off by about 25.4 or 1/25.4: inch and millimetre confused. */
  readonly unitSlips: readonly number[];
  readonly converged: boolean;
}

/** A reading further than this many scales from the median is gross: a digit lost, another dimension read. */
const grossLimit = 10;
/**
 * Many people's readings of one dimension to one value, robust against the odd wrong one.
 *
 * Random-effects mean (DerSimonian–Laird) of readings whose residual beyond 1.5 times its scale √(u² + τ²) is cut to
 * 1.5 times it (Huber's proposal 2 as in RSC Analytical Methods Committee, Technical Brief 6 (2001), "H15"), from the
 * median and the median absolute deviation to a fixed point. Before that, readings without a say are left out: unit slips,
 * off from the median by a factor near 25.4 or 1/25.4, and gross ones, over 10 scales from it (scale² = u² + the larger of
 * 1.4826 MAD and the usual spread squared); Huber's mean alone would follow one gross reading of four. A single reading has the usual spread between parts added to its own
 * uncertainty, since it tells of one part only; of two or three the spread is at least `usualSpread` (≥ 0).
 * Values, spread and uncertainties in one unit; uncertainties standard and > 0. Throws RangeError on an empty list. Cost: O(n log n).
 */
export function consensusOf(readings: readonly Result[], usualSpread: number): Consensus {
  const unitSlips = findUnitSlips(readings.map((reading) => reading.value));
  const left = leftOut(readings, unitSlips, usualSpread);
  const counted = readings.filter((_, index) => !left.has(index));
  if (counted.length === 0) throw new RangeError('At least one reading is needed.');
  const robust = huberMean(counted);
  const spread =
    counted.length <= 3
      ? Math.max(Math.sqrt(robust.betweenVariance), usualSpread)
      : Math.sqrt(robust.betweenVariance);
  const uncertainty =
    counted.length <= 3 ? Math.max(robust.uncertainty, thinUncertainty(counted, spread)) : robust.uncertainty;
  let taken = 0;
  return {
    count: readings.length,
    mean: robust.mean,
    uncertainty,
    // A single reading's uncertainty has the spread between parts in it already.
    predictionSpread: counted.length === 1 ? uncertainty : Math.hypot(uncertainty, spread),
    interval: [robust.mean - coverage95 * uncertainty, robust.mean + coverage95 * uncertainty],
    thin: counted.length <= 2,
    weights: readings.map((_, index) => (left.has(index) ? 0 : robust.weights[taken++]!)),
    unitSlips,
    converged: robust.converged,
  };
}

/** Never from fewer than three readings, and always fewer than half: a median of the rest decides. */
function leftOut(
  readings: readonly Result[],
  unitSlips: readonly number[],
  usualSpread: number,
): Set<number> {
  const left = new Set(unitSlips);
  if (readings.length < 3) return left;
  const values = readings.map((reading) => reading.value);
  const middle = medianOf(values);
  const spread = Math.max(madToDeviation * medianDeviation(values), usualSpread);
  readings.forEach((reading, index) => {
    if (Math.abs(reading.value - middle) > grossLimit * Math.hypot(reading.uncertainty, spread))
      left.add(index);
  });
  return left;
}

function thinUncertainty(readings: readonly Result[], spread: number): number {
  return (
    1 /
    Math.sqrt(readings.reduce((total, reading) => total + 1 / (reading.uncertainty ** 2 + spread ** 2), 0))
  );
}

/**
 * What one reading's say came down to in a consensus that is known already: 1 within 1.5 times its scale √(u² + spread²),
 * falling with its distance beyond, 0 for a unit slip.
 */
export function sayOf(
  reading: Result,
  consensus: { mean: number; uncertainty: number; predictionSpread: number },
): number {
  if (isUnitSlip(reading.value, consensus.mean)) return 0;
  const spread = Math.max(0, consensus.predictionSpread ** 2 - consensus.uncertainty ** 2);
  const limit = huberLimit * Math.sqrt(reading.uncertainty ** 2 + spread);
  const residual = Math.abs(reading.value - consensus.mean);
  return residual <= limit ? 1 : limit / residual;
}

/** Whether a value is off from a middle one by a factor within 4 % of 25.4 or 1/25.4. */
export function isUnitSlip(value: number, middle: number): boolean {
  if (middle <= 0) return false;
  const ratio = value / middle;
  return Math.abs(ratio / 25.4 - 1) < 0.04 || Math.abs(ratio * 25.4 - 1) < 0.04;
}

/** Indices of unit slips against the median; of fewer than three readings nobody can tell which one is wrong. */
function findUnitSlips(values: readonly number[]): number[] {
  if (values.length < 3) return [];
  const median = medianOf(values);
  return values.flatMap((value, index) => (isUnitSlip(value, median) ? [index] : []));
}
