import { family, type QuestionFamily } from './family.js';

/** Brackets, plates, rings, feet and clamps. */
export const bracketQuestions: readonly QuestionFamily[] = [
  family('m2-screws-do-not-line-up-with-the-motor-plate', {
    titles: [
      'M2 and the motor plate: holes are on another circle',
      'Only two of four screws go in',
      'Bolt circle of the motor plate, 31 or 33?',
    ],
    notices: [
      'Two screws catch, the other two stand a millimetre beside their holes.',
      'The plate is square on the motor only with all screws out.',
    ],
    tried: [
      'Thinner screws would go in, but hold nothing.',
      'I have asked for another plate and got the same one.',
    ],
    answers: {
      'slot-the-four-holes':
        'Slot each hole outwards by a millimetre with a round file, plate clamped and off the motor. All four screws then hold.',
      'plate-rev-c-with-slots': 'The later plate has slots from the start. I changed mine, five minutes.',
    },
    asides: ['What is stamped on the back of the motor? They changed the circle without a word.'],
  }),
  family('m1-rigid-bracket-rocks-on-the-wren-60-tube', {
    titles: [
      'Rigid bracket rocks on the tube of the Wren 60',
      'Saddle of the M1 bracket touches only in the middle',
      'Backlash changes when I lean on the motor',
    ],
    notices: [
      'A sheet of paper goes in under both edges and not in the middle.',
      'The focuser’s play is different with the telescope pointing up.',
    ],
    tried: ['Tightening the straps bends it down and it springs back.', 'Double tape was soft in the sun.'],
    answers: {
      'cork-strips-at-the-edges':
        'Two strips of cork along the edges, half a millimetre thick when pressed, and it stands on four places instead of one line.',
      'bracket-rev-b-lined': 'The later bracket is lined and has the right radius.',
    },
    asides: ['Measure the tube, there were some with paint a tenth thicker.'],
  }),
  family('m1-cable-outlet-hits-the-tube-ring', {
    titles: [
      'Plug of the M1 does not go past the tube ring',
      'Where to lead the cable of the M1 on a short tube',
      'Motor sits where the ring hinge is',
    ],
    notices: [
      'The plug needs more room than there is up to the hinge.',
      'With the cable bent over, focus moves when the cable does.',
    ],
    tried: [
      'An angled plug is still four millimetres too long.',
      'The ring cannot be turned, the dovetail is on it.',
    ],
    answers: {
      'turn-the-motor-a-quarter':
        'Four screws out, motor a quarter round, screws in: the outlet then points along the tube.',
      'ring-forward-by-14':
        'Move the ring forward by a finger’s breadth. Balance has to be done again, nothing else.',
    },
    asides: ['Keep a loop in the cable whatever you do.'],
  }),
  family('rack-2-drawtube-slides-when-pointing-up', {
    titles: [
      'Drawtube of the Rack 2 slides when pointing up',
      'Camera sinks by itself, motor holds its number',
      'How tight may the brake screws be?',
    ],
    notices: [
      'In ten minutes near the zenith the best position is off by eighty micrometres.',
      'The motor says it has not moved, a mark on the tube says otherwise.',
      'With the light camera nothing moves.',
    ],
    tried: ['Tightening one screw tilts the tube.', 'Moving the counterweight does not change it.'],
    answers: {
      'brake-screws-in-pairs':
        'In pairs and by an eighth of a turn, weighing the pull after each. Stop when it holds your camera and a bit.',
      'clean-the-drive-shaft':
        'There was oil on the drive shaft. Wiped with alcohol it has held since without the brake.',
    },
    asides: [
      'What does the camera weigh with everything on it? Give the pull along the tube in newtons if you can.',
    ],
  }),
  family('m1-rigid-bracket-lip-bottoms-in-the-shallow-recess', {
    titles: [
      'Lip of the rigid bracket bottoms in the older M1',
      'A hair of light all round under the bracket',
      'Is the recess of my M1 shallower than others?',
    ],
    notices: [
      'It goes in easily and stops before the faces meet.',
      'Light shows under the plate on every side.',
    ],
    tried: ['Tightening harder bows the plate.', 'No burr that I could find.'],
    answers: {
      'shim-washers-on-the-screws':
        'A thin washer on each screw between the faces: the lip hangs free and the plate rests on four places.',
      'rub-the-lip-down':
        'Four tenths off the lip on wet paper on glass, measured often. It is plastic and goes quickly.',
    },
    asides: ['Depth of the recess and height of the lip, please, both from the same face.'],
  }),
  family('guide-foot-n2-is-loose-in-the-finder-shoe', {
    titles: [
      'Guide foot N2 wobbles in its shoe',
      'Stars trail although the guiding graph is flat',
      'One millimetre of play in the finder shoe',
    ],
    notices: [
      'I can roll the guide scope by hand with the screw tight.',
      'Half an hour is fine, an hour is not, and the frames move along one line.',
    ],
    tried: ['A second screw would need a hole.', 'Paper held until the dew came.'],
    answers: {
      'brass-strip-beside-the-foot':
        'A strip of brass beside the foot, opposite the screw, as thick as the play. It does not swell as card does.',
      'foot-rev-c': 'The newer foot is the full width. Mine has not moved in a year.',
    },
    asides: ['Tap it while looking at the guide star: if that jumps you have it.'],
  }),
  family('stars-are-triangular-in-ring-clamp-70', {
    titles: [
      'Triangular stars since the ring clamp went on',
      'How tight may ring clamp 70 be?',
      'Spikes at 120 degrees, only when it is cold',
    ],
    notices: [
      'All over the field, and gone when I loosen the clamp by half a turn.',
      'Warm it looks round, at zero it is a triangle.',
    ],
    tried: ['Looser and the tube slides.', 'Turning the tube turns the triangle with the clamp.'],
    answers: {
      'three-cork-pads':
        'Three pads of cork where the clamp bears; it gives in the cold what the metal does not.',
      'move-clamp-off-the-lens': 'As far from the lens cell as the balance allows. Four centimetres did it.',
    },
    asides: ['Is the cell near the clamp? Then it is not the tightness alone.'],
  }),
  family('heron-72-bar-touches-the-dovetail-clamp-at-its-edge', {
    titles: [
      'Bar of the Heron 72 sits on its edge in the clamp',
      'Dovetail bar creeps however hard I clamp',
      'Seventy-five degrees in a sixty degree saddle?',
    ],
    notices: [
      'Blue dye shows one thin line along the edge.',
      'After a slew to the other side the star is somewhere else.',
    ],
    tried: ['More force marks the bar.', 'Sandpaper between them was worse.'],
    answers: {
      'clamp-rev-c-swivels': 'The newer clamp has a jaw that swivels to the flank; the line became a face.',
      'wedge-strip-of-15-degrees':
        'I printed a strip with the fifteen degrees between them, dense, along the whole jaw.',
    },
    asides: ['Which flank does the bar have? There are both on the market under one name.'],
  }),
  family('guide-scope-30-sags-between-its-rings', {
    titles: [
      'Guide scope 30 sags between its screws',
      'A third of a minute of arc per hour between guider and telescope',
      'Differential flexure or polar error, how to tell',
    ],
    notices: [
      'The drift turns with the telescope’s position, so it is not the axis.',
      'With two fingers I can push the scope against its plastic screws.',
    ],
    tried: ['New screws of nylon gave the same.', 'A second ring has no room.'],
    answers: {
      'printed-collar-in-the-ring':
        'A printed collar instead of the three screws: it holds all round and the drift went below what I can measure.',
      'scope-rev-c-solid-ring': 'The solid ring of the later one is worth it if you are buying anyway.',
    },
    asides: [
      'Take two frames an hour apart on each side of the meridian; if the drift changes sign it sags.',
    ],
  }),
  family('guide-foot-holes-do-not-match-the-tube-ring', {
    titles: [
      'Holes of the guide foot are a millimetre off',
      'Guide foot on tube ring 70: one screw only?',
      'Spacing 34 against 35',
    ],
    notices: [
      'One screw goes in straight, the other starts at a slant.',
      'With one screw alone it turns when I touch the scope.',
    ],
    tried: ['Smaller screws rattle.', 'I can force it, but I would rather not.'],
    answers: {
      'slot-one-hole': 'Slot one of the two by a millimetre towards the middle and use a washer.',
      'foot-rev-c-with-inserts': 'There is a later foot with inserts at the right spacing.',
    },
    asides: ['Not by force: the thread in the ring is the dearer part.'],
  }),
  family('saddle-riser-takes-the-room-of-the-focus-motor', {
    titles: [
      'Focus motor meets the saddle riser',
      'Four millimetres short of focus since the riser',
      'Motor stalls against the riser at the end of travel',
    ],
    notices: [
      'The last millimetres of travel are gone because the motor’s corner touches.',
      'It stalls at the same number each time, with a dent in the paint to match.',
    ],
    tried: [
      'Turning the whole telescope in its rings puts the finder below.',
      'A thinner riser is too low for the clutch.',
    ],
    answers: {
      'motor-at-four-oclock':
        'Turn the bracket until the motor hangs at four o’clock; it passes the riser then.',
      'riser-forward-6-mm': 'Move the riser forward by six millimetres, there are holes for it.',
    },
    asides: ['How much travel is missing? Below two millimetres an extension behind does it as well.'],
  }),
  family('tube-slides-in-tube-ring-70-with-three-strips', {
    titles: [
      'Tube slides in tube ring 70',
      'Felt of the rings is worn, or was it always this thin?',
      'Telescope slips down in its rings overnight',
    ],
    notices: [
      'By morning it has moved by the breadth of the label.',
      'The rings are closed until they touch and the tube still turns.',
    ],
    tried: ['Talc was a mistake.', 'Rubber grips but sticks to the paint.'],
    answers: {
      'card-under-the-felt':
        'A strip of card under each felt, as thick as the play divided by two. Nobody sees it and it holds.',
    },
    asides: ['Three strips or full felt inside? Those with three are from the second batch.'],
  }),
];
