import type { PhotoPoint } from '../contract/callouts.js';

/** Size in pixels at which a photo is shown. */
export interface ShownSize {
  readonly width: number;
  readonly height: number;
}

/** A place or direction on a photo as it is shown: pixels from its left and upper edge. */
export type Place = readonly [x: number, y: number];

/** A place on the photo in pixels of the size shown. */
export function placeOf({ x, y }: PhotoPoint, { width, height }: ShownSize): Place {
  return [x * width, y * height];
}

/** Unit vector from one place to another and how far apart they are; to the right where they are one. */
export function direction(from: Place, to: Place): readonly [ux: number, uy: number, length: number] {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
  return length === 0 ? [1, 0, 0] : [(to[0] - from[0]) / length, (to[1] - from[1]) / length, length];
}
