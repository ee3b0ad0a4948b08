import type { JointRef } from '../contract/joints.js';
import type { EditionView } from '../contract/write-ups.js';

/** The known joint between the two parts of a write-up's first joint, whichever way round it is written; null where none is. */
export function jointOfWriteUp(joints: readonly JointRef[], view: EditionView): JointRef | null {
  const first = view.joints[0];
  if (!first) return null;
  const between = joints.filter(
    ({ a, b }) =>
      (a.id === first.a.part.id && b.id === first.b.part.id) ||
      (a.id === first.b.part.id && b.id === first.a.part.id),
  );
  return between.length > 1
    ? (between.find((joint) => speaksOf(joint, first)) ?? between[0]!)
    : (between[0] ?? null);
}

/** Of several joints between the same parts: the one whose name shares a word with the features that the write-up names. */
function speaksOf(joint: JointRef, first: EditionView['joints'][number]): boolean {
  const words = `${first.a.feature} ${first.b.feature}`.toLowerCase().match(/[a-z]{4,}/g) ?? [];
  return words.some((word) => joint.name.toLowerCase().includes(word));
}
