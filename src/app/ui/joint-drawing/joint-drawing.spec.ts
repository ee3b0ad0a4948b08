import { TestBed } from '@angular/core/testing';
import { drawJoint } from '../../../../shared/drawing/joint-drawing';
import type { Dimension } from '../../../../shared/fit/dimension';
import { JointDrawing } from './joint-drawing';

const read = (value: number): Dimension => ({ value, uncertainty: 0.02, source: { kind: 'own-reading' } });

async function render(shim?: number): Promise<HTMLElement> {
  const drawing = drawJoint({
    kind: 'boss-recess',
    a: { dimensions: { diameter: read(22.5), height: read(1.5) }, attributes: {}, process: 'printed' },
    b: { dimensions: { diameter: read(19.5), depth: read(2) }, attributes: {}, process: 'machined' },
    nameA: 'bracket Rev 1',
    nameB: 'motor Rev C',
    ...(shim === undefined ? {} : { shim }),
  })!;
  const fixture = TestBed.createComponent(JointDrawing);
  fixture.componentRef.setInput('drawing', drawing);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('the joint drawing', () => {
  it('tells in text what it shows', async () => {
    const svg = (await render()).querySelector('svg')!;
    const described = svg.querySelector(`#${svg.getAttribute('aria-describedby')}`)!.textContent;
    expect(described).toContain('The faces stay 1.50 mm apart.');
  });

  it('picks out the overlap, and with a shim the shim instead', async () => {
    expect((await render()).querySelectorAll('.overlap')).toHaveLength(2);
    const shimmed = await render(1.52);
    expect(shimmed.querySelectorAll('.overlap')).toHaveLength(0);
    expect(shimmed.querySelectorAll('.shim')).toHaveLength(2);
  });

  it('hatches both parts by patterns of its own', async () => {
    const root = await render();
    for (const part of root.querySelectorAll<SVGPathElement>('.a, .b')) {
      const pattern = /#([\w-]+)/.exec(part.style.fill)?.[1];
      expect(root.querySelector(`pattern#${pattern}`)).not.toBeNull();
    }
  });
});
