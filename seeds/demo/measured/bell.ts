/** A normal deviate by Box and Muller (Annals of Mathematical Statistics 29, 1958), held within ±2.2 deviations. */
export function bell(next: () => number): number {
  const value = Math.sqrt(-2 * Math.log(next())) * Math.cos(2 * Math.PI * next());
  return Math.min(2.2, Math.max(-2.2, value));
}
