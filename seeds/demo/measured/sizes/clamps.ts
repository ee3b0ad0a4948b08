import { measured, type MeasuredFeature } from '../measured-shape.js';

/** Clamps, feet, the guide scope and dew rings. */
export const clampSizes: readonly MeasuredFeature[] = [
  measured('larkfield-tube-ring-70', 'lined bore', {
    diameter: { A: 67.4, B: 67.6 },
    closedDiameter: { A: 64.6, B: 66.5 },
  }),
  measured(
    'larkfield-tube-ring-70',
    'top holes',
    { circle: { AB: 35 }, count: { AB: 2 } },
    { screw: { AB: 'M4' } },
  ),
  measured('larkfield-tube-ring-70', 'hinge', {
    innerRadius: { AB: 35 },
    outerRadius: { AB: 48 },
    bottom: { AB: 15 },
    top: { AB: 33 },
    angle: { AB: 62.5 },
    width: { AB: 45 },
  }),
  // One person has measured Rev C.
  measured(
    'oxbow-ring-clamp',
    'split bore',
    { diameter: { ABC: 68.2 }, closedDiameter: { A: 64.2, B: 63.8, C: 63.6 } },
    {},
    { C: 1 },
  ),
  // The swivelling jaw of Rev C has no readings.
  measured('oxbow-dovetail-clamp', 'saddle', {
    width: { AB: 46.2 },
    referenceHeight: { AB: 3 },
    flankAngle: { AB: 60 },
  }),
  measured('oxbow-finder-shoe', 'shoe', {
    width: { A: 32.4, B: 32.6 },
    referenceHeight: { AB: 1 },
    flankAngle: { AB: 60 },
  }),
  measured('oxbow-finder-shoe', 'two holes at 35 mm', {
    circle: { AB: 35 },
    holeDiameter: { AB: 4.5 },
    count: { AB: 2 },
  }),
  measured('stonebridge-guide-foot', 'foot', {
    width: { AB: 31.9, C: 32.1 },
    referenceHeight: { ABC: 1 },
    flankAngle: { ABC: 60 },
  }),
  measured('stonebridge-guide-foot', 'two holes at 35 mm', {
    circle: { AB: 34, C: 35 },
    holeDiameter: { ABC: 4.6 },
    count: { ABC: 2 },
  }),
  measured('nettlecombe-guide-foot', 'foot', {
    width: { AB: 31.4, C: 32.2 },
    referenceHeight: { ABC: 1 },
    flankAngle: { ABC: 60 },
  }),
  measured('nettlecombe-guide-foot', 'ring holes', {
    circle: { ABC: 35 },
    holeDiameter: { ABC: 4.5 },
    count: { ABC: 2 },
  }),
  measured('nettlecombe-guide-scope-30', 'inch-and-a-quarter bore', {
    diameter: { ABC: 31.82 },
    depth: { ABC: 26 },
  }),
  measured('emberfell-dew-ring', 'bore', { diameter: { AB: 80.2, C: 82 }, depth: { ABC: 16 } }, {}, { C: 2 }),
];
