import { barrelSection, dovetailSection } from '../../drawing/mating-sections.js';
import { envelopePlan } from '../../drawing/plans.js';
import { plotSheet } from '../../drawing/plots.js';
import { atLeast, atMost, drawing, fix, joint, read, side, writeUp, type DemoWriteUp } from '../write-up-shape.js';

/** Feet in shoes and saddles, heaters on shields, and the small helical. */
export const footWriteUps: readonly DemoWriteUp[] = [
  writeUp('saddle-riser-rocks-in-the-dovetail-clamp', 'Saddle riser rocks in the dovetail clamp', {
    by: 'bram', daysAgo: 275,
    summary: 'The riser’s foot is 43.0 mm, the saddle 46.2. The jaw of Rev A and B closes by 2.8 mm and 0.4 are left. A strip of 0.5 mm on the fixed flank gives the jaw something to press.',
    joints: [joint(side('nettlecombe-riser', 'foot', 'A B'), side('oxbow-dovetail-clamp', 'saddle', 'A B', 'C'))],
    symptoms: 'rattles foot-works-loose focus-shifts-on-slew', noticed: 'Knobs tight, and the telescope still nods when I push it sideways.', cause: 'The jaw ends on its own stop before it grips: 46.2 − 2.8 − 43.0 = 0.4 mm.',
    readings: [read('nettlecombe-riser:A', 'width of the foot', 43), read('oxbow-dovetail-clamp:B', 'width of the saddle', 46.2), read('oxbow-dovetail-clamp:B', 'travel of the jaw', 2.8)],
    fixes: [
      fix('strip-on-the-fixed-flank', 'Strip of 0.5 mm on the fixed flank', 'shim', 'reversible', { why: '0.5 mm on a flank of 60° takes 0.58 mm of width, so the jaw grips 0.18 mm before its stop.', tools: 'Snips; file', materials: 'Aluminium strip 0.5 × 8 × 70 mm; thin tape', steps: ['Telescope off the mount, laid on a towel.', 'Cut the strip as long as the riser; break its edges.', 'Tape it to the fixed flank.', 'Riser in, knobs tight, push at the far end: no nod.'], shows: { 2: 0 }, after: ['balance'], accept: atMost('nod at the far end', 0.05, 'mm'), cautions: 'balance-shift blade', trials: 'h0.02 h0.03 h h0.05 w0.15' }),
      fix('clamp-that-swivels', 'Dovetail clamp Rev C', 'swap', 'reversible', { why: 'Its jaw swivels and closes further.', tools: 'Hex key 5 mm', materials: 'Dovetail clamp Rev C', steps: ['Lock both axes, telescope off first.', 'Swap the clamp, telescope on, balance.'], after: ['balance'], accept: atMost('nod at the far end', 0.05, 'mm'), cautions: 'balance-shift', trials: 'h0.01 h' }),
    ],
    drawings: [drawing(dovetailSection({ title: 'RISER IN THE SADDLE', bar: 'RISER', shoe: 'SADDLE', barWidth: 43, barAngle: 60, shoeWidth: 46.2, shoeAngle: 60, shim: 'STRIP 0.5' }), 'End view: foot of 43.0 mm in a saddle of 46.2 mm with a strip of 0.5 mm on the fixed flank.', 'Strip on the fixed side.')],
  }),
  writeUp('printed-guide-foot-tips-in-the-finder-shoe', 'Printed guide foot tips in the finder shoe', {
    by: 'greta', daysAgo: 345,
    summary: 'Foot Rev A and B is 31.9 mm, shoe Rev B 32.6. The thumb screws lift one flank and the guide scope points elsewhere each night. A strip of 0.5 mm brass takes most of it.',
    joints: [joint(side('stonebridge-guide-foot', 'foot', 'A B', 'C'), side('oxbow-finder-shoe', 'shoe', 'B', 'A'))],
    symptoms: 'foot-works-loose star-trails-guiding-good part-creeps', noticed: 'Each time I put it on the finder star is half a field away.', cause: '0.7 mm of width. The screws press above the flank’s middle and roll the foot over; nylon then takes that set.',
    readings: [read('stonebridge-guide-foot:B', 'width of the foot', 31.9), read('oxbow-finder-shoe:B', 'floor of the shoe', 32.6)],
    fixes: [
      fix('brass-between-screws-and-foot', 'Brass plate between screws and foot', 'shim', 'reversible', { why: '0.5 mm along a flank of 60° fills 0.58 of the 0.7 mm and spreads the screws’ pressure.', tools: 'Snips; file', materials: 'Brass strip 0.5 × 7 × 40 mm', steps: ['Guide scope off. Cut the strip, break its edges and bend a lip of 2 mm at each end so that it cannot slide out.', 'Lay it on the screws’ side, foot in.', 'Press the foot down while you tighten.'], shows: { 1: 0 }, accept: atMost('pointing differs after taking it off and on', 0.1, 'deg'), cautions: 'blade', trials: 'h0.05 h0.08 h w0.3 h0.1' }),
      fix('foot-printed-0-5-wider', 'Print the foot 0.5 mm wider', 'remake', 'reversible', { why: '32.4 mm leaves 0.2 for the screws.', tools: 'Printer; caliper', materials: 'Glass-filled nylon; inserts', steps: ['Measure shoe and old foot 1 mm above the floor.', 'Print on its side so that the layers run along the flank.', 'Rub the flanks on wet paper until it slides.'], accept: atMost('pointing differs after taking it off and on', 0.1, 'deg'), cautions: 'dust', trials: 'h0.05 w' }),
    ],
    drawings: [drawing(dovetailSection({ title: 'PRINTED FOOT IN SHOE REV B', bar: 'FOOT', shoe: 'SHOE', barWidth: 31.9, barAngle: 60, shoeWidth: 32.6, shoeAngle: 60, shim: 'BRASS 0.5' }), 'End view: foot of 31.9 mm in a shoe of 32.6 mm with brass of 0.5 mm on the screws’ side.', 'Brass on the screws’ side.')],
  }),
  writeUp('finder-shoe-thumb-screws-dent-guide-foot-n2', 'Finder shoe thumb screws dent guide foot N2', {
    by: 'pavo', daysAgo: 190,
    summary: 'Two steel tips leave two dents and the foot falls back into them. Round the tips and put a plate of 0.3 mm under them; more does not go in.',
    joints: [joint(side('oxbow-finder-shoe', 'thumb screw', 'B', 'A'), side('nettlecombe-guide-foot', 'foot', 'C', 'A B'))],
    symptoms: 'lock-screw-dents foot-works-loose', noticed: 'It is tight on the balcony and loose an hour later. Two bright pits in the flank.', cause: 'Turned ends with a sharp rim. The foot of 32.2 in 32.6 leaves 0.4 mm of width, so thick plates do not enter.',
    readings: [read('nettlecombe-guide-foot:C', 'width of the foot', 32.2), read('nettlecombe-guide-foot:C', 'depth of a dent', 0.15, 'mm', 'other', 0.03)],
    fixes: [
      fix('plate-of-0-3-under-the-tips', 'Plate of 0.3 mm under the tips', 'shim', 'reversible', { why: '0.3 mm along the flank takes 0.35 of 0.4 mm and bridges the old dents.', tools: 'Snips; file', materials: 'Spring brass 0.3 × 7 × 40 mm', steps: ['Guide scope off and capped.', 'Cut the plate, break its edges, bend one end over the shoe.', 'Foot in, screws by turns with two fingers.'], accept: atMost('play of the foot', 0.05, 'mm'), cautions: 'blade', trials: 'h0.02 h0.03 h n0.1' }),
      fix('round-the-tips', 'Round the screws’ tips', 'trim', 'permanent', { why: 'A rounded end presses without cutting.', tools: 'Fine file; drill to spin the screw; oil stone', steps: ['Take the screws out of the shoe and away from the telescope.', 'Spin each in the drill against the file until its rim is gone; eye protection on.', 'Polish on the stone, wipe, a spot of grease.'], accept: atMost('play of the foot', 0.05, 'mm'), cautions: 'rotary-tool swarf', trials: 'h0.04 h w' }),
    ],
    drawings: [drawing(dovetailSection({ title: 'FOOT N2 REV C IN SHOE REV B', bar: 'FOOT', shoe: 'SHOE', barWidth: 32.2, barAngle: 60, shoeWidth: 32.6, shoeAngle: 60, shim: 'BRASS 0.3' }), 'End view: foot of 32.2 mm in a shoe of 32.6 mm with a plate of 0.3 mm.', '0.3 and no more.')],
  }),
  writeUp('cork-lined-dew-ring-slides-off-the-shield', 'Cork-lined dew ring slides off the shield', {
    by: 'imke', daysAgo: 160,
    summary: 'Ring Rev C is 82.0 mm with 0.8 mm of cork: 80.4 clear. That suits the shield of Wren 60 Rev C; on 80.0 it slides. Two turns of paper tape under the cork hold it.',
    joints: [joint(side('emberfell-dew-ring', 'bore', 'C', 'A B'), side('larkfield-wren-60', 'dew shield', 'A B D', 'C'))],
    symptoms: 'too-loose-in-bore dew-on-lens', noticed: 'It stands 20 mm forward of where I put it and the lens is wet.', cause: '0.4 mm of room, and cork that has set presses nothing.',
    readings: [read('emberfell-dew-ring:C', 'bore without cork', 82), read('', 'thickness of the cork', 0.8), read('larkfield-wren-60:D', 'diameter of the dew shield', 80)],
    fixes: [
      fix('paper-tape-on-the-shield', 'Paper tape on the shield', 'shim', 'reversible', { why: 'Two turns of 0.13 mm bring the shield to 80.5; cork gives by the last tenth.', tools: 'Caliper; scissors', materials: 'Paper tape 0.13 mm, 16 mm wide', steps: ['Unplug the heater, let it cool, cap the lens.', 'Two turns where the ring stands, ends butted.', 'Push the ring on with a turning motion.', 'Power on indoors for five minutes and feel it: warm, not hot.'], shows: { 1: 0 }, accept: atLeast('pull along the tube that moves it', 3, 'N'), cautions: 'heater-hot', trials: 'h5 h4 h w2 h6' }),
      fix('ring-with-four-screws', 'Dew ring Rev B', 'swap', 'reversible', { why: 'Bore 80.2 with four nylon screws: made for 80.0.', materials: 'Dew ring Rev B', steps: ['Unplug, let cool, swap.', 'Screws by turns until it does not slide.'], accept: atLeast('pull along the tube that moves it', 3, 'N'), cautions: 'heater-hot', trials: 'h8 h7' }),
    ],
    drawings: [drawing(barrelSection({ title: 'SHIELD IN THE LINED RING', outer: 'DEW RING', inner: 'SHIELD', barrel: 80, bore: 80.4, barrelLength: 16, boreDepth: 16, through: true, shim: 'TAPE 2 × 0.13' }), 'Section: shield of 80.0 mm in a lined bore of 80.4 mm with two turns of tape.', 'Tape under the cork.')],
  }),
  writeUp('dew-strip-80-laps-over-itself-on-the-heron-72', 'Dew strip 80 laps over itself on the Heron 72', {
    by: 'lorcan', daysAgo: 235,
    summary: 'Round a shield of 92 mm are 289 mm, the strip is 320. It lies double for 31 mm and gets too hot to touch there. Felt of 5 mm under it makes room.',
    joints: [joint(side('emberfell-strip-80', 'closure', 'A B'), side('greywether-heron-72', 'dew shield', 'A B C'))],
    symptoms: 'heater-cold-spot plume-on-stars', noticed: 'The cover browned where it lies double, and stars boil on that side.', cause: 'Two layers give twice the heat on the same area. 320 mm belong on 102 mm.',
    readings: [read('greywether-heron-72:B', 'diameter of the dew shield', 92, 'mm', 'caliper', 0.1), read('emberfell-strip-80:A', 'length of the strip', 320, 'mm', 'ruler', 0.5)],
    fixes: [
      fix('felt-of-5-mm-under-the-strip', 'Felt of 5 mm under the strip', 'shim', 'reversible', { why: '92 and twice 5 are 102 mm: 320 round, end to end. Felt slows the heat, so allow half an hour.', tools: 'Scissors; ruler', materials: 'Wool felt 5 mm, 35 × 305 mm', steps: ['Unplug the strip and let it cool; cap the lens.', 'Felt round the shield, ends butted, held by thread.', 'Strip over it; its ends meet and do not lap.', 'Power on indoors; feel all round after five minutes.'], shows: { 2: 0 }, accept: atMost('length that lies double', 0, 'mm'), cautions: 'heater-hot', trials: 'h0 h0 h w4' }),
      fix('stand-the-end-off', 'Stand the end off on a cork wedge', 'reposition', 'reversible', { why: 'The last 31 mm leave the shield on a wedge and cool in the air. Some warmth is lost.', materials: 'Cork wedge 31 × 35 mm, 8 mm high', steps: ['Unplug and let cool.', 'Wedge where the lap was, the strip’s end over it, tape outside.', 'Feel after five minutes that no two layers touch.'], accept: atMost('length that lies double', 0, 'mm'), cautions: 'heater-hot', trials: 'h0 w8 n' }),
    ],
    drawings: [drawing(envelopePlan({ title: 'WHERE THE STRIP LIES DOUBLE', hub: 'DEW SHIELD', taken: [{ from: 250, to: 289, name: 'LIES DOUBLE' }], wanted: { from: 250, to: 360, name: 'FIRST THIRD OF THE STRIP' } }), 'End view: the strip lies double over 39 degrees of the shield, from 250 to 289.', '31 mm of two layers.')],
  }),
  writeUp('micro-helical-shifts-the-image-when-focus-reverses', 'Micro helical shifts the image when focus reverses', {
    by: 'nils', daysAgo: 425,
    summary: 'The helicoid of Rev A and B has play and the guide star hops by a dozen pixels when I turn back. Thicker grease takes most of it; a band of thin tape in the thread takes the rest.',
    joints: [joint(side('dunlin-micro-helical', 'helicoid', 'A B', 'C'), side('quillback-g1', 'inch-and-a-quarter barrel', 'A B C'))],
    symptoms: 'image-shifts backlash-large', noticed: 'I can rock the camera by hand with the lock open.', cause: 'Play of 0.09 mm across a thread of 22 mm: 0.23°. Thin grease does not fill it.',
    readings: [read('dunlin-micro-helical:B', 'rock at the rear rim', 0.09, 'mm', 'other', 0.01)],
    fixes: [
      fix('damping-grease', 'Damping grease in the helicoid', 'adjust', 'reversible', { why: 'A thick film centres the thread.', tools: 'Swabs; lint-free cloth', materials: 'Damping grease; isopropyl alcohol', steps: ['Camera out and capped. Mark where the thread enters, then unscrew it.', 'Wipe all old grease off with alcohol, window open; let it dry.', 'A thin film on both threads, start at the mark, run in and out ten times, wipe what comes out.'], accept: atMost('rock at the rear rim', 0.03, 'mm'), cautions: 'solvent', trials: 'h0.02 h0.03 h w0.06 h0.03 n0.08' }),
      fix('tape-in-the-thread', 'Thread tape in the helicoid', 'shim', 'reversible', { why: 'Common practice, no source: one layer of plumber’s thread tape, 0.08 mm, pressed to 0.03 by the thread.', materials: 'Thread tape', steps: ['Camera out and capped, thread dry.', 'One layer with the thread’s direction on the inner half only.', 'Screw in; if it is stiff, half the width.'], accept: atMost('rock at the rear rim', 0.03, 'mm'), trials: 'h0.01 w h0.02' }),
    ],
    drawings: [drawing(plotSheet({ title: 'WHERE THE STAR STANDS', acrossName: 'TURN, DEGREES', upName: 'SHIFT, PIXELS', across: [0, 120], up: [0, 16], series: [{ name: 'THIN GREASE', colour: 'red', points: [[0, 0], [30, 1], [60, 2], [62, 12], [90, 13], [120, 14]] }, { name: 'DAMPING GREASE', colour: 'brass', points: [[0, 0], [30, 1], [60, 1], [62, 3], [90, 4], [120, 4]] }] }), 'Plot: the star hops by ten pixels where focus reverses with thin grease, by two with damping grease.', 'The hop where it reverses.')],
  }),
];
