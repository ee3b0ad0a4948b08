import { type Outline, partOutline } from '../../drawing/part-outline.js';
import { type DemoPart, features, revision } from '../catalogue-shape.js';

type Parts = Omit<DemoPart, 'drawing'> & { outline: Outline };
const drawn = ({ outline, ...part }: Parts): DemoPart => ({ ...part, drawing: partOutline(part.name, outline) });

/** Telescopes, focusers and correctors. */
export const opticsParts: readonly DemoPart[] = [
  drawn({
    slug: 'larkfield-wren-60', maker: 'larkfield-optics', kind: 'telescope', name: 'Wren 60',
    about: '60 mm refractor, f/5.5, with a helical focuser whose grip ring takes a belt or a ring gear.',
    outline: { shape: 'tube', diameter: 66, length: 248, shield: 80 },
    features: features({ envelope: ['room round the focus ring', 'clamp screw of the focuser'], gear: 'grip ring of the focuser', dovetail: 'foot', thread: 'rear thread M48', barrel: ['dew shield', 'tube', 'grip ring over the knurl'] }),
    revisions: [
      revision('A', '2021-03-01..2022-04-01', 'Batch ring says 1 to 4; grip ring with straight knurls.', 'First batch.'),
      revision('B', '2022-04-01..2023-06-15', 'Batch ring 5 to 9; clamp screw of the focuser at two o’clock, seen from the camera.', 'Clamp screw moved from six to two o’clock; M3 became M4.'),
      revision('C', '2023-06-15..2024-11-01', 'Batch ring 10 to 15; grip ring 1.2 mm wider, diamond knurl.', 'Wider grip ring Ø 76.8; dew shield steps up to Ø 80.4.'),
      revision('D', '2024-11-01..', 'Batch ring 16 and up; flat milled on the grip ring, clamp screw sunk.', 'Clamp screw sunk flush; dew shield back to Ø 80.0.'),
    ],
  }),
  drawn({
    slug: 'larkfield-wren-80', maker: 'larkfield-optics', kind: 'telescope', name: 'Wren 80',
    about: '80 mm refractor, f/6, heavier helical focuser with two lead starts.',
    outline: { shape: 'tube', diameter: 88, length: 395, shield: 104 },
    features: features({ envelope: 'room round the focus ring', gear: 'grip ring of the focuser', thread: 'rear thread M54', barrel: ['dew shield', 'grip ring over the knurl'] }),
    revisions: [
      revision('A', '2022-01-10..2023-02-01', 'Grey lens cell.', 'First batch.'),
      revision('B', '2023-02-01..2024-08-01', 'Blue lens cell, focus scale engraved.', 'Grip ring from Ø 92 to Ø 94; longer travel.'),
      revision('C', '2024-08-01..', 'Blue cell with a dot at the batch number.', 'Rear thread 0.6 mm longer.'),
    ],
  }),
  drawn({
    slug: 'larkfield-wren-60-helical', maker: 'larkfield-optics', kind: 'focuser', name: 'Wren helical focuser',
    about: 'The Wren 60’s focuser as a spare: single-start helicoid, 1.5 mm of travel a turn.',
    outline: { shape: 'ring', outer: 76.8, inner: 52, length: 38 },
    features: features({ gear: 'grip ring', bore: 'drawtube bore', thread: ['helicoid', 'rear thread M48'], envelope: 'clamp screw' }),
    revisions: [
      revision('A', '2021-03-01..2022-04-01', 'Straight knurls, brass clamp screw.', 'First batch.'),
      revision('B', '2022-04-01..2023-06-15', 'Black clamp screw at two o’clock.', 'Clamp screw moved.'),
      revision('C', '2023-06-15..', 'Diamond knurl, 17 mm wide.', 'Wider ring; thinner grease.'),
    ],
  }),
  drawn({
    slug: 'larkfield-flattener-w1', maker: 'larkfield-optics', kind: 'corrector', name: 'W1 flattener',
    about: 'Flattener for the Wren 60; asks for 55 mm from its rear shoulder to the sensor.',
    outline: { shape: 'ring', outer: 54, inner: 42, length: 31 },
    features: features({ thread: ['front thread M48', 'rear thread M48'], barrel: 'nose', boss: 'rear shoulder' }),
    revisions: [
      revision('A', '2021-06-01..2022-09-01', 'No number on the rim.', 'First batch.'),
      revision('B', '2022-09-01..2024-03-01', 'Rim says 55.0.', 'Rear shoulder 0.8 mm lower, so the stack must be longer.'),
      revision('C', '2024-03-01..', 'Rim says 55.0 and carries a green line.', 'Rear thread shortened to 4.0 mm.'),
    ],
  }),
  drawn({
    slug: 'dunlin-rack-2', maker: 'dunlin-focus', kind: 'focuser', name: 'Rack 2 focuser',
    about: 'Two-inch rack focuser with a fine gear and four brake screws.',
    outline: { shape: 'box', width: 92, height: 92, depth: 110, opening: 51 },
    features: features({ bore: 'drawtube bore', shaft: 'fine shaft', 'hole-pattern': 'motor holes', gear: 'rack' }),
    revisions: [
      revision('A', '2020-09-01..2022-02-01', 'Fine knob with one dot.', 'First batch.'),
      revision('B', '2022-02-01..2024-01-15', 'Two dots; fine shaft has a flat.', 'Shaft from Ø 6.00 to Ø 6.35 with a flat.'),
      revision('C', '2024-01-15..', 'Three dots; four motor holes instead of three.', 'Motor holes on Ø 33.0.'),
    ],
  }),
  drawn({
    slug: 'dunlin-micro-helical', maker: 'dunlin-focus', kind: 'focuser', name: 'Micro helical',
    about: 'Short helical focuser for guide scopes and small cameras.',
    outline: { shape: 'ring', outer: 48, inner: 31.8, length: 22 },
    features: features({ thread: 'helicoid', bore: 'inch-and-a-quarter bore', envelope: 'lock ring' }),
    revisions: [
      revision('A', '2021-05-01..2022-10-01', 'Nylon lock screw.', 'First batch.'),
      revision('B', '2022-10-01..2024-05-01', 'Lock ring instead of a screw.', 'Lock ring.'),
      revision('C', '2024-05-01..', 'Lock ring with three holes for a pin.', 'Finer thread, 0.75 mm a turn.'),
    ],
  }),
  drawn({
    slug: 'greywether-heron-72', maker: 'greywether-optics', kind: 'telescope', name: 'Heron 72',
    about: '72 mm refractor, f/6, with a rack focuser and a dovetail bar cut at 75 degrees.',
    outline: { shape: 'tube', diameter: 78, length: 330, shield: 92 },
    features: features({ dovetail: 'bar', bore: 'drawtube bore', barrel: 'dew shield', 'hole-pattern': 'motor holes' }),
    revisions: [
      revision('A', '2020-04-01..2022-01-01', 'White with a black bar.', 'First batch.'),
      revision('B', '2022-01-01..2024-06-01', 'White with a red bar; drawtube engraved 0 to 60.', 'Drawtube bore from 31 to 36 mm deep; bar at 60 degrees.'),
      revision('C', '2024-06-01..', 'Grey; bar with two slots.', 'Motor holes added.'),
    ],
  }),
  drawn({
    slug: 'greywether-reducer-08', maker: 'greywether-optics', kind: 'corrector', name: '0.8 reducer',
    about: 'Reducer and flattener for the Heron 72, slipped in by a two-inch barrel.',
    outline: { shape: 'ring', outer: 56, inner: 44, length: 52 },
    features: features({ barrel: 'two-inch barrel', thread: 'rear thread M48', boss: 'shoulder' }),
    revisions: [
      revision('A', '2020-08-01..2022-06-01', 'Barrel 34 mm, with an undercut.', 'First batch.'),
      revision('B', '2022-06-01..2024-02-01', 'Barrel 34 mm, smooth.', 'Undercut left out.'),
      revision('C', '2024-02-01..', 'Barrel 30 mm.', 'Barrel shortened.'),
    ],
  }),
];
