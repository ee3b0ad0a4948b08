import type { Dimension } from '../fit/dimension.js';
import { dimensionText } from './figures.js';
import { label, line, polygon, rectangle, upright, type Drawing, type Shape } from './shapes.js';

const width = 360;

/** A male thread in a female one, in section; the thread is shown by its thin inner line (ISO 6410). Lengths mm. */
export function threadSection(
  male: { diameter: number; minor: number; length: Dimension },
  depth: Dimension,
  words: { male: string; female: string },
  designations: readonly [string, string],
): Drawing {
  const half = male.diameter / 2;
  const wall = Math.max(3, half * 0.18);
  const standOff = Math.max(0, male.length.value - depth.value);
  const high = depth.value + wall;
  const scale = Math.min(172 / (2 * (half + wall)), 150 / (high + standOff + wall));
  const x = (value: number): number => width / 2 + value * scale;
  const face = 60 + (wall + standOff) * scale;
  const y = (value: number): number => face + value * scale;
  const end = male.length.value - standOff;
  const shapes: Shape[] = [
    polygon('b', [
      [x(-half - wall), y(0)],
      [x(-half), y(0)],
      [x(-half), y(depth.value)],
      [x(half), y(depth.value)],
      [x(half), y(0)],
      [x(half + wall), y(0)],
      [x(half + wall), y(high)],
      [x(-half - wall), y(high)],
    ]),
    polygon('a', [
      [x(-half - wall), y(-standOff - wall)],
      [x(half + wall), y(-standOff - wall)],
      [x(half + wall), y(-standOff)],
      [x(half), y(-standOff)],
      [x(half), y(end)],
      [x(-half), y(end)],
      [x(-half), y(-standOff)],
      [x(-half - wall), y(-standOff)],
    ]),
    ...[-1, 1].map((side) =>
      line('thin', [x((side * male.minor) / 2), y(-standOff)], [x((side * male.minor) / 2), y(end)]),
    ),
    ...(standOff > 0
      ? [
          rectangle('overlap', x(-half), y(depth.value) - 2, x(half), y(depth.value) + 2),
          upright(
            y(-standOff),
            y(0),
            x(half + wall) + 14,
            x(half + wall),
            `gap ${standOff.toFixed(2)}`,
            true,
          ),
        ]
      : []),
    line('centre', [width / 2, y(-standOff - wall) - 10], [width / 2, y(high) + 10]),
    upright(y(-standOff), y(end), x(-half - wall) - 14, x(-half), male.length.value.toFixed(2)),
    upright(y(0), y(depth.value), x(-half - wall) - 56, x(-half), depth.value.toFixed(2)),
    label(
      [width / 2, 28],
      designations[0] === designations[1] ? designations[0] : `${designations[0]} in ${designations[1]}`,
    ),
    label([width / 2, y(high) + 34], `male ${dimensionText(male.length)}, female ${dimensionText(depth)}`),
  ];
  return {
    width,
    height: Math.ceil(y(high) + 46),
    shapes,
    scale,
    tiltFactor: null,
    description: [
      `${words.male}, thread ${dimensionText(male.length)} mm long, in ${words.female}, ${dimensionText(depth)} mm deep, in section, to scale.`,
      standOff > 0
        ? `It bottoms and the shoulders stay ${standOff.toFixed(2)} mm apart.`
        : 'The shoulders meet.',
    ],
  };
}
