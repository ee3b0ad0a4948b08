import { describe, expect, test } from 'vitest';
import type { Callout } from '../contract/callouts.js';
import { calloutAt, calloutBetween, endsOf, onPhoto, withEnd } from './callout-ends.js';

/** A photo twice as wide as it is high. */
const ratio = 2;
const size = { width: 400, height: 200 };
const place = (x: number, y: number) => ({ x, y });
const ring: Callout = { kind: 'ring', key: 'ring-one', label: '', centre: place(0.5, 0.5), radius: 0.1 };
const arrow: Callout = {
  kind: 'arrow',
  key: 'arrow-one',
  label: '',
  from: place(0.1, 0.1),
  to: place(0.9, 0.1),
};

describe('a callout drawn between two places', () => {
  test('has its radius in shares of the width, also where it was drawn downwards', () => {
    expect(calloutBetween('ring', 'ring-two', place(0.5, 0.5), place(0.5, 0.7), ratio)).toMatchObject({
      centre: place(0.5, 0.5),
      radius: 0.1,
    });
  });

  test('has no value before one is typed', () => {
    expect(calloutBetween('dimension', 'dim-one-two', place(0, 0), place(1, 1), ratio)).toMatchObject({
      value: null,
      unit: 'mm',
      label: '',
    });
  });

  test('is never smaller than what is kept', () => {
    expect(calloutBetween('ring', 'ring-two', place(0.5, 0.5), place(0.5, 0.5), ratio)).toMatchObject({
      radius: 0.005,
    });
  });
});

describe('the ends of a callout', () => {
  test('of a ring are its centre and its edge on the right', () => {
    expect(endsOf(ring, ratio)).toEqual([
      { name: 'centre', at: place(0.5, 0.5) },
      { name: 'edge', at: place(0.6, 0.5) },
    ]);
  });

  test('of a ring at the right edge stand where they can be taken hold of', () => {
    const edge = endsOf({ ...ring, centre: place(0.95, 0.5) }, ratio)[1]!;
    expect(edge.at.x).toBeCloseTo(0.85, 6);
  });

  test('of a ring larger than the photo stay on it', () => {
    expect(endsOf({ ...ring, radius: 0.9 }, ratio)[1]!.at).toEqual(place(1, 0.5));
  });

  test('are moved one at a time, and no further than the edge of the photo', () => {
    expect(withEnd(arrow, 'to', place(1.2, -0.3), ratio)).toEqual({ ...arrow, to: place(1, 0) });
    expect(withEnd(ring, 'centre', place(0.2, 0.3), ratio)).toEqual({ ...ring, centre: place(0.2, 0.3) });
    expect(withEnd(ring, 'edge', place(0.5, 0.9), ratio)).toEqual({ ...ring, radius: 0.2 });
  });
});

test('a place is kept to a ten-thousandth of the photo', () => {
  expect(onPhoto(place(1 / 3, 2 / 3))).toEqual(place(0.3333, 0.6667));
});

describe('the callout under a place', () => {
  test.each([
    ['on the line of an arrow', [200, 22], 'arrow-one'],
    ['beyond the end of an arrow', [390, 20], null],
    ['inside a small ring', [200, 100], 'ring-one'],
    ['near nothing', [20, 180], null],
  ] as const)('is found %s', (_where, at, key) => {
    expect(calloutAt(at, [arrow, { ...ring, radius: 0.05 }], size, 16)?.key ?? null).toBe(key);
  });

  test('is not a large ring, where the place is well within it', () => {
    expect(calloutAt([200, 100], [{ ...ring, radius: 0.3 }], size, 16)).toBeNull();
  });

  test('is the one drawn last where two lie over each other', () => {
    expect(calloutAt([240, 100], [ring, { ...ring, key: 'ring-over' }], size, 16)?.key).toBe('ring-over');
  });
});
