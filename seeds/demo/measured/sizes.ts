import type { MeasuredFeature } from './measured-shape.js';
import { cameraSizes } from './sizes/cameras.js';
import { clampSizes } from './sizes/clamps.js';
import { driveSizes } from './sizes/drives.js';
import { motorSizes } from './sizes/motors.js';
import { opticsSizes } from './sizes/optics.js';
import { spacerSizes } from './sizes/spacers.js';

/** Every feature of the demo that somebody has measured. */
export const measuredFeatures: readonly MeasuredFeature[] = [
  ...motorSizes,
  ...driveSizes,
  ...opticsSizes,
  ...cameraSizes,
  ...spacerSizes,
  ...clampSizes,
];
