import { dimension, ring } from '../callouts.js';
import { envelopePlan, holePlan } from '../../drawing/plans.js';
import { plotSheet } from '../../drawing/plots.js';
import { seatSection, tiltSection } from '../../drawing/sections.js';
import { atLeast, atMost, drawing, edition, fix, joint, read, side, withFix, writeUp, type DemoWriteUp } from '../write-up-shape.js';

/** Motors on plates and rigid brackets. */
export const motorWriteUps: readonly DemoWriteUp[] = [
  writeUp('m2-screws-do-not-line-up-with-the-motor-plate', 'M2 screws do not line up with the motor plate', {
    by: 'joss', daysAgo: 560,
    summary: 'Motor plate Rev B has its holes on Ø 31, M2 Rev B wants Ø 33. Slotting the four holes by 1 mm each way is enough; Rev C comes with slots.',
    joints: [joint(side('dunlin-motor-plate', 'motor holes', 'B', 'C'), side('tarn-m2', 'face holes', 'B C', 'A'))],
    symptoms: 'screws-do-not-line-up will-not-go-in', noticed: 'Two screws start, the other two stand beside their holes by half their width.', cause: 'Tarn moved the face holes from 31.0 to 33.0 mm with the new gearbox. A 3.4 mm hole round a 3.0 mm screw forgives 0.2 mm; the miss is 1.0 mm.',
    readings: [read('dunlin-motor-plate:B', 'bolt circle', 31.0, 'mm', 'caliper', 0.05), read('tarn-m2:B', 'bolt circle', 33.0, 'mm', 'caliper', 0.05)],
    fixes: [
      fix('slot-the-four-holes', 'Slot the four holes', 'trim', 'permanent', {
        why: 'The plate stays usable for both motors.', tools: 'Round file 3 mm; or rotary tool with a 3 mm burr; centre punch; vice with soft jaws', materials: 'Felt pen',
        steps: ['Take the plate off. Motor and focuser leave the room: aluminium chips short boards and scratch glass.', 'Scribe a line from the middle of the shaft opening through each hole.', 'Clamp the plate. With file or burr lengthen each hole by 1.0 mm outwards along its line; eye protection and mask on.', 'Deburr both faces with a countersink turned by hand.', 'Wash the plate, dry it, mount the motor and centre its shaft with a ring of paper round it.'],
        shows: { 2: 1 }, after: ['focus-offsets'], accept: atMost('shaft off the middle of the opening', 0.2, 'mm'), cautions: 'rotary-tool swarf', trials: 'h0.1 h0.15 h w h0.2',
      }),
      fix('plate-rev-c-with-slots', 'Motor plate Rev C', 'swap', 'reversible', { why: 'Slots from Ø 30 to Ø 34.', tools: 'Hex keys', materials: 'Motor plate Rev C', steps: ['Check for four slots before buying.', 'Mount and centre the shaft by paper.'], after: ['focus-offsets'], accept: atMost('shaft off the middle of the opening', 0.2, 'mm'), trials: 'h0.1 h0.1', madeRight: 'dunlin-motor-plate:C' }),
    ],
    drawings: [
      drawing(holePlan({ title: 'M2 REV B ON MOTOR PLATE REV B', plate: 'PLATE', body: 'SCREWS', plateCircle: 31, bodyCircle: 33, holes: 4, holeDiameter: 3.4, screwDiameter: 3 }), 'Plan: four plate holes on a circle of 31 mm and the motor’s screws on 33 mm; the screws foul the holes.', 'Off by 1 mm each.'),
      drawing(holePlan({ title: 'PLATE SLOTTED', plate: 'PLATE', body: 'SCREWS', plateCircle: 31, bodyCircle: 33, holes: 4, holeDiameter: 3.4, screwDiameter: 3, slots: true }), 'Plan: the four holes lengthened into slots along the radius; the screws stand in them freely.', 'Slotted along the radius.'),
    ],
  }),
  writeUp('m1-rigid-bracket-rocks-on-the-wren-60-tube', 'M1 rigid bracket rocks on the Wren 60 tube', {
    by: 'lorcan', daysAgo: 585,
    summary: 'The saddle of Rev A is cut for 70 mm, the tube is 66: it rests on one line and rocks. Two strips of cork along the edges make it sit.',
    joints: [joint(side('tarn-m1-rigid-bracket', 'saddle for the tube', 'A', 'B'), side('larkfield-wren-60', 'tube', 'A B C D'))],
    symptoms: 'plate-rocks foot-works-loose backlash-changes', noticed: 'I can rock the motor sideways by a degree with two fingers, and backlash changes when the telescope points west.', cause: 'A saddle of 35 mm radius on a tube of 33 mm touches along one line in its middle. Straps hold it down but nothing keeps it from rolling.',
    readings: [read('larkfield-wren-60:B', 'diameter of the tube', 66.0), read('tarn-m1-rigid-bracket:A', 'gap at the edge of the saddle', 0.55, 'mm', 'feeler-leaf', 0.03)],
    fixes: [
      fix('cork-strips-at-the-edges', 'Cork strips along both edges', 'shim', 'reversible', {
        why: 'Two lines of rest 40 mm apart cannot roll; cork grips paint and takes up what the gap varies.', tools: 'Feeler leaves; knife; steel ruler', materials: 'Cork sheet 1 mm; thin double-sided tape',
        steps: ['Measure the gap at both edges with feeler leaves, tube clean.', 'Cut two strips of 6 × 80 mm along a steel ruler.', 'Tape them along the saddle’s edges, leaving the middle free.', 'Strap down in three rounds; cork should come out at 0.6 mm.', 'Push the motor sideways with 10 N: the pinion must not lift.'],
        accept: atMost('movement of the motor under 10 N', 0.1, 'mm'), cautions: 'blade', trials: 'h0.05 h0.08 h w h0.1 n0.3',
      }),
      fix('bracket-rev-b-lined', 'Bracket Rev B', 'swap', 'reversible', { why: 'Cut for 66 mm and lined.', tools: 'Hex key', materials: 'M1 rigid bracket Rev B', steps: ['Swap, strap, set the mesh by paper.'], after: ['focus-offsets'], accept: atMost('movement of the motor under 10 N', 0.1, 'mm'), madeRight: 'tarn-m1-rigid-bracket:B' }),
    ],
    drawings: [drawing(tiltSection({ title: 'BRACKET ROLLS ON THE TUBE', gap: 0.55, span: 38, upper: 'BRACKET', lower: 'TUBE' }), 'Side view: the bracket’s saddle leaves 0.55 mm at one edge over 38 mm.', 'One line of rest.', [ring('one-line-of-rest', 'all its weight', [190, 360], 40), dimension('open-edge', 'open', [640, 304], [640, 360], 0.5)])],
  }),
  writeUp('m1-cable-outlet-hits-the-tube-ring', 'M1 cable outlet hits the tube ring', {
    by: 'mirela', daysAgo: 505,
    summary: 'From Rev B on the plug sits at the side and meets the tube ring. Turn the motor by 90° on its four holes, or move the ring forward by 14 mm.',
    joints: [joint(side('tarn-m1', 'cable outlet', 'B C D', 'A'), side('larkfield-tube-ring-70', 'ring and hinge', 'A B'))],
    symptoms: 'cable-in-the-way fouls-tube', noticed: 'The motor will not slide far enough towards the focus ring; the plug bends.', cause: 'The plug needs 22 mm beside the motor; between the motor and the ring’s hinge are 15.',
    readings: [read('tarn-m1:B', 'room the plug needs', 22, 'mm', 'ruler', 0.5), read('', 'room to the hinge', 15, 'mm', 'ruler', 0.5)],
    fixes: [
      fix('turn-the-motor-a-quarter', 'Turn the motor a quarter', 'reposition', 'reversible', { why: 'The face holes stand at 90°: the plug may point any of four ways.', tools: 'Hex key 2.5 mm', materials: '', steps: ['Unplug the motor.', 'Take its four screws out, turn it so that the plug points away from the tube, put them back.', 'Lead the cable in a loose loop to the saddle and tie it there, so that it never pulls.', 'Slew to both ends by hand and look at the loop.'], shows: { 1: 0 }, accept: atLeast('room round the plug', 5, 'mm'), cautions: 'pinch', trials: 'h7 h9 h6 h12 n3' }),
      fix('ring-forward-by-14', 'Move the tube ring forward', 'reposition', 'reversible', { why: 'Where the plug must point that way.', tools: 'Hex key 4 mm', materials: '', steps: ['Take the telescope off the mount and lay it on a towel.', 'Slide the ring forward by 14 mm, close it.', 'Balance again.'], after: ['balance'], accept: atLeast('room round the plug', 5, 'mm'), cautions: 'balance-shift', trials: 'h h' }),
    ],
    drawings: [drawing(envelopePlan({ title: 'PLUG AND TUBE RING', hub: 'TUBE', taken: [{ from: 40, to: 85, name: 'HINGE OF THE RING' }, { from: 250, to: 290, name: 'DOVETAIL' }], wanted: { from: 60, to: 110, name: 'MOTOR PLUG' } }), 'End view: the motor’s plug wants 60 to 110 degrees, the hinge of the ring takes 40 to 85.', 'They want the same room.')],
  }),
  writeUp('rack-2-drawtube-slides-when-pointing-up', 'Rack 2 drawtube slides when pointing up', {
    by: 'nils', daysAgo: 265,
    summary: 'With a 1.4 kg train the drawtube creeps down and the M2 loses count. Set the four brake screws in pairs; do not cure it with the lock knob.',
    joints: [joint(side('dunlin-rack-2', 'drawtube and brake screws', 'A B C'), side('tarn-m2', 'output shaft', 'A B C'))],
    symptoms: 'slips-when-pointing-up focus-drifts motor-stalls image-shifts', noticed: 'Towards the zenith focus walks by 80 µm in ten minutes.', cause: 'The fine gear drives by friction; brake screws press the drawtube on its rail. Two of the four were loose, so it tilts, then slides. The lock knob presses from one side and tilts it more.',
    readings: [read('', 'weight of the train as pull along the tube', 14, 'N', 'other', 0.5), read('', 'slide in ten minutes', 80, 'um', 'other', 10)],
    fixes: [
      fix('brake-screws-in-pairs', 'Set the brake screws in pairs', 'adjust', 'reversible', {
        why: 'Even pressure front and back keeps the drawtube straight.', tools: 'Hex key 2 mm; kitchen scale', materials: '', steps: ['Cap the lens. Take the motor’s coupling off; hold the train before you loosen anything.', 'Loosen all four brake screws half a turn.', 'Tighten the front pair until the knob just turns hard, then back by a sixteenth. Then the rear pair.', 'Point up and hang 1 kg more on with a bag: it must not slide in a minute.', 'Couple the motor, run in and out, and count steps against the scale.'],
        after: ['focus-offsets', 'flats'], accept: atMost('slide in ten minutes pointing up', 10, 'um'), cautions: 'balance-shift', trials: 'h5 h8 h10 w30 n60 h6',
      }),
      fix('clean-the-drive-shaft', 'Degrease the drive shaft', 'adjust', 'reversible', { why: 'A trace of oil on the shaft halves friction.', tools: 'Lint-free cloth; swabs', materials: 'Isopropyl alcohol', steps: ['Take the drawtube out, glass away and capped.', 'Wipe shaft and the flat it runs on with alcohol; window open, no flame.', 'Let it dry ten minutes, put together, set the screws.'], after: ['collimation', 'focus-offsets'], accept: atMost('slide in ten minutes pointing up', 10, 'um'), cautions: 'solvent' }),
    ],
    drawings: [drawing(plotSheet({ title: 'SLIDE POINTING UP', acrossName: 'MINUTES', upName: 'SLIDE, µm', across: [0, 12], up: [0, 100], series: [{ name: 'AS FOUND', colour: 'red', points: [[0, 0], [2, 18], [4, 35], [6, 52], [8, 67], [10, 81], [12, 95]] }, { name: 'SCREWS SET', colour: 'brass', points: [[0, 0], [2, 2], [4, 3], [6, 4], [8, 5], [10, 5], [12, 6]] }], limit: { value: 10, name: 'LIMIT 10' } }), 'Plot: slide of the drawtube over twelve minutes, 95 µm as found and 6 µm with the screws set.', 'Before and after.')],
  }),
  writeUp('m1-rigid-bracket-lip-bottoms-in-the-shallow-recess', 'M1 rigid bracket lip bottoms in the shallow recess', {
    by: 'oona', daysAgo: 240,
    summary: 'The lip enters but is 0.3 mm higher than the recess is deep, so the plate never lands. A ring of 0.3 mm shim stock or rubbing the lip down cures it.',
    joints: [joint(side('tarn-m1-rigid-bracket', 'centring lip', 'A B'), side('tarn-m1', 'recess round the shaft', 'A B', 'C D'))],
    symptoms: 'gap-under-plate bottoms-early plate-rocks', noticed: 'A leaf of 0.25 mm goes in all round under the plate.', cause: 'Lip 2.3 mm high, recess 2.0 mm deep. The load stands on the lip’s ring of 23 mm instead of on the plate.',
    readings: [read('tarn-m1-rigid-bracket:A', 'height of the lip', 2.3), read('tarn-m1:B', 'depth of the recess', 2.0)],
    fixes: [
      fix('shim-washers-on-the-screws', 'Shim washers on all four screws', 'shim', 'reversible', { why: 'Four washers of 0.3 mm under the plate carry it at the screws.', tools: 'Micrometer; hex key', materials: 'Four shim washers 3 × 6 × 0.3 mm', steps: ['Measure the washers; keep four within 0.01 mm.', 'Set them over the holes with a smear of grease.', 'Screws crosswise in three rounds; check with a 0.05 mm leaf.'], shows: { 1: 0 }, accept: atMost('gap beside the washers that is not carried', 0.05, 'mm'), trials: 'h0.03 h0.04 h n0.1' }),
      fix('rub-the-lip-down', 'Rub the lip down by 0.4 mm', 'trim', 'permanent', { why: 'Leaves 0.1 mm of room.', tools: 'Flat plate; 240 grit wet paper; caliper', materials: 'Water', steps: ['Take bracket and motor apart; motor away.', 'Rub the lip on wet paper in figures of eight, turning often: wet, so that no dust flies.', 'Measure at four places until 1.9 mm, wash, dry.'], accept: atMost('gap under the plate', 0.05, 'mm'), cautions: 'dust' }),
    ],
    drawings: [drawing(seatSection({ title: 'LIP HIGHER THAN THE RECESS IS DEEP', upper: 'RIGID BRACKET', lower: 'MOTOR M1', boss: 22.8, bossHeight: 2.3, recess: 23, recessDepth: 2 }), 'Section: the lip of 22.8 mm enters the recess of 23.0 mm but, 2.3 mm high, bottoms in 2.0 mm of depth.', 'It bottoms.')],
    later: [edition('author', 60, 'Washers measured: 0.3 mm ones vary by 0.02, so pick four.', (earlier) => withFix(earlier, 'shim-washers-on-the-screws', { steps: ['Measure ten washers and keep four within 0.01 mm; a bag varies by 0.02 mm.', 'Set them over the holes with a smear of grease.', 'Screws crosswise in three rounds; check with a 0.05 mm leaf.', 'After a week tighten once more: grease settles.'] }))],
  }),
];
