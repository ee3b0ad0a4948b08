import type { Proposed } from '../../shared/contract/proposals.js';

/** What is proposed, in words: "M1 by Tarn Motion", "revision Rev E of M1", "recess of M1". */
export function wordsOf(entry: Proposed, partName?: string): string {
  const of = partName === undefined ? '' : ` of ${partName}`;
  if (entry.kind === 'part') return `${entry.name} by ${entry.maker}`;
  if (entry.kind === 'revision') return `revision ${entry.label}${of}`;
  return `feature ${entry.name}${of}`;
}

/** Names what is proposed so that the same thing has the same name; the database compares without regard to case. */
export function waitingName(partId: number | null, entry: Proposed): string {
  if (entry.kind === 'part') return `part/${entry.maker}/${entry.name}`;
  return `${entry.kind}/${partId}/${entry.kind === 'revision' ? entry.label : entry.name}`;
}
