import { TestBed } from '@angular/core/testing';
import { of } from 'rxjs';
import { Confirm } from '../ui/confirm/confirm';
import { LimitForm } from './limit-form';
import { Members } from './members';

function form(sure = true) {
  const sent: unknown[] = [];
  const member = { id: 5, displayName: 'Loud' };
  TestBed.configureTestingModule({
    providers: [
      {
        provide: Members,
        useValue: { limit: (id: number, body: object) => (sent.push({ id, ...body }), of(member)) },
      },
      { provide: Confirm, useValue: { ask: () => Promise.resolve(sure) } },
    ],
  });
  const fixture = TestBed.createComponent(LimitForm);
  fixture.componentRef.setInput('memberId', 5);
  fixture.componentRef.setInput('name', 'Loud');
  fixture.detectChanges();
  const element = fixture.nativeElement as HTMLElement;
  const type = (text: string) => {
    const area = element.querySelector('textarea')!;
    area.value = text;
    area.dispatchEvent(new Event('input'));
  };
  const choose = (value: string) => element.querySelector<HTMLInputElement>(`input[value=${value}]`)!.click();
  const send = async () => {
    element.querySelector<HTMLButtonElement>('button[type=submit]')!.click();
    await fixture.whenStable();
    fixture.detectChanges();
  };
  return { element, fixture, sent, type, choose, send };
}

describe('limiting a member', () => {
  it('when it is set for a term, then kind, reason, days and what becomes of their works are sent', async () => {
    const { sent, type, send } = form();
    type('Advertising under questions.');

    await send();

    expect(sent).toEqual([
      { id: 5, kind: 'limited', reason: 'Advertising under questions.', days: 7, works: 'stay' },
    ]);
  });

  it('when it holds until lifted, then no days are sent and none are asked for', async () => {
    const { element, fixture, sent, type, choose, send } = form();
    type('Advertising under questions.');
    choose('blocked');
    choose('lifted');
    choose('go');
    fixture.detectChanges();
    expect(element.querySelector('.days')).toBeNull();

    await send();

    expect(sent).toEqual([
      { id: 5, kind: 'blocked', reason: 'Advertising under questions.', days: null, works: 'go' },
    ]);
  });

  it('when the moderator is not sure or the reason says too little, then nothing is sent', async () => {
    const unsure = form(false);
    unsure.type('Advertising under questions.');
    await unsure.send();
    expect(unsure.sent).toEqual([]);

    TestBed.resetTestingModule();
    const short = form();
    short.type('No.');
    await short.send();
    expect(short.sent).toEqual([]);
    expect(short.element.querySelector('textarea')?.getAttribute('aria-invalid')).toBe('true');
  });
});
