import { TestBed } from '@angular/core/testing';
import { of, throwError } from 'rxjs';
import type { MakerPage } from '../../../shared/contract/makers';
import { ApiProblem } from '../core/api-problem';
import { AskForm } from './ask-form';
import { Makers } from './makers';

const maker: MakerPage = {
  id: 1,
  slug: 'tarn-motion',
  name: 'Tarn Motion',
  about: '',
  mailDomain: 'tarn-motion.example',
  parts: [],
  speakers: [],
  answers: [],
  announced: [],
  madeRight: [],
  iSpeak: false,
  myRequest: null,
  contactAddress: null,
};

async function render(change: Partial<MakerPage> = {}, ask = vi.fn(() => of({}))) {
  TestBed.configureTestingModule({ providers: [{ provide: Makers, useValue: { ask } }] });
  const fixture = TestBed.createComponent(AskForm);
  fixture.componentRef.setInput('maker', { ...maker, ...change });
  await fixture.whenStable();
  const root = fixture.nativeElement as HTMLElement;
  return {
    root,
    ask,
    async type(text: string): Promise<void> {
      const field = root.querySelector<HTMLInputElement | HTMLTextAreaElement>('.sl-field')!;
      field.value = text;
      field.dispatchEvent(new Event('input'));
      await fixture.whenStable();
    },
    async send(): Promise<void> {
      root.querySelector('form')!.dispatchEvent(new Event('submit'));
      await fixture.whenStable();
    },
    async chooseDesk(): Promise<void> {
      root.querySelectorAll<HTMLInputElement>('input[type=radio]')[1]!.click();
      await fixture.whenStable();
    },
  };
}

describe('asking to speak for a maker', () => {
  it('goes by mail where its domain is known', async () => {
    const form = await render();
    await form.type('ada@tarn-motion.example');
    await form.send();
    expect(form.ask).toHaveBeenCalledWith('tarn-motion', {
      how: 'mail',
      address: 'ada@tarn-motion.example',
    });
  });

  it('goes to the desk only, where no domain is known', async () => {
    const form = await render({ mailDomain: null });
    expect(form.root.querySelector('input[type=radio]')).toBeNull();
    await form.type('I run the workshop, call me there.');
    await form.send();
    expect(form.ask).toHaveBeenCalledWith('tarn-motion', {
      how: 'desk',
      note: 'I run the workshop, call me there.',
    });
  });

  it('goes to the desk where somebody chooses so', async () => {
    const form = await render();
    await form.chooseDesk();
    expect(form.root.querySelector('textarea')).not.toBeNull();
  });

  it('is not sent with too little to go by', async () => {
    const form = await render({ mailDomain: null });
    await form.type('It is me.');
    await form.send();
    expect(form.ask).not.toHaveBeenCalled();
    expect(form.root.textContent).toContain('at least 20 characters');
  });

  it('keeps what was typed and shows at the field what the server says of it', async () => {
    const problem = new ApiProblem({
      type: '/problems/not-valid',
      title: '',
      status: 422,
      detail: '',
      fields: [{ path: 'address', message: 'is not at tarn-motion.example' }],
    });
    const form = await render({}, vi.fn(() => throwError(() => problem)) as never);
    await form.type('ada@elsewhere.example');
    await form.send();
    expect(form.root.querySelector<HTMLInputElement>('input[type=email]')?.value).toBe(
      'ada@elsewhere.example',
    );
    expect(form.root.querySelector('.wrong')?.textContent).toContain('s not at tarn-motion.example');
  });
});
