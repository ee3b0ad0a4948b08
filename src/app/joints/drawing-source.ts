import type { FitCell, JointPage } from '../../../shared/contract/joints';

/** What a drawing was made from: "from the consensus of 14 readings", "from one reading: thin evidence". */
export function drawingSource(joint: JointPage, cell: FitCell, own: boolean): string {
  const known = [
    { side: joint.sideA, id: cell.revisionA },
    { side: joint.sideB, id: cell.revisionB },
  ].flatMap(({ side, id }) =>
    Object.values(side.revisions.find(({ revision }) => revision.id === id)?.dimensions ?? {}),
  );
  const count = known.reduce((sum, consensus) => sum + consensus.count, 0);
  const readings = count === 1 ? 'one reading' : `the consensus of ${count} readings`;
  const thin = known.some((consensus) => consensus.thin) ? ': thin evidence' : '';
  if (own) return count > 0 ? `from your own readings, the rest from ${readings}` : 'from your own readings';
  return count > 0 ? `from ${readings}${thin}` : '';
}
