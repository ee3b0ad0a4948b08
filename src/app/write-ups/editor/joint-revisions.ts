import { Injectable, inject } from '@angular/core';
import type { EditionContent } from '../../../../shared/contract/edition-content';
import { PartDirectory } from './part-directory';

export interface NamedRevision {
  id: number;
  /** "M1 Rev B" */
  name: string;
  holds: boolean;
}

/** Revisions of the parts in a text's joints, with their names. */
@Injectable({ providedIn: 'root' })
export class JointRevisions {
  private readonly directory = inject(PartDirectory);

  of(content: EditionContent): NamedRevision[] {
    const named = new Map<number, NamedRevision>();
    for (const side of content.joints.flatMap((joint) => [joint.a, joint.b])) {
      for (const revision of this.directory.part(side.partId)?.revisions ?? []) {
        const holds = side.revisions.some((mark) => mark.revisionId === revision.id && mark.holds);
        named.set(revision.id, {
          id: revision.id,
          name: `${this.directory.partName(revision.partId)} ${revision.label}`,
          holds: holds || (named.get(revision.id)?.holds ?? false),
        });
      }
    }
    return [...named.values()];
  }
}
