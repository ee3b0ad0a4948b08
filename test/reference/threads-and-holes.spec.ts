import { describe, expect, test } from 'vitest';
import { clearanceHoles, judgeHolePattern } from '../../shared/fit/hole-pattern.js';
import { judgeThreadPair, readMetricThread } from '../../shared/fit/thread-pair.js';
import { tiltOf } from '../../shared/fit/tilt.js';
import { exact } from './dimensions.js';

describe('metric threads', () => {
  test.each([
    // Formulas of ISO 68-1, worked: d2 = d − 0.6495191 P, D1 = d − 1.0825318 P.
    ['M42x0.75', 41.513, 41.188],
    ['M48×0,75', 47.513, 47.188],
    ['M54x0.75', 53.513, 53.188],
    ['m28.5 x 0.6', 28.11, 27.85],
    ['M68x1', 67.35, 66.917],
    // ISCAR taps guide, ISO 6H nut, least minor diameter; coarse pitches.
    ['M3', 2.675, 2.459],
    ['M5', 4.48, 4.134],
    ['M8', 7.188, 6.647],
  ])('%s has pitch diameter %f and minor diameter %f', (designation, pitchDiameter, minorDiameter) => {
    const thread = readMetricThread(designation);
    expect(thread.pitchDiameter).toBeCloseTo(pitchDiameter, 3);
    expect(thread.minorDiameter).toBeCloseTo(minorDiameter, 3);
  });
  test.each(['', 'M', '48x0.75', 'M48', 'M1x1', 'T2', 'M48x0'])('“%s” is refused', (designation) => {
    expect(() => readMetricThread(designation)).toThrow(RangeError);
  });

  const male = { designation: 'M48x0.75', sex: 'male', length: exact(5) } as const;
  test.each([
    {
      name: 'another pitch',
      other: { designation: 'M48x1', sex: 'female', length: exact(6) },
      trouble: 'other-pitch',
      verdict: 'will-not-seat',
    },
    {
      name: 'another diameter',
      other: { designation: 'M42x0.75', sex: 'female', length: exact(6) },
      trouble: 'other-diameter',
      verdict: 'will-not-seat',
    },
    {
      name: 'the same sex',
      other: { designation: 'M48x0.75', sex: 'male', length: exact(6) },
      trouble: 'same-sex',
      verdict: 'will-not-seat',
    },
    {
      name: 'a shallower socket',
      other: { designation: 'M48x0.75', sex: 'female', length: exact(3.5) },
      trouble: 'bottoms',
      verdict: 'will-not-seat',
    },
    {
      name: 'a deeper socket',
      other: { designation: 'M48x0.75', sex: 'female', length: exact(6) },
      trouble: null,
      verdict: 'seats-with-room',
    },
  ] as const)(
    'with $name the trouble is $trouble, whichever side is named first',
    ({ other, trouble, verdict }) => {
      expect(judgeThreadPair(male, other)).toMatchObject({ trouble, verdict });
      expect(judgeThreadPair(other, male)).toMatchObject({ trouble, verdict });
    },
  );
  test('a male thread 1.5 mm too long stands off by 1.5 mm', () => {
    const result = judgeThreadPair(male, { designation: 'M48x0.75', sex: 'female', length: exact(3.5) });
    expect(result.standOff?.value).toBeCloseTo(1.5, 12);
    expect(result.engagement?.value).toBeCloseTo(3.5, 12);
  });
});

describe('clearance holes', () => {
  // engineeringhardware.com, "Clearance hole sizes ISO 273".
  test.each([
    ['M2', 2.2, 2.4, 2.6],
    ['M2.5', 2.7, 2.9, 3.1],
    ['M3', 3.2, 3.4, 3.6],
    ['M4', 4.3, 4.5, 4.8],
    ['M5', 5.3, 5.5, 5.8],
    ['M6', 6.4, 6.6, 7.0],
    ['M8', 8.4, 9.0, 10.0],
  ])('%s has %f fine, %f medium, %f coarse', (screw, fine, medium, coarse) => {
    expect(clearanceHoles[screw]).toMatchObject({ fine, medium, coarse });
  });

  const holes = {
    count: 3,
    circle: exact(31),
    holeDiameter: exact(3.4),
    slotTravel: null,
    slotAlong: null,
  } as const;
  test('M3 in 3.4 mm holes allows circles 0.4 mm apart on diameter and no more', () => {
    const at = (circle: number) =>
      judgeHolePattern({ holes, tapped: { count: 3, circle: exact(circle), screw: 'M3' } });
    expect(at(31.39).verdict).not.toBe('will-not-seat');
    expect(at(31.41)).toMatchObject({ verdict: 'will-not-seat', trouble: 'circle' });
    expect(at(30.5)).toMatchObject({ verdict: 'will-not-seat', trouble: 'circle' });
  });
  test('a slot along the radius adds half its travel', () => {
    const slotted = { ...holes, slotTravel: exact(2), slotAlong: 'radius' } as const;
    expect(
      judgeHolePattern({ holes: slotted, tapped: { count: 3, circle: exact(33.3), screw: 'M3' } }).margin
        ?.value,
    ).toBeCloseTo(0.05, 12);
  });
  test('three holes do not go on four taps, but on six', () => {
    expect(judgeHolePattern({ holes, tapped: { count: 4, circle: exact(31), screw: 'M3' } })).toMatchObject({
      verdict: 'will-not-seat',
      trouble: 'count',
    });
    expect(
      judgeHolePattern({ holes, tapped: { count: 6, circle: exact(31), screw: 'M3' } }).trouble,
    ).toBeNull();
  });
});

describe('tilt', () => {
  // Worked with atan(t/d); at these slopes asin and atan agree to 1e-5 degrees.
  test.each([
    [0.1, 100, 0.057296, 3.4377],
    [0.05, 60, 0.047746, 2.8648],
    [0.02, 40, 0.028648, 1.7189],
    [0.1, 58, 0.098786, 5.9271],
    [1.35, 200, 0.386741, 23.2044],
  ])('%f mm over %f mm is %f°', (height, length, degrees, arcMinutes) => {
    const tilt = tiltOf(height, length);
    expect(tilt.degrees).toBeCloseTo(degrees, 4);
    expect(tilt.arcMinutes).toBeCloseTo(arcMinutes, 2);
  });
});
