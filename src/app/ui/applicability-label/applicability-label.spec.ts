import { TestBed } from '@angular/core/testing';
import type { Applicability } from '../../../../shared/contract/search';
import { ApplicabilityLabel } from './applicability-label';

function drawn(applicability: Applicability): HTMLElement {
  const fixture = TestBed.createComponent(ApplicabilityLabel);
  fixture.componentRef.setInput('applicability', applicability);
  fixture.detectChanges();
  return fixture.nativeElement as HTMLElement;
}

const revC = { id: 3, partId: 1, label: 'Rev C' };

describe('applicability label', () => {
  it('names the revision for which a write-up holds', () => {
    const element = drawn({
      verdict: 'holds',
      reasons: [{ verdict: 'holds', part: 'M1', mine: revC, holdsFor: ['Rev C'] }],
    });
    expect(element.textContent).toContain('holds for your M1 Rev C');
  });

  it('says for which revisions it was written when the reader has another one', () => {
    const element = drawn({
      verdict: 'written-for-others',
      reasons: [{ verdict: 'written-for-others', part: 'M1', mine: revC, holdsFor: ['Rev A', 'Rev B'] }],
    });
    expect(element.textContent).toContain('written for M1 Rev A and Rev B only, yours is Rev C');
  });

  it('gives each part of the joint its own line, told apart by words and not by colour alone', () => {
    const element = drawn({
      verdict: 'not-known',
      reasons: [
        { verdict: 'not-known', part: 'Belt bracket', mine: null, holdsFor: ['Rev A'] },
        { verdict: 'holds', part: 'M1', mine: revC, holdsFor: ['Rev C'] },
      ],
    });
    const lines = [...element.querySelectorAll('.line')].map((line) => line.textContent?.trim());
    expect(lines).toEqual(['not known for your Belt bracket (revision not said)', 'holds for your M1 Rev C']);
  });

  it('says nothing to a reader who has none of the parts', () => {
    expect(drawn({ verdict: 'not-yours', reasons: [] }).textContent?.trim()).toBe('');
  });
});
