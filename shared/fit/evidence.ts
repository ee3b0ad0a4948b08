import { betaQuantile, logGamma } from '../statistics/beta-distribution.js';

export interface Evidence {
  /** Predicted chance that the pair sits as delivered. */
  readonly predicted: number;
  /** One per person. */
  readonly sat: number;
  readonly didNotSit: number;
}

export interface MovedChance extends Evidence {
  /** Posterior mean and its 90 % interval. */
  readonly chance: number;
  readonly interval: readonly [number, number];
  /** How strongly the reports speak against the prediction; over 20 a reading or a revision label is probably wrong. */
  readonly bayesFactorAgainst: number;
  readonly contradicts: boolean;
}

/** How many reports the prediction is worth. */
export const priorWeight = 2;

/**
 * Moves a predicted chance by reports: prior Beta(k·P, k·(1 − P)) with k = 2, each report one success or failure.
 * The Bayes factor compares the reports under an even prior Beta(1, 1) with the reports under this prior.
 * A prediction of exactly 0 or 1 is held 0.001 away, since no reading excludes the other outcome.
 * RangeError for a chance outside [0, 1] or counts that are not whole numbers ≥ 0.
 */
export function moveChance(evidence: Evidence): MovedChance {
  const { predicted, sat, didNotSit } = evidence;
  if (!(predicted >= 0 && predicted <= 1)) throw new RangeError('A chance lies between 0 and 1.');
  if (![sat, didNotSit].every((count) => Number.isInteger(count) && count >= 0))
    throw new RangeError('Counts are whole numbers from zero.');
  const prior = Math.min(0.999, Math.max(0.001, predicted));
  const a = priorWeight * prior;
  const b = priorWeight * (1 - prior);
  const interval: [number, number] = [
    betaQuantile(0.05, a + sat, b + didNotSit),
    betaQuantile(0.95, a + sat, b + didNotSit),
  ];
  const bayesFactorAgainst = Math.exp(
    logBeta(1 + sat, 1 + didNotSit) - logBeta(1, 1) - (logBeta(a + sat, b + didNotSit) - logBeta(a, b)),
  );
  return {
    ...evidence,
    chance: (a + sat) / (priorWeight + sat + didNotSit),
    interval,
    bayesFactorAgainst,
    contradicts: bayesFactorAgainst > 20,
  };
}

function logBeta(a: number, b: number): number {
  return logGamma(a) + logGamma(b) - logGamma(a + b);
}
