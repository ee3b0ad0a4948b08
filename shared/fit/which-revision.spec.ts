import { describe, expect, it } from 'vitest';
import { entropyOf, whichRevision, type KnownMark, type RevisionKnowledge } from './which-revision.js';

const unknownDays = (id: number) => ({ id, soldFrom: null, soldTo: null });
const three: RevisionKnowledge = {
  revisions: [1, 2, 3].map(unknownDays),
  dimensions: [],
  marks: [],
  asOf: '2026-12-01',
};
const boss = (...means: number[]) => ({
  key: 'boss',
  usualUncertainty: 0.02,
  revisions: means.map((mean, index) => ({ revisionId: index + 1, mean, predictionSpread: 0.03 })),
});
const mark = (key: string, ...shows: boolean[]): KnownMark => ({
  key,
  revisions: shows.map((answer, index) => ({ revisionId: index + 1, shows: answer })),
});
const chancesOf = (...call: Parameters<typeof whichRevision>): number[] =>
  whichRevision(...call).chances.map((entry) => entry.chance);

describe('the chance before any answer', () => {
  it('is even where a first day is not known', () => {
    expect(chancesOf(three, [])).toEqual([1 / 3, 1 / 3, 1 / 3]);
    expect(whichRevision(three, []).prior).toBe('even');
  });

  it('goes by the months sold where all first days are known, the newest counted up to today', () => {
    const revisions = [
      { id: 1, soldFrom: '2024-01-01', soldTo: '2026-01-01' },
      { id: 2, soldFrom: '2026-01-01', soldTo: null },
    ];
    const told = { ...three, revisions, asOf: '2027-01-01' };
    const [first, second] = chancesOf(told, []);
    expect(first! / second!).toBeCloseTo(731 / 365, 10);
    expect(whichRevision(told, []).prior).toBe('months-sold');
  });

  it('counts at least a month for a revision that has only just come, or has not come yet', () => {
    const revisions = [
      { id: 1, soldFrom: '2026-01-01', soldTo: '2026-03-02' },
      { id: 2, soldFrom: '2027-06-01', soldTo: null },
    ];
    const [first, second] = chancesOf({ ...three, revisions }, []);
    expect(first! / second!).toBeCloseTo(60 / (365.25 / 12), 10);
  });
});

describe('an answer', () => {
  it('on a mark moves the chances by 98 to 2', () => {
    const [a, b, c] = chancesOf({ ...three, marks: [mark('left', true, false, false)] }, [
      { key: 'left', shows: true },
    ]);
    expect(a).toBeCloseTo(0.98 / 1.02, 12);
    expect(b).toBeCloseTo(0.02 / 1.02, 12);
    expect(c).toBe(b);
  });

  it('with a reading moves them by normal densities of variance spread² + u²', () => {
    const [a, b] = chancesOf(
      { ...three, revisions: three.revisions.slice(0, 2), dimensions: [boss(20, 20.1)] },
      [{ key: 'boss', value: 20.02, uncertainty: 0.04 }],
    );
    // Scale 0.05: distances 0.4 and 1.6, so the ratio is exp((1.6² − 0.4²)/2) = exp(1.2).
    expect(a! / b!).toBeCloseTo(Math.exp(1.2), 10);
  });

  it('leaves a revision of which it says nothing where it was', () => {
    const told = { ...three, dimensions: [boss(20, 20.1)], marks: [mark('left', true, false)] };
    const [a, b, c] = chancesOf(told, [
      { key: 'boss', value: 20, uncertainty: 0.01 },
      { key: 'left', shows: true },
    ]);
    expect(c).toBeCloseTo(1 / 3, 12);
    expect(a).toBeGreaterThan(0.66);
    expect(b).toBeLessThan(0.01);
  });

  it('that nobody could give leaves all where they were, and its question is not asked again', () => {
    const told = { ...three, marks: [mark('left', true, false, false)] };
    const { chances, next } = whichRevision(told, [{ key: 'left', cannotTell: true }]);
    expect(chances.map((entry) => entry.chance)).toEqual([1 / 3, 1 / 3, 1 / 3]);
    expect(next).toBeNull();
  });

  it('far from every revision is named, and the chances stay numbers', () => {
    const told = { ...three, dimensions: [boss(20, 20.1, 20.2)] };
    const { chances, strange } = whichRevision(told, [{ key: 'boss', value: 0.787, uncertainty: 0.02 }]);
    expect(strange).toEqual(['boss']);
    expect(chances.reduce((sum, entry) => sum + entry.chance, 0)).toBeCloseTo(1, 12);
  });

  it.each([0, -0.01, NaN])('with the uncertainty %d is refused', (uncertainty) => {
    const told = { ...three, dimensions: [boss(20, 20.1)] };
    expect(() => whichRevision(told, [{ key: 'boss', value: 20, uncertainty }])).toThrow(RangeError);
  });

  it('without any revision is refused', () => {
    expect(() => whichRevision({ ...three, revisions: [] }, [])).toThrow(RangeError);
  });
});

describe('the next question', () => {
  const four: RevisionKnowledge = { ...three, revisions: [1, 2, 3, 4].map(unknownDays) };

  it('is the one that halves rather than the one that splits off one', () => {
    const marks = [mark('one', true, false, false, false), mark('half', true, true, false, false)];
    expect(whichRevision({ ...four, marks }, []).next!.key).toBe('half');
  });

  it('expects of a mark that halves all that its slips leave: 1 − H(0.02) bits', () => {
    const { next } = whichRevision({ ...four, marks: [mark('half', true, true, false, false)] }, []);
    expect(next!.bits).toBeCloseTo(1 - entropyOf([0.02, 0.98]), 10);
  });

  it('expects of a dimension that tells all apart the whole entropy', () => {
    const { next } = whichRevision({ ...four, dimensions: [boss(20, 21, 22, 23)] }, []);
    expect(next!.bits).toBeCloseTo(2, 6);
  });

  it('is a mark before a dimension, and the first of two alike', () => {
    const marks = [mark('first', true, true, false, false), mark('second', true, true, false, false)];
    const dimensions = [{ ...boss(20, 20, 20, 20), key: 'same' }];
    expect(whichRevision({ ...four, marks, dimensions }, []).next!.key).toBe('first');
  });

  it('is none where nothing tells the revisions apart', () => {
    const told = {
      ...four,
      dimensions: [boss(20, 20, 20, 20)],
      marks: [mark('all', true, true, true, true)],
    };
    expect(whichRevision(told, []).next).toBeNull();
  });

  it('is none where the revision is beyond doubt', () => {
    const told = {
      ...four,
      dimensions: [boss(20, 21, 22, 23), { ...boss(5, 6, 7, 8), key: 'recess' }],
    };
    const { next, chances } = whichRevision(told, [{ key: 'boss', value: 22, uncertainty: 0.02 }]);
    expect(next).toBeNull();
    expect(chances[2]!.chance).toBeGreaterThan(0.999999);
  });
});
