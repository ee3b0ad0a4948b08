import { figure } from './geometry.js';
import { Sheet, ink, type Point } from './sheet.js';

const units = 'DIMENSIONS IN mm';

export interface Seat {
  readonly title: string;
  /** Names of the piece with the boss (drawn above) and the piece with the recess. */
  readonly upper: string;
  readonly lower: string;
  readonly boss: number;
  readonly bossHeight: number;
  readonly recess: number;
  readonly recessDepth: number;
  /** Thickness of a shim under the plate; the gap is left open without it. */
  readonly shim?: { readonly thickness: number; readonly name: string };
  /** What the two diameters are called where they are no boss and recess. */
  readonly bossName?: string;
  readonly recessName?: string;
  /** Leave the shaft out. */
  readonly open?: boolean;
}

/** Section through a plate whose boss is meant to enter a recess: overlap in red where it does not. */
export function seatSection(seat: Seat): string {
  const sheet = new Sheet(seat.title, `SECTION A-A · ${units}`);
  const scale = 380 / Math.max(seat.boss, seat.recess) / 1.55;
  const deep = 22 * Math.min(1, 3 / Math.max(seat.bossHeight, seat.recessDepth, 1));
  const centre = 430;
  const enters = seat.boss < seat.recess;
  const bossDeep = seat.bossHeight * deep;
  const top = 318;
  const lift = enters ? Math.max(0, bossDeep - seat.recessDepth * deep) : bossDeep;
  const under = top - lift;
  const half = (seat.boss / 2) * scale;
  const recessHalf = (seat.recess / 2) * scale;
  const shaft = 34;
  const wide = Math.max(half, recessHalf) + 112;
  const recessDeep = seat.recessDepth * deep;
  const body = (sign: 1 | -1): Point[] => [
    [centre + sign * shaft, top + recessDeep],
    [centre + sign * recessHalf, top + recessDeep],
    [centre + sign * recessHalf, top],
    [centre + sign * wide, top],
    [centre + sign * wide, top + 130],
    [centre + sign * shaft, top + 130],
  ];
  const plate = (sign: 1 | -1): Point[] => [
    [centre + sign * (shaft + 10), under + bossDeep],
    [centre + sign * half, under + bossDeep],
    [centre + sign * half, under],
    [centre + sign * wide, under],
    [centre + sign * wide, under - 62],
    [centre + sign * (shaft + 10), under - 62],
  ];
  for (const sign of [1, -1] as const) {
    sheet.cut(body(sign), 'steel').cut(plate(sign), 'print');
    if (!enters && !seat.shim) {
      sheet.clash([
        [centre + sign * recessHalf, top - 7],
        [centre + sign * half, top - 7],
        [centre + sign * half, top + 7],
        [centre + sign * recessHalf, top + 7],
      ]);
    }
    if (seat.shim && lift > 0) {
      const inner = centre + sign * (half + 14);
      const outer = centre + sign * (wide - 8);
      sheet.box(Math.min(inner, outer), top - lift, Math.abs(outer - inner), lift, 'shim', 'brass');
    }
  }
  if (!seat.open) sheet.box(centre - 16, top - 150, 32, 280, 'none');
  sheet.line([centre, 140], [centre, top + 160], 'axis');
  sheet.across(centre - half, centre + half, 128, `${seat.bossName ?? 'BOSS'} Ø${figure(seat.boss)}`, [
    under - 62,
    under - 62,
  ]);
  sheet.across(
    centre - recessHalf,
    centre + recessHalf,
    top + 190,
    `${seat.recessName ?? 'RECESS'} Ø${figure(seat.recess)}`,
    [top + recessDeep, top + recessDeep],
  );
  sheet.down(under, under + bossDeep, centre - wide - 46, figure(seat.bossHeight), [
    centre - wide,
    centre - half,
  ]);
  sheet.down(top, top + recessDeep, centre + wide + 46, figure(seat.recessDepth), [
    centre + wide,
    centre + recessHalf,
  ]);
  sheet.label([centre + wide - 30, under - 40], [centre + wide + 40, 170], seat.upper);
  sheet.label([centre + wide - 30, top + 96], [centre + wide + 40, top + 150], seat.lower);
  if (seat.shim)
    sheet.label(
      [centre - wide + 22, top - lift / 2],
      [centre - wide - 20, 210],
      `${seat.shim.name} ${figure(seat.shim.thickness, 2)}`,
      ink.brass,
    );
  else if (!enters) {
    sheet.text(48, 62, `LIP OVERLAPS THE RIM BY ${figure((seat.boss - seat.recess) / 2, 2)} ALL ROUND`, {
      colour: ink.red,
      height: 14,
    });
  }
  return sheet.toSvg();
}

