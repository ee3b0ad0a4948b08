/** Median of a list; the mean of the middle two where there is an even number. RangeError when empty. Same as R's median. */
export function medianOf(values: readonly number[]): number {
  if (values.length === 0) throw new RangeError('At least one value is needed.');
  const sorted = [...values].sort((one, other) => one - other);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
}

/** Median absolute deviation from the median, raw (times 1.4826 it estimates a normal standard deviation). */
export function medianDeviation(values: readonly number[]): number {
  const median = medianOf(values);
  return medianOf(values.map((value) => Math.abs(value - median)));
}

/** Makes a median absolute deviation the standard deviation of a normal distribution: 1/Φ⁻¹(3/4). */
export const madToDeviation = 1.4826;
