import { barrelSection } from '../../drawing/mating-sections.js';
import { seatSection } from '../../drawing/sections.js';
import { atLeast, atMost, drawing, fix, joint, read, side, writeUp, type DemoWriteUp } from '../write-up-shape.js';

/** Noses, barrels and threads that bottom or are loose. */
export const seatWriteUps: readonly DemoWriteUp[] = [
  writeUp('camera-adapter-nose-bottoms-in-the-q26', 'Camera adapter nose bottoms in the Q26', {
    by: 'oona', daysAgo: 330,
    summary: 'The nose of Rev A is 5 mm high, the flange opening 4 mm deep. The adapter stands 1 mm off and the screws pull it crooked. Washers of 1 mm, or the nose of Rev B.',
    joints: [joint(side('hollin-camera-adapter', 'nose', 'A', 'B'), side('quillback-q26', 'opening of the flange', 'A B'))],
    symptoms: 'bottoms-early gap-under-plate stars-long-in-corner', noticed: 'Light shows all round under the adapter and the corner that is bad follows the screw I tighten first.', cause: 'Nose Ø 56.0 enters 56.2, but 5 mm do not go into 4. Six screws then bend the ring about the nose.',
    readings: [read('hollin-camera-adapter:A', 'height of the nose', 5), read('quillback-q26:A', 'depth of the opening', 4), read('quillback-q26:A', 'diameter of the opening', 56.2)],
    fixes: [
      fix('washers-of-1-mm', 'Washers of 1 mm at three screws', 'shim', 'reversible', { why: 'Three washers as thick as the gap carry the adapter at 120°; three screws hold 720 g with a wide margin.', tools: 'Micrometer; hex key 2.5 mm', materials: 'Three washers M3 of 1.0 to 1.05 mm; three screws 1 mm longer', steps: ['Camera capped, face up.', 'Pick washers that agree within 0.02 mm.', 'One over every second hole, three screws by turns; leave the other three out and tape their holes.', 'Take 1 mm out of the stack elsewhere.'], sheet: '/worksheets/shim?v=1&gap=1&tolerance=0.05&mostPieces=2&layout=three-points&boltCircle=68&families=washer', shows: { 2: 0 }, after: ['back-focus', 'flats'], accept: atMost('spread of the gap round the flange', 0.02, 'mm'), trials: 'h0.01 h0.02 h0.02 n0.06' }),
      fix('turn-the-nose-down', 'Turn the nose down to 3.5 mm', 'trim', 'permanent', { why: 'Half a millimetre of room, and the flange carries.', tools: 'Lathe; caliper', steps: ['Adapter off; camera capped and in another room.', 'Face the nose down to 3.5 mm in light passes.', 'Deburr, wash and dry before it comes near the camera.'], sheet: '/worksheets/trim?v=1&bossDiameter=56&bossHeight=5&recessDiameter=56.2&recessOuter=78&recessDepth=4', after: ['back-focus', 'flats'], accept: atMost('spread of the gap round the flange', 0.02, 'mm'), cautions: 'rotary-tool swarf', trials: 'h0.01 h' }),
      fix('adapter-with-the-short-nose', 'Adapter Rev B', 'swap', 'reversible', { why: 'Nose of 3 mm.', materials: 'Camera adapter M54 Rev B', steps: ['Swap; 10 mm of path as before.', 'Take flats.'], after: ['flats'], accept: atMost('spread of the gap round the flange', 0.02, 'mm'), trials: 'h0.01 h0.01', madeRight: 'hollin-camera-adapter:B' }),
    ],
    drawings: [drawing(seatSection({ title: 'NOSE IN THE FLANGE OF Q26', upper: 'ADAPTER', lower: 'Q26', boss: 56, bossHeight: 5, recess: 56.2, recessDepth: 4, bossName: 'NOSE', recessName: 'OPENING', open: true }), 'Section: a nose 5 mm high bottoms in an opening 4 mm deep; the flange is 1 mm off.', 'It stands on its nose.')],
  }),
  writeUp('printed-spacer-stands-off-the-w1-shoulder', 'Printed spacer stands off the W1 shoulder', {
    by: 'imke', daysAgo: 505,
    summary: 'The shoulder of W1 Rev A is 1.4 mm high, the seat in the printed ring 1.0 deep. The ring adds 0.4 mm that is not engraved on it, and rocks.',
    joints: [joint(side('stonebridge-spacer-set', 'flange seat', 'A B'), side('larkfield-flattener-w1', 'rear shoulder', 'A', 'B C'))],
    symptoms: 'bottoms-early stars-long-all-corners plate-rocks', noticed: 'A 2 mm ring measured as 2.4 in place. Corners were long until I took half a millimetre out.', cause: 'Shoulder Ø 51.6 enters the seat, its face meets the floor 0.4 mm before the rims meet.',
    readings: [read('larkfield-flattener-w1:A', 'height of the shoulder', 1.4), read('stonebridge-spacer-set:B', 'depth of the seat', 1)],
    fixes: [
      fix('three-pieces-under-the-rim', 'Three pieces of 0.4 mm under the rim', 'shim', 'reversible', { why: 'The rim carries again and the ring cannot rock. The 0.4 mm stay: count them in the stack.', tools: 'Micrometer; tweezers', materials: 'Shim washers or strip 0.4 mm', steps: ['Flattener capped, rear up.', 'Three pieces at 120° outside the shoulder, held by thin tape.', 'Screw the stack together and measure its length at three places.'], sheet: '/worksheets/shim?v=1&gap=0.4&tolerance=0.05&mostPieces=2&layout=three-points&boltCircle=54&families=washer', after: ['back-focus', 'flats'], accept: atMost('length of the stack differs round the rim', 0.03, 'mm'), trials: 'h0.02 h0.03 w0.08 h' }),
      fix('deepen-the-seat', 'Deepen the seat to 1.5 mm', 'trim', 'permanent', { why: 'The shoulder goes home and the engraved length is true. Not on rings under 3 mm.', tools: 'Scraper; depth gauge', steps: ['Ring in a flat jig, away from any optics.', 'Scrape the floor of the seat round and round, away from your hand, mask on.', 'Measure at six places; brush and wash.'], after: ['back-focus'], accept: atMost('length of the stack differs round the rim', 0.03, 'mm'), cautions: 'blade dust', trials: 'h0.03 n0.1' }),
    ],
    drawings: [drawing(seatSection({ title: 'SHOULDER OF W1 REV A IN THE PRINTED RING', upper: 'FLATTENER', lower: 'PRINTED RING', boss: 51.6, bossHeight: 1.4, recess: 52.1, recessDepth: 1, bossName: 'SHOULDER', recessName: 'SEAT', open: true }), 'Section: shoulder 1.4 mm high in a seat 1.0 mm deep leaves 0.4 mm under the rim.', '0.4 mm not engraved.')],
  }),
  writeUp('reducer-tilts-in-the-heron-72-drawtube', 'Reducer tilts in the Heron 72 drawtube', {
    by: 'mirela', daysAgo: 395,
    summary: 'Barrel 50.8, bore 51.0: the one screw pushes it over to the far side and it leans by a third of a degree. Foil round the barrel in two bands centres it.',
    joints: [joint(side('greywether-reducer-08', 'two-inch barrel', 'B', 'A'), side('greywether-heron-72', 'drawtube bore', 'B C'))],
    symptoms: 'too-loose-in-bore stars-long-in-corner', noticed: 'The bad corner moves with the reducer’s angle in the drawtube.', cause: '0.2 mm of room over 34 mm of barrel: up to 0.34°.',
    readings: [read('greywether-reducer-08:B', 'diameter of the barrel', 50.8), read('greywether-heron-72:B', 'drawtube bore', 51)],
    fixes: [
      fix('two-bands-of-tape', 'Two bands of metal tape', 'shim', 'reversible', { why: 'Bands of 0.08 mm leave 0.04 mm of room and hold at both ends.', tools: 'Micrometer; scissors', materials: 'Aluminium tape 0.08 mm', steps: ['Reducer capped at both ends.', 'One band at the shoulder, one at the front of the barrel, ends butted and not lapped.', 'Try it in by hand; it must slide with light pressure.'], shows: { 1: 0 }, after: ['flats', 'collimation'], accept: atMost('play of the barrel', 0.05, 'mm'), trials: 'h0.04 h0.03 h w0.1 h0.05 n0.12' }),
      fix('push-it-against-the-shoulder', 'Tighten with the shoulder pressed home', 'adjust', 'reversible', { why: 'The shoulder is square to the axis; the screw only has to keep it there.', steps: ['Point the telescope up, lock both axes, hold the camera.', 'Press the reducer home by its shoulder while you tighten the screw.', 'A leaf of 0.05 mm must not enter at the shoulder.'], after: ['flats'], accept: atMost('play of the barrel', 0.05, 'mm'), cautions: 'balance-shift', trials: 'h0.05 w n0.2' }),
    ],
    drawings: [drawing(barrelSection({ title: 'REDUCER IN THE DRAWTUBE', outer: 'DRAWTUBE', inner: 'REDUCER', barrel: 50.8, bore: 51, barrelLength: 34, boreDepth: 36, shim: 'TAPE 0.08' }), 'Section: barrel of 50.80 mm in a bore of 51.00 mm with tape of 0.08 mm.', 'Two bands.')],
  }),
  writeUp('guide-camera-is-loose-in-the-guide-scope-30', 'Guide camera is loose in the guide scope 30', {
    by: 'nils', daysAgo: 255,
    summary: 'G1 Rev C is 31.55 mm, the bore 31.82. It leans by three quarters of a degree and moves when the cable pulls. A band of 0.12 mm takes the room.',
    joints: [joint(side('quillback-g1', 'inch-and-a-quarter barrel', 'A C', 'B'), side('nettlecombe-guide-scope-30', 'inch-and-a-quarter bore', 'A B C'))],
    symptoms: 'too-loose-in-bore star-trails-guiding-good', noticed: 'Guiding looks fine, stars are lines. When I touch the cable the guide star jumps.', cause: '0.27 mm of room over 20 mm of barrel is 0.77°. The camera hangs on one screw.',
    readings: [read('quillback-g1:C', 'diameter of the barrel', 31.55), read('nettlecombe-guide-scope-30:A', 'bore', 31.82)],
    fixes: [
      fix('band-of-brass-0-12', 'Band of brass, 0.12 mm', 'shim', 'reversible', { why: 'Twice 0.12 mm leaves 0.03 mm.', tools: 'Snips; micrometer', materials: 'Brass shim 0.12 mm, 18 × 98 mm', steps: ['Camera out and capped.', 'Roll the strip to the bore’s curve and lay it in, slit away from the screw.', 'Camera in, turned as before; tighten with two fingers.'], shows: { 1: 0 }, accept: atMost('play of the camera', 0.05, 'mm'), cautions: 'blade', trials: 'h0.03 h0.04 h h0.02 w' }),
      fix('tie-the-cable-to-the-scope', 'Tie the cable to the scope', 'reposition', 'reversible', { why: 'The pull ends at the tie. The lean remains, but it does not change.', materials: 'Hook and loop strap', steps: ['Leave a loop of 60 mm at the plug.', 'Strap the cable to the tube, not to the camera.', 'Move the telescope through its range by hand and watch the loop.'], accept: atMost('play of the camera', 0.05, 'mm'), trials: 'h n0.25 w' }),
    ],
    drawings: [drawing(barrelSection({ title: 'G1 REV C IN THE GUIDE SCOPE', outer: 'GUIDE SCOPE', inner: 'G1', barrel: 31.55, bore: 31.82, barrelLength: 20, boreDepth: 26, shim: 'BRASS 0.12' }), 'Section: barrel of 31.55 mm in a bore of 31.82 mm with brass of 0.12 mm.', '0.03 mm are left.')],
  }),
  writeUp('r54-rotator-does-not-seat-on-the-wren-80', 'R54 rotator does not seat on the Wren 80', {
    by: 'lorcan', daysAgo: 310,
    summary: 'From Rev C the rear thread is 5.0 mm long, the rotator’s 4.7 deep. It grips on its last turn and stays 0.3 mm off. A ring of 0.5 mm lets the shoulders carry.',
    joints: [joint(side('larkfield-wren-80', 'rear thread M54', 'C', 'A B'), side('brackwater-r54', 'M54 on both sides', 'A B C'))],
    symptoms: 'bottoms-early thread-stuck stars-long-in-corner', noticed: 'A leaf of 0.25 mm goes in all round. It came off only with a strap.', cause: 'The end of the thread meets the floor before the shoulder meets the face.',
    readings: [read('larkfield-wren-80:C', 'length of the rear thread', 5), read('brackwater-r54:B', 'depth of the thread', 4.7)],
    fixes: [
      fix('shim-ring-m54', 'Shim ring M54, 0.5 mm', 'shim', 'reversible', { why: 'It leaves 0.2 mm at the end of the thread and the faces carry.', tools: 'Feeler leaves; strap spanner', materials: 'Shim ring M54, 0.5 mm', steps: ['Rotator unplugged, camera off.', 'Ring over the thread, rotator on by hand until it stops.', 'A leaf of 0.05 mm must not enter.', 'Take 0.5 mm out of the stack if it counts behind your corrector.'], after: ['back-focus', 'camera-angle', 'flats'], accept: atMost('gap at the shoulder', 0.03, 'mm'), trials: 'h0.02 h0.02 h h0.03 n0.06' }),
      fix('shorten-the-thread', 'Shorten the thread by 0.5 mm', 'trim', 'permanent', { why: 'No ring to lose; the telescope loses its value.', tools: 'Flat plate; 320 grit wet paper', materials: 'Water', steps: ['Focuser off the tube, glass in another room.', 'Rub the end of the thread on wet paper in figures of eight; measure at four places.', 'Chase the first turn with a fine file, wash, dry.'], after: ['collimation', 'flats'], accept: atMost('gap at the shoulder', 0.03, 'mm'), cautions: 'dust swarf', trials: 'h0.02 n' }),
    ],
    drawings: [drawing(barrelSection({ title: 'WREN 80 REV C IN THE R54', outer: 'R54', inner: 'WREN 80', barrel: 54, bore: 54.1, barrelLength: 5, boreDepth: 4.7 }), 'Section: thread of 5.0 mm bottoms in a depth of 4.7 mm.', 'It bottoms 0.3 mm early.')],
  }),
  writeUp('filter-drawer-lets-light-in-at-its-slide', 'Filter drawer lets light in at its slide', {
    by: 'kaja', daysAgo: 215,
    summary: 'The slide of Rev A leaves 0.6 mm along one edge and a lamp shows in flats and darks. A strip of thin velvet closes it.',
    joints: [joint(side('pallister-filter-drawer', 'drawer slide', 'A', 'B'), side('quillback-q16', 'M42 flange', 'A B C'))],
    symptoms: 'flats-do-not-match reflection-halo', noticed: 'Darks taken by day show a bright band along one side.', cause: 'A gap of 0.6 mm by 48 mm in line with the sensor.',
    readings: [read('pallister-filter-drawer:A', 'gap along the slide', 0.6, 'mm', 'feeler-leaf', 0.05)],
    fixes: [
      fix('velvet-along-the-edge', 'Velvet along the edge', 'shim', 'reversible', { why: 'Pile of 0.8 mm bends and closes 0.6.', tools: 'Scissors; tweezers', materials: 'Self-adhesive black velvet 0.8 mm, 3 × 48 mm', steps: ['Filter out and boxed.', 'Strip on the drawer’s edge, not in the body: fibres fall outwards.', 'Brush, close, take a dark with a lamp beside it and one under a cloth.'], after: ['flats'], accept: atMost('gap that is open', 0.1, 'mm'), trials: 'h0 h0.05 h w0.2' }),
      fix('turn-the-slide-down', 'Turn the slide to the ground', 'reposition', 'reversible', { why: 'Lamps and the Moon stand above. It helps; it does not close the gap.', tools: 'Strap spanner', steps: ['Turn the drawer at its thread until it opens downwards.', 'Check that the magnets hold it with the telescope pointing up.', 'New flats.'], after: ['flats', 'camera-angle'], accept: atLeast('pull that opens the drawer', 6, 'N'), cautions: 'magnet', trials: 'h7 n4' }),
    ],
    drawings: [drawing(seatSection({ title: 'SLIDE OF THE DRAWER', upper: 'DRAWER', lower: 'BODY', boss: 48, bossHeight: 2, recess: 49.2, recessDepth: 2.6, bossName: 'DRAWER', recessName: 'SLIDE', open: true }), 'Section: drawer of 48.0 mm in a slide of 49.2 mm leaves 0.6 mm on a side.', 'Light enters at one edge.')],
  }),
];
