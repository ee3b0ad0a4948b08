import { describe, expect, it } from 'vitest';
import { emptyContent, type EditionContent, type Reading } from '../contract/edition-content.js';
import type { EditionText } from './edition-text.js';
import { holdBack } from './hold-back.js';

const textOf = (content: Partial<EditionContent>, changeNote = ''): EditionText => ({
  content: { ...emptyContent, ...content },
  changeNote,
});
const reading = (key: string, value: number): Reading => ({
  key,
  revisionId: null,
  dimension: 'lip',
  value,
  unit: 'mm',
  instrument: 'caliper',
  uncertainty: null,
});

describe('a text of which something cannot be saved', () => {
  it('when a field is named, then it goes back to what was saved and the others stay', () => {
    const text = textOf({ title: 'too long', cause: 'new' }, 'too long');
    const saved = textOf({ title: 'old', cause: 'old' }, 'old note');
    expect(holdBack(text, saved, ['title', 'changeNote'])).toEqual(
      textOf({ title: 'old', cause: 'new' }, 'old note'),
    );
  });

  it('when an item is named, then only that goes back, wherever it stood', () => {
    const text = textOf({ readings: [reading('reading-2', 20), reading('reading-1', 10)] });
    const saved = textOf({ readings: [reading('reading-1', 1), reading('reading-2', 2)] });
    expect(holdBack(text, saved, ['readings.1.value', 'readings.1.unit']).content.readings).toEqual([
      reading('reading-2', 20),
      reading('reading-1', 1),
    ]);
  });

  it('when an item was never saved, then it is left out', () => {
    const text = textOf({ readings: [reading('reading-1', 1), reading('reading-2', 2)] });
    expect(holdBack(text, textOf({}), ['readings.0']).content.readings).toEqual([reading('reading-2', 2)]);
  });

  it('when a list as such is named, then all of it goes back', () => {
    const saved = textOf({ symptoms: ['rocks'] });
    expect(holdBack(textOf({ symptoms: ['slips', 'binds'] }), saved, ['symptoms.0', 'symptoms'])).toEqual(
      saved,
    );
  });

  it('when nothing is named that it has, then it stays as it is', () => {
    const text = textOf({ title: 'new' });
    expect(holdBack(text, textOf({}), ['elsewhere', ''])).toEqual(text);
  });
});
