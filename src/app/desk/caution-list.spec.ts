import { TestBed } from '@angular/core/testing';
import { of } from 'rxjs';
import type { DeskEdition } from '../../../shared/contract/moderation';
import type { Caution } from '../../../shared/contract/write-ups';
import { CautionList } from './caution-list';
import { Desk } from './desk';

const caution: Caution = {
  id: 7,
  fixKey: 'trim-lip',
  stepKey: 'step-gone',
  signalWord: 'warning',
  hazards: ['blade'],
  hazard: 'A blade that slips.',
  consequence: 'Could cut hands.',
  avoidance: 'Cut away from yourself.',
};

function listOf(cautions: Caution[]) {
  const moved: unknown[] = [];
  TestBed.configureTestingModule({
    providers: [
      {
        provide: Desk,
        useValue: { move: (id: number, to: object) => (moved.push({ id, ...to }), of(caution)) },
      },
    ],
  });
  const fixture = TestBed.createComponent(CautionList);
  const steps = [{ key: 'step-here' }];
  const edition = {
    editionId: 9,
    cautions,
    view: { fixes: [{ key: 'trim-lip', title: 'Trim the lip', steps }] },
  };
  fixture.componentRef.setInput('edition', edition as unknown as DeskEdition);
  let changes = 0;
  fixture.componentInstance.changed.subscribe(() => (changes += 1));
  fixture.detectChanges();
  return { element: fixture.nativeElement as HTMLElement, moved, changes: () => changes };
}

describe('cautions on the desk', () => {
  it('when one stands on a step, then it says which', () => {
    const { element } = listOf([{ ...caution, stepKey: 'step-here' }]);

    expect(element.textContent).toContain('on step 1 of “Trim the lip”');
    expect(element.textContent).not.toContain('is gone');
  });

  it('when the step of one is gone, then the desk is told and can leave it above the fix', () => {
    const { element, moved, changes } = listOf([caution]);
    expect(element.textContent).toContain('Its step is gone from this edition.');
    expect(element.textContent).toContain('above “Trim the lip”');

    [...element.querySelectorAll('button')]
      .find((one) => one.textContent?.includes('Leave it there'))
      ?.click();

    expect(moved).toEqual([{ id: 7, editionId: 9, fixKey: 'trim-lip', stepKey: null }]);
    expect(changes()).toBe(1);
  });

  it('when the fix of one is gone, then it stands above the whole write-up', () => {
    const { element } = listOf([{ ...caution, fixKey: 'fix-gone', stepKey: null }]);

    expect(element.textContent).toContain('Its fix is gone from this edition.');
    expect(element.textContent).toContain('above the whole write-up');
  });
});