export interface Tilt {
  readonly title: string;
  readonly gap: number;
  readonly span: number;
  readonly upper: string;
  readonly lower: string;
}

/** Side view of a plate pulled down on one side: the angle is drawn larger than life and said so. */
export function tiltSection(tilt: Tilt): string {
  const degrees = (Math.asin(tilt.gap / tilt.span) * 180) / Math.PI;
  const sheet = new Sheet(tilt.title, `SIDE VIEW · ANGLE ENLARGED · ${units}`);
  const left = 190;
  const right = 690;
  const top = 360;
  const rise = 62;
  sheet.box(left, top, right - left, 96, 'steel');
  sheet.cut(
    [
      [left, top],
      [right, top - rise],
      [right - 6, top - rise - 44],
      [left - 6, top - 44],
    ],
    'print',
  );
  sheet.circle([left, top], 6, 'red');
  sheet.line([(left + right) / 2, top + 120], [(left + right) / 2, 130], 'axis');
  sheet.line([(left + right) / 2, top - 30], [(left + right) / 2 - 28, 130], 'axis');
  sheet.text((left + right) / 2 - 48, 112, `${figure(degrees, 2)}° OFF SQUARE`, {
    colour: ink.red,
    height: 14,
    anchor: 'middle',
  });
  sheet.across(left, right, top + 140, `PIVOT TO FAR EDGE ${figure(tilt.span)}`, top + 96);
  sheet.down(top - rise, top, right + 60, `GAP ${figure(tilt.gap, 2)}`, right);
  sheet
    .label([right - 90, top - rise - 12], [right + 30, 190], tilt.upper)
    .label([right - 60, top + 66], [right + 40, top + 110], tilt.lower);
  sheet.label([left, top], [left - 40, top - 120], 'PIVOTS HERE', ink.red);
  return sheet.toSvg();
}

export interface Layer {
  readonly name: string;
  readonly length: number;
  readonly hatch?: 'steel' | 'print' | 'shim' | 'glass';
  /** Half height relative to the tallest, 0 to 1. */
  readonly reach?: number;
}

export interface Stack {
  readonly title: string;
  readonly layers: readonly Layer[];
  /** Length asked for, from the first face to the last. */
  readonly required?: number;
  readonly requiredName?: string;
}

/** Section through rings screwed to each other along the optical axis, with a chain of dimensions. */
export function stackSection(stack: Stack): string {
  const sheet = new Sheet(stack.title, `SECTION ALONG THE OPTICAL AXIS · ${units}`);
  const total = stack.layers.reduce((sum, layer) => sum + layer.length, 0);
  const longest = Math.max(total, stack.required ?? 0);
  const scale = 640 / longest;
  const axis = 296;
  let x = 150;
  stack.layers.forEach((layer, index) => {
    const width = layer.length * scale;
    const reach = 118 * (layer.reach ?? 1);
    for (const sign of [1, -1]) {
      const from = sign > 0 ? axis + reach * 0.55 : axis - reach;
      if (layer.hatch === 'glass') sheet.box(x, axis - reach * 0.55, width, reach * 1.1, 'glass');
      sheet.box(x, from, width, reach * 0.45, layer.hatch === 'glass' ? 'steel' : (layer.hatch ?? 'steel'));
    }
    const length = figure(layer.length, layer.length < 3 ? 2 : 1);
    // A thin ring has no room for its own dimension; its length stands beside its name.
    const narrow = width < 76;
    if (!narrow) sheet.across(x, x + width, 450, length, axis + reach);
    const tier = index % 3;
    sheet.label(
      [x + width / 2, axis - reach + 12],
      [x + width / 2 + 12, 80 + tier * 34],
      narrow ? `${layer.name} ${length}` : layer.name,
      layer.hatch === 'shim' ? ink.brass : ink.blue,
    );
    x += width;
  });
  sheet.line([110, axis], [Math.max(x, 150 + longest * scale) + 40, axis], 'axis');
  if (stack.required !== undefined) {
    const want = 150 + stack.required * scale;
    const off = total - stack.required;
    sheet.across(150, want, 500, `${stack.requiredName ?? 'REQUIRED'} ${figure(stack.required)}`, axis + 118);
    if (Math.abs(off) > 0.02) {
      sheet.clash([
        [Math.min(x, want), axis - 60],
        [Math.max(x, want), axis - 60],
        [Math.max(x, want), axis + 60],
        [Math.min(x, want), axis + 60],
      ]);
      sheet.text(48, 604, `STACK ${figure(Math.abs(off), 2)} ${off < 0 ? 'TOO SHORT' : 'TOO LONG'}`, {
        colour: ink.red,
        height: 14,
      });
    }
  }
  return sheet.toSvg();
}
