import { describe, expect, test } from 'vitest';
import { judgeClampRing } from '../../shared/fit/clamp-ring.js';
import type { Dimension } from '../../shared/fit/dimension.js';
import { judgeDovetail } from '../../shared/fit/dovetail.js';
import { judgeSeat } from '../../shared/fit/seat.js';
import { threePoints } from '../../shared/fit/shim-stack.js';
import { sizeTrim } from '../../shared/fit/trim.js';
import { normalQuantile } from '../../shared/statistics/normal-distribution.js';
import { exact, read } from './dimensions.js';

/** Fixed-seed uniform numbers in (0, 1): Park and Miller's minimal standard generator. */
function uniformSource(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
}

const draws = 200_000;

/** Draws of a model of normal dimensions: mean, standard deviation and share of draws that are zero or more. */
function monteCarlo(
  dimensions: readonly Dimension[],
  model: (values: number[]) => number,
): { mean: number; deviation: number; share: number } {
  const uniform = uniformSource(20261201);
  let [sum, squares, above] = [0, 0, 0];
  for (let draw = 0; draw < draws; draw += 1) {
    const value = model(
      dimensions.map(({ value: mean, uncertainty }) => mean + uncertainty * normalQuantile(uniform())),
    );
    sum += value;
    squares += value * value;
    above += value >= 0 ? 1 : 0;
  }
  const mean = sum / draws;
  return { mean, deviation: Math.sqrt(squares / draws - mean * mean), share: above / draws };
}

// Standard errors of 200,000 draws: 0.16 % of a deviation, 0.0011 of a share; bounds are four of them.
const deviationBound = 0.0065;
const shareBound = 0.0045;

describe('first-order uncertainty against Monte Carlo', () => {
  test.each([
    { name: 'a clear seat', boss: read(19.4, 0.05), recess: read(19.5, 0.04) },
    { name: 'a touch-and-go seat', boss: read(19.5, 0.05), recess: read(19.48, 0.08) },
    { name: 'a boss that is too large', boss: read(19.6, 0.06), recess: read(19.5, 0.05) },
  ])('$name: clearance, its uncertainty and the chance that it enters', ({ boss, recess }) => {
    const seat = judgeSeat({
      bossDiameter: boss,
      recessDiameter: recess,
      bossHeight: null,
      recessDepth: null,
      process: 'printed',
    });
    const drawn = monteCarlo([recess, boss], ([outer, inner]) => outer! - inner!);
    expect(Math.abs(seat.clearance!.value - drawn.mean)).toBeLessThan(
      4 * (drawn.deviation / Math.sqrt(draws)),
    );
    expect(Math.abs(seat.clearance!.uncertainty / drawn.deviation - 1)).toBeLessThan(deviationBound);
    expect(Math.abs(seat.chanceEnters! - drawn.share)).toBeLessThan(shareBound);
  });

  test('the chance to enter and not to bottom is that of both at once', () => {
    const [boss, recess, height, depth] = [
      read(19.45, 0.05),
      read(19.5, 0.05),
      read(2.0, 0.05),
      read(2.03, 0.05),
    ];
    const seat = judgeSeat({
      bossDiameter: boss,
      recessDiameter: recess,
      bossHeight: height,
      recessDepth: depth,
      process: 'printed',
    });
    const drawn = monteCarlo([boss, recess, height, depth], ([b, r, h, d]) => Math.min(r! - b!, d! - h!));
    expect(Math.abs(seat.chanceSeats! - drawn.share)).toBeLessThan(shareBound);
  });

  test('a split ring: the chance that the barrel lies within its range', () => {
    const [open, closed, barrel] = [read(50.9, 0.03), read(50.5, 0.05), read(50.55, 0.04)];
    const clamp = judgeClampRing({ open, closed }, barrel);
    const drawn = monteCarlo([open, closed, barrel], ([o, c, b]) => Math.min(o! - b!, b! - c!));
    expect(Math.abs(clamp.chance! - drawn.share)).toBeLessThan(shareBound);
  });

  test('a dovetail: opening carried along the flank, with the uncertainty of heights and angle', () => {
    const bar = { width: read(43.9, 0.05), referenceHeight: read(4, 0.1), flankAngle: read(75, 0.5) };
    const clamp = { width: read(46, 0.06), referenceHeight: read(0, 0.05), flankAngle: read(75, 0.5) };
    const judged = judgeDovetail(bar, clamp);
    const drawn = monteCarlo(
      [bar.width, bar.referenceHeight, clamp.width, clamp.referenceHeight, clamp.flankAngle],
      ([width, high, opening, low, angle]) =>
        opening! - (2 * (high! - low!)) / Math.tan((angle! * Math.PI) / 180) - width!,
    );
    expect(judged.clearance!.value).toBeCloseTo(drawn.mean, 2);
    // The slope is bent by the angle, so first order is right to about one per cent here.
    expect(Math.abs(judged.clearance!.uncertainty / drawn.deviation - 1)).toBeLessThan(0.02);
  });

  test('a trim: wall left after opening the recess', () => {
    const [boss, outer] = [read(22.5, 0.06), read(26, 0.1)];
    const trim = sizeTrim({
      bossDiameter: boss,
      bossHeight: exact(1.5),
      recessDiameter: read(19.5, 0.05),
      recessOuter: outer,
      process: 'printed',
      allowance: 0.1,
      clearanceWanted: 0.2,
    });
    const drawn = monteCarlo([outer, boss], ([o, b]) => (o! - (b! + 0.2)) / 2);
    expect(trim.wallLeft!.value).toBeCloseTo(1.65, 12);
    expect(Math.abs(trim.wallLeft!.uncertainty / drawn.deviation - 1)).toBeLessThan(deviationBound);
  });

  test('three stacks that scatter tilt the plate by the root mean square told', () => {
    const spread = 0.02;
    const { leastRadius, residualTilt } = threePoints(31, spread);
    const uniform = uniformSource(7);
    let squares = 0;
    for (let draw = 0; draw < draws; draw += 1) {
      const [one, two, three] = [0, 1, 2].map(() => spread * normalQuantile(uniform())) as [
        number,
        number,
        number,
      ];
      // Plane through heights at 0°, 120° and 240°.
      const slopeX = (2 * one - two - three) / (3 * leastRadius);
      const slopeY = (two - three) / (Math.sqrt(3) * leastRadius);
      squares += Math.atan(Math.hypot(slopeX, slopeY)) ** 2;
    }
    const drawn = (Math.sqrt(squares / draws) * 180) / Math.PI;
    expect(Math.abs(residualTilt / drawn - 1)).toBeLessThan(deviationBound);
  });
});

describe('combined standard uncertainty', () => {
  test('the end gauge of the GUM, H.1: 25, 9.68, 2.887 and 16.599 nm add to 31.664 nm (JCGM 100:2008, H.1.4, rounded there to 32)', () => {
    const seat = judgeSeat({
      bossDiameter: read(50, Math.hypot(25, 9.68194195397)),
      recessDiameter: read(51, Math.hypot(50 / Math.sqrt(3) / 10, 16.599)),
      bossHeight: null,
      recessDepth: null,
      process: 'machined',
    });
    expect(seat.clearance!.uncertainty).toBeCloseTo(31.664, 2);
  });
});
