import type { WhichOne } from '../../../../shared/contract/which-one';
import { knowledgeOf, percentOf, questionsOf } from './question';

const feature = { id: 7, slug: 'boss', name: 'Boss', kind: 'boss' as const };
const told: WhichOne = {
  part: {
    id: 1,
    slug: 'clamp',
    name: 'Clamp',
    kind: 'clamp',
    maker: { id: 1, slug: 'forge', name: 'Forge' },
  },
  asOf: '2026-12-01',
  revisions: [],
  marks: [{ id: 3, text: 'screw on the left', revisions: [{ revisionId: 1, shows: true }] }],
  dimensions: [
    { feature, dimension: 'diameter', revisions: [{ revisionId: 1, mean: 20, predictionSpread: 0.1 }] },
    { feature, dimension: 'noSuchDimension', revisions: [] },
  ],
};

describe('questions', () => {
  it('are the marks, then the dimensions that a feature of the kind has', () => {
    expect(questionsOf(told).map((question) => question.key)).toEqual(['mark-3', 'dimension-7-diameter']);
  });

  it('keep their keys in what the computation is given, and a reading is weighed as a caliper’s', () => {
    const { marks, dimensions } = knowledgeOf(told, questionsOf(told));
    expect(marks.map((mark) => mark.key)).toEqual(['mark-3']);
    expect(dimensions[0]).toMatchObject({ key: 'dimension-7-diameter' });
    expect(dimensions[0]!.usualUncertainty).toBeCloseTo(0.03 / Math.sqrt(3), 12);
  });
});

describe('a chance in words', () => {
  it.each([
    [1, '100 %'],
    [0.9999, 'over 99 %'],
    [0.624, '62 %'],
    [0.004, 'under 1 %'],
    [0, '0 %'],
  ])('%d is %s', (chance, words) => expect(percentOf(chance)).toBe(words));
});
