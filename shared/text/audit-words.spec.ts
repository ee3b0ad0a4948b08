import { describe, expect, it } from 'vitest';
import { actionWords, detailWords } from './audit-words.js';

describe('an entry of the audit log in words', () => {
  it('tells an action by its name, or better where it has better words', () => {
    expect(actionWords('edition-published')).toBe('edition published');
    expect(actionWords('merged')).toBe('merged into another');
  });

  it('tells each detail with its name, whatever its shape', () => {
    expect(
      detailWords({ from: 'member', writeUpId: 7, amended: true, into: null, list: ['a', 2], none: [] }),
    ).toEqual(['from: member', 'write up id: 7', 'amended: yes', 'into: none', 'list: a, 2', 'none: none']);
    expect(detailWords({ from: { fixKey: 'fix-aaaa', stepKey: null } })).toEqual([
      'from: fix key: fix-aaaa; step key: none',
    ]);
  });

  it('has nothing to tell where there are no details', () => {
    expect(detailWords(null)).toEqual([]);
    expect(detailWords('text')).toEqual([]);
  });
});
