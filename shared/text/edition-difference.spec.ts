import { describe, expect, it } from 'vitest';
import type { Callout } from '../contract/callouts.js';
import { emptyContent, type EditionContent, type Fix, type PhotoUse } from '../contract/edition-content.js';
import { editionDifference } from './edition-difference.js';
import type { ContentNames } from './edition-fields.js';

const names: ContentNames = {
  part: (id) => `part ${id}`,
  revision: (id) => `revision ${id}`,
  symptom: (slug) => slug.replaceAll('-', ' '),
  photo: (id) => `photo ${id}`,
};

function fix(key: string, over: Partial<Fix> = {}): Fix {
  return {
    key,
    title: `Remedy ${key}`,
    kind: 'shim',
    permanence: 'reversible',
    why: '',
    tools: [],
    materials: [],
    steps: [],
    revisionIds: [],
    afterwards: [],
    afterwardsNote: '',
    worksheet: null,
    acceptance: null,
    ...over,
  };
}

const content = (over: Partial<EditionContent> = {}): EditionContent => ({
  ...emptyContent,
  title: 'Bracket rocks',
  ...over,
});
const fieldsIn = (from: EditionContent | null, to: EditionContent): string[] =>
  editionDifference(from, to, names).changed.map((change) => change.field);

describe('edition difference', () => {
  it('finds nothing between an edition and itself, and counts only what it says', () => {
    const same = content({ cause: 'The lip is wide.' });
    expect(editionDifference(same, same, names)).toEqual({ changed: [], unchangedFields: 2 });
  });

  it('counts everything as new when there is no earlier edition', () => {
    expect(editionDifference(null, content({ cause: 'The lip.' }), names)).toEqual({
      changed: [
        { field: 'title', label: 'Title', pieces: [{ kind: 'added', text: 'Bracket rocks' }] },
        { field: 'cause', label: 'Cause', pieces: [{ kind: 'added', text: 'The lip.' }] },
      ],
      unchangedFields: 0,
    });
  });

  it('names the fix and the step in which a word changed', () => {
    const step = { key: 'step-aaaa', photoId: null };
    const from = content({ fixes: [fix('fix-aaaa', { steps: [{ ...step, text: 'Turn by one turn.' }] })] });
    const to = content({ fixes: [fix('fix-aaaa', { steps: [{ ...step, text: 'Turn by half a turn.' }] })] });
    const { changed } = editionDifference(from, to, names);
    expect(changed).toHaveLength(1);
    expect(changed[0]).toMatchObject({
      field: 'fixes.fix-aaaa.steps.step-aaaa',
      label: 'Fix “Remedy fix-aaaa”, step 1',
    });
    expect(changed[0]?.pieces).toContainEqual({ kind: 'removed', text: 'one' });
  });

  it('tells fixes that only changed places as moved, and nothing else about them', () => {
    const from = content({ fixes: [fix('fix-aaaa'), fix('fix-bbbb')] });
    const to = content({ fixes: [fix('fix-bbbb'), fix('fix-aaaa')] });
    const { changed } = editionDifference(from, to, names);
    expect(changed.map((change) => change.label)).toEqual(['Order of the fixes']);
    expect(
      changed[0]?.pieces
        .filter((piece) => piece.kind !== 'removed')
        .map((piece) => piece.text)
        .join(''),
    ).toBe('1. Remedy fix-bbbb\n2. Remedy fix-aaaa');
  });

  it('does not call the others moved when a fix is put in before them', () => {
    const from = content({ fixes: [fix('fix-aaaa'), fix('fix-bbbb')] });
    const to = content({ fixes: [fix('fix-cccc'), fix('fix-aaaa'), fix('fix-bbbb')] });
    expect(fieldsIn(from, to)).toEqual([
      'fixes.fix-cccc.title',
      'fixes.fix-cccc.kind',
      'fixes.fix-cccc.permanence',
    ]);
  });

  it('shows a fix that is gone where it stood', () => {
    const from = content({ fixes: [fix('fix-aaaa', { kind: null, permanence: null })], sources: 'A' });
    expect(fieldsIn(from, content({ sources: 'B' }))).toEqual(['fixes.fix-aaaa.title', 'sources']);
  });

  it('names parts and revisions of a joint, and which of them no longer hold', () => {
    const joint = (holds: boolean) => ({
      a: { partId: 3, feature: 'raised lip', revisions: [{ revisionId: 7, holds }] },
      b: { partId: null, feature: '', revisions: [] },
    });
    const { changed } = editionDifference(
      content({ joints: [joint(true)] }),
      content({ joints: [joint(false)] }),
      names,
    );
    expect(changed).toEqual([
      {
        field: 'joints.0.a',
        label: 'Joint 1, first side',
        pieces: [
          { kind: 'same', text: 'part 3: raised lip\n' },
          { kind: 'removed', text: 'holds' },
          { kind: 'added', text: 'not' },
          { kind: 'same', text: ' for revision 7' },
        ],
      },
    ]);
  });

  it('follows a reading by its key and tells figure, unit and instrument', () => {
    const reading = {
      key: 'read-aaaa',
      revisionId: 7,
      dimension: 'lip diameter',
      unit: 'mm',
      instrument: 'caliper',
      uncertainty: null,
    } as const;
    const { changed } = editionDifference(
      content({ readings: [{ ...reading, value: 22.5 }] }),
      content({ readings: [{ ...reading, value: 22.1 }] }),
      names,
    );
    expect(changed.map((change) => change.label)).toEqual(['Reading “lip diameter”']);
    expect(changed[0]?.pieces.map((piece) => piece.text).join('')).toBe(
      'lip diameter: 22.522.1 mm, caliper, revision 7',
    );
  });

  it('tells a changed acceptance figure, what is to be done afterwards and another photo at a step', () => {
    const acceptance = { quantity: 'tilt', comparison: 'at-most', value: 0.1, unit: 'deg' } as const;
    const step = { key: 'step-aaaa', text: 'Look.' };
    const from = content({
      fixes: [fix('fix-aaaa', { acceptance, afterwards: ['flats'], steps: [{ ...step, photoId: 1 }] })],
    });
    const to = content({
      fixes: [
        fix('fix-aaaa', {
          acceptance: { ...acceptance, value: 0.2 },
          afterwards: ['flats', 'balance'],
          steps: [{ ...step, photoId: 2 }],
        }),
      ],
    });
    expect(fieldsIn(from, to)).toEqual([
      'fixes.fix-aaaa.steps.step-aaaa',
      'fixes.fix-aaaa.afterwards',
      'fixes.fix-aaaa.acceptance',
    ]);
  });

  it('keeps two uses of one photo apart', () => {
    const photos = [
      { photoId: 4, alt: 'The lip', caption: '', callouts: [] },
      { photoId: 4, alt: 'The lip again', caption: '', callouts: [] },
    ];
    const changedSecond = [photos[0]!, { photoId: 4, alt: 'The lip from below', caption: '', callouts: [] }];
    expect(fieldsIn(content({ photos }), content({ photos: changedSecond }))).toEqual(['photos.4.2']);
  });

  it('tells in words what was drawn on a photo, its value changed, or moved', () => {
    const ring: Callout = {
      kind: 'ring',
      key: 'ring-aaaa',
      label: 'lip',
      centre: { x: 0.5, y: 0.25 },
      radius: 0.1,
    };
    const across: Callout = {
      kind: 'dimension',
      key: 'dimension-aaaa',
      label: '',
      from: { x: 0.1, y: 0.5 },
      to: { x: 0.9, y: 0.5 },
      value: 22.5,
      unit: 'mm',
    };
    const withCallouts = (...callouts: Callout[]) =>
      content({ photos: [{ photoId: 4, alt: 'The lip', caption: '', callouts }] });
    const told = (from: EditionContent, to: EditionContent, kind: 'added' | 'removed') =>
      editionDifference(from, to, names).changed.flatMap((change) =>
        change.pieces.filter((piece) => piece.kind === kind).map((piece) => piece.text.trim()),
      );

    expect(told(withCallouts(), withCallouts(ring, across), 'added').join('\n')).toBe(
      'ring “lip”, at 50 % across, 25 % down, radius 10 % of the width\n' +
        'dimension 22.5 mm, from 10 % across, 50 % down to 90 % across, 50 % down',
    );
    expect(told(withCallouts(across), withCallouts({ ...across, value: 19.5 }), 'removed')).toEqual(['22.5']);
    const moved = { ...ring, centre: { x: 0.75, y: 0.25 } };
    expect(told(withCallouts(ring), withCallouts(moved), 'added')).toEqual(['75']);
  });

  it('takes an edition from before callouts as one without any', () => {
    const old = content({ photos: [{ photoId: 4, alt: 'The lip', caption: '' } as PhotoUse] });
    const now = content({ photos: [{ photoId: 4, alt: 'The lip', caption: '', callouts: [] }] });
    expect(fieldsIn(old, now)).toEqual([]);
  });
});
