import { medianDeviation, medianOf } from './median.js';
import { derSimonianLaird, type Result } from './random-effects.js';

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

const huberLimit = 1.5;
/** Mean square of a standard normal variable cut at ±1.5: 2Φ(k) − 1 − 2kφ(k) + 2k²(1 − Φ(k)). */
const shareLeftByCut = 0.778465;
const z95 = 1.959963984540054;

/**
 * Many people's readings of one dimension to one value, robust against the odd wrong one.
 *
 * Random-effects mean (DerSimonian–Laird) of readings whose residual beyond 1.5 times its scale √(u² + τ²) is cut to
 * 1.5 times it (Huber's proposal 2 as in RSC Analytical Methods Committee, Technical Brief 6 (2001), "H15"), from the
 * median and the median absolute deviation to a fixed point. A reading off from the median by a factor near 25.4 or
 * 1/25.4 is named a unit slip and has no say. A single reading has the default spread of the process added to its own
 * uncertainty, since it tells of one part only; of two or three the spread between parts is at least that default.
 * Values in mm, uncertainties standard and > 0. Throws RangeError on an empty list. Cost: O(n log n).
 */
export function consensusOf(readings: readonly Result[], process: Process): Consensus {
  const unitSlips = findUnitSlips(readings.map((reading) => reading.value));
  const counted = readings.filter((_, index) => !unitSlips.includes(index));
  if (counted.length === 0) throw new RangeError('At least one reading is needed.');
  const robust = robustMean(counted);
  const spread =
    counted.length <= 3
      ? Math.max(Math.sqrt(robust.betweenVariance), defaultSpread[process])
      : Math.sqrt(robust.betweenVariance);
  const uncertainty =
    counted.length <= 3 ? Math.max(robust.uncertainty, thinUncertainty(counted, spread)) : robust.uncertainty;
  const weights = [...robust.weights];
  return {
    count: readings.length,
    mean: robust.mean,
    uncertainty,
    // A single reading's uncertainty has the spread between parts in it already.
    predictionSpread: counted.length === 1 ? uncertainty : Math.hypot(uncertainty, spread),
    interval: [robust.mean - z95 * uncertainty, robust.mean + z95 * uncertainty],
    thin: counted.length <= 2,
    weights: readings.map((_, index) => (unitSlips.includes(index) ? 0 : weights.shift()!)),
    unitSlips,
    converged: robust.converged,
  };
}

function thinUncertainty(readings: readonly Result[], spread: number): number {
  return (
    1 /
    Math.sqrt(readings.reduce((total, reading) => total + 1 / (reading.uncertainty ** 2 + spread ** 2), 0))
  );
}

function robustMean(readings: readonly Result[]): {
  mean: number;
  uncertainty: number;
  betweenVariance: number;
  weights: number[];
  converged: boolean;
} {
  const values = readings.map((reading) => reading.value);
  let mean = medianOf(values);
  let between = (1.4826 * medianDeviation(values)) ** 2;
  for (let round = 1; ; round += 1) {
    const limits = readings.map((reading) => huberLimit * Math.sqrt(reading.uncertainty ** 2 + between));
    const cut = readings.map((reading, index) => ({
      value: mean + Math.min(Math.max(reading.value - mean, -limits[index]!), limits[index]!),
      uncertainty: reading.uncertainty,
    }));
    const anyCut = cut.some((reading, index) => reading.value !== values[index]);
    const fit = derSimonianLaird(cut, anyCut ? 1 / shareLeftByCut : 1);
    const converged =
      Math.abs(fit.mean - mean) <= 1e-12 * Math.max(1, Math.abs(mean)) &&
      Math.abs(fit.betweenVariance - between) <= 1e-9 * (fit.betweenVariance + 1e-12);
    mean = fit.mean;
    between = fit.betweenVariance;
    if (converged || round === 500) {
      const weights = values.map((value, index) => {
        const residual = Math.abs(value - mean);
        return residual <= limits[index]! ? 1 : limits[index]! / residual;
      });
      return { mean, uncertainty: fit.uncertainty, betweenVariance: between, weights, converged };
    }
  }
}

/** Readings whose ratio to the median is within 4 % of 25.4 or 1/25.4; never a majority, never fewer than three readings. */
function findUnitSlips(values: readonly number[]): number[] {
  if (values.length < 3) return [];
  const median = medianOf(values);
  if (median <= 0) return [];
  return values.flatMap((value, index) => {
    const ratio = value / median;
    return Math.abs(ratio / 25.4 - 1) < 0.04 || Math.abs(ratio * 25.4 - 1) < 0.04 ? [index] : [];
  });
}
