/**
 * Optimal string alignment distance: insertions, deletions, substitutions and swaps of neighbours count one each,
 * and no part is edited twice. Answers `limit + 1` as soon as the distance must be above `limit`.
 * Cost: product of the lengths.
 */
export function alignmentDistance(left: string, right: string, limit: number): number {
  if (Math.abs(left.length - right.length) > limit) return limit + 1;
  let beforeLast: number[] = [];
  let last = Array.from({ length: right.length + 1 }, (_, column) => column);
  for (let row = 1; row <= left.length; row++) {
    const current = [row];
    let least = row;
    for (let column = 1; column <= right.length; column++) {
      const same = left[row - 1] === right[column - 1];
      let cost = Math.min(
        (last[column] ?? 0) + 1,
        (current[column - 1] ?? 0) + 1,
        (last[column - 1] ?? 0) + (same ? 0 : 1),
      );
      const swapped =
        row > 1 && column > 1 && left[row - 1] === right[column - 2] && left[row - 2] === right[column - 1];
      if (swapped) cost = Math.min(cost, (beforeLast[column - 2] ?? 0) + 1);
      current.push(cost);
      least = Math.min(least, cost);
    }
    if (least > limit) return limit + 1;
    beforeLast = last;
    last = current;
  }
  return Math.min(last[right.length] ?? 0, limit + 1);
}

/** Typos between two words: alignment distance, where a wrong first letter counts two. */
export function typosBetween(typed: string, word: string, limit: number): number {
  const distance = alignmentDistance(typed, word, limit);
  return typed[0] === word[0] ? distance : distance + 1;
}
