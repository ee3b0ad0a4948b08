import { arrow, dimension, ring } from '../callouts.js';
import { beltPlan } from '../../drawing/drive-plans.js';
import { plotSheet } from '../../drawing/plots.js';
import { seatSection, tiltSection } from '../../drawing/sections.js';
import { atLeast, atMost, drawing, edition, fix, joint, read, side, withFix, writeUp, type DemoWriteUp } from '../write-up-shape.js';

const lip = { upper: 'BELT BRACKET', lower: 'MOTOR M1', boss: 22.5, bossHeight: 1.7, recess: 19.5, recessDepth: 2 };

const trimLip = fix('trim-the-lip-off', 'Trim the lip off', 'trim', 'permanent', {
  why: 'Without the lip the plate lies on the motor’s face over its whole area. The screws alone centre it then, so mark the motor’s place first.',
  tools: 'Rotary tool with a drum sander or a fine flat file; caliper; vice with soft jaws',
  materials: 'Masking tape; 240 grit paper on a flat plate',
  steps: [
    'Take the bracket off the telescope and the motor off the bracket. Take the bracket out of the room where the telescope stands: the dust of filled nylon gets everywhere.',
    'Blacken the lip with a felt pen and put tape on the face round it, right up to the lip. Tape is 0.1 mm thick: when the tool touches tape, stop.',
    'Clamp the bracket in soft jaws, lip up. With the rotary tool at low speed take the lip down in passes of about 0.3 mm. Wear eye protection and a dust mask.',
    'Stop 0.2 mm above the face. Peel the tape, lay the paper on a flat plate and rub the bracket on it in figures of eight until the black is gone.',
    'Lay a straight edge across: no light. Measure the plate at four corners; they should agree within 0.1 mm.',
    'Brush and wipe the bracket, then mount the motor with its shaft on the scribe mark.',
  ],
  sheet: '/worksheets/trim?v=1&bossDiameter=22.5&bossHeight=1.7&recessDiameter=19.5&recessOuter=30&recessDepth=2',
  after: ['focus-offsets'], note: 'Belt tension has to be set anew: the motor sits 1.7 mm nearer to the plate.',
  accept: atMost('tilt of the motor against the plate', 0.3, 'deg'), cautions: 'rotary-tool swarf', trials: 'h0.1 h0.2 h w n0.9',
});

