import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { inchToMillimetre, millimetreToInch } from '../../shared/fit/dimension.js';
import { moveChance } from '../../shared/fit/evidence.js';
import { judgeEnvelope } from '../../shared/fit/envelope.js';
import { judgeJoint, type FeatureOnHand } from '../../shared/fit/joint-verdict.js';
import { jointKindNames, jointKinds } from '../../shared/fit/joint-kinds.js';
import { featureSpecs } from '../../shared/fit/feature-dimensions.js';
import { judgeSeat } from '../../shared/fit/seat.js';
import { judgeThreadPair } from '../../shared/fit/thread-pair.js';
import { consensusOf, defaultSpread } from '../../shared/statistics/consensus.js';
import { exact, read } from './dimensions.js';

const size = fc.double({ min: 0.5, max: 200, noNaN: true });
const small = fc.double({ min: 0, max: 1, noNaN: true });
const seatOf = (boss: number, recess: number, u: number) =>
  judgeSeat({
    bossDiameter: read(boss, u),
    recessDiameter: read(recess, u),
    bossHeight: exact(1.5),
    recessDepth: exact(2),
    process: 'printed',
  });

/** Every number anywhere inside a result. */
function numbersIn(value: unknown): number[] {
  if (typeof value === 'number') return [value];
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(numbersIn) : [];
}

describe('seats', () => {
  test('a larger recess never lowers the chance', () => {
    fc.assert(
      fc.property(size, size, small, small, (boss, recess, u, more) => {
        expect(seatOf(boss, recess + more, u).chanceSeats!).toBeGreaterThanOrEqual(
          seatOf(boss, recess, u).chanceSeats!,
        );
      }),
    );
  });
  test('clearance one way is the overlap the other way, and the chances add to one', () => {
    fc.assert(
      fc.property(size, size, fc.double({ min: 0.001, max: 1, noNaN: true }), (one, other, u) => {
        const [there, back] = [seatOf(one, other, u), seatOf(other, one, u)];
        expect(there.clearance!.value + back.clearance!.value).toBe(0);
        expect(there.chanceEnters! + back.chanceEnters!).toBeCloseTo(1, 9);
      }),
    );
  });
  test('a thicker gap never tilts less', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 5, noNaN: true }), small, (height, more) => {
        const tilt = (h: number) =>
          judgeSeat({
            bossDiameter: exact(22.5),
            recessDiameter: exact(19.5),
            bossHeight: exact(h),
            recessDepth: exact(9),
            process: 'printed',
            plateWidth: 60,
          }).tilt!.worst!.degrees;
        expect(tilt(height + more)).toBeGreaterThanOrEqual(tilt(height));
      }),
    );
  });
});

describe('units', () => {
  test('inches to millimetres and back is exact to the last bits, and an inch is 25.4 mm', () => {
    expect(inchToMillimetre(1)).toBe(25.4);
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e4, noNaN: true }), (inches) => {
        expect(Math.abs(millimetreToInch(inchToMillimetre(inches)) / inches - 1)).toBeLessThan(4.5e-16);
      }),
    );
  });
});

describe('every kind of joint', () => {
  const dimension = fc.option(
    fc.record({ value: size, u: small }).map(({ value, u }) => read(value, u)),
    { nil: undefined },
  );
  const side = (kind: keyof typeof featureSpecs): fc.Arbitrary<FeatureOnHand> => {
    const spec = featureSpecs[kind];
    return fc.record({
      dimensions: fc.record(Object.fromEntries(spec.dimensions.map(({ name }) => [name, dimension]))),
      attributes: fc.record(
        Object.fromEntries(
          spec.attributes.map(({ name, options }) => [
            name,
            fc.constantFrom(undefined, ...(options ?? ['M48x0.75', 'M42x1'])),
          ]),
        ),
      ),
      process: fc.constantFrom('machined', 'printed', 'cast'),
    });
  };
  test.each(jointKindNames)(
    '%s never gives NaN, keeps chances within 0 and 1, and either knows or says what to measure',
    (kind) => {
      fc.assert(
        fc.property(side(jointKinds[kind].a), side(jointKinds[kind].b), (a, b) => {
          let verdict;
          try {
            verdict = judgeJoint(kind, a, b);
          } catch (error) {
            // Sizes that exclude each other, such as a ring that closes wider than it opens, are told, not computed.
            expect(error).toBeInstanceOf(RangeError);
            return;
          }
          expect(numbersIn(verdict).filter((value) => Number.isNaN(value))).toEqual([]);
          if (verdict.chance !== null) {
            expect(verdict.chance).toBeGreaterThanOrEqual(0);
            expect(verdict.chance).toBeLessThanOrEqual(1);
          }
          if (verdict.verdict === 'not-known') expect(verdict.missing.length).toBeGreaterThan(0);
          expect(verdict.sentence).toMatch(/\.$/);
          expect(verdict.sentence).not.toMatch(/safe|guarantee|NaN|undefined|null/);
        }),
        { numRuns: 300 },
      );
    },
  );
});

