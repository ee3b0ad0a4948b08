/**
 * Numbers that look random and are the same in every run: the generator of Park and Miller with the multiplier 48271
 * (Communications of the ACM 36:7, 1993), x → 48271·x mod (2³¹ − 1). Gives values in (0, 1).
 */
export function seededNumbers(seed: number): () => number {
  const modulus = 2_147_483_647;
  let state = (Math.abs(Math.trunc(seed)) % (modulus - 1)) + 1;
  return () => {
    state = (state * 48_271) % modulus;
    return state / modulus;
  };
}

/** One of the items, each as likely as any other. Throws for an empty list. */
export function pick<Item>(items: readonly Item[], next: () => number): Item {
  const item = items[Math.floor(next() * items.length)];
  if (item === undefined) throw new Error('There is nothing to pick from.');
  return item;
}

/** The items in another order (Fisher and Yates); the list given stays as it is. */
export function shuffled<Item>(items: readonly Item[], next: () => number): Item[] {
  const order = [...items];
  for (let last = order.length - 1; last > 0; last--) {
    const other = Math.floor(next() * (last + 1));
    [order[last], order[other]] = [order[other]!, order[last]!];
  }
  return order;
}
