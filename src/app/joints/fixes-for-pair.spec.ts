import type { JointWriteUp } from '../../../shared/contract/joints';
import { fixesForPair } from './fixes-for-pair';

const fix = (key: string, revisionIds: number[]): JointWriteUp['fixes'][number] => ({
  key,
  title: key,
  kind: 'shim',
  permanence: 'reversible',
  standing: 'told',
  afterwards: [],
  cautions: [],
  revisionIds,
});
const writeUp: JointWriteUp = {
  slug: 'lip-rocks',
  title: 'Lip rocks',
  holdsFor: [11, 12, 22],
  cautions: [],
  fixes: [fix('for-all', []), fix('only-rev-2', [12]), fix('only-rev-b', [21]), fix('rev-1-on-c', [11, 22])],
};
const keys = (found: JointWriteUp[]): string[] => found.flatMap(({ fixes }) => fixes.map(({ key }) => key));
const parts = { a: [11, 12], b: [21, 22] };

describe('fixes for a pair', () => {
  it('are those that name no other revision of either part', () => {
    expect(keys(fixesForPair([writeUp], { revisionA: 11, revisionB: 22 }, parts))).toEqual([
      'for-all',
      'rev-1-on-c',
    ]);
    expect(keys(fixesForPair([writeUp], { revisionA: 12, revisionB: 22 }, parts))).toEqual([
      'for-all',
      'only-rev-2',
    ]);
  });
  it('come from no write-up that was not found to hold for both revisions', () => {
    expect(fixesForPair([writeUp], { revisionA: 11, revisionB: 21 }, parts)).toEqual([]);
  });
  it('leave out what names others only where the parts of the revisions are not at hand', () => {
    expect(keys(fixesForPair([writeUp], { revisionA: 11, revisionB: 22 }, null))).toEqual([
      'for-all',
      'rev-1-on-c',
    ]);
  });
});
