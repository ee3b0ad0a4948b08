import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { entropyOf, whichRevision, type RevisionKnowledge } from '../../shared/fit/which-revision.js';

const revisionIds = [1, 2, 3, 4];
const knowledge: fc.Arbitrary<RevisionKnowledge> = fc.record({
  asOf: fc.constant('2026-12-01'),
  revisions: fc.constant(revisionIds.map((id) => ({ id, soldFrom: null, soldTo: null }))),
  marks: fc
    .array(fc.array(fc.option(fc.boolean()), { minLength: 4, maxLength: 4 }), { maxLength: 4 })
    .map((marks) =>
      marks.map((answers, index) => ({
        key: `mark-${index}`,
        revisions: answers.flatMap((shows, at) =>
          shows === null ? [] : [{ revisionId: revisionIds[at]!, shows }],
        ),
      })),
    ),
  dimensions: fc
    .array(
      fc.array(
        fc.option(
          fc.record({
            mean: fc.double({ min: 18, max: 22, noNaN: true }),
            predictionSpread: fc.double({ min: 0.005, max: 0.5, noNaN: true }),
          }),
        ),
        { minLength: 4, maxLength: 4 },
      ),
      { maxLength: 3 },
    )
    .map((dimensions) =>
      dimensions.map((known, index) => ({
        key: `dimension-${index}`,
        usualUncertainty: 0.02,
        revisions: known.flatMap((entry, at) =>
          entry === null ? [] : [{ revisionId: revisionIds[at]!, ...entry }],
        ),
      })),
    ),
});

/** Uniform numbers in (0, 1), the same in every run: Park and Miller's minimal standard generator. */
function uniform(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 48_271) % 2_147_483_647;
    return state / 2_147_483_647;
  };
}

describe('which revision', () => {
  test('chances are between 0 and 1 and add up to 1 whatever was answered', () => {
    fc.assert(
      fc.property(
        knowledge,
        fc.array(fc.boolean()),
        fc.array(fc.double({ noNaN: true, min: -1e6, max: 1e6 })),
        (known, shows, values) => {
          const answers = [
            ...known.marks.flatMap(({ key }, at) => (at < shows.length ? [{ key, shows: shows[at]! }] : [])),
            ...known.dimensions.flatMap(({ key }, at) =>
              at < values.length ? [{ key, value: values[at]!, uncertainty: 0.02 }] : [],
            ),
          ];
          const { chances } = whichRevision(known, answers);
          for (const { chance } of chances) expect(chance).toBeGreaterThanOrEqual(0);
          expect(chances.reduce((sum, { chance }) => sum + chance, 0)).toBeCloseTo(1, 9);
        },
      ),
    );
  });

  test('no question is expected to widen, nor to tell more than there is to know', () => {
    fc.assert(
      fc.property(knowledge, (known) => {
        const { next, chances } = whichRevision(known, []);
        if (next === null) return;
        expect(next.bits).toBeGreaterThan(0);
        expect(next.bits).toBeLessThanOrEqual(entropyOf(chances.map(({ chance }) => chance)) + 1e-9);
      }),
    );
  });

  test('the order in which the answers came does not matter', () => {
    fc.assert(
      fc.property(knowledge, fc.boolean(), (known, shows) => {
        const answers = [
          ...known.marks.map(({ key }) => ({ key, shows })),
          ...known.dimensions.map(({ key }) => ({ key, value: 20, uncertainty: 0.02 })),
        ];
        expect(whichRevision(known, [...answers].reverse())).toEqual(whichRevision(known, answers));
      }),
    );
  });

  // The mean of the entropy left after simulated readings is what the integral is to give; 40,000 of them leave a standard
  // error below 0.004 bits.
  test('bits expected of a reading agree with simulated readings', () => {
    const means = [20, 20.05, 20.2, 20.21];
    const known: RevisionKnowledge = {
      asOf: '2026-12-01',
      revisions: revisionIds.map((id) => ({ id, soldFrom: null, soldTo: null })),
      marks: [],
      dimensions: [
        {
          key: 'boss',
          usualUncertainty: 0.02,
          revisions: revisionIds.map((revisionId, at) => ({
            revisionId,
            mean: means[at]!,
            predictionSpread: 0.03,
          })),
        },
      ],
    };
    const random = uniform(20_261_201);
    const scale = Math.hypot(0.03, 0.02);
    const runs = 40_000;
    let left = 0;
    for (let run = 0; run < runs; run += 1) {
      const truth = means[Math.floor(random() * 4)]!;
      const normal = Math.sqrt(-2 * Math.log(random())) * Math.cos(2 * Math.PI * random());
      const reading = { key: 'boss', value: truth + scale * normal, uncertainty: 0.02 };
      left += entropyOf(whichRevision(known, [reading]).chances.map(({ chance }) => chance));
    }
    expect(whichRevision(known, []).next!.bits).toBeCloseTo(2 - left / runs, 1.5);
  });

  test('chances given are borne out: of simulated parts told one revision with about 80 %, about 80 % are it', () => {
    const means = [20, 20.06, 20.12];
    const known: RevisionKnowledge = {
      asOf: '2026-12-01',
      revisions: [1, 2, 3].map((id) => ({ id, soldFrom: null, soldTo: null })),
      marks: [],
      dimensions: [
        {
          key: 'boss',
          usualUncertainty: 0.02,
          revisions: means.map((mean, at) => ({ revisionId: at + 1, mean, predictionSpread: 0.03 })),
        },
      ],
    };
    const random = uniform(7);
    const scale = Math.hypot(0.03, 0.02);
    let told = 0;
    let right = 0;
    for (let run = 0; run < 20_000; run += 1) {
      const truth = Math.floor(random() * 3);
      const normal = Math.sqrt(-2 * Math.log(random())) * Math.cos(2 * Math.PI * random());
      const value = means[truth]! + scale * normal;
      const { chances } = whichRevision(known, [{ key: 'boss', value, uncertainty: 0.02 }]);
      chances.forEach(({ chance }, at) => {
        if (chance < 0.75 || chance > 0.85) return;
        told += 1;
        if (at === truth) right += 1;
      });
    }
    expect(told).toBeGreaterThan(1000);
    expect(right / told).toBeGreaterThan(0.75);
    expect(right / told).toBeLessThan(0.85);
  });
});
