import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { MAT_DIALOG_DATA } from '@angular/material/dialog';
import { flagGroundWords } from '../../../../shared/contract/flags';
import { TellDialog } from './tell-dialog';

const api = () => TestBed.inject(HttpTestingController);

async function dialog() {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      {
        provide: MAT_DIALOG_DATA,
        useValue: { thing: { kind: 'reply', id: 5, fixKey: null }, name: 'the reply by Ada' },
      },
    ],
  });
  const fixture = TestBed.createComponent(TellDialog);
  await fixture.whenStable();
  const page = fixture.nativeElement as HTMLElement;
  const line = page.querySelector<HTMLInputElement>('[formControlName=line]')!;
  return {
    fixture,
    page,
    type: (text: string) => {
      line.value = text;
      line.dispatchEvent(new Event('input'));
    },
    send: async () => {
      page.querySelector('form')!.dispatchEvent(new Event('submit'));
      await fixture.whenStable();
    },
  };
}

describe('telling the desk', () => {
  it('needs a line that says something', async () => {
    const { type, send } = await dialog();
    type('bad');
    await send();
    api().expectNone('/api/flags');
  });

  it('sends the thing, the ground and the line, and says what comes next', async () => {
    const { fixture, page, type, send } = await dialog();
    const grounds = [...page.querySelectorAll('label')];
    grounds.find(({ textContent }) => textContent.includes(flagGroundWords.copied))!.click();
    type('The second half stands in a book of mine.');
    await send();
    const sent = api().expectOne('/api/flags');
    expect(sent.request.body).toEqual({
      kind: 'reply',
      id: 5,
      fixKey: null,
      ground: 'copied',
      line: 'The second half stands in a book of mine.',
    });
    sent.flush({ told: true });
    await fixture.whenStable();
    expect(page.textContent).toContain('You are told by mail what comes of it.');
  });

  it('keeps what was typed when the desk has heard of it already', async () => {
    const { fixture, page, type, send } = await dialog();
    type('It says the lip is round, it is not.');
    await send();
    api().expectOne('/api/flags').flush(
      {
        type: '/problems/already-there',
        title: 'That is there already',
        status: 409,
        detail: 'You have told the desk of this already.',
      },
      { status: 409, statusText: 'Conflict' },
    );
    await fixture.whenStable();
    expect(page.textContent).toContain('You have told the desk of this already.');
    expect(page.querySelector<HTMLInputElement>('[formControlName=line]')!.value).toContain(
      'the lip is round',
    );
  });
});
