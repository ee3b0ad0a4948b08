import { TestBed } from '@angular/core/testing';
import { worksheetOfLink } from '../../../../shared/fit/worksheet-link';
import { AttachedWorksheet } from './attached-worksheet';

async function render(link: string): Promise<{ root: HTMLElement; type: (gap: string) => Promise<void> }> {
  const read = worksheetOfLink(link);
  if (!('record' in read)) throw new Error(read.refusal);
  const fixture = TestBed.createComponent(AttachedWorksheet);
  fixture.componentRef.setInput('record', read.record);
  await fixture.whenStable();
  const root = fixture.nativeElement as HTMLElement;
  return {
    root,
    type: async (gap) => {
      const field = root.querySelector('input')!;
      field.value = gap;
      field.dispatchEvent(new Event('input'));
      await fixture.whenStable();
    },
  };
}

const coins = '/worksheets/shim?v=1&gap=1.7&tolerance=0.05&mostPieces=1&families=coin';

describe('a worksheet on a fix', () => {
  it('shows what the author came to, and nothing of the reader’s until they type', async () => {
    const { root } = await render(coins);
    expect(root.textContent).toContain('UK 20p');
    expect(root.querySelectorAll('li')).toHaveLength(0);
  });

  it('finds the reader’s own coin for the reader’s gap, and links on with it', async () => {
    const { root, type } = await render(coins);
    await type('1,52');
    expect(root.querySelector('li')?.textContent).toContain('US cent');
    expect(root.querySelectorAll('li')).toHaveLength(3);
    expect(root.querySelector('a[href^="/worksheets/shim"]')?.getAttribute('href')).toContain('gap=1.52');
  });

  it('says what is wrong with a gap that is none', async () => {
    const { root, type } = await render(coins);
    await type('wide');
    expect(root.querySelector('[role=status]')?.textContent).toContain('A gap in figures');
    await type('5000');
    expect(root.querySelectorAll('li')).toHaveLength(0);
    expect(root.querySelector('[role=status]')?.textContent?.trim()).not.toBe('');
  });

  it('of a trim has no field for a gap', async () => {
    const { root } = await render(
      '/worksheets/trim?v=1&bossDiameter=22.5&bossHeight=1.7&recessDiameter=19.5',
    );
    expect(root.querySelector('input')).toBeNull();
    expect(root.textContent).toContain('Either take');
  });
});
