import { type Outline, partOutline } from '../../drawing/part-outline.js';
import { type DemoPart, features, revision } from '../catalogue-shape.js';

type Parts = Omit<DemoPart, 'drawing'> & { outline: Outline };
const drawn = ({ outline, ...part }: Parts): DemoPart => ({ ...part, drawing: partOutline(part.name, outline) });

/** Spacers, adapters and tilt plates. */
export const spacerParts: readonly DemoPart[] = [
  drawn({
    slug: 'hollin-m48-spacer', maker: 'hollin-turning', kind: 'spacer', name: 'M48 spacer set',
    about: 'Turned rings of 5, 7.5, 10 and 16.5 mm with M48 × 0.75 on both ends.',
    outline: { shape: 'ring', outer: 54, inner: 44, length: 16.5 },
    features: features({ thread: ['male thread M48', 'female thread M48'], boss: 'shoulder' }),
    revisions: [
      revision('A', '2020-05-01..2022-03-01', 'Length engraved with one digit.', 'First batch.'),
      revision('B', '2022-03-01..2024-04-01', 'Length engraved with two digits.', 'Male thread 4.5 instead of 3.5 mm long.'),
      revision('C', '2024-04-01..', 'Spanner flats.', 'Flats for a strap spanner; thread 3.8 mm long.'),
    ],
  }),
  drawn({
    slug: 'hollin-m42-adapter', maker: 'hollin-turning', kind: 'spacer', name: 'M42 to M48 adapter',
    about: 'Turns an M42 camera into an M48 one; 1 mm of path.',
    outline: { shape: 'ring', outer: 54, inner: 38, length: 5 },
    features: features({ thread: ['male thread M42', 'female thread M48'], bore: 'clear opening' }),
    revisions: [
      revision('A', '2020-05-01..2023-02-01', 'Opening Ø 36.', 'First batch.'),
      revision('B', '2023-02-01..', 'Opening Ø 38.5, blackened.', 'Wider opening.'),
    ],
  }),
  drawn({
    slug: 'hollin-tilt-plate', maker: 'hollin-turning', kind: 'spacer', name: 'Tilt plate',
    about: 'Two rings on three push and three pull screws, 6.0 mm closed.',
    outline: { shape: 'ring', outer: 72, inner: 46, length: 6, holes: 6 },
    features: features({ thread: 'M48 on both sides', 'hole-pattern': 'push and pull screws', recess: 'seats of the push screws' }),
    revisions: [
      revision('A', '2021-04-01..2022-11-01', 'Push screws on bare metal.', 'First batch.'),
      revision('B', '2022-11-01..2024-08-01', 'Push screws in countersinks.', 'Countersinks; pull screws M2.5 × 6.'),
      revision('C', '2024-08-01..', 'Steel pads under the push screws.', 'Steel pads; pull screws M2.5 × 5.'),
    ],
  }),
  drawn({
    slug: 'hollin-camera-adapter', maker: 'hollin-turning', kind: 'spacer', name: 'Camera adapter M54',
    about: 'M54 to a six-hole camera flange, 10 mm.',
    outline: { shape: 'ring', outer: 78, inner: 50, length: 10, holes: 6 },
    features: features({ thread: 'male thread M54', 'hole-pattern': 'six flange holes', boss: 'nose' }),
    revisions: [
      revision('A', '2022-03-01..2024-01-01', 'Nose 5 mm.', 'First batch.'),
      revision('B', '2024-01-01..', 'Nose 3 mm.', 'Shorter nose.'),
    ],
  }),
  drawn({
    slug: 'stonebridge-spacer-set', maker: 'stonebridge-prints', kind: 'spacer', name: 'Printed spacer set',
    about: 'Printed rings of 0.5 to 5 mm that go between flanges.',
    outline: { shape: 'ring', outer: 56, inner: 47, length: 2 },
    features: features({ bore: 'bore', recess: 'flange seat' }),
    revisions: [
      revision('A', '2021-10-01..2023-06-01', 'Glossy.', 'First batch, in polylactide.'),
      revision('B', '2023-06-01..', 'Matt, speckled.', 'Glass-filled nylon.'),
    ],
  }),
  drawn({
    slug: 'nettlecombe-riser', maker: 'nettlecombe-fittings', kind: 'spacer', name: 'Saddle riser',
    about: 'Block of 30 mm that lifts a small refractor off its bar.',
    outline: { shape: 'bar', width: 40, length: 70, height: 30 },
    features: features({ 'hole-pattern': 'quarter-inch holes', dovetail: 'foot', envelope: 'room above the bar' }),
    revisions: [
      revision('A', '2022-02-01..2024-02-01', 'Solid.', 'First batch.'),
      revision('B', '2024-02-01..', 'Hollowed from below.', 'Lighter; 4 mm shorter at the rear.'),
    ],
  }),
];
