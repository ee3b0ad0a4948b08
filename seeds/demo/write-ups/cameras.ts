import { arrow } from '../callouts.js';
import { meshPlan } from '../../drawing/drive-plans.js';
import { barrelSection, dovetailSection } from '../../drawing/mating-sections.js';
import { envelopePlan, ringClampSection } from '../../drawing/plans.js';
import { plotSheet } from '../../drawing/plots.js';
import { seatSection, tiltSection } from '../../drawing/sections.js';
import { atLeast, atMost, drawing, edition, fix, joint, read, side, withFix, writeUp, type DemoWriteUp } from '../write-up-shape.js';

/** Cameras, wheels, rotators. */
export const cameraWriteUps: readonly DemoWriteUp[] = [
  writeUp('filters-rattle-in-fw5', 'Filters rattle in FW5', {
    by: 'imke', daysAgo: 650,
    summary: 'Filters of 1.85 mm in seats of 2.3 mm lie loose under the washers and tip. Rings of card or a thinner washer hold them flat.',
    joints: [joint(side('pallister-fw5', 'filter seats', 'B', 'A C'), side('quillback-q16', 'sensor', 'A B C'))],
    symptoms: 'rattles flats-do-not-match reflection-halo', noticed: 'A click when I turn the wheel by hand; dust shadows move between light and flat.', cause: 'Seat 2.3 mm, filter 1.85 mm: 0.45 mm of room. As the telescope turns the filter tips by half a degree.',
    readings: [read('pallister-fw5:B', 'depth of the seat', 2.3), read('', 'thickness of the filter', 1.85)],
    fixes: [
      fix('card-rings-under-the-filters', 'Card rings under the filters', 'shim', 'reversible', { why: 'A soft ring of 0.4 mm takes up the room and does not chip glass.', tools: 'Circle cutter; tweezers; clean gloves', materials: 'Black card 0.4 mm', steps: ['Lid off over a folded towel; filters out by the rim, in gloves.', 'Cut rings 36 × 32 mm, brush off every fibre.', 'Ring, filter, washers, screws: finger-tight and an eighth.', 'Turn the wheel by hand beside your ear: silence.'], shows: { 2: 0 }, after: ['flats', 'focus-offsets'], accept: atMost('play of the filter', 0.05, 'mm'), cautions: 'blade glass-edge', trials: 'h0.02 h0.03 h w h0.05' }),
      fix('threaded-rings-rev-c', 'Carousel of Rev C', 'swap', 'reversible', { why: 'Threaded rings clamp each filter.', tools: 'Spanner for the rings', materials: 'Carousel of FW5 Rev C', steps: ['Swap the carousel, watch the spring at its hub.', 'Rings hand-tight and no more.', 'Home the wheel and check that all five are found.'], after: ['flats', 'focus-offsets'], accept: atMost('play of the filter', 0.05, 'mm'), cautions: 'glass-edge', trials: 'h0 h0.01', madeRight: 'pallister-fw5:C' }),
    ],
    drawings: [drawing(seatSection({ title: 'FILTER IN ITS SEAT', upper: 'FILTER AND WASHERS', lower: 'CAROUSEL', boss: 35.8, bossHeight: 1.85, recess: 36.2, recessDepth: 2.3, bossName: 'FILTER', recessName: 'SEAT', open: true }), 'Section: filter of 1.85 mm in a seat 2.3 mm deep leaves 0.45 mm of room.', 'Room to tip.')],
    later: [edition('imke', 310, 'Card in place of rubber: rubber outgassed.', (earlier) => withFix(earlier, 'card-rings-under-the-filters', { materials: ['Black card 0.4 mm, no foam and no rubber: they leave a haze on glass'] }))],
  }),
  writeUp('fw7-case-meets-the-focus-motor', 'FW7 case meets the focus motor', {
    by: 'kaja', daysAgo: 440,
    summary: 'The FW7 reaches 82 mm to one side and strikes an M2 when focused in. Turn the wheel by 60°, or put 10 mm of spacer in front of it where the stack allows.',
    joints: [joint(side('pallister-fw7', 'case', 'A', 'B'), side('tarn-m2', 'body', 'A B C'))],
    symptoms: 'fouls-tube wont-reach-focus motor-stalls', noticed: 'A scratch on the wheel’s lid and a stall 5 mm before focus.', cause: 'Case and motor want the same angle; Rev B’s case has that corner cut.',
    readings: [read('pallister-fw7:A', 'reach of the case from the axis', 82, 'mm', 'ruler', 0.5), read('', 'motor’s outer edge from the axis', 76, 'mm', 'ruler', 0.5)],
    fixes: [
      fix('turn-the-wheel-60', 'Turn the wheel by 60°', 'reposition', 'reversible', { why: 'The case is narrow on two sides.', tools: 'Strap spanner', steps: ['Unplug motor and wheel, camera held.', 'Loosen the wheel’s front ring and turn it until the narrow side faces the motor.', 'Use a thin shim ring so that it is tight at this angle.', 'Run focus end to end with a finger at the plug.'], shows: { 1: 0 }, after: ['camera-angle', 'flats', 'balance'], accept: atLeast('room between case and motor', 4, 'mm'), cautions: 'pinch balance-shift', trials: 'h h h n' }),
      fix('case-rev-b', 'FW7 Rev B', 'swap', 'reversible', { why: 'One corner is cut for this.', materials: 'FW7 Rev B', steps: ['Swap; move the filters in gloves, over a towel.', 'New flats.'], after: ['flats', 'focus-offsets'], accept: atLeast('room between case and motor', 4, 'mm'), cautions: 'glass-edge', trials: 'h9', madeRight: 'pallister-fw7:B' }),
    ],
    drawings: [drawing(envelopePlan({ title: 'WHEEL AND MOTOR', hub: 'FOCUSER', taken: [{ from: 150, to: 215, name: 'MOTOR M2' }], wanted: { from: 130, to: 260, name: 'WIDE SIDE OF FW7' } }), 'End view: the wheel’s wide side from 130 to 260 degrees meets the motor at 150 to 215.', 'Turned by 60 it clears.')],
  }),
  writeUp('filter-drawer-lifts-off-its-magnets', 'Filter drawer lifts off its magnets', {
    by: 'lorcan', daysAgo: 530,
    summary: 'Glued magnets of Rev A come out with the drawer. Set them back with epoxy, the right way round, or go to Rev B.',
    joints: [joint(side('pallister-filter-drawer', 'magnet pockets', 'A', 'B'), side('hollin-m48-spacer', 'shoulder', 'A B C'))],
    symptoms: 'rattles flats-do-not-match', noticed: 'The drawer stands out by a millimetre pointing down; a magnet sits on the drawer instead of in the body.', cause: 'A thin layer of instant glue on a plated magnet lets go after frost.',
    readings: [read('pallister-filter-drawer:A', 'depth of the magnet pocket', 3.1), read('', 'height of the magnet', 3.0)],
    fixes: [
      fix('set-magnets-in-epoxy', 'Set the magnets in epoxy', 'adjust', 'permanent', { why: 'Epoxy fills the pocket and takes frost.', tools: 'Needle; felt pen; fine paper', materials: 'Slow epoxy; the magnets', steps: ['Take the filter out, put it away and close the box.', 'Mark the outward face of each magnet with a pen **before** it leaves its place; wrong way round it pushes the drawer out.', 'Roughen magnet and pocket, wipe with alcohol, let dry.', 'A drop of epoxy in the pocket, magnet in, a strip of baking paper and the drawer over it overnight.', 'Turn it upside down and shake: shut.'], accept: atLeast('pull that opens the drawer', 6, 'N'), cautions: 'magnet epoxy solvent', trials: 'h8 h7 h w4' }),
      fix('drawer-rev-b', 'Drawer body Rev B', 'swap', 'reversible', { why: 'Magnets are pressed in.', materials: 'Filter drawer Rev B', steps: ['Swap; 16 mm as before.'], after: ['flats'], accept: atLeast('pull that opens the drawer', 6, 'N'), cautions: 'magnet', trials: 'h9', madeRight: 'pallister-filter-drawer:B' }),
    ],
    drawings: [drawing(barrelSection({ title: 'MAGNET IN ITS POCKET', outer: 'BODY', inner: 'MAGNET', barrel: 5.0, bore: 5.1, barrelLength: 3, boreDepth: 3.1, shim: 'EPOXY', solid: true }), 'Section: magnet of 5.00 mm in a pocket of 5.10 mm with epoxy in the gap.', 'Fill the pocket, do not smear the rim.')],
  }),
  writeUp('r54-rotator-slips-under-a-heavy-camera', 'R54 rotator slips under a heavy camera', {
    by: 'mirela', daysAgo: 480,
    summary: 'With the 720 g Q26 the friction wheel of Rev A and B slips and angles are off by degrees. Spring screw in by half a turn, clean the track, balance the cable.',
    joints: [joint(side('brackwater-r54', 'friction wheel and inner ring', 'A B', 'C'), side('quillback-q26', 'flange', 'A B'))],
    symptoms: 'rotates-by-itself flats-do-not-match', noticed: 'After a flip the frame is turned by 3 to 5 degrees although the software says it is not.', cause: 'The camera’s cooler is off the axis: 0.12 N m. The wheel holds 0.10 dry and less on an oily track.',
    readings: [read('', 'pull at the rim that makes it slip', 2.2, 'N', 'other', 0.3)],
    fixes: [
      fix('spring-screw-and-clean-track', 'Spring screw in, track clean', 'adjust', 'reversible', { why: 'More pressure and a dry track double what it holds.', tools: 'Hex key 1.5 mm; swabs', materials: 'Isopropyl alcohol', steps: ['Camera off and capped, rotator unplugged.', 'Wipe the track through the slot with a swab of alcohol, turning by hand; let it dry.', 'Turn the spring screw in by half a turn; more wears the wheel.', 'With the camera on, drive a whole turn and back: the mark must meet itself.'], after: ['flats', 'camera-angle'], accept: atMost('mark off after a turn and back', 0.3, 'deg'), cautions: 'solvent pinch', trials: 'h0.2 h0.1 w0.5 h0.3 n2 w' }),
      fix('tie-the-cables-on-axis', 'Lead the cables along the axis', 'reposition', 'reversible', { why: 'A stiff cable pulls with 1 N at 80 mm: as much as the cooler.', materials: 'Cable clips', steps: ['Bring all cables to one place near the axis and leave a loop for one turn.', 'Turn by hand: nothing may pull.'], accept: atMost('mark off after a turn and back', 0.3, 'deg') }),
    ],
    drawings: [drawing(meshPlan({ title: 'FRICTION WHEEL ON THE INNER RING', ring: 'INNER RING (REV C)', pinion: 'DRIVE', ringTeeth: 96, pinionTeeth: 14, module: 0.6, centres: 33 }), 'Plan: inner ring and drive wheel of the rotator, drawn with the teeth of Rev C.', 'Rev C has teeth where A and B rely on friction.')],
  }),
  writeUp('hand-rotator-lock-screw-dents-the-dovetail', 'Hand rotator lock screw dents the dovetail', {
    by: 'nils', daysAgo: 820,
    summary: 'The steel tip of Rev A leaves a dent that pulls the camera back to the same angle. A disc of brass under the screw, and a turn of the ring to a fresh place.',
    joints: [joint(side('brackwater-hand-rotator', 'lock screw', 'A', 'B'), side('quillback-q16', 'flange', 'A B C'))],
    symptoms: 'lock-screw-dents rotates-by-itself stars-long-in-corner', noticed: 'The camera creeps by a degree into a dent as I tighten.', cause: 'A steel point on aluminium. The dent’s rim also lifts the ring by some hundredths on one side.',
    readings: [read('brackwater-hand-rotator:A', 'depth of the dent', 0.12, 'mm', 'other', 0.02)],
    fixes: [
      fix('brass-disc-under-the-screw', 'Brass disc under the screw', 'shim', 'reversible', { why: 'Brass gives before aluminium does.', tools: 'Punch 3 mm or snips; tweezers', materials: 'Brass sheet 0.5 mm', steps: ['Camera off and capped.', 'Take the screw out, push the disc in with tweezers and a spot of grease.', 'Turn the ring so that the screw meets a fresh place.', 'Tighten with two fingers.'], after: ['camera-angle', 'flats'], accept: atMost('creep while tightening', 0.1, 'deg'), cautions: 'blade', trials: 'h0.05 h0.1 h h0.08 n0.5' }),
      fix('stone-the-dent-rim', 'Stone the dent’s rim flat', 'trim', 'leaves-a-mark', { why: 'The raised rim is what lifts the ring.', tools: 'Fine slip stone', materials: 'Drop of oil; cloth', steps: ['Take the ring out; glass and camera away.', 'Stone the rim with light strokes along the ring until a finger nail does not catch.', 'Wipe oil and swarf off, then alcohol on a cloth.'], after: ['flats'], accept: atMost('lift of the ring', 0.01, 'mm'), cautions: 'swarf solvent' }),
      fix('rotator-rev-b', 'Brass-tipped screws of Rev B', 'swap', 'reversible', { why: 'Three brass tips share it.', materials: 'Screw set of Rev B', steps: ['They fit the thread of Rev A.', 'Tighten by turns.'], accept: atMost('creep while tightening', 0.1, 'deg'), trials: 'h0.02 h0.05', madeRight: 'brackwater-hand-rotator:B' }),
    ],
    drawings: [drawing(dovetailSection({ title: 'LOCK SCREW ON THE INNER RING', bar: 'INNER RING', shoe: 'BODY', barWidth: 30, barAngle: 60, shoeWidth: 30.6, shoeAngle: 60, shim: 'BRASS 0.5' }), 'End view: inner ring in its dovetail with a brass disc of 0.5 mm on the screw’s side.', 'The disc takes the dent.')],
  }),
  writeUp('q16-flange-tilts-on-its-adjusting-screws', 'Q16 flange tilts on its adjusting screws', {
    by: 'oona', daysAgo: 360,
    summary: 'The flange of Rev B comes from the maker unlocked. Set it square with feeler leaves before you chase tilt under the sky.',
    joints: [joint(side('quillback-q16', 'flange with adjusting screws', 'B', 'A C'), side('hollin-m42-adapter', 'male thread M42', 'A B'))],
    symptoms: 'stars-long-in-corner plate-tilts', noticed: 'One corner is bad, and a different one after I took the camera to bits.', cause: 'Three screws push against springs; lacquer that should lock them is missing on many.',
    readings: [read('quillback-q16:B', 'gap at screw 1', 0.52, 'mm', 'feeler-leaf', 0.01), read('quillback-q16:B', 'gap at screw 3', 0.31, 'mm', 'feeler-leaf', 0.01)],
    fixes: [
      fix('square-it-with-leaves', 'Square it with feeler leaves', 'adjust', 'reversible', { why: 'Equal gaps are square within what the screws can do; the rest shows on stars.', tools: 'Feeler leaves; hex key 1.5 mm', materials: 'Nail lacquer', steps: ['Camera off, cap on, cooler off and warm.', 'Bring all three gaps to 0.40 mm.', 'Check against a flat plate of glass: light even all round.', 'Lacquer on the screws, wait an hour.', 'Frame at night, corners within reach; turn one screw a sixteenth at a time.'], after: ['flats', 'back-focus'], accept: atMost('spread of the three gaps', 0.02, 'mm'), cautions: 'solvent', trials: 'h0.01 h0.02 h w0.05 h0.02 n0.1' }),
      fix('foil-under-one-side', 'Foil under one side', 'shim', 'reversible', { why: 'For Rev A, which has no screws, and as a stop-gap.', tools: 'Scissors; micrometer', materials: 'Household foil, 0.015 mm a layer', steps: ['Find the corner that focuses short: move focus in steps and note each corner’s best.', 'Lay layers under the opposite side of the flange.', 'Frame again; halve the number until it is even.'], after: ['flats', 'back-focus'], accept: atMost('corners’ best positions apart', 30, 'um'), trials: 'h h w' }),
    ],
    drawings: [drawing(tiltSection({ title: 'FLANGE OF Q16 REV B', gap: 0.21, span: 62, upper: 'FLANGE', lower: 'BODY' }), 'Side view: gaps that differ by 0.21 mm over 62 mm tilt the flange by 0.19 degrees.', 'Unequal gaps.', [arrow('shim-goes-here', 'shim goes here', [520, 210], [664, 342])])],
  }),
  writeUp('g1-guide-camera-sticks-in-the-micro-helical', 'G1 guide camera sticks in the micro helical', {
    by: 'pavo', daysAgo: 290,
    summary: 'Barrels of Rev B are 31.70 mm, the bore is 31.72: it goes in warm and stays in cold. Take the anodising down, do not force it.',
    joints: [joint(side('quillback-g1', 'inch-and-a-quarter barrel', 'B', 'A C'), side('dunlin-micro-helical', 'inch-and-a-quarter bore', 'A B C'))],
    symptoms: 'will-not-go-in thread-stuck bottoms-early', noticed: 'It squeaks going in and will not come out at the end of a cold night.', cause: 'Two hundredths of room; a speck of dust takes that, and aluminium on aluminium galls.',
    readings: [read('quillback-g1:B', 'diameter of the barrel', 31.7, 'mm', 'micrometer', 0.005), read('dunlin-micro-helical:B', 'bore', 31.72, 'mm', 'caliper', 0.02)],
    fixes: [
      fix('rub-the-barrel-down', 'Rub the barrel down by 0.08 mm', 'trim', 'permanent', { why: 'Rev C is that size.', tools: 'Micrometer; drum of cardboard', materials: '600 grit wet paper; water; tape', steps: ['Seal the camera’s window and plug with tape; work wet but keep it dry inside: barrel down.', 'Wrap the paper round and turn by hand, half a turn on, half back.', 'Measure every minute until 31.62 mm.', 'Wipe, dry, take the tape off last.'], accept: atMost('pull that takes it out at 0 °C', 5, 'N'), cautions: 'dust swarf', trials: 'h3 h4 h2', madeRight: 'quillback-g1:C' }),
      fix('wax-and-a-stop-ring', 'Wax and a stop ring', 'adjust', 'reversible', { why: 'A film of wax stops galling; the ring keeps it from going in to the end.', materials: 'Hard wax; parfocal ring', steps: ['Clean both with a dry cloth.', 'Rub wax on the barrel, polish it off.', 'Set the ring 12 mm from the end.'], accept: atMost('pull that takes it out at 0 °C', 5, 'N'), trials: 'h w n' }),
    ],
    drawings: [drawing(barrelSection({ title: 'BARREL IN THE BORE', outer: 'MICRO HELICAL', inner: 'G1', barrel: 31.7, bore: 31.72, barrelLength: 24, boreDepth: 22 }), 'Section: barrel of 31.70 mm in a bore of 31.72 mm, and 2 mm longer than the bore is deep.', 'No room, and too long.')],
  }),
  writeUp('indoor-focus-test-without-a-star-for-a-wren-60-with-m1', 'Indoor focus test without a star for a Wren 60 with M1', {
    by: 'quill', daysAgo: 195,
    summary: 'Before the first night: does the drive move what it says? A far lamp or mast through the window of an evening tells backlash, slip and travel in twenty minutes.',
    joints: [joint(side('tarn-m1', 'output shaft', 'A B C D'), side('larkfield-wren-60', 'grip ring of the focuser', 'A B C D'))],
    symptoms: 'focus-run-fails backlash-large motor-turns-focus-does-not', noticed: 'Everything is new and I want to know which part is to blame before it gets dark.', cause: 'Most failed runs are mechanical: play, slip or a stall. All of them show on a lamp.',
    readings: [read('larkfield-wren-60:C', 'travel for one turn of the ring', 1.5, 'mm', 'makers-drawing', null), read('', 'travel for one step', 1.14, 'um', 'print-model', null)],
    fixes: [
      fix('reversal-test-on-a-lamp', 'Reversal test on a far lamp', 'adjust', 'reversible', {
        why: 'A point of light grows and shrinks with focus; what does not move it did not move focus.', tools: 'Ruler; felt pen', materials: 'Paper scale for the ring',
        steps: ['At dusk or by night point at a lamp at least 200 m away. By day only at a mast well away from the Sun, never towards it.', 'Tape a paper scale to the grip ring.', 'Command 1,000 steps out, then reversals of 20, 40, 60 …; note the first that moves the scale.', 'Drive 3,000 in and out five times; the scale must come back to its mark.', 'Write down: smallest reversal that moves, largest that does not, marks apart.'],
        shows: { 4: 0 }, accept: atMost('smallest reversal that moves', 80, 'steps'), cautions: 'sun pinch', trials: 'h60 h75 h40 h80 n160 h70',
      }),
    ],
    drawings: [drawing(plotSheet({ title: 'SIZE OF THE LAMP AGAINST POSITION', acrossName: 'POSITION, STEPS', upName: 'WIDTH, PIXELS', across: [4000, 6000], up: [0, 24], series: [{ name: 'INWARDS', colour: 'blue', points: [[4200, 19], [4500, 13.6], [4800, 8.4], [5000, 5], [5150, 3.6], [5300, 4.8], [5500, 8], [5800, 13.4]] }, { name: 'OUTWARDS', colour: 'brass', points: [[4200, 20.4], [4500, 15], [4800, 9.8], [5000, 6.3], [5150, 4.2], [5250, 3.5], [5500, 6.9], [5800, 12.2]] }] }), 'Plot: width of the lamp against position, inwards and outwards; the two curves lie 75 steps apart.', 'The two curves’ distance is the backlash.')],
  }),
  writeUp('wren-60-field-shifts-with-the-ring-clamp-at-the-focuser', 'Wren 60 field shifts with the ring clamp at the focuser', {
    by: 'ubo', daysAgo: 110,
    summary: 'A clamp on the rear of the tube squeezes the helical focuser’s seat and the field shifts with each tightening. Clamp forward of the joint.',
    joints: [joint(side('oxbow-ring-clamp', 'split bore', 'A B C'), side('larkfield-wren-60-helical', 'seat in the tube', 'A B C'))],
    symptoms: 'image-shifts thread-binds stars-long-in-corner', noticed: 'The focus ring gets stiff when I tighten the clamp.', cause: 'The tube is thinned to 1.2 mm over its last 30 mm, where the focuser is screwed in.',
    readings: [read('larkfield-wren-60:C', 'wall over the focuser’s seat', 1.2)],
    fixes: [fix('clamp-forward-of-the-joint', 'Clamp forward of the joint', 'reposition', 'reversible', { why: 'Further forward the wall is 2 mm and nothing moves inside it.', tools: 'Hex key', steps: ['Telescope off the mount, on a towel.', 'Slide the clamp at least 45 mm forward of the focuser.', 'Balance again.'], after: ['balance'], accept: atMost('shift of the field on tightening', 3, 'arcmin'), cautions: 'balance-shift' })],
    drawings: [drawing(ringClampSection({ title: 'CLAMP OVER THE THIN WALL', tube: 66, ring: 68, lining: 0.8, clamp: 'RING CLAMP', tubeName: 'THIN WALL 1.2', carries: [90, 210, 330] }), 'Section across the tube: the clamp’s three pads press on the thinned wall.', 'Not here.')],
  }),
];
