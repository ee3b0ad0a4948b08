import { judgeJoint, type FeatureOnHand } from '../../shared/fit/joint-verdict.js';
import { moveChance } from '../../shared/fit/evidence.js';
import { bestStacks, type StockKind } from '../../shared/fit/shim-stack.js';
import { stockLibrary } from '../../shared/fit/stock-library.js';
import { consensusOf, defaultSpread } from '../../shared/statistics/consensus.js';
import type { Dimension } from '../../shared/fit/dimension.js';

/*
 * Prints how many times faster the product's way is than a plain one run beside it, in turns, best of several rounds.
 * Ratios only: seconds of one machine say nothing about another.
 */

/** Fixed-seed uniform numbers in (0, 1): Park and Miller's minimal standard generator. */
let state = 20261201;
const uniform = (): number => (state = (state * 48271) % 2147483647) / 2147483647;

function bestOf(rounds: number, ways: readonly (() => unknown)[]): number[] {
  const best = ways.map(() => Infinity);
  for (let round = 0; round < rounds; round += 1) {
    ways.forEach((way, index) => {
      const start = performance.now();
      way();
      best[index] = Math.min(best[index]!, performance.now() - start);
    });
  }
  return best;
}

function report(what: string, baseline: string, [product, plain]: number[]): void {
  console.log(`${what}: ${(plain! / product!).toFixed(1)} times as fast as ${baseline}`);
}

type Readings = { value: number; uncertainty: number }[];
const readings = (middle: number): Readings =>
  Array.from({ length: 20 }, () => ({ value: middle + (uniform() - 0.5) * 0.1, uncertainty: 0.017 }));
const dimensionOf = (list: Readings): Dimension => {
  const consensus = consensusOf(list, defaultSpread.printed);
  return {
    value: consensus.mean,
    uncertainty: consensus.predictionSpread,
    source: { kind: 'consensus', readings: list.length, thin: false },
  };
};
const feature = (diameter: Dimension, other: Dimension, name: 'height' | 'depth'): FeatureOnHand => ({
  dimensions: { diameter, [name]: other },
  attributes: {},
  process: 'printed',
});

// Fit table of 30 by 30 revisions, 20 readings a dimension.
const lips = Array.from({ length: 30 }, () => ({
  diameter: readings(19.2 + uniform()),
  other: readings(1.5),
}));
const recesses = Array.from({ length: 30 }, () => ({
  diameter: readings(19.5 + uniform()),
  other: readings(2),
}));
const keptLips = lips.map((lip) => feature(dimensionOf(lip.diameter), dimensionOf(lip.other), 'height'));
const keptRecesses = recesses.map((recess) =>
  feature(dimensionOf(recess.diameter), dimensionOf(recess.other), 'depth'),
);
const cell = (a: FeatureOnHand, b: FeatureOnHand): number =>
  moveChance({ predicted: judgeJoint('boss-recess', a, b).chance ?? 0.5, sat: 3, didNotSit: 1 }).chance;
report(
  'fit table, 30 × 30 revisions, 20 readings a dimension',
  'making the consensus anew in every cell',
  bestOf(5, [
    () => keptLips.map((lip) => keptRecesses.map((recess) => cell(lip, recess))),
    () =>
      lips.map((lip) =>
        recesses.map((recess) =>
          cell(
            feature(dimensionOf(lip.diameter), dimensionOf(lip.other), 'height'),
            feature(dimensionOf(recess.diameter), dimensionOf(recess.other), 'depth'),
          ),
        ),
      ),
  ]),
);

// Bench of 50 parts in a catalogue of 2,000 joints, about a hundred of which lie between parts of the bench.
const joints = Array.from({ length: 2000 }, (_, index) => ({
  a: Math.floor(uniform() * 400),
  b: Math.floor(uniform() * 400),
  seat: index % 30,
}));
const bench = new Set(Array.from({ length: 50 }, () => Math.floor(uniform() * 400)));
const judge = (joint: { seat: number }): number =>
  cell(keptLips[joint.seat]!, keptRecesses[(joint.seat + 7) % 30]!);
report(
  'fit check of a bench of 50 parts among 2,000 joints',
  'judging every joint and keeping those of the bench',
  bestOf(5, [
    () => joints.filter((joint) => bench.has(joint.a) && bench.has(joint.b)).map(judge),
    () =>
      joints
        .map((joint) => ({ joint, chance: judge(joint) }))
        .filter(({ joint }) => bench.has(joint.a) && bench.has(joint.b)),
  ]),
);

// Shim search: 40 kinds of stock, up to 5 pieces, exact both ways.
const stock = [...stockLibrary].slice(0, 40);
function countThrough(kinds: readonly StockKind[], gap: number, most: number): number {
  let best = Infinity;
  const walk = (from: number, left: number, rest: number): void => {
    best = Math.min(best, Math.abs(rest));
    if (left === 0) return;
    for (let index = from; index < kinds.length; index += 1)
      walk(index, left - 1, rest - kinds[index]!.thickness);
  };
  walk(0, most, gap);
  return best;
}
const question = {
  gap: 4.37,
  gapUncertainty: 0.03,
  tolerance: 0,
  stock: stock.map(({ available: _, ...kind }) => kind),
  mostPieces: 5,
  wanted: 5,
  copies: 1 as const,
};
const agreed = Math.abs(bestStacks(question)[0]!.error) - countThrough(question.stock, question.gap, 5);
if (Math.abs(agreed) > 1e-9) throw new Error('The two searches disagree.');
report(
  'shim search, 40 kinds, up to 5 pieces',
  'counting through every stack',
  bestOf(3, [() => bestStacks(question), () => countThrough(question.stock, question.gap, 5)]),
);
