import { TestBed } from '@angular/core/testing';
import { emptyContent, type EditionContent } from '../../../../shared/contract/edition-content';
import type { EditionText } from '../../../../shared/editions/edition-text';
import { MergePanel, type MergeResult } from './merge-panel';
import type { Merging } from './merging';
import { PartDirectory } from './part-directory';

const textOf = (content: Partial<EditionContent>): EditionText => ({
  content: { ...emptyContent, ...content },
  changeNote: '',
});

const edition: Merging['with'] = {
  kind: 'edition',
  edition: {
    id: 20,
    number: 3,
    author: { id: 2, displayName: 'Bea Lund' },
    changeNote: 'Measured again.',
    publishedAt: '2026-12-01T12:00:00.000Z',
    title: '',
  },
};

async function panelFor(texts: [EditionText, EditionText, EditionText], other = edition) {
  const names = {
    part: (id: number) => `part ${id}`,
    revision: (id: number) => `revision ${id}`,
    symptom: (slug: string) => slug,
    photo: (id: number) => `photo ${id}`,
  };
  TestBed.configureTestingModule({
    providers: [{ provide: PartDirectory, useValue: { namesWith: () => names } }],
  });
  const fixture = TestBed.createComponent(MergePanel);
  const [base, mine, theirs] = texts;
  fixture.componentRef.setInput('merging', { id: 'x', base, mine, theirs, with: other, photos: new Map() });
  let result: MergeResult | undefined;
  fixture.componentInstance.finished.subscribe((finished) => (result = finished));
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  const settle = () => fixture.whenStable();
  return {
    element,
    text: () => element.textContent.replace(/\s+/g, ' '),
    fieldset: (name: string) =>
      [...element.querySelectorAll('fieldset')].find((one) =>
        one.querySelector('legend')!.textContent.includes(name),
      )!,
    async choose(within: Element, words: string) {
      const label = [...within.querySelectorAll('label')].find((one) => one.textContent.includes(words))!;
      label.querySelector('input')!.click();
      await settle();
    },
    async finish() {
      [...element.querySelectorAll('button')].at(-1)!.click();
      await settle();
      return result!;
    },
    settle,
  };
}

describe('the panel in which two texts become one', () => {
  it('when both changed a field, then both texts stand beside each other, marked against what they began from', async () => {
    const panel = await panelFor([
      textOf({ cause: 'The lip is wide.' }),
      textOf({ cause: 'The lip is too wide.' }),
      textOf({ cause: 'The raised lip is wide.' }),
    ]);
    expect(panel.text()).toContain('Edition 3 was published since you began');
    expect(panel.text()).toContain('Bea Lund');
    const field = panel.fieldset('Cause');
    expect([...field.querySelectorAll('ins')].map((word) => word.textContent.trim())).toEqual([
      'too',
      'raised',
    ]);
    expect(field.querySelector<HTMLInputElement>('input')!.checked).toBe(true);
  });

  it('when theirs is taken, then it goes on and mine is set aside', async () => {
    const panel = await panelFor([
      textOf({ cause: 'old' }),
      textOf({ cause: 'mine', title: 'my title' }),
      textOf({ cause: 'theirs' }),
    ]);
    await panel.choose(panel.fieldset('Cause'), 'Take theirs');
    const { text, setAside } = await panel.finish();
    expect(text.content).toMatchObject({ cause: 'theirs', title: 'my title' });
    expect(setAside).toEqual([{ name: 'Cause', whose: 'Your edition', words: 'mine' }]);
  });

  it('when one is made of both by hand, then it begins with the two and what is typed goes on', async () => {
    const panel = await panelFor([
      textOf({ cause: 'old' }),
      textOf({ cause: 'mine' }),
      textOf({ cause: 'theirs' }),
    ]);
    await panel.choose(panel.fieldset('Cause'), 'Make one of both by hand');
    const area = panel.element.querySelector('textarea')!;
    expect(area.value).toBe('mine\n\ntheirs');
    area.value = 'both';
    area.dispatchEvent(new Event('input'));
    await panel.settle();
    const { text, setAside } = await panel.finish();
    expect(text.content.cause).toBe('both');
    expect(setAside.map(({ words }) => words)).toEqual(['mine', 'theirs']);
  });

  it('when only one side changed a field, then nothing is asked and it is listed as taken', async () => {
    const panel = await panelFor([textOf({}), textOf({ title: 'mine' }), textOf({ symptoms: ['rocks'] })]);
    expect(panel.element.querySelector('fieldset')).toBeNull();
    expect(panel.text()).toContain('2 things that only one side changed are taken by themselves');
    expect([...panel.element.querySelectorAll('dt')].map((term) => term.textContent.trim())).toEqual([
      'Title Your edition',
      'Symptoms Edition 3',
    ]);
    const { text, setAside } = await panel.finish();
    expect(text.content).toMatchObject({ title: 'mine', symptoms: ['rocks'] });
    expect(setAside).toEqual([]);
  });

  it('when one side took out what the other worded anew, then it says so, and it stays unless that is chosen', async () => {
    const photo = (caption: string) =>
      textOf({ photos: [{ photoId: 4, alt: 'The lip', caption, callouts: [] }] });
    const panel = await panelFor([photo('old'), textOf({}), photo('new')]);
    const field = panel.fieldset('Photo “The lip”');
    expect(field.textContent).toContain('taken out');
    await panel.choose(field, 'Keep mine');
    expect((await panel.finish()).text.content.photos).toEqual([]);
  });

  it('when the other text is the same draft saved elsewhere, then it says so', async () => {
    const other: Merging['with'] = { kind: 'draft', by: 'Ada', at: '2026-12-01T12:00:00.000Z' };
    const panel = await panelFor([textOf({}), textOf({ title: 'a' }), textOf({ title: 'b' })], other);
    expect(panel.text()).toContain('This draft was saved elsewhere in the meantime');
    expect(panel.fieldset('Title').textContent).toContain('What was saved elsewhere');
  });
});
