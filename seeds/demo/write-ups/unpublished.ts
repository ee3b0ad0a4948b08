import { beltPlan } from '../../drawing/drive-plans.js';
import { barrelSection } from '../../drawing/mating-sections.js';
import { seatSection } from '../../drawing/sections.js';
import { atLeast, atMost, drawing, edition, fix, joint, read, side, unpublished, type DemoEdition, type DemoWriteUp } from '../write-up-shape.js';

/**
 * What waits on the desk, what is being written, and what came back. The trim of the micro helical names a rotary tool and
 * has no caution yet: the desk has to place one.
 */
export const unpublishedWriteUps: readonly DemoWriteUp[] = [
  unpublished('submitted', 'Micro helical lock ring does not pass the guide scope 30 bore', {
    by: 'author', daysAgo: 3,
    summary: 'The lock ring of Rev B is 0.6 mm too wide for the guide scope’s rear bore. Trim its rim, or turn it round.',
    joints: [joint(side('dunlin-micro-helical', 'lock ring', 'B', 'A'), side('nettlecombe-guide-scope-30', 'rear bore', 'A B'))],
    symptoms: 'will-not-go-in wont-reach-focus', noticed: 'It stops 4 mm before the shoulder and I cannot reach focus with the G1.', cause: 'The lock ring is Ø 40.6 mm, the rear bore Ø 40.0 mm. On Rev A there was a nylon screw instead of the ring.',
    readings: [read('dunlin-micro-helical:B', 'diameter of the lock ring', 40.6), read('nettlecombe-guide-scope-30:B', 'rear bore', 40.0)],
    fixes: [
      fix('turn-the-lock-ring-round', 'Turn the lock ring round', 'reposition', 'reversible', { why: 'Its other side has a chamfer that enters by 3 mm.', tools: 'Pin spanner', steps: ['Unscrew the ring, turn it round, screw it on.', 'Push home and see whether focus is reached at a far lamp by night.'], accept: atLeast('travel left beyond focus', 1, 'mm') }),
      fix('grind-the-lock-ring-rim', 'Grind the lock ring’s rim', 'trim', 'permanent', { why: 'Half a millimetre off the radius lets it pass.', tools: 'Rotary tool with a sanding drum; caliper', materials: 'Felt pen', steps: ['Take the ring off the focuser.', 'Hold it in a vice between wood and go round with the rotary tool until the pen’s line is gone.', 'Measure at four places: 39.7 mm.', 'Wash and fit.'], accept: atLeast('room on the diameter', 0.2, 'mm') }),
    ],
    drawings: [drawing(barrelSection({ title: 'LOCK RING IN THE GUIDE SCOPE', outer: 'GUIDE SCOPE', inner: 'LOCK RING', barrel: 40.6, bore: 40, barrelLength: 8, boreDepth: 10 }), 'Section: lock ring of 40.60 mm against a bore of 40.00 mm; overlap in red.', 'Too wide by 0.6 mm.')],
  }),
  unpublished('submitted', 'Tension arm spring is too weak for belt kit 80', {
    by: 'stellan', daysAgo: 6,
    summary: 'The leaf spring of Rev B presses with 1.1 N; the wide belt wants about 2. A second leaf does it.',
    joints: [joint(side('thornapple-tension-arm', 'idler', 'B', 'A'), side('thornapple-belt-kit-80', 'belt', 'A B'))],
    symptoms: 'belt-slips belt-squeaks', noticed: 'The arm swings out when the motor reverses.', cause: 'The spring was made for a 6 mm belt; kit 80 has 9 mm.',
    readings: [read('thornapple-tension-arm:B', 'pull at the idler', 1.1, 'N', 'other', 0.1)],
    fixes: [fix('second-leaf-on-the-arm', 'Second leaf on the arm', 'adjust', 'reversible', { why: 'Two leaves of 0.4 mm double the pull.', tools: 'Hex key 2 mm; spring balance', materials: 'Leaf spring 0.4 × 8 × 40 mm', steps: ['Unplug the motor.', 'Lay the second leaf under the first and screw both down.', 'Pull at the idler: 2.0 to 2.4 N where it starts to move.', 'Run a hundred reversals with chalk on two teeth.'], accept: atMost('chalk marks apart', 0.2, 'mm') })],
    drawings: [drawing(beltPlan({ title: 'ARM ON BELT KIT 80', bigTeeth: 147, smallTeeth: 20, pitch: 2, centres: 90, idler: { along: 0.4, press: 3, side: 'slack' } }), 'Plan: belt of kit 80 with the sprung idler on the slack side.', 'Where the arm presses.')],
  }),
  unpublished('draft', 'Hand rotator screws reach the filter drawer', {
    by: 'author', daysAgo: 12, summary: 'Three lock screws of Rev B stand out into the drawer’s path.',
    joints: [joint(side('brackwater-hand-rotator', 'lock screws', 'B'), side('pallister-filter-drawer', 'drawer slide', ''))],
    symptoms: 'fouls-tube', noticed: 'The drawer opens only at three angles.', cause: '', readings: [], fixes: [], drawings: [], sources: '',
  }),
  unpublished('draft', 'Dew strip 60 buckle scratches the shield', {
    by: 'owner', daysAgo: 5, summary: '', joints: [joint(side('emberfell-strip-60', 'buckle', 'C'), side('larkfield-wren-60', 'dew shield', 'C'))],
    symptoms: '', noticed: 'The new buckle has a sharp corner. Felt under it?', cause: '', readings: [], fixes: [], drawings: [], sources: '',
  }),
  unpublished('draft', 'Ring-gear kit 80 bush loosens', {
    by: 'greta', daysAgo: 20, summary: 'The eccentric bush works loose after some weeks.',
    joints: [joint(side('cotterpin-ring-gear-kit-80', 'eccentric bush', 'C', ''), side('tarn-m2', 'face holes', 'B C'))],
    symptoms: 'backlash-changes', noticed: 'Backlash grows from 90 to 200 steps in a month.', cause: 'The bush is held by one screw on a smooth face.', readings: [read('cotterpin-ring-gear-kit-80:C', 'throw of the bush', 1.0)],
    fixes: [fix('wave-washer-under-bush', 'Wave washer under the bush', 'shim', 'reversible', { why: 'Keeps the screw under tension.', materials: 'Wave washer M4', steps: ['', ''] })], drawings: [],
  }),
  unpublished('draft', '', { by: 'imke', daysAgo: 1, summary: '', joints: [], symptoms: '', noticed: '', cause: '', readings: [], fixes: [], drawings: [], sources: '' }),
  unpublished('returned', 'Filing the M2 shaft for the pinion set', {
    by: 'author', daysAgo: 15,
    summary: 'A flat on the M2 shaft keeps the pinion from slipping.',
    joints: [joint(side('cotterpin-pinion-set', 'bore and grub screws', 'A B'), side('tarn-m2', 'output shaft', 'A B C'))],
    symptoms: 'pinion-slips', noticed: 'The pinion turns on the shaft in the cold.', cause: 'One screw on a round hard shaft; the same as on the M1, with more pull behind it.',
    readings: [read('tarn-m2:A', 'diameter of the shaft', 6.0)],
    fixes: [fix('flat-on-the-m2-shaft', 'Flat on the shaft', 'trim', 'permanent', { why: 'A screw on a flat cannot plough.', tools: 'File', steps: ['File a flat on the shaft, 0.5 mm deep, with the motor on the bench.', 'Fit the pinion with a screw on the flat.'], accept: atMost('chalk lines apart after 100 reversals', 0.1, 'mm') })],
    drawings: [drawing(seatSection({ title: 'M2 SHAFT AND PINION', upper: 'PINION', lower: 'MOTOR M2', boss: 18, bossHeight: 1, recess: 20, recessDepth: 2 }), 'Section: pinion above the motor’s face with its recess of 20.0 mm.', 'Where filings would go.')],
  }, 'Please say how the motor is kept clean while you file: filings in the gearbox ruin it, and the electronics should be out of the room first. Add the reading for Rev B and C, whose shafts are 6.35 mm. Then send it again: the remedy is sound.'),
];

/** Later editions of published write-ups that are not published themselves, by the write-up’s slug. */
export const openEditions: Readonly<Record<string, DemoEdition>> = {
  'filters-rattle-in-fw5': edition('imke', 4, 'Play measured on three filters; springs of Rev A told apart; wording of the steps.', (earlier) => ({
    ...earlier,
    summary: 'Filters of 1.85 to 2.0 mm in seats of 2.3 mm lie loose under the washers and tip. Rings of card as thick as the gap hold them flat.',
    cause: `${earlier.cause} On Rev A spring wire pressed the filter down, so it does not rattle there. Measure your own filters: of three I had, one was 2.00 mm and needed a ring of 0.3.`,
    readings: [...earlier.readings, read('', 'thickness of the second filter', 2.0), read('', 'thickness of the third filter', 1.86)],
  }), 'submitted'),
};
