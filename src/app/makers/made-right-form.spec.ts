import { provideHttpClient } from '@angular/common/http';
import { TestBed } from '@angular/core/testing';
import { of } from 'rxjs';
import type { ConcernedMaker } from '../../../shared/contract/makers';
import type { FixView } from '../../../shared/contract/write-ups';
import { MadeRightForm } from './made-right-form';
import { Makers } from './makers';

const concerned: ConcernedMaker = {
  maker: { id: 1, slug: 'tarn-motion', name: 'Tarn Motion' },
  iSpeak: true,
  parts: [
    {
      id: 7,
      slug: 'tarn-m1',
      name: 'M1',
      kind: 'focus-motor',
      maker: { id: 1, slug: 'tarn-motion', name: 'Tarn Motion' },
      revisions: [
        { id: 71, partId: 7, label: 'Rev D' },
        { id: 72, partId: 7, label: 'Rev E', announced: true },
      ],
    },
  ],
  canBeTold: true,
  letters: [],
};

const fixes = [
  { key: 'disc-behind', title: 'Disc behind the plate', madeRightFrom: null },
  { key: 'trim-lip', title: 'Trim the lip', madeRightFrom: { id: 71, partId: 7, label: 'Rev D' } },
  { key: 'swap-ring', title: 'Swap the ring', madeRightFrom: { id: 3, partId: 9, label: 'Rev B' } },
] as unknown as FixView[];

async function render() {
  const calls = { markMadeRight: vi.fn(() => of({})), unmarkMadeRight: vi.fn(() => of({})) };
  TestBed.configureTestingModule({
    providers: [provideHttpClient(), { provide: Makers, useValue: calls }],
  });
  const fixture = TestBed.createComponent(MadeRightForm);
  fixture.componentRef.setInput('slug', 'lip');
  fixture.componentRef.setInput('of', concerned);
  fixture.componentRef.setInput('fixes', fixes);
  await fixture.whenStable();
  const root = fixture.nativeElement as HTMLElement;
  const send = async (): Promise<void> => {
    root.querySelector('form')!.dispatchEvent(new Event('submit'));
    await fixture.whenStable();
  };
  return { root, fixture, calls, send };
}

describe('marking as made right', () => {
  it('takes every fix unless some are left out', async () => {
    const { root, fixture, calls, send } = await render();
    const select = root.querySelector('select')!;
    select.value = '71';
    select.dispatchEvent(new Event('change'));
    root.querySelectorAll<HTMLInputElement>('input[type=checkbox]')[2]!.click();
    await fixture.whenStable();
    await send();
    expect(calls.markMadeRight).toHaveBeenCalledWith('lip', {
      revisionId: 71,
      fixKeys: ['disc-behind', 'trim-lip'],
    });
  });

  it('is not sent without a revision', async () => {
    const { calls, send } = await render();
    await send();
    expect(calls.markMadeRight).not.toHaveBeenCalled();
  });

  it('says which revision is only announced', async () => {
    const { root } = await render();
    const options = [...root.querySelectorAll('optgroup option')].map((option) => option.textContent?.trim());
    expect(options).toEqual(['M1 Rev D', 'M1 Rev E (announced)']);
  });

  it("takes back the maker's own marks only", async () => {
    const { root, fixture, calls } = await render();
    [...root.querySelectorAll('button')].at(-1)!.click();
    await fixture.whenStable();
    expect(calls.unmarkMadeRight).toHaveBeenCalledWith('lip', ['trim-lip']);
  });
});
