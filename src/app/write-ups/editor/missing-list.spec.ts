import { TestBed } from '@angular/core/testing';
import { emptyContent } from '../../../../shared/contract/edition-content';
import { missingFromContent } from '../../../../shared/contract/edition-completeness';
import { MissingList } from './missing-list';

function listOf(missing: ReturnType<typeof missingFromContent>) {
  const fixture = TestBed.createComponent(MissingList);
  fixture.componentRef.setInput('missing', missing);
  const wanted: string[] = [];
  fixture.componentInstance.wanted.subscribe((path) => wanted.push(path));
  fixture.detectChanges();
  return { element: fixture.nativeElement as HTMLElement, wanted };
}

describe('what is missing', () => {
  it('when the draft is empty, then every lack is named in the order of the form, each with its remedy', () => {
    const { element } = listOf(missingFromContent(emptyContent));

    const links = [...element.querySelectorAll('a')].map((link) => link.textContent);
    expect(links).toEqual(['Title', 'Summary', 'Joint', 'Symptoms', 'Cause', 'Fix']);
    expect(element.textContent).toContain('Name the two parts that are meant to mate.');
  });

  it('when a line is followed, then its field is asked for', () => {
    const { element, wanted } = listOf([
      { path: 'fixes.0.kind', message: 'is not chosen', remedy: 'Choose one.' },
    ]);

    const link = element.querySelector('a');
    link?.click();

    expect(link?.getAttribute('href')).toBe('#field-fixes-0-kind');
    expect(wanted).toEqual(['fixes.0.kind']);
  });

  it('when nothing is missing, then it says that it can go to the desk', () => {
    const { element } = listOf([]);

    expect(element.textContent).toContain('It can go to the desk.');
  });
});
