import { family, type QuestionFamily } from './family.js';

/** Spacers, flatteners, reducers and adapters. */
export const spacerQuestions: readonly QuestionFamily[] = [
  family('stack-behind-the-w1-flattener-is-1-mm-short', {
    titles: [
      'Corners like spokes with the W1 flattener',
      'Back focus of the W1, 55 or more with a filter?',
      'Which way do I go when corner stars point to the middle?',
    ],
    notices: ['All four corners alike, middle round.', 'By the leaflet I have 55, by the caliper 54.3.'],
    tried: [
      'A ring of half a millimetre made it better, not good.',
      'Without the filter it is nearly right.',
    ],
    answers: {
      'ring-of-1-mm':
        'Too short: add a millimetre, and a third of the filter’s thickness on top. Shim rings let you walk up to it.',
      'spacer-turned-to-length':
        'Once you know the length have one ring turned to it; three stacked rings tilted mine.',
    },
    asides: ['Measure from the shoulder, not from the end of the thread.', 'How thick is the filter?'],
  }),
  family('m48-spacer-bottoms-before-its-shoulder-seats', {
    titles: [
      'M48 spacer never reaches its shoulder',
      'Light under the shoulder of the spacer',
      'Thread too long or hole too shallow?',
    ],
    notices: [
      'It stops hard with half a millimetre to go.',
      'One corner of the frame is worse than the others, and it turns with the spacer.',
    ],
    tried: ['Cleaning both threads changed nothing.', 'Another spacer from the same box does the same.'],
    answers: {
      'ring-under-the-shoulder':
        'A ring of six tenths under the shoulder gives it a face to sit on. Take it off elsewhere in the stack.',
      'shorten-the-thread':
        'I took seven tenths off the thread on wet paper, away from all glass. It seats now.',
    },
    asides: ['Read the length of the male thread and the depth of the hole; the difference is what you see.'],
  }),
  family('m48-ring-is-stuck-on-the-flattener', {
    titles: [
      'M48 ring stuck on the flattener',
      'How to unscrew a ring that will not move',
      'Two rings have become one',
    ],
    notices: ['Neither hands nor gloves move it.', 'I can turn the whole train but not that joint.'],
    tried: [
      'I have stopped before reaching for pliers.',
      'A rubber mat gave me a quarter of a turn in the wrong direction.',
    ],
    answers: {
      'strap-and-cold-pack':
        'Cold for ten minutes, then two rubber straps close to the joint, and slowly. It let go with a crack.',
      'drop-of-solvent': 'One drop of alcohol at the seam, no flame, ten minutes. Keep it off the glass.',
      'warm-the-outer-ring': 'Glass out, then warm the outer ring evenly, not hotter than you can touch.',
    },
    asides: ['No pliers. An oval ring is stuck for good.'],
  }),
  family('tilt-plate-rocks-because-its-pull-screws-bottom', {
    titles: [
      'Tilt plate rocks with all its screws tight',
      'Pull screws of the tilt plate are tight and do not pull',
      'One corner moves, whatever I adjust',
    ],
    notices: [
      'The screws stop with a hard feel and the plate can still be lifted.',
      'Two corners follow the screws, the third does not.',
    ],
    tried: [
      'I have set it on a table of glass, it is not bent.',
      'Thread lock made it firm in the wrong place.',
    ],
    answers: {
      'five-mm-pull-screws':
        'They are half a millimetre too long and stand on the ground of the hole. Five millimetre ones pull.',
      'washers-under-the-heads': 'A washer under each head does the same for tonight.',
    },
    asides: ['Reach of the screw below the plate against depth of the hole, that is all there is to it.'],
  }),
  family('printed-spacer-has-crept-and-tilts-the-camera', {
    titles: [
      'Printed spacer has gone out of shape',
      'Tilt that grows over weeks',
      'Spacer thicker on one side than when it was new',
    ],
    notices: [
      'It was flat in spring and differs by more than a tenth now.',
      'The worst corner is where the screws are tightest.',
    ],
    tried: ['Turning it moves the bad corner.', 'A new one was good for two months.'],
    answers: {
      'ring-of-metal': 'A ring of metal of that thickness, and never again.',
      'print-in-filled-nylon': 'Mine is printed in filled nylon, solid, and has kept its shape for a year.',
    },
    asides: ['Was it in the car in summer?'],
  }),
  family('reducer-barrel-bottoms-in-the-heron-72-drawtube', {
    titles: [
      'Reducer does not go all the way into the Heron 72',
      'Barrel of the reducer stands on a step',
      'Three millimetres that should not be there',
    ],
    notices: [
      'It sits on something inside and can be tipped.',
      'The flange is three millimetres off its seat.',
    ],
    tried: [
      'Another barrel of the same width goes in fully, it is shorter.',
      'The clamp grips only the front half.',
    ],
    answers: {
      'split-ring-as-a-seat':
        'A split ring as thick as the gap gives the flange its seat; back focus has to be counted anew.',
      'barrel-shortened': 'I had the barrel turned shorter, lens group out of it first.',
    },
    asides: ['How deep is it to the step? Mine is 31 mm.'],
  }),
  family('dark-corners-with-the-m42-to-m48-adapter', {
    titles: [
      'Dark corners since the M42 adapter',
      'Flats no longer take the corners out',
      'Does a 36 mm opening cut the field?',
    ],
    notices: [
      'A third of the light is gone in the corners.',
      'Worst with the large sensor, none with the small one.',
    ],
    tried: ['Flats at another brightness, no difference.', 'Moving the reducer did not help.'],
    answers: {
      'adapter-next-to-the-camera': 'Put it next to the camera, where the cone is narrow.',
      'adapter-rev-b': 'The later adapter opens wider.',
    },
    asides: [
      'Look through from the front with one eye in the corner of the field, you see the ring that cuts.',
    ],
  }),
  family('camera-adapter-m54-holes-are-turned-against-the-q26', {
    titles: [
      'Six holes of the M54 adapter do not meet the Q26',
      'Adapter fits with three screws only',
      'Holes turned by two degrees, file or return?',
    ],
    notices: ['Three screws go in, the others touch the edge of their holes.', 'Forced, the flange tilts.'],
    tried: ['Turning it to the next hole is the same.', 'Smaller heads do not reach.'],
    answers: {
      'three-screws-at-120': 'Three at 120 degrees hold it well. Choose those that go in freely.',
      'ream-the-six-holes': 'Open the six to 3.4, adapter off the camera and the sensor closed.',
    },
    asides: ['Do not force the last one, it pulls the flange out of square.'],
  }),
];
