import { figure } from './geometry.js';
import { Sheet, ink } from './sheet.js';

const units = 'DIMENSIONS IN mm';

export interface BarrelInBore {
  readonly title: string;
  readonly outer: string;
  readonly inner: string;
  readonly barrel: number;
  readonly bore: number;
  readonly barrelLength: number;
  readonly boreDepth: number;
  readonly shim?: string;
  /** The bore goes right through; the inner piece is solid. */
  readonly through?: boolean;
  readonly solid?: boolean;
}

/** Section of a barrel pushed into a bore from the right: radial room, and what bottoms. */
export function barrelSection(seat: BarrelInBore): string {
  const sheet = new Sheet(seat.title, `SECTION · RADIAL ROOM ENLARGED · ${units}`);
  const scale = 300 / Math.max(seat.barrelLength, seat.boreDepth);
  const axis = 300;
  const boreHalf = 118;
  const barrelHalf = Math.abs(seat.bore - seat.barrel) < 0.005 ? 118 : seat.bore > seat.barrel ? 106 : 124;
  const mouth = 520;
  const bottom = mouth - seat.boreDepth * scale;
  const bottoms = !seat.through && seat.barrelLength > seat.boreDepth;
  const tip = bottoms ? bottom : mouth - seat.barrelLength * scale;
  const shoulder = tip + seat.barrelLength * scale;
  for (const sign of [1, -1] as const) {
    const wall = seat.through ? bottom : bottom - 50;
    const rim = seat.through ? boreHalf : 46;
    sheet.cut(
      [
        [wall, axis + sign * rim],
        [bottom, axis + sign * rim],
        [bottom, axis + sign * boreHalf],
        [mouth, axis + sign * boreHalf],
        [mouth, axis + sign * 176],
        [wall, axis + sign * 176],
      ],
      'steel',
    );
    if (!seat.solid) {
      sheet.cut(
        [
          [tip, axis + sign * 62],
          [shoulder + 70, axis + sign * 62],
          [shoulder + 70, axis + sign * 168],
          [shoulder, axis + sign * 168],
          [shoulder, axis + sign * barrelHalf],
          [tip, axis + sign * barrelHalf],
        ],
        'print',
      );
    } else if (sign === 1) {
      sheet.cut(
        [
          [tip, axis - barrelHalf],
          [shoulder, axis - barrelHalf],
          [shoulder, axis - 168],
          [shoulder + 70, axis - 168],
          [shoulder + 70, axis + 168],
          [shoulder, axis + 168],
          [shoulder, axis + barrelHalf],
          [tip, axis + barrelHalf],
        ],
        'print',
      );
    }
    if (seat.shim && boreHalf > barrelHalf) {
      sheet.box(
        tip + 20,
        sign > 0 ? axis + barrelHalf : axis - boreHalf,
        Math.min(mouth, shoulder) - tip - 24,
        boreHalf - barrelHalf,
        'shim',
        'brass',
      );
    }
    if (boreHalf < barrelHalf) {
      sheet.clash([
        [tip, axis + sign * boreHalf],
        [mouth, axis + sign * boreHalf],
        [mouth, axis + sign * barrelHalf],
        [tip, axis + sign * barrelHalf],
      ]);
    }
    if (bottoms)
      sheet.clash([
        [bottom - 8, axis + sign * 62],
        [bottom + 5, axis + sign * 62],
        [bottom + 5, axis + sign * barrelHalf],
        [bottom - 8, axis + sign * barrelHalf],
      ]);
  }
  sheet.line([bottom - 90, axis], [shoulder + 110, axis], 'axis');
  sheet.down(axis - boreHalf, axis + boreHalf, 96, `Ø${figure(seat.bore, 2)}`, [bottom, bottom]);
  sheet.down(
    axis - barrelHalf,
    axis + barrelHalf,
    shoulder + 116,
    `Ø${figure(seat.barrel, 2)}`,
    shoulder + 70,
  );
  sheet.across(bottom, mouth, 92, `DEPTH ${figure(seat.boreDepth)}`, axis - 176);
  sheet.across(tip, shoulder, 526, `LENGTH ${figure(seat.barrelLength)}`, [axis + barrelHalf, axis + 168]);
  sheet.label([bottom + (seat.through ? 30 : -20), axis - 150], [bottom - 40, 70], seat.outer);
  sheet.label([shoulder + 50, axis - 140], [shoulder + 90, 100], seat.inner);
  if (seat.shim)
    sheet.label([tip + 60, axis - (boreHalf + barrelHalf) / 2], [shoulder + 70, 64], seat.shim, ink.brass);
  if (bottoms)
    sheet.text(48, 604, `BOTTOMS ${figure(seat.barrelLength - seat.boreDepth, 2)} EARLY`, {
      colour: ink.red,
      height: 14,
    });
  return sheet.toSvg();
}

