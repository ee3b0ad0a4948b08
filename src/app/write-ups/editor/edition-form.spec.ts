import { emptyContent, type EditionContent } from '../../../../shared/contract/edition-content';
import { editionForm, textOf } from './edition-form';

const full: EditionContent = {
  ...emptyContent,
  title: 'Plate rocks',
  joints: [
    {
      a: { partId: 1, feature: 'lip', revisions: [{ revisionId: 11, holds: true }] },
      b: { partId: 2, feature: '', revisions: [] },
    },
  ],
  symptoms: ['rocks'],
  readings: [
    {
      key: 'reading-1',
      revisionId: 11,
      dimension: 'lip',
      value: 22.5,
      unit: 'mm',
      instrument: 'caliper',
      uncertainty: 0.02,
    },
  ],
  fixes: [
    {
      key: 'fix-key-1',
      title: 'Coin',
      kind: 'shim',
      permanence: 'reversible',
      why: '',
      tools: ['caliper'],
      materials: ['coin'],
      steps: [{ key: 'step-key-1', text: 'Put it in.', photoId: 5 }],
      revisionIds: [11],
      afterwards: ['flats'],
      afterwardsNote: '',
      worksheet: null,
      acceptance: { quantity: 'tilt', comparison: 'at-most', value: 0.1, unit: 'deg' },
    },
  ],
  photos: [{ photoId: 5, alt: 'The plate', caption: '', callouts: [] }],
};

describe('the form of an edition', () => {
  it('when a text goes into the form and comes out, then it says the same', () => {
    expect(textOf(editionForm({ content: full, changeNote: 'why' }))).toEqual({
      content: full,
      changeNote: 'why',
    });
  });

  it('when an acceptance figure lacks its value, then it is not part of the text but stays in the form', () => {
    const form = editionForm({ content: full, changeNote: '' });

    form.controls.fixes.at(0).controls.acceptance.controls.value.setValue(null);

    expect(textOf(form).content.fixes[0]?.acceptance).toBeNull();
    expect(form.getRawValue().fixes[0]?.acceptance.quantity).toBe('tilt');
  });
});
