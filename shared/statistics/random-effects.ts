/** One result with its standard uncertainty (> 0), in one unit throughout. */
export interface Result {
  readonly value: number;
  readonly uncertainty: number;
}

export interface RandomEffects {
  readonly mean: number;
  /** Standard uncertainty of the mean. */
  readonly uncertainty: number;
  /** Variance between results beyond their own uncertainties, ≥ 0. */
  readonly betweenVariance: number;
  /** Cochran's Q of the fixed-effect mean. */
  readonly q: number;
}

/**
 * DerSimonian–Laird: moment estimate of the variance between results, then the weighted mean with weights
 * 1/(u² + τ²). Source: DerSimonian and Laird, Controlled Clinical Trials 7 (1986) 177-188. Same as metafor's
 * rma(method = "DL"). `inflation` (default 1) multiplies Q before the variance is taken, for values whose tails were
 * pulled in. Throws RangeError on an empty list or an uncertainty that is not positive.
 */
export function derSimonianLaird(results: readonly Result[], inflation = 1): RandomEffects {
  if (results.length === 0) throw new RangeError('At least one result is needed.');
  if (results.some((result) => !(result.uncertainty > 0)))
    throw new RangeError('Every result needs a positive standard uncertainty.');
  const fixed = results.map((result) => 1 / result.uncertainty ** 2);
  const total = sumOf(fixed);
  const fixedMean = sumOf(results.map((result, index) => result.value * fixed[index]!)) / total;
  const q = sumOf(results.map((result, index) => fixed[index]! * (result.value - fixedMean) ** 2));
  const scale = total - sumOf(fixed.map((weight) => weight ** 2)) / total;
  const betweenVariance = scale > 0 ? Math.max(0, (q * inflation - (results.length - 1)) / scale) : 0;
  const random = results.map((result) => 1 / (result.uncertainty ** 2 + betweenVariance));
  const randomTotal = sumOf(random);
  const mean = sumOf(results.map((result, index) => result.value * random[index]!)) / randomTotal;
  return { mean, uncertainty: 1 / Math.sqrt(randomTotal), betweenVariance, q };
}

function sumOf(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
