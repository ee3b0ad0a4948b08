import type { JointKind } from '../../../shared/fit/joint-kinds.js';

/** A joint between two features, each written `part/feature`. */
export interface DemoJoint {
  readonly slug: string;
  readonly name: string;
  readonly kind: JointKind;
  readonly a: string;
  readonly b: string;
}

function of(kind: JointKind, lines: readonly (readonly [string, string, string, string])[]): DemoJoint[] {
  return lines.map(([slug, name, a, b]) => ({ kind, slug, name, a, b }));
}

/** The joints of the demo, by kind. */
export const demoJoints: readonly DemoJoint[] = [
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
  ...of('thread-pair', [
    [
      'm48-spacer-in-w1-rear-thread',
      'M48 spacer in the W1 flattener’s rear thread',
      'hollin-m48-spacer/male thread M48',
      'larkfield-flattener-w1/rear thread M48',
    ],
    [
      'w1-front-thread-in-wren-60',
      'W1 flattener in the Wren 60’s rear thread',
      'larkfield-flattener-w1/front thread M48',
      'larkfield-wren-60/rear thread M48',
    ],
    [
      'w1-front-thread-in-wren-helical',
      'W1 flattener in the Wren helical focuser',
      'larkfield-flattener-w1/front thread M48',
      'larkfield-wren-60-helical/rear thread M48',
    ],
    [
      'm42-adapter-in-q16-flange',
      'M42 to M48 adapter in the Q16 flange',
      'hollin-m42-adapter/male thread M42',
      'quillback-q16/M42 flange',
    ],
    [
      'fw5-in-q16-flange',
      'FW5 in the Q16 flange',
      'pallister-fw5/M42 on the camera side',
      'quillback-q16/M42 flange',
    ],
    [
      'm48-spacer-in-m42-adapter',
      'M48 spacer in the M42 to M48 adapter',
      'hollin-m48-spacer/male thread M48',
      'hollin-m42-adapter/female thread M48',
    ],
    [
      'm48-spacer-in-fw5',
      'M48 spacer in FW5',
      'hollin-m48-spacer/male thread M48',
      'pallister-fw5/M48 on the telescope side',
    ],
    [
      'hand-rotator-in-filter-drawer',
      'Hand rotator in the filter drawer',
      'brackwater-hand-rotator/M48 on both sides',
      'pallister-filter-drawer/M48 on both sides',
    ],
    [
      'wren-80-in-r54-rotator',
      'Wren 80’s rear thread in the R54 rotator',
      'larkfield-wren-80/rear thread M54',
      'brackwater-r54/M54 on both sides',
    ],
    [
      'camera-adapter-in-r54-rotator',
      'Camera adapter M54 in the R54 rotator',
      'hollin-camera-adapter/male thread M54',
      'brackwater-r54/M54 on both sides',
    ],
    [
      'fw7-in-q26-flange',
      'FW7 in the Q26 flange',
      'pallister-fw7/M54 on both sides',
      'quillback-q26/M54 flange',
    ],
  ]),
  ...of('hole-pattern', [
    ['m2-on-motor-plate', 'M2 on the motor plate', 'dunlin-motor-plate/motor holes', 'tarn-m2/face holes'],
    ['m1-on-motor-plate', 'M1 on the motor plate', 'dunlin-motor-plate/motor holes', 'tarn-m1/face holes'],
    [
      'm1-on-rigid-bracket',
      'M1 on its rigid bracket',
      'tarn-m1-rigid-bracket/motor holes',
      'tarn-m1/face holes',
    ],
    [
      'motor-plate-on-rack-2',
      'Motor plate on the Rack 2 focuser',
      'dunlin-motor-plate/focuser holes',
      'dunlin-rack-2/motor holes',
    ],
    [
      'printed-guide-foot-on-tube-ring-70',
      'Printed guide foot on tube ring 70',
      'stonebridge-guide-foot/two holes at 35 mm',
      'larkfield-tube-ring-70/top holes',
    ],
    [
      'guide-foot-n2-on-tube-ring-70',
      'Guide foot N2 on tube ring 70',
      'nettlecombe-guide-foot/ring holes',
      'larkfield-tube-ring-70/top holes',
    ],
    [
      'finder-shoe-on-tube-ring-70',
      'Finder shoe on tube ring 70',
      'oxbow-finder-shoe/two holes at 35 mm',
      'larkfield-tube-ring-70/top holes',
    ],
    [
      'camera-adapter-on-q26',
      'Camera adapter M54 on the Q26',
      'hollin-camera-adapter/six flange holes',
      'quillback-q26/six flange holes',
    ],
    [
      'tilt-plate-on-q16',
      'Tilt plate on the Q16',
      'hollin-tilt-plate/push and pull screws',
      'quillback-q16/six flange holes',
    ],
  ]),
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
