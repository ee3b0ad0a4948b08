import { dovetailSection } from '../../drawing/mating-sections.js';
import { envelopePlan, holePlan, ringClampSection } from '../../drawing/plans.js';
import { plotSheet } from '../../drawing/plots.js';
import { tiltSection } from '../../drawing/sections.js';
import { atLeast, atMost, drawing, edition, fix, joint, read, side, writeUp, type DemoWriteUp } from '../write-up-shape.js';

/** Clamps, feet, guide scopes. */
export const clampWriteUps: readonly DemoWriteUp[] = [
  writeUp('guide-foot-n2-is-loose-in-the-finder-shoe', 'Guide foot N2 is loose in the finder shoe', {
    by: 'pavo', daysAgo: 880,
    summary: 'The foot is 31.4 mm, the shoe 32.4: the thumb screw pushes it to one flank and it rolls. A brass strip on the screw side fills it.',
    joints: [joint(side('nettlecombe-guide-foot', 'foot', 'A B', 'C'), side('oxbow-finder-shoe', 'shoe', 'A B'))],
    symptoms: 'foot-works-loose star-trails-guiding-good rattles', noticed: 'Guiding graph is fine, stars are lines of 4 pixels after ten minutes. I can roll the guide scope by hand.',
    cause: 'A foot 1.0 mm too narrow bears on one flank and on the tip of the thumb screw: a line and a point. It rolls about the line as the telescope crosses the meridian.',
    readings: [read('nettlecombe-guide-foot:A', 'width at the bottom', 31.4), read('oxbow-finder-shoe:A', 'width at the floor', 32.4), read('', 'roll of the guide scope under 5 N', 0.4, 'deg', 'other', 0.1)],
    fixes: [
      fix('brass-strip-beside-the-foot', 'Brass strip beside the foot', 'shim', 'reversible', {
        why: 'A strip spreads the screw’s tip over 40 mm, so the foot has two flanks again.', tools: 'Tin snips; fine file; caliper', materials: 'Brass strip 0.8 × 10 × 40 mm; spot of grease',
        steps: ['Measure foot and shoe at both ends.', 'Cut the strip, break its edges with a file and bend 3 mm at one end over so that it cannot slide out.', 'Lay it between screw and foot, push the foot against the far flank, tighten.', 'Push the guide scope with 5 N sideways and watch a far lamp in it: it must come back.'],
        shows: { 2: 0 }, accept: atMost('lamp does not come back by', 2, 'arcmin'), cautions: 'blade', trials: 'h1 h0.5 h1.5 w h1 n5 h0.8',
      }),
      fix('foot-rev-c', 'Guide foot N2 Rev C', 'swap', 'reversible', { why: '32.2 mm wide.', tools: 'Hex key', materials: 'Guide foot N2 Rev C', steps: ['Measure it in the shop: 32.2 mm.', 'Fit, tighten, do the lamp test.'], accept: atMost('lamp does not come back by', 2, 'arcmin'), trials: 'h0.5 h1', madeRight: 'nettlecombe-guide-foot:C' }),
    ],
    drawings: [drawing(dovetailSection({ title: 'GUIDE FOOT N2 IN THE FINDER SHOE', bar: 'FOOT', shoe: 'SHOE', barWidth: 31.4, barAngle: 60, shoeWidth: 32.4, shoeAngle: 60, shim: 'BRASS 0.8' }), 'End view: foot of 31.4 mm in a shoe of 32.4 mm with a brass strip on one flank.', 'The strip makes up the width.')],
    later: [
      edition('pavo', 600, 'Lamp test instead of “no play”.', (earlier) => ({ ...earlier, noticed: `${earlier.noticed} It is worst in the hour round the meridian.`, summary: 'The foot is 31.4 mm, the shoe 32.4: the thumb screw pushes it to one flank and it rolls. A brass strip on the screw side fills it; a far lamp proves it.' })),
    ],
  }),
  writeUp('stars-are-triangular-in-ring-clamp-70', 'Stars are triangular in ring clamp 70', {
    by: 'quill', daysAgo: 790,
    summary: 'A single tight clamp near the lens cell squeezes the thin tube. Line it at three places and tighten to a figure, not by feel.',
    joints: [joint(side('oxbow-ring-clamp', 'split bore', 'A B', 'C'), side('larkfield-wren-60', 'tube', 'A B C D'))],
    symptoms: 'stars-triangular tube-slides', noticed: 'Out-of-focus stars have three lobes. Loosening the ring makes them round and the tube slides.',
    cause: 'The unlined ring of Rev A carries at the split and at two places of the bore. 2 mm of aluminium give way by a few micrometres and hand it on to the lens cell.',
    readings: [read('larkfield-wren-60:C', 'diameter of the tube', 66.0), read('oxbow-ring-clamp:A', 'bore, clamped', 66.3)],
    fixes: [
      fix('three-cork-pads', 'Three cork pads at 120°', 'shim', 'reversible', {
        why: 'Three soft places share the load and grip at a third of the screw’s pull.', tools: 'Knife; steel ruler; torque key or a spring balance on a 100 mm arm', materials: 'Cork 1.5 mm; thin double-sided tape',
        steps: ['Take the telescope off the mount and lay it on a towel.', 'Cut three pads of 20 × 22 mm along the ruler.', 'Tape them at 60, 180 and 300 degrees from the split.', 'Close the ring and tighten to 0.4 N m (4 N at 100 mm).', 'Hang 2 kg on the tube with a strap: it must not slide. Then test on a star or on a distant lamp at night.'],
        shows: { 2: 1 }, after: ['balance', 'collimation'], accept: atMost('difference between the star’s three widths on the sensor', 8, 'um'), cautions: 'blade balance-shift', trials: 'h5 h6 h h4 w h7',
      }),
      fix('move-clamp-off-the-lens', 'Move the clamp away from the lens cell', 'reposition', 'reversible', { why: 'Squeeze fades within a tube’s width.', tools: 'Hex key', materials: '', steps: ['Take the telescope off the mount.', 'Slide the ring 60 mm towards the camera and balance again.'], after: ['balance'], cautions: 'balance-shift', trials: 'h w n' }),
    ],
    drawings: [
      drawing(ringClampSection({ title: 'TUBE IN AN UNLINED RING', tube: 66, ring: 66.3, lining: 0.1, clamp: 'RING CLAMP', tubeName: 'TUBE', carries: [0, 128, 232] }), 'Section across the tube: an unlined ring carries the tube at three hard places.', 'Hard places at the split and opposite.'),
      drawing(ringClampSection({ title: 'THREE PADS', tube: 66, ring: 69, lining: 1.5, clamp: 'RING CLAMP', tubeName: 'TUBE', carries: [] }), 'Section across the tube: three cork pads of 1.5 mm at equal angles carry it.', 'Three pads share it.'),
    ],
  }),
  writeUp('heron-72-bar-touches-the-dovetail-clamp-at-its-edge', 'Heron 72 bar touches the dovetail clamp at its edge', {
    by: 'runa', daysAgo: 930,
    summary: 'The bar of Heron 72 Rev A is cut at 75°, the saddle at 60°: it hangs by two edges and rocks. Use the clamp with the swivelling jaw or a wedge strip.',
    joints: [joint(side('greywether-heron-72', 'bar', 'A', 'B C'), side('oxbow-dovetail-clamp', 'saddle', 'A B', 'C'))],
    symptoms: 'foot-works-loose plate-rocks focus-shifts-on-slew', noticed: 'Two bright lines along the bar’s edge; nods when I touch the focuser.', cause: 'Flanks of different angle meet along one edge. The knobs’ pull goes through two lines less than 0.5 mm wide and marks the bar.',
    readings: [read('greywether-heron-72:A', 'flank of the bar', 75, 'deg', 'other', 1), read('oxbow-dovetail-clamp:B', 'flank of the saddle', 60, 'deg', 'makers-drawing', null)],
    fixes: [
      fix('clamp-rev-c-swivels', 'Clamp Rev C with swivelling jaw', 'swap', 'reversible', { why: 'Its jaw lies on flanks of 60 to 75 degrees.', tools: 'Hex key 5 mm', materials: 'Dovetail clamp Rev C', steps: ['Take the telescope off the mount first.', 'Bolt the clamp on, lay the bar in, close both knobs by turns.', 'Push at the dew shield with 20 N and watch a lamp: it must come back.'], after: ['balance'], accept: atMost('lamp does not come back by', 1, 'arcmin'), cautions: 'balance-shift', trials: 'h0.5 h0.3 h', madeRight: 'oxbow-dovetail-clamp:C' }),
      fix('wedge-strip-of-15-degrees', 'Wedge strip of 15°', 'remake', 'reversible', { why: 'A wedge between flank and jaw makes the angles meet.', tools: 'Printer or mill; caliper', materials: 'Aluminium, or solid glass-filled nylon', steps: ['Draw a wedge 80 mm long, 3.2 mm at the thick end, 15°.', 'Make two, break the edges.', 'Tape them to the saddle’s jaws with the thick end up.', 'Clamp, and look for an even mark on a strip of paper.'], accept: atMost('lamp does not come back by', 1, 'arcmin') }),
    ],
    drawings: [drawing(dovetailSection({ title: 'BAR 75° IN A SADDLE OF 60°', bar: 'BAR', shoe: 'SADDLE', barWidth: 43.9, barAngle: 75, shoeWidth: 44, shoeAngle: 60 }), 'End view: bar with flanks of 75 degrees in a saddle of 60 degrees; it touches at the edge only.', 'Only the edge carries.')],
  }),
  writeUp('guide-scope-30-sags-between-its-rings', 'Guide scope 30 sags between its rings', {
    by: 'stellan', daysAgo: 640,
    summary: 'Six plastic-tipped screws let the guide scope nod by 20 arc seconds an hour. Replace one ring’s screws by a solid ring, or lock all six against wedges.',
    joints: [joint(side('nettlecombe-guide-scope-30', 'tube in its ring screws', 'A B', 'C'), side('nettlecombe-guide-foot', 'ring holes', 'A B C'))],
    symptoms: 'star-trails-guiding-good focus-shifts-on-slew', noticed: 'Frames drift by a few pixels from one to the next, all night in one direction.', cause: 'Nylon tips creep under load and the springs of Rev B give way on purpose. The guide scope turns against the main telescope as gravity turns.',
    readings: [read('', 'drift between guide scope and telescope per hour', 0.33, 'arcmin', 'other', 0.05)],
    fixes: [
      fix('printed-collar-in-the-ring', 'Printed collar instead of the screws', 'remake', 'reversible', { why: 'A split collar holds the tube all round.', tools: 'Printer; caliper', materials: 'Glass-filled nylon', steps: ['Measure tube and ring at four places.', 'Print two half collars, 0.1 mm tight on the tube.', 'Slip them between tube and ring and close the ring.', 'Take frames for an hour without moving the guide star.'], after: ['balance'], accept: atMost('drift per hour', 0.08, 'arcmin'), trials: 'h0.05 h0.07 w h0.06' }),
      fix('scope-rev-c-solid-ring', 'Solid ring of Rev C', 'swap', 'reversible', { why: 'No screws, no creep.', tools: 'Hex key', materials: 'Ring of guide scope 30 Rev C', steps: ['Swap the rings one after the other so that the guide scope stays aligned.', 'Focus again and calibrate guiding.'], after: ['focus-offsets'], accept: atMost('drift per hour', 0.08, 'arcmin'), trials: 'h0.04 h0.05 h0.06', madeRight: 'nettlecombe-guide-scope-30:C' }),
    ],
    drawings: [drawing(plotSheet({ title: 'DRIFT AGAINST THE TELESCOPE', acrossName: 'MINUTES', upName: 'ARC SECONDS', across: [0, 120], up: [0, 48], series: [{ name: 'SCREWS', colour: 'red', points: [[0, 0], [30, 9], [60, 20], [90, 31], [120, 41]] }, { name: 'COLLAR', colour: 'brass', points: [[0, 0], [30, 1], [60, 3], [90, 3], [120, 4]] }] }), 'Plot: drift of 41 arc seconds in two hours with screws, 4 with the collar.', 'Two hours on one star.')],
  }),
  writeUp('guide-foot-holes-do-not-match-the-tube-ring', 'Guide foot holes do not match the tube ring', {
    by: 'tamsin', daysAgo: 745,
    summary: 'Holes of the printed foot are 34 mm apart, the ring’s 35. Open one hole to a slot; Rev C is right.',
    joints: [joint(side('stonebridge-guide-foot', 'two holes', 'A B', 'C'), side('larkfield-tube-ring-70', 'top holes', 'A B'))],
    symptoms: 'screws-do-not-line-up foot-works-loose', noticed: 'The second screw goes in at a slant and the foot cracks there.', cause: 'A print that shrank by nearly three in a hundred and was never checked against a ring.',
    readings: [read('stonebridge-guide-foot:A', 'hole spacing', 34.0, 'mm', 'caliper', 0.05), read('larkfield-tube-ring-70:A', 'hole spacing', 35.0, 'mm', 'caliper', 0.05)],
    fixes: [
      fix('slot-one-hole', 'Slot one hole by 1 mm', 'trim', 'permanent', { why: 'One round hole places it, one slot takes up the error.', tools: 'Round file 4 mm; caliper', materials: 'Washers M4 wide', steps: ['Take the foot off and away from the telescope.', 'File one hole outwards by 1 mm, mask on, in a straight line.', 'Use wide washers on both, tighten in turns.'], accept: atMost('foot moves under 10 N', 0.1, 'mm'), cautions: 'dust', trials: 'h h w' }),
      fix('foot-rev-c-with-inserts', 'Guide foot Rev C', 'swap', 'reversible', { why: 'Holes at 35 mm with brass inserts.', materials: 'Guide foot Rev C', steps: ['Look for brass in the holes.', 'Bolt on.'], accept: atMost('foot moves under 10 N', 0.1, 'mm'), trials: 'h0.03 h', madeRight: 'stonebridge-guide-foot:C' }),
    ],
    drawings: [drawing(holePlan({ title: 'FOOT HOLES AND RING HOLES', plate: 'FOOT', body: 'RING SCREWS', plateCircle: 34, bodyCircle: 35, holes: 2, holeDiameter: 4.3, screwDiameter: 4 }), 'Plan: two holes of the foot 34 mm apart and the ring’s screws 35 mm apart foul each other.', 'Half a millimetre each.')],
  }),
  writeUp('saddle-riser-takes-the-room-of-the-focus-motor', 'Saddle riser takes the room of the focus motor', {
    by: 'ubo', daysAgo: 330,
    summary: 'On the 30 mm riser an M1 below the focuser strikes the block when focused in. Hang the motor at four o’clock or use the hollowed Rev B.',
    joints: [joint(side('nettlecombe-riser', 'room above the bar', 'A', 'B'), side('tarn-m1', 'body', 'A B C D'))],
    symptoms: 'fouls-tube wont-reach-focus motor-stalls', noticed: 'Stops 3 mm before focus and stalls.', cause: 'Motor body 52 mm long below the tube, riser 70 mm long: they meet 4 mm before the end of travel.',
    readings: [read('nettlecombe-riser:A', 'length', 70.0), read('', 'travel that is missing', 4, 'mm', 'ruler', 0.5)],
    fixes: [
      fix('motor-at-four-oclock', 'Motor at four o’clock', 'reposition', 'reversible', { why: 'Between riser and camera cable is a free angle of 50 degrees.', tools: 'Hex key', materials: '', steps: ['Unplug the motor; hold it before its strap is loose.', 'Turn the bracket to four o’clock, seen from the camera, and strap it.', 'Set mesh or belt again, then limits, then run end to end.'], shows: { 1: 0 }, after: ['balance', 'focus-offsets'], accept: atLeast('room between motor and riser over the whole travel', 4, 'mm'), cautions: 'pinch', trials: 'h6 h8 h5' }),
      fix('riser-forward-6-mm', 'Riser 6 mm forward', 'reposition', 'reversible', { why: 'Enough where the mount allows it.', tools: 'Hex key 5 mm', materials: '', steps: ['Telescope off the mount.', 'Use the riser’s second hole, 6 mm forward.', 'Balance again.'], after: ['balance'], accept: atLeast('room between motor and riser over the whole travel', 4, 'mm'), cautions: 'balance-shift' }),
    ],
    drawings: [drawing(envelopePlan({ title: 'ROOM ROUND THE TUBE', hub: 'TUBE', taken: [{ from: 240, to: 300, name: 'SADDLE RISER' }, { from: 10, to: 60, name: 'CABLES' }], wanted: { from: 255, to: 315, name: 'MOTOR AS FITTED' } }), 'End view: the motor as fitted takes 255 to 315 degrees, the riser 240 to 300; they overlap.', 'What is free, and what is not.')],
  }),
  writeUp('tube-slides-in-tube-ring-70-with-three-strips', 'Tube slides in tube ring 70 with three strips', {
    by: 'vesna', daysAgo: 215,
    summary: 'New felt of 1.5 mm leaves the ring open: the hinge meets before the felt grips. Another 0.5 mm under the strips brings the grip back.',
    joints: [joint(side('larkfield-tube-ring-70', 'lined bore', 'B', 'A'), side('larkfield-wren-60', 'tube', 'A B C D'))],
    symptoms: 'tube-slides slips-when-pointing-up', noticed: 'The knob is tight and I can still turn the tube by hand.', cause: 'Bore 70.0, tube 66.0: 2.0 mm each side, felt 1.5 mm.',
    readings: [read('larkfield-tube-ring-70:B', 'bore', 70.0), read('larkfield-tube-ring-70:B', 'thickness of the felt', 1.5, 'mm', 'caliper', 0.1)],
    fixes: [fix('card-under-the-felt', 'Paper card under the felt', 'shim', 'reversible', { why: 'Two layers of 0.3 mm card under each strip.', tools: 'Scissors; knife', materials: 'Card 0.3 mm; thin double-sided tape', steps: ['Telescope off the mount.', 'Lift the felt with a knife’s back, tape two layers of card in, press the felt on.', 'Close: the hinge must stay open by 1 mm.', 'Pull along the tube with 30 N: no movement.'], after: ['balance', 'camera-angle'], accept: atLeast('pull along the tube that it holds', 30, 'N'), cautions: 'blade balance-shift', trials: 'h40 h35 w20 h45' })],
    drawings: [drawing(tiltSection({ title: 'TUBE NODS IN A LOOSE RING', gap: 0.5, span: 18, upper: 'TUBE', lower: 'RING' }), 'Side view: half a millimetre of play over the ring’s 18 mm lets the tube nod by 1.59 degrees.', 'What loose felt allows.')],
  }),
];
