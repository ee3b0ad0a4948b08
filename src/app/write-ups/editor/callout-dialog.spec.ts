import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { FormControl } from '@angular/forms';
import { MAT_DIALOG_DATA, MatDialogRef } from '@angular/material/dialog';
import type { Callout } from '../../../../shared/contract/callouts';
import type { Photo } from '../../../../shared/contract/photos';
import { Undo } from '../../ui/undo/undo';
import { CalloutDialog, type PhotoToDrawOn } from './callout-dialog';

const photo: Photo = {
  id: 1,
  hash: 'a'.repeat(64),
  width: 800,
  height: 400,
  widths: [480, 800],
  placeholder: '',
  alt: '',
};
const ring: Callout = {
  kind: 'ring',
  key: 'ring-one',
  label: 'lip',
  centre: { x: 0.5, y: 0.5 },
  radius: 0.1,
};

let control: FormControl<Callout[]>;
let takeBack: () => void;
let fixture: ComponentFixture<CalloutDialog>;
let page: HTMLElement;

async function open(callouts: Callout[]): Promise<void> {
  control = new FormControl(callouts, { nonNullable: true });
  const data: PhotoToDrawOn = { photo, alt: 'The lip', control };
  const undo = { offer: (_done: string, back: () => void) => (takeBack = back), tell: () => undefined };
  TestBed.configureTestingModule({
    providers: [
      { provide: MAT_DIALOG_DATA, useValue: data },
      { provide: MatDialogRef, useValue: { close: () => undefined } },
      { provide: Undo, useValue: undo },
    ],
  });
  fixture = TestBed.createComponent(CalloutDialog);
  page = fixture.nativeElement as HTMLElement;
  await fixture.whenStable();
  // The browser that runs these lays nothing out: the photo stands at the corner, 800 by 400.
  stage().getBoundingClientRect = () => new DOMRect(0, 0, 800, 400);
}

const stage = (): HTMLElement => page.querySelector<HTMLElement>('[role="application"]')!;
const hint = (): string => page.querySelector('[role="status"]')!.textContent!.trim();
const buttonNamed = (name: string): HTMLButtonElement =>
  [...page.querySelectorAll('button')].find(
    (button) => (button.getAttribute('aria-label') ?? button.textContent!.trim()) === name,
  )!;

async function press(target: HTMLElement, ...keys: string[]): Promise<void> {
  for (const key of keys) target.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true }));
  await fixture.whenStable();
}
async function click(name: string): Promise<void> {
  buttonNamed(name).click();
  await fixture.whenStable();
}
async function type(field: HTMLInputElement | HTMLSelectElement, value: string): Promise<void> {
  field.value = value;
  field.dispatchEvent(new Event(field instanceof HTMLSelectElement ? 'change' : 'input'));
  await fixture.whenStable();
}
async function point(target: HTMLElement, kind: string, x: number, y: number): Promise<void> {
  target.dispatchEvent(new PointerEvent(kind, { clientX: x, clientY: y, button: 0, bubbles: true }));
  await fixture.whenStable();
}
const times = (count: number, key: string): string[] => Array.from({ length: count }, () => key);

