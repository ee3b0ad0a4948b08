import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Callout, PhotoPoint } from '../contract/callouts.js';
import { letter, readable, wrapped } from './callout-lettering.js';
import { drawCallouts, headAt, type DrawnCallout } from './photo-callouts.js';

const phone = { width: 358, height: 239 };

const dimension = (from: PhotoPoint, to: PhotoPoint, label = '', value: number | null = 22.5): Callout => ({
  kind: 'dimension',
  key: `dimension-${from.x}-${from.y}-${to.x}-${to.y}`,
  label,
  from,
  to,
  value,
  unit: 'mm',
});
const ring = (centre: PhotoPoint, radius: number, label = 'lip'): Callout => ({
  kind: 'ring',
  key: `ring-${centre.x}-${centre.y}`,
  label,
  centre,
  radius,
});
const arrow = (from: PhotoPoint, to: PhotoPoint, label = 'rim'): Callout => ({
  kind: 'arrow',
  key: `arrow-${from.x}-${from.y}`,
  label,
  from,
  to,
});

const draw = (callout: Callout, size = phone): DrawnCallout => drawCallouts([callout], size)[0]!;

/** Absolute places of a path that has only M and L in it. */
function placesIn(path: string): [number, number][] {
  return [...path.matchAll(/[ML](-?[\d.]+) (-?[\d.]+)/g)].map(([, x, y]) => [Number(x), Number(y)]);
}

describe('an arrow head', () => {
  test('has its tip where it points and widens away from there', () => {
    expect(placesIn(headAt([100, 50], [-1, 0], { length: 12, halfWidth: 4 }))).toEqual([
      [100, 50],
      [88, 46],
      [88, 54],
    ]);
  });

  test('keeps its size whatever the size of the photo', () => {
    const across = ([, one, other]: [number, number][]): number =>
      Math.hypot(one![0] - other![0], one![1] - other![1]);
    const callout = arrow({ x: 0.1, y: 0.1 }, { x: 0.9, y: 0.8 });
    const small = across(placesIn(draw(callout, phone).heads));
    const large = across(placesIn(draw(callout, { width: 1400, height: 934 }).heads));
    expect(large).toBeCloseTo(small, 1);
  });
});

describe('a dimension', () => {
  test('has a head at either end that points outwards', () => {
    const [tipA, baseA, , tipB, baseB] = placesIn(
      draw(dimension({ x: 0.25, y: 0.5 }, { x: 0.75, y: 0.5 })).heads,
    );
    expect(tipA).toEqual([89.5, 119.5]);
    expect(tipB).toEqual([268.5, 119.5]);
    expect(baseA![0]).toBeGreaterThan(tipA![0]);
    expect(baseB![0]).toBeLessThan(tipB![0]);
  });

  test('too short for both heads has them outside, pointing inwards', () => {
    const [tipA, baseA, , tipB, baseB] = placesIn(
      draw(dimension({ x: 0.5, y: 0.5 }, { x: 0.54, y: 0.5 })).heads,
    );
    expect(baseA![0]).toBeLessThan(tipA![0]);
    expect(baseB![0]).toBeGreaterThan(tipB![0]);
  });

  test('has an extension line square to it at either end', () => {
    const [, , from, to] = placesIn(draw(dimension({ x: 0.25, y: 0.5 }, { x: 0.75, y: 0.5 })).strokes);
    expect(from![0]).toBeCloseTo(to![0], 6);
    expect(Math.abs(from![1] - to![1])).toBeCloseTo(14, 6);
  });

  test('carries its figure above the middle, along the line', () => {
    const { lettering } = draw(dimension({ x: 0.2, y: 0.5 }, { x: 0.8, y: 0.5 }, 'lip'));
    expect(lettering).toMatchObject({ lines: ['lip 22.5 mm'], turn: 0 });
    expect(lettering!.at[0]).toBeCloseTo(phone.width / 2, 6);
    expect(lettering!.at[1]).toBeLessThan(phone.height / 2);
  });

  test('that stands upright is read from the right, whichever end was drawn first', () => {
    const [top, foot] = [
      { x: 0.5, y: 0.1 },
      { x: 0.5, y: 0.9 },
    ];
    for (const callout of [dimension(top, foot), dimension(foot, top)]) {
      const { lettering } = draw(callout);
      expect(lettering!.turn).toBe(-90);
      expect(lettering!.at[0]).toBeLessThan(phone.width / 2);
    }
  });

  test('without value and words carries no lettering', () => {
    expect(draw(dimension({ x: 0.2, y: 0.5 }, { x: 0.8, y: 0.5 }, '', null)).lettering).toBeNull();
  });

  test('whose ends are one place is drawn all the same', () => {
    const { strokes, heads } = draw(dimension({ x: 0.5, y: 0.5 }, { x: 0.5, y: 0.5 }));
    expect(strokes + heads).not.toMatch(/NaN|Infinity/);
  });
});

