import { measured, type MeasuredFeature } from '../measured-shape.js';

/** Ring gears, pinions and belts. */
export const driveSizes: readonly MeasuredFeature[] = [
  measured('cotterpin-ring-gear-kit', 'bore of the ring', {
    diameter: { AB: 75.6, C: 76.9, D: 76.92 },
    closedDiameter: { A: 75.2, B: 75, CD: 76.3 },
    depth: { ABCD: 15 },
  }),
  measured(
    'cotterpin-ring-gear-kit',
    'bore of the pinion',
    { diameter: { ABCD: 5.06 }, depth: { ABCD: 12 } },
    { form: { ABCD: 'round' } },
    { ABCD: 8 },
  ),
  // The travel that is used, 240 degrees, counts as the angle it fills.
  measured('cotterpin-ring-gear-kit', 'clamp screw of the ring', {
    innerRadius: { ABCD: 36 },
    outerRadius: { ABCD: 47 },
    bottom: { ABC: 2.4, D: 3.9 },
    top: { ABCD: 10 },
    angle: { ABCD: 90 },
    width: { ABCD: 240 },
  }),
  measured('cotterpin-ring-gear-kit-80', 'bore of the ring', {
    diameter: { A: 92.2, B: 94.2 },
    closedDiameter: { A: 91.7, B: 93.6 },
  }),
  measured(
    'cotterpin-ring-gear-kit-80',
    'bore of the pinion',
    { diameter: { A: 6.03, BC: 6.38 } },
    { form: { ABC: 'round' } },
  ),
  measured(
    'cotterpin-pinion-set',
    'bore',
    { diameter: { A: 5.06, B: 5.05 }, depth: { AB: 12 } },
    { form: { AB: 'round' } },
    { AB: 9 },
  ),
  measured(
    'thornapple-belt-kit-60',
    'bore of the motor pulley',
    { diameter: { AB: 5.04, C: 5.05 }, driveSize: { C: 4.58 }, depth: { ABC: 14 } },
    { form: { AB: 'round', C: 'flat' } },
  ),
  measured('thornapple-belt-kit-60', 'bore of the ring pulley', {
    diameter: { A: 75.8, B: 77.2 },
    closedDiameter: { A: 75.1, B: 74.9 },
  }),
  measured(
    'thornapple-belt-kit-80',
    'bore of the motor pulley',
    { diameter: { A: 6.04, B: 6.39 }, depth: { AB: 16 } },
    { form: { AB: 'round' } },
  ),
  measured('thornapple-belt-kit-80', 'bore of the ring pulley', {
    diameter: { A: 92.4, B: 94.6 },
    closedDiameter: { A: 91.4, B: 91.8 },
  }),
];
