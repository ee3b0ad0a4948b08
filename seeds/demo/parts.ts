import type { DemoPart } from './catalogue-shape.js';
import { cameraParts } from './parts/cameras.js';
import { clampParts } from './parts/clamps.js';
import { driveParts } from './parts/drives.js';
import { opticsParts } from './parts/optics.js';
import { spacerParts } from './parts/spacers.js';

/** The whole catalogue of the demo. */
export const demoParts: readonly DemoPart[] = [
  ...opticsParts,
  ...driveParts,
  ...spacerParts,
  ...cameraParts,
  ...clampParts,
];
