import type { EnvelopeBody, EnvelopeResult } from '../fit/envelope.js';
import { label, line, sector, type Drawing, type Shape } from './shapes.js';

const width = 360;
const centre: readonly [number, number] = [width / 2, 176];

interface KnownBody {
  readonly inner: number;
  readonly outer: number;
  readonly angle: number;
  readonly width: number;
}

/** Two bodies round one axis, seen from the sky, with the angles at which the second one is free. */
export function envelopePlan(
  body: EnvelopeBody,
  obstruction: EnvelopeBody,
  result: EnvelopeResult,
  words: { body: string; obstruction: string },
): Drawing | null {
  const [one, other] = [known(body), known(obstruction)];
  if (!one || !other) return null;
  const outer = Math.max(one.outer, other.outer);
  const scale = 122 / outer;
  const drawn = (role: 'a' | 'b' | 'overlap', { inner, outer: far, angle, width: fill }: KnownBody): Shape =>
    sector(role, centre, inner * scale, far * scale, angle - fill / 2, angle + fill / 2);
  const free = result.freeAngles ?? [];
  const shapes: Shape[] = [
    ...free.map((angles) =>
      sector('free', centre, (outer + 3) * scale, (outer + 7) * scale, angles.from, angles.to),
    ),
    drawn('a', one),
    drawn(result.verdict === 'will-not-seat' || result.verdict === 'tight' ? 'overlap' : 'b', other),
    line('centre', [centre[0] - outer * scale, centre[1]], [centre[0] + outer * scale, centre[1]]),
    line('centre', [centre[0], centre[1] - outer * scale], [centre[0], centre[1] + outer * scale]),
    label(
      [width / 2, centre[1] + outer * scale + 38],
      free.length > 0
        ? `free: ${free.map(({ from, to }) => `${Math.round(from)}° to ${Math.round(to) % 360 || 360}°`).join(', ')}`
        : 'no free angle',
    ),
    label(
      [width / 2, centre[1] + outer * scale + 58],
      '0° at the right, counter-clockwise, seen from the sky',
    ),
  ];
  return {
    width,
    height: Math.ceil(centre[1] + outer * scale + 70),
    shapes,
    scale,
    tiltFactor: null,
    description: [
      `${words.body} and ${words.obstruction} round their axis, seen from the sky, to scale.`,
      `${words.body} fills ${one.width.toFixed(0)} degrees round ${one.angle.toFixed(0)} degrees; ${words.obstruction} fills ${other.width.toFixed(0)} degrees round ${other.angle.toFixed(0)} degrees.`,
      free.length > 0
        ? `${words.obstruction} is free from ${Math.round(free[0]!.from)} to ${Math.round(free[0]!.to) % 360 || 360} degrees.`
        : 'No angle is free.',
    ],
  };
}

/** A body without an angle is drawn at the right; what is free tells the rest. */
function known(body: EnvelopeBody): KnownBody | null {
  if (!body.innerRadius || !body.outerRadius || !body.width) return null;
  return {
    inner: body.innerRadius.value,
    outer: body.outerRadius.value,
    angle: body.angle?.value ?? 0,
    width: body.width.value,
  };
}
