import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { DeskKeys, deskKeys } from './desk-keys';

const done: string[] = [];

@Component({
  selector: 'sl-page-with-keys',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: '<input /><textarea></textarea><button type="button">Do it</button>',
})
class PageWithKeys {
  constructor() {
    deskKeys([
      { key: 'c', does: 'take it', run: () => done.push('c') },
      { key: 'ArrowDown', does: 'on', run: () => done.push('down') },
    ]);
  }
}

function open() {
  const fixture = TestBed.createComponent(PageWithKeys);
  document.body.append(fixture.nativeElement);
  const page = fixture.nativeElement as HTMLElement;
  const press = (key: string, on: Element = page, more: KeyboardEventInit = {}) =>
    on.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...more }));
  return { fixture, page, press };
}

beforeEach(() => {
  done.length = 0;
  TestBed.inject(DeskKeys).switch(true);
});

describe('keys of the desk', () => {
  it('do what they stand for, on a button as well', () => {
    const { page, press } = open();
    press('c');
    press('ArrowDown', page.querySelector('button')!);
    expect(done).toEqual(['c', 'down']);
  });

  it('never fire in a field, nor together with Control, Alt or Meta', () => {
    const { page, press } = open();
    press('c', page.querySelector('input')!);
    press('c', page.querySelector('textarea')!);
    press('c', page, { ctrlKey: true });
    press('c', page, { altKey: true });
    press('c', page, { metaKey: true });
    expect(done).toEqual([]);
  });

  it('of one character can be switched off, the others stay', () => {
    const { press } = open();
    TestBed.inject(DeskKeys).switch(false);
    press('c');
    press('ArrowDown');
    expect(done).toEqual(['down']);
  });

  it('end with their page', () => {
    const { fixture, press } = open();
    fixture.destroy();
    press('c', document.body);
    expect(done).toEqual([]);
    expect(TestBed.inject(DeskKeys).current()).toEqual([]);
  });

  it('do nothing while a dialog is open', () => {
    const { press } = open();
    const dialog = document.createElement('mat-dialog-container');
    document.body.append(dialog);
    press('c');
    dialog.remove();
    expect(done).toEqual([]);
  });
});
