import type { EditionContent, JointSide, RevisionMark } from '../../shared/contract/edition-content.js';

/** What stands for what from now on, by identity; what is not named stays. */
export interface Renamed {
  readonly parts: ReadonlyMap<number, number>;
  readonly revisions: ReadonlyMap<number, number>;
}

/**
 * The content with parts and revisions by their new identities. Where two marks of one side become one, it holds where
 * either did; a fix names each revision once.
 */
export function renameInContent(content: EditionContent, renamed: Renamed): EditionContent {
  const part = (id: number | null): number | null => (id === null ? null : (renamed.parts.get(id) ?? id));
  const revision = (id: number): number => renamed.revisions.get(id) ?? id;
  const side = (entry: JointSide): JointSide => ({
    ...entry,
    partId: part(entry.partId),
    revisions: mergedMarks(
      entry.revisions.map((mark) => ({ ...mark, revisionId: revision(mark.revisionId) })),
    ),
  });
  return {
    ...content,
    joints: content.joints.map((joint) => ({ ...joint, a: side(joint.a), b: side(joint.b) })),
    readings: content.readings.map((reading) => ({
      ...reading,
      revisionId: reading.revisionId === null ? null : revision(reading.revisionId),
    })),
    fixes: content.fixes.map((fix) => ({ ...fix, revisionIds: [...new Set(fix.revisionIds.map(revision))] })),
  };
}

function mergedMarks(marks: readonly RevisionMark[]): RevisionMark[] {
  const holds = new Map<number, boolean>();
  for (const mark of marks) holds.set(mark.revisionId, mark.holds || (holds.get(mark.revisionId) ?? false));
  return [...holds].map(([revisionId, held]) => ({ revisionId, holds: held }));
}
