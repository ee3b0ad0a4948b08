import type { OwnedPart } from '../../shared/fit/applicability.js';

/**
 * Filters that part all write-ups by what they say about the reader's parts, in the order in which they are shown: holds,
 * not known, the rest. They say the same as shared/fit/applicability.ts does for one write-up: each part that the reader
 * has must hold in one of the reader's revisions. One filter that lets everything through for an empty bench.
 */
export function benchGroups(owned: readonly OwnedPart[]): (string | undefined)[] {
  if (owned.length === 0) return [undefined];
  const parts = partsOf(owned);
  const concerned = `partIds IN [${parts.map((part) => part.id).join(', ')}]`;
  const revisionIds = parts.flatMap((part) => part.revisionIds);
  const notHolding = parts.map((part) => `(partIds = ${part.id} AND NOT ${holdsFor(part.revisionIds)})`);
  const forOthers = parts
    .filter((part) => part.allSaid)
    .map((part) => `(${foundNotToHold(part.revisionIds)})`);
  const anyForOthers = forOthers.length === 0 ? undefined : `(${forOthers.join(' OR ')})`;

  const holds = `${holdsFor(revisionIds)} AND NOT (${notHolding.join(' OR ')})`;
  const notKnown = [
    concerned,
    `(${notHolding.join(' OR ')})`,
    ...(anyForOthers ? [`NOT ${anyForOthers}`] : []),
  ].join(' AND ');
  const rest = [`NOT ${concerned}`, ...(anyForOthers ? [anyForOthers] : [])].join(' OR ');
  return [...(revisionIds.length > 0 ? [holds] : []), notKnown, rest];
}

interface OwnedRevisions {
  readonly id: number;
  readonly revisionIds: number[];
  /** Whether the reader has said the revision of each one they have. */
  readonly allSaid: boolean;
}

function partsOf(owned: readonly OwnedPart[]): OwnedRevisions[] {
  const ids = [...new Set(owned.map((item) => item.partId))];
  return ids.map((id) => {
    const items = owned.filter((item) => item.partId === id);
    return {
      id,
      revisionIds: items.flatMap((item) => (item.revision ? [item.revision.id] : [])),
      allSaid: items.every((item) => item.revision),
    };
  });
}

function holdsFor(revisionIds: readonly number[]): string {
  return `revisionIds IN [${revisionIds.join(', ')}]`;
}

/** Every revision the reader has of a part was found not to hold: the most favourable one counts, and there is none better. */
function foundNotToHold(revisionIds: readonly number[]): string {
  return revisionIds.map((id) => `notRevisionIds = ${id}`).join(' AND ');
}
