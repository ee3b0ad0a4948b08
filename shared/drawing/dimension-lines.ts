import type { DimensionShape } from './shapes.js';

/** The dimension line with its extension lines, as the data of one path. */
export function dimensionLines(shape: DimensionShape): string {
  const line = `M${shape.from.join(' ')}L${shape.to.join(' ')}`;
  return line + shape.extensions.map(([x1, y1, x2, y2]) => `M${x1} ${y1}L${x2} ${y2}`).join('');
}

/** Slim arrow heads; outside pointing in where there is no room between the ends. */
export function dimensionHeads({ from, to, vertical }: DimensionShape): string {
  const length = vertical ? to[1] - from[1] : to[0] - from[0];
  const inward = Math.abs(length) < 16 ? -1 : 1;
  const head = (x: number, y: number, direction: number): string =>
    vertical ? `M${x} ${y}l-2 ${7 * direction}l4 0Z` : `M${x} ${y}l${7 * direction} -2l0 4Z`;
  return head(from[0], from[1], inward) + head(to[0], to[1], -inward);
}

/** How the figure stands at its place. */
export function dimensionAnchor({ vertical, textAt, from }: DimensionShape): 'start' | 'middle' | 'end' {
  if (!vertical) return 'middle';
  return textAt[0] < from[0] ? 'end' : 'start';
}
