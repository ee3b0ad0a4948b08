import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import type { QuestionPage } from '../../../shared/contract/questions';
import { QuestionPageView } from './question-page';

const rocking: QuestionPage = {
  id: 1,
  slug: 'why-does-it-rock-1',
  title: 'Why does it rock?',
  parts: [
    {
      part: {
        id: 1,
        slug: 'motor-m',
        name: 'Motor M',
        kind: 'focus-motor',
        maker: { id: 1, slug: 'tarn', name: 'Tarn' },
      },
      revision: null,
    },
  ],
  person: { id: 5, displayName: 'Asker' },
  createdAt: '2026-11-01T10:00:00.000Z',
  replyCount: 0,
  settledBy: null,
  text: { source: 'It rocks.', html: '<p>It rocks.</p>' },
  symptoms: [],
  readings: [{ dimension: 'lip diameter', value: 32.1, unit: 'mm', instrument: 'caliper' }],
  worksheet: null,
  photos: [],
  changedAt: null,
  writeUps: [],
  replies: [],
  takenDown: null,
};

async function open(question: QuestionPage): Promise<HTMLElement> {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRouter([{ path: 'questions/:slug', component: QuestionPageView }]),
    ],
  });
  const harness = await RouterTestingHarness.create();
  await harness.navigateByUrl(`/questions/${question.slug}`);
  TestBed.inject(HttpTestingController).expectOne(`/api/questions/${question.slug}`).flush(question);
  await harness.fixture.whenStable();
  return harness.routeNativeElement!;
}

const words = (root: HTMLElement): string => root.textContent.replace(/\s+/g, ' ');

describe('the page of a question', () => {
  it('shows parts first, then readings, then the words', async () => {
    const text = words(await open(rocking));
    const places = ['Motor M', 'revision not known', 'lip diameter', '32.1 mm', 'It rocks.'].map((part) =>
      text.indexOf(part),
    );
    expect(places[0]).toBeGreaterThan(-1);
    expect(places).toEqual([...places].sort((one, other) => one - other));
  });

  it('says in a sentence which fix settled it', async () => {
    const root = await open({
      ...rocking,
      settledBy: {
        writeUpSlug: 'lip',
        writeUpTitle: 'Bracket on the lip',
        fixKey: 'fix-0001',
        fixTitle: 'Trim it',
      },
    });
    expect(words(root)).toContain('Settled by: Trim it in Bracket on the lip.');
    expect(root.querySelector('.settled a')?.getAttribute('href')).toBe('/write-ups/lip');
  });

  it('offers visitors neither a reply nor to settle it', async () => {
    const root = await open(rocking);
    expect(root.querySelector('sl-reply-form, sl-settle-form')).toBeNull();
    expect(words(root)).toContain('Sign in to reply.');
  });
});
