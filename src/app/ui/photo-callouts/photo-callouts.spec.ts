import { TestBed } from '@angular/core/testing';
import type { Callout } from '../../../../shared/contract/callouts';
import type { Photo } from '../../../../shared/contract/photos';
import { PhotoCallouts } from './photo-callouts';

const photo: Photo = {
  id: 1,
  hash: 'a'.repeat(64),
  width: 900,
  height: 600,
  widths: [480, 900],
  placeholder: '',
  alt: 'The lip',
};
const callouts: Callout[] = [
  { kind: 'ring', key: 'ring-one', label: 'lip', centre: { x: 0.5, y: 0.5 }, radius: 0.1 },
  {
    kind: 'dimension',
    key: 'dimension-one',
    label: '',
    from: { x: 0.2, y: 0.8 },
    to: { x: 0.8, y: 0.8 },
    value: 22.5,
    unit: 'mm',
  },
  {
    kind: 'arrow',
    key: 'arrow-one',
    label: '<b>rim</b>',
    from: { x: 0.1, y: 0.1 },
    to: { x: 0.3, y: 0.3 },
  },
];

async function render(drawn: Callout[]): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(PhotoCallouts);
  fixture.componentRef.setInput('photo', photo);
  fixture.componentRef.setInput('alt', 'The lip on the rim');
  fixture.componentRef.setInput('callouts', drawn);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('a photo with callouts', () => {
  it('tells them in words, in their order, and hides the drawing from those who listen', async () => {
    const page = await render(callouts);
    const list = page.querySelector('ul[aria-label="Drawn on the photo"]')!;
    expect([...list.querySelectorAll('li')].map((item) => item.textContent)).toEqual([
      'ring “lip”',
      'dimension 22.5 mm',
      'arrow “<b>rim</b>”',
    ]);
    expect(page.querySelector('svg')!.getAttribute('aria-hidden')).toBe('true');
    expect(page.querySelector('img')!.getAttribute('alt')).toBe('The lip on the rim');
  });

  it('draws a line with a light edge below it for each, and their words as text', async () => {
    const svg = (await render(callouts)).querySelector('svg')!;
    expect([...svg.querySelectorAll('g[class]')].map((group) => group.getAttribute('class'))).toEqual([
      'ring',
      'dimension',
      'arrow',
    ]);
    for (const group of svg.querySelectorAll('g[class]')) {
      const [edge, stroke] = group.querySelectorAll('path');
      expect(edge!.getAttribute('d')).toContain(stroke!.getAttribute('d')!);
    }
    expect([...svg.querySelectorAll('text')].map((text) => text.textContent!.trim())).toEqual([
      'lip',
      '22.5 mm',
      '<b>rim</b>',
    ]);
  });

  it('is the photo alone where nothing is drawn on it', async () => {
    const page = await render([]);
    expect(page.querySelector('img')).not.toBeNull();
    expect(page.querySelector('svg, ul')).toBeNull();
  });
});
