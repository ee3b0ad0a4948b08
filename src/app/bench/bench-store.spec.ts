import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { Account } from '../../../shared/contract/accounts';
import type { BenchItem, PartSummary } from '../../../shared/contract/hardware';
import { Session } from '../core/session';
import { BenchStore } from './bench-store';
import { BrowserBench } from './browser-bench';

const motor: PartSummary = {
  id: 1,
  slug: 'm1',
  name: 'M1',
  kind: 'focus-motor',
  maker: { id: 1, slug: 'tarn-motion', name: 'Tarn Motion' },
  about: '',
  writeUps: 0,
  revisions: [
    { id: 11, partId: 1, label: 'Rev A' },
    { id: 12, partId: 1, label: 'Rev B' },
  ],
};
const member: Account = {
  id: 5,
  email: 'o@example.org',
  displayName: 'Odile',
  role: 'member',
  noticeMail: true,
  mailRhythm: 'at-once',
  safetyMail: true,
  benchWatch: false,
  mailRefusedAt: null,
  deletionAt: null,
  units: 'mm',
  createdAt: '2026-01-01T00:00:00Z',
};

function kept(): BenchItem[] {
  return JSON.parse(localStorage.getItem('shimlore-bench') ?? '[]') as BenchItem[];
}

describe('bench', () => {
  beforeEach(() => {
    localStorage.clear();
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
  });
  afterEach(() => {
    TestBed.inject(HttpTestingController).verify();
    localStorage.clear();
  });

  it("keeps a visitor's parts in the browser and sends their revisions with a search", async () => {
    const bench = TestBed.inject(BenchStore);
    await bench.add(motor, 12);
    expect(bench.revisionIdsToSend()).toEqual([12]);
    expect(kept().map((entry) => entry.revision?.label)).toEqual(['Rev B']);
  });

  it('adds nothing twice', async () => {
    const bench = TestBed.inject(BenchStore);
    await bench.add(motor, 12);
    await bench.add(motor, 12);
    expect(bench.size()).toBe(1);
  });

  it('holds a part whose revision is not known, and sends nothing for it', async () => {
    const bench = TestBed.inject(BenchStore);
    await bench.add(motor, null);
    expect(bench.owned()).toEqual([{ partId: 1, revision: null }]);
    expect(bench.revisionIdsToSend()).toEqual([]);
  });

  it('says which revision a part is, later', async () => {
    const bench = TestBed.inject(BenchStore);
    await bench.add(motor, null);
    await bench.choose(bench.items()[0]!, 11);
    expect(kept()[0]?.revision?.id).toBe(11);
  });

  it('takes a part off and leaves nothing of it in the browser', async () => {
    const bench = TestBed.inject(BenchStore);
    await bench.add(motor, 11);
    await bench.remove(bench.items()[0]!);
    expect(bench.size()).toBe(0);
    expect(localStorage.getItem('shimlore-bench')).toBeNull();
  });

  it('counts what cannot be read as an empty bench', () => {
    localStorage.setItem('shimlore-bench', '[{"id":"x"');
    expect(TestBed.inject(BrowserBench).read()).toEqual([]);
    localStorage.setItem('shimlore-bench', '[{"id":"x"}]');
    expect(TestBed.inject(BrowserBench).read()).toEqual([]);
  });

  it("moves what was left in the browser to the member's bench on the server", async () => {
    const bench = TestBed.inject(BenchStore);
    const http = TestBed.inject(HttpTestingController);
    await bench.add(motor, 12);
    TestBed.inject(Session).take(member);
    TestBed.tick();
    http.expectOne('/api/bench').flush({ items: [] });
    expect(bench.left()).toHaveLength(1);

    const moved = bench.moveOver();
    const call = http.expectOne({ method: 'POST', url: '/api/bench' });
    expect(call.request.body).toEqual({ partId: 1, revisionId: 12 });
    call.flush({ id: 90, part: motor, revision: motor.revisions[1] });
    await moved;
    expect(bench.items().map((entry) => entry.id)).toEqual([90]);
    expect(bench.left()).toEqual([]);
    expect(localStorage.getItem('shimlore-bench')).toBeNull();
  });

  it('keeps what is in the browser when the server refuses to take it', async () => {
    const bench = TestBed.inject(BenchStore);
    const http = TestBed.inject(HttpTestingController);
    await bench.add(motor, 12);
    TestBed.inject(Session).take(member);
    TestBed.tick();
    http.expectOne('/api/bench').flush({ items: [] });

    const moved = bench.moveOver();
    http
      .expectOne({ method: 'POST', url: '/api/bench' })
      .flush('', { status: 503, statusText: 'Unavailable' });
    await expect(moved).rejects.toThrow();
    expect(kept()).toHaveLength(1);
  });
});
