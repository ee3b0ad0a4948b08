import { TestBed } from '@angular/core/testing';
import { of } from 'rxjs';
import type { Opinion } from '../../../../shared/contract/proposed-editions';
import { OpinionForm } from './opinion-form';
import { ProposedEditions } from './proposed-editions';

const opinion = (over: Partial<Opinion> = {}): Opinion => ({
  person: { id: 1, displayName: 'Ada' },
  agrees: true,
  line: '',
  at: '2026-12-01T12:00:00.000Z',
  beforeHandingIn: false,
  ...over,
});

async function formWith(said: Opinion | null) {
  const giveOpinion = vi.fn((_id: number, given: { agrees: boolean; line: string }) => of(opinion(given)));
  TestBed.configureTestingModule({ providers: [{ provide: ProposedEditions, useValue: { giveOpinion } }] });
  const fixture = TestBed.createComponent(OpinionForm);
  fixture.componentRef.setInput('editionId', 9);
  fixture.componentRef.setInput('said', said);
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  return {
    element,
    giveOpinion,
    async send() {
      element.querySelector<HTMLButtonElement>('button')!.click();
      await fixture.whenStable();
    },
  };
}

describe('what an author tells the desk', () => {
  it('when neither was chosen, then nothing is sent and it says so', async () => {
    const { element, giveOpinion, send } = await formWith(null);
    await send();
    expect(giveOpinion).not.toHaveBeenCalled();
    expect(element.querySelector('[role=alert]')?.textContent).toContain('Choose one');
  });

  it('when an author does not agree, then that is sent with the line and shown', async () => {
    const { element, giveOpinion, send } = await formWith(null);
    element.querySelectorAll<HTMLInputElement>('input[type=radio]')[1]!.click();
    const line = element.querySelector<HTMLInputElement>('input[type=text]')!;
    line.value = 'Not on Rev B.';
    line.dispatchEvent(new Event('input'));
    await send();
    expect(giveOpinion).toHaveBeenCalledWith(9, { agrees: false, line: 'Not on Rev B.' });
    expect(element.querySelector('[role=status]')?.textContent).toMatch(/do not agree.*Not on Rev B\./s);
  });

  it('when it was handed in again since, then it asks for another look', async () => {
    const { element } = await formWith(opinion({ beforeHandingIn: true }));
    expect(element.textContent).toContain('handed in again since');
    expect(element.querySelector<HTMLInputElement>('input[type=radio]')!.checked).toBe(true);
  });
});
