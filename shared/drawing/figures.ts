import { coverage95, type Dimension } from '../fit/dimension.js';

/** A dimension as it stands on a drawing: value and half width of its 95 % interval, "⌀19.50 ±0.04". Millimetres. */
export function dimensionText(dimension: Dimension, sign = ''): string {
  const half = coverage95 * dimension.uncertainty;
  const digits = half > 0 && half < 0.02 ? 3 : 2;
  return `${sign}${dimension.value.toFixed(digits)}${half > 0 ? ` ±${half.toFixed(digits)}` : ''}`;
}

export function millimetres(value: number): string {
  return `${value.toFixed(2)} mm`;
}

/** A tilt small on the part is drawn near 5°: the factor 1, 2, 5, 10, 20 … that comes closest from below. */
export function tiltFactor(degrees: number): number {
  const wanted = 5 / Math.max(degrees, 1e-6);
  if (wanted <= 1) return 1;
  const power = 10 ** Math.floor(Math.log10(wanted));
  const lead = wanted / power;
  return Math.min(1000, (lead >= 5 ? 5 : lead >= 2 ? 2 : 1) * power);
}
