import { measured, type MeasuredFeature } from '../measured-shape.js';

/** Cameras, filter wheels, rotators. */
export const cameraSizes: readonly MeasuredFeature[] = [
  // Rev C's flange has been ground; nobody has said how deep its thread is now.
  measured(
    'quillback-q16',
    'M42 flange',
    { length: { AB: 4.5 } },
    { designation: { AB: 'M42x0.75' }, sex: { AB: 'female' } },
  ),
  measured(
    'quillback-q16',
    'six flange holes',
    { circle: { ABC: 62 }, count: { ABC: 6 } },
    { screw: { ABC: 'M2.5' } },
  ),
  measured(
    'quillback-q26',
    'M54 flange',
    { length: { AB: 5 } },
    { designation: { AB: 'M54x0.75' }, sex: { AB: 'female' } },
  ),
  measured(
    'quillback-q26',
    'six flange holes',
    { circle: { AB: 68 }, count: { AB: 6 } },
    { screw: { AB: 'M3' } },
  ),
  measured('quillback-q26', 'opening of the flange', { diameter: { AB: 56.2 }, depth: { AB: 4 } }),
  measured(
    'quillback-g1',
    'inch-and-a-quarter barrel',
    { diameter: { A: 31.6, B: 31.7, C: 31.55 }, length: { ABC: 20 } },
    {},
    { B: 11 },
  ),
  measured(
    'pallister-fw5',
    'M42 on the camera side',
    { length: { ABC: 4 } },
    { designation: { ABC: 'M42x0.75' }, sex: { ABC: 'male' } },
  ),
  measured(
    'pallister-fw5',
    'M48 on the telescope side',
    { length: { ABC: 4.8 } },
    { designation: { ABC: 'M48x0.75' }, sex: { ABC: 'female' } },
  ),
  measured('pallister-fw7', 'case', {
    innerRadius: { AB: 27 },
    outerRadius: { AB: 82 },
    bottom: { AB: 40 },
    top: { AB: 61 },
    angle: { A: 195, B: 300 },
    width: { A: 130, B: 120 },
  }),
  measured(
    'pallister-fw7',
    'M54 on both sides',
    { length: { A: 4.4 } },
    { designation: { A: 'M54x0.75' }, sex: { A: 'male' } },
  ),
  measured(
    'pallister-filter-drawer',
    'M48 on both sides',
    { length: { AB: 4.6 } },
    { designation: { AB: 'M48x0.75' }, sex: { AB: 'female' } },
  ),
  measured(
    'brackwater-r54',
    'M54 on both sides',
    { length: { ABC: 4.7 } },
    { designation: { ABC: 'M54x0.75' }, sex: { ABC: 'female' } },
  ),
  measured(
    'brackwater-hand-rotator',
    'M48 on both sides',
    { length: { AB: 4 } },
    { designation: { AB: 'M48x0.75' }, sex: { AB: 'male' } },
  ),
];
