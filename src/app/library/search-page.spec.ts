import { provideHttpClient } from '@angular/common/http';
import {
  HttpTestingController,
  provideHttpClientTesting,
  type TestRequest,
} from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import type { Applicability, SearchHit, SearchResults } from '../../../shared/contract/search';
import { SearchPage } from './search-page';

function hit(slug: string, verdict: Applicability['verdict']): SearchHit {
  return {
    slug,
    title: [
      { text: 'Lip ', hit: false },
      { text: 'rocks', hit: true },
    ],
    excerpt: [],
    sides: [],
    symptoms: [],
    fixes: [],
    photo: null,
    publishedAt: '2026-01-01T00:00:00Z',
    applicability: { verdict, reasons: [] },
  };
}

function results(items: SearchHit[], next: string | null = null): SearchResults {
  const facets = { part: [], revision: [], symptom: [], permanence: [], standing: [], kind: [] };
  return { items, next, total: items.length, facets, benchSize: 0 };
}

async function opened(address: string): Promise<{ page: HTMLElement; harness: RouterTestingHarness }> {
  const harness = await RouterTestingHarness.create(address);
  return { page: harness.routeNativeElement!, harness };
}

function asked(): TestRequest {
  return TestBed.inject(HttpTestingController).expectOne((call) => call.url === '/api/search');
}

describe('search page', () => {
  beforeEach(() => {
    localStorage.clear();
    TestBed.configureTestingModule({
      providers: [
        provideRouter([{ path: 'search', component: SearchPage }], withComponentInputBinding()),
        provideHttpClient(),
        provideHttpClientTesting(),
      ],
    });
  });

  it('asks for what the address says', async () => {
    await opened('/search?q=rocks&part=m1&kind=shim&kind=trim');
    const { params } = asked().request;
    expect(params.get('q')).toBe('rocks');
    expect(params.getAll('part')).toEqual(['m1']);
    expect(params.getAll('kind')).toEqual(['shim', 'trim']);
  });

  it('puts each line under the heading that says whether it holds for the bench', async () => {
    const { page, harness } = await opened('/search?q=rocks');
    asked().flush(results([hit('first', 'holds'), hit('second', 'written-for-others')]));
    harness.detectChanges();
    const headings = [...page.querySelectorAll('.results h2')].map((heading) => heading.textContent);
    expect(headings).toEqual(['Holds for your bench', 'Written for other revisions than yours']);
  });

  it('shows the words that were found as one text, with the hit marked', async () => {
    const { page, harness } = await opened('/search?q=rocks');
    asked().flush(results([hit('first', 'not-yours')]));
    harness.detectChanges();
    expect(page.querySelector('h3')?.textContent?.trim()).toBe('Lip rocks');
    expect(page.querySelector('h3 mark')?.textContent).toBe('rocks');
  });

  it('says what to do when nothing matches', async () => {
    const { page, harness } = await opened('/search?q=xyzzy&kind=shim');
    asked().flush(results([]));
    harness.detectChanges();
    expect(page.querySelector('.empty')?.textContent).toContain('Nothing matches');
    expect(page.querySelector('.empty button')?.textContent).toContain('Clear all filters');
  });

  it('shows the problem when search does not answer, and asks again on wish', async () => {
    const { page, harness } = await opened('/search?q=rocks');
    asked().flush(
      {
        type: '/problems/search-unavailable',
        title: 'Search does not answer',
        status: 503,
        detail: 'Try later.',
      },
      { status: 503, statusText: 'Service Unavailable' },
    );
    harness.detectChanges();
    expect(page.querySelector('sl-problem-note')?.textContent).toContain('Search does not answer');
    page.querySelector<HTMLButtonElement>('sl-problem-note button')!.click();
    asked().flush(results([hit('first', 'not-yours')]));
    harness.detectChanges();
    expect(page.querySelectorAll('sl-result-line')).toHaveLength(1);
  });

  it('adds the next page under the first', async () => {
    const { page, harness } = await opened('/search?q=rocks');
    asked().flush(results([hit('first', 'not-yours')], 'place-two'));
    harness.detectChanges();
    page.querySelector<HTMLButtonElement>('.more button')!.click();
    const second = asked();
    expect(second.request.params.get('cursor')).toBe('place-two');
    second.flush(results([hit('second', 'not-yours')]));
    harness.detectChanges();
    expect(page.querySelectorAll('sl-result-line')).toHaveLength(2);
  });
});
