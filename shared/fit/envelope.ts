import { figure, type Dimension, type Figure } from './dimension.js';
import { chancePositive, type SeatVerdict } from './verdict.js';

/** A sector round the axis, degrees from 0 up to 360; `to` may pass 360. */
export interface AngleInterval {
  readonly from: number;
  readonly to: number;
}

/** A body round the common axis: a ring sector of some height. Radii and heights mm, angles degrees. */
export interface EnvelopeBody {
  readonly innerRadius: Dimension | null;
  readonly outerRadius: Dimension | null;
  readonly bottom: Dimension | null;
  readonly top: Dimension | null;
  /** Middle of the sector it fills as delivered; null where nobody has said where it stands. */
  readonly angle: Dimension | null;
  /** Angle it fills, over 0 up to 360. */
  readonly width: Dimension | null;
}

export interface EnvelopeResult {
  readonly verdict: SeatVerdict;
  /** How the bodies pass each other: beyond in radius, above or below, or beside each other in angle. */
  readonly passes: 'in-radius' | 'in-height' | 'in-angle' | null;
  /** Room between them in the direction in which they pass (radius or height, mm); overlap where negative. */
  readonly margin: Figure | null;
  readonly chance: number | null;
  /** Angles at which the second body's middle may stand; the whole circle when they pass in radius or height. */
  readonly freeAngles: readonly AngleInterval[] | null;
  /** Least turn that clears them, degrees, signed; null where none is needed or none helps. */
  readonly turnNeeded: number | null;
  readonly missing: readonly string[];
}

/**
 * A body that must go past an obstruction on the same axis, such as a motor past a clamp's thumb screw. They pass when
 * their radii or their heights do not overlap; otherwise the second one must stand at an angle where the sectors do not
 * meet. Room in radius is max(inner₂ − outer₁, inner₁ − outer₂), in height likewise; the chance of passing is Φ(room / u).
 * With an unknown angle the chance is the free share of the circle. First-order uncertainty; angles are taken 2 u apart.
 * Throws RangeError for a sector outside (0, 360] or an inner radius or bottom above its outer radius or top.
 */
export function judgeEnvelope(body: EnvelopeBody, obstruction: EnvelopeBody): EnvelopeResult {
  const missing = [...missingOf(body, 'body'), ...missingOf(obstruction, 'obstruction')];
  const inRadius = roomBetween(span(body, 'radius'), span(obstruction, 'radius'));
  const inHeight = roomBetween(span(body, 'height'), span(obstruction, 'height'));
  const best = [inRadius, inHeight].reduce<Figure | null>(
    (one, other) => (!one || (other && other.value > one.value) ? other : one),
    null,
  );
  if (!best)
    return {
      verdict: 'not-known',
      passes: null,
      margin: null,
      chance: null,
      freeAngles: null,
      turnNeeded: null,
      missing,
    };
  const past = chancePositive(best);
  if (past >= 0.95 || !inRadius || !inHeight) {
    if (past < 0.5)
      return {
        verdict: 'not-known',
        passes: null,
        margin: best,
        chance: null,
        freeAngles: null,
        turnNeeded: null,
        missing,
      };
    const verdict = past >= 0.95 ? (best.value > 0.5 ? 'seats-with-room' : 'seats-snugly') : 'tight';
    return {
      verdict,
      passes: best === inRadius ? 'in-radius' : 'in-height',
      margin: best,
      chance: past,
      freeAngles: wholeCircle,
      turnNeeded: null,
      missing,
    };
  }
  return besideEachOther(body, obstruction, best, past, missing);
}

const wholeCircle: readonly AngleInterval[] = [{ from: 0, to: 360 }];

function besideEachOther(
  body: EnvelopeBody,
  obstruction: EnvelopeBody,
  margin: Figure,
  past: number,
  missing: string[],
): EnvelopeResult {
  if (!body.angle || !body.width || !obstruction.width) {
    return {
      verdict: 'not-known',
      passes: null,
      margin,
      chance: null,
      freeAngles: null,
      turnNeeded: null,
      missing,
    };
  }
  for (const width of [body.width.value, obstruction.width.value]) {
    if (!(width > 0 && width <= 360)) throw new RangeError('A sector lies over 0° and up to 360°.');
  }
  const guard =
    2 * Math.hypot(body.angle.uncertainty, body.width.uncertainty / 2, obstruction.width.uncertainty / 2);
  const reach = body.width.value / 2 + obstruction.width.value / 2 + guard;
  if (reach >= 180)
    return {
      verdict: 'will-not-seat',
      passes: null,
      margin,
      chance: past,
      freeAngles: [],
      turnNeeded: null,
      missing,
    };
  const from = modulo(body.angle.value + reach);
  const freeAngles = [{ from, to: from + 360 - 2 * reach }];
  const share = (360 - 2 * reach) / 360;
  if (!obstruction.angle) {
    return {
      verdict: 'tight',
      passes: 'in-angle',
      margin,
      chance: past + (1 - past) * share,
      freeAngles,
      turnNeeded: null,
      missing,
    };
  }
  const apart = modulo(obstruction.angle.value - body.angle.value + 180) - 180;
  const clear = Math.abs(apart) >= reach;
  return {
    verdict: clear ? 'seats-with-room' : past <= 0.05 ? 'will-not-seat' : 'tight',
    passes: clear ? 'in-angle' : null,
    margin,
    chance: clear ? 1 : past,
    freeAngles,
    turnNeeded: clear ? null : (apart < 0 ? -1 : 1) * (reach - Math.abs(apart)),
    missing,
  };
}

type Span = { readonly low: Dimension; readonly high: Dimension } | null;

function span(body: EnvelopeBody, direction: 'radius' | 'height'): Span {
  const [low, high] = direction === 'radius' ? [body.innerRadius, body.outerRadius] : [body.bottom, body.top];
  if (!low || !high) return null;
  if (low.value > high.value)
    throw new RangeError(
      `The ${direction === 'radius' ? 'inner radius' : 'bottom'} must not lie beyond its other end.`,
    );
  return { low, high };
}

function roomBetween(one: Span, other: Span): Figure | null {
  if (!one || !other) return null;
  const outside = figure(
    other.low.value - one.high.value,
    Math.hypot(other.low.uncertainty, one.high.uncertainty),
  );
  const inside = figure(
    one.low.value - other.high.value,
    Math.hypot(one.low.uncertainty, other.high.uncertainty),
  );
  return outside.value >= inside.value ? outside : inside;
}

function missingOf(body: EnvelopeBody, side: string): string[] {
  return Object.entries(body).flatMap(([name, value]) => (value === null ? [`${side}.${name}`] : []));
}

function modulo(degrees: number): number {
  return ((degrees % 360) + 360) % 360;
}