describe('drawing on a photo by keys', () => {
  it('sets both ends with the arrow keys and Enter, and says after each what comes next', async () => {
    await open([]);
    expect(hint()).toBe('Choose what to draw.');
    await click('Dimension');
    expect(hint()).toContain('where the dimension begins');
    await press(stage(), ...times(10, 'ArrowLeft'), 'Enter');
    expect(hint()).toContain('where the dimension ends');
    await press(stage(), ...times(20, 'ArrowRight'), 'ArrowUp', 'Enter');
    expect(control.value).toMatchObject([
      { kind: 'dimension', from: { x: 0.4, y: 0.5 }, to: { x: 0.6, y: 0.49 }, value: null, unit: 'mm' },
    ]);
    expect(control.value[0]!.key).toMatch(/^[a-z0-9]{24}$/);
  });

  it('tells where the cross is', async () => {
    await open([]);
    await press(stage(), 'ArrowRight', 'ArrowDown', 'ArrowDown');
    expect(page.querySelector('[aria-live="polite"]')!.textContent).toBe('51 % across, 52 % down');
  });

  it('goes one step back with Escape and draws nothing', async () => {
    await open([]);
    await click('Ring');
    await press(stage(), 'Enter', 'Escape');
    expect(hint()).toContain('the middle of the ring');
    await press(stage(), 'Escape');
    expect(hint()).toBe('Choose what to draw.');
    expect(control.value).toEqual([]);
  });

  it('moves the ends of what is chosen, and takes a row of moves back as one', async () => {
    await open([ring]);
    page.querySelector('li')!.dispatchEvent(new FocusEvent('focusin'));
    await fixture.whenStable();
    const centre = buttonNamed('Centre of ring “lip”');
    await press(centre, ...times(5, 'ArrowDown'));
    expect(control.value).toMatchObject([{ centre: { x: 0.5, y: 0.55 } }]);
    await click('Undo');
    expect(control.value).toEqual([ring]);
    await click('Redo');
    expect(control.value).toMatchObject([{ centre: { x: 0.5, y: 0.55 } }]);
  });
});

describe('drawing on a photo with finger, pen or mouse', () => {
  it('draws from where it was pressed to where it is let go', async () => {
    await open([]);
    await click('Ring');
    await point(stage(), 'pointerdown', 400, 200);
    await point(stage(), 'pointermove', 460, 200);
    await point(stage(), 'pointerup', 480, 200);
    expect(control.value).toMatchObject([{ kind: 'ring', centre: { x: 0.5, y: 0.5 }, radius: 0.1 }]);
  });

  it('draws between two taps, without dragging', async () => {
    await open([]);
    await click('Arrow');
    for (const [x, y] of [
      [80, 40],
      [400, 200],
    ] as const) {
      await point(stage(), 'pointerdown', x, y);
      await point(stage(), 'pointerup', x, y);
    }
    expect(control.value).toMatchObject([
      { kind: 'arrow', from: { x: 0.1, y: 0.1 }, to: { x: 0.5, y: 0.5 } },
    ]);
  });

  it('moves an end by a tap on it and a tap where it goes', async () => {
    await open([ring]);
    await point(stage(), 'pointerdown', 480, 200);
    const centre = buttonNamed('Centre of ring “lip”');
    await point(centre, 'pointerdown', 400, 200);
    await point(centre, 'pointerup', 400, 200);
    expect(hint()).toBe('Tap where it goes.');
    await point(stage(), 'pointerdown', 200, 100);
    expect(control.value).toMatchObject([{ centre: { x: 0.25, y: 0.25 } }]);
  });
});

describe('the list of what is drawn', () => {
  it('takes words, value and unit', async () => {
    await open([]);
    await click('Dimension');
    await press(stage(), 'Enter', 'ArrowRight', 'Enter');
    const [label, value] = page.querySelectorAll('input');
    await type(label!, 'across the lip');
    await type(value!, '0.886');
    await type(page.querySelector('select')!, 'in');
    expect(control.value).toMatchObject([{ label: 'across the lip', value: 0.886, unit: 'in' }]);
    await type(value!, '');
    expect(control.value).toMatchObject([{ value: null }]);
  });

  it('takes one off, and undo puts it back where it was', async () => {
    const other: Callout = { ...ring, key: 'ring-two', label: 'rim' };
    await open([ring, other]);
    await click('Remove ring 1');
    expect(control.value).toEqual([other]);
    takeBack();
    await fixture.whenStable();
    expect(control.value).toEqual([ring, other]);
  });

  it('changes the order in which they are read out', async () => {
    const other: Callout = { ...ring, key: 'ring-two', label: 'rim' };
    await open([ring, other]);
    await click('Move ring 2 up');
    expect(control.value).toEqual([other, ring]);
  });

  it('draws no more than one photo takes', async () => {
    await open(Array.from({ length: 20 }, (_, index) => ({ ...ring, key: `ring-number-${index}` })));
    expect(buttonNamed('Arrow').disabled).toBe(true);
    expect(hint()).toContain('No more fit on one photo');
  });
});
