import { provideHttpClient } from '@angular/common/http';
import { provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { routes } from './worksheets.routes';

async function opened(address: string) {
  const harness = await RouterTestingHarness.create(address);
  await harness.fixture.whenStable();
  const page = harness.routeNativeElement!;
  const type = async (name: string, text: string): Promise<void> => {
    const field = page.querySelector<HTMLInputElement>(`#sheet-${name}`)!;
    field.value = text;
    field.dispatchEvent(new Event('input'));
    await harness.fixture.whenStable();
  };
  const field = (name: string): string => page.querySelector<HTMLInputElement>(`#sheet-${name}`)!.value;
  const told = (): string =>
    page.querySelector('sl-sheet-result [role=status]')!.textContent!.replace(/\s+/g, ' ');
  return { harness, page, type, field, told };
}

/** The address once the pause in typing is over. */
async function addressWith(part: string): Promise<string> {
  const router = TestBed.inject(Router);
  await vi.waitFor(() => expect(router.url).toContain(part), 2000);
  return router.url;
}

const lip = '/worksheets/seat?v=1&bossDiameter=22.5&bossHeight=1.5&recessDiameter=19.5&recessDepth=2';

describe('worksheets', () => {
  beforeEach(() => {
    localStorage.clear();
    TestBed.configureTestingModule({
      providers: [
        provideRouter([{ path: 'worksheets', children: routes }]),
        provideHttpClient(),
        provideHttpClientTesting(),
      ],
    });
  });

  it('works a seat out from the address alone', async () => {
    const { told, field, page } = await opened(lip);
    expect(field('bossDiameter')).toBe('22.5');
    expect(told()).toContain('will not seat');
    expect(page.querySelector('sl-joint-drawing')).not.toBeNull();
    expect(page.textContent).toContain('No result here makes a job safe.');
  });

  it('puts what is typed into the address, and the address brings it back', async () => {
    const { type, told } = await opened('/worksheets/seat');
    expect(told()).toContain('Needed first: diameter of the boss, diameter of the recess.');
    await type('bossDiameter', '22,5');
    await type('recessDiameter', '19.5');
    await type('bossHeight', '1.5');
    const before = told();
    const address = await addressWith('bossHeight=1.5');
    TestBed.resetTestingModule();
    TestBed.configureTestingModule({
      providers: [
        provideRouter([{ path: 'worksheets', children: routes }]),
        provideHttpClient(),
        provideHttpClientTesting(),
      ],
    });
    const again = await opened(address);
    expect(again.field('bossDiameter')).toBe('22,5');
    expect(again.told()).toBe(before);
  });

  it('names the input that is out, and then shows no figure', async () => {
    const { type, told, page } = await opened(lip);
    await type('recessDiameter', '1950');
    expect(told()).toContain(
      'Diameter of the recess or bore. Out of range: has to lie over 0 and up to 1000 mm.',
    );
    expect(told()).not.toMatch(/will not seat|apart/);
    expect(page.querySelector('sl-sheet-result table')).toBeNull();
    await type('recessDiameter', 'wide');
    expect(told()).toContain('Is not a number');
  });

  it('works nothing out from an address of another version', async () => {
    const { told, page } = await opened(lip.replace('v=1', 'v=2'));
    expect(told()).toContain('another version');
    expect(page.querySelector('sl-sheet-result table')).toBeNull();
  });

  it('hands the gap on to the shim sheet', async () => {
    const { page } = await opened(lip);
    const link = [...page.querySelectorAll('a')].find((one) => one.textContent?.includes('Fill the gap'))!;
    expect(link.getAttribute('href')).toContain('/worksheets/shim?v=1&gap=1.5&');
  });

  it('finds the stack that taking the thickest piece first would miss', async () => {
    // 1.00 first leaves 0.30, which nothing fills; two of 0.65 fill 1.30.
    const { told } = await opened(
      '/worksheets/shim?v=1&gap=1.3&tolerance=0.01&families=&own=1~0.005~~thick&own=0.65~0.005~~middling',
    );
    expect(told()).toContain('2 × middling may fill the gap of 1.30 mm');
  });

  it('draws the stack that is chosen and keeps it in the address', async () => {
    const { page, harness, told } = await opened('/worksheets/shim?v=1&gap=1.5');
    expect(told()).toContain('US cent may fill the gap');
    const [, second] = page.querySelectorAll<HTMLInputElement>('sl-stack-list input');
    second!.click();
    await harness.fixture.whenStable();
    expect(told()).toContain('feeler leaf');
    expect(page.querySelector('sl-stack-picture svg')!.getAttribute('aria-label')).toContain('feeler leaf');
    expect(await addressWith('chosen=')).toContain(second!.value);
  });

  it('keeps a visitor’s own piece in the browser and uses it', async () => {
    const { page, harness, told } = await opened('/worksheets/shim?v=1&gap=1.23&families=');
    expect(told()).toContain('No stock is left');
    const form = page.querySelector('sl-own-stock-panel form')!;
    for (const [name, text] of [
      ['name', 'strip of tin'],
      ['thickness', '1.23'],
    ]) {
      const field = form.querySelector<HTMLInputElement>(`[formControlName=${name}]`)!;
      field.value = text!;
      field.dispatchEvent(new Event('input'));
    }
    form.dispatchEvent(new Event('submit'));
    await harness.fixture.whenStable();
    await vi.waitFor(() => expect(told()).toContain('Strip of tin may fill the gap'));
    expect(localStorage.getItem('shimlore-stock')).toContain('strip of tin');
  });

  it('sizes what to take off, with the cautions before it', async () => {
    const { page, told } = await opened(
      '/worksheets/trim?v=1&bossDiameter=22.5&bossHeight=1.5&recessDiameter=19.5&recessOuter=24',
    );
    expect(told()).toContain('The wall gets thinner than 1.20 mm');
    const boxes = [...page.querySelectorAll('sl-caution-box')];
    expect(boxes.map((box) => box.querySelector('.word')!.textContent!.trim())).toEqual([
      'warning',
      'caution',
      'caution',
      'caution',
    ]);
    expect(boxes[0]!.compareDocumentPosition(page.querySelector('sl-sheet-result')!) & 4).toBe(4);
  });

  it('turns what is typed into the other unit', async () => {
    const { page, harness, field, told } = await opened(lip);
    page.querySelectorAll<HTMLInputElement>('sl-unit-choice input')[1]!.click();
    await harness.fixture.whenStable();
    expect(Number(field('bossDiameter'))).toBeCloseTo(22.5 / 25.4, 6);
    expect(told()).toContain('will not seat');
  });
});
