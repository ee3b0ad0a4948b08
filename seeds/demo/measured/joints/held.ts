import { type DemoJoint, of } from './joint-shape.js';

/** Barrels in split rings, shafts in bores, dovetails, bodies past each other. */
export const heldJoints: readonly DemoJoint[] = [
  ...of('barrel-clamp', [
    [
      'wren-60-tube-in-ring-clamp-70',
      'Wren 60’s tube in ring clamp 70',
      'larkfield-wren-60/tube',
      'oxbow-ring-clamp/split bore',
    ],
    [
      'wren-60-tube-in-tube-ring-70',
      'Wren 60’s tube in tube ring 70',
      'larkfield-wren-60/tube',
      'larkfield-tube-ring-70/lined bore',
    ],
    [
      'wren-60-grip-ring-in-ring-gear',
      'Wren 60’s grip ring in the ring gear',
      'larkfield-wren-60/grip ring over the knurl',
      'cotterpin-ring-gear-kit/bore of the ring',
    ],
    [
      'wren-60-grip-ring-in-belt-kit-60',
      'Wren 60’s grip ring in belt kit 60',
      'larkfield-wren-60/grip ring over the knurl',
      'thornapple-belt-kit-60/bore of the ring pulley',
    ],
    [
      'wren-80-grip-ring-in-ring-gear-80',
      'Wren 80’s grip ring in ring gear 80',
      'larkfield-wren-80/grip ring over the knurl',
      'cotterpin-ring-gear-kit-80/bore of the ring',
    ],
    [
      'wren-80-grip-ring-in-belt-kit-80',
      'Wren 80’s grip ring in belt kit 80',
      'larkfield-wren-80/grip ring over the knurl',
      'thornapple-belt-kit-80/bore of the ring pulley',
    ],
  ]),
  ...of('shaft-bore', [
    [
      'm1-shaft-in-ring-gear-pinion',
      'M1 shaft in the ring-gear kit’s pinion',
      'tarn-m1/output shaft',
      'cotterpin-ring-gear-kit/bore of the pinion',
    ],
    [
      'm1-shaft-in-pinion-set',
      'M1 shaft in the pinion set',
      'tarn-m1/output shaft',
      'cotterpin-pinion-set/bore',
    ],
    [
      'm1-shaft-in-belt-kit-60-pulley',
      'M1 shaft in belt kit 60’s pulley',
      'tarn-m1/output shaft',
      'thornapple-belt-kit-60/bore of the motor pulley',
    ],
    [
      'm2-shaft-in-ring-gear-80-pinion',
      'M2 shaft in ring-gear kit 80’s pinion',
      'tarn-m2/output shaft',
      'cotterpin-ring-gear-kit-80/bore of the pinion',
    ],
    [
      'm2-shaft-in-belt-kit-80-pulley',
      'M2 shaft in belt kit 80’s pulley',
      'tarn-m2/output shaft',
      'thornapple-belt-kit-80/bore of the motor pulley',
    ],
  ]),
  ...of('dovetail', [
    [
      'heron-72-bar-in-dovetail-clamp',
      'Heron 72’s bar in the dovetail clamp',
      'greywether-heron-72/bar',
      'oxbow-dovetail-clamp/saddle',
    ],
    [
      'wren-60-foot-in-dovetail-clamp',
      'Wren 60’s foot in the dovetail clamp',
      'larkfield-wren-60/foot',
      'oxbow-dovetail-clamp/saddle',
    ],
    [
      'riser-foot-in-dovetail-clamp',
      'Saddle riser’s foot in the dovetail clamp',
      'nettlecombe-riser/foot',
      'oxbow-dovetail-clamp/saddle',
    ],
    [
      'guide-foot-n2-in-finder-shoe',
      'Guide foot N2 in the finder shoe',
      'nettlecombe-guide-foot/foot',
      'oxbow-finder-shoe/shoe',
    ],
    [
      'printed-guide-foot-in-finder-shoe',
      'Printed guide foot in the finder shoe',
      'stonebridge-guide-foot/foot',
      'oxbow-finder-shoe/shoe',
    ],
  ]),
  ...of('envelope', [
    [
      'ring-gear-past-the-focuser-clamp-screw',
      'Ring gear past the focuser’s clamp screw',
      'larkfield-wren-60/clamp screw of the focuser',
      'cotterpin-ring-gear-kit/clamp screw of the ring',
    ],
    [
      'belt-bracket-arm-past-the-focus-ring',
      'Belt bracket’s arm past the focus ring',
      'larkfield-wren-60/room round the focus ring',
      'stonebridge-belt-bracket/arm beside the tube',
    ],
    [
      'm1-cable-outlet-past-the-tube-ring-hinge',
      'M1 cable outlet past the tube ring’s hinge',
      'larkfield-tube-ring-70/hinge',
      'tarn-m1/cable outlet',
    ],
    ['fw7-case-past-the-m2', 'FW7 case past the M2', 'tarn-m2/body', 'pallister-fw7/case'],
    [
      'm1-past-the-saddle-riser',
      'M1 past the saddle riser',
      'nettlecombe-riser/room above the bar',
      'tarn-m1/body',
    ],
  ]),
];
