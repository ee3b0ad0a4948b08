import { type DemoJoint, of } from './joint-shape.js';

/** Threads in threads, plates on tapped holes. */
export const screwedJoints: readonly DemoJoint[] = [
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
];
