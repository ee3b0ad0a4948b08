import type { Dimension } from '../fit/dimension.js';
import type { SeatResult } from '../fit/seat.js';
import { dimensionText, millimetres, tiltFactor } from './figures.js';
import { across, label, line, polygon, rectangle, upright, type Drawing, type Shape } from './shapes.js';

export interface SeatDrawingInput {
  readonly bossDiameter: Dimension;
  readonly recessDiameter: Dimension;
  /** Height and depth; where one is missing it is drawn as 2 mm and told. */
  readonly bossHeight: Dimension | null;
  readonly recessDepth: Dimension | null;
  /** Width of the plate; drawn at most 1.6 times as wide as the boss. */
  readonly plateWidth: Dimension | null;
  readonly result: SeatResult;
  /** Thickness of the shim drawn between the faces, mm. */
  readonly shim?: number;
  /** Height that is taken off the boss, mm. */
  readonly trim?: number;
  readonly words: {
    readonly inner: string;
    readonly outer: string;
    readonly partA: string;
    readonly partB: string;
  };
}

const width = 360;
const centre = width / 2;
const drawnFor = 2;

/**
 * Section of a boss over a recess, or a barrel over a bore, to true scale as it comes to rest: plate above, body below,
 * the gap or the overlap picked out, shim and trim drawn in; below it the plate tipped on the rim, exaggerated.
 */
export function seatSection(input: SeatDrawingInput): Drawing {
  const { bossDiameter, recessDiameter, result } = input;
  const height = input.bossHeight?.value ?? drawnFor;
  const depth = input.recessDepth?.value ?? Math.max(drawnFor, height);
  const left = Math.max(0, height - (input.trim ?? 0));
  const gap = input.shim ?? restingGap(result, left, depth);
  const half = Math.max(bossDiameter.value, recessDiameter.value) / 2;
  const plateHalf = Math.max(half * 1.2, Math.min((input.plateWidth?.value ?? 2.7 * half) / 2, half * 1.6));
  const plate = Math.max(2, half * 0.16);
  const body = depth + Math.max(2, half * 0.16);
  const scale = Math.min(172 / (2 * plateHalf), 190 / (plate + gap + body));
  const face = 82 + (plate + gap) * scale;
  const x = (value: number): number => centre + value * scale;
  const y = (value: number): number => face + value * scale;
  const underside = -gap;
  const shapes: Shape[] = [
    ...bodySection(x, y, plateHalf, recessDiameter.value / 2, depth, body),
    ...gapShapes(x, y, plateHalf, Math.max(bossDiameter.value, recessDiameter.value) / 2, gap, input.shim),
    plateSection(x, y, plateHalf, bossDiameter.value / 2, underside, left, plate),
    ...(input.trim
      ? [
          rectangle(
            'ghost',
            x(-bossDiameter.value / 2),
            y(underside + left),
            x(bossDiameter.value / 2),
            y(underside + height),
          ),
        ]
      : []),
    ...contact(x, y, input, underside + left, depth),
    line('centre', [centre, y(underside - plate) - 12], [centre, y(body) + 12]),
    across(
      x(-bossDiameter.value / 2),
      x(bossDiameter.value / 2),
      42,
      y(underside - plate),
      dimensionText(bossDiameter, '⌀'),
    ),
    across(
      x(-recessDiameter.value / 2),
      x(recessDiameter.value / 2),
      y(body) + 30,
      y(0),
      dimensionText(recessDiameter, '⌀'),
    ),
    ...heights(x, y, input, { underside, left, height, depth, plateHalf, gap }),
    label([centre, 14], input.words.partA),
    label([centre, y(body) + 50], input.words.partB),
  ];
  const below = y(body) + 60;
  const tilt = input.shim === undefined && !input.trim ? result.tilt?.worst : null;
  if (!tilt || tilt.degrees < 0.01) return finish(shapes, below, scale, null, input);
  const factor = tiltFactor(tilt.degrees);
  shapes.push(
    ...tiltedPlate(
      below,
      plateHalf,
      bossDiameter.value / 2,
      left,
      plate,
      tilt.degrees * factor,
      scale,
      `${tilt.degrees.toFixed(2)}°, drawn ${factor} ×`,
    ),
  );
  return finish(shapes, below + 110, scale, factor, input);
}

function finish(
  shapes: readonly Shape[],
  height: number,
  scale: number,
  factor: number | null,
  input: SeatDrawingInput,
): Drawing {
  return {
    width,
    height: Math.ceil(height),
    shapes,
    scale,
    tiltFactor: factor,
    description: describe(input),
  };
}

type Along = (value: number) => number;

/** Height of the boss and depth of the recess, side by side at the left where a gap is told at the right. */
function heights(
  x: Along,
  y: Along,
  input: SeatDrawingInput,
  at: { underside: number; left: number; height: number; depth: number; plateHalf: number; gap: number },
): Shape[] {
  const { underside, left, height, depth, plateHalf, gap } = at;
  const near = x(-plateHalf) - 14;
  const boss = x(-input.bossDiameter.value / 2);
  const shapes: Shape[] = [];
  if (input.trim)
    shapes.push(
      upright(y(underside + left), y(underside + height), near, boss, `off ${input.trim.toFixed(2)}`, true),
    );
  else if (input.bossHeight)
    shapes.push(upright(y(underside), y(underside + left), near, boss, left.toFixed(2)));
  if (!input.recessDepth) return shapes;
  const recess = input.recessDiameter.value / 2;
  const column = gap > 0.005 ? near - 42 : x(plateHalf) + 14;
  return [
    ...shapes,
    upright(y(0), y(depth), column, x(column < centre ? -recess : recess), depth.toFixed(2)),
  ];
}

