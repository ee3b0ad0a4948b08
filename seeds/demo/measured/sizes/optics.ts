import { measured, type MeasuredFeature } from '../measured-shape.js';

/** Telescopes, focusers and correctors. */
export const opticsSizes: readonly MeasuredFeature[] = [
  measured('larkfield-wren-60', 'tube', { diameter: { ABCD: 66 }, length: { ABCD: 120 } }),
  measured('larkfield-wren-60', 'grip ring over the knurl', {
    diameter: { AB: 75.4, CD: 76.8 },
    length: { AB: 15.8, CD: 17 },
  }),
  measured('larkfield-wren-60', 'clamp screw of the focuser', {
    innerRadius: { ABCD: 33 },
    outerRadius: { ABCD: 41 },
    bottom: { ABC: 0, D: -3 },
    top: { A: 1.6, B: 3.2, C: 3.1, D: -0.1 },
    angle: { A: 180, BCD: 60 },
    width: { ABCD: 14 },
  }),
  measured('larkfield-wren-60', 'room round the focus ring', {
    innerRadius: { ABCD: 33 },
    outerRadius: { AB: 37.7, CD: 38.4 },
    bottom: { ABCD: 2 },
    top: { AB: 17.8, CD: 19 },
    angle: { ABCD: 0 },
    width: { ABCD: 360 },
  }),
  measured('larkfield-wren-60', 'dew shield', { diameter: { ABD: 80, C: 80.4 }, length: { ABCD: 14 } }),
  measured('larkfield-wren-60', 'foot', {
    width: { ABCD: 43.6 },
    referenceHeight: { ABCD: 3 },
    flankAngle: { ABCD: 60 },
  }),
  measured(
    'larkfield-wren-60',
    'rear thread M48',
    { length: { ABCD: 5 } },
    { designation: { ABCD: 'M48x0.75' }, sex: { ABCD: 'female' } },
  ),
  measured('larkfield-wren-80', 'grip ring over the knurl', {
    diameter: { A: 92, BC: 94 },
    length: { ABC: 19 },
  }),
  measured(
    'larkfield-wren-80',
    'rear thread M54',
    { length: { AB: 4.4, C: 5 } },
    { designation: { ABC: 'M54x0.75' }, sex: { ABC: 'male' } },
  ),
  measured(
    'larkfield-wren-60-helical',
    'rear thread M48',
    { length: { ABC: 5 } },
    { designation: { ABC: 'M48x0.75' }, sex: { ABC: 'female' } },
  ),
  measured('larkfield-wren-60-helical', 'drawtube bore', { diameter: { ABC: 48 }, depth: { ABC: 30 } }),
  measured(
    'larkfield-flattener-w1',
    'front thread M48',
    { length: { ABC: 4.2 } },
    { designation: { ABC: 'M48x0.75' }, sex: { ABC: 'male' } },
  ),
  measured(
    'larkfield-flattener-w1',
    'rear thread M48',
    { length: { AB: 5, C: 4 } },
    { designation: { ABC: 'M48x0.75' }, sex: { ABC: 'female' } },
    { B: 9, C: 9 },
  ),
  measured('larkfield-flattener-w1', 'nose', { diameter: { ABC: 47.85 }, length: { ABC: 12 } }),
  measured('larkfield-flattener-w1', 'rear shoulder', {
    diameter: { ABC: 51.6 },
    height: { A: 1.4, BC: 0.6 },
    plateWidth: { ABC: 54 },
  }),
  measured('dunlin-rack-2', 'drawtube bore', { diameter: { ABC: 51 }, depth: { ABC: 42 } }),
  measured(
    'dunlin-rack-2',
    'motor holes',
    { circle: { AB: 31, C: 33 }, count: { AB: 3, C: 4 } },
    { screw: { ABC: 'M3' } },
  ),
  // Nobody has read the bore of Rev C.
  measured(
    'dunlin-micro-helical',
    'inch-and-a-quarter bore',
    { diameter: { AB: 31.72 }, depth: { AB: 22 } },
    {},
    { AB: 12 },
  ),
  measured('greywether-heron-72', 'bar', {
    width: { ABC: 43.8 },
    referenceHeight: { ABC: 3 },
    flankAngle: { A: 75, BC: 60 },
  }),
  measured('greywether-heron-72', 'drawtube bore', { diameter: { ABC: 51 }, depth: { A: 31, BC: 36 } }),
  measured('greywether-reducer-08', 'two-inch barrel', {
    diameter: { ABC: 50.8 },
    length: { AB: 34, C: 30 },
  }),
];
