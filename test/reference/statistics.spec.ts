import { describe, expect, test } from 'vitest';
import { consensusOf, defaultSpread } from '../../shared/statistics/consensus.js';
import { huberMean } from '../../shared/statistics/huber-mean.js';
import { medianDeviation, medianOf } from '../../shared/statistics/median.js';
import { derSimonianLaird } from '../../shared/statistics/random-effects.js';
import { summaryOf, typeA } from '../../shared/statistics/summary.js';
import { michelson } from './michelson.js';

const alternating = (first: number, low: number, high: number): number[] => [
  first,
  ...Array.from({ length: 1000 }, (_, index) => (index % 2 === 0 ? low : high)),
];

describe('mean and standard deviation', () => {
  // NIST/ITL Statistical Reference Datasets, univariate summary statistics, certified values.
  test.each([
    { name: 'NumAcc1', values: [10000001, 10000003, 10000002], mean: 10000002, deviation: 1 },
    { name: 'NumAcc2', values: alternating(1.2, 1.1, 1.3), mean: 1.2, deviation: 0.1 },
    {
      name: 'NumAcc3',
      values: alternating(1000000.2, 1000000.1, 1000000.3),
      mean: 1000000.2,
      deviation: 0.1,
    },
    {
      name: 'NumAcc4',
      values: alternating(10000000.2, 10000000.1, 10000000.3),
      mean: 10000000.2,
      deviation: 0.1,
    },
    { name: 'Michelso', values: michelson, mean: 299.8524, deviation: 0.0790105478190518 },
  ])('$name agrees with the certified values to 12 digits', ({ values, mean, deviation }) => {
    const summary = summaryOf(values);
    expect(Math.abs(summary.mean / mean - 1)).toBeLessThan(1e-12);
    expect(Math.abs(summary.standardDeviation! / deviation - 1)).toBeLessThan(1e-12);
  });

  test('an empty list and a value that is not finite are refused', () => {
    expect(() => summaryOf([])).toThrow(RangeError);
    expect(() => summaryOf([1, Number.NaN])).toThrow(RangeError);
    expect(() => summaryOf([1, Infinity])).toThrow(RangeError);
  });
});

describe('type A evaluation', () => {
  // JCGM 100:2008, 4.4.3 and table 1: twenty temperatures, mean 100.145 °C, s 1.489 °C, s of the mean 0.333 °C; readings from memory.
  const temperatures = [
    96.9, 98.18, 98.25, 98.61, 99.03, 99.49, 99.56, 99.74, 99.89, 100.07, 100.33, 100.42, 100.68, 100.95,
    101.11, 101.2, 101.57, 101.84, 102.36, 102.72,
  ];
  test('the twenty temperatures of the GUM have its mean and standard uncertainty', () => {
    const result = typeA(temperatures);
    expect(result.mean).toBeCloseTo(100.145, 10);
    expect(result.standardUncertainty).toBeCloseTo(0.333, 3);
    expect(result.degreesOfFreedom).toBe(19);
    expect(summaryOf(temperatures).standardDeviation).toBeCloseTo(1.489, 3);
  });
  test('a single reading has no type A uncertainty', () => {
    expect(typeA([19.5]).standardUncertainty).toBeNull();
  });
});

describe('random effects', () => {
  // 13 BCG trials (Colditz 1994); R metafor 3.8-1, escalc(measure = "RR") and rma(method = "DL").
  const trials = [
    [-0.88931133392, 0.325584765004],
    [-1.5853886572, 0.194581121398],
    [-1.3480731483, 0.415367965368],
    [-1.44155119002, 0.020010031902],
    [-0.21754732221, 0.05121017217],
    [-0.78611558582, 0.006905618456],
    [-1.6208982236, 0.223017247572],
    [0.01195233352, 0.003961579298],
    [-0.46941764874, 0.056434210463],
    [-1.37134480347, 0.073024793613],
    [-0.33935882834, 0.012412213972],
    [0.44591340057, 0.5325058452],
    [-0.01731394822, 0.071404659684],
  ].map(([value, variance]) => ({ value: value!, uncertainty: Math.sqrt(variance!) }));
  test('DerSimonian–Laird gives τ², mean and standard error of metafor', () => {
    const result = derSimonianLaird(trials);
    expect(result.q).toBeCloseTo(152.23300808, 6);
    expect(result.betweenVariance).toBeCloseTo(0.3087602629, 8);
    expect(result.mean).toBeCloseTo(-0.7141172221, 8);
    expect(result.uncertainty).toBeCloseTo(0.1787420895, 8);
  });
  test('without spread between results it is the weighted mean: 11±1, 12±1, 10±3 give 217/19 ± 3/√19 (Taylor)', () => {
    const result = derSimonianLaird([
      { value: 11, uncertainty: 1 },
      { value: 12, uncertainty: 1 },
      { value: 10, uncertainty: 3 },
    ]);
    expect(result.mean).toBeCloseTo(217 / 19, 12);
    expect(result.uncertainty).toBeCloseTo(3 / Math.sqrt(19), 12);
    expect(result.q).toBeCloseTo(0.7368, 4);
  });
});