function restingGap(result: SeatResult, height: number, depth: number): number {
  if (result.carriedBy === 'boss-on-face') return height;
  return result.carriedBy === 'boss-on-floor' ? Math.max(0, height - depth) : 0;
}

function bodySection(
  x: Along,
  y: Along,
  outer: number,
  inner: number,
  depth: number,
  bottom: number,
): Shape[] {
  return [
    polygon('b', [
      [x(-outer), y(0)],
      [x(-inner), y(0)],
      [x(-inner), y(depth)],
      [x(inner), y(depth)],
      [x(inner), y(0)],
      [x(outer), y(0)],
      [x(outer), y(bottom)],
      [x(-outer), y(bottom)],
    ]),
  ];
}

function plateSection(
  x: Along,
  y: Along,
  outer: number,
  boss: number,
  underside: number,
  height: number,
  plate: number,
): Shape {
  return polygon('a', [
    [x(-outer), y(underside - plate)],
    [x(outer), y(underside - plate)],
    [x(outer), y(underside)],
    [x(boss), y(underside)],
    [x(boss), y(underside + height)],
    [x(-boss), y(underside + height)],
    [x(-boss), y(underside)],
    [x(-outer), y(underside)],
  ]);
}

function gapShapes(
  x: Along,
  y: Along,
  outer: number,
  inner: number,
  gap: number,
  shim: number | undefined,
): Shape[] {
  if (gap <= 0.005) return [];
  const role = shim === undefined ? 'gap' : 'shim';
  return [
    rectangle(role, x(-outer), y(-gap), x(-inner), y(0)),
    rectangle(role, x(inner), y(-gap), x(outer), y(0)),
    upright(
      y(-gap),
      y(0),
      x(outer) + 14,
      x(outer),
      `${shim === undefined ? 'gap' : 'shim'} ${gap.toFixed(2)}`,
      true,
    ),
  ];
}

/** The ring on which the boss rests instead of seating, or the floor it touches. */
function contact(x: Along, y: Along, input: SeatDrawingInput, bossEnd: number, depth: number): Shape[] {
  if (input.shim !== undefined || input.trim) return [];
  const [boss, recess] = [input.bossDiameter.value / 2, input.recessDiameter.value / 2];
  if (input.result.carriedBy === 'boss-on-face') {
    return [-1, 1].map((side) =>
      rectangle('overlap', x(side * recess), y(bossEnd) - 2.5, x(side * boss), y(bossEnd) + 2.5),
    );
  }
  return input.result.carriedBy === 'boss-on-floor'
    ? [rectangle('overlap', x(-boss), y(depth) - 2, x(boss), y(depth) + 2)]
    : [];
}

function tiltedPlate(
  top: number,
  outer: number,
  boss: number,
  height: number,
  plate: number,
  degrees: number,
  scale: number,
  text: string,
): Shape[] {
  const face = top + 74;
  const angle = (degrees * Math.PI) / 180;
  // Turns about the boss's rim on the right, which rests on the face.
  const turned = (px: number, py: number): [number, number] => {
    const [dx, dy] = [(px - boss) * scale, (py - 0) * scale];
    return [
      centre + boss * scale + dx * Math.cos(angle) - dy * Math.sin(angle),
      face + dx * Math.sin(angle) + dy * Math.cos(angle),
    ];
  };
  const bottom = -height;
  return [
    line('b', [centre - outer * scale, face], [centre + outer * scale, face]),
    polygon('a', [
      turned(-outer, bottom - plate),
      turned(outer, bottom - plate),
      turned(outer, bottom),
      turned(boss, bottom),
      turned(boss, 0),
      turned(-boss, 0),
      turned(-boss, bottom),
      turned(-outer, bottom),
    ]),
    line('centre', turned(0, bottom - plate - 6), turned(0, 4)),
    label([centre, face + 20], `pulled on one side: tilt ${text}`),
  ];
}

function describe(input: SeatDrawingInput): string[] {
  const { words, bossDiameter, recessDiameter, bossHeight, recessDepth, result } = input;
  const told = (dimension: Dimension | null): string =>
    dimension ? `${dimensionText(dimension)} mm` : 'not read yet, drawn as a stand-in';
  return [
    `Section through ${words.partA} above and ${words.partB} below, to scale.`,
    `${words.inner} ${dimensionText(bossDiameter)} mm across, ${told(bossHeight)} high; ${words.outer} ${dimensionText(recessDiameter)} mm across, ${told(recessDepth)} deep.`,
    input.shim !== undefined
      ? `A shim of ${millimetres(input.shim)} fills the gap between the faces.`
      : result.gap && result.gap.value > 0.005
        ? `The faces stay ${millimetres(result.gap.value)} apart.`
        : 'The faces meet.',
    ...(result.tilt?.worst && result.tilt.worst.degrees >= 0.01 && input.shim === undefined
      ? [
          `Pulled on one side the plate tips by ${result.tilt.worst.degrees.toFixed(2)} degrees, ${result.tilt.worst.arcMinutes.toFixed(0)} arc minutes.`,
        ]
      : []),
  ];
}
