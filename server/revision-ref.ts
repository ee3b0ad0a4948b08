import type { RevisionRef } from '../shared/contract/hardware.js';

/** A row of `revisions` as read with `revisionRefColumns`. */
export interface RevisionRefRow {
  readonly id: number;
  readonly partId: number;
  readonly label: string;
  readonly state: 'sold' | 'announced';
}

export const revisionRefColumns = {
  id: 'revisions.id',
  partId: 'revisions.part_id',
  label: 'revisions.label',
  state: 'revisions.state',
};

/** Only a revision that is not sold yet says so. */
export function toRevisionRef({ id, partId, label, state }: RevisionRefRow): RevisionRef {
  return state === 'announced' ? { id, partId, label, announced: true } : { id, partId, label };
}
