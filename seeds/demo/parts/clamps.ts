import { type Outline, partOutline } from '../../drawing/part-outline.js';
import { type DemoPart, features, revision } from '../catalogue-shape.js';

type Parts = Omit<DemoPart, 'drawing'> & { outline: Outline };
const drawn = ({ outline, ...part }: Parts): DemoPart => ({ ...part, drawing: partOutline(part.name, outline) });

/** Clamps, guide-scope feet, guide scope and dew heaters. */
export const clampParts: readonly DemoPart[] = [
  drawn({
    slug: 'larkfield-tube-ring-70', maker: 'larkfield-optics', kind: 'clamp', name: 'Tube ring 70',
    about: 'Hinged ring for 66 mm tubes, lined with felt.',
    outline: { shape: 'ring', outer: 86, inner: 70, length: 18 },
    features: features({ bore: 'lined bore', 'hole-pattern': 'top holes', envelope: 'hinge' }),
    revisions: [revision('A', '2021-03-01..2023-09-01', 'Black felt, 2 mm.', 'First batch.'), revision('B', '2023-09-01..', 'Grey felt, 1.5 mm, in three strips.', 'Three strips of felt.')],
  }),
  drawn({
    slug: 'oxbow-ring-clamp', maker: 'oxbow-clampworks', kind: 'clamp', name: 'Ring clamp 70',
    about: 'Split ring with one clamp screw for tubes of 64 to 68 mm.',
    outline: { shape: 'ring', outer: 90, inner: 70, length: 22 },
    features: features({ bore: 'split bore', slot: 'split', thread: 'clamp screw' }),
    revisions: [
      revision('A', '2020-06-01..2022-05-01', 'No lining.', 'First batch.'),
      revision('B', '2022-05-01..2024-06-01', 'Two nylon pads.', 'Two pads opposite the split.'),
      revision('C', '2024-06-01..', 'Three nylon pads.', 'Third pad, so that the tube is held at 120 degrees.'),
    ],
  }),
  drawn({
    slug: 'oxbow-dovetail-clamp', maker: 'oxbow-clampworks', kind: 'clamp', name: 'Dovetail clamp',
    about: 'Saddle for narrow dovetail bars, 60 degrees.',
    outline: { shape: 'bar', width: 52, length: 80, height: 22 },
    features: features({ dovetail: 'saddle', thread: 'clamp screws', slot: 'jaw' }),
    revisions: [
      revision('A', '2020-06-01..2022-02-01', 'One knob.', 'First batch, flanks at 60 degrees.'),
      revision('B', '2022-02-01..2024-01-01', 'Two knobs.', 'Two knobs.'),
      revision('C', '2024-01-01..', 'Two knobs, jaw that swivels.', 'Swivelling jaw takes 60 to 75 degrees.'),
    ],
  }),
  drawn({
    slug: 'oxbow-finder-shoe', maker: 'oxbow-clampworks', kind: 'guide-scope-foot', name: 'Finder shoe',
    about: 'Shoe for finder feet, 32.4 mm at its floor.',
    outline: { shape: 'bar', width: 32.4, length: 44, height: 12 },
    features: features({ dovetail: 'shoe', 'hole-pattern': 'two holes at 35 mm', thread: 'thumb screw' }),
    revisions: [revision('A', '2020-06-01..2023-05-01', 'One thumb screw.', 'First batch.'), revision('B', '2023-05-01..', 'Two thumb screws.', 'Second screw; floor 32.6 mm.')],
  }),
  drawn({
    slug: 'stonebridge-guide-foot', maker: 'stonebridge-prints', kind: 'guide-scope-foot', name: 'Guide foot',
    about: 'Printed foot with a dovetail for finder shoes.',
    outline: { shape: 'bar', width: 32, length: 60, height: 16 },
    features: features({ dovetail: 'foot', 'hole-pattern': 'two holes at 35 mm' }),
    revisions: [
      revision('A', '2021-08-01..2022-12-01', 'Glossy.', 'First batch; holes at 34 mm.'),
      revision('B', '2022-12-01..2024-05-01', 'Matt.', 'Nylon; holes at 34 mm.'),
      revision('C', '2024-05-01..', 'Matt with brass inserts.', 'Holes at 35 mm, inserts.'),
    ],
  }),
  drawn({
    slug: 'nettlecombe-guide-foot', maker: 'nettlecombe-fittings', kind: 'guide-scope-foot', name: 'Guide foot N2',
    about: 'Milled foot, 31.4 mm wide at the bottom.',
    outline: { shape: 'bar', width: 31.4, length: 70, height: 12 },
    features: features({ dovetail: 'foot', 'hole-pattern': 'ring holes' }),
    revisions: [
      revision('A', '2021-02-01..2022-11-01', '31.4 mm wide.', 'First batch.'),
      revision('B', '2022-11-01..2024-06-01', '31.4 mm wide, chamfered.', 'Chamfer.'),
      revision('C', '2024-06-01..', '32.2 mm wide.', 'Wider foot.'),
    ],
  }),
  drawn({
    slug: 'nettlecombe-guide-scope-30', maker: 'nettlecombe-fittings', kind: 'telescope', name: 'Guide scope 30',
    about: 'Guide scope of 30 mm, f/4, with a helical focuser and two rings of three screws.',
    outline: { shape: 'tube', diameter: 36, length: 150, shield: 42 },
    features: features({ bore: 'inch-and-a-quarter bore', barrel: 'tube', envelope: 'ring screws' }),
    revisions: [
      revision('A', '2021-02-01..2022-09-01', 'Plastic-tipped screws.', 'First batch.'),
      revision('B', '2022-09-01..2024-03-01', 'Springs in one ring.', 'Sprung ring.'),
      revision('C', '2024-03-01..', 'One solid ring.', 'Solid ring instead of screws.'),
    ],
  }),
  drawn({
    slug: 'emberfell-strip-60', maker: 'emberfell', kind: 'dew-heater', name: 'Dew strip 60',
    about: 'Heating strip for 60 to 80 mm, 9 W.',
    outline: { shape: 'strip', length: 245, width: 30 },
    features: features({ envelope: 'closure', slot: 'cable outlet' }),
    revisions: [
      revision('A', '2020-10-01..2022-10-01', 'Cable at the end.', 'First batch.'),
      revision('B', '2022-10-01..2024-08-01', 'Cable in the middle.', 'Cable moved; heated length 245 instead of 255 mm.'),
      revision('C', '2024-08-01..', 'Buckle instead of tape.', 'Buckle.'),
    ],
  }),
  drawn({
    slug: 'emberfell-strip-80', maker: 'emberfell', kind: 'dew-heater', name: 'Dew strip 80',
    about: 'Heating strip for 80 to 105 mm, 14 W.',
    outline: { shape: 'strip', length: 320, width: 35 },
    features: features({ envelope: 'closure', slot: 'cable outlet' }),
    revisions: [revision('A', '2020-10-01..2023-10-01', 'Tape closure.', 'First batch.'), revision('B', '2023-10-01..', 'Buckle.', 'Buckle.')],
  }),
  drawn({
    slug: 'emberfell-dew-ring', maker: 'emberfell', kind: 'dew-heater', name: 'Dew ring',
    about: 'Heated aluminium ring that slips over the dew shield, bore 80.2 mm.',
    outline: { shape: 'ring', outer: 90, inner: 80.2, length: 16 },
    features: features({ bore: 'bore', envelope: 'cable hump' }),
    revisions: [
      revision('A', '2021-12-01..2023-03-01', 'Three nylon screws.', 'First batch; bore Ø 80.2.'),
      revision('B', '2023-03-01..2024-12-01', 'Four nylon screws.', 'Fourth screw.'),
      revision('C', '2024-12-01..', 'Cork lining.', 'Bore Ø 82, lined with cork of 0.8 mm.'),
    ],
  }),
];
