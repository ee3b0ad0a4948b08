import { barrelSection } from '../../drawing/mating-sections.js';
import { holePlan } from '../../drawing/plans.js';
import { plotSheet } from '../../drawing/plots.js';
import { stackSection, tiltSection } from '../../drawing/sections.js';
import { atLeast, atMost, drawing, edition, fix, joint, read, side, withFix, writeUp, type DemoWriteUp } from '../write-up-shape.js';

/** Back focus, spacers, reducers, tilt. */
export const spacerWriteUps: readonly DemoWriteUp[] = [
  writeUp('stack-behind-the-w1-flattener-is-1-mm-short', 'Stack behind the W1 flattener is 1 mm short', {
    by: 'author', daysAgo: 980,
    summary: 'With a wheel, a filter and the Q16 the sensor stands 54.3 mm behind the flattener’s shoulder instead of 55, and filters ask for more. Add a ring of 1 mm.',
    joints: [joint(side('larkfield-flattener-w1', 'rear shoulder', 'B C', 'A'), side('hollin-m48-spacer', 'male thread and shoulder', 'A B C'))],
    symptoms: 'stars-long-all-corners wont-reach-focus', noticed: 'Stars in all four corners point to the middle like spokes.',
    cause: 'Rev B’s shoulder stands 0.8 mm lower, but its leaflet still counts from the old one. A filter of thickness t moves focus back by t(1 − 1/n): a 2 mm filter with n = 1.52 by 0.68 mm. So 55.7 mm of metal are wanted and 54.5 are there.',
    readings: [read('larkfield-flattener-w1:B', 'shoulder below the thread’s end', 4.2), read('', 'stack from shoulder to flange of the camera', 37.0), read('quillback-q16:B', 'sensor behind the flange', 17.5, 'mm', 'makers-drawing', null)],
    fixes: [
      fix('ring-of-1-mm', 'Shim ring of 1.0 mm and one of 0.2', 'shim', 'reversible', {
        why: 'Rings between shoulder and spacer lengthen the path and keep the thread engaged.', tools: 'Caliper; strap spanner', materials: 'Shim rings 48 × 54 mm, 1.0 and 0.2 mm',
        steps: ['Cap the telescope and work over a towel.', 'Measure each piece’s length between shoulders, threads not counted, and add them up.', 'Slip the rings over the male thread, screw home by hand.', 'Check that at least 2.5 mm of thread still hold.', 'Take a frame: corners now tell. Spokes to the middle, add 0.2; rings round it, take 0.2 away.'],
        shows: { 1: 0 }, after: ['back-focus', 'flats', 'camera-angle', 'focus-offsets'], accept: atMost('best focus of corners and middle apart', 15, 'um'), trials: 'h8 h10 h h9 w n20 h7 h11',
      }),
      fix('spacer-turned-to-length', 'Have a spacer turned to length', 'remake', 'reversible', { why: 'One ring in place of three has no faces that can tilt.', tools: 'Caliper', materials: 'Aluminium ring M48 × 0.75, 17.7 mm', steps: ['Find the length with shims first and sum it up.', 'Order the ring at that length, both shoulders parallel within 0.02 mm.', 'Screw it on and compare with the shimmed frame.'], after: ['back-focus', 'flats', 'camera-angle'], accept: atMost('best focus of corners and middle apart', 15, 'um') }),
    ],
    drawings: [
      drawing(stackSection({ title: 'W1 REV B TO THE SENSOR OF Q16', layers: [{ name: 'SPACER', length: 16.5 }, { name: 'FW5', length: 20 }, { name: 'ADAPTER', length: 0.5 }, { name: 'Q16 TO SENSOR', length: 17.5 }], required: 55.7, requiredName: 'WANTED WITH FILTER' }), 'Section along the axis: spacer 16.5, wheel 20, adapter 0.5, camera 17.5 make 54.5 mm; 55.7 are wanted.', 'What is there and what is wanted.'),
    ],
    later: [
      edition('author', 700, 'Thickness of the filter counted; 1.2 instead of 1.0 mm.', (earlier) => withFix(earlier, 'ring-of-1-mm', { title: 'Shim rings of 1.0 and 0.2 mm', why: 'Rings between shoulder and spacer lengthen the path and keep the thread engaged. The 0.2 is for the filter: leave it away without one.' })),
      edition('joss', 400, 'Marked for Rev C; thread engagement told.', (earlier) => ({ ...earlier, readings: [...earlier.readings, read('larkfield-flattener-w1:C', 'length of the rear thread', 4.0)] })),
    ],
  }),
  writeUp('m48-spacer-bottoms-before-its-shoulder-seats', 'M48 spacer bottoms before its shoulder seats', {
    by: 'bram', daysAgo: 840,
    summary: 'The male thread of spacer Rev B is 4.5 mm long, flattener Rev C takes 4.0. It stops 0.5 mm early and sits on the thread’s end. A ring of 0.6 mm gives it a seat.',
    joints: [joint(side('hollin-m48-spacer', 'male thread', 'B', 'A C'), side('larkfield-flattener-w1', 'rear thread M48', 'C', 'A B'))],
    symptoms: 'bottoms-early thread-binds stars-long-in-corner', noticed: 'A hair of light at the shoulder all round; it stops hard and comes off with a crack.', cause: 'Male 4.5 mm against female 4.0 mm: stand-off 0.5 mm. The seat is then the thread’s end, which is not square.',
    readings: [read('hollin-m48-spacer:B', 'length of the male thread', 4.5), read('larkfield-flattener-w1:C', 'depth of the female thread', 4.0)],
    fixes: [
      fix('ring-under-the-shoulder', 'Ring of 0.6 mm under the shoulder', 'shim', 'reversible', { why: 'Brings the load back to the shoulder; take 0.1 mm into account in the stack.', tools: 'Caliper', materials: 'Shim ring 48 × 54 × 0.6 mm', steps: ['Slip the ring on, screw home.', 'Hold it against a lamp: no light at the shoulder.', 'Correct the stack elsewhere by 0.6 mm less 0.5.'], shows: { 0: 0 }, after: ['back-focus', 'flats'], accept: atMost('light at the shoulder', 0.02, 'mm'), trials: 'h0 h0.01 h h0.02' }),
      fix('shorten-the-thread', 'Shorten the thread by 0.7 mm', 'trim', 'permanent', { why: 'Leaves 3.8 mm, as Rev C.', tools: 'Flat plate; 240 grit wet paper; thread gauge or a spare nut', materials: 'Water; brush', steps: ['Take the spacer away from all glass.', 'Rub the thread’s end on wet paper, turning the ring in the hand.', 'Every 0.2 mm measure at four places.', 'Break the first thread with a needle file, brush, wash and dry.', 'Run the nut over it: it must go freely.'], after: ['back-focus'], accept: atMost('light at the shoulder', 0.02, 'mm'), cautions: 'dust swarf', trials: 'h0 w', madeRight: 'hollin-m48-spacer:C' }),
    ],
    drawings: [drawing(barrelSection({ title: 'THREAD LONGER THAN ITS HOLE', outer: 'FLATTENER', inner: 'SPACER', barrel: 48, bore: 48, barrelLength: 4.5, boreDepth: 4 }), 'Section: male thread of 4.5 mm in a hole of 4.0 mm bottoms half a millimetre early.', 'The shoulder never lands.')],
  }),
  writeUp('m48-ring-is-stuck-on-the-flattener', 'M48 ring is stuck on the flattener', {
    by: 'calla', daysAgo: 810,
    summary: 'Two fine threads of bare aluminium seize. Even grip, a cold pack and patience free it; pliers deform it.',
    joints: [joint(side('hollin-m48-spacer', 'female thread', 'A B', 'C'), side('larkfield-flattener-w1', 'rear thread M48', 'A B C'))],
    symptoms: 'thread-stuck thread-binds', noticed: 'Neither hand nor rubber glove moves it.', cause: 'Squeezing makes the ring oval, and oval threads wedge. Dirt and bare aluminium weld at the crests.',
    readings: [],
    fixes: [
      fix('strap-and-cold-pack', 'Strap spanner and a cold pack', 'adjust', 'reversible', {
        why: 'The strap presses evenly; cold shrinks the inner ring first.', tools: 'Two rubber strap spanners', materials: 'Cold pack in a cloth',
        steps: ['Cap glass on both sides; work over a towel.', 'Lay the cold pack inside the ring for ten minutes, not on glass.', 'One strap on each part, close together, and pull slowly.', 'When it moves turn it back and forth; do not force it over grit.', 'Brush both threads and rub a candle over them before they meet again.'], after: ['camera-angle', 'flats'], accept: atMost('pull on a 100 mm arm to unscrew it next time', 15, 'N'), trials: 'h h h n',
      }),
      fix('drop-of-solvent', 'A drop of isopropyl alcohol', 'adjust', 'reversible', { why: 'Creeps in and loosens old grease.', tools: 'Needle bottle', materials: 'Isopropyl alcohol', steps: ['Take the flattener’s glass away if it comes out; else hold the thread down so that nothing runs to it.', 'One drop at the seam, window open, no flame. Wait ten minutes.', 'Strap spanners as above.'], after: ['camera-angle', 'flats'], cautions: 'solvent', trials: 'h w' }),
      fix('warm-the-outer-ring', 'Warm the outer ring', 'adjust', 'leaves-a-mark', { why: 'Twenty degrees more open the thread by 0.02 mm. Only where there is no cement near.', tools: 'Hot-air tool at its lowest; thermometer strip', materials: '', steps: ['Never with the glass in: corrector out first.', 'Warm the outer ring evenly, moving all the time, to 50 °C by the strip.', 'Gloves on, straps on, turn.'], after: ['collimation', 'camera-angle', 'flats'], cautions: 'heat' }),
    ],
    drawings: [drawing(stackSection({ title: 'WHERE TO SET THE STRAPS', layers: [{ name: 'FLATTENER', length: 31 }, { name: 'STUCK RING', length: 5, hatch: 'print' }, { name: 'SPACER', length: 16.5 }] }), 'Section: flattener, stuck ring of 5 mm and spacer; straps go on either side of the seam.', 'One strap each side of the seam.')],
  }),
  writeUp('tilt-plate-rocks-because-its-pull-screws-bottom', 'Tilt plate rocks because its pull screws bottom', {
    by: 'dov', daysAgo: 570,
    summary: 'Pull screws of 6 mm reach the end of their holes before they pull. Use 5 mm ones; Rev C has them.',
    joints: [joint(side('hollin-tilt-plate', 'push and pull screws', 'B', 'A C'), side('quillback-q16', 'six flange holes', 'A B'))],
    symptoms: 'screw-bottoms stars-long-in-corner rotates-by-itself', noticed: 'Screws are tight and the rings still move by a hair; one corner is bad and changes as the telescope turns.', cause: 'Holes are 5.2 mm deep, screws reach 5.6: they bottom before the head clamps.',
    readings: [read('hollin-tilt-plate:B', 'reach of the pull screw', 5.6), read('quillback-q16:B', 'depth of the flange hole', 5.2)],
    fixes: [
      fix('five-mm-pull-screws', 'Pull screws of 5 mm', 'swap', 'reversible', { why: 'One millimetre less and the head clamps.', tools: 'Hex key 2 mm', materials: 'Three M2.5 × 5 screws', steps: ['Camera off, cap on, over a towel.', 'Change one screw at a time so that the tilt stays.', 'Tighten by turns, then try each push screw: it must resist.'], after: ['flats', 'back-focus'], accept: atMost('best focus of opposite corners apart', 12, 'um'), trials: 'h6 h8 h h7 n15', madeRight: 'hollin-tilt-plate:C' }),
      fix('washers-under-the-heads', 'Washers under the heads', 'shim', 'reversible', { why: 'Half a millimetre under the head does the same.', tools: 'Tweezers', materials: 'Three washers 2.5 × 5 × 0.5 mm', steps: ['As above, a washer under each head.', 'Check that heads do not stand proud of the ring.'], after: ['flats'], accept: atMost('best focus of opposite corners apart', 12, 'um') }),
    ],
    drawings: [drawing(barrelSection({ title: 'PULL SCREW IN ITS HOLE', outer: 'CAMERA FLANGE', inner: 'PULL SCREW', barrel: 2.5, bore: 2.5, barrelLength: 5.6, boreDepth: 5.2, solid: true }), 'Section: a screw that reaches 5.6 mm in a hole 5.2 mm deep bottoms before its head clamps.', 'It bottoms before it pulls.')],
  }),
  writeUp('printed-spacer-has-crept-and-tilts-the-camera', 'Printed spacer has crept and tilts the camera', {
    by: 'edda', daysAgo: 700,
    summary: 'Glossy rings of the first batch flow under the screws in a warm car; one side is 0.15 mm thinner. Replace by metal or by Rev B, and never shim a crept ring.',
    joints: [joint(side('stonebridge-spacer-set', 'flange seat', 'A', 'B'), side('quillback-q16', 'six flange holes', 'A B C'))],
    symptoms: 'part-creeps stars-long-in-corner', noticed: 'Stars in the left corners got long over a summer.', cause: 'Polylactide softens at 55 °C and creeps below that. Screws sink in where they pull most.',
    readings: [read('stonebridge-spacer-set:A', 'thickness, thickest place', 2.01, 'mm', 'micrometer', 0.005), read('stonebridge-spacer-set:A', 'thickness, thinnest place', 1.86, 'mm', 'micrometer', 0.005)],
    fixes: [
      fix('ring-of-metal', 'Ring of metal', 'swap', 'reversible', { why: 'Metal does not creep.', materials: 'Aluminium ring 2.0 mm', tools: 'Micrometer', steps: ['Measure the new ring at six places: within 0.01 mm.', 'Camera off, change the ring, tighten crosswise.', 'New frame, new flats.'], after: ['flats', 'back-focus', 'camera-angle'], accept: atMost('spread of thickness', 0.02, 'mm'), trials: 'h0.01 h0.01 h0.02 h' }),
      fix('print-in-filled-nylon', 'Print it in filled nylon', 'remake', 'reversible', { why: 'Stands 100 °C and creeps little; anneal it before it is rubbed to size.', tools: 'Printer; oven that is not used for food; flat plate; wet paper; micrometer', materials: 'Glass-filled nylon', steps: ['Print 0.2 mm over size, solid.', 'Anneal at 80 °C for two hours in the oven, let it cool in there.', 'Rub to size on wet paper; dust of filled nylon does not belong in lungs.', 'Spread under 0.02 mm, or do it again.'], after: ['flats', 'back-focus'], accept: atMost('spread of thickness', 0.02, 'mm'), cautions: 'dust heat', trials: 'h0.02 w0.05', madeRight: 'stonebridge-spacer-set:B' }),
    ],
    drawings: [drawing(tiltSection({ title: 'CAMERA ON A CREPT RING', gap: 0.15, span: 50, upper: 'CAMERA', lower: 'WHEEL' }), 'Side view: 0.15 mm over 50 mm tilt the camera by 0.17 degrees.', 'Small angle, bad corners.')],
  }),
  writeUp('reducer-barrel-bottoms-in-the-heron-72-drawtube', 'Reducer barrel bottoms in the Heron 72 drawtube', {
    by: 'greta', daysAgo: 900,
    summary: 'The 34 mm barrel meets a step 31 mm deep: the shoulder stands off by 3 mm and the camera nods. A parfocal ring as a seat is the reversible way.',
    joints: [joint(side('greywether-reducer-08', 'two-inch barrel', 'A B', 'C'), side('greywether-heron-72', 'drawtube bore', 'A', 'B C'))],
    symptoms: 'bottoms-early stars-long-in-corner too-loose-in-bore', noticed: 'A gap of 3 mm before the shoulder; the train nods when I touch the camera.', cause: 'Drawtube Rev A has a step at 31 mm. The barrel’s end meets it while the shoulder is still out, so two screws carry everything.',
    readings: [read('greywether-reducer-08:A', 'length of the barrel', 34), read('greywether-heron-72:A', 'depth to the step', 31)],
    fixes: [
      fix('split-ring-as-a-seat', 'Split ring of 3.1 mm as a seat', 'shim', 'reversible', { why: 'The shoulder lands on the ring before the barrel meets the step.', tools: 'Caliper', materials: 'Split ring 51 × 56 × 3.1 mm in aluminium', steps: ['Slip the ring over the barrel to the shoulder.', 'Push home: the shoulder must touch all round before the end does.', 'Tighten three screws by turns, camera held.'], shows: { 1: 0 }, after: ['back-focus', 'flats', 'camera-angle'], accept: atMost('nod of the camera under 5 N', 0.05, 'mm'), trials: 'h0.02 h0.03 h0.05 w' }),
      fix('barrel-shortened', 'Have the barrel turned shorter', 'trim', 'permanent', { why: 'A lathe takes 4 mm off in minutes; a saw ruins it.', tools: 'Lathe and somebody who knows it', materials: '', steps: ['Take the glass out of the cell and note the order and the side of each ring.', 'Have 4 mm turned off and the edge broken.', 'Wash all swarf out, dry, put the glass back.', 'Test on a star: the cell was open.'], after: ['collimation', 'back-focus', 'flats'], accept: atMost('nod of the camera under 5 N', 0.05, 'mm'), cautions: 'swarf glass-edge rotary-tool', trials: 'h0.03', madeRight: 'greywether-reducer-08:C' }),
    ],
    drawings: [drawing(barrelSection({ title: 'REDUCER IN THE DRAWTUBE', outer: 'DRAWTUBE', inner: 'REDUCER', barrel: 50.8, bore: 51, barrelLength: 34, boreDepth: 31 }), 'Section: barrel of 34 mm bottoms on a step 31 mm deep; the shoulder stands 3 mm off.', 'The shoulder never seats.')],
  }),
  writeUp('dark-corners-with-the-m42-to-m48-adapter', 'Dark corners with the M42 to M48 adapter', {
    by: 'hob', daysAgo: 620,
    summary: 'An opening of 36 mm this far from the sensor cuts the corners. Put the adapter next to the camera, or take Rev B.',
    joints: [joint(side('hollin-m42-adapter', 'clear opening', 'A', 'B'), side('larkfield-flattener-w1', 'rear thread M48', 'A B C'))],
    symptoms: 'vignetting flats-do-not-match', noticed: 'Corners at 60 % of the middle; flats do not cure it near bright stars.', cause: 'At f/5.5 the cone for a 22 mm sensor is 32 mm wide 55 mm in front, plus the beam: the flattener’s end wants 40 mm.',
    readings: [read('hollin-m42-adapter:A', 'clear opening', 36.0)],
    fixes: [
      fix('adapter-next-to-the-camera', 'Move the adapter next to the camera', 'reposition', 'reversible', { why: 'There the cone is 26 mm wide.', tools: 'Strap spanner', steps: ['Screw the wheel’s M48 side to the spacers, the adapter between wheel and camera.', 'Sum up the stack again.', 'Take flats.'], after: ['flats', 'back-focus', 'camera-angle'], accept: atLeast('distance from the middle with more than nine tenths of the light', 9, 'mm'), trials: 'h10 h9.5 h9 n7' }),
      fix('adapter-rev-b', 'Adapter Rev B', 'swap', 'reversible', { why: 'Opening 38.5 mm.', materials: 'Adapter Rev B', steps: ['Swap, take flats.'], after: ['flats'], accept: atLeast('distance from the middle with more than nine tenths of the light', 9, 'mm'), trials: 'h9.8', madeRight: 'hollin-m42-adapter:B' }),
    ],
    drawings: [drawing(plotSheet({ title: 'LIGHT ACROSS THE SENSOR', acrossName: 'FROM THE MIDDLE, mm', upName: 'LIGHT, %', across: [0, 12], up: [40, 100], series: [{ name: 'AT THE FLATTENER', colour: 'red', points: [[0, 100], [4, 97], [7, 88], [9, 74], [11, 60]] }, { name: 'AT THE CAMERA', colour: 'brass', points: [[0, 100], [4, 99], [7, 97], [9, 93], [11, 90]] }] }), 'Plot: light falls to 60 percent at 11 mm with the adapter at the flattener, to 90 percent with it at the camera.', 'Where it stands matters.')],
  }),
  writeUp('camera-adapter-m54-holes-are-turned-against-the-q26', 'Camera adapter M54 holes are turned against the Q26', {
    by: 'wim', daysAgo: 270,
    summary: 'Six holes, but turned by 4°: three screws go in and the rest bind. Two ways: use three at 120°, or ream all six.',
    joints: [joint(side('hollin-camera-adapter', 'six flange holes', 'A', 'B'), side('quillback-q26', 'six flange holes', 'A B'))],
    symptoms: 'screws-do-not-line-up stars-long-in-corner', noticed: 'The fourth screw lifts the adapter on its side.', cause: 'A division error of 0.9 mm between two sets of three; forced screws tilt the ring.',
    readings: [read('hollin-camera-adapter:A', 'bolt circle', 68, 'mm', 'caliper', 0.05)],
    fixes: [
      fix('three-screws-at-120', 'Use three screws at 120°', 'adjust', 'reversible', { why: 'Three carry 700 g with a wide margin and do not fight.', tools: 'Hex key 2 mm', steps: ['Find the set of three that starts by finger.', 'Leave the others out; close their holes with tape against dust.', 'Tighten by turns.'], after: ['flats', 'camera-angle'], accept: atMost('gap at the flange', 0.02, 'mm'), trials: 'h h h' }),
      fix('ream-the-six-holes', 'Open the holes to 3.4 mm', 'trim', 'permanent', { why: 'From 3.0 to 3.4 mm they forgive 0.4 mm each way.', tools: 'Drill press; 3.4 mm drill; countersink by hand', materials: '', steps: ['Adapter off, camera capped and in another room.', 'Clamp it flat, drill each hole through, eye protection on, no gloves.', 'Deburr by hand, wash, dry.'], after: ['flats'], accept: atMost('gap at the flange', 0.02, 'mm'), cautions: 'rotary-tool swarf' }),
    ],
    drawings: [drawing(holePlan({ title: 'ADAPTER AND CAMERA FLANGE', plate: 'ADAPTER', body: 'FLANGE SCREWS', plateCircle: 68, bodyCircle: 68, holes: 6, holeDiameter: 3, screwDiameter: 2.8, turn: 1.5 }), 'Plan: six holes and six screws on the same circle, turned by a degree and a half; screws foul the holes.', 'Turned, not displaced.')],
  }),
];
