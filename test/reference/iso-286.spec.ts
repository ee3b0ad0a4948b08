import { describe, expect, test } from 'vitest';
import {
  holeDeviation,
  isoFit,
  nearestFit,
  shaftDeviation,
  standardTolerance,
} from '../../shared/fit/iso-286.js';

/** One size inside each step up to 120 mm. */
const sizes = [2, 5, 8, 15, 25, 40, 65, 100];

describe('standard tolerances', () => {
  // "ISO 286 standard tolerance zone size table" (mechguru.com); "ISO System of Limits and Fits" (pfeffer.ch).
  test.each([
    [5, [4, 5, 6, 8, 9, 11, 13, 15]],
    [6, [6, 8, 9, 11, 13, 16, 19, 22]],
    [7, [10, 12, 15, 18, 21, 25, 30, 35]],
    [8, [14, 18, 22, 27, 33, 39, 46, 54]],
    [9, [25, 30, 36, 43, 52, 62, 74, 87]],
    [10, [40, 48, 58, 70, 84, 100, 120, 140]],
    [11, [60, 75, 90, 110, 130, 160, 190, 220]],
  ])('IT%i has the published widths', (grade, widths) => {
    expect(sizes.map((size) => standardTolerance(size, grade))).toEqual(widths);
  });
});

describe('hole classes', () => {
  // JIS B 0401 tables (Miki Pulley "Fitting Tolerances"; Sakagami "Regular fit tolerance"); D10 from Sumitomo's table.
  test.each([
    [
      'H7',
      [
        [10, 0],
        [12, 0],
        [15, 0],
        [18, 0],
        [21, 0],
        [25, 0],
        [30, 0],
        [35, 0],
      ],
    ],
    [
      'H11',
      [
        [60, 0],
        [75, 0],
        [90, 0],
        [110, 0],
        [130, 0],
        [160, 0],
        [190, 0],
        [220, 0],
      ],
    ],
    [
      'G7',
      [
        [12, 2],
        [16, 4],
        [20, 5],
        [24, 6],
        [28, 7],
        [34, 9],
        [40, 10],
        [47, 12],
      ],
    ],
    [
      'F8',
      [
        [20, 6],
        [28, 10],
        [35, 13],
        [43, 16],
        [53, 20],
        [64, 25],
        [76, 30],
        [90, 36],
      ],
    ],
    [
      'E9',
      [
        [39, 14],
        [50, 20],
        [61, 25],
        [75, 32],
        [92, 40],
        [112, 50],
        [134, 60],
        [159, 72],
      ],
    ],
    [
      'D10',
      [
        [60, 20],
        [78, 30],
        [98, 40],
        [120, 50],
        [149, 65],
        [180, 80],
        [220, 100],
        [260, 120],
      ],
    ],
  ])('%s has the published deviations', (tolerance, deviations) => {
    expect(
      sizes.map((size) => holeDeviation(size, tolerance)).map(({ upper, lower }) => [upper, lower]),
    ).toEqual(deviations);
  });
});