export interface Dovetail {
  readonly title: string;
  readonly bar: string;
  readonly shoe: string;
  readonly barWidth: number;
  readonly barAngle: number;
  readonly shoeWidth: number;
  readonly shoeAngle: number;
  readonly shim?: string;
}

/** End view of a dovetail bar in its shoe; widths at the broad face. */
export function dovetailSection(pair: Dovetail): string {
  const sheet = new Sheet(pair.title, `END VIEW · ${units}`);
  const scale = 330 / Math.max(pair.barWidth, pair.shoeWidth);
  const centre = 420;
  const top = 220;
  const height = 110;
  const lean = (angle: number): number => height / Math.tan((angle * Math.PI) / 180);
  const shoeHalf = (pair.shoeWidth * scale) / 2;
  const barHalf = (pair.barWidth * scale) / 2;
  const floor = top + height;
  sheet.cut(
    [
      [centre - 260, floor + 80],
      [centre - 260, top],
      [centre - shoeHalf + lean(pair.shoeAngle), top],
      [centre - shoeHalf, floor],
      [centre + shoeHalf, floor],
      [centre + shoeHalf - lean(pair.shoeAngle), top],
      [centre + 260, top],
      [centre + 260, floor + 80],
    ],
    'steel',
  );
  const shift = pair.shoeWidth - pair.barWidth > 0.05 ? shoeHalf - barHalf : 0;
  const middle = centre - shift;
  sheet.cut(
    [
      [middle - barHalf, floor],
      [middle - barHalf + lean(pair.barAngle), top],
      [middle - barHalf + lean(pair.barAngle), top - 70],
      [middle + barHalf - lean(pair.barAngle), top - 70],
      [middle + barHalf - lean(pair.barAngle), top],
      [middle + barHalf, floor],
    ],
    'print',
  );
  if (pair.shim && shift > 0) {
    sheet.cut(
      [
        [middle + barHalf + 2, floor - 2],
        [centre + shoeHalf - 2, floor - 2],
        [centre + shoeHalf - lean(pair.shoeAngle), top + 6],
        [middle + barHalf - lean(pair.barAngle) + 2, top + 6],
      ],
      'shim',
      'brass',
    );
    sheet.label(
      [(middle + barHalf + centre + shoeHalf) / 2 - 12, floor - 30],
      [centre + 300, 150],
      pair.shim,
      ink.brass,
    );
  }
  if (pair.barAngle !== pair.shoeAngle) {
    const edge = centre + shoeHalf - lean(pair.shoeAngle);
    sheet.clash([
      [edge - 7, top - 7],
      [edge + 7, top - 7],
      [edge + 7, top + 9],
      [edge - 7, top + 9],
    ]);
    sheet.label([edge, top], [centre + 290, 120], 'TOUCHES AT THE EDGE ONLY', ink.red);
  }
  sheet.line([centre, 120], [centre, floor + 110], 'axis');
  sheet.across(
    middle - barHalf,
    middle + barHalf,
    118,
    `BAR ${figure(pair.barWidth)} · ${pair.barAngle}°`,
    floor,
  );
  sheet.across(
    centre - shoeHalf,
    centre + shoeHalf,
    floor + 130,
    `SHOE ${figure(pair.shoeWidth)} · ${pair.shoeAngle}°`,
    floor,
  );
  sheet
    .label([centre - 210, floor + 50], [centre - 290, floor + 110], pair.shoe)
    .label([middle - 60, top - 50], [centre - 290, 190], pair.bar);
  return sheet.toSvg();
}
