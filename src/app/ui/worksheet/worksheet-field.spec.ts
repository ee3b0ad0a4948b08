import { TestBed } from '@angular/core/testing';
import { FormControl } from '@angular/forms';
import type { WorksheetRecord } from '../../../../shared/contract/worksheet';
import { WorksheetField } from './worksheet-field';

async function field() {
  const control = new FormControl<WorksheetRecord | null>(null);
  const fixture = TestBed.createComponent(WorksheetField);
  fixture.componentRef.setInput('control', control);
  fixture.componentRef.setInput('fieldId', 'sheet');
  await fixture.whenStable();
  const page = fixture.nativeElement as HTMLElement;
  const type = async (link: string): Promise<void> => {
    const input = page.querySelector('input')!;
    input.value = link;
    input.dispatchEvent(new Event('input'));
    input.dispatchEvent(new Event('change'));
    await fixture.whenStable();
  };
  const click = async (words: string): Promise<void> => {
    await fixture.whenStable();
    [...page.querySelectorAll('button')].find((button) => button.textContent.includes(words))!.click();
    await fixture.whenStable();
  };
  return { control, page, type, click };
}

describe('a worksheet attached by its link', () => {
  it('is run as soon as the field is left, and shown before it is sent', async () => {
    const { control, page, type } = await field();
    await type('http://shimlore.example/worksheets/shim?v=1&gap=1.5');
    expect(control.value).toMatchObject({ kind: 'shim', inputs: { gap: 1.5 } });
    expect(page.textContent).toContain(control.value!.result.sentence);
    expect(control.valid).toBe(true);
  });

  it('keeps a text that is no worksheet’s link, says why, and lets the form not be sent', async () => {
    const { control, page, type } = await field();
    await type('/write-ups/rocks');
    expect(page.querySelector('input')?.value).toBe('/write-ups/rocks');
    expect(page.querySelector('[role=alert]')?.textContent).toContain('not the link of a worksheet');
    expect(control.invalid).toBe(true);
    await type('');
    expect(control.valid).toBe(true);
  });

  it('when it comes out otherwise by now, then it is run again when asked, and the new result can be taken', async () => {
    const { control, page, type, click } = await field();
    await type('/worksheets/shim?v=1&gap=1.5');
    const fresh = control.value!;
    await click('Run it again');
    expect(page.textContent).toContain('It comes out the same.');
    const figures = fresh.result.figures.map((figure) => ({ ...figure, value: figure.value + 1 }));
    const old = { ...fresh, result: { ...fresh.result, sentence: 'As it was.', figures } } as WorksheetRecord;
    control.setValue(old);
    await click('Run it again');
    expect(page.textContent).toContain('It comes out otherwise by now');
    await click('Take the new result');
    expect(control.value).toEqual(fresh);
  });

  it('takes another link in the place of the worksheet it has', async () => {
    const { control, type } = await field();
    await type('/worksheets/shim?v=1&gap=1.5');
    await type('/worksheets/shim?v=1&gap=2');
    expect(control.value).toMatchObject({ kind: 'shim', inputs: { gap: 2 } });
  });
});
