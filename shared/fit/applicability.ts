import type { Applicability } from '../contract/search.js';

/** One part of a joint as a write-up speaks of it. */
export interface SpokenPart {
  readonly part: { readonly id: number; readonly name: string };
  readonly holdsFor: readonly { readonly id: number; readonly label: string }[];
  readonly notFor: readonly { readonly id: number }[];
}

/** One part that the reader has; `revision` null while they have not found out which one it is. */
export interface OwnedPart {
  readonly partId: number;
  readonly revision: { readonly id: number; readonly partId: number; readonly label: string } | null;
}

type Reason = Applicability['reasons'][number];
const gravity: Record<Reason['verdict'], number> = { holds: 0, 'not-known': 1, 'written-for-others': 2 };

/**
 * Whether a write-up holds for what the reader has.
 *
 * For each part of the joint that the reader has, their revision either stands among those it holds for, among those it
 * was found not to hold for, or among neither (not known). Of several revisions of one part the most favourable counts,
 * since the reader can choose which one to use. Over the parts the gravest counts, since a joint needs all of them.
 * A reader who has none of the parts gets `not-yours`. Cost: O(parts × (revisions + bench)).
 */
export function applicabilityOf(spoken: readonly SpokenPart[], owned: readonly OwnedPart[]): Applicability {
  const reasons: Reason[] = [];
  for (const side of spoken) {
    const best = owned
      .filter((item) => item.partId === side.part.id)
      .map((item) => reasonFor(side, item))
      .sort((one, other) => gravity[one.verdict] - gravity[other.verdict])[0];
    if (best && !reasons.some((reason) => reason.part === best.part)) reasons.push(best);
  }
  reasons.sort((one, other) => gravity[other.verdict] - gravity[one.verdict]);
  return { verdict: reasons[0]?.verdict ?? 'not-yours', reasons };
}

function reasonFor(side: SpokenPart, item: OwnedPart): Reason {
  const id = item.revision?.id;
  const verdict = side.holdsFor.some((revision) => revision.id === id)
    ? 'holds'
    : side.notFor.some((revision) => revision.id === id)
      ? 'written-for-others'
      : 'not-known';
  return {
    verdict,
    part: side.part.name,
    mine: item.revision,
    holdsFor: side.holdsFor.map((revision) => revision.label),
  };
}

/** The statement shown to the reader: "holds for your M1 Rev C", "written for M1 Rev A–B only", "not known for your M1 Rev D". */
export function applicabilityWords(reason: Reason): string {
  const mine = reason.mine ? `${reason.part} ${reason.mine.label}` : `${reason.part} (revision not said)`;
  if (reason.verdict === 'holds') return `holds for your ${mine}`;
  if (reason.verdict === 'not-known') return `not known for your ${mine}`;
  return `written for ${reason.part} ${joinLabels(reason.holdsFor)} only, yours is ${reason.mine?.label ?? 'not said'}`;
}

function joinLabels(labels: readonly string[]): string {
  return labels.length <= 1
    ? (labels[0] ?? 'no revision')
    : `${labels.slice(0, -1).join(', ')} and ${labels.at(-1)}`;
}
