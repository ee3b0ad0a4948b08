import { TestBed } from '@angular/core/testing';
import type { AuditLine } from '../../../../shared/contract/audit';
import { AuditLines } from './audit-lines';

const line: AuditLine = {
  id: 1,
  at: '2026-03-04T10:00:00.000Z',
  actor: { id: 3, displayName: 'Ada' },
  action: 'role-changed',
  subject: { kind: 'library-caution', id: 9, name: 'Blade' },
  reason: '<b>Because</b>',
  details: ['from: member', 'to: maker'],
};

function shown(lines: AuditLine[], subjects = true): HTMLElement {
  const fixture = TestBed.createComponent(AuditLines);
  fixture.componentRef.setInput('lines', lines);
  fixture.componentRef.setInput('subjects', subjects);
  fixture.detectChanges();
  return fixture.nativeElement as HTMLElement;
}

describe('entries of the audit log', () => {
  it('say who did what to what, why, and what it changed, in words', () => {
    const page = shown([line]);

    expect(page.textContent).toContain('role changed');
    expect(page.textContent).toContain('library caution');
    expect([...page.querySelectorAll('.details li')].map((detail) => detail.textContent)).toEqual(
      line.details,
    );
  });

  it('show a reason with markup in it as the text that it is', () => {
    const page = shown([line]);

    expect(page.querySelector('.reason b')).toBeNull();
    expect(page.querySelector('.reason')?.textContent).toBe('“<b>Because</b>”');
  });

  it('name the site where nobody did it, and leave out what all are about where asked', () => {
    const page = shown([{ ...line, actor: null }], false);

    expect(page.querySelector('strong')?.textContent).toBe('the site');
    expect(page.textContent).not.toContain('Blade');
  });
});
