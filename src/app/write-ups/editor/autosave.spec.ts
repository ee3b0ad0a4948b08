import { Observable, Subject, map, of, throwError } from 'rxjs';
import { emptyContent } from '../../../../shared/contract/edition-content';
import type { Problem } from '../../../../shared/contract/problem';
import type { Draft } from '../../../../shared/contract/write-ups';
import type { EditionText } from '../../../../shared/editions/edition-text';
import { Autosave, savePause } from './autosave';

const titled = (title: string): EditionText => ({ content: { ...emptyContent, title }, changeNote: '' });

function draftOf(text: EditionText, version: number): Draft {
  return {
    id: 7,
    writeUpId: 3,
    slug: null,
    number: 1,
    state: 'draft',
    author: { id: 1, displayName: 'Ada' },
    changeNote: text.changeNote,
    content: text.content,
    version,
    updatedAt: '2026-12-01T12:03:00.000Z',
    returnReason: null,
    photos: [],
    base: null,
    overtakenBy: null,
    writtenBy: [],
  };
}

const problem = (status: number, type = 'internal', more: Partial<Problem> = {}): Problem => ({
  type: `/problems/${type}`,
  title: type,
  status,
  detail: type,
  ...more,
});

/** An autosave whose saves are answered one after the other by `answers`; then by success. */
function autosaveThat(...answers: ((text: EditionText, version: number) => Observable<Draft>)[]) {
  const sent: { title: string; version: number }[] = [];
  const autosave = new Autosave(
    {
      save: (text, version) => {
        sent.push({ title: text.content.title, version });
        const answer = (answers.shift() ?? (() => of(draftOf(text, version + 1))))(text, version);
        return answer.pipe(map((draft) => ({ draft, heldBack: [] })));
      },
      problemOf: (error) => error as Problem,
    },
    { version: 1, at: new Date('2026-12-01T12:00:00Z') },
  );
  return { autosave, sent };
}

describe('saving while typing', () => {
  beforeEach(() => vi.useFakeTimers());
  afterEach(() => vi.useRealTimers());

  it('when keys follow each other quickly, then one save goes out after the pause, with the latest text', () => {
    const { autosave, sent } = autosaveThat();
    autosave.note(titled('a'));
    vi.advanceTimersByTime(savePause - 1);
    autosave.note(titled('ab'));
    vi.advanceTimersByTime(savePause - 1);
    expect(sent).toEqual([]);

    vi.advanceTimersByTime(1);

    expect(sent).toEqual([{ title: 'ab', version: 1 }]);
    expect(autosave.state()).toEqual({ kind: 'saved', at: new Date('2026-12-01T12:03:00Z') });
  });

  it('when a save is still under way, then the next waits for it and is built on the version it made', () => {
    const first = new Subject<Draft>();
    const { autosave, sent } = autosaveThat(() => first);
    autosave.note(titled('a'));
    vi.advanceTimersByTime(savePause);
    autosave.note(titled('ab'));
    autosave.note(titled('abc'));
    vi.advanceTimersByTime(savePause);
    expect(sent).toHaveLength(1);
    expect(autosave.state().kind).toBe('saving');

    first.next(draftOf(titled('a'), 2));
    first.complete();

    expect(sent).toEqual([
      { title: 'a', version: 1 },
      { title: 'abc', version: 2 },
    ]);
    expect(autosave.isSettled()).toBe(true);
  });

  it('when the server cannot be reached, then it says so and tries the same text again after five seconds', () => {
    const { autosave, sent } = autosaveThat(() => throwError(() => problem(0, 'no-connection')));
    autosave.note(titled('a'));
    vi.advanceTimersByTime(savePause);
    expect(autosave.state()).toMatchObject({ kind: 'not-saved', triesAgain: true });
    expect(autosave.isSettled()).toBe(false);

    vi.advanceTimersByTime(5_000);

    expect(sent).toEqual([
      { title: 'a', version: 1 },
      { title: 'a', version: 1 },
    ]);
    expect(autosave.state().kind).toBe('saved');
  });

  it('when the server refuses a field, then it says why, does not try by itself, and saves what is typed next', () => {
    const { autosave, sent } = autosaveThat(() => throwError(() => problem(422, 'not-valid')));
    autosave.note(titled('a'));
    vi.advanceTimersByTime(savePause);
    vi.advanceTimersByTime(120_000);
    expect(sent).toHaveLength(1);
    expect(autosave.state()).toMatchObject({ kind: 'not-saved', triesAgain: false });

    autosave.note(titled('ab'));
    vi.advanceTimersByTime(savePause);

    expect(sent[1]).toEqual({ title: 'ab', version: 1 });
    expect(autosave.state().kind).toBe('saved');
  });

  it('when somebody else has saved, then nothing more is sent until the texts are merged, and then on their version', () => {
    const theirs = draftOf(titled('theirs'), 5);
    const { autosave, sent } = autosaveThat(() =>
      throwError(() => problem(412, 'edition-moved-on', { current: theirs })),
    );
    autosave.note(titled('mine'));
    vi.advanceTimersByTime(savePause);
    expect(autosave.state()).toEqual({ kind: 'moved-on', theirs });
    autosave.note(titled('mine, longer'));
    vi.advanceTimersByTime(60_000);
    expect(sent).toHaveLength(1);

    autosave.continueFrom(5, titled('merged'));
    vi.advanceTimersByTime(savePause);

    expect(sent[1]).toEqual({ title: 'merged', version: 5 });
    expect(autosave.isSettled()).toBe(true);
  });

  it('when the page is left, then what waits is saved at once, and it is told whether everything arrived', async () => {
    const { autosave, sent } = autosaveThat();
    autosave.note(titled('a'));

    const arrived = await autosave.flush();

    expect(arrived).toBe(true);
    expect(sent).toEqual([{ title: 'a', version: 1 }]);
  });

  it('when the page is left and the save fails, then it is told that not everything arrived', async () => {
    const { autosave } = autosaveThat(() => throwError(() => problem(503)));
    autosave.note(titled('a'));

    expect(await autosave.flush()).toBe(false);
  });
});
