import { measured, type MeasuredFeature } from '../measured-shape.js';

/** Focus motors and the brackets and plates that carry them. */
export const motorSizes: readonly MeasuredFeature[] = [
  measured(
    'tarn-m1',
    'recess round the shaft',
    { diameter: { AB: 23, C: 19.5, D: 19.48 }, depth: { ABCD: 2 }, outerDiameter: { ABCD: 28 } },
    {},
    { B: 12, C: 16, D: 9 },
  ),
  measured(
    'tarn-m1',
    'output shaft',
    { diameter: { ABCD: 4.99 }, driveSize: { D: 4.5 }, length: { ABCD: 20 } },
    { form: { ABC: 'round', D: 'flat' } },
    { ABCD: 10 },
  ),
  measured('tarn-m1', 'face holes', { circle: { ABCD: 31 }, count: { ABCD: 4 } }, { screw: { ABCD: 'M3' } }),
  measured('tarn-m1', 'cable outlet', {
    innerRadius: { ABCD: 40 },
    outerRadius: { A: 52, BCD: 62 },
    bottom: { ABCD: -2 },
    top: { A: 8, BCD: 22 },
    angle: { ABCD: 85 },
    width: { ABCD: 50 },
  }),
  measured('tarn-m1', 'body', {
    innerRadius: { ABCD: 37 },
    outerRadius: { ABCD: 79 },
    bottom: { ABCD: 66.7 },
    top: { ABCD: 118.7 },
    angle: { ABCD: 180 },
    width: { ABCD: 40 },
  }),
  // One person has measured Rev B, nobody Rev C.
  measured(
    'tarn-m2',
    'recess round the shaft',
    { diameter: { A: 27, B: 27.02 }, depth: { AB: 2.2 }, outerDiameter: { AB: 33 } },
    {},
    { B: 1 },
  ),
  measured(
    'tarn-m2',
    'output shaft',
    { diameter: { A: 6, BC: 6.35 }, length: { ABC: 24 } },
    { form: { ABC: 'round' } },
  ),
  measured(
    'tarn-m2',
    'face holes',
    { circle: { A: 31, BC: 33 }, count: { ABC: 4 } },
    { screw: { ABC: 'M3' } },
  ),
  measured('tarn-m2', 'body', {
    innerRadius: { ABC: 44 },
    outerRadius: { ABC: 76 },
    bottom: { ABC: 0 },
    top: { ABC: 61 },
    angle: { ABC: 182.5 },
    width: { ABC: 65 },
  }),
  measured(
    'stonebridge-belt-bracket',
    'raised lip round the shaft hole',
    {
      diameter: { AB: 22.5, C: 22.46, D: 19.2 },
      height: { A: 1.2, BCD: 1.7 },
      plateWidth: { ABCD: 58 },
    },
    {},
    { A: 7, B: 14, C: 10, D: 5 },
  ),
  measured('stonebridge-belt-bracket', 'arm beside the tube', {
    innerRadius: { AB: 40.5, C: 39.6, D: 40.2 },
    outerRadius: { ABCD: 58 },
    bottom: { ABCD: 4 },
    top: { AB: 22, CD: 26 },
    angle: { ABCD: 270 },
    width: { ABCD: 36 },
  }),
  measured('stonebridge-belt-bracket-80', 'raised lip', {
    diameter: { AB: 26.4 },
    height: { AB: 1.8 },
    plateWidth: { AB: 66 },
  }),
  // Nobody has put a caliper to Rev B yet.
  measured('tarn-m1-rigid-bracket', 'centring lip', {
    diameter: { A: 22.8 },
    height: { A: 2.3 },
    plateWidth: { A: 54 },
  }),
  measured('tarn-m1-rigid-bracket', 'motor holes', {
    circle: { AB: 31 },
    holeDiameter: { AB: 3.4 },
    count: { AB: 4 },
  }),
  measured(
    'dunlin-motor-plate',
    'motor holes',
    {
      circle: { AB: 31, C: 32 },
      holeDiameter: { ABC: 3.4 },
      slotTravel: { C: 4 },
      count: { A: 3, BC: 4 },
    },
    { slotAlong: { C: 'radius' } },
  ),
  measured('dunlin-motor-plate', 'focuser holes', {
    circle: { AB: 31, C: 33 },
    holeDiameter: { ABC: 3.4 },
    count: { AB: 3, C: 4 },
  }),
];
