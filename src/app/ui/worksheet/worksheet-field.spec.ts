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
  return { control, page, type };
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
});
