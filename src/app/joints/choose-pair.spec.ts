import { choosePair } from './choose-pair';
import { lipJoint } from './lip-joint.fixture';

const pairOf = (wishes: { a?: number; b?: number; bench?: number[] }): number[] | null => {
  const cell = choosePair(lipJoint(), {
    a: wishes.a ?? null,
    b: wishes.b ?? null,
    bench: wishes.bench ?? [],
  });
  return cell && [cell.revisionA, cell.revisionB];
};

describe('the pair shown', () => {
  it('is the newest that readings tell something of', () => {
    expect(pairOf({})).toEqual([11, 22]);
  });
  it('is what the reader has on the bench', () => {
    expect(pairOf({ bench: [12, 21, 999] })).toEqual([12, 21]);
    expect(pairOf({ bench: [21] })).toEqual([11, 21]);
  });
  it('is what the address names, whatever is on the bench', () => {
    expect(pairOf({ a: 12, b: 22, bench: [11, 21] })).toEqual([12, 22]);
  });
  it('passes over revisions of other parts', () => {
    expect(pairOf({ a: 22, b: 11 })).toEqual([11, 22]);
  });
  it('is none of an announced revision while others tell as little', () => {
    const joint = lipJoint();
    const newest = joint.sideB.revisions.at(-1)!;
    const silent = {
      ...joint,
      cells: joint.cells.map((cell) => ({ ...cell, verdict: 'not-known' as const })),
    };
    const wishes = { a: null, b: null, bench: [] };
    expect(choosePair(silent, wishes)?.revisionB).toBe(newest.revision.id);
    newest.revision = { ...newest.revision, announced: true };
    expect(choosePair(silent, wishes)?.revisionB).not.toBe(newest.revision.id);
  });
  it('is none where a part has no revisions', () => {
    expect(choosePair({ ...lipJoint(), cells: [] }, { a: null, b: null, bench: [] })).toBeNull();
  });
});