describe('median and median absolute deviation', () => {
  test.each([
    // docslib "Robust – MAD method"; simple-statistics test/mad.test.js; RSC Analytical Methods Committee, Technical Brief 6.
    { values: [145, 157, 183, 151, 143, 147, 153, 163, 130, 148], median: 149.5, deviation: 5.5 },
    { values: [1, 1, 2, 2, 4, 6, 9], median: 2, deviation: 1 },
    { values: [4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9], median: 5.2, deviation: 0.7 },
  ])('of $values', ({ values, median, deviation }) => {
    expect(medianOf(values)).toBeCloseTo(median, 12);
    expect(medianDeviation(values)).toBeCloseTo(deviation, 12);
  });
});

describe('robust consensus', () => {
  test.each([
    // RSC Analytical Methods Committee, Technical Brief 6 (2001), data from memory; R 4.2.2, MASS::hubers.
    { name: 'the AMC brief', values: [4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9], mean: 5.386138 },
    // MASS data set chem (copper in wholemeal flour); R 4.2.2, MASS::hubers.
    {
      name: '24 copper determinations',
      values: [
        2.9, 3.1, 3.4, 3.4, 3.7, 3.7, 2.8, 2.5, 2.4, 2.4, 2.7, 2.2, 5.28, 3.37, 3.03, 3.03, 28.95, 3.77, 3.4,
        2.2, 3.5, 3.6, 3.7, 3.7,
      ],
      mean: 3.205498,
    },
  ])('with uncertainties near zero it is Huber’s proposal 2 of $name', ({ values, mean }) => {
    const huber = huberMean(values.map((value) => ({ value, uncertainty: 1e-6 })));
    expect(huber.converged).toBe(true);
    expect(huber.mean).toBeCloseTo(mean, 4);
  });

  test('one of four readings with a digit lost has no say', () => {
    const consensus = consensusOf(
      [19.5, 19.52, 19.48, 91.5].map((value) => ({ value, uncertainty: 0.02 })),
      defaultSpread.machined,
    );
    expect(consensus.mean).toBeCloseTo(19.5, 9);
    expect(consensus.weights).toEqual([1, 1, 1, 0]);
  });

  const caliper = 0.02;
  const readings = [19.48, 19.52, 19.5, 19.51, 19.49, 19.53, 19.47];
  test('a reading in inches typed as millimetres is named and moves nothing', () => {
    const clean = consensusOf(
      readings.map((value) => ({ value, uncertainty: caliper })),
      defaultSpread.machined,
    );
    const slipped = consensusOf(
      [...readings, 0.768].map((value) => ({ value, uncertainty: caliper })),
      defaultSpread.machined,
    );
    expect(slipped.unitSlips).toEqual([7]);
    expect(slipped.weights[7]).toBe(0);
    expect(slipped.mean).toBe(clean.mean);
    expect(slipped.uncertainty).toBe(clean.uncertainty);
  });
  test('one of eight readings a millimetre off moves the consensus by less than its uncertainty allows at 95 %', () => {
    const clean = consensusOf(
      readings.map((value) => ({ value, uncertainty: caliper })),
      defaultSpread.machined,
    );
    const off = consensusOf(
      [...readings, 20.5].map((value) => ({ value, uncertainty: caliper })),
      defaultSpread.machined,
    );
    expect(Math.abs(off.mean - clean.mean)).toBeLessThan(1.96 * clean.uncertainty);
    expect(off.weights[7]).toBe(0);
  });
  test('a single reading is thin and carries the spread between parts', () => {
    const single = consensusOf([{ value: 22.5, uncertainty: caliper }], defaultSpread.printed);
    expect(single.thin).toBe(true);
    expect(single.uncertainty).toBeCloseTo(Math.hypot(0.02, 0.08), 12);
  });
});
