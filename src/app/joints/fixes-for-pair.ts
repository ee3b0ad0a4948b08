import type { JointWriteUp } from '../../../shared/contract/joints';

/**
 * Write-ups found to hold for both revisions, each with those of its fixes that hold for them. Where it is not at hand
 * which revisions are of which part (null), a fix that names revisions stays when one of the pair is among them.
 */
export function fixesForPair(
  writeUps: readonly JointWriteUp[],
  pair: { readonly revisionA: number; readonly revisionB: number },
  revisionsOf: {
    readonly a: readonly number[];
    readonly b: readonly number[];
  } | null,
): JointWriteUp[] {
  const { revisionA, revisionB } = pair;
  /** A fix that names revisions of a part holds for those alone; one that names none of them holds for all. */
  const allows = (named: readonly number[], mine: number, ofPart: readonly number[]): boolean =>
    named.includes(mine) || !named.some((id) => ofPart.includes(id));
  return writeUps
    .filter(({ holdsFor }) => holdsFor.includes(revisionA) && holdsFor.includes(revisionB))
    .map((writeUp) => ({
      ...writeUp,
      fixes: writeUp.fixes.filter(({ revisionIds }) =>
        revisionsOf
          ? allows(revisionIds, revisionA, revisionsOf.a) && allows(revisionIds, revisionB, revisionsOf.b)
          : revisionIds.length === 0 || revisionIds.includes(revisionA) || revisionIds.includes(revisionB),
      ),
    }));
}
