import { describe, expect, it } from 'vitest';
import { pick, seededNumbers, shuffled } from './random.js';

describe('the seeded numbers', () => {
  it('follow x → 48271·x mod (2³¹ − 1): from 1 the next is 48271', () => {
    expect(seededNumbers(0)() * 2_147_483_647).toBeCloseTo(48_271, 3);
  });

  it('reach 399268537 after ten thousand steps from 1, as the C++ standard requires of minstd_rand', () => {
    const next = seededNumbers(0);
    let last = 0;
    for (let step = 0; step < 10_000; step++) last = next();
    expect(Math.round(last * 2_147_483_647)).toBe(399_268_537);
  });

  it('are the same for the same seed and differ for another', () => {
    const [one, same, other] = [seededNumbers(60), seededNumbers(60), seededNumbers(61)];
    const first = one();
    expect(same()).toBe(first);
    expect(other()).not.toBe(first);
  });
});

describe('shuffling', () => {
  it('keeps every item and leaves the list given as it was', () => {
    const list = [1, 2, 3, 4, 5, 6, 7, 8];
    const order = shuffled(list, seededNumbers(3));
    expect([...order].sort()).toEqual(list);
    expect(order).not.toEqual(list);
    expect(list).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
  });

  it('refuses to pick from nothing', () => {
    expect(() => pick([], seededNumbers(1))).toThrow(/nothing/);
  });
});
