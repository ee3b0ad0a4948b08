import { describe, expect, it } from 'vitest';
import { missingFromContent } from './edition-completeness.js';
import { emptyContent, type EditionContent, type Fix } from './edition-content.js';

const fix: Fix = {
  key: 'fix-aaaa',
  title: 'Disc behind the plate',
  kind: 'shim',
  permanence: 'reversible',
  why: '',
  tools: [],
  materials: [],
  steps: [{ key: 'step-aaaa', text: 'Lay it in.', photoId: null }],
  revisionIds: [],
  afterwards: [],
  afterwardsNote: '',
  worksheet: null,
  acceptance: null,
};
const side = { partId: 1, feature: '', revisions: [{ revisionId: 2, holds: true }] };
const complete: EditionContent = {
  ...emptyContent,
  title: 'Bracket rocks',
  summary: 'A disc of 1.5 mm lets it sit flat.',
  joints: [{ a: side, b: side }],
  noticed: 'It rocks.',
  cause: 'The lip is wider than the recess.',
  fixes: [fix],
};
const reading = {
  key: 'read-aaaa',
  revisionId: null,
  unit: 'mm',
  instrument: 'caliper',
  uncertainty: null,
} as const;

const missing = (over: Partial<EditionContent>): string[] =>
  missingFromContent({ ...complete, ...over }).map((problem) => problem.path);

describe('what an edition lacks before it can go to the desk', () => {
  it('is nothing where each needed field says something', () => {
    expect(missing({})).toEqual([]);
  });

  it('is told in the order of the form, each with a remedy', () => {
    const problems = missingFromContent(emptyContent);
    expect(problems.map((problem) => problem.path)).toEqual([
      'title',
      'summary',
      'joints',
      'symptoms',
      'cause',
      'fixes',
    ]);
    expect(problems.filter((problem) => !problem.remedy)).toEqual([]);
  });

  it.each<[string, Partial<EditionContent>, string]>([
    ['a side without a part', { joints: [{ a: { ...side, partId: null }, b: side }] }, 'joints.0.a.partId'],
    [
      'a side without a marked revision',
      { joints: [{ a: side, b: { ...side, revisions: [] } }] },
      'joints.0.b.revisions',
    ],
    [
      'a side with none for which it holds',
      { joints: [{ a: side, b: { ...side, revisions: [{ revisionId: 2, holds: false }] } }] },
      'joints.0.b.revisions',
    ],
    ['a cause of white space', { cause: ' '.repeat(40) }, 'cause'],
    [
      'a reading without a name',
      { readings: [{ ...reading, dimension: '', value: 1 }] },
      'readings.0.dimension',
    ],
    [
      'a reading without a value',
      { readings: [{ ...reading, dimension: 'lip', value: null }] },
      'readings.0.value',
    ],
    ['a fix without a name', { fixes: [{ ...fix, title: 'x' }] }, 'fixes.0.title'],
    ['a fix without a kind', { fixes: [{ ...fix, kind: null }] }, 'fixes.0.kind'],
    ['a fix without a permanence', { fixes: [fix, { ...fix, permanence: null }] }, 'fixes.1.permanence'],
    [
      'a fix with an empty step only',
      { fixes: [{ ...fix, steps: [{ ...fix.steps[0]!, text: ' \n' }] }] },
      'fixes.0.steps',
    ],
    [
      'a photo without alternative text',
      { photos: [{ photoId: 1, alt: '', caption: 'x', callouts: [] }] },
      'photos.0.alt',
    ],
  ])('names %s', (_name, over, path) => {
    expect(missing(over)).toEqual([path]);
  });

  it('takes a symptom from the list instead of own words, and own words instead of one', () => {
    expect(missing({ noticed: '', symptoms: ['rocks'] })).toEqual([]);
    expect(missing({ noticed: ' ', symptoms: [] })).toEqual(['symptoms']);
  });

  it('takes a reading of zero for a value', () => {
    expect(missing({ readings: [{ ...reading, dimension: 'lip', value: 0 }] })).toEqual([]);
  });
});
