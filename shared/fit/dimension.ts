import { coverage95 } from '../statistics/normal-distribution.js';

export { coverage95 };

/** Where a figure comes from; shown beside it. */
export type DimensionSource =
  | { readonly kind: 'consensus'; readonly readings: number; readonly thin: boolean }
  | { readonly kind: 'own-reading' }
  | { readonly kind: 'makers-drawing' };

/** One dimension of the one part in the reader's hand: value and standard uncertainty in mm. */
export interface Dimension {
  readonly value: number;
  readonly uncertainty: number;
  readonly source: DimensionSource;
}

/** A worked-out figure with its standard uncertainty and 95 % interval, in the unit of its name. */
export interface Figure {
  readonly value: number;
  readonly uncertainty: number;
  readonly interval: readonly [number, number];
}

export function figure(value: number, uncertainty: number): Figure {
  return {
    value,
    uncertainty,
    interval: [value - coverage95 * uncertainty, value + coverage95 * uncertainty],
  };
}

/** Millimetres in an inch, exact since 1959. */
export const millimetresPerInch = 25.4;

export function inchToMillimetre(inches: number): number {
  return inches * millimetresPerInch;
}

export function millimetreToInch(millimetres: number): number {
  return millimetres / millimetresPerInch;
}

/** RangeError unless the dimension is a finite value within (0, 1000] mm with a finite uncertainty ≥ 0. */
export function checkDimension(dimension: Dimension, name: string): void {
  if (!Number.isFinite(dimension.value) || dimension.value <= 0 || dimension.value > 1000) {
    throw new RangeError(`${name} must lie over 0 and up to 1000 mm.`);
  }
  if (!Number.isFinite(dimension.uncertainty) || dimension.uncertainty < 0) {
    throw new RangeError(`The uncertainty of ${name} must be zero or more.`);
  }
}
