import { describe, expect, it } from 'vitest';
import { type Grades, ndcg } from './ndcg.js';

const grades: Grades = { a: 3, b: 2, c: 3, d: 0, e: 1, f: 2 };

const table: readonly { name: string; returned: string[]; grades: Grades; depth: number; truth: number }[] = [
  // DCG 3 + 2 + 3/1.584963 + 0 + 1/2.321928 + 2/2.584963 = 8.097172; ideal 3 + 3 + 2/1.584963 + 2/2 + 1/2.321928 = 8.692537.
  {
    name: 'six results out of order',
    returned: ['a', 'b', 'c', 'd', 'e', 'f'],
    grades,
    depth: 6,
    truth: 0.931508,
  },
  { name: 'the best order there is', returned: ['a', 'c', 'b', 'f', 'e', 'd'], grades, depth: 6, truth: 1 },
  { name: 'ranks 1 and 2 weigh the same', returned: ['e', 'a'], grades: { a: 3, e: 1 }, depth: 2, truth: 1 },
  // 3/1.584963 = 1.892789 of 3.
  {
    name: 'the only good one at rank 3',
    returned: ['x', 'y', 'a'],
    grades: { a: 3 },
    depth: 10,
    truth: 0.63093,
  },
  {
    name: 'the only good one below the depth',
    returned: ['x', 'y', 'a'],
    grades: { a: 3 },
    depth: 2,
    truth: 0,
  },
  { name: 'nothing returned', returned: [], grades: { a: 3 }, depth: 10, truth: 0 },
  // Once: 3 of 3 + 2; the second "a" gains nothing.
  { name: 'one result twice', returned: ['a', 'a'], grades: { a: 3, b: 2 }, depth: 2, truth: 0.6 },
  {
    name: 'a slug named like a member of every object',
    returned: ['constructor', 'a'],
    grades: { a: 2 },
    depth: 2,
    truth: 1,
  },
];

describe('ndcg', () => {
  it.each(table)(
    'gives the value worked out by hand for $name',
    ({ returned, grades: judged, depth, truth }) => {
      expect(ndcg(returned, judged, depth)).toBeCloseTo(truth, 5);
    },
  );

  it.each([
    ['a depth of zero', ['a'], { a: 1 }, 0],
    ['a depth between whole numbers', ['a'], { a: 1 }, 2.5],
    ['a negative grade', ['a'], { a: -1, b: 1 }, 10],
    ['grades that are all zero', ['a'], { a: 0 }, 10],
    ['no grades', ['a'], {}, 10],
  ] as const)('refuses %s', (_name, returned, judged, depth) => {
    expect(() => ndcg(returned, judged, depth)).toThrow(RangeError);
  });
});
