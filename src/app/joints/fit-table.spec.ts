import { TestBed } from '@angular/core/testing';
import type { FitCell } from '../../../shared/contract/joints';
import { FitTable } from './fit-table';
import { lipJoint } from './lip-joint.fixture';

async function table(): Promise<{
  root: HTMLElement;
  chosen: FitCell[];
  buttons: HTMLButtonElement[];
}> {
  const fixture = TestBed.createComponent(FitTable);
  const joint = lipJoint();
  fixture.componentRef.setInput('joint', joint);
  fixture.componentRef.setInput('chosen', joint.cells[1]);
  fixture.componentRef.setInput('mine', [22]);
  const chosen: FitCell[] = [];
  fixture.componentInstance.choose.subscribe((cell) => chosen.push(cell));
  await fixture.whenStable();
  const root = fixture.nativeElement as HTMLElement;
  return { root, chosen, buttons: [...root.querySelectorAll('button')] };
}

describe('the fit table', () => {
  it('names the revisions of both parts in headers of rows and columns', async () => {
    const { root } = await table();
    const headers = (scope: string) =>
      [...root.querySelectorAll(`th[scope=${scope}] .label`)].map((label) => label.textContent?.trim());
    expect(headers('row')).toEqual(['Rev 1', 'Rev 2']);
    expect(headers('col')).toEqual(['Rev B', 'Rev C']);
    expect(root.querySelector('th.mine')?.textContent).toContain('yours');
  });

  it('says verdict, chance and counts of a pair in words, with a mark that needs no colour', async () => {
    const { buttons } = await table();
    expect(buttons[1]?.textContent).toContain('will not seat');
    expect(buttons[1]?.textContent).toContain('under 1 %');
    expect(buttons[1]?.textContent).toContain('4 did not');
    const marks = buttons.map((button) => button.querySelector('sl-fit-mark svg')?.innerHTML);
    expect(new Set(marks.slice(0, 3)).size).toBe(3);
  });

  it('chooses the pair of the cell that is touched, and shows which one is chosen', async () => {
    const { buttons, chosen } = await table();
    expect(buttons.map((button) => button.getAttribute('aria-pressed'))).toEqual([
      'false',
      'true',
      'false',
      'false',
    ]);
    buttons[2]?.click();
    expect(chosen.map(({ revisionA, revisionB }) => [revisionA, revisionB])).toEqual([[12, 21]]);
  });

  it('says in a cell that nobody can tell what to measure, and below the table how', async () => {
    const { root, buttons } = await table();
    expect(buttons[3]?.textContent).toContain('measure outer diameter, height');
    const wanted = [...root.querySelectorAll('.wanted li')].map((line) => line.textContent);
    expect(wanted).toHaveLength(2);
    expect(wanted[0]).toContain('Belt bracket Rev 2');
    expect(wanted[0]).toContain('Caliper across the outside');
  });
});