describe('threads', () => {
  test('which side is named first makes no difference', () => {
    const thread = fc.record({
      designation: fc.constantFrom('M42x0.75', 'M48x0.75', 'M48x1', null),
      sex: fc.constantFrom('male' as const, 'female' as const, null),
      length: fc.option(
        size.map((value) => read(value, 0.05)),
        { nil: null },
      ),
    });
    fc.assert(
      fc.property(thread, thread, (one, other) => {
        const [there, back] = [judgeThreadPair(one, other), judgeThreadPair(other, one)];
        expect([there.verdict, there.trouble, there.chance, there.standOff]).toEqual([
          back.verdict,
          back.trouble,
          back.chance,
          back.standOff,
        ]);
      }),
    );
  });
});

describe('envelopes', () => {
  const motor = {
    innerRadius: exact(30),
    outerRadius: exact(70),
    bottom: exact(0),
    top: exact(40),
    angle: exact(90),
    width: exact(60),
  };
  const screwAt = (angle: number | null, bottom = 10) => ({
    innerRadius: exact(40),
    outerRadius: exact(55),
    bottom: exact(bottom),
    top: exact(bottom + 8),
    angle: angle === null ? null : exact(angle),
    width: exact(20),
  });
  test('a screw that stands under the motor overlaps, and the turn told brings it to the edge of the free angles', () => {
    const judged = judgeEnvelope(motor, screwAt(100));
    expect(judged).toMatchObject({ verdict: 'will-not-seat', turnNeeded: 30 });
    expect(judged.freeAngles).toEqual([{ from: 130, to: 410 }]);
    expect(judgeEnvelope(motor, screwAt(130)).verdict).toBe('seats-with-room');
  });
  test('a screw above the motor passes at every angle', () => {
    expect(judgeEnvelope(motor, screwAt(null, 45))).toMatchObject({
      verdict: 'seats-with-room',
      passes: 'in-height',
      freeAngles: [{ from: 0, to: 360 }],
    });
  });
  test('with an unknown angle the chance is the free share of the circle', () => {
    expect(judgeEnvelope(motor, screwAt(null)).chance).toBeCloseTo(280 / 360, 12);
  });
  test('turning both bodies together changes nothing', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 360, noNaN: true }),
        fc.double({ min: 0, max: 360, noNaN: true }),
        (screw, turn) => {
          const turned = judgeEnvelope({ ...motor, angle: exact(90 + turn) }, screwAt(screw + turn));
          const still = judgeEnvelope(motor, screwAt(screw));
          // At the very edge of the free angles the last bit may tip it.
          if (Math.abs(Math.abs(((((screw - 90 + 540) % 360) + 360) % 360) - 180) - 40) > 1e-6)
            expect(turned.verdict).toBe(still.verdict);
        },
      ),
    );
  });
});

describe('evidence', () => {
  test('no reports leave the prediction, and each report moves it its own way', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 0.99, noNaN: true }),
        fc.nat(20),
        fc.nat(20),
        (predicted, sat, didNotSit) => {
          expect(moveChance({ predicted, sat: 0, didNotSit: 0 }).chance).toBeCloseTo(predicted, 12);
          const now = moveChance({ predicted, sat, didNotSit });
          expect(moveChance({ predicted, sat: sat + 1, didNotSit }).chance).toBeGreaterThan(now.chance);
          expect(moveChance({ predicted, sat, didNotSit: didNotSit + 1 }).chance).toBeLessThan(now.chance);
          expect(now.interval[0]).toBeLessThanOrEqual(now.chance + 1e-9);
          expect(now.interval[1]).toBeGreaterThanOrEqual(now.chance - 1e-9);
        },
      ),
    );
  });
  test('a prior of Beta(1, 1) and 7 of 10 have mean 8/12, and five failures against a firm prediction contradict it', () => {
    expect(moveChance({ predicted: 0.5, sat: 7, didNotSit: 3 }).chance).toBeCloseTo(8 / 12, 12);
    expect(moveChance({ predicted: 0.98, sat: 0, didNotSit: 5 }).contradicts).toBe(true);
    expect(moveChance({ predicted: 0.98, sat: 5, didNotSit: 0 }).contradicts).toBe(false);
  });
});

describe('consensus', () => {
  const readings = fc.array(
    fc.record({
      value: fc.double({ min: 1, max: 100, noNaN: true }),
      uncertainty: fc.double({ min: 0.005, max: 0.5, noNaN: true }),
    }),
    { minLength: 1, maxLength: 30 },
  );
  test('it lies within the readings, knows the order of none, and never gives NaN', () => {
    fc.assert(
      fc.property(readings, (list) => {
        const consensus = consensusOf(list, defaultSpread.printed);
        const values = list.map((reading) => reading.value);
        expect(consensus.mean).toBeGreaterThanOrEqual(Math.min(...values) - 1e-9);
        expect(consensus.mean).toBeLessThanOrEqual(Math.max(...values) + 1e-9);
        expect(numbersIn(consensus).some(Number.isNaN)).toBe(false);
        const reversed = consensusOf([...list].reverse(), defaultSpread.printed);
        expect(Math.abs(reversed.mean - consensus.mean)).toBeLessThan(1e-6);
      }),
    );
  });
});
