import { TestBed } from '@angular/core/testing';
import { EMPTY, Subject, of, throwError, type Observable } from 'rxjs';
import { emptyContent, type EditionContent } from '../../../../shared/contract/edition-content';
import type { Draft } from '../../../../shared/contract/write-ups';
import { ApiProblem } from '../../core/api-problem';
import { savePause } from './autosave';
import { DraftBackup, type BackedUpText } from './draft-backup';
import { DraftEditing } from './draft-editing';
import { Drafts } from './drafts';
import type { EditionText } from './edition-form';
import { PartDirectory } from './part-directory';

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
});

function editingWith(options: { save?: () => Observable<Draft>; kept?: BackedUpText } = {}) {
  const saves: { text: EditionText; version: number }[] = [];
  const dropped: number[] = [];
  TestBed.configureTestingModule({
    providers: [
      DraftEditing,
      {
        provide: Drafts,
        useValue: {
          save: (_id: number, text: EditionText, version: number) => {
            saves.push({ text, version });
            return (
              (saves.length === 1 && options.save?.()) || of({ ...draftWith(text.content, version + 1) })
            );
          },
        },
      },
      { provide: PartDirectory, useValue: { learn: () => EMPTY } },
      {
        provide: DraftBackup,
        useValue: {
          find: () => options.kept ?? null,
          keep: () => undefined,
          drop: (id: number) => dropped.push(id),
        },
      },
    ],
  });
  return { editing: TestBed.inject(DraftEditing), saves, dropped };
}

describe('writing a draft', () => {
  beforeEach(() => vi.useFakeTimers());
  afterEach(() => vi.useRealTimers());

  it('when somebody else saved it, then both texts are kept: what is chosen goes on, the other is set aside', () => {
    const theirs = draftWith({ title: 'their title', cause: 'their cause' }, 4);
    const movedOn = new ApiProblem({
      type: '/problems/edition-moved-on',
      title: '',
      status: 412,
      detail: '',
      current: theirs,
    });
    const { editing, saves } = editingWith({ save: () => throwError(() => movedOn) });
    editing.open(draftWith({ title: 'old title' }));
    editing.form().controls.title.setValue('my title');
    vi.advanceTimersByTime(savePause);
    const rows = editing.mergeRows() ?? [];
    expect(rows.map((row) => [row.id, row.choice, row.disputed])).toEqual([
      ['title', 'mine', true],
      ['cause', 'theirs', false],
    ]);

    editing.finishMerge(rows);
    vi.advanceTimersByTime(savePause);

    expect(editing.mergeRows()).toBeNull();
    expect(editing.form().getRawValue()).toMatchObject({ title: 'my title', cause: 'their cause' });
    expect(editing.setAside().map(({ row, side }) => row[side])).toEqual(['their title', '']);
    expect(saves[1]).toMatchObject({
      version: 4,
      text: { content: { title: 'my title', cause: 'their cause' } },
    });
    expect(editing.isSettled()).toBe(true);
  });

  it('when this browser kept a newer text of the same version, then it is back in the form and goes to the server', () => {
    const kept = {
      version: 1,
      at: new Date('2026-12-01T12:04:00Z'),
      text: { content: { ...emptyContent, title: 'kept' }, changeNote: '' },
    };
    const { editing, saves, dropped } = editingWith({ kept });

    editing.open(draftWith({ title: 'on the server' }));
    vi.advanceTimersByTime(savePause);

    expect(editing.form().controls.title.value).toBe('kept');
    expect(editing.restored()?.at).toEqual(kept.at);
    expect(saves[0]).toMatchObject({ version: 1, text: { content: { title: 'kept' } } });
    expect(dropped).toEqual([7]);
  });

  it('when this browser kept a text of an older version, then nothing is sent before somebody has chosen', () => {
    const kept = {
      version: 1,
      at: new Date(),
      text: { content: { ...emptyContent, title: 'kept' }, changeNote: '' },
    };
    const { editing, saves } = editingWith({ kept });

    editing.open(draftWith({ title: 'on the server' }, 3));
    vi.advanceTimersByTime(60_000);

    expect(editing.mergeRows()).toMatchObject([{ id: 'title', mine: 'kept', theirs: 'on the server' }]);
    expect(saves).toEqual([]);
    expect(editing.isSettled()).toBe(false);
  });

  it('when a text breaks a limit, then it is not sent and the field says why', () => {
    const { editing, saves } = editingWith({ save: () => new Subject() });
    editing.open(draftWith({}));

    editing.form().controls.title.setValue('x'.repeat(141));
    vi.advanceTimersByTime(savePause);

    expect(saves).toEqual([]);
    expect(editing.saveState()).toMatchObject({ kind: 'not-saved', why: { fields: [{ path: 'title' }] } });
    expect(editing.form().controls.title.errors?.['told']).toContain('140');
  });

  it('when it is a later edition without a change note, then that is missing too', () => {
    const { editing } = editingWith();
    editing.open(draftWith({}, 1, 2));
    expect(editing.missing().map((field) => field.path)).toContain('changeNote');

    editing.form().controls.changeNote.setValue('Said which coin.');

    expect(editing.missing().map((field) => field.path)).not.toContain('changeNote');
  });
});
