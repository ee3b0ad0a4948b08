/** Lets at most `places` pieces of work run at once; the others wait in the order they came. */
export function createGate(places: number): <T>(work: () => Promise<T>) => Promise<T> {
  let free = places;
  const waiting: (() => void)[] = [];

  return async (work) => {
    if (free > 0) free -= 1;
    else await new Promise<void>((resolve) => waiting.push(resolve));
    try {
      return await work();
    } finally {
      // The place goes straight to the next in line, so that nobody slips in between.
      const next = waiting.shift();
      if (next) next();
      else free += 1;
    }
  };
}
