import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { MakerAnswer } from '../../../shared/contract/makers';
import { MakerNote } from './maker-note';

const answer: MakerAnswer = {
  maker: { id: 1, slug: 'tarn-motion', name: 'Tarn Motion' },
  text: { source: 'Lower *lip*.', html: '<p>Lower <em>lip</em>.</p>' },
  person: { id: 2, displayName: 'Marit Tarn' },
  createdAt: '2026-01-02T10:00:00.000Z',
  changedAt: '2026-01-02T10:00:00.000Z',
  earlier: [],
};

async function drawn(change: Partial<MakerAnswer> = {}): Promise<HTMLElement> {
  TestBed.configureTestingModule({ providers: [provideRouter([])] });
  const fixture = TestBed.createComponent(MakerNote);
  fixture.componentRef.setInput('answer', { ...answer, ...change });
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('the note of a maker', () => {
  it('says which maker it is from, and who said it for them', async () => {
    const note = await drawn();
    expect(note.querySelector('h3')?.textContent).toContain('From the maker Tarn Motion');
    expect(note.querySelector('dl')?.textContent).toContain('Marit Tarn');
    expect(note.querySelector('em')?.textContent).toBe('lip');
  });

  it('is named by its heading', async () => {
    const note = await drawn();
    const article = note.querySelector('article')!;
    expect(note.querySelector(`#${article.getAttribute('aria-labelledby')}`)).not.toBeNull();
  });

  it('tells of a change only once there was one, with what it said before', async () => {
    expect((await drawn()).textContent).not.toContain('Changed');
    TestBed.resetTestingModule();
    const changed = await drawn({
      changedAt: '2026-02-03T10:00:00.000Z',
      earlier: [
        {
          text: { source: 'First.', html: '<p>First.</p>' },
          from: '2026-01-02T10:00:00.000Z',
          to: '2026-02-03T10:00:00.000Z',
        },
      ],
    });
    expect(changed.querySelector('dl')?.textContent).toContain('2026-02-03');
    expect(changed.querySelector('details')?.textContent).toContain('First.');
  });

  it('cannot run script, whatever it was given', async () => {
    const note = await drawn({ text: { source: '', html: '<img src="x" onerror="alert(1)">' } });
    expect(note.querySelector('img')?.hasAttribute('onerror')).toBe(false);
  });
});