test('a ring is a true circle on a photo of any shape', () => {
  const path = draw(ring({ x: 0.5, y: 0.5 }, 0.1), { width: 400, height: 900 }).strokes;
  expect(path).toBe('M160 450a40 40 0 1 0 80 0a40 40 0 1 0 -80 0Z');
});

describe('lettering', () => {
  const anyPoint = fc.record({
    x: fc.double({ min: 0, max: 1, noNaN: true }),
    y: fc.double({ min: 0, max: 1, noNaN: true }),
  });
  const anyLabel = fc.string({ minLength: 1, maxLength: 80, unit: fc.constantFrom('l', 'i', 'p', ' ') });
  const anyCallout = fc.oneof(
    fc.tuple(anyPoint, anyPoint, anyLabel).map(([from, to, label]) => dimension(from, to, label)),
    fc.tuple(anyPoint, anyPoint, anyLabel).map(([from, to, label]) => arrow(from, to, label)),
    fc
      .tuple(anyPoint, fc.double({ min: 0.005, max: 1, noNaN: true }), anyLabel)
      .map(([centre, radius, label]) => ring(centre, radius, label)),
  );

  test('never leaves the photo, wherever its callout stands', () => {
    fc.assert(
      fc.property(anyCallout, (callout) => {
        const box = draw(callout).lettering?.taken;
        if (!box) return;
        expect(box.left).toBeGreaterThanOrEqual(0);
        expect(box.top).toBeGreaterThanOrEqual(0);
        expect(box.right).toBeLessThanOrEqual(phone.width);
        expect(box.bottom).toBeLessThanOrEqual(phone.height);
      }),
    );
  });

  test('of a ring at the right edge stands to its left', () => {
    const { lettering } = draw(ring({ x: 0.95, y: 0.5 }, 0.03));
    expect(lettering!.taken.right).toBeLessThan(0.92 * phone.width);
  });

  test('of an arrow stands behind its tail, not on its way', () => {
    const { lettering } = draw(arrow({ x: 0.5, y: 0.5 }, { x: 0.8, y: 0.5 }));
    expect(lettering!.taken.right).toBeLessThan(0.5 * phone.width);
  });

  test('keeps clear of what stands there already', () => {
    const [one, other] = drawCallouts(
      [ring({ x: 0.5, y: 0.5 }, 0.05, 'lip'), ring({ x: 0.5, y: 0.52 }, 0.05, 'rim')],
      phone,
    ).map((drawn) => drawn.lettering!.taken);
    const apart =
      one!.right <= other!.left ||
      other!.right <= one!.left ||
      one!.bottom <= other!.top ||
      other!.bottom <= one!.top;
    expect(apart).toBe(true);
  });

  test('longer than the photo is wide is broken between words', () => {
    const { lettering } = draw(ring({ x: 0.5, y: 0.5 }, 0.05, 'lip of the bracket '.repeat(4)));
    expect(lettering!.lines.length).toBeGreaterThan(1);
    for (const line of lettering!.lines) expect(line.length * letter.width).toBeLessThan(phone.width);
  });

  test('is cut where one word is longer than a line', () => {
    expect(wrapped('abcdefgh ij', 4)).toEqual(['abcd', 'efgh', 'ij']);
  });

  test.each([
    [0, 0],
    [90, -90],
    [-90, -90],
    [91, -89],
    [180, 0],
    [-135, 45],
  ])('on a slope of %d° is turned by %d°', (slope, turn) => {
    expect(readable(slope)).toBe(turn);
  });
});
