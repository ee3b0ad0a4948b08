import { family, type QuestionFamily } from './family.js';

/** Cameras, wheels, rotators and heaters. */
export const cameraQuestions: readonly QuestionFamily[] = [
  family('dew-ring-does-not-go-over-the-wren-60-dew-shield', {
    titles: [
      'Dew ring is a hair too small for the Wren 60',
      'Ring heater jams half way over the shield',
      'Two tenths too tight, sand or swap?',
    ],
    notices: [
      'It starts and then stands askew, with paint coming off.',
      'The shield reads 80.4, the ring 80.2.',
    ],
    tried: ['Warming the ring does not give enough.', 'Soap got it on once, getting it off was worse.'],
    answers: {
      'ring-rev-c-with-cork': 'Ask for the later ring, wider and lined with cork.',
      'open-the-bore-by-paper':
        'Wet paper round a tin of nearly that size, ring unplugged, until it slides. Keep the dust wet.',
      'strip-instead-of-the-ring': 'A strip goes round anything. I gave the ring away.',
    },
    asides: ['Do not let it sit half way with power on.'],
  }),
  family('dew-strip-60-leaves-a-cold-spot-at-its-ends', {
    titles: [
      'Dew in a wedge at the top of the lens',
      'Strip 60 does not close round the shield',
      'Where should the gap of a dew strip be?',
    ],
    notices: [
      'Always the same sixth of the lens, where the ends do not meet.',
      'Six millimetres are missing to close it.',
    ],
    tried: [
      'More power fogs the stars before it clears the wedge.',
      'A rubber band pulls it together and off its place.',
    ],
    answers: {
      'gap-to-the-top': 'Turn the gap to the top; warm air from both sides rises past it.',
      'foil-under-the-gap':
        'A piece of foil under the ends carries the heat across. Nothing bare near the contacts.',
    },
    asides: ['Is it the 60 or the 70? They look alike in the bag.'],
  }),
  family('supply-cuts-out-with-dew-strip-80-and-motor', {
    titles: [
      'Supply cuts out when heater and motor start together',
      'Everything dark for a second at each focus run',
      'How strong a supply for strip 80 and an M2?',
    ],
    notices: [
      'Each alone runs for hours; together it trips within minutes.',
      'It is worse with the long lead.',
    ],
    tried: ['A thicker lead helped a little.', 'The battery is full, I checked.'],
    answers: {
      'stagger-and-regulate':
        'Start one after the other and let the strip run at half; the sum stays below the limit.',
      'supply-of-its-own': 'Give the heater its own supply, fused at its end. Then the motor does not care.',
    },
    asides: ['Leave the supply itself closed, whatever it says on its label.'],
  }),
  family('focus-drifts-when-the-dew-strip-warms-the-focus-ring', {
    titles: [
      'Focus drifts since I use the dew strip',
      'Sixty micrometres in the first hour, then steady',
      'Heater near the focuser, does it matter?',
    ],
    notices: [
      'The drift starts when the strip does and stops when it is warm through.',
      'Against the thermometer it makes no sense, against the heater it does.',
    ],
    tried: ['Refocusing every ten minutes works, of course.', 'Less power only makes it slower.'],
    answers: {
      'strip-to-the-shield':
        'Put the strip on the shield, far from the focuser, and run it at a third. The drift was gone the same night.',
    },
    asides: ['Log position against time with the heater off for one evening, then you are sure.'],
  }),
  family('filters-rattle-in-fw5', {
    titles: [
      'Filters rattle in the FW5',
      'Flats do not match after every turn of the wheel',
      'Thin filters in a seat for thick ones',
    ],
    notices: [
      'When I shake the wheel gently I hear them.',
      'Dust shadows move between two frames of one filter.',
    ],
    tried: ['A drop of varnish came loose.', 'The spring rings do not reach down that far.'],
    answers: {
      'card-rings-under-the-filters':
        'Rings of black card under each, as thick as the difference. Weigh them down a night before closing.',
      'threaded-rings-rev-c': 'The carousel with threaded rings can be had by itself.',
    },
    asides: ['How thick are the filters, with and without their cell?'],
  }),
  family('fw7-case-meets-the-focus-motor', {
    titles: [
      'FW7 hits the focus motor',
      'Large filter wheel and M2 do not go together?',
      'Six millimetres of overlap between wheel and motor',
    ],
    notices: ['Inwards the case meets the motor before focus is reached.', 'It stalls with a scrape.'],
    tried: ['An extension gives the room and takes the back focus.', 'The motor’s other side has the cable.'],
    answers: {
      'turn-the-wheel-60': 'Turn the wheel by sixty degrees on its thread, then its corner is elsewhere.',
      'case-rev-b': 'The later case is cut away just there.',
    },
    asides: ['Measure from the axis to the farthest point of both and add two millimetres for the cable.'],
  }),
  family('filter-drawer-lifts-off-its-magnets', {
    titles: [
      'Filter drawer comes off its magnets',
      'Drawer is a tenth out after each change',
      'Magnets stand proud in the drawer',
    ],
    notices: [
      'It snaps in and then sits askew on one magnet.',
      'The frame shifts by some pixels at every change.',
    ],
    tried: ['Pressing it home by hand holds until the first slew.', 'Tape on the magnets was too thick.'],
    answers: {
      'set-magnets-in-epoxy':
        'Set them a tenth deeper in epoxy, flush against a glass plate. Mind which way round they are.',
      'drawer-rev-b': 'The later body holds them from behind.',
    },
    asides: ['Keep them away from cards and watches while you do it.'],
  }),
  family('r54-rotator-slips-under-a-heavy-camera', {
    titles: [
      'R54 lets the camera turn by itself',
      'Angle of the camera is off by two degrees in the morning',
      'Rotator slips where the cable pulls',
    ],
    notices: ['It turns when the cable comes round, always the same way.', 'Two newtons at the rim move it.'],
    tried: ['The screw on top is as tight as it goes.', 'Less weight helps, but I need the wheel.'],
    answers: {
      'spring-screw-and-clean-track': 'Half a turn on the spring screw and alcohol on the track.',
      'tie-the-cables-on-axis': 'Lead the cables along the axis, then nothing pulls at the rim.',
    },
    asides: ['Weigh what hangs behind it, there is a limit in the leaflet.'],
  }),
  family('hand-rotator-lock-screw-dents-the-dovetail', {
    titles: [
      'Lock screw of the hand rotator has made a dent',
      'Rotator always goes back to the same wrong angle',
      'How to get a dent out of a ring',
    ],
    notices: [
      'The screw finds its dent and pulls the angle with it.',
      'A bright crater with a rim that one can feel.',
    ],
    tried: ['Locking more gently does not hold.', 'Moving by ten degrees makes a second one.'],
    answers: {
      'brass-disc-under-the-screw': 'A disc of brass under the screw spreads the load. It cost me a washer.',
      'stone-the-dent-rim':
        'Take the rim down with a fine stone, camera off, opening closed; leave the crater.',
      'rotator-rev-b': 'There are screws with brass tips now, they fit the older body too.',
    },
    asides: ['Ask the maker for the tips first, I was sent three.'],
  }),
  family('q16-flange-tilts-on-its-adjusting-screws', {
    titles: [
      'Flange of the Q16 is tilted from the factory',
      'How to square the Q16 without an autocollimator',
      'Bottom left always long with the Q16',
    ],
    notices: [
      'The gap under the flange is half a millimetre at one screw and three tenths at another.',
      'The bad corner stays when I turn everything in front of the camera.',
    ],
    tried: ['By the stars I chase it round in circles.', 'Paper at one side made another corner bad.'],
    answers: {
      'square-it-with-leaves':
        'Feeler leaves at the three screws until all gaps are alike, camera face down on a flat plate. Then the stars.',
      'foil-under-one-side':
        'If the screws are at their end: foil under the low side, as thick as the difference.',
    },
    asides: ['Turn only the camera by half a turn and look whether the corner goes with it.'],
  }),
  family('g1-guide-camera-sticks-in-the-micro-helical', {
    titles: [
      'Guide camera G1 sticks in the micro helical',
      'G1 goes in and will not come out',
      'Barrel of the G1 two hundredths too wide?',
    ],
    notices: ['It goes in with a push and stays.', 'In the cold it will not go in at all.'],
    tried: ['Grease made it come out once.', 'Other cameras slide in the same bore.'],
    answers: {
      'rub-the-barrel-down':
        'A few hundredths off the barrel with fine paper, sensor closed with tape, all round alike.',
      'wax-and-a-stop-ring': 'Candle wax and a ring that keeps it from going in all the way.',
    },
    asides: ['Do not turn it out by its cable.'],
  }),
  family('indoor-focus-test-without-a-star-for-a-wren-60-with-m1', {
    titles: [
      'Can I test the motor indoors, without a star?',
      'How do I measure backlash in daylight?',
      'Clouded out for weeks, what can be tried on the bench',
    ],
    notices: [
      'I would like to know that all is well before the first clear night.',
      'Steps per turn I can count, but not what the lens sees.',
    ],
    tried: ['A lamp across the garden works, more or less.', 'With a printed chart I see nothing change.'],
    answers: {
      'reversal-test-on-a-lamp':
        'A far lamp behind foil with a pinhole does as a star. Run the reversal test on it and note both numbers.',
    },
    asides: ['Never towards the Sun, not even past a window.'],
  }),
  family('wren-60-field-shifts-with-the-ring-clamp-at-the-focuser', {
    titles: [
      'Field jumps when the ring clamp is tightened',
      'Focuser of the Wren 60 binds in its clamp',
      'May the clamp sit on the focuser itself?',
    ],
    notices: [
      'The image moves sideways by a tenth of the field when I close the screw.',
      'The helical goes hard at the same time.',
    ],
    tried: ['Less force and everything slides.', 'Felt under it was better, not good.'],
    answers: {
      'clamp-forward-of-the-joint':
        'Move it forward onto the tube, where there is wall to press on. Balance again and done.',
    },
    asides: ['The wall over the seat is just over a millimetre, it has no business there.'],
  }),
];
