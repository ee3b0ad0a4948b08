import { measured, type MeasuredFeature } from '../measured-shape.js';

/** Spacers, adapters, tilt plates and risers. */
export const spacerSizes: readonly MeasuredFeature[] = [
  measured(
    'hollin-m48-spacer',
    'male thread M48',
    { length: { A: 3.5, B: 4.5, C: 3.8 } },
    { designation: { ABC: 'M48x0.75' }, sex: { ABC: 'male' } },
    { A: 8, B: 12, C: 8 },
  ),
  measured(
    'hollin-m42-adapter',
    'male thread M42',
    { length: { AB: 4 } },
    { designation: { AB: 'M42x0.75' }, sex: { AB: 'male' } },
  ),
  measured(
    'hollin-m42-adapter',
    'female thread M48',
    { length: { A: 4, B: 5 } },
    { designation: { AB: 'M48x0.75' }, sex: { AB: 'female' } },
  ),
  measured('hollin-tilt-plate', 'push and pull screws', {
    circle: { ABC: 62 },
    holeDiameter: { ABC: 2.9 },
    count: { ABC: 3 },
  }),
  measured(
    'hollin-camera-adapter',
    'male thread M54',
    { length: { AB: 4.2 } },
    { designation: { AB: 'M54x0.75' }, sex: { AB: 'male' } },
  ),
  measured('hollin-camera-adapter', 'six flange holes', {
    circle: { AB: 68 },
    holeDiameter: { A: 3, B: 3.4 },
    count: { AB: 6 },
  }),
  measured('hollin-camera-adapter', 'nose', {
    diameter: { AB: 56 },
    height: { A: 5, B: 3 },
    plateWidth: { AB: 78 },
  }),
  measured('stonebridge-spacer-set', 'flange seat', {
    diameter: { A: 51.7, B: 52.1 },
    depth: { AB: 1 },
    outerDiameter: { AB: 56 },
  }),
  measured('nettlecombe-riser', 'foot', {
    width: { AB: 43 },
    referenceHeight: { AB: 3 },
    flankAngle: { AB: 60 },
  }),
  measured('nettlecombe-riser', 'room above the bar', {
    innerRadius: { AB: 33 },
    outerRadius: { AB: 63 },
    bottom: { AB: 0 },
    top: { A: 70, B: 65.6 },
    angle: { AB: 180 },
    width: { AB: 70 },
  }),
];
