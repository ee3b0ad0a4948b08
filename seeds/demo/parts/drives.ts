import { type Outline, partOutline } from '../../drawing/part-outline.js';
import { type DemoPart, features, revision } from '../catalogue-shape.js';

type Parts = Omit<DemoPart, 'drawing'> & { outline: Outline };
const drawn = ({ outline, ...part }: Parts): DemoPart => ({ ...part, drawing: partOutline(part.name, outline) });

/** Focus motors, their brackets, gears and belts. */
export const driveParts: readonly DemoPart[] = [
  drawn({
    slug: 'tarn-m1', maker: 'tarn-motion', kind: 'focus-motor', name: 'M1',
    about: 'Stepper focus motor with a planetary gear, 5 mm shaft and a recess round it that centres brackets.',
    outline: { shape: 'motor', body: 42, length: 52, shaft: 5 },
    features: features({ recess: 'recess round the shaft', shaft: 'output shaft', 'hole-pattern': 'face holes', envelope: ['cable outlet', 'body'] }),
    revisions: [
      revision('A', '2021-02-01..2022-05-01', 'Label with a blue stripe; recess Ø 23.0.', 'First batch.'),
      revision('B', '2022-05-01..2023-07-01', 'Blue stripe, letter B; recess Ø 23.0, plug at the side.', 'Plug moved from the rear to the side.'),
      revision('C', '2023-07-01..2024-10-01', 'Letter C; recess Ø 19.5.', 'Another gearbox: recess Ø 19.5 instead of 23.0, 2.0 mm deep.'),
      revision('D', '2024-10-01..', 'Letter D and a square dot; recess Ø 19.5, shaft with a flat.', 'Flat on the shaft, 0.5 mm deep.'),
    ],
  }),
  drawn({
    slug: 'tarn-m2', maker: 'tarn-motion', kind: 'focus-motor', name: 'M2',
    about: 'Stronger focus motor for rack focusers and 80 mm helicals.',
    outline: { shape: 'motor', body: 47, length: 61, shaft: 6 },
    features: features({ recess: 'recess round the shaft', shaft: 'output shaft', 'hole-pattern': 'face holes', envelope: ['cable outlet', 'body'] }),
    revisions: [
      revision('A', '2022-02-01..2023-03-01', 'No letter.', 'First batch; face holes on Ø 31.0.'),
      revision('B', '2023-03-01..2024-09-01', 'Letter B.', 'Face holes on Ø 33.0; shaft Ø 6.35.'),
      revision('C', '2024-09-01..', 'Letter C, cable with an angled plug.', 'Angled plug.'),
    ],
  }),
  drawn({
    slug: 'tarn-m1-rigid-bracket', maker: 'tarn-motion', kind: 'motor-bracket', name: 'M1 rigid bracket',
    about: 'Milled bracket that clamps the M1 to a 66 mm tube.',
    outline: { shape: 'plate', width: 54, height: 82, bore: 24, thickness: 6 },
    features: features({ boss: 'centring lip', 'hole-pattern': 'motor holes', envelope: 'saddle for the tube' }),
    revisions: [
      revision('A', '2021-06-01..2023-01-01', 'Saddle without lining.', 'First batch; saddle radius 35 mm.'),
      revision('B', '2023-01-01..', 'Cork lining in the saddle.', 'Saddle radius 33.2 mm, lined with cork.'),
    ],
  }),
  drawn({
    slug: 'stonebridge-belt-bracket', maker: 'stonebridge-prints', kind: 'motor-bracket', name: 'Belt bracket',
    about: 'Printed bracket that carries an M1 beside the Wren 60’s focus ring for a belt; a raised lip centres the motor.',
    outline: { shape: 'plate', width: 58, height: 76, bore: 14, thickness: 5 },
    features: features({ boss: 'raised lip round the shaft hole', slot: 'motor slots', 'hole-pattern': 'foot holes', envelope: 'arm beside the tube' }),
    revisions: [
      revision('A', '2021-09-01..2022-08-01', 'One dot underneath; lip Ø 22.5, 1.2 mm high.', 'First batch.'),
      revision('B', '2022-08-01..2023-10-01', 'Two dots; lip Ø 22.5, 1.7 mm high.', 'Lip raised to 1.7 mm; tensioner slot 2 mm longer.'),
      revision('C', '2023-10-01..2025-03-01', 'Three dots; ribs along the arm.', 'Stiffer arm; tensioner on the other side. Lip as before.'),
      revision('D', '2025-03-01..', 'Four dots; lip Ø 19.2.', 'Lip Ø 19.2 so that it enters the recess of M1 Rev C and D.'),
    ],
  }),
  drawn({
    slug: 'stonebridge-belt-bracket-80', maker: 'stonebridge-prints', kind: 'motor-bracket', name: 'Belt bracket 80',
    about: 'Belt bracket for the Wren 80 and the M2.',
    outline: { shape: 'plate', width: 66, height: 88, bore: 16, thickness: 6 },
    features: features({ slot: 'motor slots', boss: 'raised lip', 'hole-pattern': 'foot holes' }),
    revisions: [
      revision('A', '2022-06-01..2024-01-01', 'One dot.', 'First batch; slots 8 mm long.'),
      revision('B', '2024-01-01..', 'Two dots.', 'Slots 12 mm long.'),
    ],
  }),
  drawn({
    slug: 'cotterpin-ring-gear-kit', maker: 'cotterpin-works', kind: 'gear-kit', name: 'Ring-gear kit',
    about: 'Acetal ring gear of 110 teeth, module 0.8, that clamps round the Wren 60’s grip ring, with a 16-tooth brass pinion.',
    outline: { shape: 'gear', teeth: 110, module: 0.8, width: 8 },
    features: features({ gear: ['ring gear', 'pinion'], bore: ['bore of the ring', 'bore of the pinion'], envelope: 'clamp screw of the ring' }),
    revisions: [
      revision('A', '2021-11-01..2022-07-01', 'White ring.', 'First batch; bore Ø 75.6.'),
      revision('B', '2022-07-01..2023-08-01', 'Black ring, screw head proud.', 'Bore Ø 75.6; clamp split added.'),
      revision('C', '2023-08-01..2025-01-15', 'Black ring, letter C.', 'Bore Ø 76.9 for the wider grip ring.'),
      revision('D', '2025-01-15..', 'Black ring with a notch of 20 degrees.', 'Notch where the focuser’s clamp screw passes.'),
    ],
  }),
  drawn({
    slug: 'cotterpin-ring-gear-kit-80', maker: 'cotterpin-works', kind: 'gear-kit', name: 'Ring-gear kit 80',
    about: 'Ring gear of 126 teeth for the Wren 80 with a 16-tooth pinion on an eccentric bush.',
    outline: { shape: 'gear', teeth: 126, module: 0.8, width: 9 },
    features: features({ gear: ['ring gear', 'pinion'], bore: ['bore of the ring', 'bore of the pinion'], slot: 'eccentric bush' }),
    revisions: [
      revision('A', '2022-09-01..2023-05-01', 'Bush without marks.', 'First batch.'),
      revision('B', '2023-05-01..2024-09-15', 'Bush with one mark.', 'Bush throws 1.0 mm instead of 0.6.'),
      revision('C', '2024-09-15..', 'Bush with a scale.', 'Scale on the bush; ring 1 mm wider.'),
    ],
  }),
  drawn({
    slug: 'cotterpin-pinion-set', maker: 'cotterpin-works', kind: 'gear-kit', name: 'Pinion set',
    about: 'Brass pinions of 14, 16 and 18 teeth, module 0.8, bored 5 or 6 mm, with two grub screws each.',
    outline: { shape: 'gear', teeth: 16, module: 0.8, width: 12 },
    features: features({ gear: 'pinion', bore: 'bore', thread: 'grub screws' }),
    revisions: [
      revision('A', '2021-11-01..2023-09-01', 'One grub screw.', 'First batch.'),
      revision('B', '2023-09-01..', 'Two grub screws at right angles.', 'Second grub screw; bore reamed.'),
    ],
  }),
  drawn({
    slug: 'thornapple-belt-kit-60', maker: 'thornapple-drives', kind: 'belt-kit', name: 'Belt kit 60',
    about: 'Toothed ring for the Wren 60, 20-tooth pulley and a closed belt of 2 mm pitch.',
    outline: { shape: 'gear', teeth: 60, module: 0.64, width: 7 },
    features: features({ pulley: ['ring pulley', 'motor pulley'], bore: ['bore of the motor pulley', 'bore of the ring pulley'], slot: 'idler slot' }),
    revisions: [
      revision('A', '2022-01-01..2023-01-01', 'Belt marked 300.', 'First batch; belt of 150 teeth.'),
      revision('B', '2023-01-01..2024-07-01', 'Belt marked 294; idler with one flange.', 'Belt of 147 teeth, idler added.'),
      revision('C', '2024-07-01..', 'Idler with two flanges.', 'Second flange on the idler; pulley bored with a flat for the M1 Rev D.'),
    ],
  }),
  drawn({
    slug: 'thornapple-belt-kit-80', maker: 'thornapple-drives', kind: 'belt-kit', name: 'Belt kit 80',
    about: 'Belt kit for the Wren 80.',
    outline: { shape: 'gear', teeth: 72, module: 0.64, width: 9 },
    features: features({ pulley: ['ring pulley', 'motor pulley'], bore: ['bore of the motor pulley', 'bore of the ring pulley'] }),
    revisions: [
      revision('A', '2022-10-01..2024-02-01', 'Belt marked 366.', 'First batch.'),
      revision('B', '2024-02-01..', 'Belt marked 360.', 'Belt three teeth shorter.'),
    ],
  }),
  drawn({
    slug: 'thornapple-tension-arm', maker: 'thornapple-drives', kind: 'belt-kit', name: 'Tension arm',
    about: 'Sprung idler arm to add to a belt drive.',
    outline: { shape: 'bar', width: 12, length: 58, height: 8 },
    features: features({ pulley: 'idler', slot: 'arm slot', bore: 'pivot' }),
    revisions: [
      revision('A', '2022-05-01..2023-04-01', 'Coil spring.', 'First batch.'),
      revision('B', '2023-04-01..2024-06-01', 'Leaf spring.', 'Leaf spring of 0.4 mm.'),
      revision('C', '2024-06-01..', 'Leaf spring, arm locks by a screw.', 'Lock screw.'),
    ],
  }),
  drawn({
    slug: 'dunlin-motor-plate', maker: 'dunlin-focus', kind: 'motor-bracket', name: 'Motor plate',
    about: 'Plate that carries a focus motor on the Rack 2 focuser.',
    outline: { shape: 'plate', width: 60, height: 60, bore: 22, thickness: 4 },
    features: features({ 'hole-pattern': ['motor holes', 'focuser holes'], recess: 'centring recess', bore: 'shaft opening' }),
    revisions: [
      revision('A', '2021-01-01..2022-04-01', 'Three holes.', 'First batch.'),
      revision('B', '2022-04-01..2024-03-01', 'Four holes on Ø 31.0.', 'Fourth hole.'),
      revision('C', '2024-03-01..', 'Four slots.', 'Slots from Ø 30 to Ø 34.'),
    ],
  }),
];
