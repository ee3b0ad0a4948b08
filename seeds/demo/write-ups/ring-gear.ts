import { meshPlan } from '../../drawing/drive-plans.js';
import { barrelSection } from '../../drawing/mating-sections.js';
import { envelopePlan } from '../../drawing/plans.js';
import { plotSheet } from '../../drawing/plots.js';
import { atLeast, atMost, drawing, edition, fix, joint, read, side, withFix, writeUp, type DemoWriteUp } from '../write-up-shape.js';

/** Ring gears and pinions. */
export const ringGearWriteUps: readonly DemoWriteUp[] = [
  writeUp('ring-gear-fouls-the-focuser-clamp-screw', 'Ring gear fouls the focuser clamp screw', {
    by: 'fenno', daysAgo: 720,
    summary: 'On Wren 60 Rev B and C the ring gear strikes the focuser’s clamp screw once a turn. Turn the ring so that its split meets the screw, or fit a sunk screw.',
    joints: [joint(side('cotterpin-ring-gear-kit', 'ring and its own clamp screw', 'A B', ''), side('larkfield-wren-60', 'clamp screw of the focuser', 'B', 'A'))],
    symptoms: 'fouls-clamp-screw gear-grinds motor-stalls',
    noticed: 'A knock at the same place of each turn; the motor stalls there when it is cold. A bright spot on the screw’s head.',
    cause: 'From Rev B on the clamp screw stands at **two o’clock** and 3.2 mm proud. The ring’s rim passes 2.4 mm above the body: it cannot clear. On Rev A the screw was at six o’clock and lower.',
    readings: [read('larkfield-wren-60:B', 'height of the screw head above the body', 3.2), read('cotterpin-ring-gear-kit:B', 'room under the ring’s rim', 2.4), read('larkfield-wren-60:B', 'angle of the clamp screw from the top', 60, 'deg', 'other', 2)],
    fixes: [
      fix('turn-the-ring-clear', 'Turn the ring so that its travel misses the screw', 'reposition', 'reversible', {
        why: 'The focuser needs only 240° for its useful travel. Set the ring’s low spot, the split, so that the screw lies in the 120° that are never used.', tools: 'Hex key 2 mm; felt pen', materials: '',
        steps: ['Unplug the motor.', 'Find the two ends of the travel you use: near focus with and without reducer, plus a turn of your wrist as margin. Mark them on the body.', 'Loosen the ring’s clamp and turn it until its split passes the screw between those marks.', 'Tighten to 0.5 N m: a stout pull on the short arm of the key.', 'Set soft limits in the motor’s software at both marks and run end to end five times.'],
        shows: { 2: 1 }, after: ['focus-offsets'], accept: atMost('marks apart after five runs', 0.1, 'mm'), cautions: 'pinch', trials: 'h0.05 h0.1 h n1 h0 h0.08',
      }),
      fix('file-a-notch-in-the-rim', 'File a notch into the rim', 'trim', 'permanent', {
        why: 'A notch of 20° lets the screw through over the whole turn; the teeth are not touched.', tools: 'Half-round file; caliper; vice with soft jaws', materials: '',
        steps: ['Take the ring off the telescope and cap the focuser; file in another room.', 'Mark 20° on the rim below the teeth and 1.5 mm of depth.', 'Clamp between leather and file away from your face, mask on. Keep 3 mm of rim under the teeth.', 'Round the corners, brush, wash in soapy water, dry.', 'Mount so that the notch passes the screw.'],
        after: ['focus-offsets'], accept: atLeast('room over the screw', 0.5, 'mm'), cautions: 'dust swarf', trials: 'h h w h n',
      }),
    ],
    drawings: [
      drawing(meshPlan({ title: "CLAMP SCREW IN THE RING'S WAY", ring: 'RING GEAR', pinion: 'PINION', ringTeeth: 110, pinionTeeth: 16, module: 0.8, centres: 50.4, screw: { angle: 60, reach: 3 } }), 'Plan: ring gear and pinion in mesh; the focuser’s clamp screw stands in the rim’s way at 60 degrees.', 'Once a turn the rim meets the screw.'),
      drawing(envelopePlan({ title: 'TRAVEL KEPT AWAY FROM THE SCREW', hub: 'FOCUS RING', taken: [{ from: 20, to: 40, name: 'CLAMP SCREW' }], wanted: { from: 80, to: 320, name: 'TRAVEL USED' } }), 'End view: the travel used from 80 to 320 degrees leaves out the clamp screw at 20 to 40 degrees.', 'The travel that is used misses the screw.'),
    ],
    later: [
      edition('fenno', 520, 'Holds for Wren 60 Rev C and ring Rev C too; angle of the screw measured.', (earlier) => ({
        ...earlier,
        joints: [joint(side('cotterpin-ring-gear-kit', 'ring and its own clamp screw', 'A B C', ''), side('larkfield-wren-60', 'clamp screw of the focuser', 'B C', 'A'))],
        readings: [...earlier.readings, read('larkfield-wren-60:C', 'height of the screw head above the body', 3.1)],
      })),
      edition('greta', 190, 'Cotterpin’s Rev D has the notch; Wren 60 Rev D has a sunk screw: marked as not concerned.', (earlier) => ({
        ...withFix(earlier, 'file-a-notch-in-the-rim', { why: 'A notch of 20° lets the screw through over the whole turn. Rev D of the ring is made this way: look whether a swap is cheaper than your evening.' }),
        joints: [joint(side('cotterpin-ring-gear-kit', 'ring and its own clamp screw', 'A B C', 'D'), side('larkfield-wren-60', 'clamp screw of the focuser', 'B C', 'A D'))],
        fixes: [
          ...earlier.fixes,
          fix('swap-for-the-notched-ring', 'Swap for the notched ring', 'swap', 'reversible', {
            why: 'Ring Rev D has the notch from the maker.', tools: 'Hex key 2 mm', materials: 'Ring of the kit Rev D', steps: ['Unplug the motor and take the old ring off.', 'Put the new one on with its notch over the screw at the middle of your travel.', 'Set the mesh again: a strip of newspaper between the teeth should come out creased, not torn.'],
            after: ['focus-offsets'], accept: atLeast('room over the screw', 0.5, 'mm'), cautions: 'pinch', trials: 'h0.9 h1', madeRight: 'cotterpin-ring-gear-kit:D',
          }),
        ],
      })),
    ],
  }),
  writeUp('ring-gear-slips-round-on-the-grip-ring', 'Ring gear slips round on the grip ring', {
    by: 'kaja', daysAgo: 540,
    summary: 'A ring bored 76.9 mm on a 75.4 mm grip ring cannot clamp. A strip of brass shim takes up the rest; tape creeps.',
    joints: [joint(side('cotterpin-ring-gear-kit', 'bore of the ring', 'C D', 'A B'), side('larkfield-wren-60', 'grip ring of the focuser', 'A B', 'C D'))],
    symptoms: 'motor-turns-focus-does-not gear-skips too-loose-in-bore', noticed: 'The gear goes round, the knurl under it does not. Tightening the clamp bends the ring egg-shaped and the mesh gets tight and loose.',
    cause: 'Kits from Rev C on are bored for the wider grip ring of Wren 60 Rev C (Ø 76.8). Earlier grip rings are Ø 75.4: 1.5 mm of play, more than the split can close.',
    readings: [read('larkfield-wren-60:B', 'diameter over the knurl', 75.4), read('cotterpin-ring-gear-kit:C', 'bore', 76.9)],
    fixes: [
      fix('brass-strip-under-the-ring', 'Brass strip under the ring', 'shim', 'reversible', {
        why: 'Half of 1.5 mm is 0.75 mm all round. Two layers of 0.35 mm brass leave what the clamp needs to bite.', tools: 'Tin snips; caliper; hex key 2 mm', materials: 'Brass strip 0.35 × 8 mm, half a metre; thin double-sided tape',
        steps: ['Degrease the knurl with a dry brush.', 'Cut two strips of 236 mm; snips leave edges as sharp as a knife, so break them with a file.', 'Wrap them one over the other with the joints on opposite sides, a spot of tape at each end.', 'Slip the ring over and clamp it. Measure the teeth’s run-out against the pinion: under 0.2 mm is good.'],
        after: ['focus-offsets'], accept: atMost('run-out at the teeth', 0.2, 'mm'), cautions: 'blade', trials: 'h0.15 h0.18 h0.1 w h0.2',
      }),
      fix('ring-bored-for-the-old-grip', 'Get the ring bored for the old grip ring', 'swap', 'reversible', {
        why: 'Kits Rev A and B are bored 75.6 mm and clamp without shims.', tools: 'Hex key 2 mm', materials: 'Ring Rev A or B', steps: ['Ask the maker: he keeps a few.', 'Fit it and set the mesh with a strip of newspaper.'], after: ['focus-offsets'], accept: atMost('run-out at the teeth', 0.2, 'mm'),
      }),
    ],
    drawings: [drawing(barrelSection({ title: 'GRIP RING IN THE RING GEAR', outer: 'RING GEAR', inner: 'GRIP RING', barrel: 75.4, bore: 76.9, barrelLength: 15, boreDepth: 15, shim: 'BRASS 2 × 0.35', through: true }), 'Section: grip ring of 75.40 mm in a bore of 76.90 mm with brass strip in the gap.', 'What the strip has to fill.')],
    later: [
      edition('kaja', 260, 'Two layers instead of one; run-out told.', (earlier) => ({
        ...withFix(earlier, 'brass-strip-under-the-ring', { steps: ['Degrease the knurl with a dry brush.', 'Cut two strips of 236 mm; snips leave edges as sharp as a knife, so break them with a file and wear gloves.', 'Wrap them one over the other with the joints on opposite sides, a spot of tape at each end.', 'Slip the ring over and clamp it with a quarter turn less than you would like.', 'Turn it by hand against the pinion: where it binds, the strip lies double. Run-out under 0.2 mm is good.'] }),
        readings: [...earlier.readings, read('cotterpin-ring-gear-kit:D', 'bore', 76.92)],
      })),
    ],
  }),
  writeUp('ring-gear-80-binds-once-a-turn', 'Ring gear 80 binds once a turn', {
    by: 'greta', daysAgo: 410,
    summary: 'Tips touch the roots at one place: the centres are 0.3 mm too close there. Set the eccentric bush at the ring’s highest place, not where you happen to be.',
    joints: [joint(side('cotterpin-ring-gear-kit-80', 'ring gear and eccentric bush', 'A B', ''), side('larkfield-wren-80', 'grip ring of the focuser', 'A B'))],
    symptoms: 'gear-grinds backlash-changes drive-noisy', noticed: 'Rough and stiff for a tenth of a turn, rattles on the far side.', cause: 'The ring runs out by 0.35 mm because its clamp pulls it to one side. Mesh set at the low side is too deep at the high side.',
    readings: [read('cotterpin-ring-gear-kit-80:B', 'run-out at the tooth tips', 0.35, 'mm', 'other', 0.05), read('', 'standard centre distance', 56.8, 'mm', 'print-model', null)],
    fixes: [
      fix('set-mesh-at-the-high-side', 'Set the mesh at the high side', 'adjust', 'reversible', {
        why: 'A little play at the low side costs focus a few micrometres and software takes it up; a mesh too deep costs the ring.', tools: 'Felt pen; strip of newspaper 0.07 mm; hex key', materials: '',
        steps: ['Unplug the motor so that the pinion is free.', 'Turn the ring by hand and mark where it is tightest.', 'At the mark lay newspaper between the teeth, turn the bush until it holds, lock it.', 'Roll the paper out: creased, not cut.', 'Measure the play on the far side; put it into the software as backlash.'],
        shows: { 2: 0 }, after: ['focus-offsets'], accept: atMost('backlash on the low side', 120, 'steps'), cautions: 'pinch', trials: 'h90 h110 h80 w150 n200 h100',
      }),
      fix('centre-the-ring-first', 'Centre the ring with three feeler leaves', 'shim', 'reversible', {
        why: 'Takes the run-out itself from 0.35 to under 0.1 mm.', tools: 'Feeler leaves; hex key', materials: 'Three strips of 0.1 mm brass', steps: ['Loosen the clamp, slide a 0.1 mm strip in at each third of the rim.', 'Tighten a little at a time and turn the ring past a pointer made of a bent paper clip.', 'Move a strip under the low side until the pointer sees less than 0.1 mm.'], accept: atMost('run-out at the tooth tips', 0.1, 'mm'), trials: 'h h n',
      }),
    ],
    drawings: [drawing(meshPlan({ title: 'TOO DEEP AT THE HIGH SIDE', ring: 'RING', pinion: 'PINION', ringTeeth: 126, pinionTeeth: 16, module: 0.8, centres: 56.5 }), 'Plan: ring gear and pinion with centres at 56.50 mm, 0.30 mm closer than standard.', 'At the high side the tips bottom.')],
  }),
  writeUp('pinion-slips-on-the-m1-shaft', 'Pinion slips on the M1 shaft', {
    by: 'hob', daysAgo: 475,
    summary: 'One grub screw on a round shaft lets go in the cold. Use the second screw at right angles and a flat; M1 Rev D has one from the maker.',
    joints: [joint(side('cotterpin-pinion-set', 'bore and grub screws', 'A', 'B'), side('tarn-m1', 'output shaft', 'A B C', 'D'))],
    symptoms: 'pinion-slips motor-turns-focus-does-not focus-run-fails', noticed: 'Focus is off by a different amount each time. A chalk mark on shaft and pinion comes apart.', cause: 'A single M3 grub screw on a hard round shaft carries about 0.3 N m when new and less after each slip, since it ploughs a groove.',
    readings: [read('tarn-m1:C', 'diameter of the shaft', 4.99, 'mm', 'micrometer', 0.003), read('cotterpin-pinion-set:A', 'bore', 5.06)],
    fixes: [
      fix('degrease-and-lock-the-screw', 'Degrease, seat and lock the grub screw', 'adjust', 'reversible', {
        why: 'Oil under the screw halves its hold; a cup point that has worn flat holds nothing.', tools: 'Hex key 1.5 mm of good steel', materials: 'Isopropyl alcohol; new cup-point grub screw M3 × 4; drop of medium thread-locking compound',
        steps: ['Unplug the motor, take the pinion off.', 'Wipe shaft and bore with alcohol on a swab; window open. Let it dry.', 'Fit the new screw with a drop of compound, tighten until the key springs.', 'Leave it a day. Chalk a line over shaft and pinion and run a hundred reversals.'], accept: atMost('chalk lines apart after 100 reversals', 0.1, 'mm'), cautions: 'solvent epoxy pinch', trials: 'h0 h0.1 w n0.8 h0.05',
      }),
      fix('file-a-flat-on-the-shaft', 'File a flat on the shaft', 'trim', 'permanent', {
        why: 'On a flat the screw cannot plough: it would have to lift. 0.4 mm is enough.', tools: 'Fine flat file; vice with soft jaws; caliper', materials: 'Tape; plastic bag; modelling clay',
        steps: ['Take the motor off and out of the room. Seal its bearing with clay round the shaft and wrap the body in a bag: filings in the gearbox are its end.', 'Clamp by the shaft’s end only, in soft jaws.', 'File a flat 8 mm long until the caliper reads 4.6 mm across.', 'Brush, tape the dust off, then take the clay away.', 'Mount the pinion with a screw on the flat.'], accept: atMost('chalk lines apart after 100 reversals', 0.1, 'mm'), cautions: 'swarf dust', trials: 'h0 h0 h', madeRight: 'tarn-m1:D',
      }),
    ],
    drawings: [drawing(barrelSection({ title: 'SHAFT IN THE PINION', outer: 'PINION', inner: 'SHAFT', barrel: 4.99, bore: 5.06, barrelLength: 12, boreDepth: 12, through: true, solid: true }), 'Section: shaft of 4.99 mm in a pinion bore of 5.06 mm.', 'A slip fit: the screw does all the work.')],
    later: [
      edition('author', 120, 'M1 Rev D has a flat: marked as not concerned, and the flat as made right.', (earlier) => withFix(earlier, 'file-a-flat-on-the-shaft', { why: 'On a flat the screw cannot plough: it would have to lift. 0.4 mm is enough. **M1 Rev D comes with such a flat**; on an older one ask yourself whether a new motor is not the better way.' })),
    ],
  }),
  writeUp('large-backlash-with-the-ring-gear-kit', 'Large backlash with the ring-gear kit', {
    by: 'imke', daysAgo: 350,
    summary: 'More than 200 steps of backlash: the pinion stands 0.4 mm too far out. Slots of the bracket allow for it; set it by paper, then measure with a reversal test indoors.',
    joints: [joint(side('cotterpin-ring-gear-kit', 'ring gear and pinion', 'A B C D'), side('tarn-m1-rigid-bracket', 'motor slots', 'A', ''))],
    symptoms: 'backlash-large focus-run-fails image-shifts', noticed: 'The first 250 steps after a reversal do nothing; V-curves have a flat shoulder on one side.', cause: 'Centres are 50.8 mm instead of 50.4. At a pressure angle of 20° each 0.1 mm too far adds 0.073 mm of play at the pitch circle. On top come the gearbox and the helicoid.',
    readings: [read('', 'centre distance as found', 50.8, 'mm', 'caliper', 0.1), read('', 'smallest reversal that moves the ring', 230, 'steps', 'count', 10), read('', 'largest reversal that does not', 210, 'steps', 'count', 10)],
    fixes: [
      fix('close-the-mesh-by-paper', 'Close the mesh with a paper strip', 'adjust', 'reversible', {
        why: 'Newspaper is 0.07 mm thick and squeezes to about half: that is the play two acetal gears want.', tools: 'Hex key 2.5 mm', materials: 'Newspaper',
        steps: ['Unplug the motor.', 'Loosen its four screws an eighth of a turn.', 'Lay a strip of paper over three teeth, press the motor in, tighten crosswise.', 'Turn the ring to roll the paper out, then try three more places.', 'Indoors: command reversals of 20, 40, 60 … steps and note the first that moves a pointer on the ring.'],
        shows: { 4: 1 }, after: ['focus-offsets'], accept: atMost('smallest reversal that moves', 80, 'steps'), cautions: 'pinch', trials: 'h60 h70 h80 h55 w90 n180 h75 h65',
      }),
      fix('approach-from-one-side', 'Always approach from one side', 'adjust', 'reversible', {
        why: 'What play is left does no harm when each move ends in the same direction.', steps: ['In the motor’s software set the overshoot to twice the backlash, and the direction to the one that lifts the camera.', 'Run a focus run in both directions; best positions should now agree.'], accept: atMost('best positions of two runs apart', 15, 'steps'), trials: 'h h w h',
      }),
    ],
    drawings: [
      drawing(meshPlan({ title: 'CENTRES TOO FAR APART', ring: 'RING', pinion: 'PINION', ringTeeth: 110, pinionTeeth: 16, module: 0.8, centres: 50.8 }), 'Plan: ring gear and pinion with centres at 50.80 mm, 0.40 mm too far apart.', 'As found.'),
      drawing(plotSheet({ title: 'REVERSAL TEST', acrossName: 'STEPS OF REVERSAL', upName: 'POINTER MOVED, mm', across: [0, 400], up: [0, 2], series: [{ name: 'BEFORE', colour: 'red', points: [[0, 0], [100, 0], [200, 0], [220, 0.05], [300, 0.6], [400, 1.25]] }, { name: 'AFTER', colour: 'brass', points: [[0, 0], [50, 0], [65, 0.03], [100, 0.25], [200, 0.9], [300, 1.55]] }] }), 'Plot: before, the pointer starts to move at 220 steps of reversal, afterwards at 65.', 'Where the pointer starts to move.'),
    ],
    later: [
      edition('imke', 180, 'Reversal test told step by step, with both readings.', (earlier) => ({ ...earlier, cause: `${earlier.cause}\n\nThe test indoors tells them apart: hold the pinion and rock the ring (mesh), hold the ring and rock the motor’s shaft (gearbox).` })),
    ],
  }),
];
