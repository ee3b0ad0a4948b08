import type { FitCell, JointPage } from '../../../shared/contract/joints';

/** What decides which pair is shown: the address first, then the bench. Ids of revisions; unknown ones count for nothing. */
export interface Wishes {
  readonly a: number | null;
  readonly b: number | null;
  readonly bench: readonly number[];
}

/**
 * The pair of revisions to show: what the address names, else what is on the reader's bench, else the newest pair that
 * readings tell something of, else the newest of both that are sold. Null where a part has no revisions.
 */
export function choosePair(joint: JointPage, wishes: Wishes): FitCell | null {
  const own = (ids: readonly number[], wish: number | null): number | null => {
    if (wish !== null && ids.includes(wish)) return wish;
    return ids.findLast((id) => wishes.bench.includes(id)) ?? null;
  };
  const a = own(idsOf(joint.sideA), wishes.a);
  const b = own(idsOf(joint.sideB), wishes.b);
  const fitting = joint.cells.filter(
    (cell) => (a === null || cell.revisionA === a) && (b === null || cell.revisionB === b),
  );
  const announced = new Set([...announcedOf(joint.sideA), ...announcedOf(joint.sideB)]);
  return (
    fitting.findLast((cell) => cell.verdict !== 'not-known') ??
    fitting.findLast((cell) => !announced.has(cell.revisionA) && !announced.has(cell.revisionB)) ??
    fitting.at(-1) ??
    null
  );
}

function announcedOf(side: JointPage['sideA']): number[] {
  return side.revisions.flatMap(({ revision }) => (revision.announced ? [revision.id] : []));
}

function idsOf(side: JointPage['sideA']): number[] {
  return side.revisions.map(({ revision }) => revision.id);
}
