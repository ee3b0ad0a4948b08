import type { EditionContent, JointSide } from '../../shared/contract/edition-content.js';
import type { FixKind, Permanence } from '../../shared/contract/vocabulary.js';

/** What an edition points at, flat, as the edition_* tables keep it once the edition is published. */
export interface EditionLinks {
  readonly sides: { joint: number; side: 'a' | 'b'; partId: number }[];
  readonly revisions: { revisionId: number; holds: boolean }[];
  readonly symptomSlugs: string[];
  readonly photoIds: number[];
  readonly fixes: {
    key: string;
    position: number;
    kind: FixKind | null;
    permanence: Permanence | null;
    revisionIds: number[];
  }[];
}

/**
 * Reads the links off an edition's content; each thing is listed once, however often the content names it. A revision
 * that is marked in several joints holds where any of the marks says so. Sides without a part are left out.
 */
export function editionLinks(content: EditionContent): EditionLinks {
  const holds = new Map<number, boolean>();
  for (const { revisionId, holds: marked } of sidesOf(content).flatMap((side) => side.revisions)) {
    holds.set(revisionId, marked || (holds.get(revisionId) ?? false));
  }
  return {
    sides: content.joints.flatMap((entry, joint) =>
      (['a', 'b'] as const).flatMap((side) => {
        const { partId } = entry[side];
        return partId === null ? [] : [{ joint, side, partId }];
      }),
    ),
    revisions: [...holds].map(([revisionId, marked]) => ({ revisionId, holds: marked })),
    symptomSlugs: [...new Set(content.symptoms)],
    photoIds: photoIdsOf(content),
    fixes: content.fixes.map((fix, position) => ({
      key: fix.key,
      position,
      kind: fix.kind,
      permanence: fix.permanence,
      revisionIds: [...new Set(fix.revisionIds)],
    })),
  };
}

/** Both sides of every joint, in the order of the form. */
export function sidesOf(content: EditionContent): JointSide[] {
  return content.joints.flatMap((joint) => [joint.a, joint.b]);
}

/** Every part that a joint names, once. */
export function partIdsOf(content: EditionContent): number[] {
  return [...new Set(sidesOf(content).flatMap((side) => side.partId ?? []))];
}

/** Every revision that is marked on a side, once, whether the write-up holds for it or not. */
export function revisionIdsOf(content: EditionContent): number[] {
  return [...new Set(sidesOf(content).flatMap((side) => side.revisions.map((mark) => mark.revisionId)))];
}

/** Every photo of the content, those of steps included, once. */
export function photoIdsOf(content: EditionContent): number[] {
  const ofSteps = content.fixes.flatMap((fix) => fix.steps.flatMap((step) => step.photoId ?? []));
  return [...new Set([...content.photos.map((use) => use.photoId), ...ofSteps])];
}
