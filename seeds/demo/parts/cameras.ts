import { type Outline, partOutline } from '../../drawing/part-outline.js';
import { type DemoPart, features, revision } from '../catalogue-shape.js';

type Parts = Omit<DemoPart, 'drawing'> & { outline: Outline };
const drawn = ({ outline, ...part }: Parts): DemoPart => ({ ...part, drawing: partOutline(part.name, outline) });

/** Cameras, filter wheels, rotators. */
export const cameraParts: readonly DemoPart[] = [
  drawn({
    slug: 'quillback-q16', maker: 'quillback', kind: 'camera', name: 'Q16',
    about: 'Cooled camera with a sensor of 22 mm diagonal, 17.5 mm behind its flange.',
    outline: { shape: 'box', width: 78, height: 78, depth: 96, opening: 42 },
    features: features({ thread: 'M42 flange', 'hole-pattern': 'six flange holes', envelope: 'fan and cables' }),
    revisions: [
      revision('A', '2021-01-01..2022-08-01', 'Red body.', 'First batch.'),
      revision('B', '2022-08-01..2024-04-01', 'Red body, tilt screws in the flange.', 'Adjustable flange.'),
      revision('C', '2024-04-01..', 'Black body.', 'Flange ground flat; side outlet for the cable.'),
    ],
  }),
  drawn({
    slug: 'quillback-q26', maker: 'quillback', kind: 'camera', name: 'Q26',
    about: 'Cooled camera with a sensor of 28 mm diagonal.',
    outline: { shape: 'box', width: 90, height: 90, depth: 112, opening: 54 },
    features: features({ thread: 'M54 flange', 'hole-pattern': 'six flange holes', recess: 'opening of the flange', envelope: 'fan' }),
    revisions: [
      revision('A', '2022-05-01..2024-01-01', 'Fan grille round.', 'First batch.'),
      revision('B', '2024-01-01..', 'Fan grille square.', 'Heavier cooler, 720 g.'),
    ],
  }),
  drawn({
    slug: 'quillback-g1', maker: 'quillback', kind: 'camera', name: 'G1 guide camera',
    about: 'Pencil-shaped guide camera of an inch and a quarter.',
    outline: { shape: 'ring', outer: 36, inner: 28, length: 62 },
    features: features({ barrel: 'inch-and-a-quarter barrel', thread: 'filter thread', envelope: 'plug at the rear' }),
    revisions: [
      revision('A', '2020-11-01..2022-05-01', 'Barrel with an undercut.', 'First batch.'),
      revision('B', '2022-05-01..2024-01-01', 'Barrel smooth, Ø 31.70.', 'Smooth barrel.'),
      revision('C', '2024-01-01..', 'Barrel smooth, Ø 31.55.', 'Thinner anodising.'),
    ],
  }),
  drawn({
    slug: 'pallister-fw5', maker: 'pallister-wheelworks', kind: 'filter-wheel', name: 'FW5',
    about: 'Wheel for five filters of 36 mm unmounted or an inch and a quarter; 20 mm thick.',
    outline: { shape: 'box', width: 126, height: 110, depth: 20, opening: 42 },
    features: features({ recess: 'filter seats', thread: ['M42 on the camera side', 'M48 on the telescope side'], envelope: 'case' }),
    revisions: [
      revision('A', '2020-10-01..2022-01-01', 'Filters held by spring wire.', 'First batch.'),
      revision('B', '2022-01-01..2024-05-01', 'Filters held by three screws and washers.', 'Screws and washers; seats 2.3 mm deep.'),
      revision('C', '2024-05-01..', 'Filters held by rings.', 'Threaded rings; seats 2.1 mm deep.'),
    ],
  }),
  drawn({
    slug: 'pallister-fw7', maker: 'pallister-wheelworks', kind: 'filter-wheel', name: 'FW7',
    about: 'Wheel for seven filters; its case reaches 82 mm to one side.',
    outline: { shape: 'box', width: 164, height: 150, depth: 21, opening: 54 },
    features: features({ envelope: 'case', thread: 'M54 on both sides', recess: 'filter seats' }),
    revisions: [
      revision('A', '2022-02-01..2024-03-01', 'Case with four corner screws.', 'First batch.'),
      revision('B', '2024-03-01..', 'Case with a cut corner.', 'One corner cut to clear motors.'),
    ],
  }),
  drawn({
    slug: 'pallister-filter-drawer', maker: 'pallister-wheelworks', kind: 'filter-wheel', name: 'Filter drawer',
    about: 'Single drawer held shut by magnets.',
    outline: { shape: 'box', width: 74, height: 62, depth: 16, opening: 48 },
    features: features({ slot: 'drawer slide', thread: 'M48 on both sides', recess: 'magnet pockets' }),
    revisions: [
      revision('A', '2021-07-01..2023-11-01', 'Magnets glued.', 'First batch.'),
      revision('B', '2023-11-01..', 'Magnets pressed in.', 'Pressed magnets, tighter slide.'),
    ],
  }),
  drawn({
    slug: 'brackwater-r54', maker: 'brackwater', kind: 'rotator', name: 'R54 rotator',
    about: 'Driven camera rotator with a friction wheel, M54, 17 mm.',
    outline: { shape: 'ring', outer: 110, inner: 54, length: 17, holes: 4 },
    features: features({ dovetail: 'inner ring', thread: 'M54 on both sides', envelope: 'motor hump' }),
    revisions: [
      revision('A', '2022-01-01..2023-04-01', 'Friction wheel of rubber.', 'First batch.'),
      revision('B', '2023-04-01..2024-10-01', 'Friction wheel of urethane.', 'Urethane wheel; spring screw from outside.'),
      revision('C', '2024-10-01..', 'Toothed inner ring.', 'Belt instead of friction.'),
    ],
  }),
  drawn({
    slug: 'brackwater-hand-rotator', maker: 'brackwater', kind: 'rotator', name: 'Hand rotator',
    about: 'Rotator turned by hand and locked by a brass-tipped screw.',
    outline: { shape: 'ring', outer: 74, inner: 46, length: 12, holes: 3 },
    features: features({ dovetail: 'inner ring', thread: ['M48 on both sides', 'lock screw'] }),
    revisions: [
      revision('A', '2021-03-01..2023-03-01', 'One lock screw, steel tip.', 'First batch.'),
      revision('B', '2023-03-01..', 'Three lock screws, brass tips.', 'Brass tips, three screws.'),
    ],
  }),
];
