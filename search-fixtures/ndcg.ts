/** Grade of each judged result by its slug: 3 answers the query, 2 helps, 1 touches it; what is not listed counts 0. */
export type Grades = Readonly<Record<string, number>>;

/**
 * Normalised discounted cumulated gain at rank `depth`, in 0 … 1.
 *
 * DCG = Σ G_i / max(1, log₂ i) over ranks i = 1 … depth, where G_i is the grade of the result at rank i: the discount starts
 * after rank 2, the base of the logarithm. NDCG is DCG over the DCG of the same grades from the highest down.
 * Source: K. Järvelin and J. Kekäläinen, "Cumulated gain-based evaluation of IR techniques", ACM Transactions on Information
 * Systems 20:4 (2002), 422–446, equations 2 and 3 with b = 2. Not the variant with (2^G − 1) / log₂(i + 1).
 *
 * A slug that is returned twice gains once. Cost: O(n log n) in the judged results.
 * Throws RangeError where `depth` is no positive whole number, a grade is negative or not finite, or no grade is above 0
 * (the measure is not defined then).
 */
export function ndcg(returned: readonly string[], grades: Grades, depth = 10): number {
  if (!Number.isInteger(depth) || depth < 1) throw new RangeError('The depth takes a positive whole number.');
  const given = Object.values(grades);
  if (given.some((grade) => !Number.isFinite(grade) || grade < 0))
    throw new RangeError('A grade takes 0 or more.');
  const ideal = discounted([...given].sort((one, other) => other - one).slice(0, depth));
  if (ideal === 0) throw new RangeError('At least one result needs a grade above 0.');
  const seen = new Set<string>();
  const gains = returned.slice(0, depth).map((slug) => {
    const again = seen.has(slug);
    seen.add(slug);
    return again || !Object.hasOwn(grades, slug) ? 0 : (grades[slug] ?? 0);
  });
  return discounted(gains) / ideal;
}

function discounted(gains: readonly number[]): number {
  return gains.reduce((sum, gain, index) => sum + gain / Math.max(1, Math.log2(index + 1)), 0);
}
