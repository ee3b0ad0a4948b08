import { emptyContent, type EditionContent, type Fix } from '../../../../shared/contract/edition-content';
import type { EditionText } from './edition-form';
import { mergeRows, mergedText } from './edition-merge';

const textOf = (content: Partial<EditionContent>, changeNote = ''): EditionText => ({
  content: { ...emptyContent, ...content },
  changeNote,
});

const fix = (key: string, title: string): Fix => ({
  key,
  title,
  kind: null,
  permanence: null,
  why: '',
  tools: [],
  materials: [],
  steps: [],
  revisionIds: [],
  afterwards: [],
  afterwardsNote: '',
  worksheet: null,
  acceptance: null,
});

describe('two texts of one draft', () => {
  it('when only one side changed a field, then that side is taken without a dispute', () => {
    const base = textOf({ title: 'old', cause: 'old' });

    const rows = mergeRows(
      base,
      textOf({ title: 'mine', cause: 'old' }),
      textOf({ title: 'old', cause: 'theirs' }),
    );

    expect(rows.map(({ id, choice, disputed }) => ({ id, choice, disputed }))).toEqual([
      { id: 'title', choice: 'mine', disputed: false },
      { id: 'cause', choice: 'theirs', disputed: false },
    ]);
  });

  it('when both changed a field, then it is disputed and mine is proposed', () => {
    const [row] = mergeRows(textOf({ cause: 'old' }), textOf({ cause: 'mine' }), textOf({ cause: 'theirs' }));

    expect(row).toMatchObject({
      id: 'cause',
      mine: 'mine',
      theirs: 'theirs',
      choice: 'mine',
      disputed: true,
    });
  });

  it('when both say the same, then there is nothing to choose, whatever the order of members', () => {
    const mine = textOf({
      readings: [
        {
          key: 'reading-1',
          revisionId: null,
          dimension: 'lip',
          value: 1,
          unit: 'mm',
          instrument: 'caliper',
          uncertainty: null,
        },
      ],
    });
    const theirs = textOf({
      readings: [
        {
          uncertainty: null,
          instrument: 'caliper',
          unit: 'mm',
          value: 1,
          dimension: 'lip',
          revisionId: null,
          key: 'reading-1',
        },
      ],
    });

    expect(mergeRows(textOf({}), mine, theirs)).toEqual([]);
  });

  it('when each side added a fix, then both stay, mine in their order and theirs after them', () => {
    const base = textOf({ fixes: [fix('fix-common', 'common')] });
    const mine = textOf({ fixes: [fix('fix-of-mine', 'mine'), fix('fix-common', 'common')] });
    const theirs = textOf({ fixes: [fix('fix-common', 'common'), fix('fix-of-theirs', 'theirs')] });

    const merged = mergedText(mine, theirs, mergeRows(base, mine, theirs));

    expect(merged.content.fixes.map((one) => one.title)).toEqual(['mine', 'common', 'theirs']);
  });

  it('when I removed a fix that they worded anew, then it is disputed, and taking theirs brings it back', () => {
    const base = textOf({ fixes: [fix('fix-common', 'old')] });
    const mine = textOf({});
    const theirs = textOf({ fixes: [fix('fix-common', 'new words')] });
    const [row] = mergeRows(base, mine, theirs);
    expect(row).toMatchObject({ mine: undefined, disputed: true, choice: 'mine' });
    expect(mergedText(mine, theirs, [row!]).content.fixes).toEqual([]);

    const merged = mergedText(mine, theirs, [{ ...row!, choice: 'theirs' }]);

    expect(merged.content.fixes[0]?.title).toBe('new words');
  });

  it('when sides are chosen field by field, then the merged text has exactly those', () => {
    const mine = textOf({ title: 'my title', cause: 'my cause', symptoms: ['rocks'] }, 'my note');
    const theirs = textOf({ title: 'their title', cause: 'their cause', symptoms: ['slips'] }, 'their note');

    const merged = mergedText(mine, theirs, [
      { id: 'title', choice: 'theirs' },
      { id: 'cause', choice: 'mine' },
      { id: 'symptoms', choice: 'theirs' },
      { id: 'changeNote', choice: 'theirs' },
    ]);

    expect(merged).toEqual(
      textOf({ title: 'their title', cause: 'my cause', symptoms: ['slips'] }, 'their note'),
    );
  });
});
