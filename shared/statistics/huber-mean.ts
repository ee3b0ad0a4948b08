import { madToDeviation, medianDeviation, medianOf } from './median.js';
import { derSimonianLaird, type Result } from './random-effects.js';

/** Scales from the mean beyond which a reading is cut. */
export const huberLimit = 1.5;
/** Mean square of a standard normal variable cut at ±1.5: 2Φ(k) − 1 − 2kφ(k) + 2k²(1 − Φ(k)). */
const shareLeftByCut = 0.778465;
const mostRounds = 500;

export interface HuberMean {
  readonly mean: number;
  /** Standard uncertainty of the mean. */
  readonly uncertainty: number;
  /** Variance between results beyond their own uncertainties. */
  readonly betweenVariance: number;
  /** 1 where a result was taken whole, less where it was cut. */
  readonly weights: readonly number[];
  readonly converged: boolean;
}

/**
 * Huber's proposal 2 with k = 1.5 ("H15", RSC Analytical Methods Committee, Technical Brief 6, 2001) carried to results
 * with uncertainties of their own: each is cut to 1.5 times its scale √(u² + τ²) from the mean, then mean and τ² are
 * taken anew by DerSimonian–Laird with Q divided by the share of variance the cut leaves. With uncertainties near zero it
 * equals R's MASS::hubers. Breaks down when about a quarter of few results are far off the same way.
 * One unit throughout, uncertainties > 0. Throws RangeError on an empty list. Cost: O(n) a round, at most 500 rounds.
 */
export function huberMean(results: readonly Result[]): HuberMean {
  const values = results.map((result) => result.value);
  let mean = medianOf(values);
  let between = (madToDeviation * medianDeviation(values)) ** 2;
  for (let round = 1; ; round += 1) {
    const limits = results.map((result) => huberLimit * Math.sqrt(result.uncertainty ** 2 + between));
    const fit = derSimonianLaird(
      results.map((result, index) => ({
        value: mean + Math.min(Math.max(result.value - mean, -limits[index]!), limits[index]!),
        uncertainty: result.uncertainty,
      })),
      1 / shareLeftByCut,
    );
    const converged =
      Math.abs(fit.mean - mean) <= 1e-12 * Math.max(1, Math.abs(mean)) &&
      Math.abs(fit.betweenVariance - between) <= 1e-9 * (fit.betweenVariance + 1e-12);
    // Shorter steps where whole ones swing to and fro.
    const step = round < 50 ? 1 : 0.5;
    mean += step * (fit.mean - mean);
    between += step * (fit.betweenVariance - between);
    if (converged || round === mostRounds) {
      const weights = values.map((value, index) => Math.min(1, limits[index]! / Math.abs(value - mean)));
      return { mean, uncertainty: fit.uncertainty, betweenVariance: between, weights, converged };
    }
  }
}
