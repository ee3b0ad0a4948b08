import { beltPlan, meshPlan } from '../../drawing/drive-plans.js';
import { barrelSection } from '../../drawing/mating-sections.js';
import { holePlan } from '../../drawing/plans.js';
import { atMost, drawing, fix, joint, read, side, writeUp, type DemoWriteUp } from '../write-up-shape.js';

/** Pulleys, pinions and rings on shafts they were not bored for; plates on focusers. */
export const shaftWriteUps: readonly DemoWriteUp[] = [
  writeUp('belt-squeaks-over-the-tension-arm', 'Belt squeaks over the tension arm', {
    by: 'stellan', daysAgo: 410,
    summary: 'The idler of Rev A and B leans by a degree and a half and the belt’s edge rubs. A piece of 0.3 mm shim under one edge of the arm squares it.',
    joints: [joint(side('thornapple-tension-arm', 'idler', 'A B', 'C'), side('thornapple-belt-kit-60', 'belt', 'A B C'))],
    symptoms: 'belt-squeaks drive-noisy', noticed: 'A squeak at each start and black dust under the idler. It stops when I push the arm’s outer edge with a pencil.', cause: 'The arm is 12 mm wide and bends at its slot. One edge lies 0.3 mm lower: 1.4° over 12 mm.',
    readings: [read('thornapple-tension-arm:B', 'gap under the arm’s edge', 0.3, 'mm', 'feeler-leaf', 0.02), read('', 'width of the arm', 12)],
    fixes: [
      fix('shim-under-the-arm-edge', 'Shim under the arm’s low edge', 'shim', 'reversible', { why: 'The idler turns square to the belt and the edge is free.', tools: 'Feeler leaves; hex key 2 mm', materials: 'Brass shim 0.3 mm, 4 × 20 mm', steps: ['Unplug the motor.', 'Loosen the arm and slide the brass under the edge that is low.', 'Tighten and hold a square against idler and bracket.', 'Run end to end; keep fingers out.'], after: ['focus-offsets'], accept: atMost('lean of the idler', 0.3, 'deg'), cautions: 'pinch', trials: 'h0.1 h0.2 h w0.5 h0.2' }),
      fix('move-the-arm-to-mid-span', 'Move the arm to the middle of the span', 'reposition', 'reversible', { why: 'In mid-span the same pull wraps the belt less and the edge rubs less. It quiets, it does not square.', tools: 'Hex key 2 mm', steps: ['Unplug the motor.', 'Slide the arm along its slot to half way between the pulleys, on the slack side.', 'Set the pull again and run.'], accept: atMost('lean of the idler', 0.3, 'deg'), cautions: 'pinch', trials: 'h w n1.4' }),
    ],
    drawings: [drawing(beltPlan({ title: 'ARM IN MID-SPAN', bigTeeth: 118, smallTeeth: 20, pitch: 2, centres: 66, idler: { along: 0.5, press: 3, side: 'slack' } }), 'Plan: sprung idler in the middle of the slack side of the belt.', 'Where it is quietest.')],
  }),
  writeUp('belt-kit-80-pulley-runs-out-on-the-6-mm-shaft', 'Belt kit 80 pulley runs out on the 6 mm shaft', {
    by: 'greta', daysAgo: 380,
    summary: 'The pulley of Rev B is bored 6.39 mm, the shaft of M2 Rev A is 6.00. The grub screw pushes it over and it wobbles by 0.39 mm. A sleeve of 0.18 mm brass centres it.',
    joints: [joint(side('thornapple-belt-kit-80', 'bore of the motor pulley', 'B', 'A'), side('tarn-m2', 'output shaft', 'A', 'B C'))],
    symptoms: 'pinion-slips belt-slips drive-noisy', noticed: 'The belt tightens and slackens once a turn of the motor.', cause: '0.39 mm of room, all of it on one side once the screw is tight. The pulley runs 0.195 mm off centre.',
    readings: [read('thornapple-belt-kit-80:B', 'bore of the pulley', 6.39), read('tarn-m2:A', 'diameter of the shaft', 6.0)],
    fixes: [
      fix('brass-sleeve-on-the-shaft', 'Sleeve of brass shim', 'shim', 'reversible', { why: 'One turn of 0.18 mm makes the shaft 6.36 mm: 0.03 mm of room is left.', tools: 'Snips; micrometer; hex key 1.5 mm', materials: 'Brass shim 0.18 mm, 15 × 19 mm', steps: ['Unplug the motor, belt off.', 'Cut the strip so that it closes round the shaft but for a slit of 0.5 mm; take the burr off.', 'Turn the slit under the grub screw so that the screw meets steel.', 'Pulley on, tighten, turn by hand against a fixed pointer.'], shows: { 2: 0 }, after: ['focus-offsets'], accept: atMost('run-out at the pulley’s rim', 0.06, 'mm'), cautions: 'blade pinch', trials: 'h0.04 h0.05 h h0.03 w0.12 n0.2' }),
      fix('pulley-of-rev-a', 'Pulley of Rev A', 'swap', 'reversible', { why: 'Bored 6.04 mm for this shaft. Teeth are the same.', tools: 'Hex key 1.5 mm', materials: 'Motor pulley of belt kit 80 Rev A', steps: ['Unplug the motor, swap the pulley, keep its height.', 'Set the belt again.'], after: ['focus-offsets'], accept: atMost('run-out at the pulley’s rim', 0.06, 'mm'), cautions: 'pinch', trials: 'h0.03 h' }),
    ],
    drawings: [drawing(barrelSection({ title: 'PULLEY ON THE M2 SHAFT', outer: 'PULLEY', inner: 'SHAFT', barrel: 6, bore: 6.39, barrelLength: 24, boreDepth: 16, shim: 'BRASS 0.18', through: true, solid: true }), 'Section: shaft of 6.00 mm in a pulley bored 6.39 mm with brass of 0.18 mm round it.', 'Slit under the screw.')],
  }),
  writeUp('pinion-set-does-not-go-on-the-m2-shaft', 'Pinion set does not go on the M2 shaft', {
    by: 'fenno', daysAgo: 350,
    summary: 'From Rev B the M2 has a shaft of 6.35 mm; the larger bore of the set is 6.03. Ream it, or take the pinion of ring-gear kit 80 Rev B.',
    joints: [joint(side('cotterpin-pinion-set', 'bore', 'A B'), side('tarn-m2', 'output shaft', 'B C', 'A'))],
    symptoms: 'will-not-go-in', noticed: 'It stops at the chamfer. No burr, it is simply too small.', cause: 'Bore 6.03 mm, shaft 6.35: 0.32 mm short.',
    readings: [read('', 'bore of the 6 mm pinion', 6.03), read('tarn-m2:B', 'diameter of the shaft', 6.35)],
    fixes: [
      fix('ream-the-pinion', 'Ream the pinion', 'trim', 'permanent', { why: 'At 16 teeth the root is 10.8 mm, so 2.2 mm of brass are left. Not with the 14: 1.4 mm is too thin at the grub screw.', tools: 'Hand reamer 6.37 mm; vice with soft jaws; caliper', materials: 'Cutting oil', steps: ['Work away from the telescope and motor: brass swarf gets into gearboxes.', 'Grub screws out. Clamp the hub, not the teeth.', 'Ream by hand, always forward, with oil; brush the flutes every turn.', 'Deburr the grub screw’s hole, wash, try on the shaft.'], accept: atMost('room on the shaft', 0.04, 'mm'), cautions: 'swarf blade', trials: 'h0.02 h0.03 h n0.1' }),
      fix('pinion-of-kit-80', 'Pinion of ring-gear kit 80', 'swap', 'reversible', { why: 'Bored 6.38 mm from Rev B, same module and 16 teeth.', tools: 'Hex key 1.5 mm', materials: 'Pinion of ring-gear kit 80 Rev B', steps: ['Unplug the motor.', 'Fit the pinion, set its height to the ring and tighten.'], after: ['focus-offsets'], accept: atMost('room on the shaft', 0.04, 'mm'), cautions: 'pinch', trials: 'h0.03 h0.03 h' }),
    ],
    drawings: [drawing(barrelSection({ title: 'PINION AND SHAFT', outer: 'PINION', inner: 'SHAFT', barrel: 6.35, bore: 6.03, barrelLength: 24, boreDepth: 12, through: true, solid: true }), 'Section: shaft of 6.35 mm against a bore of 6.03 mm; overlap in red.', 'Too small by 0.32 mm.')],
  }),
  writeUp('ring-gear-80-does-not-go-over-the-grip-ring', 'Ring gear 80 does not go over the grip ring', {
    by: 'kaja', daysAgo: 560,
    summary: 'Ring Rev A opens to 92.2 mm; the grip ring of Wren 80 Rev B and C is 94. Take ring Rev B, or have the bore turned out.',
    joints: [joint(side('cotterpin-ring-gear-kit-80', 'bore of the ring', 'A', 'B'), side('larkfield-wren-80', 'grip ring over the knurl', 'B C', 'A'))],
    symptoms: 'will-not-go-in', noticed: 'The split gapes and the ring still sits on the edge of the knurl.', cause: '1.8 mm short on the diameter. Sprung open that far the ring is oval and the mesh binds.',
    readings: [read('cotterpin-ring-gear-kit-80:A', 'bore, clamp open', 92.2), read('larkfield-wren-80:B', 'grip ring over the knurl', 94)],
    fixes: [
      fix('ring-of-rev-b', 'Ring of Rev B', 'swap', 'reversible', { why: 'Opens to 94.2 and closes to 93.6 mm.', tools: 'Hex key 2 mm', materials: 'Ring gear of kit 80 Rev B', steps: ['Unplug the motor, swing the pinion away.', 'Slip the ring on, close the clamp, set the mesh with the bush.', 'Turn by hand, one whole turn, then run.'], after: ['focus-offsets'], accept: atMost('run-out of the ring', 0.1, 'mm'), cautions: 'pinch', trials: 'h0.06 h0.08 h' }),
      fix('turn-out-the-bore', 'Have the bore turned to 94.2 mm', 'trim', 'permanent', { why: 'The root of 126 teeth is 98.8 mm: 2.3 mm of rim remain. Common practice, no source: keep at least 2 mm in acetal.', tools: 'Lathe, by someone who has one; caliper', steps: ['Clamp the split shut over a 1 mm slip so that the bore is round.', 'Turn to 94.2 mm in light passes with a sharp tool; no grip on the teeth.', 'Deburr, wash, try on the ring.'], accept: atMost('run-out of the ring', 0.1, 'mm'), cautions: 'rotary-tool', trials: 'h0.1 n0.25' }),
    ],
    drawings: [drawing(meshPlan({ title: 'RING OF 126 TEETH AND PINION', ring: 'RING GEAR 80', pinion: 'PINION', ringTeeth: 126, pinionTeeth: 16, module: 0.8, centres: 56.8 }), 'Plan: ring gear of 126 teeth and pinion of 16 at 56.8 mm between centres.', 'Centres with either ring.')],
  }),
  writeUp('m2-creeps-in-the-slots-of-the-motor-plate', 'M2 creeps in the slots of the motor plate', {
    by: 'pavo', daysAgo: 300,
    summary: 'The slots of plate Rev C run from 30 to 34 mm and nothing centres the motor. It slides by tenths and the mesh opens. Washers that bite, or a printed ring that centres.',
    joints: [joint(side('dunlin-motor-plate', 'motor holes', 'C', 'A B'), side('tarn-m2', 'face holes', 'A B C'))],
    symptoms: 'backlash-changes gear-grinds', noticed: 'Scribe lines on plate and motor stand 0.4 mm apart after a month.', cause: 'Plain washers on anodising hold by friction alone. The slots leave 2 mm of travel on either side of 32.',
    readings: [read('', 'scribe lines apart', 0.4, 'mm', 'ruler', 0.1), read('dunlin-motor-plate:C', 'travel of a slot', 4)],
    fixes: [
      fix('toothed-washers-crosswise', 'Toothed washers, tightened crosswise', 'adjust', 'leaves-a-mark', { why: 'Teeth bite through the anodising.', tools: 'Hex key 2.5 mm', materials: 'Four toothed washers M3', steps: ['Unplug the motor.', 'Set the mesh: a strip of paper of 0.1 mm between the teeth, press, tighten, pull it out.', 'Washers under all heads, crosswise in three rounds.', 'New scribe line; look after ten nights.'], after: ['focus-offsets'], accept: atMost('scribe lines apart', 0.1, 'mm'), cautions: 'pinch', trials: 'h0 h0.05 h w0.2 h0.1' }),
      fix('printed-centring-ring', 'Printed centring ring', 'remake', 'reversible', { why: 'Four pegs of 3.3 mm on the right circle fill the slots’ width and stop the motor.', tools: 'Printer; caliper', materials: 'Glass-filled nylon', steps: ['Measure the motor’s circle: 31.0 mm on Rev A, 33.0 on B and C.', 'Print a ring 1.5 mm thick with bosses that fill the slots beyond the screws.', 'Lay it between plate and motor; screws 1.5 mm longer.'], after: ['focus-offsets'], accept: atMost('scribe lines apart', 0.1, 'mm'), trials: 'h0 h0.05 w' }),
    ],
    drawings: [drawing(holePlan({ title: 'MOTOR IN THE SLOTS', plate: 'PLATE REV C', body: 'M2 SCREWS', plateCircle: 32, bodyCircle: 33, holes: 4, holeDiameter: 3.4, screwDiameter: 3, slots: true }), 'Plan: four radial slots about 32 mm with the motor’s screws on 33 mm.', 'Nothing but friction holds it.')],
  }),
  writeUp('motor-plate-holes-miss-the-rack-2-focuser', 'Motor plate holes miss the Rack 2 focuser', {
    by: 'wim', daysAgo: 460,
    summary: 'Plate Rev A and B has three holes on 31 mm, Rack 2 Rev C four on 33. One screw starts at most. Plate Rev C fits; a plate of 3 mm between them does too.',
    joints: [joint(side('dunlin-motor-plate', 'focuser holes', 'A B', 'C'), side('dunlin-rack-2', 'motor holes', 'C', 'A B'))],
    symptoms: 'screws-do-not-line-up plate-rocks', noticed: 'With one screw in, the next hole shows a crescent of metal.', cause: 'A hole of 3.4 mm forgives 0.2 mm; the circles differ by 1 mm in radius and the counts differ.',
    readings: [read('dunlin-motor-plate:B', 'circle of the focuser holes', 31), read('dunlin-rack-2:C', 'circle of the motor holes', 33)],
    fixes: [
      fix('plate-rev-c', 'Motor plate Rev C', 'swap', 'reversible', { why: 'Four holes on 33.0 mm.', tools: 'Hex key 2.5 mm', materials: 'Motor plate Rev C', steps: ['Unplug the motor; take plate and motor off together.', 'Swap the plate and set the mesh in its slots.'], after: ['focus-offsets'], accept: atMost('gap under the plate', 0.05, 'mm'), cautions: 'pinch', trials: 'h0.02 h0.03 h', madeRight: 'dunlin-motor-plate:C' }),
      fix('plate-between', 'Plate of 3 mm between', 'remake', 'reversible', { why: 'It takes four sunk screws on 33 and three threads on 31. The pinion must come 3 mm forward.', tools: 'Drill press; 3.4 and 2.5 mm drills; tap M3; caliper', materials: 'Aluminium 3 mm, 60 × 60 mm; sunk screws M3 × 8', steps: ['Mark both circles from one centre; turn them so that no two holes come nearer than 5 mm.', 'Drill with the work clamped, eye protection on; tap the three.', 'Deburr, wash, screw it to the focuser, then the old plate to it.', 'Move the pinion 3 mm out on its shaft.'], after: ['focus-offsets'], accept: atMost('gap under the plate', 0.05, 'mm'), cautions: 'rotary-tool swarf', trials: 'h0.04 n0.1' }),
    ],
    drawings: [drawing(holePlan({ title: 'THREE HOLES OF REV B AGAINST A CIRCLE OF 33', plate: 'PLATE REV B', body: 'FOCUSER', plateCircle: 31, bodyCircle: 33, holes: 3, holeDiameter: 3.4, screwDiameter: 3 }), 'Plan: holes on 31 mm against screws on 33 mm; they foul.', 'A millimetre short in radius.')],
  }),
];
