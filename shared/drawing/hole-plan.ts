import type { Dimension } from '../fit/dimension.js';
import { dimensionText } from './figures.js';
import { across, circle, label, line, type Drawing, type Shape } from './shapes.js';

const width = 360;
const centre: readonly [number, number] = [width / 2, 176];

/** Holes over taps, seen along the axis. Diameters mm. */
export function holePlan(
  input: { holeCircle: Dimension; hole: Dimension; tapCircle: Dimension; screw: number; count: number },
  words: { holes: string; taps: string },
): Drawing {
  const { holeCircle, hole, tapCircle, screw, count } = input;
  const outer = Math.max(holeCircle.value, tapCircle.value) / 2 + hole.value;
  const scale = 126 / outer;
  const places = (diameter: number): [number, number][] =>
    Array.from({ length: count }, (_, index) => {
      const angle = Math.PI / 2 + (2 * Math.PI * index) / count;
      return [
        centre[0] + (diameter / 2) * scale * Math.cos(angle),
        centre[1] - (diameter / 2) * scale * Math.sin(angle),
      ];
    });
  const fits = Math.abs(holeCircle.value - tapCircle.value) / 2 <= (hole.value - screw) / 2;
  const shapes: Shape[] = [
    circle('centre', centre, (holeCircle.value / 2) * scale),
    circle('thin', centre, (tapCircle.value / 2) * scale),
    ...places(holeCircle.value).map((at) => circle('a', at, (hole.value / 2) * scale)),
    ...places(tapCircle.value).map((at) => circle(fits ? 'b' : 'overlap', at, (screw / 2) * scale)),
    line('centre', [centre[0] - outer * scale - 8, centre[1]], [centre[0] + outer * scale + 8, centre[1]]),
    line('centre', [centre[0], centre[1] - outer * scale - 8], [centre[0], centre[1] + outer * scale + 8]),
    across(
      centre[0] - (holeCircle.value / 2) * scale,
      centre[0] + (holeCircle.value / 2) * scale,
      26,
      centre[1],
      `${dimensionText(holeCircle, '⌀')} holes`,
    ),
    across(
      centre[0] - (tapCircle.value / 2) * scale,
      centre[0] + (tapCircle.value / 2) * scale,
      centre[1] + outer * scale + 30,
      centre[1],
      `${dimensionText(tapCircle, '⌀')} taps`,
    ),
    label(
      [width / 2, centre[1] + outer * scale + 52],
      `holes ${dimensionText(hole, '⌀')}, screws ⌀${screw.toFixed(1)}`,
    ),
  ];
  return {
    width,
    height: Math.ceil(centre[1] + outer * scale + 64),
    shapes,
    scale,
    tiltFactor: null,
    description: [
      `${words.holes} over ${words.taps}, seen along the axis, to scale.`,
      `${count} holes of ${dimensionText(hole)} mm on a circle of ${dimensionText(holeCircle)} mm; screws of ${screw} mm on a circle of ${dimensionText(tapCircle)} mm.`,
    ],
  };
}
