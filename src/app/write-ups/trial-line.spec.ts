import { TestBed } from '@angular/core/testing';
import type { WorksheetRecord } from '../../../shared/contract/worksheet';
import type { Trial } from '../../../shared/contract/write-ups';
import { worksheetOfLink } from '../../../shared/fit/worksheet-link';
import { TrialLine } from './trial-line';

function sheet(): WorksheetRecord {
  const read = worksheetOfLink('/worksheets/shim?v=1&gap=1.5');
  if (!('record' in read)) throw new Error(read.refusal);
  return read.record;
}

async function lineOf(over: Partial<Trial>): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(TrialLine);
  fixture.componentRef.setInput('trial', {
    id: 1,
    fixKey: 'fix-00001',
    person: { id: 2, displayName: 'Owner' },
    outcome: 'held',
    revisions: [],
    note: 'Sits flat.',
    figure: null,
    worksheet: null,
    createdAt: '2026-05-04T10:00:00.000Z',
    takenDown: null,
    ...over,
  } satisfies Trial);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('a trial on the page', () => {
  it('shows what its worksheet came to, with the way to run it again', async () => {
    const worksheet = sheet();
    const page = await lineOf({ worksheet });
    expect(page.textContent).toContain(worksheet.result.sentence);
    expect(page.querySelector('a')?.getAttribute('href')).toMatch(/^\/worksheets\/shim\?.*gap=1\.5/);
  });

  it('shows no worksheet where its person attached none', async () => {
    const page = await lineOf({});
    expect(page.textContent).toContain('Sits flat.');
    expect(page.querySelector('a')).toBeNull();
  });
});
