import { judgeClampRing } from '../fit/clamp-ring.js';
import type { Dimension } from '../fit/dimension.js';
import { dimensionText } from './figures.js';
import { across, circle, label, line, polygon, rectangle, type Drawing, type Shape } from './shapes.js';

const width = 360;
const centre: readonly [number, number] = [width / 2, 178];

/** Barrel inside a split ring, seen along the axis: the ring with its screw slack, and dashed with the split closed. */
export function clampPlan(
  open: Dimension,
  closed: Dimension,
  barrel: Dimension,
  words: { ring: string; barrel: string },
): Drawing {
  const outer = Math.max(open.value, barrel.value) / 2 + 5;
  const scale = 118 / outer;
  const { verdict, sleeve } = judgeClampRing({ open, closed }, barrel);
  const radius = (value: number): number => (value / 2) * scale;
  const too = barrel.value > open.value;
  const shapes: Shape[] = [
    {
      ...circle('b', centre, outer * scale),
      d: circle('b', centre, outer * scale).d + circle('b', centre, radius(open.value)).d,
    },
    rectangle(
      'gap',
      centre[0] - 4,
      centre[1] - outer * scale - 4,
      centre[0] + 4,
      centre[1] - radius(open.value),
    ),
    circle('a', centre, radius(barrel.value)),
    ...(too
      ? [
          {
            ...circle('overlap', centre, radius(barrel.value)),
            d:
              circle('overlap', centre, radius(barrel.value)).d +
              circle('overlap', centre, radius(open.value)).d,
          },
        ]
      : []),
    circle('ghost', centre, radius(closed.value)),
    line('centre', [centre[0] - outer * scale - 12, centre[1]], [centre[0] + outer * scale + 12, centre[1]]),
    line('centre', [centre[0], centre[1] - outer * scale - 12], [centre[0], centre[1] + outer * scale + 12]),
    across(
      centre[0] - radius(barrel.value),
      centre[0] + radius(barrel.value),
      34,
      centre[1],
      dimensionText(barrel, '⌀'),
    ),
    across(
      centre[0] - radius(open.value),
      centre[0] + radius(open.value),
      centre[1] + outer * scale + 32,
      centre[1],
      `${dimensionText(open, '⌀')} open`,
    ),
    label([width / 2, centre[1] + outer * scale + 56], `${dimensionText(closed, '⌀')} closed (dashed)`),
  ];
  return {
    width,
    height: Math.ceil(centre[1] + outer * scale + 68),
    shapes,
    scale,
    tiltFactor: null,
    description: [
      `${words.barrel}, ${dimensionText(barrel)} mm, in ${words.ring}, seen along the axis, to scale.`,
      `The ring takes ${dimensionText(closed)} mm with the split closed to ${dimensionText(open)} mm with the screw slack.`,
      verdict === 'will-not-seat' && sleeve
        ? `A strip ${sleeve.value.toFixed(2)} mm thick round the barrel brings it into the range.`
        : '',
    ].filter((sentence) => sentence !== ''),
  };
}

/** Cross-section of a shaft in its bore, with flats where both have one. */
export function shaftSection(
  shaft: { diameter: Dimension; flat: Dimension | null },
  bore: { diameter: Dimension; flat: Dimension | null },
  words: { shaft: string; bore: string },
): Drawing {
  const outer = bore.diameter.value / 2 + Math.max(2, bore.diameter.value * 0.4);
  const scale = 118 / outer;
  const shaftOutline = flatted('a', shaft.diameter.value, shaft.flat?.value ?? null, scale);
  const boreOutline = flatted('b', bore.diameter.value, bore.flat?.value ?? null, scale);
  const shapes: Shape[] = [
    { ...boreOutline, d: circle('b', centre, outer * scale).d + boreOutline.d },
    shaftOutline,
    ...(shaft.diameter.value > bore.diameter.value
      ? [{ ...shaftOutline, role: 'overlap' as const, d: shaftOutline.d + boreOutline.d }]
      : []),
    line('centre', [centre[0] - outer * scale - 12, centre[1]], [centre[0] + outer * scale + 12, centre[1]]),
    line('centre', [centre[0], centre[1] - outer * scale - 12], [centre[0], centre[1] + outer * scale + 12]),
    across(
      centre[0] - (shaft.diameter.value / 2) * scale,
      centre[0] + (shaft.diameter.value / 2) * scale,
      34,
      centre[1],
      dimensionText(shaft.diameter, '⌀'),
    ),
    across(
      centre[0] - (bore.diameter.value / 2) * scale,
      centre[0] + (bore.diameter.value / 2) * scale,
      centre[1] + outer * scale + 32,
      centre[1],
      dimensionText(bore.diameter, '⌀'),
    ),
    ...(shaft.flat && bore.flat
      ? [
          label(
            [width / 2, centre[1] + outer * scale + 54],
            `across the flat: shaft ${dimensionText(shaft.flat)}, bore ${dimensionText(bore.flat)}`,
          ),
        ]
      : []),
  ];
  return {
    width,
    height: Math.ceil(centre[1] + outer * scale + 66),
    shapes,
    scale,
    tiltFactor: null,
    description: [
      `${words.shaft}, ${dimensionText(shaft.diameter)} mm, in ${words.bore}, ${dimensionText(bore.diameter)} mm, in cross-section, to scale.`,
    ],
  };
}

/** A circle of `diameter` cut by a flat so that `across` is left from the flat to the far side; the flat lies on top. */
function flatted(
  role: 'a' | 'b',
  diameter: number,
  across: number | null,
  scale: number,
): { kind: 'path'; role: 'a' | 'b'; d: string } {
  const radius = diameter / 2;
  const height = across === null ? radius : across - radius;
  if (height >= radius) return { kind: 'path', role, d: circle(role, centre, radius * scale).d };
  const start = Math.acos(Math.max(-1, Math.min(1, height / radius)));
  const points = Array.from({ length: 61 }, (_, index): [number, number] => {
    const angle = Math.PI / 2 - start - ((2 * Math.PI - 2 * start) * index) / 60;
    return [centre[0] + radius * scale * Math.cos(angle), centre[1] - radius * scale * Math.sin(angle)];
  });
  return { kind: 'path', role, d: polygon(role, points).d };
}