describe('shaft classes', () => {
  // Sakagami and Sumitomo JIS B 0401 tables; k, m also SKF "Shaft tolerances and resultant fits".
  test.each([
    [
      'h7',
      [
        [0, -10],
        [0, -12],
        [0, -15],
        [0, -18],
        [0, -21],
        [0, -25],
        [0, -30],
        [0, -35],
      ],
    ],
    [
      'g6',
      [
        [-2, -8],
        [-4, -12],
        [-5, -14],
        [-6, -17],
        [-7, -20],
        [-9, -25],
        [-10, -29],
        [-12, -34],
      ],
    ],
    [
      'f7',
      [
        [-6, -16],
        [-10, -22],
        [-13, -28],
        [-16, -34],
        [-20, -41],
        [-25, -50],
        [-30, -60],
        [-36, -71],
      ],
    ],
    [
      'e8',
      [
        [-14, -28],
        [-20, -38],
        [-25, -47],
        [-32, -59],
        [-40, -73],
        [-50, -89],
        [-60, -106],
        [-72, -126],
      ],
    ],
    [
      'k6',
      [
        [6, 0],
        [9, 1],
        [10, 1],
        [12, 1],
        [15, 2],
        [18, 2],
        [21, 2],
        [25, 3],
      ],
    ],
    [
      'm6',
      [
        [8, 2],
        [12, 4],
        [15, 6],
        [18, 7],
        [21, 8],
        [25, 9],
        [30, 11],
        [35, 13],
      ],
    ],
    [
      'n6',
      [
        [10, 4],
        [16, 8],
        [19, 10],
        [23, 12],
        [28, 15],
        [33, 17],
        [39, 20],
        [45, 23],
      ],
    ],
    [
      'p6',
      [
        [12, 6],
        [20, 12],
        [24, 15],
        [29, 18],
        [35, 22],
        [42, 26],
        [51, 32],
        [59, 37],
      ],
    ],
    [
      's6',
      [
        [20, 14],
        [27, 19],
        [32, 23],
        [39, 28],
        [48, 35],
        [59, 43],
        [72, 53],
        [93, 71],
      ],
    ],
  ])('%s has the published deviations', (tolerance, deviations) => {
    expect(
      sizes.map((size) => shaftDeviation(size, tolerance)).map(({ upper, lower }) => [upper, lower]),
    ).toEqual(deviations);
  });

  test('s6 is split at 65 and 100 mm (Machine Drawing, table 15.2)', () => {
    expect([60, 70, 90, 110].map((size) => shaftDeviation(size, 's6').lower)).toEqual([53, 59, 71, 79]);
  });
});

describe('worked fits', () => {
  // ANSI B4.2-1978 preferred-fit tables (from memory); 25 H7/h6: metricmech.com "ISO 286 fits visualizer";
  // 50 H7/s6: Scilab textbook companion, book 764 "Design of Machine Elements", example 3.3; the rest worked from the tables.
  test.each([
    [25, 'H7', 'g6', 41, 7, 'clearance'],
    [25, 'H7', 'h6', 34, 0, 'clearance'],
    [25, 'H8', 'f7', 74, 20, 'clearance'],
    [20, 'H7', 'k6', 19, -15, 'transition'],
    [25, 'H7', 'n6', 6, -28, 'transition'],
    [40, 'H7', 'p6', -1, -42, 'interference'],
    [25, 'H7', 'p6', -1, -35, 'interference'],
    [50, 'H7', 's6', -18, -59, 'interference'],
    [10, 'H7', 'h6', 24, 0, 'clearance'],
    [6, 'H7', 'm6', 8, -12, 'transition'],
    [50.8, 'H7', 'g6', 59, 10, 'clearance'],
    [31.75, 'H8', 'f7', 89, 25, 'clearance'],
    [70, 'H7', 's6', -29, -78, 'interference'],
    [100, 'H7', 's6', -36, -93, 'interference'],
    [80, 'D10', 'h7', 250, 100, 'clearance'],
  ])('%f %s/%s', (nominal, hole, shaft, largestClearance, smallestClearance, kind) => {
    expect(isoFit(nominal, hole, shaft)).toEqual({ hole, shaft, kind, largestClearance, smallestClearance });
  });
});

describe('limits of the tables', () => {
  test.each([0, -1, 120.001, Number.NaN])('a size of %f mm is refused', (size) => {
    expect(() => standardTolerance(size, 7)).toThrow(RangeError);
  });
  test.each(['z6', 'H', '6g', 'g16'])('the shaft class %s is refused', (tolerance) => {
    expect(() => shaftDeviation(25, tolerance)).toThrow(RangeError);
  });
  test('steps reach up to and including their upper end', () => {
    expect([standardTolerance(6, 7), standardTolerance(6.001, 7)]).toEqual([12, 15]);
  });
  test('a clearance beyond every preferred fit has no name', () => {
    expect(nearestFit(25, 1)).toBeNull();
    expect(nearestFit(25, -0.2)).toBeNull();
  });
  test('the middle clearance of H7/g6 is named H7/g6', () => {
    expect(nearestFit(25, 0.024)).toMatchObject({ hole: 'H7', shaft: 'g6' });
  });
});
