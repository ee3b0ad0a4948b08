import type { Point } from './sheet.js';

/** A length as it stands in a dimension. */
export const figure = (value: number, digits = 1): string => value.toFixed(digits);

/** The point at `radius` from `centre`, at an angle in degrees anticlockwise from three o’clock. */
export const around = (centre: Point, radius: number, degrees: number): Point => [
  centre[0] + radius * Math.cos((degrees * Math.PI) / 180),
  centre[1] - radius * Math.sin((degrees * Math.PI) / 180),
];
