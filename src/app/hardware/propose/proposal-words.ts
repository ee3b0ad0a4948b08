import type { Proposal } from '../../../../shared/contract/proposals';

/** What was proposed, in one line: "Revision Rev E of M1". */
export function headOfEntry({ entry, part }: Pick<Proposal, 'entry' | 'part'>): string {
  if (entry.kind === 'part') return `${entry.name} by ${entry.maker}`;
  const of = part ? ` of ${part.name}` : '';
  return entry.kind === 'revision' ? `Revision ${entry.label}${of}` : `Feature “${entry.name}”${of}`;
}
