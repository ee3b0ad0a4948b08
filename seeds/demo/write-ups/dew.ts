import { barrelSection } from '../../drawing/mating-sections.js';
import { envelopePlan } from '../../drawing/plans.js';
import { plotSheet } from '../../drawing/plots.js';
import { atLeast, atMost, drawing, edition, fix, joint, read, side, writeUp, type DemoWriteUp } from '../write-up-shape.js';

/** Dew heaters and what they disturb. */
export const dewWriteUps: readonly DemoWriteUp[] = [
  writeUp('dew-ring-does-not-go-over-the-wren-60-dew-shield', 'Dew ring does not go over the Wren 60 dew shield', {
    by: 'wim', daysAgo: 400,
    summary: 'The ring is bored 80.2 mm, the shield of Wren 60 Rev C is 80.4. Do not force it: use the later ring with cork, or open the bore.',
    joints: [joint(side('emberfell-dew-ring', 'bore', 'A B', 'C'), side('larkfield-wren-60', 'dew shield', 'C', 'A B D'))],
    symptoms: 'will-not-go-in dew-on-lens', noticed: 'It starts at a slant and stops after 2 mm, with a scratch.', cause: 'Shields of Rev A, B and D are 80.0 mm; Rev C was 80.4 over the paint. Interference of 0.2 mm on aluminium is a press fit.',
    readings: [read('larkfield-wren-60:C', 'diameter of the dew shield', 80.4), read('emberfell-dew-ring:B', 'bore', 80.2)],
    fixes: [
      fix('ring-rev-c-with-cork', 'Dew ring Rev C', 'swap', 'reversible', { why: 'Bored 82 mm and lined with cork of 0.8 mm.', materials: 'Dew ring Rev C', steps: ['Fit it cold, by hand, with a twist.', 'Run it for ten minutes indoors and feel all round: even and hand-warm.'], accept: atLeast('pull along the shield that it holds', 5, 'N'), trials: 'h8 h6 h', madeRight: 'emberfell-dew-ring:C' }),
      fix('open-the-bore-by-paper', 'Open the bore with wet paper', 'trim', 'permanent', {
        why: '0.3 mm off the bore; the anodising is lost there, which does no harm.', tools: 'Wooden drum of 78 mm; caliper', materials: '180 and 400 grit wet paper; water',
        steps: ['Unplug the ring and take its heater foil and cable out; they must stay dry.', 'Wrap the drum in paper and turn the ring on it, wet, a quarter at a time.', 'Measure at four places until 80.6 mm. Wash, dry, put the foil back.', 'Slip it on: it should slide with a finger’s push.'], accept: atLeast('room on the diameter', 0.15, 'mm'), cautions: 'dust heater-hot', trials: 'h0.2 h0.18 w',
      }),
      fix('strip-instead-of-the-ring', 'A strip in place of the ring', 'swap', 'reversible', { why: 'A strip closes round any diameter.', materials: 'Dew strip 60 Rev B or C', steps: ['Close it just behind the shield’s front edge, ends side by side.', 'Never let the heated length lie double.'], accept: atLeast('lens warmer than the air (°C)', 1.5, 'deg'), cautions: 'heater-hot', trials: 'h h h' }),
    ],
    drawings: [drawing(barrelSection({ title: 'DEW SHIELD IN THE DEW RING', outer: 'DEW RING', inner: 'DEW SHIELD', barrel: 80.4, bore: 80.2, barrelLength: 16, boreDepth: 16, through: true }), 'Section: dew shield of 80.40 mm against a bore of 80.20 mm; overlap in red.', 'A press fit nobody wants.')],
  }),
  writeUp('dew-strip-60-leaves-a-cold-spot-at-its-ends', 'Dew strip 60 leaves a cold spot at its ends', {
    by: 'xenia', daysAgo: 660,
    summary: 'Dew starts at seven o’clock: there the strip’s heated part ends 10 mm short. Turn the gap to the top and put a foil under it.',
    joints: [joint(side('emberfell-strip-60', 'closure', 'B C', 'A'), side('larkfield-wren-60', 'dew shield', 'A B C D'))],
    symptoms: 'heater-cold-spot dew-on-lens heater-does-not-close', noticed: 'A crescent of dew always at the same place while the heater is warm elsewhere.', cause: 'Round 80 mm are 251 mm; the heated length is 245 since Rev B. With the closure 16 mm stay cold. Cold air sinks, so a gap at the bottom dews first.',
    readings: [read('emberfell-strip-60:B', 'heated length', 245, 'mm', 'ruler', 0.5), read('', 'length round the shield', 251.5, 'mm', 'ruler', 0.5)],
    fixes: [
      fix('gap-to-the-top', 'Turn the gap to the top', 'reposition', 'reversible', { why: 'Warm air rises past the gap.', steps: ['Turn the strip so that its ends meet at twelve o’clock with the telescope level.', 'Lead the cable down the side and tie it.'], accept: atLeast('lens at the gap warmer than the air (°C)', 1.5, 'deg'), cautions: 'heater-hot', trials: 'h h w h n' }),
      fix('foil-under-the-gap', 'Aluminium foil under the gap', 'shim', 'reversible', { why: 'Foil carries heat over 20 mm.', tools: 'Scissors', materials: 'Household foil, six layers; tape that stands 80 °C', steps: ['Fold foil to 60 × 30 mm in six layers.', 'Lay it over the shield where the ends meet, strip over it.', 'After ten minutes at full power feel: warm all round.'], accept: atLeast('lens at the gap warmer than the air (°C)', 1.5, 'deg'), cautions: 'heater-hot' }),
    ],
    drawings: [drawing(envelopePlan({ title: 'WHERE THE STRIP IS WARM', hub: 'DEW SHIELD', taken: [{ from: 285, to: 338, name: 'COLD GAP' }], wanted: { from: 60, to: 280, name: 'HEATED' } }), 'End view: heated from 60 to 280 degrees, cold gap at 285 to 338 degrees.', 'Seven o’clock stays cold.')],
  }),
  writeUp('supply-cuts-out-with-dew-strip-80-and-motor', 'Supply cuts out with dew strip 80 and motor', {
    by: 'yorick', daysAgo: 520,
    summary: 'Strip, motor and camera start together and the battery’s protection trips. Stagger them, control the strip by pulses, and fuse each lead.',
    joints: [joint(side('emberfell-strip-80', 'cable', 'A B'), side('tarn-m2', 'supply', 'A B C'))],
    symptoms: 'supply-cuts-out motor-stalls', noticed: 'Everything goes dark as the motor starts; after unplugging the strip it runs.', cause: 'The strip takes 1.2 A, the cooled camera 3 A at the start, the motor 1.5 A. The protection of a 7 Ah lithium pack trips at 5 A. A long thin lead loses another volt.',
    readings: [read('', 'length of the lead', 4000, 'mm', 'ruler', 50)],
    fixes: [
      fix('stagger-and-regulate', 'Stagger the start and regulate the strip', 'adjust', 'reversible', {
        why: 'Together they never need their peaks if they do not start together.', tools: 'Multimeter', materials: 'Pulse regulator for the strip; fuses 2 A; short thick leads',
        steps: ['Start the camera, wait five minutes for its cooler, then the motor, then the strip at half.', 'Put a fuse of 2 A into the strip’s lead, at the pack. Do not open the lithium pack and never bridge its protection.', 'Use a lead no longer than 2 m and no thinner than 0.75 mm².', 'Measure at the motor’s plug with all on: not below 11.5 V.'], cautions: 'lithium heater-hot', trials: 'h h h n h',
      }),
      fix('supply-of-its-own', 'A supply of its own for the heater', 'swap', 'reversible', { why: 'A sealed 12 V supply keeps the heater off the pack.', materials: 'Sealed supply for outdoors; residual-current device', steps: ['Use a supply made for damp places on a mains socket with a residual-current device; do not open it.', 'Anything fixed to the house wiring is work for a licensed electrician, by local code.', 'Keep plugs off the grass.'], cautions: 'mains' }),
    ],
    drawings: [drawing(plotSheet({ title: 'CURRENT AT THE PACK', acrossName: 'SECONDS', upName: 'AMPERE', across: [0, 60], up: [0, 8], series: [{ name: 'ALL AT ONCE', colour: 'red', points: [[0, 0], [2, 6.1], [6, 5.8], [15, 5.4], [30, 5.2], [60, 4.9]] }, { name: 'STAGGERED', colour: 'brass', points: [[0, 0], [2, 3.2], [15, 3], [30, 3.8], [45, 4.1], [60, 4]] }], limit: { value: 5, name: 'TRIPS AT 5' } }), 'Plot: current at the pack rises to 6.1 A when all start at once and stays at 4.1 A when staggered.', 'The first minute.')],
  }),
  writeUp('focus-drifts-when-the-dew-strip-warms-the-focus-ring', 'Focus drifts when the dew strip warms the focus ring', {
    by: 'zara', daysAgo: 145,
    summary: 'A strip near the helical focuser warms it by 4 °C and focus walks by 60 µm. Move the strip to the shield and run it at a third.',
    joints: [joint(side('emberfell-strip-60', 'strip', 'A B C'), side('larkfield-wren-60-helical', 'helicoid', 'A B C'))],
    symptoms: 'focus-drifts plume-on-stars', noticed: 'Focus moves for the first hour, then it is steady until the regulator clicks.', cause: 'Aluminium grows by 0.023 mm a metre and degree; the tube’s rear warms and the helicoid’s grease thins so that the camera’s weight settles it.',
    readings: [read('', 'shift of the best position', 60, 'um', 'other', 8)],
    fixes: [fix('strip-to-the-shield', 'Strip to the shield, a third of the power', 'reposition', 'reversible', { why: 'Dew forms on the lens; warmth belongs there and nowhere else.', steps: ['Move the strip to just behind the shield’s front edge.', 'Start at a third of the power, more only if dew forms.', 'Wait an hour, then take two focus runs half an hour apart.'], after: ['focus-offsets'], accept: atMost('best positions of two runs apart', 12, 'um'), cautions: 'heater-hot', trials: 'h8 h10 h6 w20' })],
    drawings: [drawing(plotSheet({ title: 'BEST POSITION THROUGH THE NIGHT', acrossName: 'MINUTES', upName: 'SHIFT, µm', across: [0, 160], up: [0, 80], series: [{ name: 'STRIP AT THE RING', colour: 'red', points: [[0, 0], [20, 24], [40, 42], [60, 55], [90, 60], [150, 62]] }, { name: 'AT THE SHIELD', colour: 'brass', points: [[0, 0], [20, 3], [40, 5], [60, 7], [90, 8], [150, 8]] }] }), 'Plot: best focus shifts by 62 µm with the strip at the focus ring, by 8 µm with it at the shield.', 'An evening each.')],
    later: [edition('zara', 50, 'Second night with another strip; shift per degree added.', (earlier) => ({ ...earlier, readings: [...earlier.readings, read('', 'shift for one degree at the focuser', 14, 'um', 'other', 3)], cause: `${earlier.cause} With Rev C of the strip I read the same within 5 µm.` }))],
  }),
];
