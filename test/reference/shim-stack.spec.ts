import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { bestStacks, type ShimQuestion, type StockKind } from '../../shared/fit/shim-stack.js';
import { stockLibrary } from '../../shared/fit/stock-library.js';

function stock(thickness: number, index: number, available?: number): StockKind {
  return {
    id: `kind-${index}`,
    name: `${thickness} mm`,
    family: 'own',
    thickness,
    uncertainty: 0.01,
    outerDiameter: null,
    innerDiameter: null,
    source: 'made for the test',
    ...(available === undefined ? {} : { available }),
  };
}

/** Every multiset of up to `most` kinds, by counting through all of them. */
function everyStack(kinds: readonly StockKind[], most: number): { count: number; thickness: number }[] {
  const found: { count: number; thickness: number }[] = [];
  const walk = (from: number, count: number, thickness: number, used: number[]): void => {
    if (count > 0) found.push({ count, thickness });
    if (count === most) return;
    for (let index = from; index < kinds.length; index += 1) {
      const kind = kinds[index]!;
      if (used[index]! >= (kind.available ?? Infinity)) continue;
      const next = [...used];
      next[index]! += 1;
      walk(index, count + 1, thickness + kind.thickness, next);
    }
  };
  walk(
    0,
    0,
    0,
    kinds.map(() => 0),
  );
  return found;
}

const question = (parts: Partial<ShimQuestion>): ShimQuestion => ({
  gap: 1.5,
  gapUncertainty: 0.03,
  tolerance: 0.05,
  stock: stockLibrary,
  mostPieces: 3,
  wanted: 5,
  copies: 1,
  ...parts,
});

describe('the best stacks', () => {
  test('are those that counting through every stack finds', () => {
    const kinds = fc.array(
      fc.record({
        thickness: fc.integer({ min: 5, max: 300 }).map((value) => value / 100),
        available: fc.option(fc.integer({ min: 1, max: 3 }), { nil: undefined }),
      }),
      { minLength: 1, maxLength: 6 },
    );
    fc.assert(
      fc.property(
        kinds,
        fc.integer({ min: 5, max: 600 }),
        fc.integer({ min: 1, max: 4 }),
        fc.integer({ min: 0, max: 20 }),
        (list, gap, mostPieces, tolerance) => {
          const pieces = list.map((kind, index) => stock(kind.thickness, index, kind.available));
          const asked = question({
            gap: gap / 100,
            tolerance: tolerance / 100,
            stock: pieces,
            mostPieces,
            wanted: 1,
          });
          const all = everyStack(pieces, mostPieces).map(({ count, thickness }) => ({
            count,
            error: Math.abs(thickness - asked.gap),
          }));
          const within = all.filter(({ error }) => error <= asked.tolerance + 1e-9);
          const [best] = bestStacks(asked);
          if (within.length > 0) {
            const fewest = Math.min(...within.map(({ count }) => count));
            expect(best!.withinTolerance).toBe(true);
            expect(best!.count).toBe(fewest);
            expect(Math.abs(best!.error)).toBeCloseTo(
              Math.min(...within.filter(({ count }) => count === fewest).map(({ error }) => error)),
              9,
            );
          } else {
            expect(Math.abs(best!.error)).toBeCloseTo(Math.min(...all.map(({ error }) => error)), 9);
          }
        },
      ),
      { numRuns: 150 },
    );
  });

  test('a greedy choice of the thickest piece first would miss 0.6 + 0.6 for a gap of 1.2', () => {
    const pieces = [stock(1.0, 0), stock(0.6, 1), stock(0.15, 2)];
    const [best] = bestStacks(
      question({ gap: 1.2, tolerance: 0.01, stock: pieces, mostPieces: 2, wanted: 1 }),
    );
    expect(best!.pieces).toMatchObject([{ stock: { thickness: 0.6 }, count: 2 }]);
    expect(best!.error).toBeCloseTo(0, 12);
  });

  test('a lip of 1.5 mm is filled by a US cent to 0.02 mm (US Mint: 1.52 mm)', () => {
    const [best] = bestStacks(
      question({ stock: stockLibrary.filter((kind) => kind.family === 'coin'), mostPieces: 1 }),
    );
    expect(best!.pieces[0]!.stock.id).toBe('us-cent');
    expect(best!.error).toBeCloseTo(0.02, 12);
  });

  test('pieces of one kind share their deviation, kinds add as root sum of squares', () => {
    const [best] = bestStacks(
      question({
        gap: 1.4,
        gapUncertainty: 0,
        tolerance: 0.001,
        stock: [stock(0.6, 0, 2), stock(0.2, 1, 1)],
        mostPieces: 3,
        wanted: 1,
      }),
    );
    expect(best!.uncertainty).toBeCloseTo(Math.hypot(0.02, 0.01), 12);
  });

  test('three points need three equal stacks from what is at hand', () => {
    const pieces = [stock(1.5, 0, 2), stock(0.75, 1, 6)];
    const [best] = bestStacks(question({ stock: pieces, copies: 3, mostPieces: 2, wanted: 1 }));
    expect(best!.pieces).toMatchObject([{ stock: { id: 'kind-1' }, count: 2 }]);
  });

  test('no stock gives no stack', () => {
    expect(bestStacks(question({ stock: [] }))).toEqual([]);
  });

  test.each([
    ['a gap of zero', { gap: 0 }],
    ['a gap that is no number', { gap: Number.NaN }],
    ['a gap over 100 mm', { gap: 100.1 }],
    ['a tolerance below zero', { tolerance: -0.01 }],
    ['nine pieces', { mostPieces: 9 }],
    ['no piece', { mostPieces: 0 }],
    ['stock without thickness', { stock: [stock(0, 0)] }],
  ])('%s is refused', (_, parts) => {
    expect(() => bestStacks(question(parts))).toThrow(RangeError);
  });
});
