import { type DemoJoint, of } from './joint-shape.js';

/** Bosses in recesses, barrels in bores. */
export const seatJoints: readonly DemoJoint[] = [
  ...of('boss-recess', [
    [
      'bracket-lip-in-m1-recess',
      'Belt bracket’s lip in the M1 recess',
      'stonebridge-belt-bracket/raised lip round the shaft hole',
      'tarn-m1/recess round the shaft',
    ],
    [
      'rigid-bracket-lip-in-m1-recess',
      'M1 rigid bracket’s lip in the M1 recess',
      'tarn-m1-rigid-bracket/centring lip',
      'tarn-m1/recess round the shaft',
    ],
    [
      'bracket-80-lip-in-m2-recess',
      'Belt bracket 80’s lip in the M2 recess',
      'stonebridge-belt-bracket-80/raised lip',
      'tarn-m2/recess round the shaft',
    ],
    [
      'camera-adapter-nose-in-q26-flange',
      'Camera adapter’s nose in the Q26 flange',
      'hollin-camera-adapter/nose',
      'quillback-q26/opening of the flange',
    ],
    [
      'w1-shoulder-in-printed-spacer',
      'W1 flattener’s shoulder in a printed spacer',
      'larkfield-flattener-w1/rear shoulder',
      'stonebridge-spacer-set/flange seat',
    ],
  ]),
  ...of('barrel-bore', [
    [
      'reducer-barrel-in-heron-72-drawtube',
      '0.8 reducer’s barrel in the Heron 72 drawtube',
      'greywether-reducer-08/two-inch barrel',
      'greywether-heron-72/drawtube bore',
    ],
    [
      'reducer-barrel-in-rack-2-drawtube',
      '0.8 reducer’s barrel in the Rack 2 drawtube',
      'greywether-reducer-08/two-inch barrel',
      'dunlin-rack-2/drawtube bore',
    ],
    [
      'g1-barrel-in-micro-helical',
      'G1 guide camera in the micro helical',
      'quillback-g1/inch-and-a-quarter barrel',
      'dunlin-micro-helical/inch-and-a-quarter bore',
    ],
    [
      'g1-barrel-in-guide-scope-30',
      'G1 guide camera in the guide scope 30',
      'quillback-g1/inch-and-a-quarter barrel',
      'nettlecombe-guide-scope-30/inch-and-a-quarter bore',
    ],
    [
      'wren-60-shield-in-dew-ring',
      'Wren 60’s dew shield in the dew ring',
      'larkfield-wren-60/dew shield',
      'emberfell-dew-ring/bore',
    ],
    [
      'w1-nose-in-wren-helical',
      'W1 flattener’s nose in the Wren helical focuser',
      'larkfield-flattener-w1/nose',
      'larkfield-wren-60-helical/drawtube bore',
    ],
  ]),
];
