import type { Callout } from '../contract/callouts.js';
import { direction, placeOf, type Place, type ShownSize } from './photo-places.js';

/** Text beside a callout: its lines stand centred one below the other about `at`, turned by `turn` degrees. */
export interface Lettering {
  readonly lines: readonly string[];
  readonly at: Place;
  readonly turn: number;
  /** Width and height of the lines together, before the turn. */
  readonly size: ShownSize;
  readonly taken: Taken;
}

/** The upright box that lettering takes up on the photo. */
export interface Taken {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** Height of a line and width of a letter of the mono face, which has one width for all, in pixels. */
export const letter = { size: 13, width: 7.8, line: 16 } as const;
/** Room that lettering keeps from the photo's edge and from its callout. */
const margin = 4;
const clear = 7;

/** Puts a callout's text where it fits: the first of the usual places that is inside and free, else the first, moved inside. */
export function letteringOf(
  text: string,
  callout: Callout,
  size: ShownSize,
  taken: readonly Taken[],
): Lettering {
  const lines = wrapped(text, Math.max(Math.floor((size.width - 2 * margin) / letter.width), 4));
  const wide = Math.max(...lines.map((one) => one.length)) * letter.width;
  const high = lines.length * letter.line;
  const wanted = placesFor(callout, size, wide, high).map(({ at, turn }): Lettering => {
    return { lines, at, turn, size: { width: wide, height: high }, taken: boxAround(at, wide, high, turn) };
  });
  const fits = wanted.find(
    (one) => isInside(one.taken, size) && taken.every((other) => !overlap(one.taken, other)),
  );
  return fits ?? movedInside(wanted.find((one) => one.turn === 0) ?? wanted[0]!, wide, high, size);
}

interface Spot {
  readonly at: Place;
  readonly turn: number;
}

function placesFor(callout: Callout, size: ShownSize, wide: number, high: number): Spot[] {
  if (callout.kind === 'ring') {
    return around(placeOf(callout.centre, size), callout.radius * size.width + clear, wide, high);
  }
  const from = placeOf(callout.from, size);
  const to = placeOf(callout.to, size);
  return callout.kind === 'arrow' ? behind(from, to, wide, high) : along(from, to, wide, high);
}

/** Level text to the right, left, above and below of a place, with this much room between. */
function around([x, y]: Place, room: number, wide: number, high: number): Spot[] {
  return [
    [x + room + wide / 2, y],
    [x - room - wide / 2, y],
    [x, y - room - high / 2],
    [x, y + room + high / 2],
  ].map(([left, top]) => ({ at: [left!, top!], turn: 0 }));
}

/** At the tail of an arrow: behind it in its own direction, then on the side of the tail that is farthest from its way. */
function behind(from: Place, to: Place, wide: number, high: number): Spot[] {
  const [ux, uy] = direction(from, to);
  const reach = Math.min(
    ux === 0 ? Infinity : (wide / 2 + clear) / Math.abs(ux),
    uy === 0 ? Infinity : (high / 2 + clear) / Math.abs(uy),
  );
  const ahead = ({ at }: Spot): number => (at[0] - from[0]) * ux + (at[1] - from[1]) * uy;
  return [
    { at: [from[0] - ux * reach, from[1] - uy * reach], turn: 0 },
    ...around(from, clear, wide, high).sort((one, other) => ahead(one) - ahead(other)),
  ];
}

/**
 * By ISO 129-1 a figure stands parallel to its dimension line, in the middle and just above it, to be read from below or
 * from the right. One that is longer than its line stands level beside it instead.
 */
function along(from: Place, to: Place, wide: number, high: number): Spot[] {
  const [ux, uy, length] = direction(from, to);
  const middle: Place = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2];
  const turn = readable((Math.atan2(uy, ux) * 180) / Math.PI);
  const radians = (turn * Math.PI) / 180;
  const up: Place = [Math.sin(radians), -Math.cos(radians)];
  const off = 3 + high / 2;
  const parallel = ([1, -1] as const).map((side): Spot => ({
    at: [middle[0] + side * up[0] * off, middle[1] + side * up[1] * off],
    turn,
  }));
  const [right, left, above, below] = around(middle, clear + 4, wide, high) as [Spot, Spot, Spot, Spot];
  const level = Math.abs(uy) > Math.abs(ux) ? [right, left] : [above, below];
  const elsewhere = [...around(to, clear + 14, wide, high), ...around(from, clear + 14, wide, high)];
  return wide > length - 8 ? [...level, ...elsewhere] : [...parallel, ...level, ...elsewhere];
}

/** The same slope from −90° up to but without 90°, so that text on it is never upside down. Degrees. */
export function readable(degrees: number): number {
  const turned = degrees > 90 ? degrees - 180 : degrees <= -90 ? degrees + 180 : degrees;
  // An upright figure is read from the right-hand side: it climbs.
  return turned === 90 ? -90 : turned;
}

function boxAround([x, y]: Place, wide: number, high: number, turn: number): Taken {
  const radians = (turn * Math.PI) / 180;
  const halfWide = (Math.abs(Math.cos(radians)) * wide + Math.abs(Math.sin(radians)) * high) / 2;
  const halfHigh = (Math.abs(Math.sin(radians)) * wide + Math.abs(Math.cos(radians)) * high) / 2;
  return { left: x - halfWide, top: y - halfHigh, right: x + halfWide, bottom: y + halfHigh };
}

function isInside(box: Taken, size: ShownSize): boolean {
  return (
    box.left >= margin &&
    box.top >= margin &&
    box.right <= size.width - margin &&
    box.bottom <= size.height - margin
  );
}

function overlap(one: Taken, other: Taken): boolean {
  return one.left < other.right && other.left < one.right && one.top < other.bottom && other.top < one.bottom;
}

function movedInside(lettering: Lettering, wide: number, high: number, size: ShownSize): Lettering {
  const within = (value: number, half: number, whole: number): number =>
    Math.min(Math.max(value, half + margin), Math.max(whole - half - margin, half + margin));
  const at: Place = [
    within(lettering.at[0], wide / 2, size.width),
    within(lettering.at[1], high / 2, size.height),
  ];
  return { ...lettering, at, turn: 0, taken: boxAround(at, wide, high, 0) };
}

/** Text in lines of at most `most` letters, broken between words; a word that is longer is cut. */
export function wrapped(text: string, most: number): string[] {
  const lines: string[] = [];
  for (const word of text.split(/\s+/).flatMap((one) => pieces(one, most))) {
    const last = lines.at(-1);
    if (last !== undefined && last.length + 1 + word.length <= most)
      lines[lines.length - 1] = `${last} ${word}`;
    else lines.push(word);
  }
  return lines;
}

function pieces(word: string, most: number): string[] {
  const letters = [...word];
  const cut: string[] = [];
  for (let start = 0; start < letters.length; start += most)
    cut.push(letters.slice(start, start + most).join(''));
  return cut;
}
