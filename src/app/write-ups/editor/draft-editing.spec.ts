import { TestBed } from '@angular/core/testing';
import { EMPTY, of, throwError, type Observable } from 'rxjs';
import { emptyContent, type EditionContent } from '../../../../shared/contract/edition-content';
import type { Problem } from '../../../../shared/contract/problem';
import type { Draft, EditionLine } from '../../../../shared/contract/write-ups';
import { ApiProblem } from '../../core/api-problem';
import { savePause } from './autosave';
import { DraftBackup, type BackedUpText } from './draft-backup';
import { DraftEditing } from './draft-editing';
import { Drafts } from './drafts';
import type { EditionText } from '../../../../shared/editions/edition-text';
import { mergeEditions } from '../../../../shared/editions/merge-editions';
import { PartDirectory } from './part-directory';
import type { SetAside } from './set-aside';

const draftWith = (content: Partial<EditionContent>, version = 1, number = 1): Draft => ({
  id: 7,
  writeUpId: 3,
  slug: null,
  number,
  state: 'draft',
  author: { id: 1, displayName: 'Ada' },
  changeNote: '',
  content: { ...emptyContent, ...content },
  version,
  updatedAt: '2026-12-01T12:03:00.000Z',
  returnReason: null,
  photos: [],
  base: null,
  overtakenBy: null,
  writtenBy: [],
});

type Answer = (text: EditionText) => Observable<Draft>;

/** `answers`: those of the first saves, in order; later ones are taken as they come. */
function editingWith(options: { answers?: Answer[]; kept?: BackedUpText } = {}) {
  const saves: { text: EditionText; version: number; base: number | undefined }[] = [];
  const backup = {
    find: vi.fn(() => options.kept ?? null),
    keep: vi.fn(() => true),
    drop: vi.fn(),
    findSetAside: () => [],
    keepSetAside: vi.fn(),
  };
  TestBed.configureTestingModule({
    providers: [
      DraftEditing,
      {
        provide: Drafts,
        useValue: {
          save: (_id: number, text: EditionText, version: number, base?: number) => {
            saves.push({ text, version, base });
            const answer = options.answers?.[saves.length - 1];
            return answer?.(text) ?? of(draftWith(text.content, version + 1));
          },
        },
      },
      {
        provide: PartDirectory,
        useValue: { learn: () => EMPTY, namesWith: () => ({ symptom: (slug: string) => slug }) },
      },
      { provide: DraftBackup, useValue: backup },
    ],
  });
  return { editing: TestBed.inject(DraftEditing), saves, backup };
}

const refused = (over: Partial<Problem>) => () =>
  throwError(() => new ApiProblem({ type: '', title: '', status: 422, detail: '', ...over }));
const line = (number: number): EditionLine => ({
  id: number * 10,
  number,
  author: { id: 2, displayName: 'Bea' },
  changeNote: '',
  publishedAt: '2026-12-01T12:00:00.000Z',
  title: '',
});
const publishedText = (number: number, content: Partial<EditionContent>) => ({
  edition: line(number),
  content: { ...emptyContent, ...content },
  photos: [],
});

/** What the panel gives where nobody chose otherwise. */
function mergedAsOffered(editing: DraftEditing, setAside: SetAside[] = []) {
  const { base, mine, theirs } = editing.merging()!;
  return { text: mergeEditions(base, mine, theirs).text, setAside };
}