/** The belt bracket on the M1: the demo's central write-up, with its neighbours. */
export const beltBracketWriteUps: readonly DemoWriteUp[] = [
  writeUp('belt-bracket-lip-does-not-enter-the-m1-recess', 'Belt bracket lip does not enter the M1 recess', {
    by: 'author', daysAgo: 690,
    summary: 'On M1 Rev C the recess is 19.5 mm wide, the bracket’s lip 22.5 mm. The plate stands on the rim and tilts. Coins as thick as the lip put it square again.',
    joints: [joint(side('stonebridge-belt-bracket', 'raised lip round the shaft hole', 'A B', ''), side('tarn-m1', 'recess round the shaft', 'C', 'A B'))],
    symptoms: 'plate-rocks plate-tilts lip-does-not-enter belt-walks-off',
    noticed: 'The plate rocks when I press opposite corners. With the screws tight there is a gap of a bit more than 1.5 mm on one side and the belt climbs towards the motor.',
    cause: 'The lip was made for the **23.0 mm** recess of M1 Rev A and B. From Rev C on the gearbox has a **19.5 mm** recess. A lip of 22.5 mm overlaps its rim by 1.5 mm all round, so the bracket stands on the lip instead of on its face. Pulled down on one side it pivots on the rim: over 31 mm a gap of 1.7 mm is 3.1°.',
    readings: [
      read('stonebridge-belt-bracket:B', 'diameter of the lip', 22.5, 'mm', 'caliper', 0.05), read('stonebridge-belt-bracket:B', 'height of the lip', 1.7),
      read('tarn-m1:C', 'diameter of the recess', 19.5), read('tarn-m1:C', 'depth of the recess', 2.0), read('tarn-m1:B', 'diameter of the recess', 23.0, 'mm', 'makers-drawing', null),
    ],
    fixes: [
      fix('coins-behind-the-plate', 'Coins behind the plate', 'shim', 'reversible', {
        why: 'Three coins as thick as the lip, set outside it, carry the plate where its face was meant to. Nothing is cut.',
        tools: 'Caliper; hex key 2.5 mm', materials: 'Three coins of 1.65 to 1.75 mm; thin double-sided tape; M3 screws 2 mm longer',
        steps: [
          'Unplug the motor and slacken the belt.',
          'Measure the lip’s height at four places: 1.7 mm on Rev B, 1.2 mm on Rev A.',
          'Pick three coins whose thickness agrees with the lip within 0.05 mm and with each other within 0.03 mm. Clean, unworn ones: the rim is what carries.',
          'Tape them to the bracket’s face at 120°, outside the lip and clear of the screws.',
          'Put the motor on, start all four screws, then tighten crosswise in three rounds, a quarter turn at a time.',
          'Press the corners: no rock. Hold a straight edge along the motor and look at the pulley; it must stand parallel to the ring.',
        ],
        sheet: '/worksheets/shim?v=1&gap=1.7&tolerance=0.05&mostPieces=2&layout=three-points&boltCircle=42&families=coin&families=washer',
        shows: { 3: 1 }, after: ['focus-offsets'], note: 'Set the belt’s tension again.',
        accept: atMost('tilt of the motor against the plate', 0.3, 'deg'), trials: 'h0.15 h0.2 h0.1 h w n0.8 h0.25',
      }),
      trimLip,
    ],
    drawings: [
      drawing(seatSection({ ...lip, title: 'BELT BRACKET REV B ON M1 REV C' }), 'Section: the bracket’s lip of 22.5 mm stands on the rim of the motor’s recess of 19.5 mm; the overlap is marked in red.', 'As delivered: the lip stands on the rim.', [ring('carries-on-the-rim', 'carries here', [544, 318], 38), dimension('across-the-lip', 'lip', [307, 300], [553, 300], 22.5)]),
      drawing(seatSection({ ...lip, title: 'WITH COINS UNDER THE PLATE', shim: { thickness: 1.7, name: 'COINS' } }), 'Section: coins of 1.70 mm fill the gap between plate and motor outside the lip.', 'Coins carry the plate.', [ring('coin-one-of-three', 'one of three', [611, 299], 60)]),
      drawing(tiltSection({ title: 'SCREWS PULLED DOWN ON ONE SIDE', gap: 1.7, span: 31, upper: 'BELT BRACKET', lower: 'MOTOR M1' }), 'Side view: the plate pivots on the rim, a gap of 1.70 mm over 31 mm makes 3.14 degrees.', 'What uneven screws do.', [arrow('opens-here', 'opens here', [560, 190], [652, 322])]),
    ],
    later: [
      edition('author', 520, 'Rev C of the bracket and Rev D of the motor measured; spread of the coins told.', (earlier) => ({
        ...earlier,
        summary: 'From M1 Rev C on the recess is 19.5 mm wide, the bracket’s lip 22.5 mm. The plate stands on the rim and tilts. Coins as thick as the lip put it square again.',
        joints: [joint(side('stonebridge-belt-bracket', 'raised lip round the shaft hole', 'A B C', ''), side('tarn-m1', 'recess round the shaft', 'C D', 'A B'))],
        cause: `${earlier.cause}\n\nM1 Rev D has the same recess; only its shaft differs.`,
        readings: [...earlier.readings, read('tarn-m1:D', 'diameter of the recess', 19.48), read('stonebridge-belt-bracket:C', 'diameter of the lip', 22.46, 'mm', 'caliper', 0.05)],
      })),
      edition('bram', 330, 'Two more ways: a printed ring, and a bracket printed without the lip.', (earlier) => ({
        ...earlier,
        fixes: [
          earlier.fixes[0]!,
          fix('printed-ring-under-plate', 'Printed ring under the plate', 'shim', 'reversible', {
            why: 'A ring carries all round, so the plate cannot bend between three points. Better than coins where the screws are tightened hard.',
            tools: 'Printer; caliper; flat plate with 400 grit paper', materials: 'Glass-filled nylon or similar; no soft plastics',
            steps: [
              'Print a ring of 34 mm outside, 23 mm inside and 1.8 mm thick, solid.',
              'Rub it on the flat plate until it is as thick as the lip within 0.03 mm all round; turn it a quarter after every ten strokes.',
              'Slip it over the lip and mount the motor, screws crosswise.',
              'Check for rock, then run the motor end to end and watch the belt on the pulley.',
            ],
            after: ['focus-offsets'], accept: atMost('tilt of the motor against the plate', 0.3, 'deg'), cautions: 'dust', trials: 'h0.08 h0.1 h h0.12 n',
          }),
          fix('print-it-without-lip', 'Print the bracket without the lip', 'remake', 'reversible', {
            why: 'The maker hands the model out on request. Without the lip the plate lies flat on every motor revision; a loose centring ring of 19.3 mm does what the lip did.',
            tools: 'Printer with an enclosure; 3.2 mm hand reamer', materials: 'Glass-filled nylon; brass inserts M3',
            steps: ['Ask the maker for the model, or measure the arm’s holes and draw it.', 'Leave the lip away. Print flat side down, six walls, solid round the holes.', 'Clear the holes with the hand reamer.', 'Mount with the centring ring in the recess; take the ring out when the screws are tight.'],
            after: ['focus-offsets'], accept: atMost('tilt of the motor against the plate', 0.3, 'deg'), trials: 'h h w',
          }),
          earlier.fixes[1]!,
        ],
      })),
      edition('author', 140, 'The maker made Rev D with a lip of 19.2 mm: swap added; trim is now the last resort.', (earlier) => ({
        ...withFix(earlier, 'trim-the-lip-off', { why: 'Without the lip the plate lies on the motor’s face over its whole area. **Only where neither coins nor a swap will do**: the bracket loses its value and the screws alone centre it.' }),
        joints: [joint(side('stonebridge-belt-bracket', 'raised lip round the shaft hole', 'A B C', 'D'), side('tarn-m1', 'recess round the shaft', 'C D', 'A B'))],
        fixes: [
          ...earlier.fixes.slice(0, 3),
          fix('swap-for-bracket-rev-d', 'Swap for bracket Rev D', 'swap', 'reversible', {
            why: 'Rev D has a lip of 19.2 mm that enters the 19.5 mm recess with room.', tools: 'Hex key 2.5 mm', materials: 'Belt bracket Rev D (four dots underneath)',
            steps: ['Look for four dots underneath before you pay: bags were mixed for a while.', 'Mount it on the motor and turn it by hand: it centres itself with a little play.', 'Set the belt and run a focus run to find the new offset.'],
            after: ['focus-offsets'], accept: atMost('gap under the plate', 0.05, 'mm'), trials: 'h0.02 h0.03 h', madeRight: 'stonebridge-belt-bracket:D',
          }),
          ...earlier.fixes.slice(3),
        ],
      })),
    ],
  }),
  writeUp('belt-slips-one-way-on-the-belt-bracket', 'Belt slips one way on the belt bracket', {
    by: 'author', daysAgo: 610,
    summary: 'The belt jumps teeth when focusing inwards and never outwards. The idler stands on the tight side: move it to the slack side and nearer to the small pulley.',
    joints: [joint(side('stonebridge-belt-bracket', 'tensioner slot', 'A B', 'C'), side('thornapple-belt-kit-60', 'idler and belt', 'B C'))],
    symptoms: 'belt-slips-one-way belt-slips focus-run-fails backlash-large',
    noticed: 'Inwards I hear it tick and the focus run makes a step. Outwards all is well. Tightening the belt more makes the motor stall in the cold.',
    cause: 'A belt is pulled tight on one side and goes slack on the other. Turning the focus ring **in** lifts the camera’s weight and pulls hardest. On bracket Rev A and B the idler sits on the span that is tight in this direction, so it is pushed away and the slack gathers at the small pulley, where only eight teeth carry.',
    readings: [read('thornapple-belt-kit-60:B', 'pitch of the belt', 2, 'mm', 'makers-drawing', null), read('', 'pull at the grip ring to turn it', 6.5, 'N', 'other', 1), read('stonebridge-belt-bracket:B', 'length of the tensioner slot', 14, 'mm')],
    fixes: [
      fix('idler-to-slack-side', 'Idler to the slack side', 'reposition', 'reversible', {
        why: 'On the slack side the idler takes up what the pull leaves over and adds wrap to the small pulley.', tools: 'Hex key 2.5 mm; spanner 5.5 mm; ruler', materials: '',
        steps: [
          'Unplug the motor before you reach into the drive.', 'Turn the ring inwards by hand and see which span goes slack: that is where the idler belongs.',
          'Move the idler’s bolt into the other slot, a third of the span from the small pulley, and press the belt in by 4 mm.',
          'Pull at the middle of the tight span with a small spring balance: 3 N should move it by 3 mm.', 'Mark two teeth and the ring with chalk. Drive 3,000 steps in and out five times: the marks must come back to each other.',
        ],
        shows: { 2: 1 }, after: ['focus-offsets'], accept: atMost('marks apart after five runs', 0.2, 'mm'), cautions: 'pinch', trials: 'h0 h0.1 h0.1 h w n1.5 h0.05 h0.1',
      }),
      fix('tension-by-the-span', 'Set the tension by the span', 'adjust', 'reversible', {
        why: 'Too little slips, too much bends the shaft and stalls the motor. The middle of the free span tells.', tools: 'Spring balance to 5 N; ruler', materials: '',
        steps: ['Unplug the motor.', 'Loosen the motor’s screws a quarter turn and push it outwards until 3 N moves the span’s middle by 3 mm.', 'Tighten crosswise, measure again at four positions of the ring and take the tightest as your figure.'],
        accept: atMost('spread of the tension round the ring', 0.8, 'N'), cautions: 'pinch', trials: 'h h w n',
      }),
    ],
    drawings: [
      drawing(beltPlan({ title: 'IDLER ON THE TIGHT SIDE', bigTeeth: 118, smallTeeth: 20, pitch: 2, centres: 66, idler: { along: 0.45, press: 3, side: 'tight' } }), 'Plan: toothed belt over a large and a small pulley with the idler on the tight span above.', 'As delivered: the idler is pushed away by the pull.'),
      drawing(beltPlan({ title: 'IDLER ON THE SLACK SIDE', bigTeeth: 118, smallTeeth: 20, pitch: 2, centres: 66, idler: { along: 0.3, press: 4, side: 'slack' } }), 'Plan: the idler now presses into the slack span below, near to the small pulley.', 'Idler moved.'),
    ],
    later: [
      edition('author', 430, 'Tension given by a spring balance instead of by feel.', (earlier) => ({
        ...earlier, readings: [...earlier.readings, read('', 'pull for 3 mm at the middle of the span', 3, 'N', 'other', 0.3)],
        cause: `${earlier.cause}\n\nPulling harder does not cure it: at twice the tension the teeth still jump, and the motor’s shaft carries 14 N sideways.`,
      })),
      edition('edda', 210, 'Sprung arm added for those whose ring runs out of round.', (earlier) => ({
        ...earlier,
        fixes: [
          ...earlier.fixes,
          fix('add-the-sprung-arm', 'Add the sprung arm', 'swap', 'leaves-a-mark', {
            why: 'Where the ring runs out by more than 0.3 mm no fixed idler is right all round. The arm follows.', tools: 'Drill 2.5 mm; M3 tap; centre punch', materials: 'Tension arm Rev B or C; M3 × 8 screw',
            steps: ['Take motor and bracket off; drilling is done away from the telescope.', 'Mark the pivot 22 mm from the small pulley’s axis, punch, clamp and drill 2.5 mm. Wear eye protection.', 'Tap M3, brush the chips off and wipe.', 'Mount the arm so that its spring is half bent with the belt on.'],
            after: ['focus-offsets'], accept: atMost('marks apart after five runs', 0.2, 'mm'), cautions: 'rotary-tool swarf pinch', trials: 'h h w',
          }),
        ],
      })),
    ],
  }),
  writeUp('belt-walks-off-the-motor-pulley', 'Belt walks off the motor pulley', {
    by: 'calla', daysAgo: 455,
    summary: 'The belt climbs to one edge and drops off after a few turns. The motor’s pulley is not in the plane of the ring: set it by a straight edge, then lock it on the flat.',
    joints: [joint(side('thornapple-belt-kit-60', 'motor pulley', 'A B', 'C'), side('tarn-m1', 'output shaft', 'A B C D'))],
    symptoms: 'belt-walks-off drive-noisy', noticed: 'Black dust under the pulley, and the belt hums at one edge.',
    cause: 'A belt creeps towards the side where it is tighter. If the pulleys are 1 mm out of plane, or the motor leans by half a degree, it climbs. Rev C’s idler has flanges on both sides and holds it back; that hides the lean rather than curing it.',
    readings: [read('tarn-m1:C', 'offset of the pulley from the plane of the ring', 1.1, 'mm', 'ruler', 0.2), read('thornapple-belt-kit-60:B', 'width of the belt', 6.0)],
    fixes: [
      fix('pulley-into-the-plane', 'Pulley into the plane of the ring', 'adjust', 'reversible', {
        why: 'In one plane the belt has no side to climb to.', tools: 'Straight edge 150 mm; hex key 1.5 mm; torch', materials: '',
        steps: ['Unplug the motor.', 'Lay the straight edge across the face of the ring and look at the pulley’s face: the gap tells the offset.', 'Loosen the grub screws and slide the pulley until light shows evenly.', 'Tighten the first grub screw on the flat if there is one, then the other.', 'Run ten turns each way, slowly, and look at the belt’s edge under a torch.'],
        accept: atMost('offset of the pulley from the plane', 0.2, 'mm'), cautions: 'pinch', trials: 'h0.1 h0.15 h h0.2 w',
      }),
      fix('two-flange-idler', 'Fit the idler with two flanges', 'swap', 'reversible', {
        why: 'Keeps the belt on while you find the lean.', tools: 'Spanner 5.5 mm', materials: 'Idler of belt kit Rev C',
        steps: ['Slacken the belt, change the idler, set the tension again.', 'Look after a week: a bright flange means that the lean is still there.'], accept: atMost('wear at the belt’s edge after a month', 0.1, 'mm'), cautions: 'pinch', trials: 'h0.05 w n', madeRight: 'thornapple-belt-kit-60:C',
      }),
    ],
    drawings: [drawing(tiltSection({ title: 'MOTOR LEANS ON ITS BRACKET', gap: 0.4, span: 42, upper: 'MOTOR M1', lower: 'BRACKET' }), 'Side view: the motor leans by half a degree on its bracket over 42 mm.', 'The lean is small; the belt feels it.')],
  }),
  writeUp('m1-stalls-in-the-cold-with-a-tight-belt', 'M1 stalls in the cold with a tight belt', {
    by: 'dov', daysAgo: 380,
    summary: 'Below freezing the motor buzzes and the focus stays. Grease stiffens and the belt shortens its margin: slacken by a known amount and slow the motor down.',
    joints: [joint(side('tarn-m1', 'output shaft', 'A B C'), side('larkfield-wren-60', 'grip ring of the focuser', 'A B', 'C'))],
    symptoms: 'motor-stalls-cold motor-stalls motor-turns-focus-does-not focus-run-fails', noticed: 'At plus 8 °C all is well. At minus 6 °C it buzzes for the first hundred steps and then jumps.',
    cause: 'The helicoid of batches A and B is packed with a stiff grease; its pull doubles from plus 10 to minus 5 °C. Rev C’s grease is thinner. The M1 gives its rated pull only below 300 steps a second.',
    readings: [read('larkfield-wren-60:B', 'pull at the grip ring at plus 10 °C', 6, 'N', 'other', 1), read('larkfield-wren-60:B', 'pull at the grip ring at minus 5 °C', 13, 'N', 'other', 2)],
    fixes: [
      fix('slower-and-slacker', 'Run slower, belt a little slacker', 'adjust', 'reversible', {
        why: 'Half the speed gives about a third more pull; 0.5 mm less tension takes 4 N off the shaft.', tools: 'Spring balance', materials: '',
        steps: ['Set the motor to 200 steps a second in its software.', 'With the motor unplugged, slacken until 3 N moves the span by 4 mm.', 'Leave the telescope out for an hour, then command 500 steps and measure at the ring’s scale what came.'],
        accept: atLeast('steps that arrive of 500 commanded, after an hour outside', 490, 'steps'), cautions: 'pinch', trials: 'h498 h500 h495 w410 n120 h499',
      }),
      fix('regrease-the-helicoid', 'Clean and regrease the helicoid', 'adjust', 'leaves-a-mark', {
        why: 'Thin low-temperature grease takes the stiffness away for years. The focuser comes apart: mark the thread’s start or it will not go together at the same place.', tools: 'Hex keys; felt pen; lint-free cloth; soft brush', materials: 'Isopropyl alcohol; low-temperature grease for plastics and brass',
        steps: ['Take the camera off and the lens cell out and cap it; set both far away.', 'Mark where the helicoid lets go as you unscrew it: a line across both parts.', 'Wipe the old grease off with alcohol on a cloth, never poured. Window open, no flame.', 'Let it dry for half an hour. A film of new grease, no more than shows a finger’s print.', 'Start the thread at the line. Turn it end to end ten times and wipe off what comes out.'],
        after: ['collimation', 'focus-offsets', 'flats'], note: 'The lens cell was out: check the star test.', accept: atMost('pull at the grip ring at minus 5 °C', 8, 'N'), cautions: 'solvent', trials: 'h6 h7 h n12', madeRight: 'larkfield-wren-60:C',
      }),
    ],
    drawings: [drawing(plotSheet({ title: 'PULL AT THE GRIP RING', acrossName: 'TEMPERATURE, °C', upName: 'PULL, N', across: [-10, 20], up: [0, 20], series: [{ name: 'REV B', colour: 'red', points: [[-8, 16], [-5, 13], [0, 9.5], [5, 7.4], [10, 6], [18, 4.8]] }, { name: 'REGREASED', colour: 'brass', points: [[-8, 7.6], [-5, 7], [0, 5.9], [5, 5.2], [10, 4.6], [18, 4.1]] }], limit: { value: 11, name: 'M1 GIVES 11' } }), 'Plot of the pull at the grip ring against temperature: before, it rises to 16 N at minus 8 degrees, after regreasing to 7.6 N; the motor gives 11 N.', 'Where the motor gives up.')],
  }),
  writeUp('belt-bracket-80-slots-end-before-the-belt-is-tight', 'Belt bracket 80 slots end before the belt is tight', {
    by: 'edda', daysAgo: 300,
    summary: 'With the 366 mm belt the motor reaches the end of its slots and the belt still sags. A belt three teeth shorter is the clean way; opening the slots is the other.',
    joints: [joint(side('stonebridge-belt-bracket-80', 'motor slots', 'A', 'B'), side('thornapple-belt-kit-80', 'belt', 'A', 'B'))],
    symptoms: 'cannot-tension belt-slips', noticed: 'Screws stand at the end of the slots; I can still press the span in by 9 mm with one finger.',
    cause: 'The belt of 183 teeth wants the shafts 1.6 mm further apart than the 8 mm slots allow. Slots of Rev B are 12 mm long; belt Rev B is three teeth shorter.',
    readings: [read('stonebridge-belt-bracket-80:A', 'length of the slots', 8.0), read('', 'travel still wanted', 1.6, 'mm', 'ruler', 0.3)],
    fixes: [
      fix('belt-three-teeth-shorter', 'Belt three teeth shorter', 'swap', 'reversible', {
        why: 'Three teeth of 2 mm are 6 mm of belt, 3 mm of centre distance: in the middle of the slots.', tools: 'Hex key', materials: 'Closed belt of 180 teeth, 2 mm pitch, 6 mm wide',
        steps: ['Unplug the motor, take the motor off, change the belt.', 'Mount at mid-slot and set the tension by the span: 3 N for 3 mm.', 'Run end to end and check that the teeth seat all round.'], accept: atMost('sag of the span at 3 N', 3.5, 'mm'), cautions: 'pinch', trials: 'h3 h3.2 h h2.9', madeRight: 'thornapple-belt-kit-80:B',
      }),
      fix('open-the-slots-by-file', 'Open the slots with a file', 'trim', 'permanent', {
        why: 'Gains 2 mm where no shorter belt is to be had. Keep 4 mm of wall at the end.', tools: 'Round file 3 mm; caliper; vice with soft jaws', materials: '',
        steps: ['Take the motor off and carry the bracket away from the telescope.', 'Scribe the new ends: 2 mm, and check that 4 mm of wall are left.', 'File in a straight line, filing dust away from your face; mask on.', 'Brush, wipe, mount, set the tension.'], accept: atMost('sag of the span at 3 N', 3.5, 'mm'), cautions: 'dust swarf', trials: 'h w',
      }),
    ],
    drawings: [drawing(beltPlan({ title: 'SLOTS OF BRACKET 80 REV A', bigTeeth: 147, smallTeeth: 20, pitch: 2, centres: 88, slotTravel: 8 }), 'Plan: belt over two pulleys with 88 mm between the shafts; the motor’s slots allow 8 mm of travel.', 'The slots end too soon.')],
  }),
];
