import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import type { DeskItem, DeskQueue } from '../../../shared/contract/desk-queue';
import { QueuePage } from './queue-page';

const counts = { edition: 1, proposal: 1, 'maker-request': 0, flag: 0, 'first-post': 0, photo: 0 };
const item = (over: Partial<DeskItem>): DeskItem => ({
  kind: 'edition',
  id: 1,
  title: 'Bracket rocks',
  person: { id: 3, displayName: 'Anselm' },
  since: '2026-11-30T20:00:00.000Z',
  openHazards: 2,
  claim: null,
  mine: false,
  path: '/desk/editions/1',
  ...over,
});
const proposal = item({
  kind: 'proposal',
  id: 1,
  title: 'Rev E',
  openHazards: null,
  path: '/desk/hardware/1',
  claim: { person: { id: 9, displayName: 'Ines' }, until: '2026-12-01T20:20:00.000Z' },
});
const api = () => TestBed.inject(HttpTestingController);
const answer = (items: DeskItem[]): DeskQueue => ({ items, next: null, counts });

beforeEach(() => {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRouter([{ path: 'desk', component: QueuePage }]),
    ],
  });
});

async function open(address: string, items: DeskItem[]) {
  const harness = await RouterTestingHarness.create(address);
  const asked = api().expectOne((request) => request.url === '/api/desk');
  asked.flush(answer(items));
  await harness.fixture.whenStable();
  const page = harness.routeNativeElement!;
  document.body.append(harness.fixture.nativeElement);
  return { harness, page, query: asked.request.params };
}

describe('the queue', () => {
  it('tells of each line what it is, whose, what stands in the way and in whose hand it is', async () => {
    const { page } = await open('/desk', [item({}), proposal]);
    const lines = [...page.querySelectorAll('sl-queue-line')].map((line) => line.textContent);
    expect(lines[0]).toContain('2 hazards without a caution');
    expect(lines[0]).toContain('Take it in hand');
    expect(lines[1]).toContain('hardware proposal');
    expect(lines[1]).toContain('in the hand of Ines');
    expect(page.querySelector('sl-queue-filter')?.textContent).toContain('Editions 1');
  });

  it('asks for what the address keeps it to', async () => {
    const { query } = await open('/desk?kind=photo&claim=mine&words=lip', []);
    expect([query.get('kind'), query.get('claim'), query.get('words')]).toEqual(['photo', 'mine', 'lip']);
  });

  it('says so when nothing waits', async () => {
    const { page } = await open('/desk', []);
    expect(page.textContent).toContain('Nothing waits.');
  });

  it('is walked with the arrows, and the line with the focus is taken in hand by a key', async () => {
    const { page, harness } = await open('/desk', [item({}), proposal]);
    const press = (key: string) =>
      (document.activeElement ?? document.body).dispatchEvent(
        new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }),
      );
    press('ArrowDown');
    expect(document.activeElement?.textContent).toBe('Bracket rocks');
    press('ArrowDown');
    expect(document.activeElement?.textContent).toBe('Rev E');
    press('ArrowUp');
    press('c');
    api()
      .expectOne({ method: 'PUT', url: '/api/desk/claims/edition/1' })
      .flush({ person: { id: 1, displayName: 'Me' }, until: '2026-12-01T20:20:00.000Z' });
    await harness.fixture.whenStable();
    expect(page.querySelector('sl-queue-line')?.textContent).toContain('in your hand until');
  });
});
