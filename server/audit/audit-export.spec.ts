import { describe, expect, it } from 'vitest';
import { csvCell, csvLine, jsonLine } from './audit-export.js';

const line = {
  id: 7,
  at: '2026-12-01T10:00:00.000Z',
  actor: { id: 3, displayName: 'Ada' },
  action: 'role-changed',
  subject: { kind: 'account', id: 9, name: '=HYPERLINK("x")' },
  reason: 'One, two',
  details: ['from: member', 'to: maker'],
};

describe('a cell of the exported log', () => {
  it.each([
    ['plain words', 'plain words'],
    ['one, two', '"one, two"'],
    ['say "no"', '"say ""no"""'],
    ['two\nlines', '"two\nlines"'],
    ['=1+1', "'=1+1"],
    ['+1', "'+1"],
    ['-1', "'-1"],
    ['@name', "'@name"],
    ['\t=1', "'\t=1"],
    ['=A1,"x"', `"'=A1,""x"""`],
    ['', ''],
  ])('%j becomes %j', (text, cell) => {
    expect(csvCell(text)).toBe(cell);
  });
});

describe('an entry of the exported log', () => {
  it('is one line of CSV that ends as RFC 4180 has it', () => {
    expect(csvLine(line)).toBe(
      `7,2026-12-01T10:00:00.000Z,3,Ada,role-changed,role changed,account,9,"'=HYPERLINK(""x"")","One, two",from: member; to: maker\r\n`,
    );
  });

  it('names the site where nobody did it', () => {
    expect(csvLine({ ...line, actor: null })).toMatch(/^7,[^,]*,,the site,/);
  });

  it('is one line of JSON with all it says, as it is', () => {
    const text = jsonLine({ ...line, reason: 'Two\nlines' });
    expect(text.endsWith('\n')).toBe(true);
    expect(text.trimEnd()).not.toContain('\n');
    expect(JSON.parse(text)).toEqual({ ...line, reason: 'Two\nlines' });
  });
});
