import type { Callout } from '../contract/callouts.js';
import { calloutFigure } from '../text/callout-words.js';
import { letteringOf, type Lettering, type Taken } from './callout-lettering.js';
import { direction, placeOf, type Place, type ShownSize } from './photo-places.js';

/** One callout as it is drawn on a photo of a given size. All lengths in pixels. */
export interface DrawnCallout {
  readonly key: string;
  readonly kind: Callout['kind'];
  /** SVG path of the strokes. */
  readonly strokes: string;
  /** SVG path of the filled arrow heads; empty for a ring. */
  readonly heads: string;
  /** What stands beside it, inside the photo; null where it has neither label nor value. */
  readonly lettering: Lettering | null;
}

/** Slim filled heads as ISO 129-1 draws them: three times as long as wide. */
const head = { length: 10, halfWidth: 1.7 };
/** An arrow that points out something is bolder than a dimension's. */
const pointer = { length: 13, halfWidth: 4 };
/** How far extension lines stand out to either side of the dimension line. */
const extension = 7;
/** How far the line goes on outside where the heads have no room between the ends. */
const tail = 18;

/**
 * Draws callouts for a photo shown at a size: heads, extension lines and lettering keep their size in pixels whatever the
 * photo's. Lettering is placed in order, inside the photo and clear of what stands there already where that can be done.
 */
export function drawCallouts(callouts: readonly Callout[], size: ShownSize): DrawnCallout[] {
  const taken: Taken[] = [];
  return callouts.map((callout) => {
    const text = [callout.label.trim(), calloutFigure(callout)].filter(Boolean).join(' ');
    const drawn = linesOf(callout, size);
    const lettering = text === '' ? null : letteringOf(text, callout, size, taken);
    if (lettering) taken.push(lettering.taken);
    return { key: callout.key, kind: callout.kind, ...drawn, lettering };
  });
}

function linesOf(callout: Callout, size: ShownSize): Pick<DrawnCallout, 'strokes' | 'heads'> {
  switch (callout.kind) {
    case 'ring':
      return { strokes: circle(placeOf(callout.centre, size), callout.radius * size.width), heads: '' };
    case 'arrow':
      return arrow(placeOf(callout.from, size), placeOf(callout.to, size));
    case 'dimension':
      return dimension(placeOf(callout.from, size), placeOf(callout.to, size));
  }
}

/** Line and head of an arrow. The line ends where the head begins to widen, so that the tip stays sharp. */
function arrow(from: Place, to: Place): Pick<DrawnCallout, 'strokes' | 'heads'> {
  const [ux, uy, length] = direction(from, to);
  const end = Math.max(length - pointer.length * 0.8, 0);
  return {
    strokes: `M${at(from)}L${at([from[0] + ux * end, from[1] + uy * end])}`,
    heads: headAt(to, [-ux, -uy], pointer),
  };
}

/** Dimension line with a head at either end, and an extension line across each; heads stand outside where it is short. */
function dimension(from: Place, to: Place): Pick<DrawnCallout, 'strokes' | 'heads'> {
  const [ux, uy, length] = direction(from, to);
  const outside = length < head.length * 2.4;
  const over = outside ? tail : 0;
  const along: Place[] = [
    [from[0] - ux * over, from[1] - uy * over],
    [to[0] + ux * over, to[1] + uy * over],
  ];
  const across = [from, to].map(
    ([x, y]) =>
      `M${at([x - uy * extension, y + ux * extension])}L${at([x + uy * extension, y - ux * extension])}`,
  );
  const inward: Place = outside ? [-ux, -uy] : [ux, uy];
  return {
    strokes: `M${at(along[0]!)}L${at(along[1]!)}${across.join('')}`,
    heads: headAt(from, inward, head) + headAt(to, [-inward[0], -inward[1]], head),
  };
}

/** A head with its tip at a place; it widens in the direction given. */
export function headAt(
  [x, y]: Place,
  [dx, dy]: Place,
  { length, halfWidth }: { readonly length: number; readonly halfWidth: number },
): string {
  const base: Place = [x + dx * length, y + dy * length];
  const one: Place = [base[0] - dy * halfWidth, base[1] + dx * halfWidth];
  const other: Place = [base[0] + dy * halfWidth, base[1] - dx * halfWidth];
  return `M${at([x, y])}L${at(one)}L${at(other)}Z`;
}

function circle([x, y]: Place, radius: number): string {
  const r = rounded(radius);
  return `M${at([x - radius, y])}a${r} ${r} 0 1 0 ${rounded(2 * radius)} 0a${r} ${r} 0 1 0 ${rounded(-2 * radius)} 0Z`;
}

function at([x, y]: Place): string {
  return `${rounded(x)} ${rounded(y)}`;
}

function rounded(value: number): number {
  return Math.round(value * 100) / 100 + 0;
}
