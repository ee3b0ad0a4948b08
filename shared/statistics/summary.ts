import { decimalOf, ratioToNumber, toCommonScale } from './decimal.js';

export interface Summary {
  readonly count: number;
  readonly mean: number;
  /** Sample standard deviation (n − 1); null for a single value. */
  readonly standardDeviation: number | null;
}

/**
 * Mean and sample standard deviation, exact in decimal arithmetic and rounded once.
 * Cost: O(n) big-integer steps. Throws RangeError on an empty list or a value that is not finite.
 * Checked against NIST StRD, univariate summary statistics.
 */
export function summaryOf(values: readonly number[]): Summary {
  if (values.length === 0) throw new RangeError('At least one value is needed.');
  const { digits, scale } = toCommonScale(values.map(decimalOf));
  const count = BigInt(digits.length);
  const sum = digits.reduce((total, value) => total + value, 0n);
  const unit = 10n ** BigInt(scale);
  const mean = ratioToNumber(sum, count * unit);
  if (digits.length === 1) return { count: 1, mean, standardDeviation: null };
  // n·Σx² − (Σx)² is n times the sum of squared deviations, with no rounding in between.
  const spread = count * digits.reduce((total, value) => total + value * value, 0n) - sum * sum;
  const variance = ratioToNumber(spread, count * (count - 1n) * unit * unit);
  return { count: digits.length, mean, standardDeviation: Math.sqrt(variance) };
}

export interface TypeA {
  readonly count: number;
  readonly mean: number;
  /** Standard uncertainty of the mean, s/√n; null for a single reading. */
  readonly standardUncertainty: number | null;
  readonly degreesOfFreedom: number;
}

/** Type A evaluation of repeat readings (JCGM 100:2008, 4.2.3). */
export function typeA(readings: readonly number[]): TypeA {
  const { count, mean, standardDeviation } = summaryOf(readings);
  return {
    count,
    mean,
    standardUncertainty: standardDeviation === null ? null : standardDeviation / Math.sqrt(count),
    degreesOfFreedom: count - 1,
  };
}
