import type { Callout, CalloutKind, PhotoPoint } from '../contract/callouts.js';
import { placeOf, type Place, type ShownSize } from './photo-places.js';

/** What a callout is moved by: its two ends, or centre and edge of a ring. */
export type EndName = 'from' | 'to' | 'centre' | 'edge';

export interface CalloutEnd {
  readonly name: EndName;
  readonly at: PhotoPoint;
}

const smallestRadius = 0.005;

/** A new callout from one place to another, still without label and value. `ratio` is the photo's width by its height. */
export function calloutBetween(
  kind: CalloutKind,
  key: string,
  from: PhotoPoint,
  to: PhotoPoint,
  ratio: number,
): Callout {
  switch (kind) {
    case 'ring':
      return { kind, key, label: '', centre: from, radius: radiusBetween(from, to, ratio) };
    case 'arrow':
      return { kind, key, label: '', from, to };
    case 'dimension':
      return { kind, key, label: '', from, to, value: null, unit: 'mm' };
  }
}

/** The ends of a callout. A ring's edge stands to the right of its centre, or where there is room for it on the photo. */
export function endsOf(callout: Callout, ratio: number): CalloutEnd[] {
  if (callout.kind !== 'ring') {
    return [
      { name: 'from', at: callout.from },
      { name: 'to', at: callout.to },
    ];
  }
  const { centre, radius } = callout;
  const edges: PhotoPoint[] = [
    { x: centre.x + radius, y: centre.y },
    { x: centre.x - radius, y: centre.y },
    { x: centre.x, y: centre.y + radius * ratio },
    { x: centre.x, y: centre.y - radius * ratio },
  ];
  return [
    { name: 'centre', at: centre },
    { name: 'edge', at: edges.find(isOnPhoto) ?? onPhoto(edges[0]!) },
  ];
}

/** The callout with one of its ends elsewhere; a place outside is moved to the photo's edge. */
export function withEnd(callout: Callout, end: EndName, to: PhotoPoint, ratio: number): Callout {
  const at = onPhoto(to);
  if (callout.kind === 'ring') {
    return end === 'centre'
      ? { ...callout, centre: at }
      : { ...callout, radius: radiusBetween(callout.centre, at, ratio) };
  }
  return end === 'from' ? { ...callout, from: at } : { ...callout, to: at };
}

/** The place itself, or the nearest one on the photo, in steps of a ten-thousandth so that texts stay short. */
export function onPhoto({ x, y }: PhotoPoint): PhotoPoint {
  const within = (value: number): number => short(Math.min(1, Math.max(0, value)));
  return { x: within(x), y: within(y) };
}

/** The callout under a place, the uppermost first; null where none passes within `reach` pixels. */
export function calloutAt(
  place: Place,
  callouts: readonly Callout[],
  size: ShownSize,
  reach: number,
): Callout | null {
  return callouts.findLast((callout) => distanceTo(callout, place, size) <= reach) ?? null;
}

function distanceTo(callout: Callout, place: Place, size: ShownSize): number {
  if (callout.kind === 'ring') {
    const [x, y] = placeOf(callout.centre, size);
    const fromCentre = Math.hypot(place[0] - x, place[1] - y);
    const radius = callout.radius * size.width;
    // The inside of a small ring counts as the ring: nothing else can be hit there.
    return fromCentre < radius && radius < 40 ? 0 : Math.abs(fromCentre - radius);
  }
  const from = placeOf(callout.from, size);
  const to = placeOf(callout.to, size);
  const [dx, dy] = [to[0] - from[0], to[1] - from[1]];
  const square = dx * dx + dy * dy;
  const share = square === 0 ? 0 : ((place[0] - from[0]) * dx + (place[1] - from[1]) * dy) / square;
  const nearest = Math.min(1, Math.max(0, share));
  return Math.hypot(place[0] - from[0] - nearest * dx, place[1] - from[1] - nearest * dy);
}

/** Distance as a share of the photo's width. */
function radiusBetween(centre: PhotoPoint, edge: PhotoPoint, ratio: number): number {
  const distance = Math.hypot(edge.x - centre.x, (edge.y - centre.y) / ratio);
  return short(Math.min(1, Math.max(smallestRadius, distance)));
}

function isOnPhoto({ x, y }: PhotoPoint): boolean {
  return x >= 0 && x <= 1 && y >= 0 && y <= 1;
}

function short(value: number): number {
  return Math.round(value * 10_000) / 10_000;
}