describe('writing a draft', () => {
  beforeEach(() => vi.useFakeTimers());
  afterEach(() => vi.useRealTimers());

  it('when somebody else saved it, then nothing is sent before the two are merged, and what is not taken is kept', () => {
    const theirs = draftWith({ title: 'their title', cause: 'their cause' }, 4);
    const movedOn = refused({ type: '/problems/edition-moved-on', status: 412, current: theirs });
    const { editing, saves, backup } = editingWith({ answers: [movedOn] });
    editing.open(draftWith({ title: 'old title' }));
    editing.form().controls.title.setValue('my title');
    vi.advanceTimersByTime(savePause);
    expect(editing.merging()).toMatchObject({
      base: { content: { title: 'old title' } },
      mine: { content: { title: 'my title' } },
      theirs: { content: { title: 'their title' } },
      with: { kind: 'draft' },
    });
    vi.advanceTimersByTime(60_000);
    expect(saves).toHaveLength(1);

    const aside = { name: 'Title', whose: 'What was saved elsewhere', words: 'their title' };
    editing.finishMerge(mergedAsOffered(editing, [aside]));
    vi.advanceTimersByTime(savePause);

    expect(editing.merging()).toBeNull();
    expect(editing.form().getRawValue()).toMatchObject({ title: 'my title', cause: 'their cause' });
    expect(editing.setAside()).toEqual([aside]);
    expect(backup.keepSetAside).toHaveBeenCalledWith(7, [aside]);
    expect(saves[1]).toMatchObject({
      version: 4,
      text: { content: { title: 'my title', cause: 'their cause' } },
    });
    expect(editing.isSettled()).toBe(true);
  });

  it('when it was merged with an edition published since, then the next save names that edition, and only that one', () => {
    const { editing, saves } = editingWith({
      answers: [(text) => of({ ...draftWith(text.content, 2, 3), base: line(2) })],
    });
    editing.open({ ...draftWith({ title: 'old', cause: 'mine' }), base: line(1), overtakenBy: line(2) });
    editing.mergeWith({
      base: publishedText(1, { title: 'old', cause: 'old' }),
      current: publishedText(2, { title: 'theirs', cause: 'old' }),
      changed: ['title'],
    });
    expect(editing.merging()?.with).toMatchObject({ kind: 'edition', edition: { number: 2 } });

    editing.finishMerge(mergedAsOffered(editing));
    vi.advanceTimersByTime(savePause);
    editing.form().controls.summary.setValue('more');
    vi.advanceTimersByTime(savePause);

    expect(saves.map((save) => save.base)).toEqual([20, undefined]);
    expect(saves[0]!.text.content).toMatchObject({ title: 'theirs', cause: 'mine' });
  });

  it('when yet another edition was published while it was merged, then the merge with that one opens', () => {
    const ground = (number: number) => ({
      base: publishedText(1, {}),
      current: publishedText(number, { title: `edition ${number}` }),
      changed: ['title'],
    });
    const { editing } = editingWith({
      answers: [refused({ type: '/problems/edition-moved-on', status: 409, ...ground(3) })],
    });
    editing.open({ ...draftWith({ cause: 'mine' }), base: line(1), overtakenBy: line(2) });
    editing.mergeWith(ground(2));
    editing.finishMerge(mergedAsOffered(editing));
    vi.advanceTimersByTime(savePause);

    expect(editing.merging()).toMatchObject({
      mine: { content: { title: 'edition 2', cause: 'mine' } },
      theirs: { content: { title: 'edition 3' } },
    });
  });

  it('when this browser kept a newer text of the same version, then it is back in the form and goes to the server', () => {
    const kept = {
      version: 1,
      at: new Date('2026-12-01T12:04:00Z'),
      text: { content: { ...emptyContent, title: 'kept' }, changeNote: '' },
      base: { content: { ...emptyContent, title: 'before' }, changeNote: '' },
    };
    const { editing, saves, backup } = editingWith({ kept });

    editing.open(draftWith({ title: 'on the server' }));
    vi.advanceTimersByTime(savePause);

    expect(editing.form().controls.title.value).toBe('kept');
    expect(editing.restored()?.at).toEqual(kept.at);
    expect(saves[0]).toMatchObject({ version: 1, text: { content: { title: 'kept' } } });
    expect(backup.drop).toHaveBeenCalledWith(7);
  });

  it('when this browser kept a text of an older version, then nothing is sent before somebody has chosen', () => {
    const kept = {
      version: 1,
      at: new Date(),
      text: { content: { ...emptyContent, title: 'kept' }, changeNote: '' },
      base: { content: { ...emptyContent, title: 'before' }, changeNote: '' },
    };
    const { editing, saves } = editingWith({ kept });

    editing.open(draftWith({ title: 'on the server' }, 3));
    vi.advanceTimersByTime(60_000);

    expect(editing.merging()).toMatchObject({
      base: { content: { title: 'before' } },
      mine: { content: { title: 'kept' } },
      theirs: { content: { title: 'on the server' } },
    });
    expect(saves).toEqual([]);
    expect(editing.isSettled()).toBe(false);
  });

  it('when a field breaks a limit, then all the others are saved, and it is kept here and says why', () => {
    const { editing, saves, backup } = editingWith();
    editing.open(draftWith({ title: 'old' }));
    backup.drop.mockClear();

    editing.form().controls.cause.setValue('because');
    editing.form().controls.title.setValue('x'.repeat(141));
    vi.advanceTimersByTime(savePause);

    expect(saves.map(({ text }) => [text.content.title, text.content.cause])).toEqual([['old', 'because']]);
    expect(editing.saveState()).toMatchObject({ kind: 'partly-saved', heldBack: [{ path: 'title' }] });
    expect(editing.heldBack()).toMatchObject([{ path: 'title' }]);
    expect(editing.form().controls.title.errors?.['told']).toContain('140');
    expect(editing.form().controls.title.value).toHaveLength(141);
    expect(backup.drop).not.toHaveBeenCalledWith(7);
    expect(backup.keep).toHaveBeenLastCalledWith(
      7,
      2,
      expect.objectContaining({ content: expect.objectContaining({ title: 'x'.repeat(141) }) }),
      expect.objectContaining({ content: expect.objectContaining({ title: 'old', cause: 'because' }) }),
    );
    expect(editing.isSettled()).toBe(false);
  });

  it('when nothing but what cannot be saved was changed, then nothing is sent', () => {
    const { editing, saves } = editingWith();
    editing.open(draftWith({}));
    editing.form().controls.title.setValue('x'.repeat(141));
    vi.advanceTimersByTime(savePause);
    expect(saves).toEqual([]);
    expect(editing.saveState()).toMatchObject({ kind: 'not-saved', why: { fields: [{ path: 'title' }] } });
  });

  it('when the server refuses a field, then all the others are sent again without it', () => {
    const fields = [{ path: 'content.symptoms.0', message: 'is not on the list of symptoms' }];
    const { editing, saves } = editingWith({ answers: [refused({ fields })] });
    editing.open(draftWith({}));
    editing.form().controls.symptoms.setValue(['gone', 'rocks']);
    editing.form().controls.cause.setValue('because');
    vi.advanceTimersByTime(savePause);

    expect(saves.map(({ text }) => text.content.symptoms)).toEqual([['gone', 'rocks'], ['rocks']]);
    expect(editing.saveState()).toMatchObject({ kind: 'partly-saved', heldBack: [{ path: 'symptoms.0' }] });
  });

  it('when it is a later edition without a change note, then that is missing too', () => {
    const { editing } = editingWith();
    editing.open(draftWith({}, 1, 2));
    expect(editing.missing().map((field) => field.path)).toContain('changeNote');

    editing.form().controls.changeNote.setValue('Said which coin.');

    expect(editing.missing().map((field) => field.path)).not.toContain('changeNote');
  });
});
