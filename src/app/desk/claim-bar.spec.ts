import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { Confirm } from '../ui/confirm/confirm';
import { ClaimBar } from './claim-bar';

const address = '/api/desk/claims/edition/7';
const claimOf = (id: number, displayName: string) => ({
  person: { id, displayName },
  until: '2026-12-01T20:20:00.000Z',
});
const taken = {
  type: '/problems/claimed-by-another',
  title: 'Somebody else at the desk has this in hand',
  status: 409,
  detail: 'Ines has this in hand.',
};
const api = () => TestBed.inject(HttpTestingController);
const put = () => api().expectOne({ method: 'PUT', url: address });

beforeEach(() => {
  vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout', 'setInterval', 'clearInterval', 'Date'] });
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      { provide: Confirm, useValue: { ask: () => Promise.resolve(true) } },
    ],
  });
});
afterEach(() => {
  TestBed.resetTestingModule();
  vi.useRealTimers();
});

async function bar() {
  const fixture = TestBed.createComponent(ClaimBar);
  const heard: boolean[] = [];
  fixture.componentRef.setInput('item', { kind: 'edition', id: 7 });
  fixture.componentInstance.inHand.subscribe((mine) => heard.push(mine));
  fixture.detectChanges();
  await vi.advanceTimersByTimeAsync(0);
  const redraw = async () => {
    await vi.advanceTimersByTimeAsync(0);
    fixture.detectChanges();
  };
  return { fixture, heard, redraw, page: fixture.nativeElement as HTMLElement };
}

describe('who has an item in hand', () => {
  it('is the reader from the moment the page is open, and again every five minutes', async () => {
    const { page, heard, redraw } = await bar();
    put().flush(claimOf(1, 'Me'));
    await redraw();
    expect(page.textContent).toContain('You have this in hand until');
    expect(heard).toEqual([true]);
    await vi.advanceTimersByTimeAsync(5 * 60_000);
    put().flush(claimOf(1, 'Me'));
  });

  it('is told by name where it is somebody else, and can be taken over after a question', async () => {
    const { page, heard, redraw } = await bar();
    put().flush(taken, { status: 409, statusText: 'Conflict' });
    api()
      .expectOne({ method: 'GET', url: address })
      .flush({ claim: claimOf(2, 'Ines') });
    await redraw();
    expect(page.textContent).toContain('Ines');
    expect(heard).toEqual([false]);
    page.querySelector('button')!.click();
    await redraw();
    const over = put();
    expect(over.request.body).toEqual({ takeOverFrom: 2 });
    over.flush(claimOf(1, 'Me'));
    await redraw();
    put().flush(claimOf(1, 'Me'));
    await redraw();
    expect(heard.at(-1)).toBe(true);
  });

  it('is nobody once it is given up, and is not renewed', async () => {
    const { page, redraw } = await bar();
    put().flush(claimOf(1, 'Me'));
    await redraw();
    page.querySelector('button')!.click();
    api()
      .expectOne({ method: 'DELETE', url: address })
      .flush(null, { status: 204, statusText: 'No Content' });
    await redraw();
    expect(page.textContent).toContain('Nobody has this in hand.');
    await vi.advanceTimersByTimeAsync(20 * 60_000);
    api().expectNone(address);
  });

  it('is told as soon as another takes it over while the page is open', async () => {
    const { page, heard, redraw } = await bar();
    put().flush(claimOf(1, 'Me'));
    await vi.advanceTimersByTimeAsync(5 * 60_000);
    put().flush(taken, { status: 409, statusText: 'Conflict' });
    api()
      .expectOne({ method: 'GET', url: address })
      .flush({ claim: claimOf(2, 'Ines') });
    await redraw();
    expect(page.textContent).toContain('the decision is theirs');
    expect(heard).toEqual([true, false]);
  });
});
