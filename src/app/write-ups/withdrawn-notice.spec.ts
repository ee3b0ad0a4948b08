import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { WithdrawalNotice } from '../../../shared/contract/withdrawal';
import { WithdrawnNotice } from './withdrawn-notice';

const notice: WithdrawalNotice = {
  title: 'Coin behind the plate',
  reason: 'The coin comes loose.',
  at: '2026-03-04T10:00:00.000Z',
  by: 'the desk',
  instead: null,
  mayReadHistory: false,
};

function shown(change: Partial<WithdrawalNotice> = {}): HTMLElement {
  TestBed.configureTestingModule({ providers: [provideRouter([])] });
  const fixture = TestBed.createComponent(WithdrawnNotice);
  fixture.componentRef.setInput('slug', 'coin-behind-the-plate');
  fixture.componentRef.setInput('notice', { ...notice, ...change });
  fixture.detectChanges();
  return fixture.nativeElement as HTMLElement;
}
const links = (page: HTMLElement) => [...page.querySelectorAll('a')].map((link) => link.getAttribute('href'));

describe('the notice of a withdrawn write-up', () => {
  it('says why, when and by whom, and leads to search and questions where nothing stands instead', () => {
    const page = shown();

    expect(page.textContent).toContain('The coin comes loose.');
    expect(page.textContent).toContain('4 March 2026');
    expect(page.textContent).toContain('the desk has withdrawn');
    expect(links(page)).toEqual(['/search', '/questions/ask']);
  });

  it('leads to what stands instead, and authors to the history', () => {
    const page = shown({ instead: { slug: 'better', title: 'The better one' }, mayReadHistory: true });

    expect(links(page)).toEqual(['/write-ups/better', '/write-ups/coin-behind-the-plate/editions']);
  });

  it('shows markup in the reason as the text that it is', () => {
    const page = shown({ reason: '<img src=x onerror=alert(1)>' });

    expect(page.querySelector('img')).toBeNull();
    expect(page.textContent).toContain('<img src=x');
  });
});
