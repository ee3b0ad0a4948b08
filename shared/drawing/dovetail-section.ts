import type { Dimension } from '../fit/dimension.js';
import { dimensionText } from './figures.js';
import { across, label, line, polygon, upright, type Drawing, type Shape } from './shapes.js';

const width = 360;

/** Dovetail bar under its clamp's jaws, in cross-section. Widths and heights mm, angles degrees. */
export function dovetailSection(
  bar: DovetailBody,
  clamp: DovetailBody,
  words: { bar: string; clamp: string },
): Drawing {
  const high = Math.max(bar.referenceHeight.value, clamp.referenceHeight.value, 4) * 1.6;
  const widest = widthAt(bar, 0) + 16;
  const scale = Math.min(220 / (widest + 10), 110 / (high + 8));
  const face = 70;
  const x = (value: number): number => width / 2 + value * scale;
  const y = (value: number): number => face + value * scale;
  const trapezoid = (body: DovetailBody): [number, number][] => [
    [-widthAt(body, 0) / 2, 0],
    [widthAt(body, 0) / 2, 0],
    [widthAt(body, high) / 2, high],
    [-widthAt(body, high) / 2, high],
  ];
  const jaws = trapezoid(clamp);
  const wide = bar.width.value > widthAt(clamp, bar.referenceHeight.value);
  const shapes: Shape[] = [
    polygon(
      wide ? 'overlap' : 'a',
      trapezoid(bar).map(([px, py]) => [x(px), y(py)]),
    ),
    polygon('b', [
      [x(jaws[3]![0]), y(high)],
      [x(jaws[0]![0]), y(0)],
      [x(-widest / 2 - 4), y(0)],
      [x(-widest / 2 - 4), y(high + 5)],
      [x(widest / 2 + 4), y(high + 5)],
      [x(widest / 2 + 4), y(0)],
      [x(jaws[1]![0]), y(0)],
      [x(jaws[2]![0]), y(high)],
    ]),
    line('centre', [width / 2, y(-3)], [width / 2, y(high + 8)]),
    across(
      x(-bar.width.value / 2),
      x(bar.width.value / 2),
      30,
      y(bar.referenceHeight.value),
      dimensionText(bar.width),
    ),
    across(
      x(-clamp.width.value / 2),
      x(clamp.width.value / 2),
      y(high + 5) + 30,
      y(clamp.referenceHeight.value),
      `${dimensionText(clamp.width)} open`,
    ),
    upright(
      y(0),
      y(bar.referenceHeight.value),
      x(-widest / 2 - 4) - 12,
      x(-bar.width.value / 2),
      bar.referenceHeight.value.toFixed(1),
    ),
    label(
      [width / 2, y(high + 5) + 54],
      `flanks ${bar.flankAngle.value.toFixed(1)}° and ${clamp.flankAngle.value.toFixed(1)}°`,
    ),
  ];
  return {
    width,
    height: Math.ceil(y(high + 5) + 66),
    shapes,
    scale,
    tiltFactor: null,
    description: [
      `${words.bar}, ${dimensionText(bar.width)} mm wide at ${bar.referenceHeight.value.toFixed(1)} mm, in ${words.clamp} opened to ${dimensionText(clamp.width)} mm, in cross-section, to scale.`,
    ],
  };
}

export interface DovetailBody {
  readonly width: Dimension;
  readonly referenceHeight: Dimension;
  readonly flankAngle: Dimension;
}

function widthAt(body: DovetailBody, height: number): number {
  return (
    body.width.value -
    (2 * (height - body.referenceHeight.value)) / Math.tan((body.flankAngle.value * Math.PI) / 180)
  );
}
