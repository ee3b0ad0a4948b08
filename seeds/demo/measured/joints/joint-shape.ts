import type { JointKind } from '../../../../shared/fit/joint-kinds.js';

/** A joint between two features, each written `part/feature`. */
export interface DemoJoint {
  readonly slug: string;
  readonly name: string;
  readonly kind: JointKind;
  readonly a: string;
  readonly b: string;
}

/** Joints of one kind: slug, name, both features. */
export function of(
  kind: JointKind,
  lines: readonly (readonly [string, string, string, string])[],
): DemoJoint[] {
  return lines.map(([slug, name, a, b]) => ({ kind, slug, name, a, b }));
}
