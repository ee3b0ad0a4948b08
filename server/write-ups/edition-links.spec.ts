import { describe, expect, it } from 'vitest';
import { emptyContent, type EditionContent } from '../../shared/contract/edition-content.js';
import { editionLinks } from './edition-links.js';

const side = (partId: number | null, ...marks: [number, boolean][]) => ({
  partId,
  feature: '',
  revisions: marks.map(([revisionId, holds]) => ({ revisionId, holds })),
});

const content = (over: Partial<EditionContent>): EditionContent => ({ ...emptyContent, ...over });

describe('edition links', () => {
  it('lists both sides of each joint by its place, and leaves out a side without a part', () => {
    const joints = [
      { a: side(1), b: side(2) },
      { a: side(1), b: side(null) },
    ];
    expect(editionLinks(content({ joints })).sides).toEqual([
      { joint: 0, side: 'a', partId: 1 },
      { joint: 0, side: 'b', partId: 2 },
      { joint: 1, side: 'a', partId: 1 },
    ]);
  });

  it('lists a revision once, and as holding where any joint says so', () => {
    const joints = [
      { a: side(1, [10, false], [11, false]), b: side(2, [20, true]) },
      { a: side(1, [10, true]), b: side(3) },
    ];
    expect(editionLinks(content({ joints })).revisions).toEqual([
      { revisionId: 10, holds: true },
      { revisionId: 11, holds: false },
      { revisionId: 20, holds: true },
    ]);
  });

  it('lists photos of the page and of steps once, and symptoms once', () => {
    const fix = {
      key: 'fix-aaaa',
      title: 'Shim',
      kind: 'shim',
      permanence: 'reversible',
      why: '',
      tools: [],
      materials: [],
      revisionIds: [10, 10, 20],
      afterwards: [],
      afterwardsNote: '',
      worksheet: null,
      acceptance: null,
      steps: [5, null, 6].map((photoId, index) => ({ key: `step-aaa${index}`, text: '', photoId })),
    } as const;
    const links = editionLinks(
      content({
        symptoms: ['rocks', 'rocks'],
        photos: [{ photoId: 6, alt: 'x', caption: '', callouts: [] }],
        fixes: [
          {
            ...fix,
            steps: [...fix.steps],
            tools: [],
            materials: [],
            revisionIds: [10, 10, 20],
            afterwards: [],
          },
        ],
      }),
    );
    expect(links.photoIds).toEqual([6, 5]);
    expect(links.symptomSlugs).toEqual(['rocks']);
    expect(links.fixes).toEqual([
      { key: 'fix-aaaa', position: 0, kind: 'shim', permanence: 'reversible', revisionIds: [10, 20] },
    ]);
  });
});
