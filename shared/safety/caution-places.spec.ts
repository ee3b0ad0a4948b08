import { describe, expect, it } from 'vitest';
import { cautionsAt, hasMovedUp, placeIn } from './caution-places.js';

const content = { fixes: [{ key: 'fix-aaaa', steps: [{ key: 'step-aaaa' }, { key: 'step-bbbb' }] }] };
const write = { fixKey: null, stepKey: null };

describe('where a caution stands', () => {
  it.each([
    ['on the write-up', write, write],
    ['on the fix', { fixKey: 'fix-aaaa', stepKey: null }, { fixKey: 'fix-aaaa', stepKey: null }],
    [
      'on the step',
      { fixKey: 'fix-aaaa', stepKey: 'step-bbbb' },
      { fixKey: 'fix-aaaa', stepKey: 'step-bbbb' },
    ],
    [
      'on the fix when its step is gone',
      { fixKey: 'fix-aaaa', stepKey: 'gone' },
      { fixKey: 'fix-aaaa', stepKey: null },
    ],
    ['on the write-up when its fix is gone', { fixKey: 'gone', stepKey: null }, write],
    ['on the write-up when fix and step are gone', { fixKey: 'gone', stepKey: 'step-aaaa' }, write],
  ])('%s', (_, placed, stands) => {
    expect(placeIn(content, placed)).toEqual(stands);
    expect(hasMovedUp(content, placed)).toBe(
      placed.fixKey !== stands.fixKey || placed.stepKey !== stands.stepKey,
    );
  });

  it('is one place only: each caution is found once over all places', () => {
    const cautions = [
      { id: 1, ...write },
      { id: 2, fixKey: 'gone', stepKey: null },
      { id: 3, fixKey: 'fix-aaaa', stepKey: 'gone' },
      { id: 4, fixKey: 'fix-aaaa', stepKey: 'step-aaaa' },
    ];
    const at = (fixKey: string | null, stepKey: string | null) =>
      cautionsAt(content, cautions, { fixKey, stepKey }).map((caution) => caution.id);
    expect([
      at(null, null),
      at('fix-aaaa', null),
      at('fix-aaaa', 'step-aaaa'),
      at('fix-aaaa', 'step-bbbb'),
    ]).toEqual([[1, 2], [3], [4], []]);
  });
});
