import { family, type QuestionFamily } from './family.js';

/** Belts, gears and motors. */
export const driveQuestions: readonly QuestionFamily[] = [
  family('belt-bracket-lip-does-not-enter-the-m1-recess', {
    titles: [
      'Belt bracket stands off the M1 by more than a millimetre',
      'Should the lip of the belt bracket go into the motor at all?',
      'Bracket rocks on the M1 whichever screw I tighten first',
    ],
    notices: [
      'With all four screws loose the plate can be tipped with one finger; the lip sits on the rim of the recess.',
      'My caliper says the lip is three millimetres wider than the hole it is meant for, so it cannot be meant for this motor.',
      'The gap is the same all round when nothing is tight and closes on whichever side I tighten.',
    ],
    tried: [
      'I have turned the plate by a quarter each time, with no difference.',
      'Longer screws only bent the plate.',
    ],
    answers: {
      'coins-behind-the-plate':
        'Fill the gap instead of fighting it: coins of the right thickness at three of the screws, and the plate stands parallel. The gap is the height of the lip, since it does not enter at all; so measure that first.',
      'trim-the-lip-off':
        'On this pair the lip does no work. I took mine off and the plate has sat flat since; motor and belt out first, dust mask on.',
    },
    asides: [
      'Which revision of the motor is it? Up to Rev B the recess was wide enough, and the label tells.',
      'How high is the lip? With that figure the shim worksheet names the coins.',
    ],
  }),
  family('belt-slips-one-way-on-the-belt-bracket', {
    titles: [
      'Belt slips inwards but never outwards',
      'Teeth jump on the belt bracket when the drawtube comes back',
      'Focus runs good one way, hopeless the other',
    ],
    notices: [
      'Going out it holds against my hand; coming back it clicks over a tooth every half turn.',
      'A mark on the belt and one on the ring part company after three runs inwards.',
      'The curve of a run from the outside in has a step in it where the belt must have jumped.',
    ],
    tried: [
      'More tension makes the motor hum and does not stop it.',
      'A new belt did the same on the first evening.',
    ],
    answers: {
      'idler-to-slack-side':
        'Look which side is slack when it slips: the idler presses on the pulling side. Move it across and there are more teeth in mesh.',
      'tension-by-the-span':
        'Set it by the note of the free span rather than by feel; mine was at half of what it needed, and too tight was just as bad.',
    },
    asides: [
      'What pull does the grip ring want by itself? If it is over 8 N I would look at the grease first.',
      'Was it better when warm? Belts of the first batch get stiff.',
    ],
  }),
  family('belt-walks-off-the-motor-pulley', {
    titles: [
      'Belt climbs off the pulley of the M1',
      'Why does my belt run at the very edge of the pulley?',
      'Squeak, then the belt lies beside the pulley',
    ],
    notices: [
      'It takes about twenty turns, always towards the motor.',
      'Seen from above the belt is not square to the pulley.',
      'The edge of the belt has started to fray on one side.',
    ],
    tried: [
      'I have loosened and tightened the bracket twice.',
      'Swapping the belt end for end moved the fray to the other edge.',
    ],
    answers: {
      'pulley-into-the-plane':
        'Lay a straight edge across ring and pulley: mine was out by a millimetre. Slide the pulley on its shaft until both touch it.',
      'two-flange-idler': 'An idler with two flanges keeps it on where the plane cannot be got right.',
    },
    asides: [
      'Does the bracket sit flat? A tilted plate tilts the pulley with it.',
      'Check the grub screw too; a pulley that creeps looks just like this.',
    ],
  }),
  family('m1-stalls-in-the-cold-with-a-tight-belt', {
    titles: [
      'M1 stalls below freezing, fine indoors',
      'Motor hums but the ring stands still at minus four',
      'Is my M1 too weak for the Wren 60 in winter?',
    ],
    notices: [
      'At home it does a hundred runs; outside after an hour it loses steps on every second move.',
      'When I help by hand it goes, and the ring feels like cold honey.',
      'Only the inward moves fail, and only late at night.',
    ],
    tried: ['Half the speed helps for a while.', 'I took some tension off and it began to slip instead.'],
    answers: {
      'slower-and-slacker':
        'Both at once, and both by a little: a third slower and the belt just above where it slips. Mine has held to minus eight.',
      'regrease-the-helicoid':
        'The grease it is sold with stiffens. Cleaned and with a thin one the ring needs half the pull in the cold.',
    },
    asides: [
      'Measure the pull at the ring warm and cold before you touch anything; then you know which it is.',
      'What supply is it on? A flat cell looks the same.',
    ],
  }),
  family('belt-bracket-80-slots-end-before-the-belt-is-tight', {
    titles: [
      'Belt bracket 80: slots end and the belt is still loose',
      'Which belt for the 80 bracket, the one supplied is too long',
      'Two millimetres short of tension',
    ],
    notices: [
      'Motor hard against the end of the slots, and the belt can still be lifted off the pulley.',
      'It sags by a finger’s breadth in the middle of the span.',
    ],
    tried: [
      'I put a rubber band round it for one night, which I do not recommend.',
      'The other side of the bracket has the same slots.',
    ],
    answers: {
      'belt-three-teeth-shorter':
        'Three teeth less bring the motor back to the middle of the slots. Same pitch and width, next length down.',
      'open-the-slots-by-file':
        'I opened the slots by two millimetres with a file, from the far end, and kept the edges square. Motor off and everything covered first.',
    },
    asides: ['Count the teeth of yours before ordering: mine differed from the leaflet.'],
  }),
  family('ring-gear-fouls-the-focuser-clamp-screw', {
    titles: [
      'Ring gear hits the clamp screw of the Wren 60',
      'Grinding once a turn where the clamp screw is',
      'Is there a way round the screw head without filing?',
    ],
    notices: [
      'The rim touches the head for a few degrees and pushes the ring out of mesh.',
      'A bright line on the rim shows where it rubs.',
      'The motor stalls at the same place of the travel every time.',
    ],
    tried: [
      'Turning the screw in further takes the room but then the tube is clamped.',
      'A thinner head would have to be made.',
    ],
    answers: {
      'turn-the-ring-clear':
        'The travel is less than a turn. Loosen the ring, turn it so that the teeth you use never come to the screw, and tighten again.',
      'file-a-notch-in-the-rim':
        'A notch of a few millimetres in the rim clears it for good. Take the ring off for that, swarf and optics do not mix.',
    },
    asides: [
      'How high is the head above the body? Mine was 3.2 mm and there were 2.4 under the rim.',
      'Which way round is the kit mounted? In the leaflet it is mirrored.',
    ],
  }),
  family('ring-gear-slips-round-on-the-grip-ring', {
    titles: [
      'Motor turns, ring gear turns, focus does not',
      'Ring gear loose on the old grip ring',
      'New ring gear is larger than my grip ring',
    ],
    notices: [
      'With a pencil line across both I see the gear creep round on the knurl.',
      'I can turn it by hand with the screws as tight as I dare.',
      'It worked for a week and then began to lag.',
    ],
    tried: ['Tape under it was soft after an evening.', 'The three screws leave dents but do not hold.'],
    answers: {
      'brass-strip-under-the-ring':
        'A strip of brass sheet round the knurl, as thick as half the play, and it bites all round. No tape, it creeps.',
      'ring-bored-for-the-old-grip':
        'Ask for the ring bored to the old size; it was made for the newer grip.',
    },
    asides: ['What do you read over the knurl? The two sizes are a millimetre and a half apart.'],
  }),
  family('ring-gear-80-binds-once-a-turn', {
    titles: [
      'Ring gear 80 binds once a turn',
      'Mesh tight on one side and loose on the other',
      'Noise that comes and goes with each turn of the ring',
    ],
    notices: [
      'There is one place where it goes hard, and half a turn on there is play.',
      'Star size jumps at the same positions in every run.',
    ],
    tried: [
      'Opening the mesh stops the binding and then there is backlash everywhere else.',
      'Grease hides it for an hour.',
    ],
    answers: {
      'set-mesh-at-the-high-side':
        'Find the tight place first and set the mesh there; then nothing binds and the rest has a little more play, which the run takes out.',
      'centre-the-ring-first':
        'The ring is off centre. Three leaves of equal thickness between ring and grip, tighten, take them out, then set the mesh.',
    },
    asides: ['Hold a pencil to the teeth and turn: where does it touch?'],
  }),
  family('pinion-slips-on-the-m1-shaft', {
    titles: [
      'Pinion slips on the round shaft of the M1',
      'Position is off by more after every run',
      'Grub screw of the pinion never stays tight',
    ],
    notices: [
      'A felt-pen line over pinion and shaft is broken after one evening.',
      'It holds when I turn it by hand and slips when the motor starts with a jerk.',
      'Indoors fine, outside the zero point wanders.',
    ],
    tried: ['A larger key only rounded the screw.', 'Two drops of locking liquid held for a month.'],
    answers: {
      'degrease-and-lock-the-screw':
        'Shaft and bore have to be free of oil, and the screw wants a small dimple to sit in. Then lock it and leave it overnight.',
      'file-a-flat-on-the-shaft':
        'A flat of half a millimetre on the shaft ends it for good. Motor closed with tape first, no filings inside.',
    },
    asides: ['Read shaft and bore: if they differ by more than 0.05 mm no screw holds it.'],
  }),
  family('large-backlash-with-the-ring-gear-kit', {
    titles: [
      'Two hundred steps of backlash with the ring gear',
      'How much play is usual with the ring-gear kit?',
      'Image moves sideways each time focus reverses',
    ],
    notices: [
      'A reversal of 200 steps does nothing, 230 move the ring.',
      'I can hear the motor turn before anything moves.',
      'The run gives two curves, one for each direction.',
    ],
    tried: [
      'A higher number in the driver moves the trouble elsewhere.',
      'I pushed the motor by hand while tightening, it came back by itself.',
    ],
    answers: {
      'close-the-mesh-by-paper':
        'A strip of writing paper in the mesh, press together, tighten, turn the paper out. It left a quarter of the play here.',
      'approach-from-one-side':
        'Let every move end in the same direction. It does not take the play away but the pictures do not see it.',
    },
    asides: [
      'Test indoors first: smallest reversal that moves the ring, largest that does not.',
      'Is the bracket itself stiff? Half of mine was the plate bending.',
    ],
  }),
];
