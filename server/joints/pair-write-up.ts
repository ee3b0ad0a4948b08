import type { JointWriteUp } from '../../shared/contract/joints.js';
import type { Caution } from '../../shared/contract/write-ups.js';
import type { PairWriteUp } from './joint-write-ups.store.js';

/** Whether a write-up was found to hold for both revisions of a pair. */
export function holdsForPair(writeUp: PairWriteUp, revisionA: number, revisionB: number): boolean {
  return writeUp.holdsFor.includes(revisionA) && writeUp.holdsFor.includes(revisionB);
}

/** A write-up as the joint's pages list it, each fix with its own cautions. */
export function writeUpView(writeUp: PairWriteUp, cautions: readonly Caution[]): JointWriteUp {
  return {
    slug: writeUp.slug,
    title: writeUp.title,
    holdsFor: [...writeUp.holdsFor],
    cautions: cautions.filter((caution) => caution.fixKey === null),
    fixes: writeUp.content.fixes.map((fix) => ({
      key: fix.key,
      title: fix.title,
      kind: fix.kind,
      permanence: fix.permanence,
      standing: writeUp.standings.get(fix.key) ?? 'told',
      afterwards: fix.afterwards,
      cautions: cautions.filter((caution) => caution.fixKey === fix.key),
      revisionIds: fix.revisionIds,
    })),
  };
}
