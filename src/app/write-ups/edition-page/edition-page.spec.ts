import { provideHttpClient } from '@angular/common/http';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { Caution, EditionView, FixView, RichText } from '../../../../shared/contract/write-ups';
import { EditionPage } from './edition-page';

const none: RichText = { source: '', html: '' };
const rich = (html: string): RichText => ({ source: html, html });

const caution: Caution = {
  id: 1,
  fixKey: 'trim-lip',
  stepKey: null,
  signalWord: 'danger',
  hazards: ['power-tool'],
  hazard: 'Rotary tool',
  consequence: 'Cuts flesh.',
  avoidance: 'Clamp the work.',
};

const fix: FixView = {
  key: 'trim-lip',
  title: 'Trim the lip off',
  kind: 'trim',
  permanence: 'permanent',
  standing: 'tried',
  madeRightFrom: null,
  why: none,
  tools: ['rotary tool'],
  materials: [],
  steps: [{ key: 'step-one', text: rich('<p>Cut the lip.</p>'), photo: null, cautions: [] }],
  revisions: [],
  afterwards: ['flats'],
  afterwardsNote: '',
  worksheet: null,
  acceptance: { quantity: 'gap', comparison: 'at-most', value: 0.05, unit: 'mm' },
  cautions: [caution],
  trialCounts: { held: 2, heldForAWhile: 0, didNotHelp: 1 },
};

const view: EditionView = {
  title: 'Lip does not enter the recess',
  summary: '',
  joints: [],
  symptoms: [],
  noticed: none,
  cause: none,
  readings: [],
  fixes: [fix],
  photos: [],
  sources: none,
  cautions: [],
};

function drawn(change: Partial<EditionView> = {}): HTMLElement {
  TestBed.configureTestingModule({ providers: [provideRouter([]), provideHttpClient()] });
  const fixture = TestBed.createComponent(EditionPage);
  fixture.componentRef.setInput('view', { ...view, ...change });
  fixture.detectChanges();
  return fixture.nativeElement as HTMLElement;
}

/** Whether `first` stands before `second` in the page. */
function before(first: Element, second: Element): boolean {
  return (first.compareDocumentPosition(second) & Node.DOCUMENT_POSITION_FOLLOWING) !== 0;
}

describe('edition page', () => {
  it('puts the cautions of a fix above its steps', () => {
    const page = drawn();
    const box = page.querySelector('sl-fix-sheet sl-caution-box')!;
    expect(box.textContent).toContain('Clamp the work.');
    expect(before(box, page.querySelector('.steps')!)).toBe(true);
  });

  it('puts a caution on a step above that step and above no other', () => {
    const step = (key: string, text: string, cautions: Caution[]) => ({
      key,
      text: rich(text),
      photo: null,
      cautions,
    });
    const steps = [
      step('step-one', '<p>Mark the lip.</p>', []),
      step('step-two', '<p>Cut the lip.</p>', [{ ...caution, stepKey: 'step-two' }]),
    ];
    const page = drawn({ fixes: [{ ...fix, steps, cautions: [] }] });
    const [first, second] = page.querySelectorAll('.steps > li');
    expect(first!.querySelector('sl-caution-box')).toBeNull();
    const box = second!.querySelector('sl-caution-box')!;
    expect(before(box, second!.querySelector(':scope > sl-rich-text')!)).toBe(true);
  });

  it('puts a caution on the whole write-up above everything that it may warn of', () => {
    const page = drawn({ cautions: [{ ...caution, fixKey: null }] });
    expect(before(page.querySelector('sl-caution-box')!, page.querySelector('sl-fix-sheet')!)).toBe(true);
  });

  it('lets no script or handler out of rich text', () => {
    const page = drawn({
      cause: rich(
        '<p onclick="steal()">It rocks.<script>steal()</script><img src="x" onerror="steal()"></p>',
      ),
    });
    const text = page.querySelector('sl-rich-text')!;
    expect(text.textContent).toContain('It rocks.');
    expect(text.innerHTML).not.toMatch(/script|onclick|onerror|steal/);
  });

  it('shows a title with markup in it as the text that it is', () => {
    const page = drawn({ title: '<img src=x onerror=alert(1)> rocks' });
    expect(page.querySelector('h1 img')).toBeNull();
    expect(page.querySelector('h1')?.textContent).toContain('<img src=x');
  });

  it('gives a reading with its uncertainty to the same decimals', () => {
    const page = drawn({
      readings: [
        {
          key: 'reading-1',
          part: 'M1',
          revision: null,
          dimension: 'recess',
          value: 19.5,
          unit: 'mm',
          instrument: 'caliper',
          uncertainty: 0.02,
        },
      ],
    });
    expect(page.querySelector('.readings .number.sl-measured')?.textContent?.trim()).toBe('19.50 ± 0.02 mm');
  });

  it('tells trials that did not help beside those that held', () => {
    expect(drawn().querySelector('.facts')?.textContent).toContain('held for 2, did not help 1');
  });

  it('draws a draft of which nothing is written yet', () => {
    const empty: FixView = {
      ...fix,
      title: '',
      kind: null,
      permanence: null,
      steps: [],
      cautions: [],
      acceptance: null,
    };
    const page = drawn({ title: '', fixes: [empty] });
    expect(page.querySelector('h1')?.textContent).toContain('Without a title yet');
    expect(page.querySelector('.facts')?.textContent).toContain('not chosen');
  });
});
