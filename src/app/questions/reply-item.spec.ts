import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { Reply } from '../../../shared/contract/questions';
import { Session } from '../core/session';
import { ReplyItem } from './reply-item';

const reply: Reply = {
  id: 9,
  text: { source: 'Lay a disc.', html: '<p>Lay a disc.</p>' },
  worksheet: null,
  photos: [],
  person: { id: 5, displayName: 'Writer' },
  createdAt: '2026-11-01T10:00:00.000Z',
  changedAt: null,
  writeUp: null,
  takenDown: null,
};

async function itemFor(reader: { id: number } | null, over: Partial<Reply> = {}) {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRouter([]),
      { provide: Session, useValue: { account: signal(reader), isModerator: signal(false) } },
    ],
  });
  const fixture = TestBed.createComponent(ReplyItem);
  const changes: Reply[] = [];
  fixture.componentRef.setInput('reply', { ...reply, ...over });
  fixture.componentInstance.changed.subscribe((now) => changes.push(now));
  await fixture.whenStable();
  const page = fixture.nativeElement as HTMLElement;
  const button = (words: string) =>
    [...page.querySelectorAll('button')].find((each) => each.textContent.includes(words));
  return { fixture, page, changes, button };
}

describe('a reply', () => {
  it('can be changed by its writer', async () => {
    const { fixture, page, changes, button } = await itemFor({ id: 5 });
    button('Change')!.click();
    await fixture.whenStable();
    const field = page.querySelector('textarea')!;
    expect(field.value).toBe('Lay a disc.');
    field.value = 'Lay two discs.';
    field.dispatchEvent(new Event('input'));
    page.querySelector('form')!.dispatchEvent(new Event('submit'));
    const call = TestBed.inject(HttpTestingController).expectOne('/api/replies/9');
    expect([call.request.method, call.request.body]).toEqual(['PATCH', { text: 'Lay two discs.' }]);
    const after = { ...reply, changedAt: '2026-11-02T10:00:00.000Z' };
    call.flush(after);
    expect(changes).toEqual([after]);
  });

  it('offers others nothing but to read it', async () => {
    const { page, button } = await itemFor({ id: 6 });
    expect(page.textContent).toContain('Lay a disc.');
    expect([button('Change'), button('Make a write-up')]).toEqual([undefined, undefined]);
  });

  it('says which write-up it became, and when it was changed', async () => {
    const { page, button } = await itemFor(
      { id: 5 },
      { writeUp: { slug: 'disc', title: 'A disc behind it' }, changedAt: '2026-11-02T10:00:00.000Z' },
    );
    expect(page.querySelector('a[href="/write-ups/disc"]')?.textContent).toBe('A disc behind it');
    expect(page.textContent).toContain('changed 2026-11-02');
    expect(button('Make a write-up')).toBeUndefined();
  });
});
