/** What a shape stands for; the theme gives each role its line and fill. */
export type ShapeRole = 'a' | 'b' | 'overlap' | 'gap' | 'shim' | 'centre' | 'thin' | 'free' | 'ghost';

export interface PathShape {
  readonly kind: 'path';
  readonly role: ShapeRole;
  readonly d: string;
}

/** A dimension line by ISO 129: line between two ends with arrow heads, its extension lines, and the figure on it. */
export interface DimensionShape {
  readonly kind: 'dimension';
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
  /** Ends on the drawing which the extension lines start from. */
  readonly extensions: readonly (readonly [number, number, number, number])[];
  readonly text: string;
  readonly textAt: readonly [number, number];
  readonly vertical: boolean;
  /** Worked out (gap, overlap) rather than measured. */
  readonly derived: boolean;
}

export interface LabelShape {
  readonly kind: 'label';
  readonly at: readonly [number, number];
  readonly text: string;
  readonly anchor: 'start' | 'middle' | 'end';
}

export type Shape = PathShape | DimensionShape | LabelShape;

/** A drawing in a box of `width` by `height` units; one unit is a pixel on a phone. */
export interface Drawing {
  readonly width: number;
  readonly height: number;
  readonly shapes: readonly Shape[];
  /** Units for a millimetre; null where the drawing is not to scale. */
  readonly scale: number | null;
  /** How many times larger than true the tilt is drawn; null where none is drawn. */
  readonly tiltFactor: number | null;
  /** What the drawing shows, in sentences, for those who cannot see it. */
  readonly description: readonly string[];
}

type Point = readonly [number, number];

const round = (value: number): string => String(Math.round(value * 100) / 100);

export function polygon(role: ShapeRole, points: readonly Point[]): PathShape {
  return { kind: 'path', role, d: `M${points.map(([x, y]) => `${round(x)} ${round(y)}`).join('L')}Z` };
}

export function line(role: ShapeRole, from: Point, to: Point): PathShape {
  return { kind: 'path', role, d: `M${round(from[0])} ${round(from[1])}L${round(to[0])} ${round(to[1])}` };
}

export function rectangle(
  role: ShapeRole,
  left: number,
  top: number,
  right: number,
  bottom: number,
): PathShape {
  return polygon(role, [
    [left, top],
    [right, top],
    [right, bottom],
    [left, bottom],
  ]);
}

export function circle(role: ShapeRole, [x, y]: Point, radius: number): PathShape {
  const r = round(radius);
  return {
    kind: 'path',
    role,
    d: `M${round(x - radius)} ${round(y)}a${r} ${r} 0 1 0 ${round(2 * radius)} 0a${r} ${r} 0 1 0 ${round(-2 * radius)} 0Z`,
  };
}

/** Ring sector round a centre, angles in degrees counter-clockwise from the right, as on the part seen from the sky. */
export function sector(
  role: ShapeRole,
  centre: Point,
  inner: number,
  outer: number,
  from: number,
  to: number,
): PathShape {
  if (to - from >= 359.99) {
    return {
      kind: 'path',
      role,
      d: circle(role, centre, outer).d + (inner > 0 ? circle(role, centre, inner).d : ''),
    };
  }
  const at = (radius: number, degrees: number): string => {
    const angle = (degrees * Math.PI) / 180;
    return `${round(centre[0] + radius * Math.cos(angle))} ${round(centre[1] - radius * Math.sin(angle))}`;
  };
  const large = to - from > 180 ? 1 : 0;
  const back =
    inner > 0
      ? `L${at(inner, to)}A${round(inner)} ${round(inner)} 0 ${large} 1 ${at(inner, from)}`
      : `L${round(centre[0])} ${round(centre[1])}`;
  return {
    kind: 'path',
    role,
    d: `M${at(outer, from)}A${round(outer)} ${round(outer)} 0 ${large} 0 ${at(outer, to)}${back}Z`,
  };
}

/** A horizontal dimension at height `y` between two places whose edges lie at `edgeY`. */
export function across(
  left: number,
  right: number,
  y: number,
  edgeY: number,
  text: string,
  derived = false,
): DimensionShape {
  const beyond = y < edgeY ? -3 : 3;
  const narrow = right - left < text.length * 6.5;
  return {
    kind: 'dimension',
    from: [left, y],
    to: [right, y],
    text,
    derived,
    vertical: false,
    extensions: [
      [left, edgeY, left, y + beyond],
      [right, edgeY, right, y + beyond],
    ],
    textAt: narrow ? [right + 6 + text.length * 3.25, y + 4] : [(left + right) / 2, y - 4],
  };
}

/** A vertical dimension at `x` between two heights whose edges lie at `edgeX`; its figure stands beside it. */
export function upright(
  top: number,
  bottom: number,
  x: number,
  edgeX: number,
  text: string,
  derived = false,
): DimensionShape {
  const beyond = x < edgeX ? -3 : 3;
  return {
    kind: 'dimension',
    from: [x, top],
    to: [x, bottom],
    text,
    derived,
    vertical: true,
    extensions: [
      [edgeX, top, x + beyond, top],
      [edgeX, bottom, x + beyond, bottom],
    ],
    textAt: [x + (x < edgeX ? -6 : 6), (top + bottom) / 2 + 4],
  };
}

export function label(at: Point, text: string, anchor: LabelShape['anchor'] = 'middle'): LabelShape {
  return { kind: 'label', at, text, anchor };
}
